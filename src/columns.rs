//! Which column holds which field, and why.
//!
//! Found from `rules/columns.toml` by field words plus compartment and qualifier words. It reads headers and the first
//! rows of a sheet only and changes no cell.

use crate::quantity::{DecimalStyle, Unit};
use crate::substance::{Basis, Conditions, Field, Property};

/// A column whose meaning was recognised.
#[derive(Debug, Clone, PartialEq)]
pub struct Column {
    /// The column, counted from 0.
    pub index: u16,
    /// The header as written, of both rows where there are two.
    pub header: String,
    /// What it holds.
    pub field: Field,
    /// The unit the header names.
    pub unit: Option<Unit>,
    /// The basis the header names (`measured`, `calculated`).
    pub basis: Option<Basis>,
    /// Conditions the header names.
    pub conditions: Conditions,
    /// The property of which a column of reliability, guidelines or temperatures speaks, where its header or its place
    /// tells.
    pub about: Option<Property>,
    /// Decimal point or comma, from the header's column or the sheet.
    pub decimal: DecimalStyle,
    /// Why it was taken for this field, in words.
    pub reason: String,
}

/// The header of a sheet and what its columns hold.
#[derive(Debug, Clone, PartialEq)]
pub struct Recognised {
    /// The row of the header, counted from 0: the row our own headers go in (the lower one of two).
    pub header_row: u32,
    /// The first row of data.
    pub first_data_row: u32,
    /// The recognised columns, in order.
    pub columns: Vec<Column>,
    /// The other columns with a header: index and header.
    pub unknown: Vec<(u16, String)>,
    /// Doubled and doubtful columns and what to do about them, in words.
    pub remarks: Vec<String>,
}

/// `--column 'Header=field'`.
#[derive(Debug, Clone, PartialEq, Eq)]
pub struct ColumnOverride {
    /// The header as written, compared after folding.
    pub header: String,
    /// The field; `None` leaves the column aside (`--column 'Header=ignore'`).
    pub field: Option<Field>,
}
