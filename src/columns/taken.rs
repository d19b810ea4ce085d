//! A column that is taken: its unit, basis and conditions, and the reason in words.

use std::fmt::Write as _;

use super::beside::stands_beside;
use super::header_cell::{HeaderCell, Meaning, UnitFrom};
use super::overrides::option_for;
use super::words::ColumnWords;
use super::{Beside, Column, Readiness, Separator, choice::dimension_of, one_line};
use crate::quantity::{DecimalStyle, Dimension, Unit, format_number, tidy};
use crate::substance::{Basis, Conditions, DegradationKind, Field, Said, names_ready_test};
use crate::workbook::column_letters;

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
    let basis = said.basis.or_else(|| names_estimate(&cell).then_some(Basis::Calculated));
    let about = (is_companion(field) || stands_beside(field))
        .then(|| cell.header.as_ref()?.property_beside(words))
        .flatten();
    let mut reason = reason(&cell, unit, dimension);
    if let Some(basis) = basis {
        let _ = write!(reason, "; values are taken as {}", basis.word());
    }
    let conditions = conditions_in_words(&said.conditions);
    if !conditions.is_empty() {
        let _ = write!(reason, "; for all values: {}", conditions.join(", "));
    }
    let readiness = readiness(&cell, field, words);
    let remark =
        remark.or_else(|| (readiness == Readiness::NotSaid).then(|| not_said_ready_remark(sheet, &cell)));
    if readiness == Readiness::NotSaid {
        reason.push_str("; ready only where a cell says so");
    }
    let column = Column {
        index: cell.column,
        header: cell.text,
        field,
        unit: unit.map(|(unit, _)| unit),
        basis,
        conditions: said.conditions,
        about,
        decimal: DecimalStyle::Point,
        readiness,
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

/// Whether a header of ready biodegradability has a word for ready or names the tests of it.
fn readiness(cell: &HeaderCell, field: Field, words: &ColumnWords) -> Readiness {
    let is_told = matches!(cell.meaning, Meaning::Told(_));
    if field != Field::ReadyBiodegradability || is_told {
        return Readiness::Said;
    }
    let says_so = cell.header.as_ref().is_some_and(|header| header.speaks_of("ready", words));
    if says_so || names_ready_test(&cell.text) { Readiness::Said } else { Readiness::NotSaid }
}

fn not_said_ready_remark(sheet: &str, cell: &HeaderCell) -> String {
    format!(
        "{sheet}: column {} (`{}`) does not say whether its biodegradability is the ready one, so a cell counts as ready \
         only where it says so or names OECD 301 or 310; if all its cells are of ready biodegradability: {}",
        column_letters(cell.column),
        one_line(&cell.text),
        option_for(sheet, cell.column, &cell.text, Field::ReadyBiodegradability.id())
    )
}

/// `ClogP`, `Pred. BCF`: names of estimates.
fn names_estimate(cell: &HeaderCell) -> bool {
    matches!(cell.field(), Some(Field::Property(_)))
        && cell.header.as_ref().is_some_and(|header| {
            header
                .words
                .iter()
                .chain(&header.bracket_words)
                .any(|word| word == "pred" || word.starts_with("clog") || word.starts_with("xlog"))
        })
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
