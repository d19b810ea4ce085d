//! xls workbooks made record by record: what is refused, and why, and what is read all the same.

use std::path::Path;

use super::super::tests::{place, refusal};
use crate::workbook::read::{Inventory, open_inventory};
use crate::workbook::{CellContent, Visibility};

use super::super::tests::binary::{RawXls, compound_file, formula, label, number, record, shorts};

const SAVE_AGAIN: &str = "open it in a spreadsheet program, save it again as xlsx and use that file";

fn said_of(book: &RawXls) -> String {
    refusal("a.xls", |path| book.write(path))
}

fn opened(book: &RawXls) -> (tempfile::TempDir, Inventory) {
    let (folder, path) = place("a.xls");
    book.write(&path).unwrap();
    let inventory = open_inventory(&path).unwrap();
    (folder, inventory)
}

/// Row, column and content of every cell of the first sheet.
fn contents(book: &RawXls) -> Vec<(u32, u16, CellContent)> {
    let (_folder, mut inventory) = opened(book);
    let rows = inventory.first_rows(0, usize::MAX).unwrap();
    rows.into_iter()
        .flat_map(|row| row.cells.into_iter().map(move |cell| (row.index, cell.column, cell.content)))
        .collect()
}

fn text(text: &str) -> CellContent {
    CellContent::Text(text.to_owned())
}

#[test]
fn the_first_and_the_last_cell_of_a_sheet_are_two_rows_and_nothing_between() {
    let lie = record(0x0200, &shorts(&[0xFFFF, 0xFFFF, 0, 0, 0xFFFF, 0, 0], &[]));
    let book = RawXls::with_records(&[lie, number(0, 0, 1.0), number(65_535, 255, 2.0)].concat());
    assert_eq!(contents(&book), [(0, 0, CellContent::Number(1.0)), (65_535, 255, CellContent::Number(2.0))]);
}

#[test]
fn a_column_the_format_does_not_have_is_refused() {
    let said = said_of(&RawXls::with_records(&number(0, 256, 1.0)));
    assert_eq!(
        said,
        format!("sheet `Substances` has a cell in column 257, but has 256 columns; {SAVE_AGAIN}")
    );
}

#[test]
fn cells_in_any_order_are_read_in_theirs_and_one_stored_twice_is_named() {
    let by_columns = [number(0, 1, 2.0), number(1, 1, 4.0), number(0, 0, 1.0), number(1, 0, 3.0)];
    let read = contents(&RawXls::with_records(&by_columns.concat()));
    let places: Vec<_> = read.iter().map(|(row, column, _)| (*row, *column)).collect();
    assert_eq!(places, [(0, 0), (0, 1), (1, 0), (1, 1)]);
    let twice = [number(6, 2, 1.0), number(7, 2, 3.0), number(6, 2, 2.0)];
    let said = said_of(&RawXls::with_records(&twice.concat()));
    assert_eq!(said, format!("Substances!C7 is stored twice or out of order; {SAVE_AGAIN}"));
}

#[test]
fn blanks_without_end_are_refused_before_they_fill_the_memory() {
    // A row of 256 blanks, stored more often than a sheet has rows.
    let row = record(0x00BE, &[shorts(&[0, 0], &[0; 512]), shorts(&[255], &[])].concat());
    let said = said_of(&RawXls::with_records(&row.repeat(65_538)));
    assert_eq!(said, format!("sheet `Substances` stores more cells than a sheet has; {SAVE_AGAIN}"));
}

#[test]
fn a_file_whose_list_of_sectors_goes_on_beyond_its_head_is_read_to_its_end() {
    // The head names the sectors of a list for about 7 MB.
    let rows =
        (0..32_000).flat_map(|row| [label(row, 0, &[b'x'; 250]), number(row, 1, f64::from(row))].concat());
    let book = RawXls::with_records(&rows.collect::<Vec<u8>>());
    assert!(book.stream().len() > 8_000_000);
    let read = contents(&book);
    assert_eq!(read.len(), 2 * 32_000);
    assert_eq!(read.last(), Some(&(31_999, 1, CellContent::Number(31_999.0))));
}

#[test]
fn a_text_that_is_not_stored_is_named_by_cell() {
    let texts = record(0x00FC, &[1, 0, 0, 0, 0, 0xC2, 0xEB, 0x0B, 3, 0, 0, b'D', b'D', b'T']);
    let cell = |index: u8| record(0x00FD, &shorts(&[6, 2, 0], &[index, 0, 0, 0]));
    let book = |index| RawXls::with_records(&cell(index)).global(&texts);
    assert_eq!(contents(&book(0)), [(6, 2, text("DDT"))]);
    assert_eq!(
        said_of(&book(1)),
        format!("Substances!C7 holds a reference to text number `1`, which is not stored; {SAVE_AGAIN}")
    );
}

