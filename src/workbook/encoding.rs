//! In which encoding a text file is written. What its bytes leave open is said, so that a wrong guess is seen.

use std::io::Read;

use chardetng::{EncodingDetector, Iso2022JpDetection, Utf8Detection};
use encoding_rs::{
    BIG5, Decoder, EUC_JP, EUC_KR, Encoding, GB18030, GBK, ISO_8859_2, SHIFT_JIS, UTF_8, UTF_16BE, UTF_16LE,
    WINDOWS_1250, WINDOWS_1251, WINDOWS_1252, WINDOWS_1253, WINDOWS_1254, WINDOWS_1257,
};

/// Bytes that are read at a time.
const PORTION: usize = 1 << 16;

/// A text that is UTF-8 but for one character in so many is UTF-8 with damage, not in another encoding.
const SOUND_A_BROKEN: u64 = 20;

/// Letters of Western Europe aside, the signs a list of chemicals has above ASCII in Windows-1252: no-break space, §, ©, ®,
/// °, ±, ², ³, µ, ·, ¼, ½, ¾, ×, and the dashes, quotation marks, dots and per mille sign.
const SIGNS: [u8; 24] = [
    0xA0, 0xA7, 0xA9, 0xAE, 0xB0, 0xB1, 0xB2, 0xB3, 0xB5, 0xB7, 0xBC, 0xBD, 0xBE, 0xD7, 0x80, 0x85, 0x89,
    0x91, 0x92, 0x93, 0x94, 0x95, 0x96, 0x97,
];

/// The encoding of a text, and how it is known.
#[derive(Debug, Clone, Copy)]
pub(super) struct TextEncoding {
    pub(super) encoding: &'static Encoding,
    pub(super) known_by: KnownBy,
}

/// How an encoding is known.
#[derive(Debug, Clone, Copy, PartialEq, Eq)]
pub(super) enum KnownBy {
    /// The file begins with its mark.
    Mark,
    /// Every second byte is zero.
    Zeros,
    /// Every character is one of ASCII, which nearly all encodings share.
    Ascii,
    /// All bytes are sound in it, which chance would hardly make.
    Soundness,
    /// Nearly all bytes are.
    NearSoundness,
    /// The bytes look like it.
    Guess,
}

/// The encoding of two bytes a character, if the beginning shows one, and how it shows.
pub(super) fn wide_encoding(beginning: &[u8]) -> Option<(&'static Encoding, KnownBy)> {
    match beginning {
        // Four bytes a character; no spreadsheet program writes that.
        [0xFF, 0xFE, 0, 0, ..] => return None,
        [0xFF, 0xFE, ..] => return Some((UTF_16LE, KnownBy::Mark)),
        [0xFE, 0xFF, ..] => return Some((UTF_16BE, KnownBy::Mark)),
        _ => {}
    }
    let zeros = |first: usize| beginning.iter().skip(first).step_by(2).filter(|byte| **byte == 0).count();
    let (even, odd) = (zeros(0), zeros(1));
    let pairs = beginning.len() / 2;
    // Separators and line ends have a zero in every script.
    match () {
        () if pairs < 2 => None,
        () if even == 0 && odd * 20 >= pairs.max(20) => Some((UTF_16LE, KnownBy::Zeros)),
        () if odd == 0 && even * 20 >= pairs.max(20) => Some((UTF_16BE, KnownBy::Zeros)),
        () => None,
    }
}

