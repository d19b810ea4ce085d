//! The sheet of the example that is a small look-up of the company's own, and no inventory.

use rust_xlsxwriter::{Format, Worksheet, XlsxError};

/// Lines of texts; a line of one text is a title, the first line after it a header.
const LINES: [&[&str]; 14] = [
    &["Sites and storage units, internal codes"],
    &["Site code", "Site", "Tank farm", "Drum store", "Stock list kept by"],
    &["N", "North", "yes", "yes", "purchasing, in this workbook"],
    &["S", "Süd", "no", "yes", "Einkauf, in this workbook"],
    &["W", "West depot", "no", "yes", "site-stock.ods"],
    &[],
    &["Storage units"],
    &["Unit", "Meaning", "Fill"],
    &["IBC", "container", "1000 L"],
    &["DR", "steel drum", "200 L"],
    &["CN", "can", "25 L"],
    &["SK", "paper sack", "25 kg"],
    &["BX", "carton of bottles", "6 x 1 L"],
    &["GB", "glass bottle, laboratory", "0.5 L"],
];

/// Writes the sheet.
pub fn write(sheet: &mut Worksheet) -> Result<(), XlsxError> {
    let bold = Format::new().set_bold();
    let plain = Format::new();
    sheet.set_name("Sites and units")?;
    sheet.set_column_width(1, 26)?;
    sheet.set_column_width(4, 30)?;
    let mut title_above = false;
    for (row, line) in (0u32..).zip(LINES) {
        let is_title = line.len() == 1;
        let format = if is_title || title_above { &bold } else { &plain };
        for (column, text) in (0u16..).zip(line) {
            sheet.write_string_with_format(row, column, *text, format)?;
        }
        title_above = is_title;
    }
    Ok(())
}
