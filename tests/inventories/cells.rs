//! What chosen cells are read as.

use std::collections::BTreeMap;
use std::ops::ControlFlow;

use kowledger::columns::Recognised;
use kowledger::quantity::{format_interval, format_number};
use kowledger::run::recognise_columns;
use kowledger::substance::{
    Completeness, DegradationTest, Field, HazardStatements, Reading, RowReader, Substance, UnstatedBasis,
};
use kowledger::workbook::{column_letters, open_inventory};

use crate::expected::{allows, field, folder, is_of, is_sheet, lines};

/// Compares cells of a file with the table.
fn check(file: &str) {
    let path = folder().join(file);
    let sheets =
        recognise_columns(&path, &[]).unwrap_or_else(|refusal| panic!("{file} was refused: {refusal}"));
    let mut inventory = open_inventory(&path).unwrap();
    let table: Vec<Vec<String>> = lines("cells.tsv").into_iter().filter(|line| is_of(line, file)).collect();
    assert!(!table.is_empty(), "no cells of {file} are in the table");
    let mut wrong: Vec<String> = table
        .iter()
        .filter(|line| {
            !sheets.iter().any(|sheet| sheet.recognised.is_some() && is_sheet(&line[1], &sheet.name))
        })
        .map(|line| format!("{}!{} {}: the sheet has no header", line[1], line[2], line[3]))
        .collect();
    for (index, sheet) in sheets.iter().enumerate() {
        let Some(recognised) = &sheet.recognised else {
            continue;
        };
        let reader = RowReader::new(sheet.name.as_str().into(), recognised, UnstatedBasis::Unstated)
            .with_number_formats(inventory.number_formats());
        let mut substances = BTreeMap::new();
        let visit = |row| {
            let substance = reader.read(&row);
            substances.insert(row.index + 1, substance);
            ControlFlow::Continue(())
        };
        inventory.stream_rows(index, visit).unwrap();
        let of_sheet = table.iter().filter(|line| is_sheet(&line[1], &sheet.name));
        wrong.extend(of_sheet.filter_map(|line| difference(line, recognised, &substances)));
    }
    assert!(wrong.is_empty(), "{file}:\n{}", wrong.join("\n"));
}

fn difference(
    line: &[String],
    recognised: &Recognised,
    substances: &BTreeMap<u32, Substance>,
) -> Option<String> {
    let (address, id, expected) = (&line[2], &line[3], &line[4]);
    let letters: String = address.chars().filter(char::is_ascii_alphabetic).collect();
    let row: u32 = address[letters.len()..].parse().unwrap();
    let column = recognised.columns.iter().find(|column| column_letters(column.index) == letters);
    let place = format!("{}!{address} {id}: expected {expected}", line[1]);
    let substance = &substances[&row];
    if id == "identity" {
        let found = format!("{:?}", substance.identity);
        return (!allows(expected, &found)).then(|| format!("{place}, found {found}"));
    }
    let wanted = Field::from_id(id).unwrap_or_else(|| panic!("there is no field {id}"));
    if column.is_none_or(|column| column.field != wanted) {
        return Some(format!("{place}, but the column is not recognised as that"));
    }
    let found = found(substance, wanted, address);
    let right = |answer: &str| allows(expected, answer) || expected.to_lowercase() == answer.to_lowercase();
    if !right(&found.value) {
        return Some(format!("{place}, found {}{}", found.value, found.why));
    }
    let (basis, conditions) = (field(line, 5), field(line, 6));
    if !basis.is_empty() && !allows(basis, found.basis) {
        return Some(format!("{place} {basis}, found it {}", found.basis));
    }
    let lacking: Vec<&str> = conditions
        .split("; ")
        .filter(|one| !one.is_empty() && !found.conditions.contains(&(*one).to_owned()))
        .collect();
    (!lacking.is_empty())
        .then(|| format!("{place} with {}, found {}", lacking.join("; "), found.conditions.join("; ")))
}

/// What a cell was read as.
struct Found {
    value: String,
    /// The message of a fault.
    why: String,
    basis: &'static str,
    conditions: Vec<String>,
}

impl Found {
    fn value(value: &str) -> Self {
        Self { value: value.to_owned(), why: String::new(), basis: "", conditions: Vec::new() }
    }

