//! Walks through the XML of an OpenDocument workbook and hands over its sheets, columns and rows as they are stored:
//! repeated cells and rows once, with how often they stand there.

mod cell;
mod sheet;

use quick_xml::XmlVersion;
use quick_xml::events::{BytesEnd, BytesStart, Event};

use crate::fault::SheetFault;
use crate::workbook::content::{CellContent, StyleId};
use crate::workbook::place::{CellRef, LAST_COLUMN, LAST_ROW};
use crate::workbook::survey::Extras;

use super::looks::Looks;
use cell::CellDraft;

/// The most bytes of text in one row; a row of an inventory has some thousand.
const LONGEST_ROW: u64 = 2 << 20;

/// What the walk hands over.
#[derive(Debug)]
pub(super) enum Found {
    /// A sheet begins.
    Sheet { name: String, style: String },
    /// Neighbouring columns.
    Columns { first: u16, last: u16, style: String, hidden: bool },
    /// A row that holds something.
    Row(StoredRow),
    /// The sheet is at its end; what it has besides cells.
    End(Extras),
}

/// A row as stored.
#[derive(Debug, Default)]
pub(super) struct StoredRow {
    /// The row, counted from 0.
    pub(super) index: u32,
    /// How many rows in a row are the same.
    pub(super) repeated: u32,
    /// The style of the row's height.
    pub(super) style: String,
    /// The cells that hold a value or a formula, in order.
    pub(super) cells: Vec<StoredCell>,
}

/// A cell as stored.
#[derive(Debug)]
pub(super) struct StoredCell {
    pub(super) column: u16,
    /// How many cells in a row are the same.
    pub(super) repeated: u16,
    /// How many columns the cell is wide: more than one where a merged range begins.
    pub(super) wide: u16,
    pub(super) content: CellContent,
    pub(super) look: Option<StyleId>,
    pub(super) formula: bool,
}

/// What the workbook has besides sheets.
#[derive(Debug, Default)]
pub(super) struct BookExtras {
    pub(super) named: usize,
    pub(super) pivot_tables: usize,
    pub(super) filters: usize,
    pub(super) mixed_texts: u64,
}

/// Which sheets are walked through; the others are passed by.
#[derive(Debug, Clone, Copy)]
pub(super) enum Wanted {
    All,
    Only(usize),
}

/// Where in the workbook the walk stands.
#[derive(Debug, Clone, Copy, PartialEq, Eq)]
enum Place {
    Before,
    Book,
    Sheet,
    Row,
    Cell,
    Paragraph,
}

/// The walk.
#[derive(Debug)]
pub(super) struct Walk {
    wanted: Wanted,
    place: Place,
    /// How deep within something that is passed by.
    passed_by: usize,
    /// Sheets so far.
    sheets: usize,
    name: String,
    next_row: u64,
    next_column: u64,
    /// The column whose width is told next.
    next_layout: u64,
    row: StoredRow,
    row_repeated: u64,
    row_bytes: u64,
    cell: CellDraft,
    repeated: u64,
    extras: Extras,
    /// What the workbook has besides sheets.
    pub(super) book: BookExtras,
    /// Whether a workbook was there at all.
    pub(super) found_book: bool,
    /// The looks found so far.
    pub(super) looks: Looks,
}

impl Walk {
    pub(super) fn new(wanted: Wanted, looks: Looks) -> Self {
        Self {
            wanted,
            place: Place::Before,
            passed_by: 0,
            sheets: 0,
            name: String::new(),
            next_row: 0,
            next_column: 0,
            next_layout: 0,
            row: StoredRow::default(),
            row_repeated: 1,
            row_bytes: 0,
            cell: CellDraft::default(),
            repeated: 0,
            extras: Extras::default(),
            book: BookExtras::default(),
            found_book: false,
            looks,
        }
    }

    /// Takes the next event; what was completed by it.
    pub(super) fn visit(&mut self, event: &Event<'_>) -> Result<Option<Found>, SheetFault> {
        match event {
            Event::Start(_) if self.passed_by > 0 => self.passed_by += 1,
            Event::End(_) if self.passed_by > 0 => self.passed_by -= 1,
            _ if self.passed_by > 0 => {}
            Event::Start(element) => return self.open(element),
            Event::End(element) => return self.close(element),
            Event::Text(text) if self.place == Place::Paragraph => {
                self.cell.text.push(&text.xml10_content());
                return self.keep_within_row(self.cell.text.len()).map(|()| None);
            }
            Event::CData(text) if self.place == Place::Paragraph => {
                self.cell.text.push(&text.xml10_content());
            }
            Event::GeneralRef(reference) if self.place == Place::Paragraph => {
                let character = cell::character_of(reference).map_err(|what| self.unreadable(what))?;
                self.cell.text.push(character.encode_utf8(&mut [0; 4]));
            }
            Event::Text(_)
            | Event::CData(_)
            | Event::GeneralRef(_)
            | Event::Empty(_)
            | Event::Comment(_)
            | Event::Decl(_)
            | Event::PI(_)
            | Event::DocType(_)
            | Event::Eof => {}
        }
        Ok(None)
    }

