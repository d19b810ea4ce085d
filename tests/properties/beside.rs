//! Values whose unit or sign stands in a column of its own.

#![expect(clippy::expect_used, reason = "a helper that cannot go on stops the test that asks for it")]

use kowledger::columns::Recognised;
use kowledger::fault::CellFaultKind;
use kowledger::quantity::{Interval, Unit, format_interval};
use kowledger::substance::{Field, Property, Substance};
use kowledger::workbook::{CellContent, Row};

use crate::sheet::{columns_of, read_cells, read_last, text_row};

fn read(headers: &[&str], cells: &[&str]) -> Substance {
    let with = |first, others: &[&str]| -> Vec<String> {
        std::iter::once(first).chain(others.iter().copied()).map(str::to_owned).collect()
    };
    let (headers, cells) = (with("CAS", headers), with("50-29-3", cells));
    let headers: Vec<&str> = headers.iter().map(String::as_str).collect();
    let cells: Vec<&str> = cells.iter().map(String::as_str).collect();
    read_last(&[&headers, &cells]).expect("a sheet that is recognised")
}

fn shown(interval: Interval) -> String {
    format_interval(interval, Unit::One)
}

/// Every value that is read, with its property's name.
fn values(substance: &Substance) -> Vec<String> {
    let readings = substance.readings.iter().flat_map(|(property, readings)| {
        readings
            .iter()
            .map(|reading| format!("{} {}", property.id(), shown(reading.quantity.interval).trim()))
    });
    readings.collect()
}

fn columns(headers: &[&str], cells: &[&str]) -> Recognised {
    let rows: Vec<Row> =
        [headers, cells].iter().enumerate().map(|(row, cells)| text_row(row, cells)).collect();
    columns_of(&rows).expect("a sheet that is recognised")
}

#[test]
fn a_value_is_in_the_unit_of_the_column_behind_it_in_every_language() {
    for header in [
        "Unit",
        "Units",
        "NOEC unit",
        "UoM",
        "Einheit",
        "Maßeinheit",
        "Unité",
        "Unité de mesure",
        "Unidad",
        "Unidad de medida",
        "Unità",
        "Unità di misura",
        "Eenheid",
        "単位",
        "单位",
        "單位",
        "NOEC (unit)",
    ] {
        for (value, unit, expected) in [
            ("0.69", "µg/l", "long-term-toxicity 6.9E-4"),
            ("0.69", "mg/L", "long-term-toxicity 0.69"),
            ("690", "ng/L", "long-term-toxicity 6.9E-4"),
            ("< 0.5", "µg/L", "long-term-toxicity < 5E-4"),
            ("0.69", "", "long-term-toxicity 0.69"),
            ("0.69", "-", "long-term-toxicity 0.69"),
            ("0.69 mg/L", "µg/l", "long-term-toxicity 0.69"),
        ] {
            let substance = read(&["NOEC", header], &[value, unit]);
            assert_eq!(values(&substance), [expected], "{header}: {value} {unit}");
            assert!(substance.faults.is_empty(), "{header}: {value} {unit}");
        }
    }
}

#[test]
fn a_number_of_the_file_is_in_the_unit_beside_it_too() {
    let text = |text: &str| CellContent::Text(text.to_owned());
    let cells = [text("50-29-3"), CellContent::Number(0.69), text("µg/L")];
    let substance = read_cells(&["CAS", "NOEC", "Unit"], &cells).unwrap();
    assert_eq!(values(&substance), ["long-term-toxicity 6.9E-4"]);
    let cells = [text("50-29-3"), CellContent::Number(100.0), text(">")];
    let substance = read_cells(&["CAS", "BCF", "BCF qualifier"], &cells).unwrap();
    assert_eq!(values(&substance), ["bcf > 100"]);
}