#[test]
fn a_record_that_is_longer_than_the_rest_of_the_file_is_a_sheet_cut_off() {
    let mut stream = RawXls::with_records(&number(0, 0, 1.0)).stream();
    let length = stream.len();
    // The length of the number, which stands before its 14 bytes and those of the sheet's end.
    stream[length - 4 - 14 - 2..length - 4 - 14].copy_from_slice(&[0xFF, 0xFF]);
    let said = refusal("a.xls", |path| std::fs::write(path, compound_file("Workbook", &stream)));
    assert_eq!(said, format!("sheet `Substances` is cut off; {SAVE_AGAIN}"));
}

#[test]
fn records_that_do_not_fit_their_own_account_are_refused() {
    for (records, what) in [
        (record(0x0203, &shorts(&[0, 0, 0], &[1])), "Substances!A1 holds a record that is cut off"),
        (
            record(0x0203, &[0]),
            "sheet `Substances` has a cell record that is cut off or does not fit its columns",
        ),
        (record(0x00BD, &shorts(&[0, 0, 0, 0, 0, 9], &[])), "does not fit its columns"),
        (record(0x00BE, &shorts(&[0, 5, 0, 3], &[])), "does not fit its columns"),
        (label(0, 0, b"DDT").into_iter().chain([0]).collect(), "is cut off"),
        (record(0x0204, &shorts(&[0, 0, 0, 9], &[0, b'D'])), "Substances!A1 holds a text that is cut off"),
        (record(0x007D, &shorts(&[3, 2, 9, 0, 0], &[])), "gives a width to columns no sheet has"),
        (
            formula(0, 0, [0, 0, 0, 0, 0, 0, 0xFF, 0xFF], 0),
            "Substances!A1 holds a formula whose text is not stored",
        ),
        (
            formula(0, 0, [9, 0, 0, 0, 0, 0, 0xFF, 0xFF], 0),
            "Substances!A1 holds a result of the unknown type 9",
        ),
    ] {
        let said = said_of(&RawXls::with_records(&records));
        assert!(said.contains(what), "{said} lacks {what}");
    }
}

#[test]
fn a_formula_is_its_stored_result_or_has_none() {
    let recalculated = record(0x01C1, &[0xC1, 1, 0, 0, 0, 0, 0, 0]);
    let string = record(0x0207, &[2, 0, 0, b'a', b'b']);
    let shared = record(0x04BC, &[0; 10]);
    let records = [
        formula(0, 0, 6.91_f64.to_le_bytes(), 0),
        formula(0, 1, [0, 0, 0, 0, 0, 0, 0xFF, 0xFF], 0),
        shared,
        string,
        formula(0, 2, [1, 0, 1, 0, 0, 0, 0xFF, 0xFF], 0),
        formula(0, 3, [2, 0, 7, 0, 0, 0, 0xFF, 0xFF], 0),
        formula(0, 4, [3, 0, 0, 0, 0, 0, 0xFF, 0xFF], 0),
        formula(0, 5, 0.0_f64.to_le_bytes(), 0),
        formula(0, 6, 0.0_f64.to_le_bytes(), 2),
        formula(0, 7, 6.91_f64.to_le_bytes(), 2),
    ]
    .concat();
    let results = |book: &RawXls| contents(book).into_iter().map(|(.., content)| content).collect::<Vec<_>>();
    let mut expected = vec![
        CellContent::Number(6.91),
        text("ab"),
        CellContent::Boolean(true),
        CellContent::Error("#DIV/0!".to_owned()),
        text(""),
        CellContent::Number(0.0),
        CellContent::Empty,
        CellContent::Number(6.91),
    ];
    assert_eq!(results(&RawXls::with_records(&records).global(&recalculated)), expected);
    // Without the mark of a program that computes, an empty text may mean that nothing was computed.
    expected[4] = CellContent::Empty;
    let book = RawXls::with_records(&records);
    assert_eq!(results(&book), expected);
    let (_folder, inventory) = opened(&book);
    assert_eq!((inventory.sheets()[0].formulas, inventory.sheets()[0].formulas_without_result), (8, 2));
}

#[test]
fn a_password_is_told() {
    let said = said_of(&RawXls::with_records(&[]).global(&record(0x002F, &[0; 54])));
    assert_eq!(
        said,
        "the workbook is protected by a password; open it in a spreadsheet program, remove the password and save it as \
         xlsx"
    );
}

