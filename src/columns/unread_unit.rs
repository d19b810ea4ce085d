//! What has the look of a unit in a header and is not read as one, and what changes a unit without being one.
//!
//! Numbers below such a header are never read in the usual unit: the column is left aside and told.

use super::folding::is_sign;
use super::loose_unit::{is_doubtful, is_second};
use crate::quantity::{Dimension, Unit, parse_unit, parse_unit_of};

/// Words for the active substance within a unit: `µg a.s./L`. The longer ones stand first.
const ACTIVE_SUBSTANCE: [&str; 23] = [
    "active substance",
    "active ingredient",
    "substance active",
    "matière active",
    "matiere active",
    "sustancia activa",
    "ingrediente activo",
    "sostanza attiva",
    "principio attivo",
    "werkzame stof",
    "actieve stof",
    "wirkstoff",
    "有効成分",
    "有效成分",
    "a.s.",
    "a.i.",
    "i.a.",
    "w.s.",
    "m.a.",
    "s.a.",
    "a.s",
    "a.i",
    "ai",
];

/// A header without words for the active substance in or behind its unit.
pub(super) fn without_active_substance(text: &str) -> String {
    let mut kept = String::with_capacity(text.len());
    let mut rest = text;
    while let Some(next) = rest.chars().next() {
        if kept.ends_with(' ')
            && let Some(after) = after_active_substance(rest, &kept)
        {
            kept.truncate(kept.trim_end().len());
            rest = after;
            continue;
        }
        kept.push(next);
        rest = rest.get(next.len_utf8()..).unwrap_or_default();
    }
    kept
}

fn after_active_substance<'text>(rest: &'text str, before: &str) -> Option<&'text str> {
    ACTIVE_SUBSTANCE.iter().find_map(|word| {
        let (start, after) = rest.split_at_checked(word.len())?;
        if !start.eq_ignore_ascii_case(word) && start.to_lowercase() != *word {
            return None;
        }
        let after = after.trim_start();
        let closes = after.is_empty() || after.starts_with([')', ']', '}', '】', ',', ';']);
        (after.starts_with('/') || (closes && before.contains('/'))).then_some(after)
    })
}

/// The unit behind a stroke at the end: `土壤半衰期/年`, `DT50 soil/d`.
pub(super) fn unit_after_stroke(plain: &str, dimension: Dimension) -> Option<Unit> {
    const SHORTEST_WORD: usize = 3;
    let (before, end) = plain.rsplit_once('/')?;
    let end = end.trim();
    let letters = before.trim_end().chars().rev().take_while(|letter| letter.is_alphabetic()).count();
    let follows_word = letters >= SHORTEST_WORD || before.trim_end().ends_with(is_sign);
    if !follows_word || is_doubtful(end, dimension) || is_second(end) {
        return None;
    }
    parse_unit_of(end, dimension).filter(|unit| unit.dimension() == dimension)
}

/// A power of ten, or the logarithm of a time, as it is written.
pub(super) fn scale(plain: &str, brackets: &[String], dimension: Dimension) -> Option<String> {
    let parts = brackets.iter().flat_map(|bracket| bracket.split([',', ';'])).map(str::trim);
    let in_brackets = parts.filter(|part| parse_unit(part).is_none()).find(|part| {
        let lower = part.to_lowercase();
        let is_log = ["log ", "lg ", "ln ", "log10 "].iter().any(|start| lower.starts_with(start));
        is_scaled(&lower) || (is_log && dimension == Dimension::Time)
    });
    if let Some(part) = in_brackets {
        return Some(part.to_owned());
    }
    let words: Vec<&str> = plain.split_whitespace().collect();
    let pairs = words.windows(2).map(<[&str]>::concat);
    let is_times = |text: &str| is_times(&text.to_lowercase());
    let alone = words.iter().find(|word| is_times(word)).map(|word| (*word).to_owned());
    alone.or_else(|| pairs.into_iter().find(|pair| pair.starts_with(['x', 'X', '×', '*']) && is_times(pair)))
}

/// `x1000`, `10^3`, `×10³`.
fn is_times(text: &str) -> bool {
    let after_sign = text.strip_prefix(['x', '×', '*']);
    after_sign.is_some_and(|rest| rest.starts_with(|first: char| first.is_ascii_digit()))
        || ["10^", "10**", "10⁻", "10²", "10³", "10⁶", "10⁹", "×10"].iter().any(|power| text.contains(power))
}

/// A bracket with a power of ten before the unit or alone: `10-3 mg/L`, `1e-3 mg/L`, `x 1000`.
fn is_scaled(text: &str) -> bool {
    let dense: String = text.split_whitespace().collect();
    let dense = dense.replace(['−', '–'], "-");
    if is_times(&dense) {
        return true;
    }
    let digits = |text: &str| text.bytes().take_while(u8::is_ascii_digit).count();
    let power = dense.strip_prefix("10-").or_else(|| {
        let rest = dense.get(digits(&dense)..).filter(|rest| rest.len() < dense.len())?;
        Some(rest.strip_prefix('e')?.trim_start_matches(['-', '+']))
    });
    power.is_some_and(|rest| {
        let after = rest.get(digits(rest)..).unwrap_or_default();
        // `10-20 %` is a range.
        after.len() < rest.len()
            && !after.starts_with('%')
            && (after.is_empty() || parse_unit(after).is_some())
    })
}

