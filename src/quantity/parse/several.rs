//! All values of a text, each with its own unit, remarks and brackets.
//!
//! What stands before the first value is said of all, and so is what stands after the last one, unless another value has
//! remarks of its own. A unit at the end counts for all. If a part cannot be read, nothing is: it might be the one of
//! concern.

use super::brackets::{Bracket, MARK, Shape, take_brackets};
use super::expression::Expression;
use super::number::{read_number, starts_number};
use super::qualifier::{strip_phrase, take_qualifier};
use super::segment::{
    Before, Segment, is_integer, is_year_like, read_segment, segments, starts_with_integer, sums_up,
    unit_after_number,
};
use super::units::parse_unit_of;
use super::value::{read_opening, read_value, take_plus_minus};
use super::words::{has_value_word, is_missing_number};
use super::{MOST_VALUES, QuantityFault, ReadAs, Scale};
use crate::quantity::{Dimension, Unit};

/// The values of a tidied text, in order; at least one.
pub(super) fn read_all(text: &str, read_as: ReadAs) -> Result<Vec<Expression>, QuantityFault> {
    let (body, mut brackets) = take_brackets(text);
    if body.contains(is_digit) {
        return read_body(&body, brackets, read_as);
    }
    // Nothing but words outside the brackets: `insoluble (< 0.1 mg/L)`, `(4.5 ± 0.2) mg/L`.
    let outside = body.trim();
    let fault = if has_value_word(outside) { QuantityFault::WordOnly } else { QuantityFault::NoNumber };
    let Some(position) = brackets.iter().position(|bracket| bracket.text.contains(is_digit)) else {
        return Err(if is_missing_number(outside) { QuantityFault::NoValue } else { fault });
    };
    let inside = brackets.remove(position).text;
    let is_unit = parse_unit_of(outside, read_as.dimension).is_some();
    if is_unit || outside.is_empty() {
        return read_body(&format!("{inside} {outside}"), brackets, read_as);
    }
    if is_missing_number(outside) {
        return Err(QuantityFault::NoValue);
    }
    // `> water solubility (0.5 mg/L)`, `< LOQ (0.1 mg/L)`: the sign is that of the number.
    let sign = take_qualifier(outside).and_then(|(qualifier, _)| qualifier.sign());
    let inside = match sign {
        Some(_) if !starts_number(&inside) => return Err(fault),
        Some(sign) => format!("{sign} {inside}"),
        None => inside,
    };
    let label = outside.ends_with(['=', ':']);
    match read_body(&inside, brackets, read_as) {
        Ok(mut values) if label || values.iter().all(|value| names_unit_of(value, read_as.dimension)) => {
            for value in &mut values {
                value.remarks.push(outside.to_owned());
            }
            Ok(values)
        }
        _ => Err(fault),
    }
}

fn names_unit_of(value: &Expression, dimension: Dimension) -> bool {
    value.unit.is_some_and(|unit| unit.dimension() == dimension)
}

fn is_digit(character: char) -> bool {
    character.is_ascii_digit()
}

/// A value and what was said of it after it.
struct Group {
    value: Expression,
    after: Vec<String>,
}

/// The values of a text as they are found.
#[derive(Default)]
struct Found {
    before: Vec<String>,
    groups: Vec<Group>,
    /// Whether the last thing found was a remark.
    remark_last: bool,
    /// A time or temperature before the first value, which is wrong if no value follows.
    wrong: Option<Unit>,
}

impl Found {
    fn remark(&mut self, text: &str) {
        let text = text.replace(MARK, " ");
        let text = text.trim();
        if text.is_empty() {
            return;
        }
        self.remark_last = true;
        self.remarks().push(text.to_owned());
    }

    fn remarks(&mut self) -> &mut Vec<String> {
        match self.groups.last_mut() {
            Some(group) => &mut group.after,
            None => &mut self.before,
        }
    }

    fn state(&self) -> Before {
        match self.groups.last() {
            None => Before::NoValue,
            Some(_) if self.remark_last => Before::Remark,
            Some(group) if group.value.signed => Before::Labelled,
            Some(group) if group.value.unit.is_some() => Before::ValueWithUnit,
            Some(_) => Before::BareValue,
        }
    }
}

