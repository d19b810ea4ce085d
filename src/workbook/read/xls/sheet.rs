//! One pass over the records of an xls sheet: where its cells stand, and what the sheet has besides them.

use super::cells::{LAST_COLUMN, Ordered, Unreadable, places, stores_cells};
use super::globals::Globals;
use super::records::{Record, Records};
use crate::fault::SheetFault;
use crate::workbook::place::CellRef;
use crate::workbook::read::binary::bytes::{byte, short};
use crate::workbook::survey::{ColumnLayout, SheetSurvey, Visibility, clip_widths};

/// The cells of a sheet: 65,536 rows of 256 columns.
const MOST_CELLS: usize = 65_536 * 256;

/// A sheet, surveyed.
pub(super) struct Sheet {
    pub(super) survey: SheetSurvey,
    pub(super) cells: Ordered,
    pub(super) purpose: Purpose,
    /// Pictures, charts and pivot tables, which are told for the workbook as a whole.
    pub(super) parts: Vec<&'static str>,
    pub(super) mixed_texts: u64,
}

/// What a worksheet is for.
#[derive(Debug, Clone, Copy, PartialEq, Eq)]
pub(super) enum Purpose {
    Cells,
    /// The place of buttons and fields.
    Dialog,
}

struct Pass {
    survey: SheetSurvey,
    cells: Vec<(u16, u16, u32)>,
    purpose: Purpose,
    parts: Vec<&'static str>,
    mixed_texts: u64,
    frozen: bool,
    pane: Option<(u32, u16)>,
}

/// Surveys a sheet whose records are these.
pub(super) fn survey_sheet(
    globals: &Globals,
    stream: &[u8],
    begin: usize,
    name: &str,
    visibility: Visibility,
) -> Result<Sheet, SheetFault> {
    let mut pass = Pass {
        survey: SheetSurvey::unread(name, visibility),
        cells: Vec::new(),
        purpose: Purpose::Cells,
        parts: Vec::new(),
        mixed_texts: 0,
        frozen: false,
        pane: None,
    };
    let cut_off = || whole(name, "is cut off");
    // A chart on the sheet is a stream of its own within that of the sheet.
    let mut depth = 0_usize;
    for record in Records::new(stream, begin) {
        let record = record.map_err(|_cut_off| cut_off())?;
        match (record.kind, depth) {
            (0x0809, _) => depth += 1,
            (_, 0) => return Err(whole(name, "does not begin where the workbook says")),
            (0x000A, 1) => return pass.complete(globals, stream),
            (0x000A, _) => depth -= 1,
            (_, 1) => pass.note(&record)?,
            _ => {}
        }
    }
    Err(cut_off())
}

fn whole(sheet: &str, what: impl Into<String>) -> SheetFault {
    SheetFault::Whole { sheet: sheet.to_owned(), what: what.into() }
}

impl Pass {
    fn note(&mut self, record: &Record<'_>) -> Result<(), SheetFault> {
        if stores_cells(record.kind) {
            return self.note_cells(record);
        }
        let data = record.data;
        let extras = &mut self.survey.extras;
        match record.kind {
            // A row: whether it is hidden, and whether the user set its height.
            0x0208 => {
                let flags = short(data, 12).unwrap_or(0);
                extras.hidden_rows += usize::from(flags & 0x20 != 0);
                extras.row_heights += usize::from(flags & 0x40 != 0);
            }
            0x007D => self.note_columns(data)?,
            0x023E => self.frozen = short(data, 0).unwrap_or(0) & 8 != 0,
            0x0041 => {
                self.pane = short(data, 2).zip(short(data, 0)).map(|(rows, columns)| (rows.into(), columns));
            }
            0x0081 if short(data, 0).unwrap_or(0) & 0x10 != 0 => self.purpose = Purpose::Dialog,
            0x00E5 => self.note_merges(data),
            0x01B8 => extras.note("hyperlink"),
            0x009D => extras.note("autoFilter"),
            0x01B0 => extras.note("conditionalFormatting"),
            0x01BE => extras.note("dataValidation"),
            0x0012 if short(data, 0) == Some(1) => extras.note("sheetProtection"),
            0x001C => extras.note("legacyDrawing"),
            0x001A | 0x001B => (0..short(data, 0).unwrap_or(0)).for_each(|_| extras.note("brk")),
            0x00B0 => self.parts.push("xl/pivottables/pivottable"),
            0x005D => self.note_object(data),
            _ => {}
        }
        Ok(())
    }

