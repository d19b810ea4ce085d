//! Unit words in English and German.

use std::collections::BTreeMap;
use std::sync::LazyLock;

use crate::quantity::{Dimension, Unit};

/// Spellings in lower case, without spaces and multiplication signs, `per` written `/`; see [`fold`]. Parted by spaces.
const SPELLINGS: &[(Unit, &str)] = &[
    (Unit::One, "- none dimensionless dimensionslos unitless einheitenlos"),
    (Unit::Second, "s sec secs sek second seconds sekunde sekunden"),
    (Unit::Minute, "min mins minute minutes minuten"),
    (Unit::Hour, "h hr hrs hour hours std stunde stunden"),
    (Unit::Day, "d day days tag tage tagen"),
    (Unit::Week, "w wk wks week weeks wo woche wochen"),
    (Unit::Month, "mo mos mon mth mths month months monat monate monaten"),
    (Unit::Year, "a y yr yrs year years j jahr jahre jahren"),
    (Unit::NanogramPerLitre, "ng/l ngl-1 ng/liter ng/litre pg/ml ng/dm3 µg/m3"),
    (
        Unit::MicrogramPerLitre,
        "µg/l ug/l mcg/l µgl-1 ugl-1 µg/liter µg/litre ug/liter ug/litre ppb ng/ml mg/m3 µg/dm3 ug/dm3",
    ),
    (Unit::MilligramPerLitre, "mg/l mgl-1 mg/liter mg/litre ppm µg/ml ug/ml g/m3 mg/dm3 mgdm-3"),
    (Unit::GramPerLitre, "g/l gl-1 g/liter g/litre mg/ml kg/m3 g/dm3 mg/cm3 gdm-3"),
    (Unit::MolePerLitre, "mol/l moll-1 mol/liter mol/litre mol/dm3 moldm-3"),
    (Unit::MillimolePerLitre, "mmol/l mmoll-1 mmol/liter mmol/litre mmol/dm3 mol/m3"),
    (
        Unit::MicromolePerLitre,
        "µmol/l umol/l µmoll-1 umoll-1 µmol/liter µmol/litre µmol/dm3 umol/dm3 mmol/m3",
    ),
    (
        Unit::LitrePerKilogram,
        "l/kg lkg-1 liter/kg litre/kg litres/kg dm3/kg dm3kg-1 ml/g mlg-1 cm3/g cm3g-1 l/kgww l/kgwwt l/kgbw l/kgoc",
    ),
    (Unit::LogLitrePerKilogram, "logl/kg lgl/kg log(l/kg) lg(l/kg)"),
    (Unit::Pascal, "pa pascal n/m2"),
    (Unit::Hectopascal, "hpa mbar millibar hectopascal hektopascal"),
    (Unit::Kilopascal, "kpa kilopascal"),
    (Unit::Bar, "bar"),
    (Unit::MillimetreMercury, "mmhg torr"),
    (Unit::Atmosphere, "atm"),
    (Unit::Celsius, "°c c degc °celsius celsius gradc gradcelsius degreescelsius"),
    (Unit::Kelvin, "k kelvin °k"),
    (Unit::Fahrenheit, "°f f degf fahrenheit gradfahrenheit"),
    (Unit::GramPerMole, "g/mol gmol-1 g/mole da dalton u amu kg/kmol"),
    (Unit::PascalCubicMetrePerMole, "pam3/mol pam3mol-1 pa/(mol/m3) pam3/mole pa/mol/m3 m3pa/mol"),
    (Unit::AtmosphereCubicMetrePerMole, "atmm3/mol atmm3mol-1 atm-m3/mol atm-m3/mole atmm3/mole m3atm/mol"),
    (
        Unit::Percent,
        "% percent prozent wt% wt.% wt-% gew% gew.% gew-% gew.-% %w/w %(w/w) %m/m %wt %gew vol% pct ma% ma.-% ma-% mass% masse% masse-%",
    ),
    (
        Unit::TonnePerYear,
        "t/a t/y t/yr t/year t/jahr ta-1 to/a to/jahr tpa t ton tons tonne tonnes tonnen tons/year tonnes/year tonnes/annum tonnen/jahr tons/a tonnes/a",
    ),
    (Unit::KilogramPerYear, "kg/a kg/y kg/yr kg/year kg/jahr kga-1 kg"),
    (Unit::KilojoulePerMole, "kj/mol kjmol-1 kj/mole"),
];

