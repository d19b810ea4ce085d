//! The same list in other kinds of files is screened to the same verdicts, and what a text file leaves open is told.

use calamine::Data;

use crate::hostile;
use crate::place::{Place, Rows};
use crate::sheets::texts;

const LIST: [[&str; 5]; 5] = [
    ["Name", "CAS No.", "log Kow", "BCF (L/kg)", "Half-life soil (d)"],
    ["DDT", "50-29-3", "6.91", "12000", "2000"],
    ["Phenol", "108-95-2", "1.46", "17", "3"],
    ["1,2-Dichloroethane", "107-06-2", "1.48", "", "> 60"],
    ["Anthracene", "120-12-7", "4.45", "1.2E3", "soon"],
];

fn screened(place: &Place, file: &str, sheet: &str) -> Vec<Vec<Data>> {
    let run = place.run(&["screen", file, "--date", "2026-12-01"]);
    // One half-life cannot be read.
    assert_eq!(run.status, 1, "{file}: {}", run.complained);
    let name = file.rsplit_once('.').map_or(file, |(stem, _)| stem);
    // The verdicts stand to the right of the five columns.
    let Rows(rows) = place.rows_of(&format!("{name}-screened.xlsx"), sheet);
    rows.into_iter()
        .map(|row| {
            let added = row.into_iter().skip(5);
            added
                .map(|cell| match cell {
                    // Where a value stands, with the sheet's name.
                    Data::String(text) => Data::String(text.replace(&format!("{sheet}!"), "Sheet!")),
                    other => other,
                })
                .collect()
        })
        .collect()
}

fn as_workbook() -> Vec<Vec<Data>> {
    let place = Place::with_sheets(&[("list", LIST.iter().map(|row| texts(row)).collect())]);
    screened(&place, "inventory.xlsx", "list")
}

fn as_text(rows: &[[&str; 5]], separator: &str, decimal: &str) -> String {
    let quoted = |text: &&str| {
        let number = text.parse::<f64>().is_ok();
        let text = if number { text.replace('.', decimal) } else { (*text).to_owned() };
        if text.contains(separator) { format!("\"{text}\"") } else { text }
    };
    rows.iter().map(|row| row.iter().map(quoted).collect::<Vec<_>>().join(separator) + "\r\n").collect()
}

#[test]
fn a_text_file_gives_the_verdicts_of_the_workbook_whatever_its_separator_and_decimal_sign() {
    let expected = as_workbook();
    assert!(expected.len() == 5 && expected[1].len() > 10);
    for (separator, decimal) in [(",", "."), (";", "."), (";", ","), ("\t", ","), ("|", "."), (",", ",")] {
        let place = Place::new();
        std::fs::write(place.path("list.csv"), as_text(&LIST, separator, decimal)).unwrap();
        let found = screened(&place, "list.csv", "list");
        let differing: Vec<_> = expected
            .iter()
            .zip(&found)
            .flat_map(|(one, other)| one.iter().zip(other))
            .filter(|(one, other)| {
                one.to_string()
                    != other
                        .to_string()
                        .replace("6,91", "6.91")
                        .replace("1,46", "1.46")
                        .replace("1,48", "1.48")
                        .replace("4,45", "4.45")
                        .replace("1,2E3", "1.2E3")
            })
            .collect();
        assert!(differing.is_empty(), "{separator:?} {decimal:?}: {differing:?}");
    }
}

