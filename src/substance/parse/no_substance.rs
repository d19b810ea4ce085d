//! Rows among the data that hold no substance: totals, headings of groups, notes, page numbers.
//!
//! What is taken for one of these is not screened, so no substance may be taken for it: only a row that holds nothing
//! but such texts counts, and none whose text holds a number or key of a substance.

use std::sync::LazyLock;

use regex::Regex;

use super::notes::{Aside, aside_of};
use super::pattern::fixed;
use super::totals::totals_label;
use super::units::units_label;
use crate::columns::Column;
use crate::fault::CellFaultKind;
use crate::substance::Field;
use crate::workbook::{Cell, CellContent, Row, WideMerges};

/// Something that is or may be meant as a CAS number, with or without its hyphens, an EC number, an `InChI` or its key.
static NUMBER: LazyLock<Regex> = LazyLock::new(|| {
    fixed(concat!(
        r"(?i)\d{2,7}\s?\p{Pd}\s?\d{2}\s?\p{Pd}\s?\d|\d{3}\s?\p{Pd}\s?\d{3}\s?\p{Pd}\s?\d|\d{5}|",
        r"inchi|[a-z]{14}-[a-z]{10}-[a-z]"
    ))
});

/// The cell that says that the row holds no substance: its column, its text and what it is.
pub(super) fn label(
    columns: &[Column],
    row: &Row,
    merges: &WideMerges,
) -> Option<(u16, String, CellFaultKind)> {
    if let Some((column, found)) = totals_label(columns, row) {
        return Some((column, found, CellFaultKind::TotalsRow));
    }
    if let Some((column, found)) = units_label(columns, row) {
        return Some((column, found, CellFaultKind::UnitsRow));
    }
    let filled = row.cells.iter().filter(|cell| cell.is_filled());
    let texts: Vec<(u16, &str)> =
        filled.map(|cell| Some((cell.column, lone_text(columns, cell)?))).collect::<Option<_>>()?;
    let (column, text) = texts.first().copied()?;
    let kinds: Option<Vec<CellFaultKind>> = texts.iter().map(|(_, text)| kind_of(text)).collect();
    let kind = match kinds {
        Some(kinds) => kinds.into_iter().next(),
        None if texts.len() == 1 && is_heading(columns, (row.index, column), text, merges) => {
            Some(CellFaultKind::HeadingRow)
        }
        None => None,
    };
    Some((column, text.to_owned(), kind?))
}

fn kind_of(text: &str) -> Option<CellFaultKind> {
    aside_of(text).map(|aside| match aside {
        Aside::Note => CellFaultKind::NoteRow,
        Aside::PageLabel => CellFaultKind::PageLabelRow,
    })
}

/// A text that stands alone in its row and ends with a colon or across columns that hold different things. In a table
/// whose header is merged likewise, all names stand across columns; these are one column of the table.
fn is_heading(columns: &[Column], (row, column): (u32, u16), text: &str, merges: &WideMerges) -> bool {
    let crossed = |last: u16| columns.iter().filter(|known| (column..=last).contains(&known.index)).count();
    text.ends_with([':', '：']) || merges.last_column(row, column).is_some_and(|last| crossed(last) > 1)
}

/// A text in a column where headings and notes are written, without the number of a substance.
fn lone_text<'cell>(columns: &[Column], cell: &'cell Cell) -> Option<&'cell str> {
    let CellContent::Text(text) = &cell.content else {
        return None;
    };
    let mut known = columns.iter().filter(|column| column.index == cell.column);
    let takes = known.all(|column| may_hold_asides(column.field));
    (takes && !cell.formula && !NUMBER.is_match(text)).then_some(text.trim())
}

/// Whether a heading or note may stand in a column of this field: in one that holds data it may be data.
fn may_hold_asides(field: Field) -> bool {
    match field {
        Field::Name
        | Field::RowId
        | Field::CasNumber
        | Field::EcNumber
        | Field::Product
        | Field::Supplier
        | Field::Use
        | Field::Reference
        | Field::AssessorReason
        | Field::Assessor => true,
        Field::Content
        | Field::Tonnage
        | Field::Year
        | Field::AssessorVerdict
        | Field::AssessedOn
        | Field::UnitOfValue
        | Field::QualifierOfValue
        | Field::RowType
        | Field::Smiles
        | Field::InchiKey
        | Field::Formula
        | Field::SubstanceType
        | Field::Property(_)
        | Field::LogKowMethod
        | Field::LogKowSd
        | Field::LogKowTemperature
        | Field::LogKowPh
        | Field::KocPh
        | Field::BcfLipid
        | Field::HalfLifeTemperature
        | Field::ReadyBiodegradability
        | Field::InherentBiodegradability
        | Field::HazardStatements
        | Field::Reliability
        | Field::Guideline
        | Field::SubstituteFor
        | Field::ConstituentOf
        | Field::TransformsTo => false,
    }
}
