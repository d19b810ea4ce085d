//! A cell's typed value, from the attributes and the text it is stored with.

use quick_xml::XmlVersion;
use quick_xml::events::BytesStart;

use crate::workbook::content::{CellContent, StyleId};
use crate::workbook::serial::serial_of;

use super::looks::{self, Looks};
use super::words::format_of;

/// What a cell's tag says.
#[derive(Debug, Default)]
pub(super) struct Stored {
    /// `office:value-type`.
    kind: Option<String>,
    /// `office:value`, `office:date-value` and so on, whichever is there.
    value: Option<String>,
    string: Option<String>,
    /// The cell is said to hold an error.
    error: bool,
    pub(super) formula: bool,
    /// What the formula says that only says true or false, which LibreOffice stores for either; its value is a number.
    truth: Option<bool>,
    /// How many columns in a row hold the same.
    pub(super) repeated: Option<String>,
    pub(super) spans: bool,
    /// How many columns a merged range that begins here is wide.
    pub(super) columns: Option<u16>,
}

impl Stored {
    /// Reads the attributes of a cell's tag; the name of one that cannot be read.
    pub(super) fn of(element: &BytesStart<'_>) -> Result<Self, String> {
        let mut stored = Self::default();
        for attribute in element.attributes() {
            let attribute = attribute.map_err(|error| error.to_string())?;
            let name = attribute.key.as_ref();
            let value = || {
                let value = attribute.normalized_value(XmlVersion::Implicit1_0);
                value.map(std::borrow::Cow::into_owned).map_err(|error| error.to_string())
            };
            match name {
                "office:value-type" => stored.kind = Some(value()?),
                "office:value" | "office:date-value" | "office:time-value" | "office:boolean-value" => {
                    stored.value = Some(value()?);
                }
                "office:string-value" => stored.string = Some(value()?),
                "calcext:value-type" => stored.error = value()? == "error",
                "table:formula" => {
                    stored.formula = true;
                    stored.truth = truth(&value()?);
                }
                "table:number-columns-repeated" => stored.repeated = Some(value()?),
                "table:number-columns-spanned" => {
                    let columns = value()?;
                    stored.spans |= columns != "1";
                    stored.columns = columns.parse().ok();
                }
                "table:number-rows-spanned" => stored.spans |= value()? != "1",
                _ => {}
            }
        }
        Ok(stored)
    }

    /// The content and how it is to be shown, or in words what cannot be.
    pub(super) fn content(
        self,
        shown: Option<String>,
        looks: &mut Looks,
    ) -> Result<(CellContent, Option<StyleId>), String> {
        if self.error {
            return Ok((CellContent::Error(shown.unwrap_or_else(|| "#VALUE!".to_owned())), None));
        }
        // Some programs store an error as the number 0 and only show its name.
        let number_shown_as_error = self.value.is_some() && shown.as_deref().is_some_and(is_error_name);
        if number_shown_as_error || (self.formula && shown.as_deref().is_some_and(is_error_name)) {
            return Ok((CellContent::Error(shown.unwrap_or_default()), None));
        }
        if let Some(truth) = self.truth {
            return Ok((CellContent::Boolean(truth), None));
        }
        let Some(value) = self.value.filter(|_| self.kind.as_deref() != Some("string")) else {
            return Ok(self::text(self.string.or(shown), self.formula));
        };
        let shown = shown.unwrap_or_default();
        match self.kind.as_deref().unwrap_or_default() {
            "float" | "currency" => Ok(with_words(number(&value)?, shown, looks)),
            // A content of 12 % is stored as 0.12. The look says that it is shown as a percentage.
            "percentage" => Ok((number(&value)?, Some(looks::percentage(&shown)))),
            "date" => Ok(date(value)),
            "time" => Ok(match days_of_duration(&value) {
                Some(days) => (CellContent::DateTime(days), Some(looks::TIME)),
                None => (CellContent::Text(value), None),
            }),
            "boolean" => match value.as_str() {
                "true" => Ok((CellContent::Boolean(true), None)),
                "false" => Ok((CellContent::Boolean(false), None)),
                other => Err(format!("`{other}`, said to be true or false")),
            },
            other => Err(format!("a value of the unknown type `{other}`")),
        }
    }
}

fn truth(formula: &str) -> Option<bool> {
    match formula {
        "of:=TRUE()" => Some(true),
        "of:=FALSE()" => Some(false),
        _ => None,
    }
}