fn read_body(body: &str, brackets: Vec<Bracket>, read_as: ReadAs) -> Result<Vec<Expression>, QuantityFault> {
    let mut brackets = brackets.into_iter();
    let mut found = Found::default();
    let mut last: Option<Segment<'_>> = None;
    let parts = segments(body);
    let several_parts = parts.len() > 1;
    for segment in parts {
        let state = found.state();
        if several_parts && state == Before::NoValue && found.wrong.is_none() {
            found.wrong = time_or_temperature(segment.text, read_as);
            if found.wrong.is_some() {
                found.remark(segment.text);
                for bracket in brackets.by_ref().take(marks(segment.text)) {
                    found.remark(&bracket.text);
                }
                continue;
            }
        }
        let values = read_segment(segment, state, read_as)?;
        if values.is_empty() {
            found.remark(segment.text);
            for bracket in brackets.by_ref().take(marks(segment.text)) {
                found.remark(&bracket.text);
            }
            if !segment.text.trim().is_empty() {
                last = None;
            }
            continue;
        }
        if let Some(last) = last {
            check_separator(last, segment, &found, &values, read_as)?;
        }
        let mut start = 0;
        for (mut value, end) in values {
            let count = marks(segment.text.get(start..end).unwrap_or_default());
            start = end;
            if value.label.is_none() {
                inherit_label(&mut value, found.groups.last(), read_as)?;
            }
            found.remark_last = false;
            found.groups.push(Group { value, after: Vec::new() });
            for bracket in brackets.by_ref().take(count) {
                take_bracket(&mut found, &bracket, read_as)?;
            }
            if found.groups.len() > MOST_VALUES {
                return Err(QuantityFault::SeveralValues);
            }
        }
        last = Some(segment);
    }
    settle(found, read_as)
}

/// `96 h; 1.2 mg/L`: the unit of a duration or temperature that stands before the value.
fn time_or_temperature(text: &str, read_as: ReadAs) -> Option<Unit> {
    let opening = read_opening(text);
    let unit = unit_after_number(opening.rest, read_as).filter(|_| opening.label.is_empty())?;
    let beside = matches!(unit.dimension(), Dimension::Time | Dimension::Temperature);
    (beside && unit.dimension() != read_as.dimension).then_some(unit)
}

fn marks(text: &str) -> usize {
    text.matches(MARK).count()
}

/// A comma may be a decimal or thousands separator with a space after it; a smaller unit of time after a larger one may
/// add to it.
fn check_separator(
    last: Segment<'_>,
    segment: Segment<'_>,
    found: &Found,
    values: &[(Expression, usize)],
    read_as: ReadAs,
) -> Result<(), QuantityFault> {
    let Some((next, _)) = values.first() else {
        return Ok(());
    };
    let before = found.groups.last().and_then(|group| group.value.unit);
    if segment.separator == ',' && sums_up(before, next.unit) {
        return Err(QuantityFault::SeveralValues);
    }
    let ends_in_integer =
        last.text.rsplit(['/', ' ', MARK, '-', '~', '<', '>', '≤', '≥']).next().is_some_and(is_integer);
    if segment.separator != ',' || !ends_in_integer {
        return Ok(());
    }
    let begins = segment.text.trim_start();
    let digits = begins.bytes().take_while(u8::is_ascii_digit).count();
    let could_group = digits == 3;
    let could_be_decimals = starts_with_integer(begins);
    let bare = read_as.dimension != Dimension::Dimensionless || before.is_none();
    if bare && (could_group || could_be_decimals) { Err(QuantityFault::SeveralValues) } else { Ok(()) }
}

/// `log Koc: 3; 3.2`, `OECD 117: 4.2; 4.6`: the label stands before both.
fn inherit_label(
    value: &mut Expression,
    before: Option<&Group>,
    read_as: ReadAs,
) -> Result<(), QuantityFault> {
    let Some(label) = before.and_then(|group| group.value.label.clone()) else {
        return Ok(());
    };
    let by_label = super::label::unit_by_label(&label, value.unit, read_as)?;
    if by_label != value.unit {
        value.set_unit(by_label);
    }
    value.remarks.insert(0, label.clone());
    value.label = Some(label);
    Ok(())
}

/// What the parts of a bracket after a value are.
fn take_bracket(found: &mut Found, bracket: &Bracket, read_as: ReadAs) -> Result<(), QuantityFault> {
    for part in segments(&bracket.text) {
        let text = part.text.trim();
        if !text.is_empty() {
            take_part_of_bracket(found, text.to_owned(), bracket.shape, read_as)?;
        }
    }
    Ok(())
}

