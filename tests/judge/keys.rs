//! Every key of the rulebook format that the four built-in rulebooks do not use, seen to mean what it says.

use std::fs;

use kowledger::evidence::gather_evidence;
use kowledger::judge::judge;
use kowledger::reasoning::{Told, headline, verdict_text, why, with_closeness};
use kowledger::rules::{RuleSet, load_rule_set};
use kowledger::substance::{CasNumber, DegradationTest, Property, SubstanceType};

use crate::support::{Row, Value, row};

/// A policy invented for the test: it holds bands, a listing, an assessed criterion, a second limit, a missing value
/// that fires, and designations of designations.
const POLICY: &str = r#"
[rulebook]
id = "site-policy"
short = "SITE"
title = "Invented restricted-substances policy"
source = "Invented for a test"
edition = 2026-01-01
strongest = "definitive"
out-of-scope = ["inorganic"]
mixture-limit = "1 %"

[[criterion]]
id = "rating"
title = "Bioaccumulation rating"
[[criterion.band]]
rating = "rating 0"
property = "bcf"
basis = ["measured"]
below = "10 L/kg"
source = "1"
checked = "seen"
[[criterion.band]]
rating = "rating 1"
property = "bcf"
basis = ["measured"]
between = ["10 L/kg", "100 L/kg"]
source = "1"
checked = "seen"
[[criterion.band]]
rating = "rating 2"
property = "bcf"
basis = ["measured"]
at-least = "100 L/kg"
source = "1"
checked = "seen"
[[criterion.band]]
rating = "rating 1"
property = "log-kow"
below = 4
source = "1"
checked = "seen"
[[criterion.band]]
rating = "rating 2"
property = "log-kow"
at-least = 4
source = "1"
checked = "seen"

[[criterion]]
id = "slow"
title = "Not rapidly degradable"
[[criterion.step]]
weight = "screening"
[[criterion.step.test]]
property = "ready-biodegradability"
is = "not ready"
missing = "fires"
source = "2"
checked = "seen"

[[criterion]]
id = "stores"
title = "Accumulates, judged case by case between two limits"
[[criterion.step]]
weight = "definitive"
[[criterion.step.test]]
property = "bcf"
at-least = "5000 L/kg"
clear-below = "1000 L/kg"
source = "3"
checked = "seen"

[[criterion]]
id = "harm"
title = "Harm"
assess = "A person has to look at it."

[[designation]]
id = "both"
title = "Slow and stored"
all-of = ["slow", "stores"]

[[designation]]
id = "either"
title = "One of them, or both"
any-of = ["both", "stores"]

[[listing]]
title = "Invented list"
source = "Invented for a test"
date = 2026-01-01
cas = ["50-29-3"]
ec = ["204-211-0"]
"#;

fn policy() -> RuleSet {
    let folder = tempfile::tempdir().expect("a folder");
    let file = folder.path().join("site-policy.toml");
    fs::write(&file, POLICY).expect("the file is written");
    load_rule_set(&[file.display().to_string()]).expect("the policy is sound")
}

/// The cell under a criterion or designation, or the headline and its reason.
fn cell(row: &Row, id: &str) -> String {
    let rules = policy();
    let evidence = gather_evidence(&row.0, &rules.relations);
    let judgement = judge(&row.0, &evidence, &rules);
    let told = Told { substance: &row.0, evidence: &evidence, rules: &rules, judgement: &judgement };
    let book = told.books().next().expect("the policy");
    match id {
        "headline" => return headline(book),
        "why" => return why(book),
        _ => {}
    }
    if let Some((criterion, judged)) = book.criteria().find(|(criterion, _)| criterion.id == id) {
        return verdict_text(criterion, judged);
    }
    let place = book
        .rulebook
        .designations
        .iter()
        .position(|designation| designation.id == id)
        .expect("a designation");
    let judged = &book.judged.designations[place];
    with_closeness(judged.verdict, judged.closeness)
}

fn bcf(value: Value) -> Row {
    row().measured(Property::Bcf, value)
}

#[test]
fn a_band_gives_its_rating_from_its_low_end_to_below_its_high_end() {
    let table = [(9.9, "rating 0"), (10.0, "rating 1"), (99.9, "rating 1"), (100.0, "rating 2")];
    for (value, rating) in table {
        assert_eq!(cell(&bcf(Value::Point(value)), "rating"), rating, "{value}");
    }
}

#[test]
fn a_value_that_may_lie_in_several_bands_shows_them_all() {
    assert_eq!(cell(&bcf(Value::Range(50.0, 150.0)), "rating"), "rating 1 or rating 2");
    assert_eq!(cell(&bcf(Value::Less(20.0)), "rating"), "rating 0 or rating 1");
}

#[test]
fn the_first_property_with_data_is_rated() {
    let both = bcf(Value::Point(5.0)).measured(Property::LogKow, Value::Point(6.0));
    assert_eq!(cell(&both, "rating"), "rating 0");
    assert_eq!(cell(&row().measured(Property::LogKow, Value::Point(6.0)), "rating"), "rating 2");
    assert_eq!(cell(&row(), "rating"), "no data");
}

#[test]
fn a_missing_value_fires_where_the_instrument_says_so() {
    assert_eq!(cell(&row(), "slow"), "screens in");
    assert_eq!(cell(&row().ready(DegradationTest::Ready), "slow"), "screens out");
}

#[test]
fn between_the_limit_and_the_second_limit_nothing_is_decided() {
    let table = [
        (999.0, "not fulfilled"),
        (1000.0, "unresolved (close call)"),
        (4999.0, "unresolved (close call)"),
        (5000.0, "fulfilled (close call)"),
        (50_000.0, "fulfilled"),
    ];
    for (value, word) in table {
        assert_eq!(cell(&bcf(Value::Point(value)), "stores"), word, "{value}");
    }
}

#[test]
fn what_a_person_has_to_assess_stays_unresolved() {
    assert_eq!(cell(&bcf(Value::Point(50_000.0)), "harm"), "unresolved");
}

#[test]
fn a_designation_may_name_another_one() {
    let stored = bcf(Value::Point(50_000.0));
    assert_eq!(cell(&stored, "both"), "screens in");
    assert_eq!(cell(&stored, "either"), "fulfilled");
    let cleared = bcf(Value::Point(10.0)).ready(DegradationTest::Ready);
    assert_eq!(cell(&cleared, "both"), "not fulfilled");
    assert_eq!(cell(&cleared, "either"), "not fulfilled");
    assert_eq!(cell(&row(), "either"), "unresolved");
}

#[test]
fn a_listing_heads_the_row_above_every_computed_verdict() {
    let mut listed = bcf(Value::Point(50_000.0));
    assert_eq!(cell(&listed, "headline"), "either: fulfilled");
    if let Some(cas) = &mut listed.0.cas {
        cas.value = CasNumber::parse("50-29-3").expect("DDT");
    }
    assert_eq!(cell(&listed, "headline"), "listed: Invented list");
    assert!(cell(&listed, "why").contains("2026-01-01"));
    assert_eq!(cell(&listed, "stores"), "fulfilled");
}

#[test]
fn a_substance_out_of_scope_is_so_in_every_cell_but_a_listing_still_heads_it() {
    let mut salt = row().of_type(SubstanceType::Inorganic);
    for id in ["rating", "slow", "stores", "harm", "both", "either"] {
        assert_eq!(cell(&salt, id), "out of scope", "{id}");
    }
    if let Some(cas) = &mut salt.0.cas {
        cas.value = CasNumber::parse("50-29-3").expect("a number of the list");
    }
    assert_eq!(cell(&salt, "headline"), "listed: Invented list");
}
