//! Which unit a text names.

mod fold;
mod spellings;

use std::collections::BTreeMap;
use std::sync::LazyLock;

use super::fold::is_east_asian;
use crate::quantity::{Dimension, Unit};
use fold::fold;
use spellings::{EXACT, IN_DIMENSION, SPELLINGS};

type BySpelling = BTreeMap<&'static str, Unit>;

static BY_SPELLING: LazyLock<BySpelling> = LazyLock::new(|| by_spelling(SPELLINGS));
static BY_EXACT_SPELLING: LazyLock<BySpelling> = LazyLock::new(|| by_spelling(EXACT));

fn by_spelling(table: &'static [(Unit, &'static str)]) -> BySpelling {
    table.iter().flat_map(|(unit, words)| words.split(' ').map(|word| (word, *unit))).collect()
}

/// The unit that a whole tidied text names, if it is one.
pub fn parse_unit(text: &str) -> Option<Unit> {
    let text = text.trim();
    if text.is_empty() || text.len() > LONGEST_UNIT {
        return None;
    }
    let exact = BY_EXACT_SPELLING.get(text).copied();
    exact.or_else(|| BY_SPELLING.get(fold(text).as_str()).copied())
}

/// The unit that a whole tidied text names where numbers measure this: `ppm` of a content is mg/kg, else mg/L.
pub fn parse_unit_of(text: &str, dimension: Dimension) -> Option<Unit> {
    if text.len() > LONGEST_UNIT {
        return None;
    }
    let folded = fold(text.trim());
    let in_dimension = IN_DIMENSION
        .iter()
        .find(|(unit, word)| unit.dimension() == dimension && *word == folded)
        .map(|(unit, _)| *unit);
    in_dimension.or_else(|| parse_unit(text))
}

/// The longest unit, in bytes.
const LONGEST_UNIT: usize = 40;

/// The usual spellings of the units of a dimension, for the suggestion beside a misspelt one.
pub fn unit_words(dimension: Dimension) -> impl Iterator<Item = &'static str> {
    SPELLINGS
        .iter()
        .filter(move |(unit, _)| unit.dimension() == dimension)
        .flat_map(|(unit, spellings)| std::iter::once(unit.symbol()).chain(spellings.split(' ')))
        .filter(|word| word.chars().count() > 1 && !word.starts_with('/'))
}

/// The longest unit at the start of a tidied text and what follows it.
pub(super) fn take_unit(text: &str, dimension: Dimension) -> Option<(Unit, &str)> {
    let text = text.trim_start();
    unit_ends(text).into_iter().rev().find_map(|end| {
        let (word, rest) = text.split_at_checked(end)?;
        let of_active_substance = || parse_unit_of(&without_active_substance(word)?, dimension);
        parse_unit_of(word, dimension)
            .or_else(of_active_substance)
            .filter(|_| !is_inverted(rest))
            .map(|unit| (unit, rest))
    })
}

/// `mg a.s./L` is milligrams of active substance per litre.
fn without_active_substance(word: &str) -> Option<String> {
    const ACTIVE: [&str; 11] =
        ["a.s.", "a.i.", "i.a.", "w.s.", "s.a.", "m.a.", "p.a.", "as", "ai", "ws", "test item"];
    let (mass, volume) = word.split_once('/')?;
    let mass = mass.trim_end().to_lowercase();
    let mass = ACTIVE.iter().find_map(|active| mass.strip_suffix(active))?.strip_suffix(' ')?;
    Some(format!("{}/{volume}", mass.trim_end()))
}

/// Where a unit could end: before a space, a bracket, a separator, after an East Asian letter, or at the end of the text.
fn unit_ends(text: &str) -> Vec<usize> {
    let mut ends = Vec::new();
    let mut before = ' ';
    for (position, character) in text.char_indices() {
        if position > LONGEST_UNIT {
            return ends;
        }
        let separates = character.is_whitespace()
            || matches!(
                character,
                ',' | ';' | '@' | '±' | '<' | '>' | '~' | '≤' | '≥' | '+' | '.' | '|' | '&'
            )
            || (character == '-' && !before.is_ascii_punctuation())
            || (character == '/' && starts_second_value(text, position));
        if separates && position > 0 && !before.is_whitespace() {
            ends.push(position);
        }
        if (before == '%' && character.is_alphanumeric()) || (position > 0 && is_east_asian(before)) {
            ends.push(position);
        }
        before = character;
    }
    ends.push(text.len());
    ends
}

/// `0.02 d-1` is a rate.
fn is_inverted(rest: &str) -> bool {
    let rest = rest.strip_prefix('^').unwrap_or(rest);
    rest.strip_prefix("-1").is_some_and(|after| {
        !after.starts_with(|next: char| next.is_ascii_digit() || next == '.' || next == ',')
    })
}

/// `45 d/60 d`: the stroke parts two values and belongs to no unit.
fn starts_second_value(text: &str, stroke: usize) -> bool {
    let after = text.get(stroke + 1..).unwrap_or_default().trim_start();
    after.starts_with(|first: char| first.is_ascii_digit())
}

