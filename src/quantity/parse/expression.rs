//! What a tidied text says, in its own units: the ends of an interval, a unit, and remarks.

use super::number::{read_number, starts_number};
use super::qualifier::take_qualifier;
use super::units::{parse_unit, take_unit};
use super::value::{read_opening, read_value, take_plus_minus};
use super::words::{has_value_word, numbers_something_else};
use super::{QuantityFault, ReadAs};
use crate::quantity::{Bound, Dimension, Unit};

/// One end of an interval as written, with its own unit if it names one.
#[derive(Debug, Clone, Copy, PartialEq)]
pub(super) struct End {
    pub(super) bound: Bound,
    pub(super) unit: Option<Unit>,
}

impl End {
    pub(super) const OPEN: Self = Self { bound: Bound::Unbounded, unit: None };

    pub(super) fn convert(
        self,
        convert: impl Fn(f64, Option<Unit>) -> Result<f64, QuantityFault>,
    ) -> Result<Bound, QuantityFault> {
        Ok(match self.bound {
            Bound::Unbounded => Bound::Unbounded,
            Bound::Included(number) => Bound::Included(convert(number, self.unit)?),
            Bound::Excluded(number) => Bound::Excluded(convert(number, self.unit)?),
        })
    }
}

/// A value as written.
#[derive(Debug, Clone, PartialEq)]
pub(super) struct Expression {
    pub(super) low: End,
    pub(super) high: End,
    pub(super) unit: Option<Unit>,
    pub(super) written_sd: Option<f64>,
    pub(super) approximate: bool,
    pub(super) remarks: Vec<String>,
}

impl Expression {
    /// Reads a tidied text.
    pub(super) fn read(text: &str, read_as: ReadAs) -> Result<Self, QuantityFault> {
        let (body, mut brackets) = take_brackets(text);
        if body.contains(is_digit) {
            return read_body(&body, brackets, read_as);
        }
        // Nothing but words outside the brackets: `insoluble (< 0.1 mg/L)`, `(4.5 ± 0.2) mg/L`.
        let outside = body.trim();
        let fault = if has_value_word(outside) { QuantityFault::WordOnly } else { QuantityFault::NoNumber };
        let Some(position) = brackets.iter().position(|bracket| bracket.contains(is_digit)) else {
            return Err(if super::is_missing(outside) { QuantityFault::NoValue } else { fault });
        };
        let inside = brackets.remove(position);
        let is_unit = parse_unit(outside).is_some();
        if is_unit || outside.is_empty() {
            return read_body(&format!("{inside} {outside}"), brackets, read_as);
        }
        if super::is_missing(outside) {
            return Err(QuantityFault::NoValue);
        }
        let label = outside.ends_with(['=', ':']);
        match read_body(&inside, brackets, read_as) {
            Ok(mut expression) if label || expression.names_unit_of(read_as.dimension) => {
                expression.remarks.push(outside.to_owned());
                Ok(expression)
            }
            _ => Err(fault),
        }
    }

    fn names_unit_of(&self, dimension: Dimension) -> bool {
        self.unit.is_some_and(|unit| unit.dimension() == dimension)
    }
}

fn is_digit(character: char) -> bool {
    character.is_ascii_digit()
}

/// The text outside brackets and the contents of each outermost bracket.
fn take_brackets(text: &str) -> (String, Vec<String>) {
    let mut outside = String::with_capacity(text.len());
    let mut inside = Vec::new();
    let mut depth = 0usize;
    let mut current = String::new();
    // A power in brackets belongs to its number.
    let mut in_power = false;
    for character in text.chars() {
        match character {
            '(' if depth == 0 && outside.ends_with('^') => {
                in_power = true;
                outside.push(character);
            }
            ')' if in_power => {
                in_power = false;
                outside.push(character);
            }
            '(' | '[' | '{' => {
                depth += 1;
                if depth > 1 {
                    current.push(' ');
                }
            }
            ')' | ']' | '}' if depth > 0 => {
                depth -= 1;
                if depth == 0 {
                    inside.push(std::mem::take(&mut current).trim().to_owned());
                    outside.push(' ');
                } else {
                    current.push(' ');
                }
            }
            ')' | ']' | '}' => outside.push(' '),
            _ if depth > 0 => current.push(character),
            _ => outside.push(character),
        }
    }
    if !current.trim().is_empty() {
        inside.push(current.trim().to_owned());
    }
    inside.retain(|content| !content.is_empty());
    (outside, inside)
}

