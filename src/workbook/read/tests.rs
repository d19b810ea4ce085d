//! What is refused, and why, and what an inventory reads as.

use std::ops::ControlFlow;
use std::path::PathBuf;

use tempfile::TempDir;

use super::open_inventory;
use crate::workbook::{CellContent, Row, Visibility};

#[path = "../../../tests/make/binary.rs"]
pub(super) mod binary;
#[path = "../../../tests/make/hostile.rs"]
pub(super) mod hostile;

use hostile::RawBook;

/// A folder that vanishes with the test, and a path in it.
pub(super) fn place(name: &str) -> (TempDir, PathBuf) {
    let folder = tempfile::tempdir().unwrap();
    let path = folder.path().join(name);
    (folder, path)
}

/// The refusal of a file made by `make`, without the path before it.
pub(super) fn refusal(name: &str, make: impl FnOnce(&std::path::Path) -> std::io::Result<()>) -> String {
    let (_folder, path) = place(name);
    make(&path).unwrap();
    let said = match open_inventory(&path) {
        Ok(_) => panic!("{name} was opened"),
        Err(fault) => fault.to_string(),
    };
    said.strip_prefix(&format!("{}: ", path.display()))
        .unwrap_or_else(|| panic!("{said} does not begin with the path"))
        .to_owned()
}

fn refusal_of_rows(rows: &str) -> String {
    refusal("rows.xlsx", |path| RawBook::with_rows(rows).write(path))
}

fn rows_of(book: &RawBook) -> Vec<Row> {
    let (_folder, path) = place("book.xlsx");
    book.write(&path).unwrap();
    let mut rows = Vec::new();
    open_inventory(&path)
        .unwrap()
        .stream_rows(0, |row| {
            rows.push(row);
            ControlFlow::Continue(())
        })
        .unwrap();
    rows
}

const SAVE_AGAIN: &str = "open it in a spreadsheet program, save it again as xlsx and use that file";

#[test]
fn a_file_of_another_kind_is_named_as_what_it_is() {
    let save_as = "open it in a spreadsheet program, save it as xlsx and use that file";
    let text = |content: &'static [u8]| move |path: &std::path::Path| std::fs::write(path, content);
    for (said, remedy) in [
        (
            refusal("a.xlsx", text(b"")),
            "the file is empty; check that the export or the download was finished".to_owned(),
        ),
        (
            refusal("a.xls", text(b"<html><body><table><tr><td>CAS</td></tr></table></body></html>")),
            format!("this is a web page (HTML), whatever its name says; {save_as}"),
        ),
        (
            refusal(
                "a.xls",
                text(b"<?xml version=\"1.0\"?>\n<Workbook xmlns=\"urn:schemas-microsoft-com:office:spreadsheet\"/>"),
            ),
            format!("this is a workbook written as XML text, which is not read; {save_as}"),
        ),
        (
            refusal("a.csv", text(b"[{\"cas\": \"50-00-0\"}]")),
            "this is a JSON file, not a table; name a workbook, or a csv, with one substance a row".to_owned(),
        ),
        (
            refusal("a.csv", text(b"\x00\x01\x02\x03binary\xFF\xFE\x10\x11")),
            "this is not a workbook; name a workbook, or a csv, with one substance a row".to_owned(),
        ),
        (
            refusal("a.xlsx", |path| hostile::write_compound_file(path, "EncryptedPackage")),
            "the workbook is protected by a password; open it in a spreadsheet program, remove the password and save \
             it as xlsx"
                .to_owned(),
        ),
        (
            refusal("a.xls", |path| hostile::write_compound_file(path, "Workbook")),
            format!(
                "the workbook is damaged (the container around it cannot be read, perhaps the file was cut off: its \
                 sectors have a size no program uses); {SAVE_AGAIN}"
            ),
        ),
        (
            refusal("a.xlsx", hostile::write_text_document),
            "this is a text document or a presentation, not a workbook; name a workbook, or a csv, with one substance a row"
                .to_owned(),
        ),
        (
            refusal("a.ods", hostile::write_open_document),
            "this is a text document or a presentation, not a workbook; name a workbook, or a csv, with one substance a row"
                .to_owned(),
        ),
        (
            refusal("a.xlsb", hostile::write_xlsb),
            format!(
                "the workbook is damaged (the part `xl/workbook.bin` cannot be read: it ends in the middle of a \
                 record); {SAVE_AGAIN}"
            ),
        ),
        (
            refusal("a.zip", |path| hostile::write_zip(path, &[("readme.txt", b"hello")])),
            "this is an archive without a workbook in it; name a workbook, or a csv, with one substance a row".to_owned(),
        ),
        (
            refusal("a.xlsx", text(b"%PDF-1.7")),
            "this is a PDF, not a workbook; name a workbook, or a csv, with one substance a row".to_owned(),
        ),
    ] {
        assert_eq!(said, remedy);
    }
}

