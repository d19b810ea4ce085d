//! The concepts a header speaks of, and which fields that fits.

use std::collections::BTreeSet;

use super::folding::{header_words, joined};
use super::header::Header;
use super::phrase::Span;
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
    pub(super) everywhere: ConceptSet,
    /// Places of words that belong to a concept.
    pub(super) covered: BTreeSet<usize>,
    pub(super) mostly_unknown: bool,
    /// Whether every word is known or a number.
    pub(super) wholly_known: bool,
    pub(super) value: NamesValue,
    /// Whether it speaks of a limit, a count, a class or a former value of what it names.
    pub(super) is_beside_the_value: bool,
    spans: Vec<Span>,
    bracket_spans: Vec<Span>,
}

/// Whether a header can name the value of a property, or names something beside one.
#[derive(Debug, Clone, Copy, PartialEq, Eq)]
pub(super) enum NamesValue {
    Perhaps,
    No,
}

impl Reading {
    pub(super) fn new(header: &Header, known: &ColumnWords) -> Self {
        let spans = known.index.spans(&header.words);
        let bracket_spans = known.index.spans(&header.bracket_words);
        let mut main = ConceptSet::new();
        let mut everywhere: ConceptSet =
            spans.iter().chain(&bracket_spans).map(|span| span.concept).collect();
        let mut covered = BTreeSet::new();
        let mut value = NamesValue::Perhaps;
        for span in &spans {
            covered.extend(span.start..span.start + span.length);
            let number = number_beside(&header.words, *span);
            let is_condition = known.conditions.contains(&span.concept) && number != NumberBeside::None;
            if !is_condition {
                main.insert(span.concept);
            }
            if known.not_a_value.contains(&span.concept) && !is_condition && number != NumberBeside::After {
                value = NamesValue::No;
            }
        }
        for bracket in &header.brackets {
            add_companion(bracket, known, &mut main, &mut value);
        }
        everywhere.extend(&main);
        let is_class =
            |span: &Span| known.concepts.get(span.concept).is_some_and(|concept| concept.id == "type");
        let is_beside_the_value = !everywhere.is_disjoint(&known.never_a_value)
            || spans.iter().any(is_class)
            || header.counts_values()
            || header.compares_with_limit()
            || header.has_sign_of_difference();
        if is_beside_the_value {
            value = NamesValue::No;
        }
        let is_unknown = |place: &usize, word: &str| {
            !covered.contains(place) && !word.chars().all(|digit| digit.is_ascii_digit())
        };
        let words = || header.words.iter().enumerate();
        let unknown: usize =
            words().filter(|(place, word)| is_unknown(place, word)).map(|(_, word)| word.len()).sum();
        let understood: usize =
            words().filter(|(place, _)| covered.contains(place)).map(|(_, word)| word.len()).sum();
        let mostly_unknown = unknown > 0 && unknown >= understood;
        let wholly_known = unknown == 0;
        Self {
            main,
            everywhere,
            covered,
            mostly_unknown,
            wholly_known,
            value,
            is_beside_the_value,
            spans,
            bracket_spans,
        }
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

    /// Whether it names something beside a value.
    pub(super) fn names_no_value(&self) -> bool {
        self.value == NamesValue::No
    }

    /// The first words of the header that speak of a concept, as a reader knows them.
    pub(super) fn words_of(&self, concept: usize, header: &Header) -> Option<String> {
        let [main, in_brackets] = &header.shown;
        [(&self.spans, main), (&self.bracket_spans, in_brackets)].into_iter().find_map(|(spans, shown)| {
            let span = spans.iter().find(|span| span.concept == concept)?;
            Some(joined(shown.get(span.start..span.start + span.length)?))
        })
    }
}

/// Whether a number stands beside a word.
#[derive(Debug, Clone, Copy, PartialEq, Eq)]
enum NumberBeside {
    Before,
    After,
    None,
}

/// `pH 7`, `5 % lipid`: a condition with its number.
fn number_beside(words: &[String], span: Span) -> NumberBeside {
    let is_number = |word: &String| word.starts_with(|first: char| first.is_ascii_digit());
    let after = words.get(span.start + span.length).is_some_and(is_number);
    let before = span.start.checked_sub(1).and_then(|place| words.get(place)).is_some_and(is_number);
    match (before, after) {
        (_, true) => NumberBeside::After,
        (true, false) => NumberBeside::Before,
        (false, false) => NumberBeside::None,
    }
}

/// `log Kow (method)`: a bracket with nothing but a companion's word counts as if it stood outside.
fn add_companion(bracket: &str, known: &ColumnWords, main: &mut ConceptSet, value: &mut NamesValue) {
    if parse_unit(bracket).is_some() {
        return;
    }
    let words = header_words(bracket);
    let whole =
        known.index.spans(&words).into_iter().filter(|span| span.start == 0 && span.length == words.len());
    for span in whole.filter(|span| known.not_a_value.contains(&span.concept)) {
        main.insert(span.concept);
        *value = NamesValue::No;
    }
}
