//! xlsb workbooks made record by record: what is refused, and why, and what is read all the same.

use super::super::tests::{hostile, place, refusal};
use crate::workbook::CellContent;
use crate::workbook::read::{Inventory, open_inventory};

use super::super::tests::binary::{longs, shorts, wide_number, wide_record, wide_row, wide_text, xlsb_parts};

const SAVE_AGAIN: &str = "open it in a spreadsheet program, save it again as xlsx and use that file";

type Parts = Vec<(&'static str, Vec<u8>)>;

fn write(parts: &Parts) -> impl FnOnce(&std::path::Path) -> std::io::Result<()> {
    let parts = parts.clone();
    move |path| {
        let parts: Vec<(&str, &[u8])> =
            parts.iter().map(|(name, content)| (*name, content.as_slice())).collect();
        hostile::write_zip(path, &parts)
    }
}

fn said_of(cells: &[u8]) -> String {
    refusal("a.xlsb", write(&xlsb_parts(cells, 0)))
}

fn opened(parts: &Parts) -> (tempfile::TempDir, Inventory) {
    let (folder, path) = place("a.xlsb");
    write(parts)(&path).unwrap();
    let inventory = open_inventory(&path).unwrap();
    (folder, inventory)
}

/// Row, column, content and whether it is a formula of every cell of the first sheet.
fn contents(parts: &Parts) -> Vec<(u32, u16, CellContent, bool)> {
    let (_folder, mut inventory) = opened(parts);
    let rows = inventory.first_rows(0, usize::MAX).unwrap();
    rows.into_iter()
        .flat_map(|row| {
            row.cells.into_iter().map(move |cell| (row.index, cell.column, cell.content, cell.formula))
        })
        .collect()
}

fn text(text: &str) -> CellContent {
    CellContent::Text(text.to_owned())
}

fn with_part(mut parts: Parts, name: &'static str, content: Vec<u8>) -> Parts {
    parts.retain(|(known, _)| *known != name);
    parts.push((name, content));
    parts
}

#[test]
fn the_first_and_the_last_cell_of_a_sheet_are_read_and_none_beyond() {
    let cells = [wide_row(0), wide_number(0, 1.0), wide_row(1_048_575), wide_number(16_383, 2.0)].concat();
    let read = contents(&xlsb_parts(&cells, 0));
    assert_eq!(
        read,
        [(0, 0, CellContent::Number(1.0), false), (1_048_575, 16_383, CellContent::Number(2.0), false)]
    );
    for (cells, reference) in [
        ([wide_row(1_048_576), wide_number(0, 1.0)], "row 1048577"),
        ([wide_row(u32::MAX), wide_number(0, 1.0)], "row 4294967296"),
        ([wide_row(6), wide_number(16_384, 1.0)], "row 7, column 16385"),
        ([wide_row(6), wide_number(u32::MAX, 1.0)], "row 7, column 4294967296"),
    ] {
        let what = format!(
            "sheet `Substances` has a cell at `{reference}`, which is not a cell of any sheet (A1 to XFD1048576); \
             {SAVE_AGAIN}"
        );
        assert_eq!(said_of(&cells.concat()), what);
    }
}

#[test]
fn every_kind_of_cell_is_read_also_results_of_formulas_and_texts_of_two_fonts() {
    let after = |column: u32, rest: &[u8]| longs(&[column, 0], rest);
    let flags = [0, 0, 0, 0, 0, 0];
    let cells = [
        wide_row(0),
        wide_record(2, &after(0, &(691_u32 << 2 | 3).to_le_bytes())),
        wide_record(3, &after(1, &[0x2A])),
        wide_record(4, &after(2, &[1])),
        wide_record(6, &after(3, &wide_text("6,91"))),
        wide_record(0x3E, &after(4, &[&[1][..], &wide_text("log Kow"), &[0; 12]].concat())),
        wide_record(1, &after(5, &[])),
        wide_record(8, &after(6, &[wide_text("ab"), flags.to_vec()].concat())),
        wide_record(9, &after(7, &[&6.91_f64.to_le_bytes()[..], &flags].concat())),
        wide_record(10, &after(8, &[&[0][..], &flags].concat())),
        wide_record(11, &after(9, &[&[0x07][..], &flags].concat())),
        wide_record(9, &after(10, &[&0.0_f64.to_le_bytes()[..], &[2, 0, 0, 0, 0, 0]].concat())),
        // Right of the cell before, without a column.
        wide_record(13, &longs(&[0, 7 << 2 | 2], &[])),
        wide_record(17, &longs(&[0], &wide_text("next"))),
        wide_record(3, &after(20, &[0x63])),
    ];
    let parts = xlsb_parts(&cells.concat(), 0);
    let error = |text: &str| CellContent::Error(text.to_owned());
    assert_eq!(
        contents(&parts),
        [
            (0, 0, CellContent::Number(6.91), false),
            (0, 1, error("#N/A"), false),
            (0, 2, CellContent::Boolean(true), false),
            (0, 3, text("6,91"), false),
            (0, 4, text("log Kow"), false),
            (0, 6, text("ab"), true),
            (0, 7, CellContent::Number(6.91), true),
            (0, 8, CellContent::Boolean(false), true),
            (0, 9, error("#DIV/0!"), true),
            (0, 10, CellContent::Empty, true),
            (0, 11, CellContent::Number(7.0), false),
            (0, 12, text("next"), false),
            (0, 20, error("#ERROR 99!"), false),
        ]
    );
    let (_folder, inventory) = opened(&parts);
    let survey = &inventory.sheets()[0];
    assert_eq!((survey.formulas, survey.formulas_without_result, survey.error_values), (5, 1, 3));
    assert_eq!((survey.used_columns, survey.last_row), (21, 0));
}

#[test]
fn a_cell_stored_twice_or_out_of_order_is_named() {
    let rows = [
        [wide_row(6), wide_number(2, 1.0), wide_number(2, 2.0)],
        [wide_row(6), wide_number(3, 1.0), wide_number(2, 2.0)],
    ];
    for cells in rows {
        let what = format!("Substances!C7 is stored twice or out of order; {SAVE_AGAIN}");
        assert_eq!(said_of(&cells.concat()), what);
    }
    let said = said_of(&[wide_row(6), wide_row(6)].concat());
    assert!(said.starts_with("sheet `Substances` stores row 7 twice or out of order"), "{said}");
    let said = said_of(&wide_number(0, 1.0));
    assert!(said.starts_with("sheet `Substances` stores a cell outside its rows"), "{said}");
}

#[test]
fn a_text_that_is_not_stored_is_named_by_cell() {
    let cell = |index: u32| [wide_row(6), wide_record(7, &longs(&[2, 0, index], &[]))].concat();
    let kinds = "http://schemas.openxmlformats.org/officeDocument/2006/relationships";
    let relations = format!(
        r#"<Relationships><Relationship Id="rId1" Type="{kinds}/worksheet" Target="worksheets/sheet1.bin"/>
           <Relationship Id="rId2" Type="{kinds}/sharedStrings" Target="texts.bin"/></Relationships>"#
    );
    let texts = [
        wide_record(0x009F, &longs(&[4_000_000_000, 4_000_000_000], &[])),
        wide_record(0x0013, &[vec![0], wide_text("DDT")].concat()),
        wide_record(0x00A0, &[]),
    ];
    let parts = |index| {
        let parts =
            with_part(xlsb_parts(&cell(index), 0), "xl/_rels/workbook.bin.rels", relations.clone().into());
        with_part(parts, "xl/texts.bin", texts.concat())
    };
    assert_eq!(contents(&parts(0)), [(6, 2, text("DDT"), false)]);
    assert_eq!(
        refusal("a.xlsb", write(&parts(1))),
        format!("Substances!C7 holds a reference to text number `1`, which is not stored; {SAVE_AGAIN}")
    );
}

#[test]
fn records_that_do_not_fit_their_own_account_are_refused() {
    let cut = |cells: &[u8]| {
        let sheet = [wide_record(0x0091, &[]), cells.to_vec()].concat();
        refusal("a.xlsb", write(&with_part(xlsb_parts(&[], 0), "xl/worksheets/sheet1.bin", sheet)))
    };
    let row = wide_row(0);
    for (said, what) in [
        (cut(&wide_number(0, 1.0)[..9]), "it ends in the middle of a record"),
        (cut(&[5, 0xFF, 0xFF, 0xFF, 0x7F]), "a record claims to be 268435455 bytes long"),
        (cut(&[]), "sheet `Substances` holds no rows as a worksheet stores them"),
        (
            said_of(&[row.clone(), wide_record(5, &longs(&[0, 0], &[1]))].concat()),
            "Substances!A1 holds a record that",
        ),
        (said_of(&[row.clone(), wide_record(5, &[0])].concat()), "has a cell in row 1 that is cut off"),
        (said_of(&wide_record(0, &[0])), "has a row that is cut off"),
        (
            said_of(&[row, wide_record(6, &longs(&[0, 0, u32::MAX], &[]))].concat()),
            "Substances!A1 holds a record that is cut off",
        ),
    ] {
        assert!(said.contains(what), "{said} lacks {what}");
    }
}

#[test]
fn a_workbook_that_contradicts_itself_is_refused() {
    let sound = || xlsb_parts(&[], 0);
    let without = |name: &str| {
        let mut parts = sound();
        parts.retain(|(known, _)| *known != name);
        parts
    };
    for (parts, what) in [
        (
            without("xl/worksheets/sheet1.bin"),
            "the part `xl/worksheets/sheet1.bin` of sheet `Substances` is missing",
        ),
        (without("xl/_rels/workbook.bin.rels"), "it lists a sheet `Substances` without saying where it is"),
        (with_part(sound(), "xl/workbook.bin", Vec::new()), "it has no worksheet"),
        (with_part(sound(), "xl/workbook.bin", wide_record(0x009C, &[0])), "its list of sheets is cut off"),
    ] {
        let said = refusal("a.xlsb", write(&parts));
        assert!(said.starts_with("the workbook is damaged (") && said.contains(what), "{said} lacks {what}");
    }
}

#[test]
fn sheets_that_hold_no_cells_are_named_and_not_read() {
    let kinds = "http://schemas.openxmlformats.org/officeDocument/2006/relationships";
    let relations = format!(
        r#"<Relationships><Relationship Id="a" Type="{kinds}/chartsheet" Target="chartsheets/sheet1.bin"/>
           <Relationship Id="b" Type="{kinds}/worksheet" Target="worksheets/sheet1.bin"/>
           <Relationship Id="c" Type="http://schemas.microsoft.com/office/2006/relationships/xlMacrosheet"
             Target="macrosheets/sheet1.bin"/></Relationships>"#
    );
    let listed = |state: u32, relation: &str, name: &str| {
        wide_record(0x009C, &[longs(&[state, 1], &[]), wide_text(relation), wide_text(name)].concat())
    };
    let workbook = [
        listed(0, "a", "Chart"),
        listed(2, "b", "Cells"),
        listed(0, "c", "Old macros"),
        wide_record(0x0027, &[]),
    ];
    let parts = with_part(xlsb_parts(&[], 0), "xl/workbook.bin", workbook.concat());
    let parts = with_part(parts, "xl/_rels/workbook.bin.rels", relations.into());
    let (_folder, inventory) = opened(&with_part(parts, "xl/vbaProject.bin", vec![0]));
    let sheets: Vec<_> = inventory.sheets().iter().map(|sheet| (&*sheet.name, sheet.visibility)).collect();
    assert_eq!(sheets, [("Cells", crate::workbook::Visibility::VeryHidden)]);
    assert_eq!(
        inventory.not_carried(),
        [
            "Workbook, not carried over: 1 macro project, 1 defined name.",
            "Workbook, not carried over: sheets `Chart`, `Old macros`, without cells."
        ]
    );
}

#[test]
fn a_sheet_that_unpacks_to_far_more_than_it_takes_is_refused() {
    let bomb = wide_record(0x0025, &vec![0; 1 << 20]).repeat(40);
    let said = refusal("a.xlsb", write(&xlsb_parts(&bomb, 0)));
    assert!(said.contains("unpacks to over 250 times its size in the file"), "{said}");
}

#[test]
fn formats_make_dates_of_numbers_and_1904_moves_them() {
    let kinds = "http://schemas.openxmlformats.org/officeDocument/2006/relationships";
    let relations = format!(
        r#"<Relationships><Relationship Id="rId1" Type="{kinds}/worksheet" Target="/xl/worksheets/sheet1.bin"/>
           <Relationship Id="rId2" Type="{kinds}/styles" Target="styles.bin"/></Relationships>"#
    );
    let format = |number: u16| wide_record(0x002F, &shorts(&[0, number, 0, 0, 0, 0, 0, 0], &[]));
    let styles = [
        wide_record(0x0267, &longs(&[1], &[])),
        wide_record(0x002C, &shorts(&[164], &wide_text("[h]:mm"))),
        wide_record(0x0268, &[]),
        // Formats that cells are only derived from come first and do not count.
        wide_record(0x0272, &[]),
        format(14),
        wide_record(0x0273, &[]),
        wide_record(0x0269, &[]),
        format(0),
        format(14),
        format(164),
        wide_record(0x026A, &[]),
    ];
    let cell = |column: u32, style: u32| wide_record(5, &longs(&[column, style], &1000.0_f64.to_le_bytes()));
    let cells = [wide_row(0), cell(0, 0), cell(1, 1), cell(2, 2)].concat();
    let read = |flags| {
        let parts =
            with_part(xlsb_parts(&cells, flags), "xl/_rels/workbook.bin.rels", relations.clone().into());
        let read = contents(&with_part(parts, "xl/styles.bin", styles.concat()));
        read.into_iter().map(|(.., content, _)| content).collect::<Vec<_>>()
    };
    let expected =
        |day| [CellContent::Number(1000.0), CellContent::DateTime(day), CellContent::DateTime(1000.0)];
    assert_eq!(read(0), expected(1000.0));
    assert_eq!(read(1), expected(2462.0));
}

#[test]
fn rows_are_handed_out_as_often_as_asked_and_no_further_than_wanted() {
    let cells: Vec<u8> =
        (0..50).flat_map(|row| [wide_row(row), wide_number(0, f64::from(row))].concat()).collect();
    let (_folder, mut inventory) = opened(&xlsb_parts(&cells, 0));
    for wanted in [1, 7, 50, 60, 3] {
        assert_eq!(inventory.first_rows(0, wanted).unwrap().len(), wanted.min(50));
    }
}

#[test]
fn no_damage_makes_the_reader_panic_or_misorder_cells() {
    let cells = [
        wide_row(0),
        wide_record(6, &longs(&[0, 0], &wide_text("CAS"))),
        wide_number(1, 4.5),
        wide_row(2),
        wide_record(2, &longs(&[0, 0, 30], &[])),
        wide_record(9, &longs(&[3, 0], &[0; 14])),
    ]
    .concat();
    let (_folder, path) = place("a.xlsb");
    // A linear congruential generator (Knuth, TAOCP 3.3.4, from memory): the same damage in every run.
    let mut state = 1_u64;
    let mut draw = |below: usize| {
        state = state.wrapping_mul(6_364_136_223_846_793_005).wrapping_add(1_442_695_040_888_963_407);
        usize::try_from(state >> 33).unwrap() % below
    };
    let mut opened = 0;
    for _ in 0..800 {
        let mut parts = xlsb_parts(&cells, 0);
        let part = if draw(4) == 0 { 2 } else { 3 };
        let content = &mut parts[part].1;
        for _ in 0..=draw(2) {
            let place = draw(content.len());
            match draw(3) {
                0 => content[place] = [0, 1, 2, 0x7F, 0x80, 0xFE, 0xFF][draw(7)],
                1 => drop(content.drain(place..(place + draw(5)).min(content.len()))),
                _ => content[place] = u8::try_from(draw(256)).unwrap(),
            }
        }
        write(&parts)(&path).unwrap();
        let Ok(rows) = open_inventory(&path).and_then(|mut inventory| inventory.first_rows(0, usize::MAX))
        else {
            continue;
        };
        opened += 1;
        let places: Vec<_> =
            rows.iter().flat_map(|row| row.cells.iter().map(|cell| (row.index, cell.column))).collect();
        assert!(places.is_sorted_by(|one, next| one < next), "{places:?}");
    }
    assert!(opened > 50, "only {opened} of the damaged workbooks were still readable");
}

#[test]
fn merged_ranges_are_known_by_their_first_cell_if_they_are_wide() {
    let cells = [wide_row(0), wide_number(0, 1.0)].concat();
    let parts = xlsb_parts(&cells, 0);
    let (name, sheet) = parts.iter().find(|(name, _)| name.contains("sheets/")).unwrap().clone();
    let ranges = [
        wide_record(0x00B0, &longs(&[0, 0, 0, 3], &[])),
        wide_record(0x00B0, &longs(&[4, 6, 2, 3], &[])),
        wide_record(0x00B0, &longs(&[8, 9, 2, 2], &[])),
        wide_record(0x00B0, &longs(&[8], &[])),
    ];
    let (_folder, inventory) = opened(&with_part(parts, name, [sheet, ranges.concat()].concat()));
    let merges = &inventory.sheets()[0].merges;
    let places = [(0, 0), (4, 2), (5, 2), (8, 2)];
    assert_eq!(places.map(|(row, column)| merges.last_column(row, column)), [Some(3), Some(3), None, None]);
}
