//! Rows of an inventory sheet that hold no substance: headings between groups, and the total at the end.

use rust_xlsxwriter::{Color, Format, FormatBorder, Formula, Worksheet, XlsxError, utility::row_col_to_cell};

use crate::layout::{Heading, Holds, Layout};

/// Writes a heading where the sheet has its headings.
pub fn write_heading(
    sheet: &mut Worksheet,
    layout: &Layout,
    row: u32,
    heading: &str,
) -> Result<(), XlsxError> {
    let format = Format::new().set_bold().set_background_color(Color::RGB(0xEF_F3F5));
    match layout.heading {
        Heading::Across(columns) => {
            sheet.merge_range(row, 0, row, columns.saturating_sub(1), heading, &format)?;
        }
        Heading::AmongNames => {
            let columns = (0u16..).zip(layout.columns);
            for (place, _) in columns.filter(|(_, column)| column.field == "name") {
                sheet.write_with_format(row, place, heading, &format)?;
            }
        }
    }
    Ok(())
}

/// Writes the sum of the kilograms and tonnes above; `tonnes` is what a spreadsheet program works out.
pub fn write_total(
    sheet: &mut Worksheet,
    layout: &Layout,
    (first, row): (u32, u32),
    tonnes: f64,
) -> Result<(), XlsxError> {
    let format = Format::new().set_bold().set_border_top(FormatBorder::Thin);
    sheet.write_with_format(row, 0, "Total", &format)?;
    for (place, column) in (0u16..).zip(layout.columns) {
        let (result, number_format) = match column.holds {
            Holds::Kilograms(number_format) => (tonnes * 1000.0, number_format),
            Holds::TonnesOfKilograms(number_format) => (tonnes, number_format),
            Holds::Words | Holds::RegistryNumbers | Holds::Numbers(_) | Holds::Dates => continue,
        };
        let (top, bottom) = (row_col_to_cell(first, place), row_col_to_cell(row.saturating_sub(1), place));
        let rounded = (result * 1_000_000.0).round() / 1_000_000.0;
        let formula = Formula::new(format!("SUM({top}:{bottom})")).set_result(rounded.to_string());
        let format = format.clone().set_num_format(number_format);
        sheet.write_formula_with_format(row, place, formula, &format)?;
    }
    Ok(())
}
