//! What the workbooks under tests/fixtures/workbooks read as; what they hold is written down here by hand.

use std::ops::ControlFlow;
use std::path::PathBuf;

use crate::workbook::read::{Inventory, open_inventory};
use crate::workbook::{CellContent, Visibility, column_letters};

fn fixture(name: &str) -> Inventory {
    let folder = PathBuf::from(env!("CARGO_MANIFEST_DIR")).join("tests/fixtures/workbooks");
    open_inventory(&folder.join(name)).unwrap()
}

/// Every cell that holds anything, as `B7`, what stands in it, and whether it is a formula.
fn cells(inventory: &mut Inventory, sheet: usize) -> Vec<(String, CellContent, bool)> {
    let mut found = Vec::new();
    let visit = |row: crate::workbook::Row| {
        let index = row.index + 1;
        found.extend(
            row.cells
                .into_iter()
                .filter(|cell| cell.formula || cell.content != CellContent::Empty)
                .map(|cell| (format!("{}{index}", column_letters(cell.column)), cell.content, cell.formula)),
        );
        ControlFlow::Continue(())
    };
    inventory.stream_rows(sheet, visit).unwrap();
    found
}

/// What stands in column B beside the word in column A.
fn beside(cells: &[(String, CellContent, bool)], word: &str) -> (CellContent, bool) {
    let place = cells.iter().find(|(_, content, _)| *content == text(word)).map(|(place, ..)| place.clone());
    let place = place.unwrap_or_else(|| panic!("no cell holds {word}")).replace('A', "B");
    let (_, content, formula) = cells.iter().find(|(known, ..)| *known == place).unwrap();
    (content.clone(), *formula)
}

fn text(text: &str) -> CellContent {
    CellContent::Text(text.to_owned())
}

/// What all writers were asked to write. Day 46357 of the 1900 system is 1 December 2026.
fn kinds() -> Vec<(&'static str, CellContent)> {
    vec![
        ("Kind", text("Value")),
        ("number", CellContent::Number(4.5)),
        ("whole number", CellContent::Number(12_000.0)),
        ("negative", CellContent::Number(-6.91)),
        ("large", CellContent::Number(1.2e300)),
        ("date", CellContent::DateTime(46_357.0)),
        ("date and time", CellContent::DateTime(46_357.25)),
        ("duration", CellContent::DateTime(1.5)),
        ("percent", CellContent::Number(0.25)),
        ("boolean", CellContent::Boolean(true)),
        ("error", CellContent::Error("#N/A".to_owned())),
        ("apostrophe", text("'6.91")),
        ("number in text", text("6,91")),
    ]
}

#[test]
fn each_kind_of_cell_reads_the_same_from_each_kind_of_file() {
    for name in ["kinds-of-cells.xls", "of-2003.xls", "of-1995.xls", "kinds-of-cells.xlsb"] {
        let mut inventory = fixture(name);
        let found = cells(&mut inventory, 0);
        for (word, content) in kinds() {
            assert_eq!(beside(&found, word), (content, false), "{name}, {word}");
        }
    }
}

#[test]
fn sheets_are_shown_or_hidden_as_they_were() {
    for (name, sheets) in [
        ("kinds-of-cells.xls", &["Cells", "Layout", "Hidden", "Very hidden"][..]),
        ("of-2003.xls", &["Cells", "Hidden", "Very hidden"]),
        ("kinds-of-cells.xlsb", &["Cells", "Hidden", "Very hidden"]),
    ] {
        let inventory = fixture(name);
        let names: Vec<_> = inventory.sheets().iter().map(|sheet| &*sheet.name).collect();
        assert_eq!(names, sheets);
        for sheet in inventory.sheets() {
            let expected = match &*sheet.name {
                "Hidden" => Visibility::Hidden,
                "Very hidden" => Visibility::VeryHidden,
                _ => Visibility::Visible,
            };
            assert_eq!(sheet.visibility, expected, "{name}, {}", sheet.name);
        }
    }
}

#[test]
fn letters_of_any_alphabet_long_texts_and_texts_of_two_fonts_are_whole() {
    let mut inventory = fixture("kinds-of-cells.xls");
    let found = cells(&mut inventory, 0);
    assert_eq!(beside(&found, "text"), (text("Müller & 日本 <x>"), false));
    assert_eq!(beside(&found, "two fonts"), (text("log Kow"), false));
    let long = ["x", "ä", "日"].map(|letter| letter.repeat(9000)).concat();
    assert_eq!(beside(&found, "long"), (text(&long), false));
    assert_eq!(
        inventory.not_carried().first().unwrap(),
        "Workbook: 1 text changes its font within a cell; the output shows each in the cell's font."
    );
    let found = cells(&mut fixture("kinds-of-cells.xlsb"), 0);
    assert_eq!(beside(&found, "text"), (text("Müller"), false));
}

#[test]
fn rows_keep_their_places_up_to_the_last_column() {
    let found = cells(&mut fixture("kinds-of-cells.xls"), 0);
    let last: Vec<_> = found.iter().rev().take(3).rev().map(|(place, ..)| place.as_str()).collect();
    assert_eq!(last, ["B17", "A20", "IV20"]);
    let found = cells(&mut fixture("kinds-of-cells.xlsb"), 0);
    assert_eq!(found.last().unwrap(), &("A17".to_owned(), text("after two empty rows"), false));
}

#[test]
fn a_formula_nobody_has_computed_is_a_formula_without_a_result() {
    let mut inventory = fixture("kinds-of-cells.xls");
    assert_eq!(beside(&cells(&mut inventory, 0), "formula"), (CellContent::Empty, true));
    assert_eq!((inventory.sheets()[0].formulas, inventory.sheets()[0].formulas_without_result), (1, 1));
}

