//! The records of a part of an xlsb workbook: a type, a length, and the data. It does not know what a type means.

use std::io::{BufReader, Error, Read, Result};

/// No record is longer than this, in bytes: a text has at most 32,767 letters, each of which may change its font.
const LONGEST: u64 = 4 << 20;

/// The records of a part, one after the other.
pub(super) struct Records<Source: Read> {
    source: BufReader<Source>,
    data: Vec<u8>,
}

impl<Source: Read> Records<Source> {
    pub(super) fn new(source: Source) -> Self {
        Self { source: BufReader::with_capacity(1 << 16, source), data: Vec::new() }
    }

    /// The type and the data of the next record; none at the end of the part.
    pub(super) fn next(&mut self) -> Result<Option<(u16, &[u8])>> {
        let Some(first) = self.byte()? else {
            return Ok(None);
        };
        let mut kind = u16::from(first);
        if first >= 0x80 {
            kind = u16::from(first & 0x7F) | (u16::from(self.byte()?.ok_or_else(cut_off)? & 0x7F) << 7);
        }
        let length = self.length()?;
        self.data.clear();
        let read = self.source.by_ref().take(length).read_to_end(&mut self.data)?;
        if u64::try_from(read) == Ok(length) { Ok(Some((kind, &self.data))) } else { Err(cut_off()) }
    }

    /// Seven bits a byte, the lowest first, while the eighth bit is set; four bytes at most.
    fn length(&mut self) -> Result<u64> {
        let mut length = 0;
        for place in 0..4 {
            let byte = self.byte()?.ok_or_else(cut_off)?;
            length |= u64::from(byte & 0x7F) << (7 * place);
            if byte < 0x80 {
                break;
            }
        }
        if length <= LONGEST {
            Ok(length)
        } else {
            Err(Error::other(format!("a record claims to be {length} bytes long")))
        }
    }

    fn byte(&mut self) -> Result<Option<u8>> {
        let mut byte = [0];
        loop {
            match self.source.read(&mut byte) {
                Ok(0) => return Ok(None),
                Ok(_) => return Ok(byte.first().copied()),
                Err(error) if error.kind() == std::io::ErrorKind::Interrupted => {}
                Err(error) => return Err(error),
            }
        }
    }
}

fn cut_off() -> Error {
    Error::other("it ends in the middle of a record")
}

#[cfg(test)]
mod tests {
    use super::Records;

    #[test]
    fn types_and_lengths_take_as_many_bytes_as_they_need() {
        let mut part = vec![0x05, 2, 7, 8, 0x91, 0x01, 0, 0x07, 0x80, 0x01];
        part.extend([9; 128]);
        let mut records = Records::new(part.as_slice());
        assert_eq!(records.next().unwrap(), Some((5, &[7, 8][..])));
        assert_eq!(records.next().unwrap(), Some((145, &[][..])));
        assert_eq!(records.next().unwrap(), Some((7, &[9; 128][..])));
        assert_eq!(records.next().unwrap(), None);
    }

    #[test]
    fn a_record_that_is_cut_off_or_far_too_long_is_an_error() {
        for (part, what) in [
            (&[0x91][..], "it ends in the middle of a record"),
            (&[0x05], "it ends in the middle of a record"),
            (&[0x05, 3, 1, 2], "it ends in the middle of a record"),
            (&[0x05, 0xFF, 0xFF, 0xFF, 0x7F], "a record claims to be 268435455 bytes long"),
        ] {
            assert_eq!(Records::new(part).next().unwrap_err().to_string(), what);
        }
    }
}
