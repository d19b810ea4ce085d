//! Workbooks of the OpenDocument format, in their container or as one XML file.
//!
//! The workbook is one XML text; it is walked through once to survey it and again for each sheet that is streamed, so
//! that nothing but a row at a time is held. Cell formats are not read, save how dates, times, percentages and words around
//! numbers are shown.

mod looks;
mod not_carried;
mod styles;
mod survey;
#[cfg(test)]
mod tests;
mod text;
mod value;
mod walk;
mod words;

use std::fs::File;
use std::ops::ControlFlow;
use std::path::{Path, PathBuf};

use quick_xml::events::Event;

use super::{Opened, Source, Visit};
use crate::fault::{FileFault, FileKind};
use crate::workbook::content::{Cell, Row};
use crate::workbook::package::{Found as Part, Limits, Package, read_flat_xml};
use crate::workbook::survey::SheetSurvey;
use looks::Looks;
use survey::Surveyor;
use walk::{Found, StoredRow, Walk, Wanted};

/// Where the sheets and their cells stand.
const CONTENT: &str = "content.xml";

/// A file of this kind, opened.
pub(super) struct Book {
    xml: Xml,
    looks: Looks,
}

/// Where the XML of the workbook comes from.
enum Xml {
    Packed(Box<Package>),
    Flat { path: PathBuf, file: File, limits: Limits },
}

/// Opens and surveys a workbook in its container.
pub(super) fn open(path: &Path, mut package: Package) -> Result<Opened, FileFault> {
    refuse_encrypted(&mut package)?;
    if !package.has(CONTENT) {
        return Err(package.damaged(format!("its part `{CONTENT}` is missing")));
    }
    package.allow_sheets();
    let parts = not_carried::parts(package.part_names());
    survey_book(path, Xml::Packed(Box::new(package)), parts)
}

/// Opens and surveys a workbook written as one XML file.
pub(super) fn open_flat(path: &Path, file: File, limits: Limits) -> Result<Opened, FileFault> {
    survey_book(path, Xml::Flat { path: path.to_path_buf(), file, limits }, Vec::new())
}

fn survey_book(path: &Path, mut xml: Xml, parts: Vec<String>) -> Result<Opened, FileFault> {
    let shown = path.display().to_string();
    let mut surveyor = Surveyor::new();
    xml.read(|event| {
        surveyor.visit(event).map_err(|fault| FileFault::Sheet { path: shown.clone(), fault })?;
        Ok(ControlFlow::Continue(()))
    })?;
    let damaged = |what: &str| FileFault::Damaged { path: shown.clone(), what: what.to_owned() };
    let Some((sheets, book, looks)) = surveyor.into_sheets() else {
        return Err(FileFault::AnotherKind { path: shown, found: FileKind::Document });
    };
    if sheets.is_empty() {
        return Err(damaged("it has no sheet"));
    }
    let mut names = std::collections::BTreeSet::new();
    for sheet in &sheets {
        if !names.insert(sheet.name.to_lowercase()) {
            return Err(damaged(&format!("it has two sheets named `{}`", sheet.name)));
        }
    }
    let not_carried = not_carried::sentences(parts, &book, &sheets);
    let appearances = looks.appearances();
    Ok(Opened { source: Source::Ods(Book { xml, looks }), sheets, appearances, not_carried })
}

impl Book {
    /// Hands every row that holds anything to `visit`; what went wrong, in words.
    pub(super) fn stream(
        &mut self,
        sheet: usize,
        survey: &SheetSurvey,
        visit: &mut Visit<'_>,
    ) -> Result<(), String> {
        if survey.used_columns == 0 {
            return Ok(());
        }
        let mut walk = Walk::new(Wanted::Only(sheet), self.looks.clone());
        let outcome = self.xml.read(|event| {
            let found = walk.visit(event).map_err(|fault| FileFault::Sheet { path: String::new(), fault })?;
            Ok(match found {
                Some(Found::Row(row)) => hand_over(row, visit),
                Some(Found::End(_)) => ControlFlow::Break(()),
                Some(Found::Sheet { .. } | Found::Columns { .. }) | None => ControlFlow::Continue(()),
            })
        });
        outcome.map_err(|fault| match fault {
            FileFault::Sheet { fault, .. } => fault.to_string(),
            other => other.to_string(),
        })
    }
}

/// Hands a stored row over as often as it is there.
fn hand_over(row: StoredRow, visit: &mut Visit<'_>) -> ControlFlow<()> {
    let mut cells = Vec::with_capacity(row.cells.len());
    for stored in row.cells {
        for column in (stored.column..).take(usize::from(stored.repeated)) {
            cells.push(Cell {
                column,
                content: stored.content.clone(),
                style: stored.look,
                formula: stored.formula,
            });
        }
    }
    for index in (row.index..).take(usize::try_from(row.repeated).unwrap_or(1)) {
        visit(Row { index, cells: cells.clone() })?;
    }
    ControlFlow::Continue(())
}

impl Xml {
    /// Reads from the beginning until `visit` has enough.
    fn read(
        &mut self,
        mut visit: impl FnMut(&Event<'_>) -> Result<ControlFlow<()>, FileFault>,
    ) -> Result<(), FileFault> {
        let mut enough = false;
        let on_event = |event: &Event<'_>| match visit(event)? {
            ControlFlow::Continue(()) => Ok(()),
            ControlFlow::Break(()) => {
                enough = true;
                // Stops the reading; it is dropped below.
                Err(FileFault::Missing { path: String::new() })
            }
        };
        let outcome = match self {
            Self::Packed(package) => {
                package.read_again();
                package.read_xml(CONTENT, on_event).map(|found| debug_assert_eq!(found, Part::Yes))
            }
            Self::Flat { path, file, limits } => read_flat_xml(path, file, *limits, on_event),
        };
        if enough { Ok(()) } else { outcome }
    }
}

/// A workbook protected by a password lists its parts as encrypted.
fn refuse_encrypted(package: &mut Package) -> Result<(), FileFault> {
    let mut encrypted = package.has("encrypted-package");
    // Old programs declare a document type in this list, which is then not read; the content will show what it is.
    let _unreadable = package.read_xml("META-INF/manifest.xml", |event| {
        if let Event::Start(element) = event {
            encrypted |= element.local_name().as_ref() == "encryption-data";
        }
        Ok(())
    });
    if encrypted {
        return Err(FileFault::AnotherKind { path: package.path.clone(), found: FileKind::Encrypted });
    }
    Ok(())
}