#[cfg(test)]
mod tests {
    use super::{
        BY_EXACT_SPELLING, BY_SPELLING, EXACT, SPELLINGS, fold, parse_unit, parse_unit_of, take_unit,
    };
    use crate::quantity::{Dimension, Unit};

    fn spellings(table: &[(Unit, &str)]) -> usize {
        table.iter().map(|(_, words)| words.split(' ').count()).sum()
    }

    #[test]
    fn no_spelling_names_two_units() {
        assert_eq!(BY_SPELLING.len(), spellings(SPELLINGS));
        assert_eq!(BY_EXACT_SPELLING.len(), spellings(EXACT));
    }

    #[test]
    fn every_spelling_is_in_folded_form() {
        for (_, words) in SPELLINGS {
            for word in words.split(' ') {
                assert_eq!(fold(word), word);
            }
        }
    }

    #[test]
    fn every_symbol_names_its_unit() {
        for unit in Unit::ALL.into_iter().filter(|unit| !unit.symbol().is_empty()) {
            assert_eq!(parse_unit(unit.symbol()), Some(unit), "{}", unit.symbol());
        }
    }

    #[test]
    fn spaces_powers_and_words_for_per_make_no_difference() {
        for (text, unit) in [
            ("mg / l", Unit::MilligramPerLitre),
            ("mg·L-1", Unit::MilligramPerLitre),
            ("mgL-1", Unit::MilligramPerLitre),
            ("mg per litre", Unit::MilligramPerLitre),
            ("milligrams per liter", Unit::MilligramPerLitre),
            ("毫克/升", Unit::MilligramPerLitre),
            ("mg dm-3", Unit::MilligramPerLitre),
            ("MG/L", Unit::MilligramPerLitre),
            ("mg m-3", Unit::MicrogramPerLitre),
            ("g/100 mL", Unit::GramPerDecilitre),
            ("cm3 g-1", Unit::LitrePerKilogram),
            ("Pa·m^3/mol", Unit::PascalCubicMetrePerMole),
            ("Pa m3 mol-1", Unit::PascalCubicMetrePerMole),
            ("atm-m3/mole", Unit::AtmosphereCubicMetrePerMole),
            ("Tonnen pro Jahr", Unit::TonnePerYear),
            ("tonnes par an", Unit::TonnePerYear),
            ("toneladas/año", Unit::TonnePerYear),
            ("吨每年", Unit::TonnePerYear),
            ("トン/年", Unit::TonnePerYear),
            ("Std.", Unit::Hour),
            ("Grad C", Unit::Celsius),
        ] {
            assert_eq!(parse_unit(text), Some(unit), "{text}");
        }
    }

    #[test]
    fn case_counts_where_it_tells_units_apart() {
        for (text, unit) in [
            ("mM", Some(Unit::MillimolePerLitre)),
            ("M", Some(Unit::MolePerLitre)),
            ("m", None),
            ("mm", None),
            ("MM", None),
            ("mPa", Some(Unit::Millipascal)),
            ("MPa", Some(Unit::Megapascal)),
            ("mpa", None),
            ("MPA", None),
            ("KPA", Some(Unit::Kilopascal)),
            ("J", Some(Unit::Year)),
            ("j", Some(Unit::Jour)),
        ] {
            assert_eq!(parse_unit(text), unit, "{text}");
        }
    }

    #[test]
    fn some_spellings_follow_what_is_asked_for() {
        assert_eq!(parse_unit_of("ppm", Dimension::Percent), Some(Unit::MilligramPerKilogram));
        assert_eq!(parse_unit_of("ppm", Dimension::Concentration), Some(Unit::MilligramPerLitre));
        assert_eq!(parse_unit_of("u", Dimension::Time), Some(Unit::Hour));
        assert_eq!(parse_unit_of("u", Dimension::MolarMass), Some(Unit::GramPerMole));
    }

    #[test]
    fn the_longest_unit_is_taken() {
        for (text, dimension, taken) in [
            (" t/a, food grade", Dimension::Tonnage, Some((Unit::TonnePerYear, ", food grade"))),
            ("d in soil", Dimension::Time, Some((Unit::Day, " in soil"))),
            ("d-3 wk", Dimension::Time, Some((Unit::Day, "-3 wk"))),
            ("d/60 d", Dimension::Time, Some((Unit::Day, "/60 d"))),
            ("日以上", Dimension::Time, Some((Unit::Day, "以上"))),
            ("mg L-1 water", Dimension::Concentration, Some((Unit::MilligramPerLitre, " water"))),
            ("dogs", Dimension::Time, None),
            ("d-1", Dimension::Time, None),
            ("d-12 d", Dimension::Time, Some((Unit::Day, "-12 d"))),
        ] {
            assert_eq!(take_unit(text, dimension), taken, "{text}");
        }
    }
}
