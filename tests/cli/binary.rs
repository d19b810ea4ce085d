//! xls and xlsb files on the whole way, and files that are not what their names say.

use calamine::{CellErrorType, Data};

use crate::place::{Place, Rows};

/// A folder with a workbook of tests/fixtures/workbooks under some name.
fn with_fixture(fixture: &str, name: &str) -> Place {
    let place = Place::new();
    let folder = std::path::Path::new(env!("CARGO_MANIFEST_DIR")).join("tests/fixtures/workbooks");
    std::fs::copy(folder.join(fixture), place.path(name)).unwrap();
    place
}

/// The status, the faults and the annotated sheet of a list.
fn screened(fixture: &str, name: &str) -> (i32, String, Rows) {
    let place = with_fixture(fixture, name);
    let run = place.run(&["screen", name, "--date", "2026-12-01"]);
    assert!(run.said.contains("Written: list-screened.xlsx"), "{} {}", run.said, run.complained);
    (run.status, run.complained, place.rows_of("list-screened.xlsx", "Substances"))
}

#[test]
fn a_list_gets_the_same_verdicts_from_each_kind_of_file() {
    let (status, faults, expected) = screened("list.xlsx", "list.xlsx");
    assert_eq!(status, 1);
    assert!(faults.contains("Substances!C10: `see file` is no log Kow"), "{faults}");
    assert_eq!(expected.under(2, "REACH B", 3), "screens in");
    for kind in ["list.xls", "list.xlsb"] {
        let (status, said, rows) = screened(kind, kind);
        assert_eq!((status, &said), (1, &faults), "{kind}");
        assert_eq!(rows.0.len(), expected.0.len());
        for (number, (row, expected)) in (1..).zip(rows.0.iter().zip(&expected.0)) {
            assert_eq!(row, expected, "{kind}, row {number}");
        }
    }
}

#[test]
fn days_stay_days_and_results_stay_numbers_in_the_output() {
    for kind in ["list.xls", "list.xlsb"] {
        let (.., rows) = screened(kind, kind);
        // 1 March 2026 and the difference of 6.91 and 4.5.
        assert!(
            matches!(&rows.0[2][6], Data::DateTime(day) if day.as_f64().to_bits() == 46_082.0_f64.to_bits())
        );
        assert!(matches!(&rows.0[2][7], Data::Float(number) if (number - 2.41).abs() < 1e-9), "{kind}");
        assert_eq!(rows.0[9][7], Data::Error(CellErrorType::Div0));
    }
}

#[test]
fn a_workbook_is_known_by_its_content_whatever_its_name_says() {
    for (fixture, name) in [
        ("list.xls", "list.xlsx"),
        ("list.xlsb", "list.xlsx"),
        ("list.xlsx", "list.xls"),
        ("list.xls", "list.xlsb"),
        ("list.xlsb", "list.xls"),
    ] {
        let (status, _, rows) = screened(fixture, name);
        assert_eq!((status, rows.under(2, "REACH B", 3).as_str()), (1, "screens in"), "{fixture} as {name}");
    }
}

#[test]
fn exports_that_only_call_themselves_xls_are_named_as_what_they_are() {
    let save = "open it in a spreadsheet program, save it as xlsx and use that file";
    for (content, message) in [
        (
            &b"<html><body><table><tr><td>CAS</td></tr></table></body></html>"[..],
            "this is a web page (HTML), whatever its name says",
        ),
        (
            b"<?xml version=\"1.0\"?><Workbook xmlns=\"urn:schemas-microsoft-com:office:spreadsheet\"/>",
            "this is a workbook written as XML text, which is not read",
        ),
        (
            b"\x09\x04\x06\x00\x00\x00\x10\x00\x00\x00\x0A\x00\x00\x00",
            "this is a worksheet of a binary format from before 1993, which is not read",
        ),
    ] {
        let place = Place::new();
        std::fs::write(place.path("export.xls"), content).unwrap();
        place.refuses(&["screen", "export.xls"], &format!("export.xls: {message}; {save}"));
    }
}

#[test]
fn an_xls_cut_off_by_a_broken_download_is_refused() {
    let place = with_fixture("list.xls", "half.xls");
    let half = std::fs::metadata(place.path("half.xls")).unwrap().len() / 2;
    std::fs::File::options().write(true).open(place.path("half.xls")).unwrap().set_len(half).unwrap();
    let run = place.run(&["screen", "half.xls"]);
    assert_eq!(run.status, 2);
    assert!(run.complained.starts_with("half.xls: the workbook is damaged ("), "{}", run.complained);
    assert_eq!(place.files(), ["half.xls"]);
}

#[test]
fn columns_are_shown_for_an_xls_as_for_any_inventory() {
    let place = with_fixture("list.xls", "list.xls");
    let run = place.run(&["columns", "list.xls"]);
    assert_eq!(run.status, 0, "{}", run.complained);
    assert!(run.said.contains("CAS No."), "{}", run.said);
}
