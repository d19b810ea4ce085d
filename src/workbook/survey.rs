//! One pass over a sheet's XML before its cells are read: refuses cells that would be misread, and notes what the
//! reading library does not give (widths, hidden columns, which cells are formulas, what cannot be carried over).

mod cells;
mod merges;
mod tail;
mod value;

use std::collections::BTreeMap;
use std::sync::Arc;

use quick_xml::events::{BytesStart, Event};

use crate::fault::{FileFault, SheetFault};

use super::content::StyleId;
use super::contents::SheetEntry;
use super::package::{Found, Package, attribute};
use super::place::{LAST_COLUMN, parse_reference};
use cells::CellCheck;
pub use merges::WideMerges;
pub(super) use tail::Extras;

/// Whether a sheet's tab is shown.
#[derive(Debug, Clone, Copy, PartialEq, Eq)]
pub enum Visibility {
    /// It is.
    Visible,
    /// It is not, and the user may show it.
    Hidden,
    /// It is not, and the usual menus do not offer it.
    VeryHidden,
}

/// How wide neighbouring columns are.
#[derive(Debug, Clone, Copy, PartialEq)]
pub struct ColumnLayout {
    /// The first column, counted from 0.
    pub first: u16,
    /// The last column, counted from 0.
    pub last: u16,
    /// The width in characters of the workbook's usual font, padding included, as the file stores it; none for the
    /// sheet's usual width.
    pub width: Option<f64>,
    /// The columns are not shown.
    pub hidden: bool,
}

/// What a sheet holds, known before its cells are read.
#[derive(Debug, Clone)]
pub struct SheetSurvey {
    /// The sheet's name.
    pub name: Arc<str>,
    /// Whether its tab is shown.
    pub visibility: Visibility,
    /// The widths the user set, up to the last used column, in order.
    pub column_widths: Vec<ColumnLayout>,
    /// One more than the last column that holds a value or a formula; 0 for an empty sheet.
    pub used_columns: u16,
    /// The last row that holds a value or a formula, counted from 0; 0 for an empty sheet.
    pub last_row: u32,
    /// How many cells are formulas.
    pub formulas: usize,
    /// How many cells hold an error value such as `#N/A`.
    pub error_values: usize,
    /// How many formulas have no stored result and so read as empty.
    pub formulas_without_result: usize,
    /// Rows and columns that stay in place when the user scrolls.
    pub frozen: Option<(u32, u16)>,
    /// The merged ranges across two or more columns.
    pub merges: WideMerges,
    /// Where the formulas stand: by column, runs of rows.
    pub(super) formula_runs: BTreeMap<u16, Vec<(u32, u32)>>,
    /// Error values the reading library does not know, in the order of the sheet.
    pub(super) unknown_errors: Vec<UnknownError>,
    /// What the sheet has besides cells.
    pub(super) extras: Extras,
}

/// A cell whose error value the reading library does not know.
#[derive(Debug, Clone, PartialEq)]
pub(super) struct UnknownError {
    pub(super) row: u32,
    pub(super) column: u16,
    pub(super) style: StyleId,
    pub(super) text: String,
}

impl SheetSurvey {
    /// What is known of a sheet before its cells are looked at.
    pub(super) fn unread(name: &str, visibility: Visibility) -> Self {
        Self {
            name: name.into(),
            visibility,
            column_widths: Vec::new(),
            used_columns: 0,
            last_row: 0,
            formulas: 0,
            error_values: 0,
            formulas_without_result: 0,
            frozen: None,
            merges: WideMerges::default(),
            formula_runs: BTreeMap::new(),
            unknown_errors: Vec::new(),
            extras: Extras::default(),
        }
    }

    /// Whether a cell is a formula.
    pub(super) fn is_formula(&self, row: u32, column: u16) -> bool {
        self.formula_runs.get(&column).is_some_and(|runs| {
            let after = runs.partition_point(|(first, _)| *first <= row);
            after.checked_sub(1).and_then(|position| runs.get(position)).is_some_and(|(_, last)| row <= *last)
        })
    }

    /// Notes that a cell is a formula; within a column the rows must come in order.
    pub(super) fn note_formula(&mut self, row: u32, column: u16) {
        self.formulas += 1;
        let runs = self.formula_runs.entry(column).or_default();
        match runs.last_mut() {
            Some((_, last)) if last.checked_add(1) == Some(row) => *last = row,
            _ => runs.push((row, row)),
        }
    }
}

/// Surveys one sheet.
pub(super) fn survey_sheet(
    package: &mut Package,
    entry: &SheetEntry,
    shared_texts: u64,
) -> Result<SheetSurvey, FileFault> {
    let mut survey = SheetSurvey::unread(&entry.name, entry.visibility);
    let path = package.path.clone();
    let mut check = CellCheck::new(entry.name.as_str().into(), shared_texts);
    let mut place = Place::Head;
    let found = package.read_xml(&entry.part, |event| {
        let outcome = match place {
            Place::Head => read_head(event, &mut survey, &mut place),
            Place::Data => check.visit(event, &mut survey, &mut place),
            Place::Tail => read_tail(event, &mut survey),
        };
        outcome.map_err(|fault| FileFault::Sheet { path: path.clone(), fault })
    })?;
    if found == Found::No || place != Place::Tail {
        let fault = whole(&survey, "holds no rows as a worksheet stores them");
        return Err(FileFault::Sheet { path, fault });
    }
    clip_widths(&mut survey);
    Ok(survey)
}

