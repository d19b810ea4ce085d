//! The Rulebooks sheet: every limit in force, its source and how it was checked.

use crate::quantity::format_number;
use crate::reasoning::limit_phrase;
use crate::report::{Entry, Table};
use crate::rules::{
    Checked, Combine, Criterion, Decides, Designation, DesignationPart, Guards, OnlyIf, RuleSet, Rulebook,
    Step, Test, Weight,
};
use crate::substance::Basis;
use crate::workbook::Look;

const COLUMNS: [(&str, f64); 12] = [
    ("Rulebook", 12.0),
    ("Criterion", 14.0),
    ("Step", 6.0),
    ("Weight", 12.0),
    ("Counts together", 22.0),
    ("Property", 28.0),
    ("Limit", 22.0),
    ("Bases that count", 30.0),
    ("Source", 60.0),
    ("Checked", 14.0),
    ("Edition", 12.0),
    ("Remark", 70.0),
];

/// Lays out the Rulebooks sheet.
pub fn rulebooks_table(rules: &RuleSet) -> Table {
    let mut rows = vec![COLUMNS.iter().map(|(header, _)| Entry::text(*header, Look::Header)).collect()];
    for rulebook in &rules.rulebooks {
        rows.push(heading(rulebook));
        for criterion in &rulebook.criteria {
            rows.extend(criterion_rows(rulebook, criterion));
        }
        rows.extend(rulebook.designations.iter().map(|designation| designation_row(rulebook, designation)));
    }
    Table {
        name: "Rulebooks",
        widths: COLUMNS.iter().map(|(_, width)| *width).collect(),
        frozen_rows: 1,
        rows,
    }
}

fn heading(rulebook: &Rulebook) -> Vec<Entry> {
    let mut remarks = Vec::new();
    if let Some(reference) = rulebook.half_life_at {
        remarks.push(format!(
            "Half-lives in water, sediment and soil are compared at {} °C (Arrhenius, {} kJ/mol); one without a test temperature clears only if it would had it been tested at {} °C.",
            format_number(reference.temperature),
            format_number(reference.activation_energy),
            format_number(reference.unstated_temperature)
        ));
    }
    if let Some(lipid) = rulebook.bcf_at_lipid {
        remarks.push(format!(
            "A BCF with a stated lipid content is compared at {} % lipid.",
            format_number(lipid)
        ));
    }
    if let Some(limit) = rulebook.mixture_limit {
        remarks.push(format!("In a mixture a component counts from {} %.", format_number(limit)));
    }
    if rulebook.strongest != Weight::Definitive {
        remarks.push(
            "The instrument leaves the decision to a review: no verdict is more than screening.".to_owned(),
        );
    }
    remarks.extend(rulebook.note.clone());
    let mut row = vec![
        Entry::text(rulebook.short.as_str(), Look::Title),
        Entry::text(rulebook.title.as_str(), Look::Title),
    ];
    row.extend((2..8).map(|_| Entry::text("", Look::Text)));
    row.push(Entry::text(rulebook.source.as_str(), Look::Wrapped));
    row.push(Entry::text("", Look::Text));
    row.push(Entry::text(rulebook.edition.to_string(), Look::Text));
    row.push(Entry::text(remarks.join(" "), Look::Wrapped));
    row
}

fn criterion_rows(rulebook: &Rulebook, criterion: &Criterion) -> Vec<Vec<Entry>> {
    if let Some(assess) = &criterion.assess {
        let mut row = lead(rulebook, criterion);
        row.extend((2..11).map(|_| Entry::text("", Look::Text)));
        row.push(Entry::text(assess.as_str(), Look::Wrapped));
        return vec![row];
    }
    let steps = criterion.steps.iter().zip(1u32..).flat_map(|(step, number)| {
        step.tests.iter().map(move |test| {
            let mut row = lead(rulebook, criterion);
            row.push(Entry::number(Some(f64::from(number)), Look::Text));
            row.push(Entry::text(weight_word(step.weight), Look::Text));
            row.push(Entry::text(combination(step), Look::Wrapped));
            row.extend(test_entries(rulebook, test, limit_phrase(test)));
            row
        })
    });
    let bands = criterion.bands.iter().map(|band| {
        let mut row = lead(rulebook, criterion);
        row.extend((2..5).map(|_| Entry::text("", Look::Text)));
        row.extend(test_entries(
            rulebook,
            &band.test,
            format!("{}: {}", band.rating, limit_phrase(&band.test)),
        ));
        row
    });
    steps.chain(bands).collect()
}

