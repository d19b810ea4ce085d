//! Several columns of one field: which may stand side by side, and what is said of the others.

use std::collections::BTreeSet;

use super::header_cell::HeaderCell;
use super::one_line;
use super::overrides::{option_for, place_of};
use crate::substance::Field;
use crate::workbook::column_letters;

/// The fields that several columns hold.
pub(super) fn doubled_fields(cells: &[HeaderCell]) -> BTreeSet<Field> {
    let mut seen = BTreeSet::new();
    cells.iter().filter_map(HeaderCell::field).filter(|field| !seen.insert(*field)).collect()
}

/// Both of two such columns are read, because a row in which they differ does not say which substance it means.
pub(super) fn is_number_of_registry(field: Field) -> bool {
    matches!(field, Field::CasNumber | Field::EcNumber)
}

/// Several values of a property are several readings; several companions speak of different ones.
pub(super) fn may_be_doubled(field: Field) -> bool {
    is_number_of_registry(field)
        || matches!(
            field,
            Field::Property(_)
                | Field::Reliability
                | Field::Guideline
                | Field::Reference
                | Field::LogKowMethod
                | Field::HalfLifeTemperature
                | Field::HazardStatements
                | Field::ReadyBiodegradability
                | Field::InherentBiodegradability
                | Field::UnitOfValue
                | Field::QualifierOfValue
        )
}

pub(super) fn both_read_remark(sheet: &str, field: Field, first: (u16, &str), second: &HeaderCell) -> String {
    let way_out = if first.1 == second.text {
        let (first, second) = (place_of(sheet, first.0), place_of(sheet, second.column));
        format!("to take one alone: --column '{first}=ignore' or --column '{second}=ignore'")
    } else {
        let first = option_for(sheet, first.0, first.1, "ignore");
        let second = option_for(sheet, second.column, &second.text, "ignore");
        format!("to take one alone: {first} or {second}")
    };
    format!(
        "{sheet}: columns {} (`{}`) and {} (`{}`) both name {}; both are read, and a row in which they differ is not \
         identified; {way_out}",
        column_letters(first.0),
        one_line(first.1),
        column_letters(second.column),
        one_line(&second.text),
        field.id(),
    )
}

pub(super) fn doubled_remark(sheet: &str, field: Field, first: (u16, &str), second: &HeaderCell) -> String {
    let id = field.id();
    let way_out = if first.1 == second.text {
        format!("to take the other: --column '{}=ignore'", place_of(sheet, first.0))
    } else {
        let first = option_for(sheet, first.0, first.1, "ignore");
        let second = option_for(sheet, second.column, &second.text, id);
        format!("to take the other: {first} {second}")
    };
    format!(
        "{sheet}: columns {} (`{}`) and {} (`{}`) both name {id}; {} is taken; {way_out}",
        column_letters(first.0),
        one_line(first.1),
        column_letters(second.column),
        one_line(&second.text),
        column_letters(first.0),
    )
}
