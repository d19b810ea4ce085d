//! The stream of records of an xls workbook: a type, a length, and the data. It does not know what a type means.

use crate::workbook::read::binary::bytes::short;

/// A record that goes on with the one before it.
const CONTINUE: u16 = 0x003C;

/// One record.
#[derive(Debug, Clone, Copy)]
pub(super) struct Record<'book> {
    /// Its type.
    pub(super) kind: u16,
    /// Its data, without those of records that go on with it.
    pub(super) data: &'book [u8],
    /// Where it begins in the stream.
    pub(super) at: usize,
    /// Where the next record begins.
    pub(super) end: usize,
}

/// Where the records end before their time.
#[derive(Debug, Clone, Copy, PartialEq, Eq)]
pub(super) struct CutOff;

/// The records of a stream from some place on, without those that go on with another.
#[derive(Debug, Clone)]
pub(super) struct Records<'book> {
    stream: &'book [u8],
    at: usize,
}

impl<'book> Records<'book> {
    pub(super) fn new(stream: &'book [u8], at: usize) -> Self {
        Self { stream, at }
    }

    /// The data of a record in pieces: its own, and those of the records that go on with it.
    pub(super) fn pieces(&self, record: &Record<'book>) -> Result<Vec<&'book [u8]>, CutOff> {
        let mut pieces = vec![record.data];
        let mut at = record.end;
        while short(self.stream, at) == Some(CONTINUE) {
            let next = record_at(self.stream, at)?;
            pieces.push(next.data);
            at = next.end;
        }
        Ok(pieces)
    }
}

impl<'book> Iterator for Records<'book> {
    type Item = Result<Record<'book>, CutOff>;

    fn next(&mut self) -> Option<Self::Item> {
        loop {
            if self.at >= self.stream.len() {
                return None;
            }
            match record_at(self.stream, self.at) {
                Ok(record) => {
                    self.at = record.end;
                    if record.kind != CONTINUE {
                        return Some(Ok(record));
                    }
                }
                Err(cut_off) => {
                    self.at = self.stream.len();
                    return Some(Err(cut_off));
                }
            }
        }
    }
}

/// The record that begins at a place.
pub(super) fn record_at(stream: &[u8], at: usize) -> Result<Record<'_>, CutOff> {
    let kind = short(stream, at).ok_or(CutOff)?;
    let length = short(stream, at + 2).ok_or(CutOff)?;
    let begin = at + 4;
    let end = begin + usize::from(length);
    let data = stream.get(begin..end).ok_or(CutOff)?;
    Ok(Record { kind, data, at, end })
}
