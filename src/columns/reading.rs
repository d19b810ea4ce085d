//! The concepts a header speaks of, and which fields that fits.

use std::collections::BTreeSet;

use super::header::{Header, header_words};
use super::words::{ColumnWords, ConceptSet, FieldRule};
use crate::quantity::parse_unit;
use crate::substance::Field;

/// Whether words in brackets may name a field.
#[derive(Debug, Clone, Copy, PartialEq, Eq)]
pub(super) enum Brackets {
    /// Compartments and kinds of a property that is named outside.
    ForProperties,
    /// Any field.
    ForEveryField,
}

/// The concepts a header speaks of.
pub(super) struct Reading {
    pub(super) main: ConceptSet,
    everywhere: ConceptSet,
    /// Places of words that belong to a concept or are numbers.
    pub(super) covered: BTreeSet<usize>,
    pub(super) mostly_unknown: bool,
    pub(super) value: NamesValue,
}

/// Whether a header can name the value of a property, or names something beside one.
#[derive(Debug, Clone, Copy, PartialEq, Eq)]
pub(super) enum NamesValue {
    Perhaps,
    No,
}

impl Reading {
    pub(super) fn new(header: &Header, known: &ColumnWords) -> Self {
        let mut main = ConceptSet::new();
        let mut covered = BTreeSet::new();
        let mut value = NamesValue::Perhaps;
        for (place, concept) in known.concepts.iter().enumerate() {
            for start in 0..header.words.len() {
                let longest =
                    concept.phrases.iter().filter_map(|phrase| phrase.length_at(&header.words, start)).max();
                let Some(length) = longest else {
                    continue;
                };
                main.insert(place);
                covered.extend(start..start + length);
                let a_number_follows = header
                    .words
                    .get(start + length)
                    .is_some_and(|word| word.starts_with(|first: char| first.is_ascii_digit()));
                if known.not_a_value.contains(&place) && !a_number_follows {
                    value = NamesValue::No;
                }
            }
        }
        let mut everywhere = main.clone();
        for (place, concept) in known.concepts.iter().enumerate() {
            let stands = |start| {
                concept.phrases.iter().any(|phrase| phrase.length_at(&header.bracket_words, start).is_some())
            };
            if (0..header.bracket_words.len()).any(stands) {
                everywhere.insert(place);
            }
        }
        for bracket in &header.brackets {
            add_companion(bracket, known, &mut main, &mut value);
        }
        let unknown = header
            .words
            .iter()
            .enumerate()
            .filter(|(place, word)| {
                !covered.contains(place) && !word.chars().all(|digit| digit.is_ascii_digit())
            })
            .map(|(_, word)| word.len())
            .sum::<usize>();
        let understood: usize =
            covered.iter().filter_map(|place| header.words.get(*place)).map(String::len).sum();
        Self { main, everywhere, covered, mostly_unknown: unknown > understood, value }
    }

    pub(super) fn fits(&self, rule: &FieldRule, brackets: Brackets, value: NamesValue) -> bool {
        let is_property = matches!(rule.field, Field::Property(_));
        if is_property && value == NamesValue::No {
            return false;
        }
        let counted =
            if is_property || brackets == Brackets::ForEveryField { &self.everywhere } else { &self.main };
        let named_outside = rule.needs.intersection(&self.main).next().is_some();
        rule.needs.is_subset(counted)
            && (named_outside || brackets == Brackets::ForEveryField)
            && rule.without.is_disjoint(&self.everywhere)
    }
}

/// `log Kow (method)`: a bracket with nothing but a companion's word counts as if it stood outside.
fn add_companion(bracket: &str, known: &ColumnWords, main: &mut ConceptSet, value: &mut NamesValue) {
    if parse_unit(bracket).is_some() {
        return;
    }
    let words = header_words(bracket);
    for place in &known.not_a_value {
        let Some(concept) = known.concepts.get(*place) else {
            continue;
        };
        if concept.phrases.iter().any(|phrase| phrase.length_at(&words, 0) == Some(words.len())) {
            main.insert(*place);
            *value = NamesValue::No;
        }
    }
}
