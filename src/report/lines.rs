//! The Reasoning sheet: a line per row, rulebook and criterion.

use crate::judge::Verdict;
use crate::quantity::format_number;
use crate::reasoning::{Told, criterion_line};
use crate::report::Entry;
use crate::report::added::shade;
use crate::workbook::Look;

/// Which lines the Reasoning sheet holds.
#[derive(Debug, Clone, Copy, PartialEq, Eq)]
pub enum ReasoningMode {
    /// All.
    All,
    /// Those at `unresolved` or above.
    Concern,
    /// None.
    None,
}

/// Headers and widths of the Reasoning sheet.
pub const REASONING_COLUMNS: [(&str, f64); 19] = [
    ("Sheet", 14.0),
    ("Row", 7.0),
    ("CAS number", 13.0),
    ("Name", 28.0),
    ("Rulebook", 12.0),
    ("Criterion", 17.0),
    ("Verdict", 24.0),
    ("Value", 16.0),
    ("Unit", 8.0),
    ("SD (log units)", 9.0),
    ("Basis", 14.0),
    ("Origin", 26.0),
    ("Limit", 16.0),
    ("Beyond the limit by (log units)", 12.0),
    ("Chance beyond the limit", 10.0),
    ("Reasoning", 90.0),
    ("Cautions that stopped a clear", 20.0),
    ("Source of the limit", 40.0),
    ("Would settle it", 30.0),
];

/// The lines of one row.
pub fn reasoning_entries(told: Told, mode: ReasoningMode) -> Vec<Vec<Entry>> {
    let mut lines = Vec::new();
    for book in told.books() {
        for (criterion, judged) in book.criteria() {
            let shown = match mode {
                ReasoningMode::All => true,
                ReasoningMode::Concern => judged.verdict >= Verdict::Unresolved,
                ReasoningMode::None => false,
            };
            if !shown {
                continue;
            }
            let line = criterion_line(book, criterion, judged);
            let substance = told.substance;
            lines.push(vec![
                Entry::text(substance.sheet.to_string(), Look::Text),
                Entry::number(Some(f64::from(substance.row + 1)), Look::Text),
                Entry::text(
                    substance.cas.as_ref().map_or(String::new(), |cas| cas.value.to_string()),
                    Look::Text,
                ),
                Entry::text(substance.name.as_ref().map_or("", |name| name.value.as_str()), Look::Text),
                Entry::text(book.rulebook.short.as_str(), Look::Text),
                Entry::text(criterion.id.as_str(), Look::Text),
                Entry::text(line.verdict, Look::Verdict(shade(judged.verdict))),
                match line.number {
                    Some(number) => Entry::number(Some(as_shown(number)), Look::Number),
                    None => Entry::text(line.value, Look::Wrapped),
                },
                Entry::text(line.unit, Look::Text),
                Entry::number(line.sd, Look::TwoDecimals),
                Entry::text(line.basis, Look::Text),
                Entry::text(line.origin, Look::Wrapped),
                Entry::text(line.limit, Look::Wrapped),
                Entry::number(line.margin, Look::TwoDecimals),
                chance_entry(line.chance),
                Entry::text(line.sentence, Look::Wrapped),
                Entry::text(line.cautions, Look::Wrapped),
                Entry::text(line.source, Look::Wrapped),
                Entry::text(line.would_settle, Look::Wrapped),
            ]);
        }
    }
    lines
}

/// A chance; near its ends in words, because no value is certain.
fn chance_entry(chance: Option<f64>) -> Entry {
    match chance {
        Some(chance) if chance < 0.01 => Entry::text("< 0.01", Look::Text),
        Some(chance) if chance > 0.99 => Entry::text("> 0.99", Look::Text),
        Some(_) | None => Entry::number(chance, Look::TwoDecimals),
    }
}

/// A number to the four significant digits that sentences show; what was compared had them all.
fn as_shown(number: f64) -> f64 {
    format_number(number).parse().unwrap_or(number)
}
