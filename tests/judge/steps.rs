//! Criteria with several steps: every combination of empty, firing, clearing and undecided steps, the words worked by
//! hand from the evaluation's rules.

use kowledger::quantity::Interval;
use kowledger::substance::{Basis, Cited, Compartment, DegradationTest, InherentBiodegradability, Property};
use kowledger::workbook::CellRef;

use crate::support::{Row, Value, row};

type Change = fn(Row) -> Row;

/// Nothing is added.
fn nothing(row: Row) -> Row {
    row
}

const BCF: [(&str, Change); 4] = [
    ("no BCF", nothing),
    ("a low BCF", |row| row.measured(Property::Bcf, Value::Point(10.0))),
    ("a straddling BCF", |row| row.measured(Property::Bcf, Value::Range(1_500.0, 6_000.0))),
    ("a high BCF", |row| row.measured(Property::Bcf, Value::Point(30_000.0))),
];

fn kow(row: Row, log_kow: f64) -> Row {
    row.measured(Property::LogKow, Value::Point(log_kow))
}

fn koa(row: Row, log_koa: f64) -> Row {
    row.measured(Property::LogKoa, Value::Point(log_koa))
}

const PARTITIONING: [(&str, Change); 6] = [
    ("nothing", nothing),
    ("log Kow 1.5", |row| kow(row, 1.5)),
    ("log Kow 3", |row| kow(row, 3.0)),
    ("log Kow 3, log Koa 4", |row| koa(kow(row, 3.0), 4.0)),
    ("log Kow 3, log Koa 9", |row| koa(kow(row, 3.0), 9.0)),
    ("log Kow 6", |row| kow(row, 6.0)),
];

const BMF: [(&str, Change); 3] = [
    ("no BMF", nothing),
    ("BMF 0.5", |row| row.measured(Property::Bmf, Value::Point(0.5))),
    ("BMF 2", |row| row.measured(Property::Bmf, Value::Point(2.0))),
];

#[test]
fn bioaccumulation_under_reach_and_clp_with_each_step_in_each_state() {
    const IN: &str = "screens in";
    const OUT: &str = "screens out";
    const NOT: &str = "not fulfilled";
    const OPEN: &str = "unresolved";
    // Down: partitioning data as listed above. Across: no BMF, BMF 0.5, BMF 2.
    let expected: [[[&str; 3]; 6]; 4] = [
        [["no data", OPEN, OPEN], [OUT, OUT, OPEN], [OPEN; 3], [OUT, OUT, OPEN], [IN; 3], [IN; 3]],
        [[NOT, NOT, OPEN], [NOT, NOT, OPEN], [NOT, NOT, OPEN], [NOT, NOT, OPEN], [IN; 3], [NOT, NOT, IN]],
        [[OPEN; 3], [OPEN; 3], [OPEN; 3], [OPEN; 3], [IN; 3], [IN; 3]],
        [["fulfilled"; 3]; 6],
    ];
    for ((bcf, add_bcf), by_partitioning) in BCF.into_iter().zip(expected) {
        for ((partitioning, add_partitioning), by_bmf) in PARTITIONING.into_iter().zip(by_partitioning) {
            for ((bmf, add_bmf), word) in BMF.into_iter().zip(by_bmf) {
                let judged = add_bmf(add_partitioning(add_bcf(row()))).judged();
                for book in ["REACH", "CLP"] {
                    let found = judged.verdict(book, "B").words();
                    assert_eq!(found, word, "{book}: {bcf}, {partitioning}, {bmf}");
                }
            }
        }
    }
}

fn short(row: Row, property: Property) -> Row {
    row.measured(property, Value::Point(3.0))
}

const SOIL: Property = Property::HalfLife(Compartment::Soil);

const HALF_LIVES: [(&str, Change); 5] = [
    ("no half-life", nothing),
    ("all short", |row| {
        let row = short(row, Property::HalfLife(Compartment::FreshWater));
        short(short(row, Property::HalfLife(Compartment::FreshSediment)), SOIL)
    }),
    ("one short", |row| short(row, SOIL)),
    ("one straddling", |row| row.measured(SOIL, Value::Range(100.0, 200.0))),
    ("one long", |row| row.measured(SOIL, Value::Point(900.0))),
];

