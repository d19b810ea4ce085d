//! Opens an inventory of any kind and streams its rows. It gives no cell a meaning.
//!
//! What a file is, its content says. Each kind has a module of its own that surveys it once and then streams it as often
//! as asked; past them nobody knows which kind it was.

mod binary;
mod ods;
#[cfg(test)]
mod tests;
mod text;
mod xls;
mod xlsb;
mod xlsx;

use std::fs::File;
use std::ops::ControlFlow;
use std::path::Path;

use sha2::{Digest, Sha256};

use crate::fault::{FileFault, FileKind, SheetFault};

use super::appearance::Appearance;
use super::content::{Row, StyleId};
use super::guard::{self, Container};
use super::number_format::NumberFormat;
use super::package::{Limits, Package};
use super::survey::SheetSurvey;

/// An inventory, surveyed and ready to be streamed, sheet by sheet.
pub struct Inventory {
    path: String,
    source: Source,
    sheets: Vec<SheetSurvey>,
    appearances: Vec<Appearance>,
    not_carried: Vec<String>,
    fingerprint: String,
}

/// What a module for one kind of file found when it opened and surveyed it.
struct Opened {
    source: Source,
    /// The worksheets in the order of their tabs.
    sheets: Vec<SheetSurvey>,
    /// The cell formats; format 0 is that of every cell without one.
    appearances: Vec<Appearance>,
    /// What an annotated copy will lack, in sentences.
    not_carried: Vec<String>,
}

/// The opened file.
enum Source {
    Xlsx(Box<xlsx::Book>),
    Xlsb(xlsb::Book),
    Xls(xls::Book),
    Ods(ods::Book),
    Text(text::Book),
}

/// Takes rows as they come; breaks off when it has enough.
type Visit<'visit> = dyn FnMut(Row) -> ControlFlow<()> + 'visit;

/// Opens and surveys an inventory.
///
/// # Errors
/// A [`FileFault`] if the file is no inventory, is damaged, or has cells that would be misread.
pub fn open_inventory(path: &Path) -> Result<Inventory, FileFault> {
    open_within(path, Limits::USUAL)
}

fn open_within(path: &Path, limits: Limits) -> Result<Inventory, FileFault> {
    let opened = match guard::open(path)? {
        Container::Zip(file) => {
            let mut package = Package::new(path, file, limits)?;
            match guard::kind_of_package(&mut package) {
                FileKind::Ods => ods::open(path, package)?,
                FileKind::Xlsb => xlsb::open(path, package)?,
                // Whether it is a workbook at all is for its own description of itself to say.
                _ => xlsx::open(path, package)?,
            }
        }
        Container::Compound(file) => xls::open(path, file, limits)?,
        Container::Text(file) => text::open(path, &file)?,
        Container::FlatOds(file) => ods::open_flat(path, file, limits)?,
    };
    let Opened { source, sheets, appearances, not_carried } = opened;
    let fingerprint = fingerprint_of(path)?;
    Ok(Inventory { path: path.display().to_string(), source, sheets, appearances, not_carried, fingerprint })
}

impl Inventory {
    /// Whether the file says nothing of how wide the columns of a sheet are, as text files do not, and sheets of an
    /// OpenDocument file that another program than a spreadsheet's wrote. A workbook of another kind has a usual width.
    pub fn gives_no_widths(&self, sheet: usize) -> bool {
        match self.source {
            Source::Text(_) => true,
            Source::Ods(_) => self
                .sheets
                .get(sheet)
                .is_some_and(|survey| survey.column_widths.iter().all(|layout| layout.width.is_none())),
            Source::Xlsx(_) | Source::Xlsb(_) | Source::Xls(_) => false,
        }
    }

    /// The path as given.
    pub fn path(&self) -> &str {
        &self.path
    }

    /// The worksheets in the order of their tabs.
    pub fn sheets(&self) -> &[SheetSurvey] {
        &self.sheets
    }

    /// The cell formats; a cell's [`StyleId`] is an index into them.
    pub fn appearances(&self) -> &[Appearance] {
        &self.appearances
    }

    /// The cell formats that show more of a number than its digits.
    pub fn number_formats(&self) -> impl Iterator<Item = (StyleId, NumberFormat)> {
        let shown = (0..).map(StyleId).zip(&self.appearances);
        shown.filter_map(|(style, look)| Some((style, look.number_format()?.clone())))
    }

    /// How the file was read where it does not say so itself, in sentences: its encoding and separator.
    pub fn how_read(&self) -> &[String] {
        match &self.source {
            Source::Text(book) => book.how_read(),
            Source::Xlsx(_) | Source::Xlsb(_) | Source::Xls(_) | Source::Ods(_) => &[],
        }
    }

    /// How many fields one of the first rows has where the file's lines are cut into fields, be they empty; none where
    /// cells know their column.
    pub fn fields_in_row(&self, row: u32) -> Option<usize> {
        match &self.source {
            Source::Text(book) => book.fields_in_row(row),
            Source::Xlsx(_) | Source::Xlsb(_) | Source::Xls(_) | Source::Ods(_) => None,
        }
    }

    /// What an annotated copy of the inventory will lack, in sentences.
    pub fn not_carried(&self) -> &[String] {
        &self.not_carried
    }

    /// The SHA-256 of the file, in hexadecimal.
    pub fn fingerprint(&self) -> &str {
        &self.fingerprint
    }

    /// The first rows of a sheet that hold anything.
    pub fn first_rows(&mut self, sheet: usize, count: usize) -> Result<Vec<Row>, FileFault> {
        let mut rows = Vec::new();
        if count == 0 {
            return Ok(rows);
        }
        self.stream_rows(sheet, |row| {
            rows.push(row);
            if rows.len() < count { ControlFlow::Continue(()) } else { ControlFlow::Break(()) }
        })?;
        Ok(rows)
    }

    /// Hands every row that holds anything to `visit`, from the top, until it breaks off.
    ///
    /// Cells that are only formatted are given up to the last used column; a cell without content and format is not.
    pub fn stream_rows(
        &mut self,
        sheet: usize,
        mut visit: impl FnMut(Row) -> ControlFlow<()>,
    ) -> Result<(), FileFault> {
        let Some(survey) = self.sheets.get(sheet) else {
            return Ok(());
        };
        let outcome = match &mut self.source {
            Source::Xlsx(book) => book.stream(survey, &self.appearances, &mut visit),
            Source::Xlsb(book) => book.stream(sheet, survey, &mut visit),
            Source::Xls(book) => book.stream(sheet, &mut visit),
            Source::Ods(book) => book.stream(sheet, survey, &mut visit),
            Source::Text(book) => book.stream(&mut visit),
        };
        outcome.map_err(|reason| FileFault::Sheet {
            path: self.path.clone(),
            fault: SheetFault::Whole {
                sheet: survey.name.to_string(),
                what: format!("could not be read to its end: {reason}"),
            },
        })
    }
}

/// The SHA-256 of a text, in hexadecimal.
pub fn fingerprint_of_text(text: &str) -> String {
    format!("{:x}", Sha256::digest(text.as_bytes()))
}

fn fingerprint_of(path: &Path) -> Result<String, FileFault> {
    let unreadable = |error: std::io::Error| FileFault::Unreadable {
        path: path.display().to_string(),
        reason: error.to_string(),
    };
    let mut digest = Sha256::new();
    let mut file = File::open(path).map_err(unreadable)?;
    std::io::copy(&mut file, &mut digest).map_err(unreadable)?;
    Ok(format!("{:x}", digest.finalize()))
}