#[test]
fn a_unit_that_does_not_fit_makes_the_value_a_fault() {
    for (headers, cells) in [
        (["NOEC", "Unit"], ["0.69", "mg/kg"]),
        (["NOEC", "Unit"], ["0.69", "see report"]),
        (["NOEC", "Unit"], ["0.69 mg/L", "days"]),
        (["BCF", "Unit"], ["1.0", "10^3 l/kg"]),
        (["BCF", "Unit"], ["3.2", "log"]),
        (["Half-life in soil", "Unit"], ["40", "mg/L"]),
    ] {
        let substance = read(&headers, &cells);
        assert!(values(&substance).is_empty(), "{headers:?} {cells:?}");
        let [fault] = substance.faults.as_slice() else {
            panic!("{headers:?} {cells:?}: {:?}", substance.faults);
        };
        assert_eq!(fault.kind, CellFaultKind::UnitBeside { unit: cells[1].to_owned() });
        assert_eq!((fault.cell.column, fault.found.as_str()), (1, cells[0]));
    }
    let substance = read(&["NOEC (mg/L)", "Unit"], &["0.69", "µg/L"]);
    let differ = CellFaultKind::UnitsDiffer { unit: "µg/L".to_owned(), header: Unit::MilligramPerLitre };
    assert_eq!(substance.faults.iter().map(|fault| &fault.kind).collect::<Vec<_>>(), [&differ]);
    assert!(values(&substance).is_empty());
}

#[test]
fn other_units_beside_are_read_as_they_are_in_cells() {
    for (headers, cells, expected) in [
        (["Half-life in soil", "Unit"], ["6", "months"], "half-life-soil 182.6"),
        (["Half-life in soil", "Unit"], ["40", "d"], "half-life-soil 40"),
        (["BCF", "Unit"], ["1500", "L/kg"], "bcf 1500"),
        (["log BCF", "Unit"], ["3", "L/kg"], "bcf 1000"),
        (["log Kow", "Unit"], ["4.5", "-"], "log-kow 4.5"),
        (["log Kow", "Unit"], ["4.5", "dimensionless"], "log-kow 4.5"),
        (["NOEC unit mg/L", "Supplier"], ["4.5", "x"], "long-term-toxicity 4.5"),
    ] {
        let read = values(&read(&headers, &cells));
        assert_eq!(read.len(), 1, "{headers:?} {cells:?}");
        assert!(read[0].starts_with(expected), "{headers:?} {cells:?}: {read:?}");
    }
    let french = read(&["Demi-vie dans le sol", "Unité"], &["40", "j"]);
    assert_eq!(values(&french), ["half-life-soil 40"]);
    let doubtful = read(&["Half-life in soil", "Unit"], &["40", "j"]);
    assert_eq!(doubtful.faults.first().map(|fault| &fault.kind), Some(&CellFaultKind::DaysOrYears));
}

#[test]
fn a_sign_in_a_column_of_its_own_stands_before_its_value() {
    for header in [
        ">/<",
        "</>",
        "BCF qualifier",
        "BCF operator",
        "Qualifier",
        "Prefix",
        "Operator",
        "Vorzeichen",
        "Relation",
        "Opérateur",
        "Operador",
        "Qualificatore",
        "Operatore",
        "Voorvoegsel",
        "不等号",
        "限定符",
    ] {
        for (sign, value, expected) in [
            (">", "100", "bcf > 100"),
            ("<", "100", "bcf < 100"),
            (">=", "100 L/kg", "bcf ≥ 100"),
            ("≤", "100", "bcf ≤ 100"),
            ("=", "100", "bcf 100"),
            (">", "> 100", "bcf > 100"),
        ] {
            let substance = read(&[header, "BCF"], &[sign, value]);
            assert_eq!(values(&substance), [expected], "{header}: {sign} {value}");
        }
    }
    let about = read(&["Qualifier", "BCF"], &["ca.", "100"]);
    assert!(about.readings[&Property::Bcf][0].quantity.approximate);
    let no_sign = read(&["BCF qualifier", "BCF"], &["", "100"]);
    assert_eq!(values(&no_sign), ["bcf 100"]);
}

#[test]
fn what_is_no_sign_or_cannot_stand_before_the_value_makes_it_a_fault() {
    for (sign, value) in [
        ("see note", "100"),
        (">", "< 100"),
        (">", "100; 200"),
        (">", "100-200"),
        ("=", "> 100"),
        ("5", "100"),
    ] {
        let substance = read(&["BCF qualifier", "BCF"], &[sign, value]);
        assert!(values(&substance).is_empty(), "{sign} {value}");
        let kinds: Vec<&CellFaultKind> = substance.faults.iter().map(|fault| &fault.kind).collect();
        assert_eq!(kinds, [&CellFaultKind::SignBeside { sign: sign.to_owned() }], "{sign} {value}");
    }
}

