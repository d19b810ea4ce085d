//! From recognised headers to columns: doubled ones, product names, units, conditions, and remarks with the way out.

use std::collections::{BTreeMap, BTreeSet};
use std::fmt::Write as _;

use super::header_row::{Found, HeaderCell, Meaning};
use super::words::ColumnWords;
use super::{Column, Recognised};
use crate::quantity::{DecimalStyle, Dimension, tidy};
use crate::substance::{Field, Property, Said};
use crate::workbook::column_letters;

/// Settles which columns are taken.
pub(super) fn choose(sheet: &str, found: Found, words: &ColumnWords) -> Recognised {
    let mut cells = found.cells;
    let mut remarks: Vec<String> = found
        .others_above
        .iter()
        .map(|row| {
            format!(
                "{sheet}: row {} looks like a header, too, but row {} names more columns; rows above it are not \
                 screened: give each table a sheet of its own",
                row + 1,
                found.row + 1
            )
        })
        .collect();
    take_product_name(&mut cells, words);
    let doubled = doubled_fields(&cells);
    let mut taken: BTreeMap<Field, (u16, String)> = BTreeMap::new();
    let mut columns: Vec<Column> = Vec::new();
    let mut unknown = Vec::new();
    let second_table = second_table(&cells);
    for cell in cells {
        if second_table.is_some_and(|start| cell.column >= start) {
            unknown.push((cell.column, cell.text));
            continue;
        }
        let Some(field) = cell.field() else {
            remarks.extend(hint(sheet, &cell, words));
            unknown.push((cell.column, cell.text));
            continue;
        };
        match taken.get(&field) {
            Some((first, first_text)) if !may_be_doubled(field) => {
                remarks.push(doubled_remark(sheet, field, (*first, first_text), &cell));
                unknown.push((cell.column, cell.text));
            }
            first => {
                if let Some((first, first_text)) = first.filter(|_| is_number_of_registry(field)) {
                    remarks.push(both_read_remark(sheet, field, (*first, first_text), &cell));
                }
                taken.entry(field).or_insert((cell.column, cell.text.clone()));
                let (column, remark) = column(sheet, cell, field, words);
                remarks.extend(remark);
                columns.push(column);
            }
        }
    }
    remarks.extend(second_table.map(|column| {
        format!(
            "{sheet}: headers repeat from column {} on, as if a second table stood there; the columns from there on are \
             left aside: give each table a sheet of its own",
            column_letters(column)
        )
    }));
    for place in 0..columns.len() {
        let about = columns.get(place).and_then(|column| {
            column
                .about
                .or_else(|| nearest_property(&columns, place).filter(|_| doubled.contains(&column.field)))
        });
        if let Some(column) = columns.get_mut(place) {
            column.about = about;
        }
    }
    Recognised {
        header_row: found.row,
        first_data_row: found.row + 1,
        columns,
        unknown,
        remarks,
        watch: found.watch,
    }
}

