//! Lines of text with separators: csv and tsv.
//!
//! Encoding and separator are decided from the content and said. Every field stays text as it stands: a leading zero, a
//! CAS number or `1-2` must not become a number or a date on the way.

mod dialect;
mod records;
mod remarks;
mod survey;
#[cfg(test)]
mod tests;

use std::collections::BTreeMap;
use std::fs::File;
use std::io::{BufReader, Read, Seek, SeekFrom};
use std::path::{Path, PathBuf};

use super::{Opened, Source, Visit};
use crate::fault::{FileFault, LinesFault};
use crate::workbook::appearance::Appearance;
use crate::workbook::content::{Cell, CellContent, Row, StyleId};
use crate::workbook::encoding::{Decoded, TextEncoding, encoding_of};
use dialect::{Dialect, Why, decide};
use records::{Record, Records};
use survey::Surveyor;

/// How much of a text decides on the separator, in bytes.
const LOOKED_AT: u64 = 256 << 10;

/// The look of texts that run over several lines.
const SEVERAL_LINES: StyleId = StyleId(1);

/// A file of this kind, opened.
pub(super) struct Book {
    path: PathBuf,
    written: Written,
    first_fields: BTreeMap<u32, usize>,
    how_read: Vec<String>,
}

/// How the text is written.
#[derive(Debug, Clone, Copy)]
struct Written {
    encoding: TextEncoding,
    dialect: Dialect,
}

/// Opens and surveys the file.
pub(super) fn open(path: &Path, file: &File) -> Result<Opened, FileFault> {
    let unreadable = |error: std::io::Error| FileFault::Unreadable {
        path: path.display().to_string(),
        reason: error.to_string(),
    };
    let encoding = encoding_of(file).map_err(unreadable)?;
    let dialect = decide(&beginning(file, encoding).map_err(unreadable)?);
    let written = Written { encoding, dialect };
    let of_lines = |fault| FileFault::Lines { path: path.display().to_string(), fault };
    let mut records = written.records(file).map_err(of_lines)?;
    let mut surveyor = Surveyor::new(path, dialect);
    let mut record = Record::default();
    while records.next(&mut record).map_err(of_lines)? {
        surveyor.note(&record).map_err(of_lines)?;
    }
    let surveyed = surveyor.finish(records.zeros());
    let how_read = remarks::how_read(&written.encoding, &dialect, &surveyed);
    let not_carried = remarks::not_carried(&surveyed);
    let book = Book { path: path.to_path_buf(), written, first_fields: surveyed.first_fields, how_read };
    Ok(Opened {
        source: Source::Text(book),
        sheets: vec![surveyed.sheet],
        appearances: vec![Appearance::default(), Appearance::of_several_lines()],
        not_carried,
    })
}

impl Book {
    /// Hands every row that holds anything to `visit`; what went wrong, in words.
    pub(super) fn stream(&mut self, visit: &mut Visit<'_>) -> Result<(), String> {
        let file = File::open(&self.path).map_err(|error| error.to_string())?;
        let mut records = self.written.records(&file).map_err(|fault| fault.to_string())?;
        let mut record = Record::default();
        while records.next(&mut record).map_err(|fault| fault.to_string())? {
            if let Some(row) = row_of(&record)
                && visit(row).is_break()
            {
                break;
            }
        }
        Ok(())
    }

    /// How encoding and separator were decided, in sentences.
    pub(super) fn how_read(&self) -> &[String] {
        &self.how_read
    }

    /// How many fields one of the first rows has.
    pub(super) fn fields_in_row(&self, row: u32) -> Option<usize> {
        self.first_fields.get(&row).copied()
    }
}

impl Written {
    /// The rows from the beginning.
    fn records<'file>(
        &self,
        mut file: &'file File,
    ) -> Result<Records<BufReader<Decoded<&'file File>>>, LinesFault> {
        file.seek(SeekFrom::Start(0)).map_err(|error| LinesFault::BrokenOff { reason: error.to_string() })?;
        let text = BufReader::with_capacity(1 << 16, Decoded::new(file, self.encoding.encoding));
        let mut records = Records::new(text, self.dialect.separator);
        if self.dialect.why == Why::Told {
            records.pass_line_by()?;
        }
        Ok(records)
    }
}

/// The first lines; a line that is cut off is left out.
fn beginning(mut file: &File, encoding: TextEncoding) -> std::io::Result<Vec<u8>> {
    file.seek(SeekFrom::Start(0))?;
    let mut text = Vec::new();
    Decoded::new(file, encoding.encoding).take(LOOKED_AT).read_to_end(&mut text)?;
    if u64::try_from(text.len()).unwrap_or(u64::MAX) >= LOOKED_AT
        && let Some(last) = text.iter().rposition(|byte| matches!(byte, b'\n' | b'\r'))
    {
        text.truncate(last);
    }
    Ok(text)
}

/// The row of a record; none if no field holds anything.
fn row_of(record: &Record) -> Option<Row> {
    let filled = (0u16..).zip(record.iter()).filter(|(_, field)| !field.is_empty());
    let cells: Vec<Cell> = filled
        .map(|(column, field)| Cell {
            column,
            content: CellContent::Text(text_meant(field).unwrap_or_else(|| field.to_owned())),
            style: field.contains('\n').then_some(SEVERAL_LINES),
            formula: false,
        })
        .collect();
    let index = u32::try_from(record.row).ok()?;
    (!cells.is_empty()).then_some(Row { index, cells })
}

/// The text within `="0012"`, which is how exports keep a spreadsheet program from dropping zeros.
fn text_meant(field: &str) -> Option<String> {
    let inner = field.trim().strip_prefix("=\"")?.strip_suffix('"')?;
    let text = inner.replace("\"\"", "\u{0}");
    (!text.contains('"')).then(|| text.replace('\u{0}', "\""))
}
