//! One cell on the walk: its tag, its paragraphs, and what hangs on it.

use quick_xml::events::{BytesRef, BytesStart};

use crate::fault::SheetFault;
use crate::workbook::content::CellContent;
use crate::workbook::place::LAST_COLUMN;

use super::super::text::CellText;
use super::super::value::Stored;
use super::{Place, StoredCell, Walk, named};

/// A cell that has begun.
#[derive(Debug, Default)]
pub(super) struct CellDraft {
    stored: Stored,
    pub(super) text: CellText,
    fonts: Fonts,
}

/// Whether the text changes its font on the way.
#[derive(Debug, Clone, Copy, PartialEq, Eq, Default)]
enum Fonts {
    #[default]
    One,
    Several,
}

impl Walk {
    pub(super) fn begin_cell(&mut self, element: &BytesStart<'_>) -> Result<(), SheetFault> {
        self.place = Place::Cell;
        let stored = Stored::of(element)
            .map_err(|what| self.unreadable(format!("something that cannot be read ({what})")))?;
        if named(element, "table:content-validation-name").is_some() {
            self.extras.cell_checks += 1;
        }
        self.extras.merges += usize::from(stored.spans);
        self.cell = CellDraft { stored, ..CellDraft::default() };
        Ok(())
    }

    pub(super) fn open_in_cell(&mut self, name: &str) {
        match name {
            "text:p" | "text:h" => {
                self.cell.text.begin_paragraph();
                self.place = Place::Paragraph;
            }
            "text:list" | "text:list-item" | "text:section" => {}
            other => self.hang_on_cell(other),
        }
    }

    pub(super) fn open_in_paragraph(&mut self, element: &BytesStart<'_>) {
        match element.name().as_ref() {
            "text:s" => {
                let spaces =
                    named(element, "text:c").and_then(|count| count.parse::<u16>().ok()).unwrap_or(1);
                for _ in 0..spaces {
                    self.cell.text.push_meant(' ');
                }
            }
            "text:tab" => self.cell.text.push_meant('\t'),
            "text:line-break" => self.cell.text.push_meant('\n'),
            "text:a" => self.extras.links += 1,
            "text:span" => self.cell.fonts = Fonts::Several,
            // How characters are spoken, and remarks below the text.
            "text:ruby-text" | "text:note" => self.pass_by(),
            other if other.starts_with("text:") => {}
            other => self.hang_on_cell(other),
        }
    }

    /// Notes and pictures stand in a cell's XML, but are not what the cell holds.
    fn hang_on_cell(&mut self, name: &str) {
        if name == "office:annotation" {
            self.extras.notes += 1;
        } else if name.starts_with("draw:") || name.starts_with("dr3d:") {
            self.extras.drawings += 1;
        } else if name == "table:table" {
            self.extras.objects += 1;
        }
        self.pass_by();
    }

    pub(super) fn end_cell(&mut self) -> Result<(), SheetFault> {
        let CellDraft { mut stored, text, fonts } = std::mem::take(&mut self.cell);
        let times = self.times(stored.repeated.take())?;
        let bytes = text.len();
        let (formula, wide) = (stored.formula, stored.columns.unwrap_or(1));
        let (content, look) =
            stored.content(text.into_text(), &mut self.looks).map_err(|what| self.unreadable(what))?;
        if content != CellContent::Empty || formula {
            self.book.mixed_texts += u64::from(fonts == Fonts::Several);
            let last = self.next_column.saturating_add(times).saturating_sub(1);
            if last > u64::from(LAST_COLUMN) {
                let row = self.next_row.saturating_add(1);
                return Err(self.whole(format!(
                    "has filled cells in row {row} to the right of column XFD, the last a sheet can have"
                )));
            }
            self.keep_within_row(bytes.saturating_mul(usize::try_from(times).unwrap_or(usize::MAX)))?;
            self.row_bytes += u64::try_from(bytes).unwrap_or(0).saturating_mul(times);
            self.row.cells.push(StoredCell {
                column: u16::try_from(self.next_column).unwrap_or(LAST_COLUMN),
                repeated: u16::try_from(times).unwrap_or(1),
                wide,
                content,
                look,
                formula,
            });
        }
        self.next_column = self.next_column.saturating_add(times);
        Ok(())
    }
}

/// The character a reference in a text stands for.
pub(super) fn character_of(reference: &BytesRef<'_>) -> Result<char, String> {
    let unknown = |name: &str| format!("a reference to `{name}`, which nothing explains");
    if reference.is_char_ref() {
        return match reference.resolve_char_ref() {
            Ok(Some(character)) => Ok(character),
            Ok(None) | Err(_) => Err(unknown(&reference.xml10_content())),
        };
    }
    match &*reference.xml10_content() {
        "amp" => Ok('&'),
        "lt" => Ok('<'),
        "gt" => Ok('>'),
        "quot" => Ok('"'),
        "apos" => Ok('\''),
        other => Err(unknown(other)),
    }
}
