//! What was planted in the examples to be found, line by line of `tests/fixtures/planted.tsv`.
//!
//! The table was written by hand from what a chemist would say a cell means. Its kinds:
//!
//! | kind | what has to hold |
//! |---|---|
//! | `fault` | a fault names the cell and says the words given |
//! | `read` | no fault names the cell, and the Record holds the number or value given for the row |
//! | `missing` | no fault names the cell, and the Record holds no such number or value for the row |
//! | `not-read-as` | the Record does not hold the value given for the row |
//! | `caution` | the row's cautions hold the word given |
//! | `uncleared` | no verdict of the row points away from a criterion |
//! | `blank` | the row holds nothing of ours |
//! | `no-substance` | the row gets no verdict |
//! | `conflict` | the sheet of conflicts names the substance |
//! | `copied` | the sheet gets no columns of ours |

use std::collections::BTreeMap;
use std::path::Path;

use calamine::{Data, Reader, open_workbook_auto};
use kowledger::quantity::Date;
use kowledger::workbook::CellRef;

use crate::annotated::{Annotated, EXAMPLE, example};

/// A line of the table.
pub struct Planted {
    pub file: String,
    pub sheet: String,
    pub cell: String,
    pub row_id: String,
    pub found: String,
    pub kind: String,
    pub says: String,
    pub expected: String,
}

impl Planted {
    /// The row of the cell, counted from 1.
    pub fn row(&self) -> usize {
        self.cell.trim_start_matches(char::is_alphabetic).parse().expect("a row")
    }

    /// Whether it speaks of this cell.
    fn stands_at(&self, cell: &CellRef) -> bool {
        *self.sheet == *cell.sheet && self.cell == cell.address()
    }

    /// The column of the cell, counted from 0.
    fn column(&self) -> usize {
        let letters = self.cell.bytes().filter(u8::is_ascii_uppercase);
        letters.fold(0, |column, letter| column * 26 + usize::from(letter - b'A') + 1) - 1
    }
}

/// The lines that speak of a file.
pub fn planted_in(file: &str) -> Vec<Planted> {
    let path = Path::new(env!("CARGO_MANIFEST_DIR")).join("tests/fixtures/planted.tsv");
    let mut reader =
        csv::ReaderBuilder::new().delimiter(b'\t').quoting(false).from_path(path).expect("the table");
    let lines = reader.records().map(|line| {
        let line = line.expect("a line");
        let [file, sheet, cell, row_id, found, kind, says, expected] =
            [0, 1, 2, 3, 5, 6, 7, 8].map(|column| line[column].to_owned());
        Planted { file, sheet, cell, row_id, found, kind, says, expected }
    });
    lines.filter(|line| line.file == file).collect()
}

/// Checks the lines of these kinds; tells every one that does not hold.
pub fn check(annotated: &Annotated, file: &str, kinds: &[&str]) {
    let planted: Vec<Planted> =
        planted_in(file).into_iter().filter(|line| kinds.contains(&line.kind.as_str())).collect();
    for kind in kinds {
        assert!(planted.iter().any(|line| line.kind == *kind), "{file}: nothing planted of kind {kind}");
    }
    let wrong: Vec<String> = planted
        .iter()
        .filter_map(|line| {
            let why = fails(annotated, line)?;
            Some(format!(
                "{}!{} `{}` ({}): {}; {why}",
                line.sheet, line.cell, line.found, line.kind, line.expected
            ))
        })
        .collect();
    assert!(wrong.is_empty(), "{}", wrong.join("\n"));
}

/// Why a line does not hold; nothing where it does.
fn fails(annotated: &Annotated, line: &Planted) -> Option<String> {
    let told = annotated.summary.faults.iter().find(|fault| line.stands_at(&fault.cell));
    let fault = told.map(ToString::to_string);
    let holds = match line.kind.as_str() {
        "fault" => fault.as_deref().is_some_and(|fault| fault.contains(&line.says)),
        "read" => fault.is_none() && is_recorded(annotated, line),
        "missing" => fault.is_none() && !is_recorded(annotated, line),
        "not-read-as" => !is_recorded(annotated, line),
        "caution" => annotated.cell(&line.sheet, line.row(), "Cautions").contains(&line.says),
        "uncleared" => annotated
            .verdicts(&line.sheet, line.row())
            .iter()
            .all(|(_, verdict)| !verdict.contains("screens out") && !verdict.contains("not fulfilled")),
        "blank" => annotated.sheets[&line.sheet][line.row() - 1].iter().all(String::is_empty),
        "no-substance" => {
            annotated.verdicts(&line.sheet, line.row()).iter().all(|(_, verdict)| verdict.is_empty())
        }
        "conflict" => annotated.sheets["Conflicts"].iter().flatten().any(|cell| cell.contains(&line.says)),
        "copied" => annotated.sheets[&line.sheet].iter().flatten().all(|cell| cell != "log Kow used"),
        _ => return Some("the table has a kind that is not known".to_owned()),
    };
    (!holds).then(|| format!("found the fault {fault:?} and the record {:?}", record_of(annotated, line)))
}

