//! Which row of a sheet is its header, and whether a row of units stands below it.

use std::collections::BTreeSet;

use super::ColumnOverride;
use super::header::{Header, Named, header_words};
use super::second_header::HeaderWatch;
use super::words::ColumnWords;
use crate::quantity::{is_missing, parse_unit, tidy};
use crate::substance::Field;
use crate::workbook::{Cell, CellContent, Row};

/// Rows at the top of a sheet among which the header is looked for.
const HEADER_WITHIN: usize = 30;

/// A header and what it may name.
#[derive(Debug, Clone)]
pub(super) struct HeaderCell {
    pub(super) column: u16,
    pub(super) text: String,
    pub(super) header: Option<Header>,
    pub(super) meaning: Meaning,
}

/// What a header names.
#[derive(Debug, Clone, PartialEq, Eq)]
pub(super) enum Meaning {
    /// A field, by its words.
    Named(Named),
    /// A field, because the user says so.
    Told(Field),
    /// Nothing, because the user says so.
    LeftAside,
    /// No field that is known.
    Unknown,
}

impl HeaderCell {
    pub(super) fn field(&self) -> Option<Field> {
        match &self.meaning {
            Meaning::Named(named) => Some(named.field),
            Meaning::Told(field) => Some(*field),
            Meaning::LeftAside | Meaning::Unknown => None,
        }
    }
}

/// The header of a sheet.
#[derive(Debug, Clone)]
pub(super) struct Found {
    /// The row in which our own headers go, counted from 0.
    pub(super) row: u32,
    pub(super) cells: Vec<HeaderCell>,
    /// Rows above it that could be a header, too.
    pub(super) others_above: Vec<u32>,
    /// Knows a header further down when it comes.
    pub(super) watch: HeaderWatch,
}

/// The row with the most recognised headers, of several such the one with the most cells, then the first.
pub(super) fn find(first_rows: &[Row], words: &ColumnWords, overrides: &[ColumnOverride]) -> Option<Found> {
    let mut best: Option<((usize, usize), usize, Vec<HeaderCell>)> = None;
    let mut others_above = Vec::new();
    for (place, row) in first_rows.iter().take(HEADER_WITHIN).enumerate() {
        let cells = header_cells(texts_of(row), words, overrides);
        if !is_inventory(&cells) {
            continue;
        }
        let recognised = cells.iter().filter(|cell| cell.field().is_some()).count();
        let rank = (recognised, cells.len());
        if best.as_ref().is_none_or(|(best_rank, ..)| rank > *best_rank) {
            let passed_over = best.as_ref().filter(|((recognised, _), ..)| *recognised > 1);
            others_above.extend(passed_over.and_then(|(_, place, _)| Some(first_rows.get(*place)?.index)));
            best = Some((rank, place, cells));
        }
    }
    let (_, place, cells) = best?;
    let upper = first_rows.get(place)?;
    let below = first_rows.get(place + 1).filter(|row| row.index == upper.index + 1);
    let Some((row, units)) = below.and_then(|row| Some((row, units_below(row)?))) else {
        let watch = HeaderWatch::new(&[upper], overrides);
        return Some(Found { row: upper.index, cells, others_above, watch });
    };
    let joined = texts_of(upper).into_iter().map(|(column, text)| {
        let unit = units.iter().find(|(place, _)| *place == column);
        let joined = unit.map(|(_, unit)| with_unit(&text, unit));
        (column, joined.unwrap_or(text))
    });
    let watch = HeaderWatch::new(&[upper, row], overrides);
    let cells = header_cells(joined.collect(), words, overrides);
    Some(Found { row: row.index, cells, others_above, watch })
}

fn with_unit(name: &str, unit: &str) -> String {
    if unit.starts_with(['(', '[']) { format!("{name} {unit}") } else { format!("{name} [{unit}]") }
}

pub(super) fn texts_of(row: &Row) -> Vec<(u16, String)> {
    row.cells.iter().filter_map(|cell| Some((cell.column, text_of(cell)?))).collect()
}

fn text_of(cell: &Cell) -> Option<String> {
    match &cell.content {
        CellContent::Text(text) if !text.trim().is_empty() => Some(text.trim().to_owned()),
        CellContent::Text(_)
        | CellContent::Empty
        | CellContent::Number(_)
        | CellContent::Boolean(_)
        | CellContent::DateTime(_)
        | CellContent::Error(_) => None,
    }
}

pub(super) fn header_cells(
    texts: Vec<(u16, String)>,
    words: &ColumnWords,
    overrides: &[ColumnOverride],
) -> Vec<HeaderCell> {
    texts
        .into_iter()
        .map(|(column, text)| {
            let header = Header::new(&text);
            let told = overrides.iter().find(|told| told.is_for(&text) || is_for_name(told, &text));
            let meaning = match told {
                Some(ColumnOverride { field: Some(field), .. }) => Meaning::Told(*field),
                Some(ColumnOverride { field: None, .. }) => Meaning::LeftAside,
                None => header
                    .as_ref()
                    .and_then(|header| header.field(words))
                    .map_or(Meaning::Unknown, Meaning::Named),
            };
            HeaderCell { column, text, header, meaning }
        })
        .collect()
}

/// The user may give a header of two rows without its unit.
pub(super) fn is_for_name(told: &ColumnOverride, text: &str) -> bool {
    text.rsplit_once(" [").is_some_and(|(name, _)| header_words(name) == header_words(&told.header))
}

pub(super) fn is_inventory(cells: &[HeaderCell]) -> bool {
    let fields: BTreeSet<Field> = cells.iter().filter_map(HeaderCell::field).collect();
    // A product's name is the substance's where there is no other, see `choice`.
    let named = fields.iter().any(|field| matches!(field, Field::RowId | Field::Name | Field::Product));
    fields.iter().any(|field| field.identifies()) || (named && fields.len() >= 2)
}

/// The units of a row that holds nothing else: text only, at least half of it units.
fn units_below(row: &Row) -> Option<Vec<(u16, String)>> {
    let filled = row.cells.iter().filter(|cell| cell.content != CellContent::Empty).count();
    let texts = texts_of(row);
    let starts_number = |text: &str| text.starts_with(|first: char| first.is_ascii_digit());
    if texts.len() < filled || texts.iter().any(|(_, text)| starts_number(text)) {
        return None;
    }
    let is_unit = |text: &str| {
        let bare = tidy(text);
        parse_unit(bare.trim_matches(['(', ')', '[', ']'])).is_some()
    };
    let real_units = texts.iter().filter(|(_, text)| is_unit(text) && !is_missing(text)).count();
    let others = texts.iter().filter(|(_, text)| !is_unit(text) && !is_missing(text)).count();
    (real_units > 0 && real_units >= others).then_some(texts)
}
