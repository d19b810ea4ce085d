//! Letters without case and accents, so that words compare whatever keyboard they came from.

use super::text::tidy;

/// The words of a text in lower case, without accents or punctuation, parted by single spaces. `ß` becomes `ss`,
/// subscript digits become digits.
pub fn plain_words(text: &str) -> String {
    let mut words = String::with_capacity(text.len());
    for character in tidy(text).chars().flat_map(char::to_lowercase) {
        match unaccented(character) {
            Plain::Letters(letters) => words.push_str(letters),
            Plain::Same if character.is_alphanumeric() => words.push(character),
            Plain::Same => {
                if !words.ends_with(' ') && !words.is_empty() {
                    words.push(' ');
                }
            }
        }
    }
    if words.ends_with(' ') {
        words.pop();
    }
    words
}

pub(super) enum Plain {
    Letters(&'static str),
    Same,
}

/// What a lower-case letter is without its accent.
pub(super) fn unaccented(character: char) -> Plain {
    let letters = match character {
        // Combining marks.
        '\u{300}'..='\u{36F}' => "",
        'à' | 'á' | 'â' | 'ã' | 'ä' | 'å' | 'ā' | 'ă' | 'ą' => "a",
        'æ' => "ae",
        'ç' | 'ć' | 'č' => "c",
        'ď' | 'đ' => "d",
        'è' | 'é' | 'ê' | 'ë' | 'ē' | 'ę' | 'ě' => "e",
        'ì' | 'í' | 'î' | 'ï' | 'ī' => "i",
        'ł' => "l",
        'ñ' | 'ń' | 'ň' => "n",
        'ò' | 'ó' | 'ô' | 'õ' | 'ö' | 'ø' | 'ō' | 'ő' => "o",
        'œ' => "oe",
        'ř' => "r",
        'ß' => "ss",
        'ś' | 'š' | 'ş' => "s",
        'ť' | 'ţ' => "t",
        'ù' | 'ú' | 'û' | 'ü' | 'ū' | 'ű' | 'ů' => "u",
        'ý' | 'ÿ' => "y",
        'ź' | 'ż' | 'ž' => "z",
        '₀' => "0",
        '₁' => "1",
        '₂' => "2",
        '₃' => "3",
        '₄' => "4",
        '₅' => "5",
        _ => return Plain::Same,
    };
    Plain::Letters(letters)
}

/// Whether a character is one of the Chinese or Japanese scripts, which write words without spaces.
pub(super) fn is_east_asian(character: char) -> bool {
    matches!(character, '々' | '\u{3040}'..='\u{30FF}' | '\u{3400}'..='\u{4DBF}' | '\u{4E00}'..='\u{9FFF}' | '\u{F900}'..='\u{FAFF}')
}

/// A tidied text with spaces where East Asian letters meet other letters or digits: `120日以上` is `120 日以上`.
pub fn part_scripts(tidied: String) -> String {
    if !tidied.contains(is_east_asian) {
        return tidied;
    }
    let mut parted = String::with_capacity(tidied.len() + 16);
    let mut before = ' ';
    for character in tidied.chars() {
        let scripts_meet = is_east_asian(before) != is_east_asian(character);
        if scripts_meet && before.is_alphanumeric() && character.is_alphanumeric() {
            parted.push(' ');
        }
        parted.push(character);
        before = character;
    }
    parted
}

#[cfg(test)]
mod tests {
    use super::{part_scripts, plain_words};

    #[test]
    fn words_lose_case_accents_and_punctuation() {
        assert_eq!(plain_words("Löslichkeit\n(Wasser) [mg/L]"), "loslichkeit wasser mg l");
        assert_eq!(plain_words("CAS-Nr."), "cas nr");
        assert_eq!(plain_words("ThCO₂"), "thco2");
        assert_eq!(plain_words("GRÖßER"), "grosser");
        assert_eq!(plain_words("Supérieur à, año"), "superieur a ano");
    }

    #[test]
    fn scripts_without_spaces_are_parted_from_numbers() {
        assert_eq!(part_scripts("120日以上".to_owned()), "120 日以上");
        assert_eq!(part_scripts("大于4.5mg/L".to_owned()), "大于 4.5mg/L");
        assert_eq!(part_scripts("トン/年".to_owned()), "トン/年");
    }
}
