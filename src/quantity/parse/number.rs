//! One number in decimal text: sign, grouped digits, decimals, exponent.
//!
//! The digits are brought into the form that the standard library reads, so that every number is the nearest one to
//! its text and no arithmetic is done on digits.

use crate::quantity::{DecimalStyle, QuantityFault};

/// The digits of a number as written, before their separators are understood.
struct Digits<'text> {
    written: &'text str,
    rest: &'text str,
}

/// The number at the start of a tidied text and what follows it; `None` if there is none.
pub(super) fn read_number(text: &str, decimal: DecimalStyle) -> Result<Option<(f64, &str)>, QuantityFault> {
    let text = text.trim_start();
    let (sign, unsigned) = match text.strip_prefix('-') {
        Some(rest) => ("-", rest.trim_start()),
        None => ("", text.strip_prefix('+').unwrap_or(text)),
    };
    let digits = take_digits(unsigned);
    if !digits.written.contains(|character: char| character.is_ascii_digit()) {
        return Ok(None);
    }
    let power_alone = power_of_ten(unsigned);
    let (mantissa, exponent, rest) = if let Some((exponent, rest)) = power_alone {
        ("1".to_owned(), Some(exponent), rest)
    } else {
        let (exponent, rest) = take_exponent(digits.rest)?;
        (plain_decimal(digits.written, decimal, exponent)?, exponent, rest)
    };
    if goes_on_like_a_number(rest) {
        return Err(QuantityFault::BadNumber);
    }
    let written = format!("{sign}{mantissa}e{}", exponent.unwrap_or("0"));
    let number: f64 = written.parse().map_err(|_| QuantityFault::BadNumber)?;
    let vanished =
        number.abs() < f64::MIN_POSITIVE && mantissa.contains(|digit| ('1'..='9').contains(&digit));
    if !number.is_finite() || vanished {
        return Err(QuantityFault::BadRange);
    }
    Ok(Some((number, rest)))
}

/// `4.2e4.8` is no number and `4.2` no part of it.
fn goes_on_like_a_number(rest: &str) -> bool {
    let exponent = rest.strip_prefix(['e', 'E']).map(|after| after.trim_start_matches(['-', '+']));
    exponent.is_some_and(|after| after.starts_with(|first: char| first.is_ascii_digit()))
}

/// Whether a number starts here.
pub(super) fn starts_number(text: &str) -> bool {
    let unsigned = text.trim_start_matches(['-', '+']).trim_start();
    let mut characters = unsigned.chars();
    match characters.next() {
        Some('.' | ',') => characters.next().is_some_and(|next| next.is_ascii_digit()),
        Some(first) => first.is_ascii_digit(),
        None => false,
    }
}

/// Digits with `.`, `,`, `'` or a space between them, where a space must stand before exactly three digits.
fn take_digits(text: &str) -> Digits<'_> {
    let bytes = text.as_bytes();
    let is_digit = |position: usize| bytes.get(position).is_some_and(u8::is_ascii_digit);
    let three_digits_follow =
        |position: usize| (1..=3).all(|step| is_digit(position + step)) && !is_digit(position + 4);
    let mut spaced = false;
    let mut end = 0;
    while let Some(byte) = bytes.get(end) {
        let belongs = match byte {
            b'0'..=b'9' => true,
            b'.' | b',' => is_digit(end + 1),
            b'\'' => three_digits_follow(end),
            b' ' => {
                let group = bytes.get(..end).unwrap_or_default();
                let first_group = group.iter().all(u8::is_ascii_digit) && (1..=3).contains(&group.len());
                let groups = three_digits_follow(end) && (spaced || first_group);
                spaced |= groups;
                groups
            }
            _ => false,
        };
        if !belongs {
            break;
        }
        end += 1;
    }
    let (written, rest) = text.split_at(end);
    Digits { written, rest }
}

