//! What stands in a cell, typed, before anyone gives it a meaning.

/// The content of one cell.
#[derive(Debug, Clone, PartialEq)]
pub enum CellContent {
    /// Nothing, or formatting only.
    Empty,
    /// Text, as stored.
    Text(String),
    /// A number.
    Number(f64),
    /// A boolean.
    Boolean(bool),
    /// A date or time as the spreadsheet's serial number (1900 system).
    DateTime(f64),
    /// An error such as `#N/A`, as the spreadsheet shows it.
    Error(String),
}

/// Which of the inventory's cell formats a cell uses; an index into the workbook's list of appearances.
#[derive(Debug, Clone, Copy, PartialEq, Eq, PartialOrd, Ord, Hash)]
pub struct StyleId(pub u32);

/// One cell of a row.
#[derive(Debug, Clone, PartialEq)]
pub struct Cell {
    /// The column, counted from 0.
    pub column: u16,
    /// What stands in it.
    pub content: CellContent,
    /// How it looks, if it is formatted.
    pub style: Option<StyleId>,
    /// It holds a formula, of which `content` is the last result; [`CellContent::Empty`] if none is stored.
    pub formula: bool,
}

impl Cell {
    /// Whether anything stands in it: a formula without a result does, blanks alone do not.
    pub fn is_filled(&self) -> bool {
        match &self.content {
            CellContent::Empty => self.formula,
            CellContent::Text(text) => !text.trim().is_empty(),
            CellContent::Number(_)
            | CellContent::Boolean(_)
            | CellContent::DateTime(_)
            | CellContent::Error(_) => true,
        }
    }
}

/// One row of a sheet, its cells in order of column, each column once.
#[derive(Debug, Clone, PartialEq)]
pub struct Row {
    /// The row, counted from 0.
    pub index: u32,
    /// The cells that are there.
    pub cells: Vec<Cell>,
}

impl Row {
    /// The cell in a column, if the row has one.
    pub fn cell(&self, column: u16) -> Option<&Cell> {
        let position = self.cells.binary_search_by_key(&column, |cell| cell.column).ok()?;
        self.cells.get(position)
    }
}
