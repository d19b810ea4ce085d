//! Columns that hold only the unit of a value in another column, or only its sign (`>`, `<`).
//!
//! Without them a NOEC of 0.69 µg/L would be read in mg/L and a BCF of more than 100 as 100. Where it is not clear whose
//! they are, the values that they may speak of are left aside.

use super::choice::dimension_of;
use super::header::Named;
use super::header_cell::{HeaderCell, Meaning};
use super::reading::{Brackets, NamesValue, Reading};
use super::words::ColumnWords;
use crate::quantity::tidy;
use crate::substance::Field;

/// The columns that hold the unit and the sign of a column's values.
#[derive(Debug, Clone, Copy, PartialEq, Eq, Default)]
pub struct Beside {
    /// The column of the unit.
    pub unit: Option<u16>,
    /// The column of the sign.
    pub qualifier: Option<u16>,
}

/// The sign that a cell of such a column holds, as it is written before a number; empty for `=`.
pub fn sign_of(text: &str) -> Option<&'static str> {
    match tidy(text).to_lowercase().replace(' ', "").as_str() {
        "=" | "==" | "eq" | "exact" => Some(""),
        ">" | "gt" | "greaterthan" | "morethan" | "größerals" | "größer" => Some(">"),
        "<" | "lt" | "lessthan" | "kleinerals" | "kleiner" => Some("<"),
        ">=" | "=>" | "≥" | "⩾" | "≧" | "ge" | "gte" => Some(">="),
        "<=" | "=<" | "≤" | "⩽" | "≦" | "le" | "lte" => Some("<="),
        "~" | "≈" | "ca." | "ca" | "c." | "circa" | "approx." | "approx" | "about" | "env." | "约" | "約" => {
            Some("ca. ")
        }
        _ => None,
    }
}

/// Whether a column speaks of another one in this way.
pub(super) fn stands_beside(field: Field) -> bool {
    matches!(field, Field::UnitOfValue | Field::QualifierOfValue)
}

/// Takes a header that names a unit or a sign for such a column, unless the user says what it is.
pub(super) fn mark(cell: &mut HeaderCell, words: &ColumnWords) {
    if matches!(cell.meaning, Meaning::Told(_) | Meaning::LeftAside) {
        return;
    }
    if let Some((field, by)) = field_of(cell, words) {
        cell.meaning = Meaning::Named(Named { field, by: vec![by] });
    }
}

fn field_of(cell: &HeaderCell, words: &ColumnWords) -> Option<(Field, String)> {
    if let Some(signs) = signs_in(&cell.text) {
        return Some((Field::QualifierOfValue, signs));
    }
    let header = cell.header.as_ref()?;
    let reading = Reading::new(header, words);
    let kinds = [(Field::UnitOfValue, "unit-beside"), (Field::QualifierOfValue, "qualifier-beside")];
    let (field, concept) = kinds.into_iter().find_map(|(field, concept)| {
        let concept = words.concept(concept)?;
        // `NOEC (unit)`: a bracket of little else.
        let in_bracket = header.bracket_words.len() <= 2 && reading.everywhere.contains(&concept);
        (in_bracket || reading.main.contains(&concept)).then_some((field, concept))
    })?;
    let fits = words
        .rules
        .iter()
        .find(|rule| reading.fits(rule, Brackets::ForEveryField, NamesValue::Perhaps))
        .map(|rule| rule.field);
    let dimension = fits.and_then(dimension_of);
    let is_beside = match fits {
        None => reading.wholly_known,
        // `NOEC, unit mg/L` is the value.
        Some(_) if field == Field::UnitOfValue => {
            !reading.mostly_unknown && dimension.is_some_and(|dimension| cell.unit(dimension).is_none())
        }
        Some(_) => !reading.mostly_unknown && dimension.is_some(),
    };
    is_beside.then_some(())?;
    Some((field, reading.words_of(concept, header)?))
}

/// `>/<`, alone or behind a name: `BCF (</>)`. A sign before a number is a condition.
fn signs_in(header: &str) -> Option<String> {
    let parts = header.split(|character: char| character.is_whitespace() || "()[]".contains(character));
    let is_sign = |character: char| "<>=≤≥~≈＜＞＝/|,;".contains(character);
    let names_both = |part: &&str| {
        part.chars().all(is_sign) && part.contains(['<', '＜', '≤']) && part.contains(['>', '＞', '≥'])
    };
    let whole = header.trim();
    let only_sign = !whole.is_empty()
        && whole.chars().all(|character| is_sign(character) || character.is_whitespace())
        && whole.contains(['<', '>', '=', '≤', '≥', '~', '≈', '＜', '＞', '＝']);
    if only_sign {
        return Some(whole.to_owned());
    }
    parts.into_iter().find(names_both).map(str::to_owned)
}