fn lead(rulebook: &Rulebook, criterion: &Criterion) -> Vec<Entry> {
    vec![Entry::text(rulebook.short.as_str(), Look::Text), Entry::text(criterion.id.as_str(), Look::Text)]
}

fn test_entries(rulebook: &Rulebook, test: &Test, limit: String) -> Vec<Entry> {
    let bases: Vec<&str> = test.bases.iter().map(|basis| basis.word()).collect();
    let bases = if bases.len() == Basis::ALL.len() { "any".to_owned() } else { bases.join(", ") };
    let mut remarks: Vec<String> = test.note.clone().into_iter().collect();
    if let (Some(guideline), Some(within)) = (&test.guideline, test.within) {
        remarks.push(format!("By {guideline} within {} d.", format_number(within)));
    }
    if test.optional {
        remarks.push("Its absence does not keep the step from being clear.".to_owned());
    }
    if let Some(clear_below) = test.clear_below {
        remarks.push(format!("Clear below {} only.", format_number(clear_below)));
    }
    if test.checked == Checked::Memory {
        remarks.push("From memory: check the current text before relying on this.".to_owned());
    }
    vec![
        Entry::text(test.subject.title(), Look::Text),
        Entry::text(limit, Look::Wrapped),
        Entry::text(bases, Look::Wrapped),
        Entry::text(test.source.as_str(), Look::Wrapped),
        Entry::text(test.checked.word(), Look::Text),
        Entry::text(rulebook.edition.to_string(), Look::Text),
        Entry::text(remarks.join(" "), Look::Wrapped),
    ]
}

fn weight_word(weight: Weight) -> &'static str {
    match weight {
        Weight::Definitive => "definitive",
        Weight::Screening => "screening",
        Weight::Concern => "concern",
        Weight::Supporting => "supporting",
    }
}

fn combination(step: &Step) -> String {
    let mut words = vec![match step.combine {
        Combine::Any => "any one",
        Combine::All => "all together",
    }];
    match step.decides {
        Decides::Both => {}
        Decides::In => words.push("decides towards concern only"),
        Decides::Out => words.push("decides away from concern only"),
    }
    match step.guards {
        Guards::Never => {}
        Guards::Fired => words.push("stops clearing when met"),
        Guards::FiredOrOpen => words.push("stops clearing when met or not known"),
    }
    match step.only_if {
        OnlyIf::Always => {}
        OnlyIf::NoDataBefore => words.push("only without data before"),
    }
    words.join("; ")
}

fn designation_row(rulebook: &Rulebook, designation: &Designation) -> Vec<Entry> {
    let parts: Vec<&str> = designation
        .parts
        .iter()
        .filter_map(|part| match *part {
            DesignationPart::Criterion(index) => {
                rulebook.criteria.get(index).map(|criterion| criterion.id.as_str())
            }
            DesignationPart::Designation(index) => {
                rulebook.designations.get(index).map(|designation| designation.id.as_str())
            }
        })
        .collect();
    let joined = match designation.combine {
        Combine::All => parts.join(" and "),
        Combine::Any => parts.join(" or "),
    };
    let mut remark = format!("{}: {joined}.", designation.title);
    if !designation.stated_by.is_empty() {
        let codes = designation.stated_by.join(" or ");
        remark = format!("{remark} Fulfilled as stated where the row carries {codes}.");
    }
    let mut row = vec![
        Entry::text(rulebook.short.as_str(), Look::Text),
        Entry::text(designation.id.as_str(), Look::Text),
    ];
    row.extend((2..11).map(|_| Entry::text("", Look::Text)));
    row.push(Entry::text(remark, Look::Wrapped));
    row
}
