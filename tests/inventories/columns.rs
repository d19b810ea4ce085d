//! Header rows, columns and the units of headers.

use kowledger::columns::Recognised;
use kowledger::quantity::Unit;
use kowledger::run::recognise_columns;
use kowledger::workbook::column_letters;

use crate::expected::{allows, field, folder, is_of, is_sheet, lines};

/// Compares what is recognised in a file with its tables.
fn check(file: &str) {
    let stem = file.rsplit_once('.').unwrap().0;
    let columns = lines(&format!("{stem}.columns.tsv"));
    let sheets = recognise_columns(&folder().join(file), &[])
        .unwrap_or_else(|refusal| panic!("{file} was refused: {refusal}"));
    let mut wrong = Vec::new();
    for sheet in lines("sheets.tsv").iter().filter(|line| is_of(line, file)) {
        let Some(found) = sheets.iter().find(|found| is_sheet(&sheet[1], &found.name)) else {
            wrong.push(format!("{}: there is no such sheet", sheet[1]));
            continue;
        };
        let header =
            found.recognised.as_ref().map_or("-".to_owned(), |found| (found.header_row + 1).to_string());
        if !allows(&sheet[2], &header) {
            wrong.push(format!("{}: header in row {}, found {header}", sheet[1], sheet[2]));
        }
        if let Some(recognised) = &found.recognised {
            let of_sheet = columns.iter().filter(|line| line[0] == sheet[1]);
            wrong.extend(of_sheet.filter_map(|line| difference(line, recognised)));
        }
    }
    assert!(wrong.is_empty(), "{file}:\n{}", wrong.join("\n"));
}

fn difference(line: &[String], recognised: &Recognised) -> Option<String> {
    let (letter, header, expected, unit) = (&line[1], &line[2], &line[3], field(line, 4));
    let column = recognised.columns.iter().find(|column| column_letters(column.index) == *letter);
    let found = column.map_or("-", |column| column.field.id());
    let found_unit = column.and_then(|column| column.unit).map_or("", Unit::symbol);
    let unit_differs = column.is_some() && found_unit != unit;
    (!allows(expected, found) || unit_differs)
        .then(|| format!("{letter} `{header}`: expected {expected} {unit}, found {found} {found_unit}"))
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
