//! What a number format makes of a number: a date, a duration, or just a number. Whether it
//! shows percentages is for [`Appearance`](crate::workbook::Appearance) to say.

/// What a number under a format is.
#[derive(Debug, Clone, Copy, PartialEq, Eq)]
pub(in crate::workbook::read) enum Shown {
    /// A number, however many decimals it shows, or a percentage.
    Number,
    /// A day, a time of day, or both.
    Date,
    /// A span of time that may exceed a day.
    Duration,
}

/// What a built-in format shows (ECMA-376 part 1, 18.8.30; 27 to 36 and 50 to 58 are the East Asian dates).
pub(in crate::workbook::read) fn shown_by_built_in(number: u16) -> Shown {
    match number {
        14..=22 | 27..=36 | 45 | 47 | 50..=58 => Shown::Date,
        46 => Shown::Duration,
        _ => Shown::Number,
    }
}

/// What a format written out shows, by its first section.
pub(in crate::workbook::read) fn shown_by_code(code: &str) -> Shown {
    // Some writers give the usual format in the language of their users.
    if ["general", "standard", "estándar", "standaard"].contains(&code.to_lowercase().as_str()) {
        return Shown::Number;
    }
    let mut characters = code.chars();
    while let Some(character) = characters.next() {
        match character {
            ';' => break,
            // What follows is shown as it is, is a blank as wide, or fills the cell.
            '\\' | '_' | '*' => drop(characters.next()),
            '"' => drop(characters.by_ref().find(|inner| *inner == '"')),
            '[' => {
                let inner: String = characters.by_ref().take_while(|inner| *inner != ']').collect();
                if is_span(&inner) {
                    return Shown::Duration;
                }
            }
            'd' | 'D' | 'm' | 'M' | 'y' | 'Y' | 'h' | 'H' | 's' | 'S' => return Shown::Date,
            // The day and the half of the day in words of some regions, and the years of East Asian eras.
            'g' | 'G' | 'b' | 'B' if is_era(characters.as_str()) => return Shown::Date,
            _ => {}
        }
    }
    Shown::Number
}

/// `[h]`, `[mm]`, `[ss]`: hours, minutes or seconds counted on beyond their usual limit.
fn is_span(inner: &str) -> bool {
    ['h', 'm', 's']
        .iter()
        .any(|unit| !inner.is_empty() && inner.chars().all(|character| character.eq_ignore_ascii_case(unit)))
}

/// An era or a Buddhist year is followed by its year or month: `gge`, `bbbb`.
fn is_era(rest: &str) -> bool {
    rest.starts_with(['g', 'G', 'e', 'E', 'b', 'B', '1', '2'])
        && !rest.get(..6).is_some_and(|next| next.eq_ignore_ascii_case("eneral"))
}

#[cfg(test)]
mod tests {
    use super::{Shown, shown_by_built_in, shown_by_code};

    #[test]
    fn a_format_is_known_by_its_code() {
        for (code, shown) in [
            ("General", Shown::Number),
            ("0.00", Shown::Number),
            ("#,##0.00 \"mg/L\"", Shown::Number),
            ("0.00E+00", Shown::Number),
            ("[Red]0.0", Shown::Number),
            ("[$-407]0", Shown::Number),
            ("\\d0", Shown::Number),
            ("0_d", Shown::Number),
            ("General\" d\"", Shown::Number),
            ("GENERAL", Shown::Number),
            ("Standard", Shown::Number),
            ("0;yyyy", Shown::Number),
            ("@", Shown::Number),
            ("0.00%;[Red]-0.00%", Shown::Number),
            ("yyyy-mm-dd", Shown::Date),
            ("[$-407]d. mmmm yyyy", Shown::Date),
            ("DD.MM.YYYY hh:mm", Shown::Date),
            ("h:mm AM/PM", Shown::Date),
            ("gge\"年\"m\"月\"", Shown::Date),
            ("[h]:mm:ss", Shown::Duration),
            ("[mm]:ss", Shown::Duration),
        ] {
            assert_eq!(shown_by_code(code), shown, "{code}");
        }
    }

    #[test]
    fn a_built_in_format_is_known_by_its_number() {
        for (number, shown) in [
            (0, Shown::Number),
            (10, Shown::Number),
            (11, Shown::Number),
            (13, Shown::Number),
            (14, Shown::Date),
            (22, Shown::Date),
            (23, Shown::Number),
            (46, Shown::Duration),
            (49, Shown::Number),
        ] {
            assert_eq!(shown_by_built_in(number), shown, "{number}");
        }
    }
}
