//! Tables of identity cells, hazard statements, kinds and biodegradability: `tests/fixtures/*.tsv`.
//!
//! Each line says what a chemist takes a cell to mean. A result must be the same; of a fault some words are given.

use kowledger::quantity::{Date, format_number};
use kowledger::substance::{
    Completeness, DegradationTest, Identity, RowReader, RowType, Substance, SubstanceType, UnstatedBasis,
};
use kowledger::workbook::{CellContent, WideMerges};

use crate::sheet::{columns_of, content_row, read_last_row, text_row};

/// A cell as the tables write it.
fn content(written: &str) -> CellContent {
    if let Some(number) = written.strip_prefix("number: ").and_then(|number| number.parse().ok()) {
        return CellContent::Number(number);
    }
    if let Some(day) = written.strip_prefix("date: ").and_then(Date::parse) {
        let serial = (1..60_000).map(f64::from).find(|serial| Date::from_serial(*serial) == Some(day));
        return CellContent::DateTime(serial.unwrap_or_default());
    }
    if written.is_empty() {
        return CellContent::Empty;
    }
    let mut text = written.replace("\\n", "\n");
    for (code, character) in [("A0", '\u{A0}'), ("AD", '\u{AD}'), ("200B", '\u{200B}'), ("FEFF", '\u{FEFF}')]
    {
        text = text.replace(&format!("\\u{{{code}}}"), &character.to_string());
    }
    CellContent::Text(text)
}

/// A row with a name and these cells under these headers.
fn read(headers: &[&str], cells: &[&str]) -> Result<Substance, String> {
    let headers: Vec<&str> = ["Name"].into_iter().chain(headers.iter().copied()).collect();
    let name = CellContent::Text("a name".to_owned());
    let contents: Vec<CellContent> =
        std::iter::once(name).chain(cells.iter().map(|cell| content(cell))).collect();
    read_last_row(&[text_row(0, &headers), content_row(1, &contents)])
}

/// Holds every line of a table against what `describe` finds in its first `cells` columns: a text and the first fault.
/// `unsaid` stands for a cell without a result, be it missing or a fault.
fn check(
    table: &str,
    cells: usize,
    least: usize,
    describe: impl Fn(&[&str]) -> Result<(String, String), String>,
) {
    let mut wrong = Vec::new();
    let mut lines = 0;
    for line in table.lines().filter(|line| !line.starts_with("# ") && !line.is_empty()) {
        lines += 1;
        let mut columns: Vec<&str> = line.split('\t').collect();
        let fault = columns.pop().unwrap_or_default();
        let expected = columns.split_off(cells.min(columns.len())).join(" | ");
        match describe(&columns) {
            Ok((found, told)) => {
                let same_fault = if fault.is_empty() { told.is_empty() } else { told.contains(fault) };
                let says_nothing = found == "missing" || (found.is_empty() && !told.is_empty());
                if !(expected == "unsaid" && says_nothing) && (found != expected || !same_fault) {
                    wrong.push(format!(
                        "{columns:?}\n  expected {expected} [{fault}]\n  found    {found} [{told}]"
                    ));
                }
            }
            Err(error) => wrong.push(format!("{columns:?}: {error}")),
        }
    }
    assert!(lines >= least, "{lines} lines");
    assert!(wrong.is_empty(), "{} of {lines}\n{}", wrong.len(), wrong.join("\n"));
}

fn first_fault(substance: &Substance) -> String {
    substance.faults.first().map(|fault| fault.kind.to_string()).unwrap_or_default()
}

fn identity(substance: &Substance) -> &'static str {
    match substance.identity {
        Identity::Identified => "identified",
        Identity::RepairedDate => "by a date",
        Identity::BareNumber => "without hyphens",
        Identity::NameAlone => "name alone",
        Identity::NotIdentified => "not identified",
    }
}

#[test]
fn every_cas_cell_of_the_table_is_read_as_written_there() {
    check(include_str!("../fixtures/cas_cells.tsv"), 1, 200, |cells| {
        let substance = read(&["CAS"], cells)?;
        let number = substance.cas.as_ref().map(|cas| cas.value.to_string()).unwrap_or_default();
        Ok((format!("{number} | {}", identity(&substance)), first_fault(&substance)))
    });
}