    fn open(&mut self, element: &BytesStart<'_>) -> Result<Option<Found>, SheetFault> {
        let name = element.name();
        match self.place {
            Place::Before => match name.as_ref() {
                "office:document-content" | "office:document" | "office:body" => {}
                "office:spreadsheet" => {
                    self.found_book = true;
                    self.place = Place::Book;
                }
                _ => self.pass_by(),
            },
            Place::Book => return Ok(self.open_in_book(element)),
            Place::Sheet => return self.open_in_sheet(element),
            Place::Row => match name.as_ref() {
                "table:table-cell" | "table:covered-table-cell" => self.begin_cell(element)?,
                _ => self.pass_by(),
            },
            Place::Cell => self.open_in_cell(name.as_ref()),
            Place::Paragraph => self.open_in_paragraph(element),
        }
        Ok(None)
    }

    /// Whatever stands here is no sheet's content, be there tables in it.
    fn pass_by(&mut self) {
        self.passed_by = 1;
    }

    fn open_in_book(&mut self, element: &BytesStart<'_>) -> Option<Found> {
        match element.name().as_ref() {
            "table:table" => {
                let number = self.sheets;
                self.sheets += 1;
                match self.wanted {
                    Wanted::Only(wanted) if wanted != number => self.pass_by(),
                    Wanted::Only(_) | Wanted::All => return Some(self.begin_sheet(element)),
                }
            }
            "table:named-expressions" | "table:database-ranges" | "table:data-pilot-tables" => {}
            "table:named-range" | "table:named-expression" => {
                self.book.named += 1;
                self.pass_by();
            }
            "table:data-pilot-table" => {
                self.book.pivot_tables += 1;
                self.pass_by();
            }
            "table:database-range" => {
                let filters =
                    named(element, "table:display-filter-buttons").is_some_and(|said| said == "true");
                self.book.filters += usize::from(filters);
                self.pass_by();
            }
            _ => self.pass_by(),
        }
        None
    }

    fn close(&mut self, element: &BytesEnd<'_>) -> Result<Option<Found>, SheetFault> {
        let name = element.name();
        match (self.place, name.as_ref()) {
            (Place::Paragraph, "text:p" | "text:h") => self.place = Place::Cell,
            (Place::Cell, "table:table-cell" | "table:covered-table-cell") => {
                self.place = Place::Row;
                self.end_cell()?;
            }
            (Place::Row, "table:table-row") => {
                self.place = Place::Sheet;
                return self.end_row();
            }
            (Place::Sheet, "table:table") => {
                self.place = Place::Book;
                return Ok(Some(Found::End(std::mem::take(&mut self.extras))));
            }
            (Place::Book, "office:spreadsheet") => self.place = Place::Before,
            (Place::Before | Place::Book | Place::Sheet | Place::Row | Place::Cell | Place::Paragraph, _) => {
            }
        }
        Ok(None)
    }

    fn keep_within_row(&self, more: usize) -> Result<(), SheetFault> {
        let bytes = self.row_bytes.saturating_add(u64::try_from(more).unwrap_or(u64::MAX));
        if bytes > LONGEST_ROW {
            return Err(
                self.unreadable(format!("so much text that its row has more than {LONGEST_ROW} characters"))
            );
        }
        Ok(())
    }

    fn unreadable(&self, what: impl Into<String>) -> SheetFault {
        let cell = CellRef {
            sheet: self.name.as_str().into(),
            row: u32::try_from(self.next_row).unwrap_or(LAST_ROW),
            column: u16::try_from(self.next_column).unwrap_or(LAST_COLUMN).min(LAST_COLUMN),
        };
        SheetFault::Unreadable { cell, what: what.into() }
    }

    fn whole(&self, what: impl Into<String>) -> SheetFault {
        SheetFault::Whole { sheet: self.name.clone(), what: what.into() }
    }
}

/// The value of an attribute by its whole name, with references resolved.
pub(super) fn named(element: &BytesStart<'_>, name: &str) -> Option<String> {
    element
        .attributes()
        .filter_map(Result::ok)
        .find(|attribute| attribute.key.as_ref() == name)
        .and_then(|attribute| attribute.normalized_value(XmlVersion::Implicit1_0).ok())
        .map(std::borrow::Cow::into_owned)
}
