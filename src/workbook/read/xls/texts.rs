//! Texts of an xls workbook: in UTF-16 and its short form since 1997, in the bytes of an alphabet before.

use encoding_rs::{Encoding, WINDOWS_1252};

use crate::workbook::read::binary::bytes::{long, short};
use crate::workbook::read::binary::texts::SharedTexts;

/// The version of the format.
#[derive(Debug, Clone, Copy, PartialEq, Eq)]
pub(super) enum Version {
    /// From 1993 and 1995: texts in the bytes of an alphabet.
    Biff5,
    /// From 1997: texts in UTF-16.
    Biff8,
}

/// Which letters the bytes of a text stand for.
#[derive(Debug, Clone, Copy)]
pub(super) enum Alphabet {
    /// The workbook does not say.
    NotSaid,
    /// It says so by a number that is known.
    Known(&'static Encoding),
    /// It says so by a number that is not.
    Unknown(u16),
}

impl Alphabet {
    /// The alphabet of a code page (MS-XLS 2.4.52).
    pub(super) fn of_code_page(number: u16) -> Self {
        let number = match number {
            // Plain letters; older writers' numbers for those of Windows and of the Macintosh.
            367 | 0x8001 => 1252,
            0x8000 => 10000,
            other => other,
        };
        codepage::to_encoding(number).map_or(Self::Unknown(number), Self::Known)
    }

    /// The text of some bytes; what is wrong if it cannot be told.
    pub(super) fn text_of(self, bytes: &[u8]) -> Result<String, String> {
        let encoding = match self {
            Self::Known(encoding) => encoding,
            Self::Unknown(number) if !bytes.is_ascii() => {
                return Err(format!("a text in the unknown alphabet number {number}"));
            }
            Self::NotSaid | Self::Unknown(_) => WINDOWS_1252,
        };
        let (text, damaged) = encoding.decode_without_bom_handling(bytes);
        if damaged {
            return Err(format!(
                "a text with bytes that are no letters of its alphabet, {}",
                encoding.name()
            ));
        }
        Ok(text.into_owned())
    }
}

/// The data of a record and of those that go on with it, read one after the other.
#[derive(Debug, Clone)]
pub(super) struct Pieces<'book> {
    piece: &'book [u8],
    later: std::vec::IntoIter<&'book [u8]>,
}

impl<'book> Pieces<'book> {
    pub(super) fn new(pieces: Vec<&'book [u8]>) -> Self {
        let mut later = pieces.into_iter();
        Self { piece: later.next().unwrap_or_default(), later }
    }

    /// Whether nothing is left.
    pub(super) fn is_at_end(&mut self) -> bool {
        while self.piece.is_empty() {
            match self.later.next() {
                Some(next) => self.piece = next,
                None => return true,
            }
        }
        false
    }

    /// Some bytes that are all in one piece.
    fn take(&mut self, count: usize) -> Option<&'book [u8]> {
        if self.is_at_end() {
            return None;
        }
        let (taken, rest) = self.piece.split_at_checked(count)?;
        self.piece = rest;
        Some(taken)
    }

    fn byte(&mut self) -> Option<u8> {
        self.take(1)?.first().copied()
    }

    pub(super) fn short(&mut self) -> Option<u16> {
        short(self.take(2)?, 0)
    }

    fn long(&mut self) -> Option<u32> {
        long(self.take(4)?, 0)
    }

    /// Passes over some bytes, which may go on in later pieces.
    pub(super) fn skip(&mut self, mut count: usize) -> Option<()> {
        while count > 0 {
            if self.is_at_end() {
                return None;
            }
            let here = count.min(self.piece.len());
            self.piece = self.piece.get(here..)?;
            count -= here;
        }
        Some(())
    }

    /// Characters in UTF-16 or its short form, added to `text`; each further piece says anew which of the two it is.
    fn characters(&mut self, mut count: usize, mut wide: bool, text: &mut String) -> Option<()> {
        let mut units = Vec::new();
        while count > 0 {
            if self.piece.is_empty() {
                self.piece = self.later.next()?;
                wide = self.byte()? & 1 != 0;
                continue;
            }
            let size = if wide { 2 } else { 1 };
            let here = count.min(self.piece.len() / size);
            if here == 0 {
                return None;
            }
            let bytes = self.take(here * size)?;
            if wide {
                units.extend(bytes.chunks_exact(2).filter_map(|pair| short(pair, 0)));
            } else {
                units.extend(bytes.iter().copied().map(u16::from));
            }
            count -= here;
        }
        text.extend(char::decode_utf16(units).map(|unit| unit.unwrap_or(char::REPLACEMENT_CHARACTER)));
        Some(())
    }

    /// A text with everything it may have around it: changes of font, and hints on how to say it.
    fn rich_text(&mut self, text: &mut String) -> Option<Font> {
        let count = usize::from(self.short()?);
        let flags = self.byte()?;
        let runs = if flags & 8 == 0 { 0 } else { usize::from(self.short()?) };
        let hints = if flags & 4 == 0 { 0 } else { usize::try_from(self.long()?).ok()? };
        self.characters(count, flags & 1 != 0, text)?;
        self.skip(runs.checked_mul(4)?)?;
        self.skip(hints)?;
        Some(if runs > 0 { Font::Changes } else { Font::Stays })
    }

    /// A text by its length in two bytes.
    pub(super) fn text(&mut self, version: Version, alphabet: Alphabet) -> Result<String, String> {
        let short = || "a text that is cut off".to_owned();
        match version {
            Version::Biff8 => {
                let count = self.short().ok_or_else(short)?;
                let wide = self.byte().ok_or_else(short)? & 1 != 0;
                let mut text = String::new();
                self.characters(count.into(), wide, &mut text).ok_or_else(short)?;
                Ok(text)
            }
            Version::Biff5 => {
                let mut count = usize::from(self.short().ok_or_else(short)?);
                let mut bytes = Vec::new();
                while count > 0 {
                    if self.is_at_end() {
                        return Err(short());
                    }
                    let here = count.min(self.piece.len());
                    bytes.extend_from_slice(self.take(here).ok_or_else(short)?);
                    count -= here;
                }
                alphabet.text_of(&bytes)
            }
        }
    }

    /// A text by its length in one byte, such as a name.
    pub(super) fn short_text(&mut self, version: Version, alphabet: Alphabet) -> Result<String, String> {
        let short = || "a name that is cut off".to_owned();
        let count = usize::from(self.byte().ok_or_else(short)?);
        match version {
            Version::Biff8 => {
                let wide = self.byte().ok_or_else(short)? & 1 != 0;
                let mut text = String::new();
                self.characters(count, wide, &mut text).ok_or_else(short)?;
                Ok(text)
            }
            Version::Biff5 if count == 0 => Ok(String::new()),
            Version::Biff5 => alphabet.text_of(self.take(count).ok_or_else(short)?),
        }
    }
}

