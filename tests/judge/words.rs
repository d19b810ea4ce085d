//! Every verdict word, in criteria and designations, exactly as the cells hold it.

use kowledger::judge::Verdict;
use kowledger::substance::{Basis, Compartment, DegradationTest, Property, SubstanceType};

use crate::support::{Row, Value, row};

const SOIL: Property = Property::HalfLife(Compartment::Soil);

fn measured_pbt() -> Row {
    row()
        .measured(SOIL, Value::Point(900.0))
        .measured(Property::Bcf, Value::Point(30_000.0))
        .statements(&["H350"])
}

#[test]
fn the_words_are_those_of_the_documentation_in_order_of_concern() {
    let words: Vec<&str> = Verdict::ALL.iter().map(|verdict| verdict.words()).collect();
    let documented =
        ["fulfilled", "screens in", "unresolved", "no data", "screens out", "not fulfilled", "out of scope"];
    assert_eq!(words, documented);
    assert!(Verdict::ALL.windows(2).all(|pair| pair[0] > pair[1]));
}

#[test]
fn measured_data_beyond_every_limit_fulfil_the_designation() {
    let judged = measured_pbt().judged();
    for (id, expected) in [
        ("P", "fulfilled"),
        ("B", "fulfilled"),
        ("T", "fulfilled"),
        ("PBT", "fulfilled"),
        ("vPvB", "fulfilled"),
    ] {
        assert_eq!(judged.cell("REACH", id), expected, "{id}");
    }
}

#[test]
fn one_screening_part_makes_the_designation_screen_in() {
    let judged = row()
        .ready(DegradationTest::NotReady)
        .measured(Property::Bcf, Value::Point(30_000.0))
        .statements(&["H350"])
        .judged();
    assert_eq!(judged.cell("REACH", "P"), "screens in");
    assert_eq!(judged.cell("REACH", "PBT"), "screens in");
}

#[test]
fn one_unanswered_part_leaves_the_designation_unresolved() {
    let judged =
        row().measured(SOIL, Value::Point(900.0)).measured(Property::Bcf, Value::Point(30_000.0)).judged();
    assert_eq!(judged.cell("REACH", "T"), "no data");
    assert_eq!(judged.cell("REACH", "PBT"), "unresolved");
    assert_eq!(judged.cell("REACH", "vPvB"), "fulfilled");
}

#[test]
fn one_cleared_part_clears_the_designation() {
    let measured = measured_pbt().0;
    let mut low = Row(measured);
    low.0.readings.remove(&Property::Bcf);
    let by_measurement = low.measured(Property::Bcf, Value::Point(10.0)).judged();
    assert_eq!(by_measurement.cell("REACH", "PBT"), "not fulfilled");
    let by_screening = row()
        .measured(SOIL, Value::Point(900.0))
        .with(Property::Bcf, Value::Point(10.0), Basis::Unstated)
        .judged();
    assert_eq!(by_screening.cell("REACH", "B"), "screens out");
    assert_eq!(by_screening.cell("REACH", "PBT"), "screens out");
}

#[test]
fn a_stopped_clear_leaves_the_designation_unresolved_even_if_all_else_clears() {
    let judged = row()
        .of_type(SubstanceType::Polymer)
        .ready(DegradationTest::Ready)
        .measured(Property::Bcf, Value::Point(10.0))
        .judged();
    assert_eq!(judged.cell("REACH", "PBT"), "unresolved");
}

#[test]
fn a_close_call_is_said_after_the_word_and_reaches_the_designation() {
    let judged = row()
        .measured(SOIL, Value::Point(900.0))
        .measured(Property::Bcf, Value::Point(2100.0))
        .statements(&["H350"])
        .judged();
    assert_eq!(judged.cell("REACH", "B"), "fulfilled (close call)");
    assert_eq!(judged.cell("REACH", "PBT"), "fulfilled (close call)");
    assert_eq!(judged.cell("REACH", "vPvB"), "not fulfilled");
}

#[test]
fn inorganic_substances_are_out_of_scope_where_the_instrument_says_so_and_only_there() {
    let judged = row().of_type(SubstanceType::Inorganic).named("sodium chloride").judged();
    for book in ["REACH", "CLP"] {
        assert_eq!(judged.cell(book, "P"), "out of scope");
        assert_eq!(judged.cell(book, "PBT"), "out of scope");
    }
    assert_eq!(judged.cell("CANADA", "P"), "no data");
}

#[test]
fn what_no_number_settles_is_always_unresolved() {
    assert_eq!(row().judged().cell("STOCKHOLM", "adverse effects"), "unresolved");
    assert_eq!(measured_pbt().judged().cell("STOCKHOLM", "adverse effects"), "unresolved");
}
