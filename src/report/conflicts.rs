//! The Conflicts sheet: a line for every cell that could not be read and for every row that stands apart.

use crate::fault::Wording;
use crate::report::Entry;
use crate::workbook::{CellRef, Look};

/// Headers and widths of the Conflicts sheet.
pub const CONFLICT_COLUMNS: [(&str, f64); 10] = [
    ("Sheet", 14.0),
    ("Cell", 9.0),
    ("Row id", 12.0),
    ("Name", 28.0),
    ("CAS or EC number", 14.0),
    ("Column", 24.0),
    ("Kind", 32.0),
    ("Found", 24.0),
    ("What is wrong", 60.0),
    ("What to do", 60.0),
];

/// What a row is called.
#[derive(Debug, Clone, PartialEq, Eq, Default)]
pub struct RowName {
    /// The user's own number.
    pub row_id: String,
    /// The name.
    pub name: String,
    /// The CAS number, or the EC number where there is none.
    pub number: String,
}

/// One line of the Conflicts sheet.
#[derive(Debug, Clone, Copy)]
pub struct ConflictLine<'run> {
    /// The cell, on the sheet as it is named in the output.
    pub cell: &'run CellRef,
    /// The row, if it has a name.
    pub row: Option<&'run RowName>,
    /// The header of the column, empty where the line is not about one.
    pub header: &'run str,
    /// The text as found, short.
    pub found: &'run str,
    /// What is said of it.
    pub wording: &'run Wording,
}

/// The entries of a line, in the order of the columns. `sentences` is the look of the two long ones.
pub fn conflict_entries(line: &ConflictLine, sentences: Look) -> Vec<Entry> {
    let text = |text: &str| Entry::text(text, Look::Text);
    let row = line.row.cloned().unwrap_or_default();
    let Wording { title, wrong, remedy } = line.wording;
    vec![
        text(&line.cell.sheet),
        Entry::link(line.cell.clone()),
        text(&row.row_id),
        text(&row.name),
        text(&row.number),
        text(&line.header.split_whitespace().collect::<Vec<_>>().join(" ")),
        text(title),
        text(line.found),
        Entry::text(sentence(wrong), sentences),
        Entry::text(sentence(remedy), sentences),
    ]
}

/// A capital at the start and a stop at the end.
fn sentence(text: &str) -> String {
    let mut characters = text.chars();
    let Some(first) = characters.next() else {
        return String::new();
    };
    let stop = if text.ends_with(['.', '?', '!']) { "" } else { "." };
    format!("{}{}{stop}", first.to_uppercase(), characters.as_str())
}

#[cfg(test)]
mod tests {
    use super::sentence;

    #[test]
    fn a_sentence_starts_with_a_capital_and_ends_with_one_stop() {
        assert_eq!(sentence("write `40 d`"), "Write `40 d`.");
        assert_eq!(sentence("did you mean `weeks`?"), "Did you mean `weeks`?");
        assert_eq!(sentence("`x` is no log Kow."), "`x` is no log Kow.");
        assert_eq!(sentence(""), "");
    }
}
