//! Words and phrases that headers are compared with, and an index that finds those which stand at a place.
//!
//! Scripts without spaces are compared sign by sign: a phrase in them may stand anywhere in a run of signs.

use std::collections::BTreeMap;

use super::folding::{header_words, is_sign};

/// Words that stand one after the other.
#[derive(Debug, Clone, PartialEq, Eq)]
pub(super) struct Phrase(Vec<WordPattern>);

/// A word, with `*` at either end for any letters and within for any letters between.
#[derive(Debug, Clone, PartialEq, Eq)]
struct WordPattern {
    parts: Vec<String>,
}

/// A phrase at a place of a header: the concept it names, its first word and the number of its words.
#[derive(Debug, Clone, Copy, PartialEq, Eq)]
pub(super) struct Span {
    pub(super) concept: usize,
    pub(super) start: usize,
    pub(super) length: usize,
}

impl Phrase {
    pub(super) fn new(words: &str) -> Self {
        let patterns = words.split_whitespace().flat_map(|word| {
            if word.contains('*') {
                vec![WordPattern::new(word)]
            } else {
                header_words(word).into_iter().map(|word| WordPattern { parts: vec![word] }).collect()
            }
        });
        Self(patterns.filter(|pattern| pattern.parts.iter().any(|part| !part.is_empty())).collect())
    }

    pub(super) fn is_empty(&self) -> bool {
        self.0.is_empty()
    }

    /// How many words of a header the phrase covers from a place on; none if it does not stand there.
    pub(super) fn length_at(&self, words: &[String], start: usize) -> Option<usize> {
        let here = words.get(start..start + self.0.len())?;
        let fits = self.0.iter().zip(here).all(|(pattern, word)| pattern.fits(word));
        fits.then_some(self.0.len())
    }

    /// The parts of its words that are long enough to be misspelt, each with where the `*` stand.
    pub(super) fn parts(&self) -> impl Iterator<Item = KnownPart<'_>> {
        self.0.iter().flat_map(|word| {
            let last = word.parts.len() - 1;
            word.parts.iter().enumerate().map(move |(place, text)| KnownPart {
                text,
                open_before: place > 0,
                open_after: place < last,
            })
        })
    }
}

/// A part of a known word.
#[derive(Debug, Clone, Copy, PartialEq, Eq)]
pub(super) struct KnownPart<'words> {
    pub(super) text: &'words str,
    /// Any letters may stand before it.
    pub(super) open_before: bool,
    /// Any letters may follow.
    pub(super) open_after: bool,
}

impl WordPattern {
    fn new(word: &str) -> Self {
        let fold = |part: &str| header_words(part).concat();
        Self { parts: word.split('*').map(fold).collect() }
    }

    fn fits(&self, word: &str) -> bool {
        let [first, middle @ .., last] = self.parts.as_slice() else {
            return self.parts.first().is_some_and(|only| only == word);
        };
        let Some(inner) = word.strip_prefix(first.as_str()).and_then(|rest| rest.strip_suffix(last.as_str()))
        else {
            return false;
        };
        let mut rest = inner;
        middle.iter().all(|part| match rest.find(part.as_str()) {
            Some(position) => {
                rest = rest.get(position + part.len()..).unwrap_or_default();
                true
            }
            None => false,
        })
    }
}

/// Phrases by what their first word begins with, so that a header is not compared with all of them.
#[derive(Debug, Clone, Default)]
pub(super) struct PhraseIndex {
    /// By the whole first word.
    whole: BTreeMap<String, Vec<(usize, Phrase)>>,
    /// By the first character of a first word that may go on.
    beginning: BTreeMap<char, Vec<(usize, Phrase)>>,
    /// Phrases whose first word may begin with anything.
    open: Vec<(usize, Phrase)>,
}

impl PhraseIndex {
    pub(super) fn add(&mut self, concept: usize, phrase: &Phrase) {
        let Some(first) = phrase.0.first() else {
            return;
        };
        let entry = (concept, phrase.clone());
        match (first.parts.as_slice(), first.parts.first().and_then(|part| part.chars().next())) {
            ([only], Some(_)) => self.whole.entry(only.clone()).or_default().push(entry),
            (_, Some(letter)) => self.beginning.entry(letter).or_default().push(entry),
            (_, None) => self.open.push(entry),
        }
    }

    /// The longest phrase of each concept at each place.
    pub(super) fn spans(&self, words: &[String]) -> Vec<Span> {
        let mut spans: Vec<Span> = Vec::new();
        for (start, word) in words.iter().enumerate() {
            let first_here = spans.len();
            let whole = self.whole.get(word);
            let beginning = word.chars().next().and_then(|letter| self.beginning.get(&letter));
            let open = (!word.starts_with(is_sign)).then_some(&self.open);
            for (concept, phrase) in whole.into_iter().chain(beginning).chain(open).flatten() {
                let Some(length) = phrase.length_at(words, start) else {
                    continue;
                };
                let known = spans.iter_mut().skip(first_here).find(|span| span.concept == *concept);
                match known {
                    Some(span) => span.length = span.length.max(length),
                    None => spans.push(Span { concept: *concept, start, length }),
                }
            }
        }
        without_parts_of_longer_ones(spans, words)
    }
}

/// In a script without spaces, a phrase that begins within a longer one is no word: `水` in `加水分解` is no water. Read
/// from the left, the longest phrase at each place counts.
fn without_parts_of_longer_ones(mut spans: Vec<Span>, words: &[String]) -> Vec<Span> {
    let mut end = 0;
    let mut longest = None;
    spans.sort_by_key(|span| (span.start, std::cmp::Reverse(span.length)));
    spans.retain(|span| {
        if !words.get(span.start).is_some_and(|word| word.starts_with(is_sign)) {
            return true;
        }
        if span.start >= end {
            end = span.start + span.length;
            longest = Some(*span);
        }
        longest.is_some_and(|longest| (longest.start, longest.length) == (span.start, span.length))
    });
    spans
}

#[cfg(test)]
mod tests {
    use super::{Phrase, PhraseIndex, header_words};

    fn words(text: &str) -> Vec<String> {
        text.split(' ').map(str::to_owned).collect()
    }

    #[test]
    fn stars_stand_for_any_letters() {
        for (pattern, word, fits) in [
            ("*solubility", "watersolubility", true),
            ("*solubility", "solubility", true),
            ("boden*", "bodenhalbwertszeit", true),
            ("*halbwertszeit*", "bodenhalbwertszeit", true),
            ("cas*number", "casnumber", true),
            ("cas", "case", false),
            ("*oktanol*wasser*", "noktanolwasserkoeffizient", true),
        ] {
            assert_eq!(Phrase::new(pattern).length_at(&words(word), 0).is_some(), fits, "{pattern} {word}");
        }
        assert_eq!(Phrase::new("half life").length_at(&words("soil half life"), 1), Some(2));
    }

    #[test]
    fn signs_without_spaces_are_found_within_and_longer_words_hide_shorter_ones() {
        let mut index = PhraseIndex::default();
        for (concept, phrase) in [(0, "水"), (1, "加水分解"), (2, "半減期")] {
            index.add(concept, &Phrase::new(phrase));
        }
        let found = |text: &str| -> Vec<usize> {
            index.spans(&header_words(text)).iter().map(|span| span.concept).collect()
        };
        assert_eq!(found("水中半減期"), [0, 2]);
        assert_eq!(found("加水分解半減期"), [1, 2]);
        assert_eq!(found("DT50水"), [0]);
    }
}
