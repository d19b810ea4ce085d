//! One segment of text from its first word to the end: qualifiers, numbers, units, and what is left over.

use super::expression::{End, Expression};
use super::number::{read_number, starts_number};
use super::qualifier::{Qualifier, take_qualifier, take_qualifier_after};
use super::units::take_unit;
use super::words::starts_remark;
use super::{QuantityFault, ReadAs};
use crate::quantity::{Bound, Dimension, Unit};

/// What stands before the first number of a segment.
pub(super) struct Opening<'text> {
    /// Words that are no qualifier.
    pub(super) label: String,
    qualifier: Qualifier,
    approximate: bool,
    between: bool,
    /// From the first number on.
    pub(super) rest: &'text str,
}

pub(super) fn read_opening(text: &str) -> Opening<'_> {
    let mut opening = Opening {
        label: String::new(),
        qualifier: Qualifier::Exactly,
        approximate: false,
        between: false,
        rest: text.trim_start(),
    };
    loop {
        if opening.rest.is_empty() || starts_number(opening.rest) {
            return opening;
        }
        if let Some((qualifier, after)) = take_qualifier(opening.rest) {
            match qualifier {
                Qualifier::About => opening.approximate = true,
                Qualifier::Between => opening.between = true,
                Qualifier::Exactly => {}
                Qualifier::Above | Qualifier::AtLeast | Qualifier::Below | Qualifier::AtMost => {
                    opening.qualifier = qualifier;
                }
            }
            opening.rest = after.trim_start();
            continue;
        }
        let length = opening
            .rest
            .find(|character: char| {
                character.is_whitespace() || matches!(character, '<' | '>' | '≤' | '≥' | '~' | '=')
            })
            .filter(|length| *length > 0)
            .unwrap_or(opening.rest.len());
        let (word, after) = opening.rest.split_at(length);
        if !opening.label.is_empty() {
            opening.label.push(' ');
        }
        opening.label.push_str(word);
        opening.rest = after.trim_start();
    }
}

pub(super) fn read_value(opening: &Opening<'_>, read_as: ReadAs) -> Result<Expression, QuantityFault> {
    let (first, rest) = read_number(opening.rest, read_as.decimal)?.ok_or(QuantityFault::NoNumber)?;
    let (first_unit, rest) = unit_of(rest);
    let mut expression = Expression {
        low: End::OPEN,
        high: End::OPEN,
        unit: first_unit,
        written_sd: None,
        approximate: opening.approximate,
        remarks: Vec::new(),
    };
    let rest = if let Some(after) = take_plus_minus(rest) {
        let (sd, after) = read_number(after, read_as.decimal)?.ok_or(QuantityFault::NoNumber)?;
        let (sd_unit, after) = unit_of(after);
        if let (Some(value_unit), Some(sd_unit)) = (first_unit, sd_unit)
            && value_unit != sd_unit
        {
            return Err(QuantityFault::WrongDimension(sd_unit));
        }
        expression.unit = first_unit.or(sd_unit);
        expression.written_sd = Some(sd.abs());
        (expression.low, expression.high) = ends(opening.qualifier, first, first_unit);
        after
    } else if let Some(upper) = read_upper_end(rest, opening, read_as)? {
        let low_unit = first_unit.or(upper.unit);
        expression.unit = low_unit;
        expression.approximate |= upper.approximate;
        expression.low = End { bound: low_bound(opening.qualifier, first)?, unit: low_unit };
        expression.high =
            End { bound: high_bound(upper.qualifier, upper.number)?, unit: upper.unit.or(first_unit) };
        upper.rest
    } else if let Some((qualifier, after)) = take_qualifier_after(rest)
        && opening.qualifier == Qualifier::Exactly
    {
        (expression.low, expression.high) = ends(qualifier, first, None);
        after
    } else {
        (expression.low, expression.high) = ends(opening.qualifier, first, None);
        rest
    };
    read_leftover(rest, &mut expression, read_as.dimension)?;
    Ok(expression)
}

fn unit_of(rest: &str) -> (Option<Unit>, &str) {
    // A lone dash after a number parts a range and names no unit; a lone `1` is a second number.
    match take_unit(rest) {
        Some((unit, after)) if unit != Unit::One => (Some(unit), after),
        _ => (None, rest),
    }
}

