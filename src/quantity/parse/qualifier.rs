//! Signs and words that qualify a number, in English and German.

/// How a number is qualified.
#[derive(Debug, Clone, Copy, PartialEq, Eq)]
pub(super) enum Qualifier {
    Above,
    AtLeast,
    Below,
    AtMost,
    About,
    /// `=`, `from`, `von`: nothing is added to the number.
    Exactly,
    /// `between`, `zwischen`: `and` then parts the ends of a range.
    Between,
}

/// Longest first where one starts another.
const SIGNS: &[(&str, Qualifier)] = &[
    (">=", Qualifier::AtLeast),
    ("=>", Qualifier::AtLeast),
    ("≥", Qualifier::AtLeast),
    ("<=", Qualifier::AtMost),
    ("=<", Qualifier::AtMost),
    ("≤", Qualifier::AtMost),
    (">", Qualifier::Above),
    ("<", Qualifier::Below),
    ("~", Qualifier::About),
    ("=", Qualifier::Exactly),
];

/// Lower case. Longer phrases stand before those that start them.
const PHRASES: &[(&str, Qualifier)] = &[
    ("greater than or equal to", Qualifier::AtLeast),
    ("more than or equal to", Qualifier::AtLeast),
    ("not less than", Qualifier::AtLeast),
    ("no less than", Qualifier::AtLeast),
    ("at least", Qualifier::AtLeast),
    ("minimum", Qualifier::AtLeast),
    ("min.", Qualifier::AtLeast),
    ("min", Qualifier::AtLeast),
    ("größer oder gleich", Qualifier::AtLeast),
    ("groesser oder gleich", Qualifier::AtLeast),
    ("größer gleich", Qualifier::AtLeast),
    ("groesser gleich", Qualifier::AtLeast),
    ("mindestens", Qualifier::AtLeast),
    ("ab", Qualifier::AtLeast),
    ("less than or equal to", Qualifier::AtMost),
    ("lower than or equal to", Qualifier::AtMost),
    ("not more than", Qualifier::AtMost),
    ("no more than", Qualifier::AtMost),
    ("at most", Qualifier::AtMost),
    ("up to", Qualifier::AtMost),
    ("maximum", Qualifier::AtMost),
    ("maximal", Qualifier::AtMost),
    ("max.", Qualifier::AtMost),
    ("max", Qualifier::AtMost),
    ("kleiner oder gleich", Qualifier::AtMost),
    ("kleiner gleich", Qualifier::AtMost),
    ("höchstens", Qualifier::AtMost),
    ("hoechstens", Qualifier::AtMost),
    ("nicht mehr als", Qualifier::AtMost),
    ("bis zu", Qualifier::AtMost),
    ("bis", Qualifier::AtMost),
    ("greater than", Qualifier::Above),
    ("larger than", Qualifier::Above),
    ("higher than", Qualifier::Above),
    ("more than", Qualifier::Above),
    ("above", Qualifier::Above),
    ("over", Qualifier::Above),
    ("exceeds", Qualifier::Above),
    ("größer als", Qualifier::Above),
    ("grösser als", Qualifier::Above),
    ("groesser als", Qualifier::Above),
    ("größer", Qualifier::Above),
    ("groesser", Qualifier::Above),
    ("mehr als", Qualifier::Above),
    ("oberhalb", Qualifier::Above),
    ("über", Qualifier::Above),
    ("ueber", Qualifier::Above),
    ("less than", Qualifier::Below),
    ("lower than", Qualifier::Below),
    ("smaller than", Qualifier::Below),
    ("fewer than", Qualifier::Below),
    ("below", Qualifier::Below),
    ("under", Qualifier::Below),
    ("kleiner als", Qualifier::Below),
    ("kleiner", Qualifier::Below),
    ("weniger als", Qualifier::Below),
    ("unterhalb", Qualifier::Below),
    ("unter", Qualifier::Below),
    ("approximately", Qualifier::About),
    ("approx.", Qualifier::About),
    ("approx", Qualifier::About),
    ("about", Qualifier::About),
    ("around", Qualifier::About),
    ("roughly", Qualifier::About),
    ("circa", Qualifier::About),
    ("zirka", Qualifier::About),
    ("ca.", Qualifier::About),
    ("ca", Qualifier::About),
    ("c.", Qualifier::About),
    ("etwa", Qualifier::About),
    ("ungefähr", Qualifier::About),
    ("ungefaehr", Qualifier::About),
    ("rund", Qualifier::About),
    ("between", Qualifier::Between),
    ("zwischen", Qualifier::Between),
    ("from", Qualifier::Exactly),
    ("von", Qualifier::Exactly),
];

