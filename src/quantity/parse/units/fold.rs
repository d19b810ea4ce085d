//! The one form in which spellings of units are compared.

use std::collections::BTreeMap;
use std::sync::LazyLock;

use crate::quantity::parse::fold::{Plain, unaccented};

/// Words and signs and the one they stand for; whole words of a unit only.
const SAME: &[(&str, &str)] = &[
    ("l", "liter litre liters litres litro litros litri 升 リットル dm3"),
    (
        "ml",
        "milliliter millilitre milliliters millilitres mililitros millilitri 毫升 ミリリットル cm3 ccm cc",
    ),
    ("m3", "立方米 cbm"),
    (
        "µg",
        "ug mcg microgram micrograms mikrogramm microgramme microgrammes microgramo microgramos microgrammi 微克 マイクログラム μg",
    ),
    (
        "mg",
        "milligram milligrams milligramm milligramme milligrammes miligramo miligramos milligrammo milligrammi 毫克 ミリグラム",
    ),
    ("ng", "nanogram nanograms nanogramm nanogrammes nanogramos nanogrammi 纳克 ナノグラム"),
    ("g", "gram grams gramm gramme grammes gramo gramos grammo grammi 克 グラム gr"),
    (
        "kg",
        "kilogram kilograms kilogramm kilogramme kilogrammes kilogramo kilogramos kilogrammo kilogrammi kilo kilos 千克 公斤 キログラム",
    ),
    ("t", "to ton tons tonne tonnes tonnen tonnellata tonnellate tonelada toneladas tn 吨 噸 公吨 トン"),
    ("mol", "mole moles mols moli 摩尔 モル"),
    ("mmol", "millimol millimole millimoles 毫摩尔 ミリモル"),
    ("µmol", "umol micromol micromole micromoles mikromol 微摩尔"),
    ("/", "per pro je par por al 每 毎"),
];

static BY_WORD: LazyLock<BTreeMap<&'static str, &'static str>> = LazyLock::new(|| {
    SAME.iter().flat_map(|(same, others)| others.split(' ').map(move |other| (other, *same))).collect()
});

/// What stands for a year below a fraction stroke.
const YEARS: &str = "a y yr year years annum jahr j an annee ano anno jaar 年 年間";

/// Bases that a `-1` after them puts below a fraction stroke, longest first.
const INVERTED: &[(&str, &str)] = &[
    ("dm-3", "/l"),
    ("cm-3", "/ml"),
    ("ml-1", "/ml"),
    ("kg-1", "/kg"),
    ("mol-1", "/mol"),
    ("yr-1", "/a"),
    ("m-3", "/m3"),
    ("l-1", "/l"),
    ("g-1", "/g"),
    ("a-1", "/a"),
];

/// A unit in lower case, without accents, spaces and multiplication signs, words for the same thing written the same.
pub(super) fn fold(text: &str) -> String {
    let mut folded = String::with_capacity(text.len());
    let plain = unaccented_letters(text);
    for word in plain.split_inclusive(['/', ' ', '·', '*', '⋅', '∙', '(', ')', '每', '毎', '-', '.']) {
        let end = word.char_indices().next_back().map_or(0, |(place, _)| place);
        let (letters, sign) = match word.chars().next_back() {
            Some('/' | '(' | ')' | '-' | '.' | '每' | '毎') => word.split_at(end),
            Some(' ' | '·' | '*' | '⋅' | '∙') => (word.get(..end).unwrap_or_default(), ""),
            _ => (word, ""),
        };
        folded.push_str(same_as(letters, &folded));
        folded.push_str(if matches!(sign, "每" | "毎") { "/" } else { sign });
    }
    let without_point = folded.trim_end_matches('.').len();
    folded.truncate(without_point);
    without_negative_powers(folded)
}

fn unaccented_letters(text: &str) -> String {
    let mut plain = String::with_capacity(text.len());
    for character in text.chars().flat_map(char::to_lowercase).filter(|character| *character != '^') {
        match unaccented(character) {
            Plain::Letters(letters) => plain.push_str(letters),
            Plain::Same => plain.push(match character {
                '²' => '2',
                '³' => '3',
                _ => character,
            }),
        }
    }
    plain
}

fn same_as<'word>(word: &'word str, before: &str) -> &'word str {
    if before.ends_with('/') && YEARS.split(' ').any(|year| year == word) {
        return "a";
    }
    BY_WORD.get(word).copied().unwrap_or(word)
}

/// `mgl-1` is `mg/l`, `pam3mol-1` is `pam3/mol`.
fn without_negative_powers(folded: String) -> String {
    if !folded.contains("-1") && !folded.contains("-3") {
        return folded;
    }
    INVERTED
        .iter()
        .find_map(|(inverted, stroke)| {
            let base = folded.strip_suffix(inverted)?;
            Some(format!("{base}{stroke}"))
        })
        .unwrap_or(folded)
}
