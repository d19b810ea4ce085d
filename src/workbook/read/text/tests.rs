//! What a text reads as, how that is told, and which are refused.

use std::ops::ControlFlow;
use std::path::{Path, PathBuf};

use super::super::{Inventory, open_inventory};
use crate::workbook::{CellContent, Row};

fn fixture(name: &str) -> PathBuf {
    Path::new(env!("CARGO_MANIFEST_DIR")).join("tests/fixtures/workbooks/text").join(name)
}

fn opened(name: &str, content: &[u8]) -> (tempfile::TempDir, Result<Inventory, String>) {
    let folder = tempfile::tempdir().unwrap();
    let path = folder.path().join(name);
    std::fs::write(&path, content).unwrap();
    let opened = open_inventory(&path).map_err(|fault| {
        let said = fault.to_string();
        said.strip_prefix(&format!("{}: ", path.display())).map(str::to_owned).unwrap_or(said)
    });
    (folder, opened)
}

fn rows_of(inventory: &mut Inventory) -> Vec<Row> {
    let mut rows = Vec::new();
    inventory
        .stream_rows(0, |row| {
            rows.push(row);
            ControlFlow::Continue(())
        })
        .unwrap();
    rows
}

/// Row, column and text of every cell.
fn cells_of(rows: &[Row]) -> Vec<(u32, u16, &str)> {
    rows.iter()
        .flat_map(|row| {
            row.cells.iter().map(|cell| match &cell.content {
                CellContent::Text(text) => (row.index, cell.column, text.as_str()),
                other => panic!("{other:?} in a text file"),
            })
        })
        .collect()
}

fn read(content: &str) -> Vec<(u32, u16, String)> {
    let (_folder, opened) = opened("list.csv", content.as_bytes());
    let rows = rows_of(&mut opened.unwrap());
    cells_of(&rows).into_iter().map(|(row, column, text)| (row, column, text.to_owned())).collect()
}

fn refusal(content: &[u8]) -> String {
    opened("list.csv", content).1.err().unwrap()
}

fn how_read(content: &[u8]) -> Vec<String> {
    opened("list.csv", content).1.unwrap().how_read().to_vec()
}

const WESTERN: [[&str; 5]; 4] = [
    ["CAS-Nr.", "Bezeichnung", "log Kow", "Löslichkeit (µg/L)", "Bemerkung"],
    ["50-29-3", "DDT, p,p'-", "6,91", "5,5", "Prüfung bei 20 °C"],
    ["107-06-2", "1,2-Dichlorethan", "1,48", "8,6E6", "sogenanntes \"EDC\"; flüchtig"],
    ["00067-56-1", "Méthanol", "-0,77", "", "two\nlines"],
];
const JAPANESE: [[&str; 5]; 4] = [
    ["CAS番号", "物質名", "log Kow", "水溶解度 (mg/L)", "備考"],
    ["50-29-3", "ジクロロジフェニルトリクロロエタン", "6.91", "0.0055", "20 ℃で測定"],
    ["107-06-2", "1,2-ジクロロエタン", "1.48", "8600", "揮発性; 注意"],
    ["67-56-1", "メタノール", "-0.77", "", "二行\nの備考"],
];
const SIMPLIFIED: [[&str; 5]; 4] = [
    ["CAS号", "物质名称", "log Kow", "水溶解度 (mg/L)", "备注"],
    ["50-29-3", "滴滴涕", "6.91", "0.0055", "在20 ℃下测定"],
    ["107-06-2", "1,2-二氯乙烷", "1.48", "8600", "易挥发; 注意"],
    ["67-56-1", "甲醇", "-0.77", "", "两行\n备注"],
];
const TRADITIONAL: [[&str; 5]; 4] = [
    ["CAS號", "物質名稱", "log Kow", "水溶解度 (mg/L)", "備註"],
    ["50-29-3", "滴滴涕", "6.91", "0.0055", "在20 ℃下測定"],
    ["107-06-2", "1,2-二氯乙烷", "1.48", "8600", "易揮發; 注意"],
    ["67-56-1", "甲醇", "-0.77", "", "兩行\n備註"],
];