#[test]
fn a_path_without_a_file_is_named() {
    let (folder, path) = place("inventory.xlsx");
    let said = open_inventory(&path).err().unwrap().to_string();
    assert_eq!(said, format!("{}: there is no such file; check the path", path.display()));
    let said = open_inventory(folder.path()).err().unwrap().to_string();
    assert_eq!(said, format!("{}: is a folder; name the workbook inside it", folder.path().display()));
}

#[test]
fn a_workbook_cut_off_is_called_damaged() {
    let said = refusal("a.xlsx", |path| {
        RawBook::with_rows(r#"<row r="1"><c r="A1"><v>1</v></c></row>"#).write_cut_off(path)
    });
    assert!(
        said.starts_with(
            "the workbook is damaged (its list of parts cannot be read, perhaps the file was cut off"
        ),
        "{said}"
    );
}

#[test]
fn a_sheet_that_unpacks_to_far_more_than_it_takes_is_refused() {
    assert_eq!(
        refusal("a.xlsx", hostile::write_bomb),
        "its part `xl/worksheets/sheet1.xml` unpacks to over 250 times its size in the file, more than an inventory \
         can need (250 times); if the file is yours, split it into several workbooks"
    );
}

#[test]
fn parts_that_unpack_too_far_together_are_refused() {
    let (_folder, path) = place("a.xlsx");
    RawBook::with_rows("").write(&path).unwrap();
    let usual = super::Limits::USUAL;
    for limits in [super::Limits { total: 700, ..usual }, super::Limits { held: 700, ..usual }] {
        let said = super::open_within(&path, limits).err().unwrap().to_string();
        assert!(said.contains("unpacks to over 0 MB"), "{said}");
    }
    assert!(super::open_within(&path, super::Limits::USUAL).is_ok());
}

#[test]
fn a_false_number_of_shared_texts_is_refused_before_room_is_made_for_them() {
    assert_eq!(
        refusal("a.xlsx", hostile::write_false_text_count),
        format!("the workbook is damaged (it claims 4000000000 different texts but stores 1); {SAVE_AGAIN}")
    );
}

#[test]
fn a_cell_no_sheet_has_is_refused() {
    assert_eq!(
        refusal_of_rows(r#"<row r="1"><c r="XFE1"><v>1</v></c></row>"#),
        format!(
            "sheet `Substances` has a cell at `XFE1`, which is not a cell of any sheet (A1 to XFD1048576); {SAVE_AGAIN}"
        )
    );
    for rows in [
        r#"<row r="1048577"><c r="A1048577"><v>1</v></c></row>"#,
        r#"<row r="99999999999"><c r="A1"><v>1</v></c></row>"#,
        r#"<row r="1"><c r="XFD1"><v>1</v></c><c><v>2</v></c></row>"#,
    ] {
        let said = refusal_of_rows(rows);
        assert!(said.contains("is not a cell of any sheet"), "{said}");
    }
}

#[test]
fn the_last_cell_a_sheet_has_is_read() {
    let rows = rows_of(&RawBook::with_rows(r#"<row r="1048576"><c r="XFD1048576"><v>1</v></c></row>"#));
    assert_eq!(rows.len(), 1);
    assert_eq!(rows[0].index, 1_048_575);
    assert_eq!(rows[0].cells[0].column, 16_383);
}

#[test]
fn a_cell_stored_twice_or_out_of_order_is_named() {
    for rows in [
        r#"<row r="7"><c r="C7"><v>1</v></c><c r="C7"><v>2</v></c></row>"#,
        r#"<row r="7"><c r="D7"><v>1</v></c><c r="C7"><v>2</v></c></row>"#,
        r#"<row r="3"><c r="C7"><v>2</v></c></row>"#,
    ] {
        assert_eq!(
            refusal_of_rows(rows),
            format!("Substances!C7 is stored twice or out of order; {SAVE_AGAIN}")
        );
    }
    let said = refusal_of_rows(r#"<row r="7"/><row r="7"/>"#);
    assert!(said.starts_with("sheet `Substances` stores row 7 twice"), "{said}");
}

#[test]
fn a_value_that_would_be_read_as_another_is_named() {
    for (cell, what) in [
        (r#"<c r="A1" t="s"><v>0</v></c>"#, "a reference to text number `0`, which is not stored"),
        (r#"<c r="A1" t="s"><v>x</v></c>"#, "a reference to text number `x`, which is not stored"),
        (r#"<c r="A1" t="n"><v>4,5</v></c>"#, "`4,5`, said to be a number"),
        (r#"<c r="A1" t="b"><v>2</v></c>"#, "`2`, said to be true or false"),
        (r#"<c r="A1" t="q"><v>2</v></c>"#, "a value of the unknown type `q`"),
        (r#"<c r="A1"><v>1<!-- -->2</v></c>"#, "a value interrupted by something else"),
        (r#"<c r="A1"><v>1</v><f>1+1</f></c>"#, "`f` where its value should stand"),
        (r#"<c r="A1" t="inlineStr"><v>1</v></c>"#, "a text stored where a number belongs"),
    ] {
        assert_eq!(
            refusal_of_rows(&format!(r#"<row r="1">{cell}</row>"#)),
            format!("Substances!A1 holds {what}; {SAVE_AGAIN}")
        );
    }
}

#[test]
fn a_sheet_in_another_encoding_is_refused_and_not_read_as_empty() {
    let said = refusal("a.xlsx", |path| {
        RawBook::with_rows(r#"<row r="1"><c r="A1"><v>1</v></c></row>"#).write_in_utf16(path)
    });
    assert_eq!(
        said,
        format!(
            "the workbook is damaged (the part `xl/worksheets/sheet1.xml` cannot be read: it is written in UTF-16 \
             instead of UTF-8); {SAVE_AGAIN}"
        )
    );
}

#[test]
fn a_workbook_that_contradicts_itself_is_refused() {
    let book = || RawBook::with_rows("");
    for (book, what) in [
        (book().edit("xl/workbook.xml", "rId1", "rId2"), "without saying where it is"),
        (book().edit("xl/_rels/workbook.xml.rels", "sheet1", "sheet2"), "is missing"),
        (RawBook::with_sheet(""), "holds no rows"),
        (RawBook::with_sheet(r#"<dimension ref="C7:A1"/><sheetData/>"#), "says that its cells are `C7:A1`"),
        (
            RawBook::with_sheet(r#"<cols><col min="3" max="16385" width="9"/></cols><sheetData/>"#),
            "gives a width to columns no sheet has",
        ),
        (RawBook::with_sheet("<sheetData/><sheetData/>"), "stores its rows in two places"),
        (RawBook::with_sheet("<sheetData><row>"), "cannot be read"),
        (
            RawBook::with_rows(r#"<row r="1"><c r="A1" t="n" t="s"><v>0</v></c></row>"#),
            "has a cell that cannot be read",
        ),
        (book().part("XL/worksheets/SHEET1.xml", ""), "is there twice"),
        (
            book().part("xl/styles.xml", r#"<!DOCTYPE x [<!ENTITY a "b">]><styleSheet/>"#),
            "declares a document type",
        ),
    ] {
        let said = refusal("a.xlsx", |path| book.write(path));
        assert!(said.contains(what), "{said} lacks {what}");
    }
}

#[test]
fn an_error_value_newer_than_the_reading_library_is_kept_where_it_stands() {
    let rows = rows_of(&RawBook::with_rows(
        r#"<row r="1"><c r="A1"><v>1</v></c><c r="B1" t="e"><v>#SPILL!</v></c><c r="C1" t="e"><v>#N/A</v></c></row>
            <row r="2"><c r="A2" t="e"><v>#CALC!</v></c><c r="B2" t="str"><f>A1</f><v>x &amp; y</v></c></row>"#,
    ));
    let contents: Vec<_> = rows
        .iter()
        .flat_map(|row| row.cells.iter().map(|cell| (row.index, cell.column, &cell.content)))
        .collect();
    let error = |text: &str| CellContent::Error(text.to_owned());
    assert_eq!(
        contents,
        [
            (0, 0, &CellContent::Number(1.0)),
            (0, 1, &error("#SPILL!")),
            (0, 2, &error("#N/A")),
            (1, 0, &error("#CALC!")),
            (1, 1, &CellContent::Text("x & y".to_owned())),
        ]
    );
}

#[test]
fn an_unknown_error_value_among_cells_without_references_is_refused_since_it_would_shift_them() {
    for rows in [
        r#"<row><c t="e"><v>#SPILL!</v></c></row>"#,
        r#"<row r="1"><c r="A1" t="e"><v>#SPILL!</v></c><c><v>2</v></c></row>"#,
    ] {
        let said = refusal_of_rows(rows);
        assert!(said.contains("unknown error value"), "{said}");
    }
}

#[test]
fn an_inventory_can_be_handed_to_a_thread_that_reads() {
    fn sendable<Whole: Send>() {}
    sendable::<super::Inventory>();
    sendable::<crate::workbook::AnnotatedWorkbook>();
}

#[test]
fn cells_without_references_follow_each_other() {
    let rows = rows_of(&RawBook::with_rows(
        "<row><c><v>1</v></c><c/><c><v>2</v></c></row><row/><row><c r=\"B3\"><v>3</v></c><c><v>4</v></c></row>",
    ));
    let places: Vec<_> =
        rows.iter().flat_map(|row| row.cells.iter().map(|cell| (row.index, cell.column))).collect();
    assert_eq!(places, [(0, 0), (0, 2), (2, 1), (2, 2)]);
}

#[test]
fn dates_of_the_1904_system_are_given_in_the_1900_system() {
    let styles =
        r#"<styleSheet><cellXfs count="2"><xf numFmtId="0"/><xf numFmtId="14"/></cellXfs></styleSheet>"#;
    let book = || {
        RawBook::with_rows(r#"<row r="1"><c r="A1" s="1"><v>1000</v></c><c r="B1"><v>1000</v></c></row>"#)
            .part("xl/styles.xml", styles)
    };
    let contents = |book: &RawBook| -> Vec<CellContent> {
        rows_of(book).remove(0).cells.into_iter().map(|cell| cell.content).collect()
    };
    assert_eq!(contents(&book()), [CellContent::DateTime(1000.0), CellContent::Number(1000.0)]);
    let other = book().edit("xl/workbook.xml", "<sheets>", r#"<workbookPr date1904="1"/><sheets>"#);
    assert_eq!(contents(&other), [CellContent::DateTime(2462.0), CellContent::Number(1000.0)]);
}

#[test]
fn the_survey_knows_widths_formulas_and_what_is_not_carried() {
    let (_folder, path) = place("a.xlsx");
    RawBook::with_sheet(
        r#"<sheetViews><sheetView><pane xSplit="1" ySplit="2" state="frozen"/></sheetView></sheetViews>
           <cols><col min="1" max="2" width="12.5"/><col min="3" max="16384" width="9" hidden="1"/></cols>
           <sheetData>
             <row r="1"><c r="A1"><f>1+1</f><v>2</v></c><c r="B1"><v>5</v></c></row>
             <row r="2" hidden="1"><c r="A2"><f>2+2</f></c><c r="C2"><v>7</v></c></row>
             <row r="4"><c r="A4"><f>3+3</f><v>6</v></c><c r="F4" s="0"/></row>
           </sheetData>
           <mergeCells><mergeCell ref="A1:B1"/><mergeCell ref="A4:A5"/><mergeCell ref="nonsense"/></mergeCells><hyperlinks><hyperlink ref="A1"/><hyperlink ref="B1"/></hyperlinks>"#,
    )
    .part("xl/vbaProject.bin", "x")
    .part("xl/charts/chart1.xml", "x")
    .edit("xl/workbook.xml", r#"sheetId="1""#, r#"sheetId="1" state="hidden""#)
    .write(&path)
    .unwrap();
    let mut inventory = open_inventory(&path).unwrap();
    let survey = &inventory.sheets()[0];
    assert_eq!(&*survey.name, "Substances");
    assert_eq!(survey.visibility, Visibility::Hidden);
    assert_eq!((survey.used_columns, survey.last_row), (3, 3));
    assert_eq!((survey.formulas, survey.formulas_without_result), (3, 1));
    assert_eq!(survey.frozen, Some((2, 1)));
    assert_eq!(
        [(0, 0), (0, 1), (3, 0)].map(|(row, column)| survey.merges.last_column(row, column)),
        [Some(1), None, None]
    );
    let widths: Vec<_> = survey
        .column_widths
        .iter()
        .map(|layout| (layout.first, layout.last, layout.width, layout.hidden))
        .collect();
    assert_eq!(widths, [(0, 1, Some(12.5), false), (2, 2, Some(9.0), true)]);
    assert_eq!(
        inventory.not_carried(),
        [
            "Workbook, not carried over: 1 macro project, 1 chart.",
            "Sheet `Substances`, not carried over: 1 hidden row (shown in the output), 3 merged ranges, 2 links.",
            "Sheet `Substances`: 3 formulas are written as the last stored result.",
            "Sheet `Substances`: 1 formula has no stored result and read as empty; open and save the workbook in a \
             spreadsheet program to fill them.",
        ]
    );
    let rows = inventory.first_rows(0, 9).unwrap();
    let formulas: Vec<_> = rows
        .iter()
        .flat_map(|row| row.cells.iter().map(|cell| (row.index, cell.column, cell.formula)))
        .collect();
    assert_eq!(formulas, [(0, 0, true), (0, 1, false), (1, 0, true), (1, 2, false), (3, 0, true)]);
    assert_eq!(inventory.first_rows(0, 1).unwrap().len(), 1);
}

#[test]
fn the_fingerprint_is_the_sha_256_of_the_file() {
    let (_folder, path) = place("a.xlsx");
    RawBook::with_rows("").write(&path).unwrap();
    let before = open_inventory(&path).unwrap().fingerprint().to_owned();
    assert_eq!(before.len(), 64);
    RawBook::with_rows(r#"<row r="1"><c r="A1"><v>1</v></c></row>"#).write(&path).unwrap();
    assert_ne!(open_inventory(&path).unwrap().fingerprint(), before);
    // FIPS 180-4, the example of one block: the digest of `abc`.
    std::fs::write(&path, "abc").unwrap();
    assert_eq!(
        super::fingerprint_of(&path).unwrap(),
        "ba7816bf8f01cfea414140de5dae2223b00361a396177a9cb410ff61f20015ad"
    );
}

#[test]
fn no_damage_to_a_sheet_makes_the_reader_panic_or_misorder_cells() {
    let sound = r#"<dimension ref="A1:C3"/><cols><col min="1" max="2" width="9"/></cols><sheetData><row r="1"><c r="A1"
        t="s"><v>0</v></c><c r="B1" t="inlineStr"><is><t>x</t></is></c></row><row r="3"><c r="A3" s="1"><f>1+1</f><v>2</v>
        </c><c r="C3" t="e"><v>#NAME?</v></c></row></sheetData><mergeCells><mergeCell ref="A1:B2"/></mergeCells>"#;
    let (_folder, path) = place("a.xlsx");
    // A linear congruential generator (Knuth, TAOCP 3.3.4, from memory): the same damage in every run.
    let mut state = 1_u64;
    let mut draw = |below: usize| {
        state = state.wrapping_mul(6_364_136_223_846_793_005).wrapping_add(1_442_695_040_888_963_407);
        usize::try_from(state >> 33).unwrap() % below
    };
    let mut opened = 0;
    for _ in 0..600 {
        let mut sheet = sound.as_bytes().to_vec();
        for _ in 0..=draw(2) {
            let place = draw(sheet.len());
            match draw(3) {
                0 => sheet[place] = b"<>/\"=0159AZaz& \xFF"[draw(16)],
                1 => drop(sheet.drain(place..(place + draw(12)).min(sheet.len()))),
                _ => sheet.extend_from_within(place..),
            }
        }
        let mut xml = b"<worksheet>".to_vec();
        xml.extend(sheet);
        xml.extend(b"</worksheet>");
        RawBook::with_rows("")
            .part("xl/worksheets/sheet1.xml", xml)
            .part("xl/sharedStrings.xml", r#"<sst uniqueCount="1"><si><t>CAS</t></si></sst>"#)
            .write(&path)
            .unwrap();
        let Ok(rows) = open_inventory(&path).and_then(|mut inventory| inventory.first_rows(0, usize::MAX))
        else {
            continue;
        };
        opened += 1;
        let places: Vec<_> =
            rows.iter().flat_map(|row| row.cells.iter().map(|cell| (row.index, cell.column))).collect();
        assert!(places.is_sorted_by(|one, next| one < next), "{places:?}");
    }
    assert!(opened > 20, "only {opened} of the damaged sheets were still readable");
}
