//! Half-lives: the temperature of comparison, the kind of degradation, compartments not further specified.

use kowledger::judge::Verdict;
use kowledger::judge::Verdict::{Fulfilled, NotFulfilled, ScreensIn, ScreensOut, Unresolved};
use kowledger::substance::{Basis, Compartment, Conditions, DegradationKind, DegradationTest, Property};

use crate::support::{Row, Value, row};

const FRESH: Property = Property::HalfLife(Compartment::FreshWater);
const MARINE: Property = Property::HalfLife(Compartment::MarineWater);
const WATER: Property = Property::HalfLife(Compartment::Water);
const FRESH_SEDIMENT: Property = Property::HalfLife(Compartment::FreshSediment);
const SEDIMENT: Property = Property::HalfLife(Compartment::Sediment);
const SOIL: Property = Property::HalfLife(Compartment::Soil);

fn at(
    row: Row,
    property: Property,
    days: f64,
    temperature: Option<f64>,
    degradation: DegradationKind,
) -> Row {
    let conditions = Conditions { temperature, degradation, ..Conditions::default() };
    row.under(property, Value::Point(days), Basis::Measured, conditions)
}

/// All three compartments that Annex XIII needs, each far within its limit.
fn short_everywhere(degradation: DegradationKind) -> Row {
    [FRESH, FRESH_SEDIMENT, SOIL]
        .into_iter()
        .fold(row(), |row, property| at(row, property, 3.0, Some(12.0), degradation))
}

#[test]
fn a_half_life_at_twenty_degrees_is_2_12_times_longer_at_twelve() {
    // 40 d / 2.12 = 18.9 d.
    let verdict =
        |days| at(row(), FRESH, days, Some(20.0), DegradationKind::Ultimate).judged().verdict("REACH", "P");
    assert_eq!(verdict(19.0), Fulfilled);
    assert_eq!(verdict(18.7), Unresolved);
    // The same value is far within the limit of an instrument that compares as reported.
    assert_eq!(
        at(row(), WATER, 59.0, Some(20.0), DegradationKind::Ultimate).judged().verdict("STOCKHOLM", "P"),
        Unresolved
    );
}

#[test]
fn without_a_test_temperature_a_half_life_fires_as_it_is_and_clears_only_if_2_12_times_it_would() {
    let judged = |days| {
        let soil_and_sediment = [FRESH_SEDIMENT, SOIL]
            .into_iter()
            .fold(row(), |row, property| at(row, property, 3.0, Some(12.0), DegradationKind::Ultimate));
        at(soil_and_sediment, FRESH, days, None, DegradationKind::Ultimate).judged()
    };
    assert_eq!(judged(40.5).verdict("REACH", "P"), Fulfilled);
    assert_eq!(judged(40.0).verdict("REACH", "P"), Unresolved);
    assert_eq!(judged(19.0).verdict("REACH", "P"), Unresolved);
    assert!(judged(19.0).is_close("REACH", "P"));
    assert_eq!(judged(18.7).verdict("REACH", "P"), NotFulfilled);
    let sentence = judged(19.0).sentence("REACH", "P");
    assert!(sentence.contains("test temperature not stated"), "{sentence}");
}

#[test]
fn all_compartments_short_and_ultimate_is_not_persistent_and_otherwise_screens_out_only() {
    let verdict = |kind| short_everywhere(kind).judged().verdict("REACH", "P");
    assert_eq!(verdict(DegradationKind::Ultimate), NotFulfilled);
    assert_eq!(verdict(DegradationKind::Primary), ScreensOut);
    assert_eq!(verdict(DegradationKind::NotStated), ScreensOut);
}

#[test]
fn a_primary_half_life_beyond_the_limit_still_fires() {
    let judged = at(row(), SOIL, 500.0, Some(12.0), DegradationKind::Primary).judged();
    assert_eq!(judged.verdict("REACH", "P"), Fulfilled);
}

