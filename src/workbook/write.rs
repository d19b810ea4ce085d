//! Writes the annotated workbook, row by row and in little memory. It decides nothing about what is written.

mod cells;
mod height;
mod layout;
mod names;
mod output;
#[cfg(test)]
mod tests;

use std::collections::BTreeMap;
use std::path::Path;

use rust_xlsxwriter::{DocProperties, ExcelDateTime, Format, Workbook, Worksheet, XlsxError};

use crate::fault::FileFault;
use crate::quantity::Date;

use super::appearance::Appearance;
use super::caught::without_panic;
use super::look::Looks;
use super::place::LAST_ROW;
use super::survey::Visibility;
pub use cells::{Target, Value};
use height::USUAL_WIDTH;
pub use names::free_sheet_name;
use output::Output;

/// Compression: against the usual 6, half the time for 15 % more size (measured on an inventory).
const COMPRESSION: u8 = 3;

/// Whether an existing output may be replaced.
#[derive(Debug, Clone, Copy, PartialEq, Eq)]
pub enum Overwrite {
    /// It may not.
    Refuse,
    /// It may, once the new one is complete.
    Replace,
}

/// A sheet of the workbook being written.
#[derive(Debug, Clone, Copy, PartialEq, Eq)]
pub struct SheetId(usize);

/// The annotated workbook while it is written.
///
/// Rows of a sheet must come in order; sheets may be written in turns. Nothing appears at the target before
/// [`AnnotatedWorkbook::finish`] has succeeded, and nothing is left behind if it is never called.
pub struct AnnotatedWorkbook {
    book: Workbook,
    output: Output,
    appearances: Vec<Appearance>,
    looks: Looks,
    sheets: Vec<SheetState>,
    broken: Option<String>,
}

struct SheetState {
    name: String,
    visibility: Visibility,
    widths: BTreeMap<u16, f64>,
    row: u32,
    /// How many lines the wrapped texts of the row take that were written so far.
    lines: u32,
    links: u32,
}

impl SheetState {
    fn width(&self, column: u16) -> f64 {
        self.widths.get(&column).copied().unwrap_or(USUAL_WIDTH)
    }
}

impl AnnotatedWorkbook {
    /// Begins a workbook for `target`.
    ///
    /// `inputs` are the files the run reads, which are never written over. `date` is the creation date in the file, so
    /// that the same content gives the same bytes.
    ///
    /// # Errors
    /// A [`FileFault`] if the target may not or cannot be written.
    pub fn create(
        target: &Path,
        inputs: &[&Path],
        overwrite: Overwrite,
        date: Date,
        appearances: &[Appearance],
    ) -> Result<Self, FileFault> {
        let output = Output::check(target, inputs, overwrite)?;
        let mut book = Workbook::new();
        // Rows wait in temporary files; beside the output there is as much space as the output needs.
        book.set_tempdir(output.folder()).map_err(|error| FileFault::OutputFolderClosed {
            folder: output.folder().display().to_string(),
            reason: reason_of(&error),
        })?;
        book.set_zip_compression_level(COMPRESSION);
        book.set_properties(&properties(date).map_err(|error| output.failed(&error))?);
        Ok(Self {
            book,
            output,
            appearances: appearances.to_vec(),
            looks: Looks::new(),
            sheets: Vec::new(),
            broken: None,
        })
    }

    /// Adds a sheet after the others; if its name is taken it gets another, see [`free_sheet_name`].
    pub fn add_sheet(&mut self, name: &str, visibility: Visibility) -> Result<SheetId, FileFault> {
        let name = free_sheet_name(name, self.sheets.iter().map(|sheet| sheet.name.as_str()));
        self.guarded(|this| {
            let sheet = this.book.add_worksheet_with_constant_memory()?;
            sheet.set_name(&name)?;
            match visibility {
                Visibility::Visible => {}
                Visibility::Hidden => {
                    sheet.set_hidden(true);
                }
                Visibility::VeryHidden => {
                    sheet.set_very_hidden(true);
                }
            }
            this.sheets.push(SheetState {
                name,
                visibility,
                widths: BTreeMap::new(),
                row: 0,
                lines: 1,
                links: 0,
            });
            Ok(SheetId(this.sheets.len() - 1))
        })
    }

