//! What stands at a key of a rule file: texts, numbers, days and words.
//!
//! A reader gives `None` both for an absent key and for a faulty one: a file with a fault is refused as a whole, so
//! whatever stands in for the faulty value is never applied.

use std::ops::Range;

use toml::Spanned;
use toml::de::DeValue;

use super::section::Section;
use crate::fault::{RuleMistake, nearest};
use crate::quantity::Date;

/// A value with its place in the file.
#[derive(Debug, Clone, PartialEq)]
pub(crate) struct Located<T> {
    pub value: T,
    pub span: Range<usize>,
}

/// A text or a number, as limits are written.
#[derive(Debug, Clone, PartialEq)]
pub(crate) enum Scalar {
    Text(String),
    /// The number, and as it was written.
    Number(f64, String),
}

impl Section<'_> {
    fn text_of(&self, key: &str, value: &Spanned<DeValue<'_>>) -> Option<Located<String>> {
        let Some(text) = value.get_ref().as_str() else {
            self.wrong_kind(key, "a text in quotes", value);
            return None;
        };
        if text.trim().is_empty() {
            self.report(value.span(), RuleMistake::EmptyText { key: key.to_owned() });
            return None;
        }
        Some(Located { value: text.to_owned(), span: value.span() })
    }

    /// The text of a key.
    pub fn text(&self, key: &str) -> Option<Located<String>> {
        self.text_of(key, self.value(key)?)
    }

    /// The texts of a list; an empty list is a fault.
    pub fn texts(&self, key: &str) -> Option<Vec<Located<String>>> {
        let items = self.list(key, "a list of texts in quotes")?;
        if items.is_empty() {
            let span = self.value(key)?.span();
            self.report(span, RuleMistake::EmptyList { key: key.to_owned() });
        }
        Some(items.iter().filter_map(|item| self.text_of(key, item)).collect())
    }

    /// `true` or `false`; an absent key is `false`.
    pub fn flag(&self, key: &str) -> bool {
        self.value(key).is_some_and(|value| {
            value.get_ref().as_bool().unwrap_or_else(|| {
                self.wrong_kind(key, "true or false", value);
                false
            })
        })
    }

    /// A number without a unit.
    pub fn number(&self, key: &str) -> Option<Located<f64>> {
        self.number_of(key, self.value(key)?)
    }

    /// The numbers of a list.
    pub fn numbers(&self, key: &str) -> Option<Vec<Located<f64>>> {
        let items = self.list(key, "a list of numbers")?;
        Some(items.iter().filter_map(|item| self.number_of(key, item)).collect())
    }

    fn number_of(&self, key: &str, value: &Spanned<DeValue<'_>>) -> Option<Located<f64>> {
        let number = number(value.get_ref());
        if number.is_none() {
            self.wrong_kind(key, "a finite number without quotes", value);
        }
        number.map(|value_of| Located { value: value_of, span: value.span() })
    }

    fn scalar_of(&self, key: &str, value: &Spanned<DeValue<'_>>) -> Option<Located<Scalar>> {
        let scalar = match (value.get_ref().as_str(), number(value.get_ref())) {
            (Some(text), _) => Scalar::Text(text.to_owned()),
            (None, Some(number)) => Scalar::Number(number, self.faults.text(value.span()).to_owned()),
            (None, None) => {
                self.wrong_kind(key, "a finite number, or a number with its unit in quotes", value);
                return None;
            }
        };
        Some(Located { value: scalar, span: value.span() })
    }

    /// A text or a number.
    pub fn scalar(&self, key: &str) -> Option<Located<Scalar>> {
        self.scalar_of(key, self.value(key)?)
    }

    /// The two ends of a range.
    pub fn pair(&self, key: &str) -> Option<Located<[Located<Scalar>; 2]>> {
        const WANTED: &str = "a list of two values, the low end and the high end";
        let items = self.list(key, WANTED)?;
        let value = self.value(key)?;
        let [low, high] = items else {
            let mistake = RuleMistake::WrongKind {
                key: key.to_owned(),
                wanted: WANTED,
                found: "a list of another length",
            };
            self.report(value.span(), mistake);
            return None;
        };
        let ends = [self.scalar_of(key, low)?, self.scalar_of(key, high)?];
        Some(Located { value: ends, span: value.span() })
    }

    /// A day.
    pub fn date(&self, key: &str) -> Option<Located<Date>> {
        let value = self.value(key)?;
        let Some(written) = value.get_ref().as_datetime() else {
            self.wrong_kind(key, "a day without quotes, for example 2023-03-31", value);
            return None;
        };
        let day =
            written.date.filter(|_| written.time.is_none() && written.offset.is_none()).and_then(|day| {
                let year = i16::try_from(day.year).ok()?;
                Date::new(year, i8::try_from(day.month).ok()?, i8::try_from(day.day).ok()?)
            });
        if day.is_none() {
            let found = self.faults.text(value.span()).to_owned();
            self.report(value.span(), RuleMistake::NotADay { found });
        }
        day.map(|day| Located { value: day, span: value.span() })
    }

    /// One of the words a key takes.
    pub fn word<Meaning: Copy>(&self, key: &str, words: &[(&str, Meaning)]) -> Option<Meaning> {
        self.meaning(key, &self.text(key)?, words)
    }

    /// Several of the words a key takes.
    pub fn words<Meaning: Copy>(&self, key: &str, words: &[(&str, Meaning)]) -> Option<Vec<Meaning>> {
        let texts = self.texts(key)?;
        Some(texts.iter().filter_map(|text| self.meaning(key, text, words)).collect())
    }

    fn meaning<Meaning: Copy>(
        &self,
        key: &str,
        text: &Located<String>,
        words: &[(&str, Meaning)],
    ) -> Option<Meaning> {
        let meaning = words.iter().find(|(word, _)| *word == text.value);
        if meaning.is_none() {
            let known = words.iter().map(|(word, _)| *word);
            let mistake = RuleMistake::UnknownWord {
                key: key.to_owned(),
                found: text.value.clone(),
                nearest: nearest(&text.value, known.clone()).map(str::to_owned),
                known: known.map(str::to_owned).collect(),
            };
            self.report(text.span.clone(), mistake);
        }
        meaning.map(|(_, meaning)| *meaning)
    }

    /// Whether a text stands at the key.
    pub fn is_text(&self, key: &str) -> bool {
        self.value(key).is_some_and(|value| value.get_ref().is_str())
    }

    /// Whether `[]` stands at the key.
    pub fn is_empty_list(&self, key: &str) -> bool {
        self.value(key).and_then(|value| value.get_ref().as_array()).is_some_and(|list| list.is_empty())
    }
}

/// The number at a key, if it is a finite decimal one.
pub(super) fn number(value: &DeValue<'_>) -> Option<f64> {
    let number = match value {
        DeValue::Integer(integer) if integer.radix() == 10 => integer.as_str().parse().ok()?,
        DeValue::Float(float) => float.as_str().parse().ok()?,
        DeValue::Integer(_)
        | DeValue::String(_)
        | DeValue::Boolean(_)
        | DeValue::Datetime(_)
        | DeValue::Array(_)
        | DeValue::Table(_) => return None,
    };
    Some(number).filter(|number: &f64| number.is_finite())
}
