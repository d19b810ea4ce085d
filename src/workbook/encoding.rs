//! In which encoding a text file is written. What its bytes leave open is said, so that a wrong guess is seen.

mod decoded;

use std::io::Read;

use chardetng::{EncodingDetector, Iso2022JpDetection, Utf8Detection};
use encoding_rs::{
    BIG5, EUC_JP, EUC_KR, Encoding, GB18030, GBK, ISO_8859_2, SHIFT_JIS, UTF_8, UTF_16BE, UTF_16LE,
    WINDOWS_1250, WINDOWS_1251, WINDOWS_1252, WINDOWS_1253, WINDOWS_1254, WINDOWS_1257,
};

pub(super) use decoded::Decoded;
use decoded::fill;

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
    let (encoding, zeros) = match (even, odd) {
        (0, odd) => (UTF_16LE, odd),
        (even, 0) => (UTF_16BE, even),
        (_, _) => return None,
    };
    // Separators, digits and line ends have a zero in every script. A zero that an export left in a text of one byte a
    // character stands anywhere, and not beside its line ends.
    let pairs = beginning.len() / 2;
    let line_ends = || encoding.decode_without_bom_handling(beginning).0.contains(['\n', '\r']);
    let enough = zeros >= 2 && (zeros * 3 >= pairs || (zeros * 20 >= pairs && line_ends()));
    enough.then_some((encoding, KnownBy::Zeros))
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
    let mut runs = Runs::default();
    while count > 0 {
        let bytes = portion.get(..count).unwrap_or_default();
        soundness.feed(bytes);
        detector.feed(bytes, false);
        runs.feed(bytes);
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
        _ => {
            let guess = of_those_lists_come_in(detector.guess(None, Utf8Detection::Deny));
            // The two share their bytes; Japanese without its own syllables is Chinese.
            let chinese = guess == EUC_JP && runs.kana * KANA_IN_JAPANESE < runs.all;
            let guess = if chinese { GB18030 } else { guess };
            // Single letters among ASCII are no words of characters of two bytes each, and a few letters say nothing of
            // where in Europe a text was written.
            let doubtful =
                if guess.is_single_byte() { runs.all < FEWEST_LETTERS } else { runs.longest < SHORTEST_RUN };
            (if doubtful { WINDOWS_1252 } else { guess }, KnownBy::Guess)
        }
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

/// The fewest bytes beyond ASCII that stand in a row where a text has words in Japanese, Chinese or Korean: the second
/// byte of a character may be ASCII.
const SHORTEST_RUN: usize = 3;

/// The fewest letters beyond ASCII that a guess at a rarer encoding takes.
const FEWEST_LETTERS: usize = 12;

/// One in so many bytes beyond ASCII begins a Japanese syllable sign in a Japanese text, at least.
const KANA_IN_JAPANESE: usize = 40;

/// Bytes beyond ASCII, and how many stand in a row.
#[derive(Debug, Default)]
struct Runs {
    all: usize,
    /// Those that begin a Japanese syllable sign in EUC-JP.
    kana: usize,
    longest: usize,
    present: usize,
}

impl Runs {
    fn feed(&mut self, bytes: &[u8]) {
        for byte in bytes {
            self.all += usize::from(!byte.is_ascii());
            self.present = if byte.is_ascii() { 0 } else { self.present + 1 };
            self.kana += usize::from(matches!(byte, 0xA4 | 0xA5) && self.present % 2 == 1);
            self.longest = self.longest.max(self.present);
        }
    }
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

#[cfg(test)]
mod tests {
    use std::io::Read;

    use encoding_rs::{BIG5, GB18030, SHIFT_JIS, UTF_8, UTF_16BE, UTF_16LE, WINDOWS_1252};

    use super::{Decoded, KnownBy, encoding_of, wide_encoding};

    #[test]
    fn an_encoding_is_known_by_its_mark_its_zeros_its_soundness_or_guessed() {
        let japanese = SHIFT_JIS.encode("CAS番号,メタノール\n").0.into_owned();
        for (bytes, encoding, known_by) in [
            (&b"CAS,Name\n"[..], UTF_8, KnownBy::Ascii),
            ("CAS,Säure\n".as_bytes(), UTF_8, KnownBy::Soundness),
            (b"\xEF\xBB\xBFCAS", UTF_8, KnownBy::Mark),
            (b"\xFF\xFEC\0A\0", UTF_16LE, KnownBy::Mark),
            (b"\xFE\xFF\0C\0A", UTF_16BE, KnownBy::Mark),
            (b"C\0A\0S\0,\0\n\0", UTF_16LE, KnownBy::Zeros),
            (b"\0C\0A\0S\0,\0\n", UTF_16BE, KnownBy::Zeros),
            (b"CAS,20 \xB0C\n", WINDOWS_1252, KnownBy::Guess),
            // A character cut off at the end.
            (b"CAS,S\xC3", WINDOWS_1252, KnownBy::Guess),
            (&japanese, SHIFT_JIS, KnownBy::Guess),
            // Letters of code page 850, which stand alone as no Japanese does.
            (b"Pr\x81fung,L\x94sung\n", WINDOWS_1252, KnownBy::Guess),
        ] {
            let found = encoding_of(bytes).unwrap();
            assert_eq!((found.encoding, found.known_by), (encoding, known_by), "{bytes:?}");
        }
    }

    #[test]
    fn four_bytes_a_character_are_no_text_of_two() {
        assert!(wide_encoding(b"\xFF\xFE\0\0C\0\0\0").is_none());
        assert!(wide_encoding(b"CAS,Name\0").is_none());
        assert!(wide_encoding(b"CAS,Na\0me\0x,50-29-3\n").is_none());
    }

    #[test]
    fn a_text_is_decoded_across_the_ends_of_its_portions() {
        for encoding in [SHIFT_JIS, GB18030, BIG5, UTF_8] {
            let text = format!("a{}", "水溶解度".repeat(20_000));
            let bytes = encoding.encode(&text).0.into_owned();
            assert_eq!(encoding_of(bytes.as_slice()).unwrap().encoding, encoding, "{}", encoding.name());
            let mut decoded = String::new();
            Decoded::new(bytes.as_slice(), encoding).read_to_string(&mut decoded).unwrap();
            assert!(decoded == text, "{}", encoding.name());
        }
    }
}
