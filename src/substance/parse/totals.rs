//! Rows that hold a total and no substance, in the eight languages.
//!
//! Only a label of nothing but such words counts, and only where the row names no substance otherwise and holds no
//! data but amounts: what is taken for a total is not screened, and no substance may be hidden by that.

use std::sync::LazyLock;

use regex::Regex;

use super::cell::{text_of, value_text};
use super::pattern::fixed;
use crate::columns::Column;
use crate::quantity::plain_words;
use crate::substance::Field;
use crate::workbook::{CellContent, Row};

/// Whole labels in folded words: a word for a total, and around it words for what is added up.
static TOTAL: LazyLock<Regex> = LazyLock::new(|| {
    fixed(concat!(
        r"^(?:(?:grand|general|generale|overall|suma|importo|sub|sous|in)[ ]?)?",
        r"(?:totals?|subtotals?|totaux|totale|totali|subtotale|totaal|subtotaal|eindtotaal|sums?|summen?|gesamt|gesamtsumme|",
        r"gesamtmenge|gesamttonnage|zwischensumme|teilsumme|endsumme|insgesamt|somme|suma|somma|som|totales|",
        r"合 ?計|総 ?計|小 ?計|計|总 ?计|合 ?计|小 ?计|總 ?計|共 ?计|共 ?計|総 ?合計|总 ?和)",
        r"(?: (?:generale?s?|complessivo|total|totale|amount|amounts|quantity|quantities|tonnages?|tonnes?|tons|t|kg|mass|menge|",
        r"mengen|tonnen|masse|quantite|cantidad|quantita|hoeveelheid|toneladas|tonnellate|ton|a|per|pro|par|por|al|year|jahr|an|",
        r"ano|anno|jaar|of|all|aller|alle|der|des|de|tous|toutes|todas|las|los|les|delle|di|tutte|le|van|rows?|substances?|",
        r"stoffe|sustancias|sostanze|stoffen|items?|entries|zeilen|positionen|in|吨|噸|公斤|千克|トン|物质|物質|",
        r"\d{1,7} ?(?:种|種|项|項|件|個|个|品目|种物质|種物質|物質|物质|種類|吨|噸|トン)?))*$"
    ))
});

/// How many there are, in folded words: `11 substances`, `11 种`.
static COUNT: LazyLock<Regex> = LazyLock::new(|| {
    fixed(concat!(
        r"^(?:n )?\d{1,6} ?(?:substances?|rows?|items?|entries|chemicals|products?|stoffe?|zeilen|positionen|eintrage|artikel|",
        r"produits?|lignes?|articles?|sustancias?|filas?|lineas?|productos?|sostanz[ae]|righe|voci|prodotti|stoffen|rijen|",
        r"regels|producten|种|種|项|項|件|個|个|行|品目|种物质|種物質|物質|物质|種類|个物质|項目)$"
    ))
});

fn is_count(content: &CellContent) -> bool {
    match content {
        CellContent::Text(text) => text.len() <= 60 && COUNT.is_match(&plain_words(text)),
        CellContent::Empty
        | CellContent::Number(_)
        | CellContent::Boolean(_)
        | CellContent::DateTime(_)
        | CellContent::Error(_) => false,
    }
}

/// Whether a text is the label of a total.
fn is_label(content: &CellContent) -> bool {
    match content {
        CellContent::Text(text) if text.len() <= 80 => TOTAL.is_match(&plain_words(text)),
        CellContent::Text(_)
        | CellContent::Empty
        | CellContent::Number(_)
        | CellContent::Boolean(_)
        | CellContent::DateTime(_)
        | CellContent::Error(_) => false,
    }
}

/// The cell that says that the row holds a total: its column and its text.
pub(super) fn totals_label(columns: &[Column], row: &Row) -> Option<(u16, String)> {
    let filled = |column: &&Column| {
        row.cell(column.index).is_some_and(|cell| says_something(&cell.content) && !is_count(&cell.content))
    };
    // Numbers and structures first: most rows have one, and are told by it without a look at their texts.
    let identifying = columns.iter().filter(|column| column.field.identifies());
    let others = columns.iter().filter(|column| !column.field.identifies());
    let speaks_of_a_substance = identifying.chain(others).filter(filled).any(|column| match column.field {
        // A name or number beside the label is that of a substance, unless it is a number of the row only.
        Field::Name => row.cell(column.index).is_some_and(|cell| !is_label(&cell.content)),
        Field::RowId
        | Field::Content
        | Field::Tonnage
        | Field::Product
        | Field::Supplier
        | Field::Use
        | Field::Reference
        | Field::Year
        | Field::AssessorVerdict
        | Field::AssessorReason
        | Field::Assessor
        | Field::AssessedOn
        | Field::UnitOfValue
        | Field::QualifierOfValue => false,
        Field::RowType
        | Field::CasNumber
        | Field::EcNumber
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
        | Field::TransformsTo => row.cell(column.index).is_none_or(|cell| !is_label(&cell.content)),
    });
    if speaks_of_a_substance {
        return None;
    }
    let label = row.cells.iter().find(|cell| is_label(&cell.content))?;
    Some((label.column, text_of(&label.content).unwrap_or_default()))
}

fn says_something(content: &CellContent) -> bool {
    value_text(content).is_some()
}
