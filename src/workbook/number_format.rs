//! What a number format makes of a number where it shows more than its digits: words, units, signs, percentages.
//!
//! How digits are grouped, rounded and coloured is not asked: the number counts in full. Dates are no numbers here.

mod section;

use section::{Piece, Section, sections};

/// A number format that shows more than digits.
#[derive(Debug, Clone, PartialEq)]
pub struct NumberFormat {
    sections: Vec<Section>,
}

/// What a cell shows of its number.
#[derive(Debug, Clone, PartialEq)]
pub enum ShownNumber {
    /// The number and no more.
    AsItIs,
    /// The number among words or signs, with a decimal point, or words instead of it.
    Text(String),
    /// Nothing, as many formats do with zero.
    Nothing,
    /// The number divided by thousands, and no word that says so.
    Scaled(String),
}

/// Which numbers a section is for.
#[derive(Debug, Clone, Copy, PartialEq, Eq)]
enum Chosen {
    /// Its own condition, all numbers, or those from zero on.
    Plainly,
    /// The negative ones: their sign is shown by the section itself.
    AsNegative,
}

impl NumberFormat {
    /// A format by its code, as spreadsheet programs write it; nothing where it shows digits alone.
    pub fn of_code(code: &str) -> Option<Self> {
        let sections = sections(code);
        let shows_more = sections.len() > 2 || sections.iter().any(Section::shows_more);
        shows_more.then_some(Self { sections })
    }

    /// What a cell of this format shows of a number.
    pub fn show(&self, number: f64) -> ShownNumber {
        match self.section_for(number) {
            Some((section, chosen)) => show_in(section, number, chosen),
            None => ShownNumber::AsItIs,
        }
    }

    /// What a cell of this format shows of a text, where it adds words to it.
    pub fn show_text(&self, text: &str) -> Option<String> {
        let section = self.sections.last().filter(|section| section.holds_text())?;
        let (prefix, suffix) = section.around();
        let has_words = !prefix.trim().is_empty() || !suffix.trim().is_empty();
        has_words.then(|| format!("{prefix}{text}{suffix}").trim().to_owned())
    }

    /// Sections with conditions come first; without, they are for positive numbers, negative ones and zero.
    fn section_for(&self, number: f64) -> Option<(&Section, Chosen)> {
        let count = match self.sections.len() {
            // The last of four, and one that speaks of text, is for texts.
            count if count > 1 && self.sections.last().is_some_and(Section::holds_text) => count - 1,
            count => count.min(3),
        };
        let numeric = self.sections.get(..count)?;
        let first = numeric.first()?;
        let rest = numeric.get(1..).unwrap_or_default();
        let Some(condition) = &first.condition else {
            let chosen = match rest {
                [negative, ..] if number < 0.0 && negative.condition.is_none() => {
                    (negative, Chosen::AsNegative)
                }
                [_, zero] if number == 0.0 => (zero, Chosen::Plainly),
                [second, ..] if second.condition.as_ref().is_some_and(|own| own.holds(number)) => {
                    (second, Chosen::Plainly)
                }
                [] | [_] | [_, _, ..] => (first, Chosen::Plainly),
            };
            return Some(chosen);
        };
        if condition.holds(number) {
            return Some((
                first,
                if condition.is_of_negatives() { Chosen::AsNegative } else { Chosen::Plainly },
            ));
        }
        match rest {
            [] => Some((first, Chosen::Plainly)),
            [other] => Some((other, Chosen::Plainly)),
            [second, last, ..] => {
                let fits = match &second.condition {
                    Some(condition) => condition.holds(number),
                    None => number < 0.0,
                };
                Some((if fits { second } else { last }, Chosen::Plainly))
            }
        }
    }
}

