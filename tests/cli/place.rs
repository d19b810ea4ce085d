//! A folder for one test, the program run in it, and what came out.

use std::path::PathBuf;

use assert_cmd::Command;
use calamine::{Data, Reader, Xlsx, open_workbook};
use tempfile::TempDir;

use crate::sheets::{self, Put, Sheet};

/// A folder that vanishes with the test.
pub struct Place {
    folder: TempDir,
}

/// How a run ended.
pub struct Run {
    pub status: i32,
    pub said: String,
    pub complained: String,
}

impl Place {
    pub fn new() -> Self {
        Self { folder: tempfile::tempdir().unwrap() }
    }

    /// A folder with `inventory.xlsx` of one sheet, `Substances`.
    pub fn with_rows(rows: Vec<Vec<Put<'_>>>) -> Self {
        Self::with_sheets(&[("Substances", rows)])
    }

    pub fn with_sheets(book: &[Sheet<'_>]) -> Self {
        let place = Self::new();
        sheets::write(&place.path("inventory.xlsx"), book).unwrap();
        place
    }

    pub fn path(&self, name: &str) -> PathBuf {
        self.folder.path().join(name)
    }

    /// Runs the program in the folder, with words as a user types them.
    pub fn run(&self, words: &[&str]) -> Run {
        let output = Command::cargo_bin("kowledger")
            .unwrap()
            .current_dir(self.folder.path())
            .args(words)
            .timeout(std::time::Duration::from_mins(2))
            .output()
            .unwrap();
        let run = Run {
            status: output.status.code().expect("the program ended by itself"),
            said: String::from_utf8(output.stdout).unwrap(),
            complained: String::from_utf8(output.stderr).unwrap(),
        };
        assert!(!run.complained.contains("panicked"), "{}", run.complained);
        run
    }

    /// Screens `inventory.xlsx` on a fixed day.
    pub fn screen(&self, words: &[&str]) -> Run {
        let mut all = vec!["screen", "inventory.xlsx", "--date", "2026-12-01"];
        all.extend(words);
        self.run(&all)
    }

    /// All files in the folder, hidden ones, too.
    pub fn files(&self) -> Vec<String> {
        let mut names: Vec<String> = std::fs::read_dir(self.folder.path())
            .unwrap()
            .map(|entry| entry.unwrap().file_name().into_string().unwrap())
            .collect();
        names.sort();
        names
    }

    /// A run that is refused with this message and leaves the folder as it was.
    pub fn refuses(&self, words: &[&str], message: &str) {
        let before = self.files();
        let run = self.run(words);
        assert_eq!(run.status, 2, "{}", run.complained);
        assert_eq!(run.complained.trim_end(), message);
        assert_eq!(run.said, "");
        assert_eq!(self.files(), before, "nothing is left behind");
    }

    pub fn names_of_sheets(&self, file: &str) -> Vec<String> {
        let book: Xlsx<_> = open_workbook(self.path(file)).unwrap();
        book.sheet_names()
    }

    /// The rows of a sheet of `inventory-screened.xlsx`.
    pub fn screened(&self, sheet: &str) -> Rows {
        self.rows_of("inventory-screened.xlsx", sheet)
    }

    pub fn rows_of(&self, file: &str, sheet: &str) -> Rows {
        let mut book: Xlsx<_> = open_workbook(self.path(file)).unwrap();
        let range = book.worksheet_range(sheet).unwrap();
        let (rows, columns) = range.end().unwrap();
        let cell = |row, column| range.get_value((row, column)).cloned().unwrap_or_default();
        Rows((0..=rows).map(|row| (0..=columns).map(|column| cell(row, column)).collect()).collect())
    }
}

/// The cells of a sheet, from A1 on.
pub struct Rows(pub Vec<Vec<Data>>);

impl Rows {
    /// The cell in a row (counted as the user does) under a header of the given row.
    pub fn under(&self, header_row: usize, header: &str, row: usize) -> String {
        let place = self.0[header_row - 1]
            .iter()
            .position(|cell| matches!(cell, Data::String(text) if text == header))
            .unwrap_or_else(|| panic!("there is no column {header}"));
        self.0[row - 1][place].to_string()
    }

    /// All texts, one line a row.
    pub fn text(&self) -> String {
        let lines: Vec<String> = self
            .0
            .iter()
            .map(|row| row.iter().map(ToString::to_string).collect::<Vec<_>>().join("|"))
            .collect();
        lines.join("\n")
    }
}
