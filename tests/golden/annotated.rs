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

/// The example inventory.
pub fn inventory() -> PathBuf {
    Path::new(env!("CARGO_MANIFEST_DIR")).join("inputs-example/inventory.xlsx")
}

/// Settings of a run as the README shows it, on a fixed day.
pub fn settings(output: &Path) -> ScreenSettings {
    ScreenSettings {
        inventory: inventory(),
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

/// The example, screened once.
pub static EXAMPLE: LazyLock<Annotated> = LazyLock::new(|| {
    let folder = tempfile::tempdir().expect("a folder");
    let output = folder.path().join("screened.xlsx");
    let summary = screen(&settings(&output)).expect("the example is screened");
    let mut book: Xlsx<_> = open_workbook(&output).expect("the output opens");
    let sheets = book
        .worksheets()
        .into_iter()
        .map(|(name, range)| {
            // Ranges count from the first used cell; every sheet of the example uses its first column and row.
            let rows = range.rows().map(|row| row.iter().map(text).collect()).collect();
            (name, rows)
        })
        .collect();
    Annotated { sheets, summary }
});

fn text(cell: &Data) -> String {
    match cell {
        Data::Empty => String::new(),
        other => other.to_string(),
    }
}

impl Annotated {
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
