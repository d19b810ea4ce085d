//! What an OpenDocument workbook reads as, and which are refused.

use std::ops::ControlFlow;
use std::path::{Path, PathBuf};

use super::super::{Inventory, open_inventory, open_within};
use crate::workbook::appearance::Appearance;
use crate::workbook::package::Limits;
use crate::workbook::{CellContent, Row, Visibility};

use super::super::tests::hostile;

fn fixture(name: &str) -> PathBuf {
    Path::new(env!("CARGO_MANIFEST_DIR")).join("tests/fixtures/workbooks").join(name)
}

/// A workbook around these elements, with these styles.
fn xml(styles: &str, elements: &str) -> String {
    let names = ["office", "table", "text", "style"]
        .map(|name| format!(r#" xmlns:{name}="urn:oasis:names:tc:opendocument:xmlns:{name}:1.0""#))
        .concat();
    format!(
        r#"<?xml version="1.0" encoding="UTF-8"?><office:document-content{names}><office:automatic-styles>{styles}</office:automatic-styles><office:body><office:spreadsheet>{elements}</office:spreadsheet></office:body></office:document-content>"#
    )
}

fn write(path: &Path, content: &str) {
    let parts = [
        ("mimetype", &b"application/vnd.oasis.opendocument.spreadsheet"[..]),
        ("content.xml", content.as_bytes()),
    ];
    hostile::write_zip(path, &parts).unwrap();
}

fn sheet(rows: &str) -> String {
    format!(r#"<table:table table:name="List">{rows}</table:table>"#)
}

fn opened(content: &str) -> (tempfile::TempDir, Result<Inventory, String>) {
    let folder = tempfile::tempdir().unwrap();
    let path = folder.path().join("a.ods");
    write(&path, content);
    let opened = open_inventory(&path).map_err(|fault| {
        let said = fault.to_string();
        said.strip_prefix(&format!("{}: ", path.display())).map(str::to_owned).unwrap_or(said)
    });
    (folder, opened)
}

fn rows_of(inventory: &mut Inventory, sheet: usize) -> Vec<Row> {
    let mut rows = Vec::new();
    inventory
        .stream_rows(sheet, |row| {
            rows.push(row);
            ControlFlow::Continue(())
        })
        .unwrap();
    rows
}

fn cells_of(rows: &[Row]) -> Vec<(u32, u16, CellContent)> {
    rows.iter()
        .flat_map(|row| row.cells.iter().map(|cell| (row.index, cell.column, cell.content.clone())))
        .collect()
}

fn read(rows: &str) -> Vec<(u32, u16, CellContent)> {
    let (_folder, opened) = opened(&xml("", &sheet(rows)));
    cells_of(&rows_of(&mut opened.unwrap(), 0))
}

fn refusal(elements: &str) -> String {
    let (_folder, opened) = opened(&xml("", elements));
    opened.err().unwrap()
}

fn text(text: &str) -> CellContent {
    CellContent::Text(text.to_owned())
}

const CELL: &str = r#"<table:table-cell office:value-type="string"><text:p>x</text:p></table:table-cell>"#;
const SAVE_AGAIN: &str = "open it in a spreadsheet program, save it again as xlsx and use that file";

#[test]
fn what_libreoffice_wrote_is_read_as_it_was_typed() {
    for name in ["libreoffice.ods", "libreoffice.fods"] {
        let mut inventory = open_inventory(&fixture(name)).unwrap();
        let names: Vec<_> =
            inventory.sheets().iter().map(|sheet| (sheet.name.to_string(), sheet.visibility)).collect();
        assert_eq!(
            names,
            [
                ("Stock".to_owned(), Visibility::Visible),
                ("Hidden list".to_owned(), Visibility::Hidden),
                ("Nothing".to_owned(), Visibility::Visible)
            ]
        );
        let rows = rows_of(&mut inventory, 0);
        let look = |row: usize| {
            let style = rows[row].cells[1].style;
            style.map(|style| inventory.appearances()[usize::try_from(style.0).unwrap()].clone())
        };
        let shown_as = |code: &str| Some(Appearance::of_numbers(code));
        let error = |text: &str| CellContent::Error(text.to_owned());
        for (row, kind, value, shown, formula) in [
            (1, "number", CellContent::Number(4.25), None, false),
            (2, "percentage", CellContent::Number(0.125), shown_as("0.0%"), false),
            (3, "currency", CellContent::Number(12.5), shown_as("0.00\" €\""), false),
            // 1 February 2026 is 46,054 days after 30 December 1899.
            (4, "date", CellContent::DateTime(46_054.0), shown_as("yyyy-mm-dd"), false),
            (5, "date and time", CellContent::DateTime(46_054.75), shown_as("yyyy-mm-dd hh:mm:ss"), false),
            (6, "time", CellContent::DateTime(0.25), shown_as("[h]:mm:ss"), false),
            (7, "true", CellContent::Boolean(true), None, true),
            (8, "text", text("00067-56-1"), None, false),
            (9, "lines", text("two\nlines"), Some(Appearance::of_several_lines()), false),
            (10, "spaces", text("  a   b "), None, false),
            (11, "formula", CellContent::Number(3.0), None, true),
            (12, "error", error("#DIV/0!"), None, true),
            (13, "missing", error("#N/A"), None, true),
            (14, "empty text", text(""), None, true),
        ] {
            assert_eq!(rows[row].cells[0].content, text(kind), "{name}");
            assert_eq!(rows[row].cells[1].content, value, "{name}: {kind}");
            assert_eq!(rows[row].cells[1].formula, formula, "{name}: {kind}");
            assert_eq!(look(row), shown, "{name}: {kind}");
        }
        let same: Vec<_> = rows[1]
            .cells
            .iter()
            .filter(|cell| cell.content == text("same"))
            .map(|cell| cell.column)
            .collect();
        assert_eq!(same, [2, 3, 4, 5, 6], "{name}");
        let rest = cells_of(&rows[15..]);
        assert_eq!(
            rest,
            [(29, 0, text("after a gap")), (39, 0, text("merged")), (39, 3, text("beside"))],
            "{name}"
        );
        assert_eq!(cells_of(&rows_of(&mut inventory, 1)), [(0, 0, text("x"))], "{name}");
        assert!(rows_of(&mut inventory, 2).is_empty(), "{name}");
    }
}

#[test]
fn the_survey_of_what_libreoffice_wrote_knows_columns_and_what_is_not_carried() {
    let inventory = open_inventory(&fixture("libreoffice.ods")).unwrap();
    let survey = &inventory.sheets()[0];
    assert_eq!((survey.used_columns, survey.last_row), (7, 39));
    assert_eq!([survey.merges.last_column(39, 0), survey.merges.last_column(39, 3)], [Some(2), None]);
    assert_eq!((survey.formulas, survey.formulas_without_result, survey.error_values), (5, 0, 2));
    let hidden: Vec<_> = survey
        .column_widths
        .iter()
        .filter(|layout| layout.hidden)
        .map(|layout| (layout.first, layout.last))
        .collect();
    assert_eq!(hidden, [(1, 1)]);
    assert_eq!(survey.column_widths.last().map(|layout| layout.last), Some(6));
    let first = survey.column_widths[0].width.unwrap();
    // 2.139 inches of 96 pixels, at 7 pixels a character.
    assert!((29.33..29.34).contains(&first), "{first}");
    assert_eq!(
        inventory.not_carried(),
        [
            "Workbook, not carried over: cell formats (fonts, colours, borders, number formats); dates are shown as \
             2026-12-31, and percentages as percentages.",
            "Sheet `Stock`, not carried over: 1 hidden row (shown in the output), 1 merged range, notes or comments.",
            "Sheet `Stock`: 5 formulas are written as the last stored result.",
            "Sheet `Stock`: 2 error values are written as an error again where xlsx knows it, else as text.",
        ]
    );
}

#[test]
fn what_pandas_and_odfpy_wrote_is_read() {
    let mut inventory = open_inventory(&fixture("pandas.ods")).unwrap();
    let rows = cells_of(&rows_of(&mut inventory, 0));
    let expected = [
        (0, 0, text("CAS")),
        (0, 1, text("log Kow")),
        (0, 2, text("Checked")),
        (0, 3, text("Listed")),
        (1, 0, text("50-29-3")),
        (1, 1, CellContent::Number(6.91)),
        (1, 2, CellContent::DateTime(46_054.0)),
        (1, 3, CellContent::Boolean(true)),
        (2, 0, text("67-56-1")),
        (2, 1, CellContent::Number(-0.77)),
        (2, 3, CellContent::Boolean(false)),
    ];
    assert_eq!(rows, expected);
    let mut inventory = open_inventory(&fixture("odfpy.ods")).unwrap();
    let rows = cells_of(&rows_of(&mut inventory, 0));
    let expected = [
        (0, 0, text("log Kow   at 20 °C\nsecond\nthird\tend")),
        (0, 4, CellContent::Number(1.5)),
        (0, 5, CellContent::Number(1.5)),
        (1001, 0, text("a link")),
        (1002, 0, text("a link")),
    ];
    assert_eq!(rows, expected);
}

#[test]
fn blank_rows_and_cells_cost_nothing_however_often_they_repeat() {
    let rows = format!(
        r#"<table:table-row table:number-rows-repeated="1048570"><table:table-cell table:number-columns-repeated="16384"/></table:table-row>
           <table:table-row><table:covered-table-cell table:number-columns-repeated="16383"/>{CELL}</table:table-row>
           <table:table-row table:number-rows-repeated="18446744073709551615"><table:table-cell table:number-columns-repeated="18446744073709551615"/></table:table-row>"#
    );
    assert_eq!(read(&rows), [(1_048_570, 16_383, text("x"))]);
}

#[test]
fn filled_cells_beyond_the_last_of_a_sheet_are_refused() {
    let row = |before: &str, cell: &str| format!("{before}<table:table-row>{cell}</table:table-row>");
    let blank = |number: u32| format!(r#"<table:table-row table:number-rows-repeated="{number}"/>"#);
    assert_eq!(read(&row(&blank(1_048_575), CELL)).len(), 1);
    assert_eq!(
        refusal(&sheet(&row(&blank(1_048_576), CELL))),
        format!("sheet `List` has filled cells below row 1048576, the last a sheet can have; {SAVE_AGAIN}")
    );
    let right = format!(r#"<table:table-cell table:number-columns-repeated="16384"/>{CELL}"#);
    assert_eq!(
        refusal(&sheet(&row("", &right))),
        format!(
            "sheet `List` has filled cells in row 1 to the right of column XFD, the last a sheet can have; {SAVE_AGAIN}"
        )
    );
}

#[test]
fn a_filled_row_is_repeated_within_reason_and_refused_beyond() {
    let repeated = |rows: u32, columns: u32| {
        sheet(&format!(
            r#"<table:table-row table:number-rows-repeated="{rows}"><table:table-cell table:number-columns-repeated="{columns}" office:value-type="float" office:value="1"/></table:table-row>"#
        ))
    };
    let (_folder, inventory) = opened(&xml("", &repeated(1_048_576, 19)));
    assert_eq!(inventory.unwrap().sheets()[0].last_row, 1_048_575);
    let said = refusal(&repeated(1_048_576, 20));
    assert!(
        said.starts_with("List!A1 holds a value that is said to repeat; with it more than 20000000 cells"),
        "{said}"
    );
    let said = refusal(&repeated(1_048_576, 16_384));
    assert!(said.starts_with("List!A1 holds a value"), "{said}");
    let long = "y".repeat(40_000);
    let said = refusal(&sheet(&format!(
        r#"<table:table-row><table:table-cell table:number-columns-repeated="16384" office:value-type="string"><text:p>{long}</text:p></table:table-cell></table:table-row>"#
    )));
    assert!(
        said.starts_with("List!A1 holds so much text that its row has more than 2097152 characters"),
        "{said}"
    );
}

#[test]
fn only_tables_of_the_workbook_itself_are_sheets() {
    let inner = sheet(&format!("<table:table-row>{CELL}</table:table-row>"));
    let elements = format!(
        r#"<table:tracked-changes><table:deletion><table:cell-content-deletion>{CELL}{inner}</table:cell-content-deletion></table:deletion></table:tracked-changes>
           <table:table table:name="First">
             <table:shapes><draw:frame>{inner}</draw:frame></table:shapes>
             <table:table-row><table:table-cell office:value-type="string"><table:table table:name="Sub" table:is-sub-table="true"><table:table-row>{CELL}</table:table-row></table:table><text:p>outer</text:p></table:table-cell></table:table-row>
             {inner}
           </table:table>
           <table:dde-links><table:dde-link>{inner}</table:dde-link></table:dde-links>"#
    );
    let (_folder, opened) = opened(&xml("", &elements));
    let mut inventory = opened.unwrap();
    assert_eq!(inventory.sheets().len(), 1);
    assert_eq!(cells_of(&rows_of(&mut inventory, 0)), [(0, 0, text("outer"))]);
    assert_eq!(
        inventory.not_carried()[1],
        "Sheet `First`, not carried over: 1 embedded object or control, charts, images or shapes."
    );
}

#[test]
fn an_error_is_one_whatever_number_is_stored_with_it() {
    let cells = read(
        r#"<table:table-row>
             <table:table-cell table:formula="of:=1/0" office:value-type="float" office:value="0"><text:p>#DIV/0!</text:p></table:table-cell>
             <table:table-cell office:value-type="float" office:value="0"><text:p>Err:502</text:p></table:table-cell>
             <table:table-cell table:formula="of:=X" office:value-type="string"><text:p>#NAME?</text:p></table:table-cell>
             <table:table-cell office:value-type="string"><text:p>#1 in the list</text:p></table:table-cell>
             <table:table-cell table:formula="of:=Y"/>
             <table:table-cell office:value-type="float" office:value="0"><text:p>###</text:p></table:table-cell>
           </table:table-row>"#,
    );
    let error = |text: &str| CellContent::Error(text.to_owned());
    assert_eq!(
        cells,
        [
            (0, 0, error("#DIV/0!")),
            (0, 1, error("Err:502")),
            (0, 2, error("#NAME?")),
            (0, 3, text("#1 in the list")),
            (0, 4, CellContent::Empty),
            (0, 5, CellContent::Number(0.0)),
        ]
    );
}

#[test]
fn notes_and_readings_beside_a_text_are_not_the_cells_text() {
    let cells = read(
        r#"<table:table-row><table:table-cell office:value-type="string">
             <office:annotation><text:p>check this</text:p></office:annotation>
             <text:p><text:ruby><text:ruby-base>水</text:ruby-base><text:ruby-text>みず</text:ruby-text></text:ruby>&lt; 5 &#176;C<office:annotation><text:p>no</text:p></office:annotation></text:p>
           </table:table-cell></table:table-row>"#,
    );
    assert_eq!(cells, [(0, 0, text("水< 5 °C"))]);
}

#[test]
fn values_that_are_not_what_they_say_are_refused_by_cell() {
    let cell = |attributes: &str| {
        refusal(&sheet(&format!(
            "<table:table-row><table:table-cell/><table:table-cell {attributes}/></table:table-row>"
        )))
    };
    for (attributes, said) in [
        (r#"office:value-type="float" office:value="4,5""#, "List!B1 holds `4,5`, said to be a number"),
        (
            r#"office:value-type="boolean" office:boolean-value="yes""#,
            "List!B1 holds `yes`, said to be true or false",
        ),
        (
            r#"office:value-type="colour" office:value="1""#,
            "List!B1 holds a value of the unknown type `colour`",
        ),
        (
            r#"office:value-type="float" office:value="1" table:number-columns-repeated="many""#,
            "sheet `List` says that something repeats `many` times",
        ),
    ] {
        assert_eq!(cell(attributes), format!("{said}; {SAVE_AGAIN}"));
    }
    let undefined =
        "<table:table-row><table:table-cell><text:p>&bomb;</text:p></table:table-cell></table:table-row>";
    let said = refusal(&sheet(undefined));
    assert!(said.contains("List!A1 holds a reference to `bomb`, which nothing explains"), "{said}");
}

#[test]
fn dates_without_a_serial_number_stay_text() {
    let cells = read(
        r#"<table:table-row>
             <table:table-cell office:value-type="date" office:date-value="1843-05-06"/>
             <table:table-cell office:value-type="time" office:time-value="P1Y"/>
             <table:table-cell office:value-type="float" office:value="1E999"/>
           </table:table-row>"#,
    );
    assert_eq!(cells, [(0, 0, text("1843-05-06")), (0, 1, text("P1Y")), (0, 2, text("1E999"))]);
}

#[test]
fn a_hostile_or_broken_workbook_ends_in_a_sentence() {
    let begun = xml("", &sheet("")).replace("</table:table>", "");
    let (_folder, broken) = opened(&begun);
    assert!(
        broken.err().unwrap().starts_with("the workbook is damaged (the part `content.xml` cannot be read: ")
    );
    let (_folder, typed) = opened(&format!("<!DOCTYPE x [<!ENTITY a \"b\">]>{}", xml("", "")));
    assert!(typed.err().unwrap().contains("it declares a document type"));
    assert!(refusal("").starts_with("the workbook is damaged (it has no sheet)"));
    let twins = format!("{}{}", sheet(""), sheet("").replace("List", "LIST"));
    assert!(refusal(&twins).contains("it has two sheets named `LIST`"));
    let deep =
        format!("{}{}", "<table:table-row-group>".repeat(2_000), "</table:table-row-group>".repeat(2_000));
    assert!(refusal(&sheet(&deep)).contains("its elements stand within each other 1000 deep"));
    let many = sheet("").repeat(1_001);
    assert!(refusal(&many).contains("comes after 1000 others"), "{}", refusal(&many));
    let (_folder, document) = opened(
        "<office:document-content><office:body><office:text/></office:body></office:document-content>",
    );
    assert_eq!(
        document.err().unwrap(),
        "this is a text document or a presentation, not a workbook; name a workbook, or a csv, with one substance a row"
    );
}

#[test]
fn a_content_that_unpacks_too_far_is_refused() {
    let folder = tempfile::tempdir().unwrap();
    let path = folder.path().join("a.ods");
    write(&path, &xml("", &format!("{}{}", " ".repeat(40 << 20), sheet(""))));
    let said = open_inventory(&path).err().unwrap().to_string();
    assert!(said.contains("its part `content.xml` unpacks to over 250 times its size in the file"), "{said}");
    write(&path, &xml("", &sheet("<table:table-row/>")));
    let narrow = Limits { total: 300, ..Limits::USUAL };
    let said = open_within(&path, narrow).err().unwrap().to_string();
    assert!(said.contains("its part `content.xml` unpacks to over 0 MB"), "{said}");
}

#[test]
fn a_workbook_with_a_password_is_named_as_such() {
    let folder = tempfile::tempdir().unwrap();
    let path = folder.path().join("a.ods");
    let manifest = r#"<manifest:manifest xmlns:manifest="m"><manifest:file-entry manifest:full-path="content.xml"><manifest:encryption-data/></manifest:file-entry></manifest:manifest>"#;
    let media_type = ("mimetype", &b"application/vnd.oasis.opendocument.spreadsheet"[..]);
    for parts in [
        vec![
            media_type,
            ("META-INF/manifest.xml", manifest.as_bytes()),
            ("content.xml", &b"\x12\x34\x00"[..]),
        ],
        vec![media_type, ("encrypted-package", &b"\x12\x34\x00"[..])],
    ] {
        hostile::write_zip(&path, &parts).unwrap();
        let said = open_inventory(&path).err().unwrap().to_string();
        assert!(said.ends_with("the workbook is protected by a password; open it in a spreadsheet program, remove the password and save it as xlsx"), "{said}");
    }
}

#[test]
fn a_workbook_packed_anew_without_its_media_type_is_read() {
    let folder = tempfile::tempdir().unwrap();
    let path = folder.path().join("a.zip");
    let content = xml("", &sheet(&format!("<table:table-row>{CELL}</table:table-row>")));
    let old_list = r#"<!DOCTYPE manifest:manifest PUBLIC "-//OpenOffice.org//DTD Manifest 1.0//EN" "Manifest.dtd"><manifest:manifest/>"#;
    let parts = [("META-INF/manifest.xml", old_list.as_bytes()), ("content.xml", content.as_bytes())];
    hostile::write_zip(&path, &parts).unwrap();
    let mut inventory = open_inventory(&path).unwrap();
    assert_eq!(cells_of(&rows_of(&mut inventory, 0)), [(0, 0, text("x"))]);
}

#[test]
fn a_sheet_is_streamed_again_and_again_and_only_as_far_as_asked() {
    let elements = format!(
        r#"{}<table:table table:name="Second"><table:table-row>{CELL}</table:table-row><table:table-row table:number-rows-repeated="1000">{CELL}</table:table-row></table:table>"#,
        sheet(&format!("<table:table-row>{CELL}{CELL}</table:table-row>"))
    );
    let (_folder, opened) = opened(&xml("", &elements));
    let mut inventory = opened.unwrap();
    for _ in 0..3 {
        assert_eq!(inventory.first_rows(1, 7).unwrap().len(), 7);
        assert_eq!(rows_of(&mut inventory, 0).len(), 1);
        assert_eq!(rows_of(&mut inventory, 1).len(), 1_001);
    }
}
