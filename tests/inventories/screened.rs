//! A full run over each inventory, without help by `--column`: rows screened, cells complained of, cells kept.

use std::collections::{BTreeMap, BTreeSet};
use std::ops::ControlFlow;
use std::path::Path;

use kowledger::quantity::Date;
use kowledger::run::{ReasoningChoice, ScreenSettings, Summary, screen};
use kowledger::substance::UnstatedBasis;
use kowledger::workbook::{CellContent, CellRef, Overwrite, open_inventory};

use crate::expected::{folder, is_of, is_sheet, lines};

/// Screens a file as a user does who gives nothing but its name.
pub fn screen_plainly(inventory: &Path, output: &Path) -> Summary {
    let settings = ScreenSettings {
        inventory: inventory.to_owned(),
        output: output.to_owned(),
        overwrite: Overwrite::Refuse,
        rulebooks: Vec::new(),
        sheets: Vec::new(),
        columns: Vec::new(),
        unstated: UnstatedBasis::Unstated,
        reasoning: ReasoningChoice::Auto,
        threads: Some(1),
        date: Date::parse("2026-12-01").unwrap(),
    };
    screen(&settings).unwrap_or_else(|refusal| panic!("{} was refused: {refusal}", inventory.display()))
}

fn check(file: &str) {
    let place = tempfile::tempdir().unwrap();
    let (inventory, output) = (folder().join(file), place.path().join("screened.xlsx"));
    let summary = screen_plainly(&inventory, &output);
    let sheets: Vec<Vec<String>> = lines("sheets.tsv").into_iter().filter(|line| is_of(line, file)).collect();
    let mut wrong = Vec::new();
    let copied = sheets.iter().filter(|sheet| sheet[3] == "copied").count();
    if summary.sheets != (sheets.len() - copied, copied) {
        wrong.push(format!("sheets screened and copied: {:?}", summary.sheets));
    }
    let rows: usize = sheets.iter().filter_map(|sheet| sheet[3].parse::<usize>().ok()).sum();
    if summary.screened != rows {
        wrong.push(format!("expected {rows} rows screened, found {}", summary.screened));
    }
    wrong.extend(faults_that_differ(file, &summary));
    wrong.extend(cells_that_differ(&inventory, &output));
    assert!(wrong.is_empty(), "{file}:\n{}", wrong.join("\n"));
}

/// Faults where none is expected, and expected ones that did not come.
fn faults_that_differ(file: &str, summary: &Summary) -> Vec<String> {
    let table: Vec<Vec<String>> = lines("cells.tsv")
        .into_iter()
        .filter(|line| is_of(line, file) && line[4].contains("fault"))
        .collect();
    let stands =
        |line: &[String], cell: &CellRef| is_sheet(&line[1], &cell.sheet) && line[2] == cell.address();
    let came = summary.faults.iter().filter(|fault| !table.iter().any(|line| stands(line, &fault.cell)));
    let lacking = table
        .iter()
        .filter(|line| line[4] == "fault" && !summary.faults.iter().any(|fault| stands(line, &fault.cell)));
    came.map(|fault| format!("not expected: {fault}"))
        .chain(lacking.map(|line| format!("{}!{}: expected a fault", line[1], line[2])))
        .collect()
}

type Cells = BTreeMap<(usize, u32, u16), String>;

/// The user's cells that the output lacks or holds otherwise, and cells that stand where the user had none.
fn cells_that_differ(inventory: &Path, output: &Path) -> Vec<String> {
    let (given, widths) = cells_of(inventory);
    let (written, _) = cells_of(output);
    let theirs: BTreeSet<_> = given.keys().collect();
    let lost = given.iter().filter(|(place, content)| written.get(place) != Some(content));
    let new = written.iter().filter(|((sheet, row, column), _)| {
        widths.get(*sheet).is_some_and(|width| column < width) && !theirs.contains(&(*sheet, *row, *column))
    });
    lost.map(|(place, content)| format!("{place:?}: {content} became {:?}", written.get(place)))
        .chain(new.map(|(place, content)| format!("{place:?}: {content} stands in the output alone")))
        .collect()
}

/// What stands in the cells of a workbook, by sheet, row and column; and the width of each sheet.
fn cells_of(path: &Path) -> (Cells, Vec<u16>) {
    let mut book = open_inventory(path).unwrap();
    let widths: Vec<u16> = book.sheets().iter().map(|sheet| sheet.used_columns).collect();
    let mut cells = BTreeMap::new();
    for sheet in 0..widths.len() {
        let visit = |row: kowledger::workbook::Row| {
            for cell in &row.cells {
                // Errors are written as their text.
                let content = match &cell.content {
                    CellContent::Empty => continue,
                    CellContent::Text(text) | CellContent::Error(text) if text.is_empty() => continue,
                    CellContent::Text(text) | CellContent::Error(text) => format!("text {text:?}"),
                    CellContent::Number(number) => format!("number {number:?}"),
                    CellContent::Boolean(boolean) => format!("boolean {boolean}"),
                    CellContent::DateTime(serial) => format!("date {serial:?}"),
                };
                cells.insert((sheet, row.index, cell.column), content);
            }
            ControlFlow::Continue(())
        };
        book.stream_rows(sheet, visit).unwrap();
    }
    (cells, widths)
}

#[test]
fn a_german_export() {
    check("german-erp.csv");
}

#[test]
fn merged_headers() {
    check("merged-headers.xlsx");
}

#[test]
fn a_french_list() {
    check("french-list.ods");
}

#[test]
fn spanish_and_italian_sheets() {
    check("spanish-and-italian.xls");
}

#[test]
fn a_dutch_stock_list() {
    check("dutch-stock.xlsx");
}

#[test]
fn a_japanese_list() {
    check("japanese-list.xlsx");
}

#[test]
fn a_chinese_list_with_tabs() {
    check("chinese-list.tsv");
}

#[test]
fn a_chinese_list_with_commas() {
    check("chinese-list.csv");
}

#[test]
fn a_laboratory_sheet() {
    check("lab-sheet.xlsx");
}

#[test]
fn a_flat_list() {
    check("flat-list.xlsb");
}

#[test]
fn a_colleagues_sheets() {
    check("colleague.xlsx");
}

#[test]
fn an_old_data_file() {
    check("old-data.csv");
}