#[test]
fn sheets_that_hold_no_cells_are_named_and_not_read() {
    let dialog = record(0x0081, &[0x10, 0]);
    let book = RawXls::with_records(&number(0, 0, 1.0))
        .sheet("Chart", 2, 0, &[])
        .sheet("Old macros", 1, 2, &number(0, 0, 5.0))
        .sheet("Dialog", 0, 0, &dialog)
        .sheet("Last", 0, 2, &number(0, 0, 7.0));
    let (_folder, mut inventory) = opened(&book);
    let sheets: Vec<_> =
        inventory.sheets().iter().map(|sheet| (sheet.name.to_string(), sheet.visibility)).collect();
    let expected = [("Substances", Visibility::Visible), ("Last", Visibility::VeryHidden)];
    assert_eq!(sheets, expected.map(|(name, visibility)| (name.to_owned(), visibility)));
    let last = inventory.first_rows(1, 9).unwrap().remove(0).cells.remove(0).content;
    assert_eq!(last, CellContent::Number(7.0));
    assert_eq!(
        inventory.not_carried(),
        ["Workbook, not carried over: sheets `Chart`, `Old macros`, `Dialog`, without cells."]
    );
}

#[test]
fn the_numbers_of_a_chart_on_a_sheet_are_no_cells() {
    let begin = record(0x0809, &shorts(&[0x0600, 0x20, 0, 0], &[0; 8]));
    let chart = [begin, number(0, 0, 99.0), record(0x000A, &[])].concat();
    let read = contents(&RawXls::with_records(&[number(0, 0, 1.0), chart, number(1, 0, 2.0)].concat()));
    assert_eq!(read, [(0, 0, CellContent::Number(1.0)), (1, 0, CellContent::Number(2.0))]);
}

#[test]
fn a_workbook_that_contradicts_itself_is_refused() {
    let sound = || RawXls::with_records(&number(0, 0, 1.0));
    let moved = |by: i8| {
        let mut stream = sound().stream();
        // The place of the sheet stands behind the first record and the head of its own.
        let place = &mut stream[20 + 4];
        *place = place.wrapping_add_signed(by);
        move |path: &Path| std::fs::write(path, compound_file("Workbook", &stream))
    };
    for (said, what) in [
        (said_of(&sound().sheet("SUBSTANCES", 0, 0, &[])), "it has two sheets named `SUBSTANCES`"),
        (refusal("a.xls", moved(1)), "sheet `Substances` "),
        (refusal("a.xls", moved(-4)), "sheet `Substances` does not begin where the workbook says"),
        (said_of(&sound().global(&record(0x00E0, &[0; 3]))), "one of its cell formats is cut off"),
        (
            said_of(&sound().global(&record(0x00FC, &[0, 0, 0, 0, 9, 0, 0, 0, 9, 0, 0]))),
            "shared texts is cut off",
        ),
        (
            refusal("a.xls", |path| std::fs::write(path, compound_file("Workbook", &[1; 5000]))),
            "it does not begin as a workbook does",
        ),
    ] {
        assert!(said.contains(what), "{said} lacks {what}");
    }
}

#[test]
fn texts_from_before_1997_are_in_the_alphabet_the_workbook_names() {
    let label = record(0x0204, &shorts(&[0, 0, 0, 5], b"\xD4\xE5\xED\xEE\xEB"));
    let page = |number: u16| record(0x0042, &number.to_le_bytes());
    let book = |number| RawXls::of_1993(&label).global(&page(number));
    assert_eq!(contents(&book(1251)), [(0, 0, text("Фенол"))]);
    assert_eq!(contents(&RawXls::of_1993(&label)), [(0, 0, text("Ôåíîë"))]);
    let (_folder, inventory) = opened(&RawXls::of_1993(&label));
    assert_eq!(
        inventory.not_carried(),
        [
            "Workbook: it does not say in which alphabet its texts are written; they are read as Western European ones."
        ]
    );
    let said = said_of(&book(9999));
    assert_eq!(said, format!("Substances!A1 holds a text in the unknown alphabet number 9999; {SAVE_AGAIN}"));
}

#[test]
fn a_stream_by_the_older_name_is_read_too() {
    let (_folder, path) = place("a.xls");
    let stream = RawXls::of_1993(&number(0, 0, 1.0)).stream();
    std::fs::write(&path, compound_file("Book", &stream)).unwrap();
    assert_eq!(open_inventory(&path).unwrap().first_rows(0, 9).unwrap().len(), 1);
}

