//! From the cells of a row to a [`Substance`].
//!
//! What a cell says of itself counts first, then the columns that speak of it (method, guideline, temperature,
//! reliability), then its header. Whatever cannot be read becomes a fault; the rest of the row stands.

mod cell;
mod companions;
mod degradability;
mod draft;
mod identity;
mod inherent;
mod kinds;
mod pattern;
mod remark;
mod statements;
mod totals;

use std::sync::Arc;

pub(crate) use remark::Said;

use crate::columns::{Column, Recognised};
use crate::fault::{CellFault, CellFaultKind};
use crate::substance::{Basis, Field, Property, Substance};
use crate::workbook::{CellRef, Row};
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
}

impl RowReader {
    /// A reader for the rows of a sheet whose columns were recognised.
    pub fn new(sheet: Arc<str>, columns: &Recognised, unstated: UnstatedBasis) -> Self {
        let mut columns = columns.columns.clone();
        columns.sort_by_key(|column| column.field != Field::Property(Property::MolarMass));
        Self { sheet, columns, unstated }
    }

    /// The cell that says that the row holds a total and no substance, as a fault; `None` for a row of a substance.
    pub fn totals_row(&self, row: &Row) -> Option<CellFault> {
        let (column, found) = totals::totals_label(&self.columns, row)?;
        let cell = CellRef { sheet: Arc::clone(&self.sheet), row: row.index, column };
        Some(CellFault { cell, found, kind: CellFaultKind::TotalsRow })
    }

    /// What the row says of its substance.
    pub fn read(&self, row: &Row) -> Substance {
        let mut draft = Draft::new(Arc::clone(&self.sheet), row.index);
        for column in &self.columns {
            if let Some(cell) = row.cell(column.index) {
                draft.take(column, cell);
            }
        }
        draft.finish(self.unstated)
    }
}
