//! Rows that an authority would ask about: each looks harmless at first sight, and must not be cleared, or is called more
//! than its data carry.

use kowledger::columns::{ColumnWords, recognise};
use kowledger::judge::Stop;
use kowledger::judge::Verdict::{
    self, Fulfilled, NoData, NotFulfilled, OutOfScope, ScreensIn, ScreensOut, Unresolved,
};
use kowledger::substance::{
    Basis, Compartment, Conditions, DegradationKind, Property, RowReader, SubstanceType, UnstatedBasis,
};
use kowledger::workbook::{Cell, CellContent};

use crate::support::{Row, Value, row};

/// A row as a sheet with these headers and cells gives it, with a CAS number and a name before them.
fn read(cells: &[(&str, &str)]) -> Row {
    let named = [("CAS", "100-00-5"), ("Name", "1-chloro-4-nitrobenzene")];
    let cells: Vec<_> = named.iter().chain(cells).collect();
    let as_row = |index, texts: Vec<&str>| kowledger::workbook::Row {
        index,
        cells: texts
            .iter()
            .enumerate()
            .map(|(column, text)| Cell {
                column: u16::try_from(column).expect("few columns"),
                content: CellContent::Text((*text).to_owned()),
                style: None,
                formula: false,
            })
            .collect(),
    };
    let rows = [
        as_row(0, cells.iter().map(|cell| cell.0).collect()),
        as_row(1, cells.iter().map(|cell| cell.1).collect()),
    ];
    let words = ColumnWords::built_in().expect("the column words load");
    let columns = recognise("Substances", &rows, &words, &[]).expect("an inventory");
    Row(RowReader::new("Substances".into(), &columns, UnstatedBasis::Unstated).read(&rows[1]))
}

fn cleared(verdict: Verdict) -> bool {
    matches!(verdict, NotFulfilled | ScreensOut)
}

fn verdict_of(cells: &[(&str, &str)], book: &str, criterion: &str) -> Verdict {
    read(cells).judged().verdict(book, criterion)
}

// Hazard statements

fn toxicity(statements: &str) -> Verdict {
    verdict_of(&[("Hazard statements", statements), ("NOEC fish (mg/L)", "5")], "CLP", "T")
}

#[test]
fn a_statement_cell_that_was_read_to_its_end_and_holds_none_of_the_codes_clears() {
    for text in [
        "H302",
        "H225; H319",
        "H302+H312",
        "H301/311/331",
        "H302, P280, P305+351+338",
        "Aquatic Chronic 2",
        "none",
        "not classified",
        "nicht eingestuft",
        "STOT SE 3; H335",
        "H302 (100 %)",
    ] {
        assert_eq!(toxicity(text), ScreensOut, "{text}");
    }
}

#[test]
fn a_statement_cell_of_which_a_part_was_not_read_does_not_clear() {
    for text in [
        "H302; Carc.",
        "H302, 350",
        "H302; 361d; 373",
        "H302; R45",
        "Xn; R22-62; H302",
        "H302; reproductive toxicity",
        "H302; mutagenic",
        "H302; CMR",
    ] {
        assert_eq!(toxicity(text), Unresolved, "{text}");
    }
}

#[test]
fn classes_in_full_words_are_read_with_their_category() {
    for text in [
        "Reproductive toxicity, category 1B",
        "Reproductive toxicity Cat. 2; H302",
        "Toxic for reproduction 1A",
        "Specific target organ toxicity (repeated exposure), Category 2",
        "Specific target organ toxicity - repeated exposure 1; H302",
        "Reproduktionstoxizität 1B",
        "Spezifische Zielorgan-Toxizität (wiederholte Exposition) Kategorie 2; H302",
        "Endocrine disruption for human health Category 1",
    ] {
        assert_eq!(toxicity(text), Fulfilled, "{text}");
    }
}

#[test]
fn words_for_missing_statements_are_not_words_for_no_statement() {
    for text in [
        "no data",
        "no data available",
        "No information",
        "none available",
        "none known",
        "no SDS",
        "keine Daten",
        "keine Angaben",
        "keine Information verfügbar",
        "ohne Angabe",
        "not classified (data lacking)",
        "not classified due to lack of data",
        "not classified yet",
        "nicht eingestuft mangels Daten",
        "no classification possible",
    ] {
        assert!(!cleared(toxicity(text)), "{text}");
    }
}