#[test]
fn an_open_document_workbook_gives_the_verdicts_of_the_xlsx() {
    let cell = |text: &&str| match text.parse::<f64>() {
        Ok(number) => format!(r#"<table:table-cell office:value-type="float" office:value="{number}"/>"#),
        Err(_) => format!(
            r#"<table:table-cell office:value-type="string"><text:p>{}</text:p></table:table-cell>"#,
            text.replace('>', "&gt;")
        ),
    };
    let row = |row: &[&str; 5]| {
        format!("<table:table-row>{}</table:table-row>", row.iter().map(cell).collect::<String>())
    };
    let rows: String = LIST.iter().map(row).collect();
    let content = format!(
        r#"<office:document-content><office:body><office:spreadsheet><table:table table:name="list">{rows}</table:table></office:spreadsheet></office:body></office:document-content>"#
    );
    let place = Place::new();
    let parts = [
        ("mimetype", &b"application/vnd.oasis.opendocument.spreadsheet"[..]),
        ("content.xml", content.as_bytes()),
    ];
    hostile::write_zip(&place.path("list.ods"), &parts).unwrap();
    let numbers = LIST.map(|row| {
        row.map(|text| match text.parse::<f64>() {
            Ok(number) => crate::sheets::Put::Number(number),
            Err(_) if text.is_empty() => crate::sheets::Put::Nothing,
            Err(_) => crate::sheets::Put::Text(text),
        })
        .to_vec()
    });
    let workbook = Place::with_sheets(&[("list", numbers.to_vec())]);
    let expected = screened(&workbook, "inventory.xlsx", "list");
    assert_eq!(screened(&place, "list.ods", "list"), expected);
}

#[test]
fn how_a_text_file_was_read_is_told_and_kept_in_the_run_record() {
    let place = Place::new();
    let mut content = b"Name;CAS No.;log Kow\nPhenol;108-95-2;1,46\nW\xE4sserchen;7732-18-5;-1,38\n".to_vec();
    std::fs::write(place.path("list.csv"), &content).unwrap();
    let run = place.run(&["screen", "list.csv", "--date", "2026-12-01"]);
    assert_eq!(run.status, 0, "{}", run.complained);
    let encoding = "Encoding: windows-1252, as its characters suggest, for example `Wässerchen`; if such words look \
                    wrong, save the list as UTF-8 or xlsx.";
    let separator = "Separator of the fields: semicolon, which cuts most rows into 3 fields.";
    let record = place.rows_of("list-screened.xlsx", "Run record").text();
    for told in [encoding, separator] {
        assert!(run.said.contains(told), "{}", run.said);
        assert!(record.contains(&format!("How it was read|{told}")), "{record}");
    }
    assert!(record.contains("every cell is written as text, as in the file"), "{record}");
    // The list itself, as text.
    let Rows(rows) = place.rows_of("list-screened.xlsx", "list");
    assert_eq!(rows[1][2], Data::String("1,46".to_owned()));
    content.extend(b"\"Benzene;71-43-2;2,13\n");
    std::fs::write(place.path("list.csv"), &content).unwrap();
    place.refuses(
        &["screen", "list.csv", "--force"],
        "list.csv: row 4 (line 4): a quotation mark at the beginning of a field opens a text that is not closed, so \
         that the rows below it belong to it; close it at the end of the field or, where it is a character of the \
         text, put the field into quotation marks and write it twice",
    );
}

#[test]
fn a_row_with_more_fields_than_the_header_is_not_screened() {
    let place = Place::new();
    let list = "CAS No.,log Kow,Name\n108-95-2,1.46,Phenol\n50-29-3,6,91,DDT\n67-56-1,-0.77,Methanol,\n";
    std::fs::write(place.path("list.csv"), list).unwrap();
    let run = place.run(&["screen", "list.csv", "--date", "2026-12-01"]);
    assert_eq!(run.status, 1, "{}", run.complained);
    let why = "list!D3: `DDT` is field 4 of its row, but the header has 3, so that a separator within a text or number \
               may have moved the values into wrong columns, and the row is not screened; put that text into quotation \
               marks, or give the column a header";
    assert!(run.complained.contains(why), "{}", run.complained);
    assert!(run.said.contains("Screened 2 rows on 1 sheet"), "{}", run.said);
    let left = "1 row was not screened, with more fields than the header; each is among the cells that could not \
                be read.";
    assert!(run.said.contains(left), "{}", run.said);
    let text = place.rows_of("list-screened.xlsx", "list").text();
    assert!(text.contains(&format!("not screened: {why}")), "{text}");
}

#[test]
fn a_text_that_is_no_list_is_refused() {
    let place = Place::new();
    std::fs::write(place.path("letter.txt"), "Dear colleague,\n\nplease find the list attached.\n").unwrap();
    let run = place.run(&["screen", "letter.txt"]);
    assert_eq!(run.status, 2);
    assert!(
        run.complained.starts_with("letter.txt: no sheet has a header that is recognised (letter)"),
        "{}",
        run.complained
    );
    let how_read = "Encoding: ASCII. Separator of the fields: none, so that each row is one cell";
    assert!(run.complained.trim_end().ends_with(how_read), "{}", run.complained);
    let run = place.run(&["columns", "letter.txt"]);
    assert_eq!(
        run.said,
        "Encoding: ASCII.\nSeparator of the fields: none, so that each row is one cell.\n\
         letter: no header recognised; the sheet would be copied.\n"
    );
}

#[test]
fn control_characters_of_an_export_do_not_break_the_output() {
    let place = Place::new();
    let mut list = "CAS No.,log Kow,Name\n108-95-2,1.46,Phe\u{1}nol\u{b}\u{1b}\u{fffe}\n".to_owned();
    list.push_str(&"67-56-1,-0.77,Methanol\n".repeat(20));
    std::fs::write(place.path("list.csv"), list).unwrap();
    let run = place.run(&["screen", "list.csv", "--date", "2026-12-01"]);
    assert_eq!(run.status, 0, "{}", run.complained);
    let told = "3 characters are no text, the first in list!C2";
    assert!(run.said.contains(told), "{}", run.said);
    // The output can be read, by another reader and by the program itself.
    let Rows(rows) = place.rows_of("list-screened.xlsx", "list");
    assert_eq!(rows[20][0], Data::String("67-56-1".to_owned()));
    assert_eq!(place.run(&["columns", "list-screened.xlsx"]).status, 0);
}

/// A sheet of a workbook, as stored.
fn xml_of(place: &Place, file: &str, sheet: usize) -> String {
    let file = std::fs::File::open(place.path(file)).unwrap();
    let part = format!("xl/worksheets/sheet{sheet}.xml");
    std::io::read_to_string(zip::ZipArchive::new(file).unwrap().by_name(&part).unwrap()).unwrap()
}

#[test]
fn columns_of_a_text_file_are_as_wide_as_their_cells_and_our_sheets_print_one_page_wide() {
    let place = Place::new();
    let content = "Name;CAS No.;log Kow\n1,1,1-trichloro-2,2-bis(4-chlorophenyl)ethane;50-29-3;6,91\n";
    std::fs::write(place.path("list.csv"), content).unwrap();
    assert_eq!(place.run(&["screen", "list.csv"]).status, 0);
    let list = xml_of(&place, "list-screened.xlsx", 1);
    for width in ["<col min=\"1\" max=\"1\" width=\"40", "<col min=\"2\" max=\"2\" width=\"9"] {
        assert!(list.contains(width), "{width} in {}", &list[..900]);
    }
    assert!(!list.contains("fitToWidth") && !list.contains("fitToHeight"));
    for sheet in [2, 4, 5, 6] {
        let xml = xml_of(&place, "list-screened.xlsx", sheet);
        let fits = xml.contains("<pageSetUpPr fitToPage=\"1\"/>") && xml.contains("fitToHeight=\"0\"");
        assert!(fits && xml.contains("orientation=\"landscape\""), "sheet {sheet}");
    }
}