static BY_SPELLING: LazyLock<BTreeMap<&'static str, Unit>> = LazyLock::new(|| {
    SPELLINGS
        .iter()
        .flat_map(|(unit, spellings)| spellings.split(' ').map(|spelling| (spelling, *unit)))
        .collect()
});

/// The unit that a whole tidied text names, if it is one.
pub fn parse_unit(text: &str) -> Option<Unit> {
    let text = text.trim();
    if text.len() > 40 {
        return None;
    }
    match text {
        "M" => Some(Unit::MolePerLitre),
        "mM" => Some(Unit::MillimolePerLitre),
        "µM" | "uM" => Some(Unit::MicromolePerLitre),
        _ => BY_SPELLING.get(fold(text).as_str()).copied(),
    }
}

/// The usual spellings of the units of a dimension, for the suggestion beside a misspelt one.
pub fn unit_words(dimension: Dimension) -> impl Iterator<Item = &'static str> {
    SPELLINGS
        .iter()
        .filter(move |(unit, _)| unit.dimension() == dimension)
        .flat_map(|(unit, spellings)| std::iter::once(unit.symbol()).chain(spellings.split(' ')))
        .filter(|word| word.chars().count() > 1)
}

fn fold(text: &str) -> String {
    let mut folded = String::with_capacity(text.len());
    for word in text.to_lowercase().split_whitespace() {
        match word {
            "per" | "pro" | "je" => folded.push('/'),
            _ => folded
                .extend(word.chars().filter(|character| !matches!(character, '·' | '*' | '⋅' | '∙' | '^'))),
        }
    }
    let without_point = folded.trim_end_matches('.').len();
    folded.truncate(without_point);
    folded
}

/// The longest unit at the start of a tidied text and what follows it.
pub(super) fn take_unit(text: &str) -> Option<(Unit, &str)> {
    let text = text.trim_start();
    unit_ends(text).into_iter().rev().find_map(|end| {
        let (word, rest) = text.split_at_checked(end)?;
        parse_unit(word).map(|unit| (unit, rest))
    })
}

/// Where a unit could end: before a space, a bracket, a separator, or at the end of the text.
fn unit_ends(text: &str) -> Vec<usize> {
    const LONGEST_UNIT: usize = 40;
    let mut ends = Vec::new();
    let mut before = ' ';
    for (position, character) in text.char_indices() {
        if position > LONGEST_UNIT {
            return ends;
        }
        let separates =
            matches!(character, ' ' | ',' | ';' | '@' | '±' | '<' | '>' | '~' | '≤' | '≥' | '+' | '.')
                || (character == '-' && !before.is_ascii_punctuation());
        if separates && position > 0 && before != ' ' {
            ends.push(position);
        }
        if before == '%' && character.is_alphanumeric() {
            ends.push(position);
        }
        before = character;
    }
    ends.push(text.len());
    ends
}

#[cfg(test)]
mod tests {
    use super::{BY_SPELLING, SPELLINGS, parse_unit, take_unit};
    use crate::quantity::Unit;

    #[test]
    fn no_spelling_names_two_units() {
        assert_eq!(
            BY_SPELLING.len(),
            SPELLINGS.iter().map(|(_, words)| words.split(' ').count()).sum::<usize>()
        );
    }

    #[test]
    fn spaces_powers_and_words_for_per_make_no_difference() {
        for (text, unit) in [
            ("mg / l", Unit::MilligramPerLitre),
            ("mg·L-1", Unit::MilligramPerLitre),
            ("mg per litre", Unit::MilligramPerLitre),
            ("Pa·m^3/mol", Unit::PascalCubicMetrePerMole),
            ("Pa m3 mol-1", Unit::PascalCubicMetrePerMole),
            ("Tonnen pro Jahr", Unit::TonnePerYear),
            ("Std.", Unit::Hour),
            ("Grad C", Unit::Celsius),
            ("mM", Unit::MillimolePerLitre),
        ] {
            assert_eq!(parse_unit(text), Some(unit), "{text}");
        }
        assert_eq!(parse_unit("mm"), None);
        assert_eq!(parse_unit("m"), None);
    }

    #[test]
    fn the_longest_unit_is_taken() {
        assert_eq!(take_unit(" t/a, food grade"), Some((Unit::TonnePerYear, ", food grade")));
        assert_eq!(take_unit("d in soil"), Some((Unit::Day, " in soil")));
        assert_eq!(take_unit("d-3 wk"), Some((Unit::Day, "-3 wk")));
        assert_eq!(take_unit("mg L-1 water"), Some((Unit::MilligramPerLitre, " water")));
        assert_eq!(take_unit("dogs"), None);
    }
}