#[test]
fn every_encoding_and_separator_is_found_and_told() {
    for (name, rows, encoding) in [
        ("utf-8", WESTERN, "Encoding: UTF-8, in which every character is sound."),
        ("utf-8-mark", JAPANESE, "Encoding: UTF-8, as the file's first bytes say."),
        ("utf-16-le-mark", SIMPLIFIED, "Encoding: UTF-16LE, as the file's first bytes say."),
        ("utf-16-be-mark", WESTERN, "Encoding: UTF-16BE, as the file's first bytes say."),
        ("utf-16-le", JAPANESE, "Encoding: UTF-16LE, as every second byte shows."),
        ("utf-16-be", TRADITIONAL, "Encoding: UTF-16BE, as every second byte shows."),
        ("windows-1252", WESTERN, "Encoding: windows-1252, as its characters suggest, for example "),
        ("shift-jis", JAPANESE, "Encoding: Shift_JIS, as its characters suggest, for example `CAS番号`"),
        ("euc-jp", JAPANESE, "Encoding: EUC-JP, as its characters suggest, for example `CAS番号`"),
        ("gb18030", SIMPLIFIED, "Encoding: gb18030, as its characters suggest, for example `CAS号`"),
        ("big5", TRADITIONAL, "Encoding: Big5, as its characters suggest, for example `CAS號`"),
    ] {
        for (separator, word) in
            [("comma", "comma"), ("semicolon", "semicolon"), ("tab", "tab"), ("bar", "vertical bar")]
        {
            let file = format!("{name}-{separator}.csv");
            let mut inventory = open_inventory(&fixture(&file)).unwrap();
            let told = inventory.how_read().to_vec();
            assert!(told[0].starts_with(encoding), "{file}: {}", told[0]);
            let cut = format!("Separator of the fields: {word}, which cuts most rows into 5 fields.");
            assert_eq!(told[1..], [cut], "{file}");
            let read = rows_of(&mut inventory);
            let expected: Vec<(u32, u16, &str)> = (0u32..)
                .zip(&rows)
                .flat_map(|(row, texts)| (0u16..).zip(texts).map(move |(column, text)| (row, column, *text)))
                .filter(|(_, _, text)| !text.is_empty())
                .collect();
            assert_eq!(cells_of(&read), expected, "{file}");
            let survey = &inventory.sheets()[0];
            assert_eq!((survey.used_columns, survey.last_row), (5, 3), "{file}");
            assert_eq!(*survey.name, format!("{name}-{separator}"));
        }
    }
}

#[test]
fn what_libreoffice_wrote_stands_in_the_rows_it_shows() {
    let path = Path::new(env!("CARGO_MANIFEST_DIR")).join("tests/fixtures/workbooks/libreoffice.csv");
    let mut inventory = open_inventory(&path).unwrap();
    let rows = rows_of(&mut inventory);
    let cells = cells_of(&rows);
    for expected in [
        (8, 1, "00067-56-1"),
        (9, 1, "two\nlines"),
        (10, 1, "  a   b "),
        (12, 1, "#DIV/0!"),
        (29, 0, "after a gap"),
        (39, 3, "beside"),
    ] {
        assert!(cells.contains(&expected), "{expected:?}");
    }
}

#[test]
fn fields_stay_text_as_they_stand() {
    let cells = read("CAS;No;Range\n0050-29-3;0012;1-2\n=\"0007\";\"=\"\"0,5\"\"\"; 3 \n=1+2;'5;1E5\n");
    let texts: Vec<&str> = cells.iter().skip(3).map(|(_, _, text)| text.as_str()).collect();
    assert_eq!(texts, ["0050-29-3", "0012", "1-2", "0007", "0,5", " 3 ", "=1+2", "'5", "1E5"]);
    let told = how_read(b"CAS;No\n=\"0012\";x\n5;=\"\"\n");
    assert_eq!(
        told[2],
        "2 texts are written as a formula (`=\"...\"`) and read as the text within, the first in list!A2."
    );
}

