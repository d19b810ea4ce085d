//! Puts the stream of cells together into rows, in the terms of [`CellContent`].

use std::fs::File;
use std::io::BufReader;

use calamine::{DataRef, XlsxCellReader, XlsxError};

use crate::workbook::content::{Cell, CellContent, Row, StyleId};
use crate::workbook::serial::{DAYS_1900_TO_1904, serial_of};
use crate::workbook::survey::{SheetSurvey, UnknownError};

/// Which of the workbook's cell formats matter.
#[derive(Debug, Clone, Copy)]
pub(super) struct Styles {
    /// Format 0, which every cell without one has, adds nothing.
    pub(super) plain: bool,
    /// How many formats there are.
    pub(super) known: usize,
}

/// The rows of a sheet, one after the other.
pub(super) struct Rows<'book> {
    reader: XlsxCellReader<'book, BufReader<File>>,
    survey: &'book SheetSurvey,
    errors: std::slice::Iter<'book, UnknownError>,
    styles: Styles,
    date_shift: f64,
    waiting: Option<(u32, Cell)>,
    position: Position,
}

/// Whether there may be cells left; past the end the reading library takes the rest of the XML for damage.
#[derive(Debug, Clone, Copy, PartialEq, Eq)]
enum Position {
    Inside,
    AtEnd,
}

impl<'book> Rows<'book> {
    pub(super) fn new(
        reader: XlsxCellReader<'book, BufReader<File>>,
        survey: &'book SheetSurvey,
        styles: Styles,
        counts_from_1904: bool,
    ) -> Self {
        Self {
            reader,
            survey,
            errors: survey.unknown_errors.iter(),
            styles,
            date_shift: if counts_from_1904 { DAYS_1900_TO_1904 } else { 0.0 },
            waiting: None,
            position: Position::Inside,
        }
    }

    /// The next row that holds anything; an error in words if the sheet cannot be read on.
    pub(super) fn next_row(&mut self) -> Result<Option<Row>, String> {
        let first = match self.waiting.take() {
            Some(first) => Some(first),
            None => self.next_cell()?,
        };
        let Some((index, cell)) = first else {
            return Ok(None);
        };
        let mut cells = Vec::with_capacity(usize::from(self.survey.used_columns));
        cells.push(cell);
        while let Some((row, cell)) = self.next_cell()? {
            if row != index {
                self.waiting = Some((row, cell));
                break;
            }
            cells.push(cell);
        }
        Ok(Some(Row { index, cells }))
    }

    /// The next cell that holds a value or a format worth keeping.
    fn next_cell(&mut self) -> Result<Option<(u32, Cell)>, String> {
        while self.position == Position::Inside {
            let (row, column, mut content, style) = match self.reader.next_cell_with_style_id() {
                Ok(None) => {
                    self.position = Position::AtEnd;
                    break;
                }
                Ok(Some((cell, style))) => {
                    let (row, column) = cell.get_position();
                    if matches!(cell.get_value(), DataRef::String(text) if text.is_empty()) {
                        (row, column, CellContent::Text(String::new()), style)
                    } else {
                        (row, column, content_of(cell.get_value(), self.date_shift), style)
                    }
                }
                Err(XlsxError::CellError(text)) => self.known_by_survey(text)?,
                Err(error) => return Err(error.to_string()),
            };
            let column = u16::try_from(column)
                .map_err(|_too_far| format!("there is no column {}", u64::from(column) + 1))?;
            let style = self.kept_style(style);
            let formula = self.survey.is_formula(row, column);
            // Where a formula gave an empty text, that is its result; without a formula it is an empty cell.
            if !formula && content == CellContent::Text(String::new()) {
                content = CellContent::Empty;
            }
            let empty = content == CellContent::Empty && !formula;
            if empty && (style.is_none() || column >= self.survey.used_columns) {
                continue;
            }
            let cell = Cell { column, content, style, formula };
            return Ok(Some((row, cell)));
        }
        Ok(None)
    }

    /// An error value the reading library stumbled over; it can go on, and the survey knows where it stands.
    fn known_by_survey(&mut self, text: String) -> Result<(u32, u32, CellContent, usize), String> {
        match self.errors.next() {
            Some(error) if error.text == text => Ok((
                error.row,
                u32::from(error.column),
                CellContent::Error(text),
                usize::try_from(error.style.0).unwrap_or(0),
            )),
            _ => Err(format!("the error value `{text}` is not known")),
        }
    }

    fn kept_style(&self, style: usize) -> Option<StyleId> {
        if style >= self.styles.known || (style == 0 && self.styles.plain) {
            return None;
        }
        u32::try_from(style).ok().map(StyleId)
    }
}

fn content_of(value: &DataRef<'_>, date_shift: f64) -> CellContent {
    match value {
        DataRef::Empty => CellContent::Empty,
        DataRef::Float(number) => number_or_text(*number, CellContent::Number),
        DataRef::Int(number) => CellContent::Text(number.to_string()),
        DataRef::String(text) | DataRef::DurationIso(text) => text_or_empty(text),
        DataRef::SharedString(text) => text_or_empty(text),
        DataRef::Bool(boolean) => CellContent::Boolean(*boolean),
        DataRef::DateTime(moment) => {
            let shift = if moment.is_duration() { 0.0 } else { date_shift };
            number_or_text(moment.as_f64() + shift, CellContent::DateTime)
        }
        DataRef::DateTimeIso(text) => {
            serial_of(text).map_or_else(|| text_or_empty(text), CellContent::DateTime)
        }
        DataRef::Error(error) => CellContent::Error(error.to_string()),
    }
}

/// A number no spreadsheet can show is kept as the text it was, not as a number to compute with.
fn number_or_text(number: f64, content: fn(f64) -> CellContent) -> CellContent {
    if number.is_finite() { content(number) } else { CellContent::Text(number.to_string()) }
}

fn text_or_empty(text: &str) -> CellContent {
    if text.is_empty() { CellContent::Empty } else { CellContent::Text(text.to_owned()) }
}
