//! One test of a step or band: a property, the bases that count, a limit and its source.

use std::collections::BTreeSet;

use super::limit::{LIMIT_KEYS, Measured, quantity, read_limit};
use super::{CHECKED, written_text};
use crate::fault::RuleMistake;
use crate::quantity::Dimension;
use crate::rules::file::Section;
use crate::rules::{Limit, Subject, Test, WhenMissing};
use crate::substance::{Basis, Property};

const OTHER_KEYS: [&str; 10] = [
    "property",
    "basis",
    "clear-below",
    "guideline",
    "within",
    "optional",
    "missing",
    "source",
    "checked",
    "note",
];

const DAYS: Measured = Measured::new("the length of a test", Dimension::Time);

/// Every subject a test may have.
pub(crate) fn subjects() -> Vec<(&'static str, Subject)> {
    Property::ALL
        .into_iter()
        .map(Subject::Property)
        .chain([Subject::ReadyBiodegradability, Subject::InherentBiodegradability, Subject::HazardStatements])
        .map(|subject| (subject.id(), subject))
        .collect()
}

/// Reads a test; `more_keys` are those the table has beside the test's own.
pub(super) fn read_test(section: &Section<'_>, more_keys: &[&'static str]) -> Option<Test> {
    let known: Vec<&'static str> = more_keys.iter().chain(&OTHER_KEYS).chain(&LIMIT_KEYS).copied().collect();
    section.allow(&known);
    section.need("property = \"bcf\"");
    section.need("source = \"Annex XIII, 1.1.2\"");
    section.need("checked = \"seen\"");
    let subject = section.word("property", &subjects());
    let bases = section.words("basis", &Basis::ALL.map(|basis| (basis.word(), basis)));
    let checked = section.word("checked", &CHECKED);
    let (source, note) = (section.text("source"), section.text("note"));
    let missing = section.word("missing", &[("open", WhenMissing::Open), ("fires", WhenMissing::Fires)]);
    let (guideline, within) = read_inherent_keys(section, subject);
    let subject = subject?;
    let (limit, limit_text) = read_limit(section, subject)?;
    let clear_below = read_clear_below(section, subject, &limit, &limit_text);
    Some(Test {
        subject,
        bases: bases.map_or_else(|| Basis::ALL.into(), BTreeSet::from_iter),
        limit,
        limit_text,
        clear_below,
        guideline,
        within,
        optional: section.flag("optional"),
        missing: missing.unwrap_or(WhenMissing::Open),
        source: source?.value,
        checked: checked?,
        note: note.map(|note| note.value),
    })
}

fn read_inherent_keys(section: &Section<'_>, subject: Option<Subject>) -> (Option<String>, Option<f64>) {
    if subject.is_some_and(|subject| subject != Subject::InherentBiodegradability) {
        for key in ["guideline", "within"] {
            if let Some(span) = section.key_span(key) {
                let belongs = "to tests of `inherent-biodegradability`";
                section.report(span, RuleMistake::OutOfPlace { key, belongs });
            }
        }
        return (None, None);
    }
    let within = section.scalar("within");
    (
        section.text("guideline").map(|guideline| guideline.value),
        within.and_then(|written| quantity(section, &written, DAYS)),
    )
}

fn read_clear_below(section: &Section<'_>, subject: Subject, limit: &Limit, limit_text: &str) -> Option<f64> {
    let key_span = section.key_span("clear-below")?;
    let upward = match limit {
        Limit::Number { comparison, value } if comparison.looks_upward() => Some(*value),
        Limit::Number { .. } | Limit::Between { .. } | Limit::AnyOfWords(_) | Limit::Is(_) => None,
    };
    let (Some(limit), Some(measured)) = (upward, Measured::of(subject)) else {
        let belongs = "beside `above` or `at-least`";
        let key = "clear-below";
        section.report(key_span, RuleMistake::OutOfPlace { key, belongs });
        return None;
    };
    let written = section.scalar("clear-below")?;
    let clear_below = quantity(section, &written, measured)?;
    if clear_below >= limit {
        let mistake = RuleMistake::ClearBelowContradicts {
            limit: limit_text.to_owned(),
            clear_below: written_text(&written.value),
        };
        section.report(written.span, mistake);
    }
    Some(clear_below)
}
