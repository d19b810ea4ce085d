//! Tables of published values.

use std::collections::BTreeMap;
use std::path::Path;

/// A line of a table: its cells by column.
pub type Line = BTreeMap<String, String>;

/// The lines of a table under `tests/fixtures`; the ending tells the separator.
pub fn lines(name: &str) -> Vec<Line> {
    let path = Path::new(env!("CARGO_MANIFEST_DIR")).join("tests/fixtures").join(name);
    let delimiter = if path.extension().is_some_and(|ending| ending == "tsv") { b'\t' } else { b',' };
    let mut reader = csv::ReaderBuilder::new().delimiter(delimiter).from_path(path).expect("the table opens");
    let lines: Vec<Line> =
        reader.deserialize().map(|line| line.expect("the table has its columns")).collect();
    assert!(
        lines.iter().all(|line| line.get("source").is_some_and(|source| !source.is_empty())),
        "{name} names its sources"
    );
    lines
}

/// A number of a line.
pub fn number(line: &Line, column: &str) -> f64 {
    line.get(column).expect("the column").parse().expect("a number")
}