/// The digits with a point as the only separator.
fn plain_decimal(
    written: &str,
    style: DecimalStyle,
    exponent: Option<&str>,
) -> Result<String, QuantityFault> {
    let ungrouped: String = written.chars().filter(|character| !matches!(character, ' ' | '\'')).collect();
    let points = ungrouped.matches('.').count();
    let commas = ungrouped.matches(',').count();
    let separator = match (points, commas) {
        (0, 0) => return Ok(ungrouped),
        (1, 0) => only_separator(&ungrouped, '.', style, exponent),
        (0, 1) => only_separator(&ungrouped, ',', style, exponent),
        (_, 0) => Separator::Groups('.'),
        (0, _) => Separator::Groups(','),
        // Both kinds: the last one is the decimal separator, the other groups thousands.
        (_, _) if ungrouped.rfind('.') > ungrouped.rfind(',') => {
            Separator::Both { groups: ',', decimal: '.' }
        }
        (_, _) => Separator::Both { groups: '.', decimal: ',' },
    };
    match separator {
        Separator::Decimal(decimal) => Ok(with_point(&ungrouped, decimal)),
        Separator::Groups(groups) => without_groups(&ungrouped, groups),
        Separator::Both { groups, decimal } => {
            let (whole, decimals) = ungrouped.split_once(decimal).ok_or(QuantityFault::BadNumber)?;
            if decimals.contains([groups, decimal]) {
                return Err(QuantityFault::BadNumber);
            }
            Ok(format!("{}.{decimals}", without_groups(whole, groups)?))
        }
    }
}

enum Separator {
    Decimal(char),
    Groups(char),
    Both { groups: char, decimal: char },
}

/// Only a separator followed by exactly three digits and nothing else could group thousands; a zero or nothing before
/// it, more than three digits before it, or an exponent after it, rule that out.
fn only_separator(
    ungrouped: &str,
    separator: char,
    style: DecimalStyle,
    exponent: Option<&str>,
) -> Separator {
    let (whole, decimals) = ungrouped.split_once(separator).unwrap_or((ungrouped, ""));
    let could_group = decimals.len() == 3
        && (1..=3).contains(&whole.len())
        && !whole.starts_with('0')
        && exponent.is_none();
    let is_decimal_of_style = match style {
        DecimalStyle::Point => separator == '.',
        DecimalStyle::Comma => separator == ',',
    };
    if could_group && !is_decimal_of_style {
        Separator::Groups(separator)
    } else {
        Separator::Decimal(separator)
    }
}

fn with_point(ungrouped: &str, decimal: char) -> String {
    let (whole, decimals) = ungrouped.split_once(decimal).unwrap_or((ungrouped, "0"));
    let whole = if whole.is_empty() { "0" } else { whole };
    format!("{whole}.{decimals}")
}

fn without_groups(whole: &str, separator: char) -> Result<String, QuantityFault> {
    let mut groups = whole.split(separator);
    let first = groups.next().unwrap_or_default();
    let mut joined = first.to_owned();
    let mut others = 0;
    for group in groups {
        if group.len() != 3 {
            return Err(QuantityFault::BadNumber);
        }
        others += 1;
        joined.push_str(group);
    }
    if others > 0 && !(1..=3).contains(&first.len()) {
        return Err(QuantityFault::BadNumber);
    }
    Ok(joined)
}

/// `10^-3` standing alone.
fn power_of_ten(text: &str) -> Option<(&str, &str)> {
    let power = raised(text.strip_prefix("10")?)?;
    in_brackets(power, take_integer)
}

/// The exponent of a power of ten that stands alone, decimals and all: `10^4.5`.
pub(super) fn read_power(text: &str, decimal: DecimalStyle) -> Option<(f64, &str)> {
    let power = raised(text.trim_start().strip_prefix("10")?)?;
    in_brackets(power, |power| read_number(power, decimal).ok().flatten())
}

fn raised(text: &str) -> Option<&str> {
    text.strip_prefix("**").or_else(|| text.strip_prefix('^'))
}

/// What is read after an opening bracket, if there is one, and the rest after the closing one.
fn in_brackets<'text, T>(
    power: &'text str,
    read: impl Fn(&'text str) -> Option<(T, &'text str)>,
) -> Option<(T, &'text str)> {
    match power.strip_prefix('(') {
        None => read(power),
        Some(inside) => {
            let (exponent, rest) = read(inside.trim_start())?;
            Some((exponent, rest.trim_start().strip_prefix(')')?))
        }
    }
}

