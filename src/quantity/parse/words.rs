//! Words that stand for no value, for a value without a number, or beside one.

mod lists;

use std::collections::BTreeSet;
use std::sync::LazyLock;

use super::fold::{is_east_asian, plain_words};
use lists::{
    DENIALS, LABELS, MISSING, MISSING_NUMBER, NUMBERED, OTHER_KINDS, RATIO_WORDS, REMARK_STARTS, SPANS,
    TESTS, VALUE_WORDS, VALUE_WORDS_WITHIN,
};

type Words = LazyLock<BTreeSet<&'static str>>;

static MISSING_PHRASES: LazyLock<BTreeSet<String>> = LazyLock::new(|| phrases_of(MISSING));
static MISSING_NUMBER_PHRASES: LazyLock<BTreeSet<String>> = LazyLock::new(|| phrases_of(MISSING_NUMBER));
static VALUES: Words = LazyLock::new(|| words_of(VALUE_WORDS));
static STARTS: Words = LazyLock::new(|| words_of(REMARK_STARTS));
static LABEL_WORDS: Words = LazyLock::new(|| words_of(LABELS));
static DENYING: Words = LazyLock::new(|| words_of(DENIALS));
static OTHERS: Words = LazyLock::new(|| words_of(OTHER_KINDS));

