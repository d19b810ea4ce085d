//! Writes cells: the inventory's as they were, and our own.

use std::borrow::Cow;

use rust_xlsxwriter::{Format, Formula, Note, Url, Worksheet, XlsxError};

use crate::fault::FileFault;
use crate::workbook::appearance::{Appearance, Lines};
use crate::workbook::content::{Cell, CellContent, Row};
use crate::workbook::look::Look;
use crate::workbook::place::{CellRef, LAST_ROW};

use super::height::{height_of, lines_of};
use super::names::cut;
use super::{AnnotatedWorkbook, SheetId};

/// The longest text of a cell, in UTF-16 units (the format's limit).
const LONGEST_TEXT: usize = 32_767;

/// The longest note (the writing library's limit, which leaves room for an author).
const LONGEST_NOTE: usize = 32_713;

/// The width of a note's box, in pixels, and in characters of its font.
const NOTE_WIDTH: u32 = 340;
const NOTE_COLUMN: f64 = 52.0;

/// The height of a line in a note, in pixels.
const NOTE_LINE: u32 = 16;

/// What a text that was too long ends with.
const CUT: &str = " ... (cut)";

/// More links on a sheet a spreadsheet program removes as damage (65,530); the rest is written as plain text.
const MOST_LINKS: u32 = 65_000;

/// What stands in one of our cells.
#[derive(Debug, Clone, Copy, PartialEq)]
pub enum Value<'text> {
    /// Nothing; the look only.
    Empty,
    /// Text, which stays text whatever it begins with.
    Text(&'text str),
    /// A finite number; anything else is written as empty.
    Number(f64),
    /// Text that leads somewhere.
    Link {
        /// What is shown.
        text: &'text str,
        /// Where it leads.
        target: Target<'text>,
    },
}

/// Where a link leads.
#[derive(Debug, Clone, Copy, PartialEq)]
pub enum Target<'text> {
    /// A cell of this workbook.
    Cell(&'text CellRef),
    /// A page on the web, with its scheme.
    Web(&'text str),
}

impl AnnotatedWorkbook {
    /// Writes a row of the inventory as it was, at the place it had.
    pub fn write_row(&mut self, sheet: SheetId, row: &Row) -> Result<(), FileFault> {
        self.advance(sheet, row.index)?;
        self.note_wrapped_texts(sheet, row);
        self.guarded(|this| {
            let worksheet = this.book.worksheet_from_index(sheet.0)?;
            for cell in &row.cells {
                write_cell(worksheet, row.index, cell, appearance_of(&this.appearances, cell))?;
            }
            Ok(())
        })
    }

    /// Writes a row of the inventory as [`AnnotatedWorkbook::write_row`] does, its texts broken over lines.
    pub fn write_wrapped_row(&mut self, sheet: SheetId, row: &Row) -> Result<(), FileFault> {
        self.write_row(sheet, row)?;
        for cell in &row.cells {
            let CellContent::Text(text) = &cell.content else { continue };
            self.guarded(|this| {
                let usual = appearance_of(&this.appearances, cell).map(|look| look.format().clone());
                let format = usual.unwrap_or_default().set_text_wrap();
                let worksheet = this.book.worksheet_from_index(sheet.0)?;
                worksheet.write_string_with_format(row.index, cell.column, shortened(text), &format)?;
                Ok(())
            })?;
            self.fit_row(sheet, row.index, cell.column, text)?;
        }
        Ok(())
    }

    /// Writes one of our own cells.
    pub fn write(
        &mut self,
        sheet: SheetId,
        row: u32,
        column: u16,
        value: &Value<'_>,
        look: Look,
    ) -> Result<(), FileFault> {
        self.advance(sheet, row)?;
        let value = self.with_links_left(sheet, *value);
        self.guarded(|this| {
            let format = this.looks.format(look);
            let worksheet = this.book.worksheet_from_index(sheet.0)?;
            match value {
                Value::Text(text) => {
                    worksheet.write_string_with_format(row, column, shortened(text), format)?
                }
                Value::Number(number) if number.is_finite() => {
                    worksheet.write_number_with_format(row, column, number, format)?
                }
                Value::Empty | Value::Number(_) => worksheet.write_blank(row, column, format)?,
                Value::Link { text, target } => worksheet.write_url_with_options(
                    row,
                    column,
                    url(target),
                    shortened(text),
                    "",
                    Some(format),
                )?,
            };
            Ok(())
        })?;
        match (value, look) {
            (Value::Text(text), Look::Wrapped | Look::Header) => self.fit_row(sheet, row, column, text),
            _ => Ok(()),
        }
    }

    /// Puts a note on a cell, written or not.
    pub fn note(&mut self, sheet: SheetId, row: u32, column: u16, text: &str) -> Result<(), FileFault> {
        // The usual box holds a few words only.
        let note = Note::new(shortened_to(text, LONGEST_NOTE))
            .add_author_prefix(false)
            .set_width(NOTE_WIDTH)
            .set_height(NOTE_LINE * (1 + lines_of(text, NOTE_COLUMN)));
        self.on_sheet(sheet, |sheet| {
            sheet.insert_note(row, column, &note)?;
            Ok(())
        })
    }

    /// Makes the row high enough for a wrapped text of ours and for what was written before it.
    fn fit_row(&mut self, sheet: SheetId, row: u32, column: u16, text: &str) -> Result<(), FileFault> {
        let Some(state) = self.sheets.get_mut(sheet.0) else {
            return Ok(());
        };
        state.lines = state.lines.max(lines_of(text, state.width(column)));
        let lines = state.lines;
        // Below the last possible row there is none to go to, see `leave_last_rows`.
        if lines == 1 || row == LAST_ROW {
            return Ok(());
        }
        self.on_sheet(sheet, |sheet| {
            sheet.set_row_height(row, height_of(lines))?;
            Ok(())
        })
    }

    fn note_wrapped_texts(&mut self, sheet: SheetId, row: &Row) {
        let Some(state) = self.sheets.get_mut(sheet.0) else {
            return;
        };
        for cell in &row.cells {
            if let CellContent::Text(text) = &cell.content
                && appearance_of(&self.appearances, cell).is_some_and(|look| look.lines() == Lines::Wrapped)
            {
                state.lines = state.lines.max(lines_of(text, state.width(cell.column)));
            }
        }
    }

    /// A link beyond the most a sheet can have is written as the text it shows.
    fn with_links_left<'text>(&mut self, sheet: SheetId, value: Value<'text>) -> Value<'text> {
        match (value, self.sheets.get_mut(sheet.0)) {
            (Value::Link { text, .. }, Some(state)) => {
                state.links = state.links.saturating_add(1);
                if state.links > MOST_LINKS { Value::Text(text) } else { value }
            }
            _ => value,
        }
    }
}