#[test]
fn a_second_statement_column_that_was_not_read_keeps_the_first_from_clearing() {
    for classes in ["Carc.", "see data sheet", "R45"] {
        for order in [
            [("Classification", classes), ("H statements", "H302")],
            [("H statements", "H302"), ("Classification", classes)],
        ] {
            let cells = [order[0], order[1], ("NOEC fish (mg/L)", "5")];
            assert_eq!(verdict_of(&cells, "REACH", "T"), Unresolved, "{classes}");
        }
    }
}

#[test]
fn an_incomplete_statement_cell_still_fires_by_what_it_holds() {
    assert_eq!(toxicity("H350; R62"), Fulfilled);
}

// Ready biodegradability

#[test]
fn a_denial_anywhere_in_a_cell_on_ready_biodegradability_is_never_ready() {
    for text in [
        "not considered to be readily biodegradable",
        "is not expected to be readily biodegradable",
        "cannot be considered readily biodegradable",
        "can not be regarded as readily biodegradable",
        "does not meet the criteria for ready biodegradability",
        "readily biodegradable: no",
        "Readily biodegradable? No",
        "ready biodegradability: negative",
        "leicht biologisch abbaubar: nein",
        "leicht abbaubar - nein",
        "keine leichte biologische Abbaubarkeit",
        "keine leichte Abbaubarkeit",
        "nicht als leicht biologisch abbaubar eingestuft",
        "neither readily nor inherently biodegradable",
        "ready biodegradability test: not passed",
        "unlikely to be readily biodegradable",
        "isn't readily biodegradable",
        "no data on ready biodegradability",
        "not tested for ready biodegradability",
        "ready biodegradability unknown",
        "ready biodegradability test planned",
        "ready biodegradability not determined",
        "keine Daten zur leichten Abbaubarkeit; leicht abbaubar?",
        "readily biodegradable?",
        "readily biodegradable (inconclusive)",
        "readily biodegradable after adaptation",
    ] {
        let verdict = verdict_of(&[("Ready biodegradability", text)], "REACH", "P");
        assert!(!cleared(verdict), "{text}: {verdict:?}");
    }
}

#[test]
fn what_was_never_tested_is_no_result_towards_concern_either() {
    for text in [
        "no data on ready biodegradability",
        "not tested for ready biodegradability",
        "ready biodegradability unknown",
    ] {
        let verdict = verdict_of(&[("Ready biodegradability", text)], "REACH", "P");
        assert_eq!(verdict, NoData, "{text}");
    }
}

#[test]
fn a_denial_of_something_else_leaves_ready_biodegradability_as_it_is() {
    for text in [
        "readily biodegradable",
        "yes",
        "readily biodegradable, 10-day window not met",
        "readily biodegradable, but failing 10-day window",
        "leicht biologisch abbaubar, 10-Tage-Fenster nicht erfüllt",
        "readily biodegradable (82 %, 28 d)",
    ] {
        let verdict = verdict_of(&[("Ready biodegradability", text)], "REACH", "P");
        assert_eq!(verdict, ScreensOut, "{text}");
    }
}

#[test]
fn dissolved_carbon_is_held_against_its_own_pass_level_whatever_the_guideline() {
    assert!(!cleared(verdict_of(&[("Ready biodegradability", "65 % DOC, 28 d, OECD 301B")], "REACH", "P")));
    assert!(cleared(verdict_of(&[("Ready biodegradability", "65 % CO2, 28 d, OECD 301B")], "REACH", "P")));
}

#[test]
fn a_ready_test_that_is_not_reliable_decides_nothing() {
    for text in ["3", "4"] {
        let cells = [("Ready biodegradability", "82 %, 28 d"), ("Reliability", text)];
        assert_eq!(verdict_of(&cells, "REACH", "P"), NoData, "{text}");
    }
    let cells = [("Ready biodegradability", "82 %, 28 d"), ("Reliability", "2")];
    assert_eq!(verdict_of(&cells, "REACH", "P"), ScreensOut);
    let cells = [("Ready biodegradability", "readily biodegradable (82 %, 28 d, Klimisch 4)")];
    assert_eq!(verdict_of(&cells, "REACH", "P"), NoData);
}