/// The line of the Record that speaks of the row.
fn record_of<'a>(annotated: &'a Annotated, line: &Planted) -> Option<&'a [String]> {
    let row = line.cell.trim_start_matches(char::is_alphabetic);
    let mut records = annotated.sheets["Record"].iter();
    let record =
        records.find(|cells| cells[0] == "substance" && cells[1] == line.sheet && cells[2] == row)?;
    Some(&record[..8])
}

/// Whether the Record holds what the line says, as `cas 50-29-3`, `log-kow 4.5`, or `log-kow` for any value that
/// is not estimated.
fn is_recorded(annotated: &Annotated, line: &Planted) -> bool {
    let record = record_of(annotated, line).expect("the row is in the Record");
    match line.says.split_once(' ') {
        Some(("cas", number)) => record[3] == number,
        Some(("ec", number)) => record[4] == number,
        Some((property, value)) => {
            record[7].lines().any(|entry| entry.starts_with(&format!("{property}\t{value}\t")))
        }
        None if line.says == "ec" => !record[4].is_empty(),
        None => record[7]
            .lines()
            .any(|entry| entry.starts_with(&format!("{}\t", line.says)) && !entry.ends_with("estimated")),
    }
}

/// The cells of an example file as another library reads them, by sheet.
fn cells_of(file: &str) -> BTreeMap<String, Vec<Vec<String>>> {
    let path = example(file);
    if path.extension().is_some_and(|extension| extension == "csv") {
        let bytes = std::fs::read(path).expect("the export");
        // The letters of Windows-1252 that stand in it are those of Latin-1.
        let text: String = bytes.into_iter().map(char::from).collect();
        let lines = text.trim_end().split("\r\n");
        let rows = lines.map(|line| line.split(';').map(unquoted).collect()).collect();
        return BTreeMap::from([("erp-export".to_owned(), rows)]);
    }
    let mut book = open_workbook_auto(path).expect("the example opens");
    let sheets = book.worksheets().into_iter();
    let texts = |row: &[Data]| row.iter().map(shown).collect();
    sheets.map(|(name, range)| (name, range.rows().map(texts).collect())).collect()
}

/// A cell with semicolons in it falls apart here, right of all cells that are planted.
fn unquoted(cell: &str) -> String {
    let inside = cell.strip_prefix('"').and_then(|cell| cell.strip_suffix('"'));
    inside.map_or(cell.to_owned(), |cell| cell.replace("\"\"", "\""))
}

fn shown(cell: &Data) -> String {
    match cell {
        Data::DateTime(day) => Date::from_serial(day.as_f64()).expect("a day").to_string(),
        other => other.to_string().replace('\n', "\\n"),
    }
}

#[test]
fn every_planted_cell_stands_where_the_table_says() {
    for file in ["inventory.xlsx", "supplier-list.xls", "site-stock.ods", "erp-export.csv"] {
        let sheets = cells_of(file);
        for line in planted_in(file).iter().filter(|line| !line.cell.is_empty()) {
            let row = &sheets[&line.sheet][line.row() - 1];
            let place = format!("{file} {}!{}", line.sheet, line.cell);
            let cell = row.get(line.column()).map_or("", String::as_str);
            assert_eq!(cell, line.found, "{place}");
            if !line.row_id.is_empty() {
                assert_eq!(row[0], line.row_id, "{place}");
            }
        }
    }
}

#[test]
fn planted_faults_are_named_by_cell_with_what_to_write() {
    check(&EXAMPLE, "inventory.xlsx", &["fault"]);
}

#[test]
fn no_fault_is_told_that_was_not_planted() {
    let planted = planted_in("inventory.xlsx");
    for fault in &EXAMPLE.summary.faults {
        assert!(planted.iter().any(|line| line.kind == "fault" && line.stands_at(&fault.cell)), "{fault}");
    }
}

#[test]
fn untidy_cells_that_can_be_read_are_read_as_a_chemist_would() {
    check(&EXAMPLE, "inventory.xlsx", &["read"]);
}

#[test]
fn words_for_missing_are_neither_values_nor_faults() {
    check(&EXAMPLE, "inventory.xlsx", &["missing"]);
}

#[test]
fn rows_of_doubtful_identity_say_so_and_clear_nothing() {
    check(&EXAMPLE, "inventory.xlsx", &["caution", "uncleared"]);
}

#[test]
fn blank_rows_stay_blank_and_sheets_that_are_no_inventory_are_copied() {
    check(&EXAMPLE, "inventory.xlsx", &["blank", "copied"]);
    assert_eq!(EXAMPLE.summary.sheets, (2, 2));
}

#[test]
fn headings_and_totals_among_the_rows_get_no_verdict() {
    check(&EXAMPLE, "inventory.xlsx", &["no-substance"]);
}

#[test]
fn rows_that_speak_of_the_same_substance_differently_stand_among_the_conflicts() {
    check(&EXAMPLE, "inventory.xlsx", &["conflict"]);
}

#[test]
fn a_fault_stands_in_the_row_as_well() {
    assert!(EXAMPLE.cell("Substances", 60, "Cautions").contains("not read: Substances!F60"));
}
