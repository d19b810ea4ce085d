//! Each way in which a clear is stopped.

use kowledger::judge::Stop;
use kowledger::judge::Verdict::{NotFulfilled, ScreensIn, ScreensOut, Unresolved};
use kowledger::quantity::Interval;
use kowledger::substance::{
    Basis, Cited, DegradationTest, Identity, InherentBiodegradability, Property, SubstanceType,
};
use kowledger::workbook::CellRef;

use crate::support::{RULES, Row, Value, row};

fn low_bcf() -> Row {
    row().measured(Property::Bcf, Value::Point(10.0))
}

#[test]
fn a_guard_that_fired_stops_a_definitive_clear() {
    let judged = low_bcf()
        .measured(Property::LogKoa, Value::Point(9.0))
        .measured(Property::LogKow, Value::Point(3.0))
        .judged();
    assert_eq!(judged.verdict("REACH", "B"), ScreensIn);
    assert!(matches!(judged.stops("REACH", "B").as_slice(), [Stop::Guard(_)]));
}

#[test]
fn each_concern_value_stops_a_clear_without_deciding() {
    for (property, value) in [(Property::Bmf, 1.5), (Property::Tmf, 1.5), (Property::Baf, 2500.0)] {
        let beyond = low_bcf().measured(property, Value::Point(value)).judged();
        assert_eq!(beyond.verdict("REACH", "B"), Unresolved, "{}", property.title());
        let limit = if property == Property::Baf { 2000.0 } else { 1.0 };
        let unconcerning = low_bcf().measured(property, Value::Point(limit)).judged();
        assert_eq!(unconcerning.verdict("REACH", "B"), NotFulfilled, "{}", property.title());
    }
}

#[test]
fn a_guard_left_open_stops_screening_clears_only() {
    let with_basis = |basis| {
        row()
            .with(Property::Bcf, Value::Point(10.0), basis)
            .measured(Property::LogKow, Value::Point(3.0))
            .judged()
    };
    assert_eq!(with_basis(Basis::Measured).verdict("REACH", "B"), NotFulfilled);
    assert_eq!(with_basis(Basis::Unstated).verdict("REACH", "B"), Unresolved);
    assert!(
        with_basis(Basis::Unstated).stops("REACH", "B").iter().any(|stop| matches!(stop, Stop::OpenGuard(_)))
    );
}

#[test]
fn a_guard_that_is_clear_stops_nothing() {
    let judged = row().with(Property::Bcf, Value::Point(10.0), Basis::Unstated);
    let low_koa =
        judged.measured(Property::LogKoa, Value::Point(4.0)).measured(Property::LogKow, Value::Point(3.0));
    assert_eq!(low_koa.judged().verdict("REACH", "B"), ScreensOut);
    let barely_lipophilic = row().measured(Property::LogKow, Value::Point(1.5));
    assert_eq!(barely_lipophilic.judged().verdict("REACH", "B"), ScreensOut);
}

#[test]
fn a_calculated_value_within_one_sd_of_its_limit_does_not_clear_and_a_measured_one_does() {
    let with_basis = |basis| row().with(Property::Bcf, Value::Point(4500.0), basis).judged();
    assert_eq!(with_basis(Basis::Calculated).verdict("CANADA", "B"), Unresolved);
    assert!(with_basis(Basis::Calculated).stops("CANADA", "B").contains(&Stop::WithinOneSd));
    assert!(with_basis(Basis::Calculated).is_close("CANADA", "B"));
    assert_eq!(with_basis(Basis::Measured).verdict("CANADA", "B"), NotFulfilled);
    assert!(with_basis(Basis::Measured).is_close("CANADA", "B"));
    let far = row().with(Property::Bcf, Value::Point(450.0), Basis::Calculated).judged();
    assert_eq!(far.verdict("CANADA", "B"), ScreensOut);
}

#[test]
fn after_a_stopped_clear_a_later_step_may_fire_but_not_clear() {
    let judged = |log_kow| {
        row()
            .measured(Property::Bcf, Value::Point(10.0))
            .measured(Property::Bmf, Value::Point(2.0))
            .measured(Property::LogKow, Value::Point(log_kow))
            .judged()
    };
    assert_eq!(judged(1.0).verdict("REACH", "B"), Unresolved);
    assert!(judged(1.0).stops("REACH", "B").contains(&Stop::EarlierDoubt));
    assert_eq!(judged(6.0).verdict("REACH", "B"), ScreensIn);
}

#[test]
fn after_an_undecided_definitive_step_a_later_step_may_fire_but_not_clear() {
    let judged = |log_kow| {
        row()
            .measured(Property::Bcf, Value::Range(1500.0, 2500.0))
            .measured(Property::LogKow, Value::Point(log_kow))
            .judged()
    };
    assert_eq!(judged(1.0).verdict("REACH", "B"), Unresolved);
    assert_eq!(judged(6.0).verdict("REACH", "B"), ScreensIn);
}

