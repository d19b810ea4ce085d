//! The very hidden Record sheet: what a later run needs in order to compare.

use std::fmt::Write as _;

use crate::quantity::{Unit, format_interval};
use crate::reasoning::{Told, verdict_text, with_closeness};
use crate::report::Entry;
use crate::rules::RuleSet;
use crate::workbook::Look;

/// The name of the very hidden sheet.
pub const RECORD_SHEET: &str = "Record";

/// What its first cell holds.
pub const RECORD_MARK: &str = "format";

/// The number of the Record's format.
pub const RECORD_FORMAT: u32 = 1;

/// Spreadsheets hold up to 32,767 characters a cell; rule texts are cut well below.
const CHARACTERS_A_CELL: usize = 30_000;

/// The rows before the substances: format, version, rule texts, spans of the added columns.
pub fn record_head(rules: &RuleSet, spans: &[(String, u32, u16, Vec<String>)]) -> Vec<Vec<Entry>> {
    let text = |text: &str| Entry::text(text, Look::Text);
    let mut rows = vec![
        vec![text(RECORD_MARK), Entry::number(Some(f64::from(RECORD_FORMAT)), Look::Text)],
        vec![text("version"), text(env!("CARGO_PKG_VERSION"))],
    ];
    for rule in &rules.texts {
        let characters: Vec<char> = rule.text.chars().collect();
        let mut row = vec![text("rules"), text(&rule.name)];
        row.extend(characters.chunks(CHARACTERS_A_CELL).map(|chunk| text(&chunk.iter().collect::<String>())));
        rows.push(row);
    }
    for (sheet, header_row, first_column, headers) in spans {
        rows.push(vec![
            text("span"),
            text(sheet),
            Entry::number(Some(f64::from(header_row + 1)), Look::Text),
            Entry::number(Some(f64::from(*first_column)), Look::Text),
            text(&headers.join("\n")),
        ]);
    }
    rows
}

/// The line of one substance: identity, used values with basis, verdicts.
pub fn record_entries(told: Told) -> Vec<Entry> {
    let substance = told.substance;
    let text = |text: String| Entry::text(text, Look::Text);
    let own = |value: Option<String>| text(value.unwrap_or_default());
    vec![
        text("substance".to_owned()),
        text(substance.sheet.to_string()),
        Entry::number(Some(f64::from(substance.row + 1)), Look::Text),
        own(substance.cas.as_ref().map(|cas| cas.value.to_string())),
        own(substance.ec.as_ref().map(|ec| ec.value.to_string())),
        own(substance.row_id.as_ref().map(|id| id.value.clone())),
        own(substance.name.as_ref().map(|name| name.value.clone())),
        text(values(told)),
        text(verdicts(told)),
    ]
}

fn values(told: Told) -> String {
    let mut text = String::new();
    for evidence in told.evidence.iter() {
        let value = format_interval(evidence.interval, Unit::One);
        let _ = writeln!(text, "{}\t{value}\t{}", evidence.property.id(), evidence.basis.word());
    }
    text
}

fn verdicts(told: Told) -> String {
    let mut text = String::new();
    for book in told.books() {
        for (criterion, judged) in book.criteria() {
            let _ =
                writeln!(text, "{}\t{}\t{}", book.rulebook.id, criterion.id, verdict_text(criterion, judged));
        }
        for (designation, judged) in book.rulebook.designations.iter().zip(&book.judged.designations) {
            let words = with_closeness(judged.verdict, judged.closeness);
            let _ = writeln!(text, "{}\t{}\t{words}", book.rulebook.id, designation.id);
        }
    }
    text
}
