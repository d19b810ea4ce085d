//! Headers of several rows: groups above names, units and conditions below them, read together by column.
//!
//! A merged cell stores its text in its first cell only, so a text of an upper row also speaks of the empty cells to its
//! right. Where the file does not show that they belong to it, it is believed only as far as that can clear nothing.

use super::header_row::texts_of;
use crate::quantity::{parse_unit, tidy};
use crate::workbook::{CellContent, Row};

/// Whether the file shows that a cell of an upper row reaches this far.
#[derive(Debug, Clone, Copy, PartialEq, Eq)]
pub(super) enum Extent {
    /// It stands in this column, or the cells between are there and empty.
    Shown,
    /// There are no cells between.
    Assumed,
}

/// A text above a header.
#[derive(Debug, Clone, PartialEq, Eq)]
pub(super) struct Above {
    pub(super) text: String,
    pub(super) row: u32,
    /// The column it stands in.
    pub(super) start: u16,
    pub(super) extent: Extent,
}

/// What the rows of a header say of one column.
#[derive(Debug, Clone, PartialEq, Eq)]
pub(super) struct Stacked {
    pub(super) column: u16,
    /// The lowest text that is no unit, with the units below it in brackets.
    pub(super) own: String,
    /// The same without units.
    pub(super) name: String,
    /// The rows of `own`, counted from 0.
    pub(super) rows: Vec<u32>,
    /// The texts above, the highest first.
    pub(super) above: Vec<Above>,
}

/// Reads rows that stand one below the other as one header.
pub(super) fn stack(rows: &[&Row]) -> Vec<Stacked> {
    let texts: Vec<Vec<(u16, String)>> = rows.iter().map(|row| texts_of(row)).collect();
    let mut columns: Vec<u16> = texts.iter().flatten().map(|(column, _)| *column).collect();
    columns.sort_unstable();
    columns.dedup();
    let reach: Vec<Vec<(u16, usize)>> = (0..rows.len()).map(|place| groups(&texts, place)).collect();
    columns.into_iter().filter_map(|column| stacked(rows, &texts, &reach, column)).collect()
}

fn text_at(texts: &[(u16, String)], column: u16) -> Option<&str> {
    let place = texts.binary_search_by_key(&column, |(column, _)| *column).ok()?;
    texts.get(place).map(|(_, text)| text.as_str())
}

/// The columns with a text in a row that has another one below, and their places among the texts of the row: the cells
/// that may be groups.
fn groups(texts: &[Vec<(u16, String)>], place: usize) -> Vec<(u16, usize)> {
    let below = texts.get(place + 1..).unwrap_or_default();
    let row = texts.get(place).into_iter().flatten().enumerate();
    row.filter(|(_, (column, _))| below.iter().any(|texts| text_at(texts, *column).is_some()))
        .map(|(place, (column, _))| (*column, place))
        .collect()
}

fn stacked(
    rows: &[&Row],
    texts: &[Vec<(u16, String)>],
    reach: &[Vec<(u16, usize)>],
    column: u16,
) -> Option<Stacked> {
    let mut units: Vec<(usize, &str)> = Vec::new();
    let mut named: Option<(usize, &str)> = None;
    for (place, row) in texts.iter().enumerate().rev() {
        let Some(text) = text_at(row, column) else {
            continue;
        };
        if place > 0 && is_unit(text) {
            units.push((place, text));
        } else {
            named = Some((place, text));
            break;
        }
    }
    // A unit without a name above it is that of nothing.
    let (place, name) = named.or_else(|| units.pop())?;
    let mut own = name.to_owned();
    let mut own_rows = vec![rows.get(place)?.index];
    for (place, unit) in units.iter().rev() {
        own = with_unit(&own, unit);
        own_rows.push(rows.get(*place)?.index);
    }
    let above = (0..place).filter_map(|upper| above(rows, texts, reach, upper, column)).collect();
    Some(Stacked { column, own, name: name.to_owned(), rows: own_rows, above })
}

/// The text of an upper row that speaks of a column.
fn above(
    rows: &[&Row],
    texts: &[Vec<(u16, String)>],
    reach: &[Vec<(u16, usize)>],
    upper: usize,
    column: u16,
) -> Option<Above> {
    let row = rows.get(upper)?;
    let texts = texts.get(upper)?;
    if let Some(text) = text_at(texts, column) {
        return Some(Above { text: text.to_owned(), row: row.index, start: column, extent: Extent::Shown });
    }
    let nearest = texts.partition_point(|(known, _)| *known < column).checked_sub(1)?;
    let (start, text) = texts.get(nearest)?;
    let is_group = reach.get(upper)?.binary_search_by_key(start, |(known, _)| *known).is_ok();
    if !is_group {
        return None;
    }
    let between = usize::from(column - start);
    let there = row
        .cells
        .iter()
        .filter(|cell| cell.column > *start && cell.column <= column && cell.content == CellContent::Empty);
    let extent = if there.count() == between { Extent::Shown } else { Extent::Assumed };
    Some(Above { text: text.clone(), row: row.index, start: *start, extent })
}

/// Whether a text of a lower row is a unit and nothing else.
pub(super) fn is_unit(text: &str) -> bool {
    let bare = tidy(text);
    parse_unit(bare.trim_matches(['(', ')', '[', ']'])).is_some()
}

fn with_unit(name: &str, unit: &str) -> String {
    if unit.starts_with(['(', '[']) { format!("{name} {unit}") } else { format!("{name} [{unit}]") }
}

#[cfg(test)]
mod tests {
    use super::{Extent, stack};
    use crate::workbook::{Cell, CellContent, Row};

    fn row(index: u32, texts: &[Option<&str>]) -> Row {
        let cells = (0u16..).zip(texts).filter_map(|(column, text)| {
            let content = match text {
                Some("") => CellContent::Empty,
                Some(text) => CellContent::Text((*text).to_owned()),
                None => return None,
            };
            Some(Cell { column, content, style: None, formula: false })
        });
        Row { index, cells: cells.collect() }
    }

    #[test]
    fn a_group_reaches_the_empty_cells_to_its_right_up_to_the_next() {
        let upper = row(0, &[Some("Name"), Some("Half-life (d)"), Some(""), Some("BCF"), None]);
        let lower = row(1, &[Some(""), Some("water"), Some("soil"), Some("value"), Some("method")]);
        let stacked = stack(&[&upper, &lower]);
        let above: Vec<Option<(&str, Extent)>> = stacked
            .iter()
            .map(|column| column.above.first().map(|above| (above.text.as_str(), above.extent)))
            .collect();
        assert_eq!(
            above,
            [
                None,
                Some(("Half-life (d)", Extent::Shown)),
                Some(("Half-life (d)", Extent::Shown)),
                Some(("BCF", Extent::Shown)),
                Some(("BCF", Extent::Assumed)),
            ]
        );
        assert_eq!(stacked.first().map(|column| column.own.as_str()), Some("Name"));
    }

    #[test]
    fn a_name_without_a_text_below_is_no_group_and_units_go_into_brackets() {
        let upper = row(0, &[Some("CAS"), Some(""), Some("DT50 soil")]);
        let lower = row(1, &[Some(""), Some("Colour"), Some("wk")]);
        let stacked = stack(&[&upper, &lower]);
        assert!(stacked.iter().all(|column| column.above.is_empty()));
        let own: Vec<&str> = stacked.iter().map(|column| column.own.as_str()).collect();
        assert_eq!(own, ["CAS", "Colour", "DT50 soil [wk]"]);
    }
}
