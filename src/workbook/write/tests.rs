//! Round trips, and what is refused or cleaned up when writing fails.

use std::ops::ControlFlow;
use std::path::{Path, PathBuf};

use calamine::{Data, Reader, Xlsx, open_workbook};
use rust_xlsxwriter::{Format, FormatBorder, Workbook};
use tempfile::TempDir;

use super::{AnnotatedWorkbook, Overwrite, SheetId, Target, Value};
use crate::quantity::Date;
use crate::workbook::{
    Cell, CellContent, CellRef, ColumnLayout, Look, Row, Shade, Visibility, open_inventory,
};

fn day() -> Date {
    Date::new(2026, 12, 1).unwrap()
}

fn place(name: &str) -> (TempDir, PathBuf) {
    let folder = tempfile::tempdir().unwrap();
    let path = folder.path().join(name);
    (folder, path)
}

fn begin(target: &Path) -> AnnotatedWorkbook {
    AnnotatedWorkbook::create(target, &[], Overwrite::Refuse, day(), &[]).unwrap()
}

fn begin_with_sheet(target: &Path) -> (AnnotatedWorkbook, SheetId) {
    let mut book = begin(target);
    let sheet = book.add_sheet("Reasoning", Visibility::Visible).unwrap();
    (book, sheet)
}

/// The names of all files in a folder, hidden ones, too.
fn files_in(folder: &Path) -> Vec<String> {
    let mut names: Vec<String> = std::fs::read_dir(folder)
        .unwrap()
        .map(|entry| entry.unwrap().file_name().into_string().unwrap())
        .collect();
    names.sort();
    names
}

/// One part of a written workbook, as text.
fn part(path: &Path, name: &str) -> String {
    let mut archive = zip::ZipArchive::new(std::fs::File::open(path).unwrap()).unwrap();
    std::io::read_to_string(archive.by_name(name).unwrap()).unwrap()
}

/// An inventory as a user might format it.
fn make_inventory(path: &Path) {
    let mut book = Workbook::new();
    let sheet = book.add_worksheet();
    sheet.set_name("Site's list").unwrap();
    let head = Format::new()
        .set_bold()
        .set_background_color(0xDD_EEFF)
        .set_border_bottom(FormatBorder::Thin)
        .set_text_wrap();
    for (column, text) in (0..).zip(["CAS", "Name", "log Kow", "Tested on", "In use"]) {
        sheet.write_string_with_format(0, column, text, &head).unwrap();
    }
    let number = Format::new().set_num_format("0.00").set_italic().set_font_color(0x11_2233);
    let date = Format::new().set_num_format("dd.mm.yyyy");
    let built_in = Format::new().set_num_format_index(14);
    sheet.write_string(1, 0, "117-81-7").unwrap();
    sheet.write_string(1, 1, "=not a formula").unwrap();
    sheet.write_number_with_format(1, 2, 7.45, &number).unwrap();
    sheet.write_number_with_format(1, 3, 46_000.5, &date).unwrap();
    sheet.write_boolean(1, 4, true).unwrap();
    sheet.write_string(3, 0, "  spaced\nand _x0041_ kept ").unwrap();
    sheet.write_number_with_format(3, 3, 46_001.0, &built_in).unwrap();
    sheet.write_blank(3, 1, &head).unwrap();
    sheet.set_column_width(1, 30).unwrap();
    sheet.set_column_hidden(4).unwrap();
    sheet.set_freeze_panes(1, 0).unwrap();
    let notes = book.add_worksheet();
    notes.set_name("Notes").unwrap().set_hidden(true);
    notes.write_string(0, 0, "+49 30 1234").unwrap();
    book.save(path).unwrap();
}

/// Copies an inventory cell by cell and returns nothing but the file.
fn copy(from: &Path, to: &Path) {
    let mut inventory = open_inventory(from).unwrap();
    let mut book =
        AnnotatedWorkbook::create(to, &[from], Overwrite::Replace, day(), inventory.appearances()).unwrap();
    for index in 0..inventory.sheets().len() {
        let survey = inventory.sheets()[index].clone();
        let sheet = book.add_sheet(&survey.name, survey.visibility).unwrap();
        for layout in &survey.column_widths {
            book.set_columns(sheet, *layout).unwrap();
        }
        if let Some((rows, columns)) = survey.frozen {
            book.freeze(sheet, rows, columns).unwrap();
        }
        inventory
            .stream_rows(index, |row| {
                book.write_row(sheet, &row).unwrap();
                ControlFlow::Continue(())
            })
            .unwrap();
    }
    book.finish().unwrap();
}

