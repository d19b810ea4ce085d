//! Every key of a rulebook arrives in the checked types.

use std::collections::BTreeSet;

use kowledger::quantity::Comparison;
use kowledger::rules::{
    Checked, ClearsOn, Combine, Decides, DesignationPart, Guards, Limit, ListingEntry, OnlyIf, Rulebook,
    Subject, Weight, WhenMissing, load_rule_set,
};
use kowledger::substance::{Basis, CasNumber, DegradationTest, EcNumber, Property};

/// Every key once, none with its default.
const EVERY_KEY: &str = r#"
[rulebook]
id = "house-rules"
short = "HOUSE"
title = "House rules"
source = "Manual"
edition = 2026-01-31
strongest = "screening"
out-of-scope = ["inorganic", "polymer"]
mixture-limit = "0.1 %"
half-life-at = "12 °C"
half-life-activation-energy = "65.4 kJ/mol"
half-life-unstated-temperature = "20 °C"
by-name-only = true
note = "For the house only."

[[criterion]]
id = "P"
title = "Persistent"

[[criterion.step]]
weight = "screening"
combine = "any"
decides = "out"
guards = "fired-or-open"
clears-on = "some"
only-if = "no-data-before"

[[criterion.step.test]]
property = "half-life-soil"
basis = ["measured", "estimated"]
at-least = "6 months"
clear-below = "2 months"
optional = true
source = "Manual, 1"
checked = "second-hand"
note = "Topsoil."

[[criterion.step.test]]
property = "ready-biodegradability"
is = "ready"
missing = "fires"
source = "Manual, 2"
checked = "memory"

[[criterion.step.test]]
property = "inherent-biodegradability"
guideline = "OECD 302C"
at-most = "70 %"
within = "14 d"
source = "Manual, 3"
checked = "seen"

[[criterion.step.test]]
property = "hazard-statements"
any-of-words = ["H350", "EUH440"]
source = "Manual, 4"
checked = "seen"

[[criterion.step]]
weight = "concern"

[[criterion.step.test]]
property = "bmf"
above = 1
source = "Manual, 5"
checked = "seen"

[[criterion]]
id = "effects"
title = "Other effects"
assess = "No number settles it."

[[criterion]]
id = "rating"
title = "Rating"

[[criterion.band]]
rating = "rating 2"
property = "bcf"
between = ["10 L/kg", "100 L/kg"]
source = "Manual, 6"
checked = "seen"

[[designation]]
id = "concern"
title = "Of concern"
any-of = ["P", "effects"]
stated-by = ["EUH440"]

[[designation]]
id = "highest concern"
title = "Of highest concern"
all-of = ["concern", "P"]

[[listing]]
title = "Banned"
source = "Manual, annex"
date = 2026-01-30
cas = ["50-29-3"]
ec = ["200-024-3"]
"#;

fn read() -> Rulebook {
    let folder = tempfile::tempdir().unwrap();
    let path = folder.path().join("house.toml");
    std::fs::write(&path, EVERY_KEY).unwrap();
    let choice = path.to_str().unwrap().to_owned();
    load_rule_set(&[choice]).unwrap().rulebooks.remove(0)
}

#[test]
fn of_the_head() {
    let rulebook = read();
    assert_eq!((rulebook.id.as_str(), rulebook.short.as_str()), ("house-rules", "HOUSE"));
    assert_eq!((rulebook.title.as_str(), rulebook.source.as_str()), ("House rules", "Manual"));
    assert_eq!(rulebook.edition.to_string(), "2026-01-31");
    assert!(rulebook.by_name_only);
    assert_eq!(rulebook.strongest, Weight::Screening);
    assert_eq!(rulebook.out_of_scope, ["inorganic", "polymer"]);
    assert_eq!(rulebook.mixture_limit, Some(0.1));
    assert_eq!(rulebook.note.as_deref(), Some("For the house only."));
    let reference = rulebook.half_life_at.unwrap();
    assert!((reference.temperature - 12.0).abs() < 1e-12);
    assert!((reference.activation_energy - 65.4).abs() < 1e-12);
    assert!((reference.unstated_temperature - 20.0).abs() < 1e-12);
}

