//! A number shown with words around it, from the text that the cell shows beside the number it stores.

/// The number format that shows the stored number as the cell does: `0" weken"` for `4 weken`; none where nothing but
/// the number is shown. Where the number shown is another one, the format shows the text alone.
pub(super) fn format_of(shown: &str, number: f64) -> Option<String> {
    let shown = shown.trim();
    if !shown.contains(is_word) {
        return in_thousands(shown, number);
    }
    let found = number_within(shown).and_then(|found| {
        let decimals = found.decimals_as(number, rounding_of(shown))?;
        Some((found, decimals))
    });
    let Some((Within { before, after, .. }, decimals)) = found else {
        return is_more_than_an_exponent(shown).then(|| quoted(shown));
    };
    let before = before.trim_end_matches(['-', '−']);
    if !before.contains(is_word) && !after.contains(is_word) {
        return None;
    }
    let places = if decimals == 0 { "0".to_owned() } else { format!("0.{}", "0".repeat(decimals)) };
    Some(format!("{}{places}{}", quoted(before), quoted(after)))
}

/// The format of a number that is shown divided by thousands.
fn in_thousands(shown: &str, number: f64) -> Option<String> {
    let found = number_within(shown)?;
    if found.decimals_as(number, Rounding::Allowed).is_some() {
        return None;
    }
    [(1e3, "0,"), (1e6, "0,,")]
        .into_iter()
        .find(|(scale, _)| found.decimals_as(number / scale, Rounding::Allowed).is_some())
        .map(|(_, code)| code.to_owned())
        .filter(|_| number.abs() >= 1e3)
}

/// Signs that numbers, groups, fractions and times are written with are no words, nor is the `###` of a narrow column.
fn is_word(character: char) -> bool {
    !character.is_numeric()
        && !character.is_whitespace()
        && !matches!(
            character,
            '.' | ',' | '\'' | '’' | '-' | '−' | '+' | '(' | ')' | '/' | ':' | '#' | '\u{202F}'
        )
}

/// `1.2E+03` is a number.
fn is_more_than_an_exponent(shown: &str) -> bool {
    let mut words = shown.chars().filter(|character| is_word(*character));
    !(words.all(|word| matches!(word, 'E' | 'e')) && shown.contains(['E', 'e']))
}

/// Whether the number shown may be a rounded one.
#[derive(Debug, Clone, Copy, PartialEq, Eq)]
enum Rounding {
    Allowed,
    Exact,
}

fn rounding_of(shown: &str) -> Rounding {
    if shown.contains(['<', '>', '≤', '≥']) { Rounding::Exact } else { Rounding::Allowed }
}

/// The first number of a text, and what is around it.
struct Within<'text> {
    before: &'text str,
    digits: &'text str,
    after: &'text str,
}

fn number_within(shown: &str) -> Option<Within<'_>> {
    let start = shown.find(|character: char| character.is_ascii_digit())?;
    let (before, rest) = shown.split_at_checked(start)?;
    let is_part = |character: char| character.is_ascii_digit() || is_separator(character);
    let end = rest.find(|character: char| !is_part(character)).unwrap_or(rest.len());
    let digits = rest.get(..end)?.trim_end_matches(is_separator);
    Some(Within { before, digits, after: rest.get(digits.len()..)? })
}

fn is_separator(character: char) -> bool {
    matches!(character, '.' | ',' | '\'' | '’' | ' ' | '\u{A0}' | '\u{202F}')
}

impl Within<'_> {
    /// With how many decimals these digits are the number, rounded; the last separator may be for decimals or for
    /// thousands. A bound is not rounded: `< 1` for 0.6 may be `< 1` for all that is less.
    fn decimals_as(&self, number: f64, rounding: Rounding) -> Option<usize> {
        let plain = |text: &str| text.chars().filter(char::is_ascii_digit).collect::<String>();
        let is_number = |text: &str, decimals: usize| {
            let half_a_unit = 0.5 * 10f64.powi(-i32::try_from(decimals).unwrap_or(0));
            let exact = number.abs() * 1e-9;
            let allowed = match rounding {
                Rounding::Allowed => half_a_unit + exact,
                Rounding::Exact => exact,
            };
            text.parse::<f64>().is_ok_and(|shown| (shown - number.abs()).abs() <= allowed)
        };
        let with_decimals = self
            .digits
            .rsplit_once(['.', ','])
            .filter(|(before, after)| is_number(&format!("{}.{after}", plain(before)), after.len()));
        match with_decimals {
            Some((_, decimals)) => Some(decimals.len()),
            None => is_number(&plain(self.digits), 0).then_some(0),
        }
    }
}

/// A text as a format shows it; a quotation mark stands behind a backslash.
fn quoted(text: &str) -> String {
    let parts: Vec<String> = text
        .split('"')
        .map(|part| if part.is_empty() { String::new() } else { format!("\"{part}\"") })
        .collect();
    parts.join("\\\"")
}

#[cfg(test)]
mod tests {
    use super::format_of;

    #[test]
    fn words_around_a_stored_number_become_its_format() {
        for (shown, number, code) in [
            ("4 weken", 4.0, Some("0\" weken\"")),
            ("4,3 weken", 4.26, Some("0.0\" weken\"")),
            ("1.197 d", 1197.0, Some("0\" d\"")),
            ("1.197 d", 1.197, Some("0.000\" d\"")),
            ("5 weken", 4.5, Some("0\" weken\"")),
            ("6 weken", 4.5, Some("\"6 weken\"")),
            ("1 197 d", 1197.0, Some("0\" d\"")),
            ("-4 °C", -4.0, Some("0\" °C\"")),
            ("<0,5", 0.5, Some("\"<\"0.0")),
            ("4,00 €", 4.0, Some("0.00\" €\"")),
            ("4 g/100 mL", 4.0, Some("0\" g/100 mL\"")),
            ("< 1 d", 0.5, Some("\"< 1 d\"")),
            ("50k", 50_000.0, Some("\"50k\"")),
            ("n.d.", 0.0, Some("\"n.d.\"")),
            ("say \"4\"", 4.0, Some("\"say \"\\\"0\\\"")),
            ("4", 4.0, None),
            ("-4,25", -4.25, None),
            ("1.234,5", 1234.5, None),
            ("1,2E+03", 1200.0, None),
            ("2 1/2", 2.5, None),
            ("50", 50_000.0, Some("0,")),
            ("1,5", 1_500_000.0, Some("0,,")),
            ("50.000", 50_000.0, None),
            ("###", 4.0, None),
            ("", 4.0, None),
        ] {
            assert_eq!(format_of(shown, number).as_deref(), code, "{shown}");
        }
    }
}