#[test]
fn every_ec_cell_of_the_table_is_read_as_written_there() {
    check(include_str!("../fixtures/ec_cells.tsv"), 1, 90, |cells| {
        let substance = read(&["EC number"], cells)?;
        let number = substance.ec.as_ref().map(|ec| ec.value.to_string()).unwrap_or_default();
        Ok((format!("{number} | {}", identity(&substance)), first_fault(&substance)))
    });
}

#[test]
fn every_row_of_identifiers_of_the_table_is_as_sure_as_written_there() {
    check(include_str!("../fixtures/identifiers.tsv"), 4, 60, |cells| {
        let substance = read(&["CAS", "EC number", "SMILES", "InChIKey"], cells)?;
        Ok((identity(&substance).to_owned(), first_fault(&substance)))
    });
}

#[test]
fn every_cell_of_statements_of_the_table_is_read_as_written_there() {
    check(include_str!("../fixtures/statements.tsv"), 1, 200, |cells| {
        let substance = read(&["Hazard statements"], cells)?;
        let fault = first_fault(&substance);
        let found = match &substance.hazard_statements {
            None if fault.is_empty() => "missing".to_owned(),
            None => String::new(),
            Some(statements) => {
                let codes: Vec<&str> = statements.value.codes().collect();
                let complete = statements.value.completeness() == Completeness::Complete;
                match (codes.is_empty(), complete == fault.is_empty()) {
                    (_, false) => format!("{codes:?} {:?}", statements.value.completeness()),
                    (true, true) => "none".to_owned(),
                    (false, true) => codes.join(" "),
                }
            }
        };
        Ok((found, fault))
    });
}

fn row_type(substance: &Substance) -> String {
    match substance.row_type {
        RowType::NotStated => "not stated",
        RowType::Substance => "substance",
        RowType::Mixture => "mixture",
        RowType::Article => "article",
    }
    .to_owned()
}

fn substance_types(substance: &Substance) -> String {
    let first = substance.substance_type.as_ref().map(|cited| cited.value);
    let types: Vec<&str> =
        first.into_iter().chain(substance.further_types.iter().copied()).map(SubstanceType::id).collect();
    if types.is_empty() { "none".to_owned() } else { types.join(" + ") }
}

#[test]
fn every_kind_of_the_table_is_read_as_written_there() {
    check(include_str!("../fixtures/kinds.tsv"), 2, 150, |cells| {
        let [column, cell] = cells else {
            return Err("no column and cell".to_owned());
        };
        let substance = read(&["CAS", column], &["50-29-3", cell])?;
        let found = if *column == "Row type" { row_type(&substance) } else { substance_types(&substance) };
        Ok((found, first_fault(&substance)))
    });
}

#[test]
fn every_cell_on_ready_biodegradability_of_the_table_is_read_as_written_there() {
    check(include_str!("../fixtures/degradability.tsv"), 1, 300, |cells| {
        let substance = read(&["CAS", "Ready biodegradability"], &["50-29-3", cells.first().unwrap_or(&"")])?;
        let fault = first_fault(&substance);
        let found = match substance.ready.first().map(|cited| cited.value.result) {
            Some(DegradationTest::Ready) => "ready",
            Some(DegradationTest::NotReady) => "not ready",
            Some(DegradationTest::Open) => "open",
            None if fault.is_empty() => "missing",
            None => "",
        };
        Ok((found.to_owned(), fault))
    });
}

#[test]
fn every_cell_on_inherent_biodegradability_of_the_table_is_read_as_written_there() {
    check(include_str!("../fixtures/inherent.tsv"), 1, 25, |cells| {
        let substance =
            read(&["CAS", "Inherent biodegradability"], &["50-29-3", cells.first().unwrap_or(&"")])?;
        let number = |number: Option<f64>| number.map_or("-".to_owned(), format_number);
        let found = substance.inherent.first().map_or("- | - | -".to_owned(), |cited| {
            let guideline = cited.value.guideline.as_deref().unwrap_or("-");
            let lowest = cited.value.degraded.and_then(|degraded| degraded.low().number());
            format!("{guideline} | {} | {}", number(lowest), number(cited.value.days))
        });
        Ok((found, first_fault(&substance)))
    });
}

