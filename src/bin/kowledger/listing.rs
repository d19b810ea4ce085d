//! What was recognised on a sheet, laid out in columns that line up.

use kowledger::columns::Recognised;
use kowledger::run::RecognisedSheet;
use kowledger::workbook::column_letters;
use unicode_width::{UnicodeWidthChar, UnicodeWidthStr};

/// Headers wider than this are cut.
const WIDEST_HEADER: usize = 40;
/// What stands between two columns of the list.
const GAP: usize = 2;

/// One column of the sheet.
struct Line {
    index: u16,
    header: String,
    field: String,
    why: String,
}

/// What was recognised on each sheet, and why, in lines of text.
pub(crate) fn columns_listing(sheets: &[RecognisedSheet]) -> Vec<String> {
    let mut lines: Vec<String> = sheets.iter().flat_map(|sheet| sheet.how_read.iter().cloned()).collect();
    for sheet in sheets {
        let Some(recognised) = &sheet.recognised else {
            lines.push(format!("{}: no header recognised; the sheet would be copied.", sheet.name));
            continue;
        };
        lines.push(format!("{}: header in {}.", sheet.name, header_rows(recognised)));
        lines.extend(laid_out(&columns_of(recognised)));
        lines.extend(recognised.remarks.iter().map(|remark| format!("  Note: {remark}")));
    }
    lines
}

fn header_rows(recognised: &Recognised) -> String {
    let (top, lowest) = (recognised.header_top + 1, recognised.header_row + 1);
    match lowest.saturating_sub(top) {
        0 => format!("row {lowest}"),
        1 => format!("rows {top} and {lowest}, read together"),
        _ => format!("rows {top} to {lowest}, read together"),
    }
}

/// The columns of the sheet in their order, recognised or not.
fn columns_of(recognised: &Recognised) -> Vec<Line> {
    let known = recognised.columns.iter().map(|column| Line {
        index: column.index,
        header: cut(&column.header),
        field: column.field.id().to_owned(),
        why: column.reason.clone(),
    });
    let unknown = recognised.unknown.iter().map(|(index, header)| Line {
        index: *index,
        header: cut(header),
        field: "not used".to_owned(),
        why: recognised.not_taken.get(index).map_or("not recognised", String::as_str).to_owned(),
    });
    let mut lines: Vec<Line> = known.chain(unknown).collect();
    lines.sort_by_key(|line| line.index);
    lines
}

fn laid_out(lines: &[Line]) -> Vec<String> {
    let widest = |texts: &mut dyn Iterator<Item = usize>| texts.max().unwrap_or_default() + GAP;
    let letters = widest(&mut lines.iter().map(|line| column_letters(line.index).width()));
    let header = widest(&mut lines.iter().map(|line| line.header.width()));
    let field = widest(&mut lines.iter().map(|line| line.field.width()));
    lines
        .iter()
        .map(|line| {
            format!(
                "  {}{}{}{}",
                padded(&column_letters(line.index), letters),
                padded(&line.header, header),
                padded(&line.field, field),
                line.why
            )
        })
        .collect()
}

/// Filled up with spaces; a Japanese or Chinese sign takes the room of two letters.
fn padded(text: &str, width: usize) -> String {
    format!("{text}{}", " ".repeat(width.saturating_sub(text.width())))
}

/// On one line, and cut where it is too wide.
fn cut(header: &str) -> String {
    let line = header.split_whitespace().collect::<Vec<_>>().join(" ");
    if line.width() <= WIDEST_HEADER {
        return line;
    }
    let mut width = 1;
    let start = line.chars().take_while(|character| {
        width += character.width().unwrap_or_default();
        width <= WIDEST_HEADER
    });
    format!("{}…", start.collect::<String>().trim_end())
}

#[cfg(test)]
mod tests {
    use super::{WIDEST_HEADER, cut, padded};
    use unicode_width::UnicodeWidthStr;

    #[test]
    fn wide_signs_take_the_room_of_two_letters() {
        assert_eq!(padded("log Kow", 10), "log Kow   ");
        assert_eq!(padded("土壌半減期", 12), "土壌半減期  ");
    }

    #[test]
    fn only_a_header_that_is_too_wide_is_cut() {
        assert_eq!(cut("Half-life\nsoil  (d)"), "Half-life soil (d)");
        assert_eq!(cut(&"a".repeat(WIDEST_HEADER)), "a".repeat(WIDEST_HEADER));
        assert!(cut(&"a".repeat(WIDEST_HEADER + 1)).ends_with('…'));
        assert!(cut(&"水".repeat(WIDEST_HEADER)).width() <= WIDEST_HEADER);
    }
}