/// An empty text is nothing, unless a formula gave it.
fn text(text: Option<String>, formula: bool) -> (CellContent, Option<StyleId>) {
    match text {
        Some(text) if !text.is_empty() || formula => {
            let look = text.contains('\n').then_some(looks::SEVERAL_LINES);
            (CellContent::Text(text), look)
        }
        Some(_) | None => (CellContent::Empty, None),
    }
}

/// The decimal separator is always the point, whatever the cell shows.
fn number(value: &str) -> Result<CellContent, String> {
    let number: f64 = value.trim().parse().map_err(|_| format!("`{value}`, said to be a number"))?;
    // A number no spreadsheet can show is kept as the text it was.
    Ok(if number.is_finite() { CellContent::Number(number) } else { CellContent::Text(value.to_owned()) })
}

/// A number, and the look that shows the words around it.
fn with_words(content: CellContent, shown: String, looks: &mut Looks) -> (CellContent, Option<StyleId>) {
    let CellContent::Number(number) = content else {
        return (content, None);
    };
    match format_of(&shown, number).map(|code| looks.of_code(code)) {
        None => (content, None),
        Some(Some(look)) => (content, Some(look)),
        Some(None) => (CellContent::Text(shown), None),
    }
}

/// A date before March 1900 has no serial number that programs agree on, and stays text.
fn date(value: String) -> (CellContent, Option<StyleId>) {
    match serial_of(&value) {
        Some(serial) if value.contains('T') => (CellContent::DateTime(serial), Some(looks::DATE_AND_TIME)),
        Some(serial) => (CellContent::DateTime(serial), Some(looks::DATE)),
        None => (CellContent::Text(value), None),
    }
}

/// Days of a duration such as `PT08H30M00S` or `P1DT2H`; years and months have no fixed length.
fn days_of_duration(text: &str) -> Option<f64> {
    let (sign, rest) = text.strip_prefix('-').map_or((1.0, text), |rest| (-1.0, rest));
    let rest = rest.strip_prefix('P')?;
    let (date, time) = rest.split_once('T').unwrap_or((rest, ""));
    let mut days = 0.0;
    let mut found = false;
    for (part, units) in [(date, &[('D', 1.0)][..]), (time, &[('H', 24.0), ('M', 1440.0), ('S', 86_400.0)])] {
        let mut rest = part;
        for (unit, a_day) in units {
            if let Some((number, after)) = rest.split_once(*unit) {
                days += number.parse::<f64>().ok().filter(|number| number.is_finite())? / a_day;
                rest = after;
                found = true;
            }
        }
        if !rest.is_empty() {
            return None;
        }
    }
    found.then_some(sign * days)
}

/// The names of errors, in English and as programs show them in other languages; `###` only says that a column is
/// narrow.
fn is_error_name(text: &str) -> bool {
    let text = text.trim();
    let number = ["Err:", "Fehler:", "Erreur:", "Error:"].iter().find_map(|word| text.strip_prefix(word));
    if let Some(number) = number {
        return !number.is_empty() && number.bytes().all(|byte| byte.is_ascii_digit());
    }
    let Some(name) = text.strip_prefix('#') else {
        return false;
    };
    let is_name =
        |character: char| character.is_uppercase() || matches!(character, '/' | '0' | '_' | '?' | '!' | '¡');
    (2..=16).contains(&name.chars().count())
        && name.chars().all(is_name)
        && name.chars().any(char::is_alphabetic)
}

#[cfg(test)]
mod tests {
    use super::{days_of_duration, is_error_name};

    #[test]
    fn a_duration_is_a_part_of_a_day_or_several() {
        for (text, days) in [
            ("PT12H00M00S", Some(0.5)),
            ("PT36H", Some(1.5)),
            ("P1DT12H", Some(1.5)),
            ("-PT6H", Some(-0.25)),
            ("PT0H0M43.2S", Some(0.0005)),
            ("P1Y", None),
            ("P", None),
            ("PT1S2H", None),
            ("08:30", None),
        ] {
            let found = days_of_duration(text);
            let close = match (found, days) {
                (Some(found), Some(days)) => f64::abs(found - days) < 1e-12,
                (found, days) => found == days,
            };
            assert!(close, "{text}: {found:?}");
        }
    }

    #[test]
    fn names_of_errors_are_known_and_numbers_marked_with_a_sign_are_not() {
        for name in
            ["#N/A", "#DIV/0!", "#VALUE!", "#WERT!", "#NV", "#BEZUG!", "#NOM?", "Err:502", "#ZAHL!", "#¡REF!"]
        {
            assert!(is_error_name(name), "{name}");
        }
        for other in ["####", "#12", "# 4", "#", "12", "Err:", "Err: none", "#A1b", ""] {
            assert!(!is_error_name(other), "{other}");
        }
    }
}