/// `E-3`, `·10^-3`, `x 10^3`, `×10-3`; nothing if none of these follows. A space before `E` needs a sign after it.
fn take_exponent(text: &str) -> Result<(Option<&str>, &str), QuantityFault> {
    let spaced = text.trim_start();
    if let Some(after) = spaced.strip_prefix(['e', 'E'])
        && (spaced.len() == text.len() || after.starts_with(['-', '+']))
    {
        return Ok(match take_integer(after) {
            Some((exponent, rest)) => (Some(exponent), rest),
            None => (None, text),
        });
    }
    let Some(after) = text
        .trim_start()
        .strip_prefix(['x', 'X', '×', '*', '·', '⋅', '∙', '•'])
        .and_then(|rest| rest.trim_start().strip_prefix("10"))
    else {
        return Ok((None, text));
    };
    let power = match raised(after) {
        Some(power) => power,
        // `10-3` has lost its superscript and can mean nothing else; `103` could be a number.
        None if after.starts_with('-') => after,
        None => return Err(QuantityFault::BadNumber),
    };
    let (exponent, rest) = in_brackets(power, take_integer).ok_or(QuantityFault::BadNumber)?;
    Ok((Some(exponent), rest))
}

/// A signed integer of a few digits that no further digit or decimal follows.
fn take_integer(text: &str) -> Option<(&str, &str)> {
    let unsigned = text.strip_prefix(['-', '+']).unwrap_or(text);
    let length = unsigned.bytes().take_while(u8::is_ascii_digit).count();
    if !(1..=4).contains(&length) {
        return None;
    }
    let (exponent, rest) = text.split_at(text.len() - unsigned.len() + length);
    let mut following = rest.chars();
    let goes_on = matches!(following.next(), Some('.' | ','))
        && following.next().is_some_and(|character| character.is_ascii_digit());
    (!goes_on).then_some((exponent, rest))
}

#[cfg(test)]
mod tests {
    use super::read_number;
    use crate::quantity::{DecimalStyle, QuantityFault};

    fn read(text: &str, style: DecimalStyle) -> f64 {
        let (number, rest) = read_number(text, style).unwrap().unwrap();
        assert_eq!(rest, "", "{text}");
        number
    }

    #[test]
    fn only_a_separator_before_exactly_three_digits_follows_the_column() {
        for (text, point, comma) in [
            ("1.234", 1.234, 1234.0),
            ("1,234", 1234.0, 1.234),
            ("1.23", 1.23, 1.23),
            ("1,23", 1.23, 1.23),
            ("0.125", 0.125, 0.125),
            ("0,125", 0.125, 0.125),
            (",125", 0.125, 0.125),
            ("1234,567", 1234.567, 1234.567),
            ("1,2345", 1.2345, 1.2345),
            ("1.234E2", 123.4, 123.4),
            ("1.234,5", 1234.5, 1234.5),
            ("1,234.5", 1234.5, 1234.5),
            ("1,234,567", 1_234_567.0, 1_234_567.0),
            ("1 500", 1500.0, 1500.0),
            ("1 234 567,8", 1_234_567.8, 1_234_567.8),
            ("12'500.25", 12_500.25, 12_500.25),
        ] {
            assert!(read(text, DecimalStyle::Point).total_cmp(&point).is_eq(), "{text} with points");
            assert!(read(text, DecimalStyle::Comma).total_cmp(&comma).is_eq(), "{text} with commas");
        }
    }

    #[test]
    fn powers_of_ten_are_read_in_every_usual_form() {
        for (text, number) in [
            ("1.2E-3", 1.2e-3),
            ("1,2e+04", 1.2e4),
            ("1,2·10^-3", 1.2e-3),
            ("3.4×10^3", 3.4e3),
            ("3.4 x 10^(-3)", 3.4e-3),
            ("3.4 * 10**2", 340.0),
            ("2 x 10-5", 2e-5),
            ("10^-3", 1e-3),
            ("10**(-3)", 1e-3),
            ("1.2 E-3", 1.2e-3),
        ] {
            assert!(read(text, DecimalStyle::Point).total_cmp(&number).is_eq(), "{text}");
        }
    }

    #[test]
    fn digits_that_make_no_number_are_refused() {
        for text in ["1.2.3", "1,23.4", "1.234.5", "01.02.2003", "3 x 103", "1,2345,678", "4.2e4.8", "12E3.5"]
        {
            assert_eq!(read_number(text, DecimalStyle::Point), Err(QuantityFault::BadNumber), "{text}");
        }
        for text in ["1e999", "1e-999"] {
            assert_eq!(read_number(text, DecimalStyle::Point), Err(QuantityFault::BadRange), "{text}");
        }
    }
}
