//! The one pass over a workbook that tells what each sheet holds, before any sheet is streamed.

use quick_xml::events::Event;

use crate::fault::SheetFault;
use crate::workbook::content::CellContent;
use crate::workbook::survey::{ColumnLayout, Extras, SheetSurvey, Visibility, clip_widths};

use super::looks::Looks;
use super::styles::Styles;
use super::walk::{BookExtras, Found, StoredRow, Walk, Wanted};

/// More sheets than this no inventory has; each one that is streamed is a walk through the whole workbook.
const MOST_SHEETS: usize = 1_000;

/// The survey while it goes on.
pub(super) struct Surveyor {
    walk: Walk,
    styles: Styles,
    sheets: Vec<SheetSurvey>,
}

impl Surveyor {
    pub(super) fn new() -> Self {
        Self { walk: Walk::new(Wanted::All, Looks::default()), styles: Styles::default(), sheets: Vec::new() }
    }

    /// Takes the next event of the workbook's XML.
    pub(super) fn visit(&mut self, event: &Event<'_>) -> Result<(), SheetFault> {
        if !self.walk.found_book {
            self.styles.visit(event);
        }
        match self.walk.visit(event)? {
            Some(Found::Sheet { name, style }) => self.begin_sheet(&name, &style)?,
            Some(Found::Columns { first, last, style, hidden }) => {
                let width = self.styles.width(&style);
                if let Some(survey) = self.sheets.last_mut()
                    && (width.is_some() || hidden)
                {
                    survey.column_widths.push(ColumnLayout { first, last, width, hidden });
                }
            }
            Some(Found::Row(row)) => self.note_row(&row),
            Some(Found::End(extras)) => self.end_sheet(&extras),
            None => {}
        }
        Ok(())
    }

    /// The sheets, what the workbook has besides, and its looks; none if it is no workbook.
    pub(super) fn into_sheets(self) -> Option<(Vec<SheetSurvey>, BookExtras, Looks)> {
        self.walk.found_book.then_some((self.sheets, self.walk.book, self.walk.looks))
    }

    fn begin_sheet(&mut self, name: &str, style: &str) -> Result<(), SheetFault> {
        if self.sheets.len() >= MOST_SHEETS {
            return Err(SheetFault::Whole {
                sheet: name.to_owned(),
                what: format!("comes after {MOST_SHEETS} others, more than an inventory can need"),
            });
        }
        let hidden = self.styles.hides(style);
        let visibility = if hidden { Visibility::Hidden } else { Visibility::Visible };
        self.sheets.push(SheetSurvey::unread(name, visibility));
        Ok(())
    }

    fn note_row(&mut self, row: &StoredRow) {
        let Some(survey) = self.sheets.last_mut() else {
            return;
        };
        survey.last_row = row.index.saturating_add(row.repeated.saturating_sub(1));
        let rows = usize::try_from(row.repeated).unwrap_or(usize::MAX);
        survey.extras.row_heights += rows * usize::from(self.styles.sets_height(&row.style));
        for cell in &row.cells {
            let cells = rows.saturating_mul(usize::from(cell.repeated));
            survey.used_columns = survey.used_columns.max(cell.column.saturating_add(cell.repeated));
            if cell.wide > 1 {
                let last = cell.column.saturating_add(cell.wide - 1);
                survey.merges.note(row.index, cell.column, last);
            }
            if cell.formula {
                survey.formulas += cells;
            }
            match cell.content {
                CellContent::Error(_) => survey.error_values += cells,
                // A cell without content is only there for its formula.
                CellContent::Empty => survey.formulas_without_result += cells,
                CellContent::Text(_)
                | CellContent::Number(_)
                | CellContent::Boolean(_)
                | CellContent::DateTime(_) => {}
            }
        }
    }

    fn end_sheet(&mut self, extras: &Extras) {
        if let Some(survey) = self.sheets.last_mut() {
            let row_heights = survey.extras.row_heights;
            survey.extras = Extras { row_heights, ..extras.clone() };
            clip_widths(survey);
        }
    }
}
