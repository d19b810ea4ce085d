//! Decimal point or comma, from what the cells of a column show.

use std::fmt::Write as _;
use std::sync::LazyLock;

use regex::Regex;

use super::choice::dimension_of;
use super::{Column, Recognised, Separator};
use crate::quantity::{DecimalStyle, tidy};
use crate::workbook::{CellContent, Row, column_letters};

/// Digits with separators; numbers of three dotted parts and the like show nothing.
static NUMBER: LazyLock<Option<Regex>> = LazyLock::new(|| Regex::new(r"\d*(?:[.,]\d+)+").ok());

/// How many numbers show one style.
#[derive(Debug, Clone, PartialEq, Eq, Default)]
struct Shown {
    points: usize,
    commas: usize,
    /// The first number that could be read both ways.
    ambiguous: Option<String>,
}

impl Shown {
    fn style(&self) -> Option<DecimalStyle> {
        match self.commas.cmp(&self.points) {
            std::cmp::Ordering::Greater => Some(DecimalStyle::Comma),
            std::cmp::Ordering::Less => Some(DecimalStyle::Point),
            std::cmp::Ordering::Equal => None,
        }
    }

    fn add(&mut self, style: DecimalStyle) {
        match style {
            DecimalStyle::Point => self.points += 1,
            DecimalStyle::Comma => self.commas += 1,
        }
    }
}

/// Sets each column's style: what its own text cells show, else what the sheet's show, else the point. Numbers that
/// could be read both ways are remarked on; where nothing shows the style, cells that hold one are not read.
pub(super) fn set_styles(sheet: &str, recognised: &mut Recognised, data: &[&Row]) {
    let own: Vec<Shown> = recognised.columns.iter().map(|column| shown_by(column, data)).collect();
    let whole = Shown {
        points: own.iter().map(|shown| shown.points).sum(),
        commas: own.iter().map(|shown| shown.commas).sum(),
        ambiguous: None,
    };
    for (column, shown) in recognised.columns.iter_mut().zip(own) {
        let is_shown = shown.style().is_some();
        let (style, why) = match (shown.style(), whole.style()) {
            (Some(style), _) => (style, "as the column's other cells show"),
            (None, Some(style)) => (style, "as the sheet's other cells show"),
            (None, None) => (DecimalStyle::Point, "because no cell shows which"),
        };
        column.decimal = style;
        column.separator = match shown.style().or_else(|| whole.style()) {
            Some(_) => Separator::Shown,
            None => Separator::NotShown,
        };
        let word = match style {
            DecimalStyle::Point => "point",
            DecimalStyle::Comma => "comma",
        };
        if dimension_of(column.field).is_some() && (style == DecimalStyle::Comma || is_shown) {
            let _ = write!(column.reason, "; decimal {word}, {why}");
        }
        if let Some(example) = shown.ambiguous {
            let what_is_done = match column.separator {
                Separator::Shown => format!("they are read with a decimal {word}, {why}"),
                Separator::NotShown => format!("they are not read where both make sense, {why}"),
            };
            recognised.remarks.push(format!(
                "{sheet}: column {} holds numbers such as `{example}`, which could group thousands; {what_is_done}",
                column_letters(column.index)
            ));
        }
    }
}

fn shown_by(column: &Column, data: &[&Row]) -> Shown {
    let mut shown = Shown::default();
    if dimension_of(column.field).is_some() {
        for row in data {
            if let Some(CellContent::Text(text)) = row.cell(column.index).map(|cell| &cell.content) {
                count(text, &mut shown);
            }
        }
    }
    shown
}

fn count(text: &str, shown: &mut Shown) {
    let Some(number) = NUMBER.as_ref() else {
        return;
    };
    for found in number.find_iter(&tidy(text)) {
        match style_of(found.as_str()) {
            Some(style) => shown.add(style),
            None => {
                shown.ambiguous.get_or_insert_with(|| found.as_str().to_owned());
            }
        }
    }
}

/// The style a number can only have; a separator before exactly three digits shows none.
fn style_of(number: &str) -> Option<DecimalStyle> {
    let points = number.matches('.').count();
    let commas = number.matches(',').count();
    let last = number.rfind(['.', ','])?;
    let (whole, decimals) = (number.get(..last)?, number.get(last + 1..)?);
    let could_group = decimals.len() == 3 && !whole.is_empty() && !whole.starts_with('0') && whole.len() <= 3;
    let style_of_last =
        if number.get(last..=last)? == "," { DecimalStyle::Comma } else { DecimalStyle::Point };
    match (points, commas) {
        (1, 0) | (0, 1) if could_group => None,
        // Both kinds: the last is the decimal separator. Several of one kind group thousands.
        (1, 0 | 1..) | (0 | 1.., 1) => Some(style_of_last),
        (2.., 0) => Some(DecimalStyle::Comma).filter(|_| decimals.len() == 3),
        (0, 2..) => Some(DecimalStyle::Point).filter(|_| decimals.len() == 3),
        (_, _) => None,
    }
}

#[cfg(test)]
mod tests {
    use super::style_of;
    use crate::quantity::DecimalStyle;

    #[test]
    fn only_numbers_that_can_be_read_one_way_show_a_style() {
        for (number, style) in [
            ("4,5", Some(DecimalStyle::Comma)),
            ("4.5", Some(DecimalStyle::Point)),
            ("1.234,5", Some(DecimalStyle::Comma)),
            ("1,234.5", Some(DecimalStyle::Point)),
            ("0,125", Some(DecimalStyle::Comma)),
            ("1.234.567", Some(DecimalStyle::Comma)),
            ("1.234", None),
            ("1,234", None),
            ("1234,567", Some(DecimalStyle::Comma)),
        ] {
            assert_eq!(style_of(number), style, "{number}");
        }
    }
}
