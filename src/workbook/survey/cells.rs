//! Checks the cells of a sheet as the reading library will see them, so that none is misplaced, swapped or lost.

use std::sync::Arc;

use quick_xml::events::{BytesStart, Event};

use crate::fault::SheetFault;

use super::super::content::StyleId;
use super::super::place::{CellRef, LAST_COLUMN, LAST_ROW, parse_reference, parse_row};
use super::value::{ReadAs, is_text, value_of};
use super::{Place, SheetSurvey, UnknownError};

/// The state of the check between two pieces of XML.
pub(super) struct CellCheck {
    sheet: Arc<str>,
    shared_texts: u64,
    row: u32,
    row_seen: Option<u32>,
    column: u32,
    last: Option<(u32, u16)>,
    references: References,
    unknown_error: Seen,
    inside: Inside,
    cell: OpenCell,
}

/// Whether every cell says where it stands; without references a skipped cell would shift its neighbours.
#[derive(Clone, Copy, PartialEq, Eq)]
enum References {
    Everywhere,
    SomeMissing,
}

/// Which element the pass is in.
#[derive(Clone, Copy, PartialEq, Eq)]
enum Inside {
    Rows,
    Row,
    Cell,
    Value,
    Formula,
    InlineText(u32),
}

/// What is known of the cell being passed.
#[derive(Default)]
struct OpenCell {
    row: u32,
    column: u16,
    style: u32,
    kind: String,
    text: String,
    pieces: u32,
    formula: Seen,
    value: Seen,
    repeated: Seen,
}

impl OpenCell {
    /// Forgets the cell before but keeps the room for its texts.
    fn reset(&mut self) {
        let (mut kind, mut text) = (std::mem::take(&mut self.kind), std::mem::take(&mut self.text));
        kind.clear();
        text.clear();
        *self = Self { kind, text, ..Self::default() };
    }

    fn is_inline(&self) -> bool {
        matches!(self.kind.as_str(), "inlineStr" | "is")
    }
}

#[derive(Default, Clone, Copy, PartialEq, Eq)]
enum Seen {
    #[default]
    No,
    Yes,
}

impl CellCheck {
    pub(super) fn new(sheet: Arc<str>, shared_texts: u64) -> Self {
        Self {
            sheet,
            shared_texts,
            row: 0,
            row_seen: None,
            column: 0,
            last: None,
            references: References::Everywhere,
            unknown_error: Seen::No,
            inside: Inside::Rows,
            cell: OpenCell::default(),
        }
    }

    /// Takes in one piece of the sheet's rows.
    pub(super) fn visit(
        &mut self,
        event: &Event<'_>,
        survey: &mut SheetSurvey,
        place: &mut Place,
    ) -> Result<(), SheetFault> {
        match event {
            Event::Start(element) => self.open(element, survey),
            Event::End(_) => self.close(survey, place),
            Event::Text(text) => {
                self.add_text(text);
                Ok(())
            }
            Event::GeneralRef(_) | Event::CData(_) | Event::Comment(_) | Event::PI(_) => {
                self.interrupt(event)
            }
            Event::Empty(_) | Event::Decl(_) | Event::DocType(_) | Event::Eof => Ok(()),
        }
    }