fn ends(qualifier: Qualifier, number: f64, unit: Option<Unit>) -> (End, End) {
    let end = |bound| End { bound, unit };
    match qualifier {
        Qualifier::Above => (end(Bound::Excluded(number)), End::OPEN),
        Qualifier::AtLeast => (end(Bound::Included(number)), End::OPEN),
        Qualifier::Below => (End::OPEN, end(Bound::Excluded(number))),
        Qualifier::AtMost => (End::OPEN, end(Bound::Included(number))),
        Qualifier::About | Qualifier::Exactly | Qualifier::Between => {
            (end(Bound::Included(number)), end(Bound::Included(number)))
        }
    }
}

fn low_bound(qualifier: Qualifier, number: f64) -> Result<Bound, QuantityFault> {
    match qualifier {
        Qualifier::Above => Ok(Bound::Excluded(number)),
        Qualifier::AtLeast | Qualifier::About | Qualifier::Exactly | Qualifier::Between => {
            Ok(Bound::Included(number))
        }
        Qualifier::Below | Qualifier::AtMost => Err(QuantityFault::BadRange),
    }
}

fn high_bound(qualifier: Qualifier, number: f64) -> Result<Bound, QuantityFault> {
    match qualifier {
        Qualifier::Below => Ok(Bound::Excluded(number)),
        Qualifier::AtMost | Qualifier::About | Qualifier::Exactly | Qualifier::Between => {
            Ok(Bound::Included(number))
        }
        Qualifier::Above | Qualifier::AtLeast => Err(QuantityFault::BadRange),
    }
}

struct UpperEnd<'text> {
    number: f64,
    unit: Option<Unit>,
    qualifier: Qualifier,
    approximate: bool,
    rest: &'text str,
}

/// `- 4.8 d`, `to < 5`, `and 5` after `between`, or a second qualifier after a first.
fn read_upper_end<'text>(
    text: &'text str,
    opening: &Opening<'_>,
    read_as: ReadAs,
) -> Result<Option<UpperEnd<'text>>, QuantityFault> {
    let text = text.trim_start();
    let parted = ["...", "..", "-", "~", "÷"]
        .iter()
        .find_map(|sign| text.strip_prefix(sign))
        .or_else(|| strip_word(text, "to"))
        .or_else(|| strip_word(text, "bis"));
    let joined = strip_word(text, "and").or_else(|| strip_word(text, "und"));
    let opened = opening.between || matches!(opening.qualifier, Qualifier::Above | Qualifier::AtLeast);
    let second_qualifier = opened && text.starts_with(['<', '≤']);
    let after = match (parted, joined) {
        (Some(after), _) => after,
        (None, Some(after)) if opened => after,
        (None, _) if second_qualifier => text,
        (None, _) => return Ok(None),
    };
    let upper = read_opening(after);
    if !upper.label.is_empty() || !starts_number(upper.rest) {
        return Ok(None);
    }
    let Some((number, rest)) = read_number(upper.rest, read_as.decimal)? else {
        return Ok(None);
    };
    let (unit, rest) = unit_of(rest);
    Ok(Some(UpperEnd { number, unit, qualifier: upper.qualifier, approximate: upper.approximate, rest }))
}

fn strip_word<'text>(text: &'text str, word: &str) -> Option<&'text str> {
    let start = text.get(..word.len())?;
    let rest = text.get(word.len()..)?;
    (start.eq_ignore_ascii_case(word) && !rest.starts_with(char::is_alphanumeric)).then_some(rest)
}

pub(super) fn take_plus_minus(text: &str) -> Option<&str> {
    let text = text.trim_start();
    ["±", "+/-", "+-"].iter().find_map(|sign| text.strip_prefix(sign))
}

/// What follows the value and its unit: a remark, a misspelt unit, or a second number.
fn read_leftover(rest: &str, expression: &mut Expression, dimension: Dimension) -> Result<(), QuantityFault> {
    // Asterisks point to footnotes.
    let rest = rest
        .trim_matches(|character: char| character.is_whitespace() || matches!(character, '.' | '*' | '†'));
    if rest.is_empty() {
        return Ok(());
    }
    if !rest.starts_with(char::is_alphabetic) {
        let second_number = rest.contains(|character: char| character.is_ascii_digit());
        return Err(if second_number {
            QuantityFault::SeveralValues
        } else {
            QuantityFault::UnknownUnit(rest.to_owned())
        });
    }
    let word = rest.split_whitespace().next().unwrap_or(rest);
    let explained = expression.unit.is_some() || starts_remark(word);
    if explained || dimension == Dimension::Dimensionless {
        expression.remarks.push(rest.to_owned());
        return Ok(());
    }
    Err(QuantityFault::UnknownUnit(word.to_owned()))
}
