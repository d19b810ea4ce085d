//! Outcomes that a chemist expects with certainty, worked from the criteria and the row by hand before the program ran.

use std::path::Path;

use crate::annotated::EXAMPLE;

#[test]
fn outcomes_worked_by_hand_are_those_of_the_annotated_example() {
    let path = Path::new(env!("CARGO_MANIFEST_DIR")).join("tests/fixtures/certain_outcomes.tsv");
    let mut reader = csv::ReaderBuilder::new().delimiter(b'\t').from_path(path).unwrap();
    let mut checked = 0;
    for line in reader.records() {
        let line = line.unwrap();
        let (sheet, row, book) = (&line[0], line[1].parse().unwrap(), &line[4]);
        for criterion in line[5].split(", ") {
            let found = EXAMPLE.cell(sheet, row, &format!("{book} {criterion}"));
            // The table gives the word; whether the limit is close is for the standard deviation to say.
            let word = found.trim_end_matches(" (close call)");
            let expected = line[6].trim_end_matches(" (close call)");
            assert_eq!(word, expected, "{} {book} {criterion}: {}", &line[3], &line[7]);
            checked += 1;
        }
    }
    assert!(checked >= 30, "{checked} outcomes");
}

/// Every cell of every screened row, as a table; a change is to be read as a change of a verdict that a user defends.
#[test]
fn the_verdict_table_of_the_example_is_as_reviewed() {
    let mut table = String::new();
    for sheet in ["Substances", "Rohstoffe"] {
        let (header_row, header) = EXAMPLE.header(sheet);
        let first = header.iter().position(|cell| cell == "log Kow used").unwrap();
        let shown: Vec<usize> = (first..header.len())
            .filter(|column| {
                let header = &header[*column];
                !(header.ends_with(" why") || header.starts_with("Assess") || header == "Cautions")
            })
            .collect();
        let line = |row: &[String]| {
            let cells: Vec<&str> = shown.iter().map(|column| row[*column].as_str()).collect();
            format!("{} | {}\n", row[0], cells.join(" | "))
        };
        for row in &EXAMPLE.sheets[sheet][header_row..] {
            table.push_str(&line(row));
        }
    }
    insta::assert_snapshot!(table);
}

/// The sentences of a few rows, reviewed as wording.
#[test]
fn the_reasoning_of_chosen_rows_reads_as_reviewed() {
    let chosen = ["Hexachlorobenzene", "Phenanthrene", "1,4-Dioxane", "Zinkoxid", "Chlorparaffine, C10-13"];
    let lines: Vec<String> = EXAMPLE.sheets["Reasoning"]
        .iter()
        .filter(|line| chosen.contains(&line[3].as_str()))
        .map(|line| format!("{} {} {}: {}. {}", line[3], line[4], line[5], line[6], line[15]))
        .collect();
    insta::assert_snapshot!(lines.join("\n"));
}
