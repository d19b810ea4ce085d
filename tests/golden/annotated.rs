//! Screening the example once, and reading the output with the spreadsheet reader alone.

use std::collections::BTreeMap;
use std::path::{Path, PathBuf};
use std::sync::LazyLock;

use calamine::{Data, Reader, Xlsx, open_workbook};
use kowledger::quantity::Date;
use kowledger::report::ReasoningMode;
use kowledger::run::{ReasoningChoice, ScreenSettings, Summary, screen};
use kowledger::substance::UnstatedBasis;
use kowledger::workbook::Overwrite;

/// One of the example files.
pub fn example(file: &str) -> PathBuf {
    Path::new(env!("CARGO_MANIFEST_DIR")).join("inputs-example").join(file)
}

/// Settings of a run as the README shows it, on a fixed day.
pub fn settings(output: &Path) -> ScreenSettings {
    settings_of("inventory.xlsx", output)
}

/// The same for any of the example files.
pub fn settings_of(file: &str, output: &Path) -> ScreenSettings {
    ScreenSettings {
        inventory: example(file),
        output: output.to_owned(),
        overwrite: Overwrite::Replace,
        rulebooks: Vec::new(),
        sheets: Vec::new(),
        columns: Vec::new(),
        unstated: UnstatedBasis::default(),
        reasoning: ReasoningChoice::Always(ReasoningMode::All),
        threads: None,
        date: Date::new(2026, 12, 1).expect("a day"),
    }
}

/// What came out: each sheet as rows of texts, and the summary.
pub struct Annotated {
    /// Sheets by name.
    pub sheets: BTreeMap<String, Vec<Vec<String>>>,
    /// What the run said.
    pub summary: Summary,
}

/// The example inventory, screened once.
pub static EXAMPLE: LazyLock<Annotated> = LazyLock::new(|| Annotated::of("inventory.xlsx"));

fn text(cell: &Data) -> String {
    match cell {
        Data::Empty => String::new(),
        other => other.to_string(),
    }
}

impl Annotated {
    /// One of the example files, screened.
    pub fn of(file: &str) -> Self {
        let folder = tempfile::tempdir().expect("a folder");
        let output = folder.path().join("screened.xlsx");
        let summary = screen(&settings_of(file, &output)).expect("the example is screened");
        let mut book: Xlsx<_> = open_workbook(&output).expect("the output opens");
        let sheets = book
            .worksheets()
            .into_iter()
            .map(|(name, range)| {
                // Ranges count from the first used cell; every sheet of the examples uses its first column and row.
                let rows = range.rows().map(|row| row.iter().map(text).collect()).collect();
                (name, rows)
            })
            .collect();
        Self { sheets, summary }
    }

    /// The cells of a row, counted from 1, under those of our headers that hold verdicts, each with its header.
    pub fn verdicts(&self, sheet: &str, row: usize) -> Vec<(&str, &str)> {
        let header = self.header(sheet).1;
        let first = header.iter().position(|cell| cell == "log Kow basis").expect("our columns") + 1;
        let last = header.iter().position(|cell| cell == "Cautions").expect("our columns");
        let row = &self.sheets[sheet][row - 1];
        (first..last)
            .filter(|column| !header[*column].ends_with(" why"))
            .map(|column| (header[column].as_str(), row[column].as_str()))
            .collect()
    }

    /// The row of the sheet's header: the one that holds our first column.
    pub fn header(&self, sheet: &str) -> (usize, &[String]) {
        let rows = &self.sheets[sheet];
        let place =
            rows.iter().position(|row| row.iter().any(|cell| cell == "log Kow used")).expect("a header");
        (place, &rows[place])
    }

    /// The cell of a row, counted from 1, under one of our headers.
    pub fn cell(&self, sheet: &str, row: usize, header: &str) -> &str {
        let column =
            self.header(sheet).1.iter().position(|cell| cell == header).expect("a column of that header");
        &self.sheets[sheet][row - 1][column]
    }
}
