//! Rows of units among the data: nothing but units under columns of values, and no substance.

use std::sync::LazyLock;

use regex::Regex;

use super::pattern::fixed;
use crate::columns::Column;
use crate::quantity::{parse_unit, plain_words, tidy};
use crate::substance::Field;
use crate::workbook::{Cell, CellContent, Row};

/// The label of such a row, in folded words.
static LABEL: LazyLock<Regex> = LazyLock::new(|| {
    fixed(r"^(?:units?|einheit(?:en)?|unites?|unidad(?:es)?|unita|eenheid|eenheden|単位|单位|單位)$")
});

/// The first unit of a row of units: its column and its text.
pub(super) fn units_label(columns: &[Column], row: &Row) -> Option<(u16, String)> {
    let mut first = None;
    for cell in row.cells.iter().filter(|cell| cell.is_filled()) {
        match part_of(columns, cell)? {
            Part::Unit(text) => {
                first.get_or_insert((cell.column, text));
            }
            Part::Beside => {}
        }
    }
    first
}

enum Part {
    Unit(String),
    /// The label of the row, or a dash for a quantity without unit.
    Beside,
}

/// What a cell is to a row of units; `None` where it makes the row something else.
fn part_of(columns: &[Column], cell: &Cell) -> Option<Part> {
    let CellContent::Text(text) = &cell.content else {
        return None;
    };
    let tidied = tidy(text);
    let text = tidied.trim().trim_matches(['[', ']', '(', ')']);
    let mut under = columns.iter().filter(|column| column.index == cell.column).map(|column| column.field);
    if LABEL.is_match(&plain_words(text)) || matches!(text, "-" | "–" | "—") {
        return Some(Part::Beside);
    }
    let takes_values =
        under.any(|field| matches!(field, Field::Property(_) | Field::Tonnage | Field::Content));
    (takes_values && parse_unit(text).is_some()).then(|| Part::Unit(text.to_owned()))
}
