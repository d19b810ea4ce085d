//! A text in any encoding, given as UTF-8 while it is read.

use std::io::Read;

use encoding_rs::{Decoder, Encoding};

use super::PORTION;

/// Reads until the buffer is full or the source at its end.
pub(super) fn fill(source: &mut impl Read, buffer: &mut [u8]) -> std::io::Result<usize> {
    let mut filled = 0;
    while let Some(room) = buffer.get_mut(filled..).filter(|room| !room.is_empty()) {
        match source.read(room) {
            Ok(0) => break,
            Ok(count) => filled += count,
            Err(error) if error.kind() == std::io::ErrorKind::Interrupted => {}
            Err(error) => return Err(error),
        }
    }
    Ok(filled)
}

/// Gives a text in whatever encoding as UTF-8, without its mark; what cannot be decoded becomes `U+FFFD`.
pub(in crate::workbook) struct Decoded<R> {
    source: R,
    decoder: Decoder,
    bytes: Vec<u8>,
    bytes_left: std::ops::Range<usize>,
    text: Vec<u8>,
    text_left: std::ops::Range<usize>,
    ended: bool,
}

impl<R: Read> Decoded<R> {
    pub(in crate::workbook) fn new(source: R, encoding: &'static Encoding) -> Self {
        Self {
            source,
            decoder: encoding.new_decoder_with_bom_removal(),
            bytes: vec![0; PORTION],
            bytes_left: 0..0,
            text: vec![0; PORTION],
            text_left: 0..0,
            ended: false,
        }
    }

    fn decode_more(&mut self) -> std::io::Result<()> {
        while self.text_left.is_empty() && !self.ended {
            if self.bytes_left.is_empty() {
                self.bytes_left = 0..fill(&mut self.source, &mut self.bytes)?;
            }
            let at_end = self.bytes_left.is_empty();
            let bytes = self.bytes.get(self.bytes_left.clone()).unwrap_or_default();
            let (result, read, written, _replaced) =
                self.decoder.decode_to_utf8(bytes, &mut self.text, at_end);
            self.bytes_left.start += read;
            self.text_left = 0..written;
            self.ended = at_end && result == encoding_rs::CoderResult::InputEmpty;
        }
        Ok(())
    }
}

impl<R: Read> Read for Decoded<R> {
    fn read(&mut self, buffer: &mut [u8]) -> std::io::Result<usize> {
        self.decode_more()?;
        let text = self.text.get(self.text_left.clone()).unwrap_or_default();
        let count = text.len().min(buffer.len());
        if let (Some(to), Some(from)) = (buffer.get_mut(..count), text.get(..count)) {
            to.copy_from_slice(from);
        }
        self.text_left.start += count;
        Ok(count)
    }
}
