//! One header: its words, its brackets, and the field they name.

use super::reading::{Brackets, NamesValue, Reading};
use super::words::ColumnWords;
use crate::quantity::{Dimension, Unit, parse_unit_of, plain_words, tidy};
use crate::substance::{Field, Property};

/// The longest text, in characters, that is taken for a header.
const LONGEST_HEADER: usize = 160;

/// A header taken apart.
#[derive(Debug, Clone)]
pub(super) struct Header {
    /// As tidied, without brackets.
    plain: String,
    /// The content of each bracket, tidied.
    pub(super) brackets: Vec<String>,
    pub(super) words: Vec<String>,
    pub(super) bracket_words: Vec<String>,
    /// The words and those in brackets as a reader knows them, umlauts kept.
    shown: [Vec<String>; 2],
}

/// A field and the words that named it.
#[derive(Debug, Clone, PartialEq, Eq)]
pub(super) struct Named {
    pub(super) field: Field,
    pub(super) by: Vec<String>,
}

/// The words of a text as headers are compared: folded, umlauts written as `ae` the same as `ä`.
pub(super) fn header_words(text: &str) -> Vec<String> {
    let umlauts = |word: String| word.replace("ae", "a").replace("oe", "o").replace("ue", "u");
    shown_words(text).into_iter().map(umlauts).collect()
}

fn shown_words(text: &str) -> Vec<String> {
    let folded = plain_words(&parted_at_capitals(text));
    folded.split(' ').filter(|word| !word.is_empty()).map(str::to_owned).collect()
}

/// `WaterSolubility` is two words; `pKa` and `mmHg` are one.
fn parted_at_capitals(text: &str) -> String {
    const SHORTEST_WORD: usize = 3;
    let mut parted = String::with_capacity(text.len());
    let mut small_letters = 0;
    for character in text.chars() {
        if character.is_uppercase() && small_letters >= SHORTEST_WORD {
            parted.push(' ');
        }
        small_letters = if character.is_lowercase() { small_letters + 1 } else { 0 };
        parted.push(character);
    }
    parted
}

impl Header {
    /// Takes a header apart; a text too long to be one gives nothing.
    pub(super) fn new(text: &str) -> Option<Self> {
        if text.chars().count() > LONGEST_HEADER {
            return None;
        }
        let whole = text.replace("(E)C", "C").replace("(e)c", "c");
        let (plain, brackets) = part_brackets(&tidy(&whole));
        let (plain, brackets) = if header_words(&plain).is_empty() {
            (brackets.join(" "), Vec::new())
        } else {
            (plain, brackets)
        };
        let words = header_words(&plain);
        let bracket_words = brackets.iter().flat_map(|bracket| header_words(bracket)).collect();
        let shown_in_brackets = brackets.iter().flat_map(|bracket| shown_words(bracket)).collect();
        let shown = [shown_words(&plain), shown_in_brackets];
        (!words.is_empty()).then_some(Self { plain, brackets, words, bracket_words, shown })
    }

    /// The field the header names.
    pub(super) fn field(&self, known: &ColumnWords) -> Option<Named> {
        let reading = Reading::new(self, known);
        if reading.main.intersection(&known.never).next().is_some() || reading.mostly_unknown {
            return None;
        }
        let value = reading.value;
        let first_pass = known.rules.iter().find(|rule| reading.fits(rule, Brackets::ForProperties, value));
        let rule = first_pass
            .or_else(|| known.rules.iter().find(|rule| reading.fits(rule, Brackets::ForEveryField, value)))?;
        let by = rule.needs.iter().filter_map(|need| self.words_of(*need, known)).collect();
        Some(Named { field: rule.field, by })
    }

    /// The property of which a header of reliability, guideline or the like speaks.
    pub(super) fn property_beside(&self, known: &ColumnWords) -> Option<Property> {
        let reading = Reading::new(self, known);
        known
            .rules
            .iter()
            .filter(|rule| reading.fits(rule, Brackets::ForEveryField, NamesValue::Perhaps))
            .find_map(|rule| rule.field.property())
    }

