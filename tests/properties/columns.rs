//! Headers and what they name (`tests/fixtures/headers.tsv`), and how the header of a sheet is found.

use std::collections::BTreeSet;

use kowledger::columns::{Column, ColumnOverride, Recognised, recognise};
use kowledger::quantity::{DecimalStyle, Unit, format_number};
use kowledger::substance::{Basis, DegradationKind, Field, Property};
use kowledger::workbook::{CellContent, Row};

use crate::sheet::{columns_of, content_row, text_row, words};

const TABLE: &str = include_str!("../fixtures/headers.tsv");

const LANGUAGES: [&str; 8] = ["en", "de", "fr", "es", "it", "nl", "ja", "zh"];

/// A line of the table.
struct Known {
    language: &'static str,
    header: String,
    field: &'static str,
    unit: &'static str,
    said: &'static str,
}

fn table() -> impl Iterator<Item = Known> {
    TABLE.lines().filter(|line| !line.starts_with('#')).map(|line| {
        let mut parts = line.split('\t');
        let mut next = || parts.next().unwrap_or_default();
        let (language, header) = (next(), next().replace("\\n", "\n"));
        Known { language, header, field: next(), unit: next(), said: next() }
    })
}

/// The column of a header beside others. A SMILES column makes the sheet an inventory and is named by no other header,
/// but by its own.
fn column_of(header: &str) -> Result<Option<Column>, String> {
    let recognised = columns_of(&[text_row(0, &[header, "SMILES", "Supplier", "Name"])])?;
    Ok(recognised.columns.into_iter().find(|column| column.index == 0))
}

#[test]
fn every_header_of_the_table_names_its_field_and_unit() {
    let mut wrong = Vec::new();
    for Known { header, field, unit, .. } in table() {
        let found = column_of(&header).unwrap();
        let found_field = found.as_ref().map_or("none", |column| column.field.id());
        let found_unit = found.and_then(|column| column.unit).map_or("", Unit::symbol);
        if (found_field, found_unit) != (field, unit) {
            wrong.push(format!("`{header}`: expected {field} {unit}, found {found_field} {found_unit}"));
        }
    }
    assert!(wrong.is_empty(), "{}", wrong.join("\n"));
}

/// Basis and conditions as the table writes them.
fn said(column: &Column) -> String {
    let conditions = &column.conditions;
    let degradation = match conditions.degradation {
        DegradationKind::Ultimate => Some("ultimate".to_owned()),
        DegradationKind::Primary => Some("primary".to_owned()),
        DegradationKind::NotStated => None,
    };
    let parts = [
        column.basis.map(|basis| basis.word().to_owned()),
        conditions.temperature.map(|degrees| format!("{} °C", format_number(degrees))),
        conditions.ph.map(|ph| format!("pH {}", format_number(ph))),
        conditions.lipid.map(|lipid| format!("{} % lipid", format_number(lipid))),
        degradation,
        conditions.organism.as_ref().map(|_| "organism".to_owned()),
        conditions.method.as_ref().map(|_| "guideline".to_owned()),
    ];
    parts.into_iter().flatten().collect::<Vec<_>>().join("; ")
}

#[test]
fn headers_of_the_table_carry_their_basis_and_conditions() {
    let mut wrong = Vec::new();
    for known in table().filter(|known| !known.said.is_empty()) {
        let found = column_of(&known.header).unwrap().map(|column| said(&column)).unwrap_or_default();
        if found != known.said {
            wrong.push(format!("`{}`: expected {}, found {found}", known.header, known.said));
        }
    }
    assert!(wrong.is_empty(), "{}", wrong.join("\n"));
}

#[test]
fn every_language_has_its_headers_that_name_a_field_and_that_name_none() {
    for language in LANGUAGES {
        let (none, named): (Vec<Known>, Vec<Known>) =
            table().filter(|known| known.language == language).partition(|known| known.field == "none");
        assert!(named.len() >= 90 && none.len() >= 10, "{language}: {} and {}", named.len(), none.len());
    }
}

