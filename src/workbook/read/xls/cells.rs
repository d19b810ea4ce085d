//! The cells of an xls sheet, from their records.

use std::ops::RangeInclusive;

use super::globals::{Computed, Globals};
use super::records::{Record, Records, record_at};
use super::texts::Pieces;
use crate::workbook::read::binary::bytes::{byte, long, real, short};
use crate::workbook::read::binary::numbers::short_number;
use crate::workbook::read::binary::{Origin, Stored, StoredValue};

/// The last column a sheet of the format has (`IV`), counted from 0.
pub(super) const LAST_COLUMN: u16 = 255;

/// A cell that cannot be read, and what it holds instead of a value.
#[derive(Debug, Clone, PartialEq, Eq)]
pub(super) struct Unreadable {
    pub(super) row: u16,
    pub(super) column: u16,
    pub(super) what: String,
}

/// The cells one record stores, without what stands in them.
pub(super) fn places(record: &Record<'_>) -> Option<(u16, RangeInclusive<u16>)> {
    let row = short(record.data, 0)?;
    let first = short(record.data, 2)?;
    match record.kind {
        // Several blanks or numbers side by side; the last column stands at the end.
        0x00BE | 0x00BD => {
            let last = short(record.data, record.data.len().checked_sub(2)?)?;
            let size = if record.kind == 0x00BE { 2 } else { 6 };
            let room = (record.data.len() - 6) / size;
            let cells = usize::from(last.checked_sub(first)?) + 1;
            (room == cells).then_some((row, first..=last))
        }
        _ => Some((row, first..=first)),
    }
}

/// Whether a record stores cells.
pub(super) fn stores_cells(kind: u16) -> bool {
    matches!(kind, 0x0201 | 0x00BE | 0x0203 | 0x027E | 0x00BD | 0x00FD | 0x0204 | 0x00D6 | 0x0205 | 0x0006)
}

/// Reads one of the cells a record stores.
pub(super) fn read_cell(
    globals: &Globals,
    stream: &[u8],
    record: &Record<'_>,
    column: u16,
) -> Result<Stored, Unreadable> {
    let row = short(record.data, 0).unwrap_or(0);
    let unreadable = |what: String| Unreadable { row, column, what };
    let cut_off = || unreadable("a record that is cut off".to_owned());
    let reader = Reader { globals, stream, record };
    let (style, value) = match record.kind {
        0x00BE | 0x00BD => {
            let first = short(record.data, 2).unwrap_or(0);
            let place = usize::from(column.saturating_sub(first));
            reader.one_of_several(place).ok_or_else(cut_off)?
        }
        _ => {
            let style = short(record.data, 4).ok_or_else(cut_off)?;
            (style, reader.value().map_err(unreadable)?)
        }
    };
    let origin = if record.kind == 0x0006 { Origin::Formula } else { Origin::Typed };
    Ok(Stored { row: row.into(), column, style: style.into(), value, origin })
}

struct Reader<'book> {
    globals: &'book Globals,
    stream: &'book [u8],
    record: &'book Record<'book>,
}

