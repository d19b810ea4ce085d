//! Units that a header names without brackets: in `snake_case` and `CamelCase`, and between its other words.
//!
//! A unit that is overlooked may clear a substance (weeks read as days), and so may one that is read where none is meant
//! (`min` for a minimum). What may be a unit and is not certain is told, so that the column is left aside.

use crate::quantity::{Dimension, Unit, parse_unit, parse_unit_of};

/// The most words of a unit: `g per 100 ml`.
const MOST_PIECES: usize = 4;

/// The unit that some words of a header name, the last ones first.
pub(super) fn loose_unit(plain: &str, dimension: Dimension) -> Option<Unit> {
    let pieces = pieces(plain);
    let ends = (1..=pieces.len()).rev();
    let in_words = ends.clone().find_map(|end| {
        lengths(end).find_map(|length| {
            let run = pieces.get(end - length..end)?;
            let is_unit_here = end == pieces.len() || is_plain_unit(run);
            if !is_unit_here || follows_number(&pieces, end - length) {
                return None;
            }
            unit_of(run, dimension)
        })
    });
    in_words.or_else(|| {
        let parts = camel_parts(pieces.last()?);
        // The first part of a header is a word, not a unit: `SoilD`.
        let most = if pieces.len() > 1 { parts.len() } else { parts.len().saturating_sub(1) };
        (1..=most.min(MOST_PIECES)).rev().find_map(|length| {
            let run = parts.get(parts.len() - length..)?;
            unit_of(run, dimension).filter(|_| length > 1 || stands_apart(&parts))
        })
    })
}

/// Words that may be a unit of what the header measures and may mean something else, as they are written.
pub(super) fn doubtful_unit(plain: &str, brackets: &[String], dimension: Dimension) -> Option<String> {
    let pieces = pieces(plain);
    let bracket_parts = brackets.iter().flat_map(|bracket| bracket.split([',', ';']));
    let in_brackets = bracket_parts.map(str::trim).find(|part| is_doubtful(part, dimension));
    if let Some(found) = in_brackets.or_else(|| several_units(brackets, dimension).map(String::as_str)) {
        return Some(found.to_owned());
    }
    let (last, before) = pieces.split_last()?;
    // `sol sec` is dry soil in French, and `s` may stand for soil or sediment.
    let of_seconds = dimension == Dimension::Time && is_second(last);
    let doubtful = pieces.iter().skip(1).find(|piece| is_doubtful(piece, dimension));
    if let Some(found) = doubtful.or(of_seconds.then_some(last)) {
        return Some((*found).to_owned());
    }
    let joined_pressure = dimension == Dimension::Pressure
        && !matches!(*last, "mPa" | "MPa")
        && camel_parts(last).len() > 1
        && last.to_lowercase().ends_with("mpa");
    let is_identifier = plain.contains('_') && !plain.contains(char::is_whitespace);
    let of_another = || {
        is_identifier
            && !follows_number(&pieces, before.len())
            && !last.eq_ignore_ascii_case("min")
            && parse_unit(last).is_some_and(|unit| unit != Unit::One && unit.dimension() != dimension)
    };
    (joined_pressure || of_another()).then(|| (*last).to_owned())
}

/// The bracket with which several units of the same kind are named, such as `(d or wk)`: which of them a number has is not
/// said.
pub(super) fn several_units(brackets: &[String], dimension: Dimension) -> Option<&String> {
    let mut known = None;
    brackets.iter().find(|bracket| {
        let units = units_in(bracket, dimension);
        known = known.or(units.first().copied());
        units.iter().any(|unit| known != Some(*unit))
    })
}

/// The units between commas, strokes and words for `or`.
fn units_in(bracket: &str, dimension: Dimension) -> Vec<Unit> {
    const OR: [&str; 7] = [" or ", " oder ", " ou ", " o ", " of ", " OR ", " ODER "];
    let unit = |text: &str| {
        let text = Some(text.trim()).filter(|text| !is_doubtful(text, dimension))?;
        parse_unit_of(text, dimension).filter(|unit| unit.dimension() == dimension)
    };
    if let Some(unit) = unit(bracket) {
        return vec![unit];
    }
    let parted = OR.iter().fold(bracket.to_owned(), |text, or| text.replace(or, ";"));
    let parts = parted.split([',', ';', '|']);
    let units = parts.flat_map(|part| match unit(part) {
        Some(unit) => vec![unit],
        None => part.split('/').filter_map(unit).collect(),
    });
    units.collect()
}