#[test]
fn every_field_is_named_in_all_eight_languages() {
    for language in LANGUAGES {
        let named: BTreeSet<&str> =
            table().filter(|known| known.language == language).map(|known| known.field).collect();
        // Columns beside a value are in a table of their own, in the tests of `beside`.
        let beside = ["unit-of-value", "qualifier-of-value"];
        let others = Field::all().map(Field::id).filter(|id| !beside.contains(id));
        let missing: Vec<&str> = others.filter(|id| !named.contains(id)).collect();
        assert!(missing.is_empty(), "{language}: {missing:?}");
    }
}

fn column(recognised: &Recognised, field: Field) -> Option<&Column> {
    recognised.columns.iter().find(|column| column.field == field)
}

#[test]
fn a_header_below_title_rows_is_found() {
    let rows = [
        text_row(0, &["Inventory of the Elbe site"]),
        text_row(2, &["Status:", "2026"]),
        text_row(4, &["Name", "CAS-Nr.", "log Kow"]),
        text_row(5, &["DDT", "50-29-3", "6,9"]),
    ];
    let recognised = columns_of(&rows).unwrap();
    assert_eq!((recognised.header_row, recognised.first_data_row), (4, 5));
    assert_eq!(recognised.columns.len(), 3);
}

#[test]
fn a_row_of_units_below_the_names_belongs_to_the_header() {
    let rows = [
        text_row(0, &["Name", "CAS", "log Kow", "DT50 soil", "Water solubility"]),
        text_row(1, &["", "", "-", "wk", "[µg/L]"]),
        text_row(2, &["DDT", "50-29-3", "6.9", "100", "5"]),
    ];
    let recognised = columns_of(&rows).unwrap();
    assert_eq!((recognised.header_row, recognised.first_data_row), (1, 2));
    let soil = column(&recognised, Field::from_id("half-life-soil").unwrap()).unwrap();
    assert_eq!((soil.header.as_str(), soil.unit.map(Unit::symbol)), ("DT50 soil [wk]", Some("wk")));
    let solubility = column(&recognised, Field::Property(Property::WaterSolubility)).unwrap();
    assert_eq!(solubility.unit.map(Unit::symbol), Some("µg/L"));
}

#[test]
fn a_first_row_of_data_is_no_row_of_units() {
    let rows = [text_row(0, &["Name", "log Kow"]), text_row(1, &["d", "4.5"]), text_row(2, &["K", ""])];
    assert_eq!(columns_of(&rows).unwrap().header_row, 0);
}

#[test]
fn an_identity_column_makes_an_inventory_and_a_name_needs_one_more_field() {
    for (headers, inventory) in [
        (["CAS", ""], true),
        (["SMILES", ""], true),
        (["EC number", ""], true),
        (["InChIKey", ""], true),
        (["Name", ""], false),
        (["No.", ""], false),
        (["Name", "log Kow"], true),
        (["No.", "Name"], true),
        (["Name", "Colour"], false),
        (["log Kow", "BCF"], false),
    ] {
        assert_eq!(columns_of(&[text_row(0, &headers)]).is_ok(), inventory, "{headers:?}");
    }
}

#[test]
fn a_product_name_is_the_name_of_the_substance_only_where_no_other_column_is() {
    let alone = columns_of(&[text_row(0, &["Product name", "CAS"])]).unwrap();
    assert_eq!(alone.columns.first().map(|column| column.field), Some(Field::Name));
    let beside = columns_of(&[text_row(0, &["Product name", "CAS", "Substance name"])]).unwrap();
    let fields: Vec<Field> = beside.columns.iter().map(|column| column.field).collect();
    assert_eq!(fields, [Field::Product, Field::CasNumber, Field::Name]);
}

#[test]
fn of_doubled_columns_the_first_is_taken_and_the_way_out_is_named() {
    let recognised = columns_of(&[text_row(0, &["SMILES", "Name", "SMILES (neu)"])]).unwrap();
    assert_eq!(recognised.columns.len(), 2);
    assert_eq!(recognised.unknown, [(2, "SMILES (neu)".to_owned())]);
    assert_eq!(
        recognised.remarks,
        [
            "Sheet: columns A (`SMILES`) and C (`SMILES (neu)`) both name smiles; A is taken; to take the other: \
          --column 'SMILES=ignore' --column 'SMILES (neu)=smiles'"
        ]
    );
}

