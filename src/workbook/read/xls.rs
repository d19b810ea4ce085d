//! Workbooks of the binary format from 1993 to 2003: the stream of records in a compound file, surveyed once and then read
//! cell by cell. Formulas are not read, only their results.

mod cells;
mod globals;
mod looks;
mod records;
mod sheet;
#[cfg(test)]
mod tests;
mod texts;

use std::fs::File;
use std::io::Read;
use std::path::Path;

use self::cells::{Ordered, Unreadable};
use self::globals::{Globals, Refused, SheetEntry, SheetKind};
use self::sheet::{Purpose, survey_sheet};
use self::texts::{Alphabet, Version};
use super::binary::rows::{Formats, Rows};
use super::{Opened, Source, Visit};
use crate::fault::{FileFault, FileKind};
use crate::workbook::appearance::Appearance;
use crate::workbook::compound::{Compound, MAGIC};
use crate::workbook::contents::Contents;
use crate::workbook::not_carried::parts_not_carried;
use crate::workbook::package::Limits;
use crate::workbook::survey::SheetSurvey;

/// Of what may be held in memory, the part the records may take: what is made of them takes up to four times as much.
const SHARE_OF_RECORDS: u64 = 4;

/// A workbook, opened.
pub(super) struct Book {
    stream: Vec<u8>,
    globals: Globals,
    formats: Formats,
    /// The cells of each worksheet and the number of its used columns.
    sheets: Vec<(Ordered, u16)>,
}

/// Opens and surveys a workbook.
pub(super) fn open(path: &Path, file: File, limits: Limits) -> Result<Opened, FileFault> {
    let shown = path.display().to_string();
    let (stream, beside) = read_stream(&shown, file, limits)?;
    let globals = Globals::read(&stream).map_err(|refused| fault_of(&shown, refused))?;
    let mut found = Found { parts: parts_beside(&beside), ..Found::default() };
    for (entry, end) in with_ends(&globals, stream.len()) {
        if entry.kind == SheetKind::Other {
            found.contents.other_sheets.push(entry.name.clone());
            continue;
        }
        // A sheet ends where the next begins, at the latest; so none is read twice.
        let records = stream.get(..end).unwrap_or_default();
        found
            .add_sheet(&globals, records, entry)
            .map_err(|fault| FileFault::Sheet { path: shown.clone(), fault })?;
    }
    if found.surveys.is_empty() {
        return Err(FileFault::Damaged { path: shown, what: "it has no worksheet".to_owned() });
    }
    let appearances: Vec<Appearance> = globals
        .cell_formats
        .iter()
        .map(|format| Appearance::from(&format.style(&globals.formats, &globals.fonts, &globals.palette)))
        .collect();
    let kinds = globals.cell_formats.iter().map(|format| format.shown(&globals.formats)).collect();
    let formats = Formats::new(kinds, &appearances, globals.day_zero);
    let not_carried = found.not_carried(&globals);
    let Found { surveys, sheets, .. } = found;
    let book = Book { stream, globals, formats, sheets };
    Ok(Opened { source: Source::Xls(book), sheets: surveys, appearances, not_carried })
}

/// The stream of records, and the names of all streams; since 1997 it has another name, and a file may hold both versions.
fn read_stream(path: &str, mut file: File, limits: Limits) -> Result<(Vec<u8>, Vec<String>), FileFault> {
    let damaged = |error: std::io::Error| FileFault::Damaged {
        path: path.to_owned(),
        what: format!("the container around it cannot be read, perhaps the file was cut off: {error}"),
    };
    let length = file.metadata().map_err(damaged)?.len();
    let most = limits.held / SHARE_OF_RECORDS;
    if length > most {
        return Err(FileFault::TooLarge {
            path: path.to_owned(),
            part: "the workbook".to_owned(),
            found: format!("{} MB", length / 1_000_000),
            limit: format!("{} MB", most / 1_000_000),
        });
    }
    let mut beginning = [0; 8];
    file.read_exact(&mut beginning).map_err(damaged)?;
    if beginning != MAGIC {
        // Before 1993 the records stood in a file without a container.
        return Err(FileFault::AnotherKind { path: path.to_owned(), found: FileKind::Xls });
    }
    let mut compound = Compound::open(file).map_err(damaged)?;
    for name in ["Workbook", "Book"] {
        if let Some(stream) = compound.stream(name).map_err(damaged)? {
            return Ok((stream, compound.names().map_err(damaged)?));
        }
    }
    Err(FileFault::AnotherKind { path: path.to_owned(), found: FileKind::Unknown })
}