    fn open(&mut self, element: &BytesStart<'_>, survey: &mut SheetSurvey) -> Result<(), SheetFault> {
        let name = element.local_name();
        self.inside = match (self.inside, name.as_ref()) {
            (Inside::Rows, "row") => {
                self.open_row(element, survey)?;
                Inside::Row
            }
            (Inside::Row, "c") => {
                self.open_cell(element)?;
                Inside::Cell
            }
            (Inside::Cell, "f") if self.cell.value == Seen::No && self.cell.formula == Seen::No => {
                self.cell.formula = Seen::Yes;
                Inside::Formula
            }
            // A value beside an inline text repeats it; the reading library takes the text, if that comes later.
            (Inside::Cell, "v") if self.cell.value == Seen::No && self.cell.is_inline() => {
                self.cell.repeated = Seen::Yes;
                Inside::Value
            }
            (Inside::Cell, "v") if self.cell.value == Seen::No => {
                self.cell.value = Seen::Yes;
                Inside::Value
            }
            (Inside::Cell, "is") if self.cell.value == Seen::No => {
                self.cell.value = Seen::Yes;
                Inside::InlineText(0)
            }
            (Inside::InlineText(depth), _) => Inside::InlineText(depth.saturating_add(1)),
            (Inside::Rows | Inside::Row, other) => {
                return Err(SheetFault::Whole {
                    sheet: self.sheet.to_string(),
                    what: format!("holds `{other}` where a row or a cell should stand"),
                });
            }
            (Inside::Cell | Inside::Value | Inside::Formula, other) => {
                return Err(self.unreadable(format!("`{other}` where its value should stand")));
            }
        };
        Ok(())
    }

    fn open_row(&mut self, element: &BytesStart<'_>, survey: &mut SheetSurvey) -> Result<(), SheetFault> {
        let mut reference = None;
        for attribute in element.attributes() {
            let attribute =
                attribute.map_err(|error| self.whole(format!("has a row that cannot be read: {error}")))?;
            match attribute.key.as_ref() {
                "r" => reference = Some(attribute.value),
                "hidden" if matches!(attribute.value.as_ref(), "1" | "true") => {
                    survey.extras.hidden_rows += 1;
                }
                "customHeight" if matches!(attribute.value.as_ref(), "1" | "true") => {
                    survey.extras.row_heights += 1;
                }
                _ => {}
            }
        }
        if let Some(reference) = reference {
            self.row = parse_row(&reference).ok_or_else(|| self.no_such_cell(&reference))?;
        }
        if self.row > LAST_ROW {
            return Err(self.no_such_cell(&format!("row {}", u64::from(self.row) + 1)));
        }
        if self.row_seen.is_some_and(|seen| self.row <= seen) {
            return Err(self.whole(format!("stores row {} twice or out of order", self.row + 1)));
        }
        self.row_seen = Some(self.row);
        self.column = 0;
        Ok(())
    }

    fn open_cell(&mut self, element: &BytesStart<'_>) -> Result<(), SheetFault> {
        self.cell.reset();
        let mut reference = None;
        for attribute in element.attributes() {
            let attribute =
                attribute.map_err(|error| self.whole(format!("has a cell that cannot be read: {error}")))?;
            match attribute.key.as_ref() {
                "r" => reference = Some(attribute.value),
                "s" => self.cell.style = attribute.value.parse().unwrap_or(0),
                "t" => self.cell.kind.push_str(&attribute.value),
                _ => {}
            }
        }
        let column = self.column_of(reference.as_deref())?;
        if self.last.is_some_and(|last| (self.row, column) <= last) {
            let cell = self.cell_ref(self.row, column);
            return Err(SheetFault::OutOfOrder { cell });
        }
        self.last = Some((self.row, column));
        self.cell.row = self.row;
        self.cell.column = column;
        self.column = u32::from(column) + 1;
        Ok(())
    }

    /// The column a cell stands in: by its reference, or after the cell before it.
    fn column_of(&mut self, reference: Option<&str>) -> Result<u16, SheetFault> {
        if let Some(reference) = reference {
            let (row, column) = parse_reference(reference).ok_or_else(|| self.no_such_cell(reference))?;
            if row != self.row {
                let cell = self.cell_ref(row, column);
                return Err(SheetFault::OutOfOrder { cell });
            }
            Ok(column)
        } else {
            self.references = References::SomeMissing;
            if self.unknown_error == Seen::Yes {
                return Err(
                    self.whole("has an unknown error value before cells without references".to_owned())
                );
            }
            u16::try_from(self.column)
                .ok()
                .filter(|column| *column <= LAST_COLUMN)
                .ok_or_else(|| self.no_such_cell("a column after XFD"))
        }
    }

