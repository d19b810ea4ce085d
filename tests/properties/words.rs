//! Cells of words: biodegradability, hazard statements, types, reliability, and the columns beside a value.

use kowledger::quantity::{Bound, Interval};
use kowledger::substance::{
    Basis, Completeness, DegradationTest, HazardStatements, Property, ReadyBiodegradability, Substance,
    SubstanceType,
};
use kowledger::workbook::CellContent;

use crate::sheet::{read_cells, read_last};

fn ready_row(text: &str) -> Result<Substance, String> {
    read_last(&[&["CAS", "Ready biodegradability"], &["50-29-3", text]])
}

fn ready(substance: &Substance) -> Option<&ReadyBiodegradability> {
    substance.ready.first().map(|cited| &cited.value)
}

#[test]
fn ready_biodegradability_is_read_from_words_and_from_numbers() {
    use DegradationTest::{NotReady, Open, Ready};
    for (text, result) in [
        ("yes", Ready),
        ("ja", Ready),
        ("ready", Ready),
        ("readily biodegradable", Ready),
        ("Readily biodegradable (82 %, 28 d)", Ready),
        ("leicht biologisch abbaubar", Ready),
        ("leicht abbaubar", Ready),
        ("passed", Ready),
        ("bestanden", Ready),
        ("readily biodegradable, but failing 10-day window", Ready),
        ("readily biodegradable, 10-day window not met", Ready),
        ("no", NotReady),
        ("no (32 %, 28 d)", NotReady),
        ("ready biodegradability: 40 %, 28 d", NotReady),
        ("nein", NotReady),
        ("not ready", NotReady),
        ("not readily biodegradable", NotReady),
        ("Not readily biodegradable (inherently biodegradable)", NotReady),
        ("nicht leicht biologisch abbaubar", NotReady),
        ("nicht biologisch abbaubar", NotReady),
        ("not biodegradable", NotReady),
        ("non-biodegradable", NotReady),
        ("schwer abbaubar", NotReady),
        ("failed", NotReady),
        ("82 %", Ready),
        ("82 %, 28 d, OECD 301A", Ready),
        ("82 % in 20 days", Ready),
        ("70 %", Ready),
        ("> 70 %", Ready),
        ("69 %", Open),
        ("65 % (DOC)", Open),
        ("65 % BOD, 28 d", Ready),
        ("65 % ThCO2", Ready),
        ("65 % O2", Ready),
        ("60 % CO2 (28 d)", Ready),
        ("65 % (OECD 301F)", Ready),
        ("65 %, OECD 301 A", Open),
        ("> 60 %", Open),
        ("> 60 % CO2", Ready),
        ("59.9 % CO2", NotReady),
        ("40 %, 28 d", NotReady),
        ("< 10 %", NotReady),
        ("40-80 %", Open),
        ("55-65 % CO2", Open),
        ("82 %, 60 d", Open),
        ("40 %, 60 d", NotReady),
        ("40 % after 14 days", Open),
        ("readily biodegradable, 82 % in 60 d", Open),
        ("not readily biodegradable, 65 % in 28 d", NotReady),
        ("82", Ready),
        ("0 %", NotReady),
    ] {
        let substance = ready_row(text).unwrap();
        assert_eq!(ready(&substance).map(|ready| ready.result), Some(result), "{text}");
        assert!(substance.faults.is_empty(), "{text}: {:?}", substance.faults);
    }
}

#[test]
fn what_settles_nothing_on_ready_biodegradability_gives_no_reading_and_a_fault() {
    for (text, part) in [
        ("inherently biodegradable", "does not settle ready biodegradability"),
        ("inhärent abbaubar", "does not settle ready biodegradability"),
        ("inherently (75 %, OECD 302B)", "does not settle ready biodegradability"),
        ("not tested for ready biodegradability", "is no result of a ready biodegradability test"),
        ("ready biodegradability unknown", "is no result of a ready biodegradability test"),
        ("ready biodegradability", "is no result of a ready biodegradability test"),
        ("expected to be readily biodegradable", "is no result of a ready biodegradability test"),
        ("no information", "is no result of a ready biodegradability test"),
        ("leichte Abbaubarkeit nicht geprüft", "is no result of a ready biodegradability test"),
        ("biodegradable", "is no result of a ready biodegradability test"),
        ("soon", "is no result of a ready biodegradability test"),
        ("0.82", "may be a fraction or a percentage"),
        ("1", "may be a fraction or a percentage"),
    ] {
        let substance = ready_row(text).unwrap();
        assert_eq!(ready(&substance), None, "{text}");
        assert!(substance.faults[0].to_string().contains(part), "{text}: {}", substance.faults[0]);
    }
    let missing = ready_row("n.d.").unwrap();
    assert_eq!((ready(&missing), missing.faults.len()), (None, 0));
}

