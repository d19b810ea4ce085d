//! One header: its words, its brackets, and the field they name.

use super::folding::{composed, header_words, is_sign, shown_words};
use super::loose_unit::{doubtful_unit, is_doubtful, is_second, loose_unit, several_units};
use super::reading::{Brackets, NamesValue, Reading};
use super::unread_unit::{self, without_active_substance};
use super::words::ColumnWords;
use crate::quantity::{Dimension, Unit, parse_unit_of, tidy};
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
    pub(super) shown: [Vec<String>; 2],
}

/// A field and the words that named it.
#[derive(Debug, Clone, PartialEq, Eq)]
pub(super) struct Named {
    pub(super) field: Field,
    pub(super) by: Vec<String>,
}

impl Header {
    /// Takes a header apart; a text too long to be one gives nothing.
    pub(super) fn new(text: &str) -> Option<Self> {
        if text.chars().count() > LONGEST_HEADER {
            return None;
        }
        // A line break within a header is a space.
        let one_line = composed(text).split_whitespace().collect::<Vec<_>>().join(" ");
        let whole = tidy(&one_line).replace("(E)C", "C").replace("(e)c", "c");
        let whole = without_active_substance(&whole);
        // Alone it is short for `number`; elsewhere `n` stands for much else.
        let whole = if whole.eq_ignore_ascii_case("n.") { "No".to_owned() } else { whole };
        let (plain, brackets) = part_brackets(&whole);
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
        let by = rule.needs.iter().filter_map(|need| reading.words_of(*need, self)).collect();
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
        if several_units(&self.brackets, dimension).is_some() {
            return None;
        }
        let in_brackets = self
            .brackets
            .iter()
            .flat_map(|bracket| bracket.split([',', ';']).chain([bracket.as_str()]))
            .filter(|part| !is_doubtful(part.trim(), dimension))
            .filter_map(|part| parse_unit_of(without_preposition(part), dimension));
        let after_signs = self.plain.rfind(is_sign).and_then(|place| {
            self.plain
                .get(place..)?
                .char_indices()
                .nth(1)
                .and_then(|(next, _)| self.plain.get(place + next..))
        });
        let words: Vec<&str> =
            after_signs.map_or(self.plain.as_str(), str::trim).split_whitespace().collect();
        let after_signs = after_signs.and_then(|end| parse_unit_of(without_preposition(end), dimension));
        let at_end = (1..=words.len().min(4)).rev().filter_map(|length| {
            let end = words.get(words.len() - length..)?.join(" ");
            if is_doubtful(&end, dimension) || is_second(&end) {
                return None;
            }
            parse_unit_of(without_preposition(end.trim_start_matches([',', '/', '-', ' '])), dimension)
        });
        let found = in_brackets.chain(after_signs).chain(at_end).find(measures);
        found
            .or_else(|| unread_unit::unit_after_stroke(&self.plain, dimension))
            .or_else(|| loose_unit(&self.plain, dimension))
    }

    /// What changes the numbers of a column in a way that is not read: a power of ten, a logarithm.
    pub(super) fn unread_scale(&self, dimension: Dimension) -> Option<String> {
        let scale = unread_unit::scale(&self.plain, &self.brackets, dimension);
        let is_of_numbers = matches!(
            dimension,
            Dimension::Time
                | Dimension::Concentration
                | Dimension::Pressure
                | Dimension::Henry
                | Dimension::MolarMass
                | Dimension::Tonnage
        );
        scale.or_else(|| (is_of_numbers && self.names_logarithm()).then(|| "log".to_owned()))
    }

    /// `BCF n`, `BCF (n)`: how many values there are.
    pub(super) fn counts_values(&self) -> bool {
        let at_end = self.words.len() > 1 && self.words.last().is_some_and(|word| word == "n");
        at_end || self.brackets.iter().any(|bracket| bracket.trim().eq_ignore_ascii_case("n"))
    }