    /// Two values of one cell.
    fn and(self, other: &Self) -> Self {
        Self { value: format!("{} and {}", self.value, other.value), ..self }
    }
}

fn found(substance: &Substance, field: Field, address: &str) -> Found {
    if let Some(fault) = substance.faults.iter().find(|fault| fault.cell.address() == address) {
        return Found { why: format!(" ({fault})"), ..Found::value("fault") };
    }
    let missing = || Found::value("missing");
    let readings = substance.readings.values().flatten().chain(&substance.tonnage).chain(&substance.content);
    let of_cell: Vec<Found> =
        readings.filter(|reading| reading.cell.address() == address).map(of_reading).collect();
    if let Some(all) = of_cell.into_iter().reduce(|first, next| first.and(&next)) {
        return all;
    }
    let texts = [
        (Field::RowId, &substance.row_id),
        (Field::Name, &substance.name),
        (Field::Smiles, &substance.smiles),
        (Field::Formula, &substance.formula),
    ];
    if let Some((_, text)) = texts.into_iter().find(|(of, _)| *of == field) {
        return text.as_ref().map_or_else(missing, |text| Found::value(&text.value));
    }
    match field {
        Field::CasNumber => {
            substance.cas.as_ref().map_or_else(missing, |cas| Found::value(&cas.value.to_string()))
        }
        Field::EcNumber => {
            substance.ec.as_ref().map_or_else(missing, |ec| Found::value(&ec.value.to_string()))
        }
        Field::ReadyBiodegradability => {
            substance.ready.first().map_or_else(missing, |ready| Found::value(degraded(ready.value.result)))
        }
        Field::HazardStatements => substance
            .hazard_statements
            .as_ref()
            .map_or_else(missing, |cell| Found::value(&statements(&cell.value))),
        _ => substance.texts.get(&field).map_or_else(missing, |text| Found::value(&text.value)),
    }
}

fn degraded(result: DegradationTest) -> &'static str {
    match result {
        DegradationTest::Ready => "ready",
        DegradationTest::NotReady => "not ready",
        DegradationTest::Open => "open",
    }
}

fn statements(statements: &HazardStatements) -> String {
    let codes: Vec<&str> = statements.codes().collect();
    let said = if codes.is_empty() { "none".to_owned() } else { codes.join("; ") };
    match statements.completeness() {
        Completeness::Complete => said,
        Completeness::Incomplete => format!("{said}; and more"),
    }
}

fn of_reading(reading: &Reading) -> Found {
    let quantity = &reading.quantity;
    let canonical = quantity.unit.dimension().canonical();
    let said = &reading.conditions;
    let conditions = [
        quantity.written_sd.map(|sd| format!("sd {}", format_number(sd))),
        quantity.approximate.then(|| "approximate".to_owned()),
        said.temperature.map(|temperature| format!("{} °C", format_number(temperature))),
        said.ph.map(|ph| format!("pH {}", format_number(ph))),
        said.lipid.map(|lipid| format!("lipid {}", format_number(lipid))),
    ];
    Found {
        value: format_interval(quantity.interval, canonical),
        why: String::new(),
        basis: reading.basis.word(),
        conditions: conditions.into_iter().flatten().collect(),
    }
}

#[test]
fn of_a_german_export() {
    check("german-erp.csv");
}

#[test]
fn of_merged_headers() {
    check("merged-headers.xlsx");
}

#[test]
fn of_a_french_list() {
    check("french-list.ods");
}

#[test]
fn of_spanish_and_italian_sheets() {
    check("spanish-and-italian.xls");
}

#[test]
fn of_a_dutch_stock_list() {
    check("dutch-stock.xlsx");
}

#[test]
fn of_a_japanese_list() {
    check("japanese-list.xlsx");
}

#[test]
fn of_a_chinese_list_with_tabs() {
    check("chinese-list.tsv");
}

#[test]
fn of_a_chinese_list_with_commas() {
    check("chinese-list.csv");
}

#[test]
fn of_a_laboratory_sheet() {
    check("lab-sheet.xlsx");
}

#[test]
fn of_a_flat_list() {
    check("flat-list.xlsb");
}

#[test]
fn of_a_colleagues_sheets() {
    check("colleague.xlsx");
}

#[test]
fn of_an_old_data_file() {
    check("old-data.csv");
}