const READY: [(&str, Change); 4] = [
    ("no ready test", nothing),
    ("ready", |row| row.ready(DegradationTest::Ready)),
    ("not ready", |row| row.ready(DegradationTest::NotReady)),
    ("open", |row| row.ready(DegradationTest::Open)),
];

#[test]
fn persistence_with_each_step_in_each_state() {
    // Across: no ready test, ready, not ready, open.
    let under_reach: [[&str; 4]; 5] = [
        ["no data", "screens out", "screens in", "screens in"],
        ["not fulfilled"; 4],
        ["unresolved", "screens out", "screens in", "screens in"],
        ["unresolved", "unresolved", "screens in", "screens in"],
        ["fulfilled"; 4],
    ];
    // A ready test may only clear here, and three compartments of four are short.
    let under_canada: [[&str; 4]; 5] = [
        ["no data", "screens out", "unresolved", "unresolved"],
        ["unresolved", "screens out", "unresolved", "unresolved"],
        ["unresolved", "screens out", "unresolved", "unresolved"],
        ["unresolved", "unresolved", "unresolved", "unresolved"],
        ["fulfilled"; 4],
    ];
    for (book, expected) in [("REACH", under_reach), ("CLP", under_reach), ("CANADA", under_canada)] {
        for ((half_lives, add_half_lives), by_ready) in HALF_LIVES.into_iter().zip(expected) {
            for ((ready, add_ready), word) in READY.into_iter().zip(by_ready) {
                let judged = add_ready(add_half_lives(row())).judged();
                assert_eq!(judged.verdict(book, "P").words(), word, "{book}: {half_lives}, {ready}");
            }
        }
    }
}

#[test]
fn an_inherent_test_alone_decides_nothing_in_either_direction() {
    for (degraded, days) in [(95.0, 7.0), (95.0, 28.0), (10.0, 7.0)] {
        let mut with_test = row();
        with_test.0.inherent.push(Cited {
            value: InherentBiodegradability {
                guideline: Some("OECD 302B".to_owned()),
                degraded: Some(Interval::point(degraded).unwrap()),
                days: Some(days),
                basis: Basis::Measured,
                reliability: None,
                reported: format!("{degraded} % in {days} d"),
            },
            cell: CellRef { sheet: "Substances".into(), row: 6, column: 30 },
        });
        let verdict = with_test.judged().verdict("REACH", "P").words();
        assert_eq!(verdict, "unresolved", "{degraded} % in {days} d");
    }
}

#[test]
fn toxicity_with_each_step_in_each_state() {
    let statements: [(&str, Change); 3] = [
        ("empty", nothing),
        ("others", |row| row.statements(&["H302"])),
        ("H350", |row| row.statements(&["H350"])),
    ];
    let long_term: [(&str, Change); 4] = [
        ("none", nothing),
        ("1", |row| row.measured(Property::LongTermToxicity, Value::Point(1.0))),
        ("straddling", |row| row.measured(Property::LongTermToxicity, Value::Less(0.02))),
        ("0.001", |row| row.measured(Property::LongTermToxicity, Value::Point(0.001))),
    ];
    let acute: [(&str, Change); 4] = [
        ("none", nothing),
        ("50", |row| row.measured(Property::AcuteToxicity, Value::Point(50.0))),
        ("0.05", |row| row.measured(Property::AcuteToxicity, Value::Point(0.05))),
        ("0.001", |row| row.measured(Property::AcuteToxicity, Value::Point(0.001))),
    ];
    for (stated, add_statements) in statements {
        for (noec, add_noec) in long_term {
            for (lc50, add_acute) in acute {
                // In words: a definitive value or statement decides; else a low acute value screens in; both kinds of
                // long-term information together screen out; acute data never do.
                let word = if stated == "H350" || noec == "0.001" || lc50 == "0.001" {
                    "fulfilled"
                } else if lc50 == "0.05" {
                    "screens in"
                } else if stated == "others" && noec == "1" {
                    "screens out"
                } else if (stated, noec, lc50) == ("empty", "none", "none") {
                    "no data"
                } else {
                    "unresolved"
                };
                let judged = add_acute(add_noec(add_statements(row()))).judged();
                for book in ["REACH", "CLP"] {
                    let found = judged.verdict(book, "T").words();
                    assert_eq!(found, word, "{book}: statements {stated}, NOEC {noec}, LC50 {lc50}");
                }
            }
        }
    }
}