#[test]
fn a_container_that_refers_to_itself_or_beyond_its_end_is_refused() {
    let sound = compound_file("Workbook", &RawXls::with_records(&number(0, 0, 1.0)).stream());
    // The list of sectors stands behind the head; sector 1 is the list of streams, sector 2 the first of the workbook.
    let with = |place: usize, value: u32| {
        let mut file = sound.clone();
        file[place..place + 4].copy_from_slice(&value.to_le_bytes());
        refusal("a.xls", move |path| std::fs::write(path, file))
    };
    let length = 512 + 512 + 128 + 120;
    for (said, what) in [
        (with(512 + 4, 1), "a chain of its sectors refers to itself"),
        (with(512 + 4 * 5, 3), "a chain of its sectors refers to itself"),
        (with(512 + 4 * 5, 77), "it is cut off or refers to a sector it does not have"),
        (with(48, 4_000_000), "it is cut off or refers to a sector it does not have"),
        (with(76, 4_000_000), "it is cut off or refers to a sector it does not have"),
        (with(length, 2_000_000_000), "its stream `Workbook` is cut off"),
    ] {
        let what = format!(
            "the workbook is damaged (the container around it cannot be read, perhaps the file was cut off: {what}); \
             {SAVE_AGAIN}"
        );
        assert_eq!(said, what);
    }
    // A list of sectors that goes on in itself.
    let mut circle = sound.clone();
    circle[68..72].copy_from_slice(&0_u32.to_le_bytes());
    circle[512 + 508..512 + 512].copy_from_slice(&0_u32.to_le_bytes());
    circle[76..512].fill(0xFF);
    let said = refusal("a.xls", |path| std::fs::write(path, circle));
    assert!(said.contains("refers to itself"), "{said}");
}

#[test]
fn a_workbook_cut_off_anywhere_is_refused_or_whole() {
    let records: Vec<u8> = (0..400).flat_map(|row| number(row, 0, f64::from(row))).collect();
    let sound = compound_file("Workbook", &RawXls::with_records(&records).stream());
    let (_folder, path) = place("a.xls");
    let mut refused = 0;
    for length in (0..sound.len()).step_by(97) {
        std::fs::write(&path, &sound[..length]).unwrap();
        match open_inventory(&path) {
            Ok(mut inventory) => {
                assert_eq!(inventory.first_rows(0, usize::MAX).unwrap().len(), 400, "{length}");
            }
            Err(_) => refused += 1,
        }
    }
    assert!(refused > sound.len() / 97 - 3, "only {refused} of the cut files were refused");
}

#[test]
fn no_damage_makes_the_reader_panic_or_misorder_cells() {
    let records = [
        label(0, 0, b"CAS"),
        number(0, 1, 4.5),
        record(0x00BD, &shorts(&[1, 0, 0, 2, 0, 0, 2, 0, 1], &[])),
        formula(2, 0, [0, 0, 0, 0, 0, 0, 0xFF, 0xFF], 0),
        record(0x0207, &[2, 0, 0, b'a', b'b']),
        record(0x007D, &shorts(&[0, 1, 2560, 0, 0], &[])),
    ];
    let texts = record(0x00FC, &[1, 0, 0, 0, 1, 0, 0, 0, 3, 0, 8, 1, 0, b'D', b'D', b'T', 0, 0, 0, 0]);
    let sound =
        RawXls::with_records(&records.concat()).global(&texts).global(&record(0x00E0, &[0; 20])).stream();
    let container = compound_file("Workbook", &sound);
    let (_folder, path) = place("a.xls");
    // A linear congruential generator (Knuth, TAOCP 3.3.4, from memory): the same damage in every run.
    let mut state = 1_u64;
    let mut draw = |below: usize| {
        state = state.wrapping_mul(6_364_136_223_846_793_005).wrapping_add(1_442_695_040_888_963_407);
        usize::try_from(state >> 33).unwrap() % below
    };
    let mut opened = 0;
    for round in 0..1500 {
        let mut bytes = if round % 3 == 0 { container.clone() } else { sound.clone() };
        let reach = if round % 3 == 0 { 1600 } else { bytes.len() };
        for _ in 0..=draw(2) {
            let place = draw(reach.min(bytes.len()));
            match draw(3) {
                0 => bytes[place] = [0, 1, 2, 0x7F, 0x80, 0xFE, 0xFF][draw(7)],
                1 => drop(bytes.drain(place..(place + draw(5)).min(bytes.len()))),
                _ => bytes[place] = u8::try_from(draw(256)).unwrap(),
            }
        }
        let file = if round % 3 == 0 { bytes } else { compound_file("Workbook", &bytes) };
        std::fs::write(&path, file).unwrap();
        let Ok(rows) = open_inventory(&path).and_then(|mut inventory| inventory.first_rows(0, usize::MAX))
        else {
            continue;
        };
        opened += 1;
        let places: Vec<_> =
            rows.iter().flat_map(|row| row.cells.iter().map(|cell| (row.index, cell.column))).collect();
        assert!(places.is_sorted_by(|one, next| one < next), "{places:?}");
    }
    assert!(opened > 200, "only {opened} of the damaged workbooks were still readable");
}

#[test]
fn macros_and_embedded_files_stand_beside_the_records() {
    let names = ["Workbook", "_VBA_PROJECT_CUR", "MBD0001A2B3", "\u{5}SummaryInformation"].map(str::to_owned);
    assert_eq!(super::parts_beside(&names), ["xl/vbaproject.bin", "xl/embeddings/"]);
}
