//! Writes `inputs-example/inventory.xlsx` from `tests/fixtures/inventory.tsv`.
//!
//! Run with `cargo run --example make-inventory`. The substances are real; the company, its products, suppliers and
//! quantities are invented. Where each value comes from stands in `tests/fixtures/inventory-sources.tsv`. The same table
//! gives the same bytes. This program decides how the workbook looks, never what a cell holds: a text that is a plain
//! number with a decimal point becomes a number cell, everything else stays the text it is; an apostrophe before a number
//! keeps it a text, as in a spreadsheet. Rows of the table that are
//! marked `heading` or `total`, and rows without a name, are laid out in `between.rs`.

mod between;
mod layout;
mod lookup;

use layout::{Column, Holds, LAYOUTS, Layout, NOTES, Units, Visibility};
use rust_xlsxwriter::{
    Color, DocProperties, ExcelDateTime, Format, FormatAlign, FormatBorder, Formula, Workbook, Worksheet,
    XlsxError, utility::row_col_to_cell,
};
use std::collections::BTreeMap;
use std::error::Error;
use std::path::Path;

/// One row of the table: the text under each heading.
type Row<'a> = BTreeMap<&'a str, &'a str>;

fn main() -> Result<(), Box<dyn Error>> {
    let root = Path::new(env!("CARGO_MANIFEST_DIR"));
    let table = std::fs::read_to_string(root.join("tests/fixtures/inventory.tsv"))?;
    let rows = read_rows(&table)?;
    let mut workbook = Workbook::new();
    workbook.set_properties(
        &DocProperties::new()
            .set_title("Raw material inventory (invented company)")
            .set_company("Grenwick & Aldermoor Surface Technologies (invented)")
            .set_creation_datetime(&ExcelDateTime::from_ymd(2026, 11, 30)?),
    );
    for layout in &LAYOUTS {
        let of_sheet = rows.iter().filter(|row| text(row, "sheet") == layout.sheet);
        write_sheet(workbook.add_worksheet(), layout, of_sheet)?;
    }
    lookup::write(workbook.add_worksheet())?;
    write_notes(workbook.add_worksheet())?;
    workbook.save(root.join("inputs-example/inventory.xlsx"))?;
    Ok(())
}

fn read_rows(table: &str) -> Result<Vec<Row<'_>>, Box<dyn Error>> {
    let mut lines = table.lines();
    let headings: Vec<&str> = lines.next().ok_or("the table is empty")?.split('\t').collect();
    let mut rows = Vec::new();
    for (number, line) in (2..).zip(lines) {
        let cells: Vec<&str> = line.split('\t').collect();
        if cells.len() != headings.len() {
            return Err(format!("line {number} has {} cells, not {}", cells.len(), headings.len()).into());
        }
        rows.push(headings.iter().copied().zip(cells).collect());
    }
    Ok(rows)
}

fn text<'a>(row: &Row<'a>, field: &str) -> &'a str {
    row.get(field).copied().unwrap_or_default()
}

fn write_sheet<'a>(
    sheet: &mut Worksheet,
    layout: &Layout,
    rows: impl Iterator<Item = &'a Row<'a>>,
) -> Result<(), Box<dyn Error>> {
    sheet.set_name(layout.sheet)?;
    write_titles(sheet, layout)?;
    let header_row = u32::try_from(layout.titles.len())?;
    write_header(sheet, layout, header_row)?;
    let below_header = match layout.units {
        Units::InHeaders => header_row,
        Units::RowBelow => write_units(sheet, layout, header_row + 1)?,
    };
    let mut last_row = below_header;
    let mut tonnes = 0.0;
    for (place, row) in (below_header + 1..).zip(rows) {
        match text(row, "planted") {
            "heading" => between::write_heading(sheet, layout, place, text(row, "name"))?,
            "total" => between::write_total(sheet, layout, (below_header + 1, place), tonnes)?,
            _ if text(row, "name").is_empty() => {}
            _ => {
                write_row(sheet, layout, place, row)?;
                tonnes += text(row, "tonnes-per-year").parse().unwrap_or(0.0);
                last_row = place;
            }
        }
    }
    let last_column = u16::try_from(layout.columns.len().saturating_sub(1))?;
    sheet.autofilter(below_header, 0, last_row, last_column)?;
    sheet.set_freeze_panes(below_header + 1, 4)?;
    sheet.set_landscape().set_paper_size(8).set_print_fit_to_pages(3, 0);
    sheet.set_repeat_rows(header_row, below_header)?;
    Ok(())
}

fn write_row(sheet: &mut Worksheet, layout: &Layout, place: u32, row: &Row<'_>) -> Result<(), XlsxError> {
    for (column_place, column) in (0u16..).zip(layout.columns) {
        write_cell(sheet, (place, column_place), column, layout, text(row, column.field))?;
    }
    Ok(())
}

fn write_titles(sheet: &mut Worksheet, layout: &Layout) -> Result<(), XlsxError> {
    let large = Format::new().set_bold().set_font_size(14).set_font_color(Color::RGB(0x1F_3A4D));
    let small = Format::new().set_italic().set_font_color(Color::RGB(0x59_5959));
    for (place, title) in (0u32..).zip(layout.titles) {
        let format = if place == 0 { &large } else { &small };
        sheet.write_with_format(place, 0, *title, format)?;
    }
    Ok(())
}

