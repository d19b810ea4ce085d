//! Small sheets written as text, and what the library makes of their rows.

use std::sync::LazyLock;

use kowledger::columns::{ColumnWords, Recognised, recognise};
use kowledger::substance::{RowReader, Substance, UnstatedBasis};
use kowledger::workbook::{Cell, CellContent, Row};

/// A cell with this content.
pub fn cell(column: usize, content: CellContent) -> Cell {
    Cell { column: u16::try_from(column).unwrap_or(u16::MAX), content, style: None, formula: false }
}

/// A row of text cells; an empty text is no cell.
pub fn text_row(index: usize, texts: &[&str]) -> Row {
    let contents: Vec<CellContent> = texts
        .iter()
        .map(|text| if text.is_empty() { CellContent::Empty } else { CellContent::Text((*text).to_owned()) })
        .collect();
    content_row(index, &contents)
}

/// A row of cells with these contents.
pub fn content_row(index: usize, contents: &[CellContent]) -> Row {
    let cells = contents.iter().enumerate().map(|(column, content)| cell(column, content.clone())).collect();
    Row { index: u32::try_from(index).unwrap_or(u32::MAX), cells }
}

/// The columns of a sheet with these rows.
pub fn columns_of(rows: &[Row]) -> Result<Recognised, String> {
    static WORDS: LazyLock<Result<ColumnWords, String>> = LazyLock::new(ColumnWords::built_in);
    let words = WORDS.as_ref().map_err(Clone::clone)?;
    recognise("Sheet", rows, words, &[]).ok_or_else(|| "no inventory".to_owned())
}

/// The last row of a sheet of text rows, the first of which is the header.
pub fn read_last(rows: &[&[&str]]) -> Result<Substance, String> {
    let rows: Vec<Row> = rows.iter().enumerate().map(|(index, texts)| text_row(index, texts)).collect();
    read_last_row(&rows)
}

/// The last row of a sheet, the first of which is the header.
pub fn read_last_row(rows: &[Row]) -> Result<Substance, String> {
    let columns = columns_of(rows)?;
    let reader = RowReader::new("Sheet".into(), &columns, UnstatedBasis::Unstated);
    rows.last().map(|row| reader.read(row)).ok_or_else(|| "no row".to_owned())
}

/// The one data row of a sheet with a name and these headers and cells.
pub fn read_cells(headers: &[&str], contents: &[CellContent]) -> Result<Substance, String> {
    read_last_row(&[text_row(0, headers), content_row(1, contents)])
}
