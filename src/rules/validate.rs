//! From a rule file to a checked [`Rulebook`]: every fault of meaning is found and named at its place.
//!
//! Whatever passes can be applied without further questions. It compares no substance with anything.

mod caution;
mod criterion;
mod designation;
mod limit;
mod listing;
mod test;

pub(crate) use caution::read_cautions;
pub(crate) use criterion::refuse_duplicate;

use crate::fault::{RuleFaults, RuleMistake};
use crate::quantity::Dimension;
use crate::rules::file::{Located, Scalar, Section};
use crate::rules::{Checked, HalfLifeReference, RuleSource, Rulebook, Weight};
use limit::{Measured, quantity};

pub(crate) const CHECKED: [(&str, Checked); 3] =
    [("seen", Checked::Seen), ("second-hand", Checked::SecondHand), ("memory", Checked::Memory)];

/// The checked rulebook of a file. `caution_ids` are the cautions that `out-of-scope` may name.
pub(crate) fn read_rulebook(source: &RuleSource, caution_ids: &[&str]) -> Result<Rulebook, RuleFaults> {
    source.build(|file| {
        file.allow(&["rulebook", "criterion", "designation", "listing"]);
        file.need("[rulebook]");
        let criteria = criterion::read_criteria(file);
        let designations = designation::read_designations(file, &criteria);
        let listings = listing::read_listings(file);
        let head = file.section("rulebook", "[rulebook]")?;
        let mut rulebook = read_head(&head, caution_ids)?;
        if criteria.is_empty() {
            head.report(head.span(), RuleMistake::NoCriteria);
        }
        rulebook.criteria = criteria;
        rulebook.designations = designations?;
        rulebook.listings = listings;
        Some(rulebook)
    })
}

fn read_head(head: &Section<'_>, caution_ids: &[&str]) -> Option<Rulebook> {
    head.allow(&[
        "id",
        "short",
        "title",
        "source",
        "edition",
        "strongest",
        "out-of-scope",
        "mixture-limit",
        "half-life-at",
        "half-life-activation-energy",
        "half-life-unstated-temperature",
        "bcf-at-lipid",
        "by-name-only",
        "note",
    ]);
    for example in [
        "id = \"eu-reach-pbt\"",
        "short = \"REACH\"",
        "title = \"EU REACH Annex XIII: PBT and vPvB\"",
        "source = \"Regulation (EC) No 1907/2006, Annex XIII\"",
        "edition = 2011-03-15",
        "strongest = \"definitive\"",
    ] {
        head.need(example);
    }
    let scope: Vec<(&str, &str)> = caution_ids.iter().map(|id| (*id, *id)).collect();
    let strongest = [("definitive", Weight::Definitive), ("screening", Weight::Screening)];
    // Each is read before any is missed, so that all their faults are found.
    let (id, short) = (read_id(head), head.text("short"));
    let (title, source) = (head.text("title"), head.text("source"));
    let (edition, strongest) = (head.date("edition"), head.word("strongest", &strongest));
    let out_of_scope = head.words("out-of-scope", &scope).unwrap_or_default();
    let mixture_limit = read_share(head, "mixture-limit");
    let bcf_at_lipid = read_share(head, "bcf-at-lipid");
    let half_life_at = read_half_life_reference(head);
    let note = head.text("note").map(|note| note.value);
    Some(Rulebook {
        id: id?,
        short: short?.value,
        title: title?.value,
        source: source?.value,
        edition: edition?.value,
        by_name_only: head.flag("by-name-only"),
        strongest: strongest?,
        out_of_scope: out_of_scope.into_iter().map(str::to_owned).collect(),
        mixture_limit,
        half_life_at,
        bcf_at_lipid,
        criteria: Vec::new(),
        designations: Vec::new(),
        listings: Vec::new(),
        note,
    })
}

/// The `id` of a table, which must be usable on the command line.
pub(crate) fn read_id(section: &Section<'_>) -> Option<String> {
    let id = section.text("id")?;
    let starts_with_letter = id.value.starts_with(|first: char| first.is_ascii_lowercase());
    let plain = |letter: char| letter.is_ascii_lowercase() || letter.is_ascii_digit() || letter == '-';
    if !starts_with_letter || !id.value.chars().all(plain) || id.value.ends_with('-') {
        section.report(id.span, RuleMistake::NotKebabCase { found: id.value });
        return None;
    }
    Some(id.value)
}

/// A share in %, above 0 and up to 100.
fn read_share(head: &Section<'_>, key: &str) -> Option<f64> {
    let written = head.scalar(key)?;
    let content = quantity(head, &written, CONTENT)?;
    if !(content > 0.0 && content <= 100.0) {
        let found = written_text(&written.value);
        let property = CONTENT.title;
        head.report(written.span, RuleMistake::Impossible { found, property });
    }
    Some(content)
}

const CONTENT: Measured = Measured::new("a content in a mixture", Dimension::Percent);
const TEMPERATURE: Measured = Measured::new("a temperature", Dimension::Temperature);
const ENERGY: Measured = Measured::new("an activation energy", Dimension::MolarEnergy);

fn read_half_life_reference(head: &Section<'_>) -> Option<HalfLifeReference> {
    const KEYS: [&str; 3] = ["half-life-at", "half-life-activation-energy", "half-life-unstated-temperature"];
    if KEYS.iter().all(|key| head.key_span(key).is_none()) {
        return None;
    }
    // The three say together how a half-life gets to the temperature of the comparison.
    head.need("half-life-at = \"12 °C\"");
    head.need("half-life-activation-energy = \"65.4 kJ/mol\"");
    head.need("half-life-unstated-temperature = \"20 °C\"");
    let [temperature, energy, unstated] = KEYS.map(|key| head.scalar(key));
    let read = |written: Option<Located<Scalar>>, measured| quantity(head, &written?, measured);
    let (temperature, unstated) = (read(temperature, TEMPERATURE), read(unstated, TEMPERATURE));
    let energy = read(energy, ENERGY);
    Some(HalfLifeReference {
        temperature: temperature?,
        activation_energy: energy?,
        unstated_temperature: unstated?,
    })
}

/// A value as the rule file writes it.
fn written_text(scalar: &Scalar) -> String {
    match scalar {
        Scalar::Text(text) | Scalar::Number(_, text) => text.clone(),
    }
}