/// Where in a sheet's XML the pass stands.
#[derive(Debug, Clone, Copy, PartialEq, Eq)]
enum Place {
    Head,
    Data,
    Tail,
}

fn whole(survey: &SheetSurvey, what: impl Into<String>) -> SheetFault {
    SheetFault::Whole { sheet: survey.name.to_string(), what: what.into() }
}

fn read_head(event: &Event<'_>, survey: &mut SheetSurvey, place: &mut Place) -> Result<(), SheetFault> {
    let Event::Start(element) = event else {
        return Ok(());
    };
    match element.local_name().as_ref() {
        "sheetData" => *place = Place::Data,
        "dimension" => check_dimension(element, survey)?,
        "col" => read_column_layout(element, survey)?,
        "pane" => {
            let state = attribute(element, "state").unwrap_or_default();
            if state == "frozen" || state == "frozenSplit" {
                let rows = whole_number(element, "ySplit").and_then(|rows| u32::try_from(rows).ok());
                let columns = whole_number(element, "xSplit").and_then(|columns| u16::try_from(columns).ok());
                survey.frozen = Some((rows.unwrap_or(0), columns.unwrap_or(0)));
            }
        }
        _ => {}
    }
    Ok(())
}

/// A whole number that may be written as `3` or `3.0`.
fn whole_number(element: &BytesStart<'_>, name: &str) -> Option<u64> {
    let text = attribute(element, name)?;
    text.strip_suffix(".0").unwrap_or(&text).parse().ok()
}

/// The reading library computes with the dimension unchecked.
fn check_dimension(element: &BytesStart<'_>, survey: &SheetSurvey) -> Result<(), SheetFault> {
    let text = attribute(element, "ref").unwrap_or_default();
    let mut ends = text.split(':').map(parse_reference);
    let sound = match (ends.next().flatten(), ends.next(), ends.next()) {
        (Some(_), None, _) => true,
        (Some((row, column)), Some(Some((last_row, last_column))), None) => {
            row <= last_row && column <= last_column
        }
        _ => false,
    };
    if sound {
        Ok(())
    } else {
        Err(whole(survey, format!("says that its cells are `{text}`, which is no range")))
    }
}

fn read_column_layout(element: &BytesStart<'_>, survey: &mut SheetSurvey) -> Result<(), SheetFault> {
    let number = |name| {
        whole_number(element, name)
            .and_then(|number| number.checked_sub(1))
            .and_then(|number| u16::try_from(number).ok())
            .filter(|column| *column <= LAST_COLUMN)
    };
    let (Some(first), Some(last)) = (number("min"), number("max")) else {
        return Err(whole(survey, "gives a width to columns no sheet has"));
    };
    if first > last {
        return Err(whole(survey, "gives a width to columns no sheet has"));
    }
    let width = attribute(element, "width")
        .and_then(|width| width.parse::<f64>().ok())
        .filter(|width| (0.0..=255.0).contains(width));
    let hidden = attribute(element, "hidden").is_some_and(|hidden| hidden == "1" || hidden == "true");
    survey.column_widths.push(ColumnLayout { first, last, width, hidden });
    Ok(())
}

fn read_tail(event: &Event<'_>, survey: &mut SheetSurvey) -> Result<(), SheetFault> {
    let Event::Start(element) = event else {
        return Ok(());
    };
    let name = element.local_name();
    if name.as_ref() == "sheetData" {
        return Err(whole(survey, "stores its rows in two places"));
    }
    if name.as_ref() == "mergeCell" {
        note_merge(element, survey);
    }
    survey.extras.note(name.as_ref());
    Ok(())
}

/// A range that cannot be read is none: nothing but the look of the sheet hangs on it.
fn note_merge(element: &BytesStart<'_>, survey: &mut SheetSurvey) {
    let range = attribute(element, "ref").unwrap_or_default();
    let ends = range.split_once(':').map(|(first, last)| (parse_reference(first), parse_reference(last)));
    if let Some((Some((row, first)), Some((_, last)))) = ends {
        survey.merges.note(row, first, last);
    }
}

/// Widths beyond the last used column would fall on the columns that are added there.
pub(super) fn clip_widths(survey: &mut SheetSurvey) {
    let Some(last_used) = survey.used_columns.checked_sub(1) else {
        return survey.column_widths.clear();
    };
    survey.column_widths.retain(|layout| layout.first <= last_used);
    for layout in &mut survey.column_widths {
        layout.last = layout.last.min(last_used);
    }
    survey.column_widths.sort_by_key(|layout| layout.first);
}
