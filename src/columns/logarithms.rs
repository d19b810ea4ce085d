//! Columns whose numbers look like logarithms although the header names none, or the other way round.
//!
//! A BCF of 3.2 that is really its logarithm would clear a substance, and so would a Koc of 500 read as a logarithm. Such
//! a column is left aside until the user says what it holds; a remark beside a wrong verdict would not be enough.

use std::collections::BTreeSet;

use super::overrides::option_for;
use super::{Column, Recognised, one_line};
use crate::quantity::{DecimalStyle, Unit, format_number, tidy};
use crate::substance::{Field, Property};
use crate::workbook::{CellContent, Row, column_letters};

/// Numbers that are needed to say how a column looks.
const FEWEST_NUMBERS: usize = 5;
/// Where logarithms of these properties lie.
const LOGARITHMS: std::ops::RangeInclusive<f64> = -1.0..=8.0;
/// Above this no logarithm of these properties lies.
const HIGHEST_LOGARITHM: f64 = 10.0;

/// Above this a cell is refused as a logarithm on its own.
const CELLS_REFUSE_ABOVE: f64 = 15.0;

/// What is wrong with the numbers of a column.
enum Look {
    /// They look like logarithms, and the header names neither them nor a unit.
    Logarithms,
    /// They look like logarithms, but the header names a unit.
    SmallNumbers,
    /// One is too high for a logarithm.
    TooHigh(f64),
}

/// Leaves columns aside that the user has not named and whose numbers do not look like what the header says.
pub(super) fn leave_doubtful_aside(
    sheet: &str,
    recognised: &mut Recognised,
    data: &[&Row],
    told: &BTreeSet<u16>,
) {
    let columns = std::mem::take(&mut recognised.columns);
    for column in columns {
        let look = if told.contains(&column.index) { None } else { look_of(&column, data) };
        let Some(look) = look else {
            recognised.columns.push(column);
            continue;
        };
        recognised.remarks.push(remark(sheet, &column, &look));
        match look {
            Look::SmallNumbers => recognised.columns.push(column),
            Look::Logarithms | Look::TooHigh(_) => {
                let why = match look {
                    Look::Logarithms => "left aside; its numbers look like logarithms",
                    Look::SmallNumbers | Look::TooHigh(_) => {
                        "left aside; its numbers look like no logarithms"
                    }
                };
                recognised.not_taken.insert(column.index, why.to_owned());
                recognised.unknown.push((column.index, column.header));
            }
        }
    }
    recognised.unknown.sort();
}

fn look_of(column: &Column, data: &[&Row]) -> Option<Look> {
    let Field::Property(Property::Koc | Property::Bcf | Property::Baf) = column.field else {
        return None;
    };
    let numbers: Vec<f64> = data
        .iter()
        .filter_map(|row| row.cell(column.index))
        .filter_map(|cell| bare_number(&cell.content, column.decimal))
        .collect();
    if column.unit == Some(Unit::LogLitrePerKilogram) {
        // A number alone misleads about no other, and its cell is faulted if it is higher still.
        let others = numbers.len() > 1;
        let too_high = numbers.into_iter().find(|number| *number > HIGHEST_LOGARITHM);
        return too_high.filter(|number| others || *number <= CELLS_REFUSE_ABOVE).map(Look::TooHigh);
    }
    let with_decimals = numbers.iter().filter(|number| number.fract().abs() > 0.0).count();
    let like_logarithms = numbers.len() >= FEWEST_NUMBERS
        && numbers.iter().all(|number| LOGARITHMS.contains(number))
        && with_decimals * 2 >= numbers.len();
    let look = if column.unit.is_none() { Look::Logarithms } else { Look::SmallNumbers };
    like_logarithms.then_some(look)
}

/// A number without a unit, with or without a sign such as `<`.
fn bare_number(content: &CellContent, decimal: DecimalStyle) -> Option<f64> {
    match content {
        CellContent::Number(number) => Some(*number),
        CellContent::Text(text) => {
            let text = tidy(text);
            let signs = |character: char| matches!(character, '<' | '>' | '=' | '≤' | '≥' | '~' | ' ');
            let number = text.trim_start_matches(signs).trim();
            match decimal {
                DecimalStyle::Point => number.parse().ok(),
                DecimalStyle::Comma => number.replace(',', ".").parse().ok(),
            }
        }
        CellContent::Empty | CellContent::Boolean(_) | CellContent::DateTime(_) | CellContent::Error(_) => {
            None
        }
    }
}

fn remark(sheet: &str, column: &Column, look: &Look) -> String {
    let (id, header) = (column.field.id(), one_line(&column.header));
    let title = column.field.property().map_or(id, Property::title);
    let place = format!("{sheet}: column {} (`{header}`)", column_letters(column.index));
    let option = option_for(sheet, column.index, &column.header, id);
    match look {
        Look::Logarithms => format!(
            "{place} is left aside, because its numbers look like logarithms and its header does not say so; write \
             `log {title}` as its header if they are, or say that they are none: {option}"
        ),
        Look::SmallNumbers => format!(
            "{place} holds numbers that look like logarithms; they are read in {}, as the header says; write `log \
             {title}` as its header if they are logarithms",
            column.unit.map_or("", Unit::symbol)
        ),
        Look::TooHigh(number) => format!(
            "{place} is left aside, because it holds {}, which is too high for a logarithm; write `{title} (L/kg)` as its \
             header if its numbers are no logarithms, or correct the number, or say that they are: {option}",
            format_number(*number)
        ),
    }
}

#[cfg(test)]
mod tests {
    use super::bare_number;
    use crate::quantity::DecimalStyle;
    use crate::workbook::CellContent;

    #[test]
    fn only_numbers_without_a_unit_count() {
        let number = |text: &str, style| bare_number(&CellContent::Text(text.to_owned()), style);
        assert_eq!(number("3.2", DecimalStyle::Point), Some(3.2));
        assert_eq!(number("< 3,2", DecimalStyle::Comma), Some(3.2));
        assert_eq!(number("3.2 L/kg", DecimalStyle::Point), None);
        assert_eq!(number("1,234", DecimalStyle::Point), None);
        assert_eq!(number("n.d.", DecimalStyle::Point), None);
    }
}