#[test]
fn one_short_compartment_does_not_make_up_for_a_missing_one() {
    for missing in [FRESH, FRESH_SEDIMENT, SOIL] {
        let two = [FRESH, FRESH_SEDIMENT, SOIL]
            .into_iter()
            .filter(|property| *property != missing)
            .fold(row(), |row, property| at(row, property, 3.0, Some(12.0), DegradationKind::Ultimate));
        assert_eq!(two.judged().verdict("REACH", "P"), Unresolved, "without {}", missing.title());
    }
}

#[test]
fn water_not_further_specified_fires_above_the_highest_limit_it_could_stand_for() {
    // It could stand for fresh water (40 d) and marine water (60 d).
    let judged = |days| {
        let rest = [FRESH_SEDIMENT, SOIL]
            .into_iter()
            .fold(row(), |row, property| at(row, property, 3.0, Some(12.0), DegradationKind::Ultimate));
        at(rest, WATER, days, Some(12.0), DegradationKind::Ultimate).judged()
    };
    let table: [(f64, Verdict); 4] =
        [(61.0, Fulfilled), (60.0, Unresolved), (41.0, Unresolved), (40.0, NotFulfilled)];
    for (days, expected) in table {
        assert_eq!(judged(days).verdict("REACH", "P"), expected, "{days} d in water");
    }
}

#[test]
fn water_not_further_specified_stands_only_for_compartments_without_a_value_of_their_own() {
    // With a marine value of its own, only the fresh water limit is left for it.
    let row = at(row(), MARINE, 3.0, Some(12.0), DegradationKind::Ultimate);
    let judged = at(row, WATER, 50.0, Some(12.0), DegradationKind::Ultimate).judged();
    assert_eq!(judged.verdict("REACH", "P"), Fulfilled);
}

#[test]
fn sediment_not_further_specified_follows_the_same_rule() {
    // Fresh water sediment 120 d, marine sediment 180 d.
    let verdict = |days| {
        at(row(), SEDIMENT, days, Some(12.0), DegradationKind::Ultimate).judged().verdict("REACH", "P")
    };
    assert_eq!(verdict(181.0), Fulfilled);
    assert_eq!(verdict(150.0), Unresolved);
}

#[test]
fn a_rule_on_water_takes_the_water_compartments_together_and_the_worst_decides() {
    let row = at(row(), FRESH, 3.0, Some(12.0), DegradationKind::Ultimate);
    let judged = at(row, MARINE, 70.0, Some(12.0), DegradationKind::Ultimate).judged();
    assert_eq!(judged.verdict("STOCKHOLM", "P"), ScreensIn);
}

#[test]
fn ready_biodegradability_screens_persistence_where_half_lives_are_missing() {
    let verdict = |result, book| row().ready(result).judged().verdict(book, "P");
    assert_eq!(verdict(DegradationTest::Ready, "REACH"), ScreensOut);
    assert_eq!(verdict(DegradationTest::NotReady, "REACH"), ScreensIn);
    assert_eq!(verdict(DegradationTest::Open, "REACH"), ScreensIn);
    assert!(row().ready(DegradationTest::Open).judged().is_close("REACH", "P"));
    // In the other two it is agency practice and may only clear.
    for book in ["STOCKHOLM", "CANADA"] {
        assert_eq!(verdict(DegradationTest::Ready, book), ScreensOut);
        assert_eq!(verdict(DegradationTest::NotReady, book), Unresolved);
    }
}

#[test]
fn a_ready_result_does_not_overrule_a_long_or_straddling_half_life() {
    let long = at(row().ready(DegradationTest::Ready), SOIL, 300.0, Some(12.0), DegradationKind::Ultimate);
    assert_eq!(long.judged().verdict("REACH", "P"), Fulfilled);
    let straddling = row().ready(DegradationTest::Ready).measured(SOIL, Value::Range(100.0, 140.0));
    assert_eq!(straddling.judged().verdict("REACH", "P"), Unresolved);
}

#[test]
fn an_older_reliability_score_of_three_supports_and_decides_nothing() {
    let conditions = Conditions {
        temperature: Some(12.0),
        degradation: DegradationKind::Ultimate,
        reliability: Some(3),
        ..Conditions::default()
    };
    let judged = row().under(SOIL, Value::Point(900.0), Basis::Measured, conditions).judged();
    assert_eq!(judged.verdict("REACH", "P"), Verdict::NoData);
}