#[test]
fn of_doubled_columns_of_registry_numbers_both_are_read_and_the_way_out_is_named() {
    let recognised = columns_of(&[text_row(0, &["CAS", "Name", "CAS-Nr. (neu)"])]).unwrap();
    assert_eq!((recognised.columns.len(), recognised.unknown.len()), (3, 0));
    assert_eq!(
        recognised.remarks,
        [
            "Sheet: columns A (`CAS`) and C (`CAS-Nr. (neu)`) both name cas-number; both are read, and a row in which \
             they differ is not identified; to take one alone: --column 'CAS=ignore' or --column 'CAS-Nr. (neu)=ignore'"
        ]
    );
}

#[test]
fn two_columns_of_one_property_are_both_kept_with_their_basis() {
    let recognised =
        columns_of(&[text_row(0, &["CAS", "log Kow (gemessen)", "log Kow (berechnet)"])]).unwrap();
    let bases: Vec<Option<Basis>> = recognised.columns.iter().map(|column| column.basis).collect();
    assert_eq!(bases, [None, Some(Basis::Measured), Some(Basis::Calculated)]);
}

#[test]
fn headers_carry_conditions() {
    let headers =
        ["CAS", "DT50 soil (12 °C, primary)", "LC50 fish (mg/L)", "log Kow OECD 117", "log D (pH 7,4)"];
    let recognised = columns_of(&[text_row(0, &headers)]).unwrap();
    let conditions: Vec<_> = recognised.columns.iter().map(|column| &column.conditions).collect();
    assert_eq!(conditions[1].temperature, Some(12.0));
    assert_eq!(conditions[2].organism.as_deref(), Some("fish"));
    assert_eq!(recognised.columns[3].basis, Some(Basis::Measured));
    assert_eq!(conditions[4].ph, Some(7.4));
}

#[test]
fn the_decimal_style_is_the_columns_else_the_sheets_else_the_point() {
    let rows = |cells: &[[&str; 3]]| -> Vec<Row> {
        let header = text_row(0, &["CAS", "BCF", "log Kow"]);
        let data = cells.iter().enumerate().map(|(place, texts)| text_row(place + 1, texts));
        std::iter::once(header).chain(data).collect()
    };
    let styles = |rows: &[Row]| {
        let recognised = columns_of(rows).unwrap();
        (recognised.columns[1].decimal, recognised.columns[2].decimal)
    };
    let (point, comma) = (DecimalStyle::Point, DecimalStyle::Comma);
    assert_eq!(styles(&rows(&[["", "1.234", "4.5"]])), (point, point));
    assert_eq!(styles(&rows(&[["", "1.234", "4,5"]])), (comma, comma));
    assert_eq!(styles(&rows(&[["", "1.234,5", "4.5"]])), (comma, point));
    assert_eq!(styles(&rows(&[["", "1.234", "5"]])), (point, point));
}

#[test]
fn numbers_that_could_group_thousands_are_remarked_on() {
    let header = text_row(0, &["CAS", "BCF"]);
    let remarks = |cells: &[&str]| {
        let data = cells.iter().enumerate().map(|(place, text)| text_row(place + 1, &["", text]));
        let rows: Vec<Row> = std::iter::once(header.clone()).chain(data).collect();
        columns_of(&rows).unwrap().remarks
    };
    assert_eq!(
        remarks(&["1.500"]),
        [
            "Sheet: column B holds numbers such as `1.500`, which could group thousands; they are not read where \
          both make sense, because no cell shows which"
        ]
    );
    assert!(remarks(&["1.500", "12,5"])[0].ends_with("decimal comma, as the column's other cells show"));
    assert!(remarks(&["15.00", "0.125"]).is_empty());
}

