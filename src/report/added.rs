//! The columns right of the user's last one.

use crate::fault::CellFault;
use crate::judge::{Headline, Verdict};
use crate::reasoning::{
    Book, Told, cautions_text, deciding_text, headline, headline_verdict, log_kow_cells, verdict_text, why,
    with_closeness,
};
use crate::report::Entry;
use crate::rules::{RuleSet, Rulebook};
use crate::workbook::{Look, Shade};

/// The headers of the added columns, their widths, and which of them are folded away.
#[derive(Debug, Clone, PartialEq)]
pub struct AddedColumns {
    /// Headers, with ` (screened)` where the user has one of the same name.
    pub headers: Vec<String>,
    /// Widths, in characters.
    pub widths: Vec<f64>,
    /// First and last of each folded group, counted from the first added column.
    pub folded: Vec<(usize, usize)>,
}

const ASSESSOR: [(&str, f64); 4] =
    [("Assessor verdict", 18.0), ("Assessor reason", 30.0), ("Assessor", 14.0), ("Assessed on", 12.0)];

/// Lays out the added columns for a rule set, beside headers that the user already has.
pub fn added_columns(rules: &RuleSet, taken: &[String]) -> AddedColumns {
    let mut added = AddedColumns { headers: Vec::new(), widths: Vec::new(), folded: Vec::new() };
    let mut push = |header: String, width: f64| {
        added.headers.push(free_header(header, taken));
        added.widths.push(width);
        added.headers.len() - 1
    };
    push("log Kow used".into(), 10.0);
    push("log Kow SD".into(), 9.0);
    push("log Kow basis".into(), 14.0);
    let mut folded = Vec::new();
    for rulebook in &rules.rulebooks {
        push(rulebook.short.clone(), headline_width(rulebook));
        push(format!("{} why", rulebook.short), 60.0);
        let places: Vec<usize> =
            parts(rulebook).map(|id| push(format!("{} {id}", rulebook.short), 20.0)).collect();
        folded.extend(places.first().copied().zip(places.last().copied()));
    }
    push("Cautions".into(), 70.0);
    push("Deciding data".into(), 70.0);
    for (header, width) in ASSESSOR {
        push(header.into(), width);
    }
    AddedColumns { folded, ..added }
}

/// Room for the longest headline: a designation and `unresolved (close call)`.
fn headline_width(rulebook: &Rulebook) -> f64 {
    let longest = parts(rulebook).map(|id| id.chars().count()).max().unwrap_or(0);
    f64::from(u8::try_from(longest).unwrap_or(u8::MAX)) + 27.0
}

fn parts(rulebook: &Rulebook) -> impl Iterator<Item = &str> {
    let criteria = rulebook.criteria.iter().map(|criterion| criterion.id.as_str());
    criteria.chain(rulebook.designations.iter().map(|designation| designation.id.as_str()))
}

fn free_header(header: String, taken: &[String]) -> String {
    let is_taken = |header: &str| taken.iter().any(|other| other.trim().eq_ignore_ascii_case(header));
    if !is_taken(&header) {
        return header;
    }
    let mut free = format!("{header} (screened)");
    let mut number = 2_u32;
    while is_taken(&free) {
        free = format!("{header} (screened {number})");
        number = number.saturating_add(1);
    }
    free
}

/// The added cells of one row, in the order of the headers.
pub fn added_entries(told: Told, faults: &[CellFault]) -> Vec<Entry> {
    let log_kow = log_kow_cells(told);
    let mut entries = vec![
        match log_kow.number {
            Some(number) => Entry::number(Some(number), Look::Number),
            None => Entry::text(log_kow.text, Look::Text),
        },
        Entry::number(log_kow.sd, Look::TwoDecimals),
        Entry::text(log_kow.basis, Look::Text),
    ];
    for book in told.books() {
        entries.push(Entry::text(headline(book), Look::Verdict(headline_shade(book))));
        entries.push(Entry::text(why(book), Look::Wrapped));
        entries.extend(book.criteria().map(|(criterion, judged)| {
            Entry::text(verdict_text(criterion, judged), Look::Verdict(shade(judged.verdict)))
        }));
        entries.extend(book.judged.designations.iter().map(|judged| {
            let words = with_closeness(judged.verdict, judged.closeness);
            Entry::text(words, Look::Verdict(shade(judged.verdict)))
        }));
    }
    entries.push(Entry::text(cautions_and_faults(told, faults), Look::Aside));
    entries.push(Entry::text(deciding_text(told), Look::Aside));
    entries.extend(ASSESSOR.map(|_| Entry::text("", Look::Text)));
    entries
}

/// The added cells of a row that is not screened: why, among the cautions.
pub fn unscreened_entries(columns: &AddedColumns, why: &str) -> Vec<Entry> {
    let cautions = columns.headers.len().saturating_sub(ASSESSOR.len() + 2);
    let mut entries = vec![Entry::text("", Look::Text); cautions];
    entries.push(Entry::text(format!("not screened: {why}"), Look::Aside));
    entries
}

fn cautions_and_faults(told: Told, faults: &[CellFault]) -> String {
    let mut parts = Vec::new();
    let cautions = cautions_text(told);
    if !cautions.is_empty() {
        parts.push(cautions);
    }
    parts.extend(faults.iter().map(|fault| format!("not read: {fault}")));
    parts.join("; ")
}

fn headline_shade(book: Book) -> Shade {
    match book.judged.headline {
        Headline::Listed(_) => Shade::Listed,
        Headline::Designation(_) | Headline::Criterion(_) => {
            headline_verdict(book).map_or(Shade::NoData, shade)
        }
    }
}

/// The depth in which a verdict is shown.
pub(crate) fn shade(verdict: Verdict) -> Shade {
    match verdict {
        Verdict::Fulfilled => Shade::Fulfilled,
        Verdict::ScreensIn => Shade::ScreensIn,
        Verdict::Unresolved => Shade::Unresolved,
        Verdict::NoData => Shade::NoData,
        Verdict::ScreensOut => Shade::ScreensOut,
        Verdict::NotFulfilled => Shade::NotFulfilled,
        Verdict::OutOfScope => Shade::OutOfScope,
    }
}
