//! Signs and words that qualify a number.

mod phrases;

use std::sync::LazyLock;

use super::fold::{Plain, is_east_asian, unaccented};

/// How a number is qualified.
#[derive(Debug, Clone, Copy, PartialEq, Eq)]
pub(super) enum Qualifier {
    Above,
    AtLeast,
    Below,
    AtMost,
    About,
    /// `=`, `is`: nothing is added to the number.
    Exactly,
    /// `from`, `de`: nothing is added to the number, and a word for `to` may follow.
    From,
    /// `between`, `zwischen`: `and` then parts the ends of a range.
    Between,
}

impl Qualifier {
    /// The sign of a qualifier that opens an end.
    pub(super) fn sign(self) -> Option<&'static str> {
        match self {
            Self::Above => Some(">"),
            Self::AtLeast => Some("≥"),
            Self::Below => Some("<"),
            Self::AtMost => Some("≤"),
            Self::About | Self::Exactly | Self::From | Self::Between => None,
        }
    }
}

/// Longest first where one starts another.
const SIGNS: &[(&str, Qualifier)] = &[
    (">=", Qualifier::AtLeast),
    ("=>", Qualifier::AtLeast),
    ("≥", Qualifier::AtLeast),
    ("<=", Qualifier::AtMost),
    ("=<", Qualifier::AtMost),
    ("≤", Qualifier::AtMost),
    (">", Qualifier::Above),
    ("<", Qualifier::Below),
    ("~", Qualifier::About),
    ("=", Qualifier::Exactly),
];

struct Phrase {
    folded: String,
    qualifier: Qualifier,
}

static BEFORE: LazyLock<Vec<Phrase>> = LazyLock::new(|| longest_first(phrases::BEFORE));
static AFTER: LazyLock<Vec<Phrase>> = LazyLock::new(|| longest_first(phrases::AFTER));

fn longest_first(table: &[(Qualifier, &[&str])]) -> Vec<Phrase> {
    let mut phrases: Vec<Phrase> = table
        .iter()
        .flat_map(|(qualifier, lines)| {
            lines.iter().flat_map(|line| line.split('|')).map(|phrase| Phrase {
                folded: phrase.chars().flat_map(char::to_lowercase).fold(String::new(), fold_onto),
                qualifier: *qualifier,
            })
        })
        .collect();
    phrases.sort_by_key(|phrase| std::cmp::Reverse(phrase.folded.chars().count()));
    phrases
}

fn fold_onto(mut folded: String, character: char) -> String {
    match unaccented(character) {
        Plain::Letters(letters) => folded.push_str(letters),
        Plain::Same => folded.push(character),
    }
    folded
}

/// The qualifier that stands after a number: `6 or more`, `6 oder weniger`, `6以上`, `6+`.
pub(super) fn take_qualifier_after(text: &str) -> Option<(Qualifier, &str)> {
    let text = text.trim_start();
    if let Some(rest) = text.strip_prefix('+').filter(|rest| rest.trim().is_empty()) {
        return Some((Qualifier::AtLeast, rest));
    }
    take_phrase(text, &AFTER)
}

/// The qualifier at the start of a text, if any, and what follows it.
pub(super) fn take_qualifier(text: &str) -> Option<(Qualifier, &str)> {
    let text = text.trim_start();
    let sign =
        SIGNS.iter().find_map(|(sign, qualifier)| text.strip_prefix(sign).map(|rest| (*qualifier, rest)));
    sign.or_else(|| take_phrase(text, &BEFORE))
}

fn take_phrase<'text>(text: &'text str, phrases: &[Phrase]) -> Option<(Qualifier, &'text str)> {
    if !text.starts_with(char::is_alphabetic) {
        return None;
    }
    phrases.iter().find_map(|phrase| {
        let rest = strip_phrase(text, &phrase.folded)?;
        Some((phrase.qualifier, rest))
    })
}

/// What follows a folded phrase at the start of a text, whatever its case, accents and spaces, if it ends where a word
/// ends.
pub(super) fn strip_phrase<'text>(text: &'text str, phrase: &str) -> Option<&'text str> {
    let mut rest = text;
    let mut expected = phrase;
    while !expected.is_empty() {
        let found = rest.chars().next()?;
        rest = rest.get(found.len_utf8()..)?;
        if found.is_whitespace() {
            expected = expected.strip_prefix(' ')?;
            rest = rest.trim_start();
            continue;
        }
        for lower in found.to_lowercase() {
            expected = match unaccented(lower) {
                Plain::Letters(letters) => expected.strip_prefix(letters)?,
                Plain::Same => expected.strip_prefix(lower)?,
            };
        }
    }
    let rest = rest.trim_start_matches(|character| matches!(character, '\u{300}'..='\u{36F}'));
    let open_end = phrase.ends_with(|last: char| last == '.' || is_east_asian(last));
    let ends_word = open_end || !rest.starts_with(char::is_alphanumeric);
    ends_word.then_some(rest)
}

#[cfg(test)]
mod tests {
    use super::{Qualifier, take_qualifier, take_qualifier_after};

    #[test]
    fn qualifier_words_end_where_words_end() {
        assert_eq!(take_qualifier("at least 3"), Some((Qualifier::AtLeast, " 3")));
        assert_eq!(take_qualifier("Größer als 6"), Some((Qualifier::Above, " 6")));
        assert_eq!(take_qualifier("ca.4"), Some((Qualifier::About, "4")));
        assert_eq!(take_qualifier("bisphenol 4"), None);
        assert_eq!(take_qualifier("=> 4"), Some((Qualifier::AtLeast, " 4")));
    }

    #[test]
    fn accents_may_be_missing_or_written_apart() {
        for text in ["supérieur à 6", "superieur a 6", "SUPÉRIEUR À 6", "supe\u{301}rieur a\u{300} 6"] {
            assert_eq!(take_qualifier(text), Some((Qualifier::Above, " 6")), "{text}");
        }
    }

    #[test]
    fn a_denied_qualifier_is_its_opposite() {
        assert_eq!(take_qualifier("not greater than 6"), Some((Qualifier::AtMost, " 6")));
        assert_eq!(take_qualifier("不小于 6"), Some((Qualifier::AtLeast, " 6")));
        assert_eq!(take_qualifier("niet meer dan 6"), Some((Qualifier::AtMost, " 6")));
    }

    #[test]
    fn qualifiers_may_follow_the_number() {
        assert_eq!(take_qualifier_after(" 以上"), Some((Qualifier::AtLeast, "")));
        assert_eq!(take_qualifier_after("未満"), Some((Qualifier::Below, "")));
        assert_eq!(take_qualifier_after(" o más"), Some((Qualifier::AtLeast, "")));
        assert_eq!(take_qualifier_after(" overnight"), None);
    }
}
