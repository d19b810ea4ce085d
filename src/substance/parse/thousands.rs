//! Numbers such as `2.500` and `1,500` where no cell of the sheet shows whether the separator is for decimals or for
//! thousands. Where both make sense, neither is taken: a BCF of 2500 that is read as 2.5 would clear a substance.

use std::sync::LazyLock;

use regex::{Captures, Regex};

use super::pattern::fixed;
use crate::columns::{Column, Separator};
use crate::fault::CellFaultKind;
use crate::quantity::{DecimalStyle, Unit, format_number, tidy};
use crate::substance::{Field, Property};
use crate::workbook::CellContent;

/// What the separators of a cell are.
pub(super) enum Thousands {
    /// What they are in the column, or there is none in doubt.
    AsTheColumn,
    /// For decimals, because thousands would make no sense.
    DecimalsOnly(DecimalStyle),
    /// Either.
    Doubtful(CellFaultKind),
}

/// What the separators of a cell of a column are.
pub(super) fn of(column: &Column, content: &CellContent) -> Thousands {
    // Digits with separators and a power of ten behind, which no grouped number has.
    static NUMBER: LazyLock<Regex> = LazyLock::new(|| fixed(r"(?i)\d+(?:[.,]\d+)+(e[-+]?\d|\s?[x×*]\s?10)?"));
    let (CellContent::Text(text), Separator::NotShown) = (content, column.separator) else {
        return Thousands::AsTheColumn;
    };
    let Some((least, most)) = sensible(column) else {
        return Thousands::AsTheColumn;
    };
    let text = tidy(text);
    let mut answer = Thousands::AsTheColumn;
    for number in NUMBER.captures_iter(&text) {
        // Another number of the cell shows what its separators are.
        let Some(read) = read_both(&number) else {
            return Thousands::AsTheColumn;
        };
        let in_powers = number.get(1).is_some();
        if !in_powers && (least..=most).contains(&read.with_thousands) {
            return Thousands::Doubtful(CellFaultKind::ThousandsOrDecimals {
                with_decimals: format_number(read.with_decimals),
                with_thousands: format_number(read.with_thousands),
            });
        }
        if in_powers || (least..=most).contains(&read.with_decimals) {
            answer = Thousands::DecimalsOnly(read.separator);
        }
    }
    answer
}

/// A number read both ways.
struct Both {
    with_decimals: f64,
    with_thousands: f64,
    /// What the separator is if it is for decimals.
    separator: DecimalStyle,
}

/// A number of one separator before exactly three digits; others can be read one way only.
fn read_both(number: &Captures<'_>) -> Option<Both> {
    let digits = number.get(0)?.as_str();
    let digits = number
        .get(1)
        .map_or(digits, |power| digits.get(..digits.len() - power.as_str().len()).unwrap_or_default());
    let (whole, decimals) = digits.split_once(['.', ','])?;
    let could_group = decimals.len() == 3
        && decimals.bytes().all(|digit| digit.is_ascii_digit())
        && (1..=3).contains(&whole.len())
        && !whole.starts_with('0');
    could_group.then_some(())?;
    Some(Both {
        with_decimals: format!("{whole}.{decimals}").parse().ok()?,
        with_thousands: format!("{whole}{decimals}").parse().ok()?,
        separator: if digits.contains(',') { DecimalStyle::Comma } else { DecimalStyle::Point },
    })
}

/// Between which ends a number of a column makes sense, in whatever unit; `None` for columns that hold no number.
fn sensible(column: &Column) -> Option<(f64, f64)> {
    const LOGARITHMS: (f64, f64) = (-15.0, 20.0);
    const LIGHTEST_AND_HEAVIEST: (f64, f64) = (2.0, 10_000.0);
    const PERCENT: (f64, f64) = (0.0, 100.0);
    match column.field {
        Field::Property(_) if column.unit == Some(Unit::LogLitrePerKilogram) => Some(LOGARITHMS),
        Field::Property(Property::MolarMass) => Some(LIGHTEST_AND_HEAVIEST),
        Field::Property(property) => Some(super::expected::Expected::property(property).sensible),
        Field::Tonnage => Some(super::expected::Expected::TONNAGE.sensible),
        Field::Content | Field::BcfLipid | Field::ReadyBiodegradability | Field::InherentBiodegradability => {
            Some(PERCENT)
        }
        _ => None,
    }
}