#[test]
fn values_that_are_not_reliable_are_not_told_as_missing() {
    let sentence = |reliability: &str| {
        let cells = [("BCF", "300"), ("Reliability", reliability)];
        read(&cells).judged().sentence("REACH", "B")
    };
    let told = "Of BCF the inventory holds only values of reliability 3 or 4, which do not decide";
    assert!(sentence("4").contains(told), "{}", sentence("4"));
    assert!(!sentence("2").contains(told), "{}", sentence("2"));
}

#[test]
fn an_open_value_beside_a_measured_one_in_its_cell_keeps_it_from_clearing() {
    let verdict = |bcf: &str| verdict_of(&[("BCF", bcf)], "REACH", "B");
    assert_eq!(verdict("300 (measured)"), NotFulfilled);
    assert!(!cleared(verdict("300 (measured); 9000")));
}

// Half-lives

#[test]
fn mineralisation_given_in_percent_does_not_make_a_half_life_ultimate() {
    let clear = |water: &str| {
        let cells = [
            ("DT50 fresh water", water),
            ("DT50 fresh sediment", "10 d (measured, mineralisation, 12 °C)"),
            ("DT50 soil", "10 d (measured, mineralisation, 12 °C)"),
        ];
        verdict_of(&cells, "REACH", "P")
    };
    assert_eq!(clear("5 d (measured, mineralisation, 12 °C)"), NotFulfilled);
    for water in [
        "5 d (measured, mineralisation 12 % after 100 d, 12 °C)",
        "5 d (measured, not ultimate, 12 °C)",
        "5 d (measured, no mineralisation, 12 °C)",
        "5 d (measured, keine Mineralisierung, 12 °C)",
    ] {
        assert_eq!(clear(water), ScreensOut, "{water}");
    }
}

#[test]
fn a_half_life_that_its_cell_calls_dissipation_hydrolysis_or_photolysis_decides_nothing() {
    for water in [
        "5 d (dissipation)",
        "5 d (field dissipation, 12 °C)",
        "5 d (photolysis)",
        "5 d (direct photolysis at 20 °C)",
        "5 d (hydrolysis, pH 7)",
        "5 d (Hydrolyse)",
        "5 d (OECD 111)",
    ] {
        let cells = [
            ("DT50 fresh water", water),
            ("DT50 fresh sediment", "10 d (12 °C)"),
            ("DT50 soil", "10 d (12 °C)"),
        ];
        assert_eq!(verdict_of(&cells, "REACH", "P"), Unresolved, "{water}");
    }
}

#[test]
fn a_temperature_below_freezing_never_shortens_a_half_life() {
    let at = |temperature| {
        let conditions = Conditions {
            temperature: Some(temperature),
            degradation: DegradationKind::Ultimate,
            ..Conditions::default()
        };
        let half_life = |row: Row, compartment| {
            let property = Property::HalfLife(compartment);
            row.under(property, Value::Point(100.0), Basis::Measured, conditions.clone())
        };
        [Compartment::FreshWater, Compartment::FreshSediment, Compartment::Soil]
            .into_iter()
            .fold(row(), half_life)
            .judged()
            .verdict("REACH", "P")
    };
    for temperature in [-273.15, -268.0, -20.0, -5.0] {
        assert_eq!(at(temperature), Fulfilled, "{temperature}");
    }
}

// Values near a limit, and values that are not what they are called

#[test]
fn a_modelled_range_does_not_clear_where_none_of_its_points_would() {
    let judged = |value| row().with(Property::LogKow, value, Basis::Calculated).judged();
    assert_eq!(judged(Value::Point(4.8)).verdict("CANADA", "B"), Unresolved);
    for value in [Value::Range(4.6, 4.8), Value::Range(3.0, 4.8), Value::Less(4.9)] {
        let judged = judged(value);
        assert_eq!(judged.verdict("CANADA", "B"), Unresolved, "{value:?}");
        assert!(judged.stops("CANADA", "B").contains(&Stop::WithinOneSd), "{value:?}");
    }
    for value in [Value::Point(4.4), Value::Range(3.0, 4.4), Value::Less(4.4)] {
        assert_eq!(judged(value).verdict("CANADA", "B"), ScreensOut, "{value:?}");
    }
}

