//! Opens an inventory and streams its rows. It gives no cell a meaning and never holds a whole sheet.

mod rows;
#[cfg(test)]
mod tests;

use std::fs::File;
use std::io::BufReader;
use std::ops::ControlFlow;
use std::path::Path;

use calamine::{Reader, Xlsx};
use sha2::{Digest, Sha256};

use crate::fault::{FileFault, SheetFault};

use super::appearance::Appearance;
use super::caught::without_panic;
use super::content::Row;
use super::contents::{Contents, read_contents};
use super::not_carried::parts_not_carried;
use super::package::{Limits, Package};
use super::survey::{SheetSurvey, survey_sheet};
use rows::{Rows, Styles};

/// An inventory, surveyed and ready to be streamed, sheet by sheet.
pub struct Inventory {
    path: String,
    book: Xlsx<BufReader<File>>,
    sheets: Vec<SheetSurvey>,
    appearances: Vec<Appearance>,
    not_carried: Vec<String>,
    fingerprint: String,
}

/// Opens and surveys an inventory.
///
/// # Errors
/// A [`FileFault`] if the file is no xlsx workbook, is damaged, or has cells that would be misread.
pub fn open_inventory(path: &Path) -> Result<Inventory, FileFault> {
    open_within(path, Limits::USUAL)
}

fn open_within(path: &Path, limits: Limits) -> Result<Inventory, FileFault> {
    let mut package = Package::open(path, limits)?;
    let contents = read_contents(&mut package)?;
    package.allow_sheets();
    let mut sheets = Vec::new();
    for entry in &contents.sheets {
        sheets.push(survey_sheet(&mut package, entry, contents.shared_texts)?);
    }
    let mut book = open_book(path)?;
    check_same_sheets(&book, &package, &contents)?;
    let appearances = read_appearances(&mut book, &package, &sheets)?;
    let mut not_carried = parts_not_carried(package.part_names(), &contents);
    not_carried.extend(sheets.iter().flat_map(SheetSurvey::not_carried));
    Ok(Inventory {
        path: path.display().to_string(),
        book,
        sheets,
        appearances,
        not_carried,
        fingerprint: fingerprint_of(path)?,
    })
}

impl Inventory {
    /// The path as given.
    pub fn path(&self) -> &str {
        &self.path
    }

    /// The worksheets in the order of their tabs.
    pub fn sheets(&self) -> &[SheetSurvey] {
        &self.sheets
    }

    /// The cell formats; a cell's [`StyleId`](super::StyleId) is an index into them.
    pub fn appearances(&self) -> &[Appearance] {
        &self.appearances
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
        let fault = |reason: String| FileFault::Sheet {
            path: self.path.clone(),
            fault: SheetFault::Whole {
                sheet: survey.name.to_string(),
                what: format!("could not be read to its end: {reason}"),
            },
        };
        let styles = Styles {
            plain: self.appearances.first().is_none_or(Appearance::is_plain),
            known: self.appearances.len(),
        };
        let counts_from_1904 = self.book.has_1904_epoch();
        let reader = without_panic(|| self.book.worksheet_cells_reader(&survey.name))
            .map_err(&fault)?
            .map_err(|error| fault(error.to_string()))?;
        let mut rows = Rows::new(reader, survey, styles, counts_from_1904);
        loop {
            match without_panic(|| rows.next_row()).map_err(&fault)?.map_err(&fault)? {
                Some(row) => {
                    if visit(row).is_break() {
                        return Ok(());
                    }
                }
                None => return Ok(()),
            }
        }
    }
}

fn open_book(path: &Path) -> Result<Xlsx<BufReader<File>>, FileFault> {
    let shown = path.display().to_string();
    let file = File::open(path)
        .map_err(|error| FileFault::Unreadable { path: shown.clone(), reason: error.to_string() })?;
    let damaged = |what: String| FileFault::Damaged { path: shown.clone(), what };
    without_panic(|| Xlsx::new(BufReader::new(file)))
        .map_err(damaged)?
        .map_err(|error| damaged(error.to_string()))
}

/// Guards against the survey and the reading library having looked at different sheets.
fn check_same_sheets(
    book: &Xlsx<BufReader<File>>,
    package: &Package,
    contents: &Contents,
) -> Result<(), FileFault> {
    let read = book
        .sheets_metadata()
        .iter()
        .filter(|sheet| sheet.typ == calamine::SheetType::WorkSheet)
        .map(|sheet| sheet.name.as_str());
    if read.eq(contents.sheets.iter().map(|sheet| sheet.name.as_str())) {
        Ok(())
    } else {
        Err(package.damaged("its list of sheets can be read in two ways"))
    }
}

fn read_appearances(
    book: &mut Xlsx<BufReader<File>>,
    package: &Package,
    sheets: &[SheetSurvey],
) -> Result<Vec<Appearance>, FileFault> {
    let Some(first) = sheets.first() else {
        return Ok(Vec::new());
    };
    // The formats belong to the workbook, but only a sheet's reader gives them away.
    without_panic(|| {
        book.worksheet_cells_reader(&first.name)
            .map(|reader| reader.styles().iter().map(Appearance::from).collect())
    })
    .map_err(|reason| package.damaged(reason))?
    .map_err(|error| package.damaged(error.to_string()))
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
