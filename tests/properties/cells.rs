//! Texts of numeric cells under their headers: `tests/fixtures/cells.tsv`.

use std::collections::BTreeMap;

use kowledger::quantity::format_interval;
use kowledger::substance::{DegradationKind, Reading};

use crate::sheet::read_last;

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

pub fn describe(header: &str, cell: &str) -> String {
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
            let [mut values, mut units, mut bases, mut others] = <[Vec<String>; 4]>::default();
            for reading in readings {
                let [value, unit, basis, conditions] = describe_reading(reading);
                values.push(value);
                units.push(unit);
                bases.push(basis);
                others.push(conditions);
            }
            [values, units, bases, others].map(joined).join("\t").trim_end().to_owned()
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
    ];
    parts.into_iter().flatten().collect::<Vec<_>>().join("; ")
}