    /// The unit the header names, in brackets or as its last words.
    pub(super) fn unit(&self, dimension: Dimension) -> Option<Unit> {
        let measures = |unit: &Unit| unit.dimension() == dimension;
        if dimension == Dimension::VolumePerMass && self.names_logarithm() {
            return Some(Unit::LogLitrePerKilogram);
        }
        let in_brackets = self
            .brackets
            .iter()
            .flat_map(|bracket| bracket.split([',', ';']).chain([bracket.as_str()]))
            .filter_map(|part| parse_unit_of(without_preposition(part), dimension));
        let words: Vec<&str> = self.plain.split_whitespace().collect();
        let at_end = (1..words.len().min(5)).rev().filter_map(|length| {
            let end = words.get(words.len() - length..)?.join(" ");
            parse_unit_of(without_preposition(end.trim_start_matches([',', '/', '-', ' '])), dimension)
        });
        in_brackets.chain(at_end).find(measures)
    }

    /// A unit in brackets that does not measure what the column holds.
    pub(super) fn strange_unit(&self, dimension: Dimension) -> Option<Unit> {
        self.brackets
            .iter()
            .filter_map(|bracket| parse_unit_of(without_preposition(bracket), dimension))
            .find(|unit| unit.dimension() != dimension && *unit != Unit::One)
    }

    /// The first word of no concept with a known one close to it put in its place.
    pub(super) fn with_nearest_word(&self, known: &ColumnWords) -> Option<Self> {
        let reading = Reading::new(self, known);
        let (place, word) = self
            .words
            .iter()
            .enumerate()
            .find(|(place, word)| !reading.covered.contains(place) && word.len() >= 4)?;
        let close = crate::fault::nearest(word, known.all_words())?;
        let mut corrected = self.clone();
        if let Some(slot) = corrected.words.get_mut(place) {
            close.clone_into(slot);
        }
        Some(corrected)
    }

    fn names_logarithm(&self) -> bool {
        let mut words = self.words.iter().chain(&self.bracket_words);
        words.any(|word| word.starts_with("log") || word == "lg" || word.starts_with("lgk"))
    }

    /// Whether the header speaks of a concept with this name.
    pub(super) fn speaks_of(&self, concept: &str, known: &ColumnWords) -> bool {
        let place = known.concepts.iter().position(|one| one.id == concept);
        place.is_some_and(|place| self.words_of(place, known).is_some())
    }

    fn words_of(&self, concept: usize, known: &ColumnWords) -> Option<String> {
        let concept = known.concepts.get(concept)?;
        [&self.words, &self.bracket_words].into_iter().zip(&self.shown).find_map(|(words, shown)| {
            (0..words.len()).find_map(|start| {
                let length =
                    concept.phrases.iter().filter_map(|phrase| phrase.length_at(words, start)).max()?;
                Some(shown.get(start..start + length)?.join(" "))
            })
        })
    }
}

fn without_preposition(text: &str) -> &str {
    let text = text.trim();
    text.strip_prefix("in ").unwrap_or(text)
}

fn part_brackets(text: &str) -> (String, Vec<String>) {
    let mut plain = String::with_capacity(text.len());
    let mut brackets = Vec::new();
    let mut inside = String::new();
    let mut depth = 0usize;
    for character in text.chars() {
        match character {
            '(' | '[' | '{' => depth += 1,
            ')' | ']' | '}' if depth > 0 => {
                depth -= 1;
                if depth == 0 {
                    brackets.push(std::mem::take(&mut inside).trim().to_owned());
                    plain.push(' ');
                }
            }
            _ if depth > 0 => inside.push(character),
            _ => plain.push(character),
        }
    }
    if !inside.trim().is_empty() {
        brackets.push(inside.trim().to_owned());
    }
    (plain.trim().to_owned(), brackets)
}
