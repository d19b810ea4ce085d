//! The Run record: what was read, with what, and what was left out.

use crate::columns::Recognised;
use crate::fault::ConflictCounts;
use crate::quantity::{Date, format_number};
use crate::report::{CAUTIONS_OF_USE, Entry, Table};
use crate::rules::RuleSet;
use crate::workbook::{Look, column_letters};

/// What is known of a run when its rows are done.
#[derive(Debug, Clone, PartialEq)]
pub struct RunFacts {
    /// The day of the run.
    pub date: Date,
    /// The inventory's file name, without its folder.
    pub inventory: String,
    /// SHA-256 of the inventory.
    pub fingerprint: String,
    /// Options that can change a cell, as `name`, `value`.
    pub options: Vec<(&'static str, String)>,
    /// SHA-256 of each rule file: name and fingerprint.
    pub rule_fingerprints: Vec<(String, String)>,
    /// The sheets, in order.
    pub sheets: Vec<SheetFacts>,
    /// How the file was read where it does not say so itself, in sentences.
    pub how_read: Vec<String>,
    /// Which rows were left aside, in sentences.
    pub rows_aside: Vec<String>,
    /// What could not be carried over.
    pub not_carried: Vec<String>,
    /// Which lines the Reasoning sheet holds, in words.
    pub reasoning: String,
    /// How many cells could not be read or used, by kind.
    pub fault_kinds: Vec<(&'static str, usize)>,
    /// What the Conflicts sheet counts.
    pub conflicts: ConflictCounts,
    /// The name of that sheet in the output.
    pub conflicts_sheet: String,
}

/// One sheet of the inventory.
#[derive(Debug, Clone, PartialEq)]
pub struct SheetFacts {
    /// Its name.
    pub name: String,
    /// Its tab is not shown.
    pub hidden: bool,
    /// Rows that were screened.
    pub screened: usize,
    /// The row of another table's header, counted from 0, and how many rows were left aside below it.
    pub unscreened: Option<(u32, usize)>,
    /// What its columns hold; none where it was copied only.
    pub recognised: Option<Recognised>,
    /// Why it was copied only.
    pub copied_because: String,
}

/// Lays out the Run record.
pub fn run_record_table(facts: &RunFacts, rules: &RuleSet) -> Table {
    let mut rows = vec![title("Run record")];
    rows.push(pair("Screened with", format!("kowledger {}", env!("CARGO_PKG_VERSION"))));
    rows.push(pair("Date of the run", facts.date.to_string()));
    rows.push(pair("Inventory", facts.inventory.clone()));
    rows.push(pair("SHA-256 of the inventory", facts.fingerprint.clone()));
    rows.extend(facts.how_read.iter().map(|text| pair("How it was read", text.clone())));
    rows.extend(facts.rows_aside.iter().map(|text| pair("Rows left aside", text.clone())));
    rows.extend(facts.options.iter().map(|(name, value)| pair(name, value.clone())));
    rows.push(pair("Reasoning sheet", facts.reasoning.clone()));
    rows.push(pair(
        "Hidden sheet",
        "A very hidden sheet `Record` keeps the rule texts, values and verdicts for a later comparison."
            .to_owned(),
    ));
    rows.push(title("Cautions of use"));
    rows.extend(CAUTIONS_OF_USE.iter().map(|sentence| pair("", (*sentence).to_owned())));
    rows.push(title("Rulebooks applied"));
    rows.extend(rules.rulebooks.iter().map(|rulebook| {
        pair(
            &rulebook.short,
            format!("{} — {}, edition {}", rulebook.title, rulebook.source, rulebook.edition),
        )
    }));
    rows.extend(error_rows(rules));
    rows.push(title("SHA-256 of the rule files"));
    rows.extend(facts.rule_fingerprints.iter().map(|(name, hash)| pair(name, hash.clone())));
    for sheet in &facts.sheets {
        rows.extend(sheet_rows(sheet));
    }
    rows.push(title("Not carried over"));
    if facts.not_carried.is_empty() {
        rows.push(pair("", "Nothing was found that is not carried over.".to_owned()));
    }
    rows.extend(facts.not_carried.iter().map(|text| pair("", text.clone())));
    rows.extend(fault_rows(facts));
    rows.push(title("Lists not consulted"));
    rows.push(pair("", lists_not_consulted(rules)));
    Table { name: "Run record", widths: vec![40.0, 120.0], frozen_rows: 0, rows }
}

fn lists_not_consulted(rules: &RuleSet) -> String {
    let lists: Vec<&str> = rules
        .rulebooks
        .iter()
        .flat_map(|rulebook| &rulebook.listings)
        .map(|listing| listing.title.as_str())
        .collect();
    let consulted = if lists.is_empty() {
        "No list of named substances was consulted".to_owned()
    } else {
        format!("Only these lists of named substances were consulted: {}", lists.join(", "))
    };
    format!(
        "{consulted}. Candidate and authorisation lists, annexes of treaties, harmonised classifications and national inventories have to be looked up separately."
    )
}

/// The standard deviations behind `close call` and `chance`, where the row gives none with `±`.
fn error_rows(rules: &RuleSet) -> Vec<Vec<Entry>> {
    let mut rows =
        vec![title("Standard deviations of values that state none, log units; errors are taken as normal")];
    rows.extend(rules.relations.default_sds.iter().map(|line| {
        let bases: Vec<&str> = line.bases.iter().map(|basis| basis.word()).collect();
        let above = line.above.map_or(String::new(), |above| format!(" above {}", format_number(above)));
        let property = if line.property == "any" { "any other" } else { line.property.as_str() };
        let bases = if bases.is_empty() { String::new() } else { format!(", {}", bases.join(" or ")) };
        pair(&format!("{property}{above}{bases}"), format!("{} ({})", format_number(line.sd), line.source))
    }));
    rows
}

fn sheet_rows(sheet: &SheetFacts) -> Vec<Vec<Entry>> {
    let mut rows = vec![title(&format!("Sheet: {}", sheet.name))];
    if sheet.hidden {
        let done = if sheet.recognised.is_some() { "screened" } else { "copied" };
        rows.push(pair(
            "Hidden",
            format!("The sheet is hidden in the inventory; it was {done} and is hidden here."),
        ));
    }
    let Some(recognised) = &sheet.recognised else {
        rows.push(pair("Copied only", sheet.copied_because.clone()));
        return rows;
    };
    let none = if sheet.screened == 0 { "; no row below the header holds a substance" } else { "" };
    rows.push(pair("Rows screened", format!("{}{none}", sheet.screened)));
    if let Some((header, left)) = sheet.unscreened {
        let why = format!("{left}; they stand below the header of another table in row {}", header + 1);
        rows.push(pair("Rows not screened", why));
    }
    rows.push(header_entry(recognised.header_top + 1, recognised.header_row + 1));
    rows.extend(column_rows(recognised));
    rows.extend(recognised.remarks.iter().map(|remark| {
        let remark =
            remark.strip_prefix(&sheet.name).and_then(|rest| rest.strip_prefix(": ")).unwrap_or(remark);
        pair("To look at", remark.to_owned())
    }));
    rows
}

/// The columns in the order of the sheet, used or not.
fn column_rows(recognised: &Recognised) -> Vec<Vec<Entry>> {
    let known = recognised.columns.iter().map(|column| {
        (column.index, column.header.as_str(), format!("{}; {}", column.field.id(), column.reason))
    });
    let unknown = recognised.unknown.iter().map(|(index, header)| {
        let why = recognised.not_taken.get(index).map_or("header not recognised", String::as_str);
        (*index, header.as_str(), format!("not used, only carried along: {why}"))
    });
    let mut columns: Vec<(u16, &str, String)> = known.chain(unknown).collect();
    columns.sort_by_key(|(index, ..)| *index);
    columns
        .into_iter()
        .map(|(index, header, said)| {
            let header = header.split_whitespace().collect::<Vec<_>>().join(" ");
            pair(&format!("{} {header}", column_letters(index)), said)
        })
        .collect()
}

/// The row of the header, or those read together.
fn header_entry(top: u32, lowest: u32) -> Vec<Entry> {
    match lowest.saturating_sub(top) {
        0 => pair("Header in row", lowest.to_string()),
        1 => pair("Header in rows", format!("{top} and {lowest}, read together")),
        _ => pair("Header in rows", format!("{top} to {lowest}, read together")),
    }
}

fn fault_rows(facts: &RunFacts) -> Vec<Vec<Entry>> {
    let ConflictCounts { cells, .. } = facts.conflicts;
    let mut rows = vec![title(&format!("Cells that could not be read or used: {cells}"))];
    rows.extend(facts.fault_kinds.iter().map(|(kind, number)| pair(kind, number.to_string())));
    if cells > 0 {
        let where_listed = format!(
            "The sheet {} says cell by cell what to do; each also stands in the Cautions cell of its row.",
            facts.conflicts_sheet
        );
        rows.push(pair("", where_listed));
    }
    let repeated = facts.conflicts.repeated();
    if !repeated.is_empty() {
        rows.push(title("Rows that share a number or a name"));
        rows.extend(repeated.into_iter().map(|phrase| pair("", format!("{phrase}."))));
        rows.push(pair("", format!("The sheet {} says where they differ.", facts.conflicts_sheet)));
    }
    rows
}

fn title(text: &str) -> Vec<Entry> {
    vec![Entry::text(text, Look::Title)]
}

fn pair(name: &str, value: String) -> Vec<Entry> {
    vec![Entry::text(name, Look::Wrapped), Entry::text(value, Look::Wrapped)]
}