const BAF: [(&str, Change); 4] = [
    ("no BAF", nothing),
    ("a low BAF", |row| row.measured(Property::Baf, Value::Point(10.0))),
    ("a straddling BAF", |row| row.measured(Property::Baf, Value::Range(4_000.0, 6_000.0))),
    ("a high BAF", |row| row.measured(Property::Baf, Value::Point(30_000.0))),
];

const LOG_KOW: [(&str, Change); 4] = [
    ("no log Kow", nothing),
    ("log Kow 3", |row| kow(row, 3.0)),
    ("log Kow 4.9 to 5.1", |row| row.measured(Property::LogKow, Value::Range(4.9, 5.1))),
    ("log Kow 6", |row| kow(row, 6.0)),
];

#[test]
fn bioaccumulation_in_canada_follows_the_strict_order() {
    let by_value = ["no data", "not fulfilled", "unresolved", "fulfilled"];
    let by_log_kow = ["no data", "screens out", "screens in", "screens in"];
    for (baf_place, (baf, add_baf)) in BAF.into_iter().enumerate() {
        for (bcf_place, (bcf, add_bcf)) in BCF.into_iter().enumerate() {
            for ((log_kow, add_log_kow), from_log_kow) in LOG_KOW.into_iter().zip(by_log_kow) {
                let word = match (baf_place, bcf_place) {
                    (0, 0) => from_log_kow,
                    (0, bcf) => by_value[bcf],
                    (baf, _) => by_value[baf],
                };
                let judged = add_log_kow(add_bcf(add_baf(row()))).judged();
                assert_eq!(judged.verdict("CANADA", "B").words(), word, "{baf}, {bcf}, {log_kow}");
            }
        }
    }
}

#[test]
fn bioaccumulation_under_stockholm_takes_either_factor_and_log_kow_only_without_them() {
    let by_log_kow = ["no data", "screens out", "screens in", "screens in"];
    for (baf_place, (baf, add_baf)) in BAF.into_iter().enumerate() {
        for (bcf_place, (bcf, add_bcf)) in BCF.into_iter().enumerate() {
            for ((log_kow, add_log_kow), from_log_kow) in LOG_KOW.into_iter().zip(by_log_kow) {
                let word = match (baf_place, bcf_place) {
                    (0, 0) => from_log_kow,
                    (3, _) | (_, 3) => "screens in",
                    (2, _) | (_, 2) => "unresolved",
                    _ => "screens out",
                };
                let judged = add_log_kow(add_bcf(add_baf(row()))).judged();
                assert_eq!(judged.verdict("STOCKHOLM", "B").words(), word, "{baf}, {bcf}, {log_kow}");
            }
        }
    }
}

#[test]
fn mobility_with_each_step_in_each_state() {
    let koc: [(&str, Change); 4] = [
        ("no Koc", nothing),
        ("a low Koc", |row| row.measured(Property::Koc, Value::Point(5.0))),
        ("a straddling Koc", |row| row.measured(Property::Koc, Value::Range(50.0, 2_000.0))),
        ("a high Koc", |row| row.measured(Property::Koc, Value::Point(50_000.0))),
    ];
    // 0.81 log Kow + 0.10: 0.91 at 1, 4.15 at 5. Across: no log Kow, 1, 5.
    let log_kow: [(&str, Change); 3] =
        [("no log Kow", nothing), ("log Kow 1", |row| kow(row, 1.0)), ("log Kow 5", |row| kow(row, 5.0))];
    let expected: [[&str; 3]; 4] = [
        ["no data", "screens in", "unresolved"],
        ["fulfilled"; 3],
        ["unresolved", "screens in", "unresolved"],
        ["not fulfilled"; 3],
    ];
    for ((koc, add_koc), by_log_kow) in koc.into_iter().zip(expected) {
        for ((log_kow, add_log_kow), word) in log_kow.into_iter().zip(by_log_kow) {
            let judged = add_log_kow(add_koc(row())).judged();
            for criterion in ["M", "vM"] {
                assert_eq!(judged.verdict("CLP", criterion).words(), word, "{criterion}: {koc}, {log_kow}");
            }
        }
    }
}