#[test]
fn words_against_numbers_are_open_and_a_fault() {
    for text in ["readily biodegradable (40 %, 28 d)", "not readily biodegradable (82 %, 28 d)"] {
        let substance = ready_row(text).unwrap();
        assert_eq!(ready(&substance).map(|ready| ready.result), Some(DegradationTest::Open), "{text}");
        assert_eq!(substance.faults.len(), 1, "{text}");
    }
}

#[test]
fn true_and_false_answer_the_question_of_the_header() {
    for (content, result) in [
        (CellContent::Boolean(true), Some(DegradationTest::Ready)),
        (CellContent::Boolean(false), Some(DegradationTest::NotReady)),
        (CellContent::Number(82.0), Some(DegradationTest::Ready)),
        (CellContent::Number(40.0), Some(DegradationTest::NotReady)),
        (CellContent::Number(65.0), Some(DegradationTest::Open)),
        (CellContent::Number(0.82), None),
    ] {
        let substance =
            read_cells(&["CAS", "Ready biodegradability"], &[CellContent::Empty, content.clone()]);
        assert_eq!(ready(&substance.unwrap()).map(|ready| ready.result), result, "{content:?}");
    }
}

#[test]
fn a_test_number_makes_a_result_measured_and_a_model_makes_it_calculated() {
    for (text, basis) in [
        ("82 %", Basis::Unstated),
        ("82 % (OECD 301B)", Basis::Measured),
        ("readily biodegradable (QSAR)", Basis::Calculated),
        ("not readily biodegradable (predicted)", Basis::Calculated),
    ] {
        assert_eq!(ready(&ready_row(text).unwrap()).map(|ready| ready.basis), Some(basis), "{text}");
    }
    let headers = ["CAS", "Ready biodegradability", "Guideline"];
    let beside = read_last(&[&headers, &["50-29-3", "82 %", "OECD 301F"]]).unwrap();
    assert_eq!(ready(&beside).map(|ready| ready.basis), Some(Basis::Measured));
    let other = read_last(&[&headers, &["50-29-3", "82 %", "OECD 117"]]).unwrap();
    assert_eq!(ready(&other).map(|ready| ready.basis), Some(Basis::Unstated));
}

#[test]
fn an_inherent_test_has_its_guideline_percentage_and_days() {
    for (text, guideline, percent, days) in [
        ("75 %, 28 d, OECD 302B", Some("OECD 302B"), Some(75.0), Some(28.0)),
        ("80 % in 7 d (OECD 302 C)", Some("OECD 302C"), Some(80.0), Some(7.0)),
        ("Zahn-Wellens 71 %", Some("OECD 302B"), Some(71.0), None),
        ("inherently biodegradable", None, None, None),
        ("72", None, Some(72.0), None),
    ] {
        let substance = read_last(&[&["CAS", "Inherent biodegradability"], &["50-29-3", text]]).unwrap();
        let inherent = &substance.inherent.first().unwrap().value;
        let degraded = inherent.degraded.map(Interval::low);
        assert_eq!(inherent.guideline.as_deref(), guideline, "{text}");
        assert_eq!(degraded, percent.map(Bound::Included), "{text}");
        assert_eq!(inherent.days, days, "{text}");
    }
    let wrong = read_last(&[&["CAS", "Inherent biodegradability"], &["50-29-3", "soon"]]).unwrap();
    assert_eq!((wrong.inherent.len(), wrong.faults.len()), (0, 1));
}

