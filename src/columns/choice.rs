//! From recognised headers to columns: doubled ones, product names, units, conditions, and remarks with the way out.

use std::collections::{BTreeMap, BTreeSet};

use super::beside::mark;
use super::doubled::{
    both_read_remark, doubled_fields, doubled_remark, is_number_of_registry, may_be_doubled,
};
use super::header_cell::{HeaderCell, Meaning};
use super::header_row::Found;
use super::hints::hint;
use super::one_line;
use super::overrides::option_for;
use super::taken::{column_of, is_companion};
use super::words::ColumnWords;
use super::{Column, Recognised};
use crate::quantity::Dimension;
use crate::substance::{Field, Property};
use crate::workbook::column_letters;

/// Settles which columns are taken.
pub(super) fn choose(sheet: &str, found: Found, words: &ColumnWords) -> Recognised {
    let mut cells = found.cells;
    let mut remarks: Vec<String> =
        found.others_above.iter().map(|row| other_header_remark(sheet, *row, found.row)).collect();
    for cell in &mut cells {
        mark(cell, words);
    }
    let names = cells.iter().flat_map(HeaderCell::names).cloned().collect();
    take_product_name(&mut cells, words);
    let doubled = doubled_fields(&cells);
    let mut taken: BTreeMap<Field, (u16, String)> = BTreeMap::new();
    let mut columns: Vec<Column> = Vec::new();
    let mut unknown = Vec::new();
    let mut not_taken = BTreeMap::new();
    let second_table = second_table(&cells);
    for cell in cells {
        if second_table.is_some_and(|start| cell.column >= start) {
            not_taken.insert(cell.column, "left aside, in a second table".to_owned());
            unknown.push((cell.column, cell.text));
            continue;
        }
        let Some(field) = cell.field() else {
            let hint = hint(sheet, &cell, words);
            not_taken.extend(hint.short.map(|short| (cell.column, short)));
            remarks.extend(hint.remark);
            unknown.push((cell.column, cell.text));
            continue;
        };
        if let Some(word) = dimension_of(field).and_then(|dimension| cell.doubtful_unit(dimension)) {
            remarks.push(doubtful_unit_remark(sheet, field, &cell, &word));
            not_taken.insert(cell.column, format!("left aside; `{word}` may be a unit or not"));
            unknown.push((cell.column, cell.text));
            continue;
        }
        match taken.get(&field) {
            Some((first, first_text)) if !may_be_doubled(field) => {
                remarks.push(doubled_remark(sheet, field, (*first, first_text), &cell));
                let why = format!("left aside; column {} is the {}", column_letters(*first), field.id());
                not_taken.insert(cell.column, why);
                unknown.push((cell.column, cell.text));
            }
            first => {
                if let Some((first, first_text)) = first.filter(|_| is_number_of_registry(field)) {
                    remarks.push(both_read_remark(sheet, field, (*first, first_text), &cell));
                }
                taken.entry(field).or_insert((cell.column, cell.text.clone()));
                let (column, remark) = column_of(sheet, cell, field, words);
                remarks.extend(remark);
                columns.push(column);
            }
        }
    }
    remarks.extend(second_table.map(|column| second_table_remark(sheet, column)));
    set_about(&mut columns, &doubled);
    Recognised {
        header_top: found.top,
        header_row: found.row,
        first_data_row: found.row + 1,
        columns,
        unknown,
        not_taken,
        remarks,
        sheet: sheet.to_owned(),
        names,
        watch: found.watch,
    }
}

fn other_header_remark(sheet: &str, row: u32, taken: u32) -> String {
    format!(
        "{sheet}: row {} looks like a header, too, but row {} names more columns; rows above it are not screened: give \
         each table a sheet of its own",
        row + 1,
        taken + 1
    )
}

fn doubtful_unit_remark(sheet: &str, field: Field, cell: &HeaderCell, word: &str) -> String {
    let symbol = dimension_of(field).map_or("", |dimension| dimension.canonical().symbol());
    format!(
        "{sheet}: column {} (`{}`) is left aside, because `{word}` may be a unit and may mean something else; write the \
         unit in brackets, such as `({symbol})`, or say that its numbers are in {symbol} where a cell names no unit: {}",
        column_letters(cell.column),
        one_line(&cell.text),
        option_for(sheet, cell.column, &cell.text, field.id())
    )
}