/// The SD of a value, its unit, its range, or a remark.
fn take_part_of_bracket(
    found: &mut Found,
    text: String,
    shape: Shape,
    read_as: ReadAs,
) -> Result<(), QuantityFault> {
    let Some(group) = found.groups.last_mut() else {
        return Ok(());
    };
    if let Some(sd) =
        take_plus_minus(&text).and_then(|rest| read_number(rest, read_as.decimal).ok().flatten())
    {
        group.value.written_sd = group.value.written_sd.or(Some(sd.0.abs()));
        return Ok(());
    }
    let says_logarithm = matches!(text.to_lowercase().as_str(), "log" | "log10" | "lg" | "logarithm");
    match (read_as.dimension, read_as.scale) {
        (Dimension::VolumePerMass, _) if says_logarithm => {
            group.value.set_unit(Some(Unit::LogLitrePerKilogram));
            return Ok(());
        }
        (Dimension::Dimensionless, Scale::Linear) if says_logarithm => {
            group.value.set_unit(Some(Unit::LogarithmOfRatio));
            return Ok(());
        }
        (_, _) => {}
    }
    let unit = parse_unit_of(&text, read_as.dimension);
    // A single letter that measures something else points to a footnote.
    let unit = unit.filter(|unit| unit.dimension() == read_as.dimension || text.chars().count() > 1);
    if let Some(unit) = unit.filter(|_| group.value.unit.is_none()) {
        group.value.unit = Some(unit);
        return Ok(());
    }
    match value_in_bracket(&text, shape, read_as)? {
        Some(mut value) => {
            value.unit = value.unit.or(group.value.unit);
            value.label.clone_from(&group.value.label);
            value.written = text;
            found.groups.push(Group { value, after: Vec::new() });
        }
        None => group.after.push(text),
    }
    Ok(())
}

/// `4.5 (4.2-4.8)`, `12 wk (84 d)`: a value of its own. `4.5 (4.6)` may be a value, an error or a footnote.
fn value_in_bracket(text: &str, shape: Shape, read_as: ReadAs) -> Result<Option<Expression>, QuantityFault> {
    const RANGE: [&str; 9] =
        ["range", "spanne", "bereich", "plage", "rango", "intervallo", "bereik", "範囲", "范围"];
    let text = RANGE
        .iter()
        .find_map(|word| strip_phrase(text, word))
        .map_or(text, |rest| rest.trim_start_matches([':', '=', ' ']));
    let opening = read_opening(text);
    if !opening.label.is_empty() || !starts_number(opening.rest) || is_year_like(text) {
        return Ok(None);
    }
    let Ok((value, rest)) = read_value(&opening, read_as) else {
        return Ok(None);
    };
    let of_another_kind = value.unit.is_some_and(|unit| unit.dimension() != read_as.dimension);
    if !rest.trim().is_empty() || of_another_kind {
        return Ok(None);
    }
    if value.is_range() || value.unit.is_some() {
        return Ok(Some(value));
    }
    match shape {
        Shape::Square if is_integer(text) => Ok(None),
        Shape::Square | Shape::Round => Err(QuantityFault::SeveralValues),
    }
}

/// Units and remarks that count for more than the value they stand beside.
fn settle(found: Found, read_as: ReadAs) -> Result<Vec<Expression>, QuantityFault> {
    let Found { before, groups, wrong, .. } = found;
    let several = groups.len() > 1;
    let last = groups.len().saturating_sub(1);
    let only_the_last_has_remarks =
        groups.iter().enumerate().all(|(place, group)| group.after.is_empty() || place == last);
    let shared = match groups.last() {
        Some(group) if several && only_the_last_has_remarks => group.after.clone(),
        Some(_) | None => Vec::new(),
    };
    let mut unit_after = None;
    let mut values = Vec::with_capacity(groups.len());
    for (place, Group { mut value, after }) in groups.into_iter().enumerate().rev() {
        value.unit = value.unit.or(unit_after);
        unit_after = value.unit;
        if place != last {
            value.remarks.extend(shared.iter().cloned());
        }
        value.remarks.extend(after);
        value.remarks.splice(0..0, before.iter().cloned());
        values.push(value);
    }
    values.reverse();
    let units_differ = values.iter().any(|value| value.unit.is_none())
        && values.iter().any(|value| value.unit.is_some_and(|unit| unit != read_as.default_unit));
    match values.as_slice() {
        [] => Err(wrong.map_or(QuantityFault::NoNumber, QuantityFault::WrongDimension)),
        // `12 µg/L; 15` in a column of mg/L: nobody knows what the second is in.
        _ if units_differ => Err(QuantityFault::SeveralValues),
        _ => Ok(values),
    }
}