fn statements_row(text: &str) -> Result<Substance, String> {
    read_last(&[&["CAS", "Hazard statements"], &["50-29-3", text]])
}

fn statements(substance: &Substance) -> Option<&HazardStatements> {
    substance.hazard_statements.as_ref().map(|cited| &cited.value)
}

#[test]
fn hazard_statements_are_read_in_every_usual_spelling() {
    for (text, codes) in [
        ("H350", vec!["H350"]),
        ("H 350", vec!["H350"]),
        ("h350", vec!["H350"]),
        ("H360FD", vec!["H360FD"]),
        ("H360Fd; H372", vec!["H360Fd", "H372"]),
        ("H350i", vec!["H350i"]),
        ("H361 d", vec!["H361d"]),
        ("H372 **", vec!["H372"]),
        ("EUH 440", vec!["EUH440"]),
        ("EUH440, EUH441", vec!["EUH440", "EUH441"]),
        ("H301/311/331", vec!["H301", "H311", "H331"]),
        ("H300+H310", vec!["H300", "H310"]),
        ("Repr. 1B; H360", vec!["H360"]),
        ("Repr. 1B; H360FD", vec!["H360FD"]),
        ("Carc. 1A", vec!["H350"]),
        ("Carc. 1B, Muta. 1B", vec!["H340", "H350"]),
        ("Carc. Cat. 1B", vec!["H350"]),
        ("Karz. 1B", vec!["H350"]),
        ("Repr. 2", vec!["H361"]),
        ("STOT RE 1", vec!["H372"]),
        ("STOT RE 2", vec!["H373"]),
        ("Carc. 2", vec!["H351"]),
        ("Aquatic Chronic 1", vec!["H410"]),
        ("H410: Very toxic to aquatic life", vec!["H410"]),
        ("none", vec![]),
        ("None.", vec![]),
        ("not classified", vec![]),
        ("keine", vec![]),
        ("nicht eingestuft", vec![]),
    ] {
        let substance = statements_row(text).unwrap();
        let found: Option<Vec<&str>> = statements(&substance).map(|statements| statements.codes().collect());
        assert_eq!(found, Some(codes), "{text}");
        assert!(substance.faults.is_empty(), "{text}");
    }
}

#[test]
fn a_cell_without_statement_is_never_a_row_without_hazards() {
    for text in ["n.d.", "-", "n/a", "unknown", "k.A.", "", "no data", "keine Angabe", "keine Daten"] {
        let substance = statements_row(text).unwrap();
        assert_eq!((statements(&substance), substance.faults.len()), (None, 0), "{text}");
    }
    for text in [
        "not classified due to lack of data",
        "no information",
        "none known",
        "see data sheet",
        "toxic",
        "Carc.",
        "R45",
        "H35",
        "P280",
        "carcinogenic",
    ] {
        let substance = statements_row(text).unwrap();
        assert_eq!((statements(&substance), substance.faults.len()), (None, 1), "{text}");
    }
}

#[test]
fn a_class_without_category_leaves_the_statements_incomplete() {
    let substance = statements_row("H410; Carc.").unwrap();
    let found = statements(&substance).unwrap();
    assert_eq!(found.codes().collect::<Vec<_>>(), ["H410"]);
    assert_eq!((found.completeness(), substance.faults.len()), (Completeness::Incomplete, 1));
    let complete = statements_row("H410; Carc. 1B").unwrap();
    assert_eq!(statements(&complete).map(HazardStatements::completeness), Some(Completeness::Complete));
}

#[test]
fn codes_and_classes_in_two_columns_add_up() {
    let headers = ["CAS", "Classification", "H statements"];
    let substance = read_last(&[&headers, &["50-29-3", "Carc. 1B", "H410"]]).unwrap();
    assert_eq!(statements(&substance).unwrap().codes().collect::<Vec<_>>(), ["H350", "H410"]);
}