fn recognised_with(headers: &[&str], overrides: &[&str]) -> Result<Recognised, String> {
    let overrides =
        overrides.iter().map(|text| ColumnOverride::parse(text)).collect::<Result<Vec<_>, _>>()?;
    let rows = [text_row(0, headers), text_row(1, &vec!["x"; headers.len()])];
    recognise("Sheet", &rows, words()?, &overrides).ok_or_else(|| "no inventory".to_owned())
}

#[test]
fn the_user_can_name_a_column_or_leave_it_aside() {
    let headers = ["CAS", "Fettliebe", "log Kow"];
    let recognised = recognised_with(&headers, &["Fettliebe = log-kow", "LOG KOW=ignore"]).unwrap();
    let fields: Vec<&str> = recognised.columns.iter().map(|column| column.field.id()).collect();
    assert_eq!(fields, ["cas-number", "log-kow"]);
    assert_eq!(recognised.unknown, [(2, "log Kow".to_owned())]);
    assert_eq!(recognised.columns[1].reason, "told by --column");
}

#[test]
fn the_user_can_name_a_column_by_its_letter_with_or_without_a_header() {
    let headers = ["CAS", "SMILES", "SMILES", "", "H:H"];
    let doubled = recognised_with(&headers, &[]).unwrap();
    assert_eq!(
        doubled.remarks,
        [
            "Sheet: columns B (`SMILES`) and C (`SMILES`) both name smiles; B is taken; to take the other: --column \
             'Sheet!B:B=ignore'"
        ]
    );
    let told = ["Sheet!B:B=ignore", "D:D=bcf", "Other!A:A=ignore"];
    let recognised = recognised_with(&headers, &told).unwrap();
    let columns: Vec<(u16, &str)> =
        recognised.columns.iter().map(|column| (column.index, column.field.id())).collect();
    assert_eq!(columns, [(0, "cas-number"), (2, "smiles"), (3, "bcf")]);
    assert_eq!(recognised.columns[2].header, "(no header)");
    let has = |text: &str| recognised.has_column_of(&ColumnOverride::parse(text).unwrap());
    assert!(has("C:C=bcf") && !has("F:F=bcf") && !has("Other!A:A=ignore"));
    // A header that is written like a column is still one.
    assert!(has("H:H=bcf"));
}

#[test]
fn an_override_that_means_nothing_is_refused_with_the_nearest_field() {
    assert_eq!(
        ColumnOverride::parse("Stoff=nmae").unwrap_err(),
        "there is no field `nmae`; did you mean `name`?"
    );
    assert!(ColumnOverride::parse("Stoff").unwrap_err().contains("--column 'Header=field'"));
    assert!(ColumnOverride::parse("=name").unwrap_err().contains("names no header"));
    assert_eq!(ColumnOverride::parse("a=b=name").map(|told| told.header).as_deref(), Ok("a=b"));
}

#[test]
fn a_header_that_nearly_names_a_field_is_pointed_out() {
    let recognised = columns_of(&[text_row(0, &["CAS", "Water solubillity", "Half-life", "pKa"])]).unwrap();
    assert_eq!(recognised.columns.len(), 1);
    let expected = [
        "--column 'Water solubillity=water-solubility'",
        "names no compartment",
        "does not say whether its pKa is of an acid or a base",
    ];
    assert_eq!(recognised.remarks.len(), expected.len());
    for (remark, part) in recognised.remarks.iter().zip(expected) {
        assert!(remark.contains(part), "{remark}");
    }
}

#[test]
fn a_column_with_a_unit_that_does_not_fit_is_left_aside_and_told() {
    let recognised = columns_of(&[text_row(0, &["CAS", "BCF (mg/L)"])]).unwrap();
    assert_eq!(recognised.columns.len(), 1);
    assert_eq!(
        recognised.remarks,
        [
            "Sheet: column B (`BCF (mg/L)`) is left aside, because `mg/L` may be a unit and may mean something else; write \
             the unit in brackets, such as `(L/kg)`, or say that its numbers are in L/kg where a cell names no unit: \
             --column 'BCF (mg/L)=bcf'"
        ]
    );
}