/// What may be a unit and something else: a minimum, a month, a metre.
pub(super) fn is_doubtful(word: &str, dimension: Dimension) -> bool {
    let bare = word.trim_end_matches('.');
    let lower = bare.to_lowercase().replace('μ', "µ");
    match dimension {
        Dimension::Time => matches!(lower.as_str(), "min" | "m"),
        Dimension::Pressure => lower == "mm" || (lower == "mpa" && !matches!(bare, "mPa" | "MPa")),
        Dimension::Concentration => matches!(lower.as_str(), "g" | "µg" | "ug" | "ng"),
        Dimension::Tonnage => matches!(lower.as_str(), "lb" | "lbs" | "m3" | "m³" | "l"),
        Dimension::Dimensionless
        | Dimension::VolumePerMass
        | Dimension::Temperature
        | Dimension::MolarMass
        | Dimension::Henry
        | Dimension::Percent
        | Dimension::MolarEnergy => false,
    }
}

/// Short words for seconds.
pub(super) fn is_second(word: &str) -> bool {
    matches!(word.to_lowercase().as_str(), "s" | "sec")
}

fn lengths(end: usize) -> impl Iterator<Item = usize> {
    (1..=end.min(MOST_PIECES)).rev()
}

/// The words of a header, parted by spaces, underscores, hyphens and the like.
fn pieces(plain: &str) -> Vec<&str> {
    let parts =
        |character: char| character.is_whitespace() || matches!(character, '_' | '-' | '.' | ',' | ';' | ':');
    plain.split(parts).filter(|piece| !piece.is_empty()).collect()
}

/// `96 h` is how long a test took.
fn follows_number(pieces: &[&str], start: usize) -> bool {
    let before = start.checked_sub(1).and_then(|place| pieces.get(place));
    before.is_some_and(|before| before.chars().all(|character| character.is_ascii_digit()))
}

/// Whether words before the end of a header are a unit: letters that stand for units only.
fn is_plain_unit(run: &[&str]) -> bool {
    const OTHER_WORDS: [&str; 3] = ["std", "sec", "sem"];
    match run {
        [only] => {
            let lower = only.to_lowercase();
            matches!(lower.as_str(), "%" | "d" | "h" | "c" | "k" | "wk" | "hr" | "yr" | "mo" | "pa")
                || (lower.chars().count() > 2 && !OTHER_WORDS.contains(&lower.as_str()))
        }
        _ => true,
    }
}

fn unit_of(run: &[&str], dimension: Dimension) -> Option<Unit> {
    let measures = |unit: &Unit| unit.dimension() == dimension;
    let spaced = run.join(" ");
    let strokes =
        run.split_last().filter(|(_, before)| !before.is_empty()).into_iter().flat_map(|(last, before)| {
            [format!("{}/{last}", before.join(" ")), format!("{}{last}", before.concat())]
        });
    std::iter::once(spaced)
        .chain(strokes)
        .filter(|text| !is_doubtful(text, dimension) && !is_second(text))
        .filter_map(|text| parse_unit_of(&text, dimension))
        .find(measures)
}

/// `WaterSolubilityMgL` in its words, `mgL` in two.
fn camel_parts(piece: &str) -> Vec<&str> {
    let letters: Vec<(usize, char)> = piece.char_indices().collect();
    let mut starts = vec![0];
    for place in 1..letters.len() {
        let kind = |place: usize| letters.get(place).map(|(_, letter)| *letter);
        let (before, here, after) = (kind(place - 1), kind(place), kind(place + 1));
        let is_upper = |letter: Option<char>| letter.is_some_and(char::is_uppercase);
        let after_small = before.is_some_and(|letter| letter.is_lowercase() || letter.is_ascii_digit());
        let begins_word = is_upper(before) && after.is_some_and(char::is_lowercase);
        if is_upper(here) && (after_small || begins_word) {
            starts.extend(letters.get(place).map(|(start, _)| *start));
        }
    }
    let ends = starts.iter().skip(1).copied().chain([piece.len()]);
    starts.iter().zip(ends).filter_map(|(start, end)| piece.get(*start..end)).collect()
}