#[test]
fn an_sd_of_zero_does_not_bring_a_modelled_value_over_the_line() {
    let verdict = |cell| verdict_of(&[("log Kow", cell)], "CANADA", "B");
    assert_eq!(verdict("4.8 ± 0 (QSAR)"), Unresolved);
    assert_eq!(verdict("4.8 ± 0.1 (QSAR)"), ScreensOut);
}

#[test]
fn a_guard_is_not_closed_by_a_value_that_may_not_clear() {
    let surfactant = |log_kow| {
        row()
            .of_type(SubstanceType::Surfactant)
            .with(Property::Bcf, Value::Point(10.0), Basis::Unstated)
            .measured(Property::LogKow, Value::Point(log_kow))
            .judged()
    };
    assert_eq!(surfactant(3.0).verdict("REACH", "B"), Unresolved);
    assert_eq!(surfactant(1.0).verdict("REACH", "B"), Unresolved);
    let modelled = |log_kow| {
        row()
            .with(Property::Bcf, Value::Point(10.0), Basis::Unstated)
            .with(Property::LogKow, Value::Point(log_kow), Basis::Calculated)
            .judged()
            .verdict("REACH", "B")
    };
    assert_eq!(modelled(1.8), Unresolved);
    assert_eq!(modelled(1.4), ScreensOut);
}

#[test]
fn a_log_kow_of_a_mostly_ionised_substance_is_a_lower_bound_however_its_pka_is_written() {
    for (property, pka) in [
        (Property::PkaAcid, Value::Point(4.0)),
        (Property::PkaAcid, Value::Less(3.0)),
        (Property::PkaAcid, Value::Range(3.0, 5.0)),
        (Property::PkaBase, Value::Point(10.0)),
        (Property::PkaBase, Value::Greater(9.0)),
    ] {
        let conditions = Conditions { ph: Some(7.0), ..Conditions::default() };
        let judged = row()
            .under(Property::LogKow, Value::Point(1.0), Basis::Measured, conditions)
            .measured(property, pka)
            .judged();
        assert!(!cleared(judged.verdict("CANADA", "B")), "{property:?} {pka:?}");
    }
}

#[test]
fn of_several_acid_groups_the_strongest_says_what_is_neutral() {
    let conditions = Conditions { ph: Some(7.0), ..Conditions::default() };
    let judged = row()
        .under(Property::LogKow, Value::Point(1.0), Basis::Measured, conditions)
        .measured(Property::PkaAcid, Value::Point(9.9))
        .measured(Property::PkaAcid, Value::Point(3.0))
        .judged();
    assert!(!cleared(judged.verdict("CANADA", "B")));
}

#[test]
fn a_lipid_content_that_may_be_a_fraction_neither_fires_nor_clears_where_its_two_readings_differ() {
    let verdict = |bcf, lipid| {
        let cells = [("BCF", bcf), ("BCF lipid content (%)", lipid)];
        verdict_of(&cells, "REACH", "B")
    };
    assert_eq!(verdict("1500 (measured)", "0.05"), Unresolved);
    assert_eq!(verdict("500 (measured)", "0.8"), Unresolved);
    assert_eq!(verdict("5 (measured)", "0.05"), NotFulfilled);
    assert_eq!(verdict("90000 (measured)", "0.05"), Fulfilled);
    assert_eq!(verdict("500 (measured)", "1"), Fulfilled);
}

#[test]
fn a_log_kow_that_no_relation_takes_does_not_hide_the_estimate_from_another() {
    let with = |value| {
        row().measured(Property::LogKow, Value::Point(2.0)).measured(Property::LogKow, value).judged()
    };
    assert_eq!(with(Value::Point(2.1)).verdict("CLP", "M"), ScreensIn);
    for value in [Value::Point(-4.0), Value::Less(3.0)] {
        assert_eq!(with(value).verdict("CLP", "M"), ScreensIn, "{value:?}");
    }
}