#[test]
fn several_columns_of_reliability_speak_of_the_value_to_their_left() {
    let headers = ["CAS", "log Kow", "Reliability", "BCF", "Reliability"];
    let recognised = columns_of(&[text_row(0, &headers)]).unwrap();
    let about: Vec<_> = recognised.columns.iter().map(|column| column.about).collect();
    assert_eq!(about, [None, None, Some(Property::LogKow), None, Some(Property::Bcf)]);
    let named = columns_of(&[text_row(0, &["CAS", "log Kow", "BCF", "Reliability log Kow"])]).unwrap();
    assert_eq!(named.columns[3].about, Some(Property::LogKow));
}

#[test]
fn rows_without_text_are_no_header() {
    let rows = [content_row(0, &[CellContent::Number(1.0), CellContent::Empty]), text_row(1, &[])];
    assert!(columns_of(&rows).is_err());
}

/// The brackets of a header in another form.
fn with_brackets(header: &str, open: char, close: char) -> String {
    header
        .chars()
        .map(|character| match character {
            '(' | '[' | '（' | '［' | '【' => open,
            ')' | ']' | '）' | '］' | '】' => close,
            other => other,
        })
        .collect()
}

/// ASCII letters and digits as Japanese programs write them.
fn full_width(header: &str) -> String {
    let wide = |character: char| match character {
        '!'..='~' => char::from_u32(u32::from(character) + 0xFEE0).unwrap_or(character),
        other => other,
    };
    header.chars().map(wide).collect()
}

fn without_accents(header: &str) -> String {
    let plain = |character: char| match character {
        'é' | 'è' | 'ê' | 'ë' => 'e',
        'É' | 'È' => 'E',
        'à' | 'á' | 'â' => 'a',
        'ì' | 'í' => 'i',
        'ò' | 'ó' => 'o',
        'ù' | 'ú' => 'u',
        'ñ' => 'n',
        'ç' => 'c',
        other => other,
    };
    header.chars().map(plain).collect()
}

#[test]
fn case_accents_brackets_width_and_line_breaks_make_no_difference() {
    let mut wrong = Vec::new();
    for known in table() {
        // In `L(E)C50` the brackets are no remark, and capitals within a word part it.
        let header = known.header.as_str();
        let bracketed = |open, close| {
            if header.contains("(E)") { header.to_owned() } else { with_brackets(header, open, close) }
        };
        let mut forms = vec![
            format!(" {}\t", without_accents(header).replace(' ', "  ")),
            full_width(header),
            bracketed('[', ']').replace(' ', "\n"),
            bracketed('（', '）').replace(' ', "\u{A0}"),
        ];
        if !header.contains("WaterS") && !header.contains("LogK") {
            forms.extend([bracketed('【', '】').to_lowercase(), header.to_uppercase()]);
        }
        for form in forms {
            let found = column_of(&form).unwrap().map_or("none", |column| column.field.id());
            if found != known.field {
                wrong.push(format!("`{form:?}`: expected {}, found {found}", known.field));
            }
        }
    }
    assert!(wrong.is_empty(), "{}", wrong.join("\n"));
}

/// Work that grew faster than the text would not end here.
#[test]
fn a_text_of_any_length_is_looked_at_to_its_end_or_not_at_all() {
    for text in ["水".repeat(30_000), "half life ".repeat(3_000), "(".repeat(30_000), "a".repeat(30_000)] {
        let rows = [text_row(0, &["CAS", &text]), text_row(1, &[&text, &text])];
        let recognised = columns_of(&rows).unwrap();
        assert_eq!(recognised.columns.len(), 1, "a text too long for a header names no field");
    }
}

proptest::proptest! {
    #![proptest_config(crate::sampling())]

    #[test]
    fn no_header_panics(headers in proptest::collection::vec(proptest::prelude::any::<String>(), 1..6)) {
        let texts: Vec<&str> = headers.iter().map(String::as_str).collect();
        let _ = columns_of(&[text_row(0, &texts), text_row(1, &texts)]);
    }
}