fn write_header(sheet: &mut Worksheet, layout: &Layout, row: u32) -> Result<(), XlsxError> {
    let format = match layout.units {
        Units::InHeaders => header_format().set_border_bottom(FormatBorder::Medium),
        Units::RowBelow => header_format(),
    };
    sheet.set_row_height(row, 48)?;
    for (place, column) in (0u16..).zip(layout.columns) {
        sheet.set_column_width(place, column.width)?;
        if column.visibility == Visibility::Hidden {
            sheet.set_column_hidden(place)?;
        }
        sheet.write_with_format(row, place, column.header, &format)?;
    }
    Ok(())
}

/// The row of units below the header; gives its place back.
fn write_units(sheet: &mut Worksheet, layout: &Layout, row: u32) -> Result<u32, XlsxError> {
    let format = header_format().set_italic().set_border_bottom(FormatBorder::Medium);
    for (place, column) in (0u16..).zip(layout.columns) {
        sheet.write_with_format(row, place, column.unit, &format)?;
    }
    Ok(row)
}

fn header_format() -> Format {
    Format::new()
        .set_bold()
        .set_text_wrap()
        .set_align(FormatAlign::VerticalCenter)
        .set_background_color(Color::RGB(0xD9_E2E7))
}

fn write_cell(
    sheet: &mut Worksheet,
    (row, place): (u32, u16),
    column: &Column,
    layout: &Layout,
    text: &str,
) -> Result<(), XlsxError> {
    let format = cell_format(column, layout);
    match column.holds {
        _ if text.is_empty() => sheet.write_blank(row, place, &format)?,
        // A look-up that found nothing; what it looked for is of no account.
        Holds::Numbers(_) if text == "#N/A" => {
            let formula = Formula::new("VLOOKUP(\"none\",A4:B9,2,FALSE)").set_result(text);
            sheet.write_formula_with_format(row, place, formula, &format)?
        }
        Holds::Kilograms(_) => match text.parse() {
            Ok(tonnes) => sheet.write_with_format(row, place, kilograms(tonnes), &format)?,
            Err(_) => sheet.write_blank(row, place, &format)?,
        },
        Holds::TonnesOfKilograms(_) if text.parse::<f64>().is_ok() => {
            let left = row_col_to_cell(row, place.saturating_sub(1));
            let formula = Formula::new(format!("{left}/1000")).set_result(text);
            sheet.write_formula_with_format(row, place, formula, &format)?
        }
        Holds::Dates => write_date(sheet, (row, place), text, &format)?,
        Holds::RegistryNumbers if is_day(text) => {
            write_date(sheet, (row, place), text, &format.set_num_format(layout.date_format))?
        }
        Holds::Words => sheet.write_with_format(row, place, text.replace("\\n", "\n"), &format)?,
        // Registry numbers that lost their hyphens on the way are plain numbers, too.
        Holds::Numbers(_) | Holds::RegistryNumbers | Holds::TonnesOfKilograms(_) => match text.parse::<f64>()
        {
            Ok(number) => sheet.write_with_format(row, place, number, &format)?,
            Err(_) => sheet.write_with_format(row, place, text.trim_start_matches('\''), &format)?,
        },
    };
    Ok(())
}

/// Whether the spreadsheet took a registry number for a day: `1983-10-04` is no CAS number, its last group has two digits.
fn is_day(text: &str) -> bool {
    text.len() == 10 && text.split('-').nth(2).is_some_and(|last| last.len() == 2)
}

/// Whole grams are as exact as the table's tonnes.
fn kilograms(tonnes: f64) -> f64 {
    (tonnes * 1_000_000.0).round() / 1000.0
}

fn write_date<'a>(
    sheet: &'a mut Worksheet,
    (row, place): (u32, u16),
    text: &str,
    format: &Format,
) -> Result<&'a mut Worksheet, XlsxError> {
    sheet.write_with_format(row, place, &ExcelDateTime::parse_from_str(text)?, format)
}

fn cell_format(column: &Column, layout: &Layout) -> Format {
    let mut format =
        Format::new().set_border_bottom(FormatBorder::Hair).set_border_bottom_color(Color::RGB(0xBF_BFBF));
    format = match column.holds {
        Holds::Words | Holds::RegistryNumbers => format.set_indent(1),
        Holds::Numbers(number_format)
        | Holds::Kilograms(number_format)
        | Holds::TonnesOfKilograms(number_format) => {
            format.set_num_format(number_format).set_align(FormatAlign::Right)
        }
        Holds::Dates => format.set_num_format(layout.date_format).set_align(FormatAlign::Right),
    };
    match column.fill {
        Some(colour) => format.set_background_color(Color::RGB(colour)),
        None => format,
    }
}

fn write_notes(sheet: &mut Worksheet) -> Result<(), XlsxError> {
    let bold = Format::new().set_bold();
    let plain = Format::new().set_text_wrap().set_align(FormatAlign::Top);
    sheet.set_name("Read me")?;
    sheet.set_landscape().set_paper_size(9).set_print_fit_to_pages(1, 0);
    sheet.set_column_width(0, 120)?;
    for (place, note) in (0u32..).zip(NOTES) {
        let format = if place == 0 { &bold } else { &plain };
        sheet.set_row_height(place, 32)?;
        sheet.write_with_format(place, 0, note, format)?;
    }
    Ok(())
}