fn show_in(section: &Section, number: f64, chosen: Chosen) -> ShownNumber {
    let zero = number == 0.0;
    if section.holds_date() {
        return ShownNumber::AsItIs;
    }
    let (mut prefix, mut suffix) = section.around();
    if !section.holds_number() {
        let words = prefix.trim();
        return match (words.is_empty(), zero) {
            (false, _) => ShownNumber::Text(words.to_owned()),
            (true, true) => ShownNumber::Nothing,
            // A number that is hidden is a number still.
            (true, false) => ShownNumber::AsItIs,
        };
    }
    let mut number = number;
    if number < 0.0 {
        let says_less = |text: &str| text.contains(['<', '>', '≤', '≥', '~']);
        let has_sign = prefix.contains(['-', '−', '(']);
        if chosen == Chosen::AsNegative && !has_sign && (says_less(&prefix) || says_less(&suffix)) {
            number = number.abs();
        } else if chosen == Chosen::AsNegative {
            // The number brings its own sign.
            prefix = prefix.replace(['-', '−', '('], "");
            suffix = suffix.replace(')', "");
        }
    }
    let digits = if zero && section.hides_zero() { Some(String::new()) } else { section.digits_of(number) };
    let is_word = |text: &str| text.contains(|sign: char| !sign.is_whitespace() && !"()+".contains(sign));
    let inner = section.between();
    let has_words = is_word(&prefix) || is_word(&suffix) || is_word(&inner);
    if !has_words {
        return match section.thousands {
            _ if digits.as_deref() == Some("") => ShownNumber::Nothing,
            0 => ShownNumber::AsItIs,
            _ => ShownNumber::Scaled(shifted(number, section.shift())),
        };
    }
    let shown = if let Some(digits) = digits {
        format!("{prefix}{digits}{suffix}")
    } else {
        let inner = if is_word(&inner) { format!(" {}", inner.trim()) } else { String::new() };
        format!("{prefix}{}{inner}{suffix}", shifted(number, section.shift()))
    };
    ShownNumber::Text(shown.trim().to_owned())
}

/// A number with its decimal point moved, every digit kept: 0.07 by 2 is `7`. Three decimals get a zero: they could be
/// read as thousands.
fn shifted(number: f64, places: i32) -> String {
    let scientific = format!("{number:e}");
    let moved = scientific.split_once('e').and_then(|(digits, power)| {
        let power = power.parse::<i32>().ok()? + places;
        format!("{digits}e{power}").parse::<f64>().ok()
    });
    let text = moved.unwrap_or(number * 10f64.powi(places)).to_string();
    let three = text.rsplit_once('.').is_some_and(|(_, decimals)| decimals.len() == 3);
    if three { format!("{text}0") } else { text }
}

impl Section {
    /// Whether it shows more than digits and a sign.
    fn shows_more(&self) -> bool {
        let words = self.pieces.iter().any(|piece| match piece {
            Piece::Literal(text) => {
                text.contains(|sign: char| !sign.is_whitespace() && !"()+-−".contains(sign))
            }
            Piece::Digit(_) | Piece::Rest | Piece::Whole => false,
        });
        let sign_first = matches!(self.pieces.first(), Some(Piece::Literal(text)) if text.contains('-'));
        words || sign_first || self.thousands > 0 || self.between().contains(['-', '−'])
    }

    fn shift(&self) -> i32 {
        self.percent_shift() - 3 * i32::from(self.thousands)
    }
}

#[cfg(test)]
mod tests {
    use super::{NumberFormat, ShownNumber, shifted};

    fn shown(code: &str, number: f64) -> String {
        match NumberFormat::of_code(code).map_or(ShownNumber::AsItIs, |format| format.show(number)) {
            ShownNumber::AsItIs => "as it is".to_owned(),
            ShownNumber::Text(text) => text,
            ShownNumber::Nothing => "nothing".to_owned(),
            ShownNumber::Scaled(text) => format!("scaled {text}"),
        }
    }

    #[test]
    fn words_of_a_format_stand_around_the_number_in_full() {
        for (code, number, text) in [
            ("0\" weken\"", 4.4, "4.4 weken"),
            ("0\\ \\d", 4.0, "4 d"),
            ("#,##0.0 \"mg/L\"", 12_345.678_9, "12345.6789 mg/L"),
            ("0.0\" d\"", 1.197, "1.1970 d"),
            ("General\" d\"", 4.5, "4.5 d"),
            ("General \"d\"", 4.5, "4.5 d"),
            ("0 kg", 4.0, "4 kg"),
            ("\"<\"0.0", 0.1, "<0.1"),
            ("<0.0", 0.1, "<0.1"),
            ("\"ca. \"0", 4.0, "ca. 4"),
            ("~0", 4.0, "~4"),
            ("[$€-407] #,##0.00", 4.0, "€ 4"),
            ("#,##0.00\\ [$€-407]", 4.0, "4 €"),
            ("_-* #,##0.00\\ \"d\"_-", 4.0, "4 d"),
            ("0.00E+00\" Pa\"", 0.000_12, "0.00012 Pa"),
            ("# ?/?\" a\"", 2.5, "2.5 a"),
            ("@\" d\"", 4.0, "4 d"),
            ("0\" %\"", 4.0, "4 %"),
            ("0%", 0.07, "7 %"),
            ("0.00%;[Red]-0.00%", -0.05, "-5 %"),
            ("\"<\"0.0%", 0.001, "<0.1 %"),
            ("\"log Kow \"0.0", -1.5, "log Kow -1.5"),
        ] {
            assert_eq!(shown(code, number), text, "{code}");
        }
    }

