//! How a sheet is laid out: widths, folded columns, panes and filters.

use super::{AnnotatedWorkbook, SheetId};
use crate::fault::FileFault;
use crate::workbook::survey::ColumnLayout;

impl AnnotatedWorkbook {
    /// Sets the width of columns, or hides them.
    pub fn set_columns(&mut self, sheet: SheetId, layout: ColumnLayout) -> Result<(), FileFault> {
        if let (Some(width), Some(state)) = (layout.width, self.sheets.get_mut(sheet.0)) {
            state.widths.extend((layout.first..=layout.last).map(|column| (column, width)));
        }
        self.on_sheet(sheet, |sheet| {
            if let Some(width) = layout.width {
                sheet.set_column_range_width_pixels(layout.first, layout.last, pixels(width))?;
            }
            if layout.hidden {
                sheet.set_column_range_hidden(layout.first, layout.last)?;
            }
            Ok(())
        })
    }

    /// Sets the width of columns, in characters of the usual font, padding included.
    pub fn set_column_width(
        &mut self,
        sheet: SheetId,
        first: u16,
        last: u16,
        width: f64,
    ) -> Result<(), FileFault> {
        self.set_columns(sheet, ColumnLayout { first, last, width: Some(width), hidden: false })
    }

    /// Folds columns away under an outline, which the user opens with a click.
    pub fn group_columns(&mut self, sheet: SheetId, first: u16, last: u16) -> Result<(), FileFault> {
        self.on_sheet(sheet, |sheet| {
            // The library notes the depth of the outline for columns it knows already only; hiding makes them known,
            // and a folded column is hidden anyway.
            sheet.set_column_range_hidden(first, last)?;
            sheet.group_columns_collapsed(first, last)?;
            Ok(())
        })
    }

    /// Keeps the first rows and columns in place when the user scrolls.
    pub fn freeze(&mut self, sheet: SheetId, rows: u32, columns: u16) -> Result<(), FileFault> {
        self.on_sheet(sheet, |sheet| {
            sheet.set_freeze_panes(rows, columns)?;
            Ok(())
        })
    }

    /// Prints a sheet across, one page wide, with its first rows up to the header on every page.
    pub fn print_across(&mut self, sheet: SheetId, header_row: Option<u32>) -> Result<(), FileFault> {
        self.on_sheet(sheet, |sheet| {
            sheet.set_landscape();
            // As many pages high as it takes.
            sheet.set_print_fit_to_pages(1, 0);
            if let Some(row) = header_row {
                sheet.set_repeat_rows(row, row)?;
            }
            Ok(())
        })
    }

    /// Gives the rows below a header their filter buttons.
    pub fn filter(
        &mut self,
        sheet: SheetId,
        header_row: u32,
        last_row: u32,
        last_column: u16,
    ) -> Result<(), FileFault> {
        self.on_sheet(sheet, |sheet| {
            sheet.autofilter(header_row, 0, last_row, last_column)?;
            Ok(())
        })
    }
}

/// A width in characters of 7 pixels, the widest digit of the usual font.
fn pixels(width: f64) -> u32 {
    #[expect(
        clippy::cast_possible_truncation,
        clippy::cast_sign_loss,
        reason = "bounded just before to the widths a column can have"
    )]
    let pixels = (width.clamp(0.0, 255.0) * 7.0).round() as u32;
    pixels
}
