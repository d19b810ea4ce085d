//! What the terminal shows: summaries on stdout, faults and refusals on stderr. The only place that prints.

use std::io::{self, Write};

use kowledger::fault::{Refusal, count};
use kowledger::judge::Verdict;
use kowledger::rules::RulebookSummary;
use kowledger::run::{RecognisedSheet, Summary};

use crate::listing::columns_listing;

/// Different faults that are shown, a sentence each; the total by kind follows.
const FAULTS_SHOWN: usize = 20;

/// How much a run says.
pub(crate) struct Console {
    quiet: bool,
}

impl Console {
    pub(crate) fn new(quiet: bool) -> Self {
        Self { quiet }
    }

    /// What came out of a run.
    pub(crate) fn summary(&self, summary: &Summary) {
        show_faults(summary);
        let remarks: Vec<String> =
            summary.column_remarks.iter().map(|remark| format!("Columns of {remark}")).collect();
        let unrecognised = summary.unrecognised.iter().map(|sentence| format!("Columns of {sentence}"));
        let remarks: Vec<String> = remarks.into_iter().chain(unrecognised).collect();
        if self.quiet {
            // A remark may mean that data were left aside.
            print_error(&remarks);
            return;
        }
        let mut lines = vec![format!(
            "Screened {} on {}; {} copied.",
            count(summary.screened, "row", "rows"),
            count(summary.sheets.0, "sheet", "sheets"),
            count(summary.sheets.1, "other sheet", "other sheets")
        )];
        lines.extend(summary.headlines.iter().map(|(short, counts, listed)| {
            let mut parts: Vec<String> = Verdict::ALL
                .iter()
                .filter_map(|verdict| {
                    counts.get(verdict).map(|number| format!("{number} {}", verdict.words()))
                })
                .collect();
            if *listed > 0 {
                parts.insert(0, format!("{listed} listed"));
            }
            format!("  {short}: {}", parts.join(", "))
        }));
        lines.extend(summary.hidden.iter().cloned());
        lines.extend(summary.how_read.iter().cloned());
        lines.extend(summary.rows_aside.iter().cloned());
        lines.extend(remarks);
        let repeated = summary.conflicts.repeated();
        if !repeated.is_empty() {
            let sheet = &summary.conflicts_sheet;
            lines.push(format!("{}; the sheet `{sheet}` says where they differ.", repeated.join("; ")));
        }
        if !summary.unreached.is_empty() {
            lines.push(format!("No row had a value for: {}.", summary.unreached.join("; ")));
        }
        lines.extend(summary.not_carried.iter().cloned());
        lines.push(format!("Written: {}", summary.output.display()));
        lines.push(
            "A screening, not a decision: unresolved and no data are open questions, and a qualified person must confirm every verdict."
                .to_owned(),
        );
        print(&lines);
    }
}

fn show_faults(summary: &Summary) {
    let mut lines = summary.tally.lines(FAULTS_SHOWN, &summary.conflicts_sheet);
    lines.extend(summary.unscreened.iter().map(|(sheet, header, left)| {
        format!(
            "{sheet}: {} not screened, below the header of another table in row {header}.",
            count(*left, "row was", "rows were")
        )
    }));
    lines.extend(summary.without_rows.iter().cloned());
    print_error(&lines);
}

/// Why nothing was written.
pub(crate) fn refuse(refusal: &Refusal) {
    print_error(&[refusal.to_string()]);
}

/// What was recognised on each sheet, and why.
pub(crate) fn columns(sheets: &[RecognisedSheet]) {
    print(&columns_listing(sheets));
}

/// The built-in rulebooks.
pub(crate) fn rulebooks(summaries: &[RulebookSummary]) {
    let lines: Vec<String> = summaries.iter().map(rulebook_line).collect();
    print(&lines);
}

/// Rule files that are in order.
pub(crate) fn checked(summaries: &[RulebookSummary]) {
    let mut lines: Vec<String> = summaries.iter().map(rulebook_line).collect();
    lines.push(format!("{} in order.", count(summaries.len(), "rulebook is", "rulebooks are")));
    print(&lines);
}

fn rulebook_line(summary: &RulebookSummary) -> String {
    format!(
        "{:<32}{:<12}{}, edition {}: {}; limits seen {}, second-hand {}, from memory {}",
        summary.id,
        summary.short,
        summary.title,
        summary.edition,
        count(summary.criteria, "criterion", "criteria"),
        summary.seen,
        summary.second_hand,
        summary.memory
    )
}

/// A reader that went away is no fault of ours.
fn print(lines: &[String]) {
    let mut out = io::stdout().lock();
    for line in lines {
        if writeln!(out, "{line}").is_err() {
            return;
        }
    }
}

fn print_error(lines: &[String]) {
    let mut out = io::stderr().lock();
    for line in lines {
        if writeln!(out, "{line}").is_err() {
            return;
        }
    }
}