/// Whether a text is in one font.
#[derive(Debug, Clone, Copy, PartialEq, Eq)]
enum Font {
    Stays,
    Changes,
}

/// Reads the table of the texts that cells share, and how many of them change their font; what it claims to hold is not
/// believed but counted.
pub(super) fn read_shared_texts(mut pieces: Pieces<'_>) -> Option<(SharedTexts, u64)> {
    let mut texts = SharedTexts::default();
    let mut mixed = 0;
    pieces.long()?;
    let claimed = pieces.long()?;
    for _ in 0..claimed {
        if pieces.is_at_end() {
            break;
        }
        if texts.add(|text| pieces.rich_text(text))? == Font::Changes {
            mixed += 1;
        }
    }
    Some((texts, mixed))
}

#[cfg(test)]
mod tests {
    use super::{Alphabet, Pieces, Version, read_shared_texts};

    #[test]
    fn a_text_goes_on_in_the_next_record_in_its_own_width() {
        // "Aä" in short form, then "日本" in UTF-16 in the next record.
        let pieces = Pieces::new(vec![&[4, 0, 0, b'A', 0xE4], &[1, 0xE5, 0x65, 0x2C, 0x67]]);
        let text = pieces.clone().text(Version::Biff8, Alphabet::NotSaid);
        assert_eq!(text, Ok("Aä日本".to_owned()));
        let cut = Pieces::new(vec![&[4, 0, 0, b'A', 0xE4], &[1, 0xE5, 0x65, 0x2C]]);
        assert_eq!(
            cut.clone().text(Version::Biff8, Alphabet::NotSaid),
            Err("a text that is cut off".to_owned())
        );
    }

    #[test]
    fn shared_texts_are_found_by_number_and_a_false_number_of_them_changes_nothing() {
        let table = [
            9, 0, 0, 0, 0xFF, 0xFF, 0xFF, 0xFF, 1, 0, 0, b'a', 0, 0, 0, 2, 0, 8, 1, 0, b'b', b'c', 1, 0, 5, 0,
        ];
        let (texts, mixed) = read_shared_texts(Pieces::new(vec![&table])).unwrap();
        let found: Vec<_> = (0..4).map(|number| texts.get(number)).collect();
        assert_eq!(found, [Some("a"), Some(""), Some("bc"), None]);
        assert_eq!(mixed, 1);
    }

    #[test]
    fn bytes_are_letters_of_the_alphabet_the_workbook_names() {
        for (number, bytes, text) in [
            (1252, &b"M\xFCller"[..], Ok("Müller")),
            (1251, b"\xD4\xE5\xED\xEE\xEB", Ok("Фенол")),
            (932, b"\x93\xFA\x96\x7B", Ok("日本")),
            (936, b"\xD6\xD0\xCE\xC4", Ok("中文")),
            (0x8001, b"caf\xE9", Ok("café")),
            (0x8000, b"caf\x8E", Ok("café")),
            (367, b"phenol", Ok("phenol")),
            (9999, b"phenol", Ok("phenol")),
            (9999, b"caf\x8E", Err("a text in the unknown alphabet number 9999")),
            (932, b"\x93", Err("a text with bytes that are no letters of its alphabet, Shift_JIS")),
        ] {
            let found = Alphabet::of_code_page(number).text_of(bytes);
            assert_eq!(found.as_deref().map_err(String::as_str), text, "{number}");
        }
    }
}