    #[test]
    fn a_format_of_digits_alone_shows_the_number_as_it_is() {
        for code in [
            "General",
            "0",
            "0.00",
            "#,##0.00",
            "[Red]0.0",
            "[$-407]0.0",
            "0_)",
            "+0.0;-0.0",
            "0.0;[Red]-0.0",
            "#,##0_);(#,##0)",
            "0.0E+00",
            "# ?/?",
            "# ##0.0",
            "@",
            "0;yyyy",
            "0.0;0.0",
            "_-* #,##0_-;-* #,##0_-",
            "[>1000]#,##0;0.00",
        ] {
            for number in [4.0, -4.0, 0.001, 123_456.0] {
                assert_eq!(shown(code, number), "as it is", "{code} {number}");
            }
        }
    }

    #[test]
    fn each_section_is_for_its_own_numbers() {
        for (code, number, text) in [
            ("0\" d\";-0\" wk\";\"n.d.\"", 4.0, "4 d"),
            ("0\" d\";-0\" wk\";\"n.d.\"", -4.0, "-4 wk"),
            ("0\" d\";-0\" wk\";\"n.d.\"", 0.0, "n.d."),
            ("0.0;\"<\"0.0", -0.5, "<0.5"),
            ("0\" d\";[Red]0\" d\"", -4.0, "-4 d"),
            ("0\" d\";(0\" d\")", -4.0, "-4 d"),
            ("[<1]\"< 1 d\";0\" d\"", 0.5, "< 1 d"),
            ("[<1]\"< 1 d\";0\" d\"", 1.0, "1 d"),
            ("[>=365]\"> 365 d\";[<0]\"?\";0\" d\"", 365.0, "> 365 d"),
            ("[>=365]\"> 365 d\";[<0]\"?\";0\" d\"", -1.0, "?"),
            ("[>=365]\"> 365 d\";[<0]\"?\";0\" d\"", 364.0, "364 d"),
            ("[=1]\"1 Tag\";0\" Tage\"", 1.0, "1 Tag"),
            ("_-* #,##0_-;-* #,##0_-;_-* \"-\"??_-;_-@_-", 0.0, "-"),
            ("_-* #,##0_-;-* #,##0_-;_-* \"-\"??_-;_-@_-", 4.0, "as it is"),
            ("0;-0;;@", 0.0, "nothing"),
            ("0;-0;;@", 4.0, "as it is"),
            (";;;", 4.0, "as it is"),
            ("0\" d\";@\" d\"", -4.0, "-4 d"),
        ] {
            assert_eq!(shown(code, number), text, "{code} {number}");
        }
    }

    #[test]
    fn a_number_shown_in_thousands_is_never_the_bare_number() {
        for (code, number, text) in [
            ("0,\"k\"", 50_000.0, "50k"),
            ("0.0,,\" t\"", 1_500_000.0, "1.5 t"),
            ("0,", 50_000.0, "scaled 50"),
            ("#,##0,", 1234.0, "scaled 1.2340"),
        ] {
            assert_eq!(shown(code, number), text, "{code}");
        }
    }

    #[test]
    fn signs_between_the_digits_stand_where_the_format_puts_them() {
        for (code, number, text) in [
            ("0000000\\-00\\-0", 50_293.0, "0000050-29-3"),
            ("#######-00-0", 50_293.0, "50-29-3"),
            ("000-000-0", 2_000_243.0, "200-024-3"),
            ("\"ID-\"0000", 4.0, "ID-0004"),
            ("0\"-\"0", 12.0, "1-2"),
            ("0\".\"0", 45.0, "4.5"),
            ("0\" h \"00\" min\"", 430.0, "4 h 30 min"),
            ("0\" h \"00\" min\"", 4.5, "4.5 h min"),
        ] {
            assert_eq!(shown(code, number), text, "{code}");
        }
    }

    #[test]
    fn words_beside_a_text_are_shown_by_the_section_for_texts() {
        for (code, text) in [
            ("@\" d\"", Some("4 d")),
            ("0;0;0;@\" d\"", Some("4 d")),
            ("0\" d\"", None),
            ("0\" d\";-0;0;@", None),
        ] {
            let found = NumberFormat::of_code(code).and_then(|format| format.show_text("4"));
            assert_eq!(found.as_deref(), text, "{code}");
        }
    }

    #[test]
    fn a_moved_point_keeps_every_digit() {
        for (number, places, text) in [
            (0.12, 2, "12"),
            (0.07, 2, "7"),
            (0.001, 2, "0.1"),
            (0.123_45, 2, "12.3450"),
            (1e-7, 2, "0.00001"),
            (1234.0, -3, "1.2340"),
            (0.0, 2, "0"),
        ] {
            assert_eq!(shifted(number, places), text);
        }
    }
}
