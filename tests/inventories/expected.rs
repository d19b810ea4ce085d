//! The tables beside the inventories.

use std::fs;
use std::path::PathBuf;

/// The folder of the inventories.
pub fn folder() -> PathBuf {
    PathBuf::from(env!("CARGO_MANIFEST_DIR")).join("tests/fixtures/inventories")
}

/// The lines of a table, in fields; an absent last field is empty.
pub fn lines(table: &str) -> Vec<Vec<String>> {
    let text = fs::read_to_string(folder().join(table)).unwrap();
    text.lines()
        .filter(|line| !line.starts_with('#'))
        .map(|line| line.split('\t').map(str::to_owned).collect())
        .collect()
}

/// A field of a line.
pub fn field(line: &[String], place: usize) -> &str {
    line.get(place).map_or("", String::as_str)
}

/// Whether a table speaks of a file: by its name, or without its ending where two files hold the same cells.
pub fn is_of(line: &[String], file: &str) -> bool {
    line[0] == file || file.rsplit_once('.').is_some_and(|(stem, _)| line[0] == stem)
}

/// Whether a table speaks of a sheet; `*` stands for the only one of a text file.
pub fn is_sheet(written: &str, name: &str) -> bool {
    written == "*" || written == name
}

/// Whether an answer is one of those that are right, written with `|` between them.
pub fn allows(right: &str, answer: &str) -> bool {
    right.split('|').any(|one| one == answer)
}
