//! One value from its first word on: qualifiers, numbers, units.

use super::expression::{End, Expression};
use super::number::{read_number, read_power, starts_number};
use super::qualifier::{Qualifier, strip_phrase, take_qualifier, take_qualifier_after};
use super::range::read_upper_end;
use super::units::take_unit;
use super::{LetterA, QuantityFault, ReadAs, Scale};
use crate::quantity::{Bound, Dimension, Unit};

/// What stands before the first number of a text.
#[derive(Debug, Clone)]
pub(super) struct Opening<'text> {
    /// Words that are no qualifier.
    pub(super) label: String,
    pub(super) qualifier: Qualifier,
    pub(super) approximate: bool,
    pub(super) frame: Frame,
    /// From the first number on.
    pub(super) rest: &'text str,
}

/// A word before the number that lets a second end follow.
#[derive(Debug, Clone, Copy, PartialEq, Eq)]
pub(super) enum Frame {
    None,
    From,
    Between,
}

pub(super) fn read_opening(text: &str) -> Opening<'_> {
    let mut opening = Opening {
        label: String::new(),
        qualifier: Qualifier::Exactly,
        approximate: false,
        frame: Frame::None,
        rest: text.trim_start(),
    };
    loop {
        if opening.rest.is_empty() || starts_number(opening.rest) {
            return opening;
        }
        if let Some((qualifier, after)) = take_qualifier(opening.rest) {
            match qualifier {
                Qualifier::About => opening.approximate = true,
                Qualifier::Between => opening.frame = Frame::Between,
                Qualifier::From => opening.frame = Frame::From,
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

/// A number, and its unit where its form says it: a power of ten whose exponent was taken.
pub(super) struct Number {
    pub(super) value: f64,
    pub(super) unit: Option<Unit>,
}

/// Where a logarithm is asked for, `10^4.5` is the logarithm 4.5.
pub(super) fn read_measure(text: &str, read_as: ReadAs) -> Result<Option<(Number, &str)>, QuantityFault> {
    let power = read_power(text, read_as.decimal).filter(|(_, rest)| !rest.starts_with(is_decimal_sign));
    match (power, read_as.scale) {
        (Some((exponent, rest)), Scale::Logarithm) => {
            let unit = (read_as.dimension == Dimension::Dimensionless).then_some(Unit::PowerOfTen);
            Ok(Some((Number { value: exponent, unit: unit.or(Some(read_as.default_unit)) }, rest)))
        }
        (Some((exponent, rest)), Scale::Linear) if exponent.fract().abs() > 0.0 => {
            Ok(Some((Number { value: 10f64.powf(exponent), unit: None }, rest)))
        }
        (Some(_) | None, Scale::Linear | Scale::Logarithm) => {
            let number = read_number(text, read_as.decimal)?;
            Ok(number.map(|(value, rest)| (Number { value, unit: None }, rest)))
        }
    }
}

fn is_decimal_sign(character: char) -> bool {
    matches!(character, '.' | ',')
}

/// Reads the value that an opening leads to; what follows it is handed back.
pub(super) fn read_value<'text>(
    opening: &Opening<'text>,
    read_as: ReadAs,
) -> Result<(Expression, &'text str), QuantityFault> {
    let (first, rest) = read_measure(opening.rest, read_as)?.ok_or(QuantityFault::NoNumber)?;
    let (first_unit, rest) =
        if goes_on_with_a_word(rest, opening, read_as) { (None, rest) } else { unit_of(rest, read_as) };
    let first_unit = first_unit.or(first.unit);
    let mut expression = Expression::of_unit(first_unit);
    expression.approximate = opening.approximate;
    let rest = if let Some(after) = take_plus_minus(rest) {
        read_plus_minus(after, &mut expression, read_as)?
    } else {
        rest
    };
    if expression.written_sd.is_some() {
        (expression.low, expression.high) = ends(opening.qualifier, first.value, expression.unit);
        return Ok((expression, rest));
    }
    if let Some(upper) = read_upper_end(rest, opening, read_as)? {
        let low_unit = first_unit.or(upper.unit);
        expression.unit = low_unit;
        expression.approximate |= upper.approximate;
        expression.low = End { bound: low_bound(opening.qualifier, first.value)?, unit: low_unit };
        expression.high =
            End { bound: high_bound(upper.qualifier, upper.number)?, unit: upper.unit.or(first_unit) };
        return Ok((expression, upper.rest));
    }
    let mut qualifier = opening.qualifier;
    let mut rest = rest;
    while let Some((after_number, after)) = take_qualifier_after(rest) {
        match (after_number, qualifier) {
            (Qualifier::About, _) => expression.approximate = true,
            (_, Qualifier::Exactly) => qualifier = after_number,
            // `at most 6 or more` says nothing.
            (_, _) => return Err(QuantityFault::BadRange),
        }
        rest = after;
    }
    (expression.low, expression.high) = ends(qualifier, first.value, None);
    Ok((expression, rest))
}

fn read_plus_minus<'text>(
    text: &'text str,
    expression: &mut Expression,
    read_as: ReadAs,
) -> Result<&'text str, QuantityFault> {
    let (sd, after) = read_number(text, read_as.decimal)?.ok_or(QuantityFault::NoNumber)?;
    let (sd_unit, after) = unit_of(after, read_as);
    if let (Some(value_unit), Some(sd_unit)) = (expression.unit, sd_unit)
        && value_unit != sd_unit
    {
        return Err(QuantityFault::WrongDimension(sd_unit));
    }
    expression.unit = expression.unit.or(sd_unit);
    expression.written_sd = Some(sd.abs());
    Ok(after)
}