#[test]
fn substance_types_are_known_in_both_languages() {
    for (text, kind) in [
        ("organic", SubstanceType::Organic),
        ("organisch", SubstanceType::Organic),
        ("inorganic", SubstanceType::Inorganic),
        ("Anorganisches Salz", SubstanceType::Inorganic),
        ("inorganic salt", SubstanceType::Inorganic),
        ("organic salt", SubstanceType::OrganicSalt),
        ("metallorganisch", SubstanceType::Organometallic),
        ("Polymer", SubstanceType::Polymer),
        ("UVCB", SubstanceType::Uvcb),
        ("multi-constituent", SubstanceType::MultiConstituent),
        ("Tensid", SubstanceType::Surfactant),
    ] {
        let substance = read_last(&[&["CAS", "Substance type"], &["50-29-3", text]]).unwrap();
        assert_eq!(substance.substance_type.map(|cited| cited.value), Some(kind), "{text}");
    }
    let unknown = read_last(&[&["CAS", "Substance type"], &["50-29-3", "blue"]]).unwrap();
    assert_eq!((unknown.substance_type.is_none(), unknown.faults.len()), (true, 1));
}

/// Basis of the log Kow and of the BCF of a row with these companion columns.
fn bases(companion: &str, text: &str) -> Result<(Option<Basis>, Option<Basis>), String> {
    let headers = ["CAS", "log Kow", "BCF", companion];
    let substance = read_last(&[&headers, &["50-29-3", "4.5", "1500", text]])?;
    let basis = |property| substance.readings_of(property).first().map(|reading| reading.basis);
    Ok((basis(Property::LogKow), basis(Property::Bcf)))
}

#[test]
fn method_and_guideline_columns_speak_only_of_the_values_they_can_mean() {
    use Basis::{Calculated, Measured, Unstated};
    for (companion, text, expected) in [
        ("log Kow method", "shake flask", (Measured, Unstated)),
        ("log Kow method", "OECD 117", (Measured, Unstated)),
        ("log Kow method", "QSAR", (Calculated, Unstated)),
        ("log Kow method", "berechnet", (Calculated, Unstated)),
        ("log Kow method", "handbook", (Unstated, Unstated)),
        ("Guideline", "OECD 305", (Unstated, Measured)),
        ("Guideline", "305", (Unstated, Measured)),
        ("Guideline", "OECD 117", (Measured, Unstated)),
        ("Guideline", "GLP study", (Unstated, Unstated)),
        ("Guideline", "QSAR", (Calculated, Calculated)),
        ("BCF guideline", "GLP study", (Unstated, Measured)),
    ] {
        let (log_kow, bcf) = expected;
        assert_eq!(bases(companion, text), Ok((Some(log_kow), Some(bcf))), "{companion}: {text}");
    }
}

#[test]
fn an_estimate_is_never_shown_as_measured_by_the_columns_beside_it() {
    let headers = ["CAS", "log Kow (measured)", "log Kow method"];
    let substance = read_last(&[&headers, &["50-29-3", "4.5", "QSAR"]]).unwrap();
    assert_eq!(substance.readings_of(Property::LogKow)[0].basis, Basis::Calculated);
    let headers = ["CAS", "log Kow (calculated)", "log Kow method"];
    let substance = read_last(&[&headers, &["50-29-3", "4.5", "OECD 117"]]).unwrap();
    assert_eq!(substance.readings_of(Property::LogKow)[0].basis, Basis::Calculated);
}

#[test]
fn companion_columns_fill_in_what_the_cell_leaves_open() {
    let headers = [
        "CAS",
        "log Kow",
        "log Kow SD",
        "log Kow temperature",
        "log Kow pH",
        "BCF",
        "BCF lipid content",
        "DT50 soil",
        "Half-life temperature",
        "Koc",
        "Koc pH",
        "Reliability",
    ];
    let cells =
        ["50-29-3", "4.5", "0.3", "25", "7", "1500 (3 % lipid)", "5", "40 d", "20 °C", "100", "6,5", "2"];
    let substance = read_last(&[&headers, &cells]).unwrap();
    assert!(substance.faults.is_empty(), "{:?}", substance.faults);
    let reading = |property| &substance.readings_of(property)[0];
    let log_kow = reading(Property::LogKow);
    assert_eq!(log_kow.quantity.written_sd, Some(0.3));
    assert_eq!((log_kow.conditions.temperature, log_kow.conditions.ph), (Some(25.0), Some(7.0)));
    assert_eq!(reading(Property::Bcf).conditions.lipid, Some(3.0));
    assert_eq!(reading(Property::Koc).conditions.ph, Some(6.5));
    let soil = Property::from_id("half-life-soil").unwrap();
    assert_eq!(reading(soil).conditions.temperature, Some(20.0));
    for property in [Property::LogKow, Property::Bcf, Property::Koc, soil] {
        assert_eq!(reading(property).conditions.reliability, Some(2), "{property:?}");
    }
}

