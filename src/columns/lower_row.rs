//! Whether a row below the names of columns is part of the header: units, kinds, conditions, and no data.

use super::choice::dimension_of;
use super::header::Header;
use super::header_cell::HeaderCell;
use super::header_row::{text_of, texts_of};
use super::reading::Reading;
use super::second_header::is_number;
use super::stack::is_unit;
use super::words::ColumnWords;
use crate::quantity::{Dimension, Unit, is_missing, parse_unit, tidy};
use crate::substance::Field;
use crate::workbook::{CellContent, Row};

/// How surely a row belongs to the header above it.
#[derive(Debug, Clone, Copy, PartialEq, Eq)]
pub(super) enum Sign {
    /// Words of headers stand below columns of numbers, where data would be numbers.
    Certain,
    /// Only if the header is understood better with it.
    Possible,
}

/// A text below a header.
enum Below {
    /// A word for a missing value.
    Missing,
    /// Words that headers are made of.
    Words,
    Other,
}

/// Whether a row holds units and little else: text only, at least half of it units.
pub(super) fn holds_units(row: &Row) -> bool {
    let filled = row.cells.iter().filter(|cell| cell.content != CellContent::Empty).count();
    let texts = texts_of(row);
    let starts_number = |text: &str| text.starts_with(|first: char| first.is_ascii_digit());
    if texts.len() < filled || texts.iter().any(|(_, text)| starts_number(text)) {
        return false;
    }
    let real_units = texts.iter().filter(|(_, text)| is_unit(text) && !is_missing(text)).count();
    let others = texts.iter().filter(|(_, text)| !is_unit(text) && !is_missing(text)).count();
    real_units > 0 && real_units >= others
}

/// Whether a row below names holds words of headers and no data, and how surely.
pub(super) fn reads_as_header(row: &Row, above: &[HeaderCell], words: &ColumnWords) -> Option<Sign> {
    let filled = row.cells.iter().filter(|cell| cell.content != CellContent::Empty);
    if filled.clone().any(|cell| text_of(cell).is_none() || is_number(&cell.content)) {
        return None;
    }
    let mut sign = Sign::Possible;
    let (mut understood, mut others) = (0, 0);
    for (column, text) in texts_of(row) {
        let field = above.iter().find(|cell| cell.column == column).and_then(HeaderCell::field);
        match kind_below(&text, field, words)? {
            Below::Missing => {}
            Below::Words if field.is_some_and(holds_numbers) => {
                understood += 1;
                sign = Sign::Certain;
            }
            Below::Words => understood += 1,
            Below::Other => others += 1,
        }
    }
    (understood > others).then_some(sign)
}

/// What a text below the header of a field is; none where it must be data.
fn kind_below(text: &str, field: Option<Field>, words: &ColumnWords) -> Option<Below> {
    if is_missing(text) {
        return Some(Below::Missing);
    }
    let header = Header::new(text)?;
    let reading = Reading::new(&header, words);
    let dimension = field.and_then(dimension_of);
    let is_value = tidy(text).starts_with(|first: char| first.is_ascii_digit())
        && dimension.is_none_or(|dimension| measures_value(text) == Some(dimension));
    let is_text_of_field = field.is_some() && dimension.is_none();
    if is_value || (is_text_of_field && header.field(words).is_none() && !is_unit(text)) {
        return None;
    }
    Some(if reading.wholly_known && !reading.covered.is_empty() { Below::Words } else { Below::Other })
}

/// Whether words in a column of this field are no data.
fn holds_numbers(field: Field) -> bool {
    let of_words = matches!(field, Field::ReadyBiodegradability | Field::InherentBiodegradability);
    dimension_of(field).is_some() && !of_words
}

/// What a number with a unit measures.
fn measures_value(text: &str) -> Option<Dimension> {
    let text = tidy(text);
    let unit = text.trim_start_matches(|character: char| {
        character.is_ascii_digit() || matches!(character, '.' | ',' | ' ' | '-' | '±')
    });
    parse_unit(unit).map(Unit::dimension)
}
