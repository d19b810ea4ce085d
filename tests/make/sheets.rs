//! Makes small sound inventories for tests: rows of cells, written as a spreadsheet program would.

use std::path::Path;

use rust_xlsxwriter::{Formula, Workbook, Worksheet, XlsxError};

/// What stands in a cell.
#[derive(Clone, Copy)]
pub enum Put<'text> {
    /// Nothing.
    Nothing,
    /// A text.
    Text(&'text str),
    /// A number.
    Number(f64),
    /// True or false.
    Boolean(bool),
    /// A day, as a serial number with a date format.
    Day(f64),
    /// A formula with its result as stored.
    Formula(&'text str, &'text str),
}

/// A sheet: its name and its rows.
pub type Sheet<'text> = (&'text str, Vec<Vec<Put<'text>>>);

/// The header of most inventories here; the half-life stands in column E.
pub const HEADER: [&str; 5] = ["Name", "CAS No.", "log Kow", "BCF (L/kg)", "Half-life soil (d)"];

/// A row of texts.
pub fn texts<'text>(row: &[&'text str]) -> Vec<Put<'text>> {
    row.iter().map(|text| if text.is_empty() { Put::Nothing } else { Put::Text(text) }).collect()
}

/// An inventory of two substances whose cells can all be read.
pub fn sound_rows() -> Vec<Vec<Put<'static>>> {
    vec![
        texts(&HEADER),
        texts(&["DDT", "50-29-3", "6.91", "12000", "2000"]),
        texts(&["Phenol", "108-95-2", "1.46", "17", "3"]),
    ]
}

/// The same with one half-life nobody can read, in E3.
pub fn rows_with_a_fault() -> Vec<Vec<Put<'static>>> {
    let mut rows = sound_rows();
    rows[2][4] = Put::Text("soon");
    rows
}

/// Writes a workbook of these sheets.
pub fn write(path: &Path, sheets: &[Sheet<'_>]) -> Result<(), XlsxError> {
    let mut book = Workbook::new();
    let day = rust_xlsxwriter::Format::new().set_num_format("yyyy-mm-dd");
    for (name, rows) in sheets {
        let sheet = book.add_worksheet();
        sheet.set_name(*name)?;
        for (row, cells) in (0..).zip(rows) {
            for (column, cell) in (0..).zip(cells) {
                put(sheet, row, column, *cell, &day)?;
            }
        }
    }
    book.save(path)
}

fn put(
    sheet: &mut Worksheet,
    row: u32,
    column: u16,
    cell: Put<'_>,
    day: &rust_xlsxwriter::Format,
) -> Result<(), XlsxError> {
    match cell {
        Put::Nothing => {}
        Put::Text(text) => {
            sheet.write_string(row, column, text)?;
        }
        Put::Number(number) => {
            sheet.write_number(row, column, number)?;
        }
        Put::Boolean(boolean) => {
            sheet.write_boolean(row, column, boolean)?;
        }
        Put::Day(serial) => {
            sheet.write_number_with_format(row, column, serial, day)?;
        }
        Put::Formula(formula, result) => {
            sheet.write_formula(row, column, Formula::new(formula).set_result(result))?;
        }
    }
    Ok(())
}
