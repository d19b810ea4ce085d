//! What is said of each kind of fault, listed so that it is read as wording: would a chemist know what to do next?

use kowledger::fault::{CellFault, CellFaultKind, Wording};
use kowledger::quantity::Unit;
use kowledger::workbook::CellRef;

/// A text as it is found in inventories, and the kind of fault it makes.
fn examples() -> Vec<(&'static str, CellFaultKind)> {
    use CellFaultKind as Kind;
    let (what, example) = ("half-life in soil", "40 d");
    let cell = |row, column| CellRef { sheet: "Substances".into(), row, column };
    vec![
        ("soon", Kind::NotA { what, example }),
        ("miscible", Kind::WordNoNumber { what: "water solubility", example: "0.5 mg/L" }),
        ("1.2.3", Kind::BadNumber { example: "4.5" }),
        ("4.5 and 5.1", Kind::SeveralValues { what: "log Kow" }),
        ("12 wekks", Kind::UnknownUnit { word: "wekks".to_owned(), nearest: Some("weeks"), example }),
        ("0.43 oz/gal", Kind::UnknownUnit { word: "oz/gal".to_owned(), nearest: None, example: "0.5 mg/L" }),
        ("3 mg/L", Kind::WrongUnit { unit: Unit::MilligramPerLitre, what, example }),
        ("2 mmol/L", Kind::NeedsMolarMass),
        ("99", Kind::OutOfSense { what: "log Kow" }),
        ("5-3", Kind::BadRange { what: "log Kow" }),
        ("-5", Kind::Negative { what: "BCF" }),
        ("0", Kind::Zero { what: "water solubility", example: "< 0.001 mg/L" }),
        ("2026-05-04", Kind::BecameDate { what: "log Kow" }),
        ("The study was carried out in three soils, of which", Kind::TooLong),
        ("=…", Kind::FormulaWithoutResult),
        ("#N/A", Kind::SheetError),
        ("50-29-4", Kind::CheckDigit { what: "CAS number", expected: 3, corrected: "50-29-3".to_owned() }),
        ("210-001-1", Kind::NoSuchEcNumber),
        ("2025-12-09", Kind::DateIsNoCas),
        ("1330-20-7 / 100-41-4", Kind::SeveralIdentities { what: "CAS numbers" }),
        ("200-024-3", Kind::NumberOfOtherKind { what: "CAS number", found: "EC number" }),
        ("50-29-3", Kind::NumberOfOtherKind { what: "EC number", found: "CAS number" }),
        (
            "50-29-3",
            Kind::OtherIdentity { what: "CAS number", number: "108-95-2".to_owned(), other: cell(6, 1) },
        ),
        ("Name", Kind::SecondHeader),
        ("mixture", Kind::MixtureRow),
        ("article", Kind::ArticleRow),
        ("inherently biodegradable", Kind::InherentlySettlesNothing),
        ("0.82", Kind::FractionOrPercent),
        ("not readily biodegradable, 82 %", Kind::WordsAgainstNumber),
        ("see section 2", Kind::NoStatement),
        ("Carc.", Kind::ClassWithoutCategory { class: "Carc.".to_owned() }),
        ("H302; 350", Kind::StatementUnread { part: "350".to_owned() }),
        ("DDT", Kind::BeyondHeader { fields: 4, header: 3 }),
        ("blend", Kind::NotOneOf { what: "row type", words: "substance, mixture, article" }),
        ("601-043-00-3", Kind::IndexNumber { what: "CAS number", example: "50-29-3" }),
        ("Total", Kind::TotalsRow),
        ("R45", Kind::RiskPhrase { phrase: "R45".to_owned() }),
        ("Carc. Cat. 2", Kind::OldCategory { class: "Carc. Cat. 2".to_owned() }),
        ("readily biodegradable: no", Kind::SaysBoth),
        ("82 % (OECD 306)", Kind::OtherDegradationTest { test: "OECD 306".to_owned() }),
        ("50000", Kind::NotALogarithm { what: "log Kow", example: "Kow = 50000" }),
        ("-0.3", Kind::MayBeLogarithm { what: "BCF", example: "log BCF = 3.2" }),
        ("Kow = 4.5", Kind::LogarithmOrNot { what: "log Kow", example: "log Kow = 4.5" }),
        ("40 j", Kind::DaysOrYears),
        ("0.01", Kind::DimensionlessHenry),
        ("1500000", Kind::ShownInThousands { shown: "1500".to_owned() }),
        ("Solvents", Kind::HeadingRow),
        ("* mean of two determinations", Kind::NoteRow),
        ("Page 2 of 5", Kind::PageLabelRow),
        ("10 d (plasma)", Kind::SpeaksOfOther { found: "a body".to_owned(), what }),
        ("log D 1.2 (pH 7)", Kind::SpeaksOfOther { found: "log d".to_owned(), what: "log Kow" }),
        ("10 d (hydrolysis)", Kind::CountsAs { other: "hydrolysis half-life", what }),
        ("9999", Kind::Placeholder { what: "BCF" }),
        ("not 67-64-1", Kind::NumberOfAnother { what: "CAS number", word: "not".to_owned() }),
        ("mg/L", Kind::UnitsRow),
        (
            "2.500",
            Kind::ThousandsOrDecimals { with_decimals: "2.5".to_owned(), with_thousands: "2500".to_owned() },
        ),
        ("0.69", Kind::UnitBeside { unit: "mg/kg".to_owned() }),
        ("0.69", Kind::UnitsDiffer { unit: "µg/L".to_owned(), header: Unit::MilligramPerLitre }),
        ("100", Kind::SignBeside { sign: "see note".to_owned() }),
        ("2500", Kind::ShownInThousands { shown: "2.5".to_owned() }),
    ]
}

