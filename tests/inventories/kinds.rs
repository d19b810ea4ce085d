//! The same table from every writer in every kind of file: the screened output holds it, cell by cell and type by type.

use std::path::Path;

use calamine::{Data, Reader, Xlsx, open_workbook};
use kowledger::workbook::column_letters;

use crate::expected::{field, folder, lines};
use crate::screened::screen_plainly;

/// How closely the types of cells are compared.
#[derive(Clone, Copy, PartialEq, Eq)]
enum Types {
    /// As in the table, but for errors, which are written as their text.
    AllButErrors,
    /// As in the table.
    All,
    /// The file holds texts only.
    Texts,
}

/// Screens the file and compares the user's columns of the output with the table.
fn check(file: &str, types: Types) {
    let place = tempfile::tempdir().unwrap();
    let output = place.path().join("screened.xlsx");
    let summary = screen_plainly(&folder().join("kinds").join(file), &output);
    assert_eq!(summary.screened, 20, "{file}: rows screened");
    let wrong = differences(file, &output, types);
    assert!(wrong.is_empty(), "{file}:\n{}", wrong.join("\n"));
}

fn differences(file: &str, output: &Path, types: Types) -> Vec<String> {
    let exceptions: Vec<Vec<String>> =
        lines("kinds/differences.tsv").into_iter().filter(|line| line[0] == file).collect();
    let mut book: Xlsx<_> = open_workbook(output).unwrap();
    let sheet = book.worksheet_range_at(0).unwrap().unwrap();
    let mut wrong = Vec::new();
    for (row, line) in lines("kinds/table.tsv").iter().enumerate() {
        for column in 0..12 {
            let address = format!("{}{}", column_letters(column), row + 1);
            let instead =
                exceptions.iter().find(|exception| exception[1].split(' ').any(|cell| cell == address));
            let expected = instead.map_or_else(|| field(line, usize::from(column)), |line| &line[2]);
            let place = (u32::try_from(row).unwrap(), u32::from(column));
            let found = sheet.get_value(place).unwrap_or(&Data::Empty);
            if !same(expected, found, types) {
                wrong.push(format!("{address}: expected {expected:?}, found {found:?}"));
            }
        }
    }
    wrong
}

/// Whether a cell is what the table says.
fn same(expected: &str, found: &Data, types: Types) -> bool {
    let (kind, value) = expected.split_once(' ').unwrap_or((expected, ""));
    let value = value.replace("\\n", "\n").replace("\\t", "\t");
    match (kind, found) {
        ("", Data::Empty) => true,
        ("", Data::String(text)) => text.is_empty(),
        ("text", Data::String(text)) => *text == value,
        ("number", Data::Float(number)) => is_number(&value, *number),
        ("boolean", Data::Bool(boolean)) => (value == "TRUE") == *boolean,
        ("date", Data::DateTime(date)) => moment(date.as_f64()) == value,
        ("error", Data::Error(error)) => error.to_string() == value,
        ("error", Data::String(text)) => types != Types::All && *text == value,
        // What a text file says, whatever type the program gives it.
        ("number", Data::String(text)) => {
            types == Types::Texts && text.parse().is_ok_and(|number| is_number(&value, number))
        }
        ("boolean", Data::String(text)) => types == Types::Texts && text.eq_ignore_ascii_case(&value),
        ("date", Data::String(text)) => types == Types::Texts && *text == value,
        ("text", Data::Float(number)) => types == Types::Texts && number.to_string() == value,
        ("text", Data::Bool(boolean)) => {
            types == Types::Texts && boolean.to_string().eq_ignore_ascii_case(&value)
        }
        ("text", Data::DateTime(date)) => types == Types::Texts && moment(date.as_f64()) == value,
        _ => false,
    }
}

/// Whether a number is the written one, to the last bit.
fn is_number(written: &str, number: f64) -> bool {
    written.parse::<f64>().unwrap().to_bits() == number.to_bits()
}

/// A spreadsheet's day and time as it is written, to the second.
fn moment(serial: f64) -> String {
    const SECONDS: f64 = 86_400.0;
    let day = kowledger::quantity::Date::from_serial((serial * SECONDS).round() / SECONDS).unwrap();
    let seconds = (serial * SECONDS).round().rem_euclid(SECONDS);
    if seconds < 0.5 {
        return day.to_string();
    }
    let (hours, minutes) = ((seconds / 3600.0).floor(), (seconds / 60.0).floor().rem_euclid(60.0));
    format!("{day} {hours:02}:{minutes:02}:{:02}", seconds.rem_euclid(60.0))
}

#[test]
fn a_moment_is_written_to_the_second() {
    assert_eq!(moment(45366.0), "2024-03-15");
    assert_eq!(moment(45_366.572_916_666_7), "2024-03-15 13:45:00");
    assert_eq!(moment(45_366.999_988_425_9), "2024-03-15 23:59:59");
}

#[test]
fn openpyxl_xlsx() {
    check("openpyxl.xlsx", Types::AllButErrors);
}

#[test]
fn openpyxl_xlsm() {
    check("openpyxl.xlsm", Types::AllButErrors);
}

#[test]
fn xlsxwriter_xlsx() {
    check("xlsxwriter.xlsx", Types::AllButErrors);
}

#[test]
fn pandas_xlsx() {
    check("pandas.xlsx", Types::AllButErrors);
}

#[test]
fn libreoffice_xlsx() {
    check("libreoffice.xlsx", Types::AllButErrors);
}

#[test]
fn libreoffice_xlsm() {
    check("libreoffice.xlsm", Types::AllButErrors);
}

#[test]
fn errors_stay_errors() {
    check("openpyxl.xlsx", Types::All);
}

#[test]
#[ignore = "xls is not read yet"]
fn xlwt_xls() {
    check("xlwt.xls", Types::AllButErrors);
}

#[test]
#[ignore = "xls is not read yet"]
fn libreoffice_xls() {
    check("libreoffice.xls", Types::AllButErrors);
}

#[test]
#[ignore = "xls is not read yet"]
fn sheetjs_xls() {
    check("sheetjs.xls", Types::AllButErrors);
}

#[test]
#[ignore = "xlsb is not read yet"]
fn sheetjs_xlsb() {
    check("sheetjs.xlsb", Types::AllButErrors);
}

#[test]
#[ignore = "xlsb is not read yet"]
fn pyxlsbwriter_xlsb() {
    check("pyxlsbwriter.xlsb", Types::AllButErrors);
}

#[test]
#[ignore = "ods is not read yet"]
fn libreoffice_ods() {
    check("libreoffice.ods", Types::AllButErrors);
}

#[test]
#[ignore = "ods is not read yet"]
fn odfpy_ods() {
    check("odfpy.ods", Types::AllButErrors);
}

#[test]
#[ignore = "text files are not read yet"]
fn libreoffice_csv() {
    check("libreoffice.csv", Types::Texts);
}

#[test]
#[ignore = "text files are not read yet"]
fn pandas_csv() {
    check("pandas.csv", Types::Texts);
}
