//! What is added to the user's workbook, laid out: the columns beside their data and the sheets after theirs.
//!
//! It arranges what [`judge`](crate::judge) decided and [`reasoning`](crate::reasoning) worded; it decides and words no
//! verdict.

mod added;
mod cautions_of_use;
mod conflicts;
mod lines;
mod record;
mod rulebooks;
mod run_record;

pub use added::{AddedColumns, added_columns, added_entries, unscreened_entries};
pub use cautions_of_use::CAUTIONS_OF_USE;
pub use conflicts::{CONFLICT_COLUMNS, ConflictLine, RowName, conflict_entries};
pub use lines::{REASONING_COLUMNS, ReasoningMode, reasoning_entries};
pub use record::{RECORD_FORMAT, RECORD_MARK, RECORD_SHEET, record_entries, record_head};
pub use rulebooks::rulebooks_table;
pub use run_record::{RunFacts, SheetFacts, run_record_table};

use crate::workbook::{CellRef, Look};

/// One cell that we add.
#[derive(Debug, Clone, PartialEq)]
pub struct Entry {
    /// What it holds.
    pub content: EntryContent,
    /// How it looks.
    pub look: Look,
}

/// What an added cell holds.
#[derive(Debug, Clone, PartialEq)]
pub enum EntryContent {
    /// Nothing.
    Empty,
    /// Text.
    Text(String),
    /// A number.
    Number(f64),
    /// A cell of the workbook, shown without its sheet, to click on.
    Link(CellRef),
}

impl Entry {
    /// A text.
    pub fn text(text: impl Into<String>, look: Look) -> Self {
        let text = text.into();
        let content = if text.is_empty() { EntryContent::Empty } else { EntryContent::Text(text) };
        Self { content, look }
    }

    /// A cell to click on.
    pub fn link(cell: CellRef) -> Self {
        Self { content: EntryContent::Link(cell), look: Look::Link }
    }

    /// A number, or nothing.
    pub fn number(number: Option<f64>, look: Look) -> Self {
        Self { content: number.map_or(EntryContent::Empty, EntryContent::Number), look }
    }
}

/// A sheet of ours that is small enough to lay out whole.
#[derive(Debug, Clone, PartialEq)]
pub struct Table {
    /// The sheet's name, before a clash with the user's names is settled.
    pub name: &'static str,
    /// Widths of its columns, in characters.
    pub widths: Vec<f64>,
    /// Rows that stay in view.
    pub frozen_rows: u32,
    /// Its rows.
    pub rows: Vec<Vec<Entry>>,
}
