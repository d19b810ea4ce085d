//! The one pass over a text that tells what it holds before its rows are streamed.

use std::collections::BTreeMap;
use std::path::Path;

use crate::fault::LinesFault;
use crate::workbook::place::{CellRef, LAST_ROW};
use crate::workbook::survey::{SheetSurvey, Visibility};
use crate::workbook::write::free_sheet_name;

use super::dialect::Dialect;
use super::records::Record;
use super::text_meant;

/// Rows whose number of fields is kept; a header stands among them.
const FIRST_ROWS: u32 = 1_000;

/// The longest text of a cell, in UTF-16 units (the format's limit).
const LONGEST_TEXT: usize = 32_767;

/// Words that are shown for the user to see whether the encoding was right.
const WORDS_SHOWN: usize = 3;

/// The longest of such words, in characters.
const LONGEST_WORD: usize = 24;

/// A line within a quoted text that has at least so many separators, as many as a row has, is a row that was swallowed.
const SEPARATORS_OF_A_ROW: usize = 3;

/// What a text holds.
#[derive(Debug)]
pub(super) struct Surveyed {
    pub(super) sheet: SheetSurvey,
    /// How many fields each of the first rows has.
    pub(super) first_fields: BTreeMap<u32, usize>,
    /// Words with characters that depend on the encoding.
    pub(super) words: Vec<String>,
    /// Characters that could not be decoded.
    pub(super) broken: Count,
    /// Characters that control a device and are no text.
    pub(super) controls: Count,
    /// Texts that a cell cannot hold whole.
    pub(super) overlong: Count,
    /// Texts written as a formula that only gives a text.
    pub(super) unwrapped: Count,
    /// Rows in the table with fewer fields than usual.
    pub(super) short: Count,
    /// Zero characters, which are left out.
    pub(super) zeros: u64,
}

/// How many there are, and where the first stands.
#[derive(Debug, Default)]
pub(super) struct Count {
    pub(super) number: usize,
    pub(super) first: Option<CellRef>,
}

impl Count {
    fn add(&mut self, number: usize, cell: impl FnOnce() -> CellRef) {
        self.number += number;
        if number > 0 && self.first.is_none() {
            self.first = Some(cell());
        }
    }
}

/// The survey while it goes on.
pub(super) struct Surveyor {
    surveyed: Surveyed,
    dialect: Dialect,
    /// The first row with the usual number of fields, in which the table begins, has been seen.
    in_table: bool,
}

impl Surveyor {
    pub(super) fn new(path: &Path, dialect: Dialect) -> Self {
        let stem = path.file_stem().map(|stem| stem.to_string_lossy().into_owned()).unwrap_or_default();
        let sheet = SheetSurvey::unread(&free_sheet_name(stem.trim(), []), Visibility::Visible);
        let surveyed = Surveyed {
            sheet,
            first_fields: BTreeMap::new(),
            words: Vec::new(),
            broken: Count::default(),
            controls: Count::default(),
            overlong: Count::default(),
            unwrapped: Count::default(),
            short: Count::default(),
            zeros: 0,
        };
        Self { surveyed, dialect, in_table: false }
    }

    /// Takes note of a row.
    pub(super) fn note(&mut self, record: &Record) -> Result<(), LinesFault> {
        self.refuse_swallowed_rows(record)?;
        let row = u32::try_from(record.row).unwrap_or(LAST_ROW);
        if row < FIRST_ROWS {
            self.surveyed.first_fields.insert(row, record.fields);
        }
        self.in_table |= record.fields >= self.dialect.usual_fields;
        if self.in_table && record.fields < self.dialect.usual_fields && !record.is_blank() {
            let name = self.surveyed.sheet.name.clone();
            self.surveyed.short.add(1, || CellRef { sheet: name, row, column: 0 });
        }
        for (column, field) in (0u16..).zip(record.iter()).filter(|(_, field)| !field.is_empty()) {
            let sheet = &mut self.surveyed.sheet;
            sheet.used_columns = sheet.used_columns.max(column.saturating_add(1));
            sheet.last_row = row;
            self.note_field(row, column, field);
        }
        Ok(())
    }

    /// What the whole text holds.
    pub(super) fn finish(mut self, zeros: u64) -> Surveyed {
        self.surveyed.zeros = zeros;
        self.surveyed
    }

    fn note_field(&mut self, row: u32, column: u16, field: &str) {
        let surveyed = &mut self.surveyed;
        let name = surveyed.sheet.name.clone();
        let cell = || CellRef { sheet: name.clone(), row, column };
        // A text has at most as many UTF-16 units as bytes.
        if field.len() > LONGEST_TEXT && field.encode_utf16().count() > LONGEST_TEXT {
            surveyed.overlong.add(1, cell);
        }
        if field.starts_with('=') || field.starts_with(' ') {
            surveyed.unwrapped.add(usize::from(text_meant(field).is_some()), cell);
        }
        if field.bytes().all(|byte| (0x20..0x7F).contains(&byte)) {
            return;
        }
        surveyed.broken.add(field.matches('\u{FFFD}').count(), cell);
        let controls = |character: &char| character.is_control() && !matches!(character, '\t' | '\n');
        surveyed.controls.add(field.chars().filter(controls).count(), cell);
        if surveyed.words.len() < WORDS_SHOWN
            && let Some(word) = word_beyond_ascii(field)
            && !surveyed.words.contains(&word)
        {
            surveyed.words.push(word);
        }
    }

    /// Two stray quotation marks make one text of the rows between them.
    fn refuse_swallowed_rows(&self, record: &Record) -> Result<(), LinesFault> {
        let separators = self.dialect.usual_fields.saturating_sub(1);
        let Some(separator) = self.dialect.separator.filter(|_| separators >= SEPARATORS_OF_A_ROW) else {
            return Ok(());
        };
        for (field, line) in &record.of_several_lines {
            let is_row = |text: &str| text.bytes().filter(|byte| *byte == separator).count() == separators;
            if record.get(*field).lines().any(is_row) {
                return Err(LinesFault::Swallowed { row: record.row + 1, line: *line });
            }
        }
        Ok(())
    }
}

/// The first word with a character beyond ASCII, cut if it is long.
fn word_beyond_ascii(field: &str) -> Option<String> {
    let word = field.split_whitespace().find(|word| !word.is_ascii())?;
    let beyond = word.chars().position(|character| !character.is_ascii()).unwrap_or(0);
    let skipped = (beyond + 1).saturating_sub(LONGEST_WORD);
    Some(word.chars().skip(skipped).take(LONGEST_WORD).collect())
}
