//! What a part of a text between separators says: values, or a remark beside one.

use super::brackets::MARK;
use super::expression::Expression;
use super::label::{split_label, unit_by_label};
use super::leftover::read_leftover;
use super::number::starts_number;
use super::qualifier::strip_phrase;
use super::units::take_unit;
use super::value::{Opening, read_opening, read_value};
use super::words::{Lead, ends_as_a_span, lead_of, numbers_something_else};
use super::{QuantityFault, ReadAs};
use crate::quantity::{Dimension, Unit};

/// A part of the text outside brackets.
#[derive(Debug, Clone, Copy)]
pub(super) struct Segment<'text> {
    pub(super) text: &'text str,
    /// What parts it from the one before.
    pub(super) separator: char,
}

/// The parts between `;`, `@`, `|`, and a comma that stands in no number.
pub(super) fn segments(body: &str) -> Vec<Segment<'_>> {
    let mut parts = Vec::new();
    let (mut start, mut separator) = (0, ';');
    let bytes = body.as_bytes();
    for (position, byte) in bytes.iter().enumerate() {
        let separates = match byte {
            b';' | b'@' | b'|' => true,
            b',' => !is_between_digits(bytes, position),
            _ => false,
        };
        if separates {
            parts.push(Segment { text: body.get(start..position).unwrap_or_default(), separator });
            (start, separator) = (position + 1, char::from(*byte));
        }
    }
    parts.push(Segment { text: body.get(start..).unwrap_or_default(), separator });
    parts
}

/// Whether a comma may belong to a number.
fn is_between_digits(bytes: &[u8], position: usize) -> bool {
    let digit = |position: Option<usize>| {
        position.and_then(|position| bytes.get(position)).is_some_and(u8::is_ascii_digit)
    };
    let before = position.checked_sub(1);
    // `,5` is a half.
    let begins = before
        .and_then(|before| bytes.get(before))
        .is_none_or(|byte| !byte.is_ascii_alphanumeric() && byte.is_ascii());
    digit(Some(position + 1)) && (digit(before) || begins)
}

/// What stands before a segment.
#[derive(Debug, Clone, Copy, PartialEq, Eq)]
pub(super) enum Before {
    /// No value yet.
    NoValue,
    /// A value, and remarks after it.
    Remark,
    /// A value with a unit of its own.
    ValueWithUnit,
    /// A value without one.
    BareValue,
    /// A value behind words with `:` or `=` that nobody knows: `isomer A: 4.2`.
    Labelled,
}

/// The values of a segment, each with the length of text up to its end; none for a remark.
pub(super) fn read_segment(
    segment: Segment<'_>,
    before: Before,
    read_as: ReadAs,
) -> Result<Vec<(Expression, usize)>, QuantityFault> {
    let text = segment.text;
    let (label, rest) = split_label(text);
    let mut opening = read_opening(rest);
    if segment.separator == '@' || !starts_number(opening.rest) {
        return Ok(Vec::new());
    }
    if let Some(qualifier) = label.and_then(|label| label.qualifier) {
        opening.qualifier = qualifier;
    }
    let label = label.filter(|label| label.qualifier.is_none()).map(|label| label.text);
    if !leads_a_value(label, &opening, before, read_as)? {
        return Ok(Vec::new());
    }
    if before != Before::NoValue && label.is_none() && opening.label.is_empty() {
        match stands_alone(opening.rest, before, read_as)? {
            Alone::Value => {}
            Alone::Remark => return Ok(Vec::new()),
        }
    }
    read_values(text, label, opening, before, read_as)
}