fn words_of(lines: &[&'static str]) -> BTreeSet<&'static str> {
    lines.iter().flat_map(|line| line.split(' ')).collect()
}

fn phrases_of(lines: &[&str]) -> BTreeSet<String> {
    lines.iter().flat_map(|line| line.split('|')).map(joined).collect()
}

/// The folded words of a text without spaces between.
fn joined(text: &str) -> String {
    plain_words(text).split(' ').collect()
}

/// Whether a text is empty or one of the words for a missing value.
pub fn is_missing(text: &str) -> bool {
    is_one_of(text, &MISSING_PHRASES)
}

/// Whether a text is empty or stands for a missing value where a number is asked for.
pub(super) fn is_missing_number(text: &str) -> bool {
    is_missing(text) || is_one_of(text, &MISSING_NUMBER_PHRASES)
}

fn is_one_of(text: &str, phrases: &BTreeSet<String>) -> bool {
    // Long enough for every phrase, in the widest script.
    const LONGEST_PHRASE: usize = 90;
    if text.len() > LONGEST_PHRASE {
        return false;
    }
    let has_letter_or_digit = text.chars().any(char::is_alphanumeric);
    if !has_letter_or_digit {
        return text.chars().all(|character| {
            character.is_whitespace()
                || matches!(character, '-' | '–' | '—' | '−' | '?' | '.' | '/' | '_' | '*' | '#' | '(' | ')')
        });
    }
    let joined = joined(text);
    joined.is_empty() || phrases.contains(&joined)
}

/// Whether a text holds a word that stands for a value without a number.
pub(super) fn has_value_word(text: &str) -> bool {
    let plain = plain_words(text);
    plain.split(' ').any(|word| VALUES.contains(word))
        || VALUE_WORDS_WITHIN.split(' ').any(|word| plain.contains(word))
}

/// Whether a word after a bare number begins a remark.
pub(super) fn starts_remark(word: &str) -> bool {
    let plain = plain_words(word);
    let first = plain.split(' ').next().unwrap_or_default();
    STARTS.contains(first)
        // `OECD117`, `pH7`: the number is the word's.
        || STARTS.contains(first.trim_end_matches(|character: char| character.is_ascii_digit()))
}

/// Whether words after a bare number without a dimension are those of a remark: one of them is known, they are in a script
/// without spaces, or they end in the year of a reference.
pub(super) fn reads_as_remark(text: &str) -> bool {
    const MONTHS: &str = "jan feb mar apr may jun jul aug sep oct nov dec mai okt dez juin mei";
    let plain = plain_words(text);
    let first = plain.split(' ').next().unwrap_or_default();
    let short = first.char_indices().nth(3).map_or(first, |(end, _)| first.get(..end).unwrap_or_default());
    let is_month = MONTHS.split(' ').any(|month| month == first || (month == short && first.len() > 4));
    let last = plain.split(' ').next_back().unwrap_or_default();
    let year = last.len() == 4 && last.parse().is_ok_and(|year: u32| (1900..2100).contains(&year));
    plain.contains(is_east_asian)
        || plain.split(' ').any(|word| starts_remark(word) || LABEL_WORDS.contains(word))
        || (year && !is_month && plain.contains(' '))
}

/// Whether the words before a time end in one for its length: `after 28 d` is no half-life.
pub(super) fn ends_as_a_span(label: &str) -> bool {
    let plain = plain_words(label);
    plain.split(' ').next_back().is_some_and(|word| SPANS.split(' ').any(|span| span == word))
}

/// Whether a word after a bare number makes it a part of something: `1 in 100`.
pub(super) fn is_ratio_word(word: &str) -> bool {
    RATIO_WORDS.split(' ').any(|known| known == plain_words(word))
}

/// Whether a word after a time makes it the length of a test: `28 d study`.
pub(super) fn names_a_test(word: &str) -> bool {
    TESTS.split(' ').any(|known| known == plain_words(word))
}

/// Whether the words before a number make it the number of a guideline, a pH or the like.
pub(super) fn numbers_something_else(label: &str) -> bool {
    let plain = plain_words(label);
    plain.split(' ').next_back().is_some_and(|word| NUMBERED.split(' ').any(|known| known == word))
}

/// What the words before a number are to it.
#[derive(Debug, Clone, Copy, PartialEq, Eq)]
pub(super) enum Lead {
    /// They lead a value: `log Kow`, `DT50`, `measured`.
    Value,
    /// They name a value of another kind: `DT90`, `n`.
    OtherKind,
    /// They deny something: `no degradation after`, `minus`.
    Denial,
    /// They stand for a value without a number: `insoluble`, `stable for`.
    ValueWord,
    /// Nobody knows.
    Unknown,
}

/// What the words before a number are to it.
pub(super) fn lead_of(label: &str) -> Lead {
    let plain = plain_words(label);
    let words = || plain.split(' ');
    if words().any(|word| DENYING.contains(word)) {
        Lead::Denial
    } else if has_value_word(label) {
        Lead::ValueWord
    } else if words().all(|word| LABEL_WORDS.contains(word)) {
        Lead::Value
    } else if words().next_back().is_some_and(|word| OTHERS.contains(word)) {
        Lead::OtherKind
    } else {
        Lead::Unknown
    }
}

#[cfg(test)]
mod tests {
    use super::{Lead, is_missing, is_missing_number, lead_of};

    #[test]
    fn words_for_missing_are_known_in_every_spelling() {
        for text in [
            "",
            " ",
            "-",
            "–",
            "--",
            "n.d.",
            "N.D.",
            "n. d.",
            "n/a",
            "#N/A",
            "k.A.",
            "k. A.",
            "keine Angabe",
            "?",
            "unknown",
            "nicht bestimmt",
            "No data available",
            "not determined",
            "non déterminé",
            "sin datos",
            "dato non disponibile",
            "geen gegevens",
            "データなし",
            "无数据",
            "/",
        ] {
            assert!(is_missing(text), "{text}");
        }
        for text in ["0", "insoluble", "4.5", "no", "> 3", "NC", "sí", "S/D"] {
            assert!(!is_missing(text), "{text}");
        }
    }

    #[test]
    fn short_forms_stand_for_missing_only_where_a_number_is_asked_for() {
        for text in ["s.o.", "n.c.", "S/D", "n.m.", "x"] {
            assert!(is_missing_number(text), "{text}");
        }
        assert!(!is_missing_number("4.5"));
    }

    #[test]
    fn words_before_a_number_lead_it_or_do_not() {
        for (label, lead) in [
            ("log Kow", Lead::Value),
            ("DT50", Lead::Value),
            ("t1/2", Lead::Value),
            ("実測値", Lead::Value),
            ("DT90", Lead::OtherKind),
            ("n", Lead::OtherKind),
            ("no degradation after", Lead::Denial),
            ("stable for", Lead::ValueWord),
            ("minus", Lead::Denial),
            ("see report", Lead::Unknown),
        ] {
            assert_eq!(lead_of(label), lead, "{label}");
        }
    }
}
