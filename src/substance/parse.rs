//! From the cells of a row to a [`Substance`].
//!
//! What a cell says of itself counts first, then the columns that speak of it (method, guideline, temperature,
//! reliability), then its header. Whatever cannot be read becomes a fault; the rest of the row stands.

mod cell;
mod companions;
mod degradability;
mod draft;
mod expected;
mod identity;
mod inherent;
mod kinds;
mod no_substance;
mod notes;
mod pattern;
mod remark;
mod statements;
mod totals;

use std::collections::BTreeSet;
use std::sync::Arc;

pub(crate) use remark::Said;

use crate::columns::{Column, Recognised};
use crate::fault::CellFault;
use crate::substance::{Basis, Field, Property, Substance};
use crate::workbook::{Cell, CellContent, CellRef, Row, StyleId, WideMerges};
use draft::Draft;

/// What a value without a word on how it was obtained counts as (`--unstated`).
#[derive(Debug, Clone, Copy, PartialEq, Eq, Default)]
pub enum UnstatedBasis {
    /// As measured.
    Measured,
    /// As a rank of its own between measured and calculated.
    #[default]
    Unstated,
    /// As calculated.
    Calculated,
}

impl UnstatedBasis {
    fn basis(self) -> Basis {
        match self {
            Self::Measured => Basis::Measured,
            Self::Unstated => Basis::Unstated,
            Self::Calculated => Basis::Calculated,
        }
    }
}

/// Reads rows of one sheet.
#[derive(Debug, Clone)]
pub struct RowReader {
    sheet: Arc<str>,
    /// Molar mass first, because molar concentrations need it.
    columns: Vec<Column>,
    unstated: UnstatedBasis,
    percentages: BTreeSet<StyleId>,
    merges: WideMerges,
}

impl RowReader {
    /// A reader for the rows of a sheet whose columns were recognised.
    pub fn new(sheet: Arc<str>, columns: &Recognised, unstated: UnstatedBasis) -> Self {
        let mut columns = columns.columns.clone();
        columns.sort_by_key(|column| column.field != Field::Property(Property::MolarMass));
        let (percentages, merges) = (BTreeSet::new(), WideMerges::default());
        Self { sheet, columns, unstated, percentages, merges }
    }

    /// The same reader, which knows the cell formats that show numbers as percentages: 0.12 as `12 %`.
    #[must_use]
    pub fn with_percentages(mut self, formats: impl IntoIterator<Item = StyleId>) -> Self {
        self.percentages = formats.into_iter().collect();
        self
    }

    /// The same reader, which knows the merged ranges of the sheet.
    #[must_use]
    pub fn with_merges(mut self, merges: WideMerges) -> Self {
        self.merges = merges;
        self
    }

    /// The cell that says that the row holds no substance but a total, a heading, a note or the number of a page, as a
    /// fault; `None` for a row of a substance.
    pub fn no_substance(&self, row: &Row) -> Option<CellFault> {
        let (column, found, kind) = no_substance::label(&self.columns, row, &self.merges)?;
        let cell = CellRef { sheet: Arc::clone(&self.sheet), row: row.index, column };
        Some(CellFault { cell, found, kind })
    }

    /// What the row says of its substance.
    pub fn read(&self, row: &Row) -> Substance {
        let mut draft = Draft::new(Arc::clone(&self.sheet), row.index);
        for column in &self.columns {
            if let Some(cell) = row.cell(column.index) {
                match self.as_percentage(cell) {
                    Some(shown) => draft.take(column, &shown),
                    None => draft.take(column, cell),
                }
            }
        }
        draft.finish(self.unstated)
    }

    /// A number that the sheet shows as a percentage, with what it shows as its text.
    fn as_percentage(&self, cell: &Cell) -> Option<Cell> {
        let shown = cell.style.is_some_and(|style| self.percentages.contains(&style));
        match &cell.content {
            CellContent::Number(number) if shown => {
                Some(Cell { content: CellContent::Text(percentage_of(*number)), ..cell.clone() })
            }
            _ => None,
        }
    }
}

/// A hundred times a number with its sign, every digit kept: 0.07 is `7 %`.
fn percentage_of(number: f64) -> String {
    let scientific = format!("{number:e}");
    let moved = scientific.split_once('e').and_then(|(digits, power)| {
        let power = power.parse::<i32>().ok()? + 2;
        format!("{digits}e{power}").parse::<f64>().ok()
    });
    let text = moved.unwrap_or(number * 100.0).to_string();
    // Three decimals could be read as thousands.
    let three = text.rsplit_once('.').is_some_and(|(_, decimals)| decimals.len() == 3);
    if three { format!("{text}0 %") } else { format!("{text} %") }
}

#[cfg(test)]
mod tests {
    use super::percentage_of;

    #[test]
    fn a_number_shown_as_a_percentage_keeps_its_digits() {
        for (number, text) in [
            (0.12, "12 %"),
            (0.07, "7 %"),
            (0.001, "0.1 %"),
            (1.0, "100 %"),
            (0.0, "0 %"),
            (-0.05, "-5 %"),
            (0.123_45, "12.3450 %"),
            (1e-7, "0.00001 %"),
        ] {
            assert_eq!(percentage_of(number), text);
        }
    }
}
