//! Closeness, margins and chances.

use kowledger::judge::{CriterionJudgement, Decision, Used};
use kowledger::substance::{Basis, Property};

use crate::support::{Judged, Value, row};

fn deciding_value<'run>(judged: &'run Judged, book: &str, criterion: &str) -> &'run Used {
    let criterion: &CriterionJudgement = judged.criterion(book, criterion);
    let (Decision::In(step) | Decision::Out(step)) = criterion.decision else {
        panic!("a decided criterion")
    };
    let step = &criterion.steps[step];
    &step.tests[step.by[0]].used[0]
}

#[test]
fn a_value_within_one_sd_of_the_limit_is_a_close_call_on_either_side() {
    // A measured BCF has 0.21 log units: 2000 x 10^0.21 = 3244.
    let close = |bcf| row().measured(Property::Bcf, Value::Point(bcf)).judged().is_close("REACH", "B");
    assert!(close(3_240.0));
    assert!(!close(3_250.0));
    assert!(close(1_240.0));
    assert!(!close(1_230.0));
}

#[test]
fn margin_and_chance_are_counted_towards_the_concerning_side() {
    let judged = row().measured(Property::Bcf, Value::Point(20_000.0)).judged();
    let used = deciding_value(&judged, "REACH", "B");
    assert!((used.margin.unwrap() - 1.0).abs() < 1e-9);
    assert!(used.chance.unwrap() > 0.999);
    let judged = row().measured(Property::Koc, Value::Point(100.0)).judged();
    let used = deciding_value(&judged, "CLP", "M");
    assert!((used.margin.unwrap() - 1.0).abs() < 1e-9);
    // One log unit at a standard deviation of 0.4: Phi(2.5) = 0.9938 (standard normal table).
    assert!((used.chance.unwrap() - 0.9938).abs() < 1e-4);
}

#[test]
fn an_open_interval_has_neither_margin_nor_chance() {
    let judged = row().measured(Property::LogKow, Value::Greater(6.0)).judged();
    let used = deciding_value(&judged, "STOCKHOLM", "B");
    assert_eq!((used.margin, used.chance), (None, None));
    assert_eq!(judged.cell("STOCKHOLM", "B"), "screens in");
}

#[test]
fn the_value_of_most_concern_among_equals_decides_and_a_better_basis_goes_before() {
    let two_measured = row()
        .measured(Property::Bcf, Value::Point(100.0))
        .measured(Property::Bcf, Value::Point(9_000.0))
        .judged();
    assert_eq!(two_measured.cell("REACH", "vB"), "fulfilled");
    let measured_and_calculated = row()
        .measured(Property::Bcf, Value::Point(100.0))
        .with(Property::Bcf, Value::Point(9_000.0), Basis::Calculated)
        .judged();
    assert_eq!(measured_and_calculated.cell("REACH", "vB"), "not fulfilled");
    // For mobility the lower value is of more concern.
    let two_koc = row()
        .measured(Property::Koc, Value::Point(5_000.0))
        .measured(Property::Koc, Value::Point(5.0))
        .judged();
    assert_eq!(two_koc.cell("CLP", "vM"), "fulfilled");
}
