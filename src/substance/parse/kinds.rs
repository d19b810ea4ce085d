//! Words for what a row describes and for types of substance, in English and German.

use super::cell;
use crate::fault::CellFaultKind;
use crate::quantity::plain_words;
use crate::substance::{RowType, SubstanceType};
use crate::workbook::CellContent;

/// Word parts in the order in which they are looked for: `inorganic` before `organic`.
const TYPE_WORDS: &[(&str, SubstanceType)] = &[
    ("uvcb", SubstanceType::Uvcb),
    ("unknown or variable", SubstanceType::Uvcb),
    ("multi constituent", SubstanceType::MultiConstituent),
    ("multiconstituent", SubstanceType::MultiConstituent),
    ("mehrkomponentenstoff", SubstanceType::MultiConstituent),
    ("multikonstituent", SubstanceType::MultiConstituent),
    ("mehrere bestandteile", SubstanceType::MultiConstituent),
    ("organometal", SubstanceType::Organometallic),
    ("metal organic", SubstanceType::Organometallic),
    ("organotin", SubstanceType::Organometallic),
    ("organozinn", SubstanceType::Organometallic),
    ("zinnorgan", SubstanceType::Organometallic),
    ("organo metal", SubstanceType::Organometallic),
    ("metallorganisch", SubstanceType::Organometallic),
    ("metalorganic", SubstanceType::Organometallic),
    ("organic salt", SubstanceType::OrganicSalt),
    ("salt of an organic", SubstanceType::OrganicSalt),
    ("organisches salz", SubstanceType::OrganicSalt),
    ("inorganic", SubstanceType::Inorganic),
    ("anorgan", SubstanceType::Inorganic),
    ("polymer", SubstanceType::Polymer),
    ("surfactant", SubstanceType::Surfactant),
    ("tensid", SubstanceType::Surfactant),
    ("mixture", SubstanceType::Mixture),
    ("gemisch", SubstanceType::Mixture),
    ("mischung", SubstanceType::Mixture),
    ("zubereitung", SubstanceType::Mixture),
    ("preparation", SubstanceType::Mixture),
    ("organic", SubstanceType::Organic),
    ("organisch", SubstanceType::Organic),
];

/// Words that name a type of which nothing follows here.
const NO_TYPE: &[&str] = &[
    "substance",
    "stoff",
    "mono constituent",
    "monoconstituent",
    "einkomponentenstoff",
    "other",
    "sonstige",
];

const ROW_WORDS: &[(&str, RowType)] = &[
    ("mixture", RowType::Mixture),
    ("gemisch", RowType::Mixture),
    ("mischung", RowType::Mixture),
    ("zubereitung", RowType::Mixture),
    ("preparation", RowType::Mixture),
    ("formulation", RowType::Mixture),
    ("formulierung", RowType::Mixture),
    ("rezeptur", RowType::Mixture),
    ("article", RowType::Article),
    ("erzeugnis", RowType::Article),
    ("artikel", RowType::Article),
    ("substance", RowType::Substance),
    ("stoff", RowType::Substance),
    ("component", RowType::Substance),
    ("komponente", RowType::Substance),
    ("ingredient", RowType::Substance),
    ("chemical", RowType::Substance),
    ("chemikalie", RowType::Substance),
];

/// The type of substance a cell names.
pub(super) fn read_substance_type(content: &CellContent) -> Result<Option<SubstanceType>, CellFaultKind> {
    let Some(text) = cell::value_text(content) else {
        return Ok(None);
    };
    let plain = plain_words(&text);
    // `inorganic salt` names no organic salt.
    let padded = format!(" {plain}");
    let found = TYPE_WORDS.iter().find(|(words, kind)| match kind {
        SubstanceType::OrganicSalt | SubstanceType::Organic => padded.contains(&format!(" {words}")),
        // A hybrid is organic as well, and so inside the instruments.
        SubstanceType::Inorganic => {
            plain.contains(words) && ![" organic", " organisch"].iter().any(|word| padded.contains(word))
        }
        SubstanceType::Organometallic
        | SubstanceType::Polymer
        | SubstanceType::Uvcb
        | SubstanceType::MultiConstituent
        | SubstanceType::Mixture
        | SubstanceType::Surfactant => plain.contains(words),
    });
    match found {
        Some((_, kind)) => Ok(Some(*kind)),
        None if NO_TYPE.contains(&plain.as_str()) => Ok(None),
        None => Err(CellFaultKind::NotA { what: "substance type", example: "organic" }),
    }
}

/// What a cell says the row describes.
pub(super) fn read_row_type(content: &CellContent) -> Result<Option<RowType>, CellFaultKind> {
    let Some(text) = cell::value_text(content) else {
        return Ok(None);
    };
    let plain = plain_words(&text);
    ROW_WORDS
        .iter()
        .find(|(words, _)| plain.contains(words))
        .map(|(_, row_type)| Some(*row_type))
        .ok_or(CellFaultKind::NotA { what: "row type", example: "substance" })
}
