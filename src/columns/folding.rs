//! The words of a header, folded so that spellings of the same word are equal.

use unicode_normalization::UnicodeNormalization;

use crate::quantity::plain_words;

/// The words of a text as headers are compared: folded, umlauts written as `ae` the same as `ä`, each sign of a script
/// without spaces a word.
pub(super) fn header_words(text: &str) -> Vec<String> {
    let umlauts = |word: String| word.replace("ae", "a").replace("oe", "o").replace("ue", "u");
    shown_words(text).into_iter().map(umlauts).collect()
}

/// The same words as a reader knows them.
pub(super) fn shown_words(text: &str) -> Vec<String> {
    let folded = plain_words(&parted_at_capitals(&composed(text)));
    let mut words: Vec<String> = Vec::new();
    for run in folded.split(' ').filter(|word| !word.is_empty()) {
        let mut goes_on = false;
        for character in run.chars() {
            match words.last_mut().filter(|_| goes_on && !is_sign(character)) {
                Some(word) => word.push(character),
                None => words.push(character.to_string()),
            }
            goes_on = !is_sign(character);
        }
    }
    words
}

/// Words joined as they are written: signs without spaces.
pub(super) fn joined(words: &[String]) -> String {
    let mut text = String::new();
    for word in words {
        let after_sign = text.chars().next_back().is_some_and(is_sign);
        let is_joined = text.is_empty() || (after_sign && word.starts_with(is_sign));
        if !is_joined {
            text.push(' ');
        }
        text.push_str(word);
    }
    text
}

/// Whether a character belongs to a script that is written without spaces: kana and Han.
pub(super) fn is_sign(character: char) -> bool {
    matches!(character, '\u{3005}'..='\u{3007}' | '\u{3040}'..='\u{30FF}' | '\u{3400}'..='\u{9FFF}' | '\u{F900}'..='\u{FAFF}' | '\u{20000}'..='\u{2FA1F}')
}

/// `N°` as `No`; half-width kana, signs copied from PDF files as radicals, and units written as one sign (`㎎`) in their usual form.
pub(super) fn composed(text: &str) -> String {
    let is_other_form = |character: char| matches!(character, '\u{2E80}'..='\u{2FDF}' | '\u{3099}' | '\u{309A}' | '\u{3300}'..='\u{33FF}' | '\u{F900}'..='\u{FAFF}' | '\u{FF61}'..='\u{FF9F}');
    let numero = text.replace(['º', '˚'], "°");
    let numero = ["N.°", "n.°", "N°", "n°", "№"]
        .iter()
        .fold(numero, |text, sign| if text.contains(sign) { text.replace(sign, "No ") } else { text });
    if numero.contains(is_other_form) { numero.nfkc().collect() } else { numero }
}

/// `WaterSolubility` is two words; `pKa` and `mmHg` are one.
fn parted_at_capitals(text: &str) -> String {
    const SHORTEST_WORD: usize = 3;
    let mut parted = String::with_capacity(text.len());
    let mut small_letters = 0;
    for character in text.chars() {
        if character.is_uppercase() && small_letters >= SHORTEST_WORD {
            parted.push(' ');
        }
        small_letters = if character.is_lowercase() { small_letters + 1 } else { 0 };
        parted.push(character);
    }
    parted
}

#[cfg(test)]
mod tests {
    use super::{header_words, joined, shown_words};

    #[test]
    fn signs_are_words_of_their_own_and_letters_beside_them_stay_together() {
        assert_eq!(header_words("CAS番号"), ["cas", "番", "号"]);
        assert_eq!(header_words("log Kow値"), ["log", "kow", "値"]);
        assert_eq!(header_words("LC50（魚類）"), ["lc50", "魚", "類"]);
        assert_eq!(header_words("ｵｸﾀﾉｰﾙ"), header_words("オクタノール"));
        assert_eq!(header_words("ﾃﾞｰﾀ"), header_words("データ"));
    }

    #[test]
    fn umlauts_and_capitals_within_make_no_difference() {
        assert_eq!(header_words("Wasserloeslichkeit"), header_words("WASSERLÖSLICHKEIT"));
        assert_eq!(header_words("WaterSolubility"), ["water", "solubility"]);
        assert_eq!(header_words("Solubilité dans l’eau"), ["solubilite", "dans", "l", "eau"]);
    }

    #[test]
    fn words_are_shown_as_they_are_written() {
        assert_eq!(joined(&shown_words("CAS番号")), "cas 番号");
        assert_eq!(joined(&shown_words("half-life")), "half life");
    }
}