#[test]
fn rows_are_counted_as_a_spreadsheet_shows_them() {
    let cells = read("sep=;\r\nCAS;Name\r\n\r\n50-29-3;\"a\r\nb\"\r\n;;\r\n67-56-1;c\r\n");
    let places: Vec<_> = cells.iter().map(|(row, column, text)| (*row, *column, text.as_str())).collect();
    assert_eq!(
        places,
        [(0, 0, "CAS"), (0, 1, "Name"), (2, 0, "50-29-3"), (2, 1, "a\nb"), (4, 0, "67-56-1"), (4, 1, "c")]
    );
}

#[test]
fn a_text_in_western_europe_with_signs_only_is_not_taken_for_another_script() {
    for (text, words) in [
        (
            &b"CAS;mg/L;Temp\n50-29-3;5,5 \xB5g/L;20 \xB0C\n67-56-1;1 \xB1 0,2;x\n"[..],
            "`\u{b5}g/L`, `\u{b0}C`, `\u{b1}`",
        ),
        (
            b"CAS,Nom\n64-17-5,\xC9thanol\n71-43-2,Benz\xE8ne\n67-64-1,Ac\xE9tone\n",
            "`\u{c9}thanol`, `Benz\u{e8}ne`, `Ac\u{e9}tone`",
        ),
        (b"CAS;Stoff\n64-17-5;S\xE4ure\n71-43-2;L\xF6sung\n", "`S\u{e4}ure`, `L\u{f6}sung`"),
        (b"CAS;Nombre\n7732-18-5;a\xF1o \xBD\n", "`a\u{f1}o`"),
    ] {
        let told = how_read(text);
        assert_eq!(
            told[0],
            format!(
                "Encoding: windows-1252, as its characters suggest, for example {words}; if such words look wrong, save \
                 the list as UTF-8 or xlsx."
            )
        );
    }
}

#[test]
fn broken_characters_are_counted_and_their_first_cell_is_named() {
    let sound = "Säure;Löslichkeit;µg/L °C é è\n".repeat(10);
    let mut content = format!("CAS;Name;x\n{sound}").into_bytes();
    content.extend(b"50-29-3;S\xE4ure;x\n");
    let told = how_read(&content);
    assert_eq!(told[0], "Encoding: UTF-8, in which nearly every character is sound.");
    assert_eq!(
        told[2],
        "1 character is not in this encoding and read as `\u{FFFD}`, the first in list!B12; export the list again as \
         UTF-8, or save it as xlsx."
    );
    // Code page 850, which has ü where Windows-1252 has a control character.
    let told = how_read(b"CAS;Stoff\n50-29-3;Pr\x81fung\n");
    assert!(
        told.iter().any(|told| told.starts_with("1 character is no text, the first in list!B2")),
        "{told:?}"
    );
    let told = how_read(b"CAS;Stoff;a;b;c;d;e;f;g;h;i;j;k;l\n50-29-3;x\0y;a;b;c;d;e;f;g;h;i;j;k;l\n");
    assert_eq!(told[2], "1 zero character was left out.");
}

#[test]
fn rows_with_too_few_fields_are_told() {
    let told =
        how_read(b"A title\nCAS;Name;log Kow\n50-29-3;DDT\n50-29-3;DDT;6,91\n\n67-56-1;Methanol;-0,77\n");
    assert_eq!(
        told[2],
        "1 row has fewer fields than the others, the first is row 3; if a line break within a text cut such a row in \
         two, put the text into quotation marks."
    );
}

#[test]
fn quotation_marks_that_swallow_rows_are_refused_with_row_and_line() {
    let open = "opens a text that is not closed, so that the rows below it belong to it";
    let over = "opens a text that runs over whole rows before another one closes it";
    for (text, said) in [
        (
            "CAS;Name\n50-29-3;\"DDT\n67-56-1;x\n",
            format!("row 2 (line 2): a quotation mark at the beginning of a field {open}"),
        ),
        (
            "CAS;Name\n50-29-3;\"DDT\n67-56-1;x\n64-17-5;\"y\"\n",
            format!("row 2 (line 2): a quotation mark at the beginning of a field {over}"),
        ),
        (
            "a;b;c;d\n1;2;3;\"x\n1;2;3;4\n1;2;3;y\"\n1;2;3;4\n1;2;3;4\n",
            format!("row 2 (line 2): a quotation mark at the beginning of a field {over}"),
        ),
    ] {
        let refused = refusal(text.as_bytes());
        assert!(refused.starts_with(&said), "{refused}");
    }
    // An address within a quoted field is no row.
    assert_eq!(read("a,b,c,d\n1,2,3,\"Street 1, City\nCountry, a\"\n").len(), 8);
}

