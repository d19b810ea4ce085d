//! The words before a number, as far as they change what it means.

use super::qualifier::{Qualifier, take_qualifier};
use super::text::tidy;
use super::{QuantityFault, ReadAs, Scale, plain_words};
use crate::quantity::{Dimension, Unit};

/// Words before `=` or `:`.
#[derive(Debug, Clone, Copy)]
pub(super) struct Label<'text> {
    pub(super) text: &'text str,
    /// Set where the words only qualify the number: `max: 4.8`.
    pub(super) qualifier: Option<Qualifier>,
}

/// `log Pow = 4.7`, `OECD 117: 3.1`: the words before the last sign that is no qualifier, and the rest.
pub(super) fn split_label(segment: &str) -> (Option<Label<'_>>, &str) {
    // What stands before the last digit may hold labels; behind it, no number follows.
    let Some(last_digit) = segment.rfind(|character: char| character.is_ascii_digit()) else {
        return (None, segment);
    };
    let Some(first_letter) = segment.find(char::is_alphabetic) else {
        return (None, segment);
    };
    let signs = segment.char_indices().rev().filter(|(_, character)| matches!(character, ':' | '='));
    for (position, _) in signs {
        let (before, after) = segment.split_at(position);
        let after = after.get(1..).unwrap_or_default();
        if before.ends_with(['<', '>']) || after.starts_with(['<', '>']) {
            continue;
        }
        if first_letter < position && position < last_digit {
            let text = before.trim();
            let qualifier = take_qualifier(text)
                .filter(|(_, rest)| rest.trim().is_empty())
                .map(|(qualifier, _)| qualifier);
            return (Some(Label { text, qualifier }), after);
        }
    }
    (None, segment)
}

/// A label may say whether a value stands as its logarithm, whatever the column does.
pub(super) fn unit_by_label(
    label: &str,
    written: Option<Unit>,
    read_as: ReadAs,
) -> Result<Option<Unit>, QuantityFault> {
    let plain = plain_words(&tidy(label));
    let words = || plain.split(' ');
    let says_log = words().any(|word| word.starts_with("log") || word.starts_with("lg"));
    match (read_as.dimension, read_as.scale) {
        (Dimension::VolumePerMass, _) if says_log => Ok(Some(Unit::LogLitrePerKilogram)),
        (Dimension::VolumePerMass, _) => {
            let names_value = ["koc", "bcf", "baf"].iter().any(|name| plain.contains(name));
            Ok(written.or(names_value.then_some(Unit::LitrePerKilogram)))
        }
        // Ka where pKa is asked for is its inverse; it is not read.
        (Dimension::Dimensionless, _) if plain == "ka" => Err(QuantityFault::NoNumber),
        (Dimension::Dimensionless, Scale::Logarithm) => {
            let ratio =
                ["kow", "pow", "koa", "k ow", "p ow", "k oa", "p", "k", "d", "dow"].contains(&plain.as_str());
            Ok(if ratio && written.is_none() { Some(Unit::Ratio) } else { written })
        }
        (Dimension::Dimensionless, Scale::Linear) if says_log => Ok(Some(Unit::LogarithmOfRatio)),
        (_, _) => Ok(written),
    }
}
