//! Texts of numeric cells under their headers: `tests/fixtures/cells.tsv`.

use std::collections::BTreeMap;

use kowledger::quantity::format_interval;
use kowledger::substance::{
    DegradationKind, DegradationTest, Property, Reading, RowReader, Substance, UnstatedBasis,
};
use kowledger::workbook::{CellContent, NumberFormat, StyleId};

use crate::sheet::{columns_of, content_row, read_last, text_row};

/// The headings of the table that begin a language.
const LANGUAGES: [&str; 8] =
    ["English", "German", "French", "Spanish", "Italian", "Dutch", "Japanese", "Chinese"];

const TABLE: &str = include_str!("../fixtures/cells.tsv");

#[test]
fn every_cell_of_the_table_is_read_as_written_there() {
    let mut wrong = Vec::new();
    let mut of_language: BTreeMap<&str, usize> = BTreeMap::new();
    let mut language = "";
    let mut rows = 0;
    for line in TABLE.lines().filter(|line| !line.trim().is_empty()) {
        if let Some(heading) = line.strip_prefix('#') {
            language = LANGUAGES.into_iter().find(|name| heading.contains(name)).unwrap_or("");
            continue;
        }
        rows += 1;
        *of_language.entry(language).or_default() += 1;
        let mut columns = line.split('\t');
        let header = columns.next().unwrap_or_default();
        // Signs that no table of text can show are written as escapes.
        let cell = unescaped(columns.next().unwrap_or_default());
        let cell = cell.as_str();
        let expected: Vec<&str> = columns.map(str::trim).collect();
        let found = describe(header, cell);
        let fits = match expected.as_slice() {
            [fault] if fault.starts_with("fault: ") => found.starts_with(fault),
            _ => found == expected.join("\t").trim_end(),
        };
        if !fits {
            wrong.push(format!("{header} | {cell}\n  expected {}\n  found    {found}", expected.join("\t")));
        }
    }
    assert!(rows >= 420, "{rows}");
    for language in LANGUAGES {
        assert!(of_language.get(language).is_some_and(|rows| *rows >= 25), "{language} {of_language:?}");
    }
    assert!(wrong.is_empty(), "{}", wrong.join("\n"));
}

fn unescaped(text: &str) -> String {
    let mut plain = text.replace("\\n", "\n");
    for (escape, sign) in [
        ("\\u{A0}", '\u{A0}'),
        ("\\u{AD}", '\u{AD}'),
        ("\\u{200B}", '\u{200B}'),
        ("\\u{2009}", '\u{2009}'),
        ("\\u{202F}", '\u{202F}'),
        ("\\u{FEFF}", '\u{FEFF}'),
        ("\\u{B5}", '\u{B5}'),
        ("\\u{3BC}", '\u{3BC}'),
        ("\\u{3000}", '\u{3000}'),
    ] {
        plain = plain.replace(escape, &sign.to_string());
    }
    plain
}

fn describe(header: &str, cell: &str) -> String {
    let substance = match read_last(&[&["CAS", header], &["50-29-3", cell]]) {
        Ok(substance) => substance,
        Err(error) => return error,
    };
    if let Some(fault) = substance.faults.first() {
        return format!("fault: {}", fault.kind);
    }
    match substance.readings.values().flatten().collect::<Vec<_>>().as_slice() {
        [] => "missing".to_owned(),
        readings => {
            let mut columns = <[Vec<String>; 4]>::default();
            for reading in readings {
                for (column, text) in columns.iter_mut().zip(describe_reading(reading)) {
                    column.push(text);
                }
            }
            columns.map(joined).join("\t").trim_end().to_owned()
        }
    }
}

/// What several readings have in common once, and what differs with bars between.
fn joined(mut texts: Vec<String>) -> String {
    if texts.windows(2).all(|pair| pair.first() == pair.last()) {
        texts.truncate(1);
    }
    texts.join(" | ").trim().to_owned()
}

fn describe_reading(reading: &Reading) -> [String; 4] {
    let quantity = &reading.quantity;
    let canonical = quantity.unit.dimension().canonical();
    [
        format_interval(quantity.interval, canonical),
        quantity.unit.symbol().to_owned(),
        reading.basis.word().to_owned(),
        conditions(reading),
    ]
}

fn conditions(reading: &Reading) -> String {
    let conditions = &reading.conditions;
    let degradation = match conditions.degradation {
        DegradationKind::NotStated => None,
        DegradationKind::Ultimate => Some("ultimate".to_owned()),
        DegradationKind::Primary => Some("primary".to_owned()),
    };
    let parts = [
        reading.quantity.approximate.then(|| "approximate".to_owned()),
        reading.quantity.written_sd.map(|sd| format!("sd {sd}")),
        conditions.temperature.map(|temperature| format!("{temperature} °C")),
        conditions.ph.map(|ph| format!("pH {ph}")),
        conditions.lipid.map(|lipid| format!("lipid {lipid}")),
        conditions.reliability.map(|score| format!("reliability {score}")),
        degradation,
        conditions.year.map(|year| format!("year {year}")),
        conditions.organism.as_ref().map(|organism| format!("organism {organism}")),
        conditions.method.as_ref().map(|method| format!("method {method}")),
        conditions.doubt.as_ref().map(|doubt| format!("doubt {doubt}")),
    ];
    parts.into_iter().flatten().collect::<Vec<_>>().join("; ")
}

