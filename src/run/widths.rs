//! How wide the columns of a sheet are made whose file gives no widths, as text files do not.

use crate::columns::Recognised;
use crate::workbook::{CellContent, Row};

/// What a column has at least and at most, in characters.
const NARROWEST: usize = 8;
const WIDEST: usize = 40;
/// What padding takes, in characters.
const PADDING: usize = 2;

/// The width of each column that holds something within these first rows. A header is broken between its words, so that
/// its longest word has to fit; what stands above it does not count.
pub(crate) fn fitted_widths(first_rows: &[Row], recognised: Option<&Recognised>) -> Vec<(u16, f64)> {
    let header = recognised.map(|recognised| (recognised.header_top, recognised.header_row));
    let mut widest: Vec<usize> = Vec::new();
    for row in first_rows.iter().filter(|row| header.is_none_or(|(top, _)| row.index >= top)) {
        let is_header = header.is_some_and(|(_, lowest)| row.index <= lowest);
        for cell in &row.cells {
            let wanted = match &cell.content {
                CellContent::Empty => continue,
                CellContent::Text(text) if is_header => {
                    text.split_whitespace().map(shown_width).max().unwrap_or_default()
                }
                CellContent::Text(text) | CellContent::Error(text) => {
                    text.lines().map(shown_width).max().unwrap_or_default()
                }
                CellContent::Number(number) => number.to_string().len(),
                CellContent::Boolean(_) => NARROWEST,
                CellContent::DateTime(_) => "2026-12-31".len(),
            };
            let place = usize::from(cell.column);
            if widest.len() <= place {
                widest.resize(place + 1, 0);
            }
            if let Some(known) = widest.get_mut(place) {
                *known = wanted.max(*known);
            }
        }
    }
    let bounded = |width: usize| (width + PADDING).clamp(NARROWEST, WIDEST);
    let widths = (0u16..).zip(widest).filter(|(_, width)| *width > 0);
    widths
        .map(|(column, width)| (column, f64::from(u8::try_from(bounded(width)).unwrap_or(u8::MAX))))
        .collect()
}

/// In characters; from the first Korean sign on a sign takes the room of two letters, as nearly all do there.
fn shown_width(text: &str) -> usize {
    text.chars().map(|sign| if sign >= '\u{1100}' { 2 } else { 1 }).sum()
}

#[cfg(test)]
mod tests {
    use super::{NARROWEST, WIDEST, fitted_widths, shown_width};
    use crate::workbook::{Cell, CellContent, Row};

    fn row(index: u32, texts: &[&str]) -> Row {
        let cells = (0u16..).zip(texts).map(|(column, text)| Cell {
            column,
            content: CellContent::Text((*text).to_owned()),
            style: None,
            formula: false,
        });
        Row { index, cells: cells.collect() }
    }

    #[test]
    fn a_column_is_as_wide_as_its_widest_cell_within_bounds() {
        let long = "x".repeat(100);
        let rows =
            [row(0, &["1", "108-88-3", "exactly 38 characters of a long name.."]), row(1, &["2", "", &long])];
        let expected = [(0, 8.0), (1, 10.0), (2, 40.0)];
        assert_eq!(fitted_widths(&rows, None), expected);
        assert_eq!(fitted_widths(&rows[..1], None), expected, "{NARROWEST} to {WIDEST}");
    }

    #[test]
    fn nothing_has_no_width_and_wide_signs_count_twice() {
        assert_eq!(fitted_widths(&[row(0, &["", ""])], None), []);
        assert_eq!((shown_width("°C"), shown_width("半減期")), (2, 6));
    }
}
