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

/// How many letters differ, if only so few that the words may be the same.
fn close(word: &str, known: &str) -> Option<usize> {
    let most = match known.len() {
        0..=7 => 1,
        8..=13 => 2,
        _ => 3,
    };
    // The first letter is seldom wrong, and of a long word either the first or the last is right.
    let (word_letters, known_letters) = (word.as_bytes(), known.as_bytes());
    let same_start = word_letters.first() == known_letters.first();
    let same_end = word_letters.last() == known_letters.last();
    let may_be = same_start || (known.len() > 5 && same_end);
    if word == known || !may_be || word.len().abs_diff(known.len()) > most {
        return None;
    }
    let edits = edits(word, known);
    (edits <= most).then_some(edits)
}
