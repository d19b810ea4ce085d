//! Cells that cannot be read: each is named, and the row is screened with what remains. Nothing of the user's is lost.

use calamine::Data;

use crate::place::Place;
use crate::sheets::{HEADER, Put, rows_with_a_fault, texts};

/// What is said of a cell of a row that is otherwise sound.
fn complaint(column: usize, cell: Put<'_>) -> String {
    let mut row = texts(&["DDT", "50-29-3", "6.91", "12000", "2000"]);
    row[column] = cell;
    let place = Place::with_rows(vec![texts(&HEADER), row]);
    let run = place.screen(&["--quiet", "--reasoning", "none"]);
    assert_eq!(run.status, i32::from(!run.complained.is_empty()));
    run.complained.lines().next().unwrap_or_default().to_owned()
}

#[test]
fn an_unreadable_cell_is_named_here_and_in_its_row_and_the_row_is_screened() {
    let place = Place::with_rows(rows_with_a_fault());
    let run = place.screen(&[]);
    assert_eq!(run.status, 1);
    let fault = "Substances!E3: `soon` is no half-life in soil; write, for example, `40 d`";
    assert!(run.complained.starts_with(fault), "{}", run.complained);
    assert!(run.said.starts_with("Screened 2 rows on 1 sheet"), "{}", run.said);
    let rows = place.screened("Substances");
    assert!(rows.under(1, "Cautions", 3).contains(&format!("not read: {fault}")));
    assert_eq!(rows.under(1, "REACH B", 3), "screens out");
    assert_eq!(rows.under(1, "Half-life soil (d)", 3), "soon", "the cell itself is kept");
    let record = place.screened("Run record").text();
    assert!(
        record.contains("Cells that could not be read or used: 1|\nnot a value of its column|1"),
        "{record}"
    );
}

#[test]
fn what_no_substance_has_is_no_value() {
    let expected = [
        (
            2,
            Put::Number(1e308),
            "C2: `1E308` is far outside what log Kow can be; check the number, its unit and its decimal separator",
        ),
        (
            2,
            Put::Text("99"),
            "C2: `99` is far outside what log Kow can be as a logarithm; if it is the value itself, write it with its name, \
             for example `Kow = 50000`",
        ),
        (2, Put::Text("NaN"), "C2: `NaN` is no log Kow; write, for example, `4.5`"),
        (2, Put::Boolean(true), "C2: `TRUE` is no log Kow; write, for example, `4.5`"),
        (
            3,
            Put::Number(-5.0),
            "D2: `-5` is negative, which BCF cannot be; if it is a logarithm, write, for example, `log BCF = 3.2`, else \
             check the sign",
        ),
        (
            4,
            Put::Day(46_000.0),
            "E2: `2025-12-09` is a date, which a spreadsheet may have made of a number such as `4.5`; format the column \
             as text or number and write the half-life in soil again",
        ),
        (
            3,
            Put::Formula("=NA()", "#N/A"),
            "D2: `#N/A` is an error of the spreadsheet; correct the formula or leave the cell empty",
        ),
    ];
    for (column, cell, message) in expected {
        assert_eq!(complaint(column, cell), format!("Substances!{message}"));
    }
}

#[test]
fn a_formula_without_a_stored_result_is_a_fault_and_one_with_an_empty_text_is_not() {
    use crate::hostile::RawBook;
    let text = |reference: &str, text: &str| {
        format!(r#"<c r="{reference}" t="inlineStr"><is><t>{text}</t></is></c>"#)
    };
    let header = format!(r#"<row r="1">{}{}</row>"#, text("A1", "CAS"), text("B1", "log Kow"));
    for (cell, status) in [
        (r#"<c r="B2"><f>3+3.91</f></c>"#, 1),
        (r#"<c r="B2"><f>3+3.91</f><v/></c>"#, 1),
        (r#"<c r="B2"><f>3+3.91</f><v></v></c>"#, 1),
        (r#"<c r="B2" t="str"><f>""</f><v></v></c>"#, 0),
        (r#"<c r="B2"><f>3+3.91</f><v>6.91</v></c>"#, 0),
    ] {
        let place = Place::new();
        let row = format!(r#"{header}<row r="2">{}{cell}</row>"#, text("A2", "50-29-3"));
        RawBook::with_rows(&row).write(&place.path("inventory.xlsx")).unwrap();
        let run = place.screen(&[]);
        assert_eq!(run.status, status, "{cell}: {}", run.complained);
        let said = "Substances!B2: `=…` is a formula without a stored result; open the workbook in a spreadsheet \
                    program, save it and use that file";
        assert_eq!(run.complained.starts_with(said), status == 1, "{}", run.complained);
    }
}

#[test]
fn error_values_that_become_text_are_told() {
    let mut rows = rows_with_a_fault();
    rows[1][3] = Put::Formula("=NA()", "#N/A");
    let run = Place::with_rows(rows).screen(&[]);
    assert!(run.said.contains("Sheet `Substances`: 1 error value is written as an error again where xlsx knows it, else as text."), "{}", run.said);
}

#[test]
fn texts_of_any_kind_stay_what_they_were() {
    let long = "x".repeat(32_767);
    let odd = [
        "=1+1",
        "+41 79",
        "-x",
        "@home",
        "=HYPERLINK(\"http://x\",\"y\")",
        "😀 שלום مرحبا",
        "00123",
        "1E5",
        "TRUE",
        &long,
    ];
    let mut rows = vec![texts(&["CAS No.", "Note", "Name"])];
    rows.extend(odd.iter().map(|text| texts(&["108-95-2", text, text])));
    let place = Place::with_rows(rows);
    let run = place.screen(&["--reasoning", "none"]);
    assert_eq!(run.status, 0, "{}", run.complained);
    let written = place.screened("Substances");
    for (row, text) in written.0.iter().skip(1).zip(odd) {
        assert_eq!(row[1], Data::String(text.to_owned()));
        assert_eq!(row[2], Data::String(text.to_owned()));
    }
}
