//! Faults of single cells and columns. A row with faults is still screened with what remains.

use std::fmt;

use crate::workbook::CellRef;

/// A cell that could not be read as what its column promises.
#[derive(Debug, Clone, PartialEq, Eq)]
pub struct CellFault {
    /// Where it stands.
    pub cell: CellRef,
    /// The text as found.
    pub found: String,
    /// What is wrong with it.
    pub kind: CellFaultKind,
}

/// What can be wrong with a cell.
#[derive(Debug, Clone, PartialEq, Eq)]
pub enum CellFaultKind {
    /// Not a value of the field at all.
    NotA {
        /// The field's title, for example `half-life in soil`.
        what: &'static str,
        /// What could stand there, for example `40 d`.
        example: &'static str,
    },
}

impl fmt::Display for CellFault {
    fn fmt(&self, formatter: &mut fmt::Formatter<'_>) -> fmt::Result {
        write!(formatter, "{}: `{}` ", self.cell, self.found)?;
        match &self.kind {
            CellFaultKind::NotA { what, example } => {
                write!(formatter, "is not a {what}; write, for example, `{example}`")
            }
        }
    }
}