// How a value is known

#[test]
fn what_was_reckoned_is_calculated_in_every_usual_word() {
    for word in [
        "model",
        "modelling",
        "Modellrechnung",
        "simulated",
        "regression",
        "group contribution",
        "abgeschätzt",
        "Abschätzung",
        "kalkuliert",
        "theoretical",
        "Vorhersage",
        "expert judgement",
        "expected",
        "vermutlich",
        "presumably",
    ] {
        let row = read(&[("BCF", &format!("100 ({word})"))]);
        let basis = row.0.readings_of(Property::Bcf)[0].basis;
        assert_eq!(basis, Basis::Calculated, "{word}");
    }
}

#[test]
fn a_value_that_is_said_not_to_be_measured_is_not_measured() {
    for words in [
        "not a measured value",
        "no experimental data",
        "not experimentally determined",
        "no reliable study",
        "kein experimenteller Wert",
        "nicht experimentell bestimmt",
        "ohne Messung",
        "unmeasured",
        "no OECD 305 study",
        "instead of OECD 305",
    ] {
        let row = read(&[("BCF", &format!("100 ({words})"))]);
        let basis = row.0.readings_of(Property::Bcf)[0].basis;
        assert_ne!(basis, Basis::Measured, "{words}");
    }
}

// Identity

#[test]
fn a_word_in_the_structure_column_is_no_second_identifier() {
    for word in ["no", "No", "NO", "non", "none", "con", "not known", "OK", "Spinon"] {
        let mut row = read(&[("SMILES", word), ("log Kow", "1.0 (measured)")]);
        assert!(row.0.smiles.is_none(), "{word}");
        row.0.cas = None;
    }
    for smiles in ["CCO", "c1ccccc1", "O=C=O", "N#N", "Cn1cccc1", "[Na+].[Cl-]", "CO"] {
        assert!(read(&[("SMILES", smiles)]).0.smiles.is_some(), "{smiles}");
    }
}

// Scope

#[test]
fn a_type_that_the_formula_contradicts_puts_no_substance_out_of_scope() {
    let with_formula = |formula: &str| {
        read(&[("Substance type", "inorganic"), ("Formula", formula), ("log Kow", "6.2")]).judged()
    };
    for formula in ["C24H54OSn2", "C8HF15O2", "C12H10", "C36H70O4Zn"] {
        assert_eq!(with_formula(formula).verdict("REACH", "B"), ScreensIn, "{formula}");
    }
    for formula in ["NaCl", "CaCO3", "unknown"] {
        assert_eq!(with_formula(formula).verdict("REACH", "B"), OutOfScope, "{formula}");
    }
}

#[test]
fn a_type_that_the_name_contradicts_puts_no_substance_out_of_scope() {
    for name in [
        "Bis(tributyltin) oxide",
        "Tributylzinnoxid",
        "Ammonium perfluorooctanoate",
        "Cobalt bis(2-ethylhexanoate)",
        "Hexadecyltrimethylammonium bromide",
    ] {
        let judged = row()
            .named(name)
            .of_type(SubstanceType::Inorganic)
            .measured(Property::LogKow, Value::Point(6.2))
            .judged();
        assert_eq!(judged.verdict("REACH", "B"), ScreensIn, "{name}");
    }
}

#[test]
fn a_hybrid_is_not_inorganic() {
    for text in ["organic-inorganic hybrid", "inorganic/organic", "teils organisch, teils anorganisch"] {
        let row = read(&[("Substance type", text)]);
        let kind = row.0.substance_type.map(|cited| cited.value);
        assert_ne!(kind, Some(SubstanceType::Inorganic), "{text}");
    }
    for text in ["metal-organic compound", "organotin", "metallorganische Verbindung", "Organozinnverbindung"]
    {
        let row = read(&[("Substance type", text)]);
        let kind = row.0.substance_type.map(|cited| cited.value);
        assert_eq!(kind, Some(SubstanceType::Organometallic), "{text}");
    }
}