/// Whether the words before a number say that it is a value of what is asked for.
fn leads_a_value(
    label: Option<&str>,
    opening: &Opening<'_>,
    before: Before,
    read_as: ReadAs,
) -> Result<bool, QuantityFault> {
    if label.is_none() && numbers_something_else(&opening.label) {
        return Ok(false);
    }
    let unit = unit_after_number(opening.rest, read_as);
    let own_unit = unit.is_some_and(|unit| unit.dimension() == read_as.dimension);
    let first = before == Before::NoValue;
    if !first && unit.is_some() && !own_unit && (label.is_some() || !opening.label.is_empty()) {
        return Ok(false);
    }
    let not_told_apart = if first { QuantityFault::NoNumber } else { QuantityFault::SeveralValues };
    let is_time = read_as.dimension == Dimension::Time;
    if is_time && ends_as_a_span(&opening.label) {
        return Err(not_told_apart);
    }
    let (words, signed) = match label {
        Some(label) if opening.label.is_empty() => (label, Signed::Yes),
        Some(label) if lead_of(&opening.label) == Lead::Value => (label, Signed::Yes),
        Some(_) | None => (opening.label.as_str(), Signed::No),
    };
    if words.is_empty() {
        return Ok(true);
    }
    match (lead_of(words), signed) {
        (Lead::Value, _) => Ok(true),
        (Lead::OtherKind, _) => Ok(false),
        (Lead::ValueWord, _) if !is_time && (own_unit || signed == Signed::Yes) => Ok(true),
        (Lead::Unknown, _) if own_unit => Ok(true),
        (Lead::Unknown, Signed::Yes) if first || before == Before::Labelled => Ok(true),
        (Lead::Unknown, _)
            if is_year_like(opening.rest) || (!first && is_large_integer(opening.rest, read_as)) =>
        {
            Ok(false)
        }
        (Lead::Unknown | Lead::ValueWord | Lead::Denial, _) => Err(not_told_apart),
    }
}

/// Whether a label ends with `=` or `:`.
#[derive(Debug, Clone, Copy, PartialEq, Eq)]
enum Signed {
    Yes,
    No,
}

/// The unit right after the first number of a text.
pub(super) fn unit_after_number(text: &str, read_as: ReadAs) -> Option<Unit> {
    let opening = read_opening(text);
    let (_, rest) = super::number::read_number(opening.rest, read_as.decimal).ok().flatten()?;
    // A dash parts a range and names no unit.
    take_unit(rest, read_as.dimension).map(|(unit, _)| unit).filter(|unit| *unit != Unit::One)
}

/// Whether a text is a year and nothing else.
pub(super) fn is_year_like(text: &str) -> bool {
    let text = text.trim();
    text.len() == 4 && text.parse().is_ok_and(|year: u32| (1900..2100).contains(&year))
}

/// The number of a report is no log Kow.
fn is_large_integer(text: &str, read_as: ReadAs) -> bool {
    read_as.dimension == Dimension::Dimensionless
        && text.trim().parse().is_ok_and(|number: u64| number >= 100)
}

enum Alone {
    Value,
    Remark,
}

/// What a number without words before it is, where a value stands before it already.
fn stands_alone(text: &str, before: Before, read_as: ReadAs) -> Result<Alone, QuantityFault> {
    if is_year_like(text) {
        let never = matches!(
            read_as.dimension,
            Dimension::Dimensionless | Dimension::Percent | Dimension::Temperature
        );
        return match before {
            _ if never => Ok(Alone::Remark),
            Before::Remark => Ok(Alone::Remark),
            Before::ValueWithUnit => Err(QuantityFault::SeveralValues),
            Before::BareValue | Before::NoValue | Before::Labelled => Ok(Alone::Value),
        };
    }
    match unit_after_number(text, read_as) {
        Some(unit) if unit.dimension() != read_as.dimension => Ok(Alone::Remark),
        Some(_) | None => Ok(Alone::Value),
    }
}

/// The values that follow each other with `/`, `and` or the like between.
fn read_values(
    text: &str,
    label: Option<&str>,
    opening: Opening<'_>,
    before: Before,
    read_as: ReadAs,
) -> Result<Vec<(Expression, usize)>, QuantityFault> {
    let mut values: Vec<(Expression, usize)> = Vec::new();
    let mut opening = opening;
    let mut label = label.map(str::to_owned);
    let signed = label.as_deref().is_some_and(|label| lead_of(label) == Lead::Unknown);
    loop {
        let (mut expression, rest) = read_value(&opening, read_as)?;
        expression.signed = signed;
        let own = label.take().unwrap_or_else(|| std::mem::take(&mut opening.label));
        let own = Some(own.trim().to_owned()).filter(|own| !own.is_empty());
        expression.label = own.or_else(|| values.last().and_then(|(before, _)| before.label.clone()));
        if let Some(label) = expression.label.clone() {
            let by_label = unit_by_label(&label, expression.unit, read_as)?;
            if by_label != expression.unit {
                expression.set_unit(by_label);
            }
            expression.remarks.push(label);
        }
        let start = values.last().map_or(0, |(_, end)| *end);
        if let Some(next) = next_in_list(rest)? {
            check_list(opening.rest, rest, &next, &expression, read_as)?;
            // The brackets before the joining word belong to this value; their marks are white space.
            let end = text.len() - rest.trim_start().len();
            text.get(start..end).unwrap_or_default().clone_into(&mut expression.written);
            values.push((expression, end));
            if values.len() > super::MOST_VALUES {
                return Err(QuantityFault::SeveralValues);
            }
            opening = next;
            continue;
        }
        read_leftover(rest, &mut expression, before, read_as)?;
        text.get(start..).unwrap_or_default().clone_into(&mut expression.written);
        values.push((expression, text.len()));
        return Ok(values);
    }
}