fn rows_of(path: &Path, sheet: usize) -> Vec<Row> {
    open_inventory(path).unwrap().first_rows(sheet, usize::MAX).unwrap()
}

#[test]
fn a_copy_has_the_values_types_and_formats_of_the_original() {
    let (folder, from) = place("inventory.xlsx");
    let to = folder.path().join("copy.xlsx");
    make_inventory(&from);
    copy(&from, &to);
    let contents = |path: &Path, sheet| -> Vec<(u32, u16, CellContent)> {
        rows_of(path, sheet)
            .into_iter()
            .flat_map(|row| row.cells.into_iter().map(move |cell| (row.index, cell.column, cell.content)))
            .collect()
    };
    let copied = contents(&to, 0);
    assert_eq!(contents(&from, 0), copied);
    assert_eq!(contents(&from, 1), contents(&to, 1));
    assert_eq!(copied.len(), 13);
    assert!(copied.contains(&(1, 3, CellContent::DateTime(46_000.5))));
    assert!(copied.contains(&(3, 0, CellContent::Text("  spaced\nand _x0041_ kept ".to_owned()))));

    let (mut before, mut after): (Xlsx<_>, Xlsx<_>) =
        (open_workbook(&from).unwrap(), open_workbook(&to).unwrap());
    let (before, after) =
        (before.worksheet_style("Site's list").unwrap(), after.worksheet_style("Site's list").unwrap());
    let head = after.get((0, 0)).unwrap();
    assert!(head.font.as_ref().unwrap().is_bold());
    assert_eq!(head.fill.as_ref().unwrap().get_color().unwrap().to_string(), "#DDEEFF");
    let format_of = |cell| after.get(cell).unwrap().number_format.as_ref().unwrap().format_code.clone();
    assert_eq!(format_of((1, 2)), "0.00");
    assert_eq!(format_of((1, 3)), "dd.mm.yyyy");
    assert_eq!(after.get((3, 3)).unwrap().number_format.as_ref().unwrap().format_id, Some(14));
    for cell in [(0, 0), (1, 2), (1, 3), (3, 1), (3, 3)] {
        assert_eq!(before.get(cell), after.get(cell), "{cell:?}");
    }
}

#[test]
fn a_copy_has_the_widths_visibility_and_panes_of_the_original() {
    let (folder, from) = place("inventory.xlsx");
    let to = folder.path().join("copy.xlsx");
    make_inventory(&from);
    copy(&from, &to);
    let (before, after) = (open_inventory(&from).unwrap(), open_inventory(&to).unwrap());
    for (before, after) in before.sheets().iter().zip(after.sheets()) {
        assert_eq!(before.name, after.name);
        assert_eq!(before.visibility, after.visibility);
        assert_eq!(before.frozen, after.frozen);
        assert_eq!(before.column_widths, after.column_widths);
        assert_eq!(before.used_columns, after.used_columns);
    }
    let layout = after.sheets()[0].column_widths.first().unwrap();
    assert_eq!((layout.first, layout.last, layout.hidden), (1, 1, false));
    assert!(after.sheets()[0].column_widths.iter().any(|layout| layout.hidden));
    assert_eq!(after.sheets()[1].visibility, Visibility::Hidden);
}

#[test]
fn text_stays_text_whatever_it_begins_with() {
    let (_folder, path) = place("out.xlsx");
    let texts = ["=1+1", "+1", "-1", "@SUM(A1)", "1.5", "http://example.org", "{=A1}", "TRUE"];
    let (mut book, sheet) = begin_with_sheet(&path);
    for (row, text) in (0..).zip(texts) {
        book.write(sheet, row, 0, &Value::Text(text), Look::Text).unwrap();
        let cell =
            Cell { column: 1, content: CellContent::Text(text.to_owned()), style: None, formula: false };
        book.write_row(sheet, &Row { index: row, cells: vec![cell] }).unwrap();
    }
    book.finish().unwrap();
    let mut read: Xlsx<_> = open_workbook(&path).unwrap();
    let range = read.worksheet_range("Reasoning").unwrap();
    for (row, text) in (0..).zip(texts) {
        for column in [0, 1] {
            assert_eq!(range.get_value((row, column)), Some(&Data::String(text.to_owned())));
        }
    }
    assert!(!part(&path, "xl/worksheets/sheet1.xml").contains("<f>"));
}