    /// `Δ log Kow`.
    pub(super) fn has_sign_of_difference(&self) -> bool {
        self.plain.contains(['Δ', 'δ', '∆'])
    }

    /// `BCF > 2000`: whether a value is above a limit, not the value.
    pub(super) fn compares_with_limit(&self) -> bool {
        unread_unit::compares(&self.plain)
            || self.brackets.iter().any(|bracket| {
                let is_number = |character: char| "<>≤≥= .,0123456789".contains(character);
                bracket.chars().all(is_number) && unread_unit::compares(bracket)
            })
    }

    /// Words that may be a unit and may mean something else, where the header names no other.
    pub(super) fn doubtful_unit(&self, dimension: Dimension) -> Option<String> {
        let is_asked = dimension != Dimension::Dimensionless && self.unit(dimension).is_none();
        if !is_asked {
            return None;
        }
        doubtful_unit(&self.plain, &self.brackets, dimension)
            .or_else(|| unread_unit::unread(&self.plain, &self.brackets, dimension))
    }

    /// A unit in brackets that does not measure what the column holds.
    pub(super) fn strange_unit(&self, dimension: Dimension) -> Option<Unit> {
        self.brackets
            .iter()
            .filter_map(|bracket| parse_unit_of(without_preposition(bracket), dimension))
            .find(|unit| unit.dimension() != dimension && !matches!(unit, Unit::One | Unit::Minute))
    }

    /// The same with another word at a place.
    pub(super) fn with_word(&self, place: usize, word: &str) -> Self {
        let mut corrected = self.clone();
        if let Some(slot) = corrected.words.get_mut(place) {
            word.clone_into(slot);
        }
        corrected
    }

    /// `log BCF`, `Koc (log)`; the logarithm of another quantity, as in `BCF (from log Kow)`, is none of this one.
    fn names_logarithm(&self) -> bool {
        const SIGNS: [[&str; 2]; 3] = [["対", "数"], ["对", "数"], ["對", "數"]];
        const OF_OTHERS: [&str; 10] = ["kow", "pow", "p", "d", "koa", "dow", "ko", "po", "kaw", "koe"];
        [&self.words, &self.bracket_words].into_iter().any(|words| {
            words.iter().enumerate().any(|(place, word)| {
                let next = words.get(place + 1).map_or("", String::as_str);
                let after_next = words.get(place + 2).map_or("", String::as_str);
                let of_other = OF_OTHERS.contains(&next) || (next == "k" && after_next != "oc");
                let is_log = matches!(word.as_str(), "log" | "lg" | "log10") || word.starts_with("logarit");
                let joined = ["log", "lg", "log10"].iter().any(|start| {
                    word.strip_prefix(start).is_some_and(|rest| {
                        rest.starts_with("koc") || rest.starts_with("bcf") || rest.starts_with("baf")
                    })
                });
                joined || (is_log && !of_other) || SIGNS.contains(&[word.as_str(), next])
            })
        })
    }

    /// Whether the header speaks of a concept with this name.
    pub(super) fn speaks_of(&self, concept: &str, known: &ColumnWords) -> bool {
        known.concept(concept).is_some_and(|place| Reading::new(self, known).everywhere.contains(&place))
    }
}

fn without_preposition(text: &str) -> &str {
    let text = text.trim();
    text.strip_prefix("in ").or_else(|| text.strip_prefix("en ")).unwrap_or(text)
}

fn part_brackets(text: &str) -> (String, Vec<String>) {
    let mut plain = String::with_capacity(text.len());
    let mut brackets = Vec::new();
    let mut inside = String::new();
    let mut depth = 0usize;
    for character in text.chars() {
        match character {
            '(' | '[' | '{' | '【' | '〔' | '〈' | '《' | '「' => depth += 1,
            ')' | ']' | '}' | '】' | '〕' | '〉' | '》' | '」' if depth > 0 => {
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
