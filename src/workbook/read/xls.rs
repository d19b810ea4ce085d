//! Workbooks of the binary format before 2007.

use std::path::Path;

use super::{Opened, Visit};
use crate::fault::{FileFault, FileKind};
use crate::workbook::package::Limits;

/// A file of this kind, opened.
pub(super) struct Book;

/// Opens and surveys the file.
pub(super) fn open(path: &Path, _file: std::fs::File, _limits: Limits) -> Result<Opened, FileFault> {
    Err(FileFault::AnotherKind { path: path.display().to_string(), found: FileKind::Xls })
}

impl Book {
    /// Hands every row that holds anything to `visit`; what went wrong, in words.
    pub(super) fn stream(&mut self, _sheet: usize, visit: &mut Visit<'_>) -> Result<(), String> {
        let _ = visit;
        Ok(())
    }
}