#[test]
fn of_a_step() {
    let rulebook = read();
    let [step, concern] = &rulebook.criteria[0].steps[..] else { panic!("two steps") };
    assert_eq!((step.weight, step.combine), (Weight::Screening, Combine::Any));
    assert_eq!((step.decides, step.guards), (Decides::Out, Guards::FiredOrOpen));
    assert_eq!((step.clears_on, step.only_if), (ClearsOn::Some, OnlyIf::NoDataBefore));
    // A step of concern guards without being told to.
    assert_eq!((concern.weight, concern.guards), (Weight::Concern, Guards::Fired));
    assert_eq!((concern.decides, concern.clears_on), (Decides::Both, ClearsOn::All));
    assert_eq!(concern.only_if, OnlyIf::Always);
}

#[test]
fn of_a_test() {
    let rulebook = read();
    let [soil, ready, inherent, statements] = &rulebook.criteria[0].steps[0].tests[..] else {
        panic!("four tests")
    };
    let Limit::Number { comparison, value } = soil.limit else { panic!("a number") };
    assert_eq!(soil.subject.id(), "half-life-soil");
    assert_eq!((comparison, value.to_string().as_str()), (Comparison::AtLeast, "182.625"));
    assert_eq!(soil.limit_text, "6 months");
    assert_eq!(soil.clear_below.map(|days| days.to_string()).as_deref(), Some("60.875"));
    assert_eq!(soil.bases, BTreeSet::from([Basis::Measured, Basis::Estimated]));
    assert_eq!((soil.optional, soil.missing), (true, WhenMissing::Open));
    assert_eq!((soil.source.as_str(), soil.checked), ("Manual, 1", Checked::SecondHand));
    assert_eq!(soil.note.as_deref(), Some("Topsoil."));

    assert_eq!(ready.limit, Limit::Is(DegradationTest::Ready));
    assert_eq!((ready.optional, ready.missing), (false, WhenMissing::Fires));
    assert_eq!(ready.bases, BTreeSet::from(Basis::ALL));

    assert_eq!(inherent.subject, Subject::InherentBiodegradability);
    assert_eq!((inherent.guideline.as_deref(), inherent.within), (Some("OECD 302C"), Some(14.0)));
    assert_eq!(inherent.limit_text, "70 %");

    assert_eq!(statements.limit, Limit::AnyOfWords(vec!["H350".to_owned(), "EUH440".to_owned()]));
    assert_eq!(statements.limit_text, "H350, EUH440");
}

#[test]
fn of_a_band_and_a_sentence() {
    let rulebook = read();
    assert_eq!(rulebook.criteria[1].assess.as_deref(), Some("No number settles it."));
    let band = &rulebook.criteria[2].bands[0];
    assert_eq!(band.rating, "rating 2");
    assert_eq!(band.test.subject, Subject::Property(Property::Bcf));
    assert_eq!(band.test.limit, Limit::Between { low: 10.0, high: 100.0 });
    assert_eq!(band.test.limit_text, "10 L/kg to below 100 L/kg");
}

#[test]
fn of_designations_and_listings() {
    let rulebook = read();
    let [concern, highest] = &rulebook.designations[..] else { panic!("two designations") };
    assert_eq!((concern.id.as_str(), concern.title.as_str()), ("concern", "Of concern"));
    assert_eq!(concern.combine, Combine::Any);
    assert_eq!(concern.parts, [DesignationPart::Criterion(0), DesignationPart::Criterion(1)]);
    assert_eq!(concern.stated_by, ["EUH440"]);
    assert_eq!(highest.combine, Combine::All);
    assert_eq!(highest.parts, [DesignationPart::Designation(0), DesignationPart::Criterion(0)]);
    let listing = &rulebook.listings[0];
    assert_eq!((listing.title.as_str(), listing.source.as_str()), ("Banned", "Manual, annex"));
    assert_eq!(listing.date.to_string(), "2026-01-30");
    let cas = ListingEntry::Cas(CasNumber::parse("50-29-3").unwrap());
    let ec = ListingEntry::Ec(EcNumber::parse("200-024-3").unwrap());
    assert_eq!(listing.entries, [cas, ec]);
}