/// Finds out the encoding; reads the text to its end unless its beginning tells.
pub(super) fn encoding_of(mut source: impl Read) -> std::io::Result<TextEncoding> {
    let mut portion = vec![0; PORTION];
    let mut count = fill(&mut source, &mut portion)?;
    let beginning = portion.get(..count).unwrap_or_default();
    if let Some((encoding, known_by)) = wide_encoding(beginning) {
        return Ok(TextEncoding { encoding, known_by });
    }
    if beginning.starts_with(&[0xEF, 0xBB, 0xBF]) {
        return Ok(TextEncoding { encoding: UTF_8, known_by: KnownBy::Mark });
    }
    let mut detector = EncodingDetector::new(Iso2022JpDetection::Deny);
    let mut soundness = Soundness::default();
    let mut only_signs = true;
    while count > 0 {
        let bytes = portion.get(..count).unwrap_or_default();
        soundness.feed(bytes);
        detector.feed(bytes, false);
        only_signs = only_signs && bytes.iter().all(|byte| byte.is_ascii() || SIGNS.contains(byte));
        count = fill(&mut source, &mut portion)?;
    }
    detector.feed(&[], true);
    soundness.end();
    let (encoding, known_by) = match (soundness.sound, soundness.broken) {
        (0, 0) => (UTF_8, KnownBy::Ascii),
        (_, 0) => (UTF_8, KnownBy::Soundness),
        (sound, broken) if broken.saturating_mul(SOUND_A_BROKEN) <= sound => (UTF_8, KnownBy::NearSoundness),
        _ if only_signs => (WINDOWS_1252, KnownBy::Guess),
        _ => (of_those_lists_come_in(detector.guess(None, Utf8Detection::Deny)), KnownBy::Guess),
    };
    Ok(TextEncoding { encoding, known_by })
}

/// Rare encodings are guessed for texts that are too short to tell.
fn of_those_lists_come_in(guess: &'static Encoding) -> &'static Encoding {
    if guess == GBK {
        return GB18030;
    }
    let usual = [
        SHIFT_JIS,
        EUC_JP,
        GB18030,
        BIG5,
        EUC_KR,
        ISO_8859_2,
        WINDOWS_1250,
        WINDOWS_1251,
        WINDOWS_1253,
        WINDOWS_1254,
        WINDOWS_1257,
    ];
    if usual.contains(&guess) { guess } else { WINDOWS_1252 }
}

/// Counts what is sound and what is broken as UTF-8.
#[derive(Debug, Default)]
struct Soundness {
    sound: u64,
    broken: u64,
    /// The beginning of a character whose end comes later.
    begun: Vec<u8>,
}

impl Soundness {
    fn feed(&mut self, bytes: &[u8]) {
        let joined: Vec<u8>;
        let bytes = if self.begun.is_empty() {
            bytes
        } else {
            joined = self.begun.drain(..).chain(bytes.iter().copied()).collect();
            joined.as_slice()
        };
        let mut rest = bytes;
        while !rest.is_empty() {
            let (sound, after, open) = match std::str::from_utf8(rest) {
                Ok(_) => (rest, &[][..], false),
                Err(error) => {
                    let (sound, after) = rest.split_at_checked(error.valid_up_to()).unwrap_or((rest, &[]));
                    (
                        sound,
                        after.get(error.error_len().unwrap_or(0)..).unwrap_or_default(),
                        error.error_len().is_none(),
                    )
                }
            };
            let ended = sound.len() == rest.len();
            self.sound += u64::try_from(sound.iter().filter(|byte| **byte >= 0xC0).count()).unwrap_or(0);
            if open {
                self.begun = after.to_vec();
                return;
            }
            self.broken += u64::from(!ended);
            rest = after;
        }
    }

    fn end(&mut self) {
        self.broken += u64::from(!self.begun.is_empty());
        self.begun.clear();
    }
}

/// Reads until the buffer is full or the source at its end.
fn fill(source: &mut impl Read, buffer: &mut [u8]) -> std::io::Result<usize> {
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
pub(super) struct Decoded<R> {
    source: R,
    decoder: Decoder,
    bytes: Vec<u8>,
    bytes_left: std::ops::Range<usize>,
    text: Vec<u8>,
    text_left: std::ops::Range<usize>,
    ended: bool,
}

impl<R: Read> Decoded<R> {
    pub(super) fn new(source: R, encoding: &'static Encoding) -> Self {
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