#[test]
fn a_limit_from_memory_never_clears() {
    // The levels of the inherent tests are recorded from memory.
    let mut with_inherent = row();
    with_inherent.0.inherent.push(Cited {
        value: InherentBiodegradability {
            guideline: Some("OECD 302B".to_owned()),
            degraded: Some(Interval::point(95.0).unwrap()),
            days: Some(7.0),
            basis: Basis::Measured,
            reliability: None,
            reported: "95 % in 7 d, OECD 302B".to_owned(),
        },
        cell: CellRef { sheet: "Substances".into(), row: 6, column: 30 },
    });
    let judged = with_inherent.judged();
    assert_eq!(judged.verdict("REACH", "P"), Unresolved);
    assert!(judged.stops("REACH", "P").contains(&Stop::LimitFromMemory));
    assert!(judged.sentence("REACH", "P").contains("check the current text"));
}

#[test]
fn an_estimated_koc_fires_on_the_leading_line_and_does_not_clear_while_a_lower_line_could_apply() {
    let judged = |log_kow| row().measured(Property::LogKow, Value::Point(log_kow)).judged();
    // 0.81 x 2 + 0.10 = 1.72, below 2; 0.81 x 3 + 0.10 = 2.53, between 2 and 3.
    assert_eq!(judged(2.0).verdict("CLP", "vM"), ScreensIn);
    assert_eq!(judged(3.0).verdict("CLP", "M"), ScreensIn);
    assert_eq!(judged(3.0).verdict("CLP", "vM"), Unresolved);
    // 0.81 x 5 + 0.10 = 4.15, but the substance may be of another class, or ionise.
    assert_eq!(judged(5.0).verdict("CLP", "M"), Unresolved);
    assert!(judged(5.0).stops("CLP", "M").iter().any(|stop| matches!(stop, Stop::LowSide { .. })));
}

#[test]
fn a_given_koc_of_an_ionisable_substance_may_fire_and_not_clear() {
    let judged = |koc| {
        row()
            .measured(Property::Koc, Value::Point(koc))
            .measured(Property::PkaAcid, Value::Point(4.8))
            .judged()
    };
    assert_eq!(judged(5000.0).verdict("CLP", "M"), Unresolved);
    assert_eq!(judged(50.0).verdict("CLP", "vM"), kowledger::judge::Verdict::Fulfilled);
}

/// A caution, a row that raises it, and whether it stops a clear by log Kow, by BCF, by a ready test.
type CautionLine = (&'static str, fn(Row) -> Row, [bool; 3]);

/// What each caution keeps from clearing, written by hand from the published list of what it stops.
#[test]
fn each_caution_stops_what_it_says_and_nothing_more() {
    let everything = [true, true, true];
    let whole_log_kow = [true, false, false];
    let table: [CautionLine; 10] = [
        ("perfluoroalkyl", |row| row.named("perfluorooctanoic acid"), [true, true, false]),
        ("surfactant", |row| row.of_type(SubstanceType::Surfactant), whole_log_kow),
        ("permanent-charge", |row| row.named("hexadecyltrimethylammonium bromide"), whole_log_kow),
        ("organometallic", |row| row.of_type(SubstanceType::Organometallic), whole_log_kow),
        ("polymer", |row| row.of_type(SubstanceType::Polymer), everything),
        ("uvcb", |row| row.of_type(SubstanceType::Uvcb), everything),
        ("multi-constituent", |row| row.of_type(SubstanceType::MultiConstituent), everything),
        ("identity-by-name-alone", Row::by_name_alone, everything),
        ("identity-by-repaired-date", |row| row.identified_as(Identity::RepairedDate), everything),
        ("identity-by-bare-number", |row| row.identified_as(Identity::BareNumber), everything),
    ];
    for (caution, make, [log_kow, bcf, ready]) in table {
        let stopped = |row: Row, book: &str, criterion: &str| {
            let judged = make(row).judged();
            assert!(judged.cautions().contains(&caution), "{caution} is raised: {:?}", judged.cautions());
            judged
                .stops(book, criterion)
                .iter()
                .any(|stop| matches!(stop, Stop::Caution(index) if RULES.cautions[*index].id == caution))
        };
        let by_log_kow = row().measured(Property::LogKow, Value::Point(1.0));
        assert_eq!(stopped(by_log_kow, "STOCKHOLM", "B"), log_kow, "{caution} and log Kow");
        let by_bcf = row().measured(Property::Bcf, Value::Point(10.0));
        assert_eq!(stopped(by_bcf, "CANADA", "B"), bcf, "{caution} and BCF");
        let by_ready = row().ready(DegradationTest::Ready);
        assert_eq!(stopped(by_ready, "REACH", "P"), ready, "{caution} and ready biodegradability");
    }
}

#[test]
fn a_caution_never_keeps_a_test_from_firing() {
    for kind in [SubstanceType::Polymer, SubstanceType::Uvcb, SubstanceType::Surfactant] {
        let judged = row().of_type(kind).measured(Property::LogKow, Value::Point(7.0)).judged();
        assert_eq!(judged.verdict("REACH", "B"), ScreensIn, "{kind:?}");
    }
}
