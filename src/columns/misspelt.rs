//! Headers that name a field but for one misspelt word.

use super::header::Header;
use super::phrase::KnownPart;
use super::reading::Reading;
use super::words::ColumnWords;
use crate::fault::edits;
use crate::substance::Field;

/// Known words that are tried in the place of one that is not.
const WORDS_TRIED: usize = 16;

/// The field a header names when one of its words is taken for a known one close to it. The known word must be one that
/// names the field, so that `Lot no` is not taken for a misspelt number.
pub(super) fn nearly_named(header: &Header, known: &ColumnWords) -> Option<Field> {
    let reading = Reading::new(header, known);
    if !reading.main.is_disjoint(&known.never) || reading.names_no_value() {
        return None;
    }
    header.words.iter().enumerate().find_map(|(place, word)| {
        let candidates = close_words(word, known, reading.covered.contains(&place));
        candidates.into_iter().take(WORDS_TRIED).find_map(|(_, concept, corrected)| {
            let corrected = header.with_word(place, &corrected);
            let named = corrected.field(known)?;
            let needed =
                known.rules.iter().any(|rule| rule.field == named.field && rule.needs.contains(&concept));
            needed.then_some(named.field)
        })
    })
}

/// Known words close to one, each with its concept, the closest first. Of a compound whose one half is known, the other
/// half is compared.
fn close_words(word: &str, known: &ColumnWords, is_known: bool) -> Vec<(usize, usize, String)> {
    const SHORTEST: usize = 3;
    if !word.is_ascii() || word.len() < SHORTEST || word.len() > LONGEST {
        return Vec::new();
    }
    let mut close: Vec<(usize, usize, String)> = known
        .known_parts()
        .filter(|(_, part)| part.text.is_ascii() && part.text.len() >= SHORTEST)
        .filter_map(|(concept, part)| {
            let (edits, corrected) = corrected(word, part, is_known)?;
            Some((edits, concept, corrected))
        })
        .collect();
    close.sort();
    close.dedup();
    close
}

/// The longest word that is compared with all known ones.
const LONGEST: usize = 40;
/// The shortest half of a compound that is compared on its own.
const LONG_HALF: usize = 7;

fn corrected(word: &str, part: KnownPart, is_known: bool) -> Option<(usize, String)> {
    if !is_known && let Some(edits) = close(word, part.text) {
        return Some((edits, part.text.to_owned()));
    }
    if part.text.len() < LONG_HALF {
        return None;
    }
    // A letter may be missing or too many in the half that is compared.
    let lengths = (part.text.len() - 1)..=(part.text.len() + 1);
    let ends = lengths.clone().filter(|_| part.open_before).filter_map(|length| {
        let (start, end) = word.split_at_checked(word.len().checked_sub(length)?)?;
        Some((close(end, part.text)?, format!("{start}{}", part.text)))
    });
    let starts = lengths.filter(|_| part.open_after).filter_map(|length| {
        let (start, end) = word.split_at_checked(length)?;
        Some((close(start, part.text)?, format!("{}{end}", part.text)))
    });
    ends.chain(starts).min()
}

/// The length, in letters, up to which a word is one of the short ones that stand for quantities.
const LONGEST_SHORT_WORD: usize = 5;

/// How many letters differ, if only so few that the words may be the same.
fn close(word: &str, known: &str) -> Option<usize> {
    let most = match known.len() {
        0..=7 => 1,
        8..=13 => 2,
        _ => 3,
    };
    // The first letter is seldom wrong, and digits tell one quantity from another: `EC10`, `EC20`.
    let same_start = word.as_bytes().first() == known.as_bytes().first();
    let digits = |text: &str| -> String { text.chars().filter(char::is_ascii_digit).collect() };
    if word == known
        || !same_start
        || digits(word) != digits(known)
        || word.len().abs_diff(known.len()) > most
    {
        return None;
    }
    // Another letter in a short word makes another quantity: `Koa`, `Kow`, `Kom`.
    let letters = |text: &str| {
        let mut letters: Vec<u8> = text.bytes().collect();
        letters.sort_unstable();
        letters
    };
    let is_short = known.len() <= LONGEST_SHORT_WORD && word.len() <= LONGEST_SHORT_WORD;
    let is_swapped = letters(word) == letters(known);
    let lacks_one = known.len() > 3 && digits(known).is_empty() && word.len() + 1 == known.len();
    if is_short && !is_swapped && !lacks_one {
        return None;
    }
    let edits = edits(word, known);
    (edits <= most).then_some(edits)
}