/// Whether a text compares with a number: `> 2000`.
pub(super) fn compares(text: &str) -> bool {
    text.match_indices(['<', '>', '≤', '≥']).any(|(place, sign)| {
        let rest = text.get(place + sign.len()..).unwrap_or_default();
        rest.trim_start_matches(['=', ' ']).starts_with(|first: char| first.is_ascii_digit())
    })
}

/// What has the look of a unit, in brackets or as a word, and is none that measures this.
pub(super) fn unread(plain: &str, brackets: &[String], dimension: Dimension) -> Option<String> {
    let whole = brackets.iter().map(String::as_str);
    let parts = brackets.iter().flat_map(|bracket| bracket.split([',', ';'])).map(str::trim);
    let in_brackets = whole.chain(parts).find(|part| {
        is_strange_ratio(part) || is_reciprocal(part, dimension) || measures_another(part, dimension)
    });
    let words = plain.split_whitespace().skip(1);
    let in_words = || {
        words.into_iter().find(|word| {
            is_reciprocal(word, dimension)
                || (word.contains('/') && (is_strange_ratio(word) || measures_another(word, dimension)))
        })
    };
    in_brackets.or_else(in_words).map(str::to_owned)
}

/// Of what is no time, `min` is the minimum.
fn measures_another(text: &str, dimension: Dimension) -> bool {
    if text.trim_end_matches('.').eq_ignore_ascii_case("min") {
        return false;
    }
    parse_unit_of(text, dimension).is_some_and(|unit| unit != Unit::One && unit.dimension() != dimension)
}

/// `1/d`, `d-1`: a rate, not a time.
fn is_reciprocal(text: &str, dimension: Dimension) -> bool {
    let dense: String = text.split_whitespace().collect();
    let unit = dense
        .strip_prefix("1/")
        .or_else(|| ["^-1", "⁻¹", "-1", "−1"].iter().find_map(|end| dense.strip_suffix(end)));
    unit.is_some_and(|unit| parse_unit_of(unit, dimension).is_some_and(|unit| unit.dimension() == dimension))
}

/// `oz/gal`, `?g/L`, `mg/kg dw`: an amount by something, and no unit that is known.
fn is_strange_ratio(part: &str) -> bool {
    const AMOUNTS: &str =
        "pg ng µg ug mcg mg g gr kg t oz lb lbs mol mmol umol µmol l ml m3 pa hpa kpa atm bar";
    const LONGEST: usize = 24;
    /// A letter that was lost in an encoding, before a known one.
    const LONGEST_STRANGE: usize = 3;
    let is_amount = |word: &str| {
        let is_known = AMOUNTS.split(' ').any(|known| known == word);
        let length = word.chars().count();
        is_known
            || (word.ends_with('g') && (2..=LONGEST_STRANGE).contains(&length))
            || (word.ends_with("mol") && length <= LONGEST_STRANGE + 3)
    };
    let is_ratio = part.split_once('/').is_some_and(|(amount, rest)| {
        let amount = amount.to_lowercase().replace('μ', "µ");
        amount.split_whitespace().any(is_amount) && (1..=LONGEST).contains(&rest.trim().chars().count())
    });
    is_ratio && parse_unit(part).is_none()
}

#[cfg(test)]
mod tests {
    use super::{compares, is_scaled, unread, without_active_substance};
    use crate::quantity::Dimension;

    #[test]
    fn the_active_substance_is_no_part_of_a_unit_and_other_words_stay() {
        for (header, without) in [
            ("NOEC (µg a.s./L)", "NOEC (µg/L)"),
            ("NOEC µg A.I. /L", "NOEC µg/L"),
            ("NOEC (mg/L a.s.)", "NOEC (mg/L)"),
            ("NOEC (mg Wirkstoff/L)", "NOEC (mg/L)"),
            ("Active substance", "Active substance"),
            ("Content active substance (%)", "Content active substance (%)"),
        ] {
            assert_eq!(without_active_substance(header), without);
        }
    }

    #[test]
    fn powers_of_ten_are_seen_and_ranges_and_numbers_are_none() {
        for (text, scaled) in [
            ("x1000", true),
            ("x 10 d", true),
            ("10^-3 mg/l", true),
            ("10-3 mg/l", true),
            ("1e-3 mg/l", true),
            ("20 °c", false),
            ("96 h", false),
            ("10-20 %", false),
            ("log10", false),
        ] {
            assert_eq!(is_scaled(text), scaled, "{text}");
        }
        assert!(compares("BCF > 2000") && compares("≥4") && !compares("A > B"));
    }

    #[test]
    fn what_looks_like_a_unit_and_is_not_read_is_found() {
        let in_brackets = |text: &str, dimension| unread("Value", &[text.to_owned()], dimension).is_some();
        for (text, dimension, found) in [
            ("oz/gal", Dimension::Concentration, true),
            ("?g/L", Dimension::Concentration, true),
            ("mg/kg dw", Dimension::Concentration, true),
            ("1/d", Dimension::Time, true),
            ("d-1", Dimension::Time, true),
            ("mg/L", Dimension::Concentration, false),
            ("fish/daphnia", Dimension::Concentration, false),
            ("pH 7", Dimension::Time, false),
        ] {
            assert_eq!(in_brackets(text, dimension), found, "{text}");
        }
    }
}
