//! Words that stand for no value, for a value without a number, or beside one, in English and German.

use super::text::plain_words;

/// Folded by [`plain_words`], spaces left out.
const MISSING: &str = concat!(
    "nd na nb nv nr ka null nil none tbd tba tbc unknown unbekannt missing fehlt keine leer blank empty ",
    "offen pending entfallt nodata nodataavailable datanotavailable notavailable notdetermined nottested ",
    "notmeasured notreported notapplicable notknown notstated notspecified nichtbestimmt nichtverfugbar ",
    "nichtanwendbar nichtbekannt nichtgemessen nichtgepruft nichtermittelt nichtvorhanden keineangabe ",
    "keineangaben keinedaten keinedatenverfugbar keinedatenvorhanden nichtrelevant notrelevant keinwert ",
    "novalue"
);

/// Words that say something of a value but not how much, folded by [`plain_words`]; any of them may stand within.
const VALUE_WORDS: &str = concat!(
    "miscible mischbar immiscible insoluble soluble unloslich loslich negligible vernachlassigbar ",
    "decomposes decomposition zersetzt zersetzung sublimes sublimiert stable stabil persistent hydrolyses ",
    "hydrolysiert low high niedrig gering hoch reacts"
);

/// Words after a bare number that are known to be remarks and no misspelt unit, in lower case.
const REMARK_STARTS: &str = concat!(
    "at bei in for für oecd eu ec epa iso ph ww dw wet dry measured gemessen exp exp. experimental ",
    "experimentell calc calc. calculated berechnet estimated est. geschätzt predicted qsar fish fisch ",
    "lipid glp study studie primary ultimate"
);

/// Words before a number, without `=` or `:`, that make the number theirs and no value.
const NUMBERED: &str = concat!(
    "oecd eu ec eg epa oppts ocspp iso din astm tg method methode guideline richtlinie test ph year jahr ",
    "klimisch reliability ref ref. no. nr."
);

fn stands_in(list: &str, word: &str) -> bool {
    list.split(' ').any(|known| known == word)
}

/// Whether a text is empty or one of the words for a missing value.
pub fn is_missing(text: &str) -> bool {
    if text.len() > 60 {
        return false;
    }
    let has_letter_or_digit = text.chars().any(char::is_alphanumeric);
    if !has_letter_or_digit {
        return text.chars().all(|character| {
            character.is_whitespace()
                || matches!(character, '-' | '–' | '—' | '−' | '?' | '.' | '/' | '_' | '*' | '#')
        });
    }
    let joined: String = plain_words(text).split(' ').collect();
    joined.is_empty() || stands_in(MISSING, &joined)
}

/// Whether a text holds a word that stands for a value without a number.
pub(super) fn has_value_word(text: &str) -> bool {
    plain_words(text).split(' ').any(|word| stands_in(VALUE_WORDS, word))
}

pub(super) fn starts_remark(word: &str) -> bool {
    stands_in(REMARK_STARTS, &word.to_lowercase())
}

/// Whether the words before a number make it the number of a guideline, a pH or the like.
pub(super) fn numbers_something_else(label: &str) -> bool {
    label.split_whitespace().last().is_some_and(|word| stands_in(NUMBERED, &word.to_lowercase()))
}

#[cfg(test)]
mod tests {
    use super::is_missing;

    #[test]
    fn words_for_missing_are_known_in_every_spelling() {
        for text in [
            "",
            " ",
            "-",
            "–",
            "--",
            "n.d.",
            "N.D.",
            "n. d.",
            "n/a",
            "#N/A",
            "k.A.",
            "k. A.",
            "keine Angabe",
            "?",
            "unknown",
            "nicht bestimmt",
            "No data available",
            "not determined",
        ] {
            assert!(is_missing(text), "{text}");
        }
        for text in ["0", "insoluble", "4.5", "no", "> 3"] {
            assert!(!is_missing(text), "{text}");
        }
    }
}