#[test]
fn the_same_content_gives_the_same_bytes() {
    let (folder, one) = place("one.xlsx");
    let other = folder.path().join("other.xlsx");
    let inventory = folder.path().join("inventory.xlsx");
    make_inventory(&inventory);
    copy(&inventory, &one);
    copy(&inventory, &other);
    assert_eq!(std::fs::read(&one).unwrap(), std::fs::read(&other).unwrap());
    for path in [&one, &other] {
        std::fs::remove_file(path).unwrap();
        write_every_look(path);
    }
    assert_eq!(std::fs::read(&one).unwrap(), std::fs::read(&other).unwrap());
}

const LOOKS: [Look; 15] = [
    Look::Header,
    Look::Text,
    Look::Wrapped,
    Look::Number,
    Look::Title,
    Look::Subtle,
    Look::Link,
    Look::Verdict(Shade::Listed),
    Look::Verdict(Shade::Fulfilled),
    Look::Verdict(Shade::ScreensIn),
    Look::Verdict(Shade::Unresolved),
    Look::Verdict(Shade::NoData),
    Look::Verdict(Shade::ScreensOut),
    Look::Verdict(Shade::NotFulfilled),
    Look::Verdict(Shade::OutOfScope),
];

fn write_every_look(path: &Path) {
    let (mut book, sheet) = begin_with_sheet(path);
    for (row, look) in (0..).zip(LOOKS) {
        let text = format!("{look:?}");
        book.write(sheet, row, 0, &Value::Text(&text), look).unwrap();
        book.write(sheet, row, 1, &Value::Number(4.5), look).unwrap();
        book.note(sheet, row, 0, "why").unwrap();
    }
    book.finish().unwrap();
}

#[test]
fn no_two_looks_are_the_same_and_the_unknown_is_never_pale() {
    let (_folder, path) = place("looks.xlsx");
    write_every_look(&path);
    let mut read: Xlsx<_> = open_workbook(&path).unwrap();
    let styles = read.worksheet_style("Reasoning").unwrap();
    let looks: Vec<_> = (0..).take(LOOKS.len()).map(|row| styles.get((row, 0)).cloned()).collect();
    for (index, look) in looks.iter().enumerate() {
        assert!(look.is_some(), "{:?}", LOOKS[index]);
        assert!(!looks[..index].contains(look), "{:?}", LOOKS[index]);
    }
    let style_of = |shade| {
        let row = LOOKS.iter().position(|look| *look == Look::Verdict(shade)).unwrap();
        looks[row].clone().unwrap()
    };
    for shade in [Shade::Unresolved, Shade::NoData] {
        let style = style_of(shade);
        let pattern = style.fill.unwrap().pattern;
        assert!(!matches!(pattern, calamine::FillPattern::None | calamine::FillPattern::Solid));
        assert!(style.borders.unwrap().has_visible_borders());
    }
    let lightness = |shade| {
        style_of(shade)
            .fill
            .filter(calamine::Fill::is_visible)
            .and_then(|fill| fill.get_color())
            .map_or(765, |colour| u32::from(colour.red) + u32::from(colour.green) + u32::from(colour.blue))
    };
    let shades = [Shade::Fulfilled, Shade::ScreensIn, Shade::ScreensOut, Shade::NotFulfilled].map(lightness);
    assert!(shades.is_sorted_by(|deeper, paler| deeper < paler), "{shades:?}");
}

#[test]
fn an_existing_output_is_kept_unless_it_may_be_replaced() {
    let (_folder, path) = place("out.xlsx");
    std::fs::write(&path, "old").unwrap();
    let refused = AnnotatedWorkbook::create(&path, &[], Overwrite::Refuse, day(), &[]);
    assert_eq!(
        refused.err().unwrap().to_string(),
        format!(
            "{}: exists already; add `--force` to replace it, or choose another `--output`",
            path.display()
        )
    );
    let book = AnnotatedWorkbook::create(&path, &[], Overwrite::Replace, day(), &[]).unwrap();
    assert_eq!(std::fs::read(&path).unwrap(), b"old");
    book.finish().unwrap();
    assert!(open_inventory(&path).is_ok());
}

#[test]
fn an_output_that_appeared_meanwhile_is_kept() {
    let (_folder, path) = place("out.xlsx");
    let (book, _sheet) = begin_with_sheet(&path);
    std::fs::write(&path, "other").unwrap();
    let said = book.finish().unwrap_err().to_string();
    assert!(said.contains("exists already"), "{said}");
    assert_eq!(std::fs::read(&path).unwrap(), b"other");
}

