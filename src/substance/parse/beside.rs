//! A value read together with its unit and its sign, where other columns of the row hold them.

use std::sync::LazyLock;

use regex::Regex;

use super::cell::text_of;
use super::pattern::fixed;
use crate::columns::{Column, Separator, sign_of};
use crate::fault::CellFaultKind;
use crate::quantity::{DecimalStyle, Dimension, Unit, is_missing, parse_unit_of, tidy};
use crate::workbook::{CellContent, Row};

/// The column and the content with which a cell is to be read; `None` where no other column speaks of it.
pub(super) fn complete(
    column: &Column,
    content: &CellContent,
    row: &Row,
) -> Result<Option<(Column, CellContent)>, CellFaultKind> {
    let says_nothing = match content {
        CellContent::Text(text) => is_missing(text),
        CellContent::Number(_) => false,
        // Faults of their own.
        CellContent::Empty | CellContent::Boolean(_) | CellContent::DateTime(_) | CellContent::Error(_) => {
            true
        }
    };
    let unit = column.beside.unit.and_then(|index| beside(row, index));
    let sign = column.beside.qualifier.and_then(|index| beside(row, index));
    if says_nothing || (unit.is_none() && sign.is_none()) {
        return Ok(None);
    }
    let mut column = column.clone();
    if let Some(unit) = unit {
        column.unit = unit_with(&column, unit)?;
    }
    let content = match sign {
        Some(sign) => signed(&mut column, content, sign)?,
        None => content.clone(),
    };
    Ok(Some((column, content)))
}

/// What a cell beside a value holds; nothing where it is empty or says that there is nothing.
fn beside(row: &Row, index: u16) -> Option<String> {
    let cell = row.cell(index)?;
    if cell.formula && cell.content == CellContent::Empty {
        return Some("=…".to_owned());
    }
    text_of(&cell.content).filter(|text| !is_missing(text))
}

/// The unit in which numbers of the cell are: that of the column beside, which has to agree with the header.
fn unit_with(column: &Column, unit: String) -> Result<Option<Unit>, CellFaultKind> {
    const NO_UNIT: [&str; 8] =
        ["log", "log10", "lg", "unitless", "dimensionless", "none", "no unit", "logarithmic"];
    let Some(dimension) = column.dimension() else {
        return Ok(column.unit);
    };
    let tidied = tidy(&unit);
    let bare = tidied.trim_matches(['(', ')', '[', ']', ' ']);
    let bare = bare.strip_prefix("in ").unwrap_or(bare);
    if dimension == Dimension::Dimensionless && NO_UNIT.contains(&bare.to_lowercase().as_str()) {
        return Ok(column.unit);
    }
    let Some(read) = parse_unit_of(bare, dimension).filter(|read| read.dimension() == dimension) else {
        return Err(CellFaultKind::UnitBeside { unit });
    };
    match column.unit {
        // A log BCF is that of litres per kilogram.
        Some(Unit::LogLitrePerKilogram) if read == Unit::LitrePerKilogram => Ok(column.unit),
        Some(header) if header != read => Err(CellFaultKind::UnitsDiffer { unit, header }),
        Some(_) | None => Ok(Some(read)),
    }
}

/// The content with its sign before it.
fn signed(column: &mut Column, content: &CellContent, sign: String) -> Result<CellContent, CellFaultKind> {
    // One number, perhaps with a power of ten, and words without digits apart from those of `m3`.
    static ONE_NUMBER: LazyLock<Regex> = LazyLock::new(|| {
        fixed(concat!(
            r"(?i)^[-+−]?\d[\d.,']*(?:\s?e[-+]?\d+|\s?[x×*]\s?10\s?\^?\s?[-−+]?\d+)?",
            r"(?:[^;<>≤≥~±\d–]|\p{L}\d)*$"
        ))
    });
    let Some(before) = sign_of(&sign) else {
        return Err(CellFaultKind::SignBeside { sign });
    };
    let text = match content {
        CellContent::Number(number) => {
            // Written here, so that its separator is known.
            column.decimal = DecimalStyle::Point;
            column.separator = Separator::Shown;
            number.to_string()
        }
        CellContent::Text(text) => tidy(text),
        CellContent::Empty | CellContent::Boolean(_) | CellContent::DateTime(_) | CellContent::Error(_) => {
            return Ok(content.clone());
        }
    };
    if before.is_empty() {
        let has_sign = text.starts_with(['<', '>', '≤', '≥', '~', '≈']);
        return if has_sign { Err(CellFaultKind::SignBeside { sign }) } else { Ok(content.clone()) };
    }
    let own_end = text.find(|character: char| character.is_ascii_digit()).unwrap_or(0);
    if text.get(..own_end).and_then(sign_of) == Some(before) {
        return Ok(content.clone());
    }
    if !ONE_NUMBER.is_match(&text) {
        return Err(CellFaultKind::SignBeside { sign });
    }
    Ok(CellContent::Text(format!("{before}{text}")))
}
