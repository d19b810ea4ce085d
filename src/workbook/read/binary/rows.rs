//! Puts cells that come in order together into rows, in the terms of [`CellContent`].

use std::ops::ControlFlow;

use super::formats::Shown;
use super::numbers::error_text;
use super::{Origin, Stored, StoredValue};
use crate::workbook::appearance::Appearance;
use crate::workbook::content::{Cell, CellContent, Row, StyleId};
use crate::workbook::read::Visit;
use crate::workbook::serial::DAYS_1900_TO_1904;

/// From when a workbook counts its days.
#[derive(Debug, Clone, Copy, PartialEq, Eq, Default)]
pub(in crate::workbook::read) enum DayZero {
    #[default]
    In1900,
    In1904,
}

/// What the formats of a workbook do to its cells.
#[derive(Debug, Clone, Default)]
pub(in crate::workbook::read) struct Formats {
    /// What a number under each format is.
    pub(in crate::workbook::read) shown: Vec<Shown>,
    /// Whether each format adds anything to a cell.
    pub(in crate::workbook::read) plain: Vec<bool>,
    pub(in crate::workbook::read) day_zero: DayZero,
}

impl Formats {
    /// The formats by what they show and how they look.
    pub(in crate::workbook::read) fn new(
        shown: Vec<Shown>,
        appearances: &[Appearance],
        day_zero: DayZero,
    ) -> Self {
        Self { shown, plain: appearances.iter().map(Appearance::is_plain).collect(), day_zero }
    }

    fn style(&self, number: u32) -> Option<StyleId> {
        let place = usize::try_from(number).ok()?;
        self.plain.get(place).is_some_and(|plain| !plain).then_some(StyleId(number))
    }

    fn shown(&self, number: u32) -> Shown {
        usize::try_from(number).ok().and_then(|place| self.shown.get(place)).copied().unwrap_or(Shown::Number)
    }

    fn cell(&self, stored: Stored) -> Cell {
        let content = match stored.value {
            StoredValue::Blank | StoredValue::NoResult => CellContent::Empty,
            StoredValue::Number(number) => self.number(number, self.shown(stored.style)),
            // Where a formula gave an empty text, that is its result; without a formula it is an empty cell.
            StoredValue::Text(text) if text.is_empty() && stored.origin == Origin::Typed => {
                CellContent::Empty
            }
            StoredValue::Text(text) => CellContent::Text(text),
            StoredValue::Boolean(boolean) => CellContent::Boolean(boolean),
            StoredValue::Error(code) => CellContent::Error(error_text(code)),
        };
        Cell {
            column: stored.column,
            content,
            style: self.style(stored.style),
            formula: stored.origin == Origin::Formula,
        }
    }

    /// A number no spreadsheet can show is kept as the text it was, not as a number to compute with.
    fn number(&self, number: f64, shown: Shown) -> CellContent {
        if !number.is_finite() {
            return CellContent::Text(number.to_string());
        }
        match shown {
            Shown::Number => CellContent::Number(number),
            Shown::Duration => CellContent::DateTime(number),
            Shown::Date => CellContent::DateTime(match self.day_zero {
                DayZero::In1900 => number,
                DayZero::In1904 => number + DAYS_1900_TO_1904,
            }),
        }
    }
}

/// Hands on each row as soon as it is complete.
pub(in crate::workbook::read) struct Rows<'book, 'visit> {
    formats: &'book Formats,
    used_columns: u16,
    visit: &'book mut Visit<'visit>,
    row: Option<Row>,
}

impl<'book, 'visit> Rows<'book, 'visit> {
    pub(in crate::workbook::read) fn new(
        formats: &'book Formats,
        used_columns: u16,
        visit: &'book mut Visit<'visit>,
    ) -> Self {
        Self { formats, used_columns, visit, row: None }
    }

    /// Takes the next cell.
    pub(in crate::workbook::read) fn take(&mut self, stored: Stored) -> ControlFlow<()> {
        let (index, column) = (stored.row, stored.column);
        let cell = self.formats.cell(stored);
        let empty = cell.content == CellContent::Empty && !cell.formula;
        if empty && (cell.style.is_none() || column >= self.used_columns) {
            return ControlFlow::Continue(());
        }
        match &mut self.row {
            Some(row) if row.index == index => row.cells.push(cell),
            row => {
                let mut cells = Vec::with_capacity(usize::from(self.used_columns));
                cells.push(cell);
                if let Some(complete) = row.replace(Row { index, cells }) {
                    return (self.visit)(complete);
                }
            }
        }
        ControlFlow::Continue(())
    }

    /// Hands on the last row.
    pub(in crate::workbook::read) fn finish(mut self) {
        if let Some(row) = self.row.take() {
            // Nothing comes after it that could be broken off.
            let _enough = (self.visit)(row);
        }
    }
}