#[test]
fn a_computed_formula_is_its_result() {
    let mut inventory = fixture("computed.xls");
    let found = cells(&mut inventory, 0);
    let results: Vec<_> = found.iter().filter(|(place, ..)| place.starts_with('A')).cloned().collect();
    let expected = [
        ("A1", CellContent::Number(2.5)),
        ("A2", text("ab")),
        ("A3", text("")),
        ("A4", CellContent::Boolean(true)),
        ("A5", CellContent::Error("#DIV/0!".to_owned())),
        ("A6", CellContent::DateTime(46_357.0)),
        ("A7", CellContent::Number(5.0)),
    ];
    assert_eq!(results, expected.map(|(place, content)| (place.to_owned(), content, true)));
    assert_eq!((inventory.sheets()[0].formulas, inventory.sheets()[0].formulas_without_result), (7, 0));
    assert_eq!(inventory.sheets()[0].error_values, 1);
}

#[test]
fn what_an_xls_has_besides_cells_is_carried_or_named() {
    let inventory = fixture("kinds-of-cells.xls");
    let layout = &inventory.sheets()[1];
    assert_eq!(layout.frozen, Some((2, 1)));
    assert_eq!([layout.merges.last_column(0, 3), layout.merges.last_column(0, 4)], [Some(5), None]);
    let widths: Vec<_> =
        layout.column_widths.iter().map(|layout| (layout.first, layout.last, layout.hidden)).collect();
    assert_eq!(widths, [(0, 0, false), (2, 2, true)]);
    assert_eq!(layout.column_widths[0].width, Some(20.0));
    assert_eq!(
        inventory.not_carried().last().unwrap(),
        "Sheet `Layout`, not carried over: 1 hidden row (shown in the output), 1 merged range."
    );
    assert_eq!(
        fixture("computed.xls").not_carried(),
        [
            "Workbook, not carried over: 1 chart.",
            "Sheet `Computed`, not carried over: 1 merged range, 1 link, notes or comments.",
            "Sheet `Computed`: 7 formulas are written as the last stored result.",
            "Sheet `Computed`: 1 error value is written as an error again where xlsx knows it, else as text.",
        ]
    );
}

#[test]
fn what_an_xlsb_has_besides_cells_is_carried_or_named() {
    let inventory = fixture("kinds-of-cells.xlsb");
    let sheet = &inventory.sheets()[0];
    let widths: Vec<_> =
        sheet.column_widths.iter().map(|layout| (layout.first, layout.last, layout.hidden)).collect();
    assert_eq!(widths, [(0, 0, false), (1, 1, true)]);
    assert_eq!(inventory.not_carried()[0], "Sheet `Cells`, not carried over: 1 merged range.");
    let mut inventory = fixture("written.xlsb");
    assert_eq!(inventory.sheets()[0].frozen, Some((1, 0)));
    let places: Vec<_> = cells(&mut inventory, 0).into_iter().map(|(place, ..)| place).collect();
    let expected = "A1 B1 C1 D1 A2 B2 C2 D2 A3 B3 C3 A4 C4 D4";
    assert_eq!(places.join(" "), expected);
    assert_eq!(beside(&cells(&mut inventory, 0), "108-95-2"), (text("Phenol 日本"), false));
}

#[test]
fn days_counted_from_1904_are_given_in_the_1900_system_and_durations_are_left_alone() {
    assert_eq!(
        cells(&mut fixture("from-1904.xls"), 0),
        [
            ("A1".to_owned(), CellContent::DateTime(46_357.0), false),
            ("B1".to_owned(), CellContent::DateTime(1.5), false),
            ("C1".to_owned(), CellContent::Number(1000.0), false),
        ]
    );
}

#[test]
fn a_file_from_before_1993_is_named_as_what_it_is() {
    let path = PathBuf::from(env!("CARGO_MANIFEST_DIR")).join("tests/fixtures/workbooks/of-1992.xls");
    let said = open_inventory(&path).err().unwrap().to_string();
    assert!(
        said.ends_with(
            "this is a worksheet of a binary format from before 1993, which is not read; open it in a spreadsheet \
             program, save it as xlsx and use that file"
        ),
        "{said}"
    );
}

#[test]
fn only_cells_whose_format_adds_something_have_a_look() {
    let mut inventory = fixture("computed.xls");
    let rows = inventory.first_rows(0, 2).unwrap();
    let plain = rows[1].cell(0).unwrap();
    assert_eq!(plain.style, None);
    let head = rows[0].cell(1).unwrap().style.unwrap();
    let look = &inventory.appearances()[usize::try_from(head.0).unwrap()];
    let format = look.format().clone();
    let expected = rust_xlsxwriter::Format::new()
        .set_font_name("Arial")
        .set_font_size(14)
        .set_bold()
        .set_italic()
        .set_underline(rust_xlsxwriter::FormatUnderline::Single)
        .set_font_color(rust_xlsxwriter::Color::RGB(0x00_00FF))
        .set_background_color(rust_xlsxwriter::Color::RGB(0xFF_FF00))
        .set_border_bottom(rust_xlsxwriter::FormatBorder::Double)
        .set_border_bottom_color(rust_xlsxwriter::Color::RGB(0xFF_0000))
        .set_border_left(rust_xlsxwriter::FormatBorder::Thin)
        .set_border_left_color(rust_xlsxwriter::Color::RGB(0))
        .set_align(rust_xlsxwriter::FormatAlign::Center)
        .set_align(rust_xlsxwriter::FormatAlign::Top)
        .set_text_wrap()
        .set_rotation(45);
    assert_eq!(format, expected);
}
