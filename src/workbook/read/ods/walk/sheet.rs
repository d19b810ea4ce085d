//! A sheet on the walk: its columns and rows, and how often they repeat.

use quick_xml::events::BytesStart;

use crate::fault::SheetFault;
use crate::workbook::place::{LAST_COLUMN, LAST_ROW};
use crate::workbook::survey::Extras;

use super::{Found, Place, StoredRow, Walk, named};

/// The most cells that may be there only because a cell or row with content is said to repeat.
const MOST_REPEATED: u64 = 20_000_000;

impl Walk {
    pub(super) fn begin_sheet(&mut self, element: &BytesStart<'_>) -> Found {
        self.place = Place::Sheet;
        self.next_row = 0;
        self.next_layout = 0;
        self.extras = Extras::default();
        self.extras.protections +=
            usize::from(named(element, "table:protected").is_some_and(|said| said == "true"));
        self.name = named(element, "table:name").unwrap_or_default();
        if self.name.is_empty() {
            self.name = format!("Sheet {}", self.sheets);
        }
        Found::Sheet {
            name: self.name.clone(),
            style: named(element, "table:style-name").unwrap_or_default(),
        }
    }

    pub(super) fn open_in_sheet(&mut self, element: &BytesStart<'_>) -> Result<Option<Found>, SheetFault> {
        match element.name().as_ref() {
            "table:table-column" => return self.columns(element),
            "table:table-columns"
            | "table:table-header-columns"
            | "table:table-column-group"
            | "table:table-rows"
            | "table:table-header-rows"
            | "table:table-row-group"
            | "calcext:conditional-formats" => {}
            "table:table-row" => {
                self.place = Place::Row;
                self.next_column = 0;
                self.row_bytes = 0;
                self.row_repeated = self.times(named(element, "table:number-rows-repeated"))?;
                self.row = StoredRow {
                    style: named(element, "table:style-name").unwrap_or_default(),
                    ..StoredRow::default()
                };
                if is_hidden(element) {
                    self.extras.hidden_rows += usize::try_from(self.row_repeated).unwrap_or(usize::MAX);
                }
            }
            "calcext:conditional-format" => {
                self.extras.conditional_formats += 1;
                self.pass_by();
            }
            "calcext:sparkline-groups" => {
                self.extras.sparklines += 1;
                self.pass_by();
            }
            "table:shapes" => {
                self.extras.drawings += 1;
                self.pass_by();
            }
            _ => self.pass_by(),
        }
        Ok(None)
    }

    fn columns(&mut self, element: &BytesStart<'_>) -> Result<Option<Found>, SheetFault> {
        let first = self.next_layout;
        let times = self.times(named(element, "table:number-columns-repeated"))?;
        self.next_layout = first.saturating_add(times);
        let last = self.next_layout.saturating_sub(1).min(u64::from(LAST_COLUMN));
        let (Ok(first), Ok(last)) = (u16::try_from(first), u16::try_from(last)) else {
            return Ok(None);
        };
        if first > LAST_COLUMN {
            return Ok(None);
        }
        let style = named(element, "table:style-name").unwrap_or_default();
        Ok(Some(Found::Columns { first, last, style, hidden: is_hidden(element) }))
    }

    /// Blank rows cost nothing, however often they are said to be there.
    pub(super) fn end_row(&mut self) -> Result<Option<Found>, SheetFault> {
        let first = self.next_row;
        self.next_row = first.saturating_add(self.row_repeated);
        if self.row.cells.is_empty() {
            return Ok(None);
        }
        if self.next_row > u64::from(LAST_ROW) + 1 {
            return Err(self.whole("has filled cells below row 1048576, the last a sheet can have"));
        }
        let stored = u64::try_from(self.row.cells.len()).unwrap_or(u64::MAX);
        let there: u64 = self.row.cells.iter().map(|cell| u64::from(cell.repeated)).sum();
        self.repeated =
            self.repeated.saturating_add(there.saturating_mul(self.row_repeated).saturating_sub(stored));
        if self.repeated > MOST_REPEATED {
            let what = format!(
                "a value that is said to repeat; with it more than {MOST_REPEATED} cells are only there by repetition"
            );
            let repeated = self.row.cells.iter().find(|cell| cell.repeated > 1);
            self.next_row = first;
            self.next_column =
                repeated.or_else(|| self.row.cells.first()).map_or(0, |cell| u64::from(cell.column));
            return Err(self.unreadable(what));
        }
        self.row.index = u32::try_from(first).unwrap_or(LAST_ROW);
        self.row.repeated = u32::try_from(self.row_repeated).unwrap_or(1);
        Ok(Some(Found::Row(std::mem::take(&mut self.row))))
    }

    /// How often something repeats, as an attribute says.
    pub(super) fn times(&self, said: Option<String>) -> Result<u64, SheetFault> {
        match said {
            None => Ok(1),
            Some(said) => match said.trim().parse::<u64>() {
                Ok(times) => Ok(times.max(1)),
                Err(_) => Err(self.whole(format!("says that something repeats `{said}` times"))),
            },
        }
    }
}

/// Rows and columns that are hidden or filtered out.
fn is_hidden(element: &BytesStart<'_>) -> bool {
    named(element, "table:visibility").is_some_and(|said| said == "collapse" || said == "filter")
}