#[test]
fn reliability_scores_are_read_in_words_and_numbers() {
    for (text, score) in [
        ("2", Some(2)),
        ("1 (reliable without restriction)", Some(1)),
        ("reliable with restrictions", Some(2)),
        ("not reliable", Some(3)),
        ("not assignable", Some(4)),
        ("RL2", Some(2)),
        ("Klimisch 2", Some(2)),
        ("7", None),
        ("good", None),
    ] {
        let substance = read_last(&[&["CAS", "BCF", "Reliability"], &["50-29-3", "1500", text]]).unwrap();
        assert_eq!(substance.readings_of(Property::Bcf)[0].conditions.reliability, score, "{text}");
        assert_eq!(substance.faults.is_empty(), score.is_some(), "{text}");
    }
}

#[test]
fn number_cells_dates_and_errors_are_told_apart() {
    let row = |content| read_cells(&["CAS", "DT50 soil [wk]"], &[CellContent::Empty, content]).unwrap();
    let soil = Property::from_id("half-life-soil").unwrap();
    let number = row(CellContent::Number(12.0));
    assert_eq!(number.readings_of(soil)[0].quantity.single(), Some(84.0));
    for (content, part) in [
        (CellContent::DateTime(45_000.0), "is a date"),
        (CellContent::Error("#N/A".to_owned()), "Sheet!B2: `#N/A` is an error of the spreadsheet"),
        (CellContent::Boolean(true), "is no half-life in soil"),
        (CellContent::Number(-1.0), "is negative"),
        (CellContent::Number(0.0), "is zero"),
        (CellContent::Number(f64::INFINITY), "out of any range"),
    ] {
        let substance = row(content);
        assert!(substance.readings_of(soil).is_empty());
        assert!(substance.faults[0].to_string().contains(part), "{}", substance.faults[0]);
    }
}

#[test]
fn molar_mass_serves_molar_concentrations_wherever_it_stands() {
    let headers = ["CAS", "Water solubility (mmol/L)", "Molar mass"];
    let substance = read_last(&[&headers, &["50-29-3", "2", "100 g/mol"]]).unwrap();
    assert_eq!(substance.readings_of(Property::WaterSolubility)[0].quantity.single(), Some(200.0));
}

#[test]
fn the_columns_decimal_style_decides_three_digits() {
    let rows: [&[&str]; 3] = [&["CAS", "BCF"], &["50-29-3", "12,5"], &["50-29-3", "1.234"]];
    let substance = read_last(&rows).unwrap();
    assert_eq!(substance.readings_of(Property::Bcf)[0].quantity.single(), Some(1234.0));
}

#[test]
fn one_reader_serves_all_threads() {
    fn shared<T: Send + Sync>() -> usize {
        std::mem::size_of::<T>()
    }
    assert!(shared::<kowledger::substance::RowReader>() > 0);
}

proptest::proptest! {
    #![proptest_config(crate::sampling())]

    #[test]
    fn no_row_of_text_panics(text in proptest::prelude::any::<String>()) {
        let headers = [
            "CAS", "EC number", "SMILES", "InChIKey", "Name", "Row type", "Substance type", "log Kow", "log Kow method",
            "Ready biodegradability", "Inherent biodegradability", "Hazard statements", "Reliability", "Guideline",
            "Content", "Tonnage",
        ];
        let cells = [text.as_str(); 16];
        proptest::prop_assert!(read_last(&[&headers, &cells]).is_ok());
    }
}
