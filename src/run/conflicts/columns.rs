//! Columns that stand apart: those a remark speaks of, and those that hold data and are not used.

use crate::columns::Recognised;
use crate::fault::Conflict;
use crate::workbook::{CellContent, Row, column_letters};

/// How many screened rows of a sheet have something in each column.
#[derive(Debug, Clone, Default)]
pub(super) struct FilledColumns {
    rows: Vec<usize>,
}

impl FilledColumns {
    /// Notes the cells of a screened row.
    pub(super) fn take(&mut self, row: &Row) {
        for cell in &row.cells {
            let filled = match &cell.content {
                CellContent::Empty => false,
                CellContent::Text(text) => !text.trim().is_empty(),
                CellContent::Number(_)
                | CellContent::Boolean(_)
                | CellContent::DateTime(_)
                | CellContent::Error(_) => true,
            };
            let place = usize::from(cell.column);
            if filled && self.rows.len() <= place {
                self.rows.resize(place + 1, 0);
            }
            if let Some(rows) = self.rows.get_mut(place).filter(|_| filled) {
                *rows += 1;
            }
        }
    }

    fn in_order(&self) -> impl Iterator<Item = (u16, usize)> {
        (0u16..).zip(self.rows.iter().copied()).filter(|(_, rows)| *rows > 0)
    }
}

/// The remarks of a sheet, each with its column where it speaks of one, and the filled columns that are not used and of
/// which no remark speaks.
pub(super) fn columns_apart(
    sheet: &str,
    recognised: &Recognised,
    filled: &FilledColumns,
) -> Vec<(Option<u16>, Conflict)> {
    let mut apart: Vec<(Option<u16>, Conflict)> = Vec::new();
    for remark in &recognised.remarks {
        // The remark names its sheet, which stands in the line already.
        let remark = remark.strip_prefix(sheet).and_then(|rest| rest.strip_prefix(": ")).unwrap_or(remark);
        let headers: Vec<(u16, &str)> = headers_of(recognised).collect();
        let column = column_of_remark(remark, &headers);
        let remark = remark.to_owned();
        let conflict = match column {
            Some(_) => Conflict::Columns { remark },
            None => Conflict::Header { remark },
        };
        apart.push((column, conflict));
    }
    for (column, rows) in filled.in_order() {
        let used = recognised.columns.iter().any(|known| known.index == column);
        if used || apart.iter().any(|(doubtful, _)| *doubtful == Some(column)) {
            continue;
        }
        let header = recognised.unknown.iter().find(|(index, _)| *index == column);
        let conflict = Conflict::Unused {
            letters: column_letters(column),
            header: header.map(|(_, header)| header.clone()),
            rows,
            why: recognised.not_taken.get(&column).cloned(),
        };
        apart.push((Some(column), conflict));
    }
    apart
}

/// Index and header of the columns with a header.
pub(super) fn headers_of(recognised: &Recognised) -> impl Iterator<Item = (u16, &str)> {
    let known = recognised.columns.iter().map(|column| (column.index, column.header.as_str()));
    known.chain(recognised.unknown.iter().map(|(index, header)| (*index, header.as_str())))
}

/// The column that a remark speaks of; of two that name the same, the second, which is left aside or contradicts.
fn column_of_remark(remark: &str, headers: &[(u16, &str)]) -> Option<u16> {
    let lettered = |letters: &str| headers.iter().find(|(index, _)| column_letters(*index) == letters);
    if let Some(rest) = remark.strip_prefix("column ") {
        return lettered(first_word(rest)).map(|(index, _)| *index);
    }
    if let Some(rest) = remark.strip_prefix("headers repeat from column ") {
        return lettered(first_word(rest)).map(|(index, _)| *index);
    }
    let one_line = |header: &str| header.split_whitespace().collect::<Vec<_>>().join(" ");
    if let Some(rest) = remark.strip_prefix("columns ") {
        // The headers are quoted, and may hold anything.
        let (first, header) = lettered(first_word(rest))?;
        let quoted = format!("{} (`{}`) and ", column_letters(*first), one_line(header));
        let second = rest.strip_prefix(&quoted).and_then(|rest| lettered(first_word(rest)));
        return Some(second.map_or(*first, |(index, _)| *index));
    }
    let rest = remark.strip_prefix("the header `")?;
    let named =
        |header: &str| rest.strip_prefix(&one_line(header)).is_some_and(|rest| rest.starts_with("` "));
    headers.iter().find(|(_, header)| named(header)).map(|(index, _)| *index)
}

fn first_word(text: &str) -> &str {
    text.split_whitespace().next().unwrap_or_default()
}

#[cfg(test)]
mod tests {
    use super::column_of_remark;

    #[test]
    fn a_remark_leads_to_the_column_it_speaks_of() {
        let headers = [(0, "Name"), (1, "Name and (old)"), (5, "Koc\n(mL/g)"), (27, "Koc")];
        let table = [
            ("column F holds numbers such as `1.500`, which could group thousands", Some(5)),
            ("column AB (`Koc`) is not recognised; if it is koc: --column 'Koc=koc'", Some(27)),
            ("column AC (`Koc`) is not recognised", None),
            ("columns A (`Name`) and B (`Name and (old)`) both name name; A is taken", Some(1)),
            ("columns A (`other`) and B (`Name`) both name name", Some(0)),
            ("headers repeat from column AB on, as if a second table stood there", Some(27)),
            ("the header `Koc (mL/g)` names mL/g, which does not measure koc", Some(5)),
            ("the header `Koc` names d, which does not measure koc", Some(27)),
            ("the header `Ko` names d", None),
            ("row 2 looks like a header, too, but row 5 names more columns", None),
            ("", None),
        ];
        for (remark, expected) in table {
            assert_eq!(column_of_remark(remark, &headers), expected, "{remark}");
        }
    }
}