/// A reader of rows with an item number, name, CAS number, log Kow and tonnage.
fn reader_of_stock() -> Result<RowReader, String> {
    let headers = text_row(0, &["Item no.", "Name", "CAS", "log Kow", "Tonnes per year"]);
    let columns = columns_of(&[headers, text_row(1, &["7", "Phenol", "108-95-2", "1.46", "12"])])?;
    Ok(RowReader::new("Sheet".into(), &columns, UnstatedBasis::Unstated))
}

/// What a row is taken for that is no substance; `substance` for one.
fn kind_of_row(reader: &RowReader, cells: &[&str]) -> &'static str {
    let contents: Vec<CellContent> = cells.iter().map(|cell| content(cell)).collect();
    let told = reader.no_substance(&content_row(1, &contents));
    told.map_or("substance", |fault| fault.kind.wording().title)
}

fn check_kinds_of_rows(reader: &RowReader, table: &str, least: usize) {
    check(table, 5, least, |cells| Ok((kind_of_row(reader, cells).to_owned(), String::new())));
}

#[test]
fn every_row_of_totals_of_the_table_is_told_from_substances() {
    check_kinds_of_rows(&reader_of_stock().unwrap(), include_str!("../fixtures/totals.tsv"), 60);
}

#[test]
fn notes_headings_and_page_numbers_of_the_table_are_told_from_substances() {
    check_kinds_of_rows(&reader_of_stock().unwrap(), include_str!("../fixtures/no_substance.tsv"), 220);
}

#[test]
fn no_name_of_the_example_is_taken_for_a_note_whatever_mark_stands_before_it() {
    let reader = reader_of_stock().unwrap();
    let names = include_str!("../fixtures/inventory.tsv").lines().skip(1);
    let names = names.filter_map(|line| line.split('\t').nth(4)).filter(|name| !["", "Total"].contains(name));
    let mut wrong = Vec::new();
    let mut tried = 0;
    for name in names {
        for mark in ["", "* ", "*", "** ", "† ", "‡", "§ ", "※", "¹ ", "1) ", "(2) ", "[3] ", "a) ", "(b) "]
        {
            tried += 1;
            let marked = format!("{mark}{name}");
            if kind_of_row(&reader, &["", &marked, "", "", ""]) != "substance" {
                wrong.push(marked);
            }
        }
    }
    assert!(tried > 2000, "{tried}");
    assert!(wrong.is_empty(), "{wrong:#?}");
}

#[test]
fn a_text_merged_across_columns_that_hold_different_things_is_a_heading() {
    // The names stand across two columns throughout, as the header does.
    let headers = text_row(0, &["Item no.", "Name", "", "CAS", "log Kow", "Tonnes per year"]);
    let columns =
        columns_of(&[headers, text_row(1, &["7", "Phenol", "", "108-95-2", "1.46", "12"])]).unwrap();
    for (cells, merged, title) in [
        (["Solvents", "", "", "", "", ""], Some((0, 5)), Some("heading")),
        (["Solvents", "", "", "", "", ""], Some((0, 1)), Some("heading")),
        (["", "Solvents", "", "", "", ""], Some((1, 3)), Some("heading")),
        (["", "", "", "Solvents", "", ""], Some((3, 4)), Some("heading")),
        (["Solvents", "", "", "", "", ""], None, None),
        (["", "Rosin ester", "", "", "", ""], Some((1, 2)), None),
        (["", "Rosin ester", "", "", "", ""], Some((0, 5)), None),
        (["8", "Rosin ester", "", "", "", ""], Some((1, 3)), None),
        (["", "Rosin ester", "", "", "", "12"], Some((1, 4)), None),
        (["", "", "", "108-95-2", "", ""], Some((3, 5)), None),
        (["", "", "", "108952", "", ""], Some((3, 5)), None),
        (["", "", "", "", "soon", ""], Some((4, 5)), None),
    ] {
        let mut merges = WideMerges::default();
        if let Some((first, last)) = merged {
            merges.note(1, first, last);
        }
        let reader = RowReader::new("Sheet".into(), &columns, UnstatedBasis::Unstated).with_merges(merges);
        let told = reader.no_substance(&text_row(1, &cells)).map(|fault| fault.kind.wording().title);
        assert_eq!(told, title, "{cells:?} {merged:?}");
    }
}
