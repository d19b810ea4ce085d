//! Workbooks of the present xlsx format: surveyed in their XML, then read cell by cell with the formats.

mod rows;

use std::fs::File;
use std::io::BufReader;
use std::path::Path;

use calamine::{Reader, Xlsx};

use super::{Opened, Source, Visit};
use crate::fault::FileFault;
use crate::workbook::appearance::Appearance;
use crate::workbook::caught::without_panic;
use crate::workbook::contents::{Contents, read_contents};
use crate::workbook::not_carried::parts_not_carried;
use crate::workbook::package::Package;
use crate::workbook::survey::{SheetSurvey, survey_sheet};
use rows::{Rows, Styles};

/// A workbook, opened.
pub(super) struct Book {
    book: Xlsx<BufReader<File>>,
}

/// Opens and surveys a workbook.
pub(super) fn open(path: &Path, mut package: Package) -> Result<Opened, FileFault> {
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
    Ok(Opened { source: Source::Xlsx(Box::new(Book { book })), sheets, appearances, not_carried })
}

impl Book {
    /// Hands every row that holds anything to `visit`; what went wrong, in words.
    pub(super) fn stream(
        &mut self,
        survey: &SheetSurvey,
        appearances: &[Appearance],
        visit: &mut Visit<'_>,
    ) -> Result<(), String> {
        let styles =
            Styles { plain: appearances.first().is_none_or(Appearance::is_plain), known: appearances.len() };
        let counts_from_1904 = self.book.has_1904_epoch();
        let reader = without_panic(|| self.book.worksheet_cells_reader(&survey.name))?
            .map_err(|error| error.to_string())?;
        let mut rows = Rows::new(reader, survey, styles, counts_from_1904);
        while let Some(row) = without_panic(|| rows.next_row())?? {
            if visit(row).is_break() {
                return Ok(());
            }
        }
        Ok(())
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