impl Reader<'_> {
    fn one_of_several(&self, place: usize) -> Option<(u16, StoredValue)> {
        let data = self.record.data;
        if self.record.kind == 0x00BE {
            return Some((short(data, 4 + 2 * place)?, StoredValue::Blank));
        }
        let number = short_number(long(data, 6 + 6 * place)?);
        Some((short(data, 4 + 6 * place)?, StoredValue::Number(number)))
    }

    fn value(&self) -> Result<StoredValue, String> {
        let data = self.record.data;
        let short_of = || "a record that is cut off".to_owned();
        Ok(match self.record.kind {
            0x0203 => StoredValue::Number(real(data, 6).ok_or_else(short_of)?),
            0x027E => StoredValue::Number(short_number(long(data, 6).ok_or_else(short_of)?)),
            0x00FD => {
                let number = long(data, 6).ok_or_else(short_of)?;
                let text =
                    self.globals.texts.get(number).ok_or_else(|| {
                        format!("a reference to text number `{number}`, which is not stored")
                    })?;
                StoredValue::Text(text.to_owned())
            }
            0x0204 | 0x00D6 => StoredValue::Text(self.text_after(6)?),
            0x0205 => {
                let code = byte(data, 6).ok_or_else(short_of)?;
                match byte(data, 7).ok_or_else(short_of)? {
                    0 => StoredValue::Boolean(code != 0),
                    _ => StoredValue::Error(code),
                }
            }
            0x0006 => self.result()?,
            _ => StoredValue::Blank,
        })
    }

    /// A text in the record itself and those that go on with it, after `head` bytes. Where its font changes stands behind
    /// it and is passed over.
    fn text_after(&self, head: usize) -> Result<String, String> {
        let cut_off = || "a text that is cut off".to_owned();
        let records = Records::new(self.stream, self.record.at);
        let mut pieces = Pieces::new(records.pieces(self.record).map_err(|_cut_off| cut_off())?);
        pieces.skip(head).ok_or_else(cut_off)?;
        pieces.text(self.globals.version, self.globals.alphabet)
    }

    /// The stored result of a formula (MS-XLS 2.5.133, `FormulaValue`).
    fn result(&self) -> Result<StoredValue, String> {
        let data = self.record.data;
        let short_of = || "a formula that is cut off".to_owned();
        let flags = short(data, 14).ok_or_else(short_of)?;
        if short(data, 12) != Some(0xFFFF) {
            let number = real(data, 6).ok_or_else(short_of)?;
            // Programs that write formulas without computing them store 0 and ask for it to be computed.
            let asked = flags & 2 != 0 && number.to_bits() == 0;
            return Ok(if asked { StoredValue::NoResult } else { StoredValue::Number(number) });
        }
        let code = byte(data, 8).ok_or_else(short_of)?;
        Ok(match byte(data, 6).ok_or_else(short_of)? {
            0 => self.text_result()?,
            1 => StoredValue::Boolean(code != 0),
            2 => StoredValue::Error(code),
            // An empty text; but also what those programs store that do not compute.
            3 if self.globals.computed == Computed::Said => StoredValue::Text(String::new()),
            3 => StoredValue::NoResult,
            other => return Err(format!("a result of the unknown type {other}")),
        })
    }

    /// A text result stands in a record of its own, behind those that belong to the formula.
    fn text_result(&self) -> Result<StoredValue, String> {
        for record in Records::new(self.stream, self.record.end) {
            let record = record.map_err(|_cut_off| "a formula that is cut off".to_owned())?;
            match record.kind {
                0x0207 => {
                    let reader = Reader { record: &record, ..*self };
                    return reader.text_after(0).map(StoredValue::Text);
                }
                // A formula shared with other cells, an array or a table.
                0x04BC | 0x0221 | 0x0236 => {}
                _ => break,
            }
        }
        Err("a formula whose text is not stored".to_owned())
    }
}

/// The cells of a sheet in order of row and column, each by its record.
pub(super) struct Ordered(Vec<(u16, u16, u32)>);

impl Ordered {
    /// Orders cells by their places; the first place that is taken twice is the error.
    pub(super) fn new(mut cells: Vec<(u16, u16, u32)>) -> Result<Self, (u16, u16)> {
        cells.sort_unstable();
        let twice = cells.windows(2).find_map(|pair| match pair {
            [one, next] if (one.0, one.1) == (next.0, next.1) => Some((one.0, one.1)),
            _ => None,
        });
        twice.map_or(Ok(Self(cells)), Err)
    }

    /// Each cell in turn.
    pub(super) fn cells<'book>(
        &'book self,
        globals: &'book Globals,
        stream: &'book [u8],
    ) -> impl Iterator<Item = Result<Stored, Unreadable>> + 'book {
        self.0.iter().map(move |(row, column, at)| {
            let (row, column) = (*row, *column);
            let record = usize::try_from(*at).ok().and_then(|at| record_at(stream, at).ok());
            let Some(record) = record else {
                return Err(Unreadable { row, column, what: "a record that is cut off".to_owned() });
            };
            read_cell(globals, stream, &record, column)
        })
    }
}