#[test]
fn an_input_is_never_written_over() {
    let (folder, path) = place("inventory.xlsx");
    make_inventory(&path);
    let detour = folder.path().join(".").join("inventory.xlsx");
    for overwrite in [Overwrite::Refuse, Overwrite::Replace] {
        let refused = AnnotatedWorkbook::create(&detour, &[&path], overwrite, day(), &[]);
        let said = refused.err().unwrap().to_string();
        assert!(said.ends_with("is read by this run and is never written over; choose another `--output`"));
    }
}

#[test]
fn a_missing_folder_and_one_that_cannot_be_written_into_are_named() {
    let (folder, _path) = place("out.xlsx");
    let missing = folder.path().join("missing");
    let said = |target: &Path| {
        AnnotatedWorkbook::create(target, &[], Overwrite::Refuse, day(), &[]).err().unwrap().to_string()
    };
    assert_eq!(
        said(&missing.join("out.xlsx")),
        format!("{}: there is no such folder; create it, or choose another `--output`", missing.display())
    );
    assert_eq!(
        said(folder.path()),
        format!("{}: is a folder; name the workbook inside it", folder.path().display())
    );
    #[cfg(target_os = "linux")]
    {
        let closed = said(Path::new("/proc/out.xlsx"));
        assert!(closed.starts_with("/proc: cannot be written into ("), "{closed}");
        assert!(closed.ends_with("); choose another `--output`"), "{closed}");
    }
}

#[test]
fn nothing_is_left_of_a_workbook_that_was_not_finished() {
    let (folder, path) = place("out.xlsx");
    let (mut book, sheet) = begin_with_sheet(&path);
    for row in 0..1000 {
        book.write(sheet, row, 0, &Value::Number(1.0), Look::Number).unwrap();
    }
    assert_eq!(files_in(folder.path()), Vec::<String>::new());
    drop(book);
    assert_eq!(files_in(folder.path()), Vec::<String>::new());
}

#[test]
fn a_row_that_comes_too_late_fails_the_workbook_instead_of_being_dropped() {
    let (folder, path) = place("out.xlsx");
    let (mut book, sheet) = begin_with_sheet(&path);
    book.write(sheet, 5, 0, &Value::Text("five"), Look::Text).unwrap();
    let said = book.write(sheet, 4, 0, &Value::Text("four"), Look::Text).unwrap_err().to_string();
    assert!(said.contains("row 5 of sheet `Reasoning` came too late"), "{said}");
    assert!(book.finish().is_err());
    assert_eq!(files_in(folder.path()), Vec::<String>::new());
}

#[test]
fn a_text_a_cell_cannot_hold_is_cut_and_says_so() {
    let (_folder, path) = place("out.xlsx");
    let (mut book, sheet) = begin_with_sheet(&path);
    let (fits, long) = ("x".repeat(32_767), "\u{1F9EA}".repeat(20_000));
    book.write(sheet, 0, 0, &Value::Text(&fits), Look::Text).unwrap();
    book.write(sheet, 1, 0, &Value::Text(&long), Look::Text).unwrap();
    book.note(sheet, 1, 0, &long).unwrap();
    book.finish().unwrap();
    let rows = rows_of(&path, 0);
    assert_eq!(rows[0].cells[0].content, CellContent::Text(fits));
    let CellContent::Text(cut) = &rows[1].cells[0].content else {
        panic!("not a text");
    };
    assert!(cut.ends_with("\u{1F9EA} ... (cut)"));
    assert_eq!(cut.encode_utf16().count(), 32_766);
}

#[test]
fn a_taken_sheet_name_gets_our_mark() {
    let (_folder, path) = place("out.xlsx");
    let (mut book, first) = begin_with_sheet(&path);
    let second = book.add_sheet("reasoning", Visibility::Visible).unwrap();
    assert_eq!(book.sheet_name(first), "Reasoning");
    assert_eq!(book.sheet_name(second), "reasoning (screened)");
    book.finish().unwrap();
    let inventory = open_inventory(&path).unwrap();
    let names: Vec<_> = inventory.sheets().iter().map(|sheet| sheet.name.to_string()).collect();
    assert_eq!(names, ["Reasoning", "reasoning (screened)"]);
}

