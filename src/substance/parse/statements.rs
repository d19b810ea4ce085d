//! Cells with hazard statements or hazard classes.

mod classes;
mod codes;
mod none;
mod unread;

use super::cell::value_text;
use crate::fault::CellFaultKind;
use crate::quantity::plain_words;
use crate::substance::HazardStatements;
use crate::workbook::CellContent;
use classes::read_classes;
use codes::codes_in;
use none::says_none;
use unread::unread_part;

/// The statements of a cell, and a fault where something of it could not be read. A cell that says `none` holds an
/// empty set; a cell without code, class or such a word holds no set at all.
pub(super) fn read_statements(
    content: &CellContent,
) -> Result<(Option<HazardStatements>, Option<CellFaultKind>), CellFaultKind> {
    // `none` is a word for missing elsewhere; here it says that there is no statement.
    let text = match content {
        CellContent::Text(text) if says_none(text) => {
            return Ok((Some(HazardStatements::default()), None));
        }
        CellContent::Text(_) => value_text(content),
        CellContent::Empty => None,
        CellContent::Number(_)
        | CellContent::Boolean(_)
        | CellContent::DateTime(_)
        | CellContent::Error(_) => {
            return Err(CellFaultKind::NoStatement);
        }
    };
    let Some(text) = text else {
        return Ok((None, None));
    };
    let (mut codes, rest) = codes_in(&text);
    let in_codes = !codes.is_empty();
    let of_classes = read_classes(&plain_words(&rest), &mut codes);
    let unread = unread_part(&rest, in_codes).or(of_classes);
    match (codes.is_empty(), unread) {
        (true, None) => Err(CellFaultKind::NoStatement),
        (true, Some(fault)) => Err(fault),
        (false, None) => Ok((Some(HazardStatements::new(codes)), None)),
        (false, Some(fault)) => Ok((Some(HazardStatements::incomplete(codes)), Some(fault))),
    }
}