/// Words after a number that qualify it; lower case.
const AFTER: &[(&str, Qualifier)] = &[
    ("or more", Qualifier::AtLeast),
    ("or higher", Qualifier::AtLeast),
    ("or above", Qualifier::AtLeast),
    ("or greater", Qualifier::AtLeast),
    ("or longer", Qualifier::AtLeast),
    ("and above", Qualifier::AtLeast),
    ("and more", Qualifier::AtLeast),
    ("oder mehr", Qualifier::AtLeast),
    ("oder höher", Qualifier::AtLeast),
    ("oder länger", Qualifier::AtLeast),
    ("und mehr", Qualifier::AtLeast),
    ("und höher", Qualifier::AtLeast),
    ("or less", Qualifier::AtMost),
    ("or lower", Qualifier::AtMost),
    ("or below", Qualifier::AtMost),
    ("or shorter", Qualifier::AtMost),
    ("and below", Qualifier::AtMost),
    ("oder weniger", Qualifier::AtMost),
    ("oder kürzer", Qualifier::AtMost),
    ("und weniger", Qualifier::AtMost),
];

/// The qualifier that stands after a number: `6 or more`, `6 oder weniger`, `6+`.
pub(super) fn take_qualifier_after(text: &str) -> Option<(Qualifier, &str)> {
    let text = text.trim_start();
    if let Some(rest) = text.strip_prefix('+').filter(|rest| rest.trim().is_empty()) {
        return Some((Qualifier::AtLeast, rest));
    }
    AFTER.iter().find_map(|(phrase, qualifier)| strip_phrase(text, phrase).map(|rest| (*qualifier, rest)))
}

/// The qualifier at the start of a text, if any, and what follows it.
pub(super) fn take_qualifier(text: &str) -> Option<(Qualifier, &str)> {
    let text = text.trim_start();
    let sign =
        SIGNS.iter().find_map(|(sign, qualifier)| text.strip_prefix(sign).map(|rest| (*qualifier, rest)));
    sign.or_else(|| {
        if !text.starts_with(char::is_alphabetic) {
            return None;
        }
        PHRASES
            .iter()
            .find_map(|(phrase, qualifier)| strip_phrase(text, phrase).map(|rest| (*qualifier, rest)))
    })
}

/// What follows a phrase at the start of a text, whatever its case and spaces, if it ends where a word ends.
fn strip_phrase<'text>(text: &'text str, phrase: &str) -> Option<&'text str> {
    let mut rest = text;
    for (place, word) in phrase.split(' ').enumerate() {
        if place > 0 {
            rest = rest.strip_prefix(' ')?.trim_start();
        }
        for expected in word.chars() {
            let found = rest.chars().next()?;
            if !found.to_lowercase().eq(expected.to_lowercase()) {
                return None;
            }
            rest = rest.get(found.len_utf8()..)?;
        }
    }
    let ends_word = phrase.ends_with('.') || !rest.starts_with(char::is_alphanumeric);
    ends_word.then_some(rest)
}

#[cfg(test)]
mod tests {
    use super::{Qualifier, take_qualifier};

    #[test]
    fn qualifier_words_end_where_words_end() {
        assert_eq!(take_qualifier("at least 3"), Some((Qualifier::AtLeast, " 3")));
        assert_eq!(take_qualifier("Größer als 6"), Some((Qualifier::Above, " 6")));
        assert_eq!(take_qualifier("ca.4"), Some((Qualifier::About, "4")));
        assert_eq!(take_qualifier("bisphenol 4"), None);
        assert_eq!(take_qualifier("=> 4"), Some((Qualifier::AtLeast, " 4")));
    }
}