#[test]
fn each_column_belongs_to_the_value_it_names_or_stands_beside() {
    for (headers, cells, expected) in [
        // Named, wherever it stands.
        (
            vec!["BCF", "NOEC", "BCF unit", "NOEC unit"],
            vec!["5", "7", "mL/g", "µg/L"],
            vec!["bcf 5", "long-term-toxicity 0.007"],
        ),
        (
            vec!["NOEC", "Unit", "BCF", "Unit"],
            vec!["7", "µg/L", "5", "L/kg"],
            vec!["bcf 5", "long-term-toxicity 0.007"],
        ),
        (vec!["Qualifier", "NOEC", "Unit"], vec!["<", "7", "µg/L"], vec!["long-term-toxicity < 0.007"]),
        (vec!["NOEC", "Qualifier", "Unit"], vec!["7", "<", "µg/L"], vec!["long-term-toxicity < 0.007"]),
        // Signs stand before; behind, where the last of them has nothing behind it.
        (vec!["BCF", "Qualifier", "NOEC"], vec!["5", "<", "7"], vec!["bcf 5", "long-term-toxicity < 7"]),
        (vec!["BCF", "Qualifier", "NOEC", "Qualifier"], vec![">", "5", "<", "7"], vec![]),
        (
            vec!["BCF", "Qualifier", "NOEC", "Qualifier"],
            vec!["5", ">", "7", "<"],
            vec!["bcf > 5", "long-term-toxicity < 7"],
        ),
        // A unit of something else.
        (vec!["BCF", "Stored amount", "Unit"], vec!["5", "30", "kg"], vec!["bcf 5"]),
        // It may be that of the NOEC or of what is not recognised.
        (vec!["NOEC", "Whatever", "Unit"], vec!["5", "30", "µg/L"], vec![]),
        // A person.
        (vec!["Operator", "BCF"], vec!["Smith", "5"], vec!["bcf 5"]),
    ] {
        let mut read = values(&read(&headers, &cells));
        read.sort();
        assert_eq!(read, expected, "{headers:?} {cells:?}");
    }
}

#[test]
fn a_unit_under_the_name_of_a_group_is_that_of_the_group() {
    let rows: [&[&str]; 3] = [
        &["CAS", "NOEC", "", "BCF", ""],
        &["", "Wert", "Einheit", "Wert", "Einheit"],
        &["50-29-3", "0.69", "µg/l", "5", "L/kg"],
    ];
    let substance = read_last(&rows).unwrap();
    assert_eq!(values(&substance), ["bcf 5", "long-term-toxicity 6.9E-4"]);
}

#[test]
fn the_list_of_columns_says_whose_unit_and_sign_they_are() {
    let found = columns(&["CAS", ">/<", "NOEC", "Unit"], &["50-29-3", "<", "7", "µg/L"]);
    let reason = |index: usize| found.columns[index].reason.clone();
    assert_eq!(found.columns[1].field, Field::QualifierOfValue);
    assert_eq!(found.columns[3].field, Field::UnitOfValue);
    assert!(reason(1).ends_with("; qualifier of column C"), "{}", reason(1));
    assert!(reason(3).ends_with("; unit of column C"), "{}", reason(3));
    assert!(reason(2).contains("qualifier in column B") && reason(2).contains("unit in column D"));
    let unclear = columns(&["CAS", "NOEC", "Whatever", "Unit"], &["50-29-3", "7", "x", "µg/L"]);
    assert!(unclear.columns.iter().all(|column| column.field == Field::CasNumber));
    assert!(unclear.remarks.iter().any(|remark| remark.contains("column B (`NOEC`) is left aside")));
}

#[test]
fn amounts_are_in_the_unit_beside_them() {
    for (unit, tonnes) in [("t", 1500.0), ("t/a", 1500.0), ("kg", 1.5), ("kg/a", 1.5), ("", 1500.0)] {
        let substance = read(&["Tonnage", "Unit"], &["1500", unit]);
        let read = substance.tonnage.as_ref().and_then(|reading| reading.quantity.single());
        assert_eq!(read, Some(tonnes), "{unit}: {:?}", substance.faults);
    }
    let lost = read(&["Tonnage", "Unit"], &["1500", "drums"]);
    assert!(lost.tonnage.is_none() && lost.faults.len() == 1);
}

#[test]
fn a_business_unit_is_no_unit() {
    let found = columns(&["CAS", "BCF", "Business unit"], &["50-29-3", "7", "Plant A"]);
    assert!(found.columns.iter().all(|column| column.field != Field::UnitOfValue));
}
