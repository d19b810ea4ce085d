//! Which column holds which field, and why.
//!
//! Found from `rules/columns.toml` by field words plus compartment and qualifier words. It reads headers and the first
//! rows of a sheet only and changes no cell.

mod beside;
mod choice;
mod decimals;
mod doubled;
mod folding;
mod header;
mod header_cell;
mod header_row;
mod hints;
mod logarithms;
mod loose_unit;
mod lower_row;
mod misspelt;
mod overrides;
mod owners;
mod phrase;
mod reading;
mod second_header;
mod stack;
mod taken;
mod unread_unit;
mod words;

use std::collections::{BTreeMap, BTreeSet};

pub use beside::{Beside, sign_of};
pub use overrides::ColumnOverride;
pub use second_header::HeaderAgain;
use second_header::HeaderWatch;
pub(crate) use second_header::second_header_fault;
pub use words::{BUILT_IN_COLUMN_WORDS, ColumnWords};

use crate::quantity::{DecimalStyle, Dimension, Unit};
use crate::substance::{Basis, Conditions, Field, Property};
use crate::workbook::Row;

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
    /// Of a column on ready biodegradability, whether its header says that it is the ready one.
    pub readiness: Readiness,
    /// Whether anything shows that style.
    pub separator: Separator,
    /// The columns that hold the unit or the sign of its values.
    pub beside: Beside,
    /// Why it was taken for this field, in words.
    pub reason: String,
}

/// Whether a header says that the biodegradability below it is that of a ready test.
#[derive(Debug, Clone, Copy, PartialEq, Eq)]
pub enum Readiness {
    /// It does, or the user says so, or the column holds something else.
    Said,
    /// It speaks of biodegradability in general: a cell counts as ready only where it says so itself.
    NotSaid,
}

impl Column {
    /// What its numbers measure, where it holds numbers.
    pub fn dimension(&self) -> Option<Dimension> {
        choice::dimension_of(self.field)
    }
}

/// Whether the cells of a sheet show what a separator before exactly three digits is: in `2.500` it may be for decimals
/// or for thousands.
#[derive(Debug, Clone, Copy, PartialEq, Eq)]
pub enum Separator {
    /// Another cell of the column or the sheet shows it.
    Shown,
    /// No cell shows it.
    NotShown,
}

/// The header of a sheet and what its columns hold.
#[derive(Debug, Clone, PartialEq)]
pub struct Recognised {
    /// The first row of the header, counted from 0: above `header_row` where several rows were read together.
    pub header_top: u32,
    /// The row of the header, counted from 0: the row our own headers go in (the lowest of several).
    pub header_row: u32,
    /// The first row of data.
    pub first_data_row: u32,
    /// The recognised columns, in order.
    pub columns: Vec<Column>,
    /// The other columns with a header: index and header.
    pub unknown: Vec<(u16, String)>,
    /// Of some of these, why they are not taken or which field they nearly name, in words.
    pub not_taken: BTreeMap<u16, String>,
    /// Doubled and doubtful columns and what to do about them, in words.
    pub remarks: Vec<String>,
    /// The sheet's name.
    sheet: String,
    /// Every way in which the user may write a header.
    names: Vec<String>,
    /// Knows a header further down when it comes.
    watch: HeaderWatch,
}

impl Recognised {
    /// The headers of all columns, recognised or not.
    pub fn headers(&self) -> impl Iterator<Item = &str> {
        let known = self.columns.iter().map(|column| column.header.as_str());
        known.chain(self.unknown.iter().map(|(_, header)| header.as_str()))
    }

    /// Whether there is a column of which the user speaks.
    pub fn has_column_of(&self, told: &ColumnOverride) -> bool {
        let columns = self.columns.iter().map(|column| column.index);
        let mut columns = columns.chain(self.unknown.iter().map(|(index, _)| *index));
        let named =
            || self.names.iter().any(|name| told.is_for(name) || header_cell::is_for_name(told, name));
        told.is_for_sheet(&self.sheet) && (columns.any(|column| told.is_for_column(column)) || named())
    }
}

/// The header of a sheet and its columns; `None` if the sheet is no inventory.
///
/// A sheet is an inventory if a column holds a CAS number, EC number, SMILES or InChI key, or if one holds the row's
/// own number or a name and another one any other field. `first_rows` are the first rows of the sheet, at least some
/// dozens, so that the columns' decimal style can be seen.
pub fn recognise(
    sheet: &str,
    first_rows: &[Row],
    words: &ColumnWords,
    overrides: &[ColumnOverride],
) -> Option<Recognised> {
    let overrides: Vec<ColumnOverride> =
        overrides.iter().filter(|told| told.is_for_sheet(sheet)).cloned().collect();
    let found = header_row::find(first_rows, words, &overrides)?;
    let header_row = found.row;
    let told: BTreeSet<u16> = found
        .cells
        .iter()
        .filter(|cell| matches!(cell.meaning, header_cell::Meaning::Told(_)))
        .map(|cell| cell.column)
        .collect();
    let mut recognised = choice::choose(sheet, found, words);
    let data: Vec<&Row> = first_rows
        .iter()
        .filter(|row| row.index > header_row)
        .take_while(|row| recognised.header_again(row, words) != HeaderAgain::Other)
        .collect();
    owners::settle(sheet, &mut recognised, &data);
    decimals::set_styles(sheet, &mut recognised, &data);
    logarithms::leave_doubtful_aside(sheet, &mut recognised, &data, &told);
    Some(recognised)
}

fn one_line(text: &str) -> String {
    text.split_whitespace().collect::<Vec<_>>().join(" ")
}
