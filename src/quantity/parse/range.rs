//! The second end of a range.

use super::number::starts_number;
use super::qualifier::{Qualifier, strip_phrase, take_qualifier_after};
use super::value::{Frame, Opening, read_measure, read_opening, unit_of};
use super::{QuantityFault, ReadAs};
use crate::quantity::Unit;

/// The upper end of a range.
pub(super) struct UpperEnd<'text> {
    pub(super) number: f64,
    pub(super) unit: Option<Unit>,
    pub(super) qualifier: Qualifier,
    pub(super) approximate: bool,
    pub(super) rest: &'text str,
}

/// Words between the ends of a range; folded.
const TO: [&str; 14] =
    ["to", "bis", "jusqu'a", "hasta", "tot", "fino a", "al", "~", "から", "至", "到", "乃至", "ないし", "a"];
/// Words between the ends of a range after `between`, or after a qualifier; folded.
const AND: [&str; 11] = ["and", "und", "et", "y", "e", "en", "と", "和", "与", "與", "及"];

/// `- 4.8 d`, `to < 5`, `and 5` after `between`, or a second qualifier after a first.
pub(super) fn read_upper_end<'text>(
    text: &'text str,
    opening: &Opening<'_>,
    read_as: ReadAs,
) -> Result<Option<UpperEnd<'text>>, QuantityFault> {
    let text = text.trim_start();
    let parted = ["...", "..", "-", "~", "÷"]
        .iter()
        .find_map(|sign| text.strip_prefix(sign))
        .or_else(|| TO.iter().find_map(|word| strip_phrase(text, word)));
    let joined = AND.iter().find_map(|word| strip_phrase(text, word));
    let opened =
        opening.frame == Frame::Between || matches!(opening.qualifier, Qualifier::Above | Qualifier::AtLeast);
    let second_qualifier = opened && text.starts_with(['<', '≤']);
    let low_end_before = take_qualifier_after(text).filter(|(qualifier, after)| {
        matches!(qualifier, Qualifier::AtLeast | Qualifier::Above)
            && starts_number(after.trim_start_matches([' ', ',', '~', '-']))
    });
    let after = match (parted, joined) {
        (Some(after), _) => after,
        (None, Some(after)) if opened => after,
        (None, Some(after)) if says_between_at_its_end(after) => after,
        (None, _) if second_qualifier => text,
        // `4以上5未満`: a qualifier follows each end.
        (None, _) if low_end_before.is_some() && opening.qualifier == Qualifier::Exactly => {
            return read_qualified_ends(text, read_as);
        }
        (None, _) => return Ok(None),
    };
    let upper = read_opening(after);
    if !upper.label.is_empty() || !starts_number(upper.rest) {
        return Ok(None);
    }
    let Some((number, rest)) = read_measure(upper.rest, read_as)? else {
        return Ok(None);
    };
    let (unit, rest) = unit_of(rest, read_as);
    // `4,7 a 25 °C` says where it was measured.
    let by_a_word = !text.starts_with(['.', '-', '~', '÷', '<', '≤']);
    if by_a_word && unit.is_some_and(|unit| unit.dimension() != read_as.dimension) {
        return Ok(None);
    }
    let rest = ["まで", "之间", "之間", "の間"]
        .iter()
        .find_map(|word| rest.trim_start().strip_prefix(word))
        .unwrap_or(rest);
    Ok(Some(UpperEnd {
        number: number.value,
        unit: unit.or(number.unit),
        qualifier: upper.qualifier,
        approximate: upper.approximate,
        rest,
    }))
}

/// `4.2と4.8の間`.
fn says_between_at_its_end(text: &str) -> bool {
    let end = text.trim_end();
    ["の間", "之间", "之間"].iter().any(|word| end.ends_with(word))
}

fn read_qualified_ends(text: &str, read_as: ReadAs) -> Result<Option<UpperEnd<'_>>, QuantityFault> {
    let Some((Qualifier::AtLeast, after)) = take_qualifier_after(text) else {
        return Err(QuantityFault::SeveralValues);
    };
    let after = after.trim_start_matches([' ', ',', '~', '-']);
    let (number, rest) = read_measure(after, read_as)?.ok_or(QuantityFault::NoNumber)?;
    let (unit, rest) = unit_of(rest, read_as);
    match take_qualifier_after(rest) {
        Some((qualifier @ (Qualifier::Below | Qualifier::AtMost), rest)) => Ok(Some(UpperEnd {
            number: number.value,
            unit: unit.or(number.unit),
            qualifier,
            approximate: false,
            rest,
        })),
        _ => Err(QuantityFault::SeveralValues),
    }
}
