//! Workbooks of the binary xlsb format: parts in a zip container that hold records. Each sheet is surveyed once and then
//! streamed, cell by cell. Formulas are not read, only their results.

mod cells;
mod contents;
mod looks;
mod records;
mod sheet;
#[cfg(test)]
mod tests;

use std::ops::ControlFlow;
use std::path::Path;

use self::cells::{Cells, Taken};
use self::looks::Looks;
use self::records::Records;
use super::binary::rows::{Formats, Rows};
use super::binary::texts::SharedTexts;
use super::{Opened, Source, Visit};
use crate::fault::FileFault;
use crate::workbook::appearance::Appearance;
use crate::workbook::not_carried::parts_not_carried;
use crate::workbook::package::{Found, Package};
use crate::workbook::survey::SheetSurvey;

/// A workbook, opened.
pub(super) struct Book {
    package: Package,
    texts: SharedTexts,
    formats: Formats,
    /// The part of each worksheet.
    parts: Vec<String>,
}

/// Opens and surveys a workbook.
pub(super) fn open(_path: &Path, mut package: Package) -> Result<Opened, FileFault> {
    let mut workbook = contents::read_workbook(&mut package)?;
    let looks = match &workbook.styles {
        Some(part) => Looks::read(&mut package, part)?,
        None => Looks::default(),
    };
    package.allow_sheets();
    let mut sheets = Vec::new();
    for entry in &workbook.contents.sheets {
        let mixed_texts = &mut workbook.contents.mixed_texts;
        sheets.push(sheet::survey_sheet(&mut package, entry, &workbook.texts, mixed_texts)?);
    }
    let appearances: Vec<Appearance> = looks.styles().iter().map(Appearance::from).collect();
    let formats = Formats::new(looks.shown(), &appearances, workbook.day_zero);
    let mut not_carried = parts_not_carried(package.part_names(), &workbook.contents);
    not_carried.extend(sheets.iter().flat_map(SheetSurvey::not_carried));
    let parts = workbook.contents.sheets.into_iter().map(|entry| entry.part).collect();
    let book = Book { package, texts: workbook.texts, formats, parts };
    Ok(Opened { source: Source::Xlsb(book), sheets, appearances, not_carried })
}

impl Book {
    /// Hands every row that holds anything to `visit`; what went wrong, in words.
    pub(super) fn stream(
        &mut self,
        sheet: usize,
        survey: &SheetSurvey,
        visit: &mut Visit<'_>,
    ) -> Result<(), String> {
        let Some(part) = self.parts.get(sheet) else {
            return Ok(());
        };
        let mut cells = Cells::new(survey.name.clone(), &self.texts);
        let mut rows = Rows::new(&self.formats, survey.used_columns, visit);
        let mut inside = false;
        let mut enough = false;
        self.package.read_again();
        for_each_record(&mut self.package, part, |kind, data| {
            if !inside {
                inside = kind == 0x0091;
                return Ok(ControlFlow::Continue(()));
            }
            match cells.take(kind, data).map_err(|fault| fault.to_string())? {
                Taken::Cell(cell) => {
                    let next = rows.take(cell);
                    enough = next.is_break();
                    Ok(next)
                }
                Taken::End => Ok(ControlFlow::Break(())),
                Taken::Row(_) | Taken::Other => Ok(ControlFlow::Continue(())),
            }
        })
        .map_err(|fault| fault.to_string())?;
        if !enough {
            rows.finish();
        }
        Ok(())
    }
}

/// Hands every record of a part to `visit`, until it breaks off or says what is wrong.
fn for_each_record(
    package: &mut Package,
    part: &str,
    mut visit: impl FnMut(u16, &[u8]) -> Result<ControlFlow<()>, String>,
) -> Result<Found, FileFault> {
    package.read_part(part, |source, damaged| {
        let mut records = Records::new(source);
        while let Some((kind, data)) = records.next().map_err(|error| damaged(&error))? {
            if visit(kind, data).map_err(|what| damaged(&what))?.is_break() {
                break;
            }
        }
        Ok(())
    })
}
