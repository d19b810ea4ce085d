//! Text as people's programs leave it, made plain: one kind of space, of minus, of digit.

use std::borrow::Cow;

use super::symbols::{entities_read, symbol};

/// The text with one kind of space, hyphen, micro sign and digit, without invisible characters; line breaks become
/// semicolons, superscript digits `^2` after a number and plain digits after a letter, `&lt;` the sign it stands for.
pub fn tidy(text: &str) -> String {
    let text: Cow<str> = if text.contains('&') { entities_read(text) } else { Cow::Borrowed(text) };
    let mut plain = String::with_capacity(text.len());
    let mut raised = Raised::No;
    let mut characters = text.chars().peekable();
    while let Some(character) = characters.next() {
        raised = push_tidied(&mut plain, character, characters.peek().copied(), raised);
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
fn push_tidied(plain: &mut String, character: char, next: Option<char>, raised: Raised) -> Raised {
    let before_digit = next.is_some_and(|next| next.is_ascii_digit());
    match character {
        '\n' | '\r' => push_line_break(plain),
        // Some programs write a soft hyphen for a minus or a dash: before a digit it is kept, and then makes no number.
        '\u{AD}' if before_digit && !plain.ends_with([',', '.', '-']) => plain.push(character),
        // Soft hyphen, zero-width spaces and joiners, marks of direction, byte order mark.
        '\u{AD}' | '\u{200B}'..='\u{200F}' | '\u{202A}'..='\u{202E}' | '\u{2060}' | '\u{FEFF}' => {}
        '\u{2010}'..='\u{2015}' | '\u{2212}' | '\u{FE58}' | '\u{FE63}' | '\u{2043}' | '\u{2D7}' => {
            plain.push('-');
        }
        // The mark of a long vowel, where it stands for a dash.
        'ー' | 'ｰ'
            if plain.ends_with(|last: char| last.is_ascii_digit()) || (plain.is_empty() && before_digit) =>
        {
            plain.push('-');
        }
        '½' if plain.ends_with(|last: char| last.is_ascii_digit()) => plain.push_str(".5"),
        '½' if plain.is_empty() => plain.push_str("0.5"),
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
        _ => match (superscript_digit(character), symbol(character)) {
            (Some(digit), _) => {
                push_superscript(plain, digit, raised);
                return Raised::Yes;
            }
            (None, Some(written)) => plain.push_str(written),
            (None, None) => plain.push(character),
        },
    }
    Raised::No
}

fn push_line_break(plain: &mut String) {
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

#[cfg(test)]
mod tests {
    use super::tidy;

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
    fn characters_made_of_several_become_those() {
        assert_eq!(tidy("12㎎/ℓ"), "12mg/l");
        assert_eq!(tidy("5 ％、20 ℃"), "5 %, 20 °C");
        assert_eq!(tidy("&lt;&nbsp;5 &#181;g/L"), "< 5 µg/L");
        assert_eq!(tidy("&amp;gt; 6"), "> 6");
        assert_eq!(tidy("R&D; 5"), "R&D; 5");
    }

    #[test]
    fn a_dash_in_disguise_is_a_dash_or_left_to_be_refused() {
        assert_eq!(tidy("4.2ー4.8"), "4.2-4.8");
        assert_eq!(tidy("ー0.3"), "-0.3");
        assert_eq!(tidy("データなし"), "データなし");
        assert_eq!(tidy("10\u{AD}20"), "10\u{AD}20");
    }
}