/// A reader of one column, for which the format with this number shows percentages.
fn read_formatted(header: &str, number: f64, style: u32) -> Result<Substance, String> {
    let headers = text_row(0, &["CAS", header]);
    let mut data = content_row(1, &[CellContent::Text("50-29-3".to_owned()), CellContent::Number(number)]);
    for cell in &mut data.cells {
        cell.style = Some(StyleId(style));
    }
    let columns = columns_of(&[headers, data.clone()])?;
    let reader = RowReader::new("Sheet".into(), &columns, UnstatedBasis::Unstated);
    let percent = NumberFormat::of_code("0.0%").ok_or("no format")?;
    Ok(reader.with_number_formats([(StyleId(2), percent)]).read(&data))
}

fn content_of(substance: &Substance) -> Option<f64> {
    substance.content.as_ref().and_then(|reading| reading.quantity.single())
}

#[test]
fn a_number_shown_as_a_percentage_is_read_as_shown_and_any_other_as_it_is() {
    for (number, style, percent) in
        [(0.12, 2, 12.0), (0.001, 2, 0.1), (0.07, 2, 7.0), (0.12, 1, 0.12), (12.0, 1, 12.0)]
    {
        let substance = read_formatted("Content", number, style).unwrap();
        assert_eq!(content_of(&substance), Some(percent), "{number} in format {style}");
    }
    let degraded = read_formatted("Ready biodegradability", 0.82, 2).unwrap();
    assert_eq!(degraded.ready.first().map(|ready| ready.value.result), Some(DegradationTest::Ready));
    assert_eq!(degraded.ready.first().map(|ready| ready.value.reported.as_str()), Some("82 %"));
    let strange = read_formatted("BCF", 15.0, 2).unwrap();
    let fault = strange.faults.first().map(ToString::to_string).unwrap_or_default();
    assert!(fault.starts_with("Sheet!B2: `1500 %` is in %, which does not measure BCF"), "{fault}");
}

#[test]
fn contents_and_tonnages_are_converted() {
    for (header, cell, expected) in [
        ("Content", "0,5 %", 0.5),
        ("Content", "500 ppm", 0.05),
        ("Content (ppm)", "500", 0.05),
        ("Content", "500 mg/kg", 0.05),
        ("Content", "5 ‰", 0.5),
        ("Content", "5 g/kg", 0.5),
        ("Content", "12 Gew.-%", 12.0),
        ("Content", "12 % w/w", 12.0),
        ("Content", "12 % en poids", 12.0),
        ("Content", "12 % p/p", 12.0),
        ("Content", "１２％", 12.0),
        ("Tonnage", "25 t/a", 25.0),
        ("Tonnage", "25 tonnes/an", 25.0),
        ("Tonnage", "25 t/año", 25.0),
        ("Tonnage", "25 吨/年", 25.0),
        ("Tonnage", "25 トン/年", 25.0),
        ("Tonnage", "25 tpa", 25.0),
        ("Tonnage", "2500 kg/a", 2.5),
        ("Tonnage", "2 kt/a", 2000.0),
    ] {
        let substance = read_last(&[&["CAS", header], &["50-29-3", cell]]).unwrap();
        let reading = substance.content.as_ref().or(substance.tonnage.as_ref());
        let found = reading.and_then(|reading| reading.quantity.single());
        let close = found.is_some_and(|found| (found - expected).abs() < 1e-9 * expected);
        assert!(close, "{header} {cell}: {found:?} {:?}", substance.faults);
    }
    let several = read_last(&[&["CAS", "Content"], &["50-29-3", "5 %; 10 %"]]).unwrap();
    assert_eq!((several.content.is_none(), several.faults.len()), (true, 1));
}

#[test]
fn each_value_of_a_list_tells_its_own_part_of_the_cell() {
    let substance = read_last(&[&["CAS", "log Kow"], &["50-29-3", "4.2 (pH 5); 4,6 (pH 9)"]]).unwrap();
    let told: Vec<&str> = substance
        .readings_of(Property::LogKow)
        .iter()
        .map(|reading| reading.quantity.reported.as_str())
        .collect();
    assert_eq!(told, ["4.2", "4,6"]);
    let alone = read_last(&[&["CAS", "log Kow"], &["50-29-3", "4.2 (pH 5)"]]).unwrap();
    assert_eq!(alone.readings_of(Property::LogKow)[0].quantity.reported, "4.2 (pH 5)");
}
