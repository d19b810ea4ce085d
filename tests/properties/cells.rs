//! Texts of numeric cells under their headers: `tests/fixtures/cells.tsv`.

use kowledger::quantity::format_interval;
use kowledger::substance::{DegradationKind, Reading};

use crate::sheet::read_last;

const TABLE: &str = include_str!("../fixtures/cells.tsv");

#[test]
fn every_cell_of_the_table_is_read_as_written_there() {
    let mut wrong = Vec::new();
    let mut rows = 0;
    for line in TABLE.lines().filter(|line| !line.starts_with('#')) {
        rows += 1;
        let mut columns = line.split('\t');
        let header = columns.next().unwrap_or_default();
        let cell = columns.next().unwrap_or_default();
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
    assert!(rows > 150, "{rows}");
    assert!(wrong.is_empty(), "{}", wrong.join("\n"));
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
        [reading] => describe_reading(reading),
        _ => "several readings".to_owned(),
    }
}

fn describe_reading(reading: &Reading) -> String {
    let quantity = &reading.quantity;
    let canonical = quantity.unit.dimension().canonical();
    let parts = [
        format_interval(quantity.interval, canonical),
        quantity.unit.symbol().to_owned(),
        reading.basis.word().to_owned(),
        conditions(reading),
    ];
    parts.join("\t").trim_end().to_owned()
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
        conditions.organism.as_ref().map(|organism| format!("organism {organism}")),
        conditions.method.as_ref().map(|method| format!("method {method}")),
    ];
    parts.into_iter().flatten().collect::<Vec<_>>().join("; ")
}
