//! One pass over the records of an xlsb sheet: that its cells can be trusted, and what the sheet has besides them.

use std::ops::ControlFlow;

use super::cells::{Cells, Taken};
use super::for_each_record;
use crate::fault::{FileFault, SheetFault};
use crate::workbook::contents::SheetEntry;
use crate::workbook::package::Package;
use crate::workbook::place::LAST_COLUMN;
use crate::workbook::read::binary::bytes::{byte, long, real, short};
use crate::workbook::read::binary::texts::SharedTexts;
use crate::workbook::survey::{ColumnLayout, SheetSurvey, clip_widths};

/// Where in a sheet the pass stands.
#[derive(Debug, Clone, Copy, PartialEq, Eq)]
enum Place {
    Head,
    Data,
    Tail,
}

/// Surveys one sheet; how many of its own texts change their font is counted into `mixed_texts`.
pub(super) fn survey_sheet(
    package: &mut Package,
    entry: &SheetEntry,
    texts: &SharedTexts,
    mixed_texts: &mut u64,
) -> Result<SheetSurvey, FileFault> {
    let mut survey = SheetSurvey::unread(&entry.name, entry.visibility);
    let mut cells = Cells::new(survey.name.clone(), texts);
    let mut place = Place::Head;
    let mut wrong = None;
    for_each_record(package, &entry.part, |kind, data| {
        let outcome = match place {
            Place::Head => read_head(kind, data, &mut survey, &mut place),
            Place::Data => {
                *mixed_texts += u64::from(kind == 0x003E);
                read_data(kind, data, &mut survey, &mut cells, &mut place)
            }
            Place::Tail => read_tail(kind, data, &mut survey),
        };
        Ok(match outcome {
            Ok(()) => ControlFlow::Continue(()),
            Err(fault) => {
                wrong = Some(fault);
                ControlFlow::Break(())
            }
        })
    })?;
    if place != Place::Tail && wrong.is_none() {
        wrong = Some(whole(&survey, "holds no rows as a worksheet stores them"));
    }
    if let Some(fault) = wrong {
        return Err(FileFault::Sheet { path: package.path.clone(), fault });
    }
    clip_widths(&mut survey);
    Ok(survey)
}

fn whole(survey: &SheetSurvey, what: &str) -> SheetFault {
    SheetFault::Whole { sheet: survey.name.to_string(), what: what.to_owned() }
}

fn read_head(kind: u16, data: &[u8], survey: &mut SheetSurvey, place: &mut Place) -> Result<(), SheetFault> {
    match kind {
        0x0091 => *place = Place::Data,
        0x003C => {
            let layout =
                column_layout(data).ok_or_else(|| whole(survey, "gives a width to columns no sheet has"))?;
            survey.column_widths.push(layout);
        }
        // A pane that stays in place: how many columns and rows of it.
        0x0097 if byte(data, 28).unwrap_or(0) & 3 != 0 => {
            let count = |at| real(data, at).map_or(0, whole_number);
            survey.frozen = Some((count(8), u16::try_from(count(0)).unwrap_or(0)));
        }
        _ => {}
    }
    Ok(())
}

/// A count stored as a floating-point number; 0 if it is none.
fn whole_number(number: f64) -> u32 {
    #[expect(
        clippy::cast_possible_truncation,
        clippy::cast_sign_loss,
        reason = "a conversion that ends at the bounds is meant"
    )]
    let whole = number as u32;
    if whole > crate::workbook::place::LAST_ROW { 0 } else { whole }
}

fn column_layout(data: &[u8]) -> Option<ColumnLayout> {
    let column = |at| u16::try_from(long(data, at)?).ok().filter(|column| *column <= LAST_COLUMN);
    let (first, last) = (column(0)?, column(4)?);
    let width = Some(f64::from(long(data, 8)?) / 256.0).filter(|width| *width <= 255.0);
    let hidden = short(data, 16)? & 1 != 0;
    (first <= last).then_some(ColumnLayout { first, last, width, hidden })
}

fn read_data(
    kind: u16,
    data: &[u8],
    survey: &mut SheetSurvey,
    cells: &mut Cells<'_>,
    place: &mut Place,
) -> Result<(), SheetFault> {
    match cells.take(kind, data)? {
        Taken::Cell(cell) => cell.count(survey),
        Taken::Row(flags) => {
            survey.extras.hidden_rows += usize::from(flags.hidden);
            survey.extras.row_heights += usize::from(flags.own_height);
        }
        Taken::End => *place = Place::Tail,
        Taken::Other => {}
    }
    Ok(())
}

fn read_tail(kind: u16, data: &[u8], survey: &mut SheetSurvey) -> Result<(), SheetFault> {
    let element = match kind {
        0x0091 => return Err(whole(survey, "stores its rows in two places")),
        0x00B0 => {
            note_merge(data, survey);
            "mergeCell"
        }
        0x01EE => "hyperlink",
        0x00A1 => "autoFilter",
        0x01CD => "conditionalFormatting",
        0x0040 => "dataValidation",
        0x0217 if long(data, 2).is_some_and(|locked| locked != 0) => "sheetProtection",
        0x0295 => "tablePart",
        0x0226 => "drawing",
        0x0227 => "legacyDrawing",
        0x027F => "oleObject",
        0x018C => "brk",
        _ => return Ok(()),
    };
    survey.extras.note(element);
    Ok(())
}

/// A range has its first and last row, then its first and last column.
fn note_merge(data: &[u8], survey: &mut SheetSurvey) {
    let column = |at| long(data, at).and_then(|column| u16::try_from(column).ok());
    if let (Some(row), Some(first), Some(last)) = (long(data, 0), column(8), column(12)) {
        survey.merges.note(row, first, last);
    }
}