pub(super) fn unit_of(rest: &str, read_as: ReadAs) -> (Option<Unit>, &str) {
    // A lone dash after a number parts a range and names no unit.
    match take_unit(rest, read_as.dimension) {
        Some((unit, after)) if unit != Unit::One || !rest.trim_start().starts_with('-') => {
            (Some(unit), after)
        }
        _ => (None, rest),
    }
}

/// `4,2 a 4,8`, `4,2 y 4,6`: letters that are units, too, where no time is asked for or the opening says that an end
/// follows.
fn goes_on_with_a_word(rest: &str, opening: &Opening<'_>, read_as: ReadAs) -> bool {
    let rest = rest.trim_start();
    let word = |word| {
        strip_phrase(rest, word).is_some_and(|after| {
            let after = read_opening(after);
            after.label.is_empty() && starts_number(after.rest)
        })
    };
    let is_no_unit = read_as.dimension != Dimension::Time;
    // The accent tells it from the unit.
    let accented = rest.starts_with(['à', 'À']) && word("a");
    let of_days = |after: &str| {
        let unit_word = after.trim_start_matches(|character: char| !character.is_alphabetic());
        ["d\u{ED}a", "dia", "seman", "mes", "a\u{F1}o", "hora", "giorn", "settiman", "ann", "ore"]
            .iter()
            .any(|start| unit_word.starts_with(start))
    };
    let romance = word("a") && strip_phrase(rest, "a").is_some_and(of_days);
    word("to")
        || accented
        || romance
        || (word("a") && (is_no_unit || opening.frame == Frame::From || read_as.letter_a == LetterA::To))
        || (word("y") && (is_no_unit || opening.frame == Frame::Between))
}

fn ends(qualifier: Qualifier, number: f64, unit: Option<Unit>) -> (End, End) {
    let end = |bound| End { bound, unit };
    match qualifier {
        Qualifier::Above => (end(Bound::Excluded(number)), End::OPEN),
        Qualifier::AtLeast => (end(Bound::Included(number)), End::OPEN),
        Qualifier::Below => (End::OPEN, end(Bound::Excluded(number))),
        Qualifier::AtMost => (End::OPEN, end(Bound::Included(number))),
        Qualifier::About | Qualifier::Exactly | Qualifier::From | Qualifier::Between => {
            (end(Bound::Included(number)), end(Bound::Included(number)))
        }
    }
}

fn low_bound(qualifier: Qualifier, number: f64) -> Result<Bound, QuantityFault> {
    match qualifier {
        Qualifier::Above => Ok(Bound::Excluded(number)),
        Qualifier::AtLeast | Qualifier::About | Qualifier::Exactly | Qualifier::From | Qualifier::Between => {
            Ok(Bound::Included(number))
        }
        Qualifier::Below | Qualifier::AtMost => Err(QuantityFault::BadRange),
    }
}

fn high_bound(qualifier: Qualifier, number: f64) -> Result<Bound, QuantityFault> {
    match qualifier {
        Qualifier::Below => Ok(Bound::Excluded(number)),
        Qualifier::AtMost | Qualifier::About | Qualifier::Exactly | Qualifier::From | Qualifier::Between => {
            Ok(Bound::Included(number))
        }
        Qualifier::Above | Qualifier::AtLeast => Err(QuantityFault::BadRange),
    }
}

pub(super) fn take_plus_minus(text: &str) -> Option<&str> {
    let text = text.trim_start();
    ["±", "+/-", "+-", "∓"].iter().find_map(|sign| text.strip_prefix(sign))
}