/// Macros and embedded files, which stand beside the records, by the names of the parts an xlsx keeps them in.
fn parts_beside(names: &[String]) -> Vec<&'static str> {
    names
        .iter()
        .filter_map(|name| match name.as_str() {
            "_VBA_PROJECT_CUR" => Some("xl/vbaproject.bin"),
            name if name.starts_with("MBD") => Some("xl/embeddings/"),
            _ => None,
        })
        .collect()
}

fn fault_of(path: &str, refused: Refused) -> FileFault {
    let path = path.to_owned();
    match refused {
        Refused::Encrypted => FileFault::AnotherKind { path, found: FileKind::Encrypted },
        Refused::TooOld => FileFault::AnotherKind { path, found: FileKind::Xls },
        Refused::Damaged(what) => FileFault::Damaged { path, what },
    }
}

/// The sheets in the order of their tabs, each with the place at which it has to have ended.
fn with_ends(globals: &Globals, length: usize) -> Vec<(&SheetEntry, usize)> {
    let mut begins: Vec<usize> = globals.sheets.iter().map(|entry| entry.begin).collect();
    begins.sort_unstable();
    globals
        .sheets
        .iter()
        .map(|entry| {
            let next = begins.partition_point(|begin| *begin <= entry.begin);
            (entry, begins.get(next).copied().unwrap_or(length).min(length))
        })
        .collect()
}

/// What the sheets were found to hold.
#[derive(Default)]
struct Found {
    surveys: Vec<SheetSurvey>,
    sheets: Vec<(Ordered, u16)>,
    contents: Contents,
    parts: Vec<&'static str>,
}

impl Found {
    fn add_sheet(
        &mut self,
        globals: &Globals,
        records: &[u8],
        entry: &SheetEntry,
    ) -> Result<(), crate::fault::SheetFault> {
        let sheet = survey_sheet(globals, records, entry.begin, &entry.name, entry.visibility)?;
        self.parts.extend(sheet.parts);
        self.contents.mixed_texts += sheet.mixed_texts;
        match sheet.purpose {
            Purpose::Cells => {
                self.sheets.push((sheet.cells, sheet.survey.used_columns));
                self.surveys.push(sheet.survey);
            }
            Purpose::Dialog => self.contents.other_sheets.push(entry.name.clone()),
        }
        Ok(())
    }

    fn not_carried(&mut self, globals: &Globals) -> Vec<String> {
        self.contents.defined_names = globals.defined_names;
        self.contents.mixed_texts += globals.mixed_texts;
        self.parts.extend(std::iter::repeat_n("xl/externallinks/externallink", globals.links));
        let mut sentences = parts_not_carried(self.parts.iter().copied(), &self.contents);
        if globals.version == Version::Biff5 && matches!(globals.alphabet, Alphabet::NotSaid) {
            sentences.push(
                "Workbook: it does not say in which alphabet its texts are written; they are read as Western \
                 European ones."
                    .to_owned(),
            );
        }
        sentences.extend(self.surveys.iter().flat_map(SheetSurvey::not_carried));
        sentences
    }
}

impl Book {
    /// Hands every row that holds anything to `visit`; what went wrong, in words.
    pub(super) fn stream(&mut self, sheet: usize, visit: &mut Visit<'_>) -> Result<(), String> {
        let Some((cells, used_columns)) = self.sheets.get(sheet) else {
            return Ok(());
        };
        let mut rows = Rows::new(&self.formats, *used_columns, visit);
        for cell in cells.cells(&self.globals, &self.stream) {
            let cell = cell.map_err(|Unreadable { what, .. }| what)?;
            if rows.take(cell).is_break() {
                return Ok(());
            }
        }
        rows.finish();
        Ok(())
    }
}