/// Where a second table begins: an identity repeated word by word, and right of it a property, too. Its values may be
/// another substance's than the row's.
fn second_table(cells: &[HeaderCell]) -> Option<u16> {
    let repeats = |cell: &HeaderCell| {
        cells.iter().any(|other| {
            other.column < cell.column && other.text == cell.text && other.field() == cell.field()
        })
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

fn doubled_fields(cells: &[HeaderCell]) -> BTreeSet<Field> {
    let mut seen = BTreeSet::new();
    cells.iter().filter_map(HeaderCell::field).filter(|field| !seen.insert(*field)).collect()
}

/// Both of two such columns are read, because a row in which they differ does not say which substance it means.
fn is_number_of_registry(field: Field) -> bool {
    matches!(field, Field::CasNumber | Field::EcNumber)
}

/// Several values of a property are several readings; several companions speak of different ones.
fn may_be_doubled(field: Field) -> bool {
    is_number_of_registry(field)
        || matches!(
            field,
            Field::Property(_)
                | Field::Reliability
                | Field::Guideline
                | Field::HalfLifeTemperature
                | Field::HazardStatements
                | Field::ReadyBiodegradability
                | Field::InherentBiodegradability
        )
}

fn both_read_remark(sheet: &str, field: Field, first: (u16, &str), second: &HeaderCell) -> String {
    let way_out = if first.1 == second.text {
        "rename one of them to take one alone".to_owned()
    } else {
        let (first, second) = (one_line(first.1), one_line(&second.text));
        format!("to take one alone: --column '{first}=ignore' or --column '{second}=ignore'")
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

fn doubled_remark(sheet: &str, field: Field, first: (u16, &str), second: &HeaderCell) -> String {
    let id = field.id();
    let way_out = if first.1 == second.text {
        format!(
            "rename one of them to choose the other, or leave both aside with --column '{}=ignore'",
            second.text
        )
    } else {
        format!("to take the other: --column '{}=ignore' --column '{}={id}'", first.1, second.text)
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

fn one_line(text: &str) -> String {
    text.split_whitespace().collect::<Vec<_>>().join(" ")
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
        | Field::AssessedOn => None,
    }
}

fn column(sheet: &str, cell: HeaderCell, field: Field, words: &ColumnWords) -> (Column, Option<String>) {
    let HeaderCell { column, text, header, meaning } = cell;
    let dimension = dimension_of(field);
    let unit = dimension.and_then(|dimension| header.as_ref()?.unit(dimension));
    let strange = dimension
        .filter(|_| unit.is_none())
        .and_then(|dimension| Some((dimension, header.as_ref()?.strange_unit(dimension)?)));
    let remark = strange.map(|(dimension, strange)| {
        format!(
            "{sheet}: the header `{}` names {}, which does not measure {}; numbers without a unit are read in {}",
            one_line(&text),
            strange.symbol(),
            field.id(),
            shown_unit(dimension),
        )
    });
    let has_conditions =
        matches!(field, Field::Property(_) | Field::ReadyBiodegradability | Field::InherentBiodegradability);
    let said = if has_conditions { Said::in_header(&tidy(&text)) } else { Said::default() };
    let about = is_companion(field).then(|| header.as_ref()?.property_beside(words)).flatten();
    let mut reason = reason(&meaning, unit.map(crate::quantity::Unit::symbol), dimension);
    if let Some(basis) = said.basis {
        let _ = write!(reason, "; values are taken as {}", basis.word());
    }
    let column = Column {
        index: column,
        header: text,
        field,
        unit,
        basis: said.basis,
        conditions: said.conditions,
        about,
        decimal: DecimalStyle::Point,
        reason,
    };
    (column, remark)
}

fn shown_unit(dimension: Dimension) -> &'static str {
    match dimension.canonical().symbol() {
        "" => "no unit",
        symbol => symbol,
    }
}

fn reason(meaning: &Meaning, unit: Option<&str>, dimension: Option<Dimension>) -> String {
    let mut reason = match meaning {
        Meaning::Named(named) => format!("named by `{}`", named.by.join("` and `")),
        Meaning::Told(_) => "told by --column".to_owned(),
        Meaning::LeftAside | Meaning::Unknown => String::new(),
    };
    match (unit, dimension) {
        (Some(unit), Some(dimension)) if dimension != Dimension::Dimensionless => {
            let _ = write!(reason, "; {unit} from the header");
        }
        (None, Some(dimension)) if dimension != Dimension::Dimensionless => {
            let _ = write!(reason, "; {} where a cell names no unit", shown_unit(dimension));
        }
        (_, _) => {}
    }
    reason
}

/// Fields that speak of another column's value and may name it.
fn is_companion(field: Field) -> bool {
    matches!(field, Field::Reliability | Field::Guideline | Field::HalfLifeTemperature)
}

/// The property of the nearest column to the left that holds one.
fn nearest_property(columns: &[Column], place: usize) -> Option<Property> {
    let field = columns.get(place)?.field;
    let left = columns.get(..place)?.iter().rev().find_map(|column| column.field.property());
    left.filter(|_| is_companion(field))
}

/// A header that nearly names a field, or names one but for a word.
fn hint(sheet: &str, cell: &HeaderCell, words: &ColumnWords) -> Option<String> {
    if cell.meaning == Meaning::LeftAside {
        return None;
    }
    let header = cell.header.as_ref()?;
    let place = format!("{sheet}: column {} (`{}`)", column_letters(cell.column), one_line(&cell.text));
    let told = |field: &str| format!("--column '{}={field}'", one_line(&cell.text));
    if header.speaks_of("pka", words) {
        let (acid, base) = (told("pka-acid"), told("pka-base"));
        return Some(format!(
            "{place} does not say whether its pKa is of an acid or a base: {acid} or {base}"
        ));
    }
    if header.speaks_of("half-life", words) {
        let soil = told("half-life-soil");
        return Some(format!(
            "{place} names no compartment, so it is left aside; for soil, for example: {soil}"
        ));
    }
    let corrected = header.with_nearest_word(words)?;
    let field = corrected.field(words)?.field.id();
    Some(format!("{place} is not recognised; if it is {field}: {}", told(field)))
}