    /// Each range has its first and last row, then its first and last column.
    fn note_merges(&mut self, data: &[u8]) {
        for range in 0..short(data, 0).unwrap_or(0) {
            self.survey.extras.note("mergeCell");
            let at = |number: usize| short(data, 2 + usize::from(range) * 8 + number * 2);
            if let (Some(row), Some(first), Some(last)) = (at(0), at(2), at(3)) {
                self.survey.merges.note(row.into(), first, last);
            }
        }
    }

    fn note_cells(&mut self, record: &Record<'_>) -> Result<(), SheetFault> {
        let name = &self.survey.name;
        let Some((row, columns)) = places(record) else {
            return Err(whole(name, "has a cell record that is cut off or does not fit its columns"));
        };
        if *columns.end() > LAST_COLUMN {
            let what = format!("has a cell in column {}, but has 256 columns", u32::from(*columns.end()) + 1);
            return Err(whole(name, what));
        }
        if self.cells.len() > MOST_CELLS {
            return Err(whole(name, "stores more cells than a sheet has"));
        }
        // The stream is held to less than what four bytes count.
        let at = u32::try_from(record.at).unwrap_or(u32::MAX);
        self.cells.extend(columns.map(|column| (row, column, at)));
        self.mixed_texts += u64::from(record.kind == 0x00D6);
        Ok(())
    }

    /// What stands on the sheet above its cells; notes and the buttons of filters are counted elsewhere.
    fn note_object(&mut self, data: &[u8]) {
        match byte(data, 4) {
            Some(0x05) => self.parts.push("xl/charts/chart"),
            Some(0x08) => self.parts.push("xl/media/"),
            Some(0x14 | 0x19) => {}
            _ => self.survey.extras.note("drawing"),
        }
    }

    fn note_columns(&mut self, data: &[u8]) -> Result<(), SheetFault> {
        let short_at = |at| short(data, at);
        let (Some(first), Some(last), Some(width)) = (short_at(0), short_at(2), short_at(4)) else {
            return Err(whole(&self.survey.name, "has a column width that is cut off"));
        };
        // Some writers count one column beyond the last.
        if first > LAST_COLUMN || first > last || last > LAST_COLUMN + 1 {
            return Err(whole(&self.survey.name, "gives a width to columns no sheet has"));
        }
        self.survey.column_widths.push(ColumnLayout {
            first,
            last: last.min(LAST_COLUMN),
            width: Some(f64::from(width) / 256.0).filter(|width| *width <= 255.0),
            hidden: short_at(8).unwrap_or(0) & 1 != 0,
        });
        Ok(())
    }

    fn complete(self, globals: &Globals, stream: &[u8]) -> Result<Sheet, SheetFault> {
        let Self { mut survey, cells, purpose, parts, mixed_texts, frozen, pane } = self;
        let place = |row: u16, column| CellRef { sheet: survey.name.clone(), row: row.into(), column };
        let cells = Ordered::new(cells)
            .map_err(|(row, column)| SheetFault::OutOfOrder { cell: place(row, column) })?;
        survey.frozen = pane.filter(|_| frozen);
        for cell in cells.cells(globals, stream) {
            let cell = cell.map_err(|Unreadable { row, column, what }| SheetFault::Unreadable {
                cell: CellRef { sheet: survey.name.clone(), row: row.into(), column },
                what,
            })?;
            cell.count(&mut survey);
        }
        clip_widths(&mut survey);
        Ok(Sheet { survey, cells, purpose, parts, mixed_texts })
    }
}