    fn close(&mut self, survey: &mut SheetSurvey, place: &mut Place) -> Result<(), SheetFault> {
        self.inside = match self.inside {
            Inside::InlineText(0) | Inside::Formula | Inside::Value => Inside::Cell,
            Inside::InlineText(depth) => Inside::InlineText(depth - 1),
            Inside::Cell => {
                self.close_cell(survey)?;
                Inside::Row
            }
            Inside::Row => {
                self.row += 1;
                Inside::Rows
            }
            Inside::Rows => {
                *place = Place::Tail;
                Inside::Rows
            }
        };
        Ok(())
    }

    fn close_cell(&mut self, survey: &mut SheetSurvey) -> Result<(), SheetFault> {
        let (row, column) = (self.cell.row, self.cell.column);
        if self.cell.formula == Seen::Yes {
            survey.note_formula(row, column);
            if self.has_no_result() {
                survey.formulas_without_result += 1;
            }
        }
        if self.cell.formula == Seen::Yes || self.cell.value == Seen::Yes {
            survey.used_columns = survey.used_columns.max(column + 1);
            survey.last_row = survey.last_row.max(row);
        }
        if self.cell.value == Seen::Yes {
            self.check_value(survey)?;
        } else if self.cell.repeated == Seen::Yes {
            return Err(self.unreadable("a text stored where a number belongs".to_owned()));
        }
        Ok(())
    }

    /// Programs that write formulas without computing them store no value, or an empty one; an empty text is a result.
    fn has_no_result(&self) -> bool {
        let stored_empty = self.cell.text.is_empty() && self.cell.pieces == 0 && !is_text(&self.cell.kind);
        self.cell.value == Seen::No || stored_empty
    }

    fn check_value(&mut self, survey: &mut SheetSurvey) -> Result<(), SheetFault> {
        let (kind, text) = (self.cell.kind.as_str(), self.cell.text.as_str());
        if kind == "e" {
            survey.error_values += 1;
        }
        match value_of(kind, text, self.cell.pieces, self.shared_texts) {
            Ok(ReadAs::Meant) => Ok(()),
            Ok(ReadAs::Unknown) => self.note_unknown_error(survey),
            Err(what) => Err(self.unreadable(what)),
        }
    }

    fn note_unknown_error(&mut self, survey: &mut SheetSurvey) -> Result<(), SheetFault> {
        if self.references == References::SomeMissing {
            return Err(self.unreadable(format!("the unknown error value `{}`", self.cell.text)));
        }
        self.unknown_error = Seen::Yes;
        survey.unknown_errors.push(UnknownError {
            row: self.cell.row,
            column: self.cell.column,
            style: StyleId(self.cell.style),
            text: self.cell.text.clone(),
        });
        Ok(())
    }

    fn add_text(&mut self, text: &str) {
        match self.inside {
            Inside::Value => {
                self.cell.pieces += 1;
                self.cell.text.push_str(text);
            }
            Inside::Rows | Inside::Row | Inside::Cell | Inside::Formula | Inside::InlineText(_) => {}
        }
    }

    /// A value may hold references to characters if it is text; anything else in it would be dropped.
    fn interrupt(&mut self, event: &Event<'_>) -> Result<(), SheetFault> {
        if self.inside == Inside::Value {
            if matches!(event, Event::CData(_)) || !is_text(&self.cell.kind) {
                return Err(self.unreadable("a value interrupted by something else".to_owned()));
            }
            self.cell.pieces += 1;
        }
        Ok(())
    }

    fn cell_ref(&self, row: u32, column: u16) -> CellRef {
        CellRef { sheet: Arc::clone(&self.sheet), row, column }
    }

    fn unreadable(&self, what: String) -> SheetFault {
        SheetFault::Unreadable { cell: self.cell_ref(self.cell.row, self.cell.column), what }
    }

    fn no_such_cell(&self, reference: &str) -> SheetFault {
        SheetFault::NoSuchCell { sheet: self.sheet.to_string(), reference: reference.to_owned() }
    }

    fn whole(&self, what: String) -> SheetFault {
        SheetFault::Whole { sheet: self.sheet.to_string(), what }
    }
}
