//! Our own sheets and columns, laid out and written line by line.

use crate::fault::{FileFault, Refusal};
use crate::report::{Entry, EntryContent, REASONING_COLUMNS, Table};
use crate::run::plan::SheetPlan;
use crate::workbook::{AnnotatedWorkbook, Look, SheetId, Target, Value, Visibility};

/// A sheet of ours that grows row by row, and goes on in another at the format's row limit.
pub(crate) struct SheetWriter {
    pub(crate) name: &'static str,
    pub(crate) sheet: SheetId,
    pub(crate) next_row: u32,
    pub(crate) part: u32,
}

pub(crate) fn span(sheet: &SheetPlan) -> Option<(String, u32, u16, Vec<String>)> {
    let screened = sheet.screened.as_ref()?;
    let headers = screened.added.headers.clone();
    Some((sheet.name.to_string(), screened.recognised.header_row, screened.first_added, headers))
}

pub(crate) fn lay_out_added(
    workbook: &mut AnnotatedWorkbook,
    id: SheetId,
    sheet: &SheetPlan,
) -> Result<(), FileFault> {
    let Some(screened) = &sheet.screened else {
        return Ok(());
    };
    for (column, width) in (screened.first_added..).zip(&screened.added.widths) {
        workbook.set_column_width(id, column, column, *width)?;
    }
    for (first, last) in &screened.added.folded {
        let place = |offset: usize| u16::try_from(usize::from(screened.first_added) + offset).ok();
        if let (Some(first), Some(last)) = (place(*first), place(*last)) {
            workbook.group_columns(id, first, last)?;
        }
    }
    workbook.freeze(id, screened.recognised.header_row + 1, 0)
}

pub(crate) fn new_reasoning_sheet(
    workbook: &mut AnnotatedWorkbook,
    part: u32,
) -> Result<SheetWriter, FileFault> {
    let name = "Reasoning";
    let title = if part == 1 { name.to_owned() } else { format!("{name} {part}") };
    let sheet = workbook.add_sheet(&title, Visibility::Visible)?;
    for (column, (header, width)) in (0u16..).zip(REASONING_COLUMNS) {
        workbook.set_column_width(sheet, column, column, width)?;
        workbook.write(sheet, 0, column, &Value::Text(header), Look::Header)?;
    }
    workbook.freeze(sheet, 1, 0)?;
    workbook.print_across(sheet, Some(0))?;
    Ok(SheetWriter { name, sheet, next_row: 1, part })
}

pub(crate) fn write_line(
    workbook: &mut AnnotatedWorkbook,
    writer: &mut SheetWriter,
    line: &[Entry],
) -> Result<(), Refusal> {
    for (column, entry) in (0u16..).zip(line) {
        write_entry(workbook, writer.sheet, writer.next_row, column, entry)?;
    }
    writer.next_row += 1;
    Ok(())
}

pub(crate) fn write_table(workbook: &mut AnnotatedWorkbook, table: &Table) -> Result<(), FileFault> {
    let sheet = workbook.add_sheet(table.name, Visibility::Visible)?;
    for (column, width) in (0u16..).zip(&table.widths) {
        workbook.set_column_width(sheet, column, column, *width)?;
    }
    workbook.print_across(sheet, table.frozen_rows.checked_sub(1))?;
    if table.frozen_rows > 0 {
        workbook.freeze(sheet, table.frozen_rows, 0)?;
    }
    for (row, entries) in (0u32..).zip(&table.rows) {
        for (column, entry) in (0u16..).zip(entries) {
            write_entry(workbook, sheet, row, column, entry)?;
        }
    }
    Ok(())
}

pub(crate) fn write_entry(
    workbook: &mut AnnotatedWorkbook,
    sheet: SheetId,
    row: u32,
    column: u16,
    entry: &Entry,
) -> Result<(), FileFault> {
    let address;
    let value = match &entry.content {
        EntryContent::Empty => Value::Empty,
        EntryContent::Text(text) => Value::Text(text),
        EntryContent::Number(number) => Value::Number(*number),
        EntryContent::Link(cell) => {
            address = cell.address();
            Value::Link { text: &address, target: Target::Cell(cell) }
        }
    };
    workbook.write(sheet, row, column, &value, entry.look)
}
