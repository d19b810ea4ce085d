//! The cautions file, checked.

use std::collections::BTreeSet;

use regex::Regex;

use super::criterion::refuse_duplicate;
use super::limit::{Measured, quantity};
use super::read_id;
use super::test::subjects;
use crate::fault::{OwnerKind, RuleFaults, RuleMistake};
use crate::quantity::Dimension;
use crate::rules::file::{Located, Section};
use crate::rules::{Blocks, Caution, RuleSource, Subject, Triggers};
use crate::substance::{Identity, RowType, SubstanceType};

const ROW_TYPES: [(&str, RowType); 3] =
    [("substance", RowType::Substance), ("mixture", RowType::Mixture), ("article", RowType::Article)];
const IDENTITIES: [(&str, Identity); 4] = [
    ("name-alone", Identity::NameAlone),
    ("repaired-date", Identity::RepairedDate),
    ("not-identified", Identity::NotIdentified),
    ("bare-number", Identity::BareNumber),
];
const TRIGGER_KEYS: [&str; 8] = [
    "substance-types",
    "row-types",
    "identities",
    "name-patterns",
    "formula",
    "ionisable",
    "log-kow-spread",
    "nothing-to-look-at",
];

/// The checked cautions of a file, in order.
pub(crate) fn read_cautions(source: &RuleSource) -> Result<Vec<Caution>, RuleFaults> {
    source.build(|file| {
        file.allow(&["caution"]);
        file.need("[[caution]]");
        let mut names = Vec::new();
        let mut cautions = Vec::new();
        for section in file.sections("caution", "[[caution]]") {
            if let Some(caution) = read_caution(&section) {
                refuse_duplicate(&section, &caution.id, &mut names, OwnerKind::Caution);
                cautions.push(caution);
            }
        }
        Some(cautions)
    })
}

fn read_caution(section: &Section<'_>) -> Option<Caution> {
    let mut known = vec!["id", "sentence", "source", "unless-names", "blocks", "at-most-screening"];
    known.extend(TRIGGER_KEYS);
    section.allow(&known);
    section.need("id = \"polymer\"");
    section.need("sentence = \"A polymer: ...\"");
    section.need("source = \"common practice\"");
    section.need("blocks = [\"log-kow\"]");
    let id = read_id(section);
    let (sentence, source) = (section.text("sentence"), section.text("source"));
    let triggers = read_triggers(section);
    let at_most_screening = read_subjects(section, "at-most-screening");
    let blocks = read_blocks(section);
    let id = id?;
    if TRIGGER_KEYS.iter().all(|key| section.key_span(key).is_none()) {
        let caution = id.clone();
        section.report(section.span(), RuleMistake::NoTrigger { caution });
    }
    Some(Caution {
        id,
        sentence: sentence?.value,
        source: source?.value,
        triggers,
        blocks,
        at_most_screening,
    })
}

fn read_triggers(section: &Section<'_>) -> Triggers {
    let types = SubstanceType::ALL.map(|kind| (kind.id(), kind));
    let formula = section.word("formula", &[("inorganic", ())]);
    Triggers {
        substance_types: set(section.words("substance-types", &types)),
        row_types: set(section.words("row-types", &ROW_TYPES)),
        identities: set(section.words("identities", &IDENTITIES)),
        name_pattern: read_pattern(section, "name-patterns"),
        unless_name: read_pattern(section, "unless-names"),
        inorganic_formula: formula.is_some(),
        ionisable: section.flag("ionisable"),
        log_kow_spread: read_spread(section),
        nothing_to_look_at: section.flag("nothing-to-look-at"),
    }
}

const SPREAD: Measured = Measured::new("a spread of log Kow", Dimension::Dimensionless);

/// Log units between the lowest and the highest log Kow of a row.
fn read_spread(section: &Section<'_>) -> Option<f64> {
    let written = section.scalar("log-kow-spread")?;
    quantity(section, &written, SPREAD)
}

fn set<T: Ord>(items: Option<Vec<T>>) -> BTreeSet<T> {
    items.unwrap_or_default().into_iter().collect()
}

/// One pattern that matches wherever one of the list does, whatever the case.
fn read_pattern(section: &Section<'_>, key: &str) -> Option<Regex> {
    let patterns = section.texts(key)?;
    let sound: Vec<&Located<String>> =
        patterns.iter().filter(|pattern| refuse_unsound(section, pattern)).collect();
    let joined: Vec<String> = sound.iter().map(|pattern| format!("(?:{})", pattern.value)).collect();
    let span = patterns.first()?.span.clone();
    compile(&joined.join("|")).map_err(|reason| section.report(span, RuleMistake::BadPattern { reason })).ok()
}

fn refuse_unsound(section: &Section<'_>, pattern: &Located<String>) -> bool {
    let compiled = compile(&pattern.value);
    compiled
        .map_err(|reason| section.report(pattern.span.clone(), RuleMistake::BadPattern { reason }))
        .is_ok()
}

fn compile(pattern: &str) -> Result<Regex, String> {
    Regex::new(&format!("(?i){pattern}")).map_err(|error| {
        // The crate draws the pattern over several lines; its last line says what is wrong.
        let text = error.to_string();
        let last = text.lines().last().unwrap_or(&text);
        last.trim_start_matches("error: ").to_owned()
    })
}

fn read_subjects(section: &Section<'_>, key: &str) -> BTreeSet<Subject> {
    set(section.words(key, &subjects()))
}

fn read_blocks(section: &Section<'_>) -> Blocks {
    if section.is_empty_list("blocks") {
        return Blocks::Subjects(BTreeSet::new());
    }
    if !section.is_text("blocks") {
        return Blocks::Subjects(read_subjects(section, "blocks"));
    }
    if let Some(text) = section.text("blocks").filter(|text| text.value != "everything") {
        let mistake = RuleMistake::UnknownWord {
            key: "blocks".to_owned(),
            nearest: None,
            found: text.value,
            known: vec!["\"everything\"".to_owned(), "[\"log-kow\", \"bcf\"]".to_owned()],
        };
        section.report(text.span, mistake);
    }
    Blocks::Everything
}
