//! What a tidied text says, in its own units: the ends of an interval, a unit, and remarks.

use super::number::{read_number, starts_number};
use super::units::{parse_unit, take_unit};
use super::words::{Qualifier, has_value_word, numbers_something_else, starts_remark, take_qualifier};
use super::{QuantityFault, ReadAs};
use crate::quantity::{Bound, DecimalStyle, Dimension, Unit};

/// One end of an interval as written, with its own unit if it names one.
#[derive(Debug, Clone, Copy, PartialEq)]
pub(super) struct End {
    bound: Bound,
    unit: Option<Unit>,
}

impl End {
    const OPEN: Self = Self {
        bound: Bound::Unbounded,
        unit: None,
    };

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
        let fault = if has_value_word(outside) {
            QuantityFault::WordOnly
        } else {
            QuantityFault::NoNumber
        };
        let Some(position) = brackets.iter().position(|bracket| bracket.contains(is_digit)) else {
            return Err(if super::is_missing(outside) {
                QuantityFault::NoValue
            } else {
                fault
            });
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
        read_bracket(&mut expression, bracket, read_as.decimal);
    }
    Ok(expression)
}

fn read_bracket(expression: &mut Expression, bracket: String, decimal: DecimalStyle) {
    if let Some(sd) = take_plus_minus(&bracket).and_then(|rest| read_number(rest, decimal).ok().flatten()) {
        expression.written_sd = expression.written_sd.or(Some(sd.0.abs()));
        return;
    }
    match parse_unit(&bracket) {
        Some(unit) if expression.unit.is_none() && !bracket.contains(is_digit) => {
            expression.unit = Some(unit)
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
            expression.unit = unit_by_label(label, expression.unit);
        }
        expression.remarks.insert(0, label.to_owned());
    }
    Ok(Some(expression))
}

/// A label may say whether a Koc or BCF stands as its logarithm.
fn unit_by_label(label: &str, written: Option<Unit>) -> Option<Unit> {
    let plain = super::plain_words(label);
    if plain
        .split(' ')
        .any(|word| word.starts_with("log") || word.starts_with("lg"))
    {
        return Some(Unit::LogLitrePerKilogram);
    }
    let names_value = ["koc", "bcf", "baf"].iter().any(|name| plain.contains(name));
    written.or(names_value.then_some(Unit::LitrePerKilogram))
}

/// `log Pow = 4.7`, `OECD 117: 3.1`: the words before the last sign that is no qualifier, and the rest.
fn split_label(segment: &str) -> (Option<&str>, &str) {
    let positions = segment
        .char_indices()
        .rev()
        .filter(|(_, character)| matches!(character, ':' | '='));
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

/// What stands before the first number of a segment.
struct Opening<'text> {
    label: String,
    qualifier: Qualifier,
    approximate: bool,
    between: bool,
    rest: &'text str,
}

fn read_opening(text: &str) -> Opening<'_> {
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

fn read_value(opening: &Opening<'_>, read_as: ReadAs) -> Result<Expression, QuantityFault> {
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
        expression.low = End {
            bound: low_bound(opening.qualifier, first)?,
            unit: low_unit,
        };
        expression.high = End {
            bound: high_bound(upper.qualifier, upper.number)?,
            unit: upper.unit.or(first_unit),
        };
        upper.rest
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
    Ok(Some(UpperEnd {
        number,
        unit,
        qualifier: upper.qualifier,
        approximate: upper.approximate,
        rest,
    }))
}

fn strip_word<'text>(text: &'text str, word: &str) -> Option<&'text str> {
    let start = text.get(..word.len())?;
    let rest = text.get(word.len()..)?;
    (start.eq_ignore_ascii_case(word) && !rest.starts_with(char::is_alphanumeric)).then_some(rest)
}

fn take_plus_minus(text: &str) -> Option<&str> {
    let text = text.trim_start();
    ["±", "+/-", "+-"].iter().find_map(|sign| text.strip_prefix(sign))
}

/// What follows the value and its unit: a remark, a misspelt unit, or a second number.
fn read_leftover(rest: &str, expression: &mut Expression, dimension: Dimension) -> Result<(), QuantityFault> {
    let rest = rest.trim_matches(|character: char| character.is_whitespace() || character == '.');
    if rest.is_empty() {
        return Ok(());
    }
    if !rest.starts_with(char::is_alphabetic) {
        let second_number = rest.contains(is_digit);
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