/// Finds the segment that holds the value; the others are remarks.
fn read_body(body: &str, brackets: Vec<String>, read_as: ReadAs) -> Result<Expression, QuantityFault> {
    let mut remarks = Vec::new();
    let mut value: Option<Expression> = None;
    for segment in segments(body) {
        if value.is_some() {
            if is_another_value(segment, read_as) {
                return Err(QuantityFault::SeveralValues);
            }
            remarks.push(segment.to_owned());
            continue;
        }
        match read_segment(segment, read_as)? {
            Some(expression) => value = Some(expression),
            None => remarks.push(segment.to_owned()),
        }
    }
    let mut expression = value.ok_or(QuantityFault::NoNumber)?;
    expression.remarks.append(&mut remarks);
    for bracket in brackets {
        read_bracket(&mut expression, bracket, read_as);
    }
    Ok(expression)
}

fn read_bracket(expression: &mut Expression, bracket: String, read_as: ReadAs) {
    if let Some(sd) =
        take_plus_minus(&bracket).and_then(|rest| read_number(rest, read_as.decimal).ok().flatten())
    {
        expression.written_sd = expression.written_sd.or(Some(sd.0.abs()));
        return;
    }
    let says_logarithm = matches!(bracket.to_lowercase().as_str(), "log" | "log10" | "lg" | "logarithm");
    if says_logarithm && read_as.dimension == Dimension::VolumePerMass {
        (expression.low.unit, expression.high.unit) = (None, None);
        expression.unit = Some(Unit::LogLitrePerKilogram);
        return;
    }
    match parse_unit(&bracket) {
        Some(unit) if expression.unit.is_none() && !bracket.contains(is_digit) => {
            expression.unit = Some(unit);
        }
        _ => expression.remarks.push(bracket),
    }
}

/// The parts between `;`, `@`, and a comma that stands in no number.
fn segments(body: &str) -> Vec<&str> {
    let mut parts = Vec::new();
    let mut start = 0;
    let bytes = body.as_bytes();
    for (position, byte) in bytes.iter().enumerate() {
        let separates = match byte {
            b';' | b'@' => true,
            b',' => !bytes.get(position + 1).is_some_and(u8::is_ascii_digit),
            _ => false,
        };
        if separates {
            parts.push(body.get(start..position).unwrap_or_default().trim());
            start = position + 1;
        }
    }
    parts.push(body.get(start..).unwrap_or_default().trim());
    parts.retain(|part| !part.is_empty());
    parts
}

/// Whether a segment after the value is a second value of the same kind.
fn is_another_value(segment: &str, read_as: ReadAs) -> bool {
    let mut rest = segment;
    while let Some((_, after)) = take_qualifier(rest) {
        rest = after;
    }
    if !starts_number(rest.trim_start()) {
        return false;
    }
    let Ok(Some((number, rest))) = read_number(rest, read_as.decimal) else {
        return false;
    };
    match take_unit(rest) {
        Some((unit, after)) => unit.dimension() == read_as.dimension && after.trim().is_empty(),
        None => rest.trim().is_empty() && !(1900.0..2100.0).contains(&number),
    }
}

/// The value of a segment; `None` if the segment holds none.
fn read_segment(segment: &str, read_as: ReadAs) -> Result<Option<Expression>, QuantityFault> {
    let (label, rest) = split_label(segment);
    let opening = read_opening(rest);
    if !starts_number(opening.rest) {
        return Ok(None);
    }
    if label.is_none() && numbers_something_else(&opening.label) {
        return Ok(None);
    }
    let mut expression = read_value(&opening, read_as)?;
    let label = label.unwrap_or(opening.label.as_str()).trim();
    if !label.is_empty() {
        if read_as.dimension == Dimension::VolumePerMass {
            let by_label = unit_by_label(label, expression.unit);
            if by_label != expression.unit {
                (expression.low.unit, expression.high.unit) = (None, None);
            }
            expression.unit = by_label;
        }
        expression.remarks.insert(0, label.to_owned());
    }
    Ok(Some(expression))
}

/// A label may say whether a Koc or BCF stands as its logarithm.
fn unit_by_label(label: &str, written: Option<Unit>) -> Option<Unit> {
    let plain = super::plain_words(label);
    if plain.split(' ').any(|word| word.starts_with("log") || word.starts_with("lg")) {
        return Some(Unit::LogLitrePerKilogram);
    }
    let names_value = ["koc", "bcf", "baf"].iter().any(|name| plain.contains(name));
    written.or(names_value.then_some(Unit::LitrePerKilogram))
}

/// `log Pow = 4.7`, `OECD 117: 3.1`: the words before the last sign that is no qualifier, and the rest.
fn split_label(segment: &str) -> (Option<&str>, &str) {
    let positions = segment.char_indices().rev().filter(|(_, character)| matches!(character, ':' | '='));
    for (position, _) in positions {
        let (before, after) = segment.split_at(position);
        let after = after.get(1..).unwrap_or_default();
        if before.ends_with(['<', '>']) || after.starts_with(['<', '>']) {
            continue;
        }
        if before.contains(char::is_alphabetic) && after.contains(is_digit) {
            return (Some(before), after);
        }
    }
    (None, segment)
}