fn second_table_remark(sheet: &str, start: u16) -> String {
    format!(
        "{sheet}: headers repeat from column {} on, as if a second table stood there; the columns from there on are \
         left aside: give each table a sheet of its own",
        column_letters(start)
    )
}

/// Several columns of companions speak of the value to their left, if their headers name none.
fn set_about(columns: &mut [Column], doubled: &BTreeSet<Field>) {
    for place in 0..columns.len() {
        let about = columns.get(place).and_then(|column| {
            column
                .about
                .or_else(|| nearest_property(columns, place).filter(|_| doubled.contains(&column.field)))
        });
        if let Some(column) = columns.get_mut(place) {
            column.about = about;
        }
    }
}

/// Where a second table begins: an identity repeated word by word, and right of it a property, too. Its values may be
/// another substance's than the row's.
fn second_table(cells: &[HeaderCell]) -> Option<u16> {
    let mut first: BTreeMap<(&str, Option<Field>), u16> = BTreeMap::new();
    for cell in cells {
        first.entry((&cell.text, cell.field())).or_insert(cell.column);
    }
    let repeats = |cell: &HeaderCell| {
        first.get(&(cell.text.as_str(), cell.field())).is_some_and(|column| *column < cell.column)
    };
    let start =
        cells.iter().find(|cell| cell.field().is_some_and(Field::identifies) && repeats(cell))?.column;
    let property_too = cells
        .iter()
        .any(|cell| cell.column > start && matches!(cell.field(), Some(Field::Property(_))) && repeats(cell));
    property_too.then_some(start)
}

/// `Product name` is the substance's name where no other column is.
fn take_product_name(cells: &mut [HeaderCell], words: &ColumnWords) {
    if cells.iter().any(|cell| cell.field() == Some(Field::Name)) {
        return;
    }
    let product_name = cells.iter_mut().find(|cell| {
        cell.field() == Some(Field::Product)
            && cell.header.as_ref().is_some_and(|header| header.speaks_of("name", words))
    });
    if let Some(HeaderCell { meaning: Meaning::Named(named), .. }) = product_name {
        named.field = Field::Name;
        named.by.push("no other column of names".to_owned());
    }
}

/// What the numbers of a field measure.
pub(super) fn dimension_of(field: Field) -> Option<Dimension> {
    match field {
        Field::Property(property) => Some(property.dimension()),
        Field::LogKowTemperature | Field::HalfLifeTemperature => Some(Dimension::Temperature),
        Field::BcfLipid | Field::Content | Field::ReadyBiodegradability | Field::InherentBiodegradability => {
            Some(Dimension::Percent)
        }
        Field::Tonnage => Some(Dimension::Tonnage),
        Field::LogKowSd | Field::LogKowPh | Field::KocPh => Some(Dimension::Dimensionless),
        Field::RowId
        | Field::RowType
        | Field::Name
        | Field::CasNumber
        | Field::EcNumber
        | Field::Smiles
        | Field::InchiKey
        | Field::Formula
        | Field::SubstanceType
        | Field::LogKowMethod
        | Field::HazardStatements
        | Field::Reliability
        | Field::Guideline
        | Field::Reference
        | Field::Year
        | Field::Product
        | Field::Supplier
        | Field::Use
        | Field::SubstituteFor
        | Field::ConstituentOf
        | Field::TransformsTo
        | Field::AssessorVerdict
        | Field::AssessorReason
        | Field::Assessor
        | Field::AssessedOn
        | Field::UnitOfValue
        | Field::QualifierOfValue => None,
    }
}

/// The property of the nearest column to the left that holds one.
fn nearest_property(columns: &[Column], place: usize) -> Option<Property> {
    let field = columns.get(place)?.field;
    let left = columns.get(..place)?.iter().rev().find_map(|column| column.field.property());
    left.filter(|_| is_companion(field))
}