fn appearance_of<'book>(appearances: &'book [Appearance], cell: &Cell) -> Option<&'book Appearance> {
    let style = usize::try_from(cell.style?.0).ok()?;
    appearances.get(style)
}

fn write_cell(
    sheet: &mut Worksheet,
    row: u32,
    cell: &Cell,
    appearance: Option<&Appearance>,
) -> Result<(), XlsxError> {
    let column = cell.column;
    let format = appearance.map(Appearance::format);
    match (&cell.content, format) {
        (CellContent::Empty, None) => sheet,
        (CellContent::Empty, Some(format)) => sheet.write_blank(row, column, format)?,
        (CellContent::Error(name), format) if is_error_value(name) => {
            write_error(sheet, row, column, name, format)?
        }
        (CellContent::Text(text) | CellContent::Error(text), Some(format)) => {
            sheet.write_string_with_format(row, column, shortened(text), format)?
        }
        (CellContent::Text(text) | CellContent::Error(text), None) => {
            sheet.write_string(row, column, shortened(text))?
        }
        (CellContent::Number(number), Some(format)) => {
            sheet.write_number_with_format(row, column, *number, format)?
        }
        (CellContent::Number(number), None) => sheet.write_number(row, column, *number)?,
        (CellContent::DateTime(number), _) => match appearance {
            Some(appearance) => {
                sheet.write_number_with_format(row, column, *number, &appearance.format_for_dates())?
            }
            None => sheet.write_number_with_format(
                row,
                column,
                *number,
                &Appearance::default().format_for_dates(),
            )?,
        },
        (CellContent::Boolean(boolean), Some(format)) => {
            sheet.write_boolean_with_format(row, column, *boolean, format)?
        }
        (CellContent::Boolean(boolean), None) => sheet.write_boolean(row, column, *boolean)?,
    };
    Ok(())
}

/// The errors that a cell can hold as such (ECMA-376 part 1, 18.18.11, and what programs added since); others are text.
fn is_error_value(name: &str) -> bool {
    const VALUES: [&str; 8] =
        ["#DIV/0!", "#N/A", "#NAME?", "#NULL!", "#NUM!", "#REF!", "#VALUE!", "#GETTING_DATA"];
    VALUES.contains(&name)
}

/// The writing library has no errors but as results: the formula of the error itself has it as its result.
fn write_error<'sheet>(
    sheet: &'sheet mut Worksheet,
    row: u32,
    column: u16,
    name: &str,
    format: Option<&Format>,
) -> Result<&'sheet mut Worksheet, XlsxError> {
    let formula = Formula::new(format!("={name}")).set_result(name);
    match format {
        Some(format) => sheet.write_formula_with_format(row, column, formula, format),
        None => sheet.write_formula(row, column, formula),
    }
}

fn url(target: Target<'_>) -> Url {
    match target {
        // Quoted always: a sheet called 2026 or A1 would be taken for something else.
        Target::Cell(cell) => {
            Url::new(format!("internal:'{}'!{}", cell.sheet.replace('\'', "''"), cell.address()))
        }
        Target::Web(page) => Url::new(page),
    }
}

fn shortened(text: &str) -> Cow<'_, str> {
    shortened_to(text, LONGEST_TEXT)
}

fn shortened_to(text: &str, longest: usize) -> Cow<'_, str> {
    // A text has at most as many UTF-16 units as bytes.
    if text.len() <= longest || text.encode_utf16().count() <= longest {
        text.into()
    } else {
        format!("{}{CUT}", cut(text, longest.saturating_sub(CUT.len()))).into()
    }
}
