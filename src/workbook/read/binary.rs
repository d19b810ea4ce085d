//! What the binary formats xls and xlsb have in common: how numbers, formats and errors are coded, and how their cells
//! become rows. It reads no records.

pub(super) mod bytes;
pub(super) mod formats;
pub(super) mod looks;
pub(super) mod numbers;
pub(super) mod rows;
#[cfg(test)]
mod tests;
pub(super) mod texts;

use crate::workbook::survey::SheetSurvey;

/// A cell as its record holds it.
#[derive(Debug, Clone, PartialEq)]
pub(super) struct Stored {
    /// The row, counted from 0.
    pub(super) row: u32,
    /// The column, counted from 0.
    pub(super) column: u16,
    /// The number of its cell format.
    pub(super) style: u32,
    /// What stands in it.
    pub(super) value: StoredValue,
    /// Whether it is a formula.
    pub(super) origin: Origin,
}

/// What a record holds.
#[derive(Debug, Clone, PartialEq)]
pub(super) enum StoredValue {
    /// A format and nothing else.
    Blank,
    Number(f64),
    Text(String),
    Boolean(bool),
    /// An error by its code.
    Error(u8),
    /// A formula that nobody has computed yet.
    NoResult,
}

/// Where a value comes from.
#[derive(Debug, Clone, Copy, PartialEq, Eq)]
pub(super) enum Origin {
    Typed,
    Formula,
}

impl Stored {
    /// It holds a value or a formula.
    pub(super) fn holds_anything(&self) -> bool {
        let empty_text = matches!(&self.value, StoredValue::Text(text) if text.is_empty());
        self.origin == Origin::Formula || !(empty_text || self.value == StoredValue::Blank)
    }

    /// Counts the cell into what is known of its sheet; cells must come in order.
    pub(super) fn count(&self, survey: &mut SheetSurvey) {
        if self.origin == Origin::Formula {
            survey.note_formula(self.row, self.column);
        }
        if self.value == StoredValue::NoResult {
            survey.formulas_without_result += 1;
        }
        if matches!(self.value, StoredValue::Error(_)) {
            survey.error_values += 1;
        }
        if self.holds_anything() {
            survey.used_columns = survey.used_columns.max(self.column + 1);
            survey.last_row = survey.last_row.max(self.row);
        }
    }
}
