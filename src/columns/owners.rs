//! To which column of values a column of units or signs belongs.

use std::fmt::Write as _;

use super::beside::{sign_of, stands_beside};
use super::choice::dimension_of;
use super::overrides::option_for;
use super::taken::is_companion;
use super::{Column, Recognised, one_line};
use crate::quantity::{is_missing, parse_unit_of, tidy};
use crate::substance::Field;
use crate::workbook::{CellContent, Row, column_letters};

/// Whose column it is.
enum Owner {
    Column(u16),
    /// One of these.
    Unclear(Vec<u16>),
    /// None that is read.
    Nobody,
}

/// Gives each column of units or signs to its values.
pub(super) fn settle(sheet: &str, recognised: &mut Recognised, data: &[&Row]) {
    let beside: Vec<Column> =
        recognised.columns.iter().filter(|column| stands_beside(column.field)).cloned().collect();
    for column in beside {
        match owner(&recognised.columns, &column, data) {
            Owner::Column(owner) => give(sheet, recognised, owner, &column),
            Owner::Unclear(owners) => {
                for owner in owners {
                    leave_aside(sheet, recognised, owner, &column);
                }
                drop_column(recognised, column.index, "left aside; not clear of which column");
            }
            Owner::Nobody => drop_column(recognised, column.index, "left aside; of no column that is read"),
        }
    }
}

fn word(field: Field) -> &'static str {
    if field == Field::UnitOfValue { "unit" } else { "qualifier" }
}

fn give(sheet: &str, recognised: &mut Recognised, owner: u16, column: &Column) {
    let Some(value) = recognised.columns.iter_mut().find(|value| value.index == owner) else {
        return;
    };
    let slot =
        if column.field == Field::UnitOfValue { &mut value.beside.unit } else { &mut value.beside.qualifier };
    if slot.is_some() {
        leave_aside(sheet, recognised, owner, column);
        drop_column(recognised, column.index, "left aside; a second one of the same column");
        return;
    }
    *slot = Some(column.index);
    let _ = write!(value.reason, "; {} in column {}", word(column.field), column_letters(column.index));
    if let Some(column) = recognised.columns.iter_mut().find(|other| other.index == column.index) {
        let _ = write!(column.reason, "; {} of column {}", word(column.field), column_letters(owner));
    }
}

fn leave_aside(sheet: &str, recognised: &mut Recognised, owner: u16, column: &Column) {
    let Some(value) = recognised.columns.iter().find(|value| value.index == owner) else {
        return;
    };
    let word = word(column.field);
    recognised.remarks.push(format!(
        "{sheet}: column {} (`{}`) is left aside, because it is not clear whether column {} (`{}`) holds its {word}; \
         name the property in the header of the {word}, such as `{} {word}`, or say that it is not needed: {}",
        column_letters(owner),
        one_line(&value.header),
        column_letters(column.index),
        one_line(&column.header),
        value.field.id(),
        option_for(sheet, column.index, &column.header, "ignore")
    ));
    let why = format!("left aside; its {word} may stand in column {}", column_letters(column.index));
    drop_column(recognised, owner, &why);
}

fn drop_column(recognised: &mut Recognised, index: u16, why: &str) {
    if let Some(place) = recognised.columns.iter().position(|column| column.index == index) {
        let column = recognised.columns.remove(place);
        recognised.not_taken.insert(index, why.to_owned());
        recognised.unknown.push((index, column.header));
        recognised.unknown.sort();
    }
}

fn owner(columns: &[Column], column: &Column, data: &[&Row]) -> Owner {
    let is_unit = column.field == Field::UnitOfValue;
    let (left, right) = (value_to_the_left(columns, column.index), value_at(columns, column.index + 1));
    let near = if is_unit { left } else { side_of_signs(columns, left, right) };
    if let Some(property) = column.about {
        let named: Vec<u16> = columns
            .iter()
            .filter(|value| value.field == Field::Property(property))
            .map(|value| value.index)
            .collect();
        return match (named.as_slice(), near) {
            ([], _) => near.map_or(Owner::Nobody, Owner::Column),
            ([only], _) => Owner::Column(*only),
            (_, Some(near)) if named.contains(&near) => Owner::Column(near),
            (_, _) => Owner::Unclear(named),
        };
    }
    // An operator may be a person, too.
    if !is_unit && !cells(column, data).any(|text| sign_of(&text).is_some()) {
        return Owner::Nobody;
    }
    if let Some(near) = near {
        return Owner::Column(near);
    }
    let may_own = |value: &&Column| match dimension_of(value.field) {
        None => false,
        Some(_) if !is_unit => true,
        Some(dimension) => cells(column, data)
            .any(|text| parse_unit_of(&text, dimension).is_some_and(|unit| unit.dimension() == dimension)),
    };
    let further = columns.iter().rev().filter(|value| value.index < column.index).find(may_own);
    let behind = columns.iter().filter(|value| Some(value.index) == right).find(may_own);
    // What stands before it is no value that is not recognised.
    let follows_known =
        column.index.checked_sub(1).is_none_or(|before| columns.iter().any(|other| other.index == before));
    match (further, behind) {
        (None, None) => Owner::Nobody,
        (None, Some(behind)) if follows_known => Owner::Column(behind.index),
        (further, behind) => {
            Owner::Unclear(further.into_iter().chain(behind).map(|value| value.index).collect())
        }
    }
}

/// Signs stand before their values, unless the last such column of the sheet has none behind it.
fn side_of_signs(columns: &[Column], left: Option<u16>, right: Option<u16>) -> Option<u16> {
    let mut unnamed =
        columns.iter().filter(|column| column.field == Field::QualifierOfValue && column.about.is_none());
    let all_before = unnamed.all(|column| value_at(columns, column.index + 1).is_some());
    if all_before { right.or(left) } else { left.or(right) }
}

fn cells(column: &Column, data: &[&Row]) -> impl Iterator<Item = String> {
    let texts = data.iter().filter_map(|row| match &row.cell(column.index)?.content {
        CellContent::Text(text) => Some(tidy(text)),
        _ => None,
    });
    texts.filter(|text| !is_missing(text))
}

/// The column of values at an index.
fn value_at(columns: &[Column], index: u16) -> Option<u16> {
    let column = columns.iter().find(|column| column.index == index)?;
    dimension_of(column.field).map(|_| index)
}

/// The next column to the left that holds values; only columns that speak of values stand between.
fn value_to_the_left(columns: &[Column], index: u16) -> Option<u16> {
    let mut next = index.checked_sub(1)?;
    loop {
        let column = columns.iter().find(|column| column.index == next)?;
        if dimension_of(column.field).is_some() {
            return Some(next);
        }
        let passes =
            stands_beside(column.field) || is_companion(column.field) || column.field == Field::LogKowMethod;
        next = next.checked_sub(1).filter(|_| passes)?;
    }
}