/// The names of the kinds, from the source itself, so that a new one has to have an example here.
fn kinds() -> Vec<&'static str> {
    let source = include_str!("../../src/fault/cell.rs");
    let (_, list) = source.split_once("pub enum CellFaultKind {\n").unwrap();
    let (list, _) = list.split_once("\n}\n").unwrap();
    let variants = list.lines().filter_map(|line| line.strip_prefix("    "));
    variants
        .filter(|line| line.starts_with(|first: char| first.is_ascii_uppercase()))
        .map(|line| line.split([' ', ',', '(']).next().unwrap())
        .collect()
}

#[test]
fn every_kind_has_an_example() {
    let shown: Vec<String> = examples().iter().map(|(_, kind)| format!("{kind:?}")).collect();
    let kinds = kinds();
    assert!(kinds.len() >= 30, "{kinds:?}");
    for kind in kinds {
        let has = |shown: &String| shown.split([' ', '(']).next() == Some(kind);
        assert!(shown.iter().any(has), "{kind} has no example in tests/cli/wording.rs");
    }
}

#[test]
fn titles_are_short_and_sentences_fit_together() {
    for (_, kind) in examples() {
        let Wording { title, wrong, remedy } = kind.wording();
        assert!(title.chars().count() <= 36, "`{title}` is too long to filter by");
        for part in [title, &wrong, &remedy] {
            assert!(!part.ends_with(['.', ';', ',']) && !part.contains("  "), "{part}");
            assert!(part.starts_with(|first: char| first.is_lowercase()), "{part}");
        }
        assert_eq!(kind.to_string(), format!("{wrong}; {remedy}"));
    }
}

#[test]
fn what_is_said_of_each_kind_reads_as_reviewed() {
    let lines: Vec<String> = examples()
        .into_iter()
        .map(|(found, kind)| {
            let title = kind.wording().title;
            let cell = CellRef { sheet: "Substances".into(), row: 6, column: 2 };
            format!("{title}\n    {}", CellFault { cell, found: found.to_owned(), kind })
        })
        .collect();
    insta::assert_snapshot!(lines.join("\n"));
}
