//! From the cells of a row to a [`Substance`].
//!
//! What a cell says of itself counts first, then the columns that speak of it (method, guideline, temperature,
//! reliability), then its header. Whatever cannot be read becomes a fault; the rest of the row stands.

mod against;
mod beside;
mod cell;
mod companions;
mod degradability;
mod doubt;
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
mod thousands;
mod totals;
mod units;

use std::collections::BTreeMap;
use std::sync::Arc;

pub(crate) use degradability::names_ready_test;
pub(crate) use remark::Said;

use crate::columns::{Column, Recognised, Separator};
use crate::fault::CellFault;
use crate::quantity::DecimalStyle;
use crate::substance::{Basis, Field, Property, Substance};
use crate::workbook::{Cell, CellContent, CellRef, NumberFormat, Row, ShownNumber, StyleId, WideMerges};
use draft::Draft;
use thousands::Thousands;

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
    formats: BTreeMap<StyleId, NumberFormat>,
    merges: WideMerges,
}

impl RowReader {
    /// A reader for the rows of a sheet whose columns were recognised.
    pub fn new(sheet: Arc<str>, columns: &Recognised, unstated: UnstatedBasis) -> Self {
        let mut columns = columns.columns.clone();
        columns.sort_by_key(|column| column.field != Field::Property(Property::MolarMass));
        Self { sheet, columns, unstated, formats: BTreeMap::new(), merges: WideMerges::default() }
    }

    /// The same reader, which knows the cell formats that show more of a number than its digits: 0.12 as `12 %`, 4 as
    /// `4 weeks`.
    #[must_use]
    pub fn with_number_formats(mut self, formats: impl IntoIterator<Item = (StyleId, NumberFormat)>) -> Self {
        self.formats = formats.into_iter().collect();
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
                match self.as_shown(cell) {
                    Shown::AsStored => take(&mut draft, column, cell, row),
                    Shown::As(content) => {
                        let mut column = column.clone();
                        // Whatever the column writes, the number has a decimal point.
                        if matches!(cell.content, CellContent::Number(_)) {
                            column.decimal = DecimalStyle::Point;
                            column.separator = Separator::Shown;
                        }
                        take(&mut draft, &column, &Cell { content, ..cell.clone() }, row);
                    }
                    Shown::Scaled(shown) => draft.take_scaled(column, cell, shown),
                }
            }
        }
        draft.finish(self.unstated)
    }

    /// The cell as its number format shows it.
    fn as_shown(&self, cell: &Cell) -> Shown {
        let Some(format) = cell.style.and_then(|style| self.formats.get(&style)) else {
            return Shown::AsStored;
        };
        match &cell.content {
            CellContent::Number(number) => match format.show(*number) {
                ShownNumber::AsItIs => Shown::AsStored,
                ShownNumber::Text(text) => Shown::As(CellContent::Text(text)),
                ShownNumber::Nothing => Shown::As(CellContent::Text(String::new())),
                ShownNumber::Scaled(shown) => Shown::Scaled(shown),
            },
            CellContent::Text(text) => match format.show_text(text) {
                Some(text) => Shown::As(CellContent::Text(text)),
                None => Shown::AsStored,
            },
            CellContent::Empty
            | CellContent::Boolean(_)
            | CellContent::DateTime(_)
            | CellContent::Error(_) => Shown::AsStored,
        }
    }
}

/// Takes a cell with its unit and sign, where other columns hold them, unless its separators may be for decimals or for
/// thousands.
fn take(draft: &mut Draft, column: &Column, cell: &Cell, row: &Row) {
    let completed = match beside::complete(column, &cell.content, row) {
        Ok(completed) => completed,
        Err(kind) => return draft.refuse(column, cell, kind),
    };
    let with_content;
    let (column, cell) = match &completed {
        None => (column, cell),
        Some((column, content)) => {
            with_content = Cell { content: content.clone(), ..cell.clone() };
            (column, &with_content)
        }
    };
    match thousands::of(column, &cell.content) {
        Thousands::AsTheColumn => draft.take(column, cell),
        Thousands::DecimalsOnly(decimal) => draft.take(&Column { decimal, ..column.clone() }, cell),
        Thousands::Doubtful(kind) => draft.refuse(column, cell, kind),
    }
}

/// What a cell shows beside what it stores.
enum Shown {
    /// The same.
    AsStored,
    /// Something else.
    As(CellContent),
    /// Its number in thousands, without a word that says so.
    Scaled(String),
}
