//! A header further down a sheet: the first one again, as after a page break, or that of another table.
//!
//! The rows below another header hold other things than the first one promises, so nothing is read from them. This
//! looks at one row alone; who streams the rows keeps in mind what came before.

use std::collections::BTreeSet;

use super::choice::dimension_of;
use super::header_cell::HeaderCell;
use super::header_row::{header_cells, is_inventory, texts_of};
use super::words::ColumnWords;
use super::{ColumnOverride, Recognised};
use crate::fault::{CellFault, CellFaultKind};
use crate::substance::Field;
use crate::workbook::{CellContent, CellRef, Row};

/// Whether a row among the data is a header.
#[derive(Debug, Clone, Copy, PartialEq, Eq)]
pub enum HeaderAgain {
    /// It is none.
    No,
    /// The header of the sheet once more, word by word in the same columns.
    Repeated,
    /// The header of another table.
    Other,
}

/// What a header further down is known by.
#[derive(Debug, Clone, PartialEq)]
pub(super) struct HeaderWatch {
    /// The texts of the header, one line for each of its rows.
    lines: Vec<Vec<(u16, String)>>,
    overrides: Vec<ColumnOverride>,
}

impl HeaderWatch {
    pub(super) fn new(header: &[&Row], overrides: &[ColumnOverride]) -> Self {
        Self { lines: header.iter().map(|row| texts_of(row)).collect(), overrides: overrides.to_vec() }
    }
}

impl Recognised {
    /// Whether a row below the header is a header, too.
    pub fn header_again(&self, row: &Row, words: &ColumnWords) -> HeaderAgain {
        if row.index < self.first_data_row || self.holds_numbers(row) {
            return HeaderAgain::No;
        }
        let texts = texts_of(row);
        if self.repeats_header(&texts) {
            return HeaderAgain::Repeated;
        }
        // Most rows of words end here: reading all their texts as headers would take long.
        let overrides = &self.watch.overrides;
        let out_of_place =
            texts.iter().filter(|(column, _)| self.holds_no_words(*column)).any(|(column, text)| {
                HeaderCell::alone(*column, text.clone(), words, overrides).field().is_some()
            });
        if !out_of_place {
            return HeaderAgain::No;
        }
        let cells = header_cells(texts, words, overrides);
        if names_columns(&cells) { HeaderAgain::Other } else { HeaderAgain::No }
    }

    /// Names the first header of another table among these rows in a remark, with what to do.
    pub fn remark_on_second_header(&mut self, sheet: &str, first_rows: &[Row], words: &ColumnWords) {
        let other = first_rows.iter().find(|row| self.header_again(row, words) == HeaderAgain::Other);
        self.remarks
            .extend(other.and_then(|row| second_header_fault(sheet, row)).map(|fault| fault.to_string()));
    }

    /// What most rows of data are known by without reading their texts as headers, which takes long.
    fn holds_numbers(&self, row: &Row) -> bool {
        let recognised = self.columns.iter().filter_map(|column| row.cell(column.index));
        recognised.into_iter().any(|cell| is_number(&cell.content) && !is_year(&cell.content))
    }

    /// Whether a column is one of numbers, registry numbers or structures, so that the name of a field is out of place
    /// in it. In a column of words, `substance` or `OECD 117` may be data.
    fn holds_no_words(&self, column: u16) -> bool {
        let field = self.columns.iter().find(|known| known.index == column).map(|known| known.field);
        field.is_some_and(|field| {
            let of_words = matches!(field, Field::ReadyBiodegradability | Field::InherentBiodegradability);
            field.identifies() || (dimension_of(field).is_some() && !of_words)
        })
    }

    fn repeats_header(&self, texts: &[(u16, String)]) -> bool {
        let recognised =
            |(column, _): &&(u16, String)| self.columns.iter().any(|known| known.index == *column);
        let held: Vec<_> = texts.iter().filter(recognised).collect();
        !held.is_empty()
            && self.watch.lines.iter().any(|line| held.iter().copied().eq(line.iter().filter(recognised)))
    }
}

/// The fault that a second header is, at its first cell.
pub(crate) fn second_header_fault(sheet: &str, row: &Row) -> Option<CellFault> {
    let (column, found) = texts_of(row).into_iter().next()?;
    let cell = CellRef { sheet: sheet.into(), row: row.index, column };
    Some(CellFault { cell, found, kind: CellFaultKind::SecondHeader })
}

/// Two fields at least, and an identity or the greater part of the row: a substance called `Name` is no header.
fn names_columns(cells: &[HeaderCell]) -> bool {
    let named = cells.iter().filter(|cell| cell.field().is_some()).count();
    let fields: BTreeSet<Field> = cells.iter().filter_map(HeaderCell::field).collect();
    fields.len() > 1 && (is_inventory(cells) || named * 2 > cells.len())
}

/// A number, or a text of digits without letters, such as `50-29-3` or `< 5`.
pub(super) fn is_number(content: &CellContent) -> bool {
    match content {
        CellContent::Number(_) | CellContent::DateTime(_) => true,
        CellContent::Text(text) => {
            text.contains(|character: char| character.is_ascii_digit()) && !text.contains(char::is_alphabetic)
        }
        CellContent::Empty | CellContent::Boolean(_) | CellContent::Error(_) => false,
    }
}

/// A header may be a year, as of tonnages.
fn is_year(content: &CellContent) -> bool {
    let years = 1900.0..2100.0;
    match content {
        CellContent::Number(number) => years.contains(number) && number.fract() <= 0.0,
        CellContent::Text(text) => text.trim().parse::<u32>().is_ok_and(|year| (1900..2100).contains(&year)),
        CellContent::Empty | CellContent::Boolean(_) | CellContent::DateTime(_) | CellContent::Error(_) => {
            false
        }
    }
}