#[test]
fn a_text_beyond_what_a_cell_holds_is_told() {
    let (_folder, opened) =
        opened("list.csv", format!("CAS;x\n1;{}\n2;{}\n", "y".repeat(32_767), "z".repeat(32_768)).as_bytes());
    let inventory = opened.unwrap();
    assert_eq!(
        inventory.not_carried(),
        [
            "Sheet `list`: every cell is written as text, as in the file, so that no number or identifier is changed; a \
             spreadsheet program may mark numbers that are stored as text.",
            "Sheet `list`: 1 text is longer than the 32767 characters a cell can hold and cut, the first in list!B3.",
        ]
    );
}

#[test]
fn a_line_without_end_is_refused_and_not_held() {
    let refused = refusal(&vec![b'x'; 30 << 20]);
    assert!(refused.starts_with("row 1 (line 1): has more than 2097152 characters"), "{refused}");
    let mut wide = b"CAS;Name\n".to_vec();
    wide.extend(b"1;".repeat(1_000_000));
    let refused = refusal(&wide);
    assert!(refused.starts_with("row 2 (line 2): has more than 16384 filled columns"), "{refused}");
    assert!(read(&format!("CAS;Name\n1;2{}\n", ";".repeat(1_000_000))).len() == 4);
}

#[test]
fn more_rows_than_a_sheet_has_ask_for_a_split() {
    let row = "5;x\n";
    let mut content = format!("CAS;Name\n{}", row.repeat(1_048_575));
    assert_eq!(opened("list.csv", content.as_bytes()).1.unwrap().sheets()[0].last_row, 1_048_575);
    content.push_str(row);
    assert_eq!(
        refusal(content.as_bytes()),
        "has more than 1048576 rows, the most a sheet can have; split the file into several, each with the header"
    );
}

#[test]
fn a_sheet_is_named_after_the_file_as_far_as_a_sheet_can_be() {
    for (file, name) in [
        ("Stock [north].csv", "Stock _north_"),
        ("export of the northern works 2026-12-01.tsv", "export of the northern works 20"),
        ("物質.csv", "物質"),
        ("list", "list"),
    ] {
        let (_folder, opened) = opened(file, b"CAS;Name\n1;2\n");
        assert_eq!(&*opened.unwrap().sheets()[0].name, name);
    }
}

#[test]
fn any_bytes_are_read_or_refused() {
    // A linear congruential generator (Knuth, TAOCP 3.3.4, from memory): the same damage in every run.
    let mut state = 7_u64;
    let mut draw = |below: usize| {
        state = state.wrapping_mul(6_364_136_223_846_793_005).wrapping_add(1_442_695_040_888_963_407);
        usize::try_from(state >> 33).unwrap() % below
    };
    let sound = "CAS;Name;log Kow\n50-29-3;\"DDT; p,p'\";6,91\n67-56-1;Méthanol;-0,77\n".as_bytes();
    let mut read = 0;
    for _ in 0..400 {
        let mut content = sound.to_vec();
        for _ in 0..=draw(4) {
            let place = draw(content.len());
            match draw(3) {
                0 => content[place] = b"\"\r\n;,\t\0\xFF\xE9\x81 ="[draw(12)],
                1 => drop(content.drain(place..(place + draw(9)).min(content.len()))),
                _ => content.insert(place, b"\"\r\n;\xC3\xB5"[draw(6)]),
            }
        }
        let (_folder, opened) = opened("list.csv", &content);
        if let Ok(mut inventory) = opened {
            read += usize::from(!rows_of(&mut inventory).is_empty());
        }
    }
    assert!(read > 100, "only {read} of the damaged texts were still readable");
}
