//! Headers of several rows, laid out as people do (`tests/fixtures/header_rows.txt`).

use kowledger::columns::{Column, Recognised};
use kowledger::quantity::{Unit, format_number};
use kowledger::workbook::{Cell, CellContent, Row, column_letters};

use crate::sheet::columns_of;

const LAYOUTS: &str = include_str!("../fixtures/header_rows.txt");

/// A sheet and what its header says.
struct Layout {
    title: &'static str,
    rows: Vec<Row>,
    expected: Vec<&'static str>,
}

fn layouts() -> Vec<Layout> {
    let mut layouts: Vec<Layout> = Vec::new();
    for line in LAYOUTS.lines().filter(|line| !line.starts_with('#') && !line.trim().is_empty()) {
        if let Some(title) = line.strip_prefix("== ") {
            layouts.push(Layout { title, rows: Vec::new(), expected: Vec::new() });
        } else if let Some(layout) = layouts.last_mut() {
            match line.strip_prefix("= ") {
                Some(expected) => layout.expected.push(expected),
                None => layout.rows.push(row(layout.rows.len(), line)),
            }
        }
    }
    layouts
}

/// Cells between bars; `.` is a cell that is there and empty, nothing is no cell.
fn row(index: usize, line: &str) -> Row {
    let cells = line.split('|').map(str::trim).enumerate().filter(|(_, text)| !text.is_empty());
    let cells = cells.map(|(column, text)| Cell {
        column: u16::try_from(column).unwrap_or(u16::MAX),
        content: match text.parse::<f64>() {
            Ok(number) => CellContent::Number(number),
            Err(_) if text == "." => CellContent::Empty,
            Err(_) => CellContent::Text(text.to_owned()),
        },
        style: None,
        formula: false,
    });
    Row { index: u32::try_from(index).unwrap_or(u32::MAX), cells: cells.collect() }
}

/// `header 2`, then the columns as `D half-life-water d`, with basis and conditions where the header says them.
fn told(recognised: &Recognised) -> Vec<String> {
    let mut lines = vec![format!("header {}", recognised.header_row + 1)];
    lines.extend(recognised.columns.iter().map(|column| {
        let parts = [column_letters(column.index), column.field.id().to_owned()];
        parts.into_iter().chain(said(column)).collect::<Vec<_>>().join(" ")
    }));
    lines
}

fn said(column: &Column) -> Vec<String> {
    let conditions = &column.conditions;
    let about = column.about.map(|property| format!("of {}", property.id()));
    [
        column.unit.map(Unit::symbol).filter(|symbol| !symbol.is_empty()).map(str::to_owned),
        column.basis.map(|basis| basis.word().to_owned()),
        conditions.temperature.map(|degrees| format!("{} °C", format_number(degrees))),
        conditions.ph.map(|ph| format!("pH {}", format_number(ph))),
        conditions.organism.clone(),
        about,
    ]
    .into_iter()
    .flatten()
    .collect()
}

#[test]
fn headers_of_several_rows_are_read_together() {
    let layouts = layouts();
    assert!(layouts.len() >= 20, "{}", layouts.len());
    let mut wrong = Vec::new();
    for layout in &layouts {
        let found = columns_of(&layout.rows).map_or_else(|fault| vec![fault], |found| told(&found));
        if found != layout.expected {
            wrong.push(format!("{}\n{}", layout.title, found.join("\n")));
        }
    }
    assert!(wrong.is_empty(), "{}", wrong.join("\n\n"));
}

#[test]
fn the_reason_says_which_rows_were_read_together_and_where_the_unit_stands() {
    let rows = [
        row(0, "Name | CAS | Half-life (d) | .     | BCF"),
        row(1, ".    | .   | soil          | water | L/kg"),
        row(2, "DDT  | 50-29-3 | 2000      | 100   | 12000"),
    ];
    let recognised = columns_of(&rows).unwrap();
    assert_eq!((recognised.header_top, recognised.header_row, recognised.first_data_row), (0, 1, 2));
    let reason = |place: usize| recognised.columns[place].reason.as_str();
    assert_eq!(reason(0), "named by `name`");
    assert_eq!(
        reason(3),
        "named by `half life` and `water`; rows 1 and 2 read together; d from the row above it"
    );
    assert_eq!(reason(4), "named by `bcf`; rows 1 and 2 read together; L/kg from the header");
    assert_eq!(recognised.columns[3].header, "Half-life (d): water");
}

#[test]
fn a_value_that_means_another_thing_under_its_group_is_left_aside_and_told() {
    let rows = [
        row(0, ".   | Mammals (oral) | .            | Fish"),
        row(1, "CAS | NOEC (mg/L)    | LC50 (mg/L)  | NOEC (mg/L)"),
    ];
    let recognised = columns_of(&rows).unwrap();
    let fields: Vec<&str> = recognised.columns.iter().map(|column| column.field.id()).collect();
    assert_eq!(fields, ["cas-number", "long-term-toxicity"]);
    assert_eq!(
        recognised.remarks[0],
        "Sheet: column B (`Mammals (oral): NOEC (mg/L)`) is left aside, because the row above says that it is no \
         long-term-toxicity; if it is one: --column 'Mammals (oral): NOEC (mg/L)=long-term-toxicity'"
    );
}
