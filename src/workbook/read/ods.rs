//! Workbooks of the OpenDocument format.

use std::path::Path;

use super::{Opened, Visit};
use crate::fault::{FileFault, FileKind};
use crate::workbook::package::Package;
use crate::workbook::survey::SheetSurvey;

/// A file of this kind, opened.
pub(super) struct Book;

/// Opens and surveys the file.
pub(super) fn open(path: &Path, _package: Package) -> Result<Opened, FileFault> {
    Err(FileFault::AnotherKind { path: path.display().to_string(), found: FileKind::Ods })
}

impl Book {
    /// Hands every row that holds anything to `visit`; what went wrong, in words.
    pub(super) fn stream(
        &mut self,
        _sheet: usize,
        _survey: &SheetSurvey,
        visit: &mut Visit<'_>,
    ) -> Result<(), String> {
        let _ = visit;
        Ok(())
    }
}
