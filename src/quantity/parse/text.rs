//! Text as people's programs leave it, made plain: one kind of space, of minus, of digit.

/// The text with one kind of space, hyphen, micro sign and digit, without invisible characters; line breaks become
/// semicolons, superscript digits `^2` after a number and plain digits after a letter.
pub fn tidy(text: &str) -> String {
    let mut plain = String::with_capacity(text.len());
    let mut raised = Raised::No;
    for character in text.chars() {
        raised = push_tidied(&mut plain, character, raised);
    }
    for (ending, replacement) in [("(s)", "s"), ("(en)", "en"), ("(e)", "e")] {
        if plain.contains(ending) {
            plain = plain.replace(ending, replacement);
        }
    }
    // A leading apostrophe is how spreadsheets mark text.
    let trimmed = plain
        .trim_matches(|character: char| character.is_whitespace() || character == ';')
        .trim_start_matches('\'');
    if trimmed.len() == plain.len() { plain } else { trimmed.to_owned() }
}

/// Appends what stands for a character; says whether it was a superscript.
fn push_tidied(plain: &mut String, character: char, raised: Raised) -> Raised {
    match character {
        '\n' | '\r' => {
            // Only what was just written is looked at, so that a text of line breaks stays linear.
            let before = plain.strip_suffix(' ').unwrap_or(plain);
            if before.ends_with([':', '=', ';']) {
                if before.len() == plain.len() {
                    plain.push(' ');
                }
            } else {
                plain.push_str("; ");
            }
        }
        // Soft hyphen, zero-width spaces and joiners, byte order mark.
        '\u{AD}' | '\u{200B}'..='\u{200F}' | '\u{2060}' | '\u{FEFF}' => {}
        '\u{2010}'..='\u{2015}' | '\u{2212}' | '\u{FE58}' | '\u{FE63}' | '\u{2043}' => plain.push('-'),
        '\u{3BC}' => plain.push('µ'),
        '\u{2103}' => plain.push_str("°C"),
        '\u{2109}' => plain.push_str("°F"),
        'º' | '˚' => plain.push('°'),
        '½' => plain.push_str("1/2"),
        '≧' | '⩾' => plain.push('≥'),
        '≦' | '⩽' => plain.push('≤'),
        '∼' | '～' | '≈' | '≅' | '≃' => plain.push('~'),
        '’' | '‘' | '´' | '`' => plain.push('\''),
        '…' => plain.push_str("..."),
        // Full-width forms of ASCII.
        '\u{FF01}'..='\u{FF5E}' => plain.extend(char::from_u32(u32::from(character) - 0xFEE0)),
        '⁻' => {
            push_superscript(plain, '-', raised);
            return Raised::Yes;
        }
        '⁺' => {
            push_superscript(plain, '+', raised);
            return Raised::Yes;
        }
        _ if character.is_whitespace() => plain.push(' '),
        _ => match superscript_digit(character) {
            Some(digit) => {
                push_superscript(plain, digit, raised);
                return Raised::Yes;
            }
            None => plain.push(character),
        },
    }
    Raised::No
}

/// `raised` tells whether the character before was a superscript too.
fn push_superscript(plain: &mut String, digit: char, raised: Raised) {
    let after_digit = plain.ends_with(|character: char| character.is_ascii_digit());
    if raised == Raised::No && after_digit {
        plain.push('^');
    }
    plain.push(digit);
}

/// Whether a character is a superscript.
#[derive(Debug, Clone, Copy, PartialEq, Eq)]
enum Raised {
    Yes,
    No,
}

fn superscript_digit(character: char) -> Option<char> {
    match character {
        '⁰' => Some('0'),
        '¹' => Some('1'),
        '²' => Some('2'),
        '³' => Some('3'),
        '⁴'..='⁹' => char::from_u32(u32::from(character) - u32::from('⁴') + u32::from('4')),
        _ => None,
    }
}

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

enum Plain {
    Letters(&'static str),
    Same,
}

fn unaccented(character: char) -> Plain {
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

#[cfg(test)]
mod tests {
    use super::{plain_words, tidy};

    #[test]
    fn invisible_and_lookalike_characters_become_plain_ones() {
        assert_eq!(tidy("\u{FEFF}\u{A0}4,\u{AD}5\u{A0}"), "4,5");
        assert_eq!(tidy("４．７"), "4.7");
        assert_eq!(tidy("−3 – 5"), "-3 - 5");
        assert_eq!(tidy("3.4×10³"), "3.4×10^3");
        assert_eq!(tidy("1,2·10⁻¹²"), "1,2·10^-12");
        assert_eq!(tidy("mg L⁻¹"), "mg L-1");
        assert_eq!(tidy("Pa m³/mol"), "Pa m3/mol");
    }

    #[test]
    fn words_lose_case_accents_and_punctuation() {
        assert_eq!(plain_words("Löslichkeit\n(Wasser) [mg/L]"), "loslichkeit wasser mg l");
        assert_eq!(plain_words("CAS-Nr."), "cas nr");
        assert_eq!(plain_words("ThCO₂"), "thco2");
        assert_eq!(plain_words("GRÖßER"), "grosser");
    }
}