/// Whether the last part follows a word: `PointC`, but not `pH`.
fn stands_apart(parts: &[&str]) -> bool {
    const SHORTEST_WORD: usize = 3;
    parts.iter().rev().nth(1).is_some_and(|word| word.len() >= SHORTEST_WORD && !word.ends_with('p'))
}

#[cfg(test)]
mod tests {
    use super::{doubtful_unit, loose_unit};
    use crate::quantity::{Dimension, Unit};

    #[test]
    fn units_are_found_in_snake_case_camel_case_and_between_words() {
        for (header, dimension, unit) in [
            ("water_solubility_mg_l", Dimension::Concentration, Some(Unit::MilligramPerLitre)),
            ("water.solubility.ug.l", Dimension::Concentration, Some(Unit::MicrogramPerLitre)),
            ("WaterSolubility_mgL", Dimension::Concentration, Some(Unit::MilligramPerLitre)),
            ("WaterSolubilityUgL", Dimension::Concentration, Some(Unit::MicrogramPerLitre)),
            ("sol_g_per_100_ml", Dimension::Concentration, Some(Unit::GramPerDecilitre)),
            ("MeltingPointC", Dimension::Temperature, Some(Unit::Celsius)),
            ("melting-point-k", Dimension::Temperature, Some(Unit::Kelvin)),
            ("VapourPressureHPa", Dimension::Pressure, Some(Unit::Hectopascal)),
            ("vp_hpa_25_c", Dimension::Pressure, Some(Unit::Hectopascal)),
            ("dt50_soil_wk", Dimension::Time, Some(Unit::Week)),
            ("dt50_weeks_soil", Dimension::Time, Some(Unit::Week)),
            ("DT50 soil weeks measured", Dimension::Time, Some(Unit::Week)),
            ("DT50SoilWk", Dimension::Time, Some(Unit::Week)),
            ("henry_pa_m3_mol", Dimension::Henry, Some(Unit::PascalCubicMetrePerMole)),
            ("kg_per_year", Dimension::Tonnage, Some(Unit::KilogramPerYear)),
            ("dt50_soil_28_d", Dimension::Time, None),
            ("DT50 soil pH", Dimension::Time, None),
            ("Halbwertszeit an Boden", Dimension::Time, None),
        ] {
            assert_eq!(loose_unit(header, dimension), unit, "{header}");
        }
    }

    #[test]
    fn what_may_be_a_unit_and_something_else_is_doubtful() {
        for (header, dimension, doubtful) in [
            ("DT50 soil min", Dimension::Time, Some("min")),
            ("dt50_soil_m", Dimension::Time, Some("m")),
            ("dt50_soil_s", Dimension::Time, Some("s")),
            ("dt50_soil_d", Dimension::Time, None),
            ("dt50_soil_c", Dimension::Time, Some("c")),
            ("vapour_pressure_mpa", Dimension::Pressure, Some("mpa")),
            ("vapour_pressure_mPa", Dimension::Pressure, None),
            ("VapourPressureMPa", Dimension::Pressure, Some("VapourPressureMPa")),
            ("noec_ug", Dimension::Concentration, Some("ug")),
            ("lc50_fish_96_h", Dimension::Concentration, None),
            ("lc50_fish_h", Dimension::Concentration, Some("h")),
            ("bcf_max", Dimension::VolumePerMass, None),
        ] {
            assert_eq!(doubtful_unit(header, &[], dimension).as_deref(), doubtful, "{header}");
        }
        let in_brackets = |bracket: &str, dimension| doubtful_unit("Value", &[bracket.to_owned()], dimension);
        assert_eq!(in_brackets("min", Dimension::Time).as_deref(), Some("min"));
        assert_eq!(in_brackets("mg/L", Dimension::Concentration), None);
        assert_eq!(in_brackets("days/weeks", Dimension::Time).as_deref(), Some("days/weeks"));
        assert_eq!(in_brackets("d or wk", Dimension::Time).as_deref(), Some("d or wk"));
        assert_eq!(in_brackets("d, days", Dimension::Time), None);
    }
}
