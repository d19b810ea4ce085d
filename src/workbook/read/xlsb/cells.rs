//! The cells of an xlsb sheet, from their records.

use std::sync::Arc;

use crate::fault::SheetFault;
use crate::workbook::place::{CellRef, LAST_COLUMN, LAST_ROW};
use crate::workbook::read::binary::bytes::{byte, long, real, short};
use crate::workbook::read::binary::numbers::short_number;
use crate::workbook::read::binary::texts::{SharedTexts, wide_text};
use crate::workbook::read::binary::{Origin, Stored, StoredValue};

/// Follows the rows and columns of a sheet, so that no cell is misplaced or doubled.
pub(super) struct Cells<'book> {
    sheet: Arc<str>,
    texts: &'book SharedTexts,
    row: Option<u32>,
    column: Option<u16>,
}

/// What a record among the cells is.
pub(super) enum Taken {
    Cell(Stored),
    /// A row begins, with what the user did to it.
    Row(RowFlags),
    /// The last cell has been.
    End,
    /// Something that stands beside cells.
    Other,
}

/// What the user did to a row.
pub(super) struct RowFlags {
    pub(super) hidden: bool,
    pub(super) own_height: bool,
}

impl<'book> Cells<'book> {
    pub(super) fn new(sheet: Arc<str>, texts: &'book SharedTexts) -> Self {
        Self { sheet, texts, row: None, column: None }
    }

    /// Takes in the next record.
    pub(super) fn take(&mut self, kind: u16, data: &[u8]) -> Result<Taken, SheetFault> {
        match kind {
            0x0000 => self.open_row(data).map(Taken::Row),
            0x0001..=0x000B | 0x003E => self.read_cell(kind, long(data, 0), data.get(4..)).map(Taken::Cell),
            // Cells that leave out their column, since they stand right of the one before; otherwise as 1 to 7.
            0x000C..=0x0012 => {
                let column = self.column.map_or(0, |last| u32::from(last) + 1);
                self.read_cell(kind - 0x000B, Some(column), Some(data)).map(Taken::Cell)
            }
            0x0092 => Ok(Taken::End),
            _ => Ok(Taken::Other),
        }
    }

    fn open_row(&mut self, data: &[u8]) -> Result<RowFlags, SheetFault> {
        let row = long(data, 0).ok_or_else(|| self.whole("has a row that is cut off"))?;
        if row > LAST_ROW {
            return Err(self.no_such_cell(&format!("row {}", u64::from(row) + 1)));
        }
        if self.row.is_some_and(|seen| row <= seen) {
            return Err(self.whole(&format!("stores row {} twice or out of order", row + 1)));
        }
        self.row = Some(row);
        self.column = None;
        let flags = byte(data, 11).unwrap_or(0);
        Ok(RowFlags { hidden: flags & 0x10 != 0, own_height: flags & 0x20 != 0 })
    }

    /// Reads a cell from what stands behind its column: its format, and then its value.
    fn read_cell(
        &mut self,
        kind: u16,
        column: Option<u32>,
        data: Option<&[u8]>,
    ) -> Result<Stored, SheetFault> {
        let row = self.row.ok_or_else(|| self.whole("stores a cell outside its rows"))?;
        let data = data.unwrap_or_default();
        let (Some(column), Some(style)) = (column, long(data, 0)) else {
            return Err(self.whole(&format!("has a cell in row {} that is cut off", row + 1)));
        };
        let Some(column) = u16::try_from(column).ok().filter(|column| *column <= LAST_COLUMN) else {
            return Err(self.no_such_cell(&format!("row {}, column {}", row + 1, u64::from(column) + 1)));
        };
        let cell = || CellRef { sheet: Arc::clone(&self.sheet), row, column };
        if self.column.is_some_and(|last| column <= last) {
            return Err(SheetFault::OutOfOrder { cell: cell() });
        }
        let value = self
            .value(kind, data)
            .and_then(|value| value.ok_or_else(|| "a record that is cut off".to_owned()))
            .map_err(|what| SheetFault::Unreadable { cell: cell(), what })?;
        self.column = Some(column);
        let origin = if (0x0008..=0x000B).contains(&kind) { Origin::Formula } else { Origin::Typed };
        // The upper byte is a flag about phonetic guides.
        Ok(Stored { row, column, style: style & 0x00FF_FFFF, value, origin })
    }

    /// What stands after the format; none if the record is too short for it.
    fn value(&self, kind: u16, data: &[u8]) -> Result<Option<StoredValue>, String> {
        Ok(match kind {
            0x0002 => long(data, 4).map(|number| StoredValue::Number(short_number(number))),
            0x0003 | 0x000B => byte(data, 4).map(StoredValue::Error),
            0x0004 | 0x000A => byte(data, 4).map(|boolean| StoredValue::Boolean(boolean != 0)),
            0x0005 => real(data, 4).map(StoredValue::Number),
            0x0009 => real(data, 4).zip(short(data, 12)).map(|(number, flags)| {
                // Programs that write formulas without computing them store 0 and ask for it to be computed.
                let asked = flags & 2 != 0 && number.to_bits() == 0;
                if asked { StoredValue::NoResult } else { StoredValue::Number(number) }
            }),
            0x0006 | 0x0008 => own_text(data, 4),
            0x003E => own_text(data, 5),
            0x0007 => match long(data, 4) {
                Some(number) => Some(self.shared_text(number)?),
                None => None,
            },
            _ => Some(StoredValue::Blank),
        })
    }

    fn shared_text(&self, number: u32) -> Result<StoredValue, String> {
        self.texts
            .get(number)
            .map(|text| StoredValue::Text(text.to_owned()))
            .ok_or_else(|| format!("a reference to text number `{number}`, which is not stored"))
    }

    pub(super) fn whole(&self, what: &str) -> SheetFault {
        SheetFault::Whole { sheet: self.sheet.to_string(), what: what.to_owned() }
    }

    fn no_such_cell(&self, reference: &str) -> SheetFault {
        SheetFault::NoSuchCell { sheet: self.sheet.to_string(), reference: reference.to_owned() }
    }
}

fn own_text(data: &[u8], at: usize) -> Option<StoredValue> {
    let mut text = String::new();
    wide_text(data, at, &mut text).map(|_end| StoredValue::Text(text))
}
