//! What follows a value and its unit.

use super::brackets::MARK;
use super::expression::Expression;
use super::number::starts_number;
use super::qualifier::strip_phrase;
use super::segment::{Before, JOINERS, unit_after_number};
use super::value::read_opening;
use super::words::{is_ratio_word, names_a_test, reads_as_remark, starts_remark};
use super::{QuantityFault, ReadAs};
use crate::quantity::Dimension;

/// What follows the value and its unit: a remark, a misspelt unit, or a second number.
pub(super) fn read_leftover(
    rest: &str,
    expression: &mut Expression,
    before: Before,
    read_as: ReadAs,
) -> Result<(), QuantityFault> {
    // Asterisks point to footnotes.
    let rest = rest
        .trim_matches(|character: char| character.is_whitespace() || matches!(character, '.' | '*' | '†'));
    if rest.is_empty() {
        return Ok(());
    }
    let has_digit = |text: &str| text.contains(|character: char| character.is_ascii_digit());
    let other_kind =
        unit_after_number(rest, read_as).is_some_and(|unit| unit.dimension() != read_as.dimension);
    if starts_number(rest) && other_kind && expression.unit.is_some() {
        // `1.2 mg/L 96 h`
        expression.remarks.push(rest.replace(MARK, " "));
        return Ok(());
    }
    if !rest.starts_with(char::is_alphabetic) {
        return Err(if has_digit(rest) {
            QuantityFault::SeveralValues
        } else {
            QuantityFault::UnknownUnit(rest.to_owned())
        });
    }
    let word = rest.split_whitespace().next().unwrap_or(rest);
    let known = starts_remark(word);
    let next_is_number = rest
        .split_whitespace()
        .nth(1)
        .is_some_and(|next| next.starts_with(|first: char| first.is_ascii_digit()));
    if expression.unit.is_none() && next_is_number && is_ratio_word(word) {
        return Err(QuantityFault::SeveralValues);
    }
    if read_as.dimension == Dimension::Time && names_a_test(word) {
        return Err(QuantityFault::NoNumber);
    }
    if hides_a_value(rest, read_as) {
        return Err(QuantityFault::SeveralValues);
    }
    let bare = read_as.dimension == Dimension::Dimensionless;
    let readable = known || (bare && before == Before::NoValue && !has_digit(word) && reads_as_remark(rest));
    if readable || expression.unit.is_some() {
        expression.remarks.push(rest.replace(MARK, " "));
        return Ok(());
    }
    let unknown = !bare || (before == Before::NoValue && !has_digit(rest));
    Err(if unknown {
        QuantityFault::UnknownUnit(unknown_unit(rest, word))
    } else {
        QuantityFault::SeveralValues
    })
}

/// The word in a message, with what belongs to it: `mg x/L` and no `mg`.
fn unknown_unit(rest: &str, word: &str) -> String {
    const LONGEST_SHOWN: usize = 20;
    let whole = rest.split([',', ';', '|', MARK]).next().unwrap_or(rest).trim();
    let fits = whole.contains('/') && !word.contains('/') && whole.chars().count() <= LONGEST_SHOWN;
    if fits { whole.to_owned() } else { word.to_owned() }
}

/// Whether a remark goes on with another value: `4.2 measured and 4.6 calculated`.
fn hides_a_value(remark: &str, read_as: ReadAs) -> bool {
    let words: Vec<(usize, &str)> = remark
        .split_whitespace()
        .map(|word| (word.as_ptr() as usize - remark.as_ptr() as usize, word))
        .collect();
    let joins =
        |word: &str| word == "/" || JOINERS.iter().any(|joiner| strip_phrase(word, joiner) == Some(""));
    words.iter().filter(|(_, word)| joins(word)).any(|(start, word)| {
        let after = remark.get(start + word.len()..).unwrap_or_default();
        // A number right after the word; how the text goes on from there is not looked at.
        let end = after.char_indices().nth(NEXT_FEW).map_or(after.len(), |(end, _)| end);
        let next = after.get(..end).unwrap_or_default();
        let opening = read_opening(next);
        starts_number(opening.rest)
            && opening.label.is_empty()
            && unit_after_number(opening.rest, read_as)
                .is_none_or(|unit| unit.dimension() == read_as.dimension)
    })
}

/// Characters that a qualifier, a number and its unit take.
const NEXT_FEW: usize = 100;