    /// The name a sheet got.
    pub fn sheet_name(&self, sheet: SheetId) -> &str {
        self.sheets.get(sheet.0).map_or("", |sheet| sheet.name.as_str())
    }

    /// Completes the workbook and puts it at the target.
    ///
    /// # Errors
    /// A [`FileFault`]; then what stood at the target before still does, and no temporary file is left.
    pub fn finish(mut self) -> Result<(), FileFault> {
        if let Some(reason) = &self.broken {
            return Err(self.output.failed(&reason));
        }
        let shown = self.sheets.iter().position(|sheet| sheet.visibility == Visibility::Visible);
        let first = match shown {
            Some(shown) => SheetId(shown),
            // A workbook must show one sheet.
            None => self.add_sheet("Sheet", Visibility::Visible)?,
        };
        self.on_sheet(first, |sheet| {
            sheet.set_active(true);
            Ok(())
        })?;
        self.leave_last_rows()?;
        let Self { mut book, output, .. } = self;
        output.fill(|file| {
            without_panic(|| book.save_to_writer(file))
                .map_err(|reason| output.failed(&reason))?
                .map_err(|error| output.failed(&reason_of(&error)))
        })
    }

    /// At the end the writing library writes a last row that has a height twice, the second time empty, and spreadsheet
    /// programs then call the file damaged. A blank cell below makes it leave the row before the end.
    fn leave_last_rows(&mut self) -> Result<(), FileFault> {
        let last: Vec<(SheetId, u32)> = self
            .sheets
            .iter()
            .enumerate()
            .filter(|(_, state)| state.lines > 1 && state.row < LAST_ROW)
            .map(|(place, state)| (SheetId(place), state.row))
            .collect();
        for (sheet, row) in last {
            self.on_sheet(sheet, |sheet| {
                sheet.write_blank(row + 1, 0, &Format::new())?;
                Ok(())
            })?;
        }
        Ok(())
    }

    /// The writing library drops cells of rows it has left; that must never happen silently.
    fn advance(&mut self, sheet: SheetId, row: u32) -> Result<(), FileFault> {
        match self.sheets.get_mut(sheet.0) {
            Some(state) if row < state.row => {
                let reason = format!("row {} of sheet `{}` came too late", u64::from(row) + 1, state.name);
                self.broken = Some(reason.clone());
                Err(self.output.failed(&reason))
            }
            Some(state) => {
                if row > state.row {
                    state.row = row;
                    state.lines = 1;
                }
                Ok(())
            }
            None => Ok(()),
        }
    }

    fn on_sheet(
        &mut self,
        sheet: SheetId,
        work: impl FnOnce(&mut Worksheet) -> Result<(), XlsxError>,
    ) -> Result<(), FileFault> {
        self.guarded(|this| work(this.book.worksheet_from_index(sheet.0)?))
    }

    /// Runs the writing library; after it has failed nothing more is written.
    fn guarded<Outcome>(
        &mut self,
        work: impl FnOnce(&mut Self) -> Result<Outcome, XlsxError>,
    ) -> Result<Outcome, FileFault> {
        if let Some(reason) = &self.broken {
            return Err(self.output.failed(&reason));
        }
        let outcome =
            without_panic(|| work(self)).and_then(|outcome| outcome.map_err(|error| reason_of(&error)));
        outcome.map_err(|reason| {
            self.broken = Some(reason.clone());
            self.output.failed(&reason)
        })
    }
}

fn properties(date: Date) -> Result<DocProperties, XlsxError> {
    let (year, month, day) = date.parts();
    let created = ExcelDateTime::from_ymd(
        u16::try_from(year).unwrap_or(0),
        u8::try_from(month).unwrap_or(0),
        u8::try_from(day).unwrap_or(0),
    )?;
    Ok(DocProperties::new().set_creation_datetime(&created))
}

fn reason_of(error: &XlsxError) -> String {
    match error {
        XlsxError::IoError(error) | XlsxError::TempFileError(_, error) => error.to_string(),
        XlsxError::ZipError(error) => error.to_string(),
        other => other.to_string(),
    }
}