/// Words between the values of a list; folded.
pub(super) const JOINERS: [&str; 21] = [
    "and",
    "und",
    "et",
    "y",
    "e",
    "en",
    "or",
    "oder",
    "ou",
    "o",
    "of",
    "と",
    "和",
    "及び",
    "および",
    "及",
    "又は",
    "または",
    "或者",
    "或",
    "与",
];

/// The opening of the value that follows `/`, `and` or the like.
fn next_in_list(rest: &str) -> Result<Option<Opening<'_>>, QuantityFault> {
    let rest = rest.trim_start();
    // `1.3 E -5` is a number with spaces in it.
    let after = rest.trim_start_matches(['e', 'E']).trim_start();
    if rest.starts_with(['e', 'E']) && after.starts_with(['-', '+']) {
        return Ok(None);
    }
    let after = rest
        .strip_prefix(['/', '&'])
        .or_else(|| JOINERS.iter().find_map(|joiner| strip_phrase(rest, joiner)));
    let Some(opening) = after.map(read_opening) else {
        return Ok(None);
    };
    if !starts_number(opening.rest) {
        return Ok(None);
    }
    match lead_of(&opening.label) {
        _ if opening.label.is_empty() => Ok(Some(opening)),
        Lead::Value => Ok(Some(opening)),
        // `4.2 and pH 4.6`
        Lead::OtherKind => Ok(None),
        Lead::Unknown | Lead::ValueWord | Lead::Denial => Err(QuantityFault::SeveralValues),
    }
}

/// Refuses lists that may be something else: `1/2` is a half, `1 a and 6 mo` a sum.
fn check_list(
    first: &str,
    rest: &str,
    next: &Opening<'_>,
    expression: &Expression,
    read_as: ReadAs,
) -> Result<(), QuantityFault> {
    let between = rest.trim_start();
    let bracketed = rest.len() > between.len()
        && rest.get(..rest.len() - between.len()).is_some_and(|gap| gap.contains(MARK));
    let first = first.get(..first.len() - rest.len()).unwrap_or_default();
    if between.starts_with('/') && !bracketed && is_integer(first) && starts_with_integer(next.rest) {
        return Err(QuantityFault::SeveralValues);
    }
    let next_unit = unit_after_number(next.rest, read_as);
    if !between.starts_with('/') && sums_up(expression.unit, next_unit) {
        return Err(QuantityFault::SeveralValues);
    }
    Ok(())
}

/// Whether a smaller unit of time after a larger one may add to it.
pub(super) fn sums_up(unit: Option<Unit>, next: Option<Unit>) -> bool {
    let days = |unit: Option<Unit>| {
        unit.filter(|unit| unit.dimension() == Dimension::Time).and_then(|unit| unit.to_canonical(1.0, None))
    };
    days(unit).zip(days(next)).is_some_and(|(larger, smaller)| smaller < larger)
}

pub(super) fn is_integer(text: &str) -> bool {
    let text = text.trim();
    !text.is_empty() && text.bytes().all(|byte| byte.is_ascii_digit())
}

/// Whether a text begins with digits and no decimals.
pub(super) fn starts_with_integer(text: &str) -> bool {
    let after = text.trim_start().trim_start_matches(|character: char| character.is_ascii_digit());
    after.len() < text.trim_start().len() && !after.starts_with(['.', ','])
}
