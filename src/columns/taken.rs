//! A column that is taken: its unit, basis and conditions, and the reason in words.

use std::fmt::Write as _;

use super::beside::stands_beside;
use super::header_cell::{HeaderCell, Meaning, UnitFrom};
use super::words::ColumnWords;
use super::{Beside, Column, Separator, choice::dimension_of, one_line};
use crate::quantity::{DecimalStyle, Dimension, Unit, format_number, tidy};
use crate::substance::{Conditions, DegradationKind, Field, Said};

/// The column of a header that names a field, and what is to be said of its unit.
pub(super) fn column_of(
    sheet: &str,
    cell: HeaderCell,
    field: Field,
    words: &ColumnWords,
) -> (Column, Option<String>) {
    let dimension = dimension_of(field);
    let unit = dimension.and_then(|dimension| cell.unit(dimension));
    let strange = dimension
        .filter(|_| unit.is_none())
        .and_then(|dimension| Some((dimension, cell.strange_unit(dimension)?)));
    let remark = strange.map(|(dimension, strange)| {
        format!(
            "{sheet}: the header `{}` names {}, which does not measure {}; numbers without a unit are read in {}",
            one_line(&cell.text),
            strange.symbol(),
            field.id(),
            shown_unit(dimension),
        )
    });
    let has_conditions =
        matches!(field, Field::Property(_) | Field::ReadyBiodegradability | Field::InherentBiodegradability);
    let said = if has_conditions { Said::in_header(&tidy(&cell.text)) } else { Said::default() };
    let about = (is_companion(field) || stands_beside(field))
        .then(|| cell.header.as_ref()?.property_beside(words))
        .flatten();
    let mut reason = reason(&cell, unit, dimension);
    if let Some(basis) = said.basis {
        let _ = write!(reason, "; values are taken as {}", basis.word());
    }
    let conditions = conditions_in_words(&said.conditions);
    if !conditions.is_empty() {
        let _ = write!(reason, "; for all values: {}", conditions.join(", "));
    }
    let column = Column {
        index: cell.column,
        header: cell.text,
        field,
        unit: unit.map(|(unit, _)| unit),
        basis: said.basis,
        conditions: said.conditions,
        about,
        decimal: DecimalStyle::Point,
        separator: Separator::Shown,
        beside: Beside::default(),
        reason,
    };
    (column, remark)
}

/// Fields that speak of another column's value and may name it.
pub(super) fn is_companion(field: Field) -> bool {
    matches!(field, Field::Reliability | Field::Guideline | Field::Reference | Field::HalfLifeTemperature)
}

fn shown_unit(dimension: Dimension) -> &'static str {
    match dimension.canonical().symbol() {
        "" => "no unit",
        symbol => symbol,
    }
}

fn reason(cell: &HeaderCell, unit: Option<(Unit, UnitFrom)>, dimension: Option<Dimension>) -> String {
    let mut reason = match &cell.meaning {
        Meaning::Named(named) => format!("named by `{}`", named.by.join("` and `")),
        Meaning::Told(_) => "told by --column".to_owned(),
        Meaning::LeftAside | Meaning::NotInGroup(_) | Meaning::Unknown => String::new(),
    };
    if let [first, .., last] = cell.rows.as_slice() {
        let word = if first + 1 == *last { "and" } else { "to" };
        let _ = write!(reason, "; rows {} {word} {} read together", first + 1, last + 1);
    }
    match (unit, dimension) {
        (Some((unit, from)), Some(dimension)) if dimension != Dimension::Dimensionless => {
            let place = match from {
                UnitFrom::Header => "the header",
                UnitFrom::GroupAbove => "the row above it",
            };
            let _ = write!(reason, "; {} from {place}", unit.symbol());
        }
        (None, Some(dimension)) if dimension != Dimension::Dimensionless => {
            let _ = write!(reason, "; {} where a cell names no unit", shown_unit(dimension));
        }
        (_, _) => {}
    }
    reason
}

fn conditions_in_words(conditions: &Conditions) -> Vec<String> {
    let number = |value: Option<f64>, before: &str, after: &str| {
        value.map(|value| format!("{before}{}{after}", format_number(value)))
    };
    let degradation = match conditions.degradation {
        DegradationKind::Ultimate => Some("ultimate degradation".to_owned()),
        DegradationKind::Primary => Some("primary degradation".to_owned()),
        DegradationKind::NotStated => None,
    };
    [
        number(conditions.temperature, "", " °C"),
        number(conditions.ph, "pH ", ""),
        number(conditions.lipid, "", " % lipid"),
        degradation,
        conditions.organism.clone(),
        conditions.method.as_ref().map(|method| format!("method `{method}`")),
        conditions.reliability.map(|score| format!("reliability {score}")),
    ]
    .into_iter()
    .flatten()
    .collect()
}