#[test]
fn columns_fold_under_an_outline_after_their_rows_were_written() {
    let (_folder, path) = place("out.xlsx");
    let (mut book, sheet) = begin_with_sheet(&path);
    book.write(sheet, 0, 2, &Value::Text("REACH P"), Look::Header).unwrap();
    book.write(sheet, 9, 2, &Value::Text("no data"), Look::Verdict(Shade::NoData)).unwrap();
    book.group_columns(sheet, 2, 4).unwrap();
    book.set_column_width(sheet, 2, 4, 20.0).unwrap();
    book.freeze(sheet, 1, 0).unwrap();
    book.finish().unwrap();
    let xml = part(&path, "xl/worksheets/sheet1.xml");
    assert!(
        xml.contains(r#"<col min="3" max="5" width="20" hidden="1" customWidth="1" outlineLevel="1"/>"#),
        "{xml}"
    );
    assert!(xml.contains(r#"<col min="6" max="6" width="9.140625" collapsed="1"/>"#), "{xml}");
    assert!(xml.contains(r#"outlineLevelCol="1""#), "{xml}");
    assert!(xml.contains(r#"state="frozen""#), "{xml}");
}

#[test]
fn a_workbook_opens_on_its_first_visible_sheet_and_always_has_one() {
    let (folder, path) = place("out.xlsx");
    let mut book = begin(&path);
    book.add_sheet("Lists", Visibility::Hidden).unwrap();
    book.add_sheet("Substances", Visibility::Visible).unwrap();
    book.add_sheet("Record", Visibility::VeryHidden).unwrap();
    book.finish().unwrap();
    assert!(part(&path, "xl/workbook.xml").contains(r#"activeTab="1""#));
    let seen: Vec<_> = open_inventory(&path).unwrap().sheets().iter().map(|sheet| sheet.visibility).collect();
    assert_eq!(seen, [Visibility::Hidden, Visibility::Visible, Visibility::VeryHidden]);
    let only_hidden = folder.path().join("hidden.xlsx");
    let mut book = begin(&only_hidden);
    book.add_sheet("Record", Visibility::VeryHidden).unwrap();
    book.finish().unwrap();
    assert_eq!(open_inventory(&only_hidden).unwrap().sheets()[1].visibility, Visibility::Visible);
}

#[test]
fn links_lead_to_cells_and_pages_and_become_text_where_a_sheet_can_have_no_more() {
    let (_folder, path) = place("out.xlsx");
    let (mut book, sheet) = begin_with_sheet(&path);
    let cell = CellRef { sheet: "Site's list".into(), row: 6, column: 2 };
    for row in 0..65_002 {
        let target = if row == 0 { Target::Web("https://eur-lex.europa.eu/") } else { Target::Cell(&cell) };
        book.write(sheet, row, 0, &Value::Link { text: "see", target }, Look::Link).unwrap();
    }
    book.finish().unwrap();
    let xml = part(&path, "xl/worksheets/sheet1.xml");
    assert_eq!(xml.matches("<hyperlink ").count(), 65_000);
    assert!(
        xml.contains("<hyperlink ref=\"A2\" location=\"'Site''s list'!C7\""),
        "{}",
        &xml[xml.len() - 900..]
    );
    assert_eq!(rows_of(&path, 0).len(), 65_002);
}

#[test]
fn a_date_without_a_format_of_its_own_is_still_shown_and_read_as_a_date() {
    let (_folder, path) = place("out.xlsx");
    let (mut book, sheet) = begin_with_sheet(&path);
    let cell = |column, content| Cell { column, content, style: None, formula: false };
    let cells = vec![
        cell(0, CellContent::DateTime(46_000.0)),
        cell(1, CellContent::Error("#N/A".to_owned())),
        cell(2, CellContent::Boolean(false)),
        cell(3, CellContent::Empty),
    ];
    book.write_row(sheet, &Row { index: 2, cells }).unwrap();
    book.set_columns(sheet, ColumnLayout { first: 0, last: 0, width: None, hidden: true }).unwrap();
    book.finish().unwrap();
    let row = rows_of(&path, 0).remove(0);
    let contents: Vec<_> = row.cells.into_iter().map(|cell| cell.content).collect();
    assert_eq!(
        contents,
        [CellContent::DateTime(46_000.0), CellContent::Error("#N/A".to_owned()), CellContent::Boolean(false),]
    );
    assert!(open_inventory(&path).unwrap().sheets()[0].column_widths[0].hidden);
}

#[test]
fn a_row_is_as_high_as_its_wrapped_texts_need() {
    let (folder, path) = place("out.xlsx");
    let from = folder.path().join("inventory.xlsx");
    let mut inventory = Workbook::new();
    let wrapped = Format::new().set_text_wrap();
    inventory.add_worksheet().write_string_with_format(0, 0, "one\ntwo\nthree", &wrapped).unwrap();
    inventory.save(&from).unwrap();
    let mut inventory = open_inventory(&from).unwrap();
    let row = inventory.first_rows(0, 1).unwrap().remove(0);
    let mut book =
        AnnotatedWorkbook::create(&path, &[&from], Overwrite::Refuse, day(), inventory.appearances())
            .unwrap();
    let sheet = book.add_sheet("Substances", Visibility::Visible).unwrap();
    book.write_row(sheet, &row).unwrap();
    book.write(sheet, 0, 1, &Value::Text("log Kow used"), Look::Header).unwrap();
    book.write(sheet, 1, 1, &Value::Text("4.5"), Look::Wrapped).unwrap();
    book.write(sheet, 2, 1, &Value::Text("log Kow used"), Look::Wrapped).unwrap();
    book.finish().unwrap();
    let xml = part(&path, "xl/worksheets/sheet1.xml");
    for head in [
        r#"<row r="1" ht="45" customHeight="1">"#,
        r#"<row r="2">"#,
        r#"<row r="3" ht="30" customHeight="1">"#,
    ] {
        assert!(xml.contains(head), "{xml} lacks {head}");
    }
}

#[test]
fn errors_that_xlsx_knows_stay_errors_and_others_become_text() {
    let (_folder, path) = place("out.xlsx");
    let (mut book, sheet) = begin_with_sheet(&path);
    let known = ["#DIV/0!", "#N/A", "#NAME?", "#NULL!", "#NUM!", "#REF!", "#VALUE!", "#GETTING_DATA"];
    for (row, name) in (0..).zip(known.into_iter().chain(["#SPILL!", "Err:502", "#NV"])) {
        let content = CellContent::Error(name.to_owned());
        let cells = vec![Cell { column: 0, content, style: None, formula: true }];
        book.write_row(sheet, &Row { index: row, cells }).unwrap();
    }
    book.finish().unwrap();
    let contents: Vec<_> = rows_of(&path, 0).into_iter().map(|mut row| row.cells.remove(0).content).collect();
    let mut expected: Vec<_> = known.iter().map(|name| CellContent::Error((*name).to_owned())).collect();
    expected.extend(["#SPILL!", "Err:502", "#NV"].map(|name| CellContent::Text(name.to_owned())));
    assert_eq!(contents, expected);
}

#[test]
fn a_number_shown_with_words_keeps_its_number_and_its_format() {
    let (folder, path) = place("out.xlsx");
    let from = folder.path().join("inventory.xlsx");
    let codes = ["0\" weken\"", "\"<\"0.0", "0;-0;\"n.d.\"", "[<1]\"< 1 d\";0\" d\"", "0.0%", "0,\"k\""];
    let mut inventory = Workbook::new();
    let sheet = inventory.add_worksheet();
    for (row, code) in (0..).zip(codes) {
        sheet.write_number_with_format(row, 0, 4.25, &Format::new().set_num_format(code)).unwrap();
    }
    inventory.save(&from).unwrap();
    let mut inventory = open_inventory(&from).unwrap();
    let rows = inventory.first_rows(0, 10).unwrap();
    let mut book =
        AnnotatedWorkbook::create(&path, &[&from], Overwrite::Refuse, day(), inventory.appearances())
            .unwrap();
    let sheet = book.add_sheet("Substances", Visibility::Visible).unwrap();
    for row in &rows {
        book.write_row(sheet, row).unwrap();
    }
    book.finish().unwrap();
    let mut written = open_inventory(&path).unwrap();
    let again = written.first_rows(0, 10).unwrap();
    let formats = |inventory: &crate::workbook::Inventory, rows: &[Row]| -> Vec<_> {
        let known: std::collections::BTreeMap<_, _> = inventory.number_formats().collect();
        rows.iter().map(|row| known.get(&row.cells[0].style.unwrap()).cloned()).collect()
    };
    assert_eq!(formats(&written, &again), formats(&inventory, &rows));
    assert!(formats(&written, &again).iter().all(Option::is_some));
    for (row, code) in again.iter().zip(codes) {
        assert_eq!(row.cells[0].content, CellContent::Number(4.25), "{code}");
        assert!(
            part(&path, "xl/styles.xml").contains(&code.replace('"', "&quot;").replace('<', "&lt;")),
            "{code}"
        );
    }
}
