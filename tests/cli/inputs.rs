//! Inventories that cannot be used: each is named as what it is, and nothing is written.

use crate::hostile::{self, RawBook};
use crate::place::Place;
use crate::sheets::{HEADER, sound_rows, texts};

#[test]
fn a_missing_file_and_a_folder_are_told_apart() {
    let place = Place::new();
    place.refuses(&["screen", "none.xlsx"], "none.xlsx: there is no such file; check the path");
    std::fs::create_dir(place.path("lists.xlsx")).unwrap();
    place.refuses(&["screen", "lists.xlsx"], "lists.xlsx: is a folder; name the workbook inside it");
}

#[test]
fn a_file_of_another_kind_is_named_as_what_it_is_and_what_to_do() {
    let save = "open it in a spreadsheet program, save it as xlsx and use that file";
    let other = "name a workbook, or a csv, with one substance a row";
    let written: [(&[u8], String); 4] = [
        (b"", "the file is empty; check that the export or the download was finished".to_owned()),
        (b"{\"cas\": \"50-29-3\"}\n", format!("this is a JSON file, not a table; {other}")),
        (
            b"<html><body><table></table></body></html>",
            format!("this is a web page (HTML), whatever its name says; {save}"),
        ),
        (b"%PDF-1.7\n", format!("this is a PDF, not a workbook; {other}")),
    ];
    for (content, message) in written {
        let place = Place::new();
        std::fs::write(place.path("inventory.xlsx"), content).unwrap();
        for command in ["screen", "columns"] {
            place.refuses(&[command, "inventory.xlsx"], &format!("inventory.xlsx: {message}"));
        }
    }
    let place = Place::new();
    hostile::write_text_document(&place.path("letter.xlsx")).unwrap();
    place.refuses(
        &["screen", "letter.xlsx"],
        &format!("letter.xlsx: this is a text document or a presentation, not a workbook; {other}"),
    );
    hostile::write_compound_file(&place.path("locked.xlsx"), "EncryptedPackage").unwrap();
    place.refuses(
        &["screen", "locked.xlsx"],
        "locked.xlsx: the workbook is protected by a password; open it in a spreadsheet program, remove the password \
         and save it as xlsx",
    );
}

#[test]
fn a_broken_download_is_said_to_be_damaged() {
    let place = Place::new();
    RawBook::with_rows("").write_cut_off(&place.path("half.xlsx")).unwrap();
    let run = place.run(&["screen", "half.xlsx"]);
    assert_eq!(run.status, 2);
    assert!(run.complained.starts_with("half.xlsx: the workbook is damaged ("), "{}", run.complained);
    assert!(
        run.complained
            .trim_end()
            .ends_with("open it in a spreadsheet program, save it again as xlsx and use that file"),
        "{}",
        run.complained
    );
    assert_eq!(place.files(), ["half.xlsx"]);
}

#[test]
fn a_workbook_without_a_header_says_what_a_header_needs_and_where_it_looked() {
    let message = "inventory.xlsx: no sheet has a header that is recognised (Notes, More); a header stands within the \
        first 30 rows that hold anything and needs a column for a CAS number, an EC number or a structure, or a name \
        beside another known column. `kowledger columns` shows what was found, and `--column 'Header=field'` names a \
        column";
    let place = Place::with_sheets(&[("Notes", vec![texts(&["Colour", "Place"])]), ("More", vec![])]);
    place.refuses(&["screen", "inventory.xlsx"], message);
    let run = place.run(&["columns", "inventory.xlsx"]);
    assert_eq!(run.status, 0);
    assert_eq!(
        run.said,
        "Notes: no header recognised; the sheet would be copied.\nMore: no header recognised; the sheet would be copied.\n"
    );
}

#[test]
fn a_header_is_found_in_row_30_and_refused_in_row_31() {
    for (titles, status) in [(29, 0), (30, 2)] {
        let mut rows = vec![texts(&["a line of a long preamble"]); titles];
        rows.extend(sound_rows());
        assert_eq!(Place::with_rows(rows).screen(&[]).status, status, "{titles}");
    }
}

#[test]
fn a_sheet_too_wide_for_the_added_columns_is_refused_with_the_numbers() {
    let place = Place::new();
    let cell = |reference: &str, text: &str| {
        format!(r#"<c r="{reference}" t="inlineStr"><is><t>{text}</t></is></c>"#)
    };
    let row = format!(r#"<row r="1">{}{}</row>"#, cell("A1", "CAS"), cell("XFD1", "end"));
    RawBook::with_rows(&row).write(&place.path("wide.xlsx")).unwrap();
    let run = place.run(&["screen", "wide.xlsx"]);
    assert_eq!(run.status, 2);
    assert!(
        run.complained.starts_with("sheet Substances: 16384 columns are used and "),
        "{}",
        run.complained
    );
    assert_eq!(place.files(), ["wide.xlsx"]);
}

#[test]
fn a_header_alone_and_a_header_above_nothing_screen_no_row() {
    for rows in [vec![texts(&HEADER)], vec![texts(&HEADER), vec![], texts(&["  "])]] {
        let place = Place::with_rows(rows);
        let run = place.screen(&[]);
        assert_eq!(run.status, 0, "{}", run.complained);
        assert_eq!(
            run.complained,
            "Substances: nothing was screened: the header in row 1 was recognised, but no row below it holds a \
             substance; if there should be one, check that the file is complete and that the header stands above the \
             data\n"
        );
        let record = place.screened("Run record").text();
        assert!(record.contains("Rows screened|0; no row below the header holds a substance"), "{record}");
        assert!(run.said.starts_with("Screened 0 rows on 1 sheet; 0 other sheets copied."), "{}", run.said);
    }
}

#[test]
fn a_hidden_sheet_that_is_screened_is_said_to_be_hidden_and_a_visible_one_is_not() {
    let place = Place::new();
    let mut book = rust_xlsxwriter::Workbook::new();
    for name in ["Shown", "Old"] {
        let sheet = book.add_worksheet();
        sheet.set_name(name).unwrap().set_hidden(name == "Old");
        sheet.write_row(0, 0, ["Name", "CAS"]).unwrap();
        sheet.write_row(1, 0, ["Phenol", "108-95-2"]).unwrap();
    }
    book.save(place.path("inventory.xlsx")).unwrap();
    let run = place.screen(&[]);
    assert!(run.said.contains("\nSheet `Old` is hidden and was screened.\n"), "{}", run.said);
    assert!(!run.said.contains("`Shown` is hidden"), "{}", run.said);
    let record = place.screened("Run record").text();
    let told =
        "Sheet: Old|\nHidden|The sheet is hidden in the inventory; it was screened and is hidden here.";
    assert!(record.contains(told), "{record}");
    assert_eq!(record.matches("\nHidden|").count(), 1, "{record}");
}
