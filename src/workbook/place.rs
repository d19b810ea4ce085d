//! Where a cell stands, written as the user sees it.

use std::fmt;
use std::sync::Arc;

/// One cell of the inventory; prints as `Sheet!C7`.
#[derive(Debug, Clone, PartialEq, Eq, PartialOrd, Ord, Hash)]
pub struct CellRef {
    /// The sheet's name.
    pub sheet: Arc<str>,
    /// The row, counted from 0.
    pub row: u32,
    /// The column, counted from 0.
    pub column: u16,
}

impl fmt::Display for CellRef {
    fn fmt(&self, formatter: &mut fmt::Formatter<'_>) -> fmt::Result {
        let plain = self
            .sheet
            .chars()
            .all(|character| character.is_alphanumeric() || character == '_');
        if plain {
            write!(formatter, "{}!{}", self.sheet, self.address())
        } else {
            write!(
                formatter,
                "'{}'!{}",
                self.sheet.replace('\'', "''"),
                self.address()
            )
        }
    }
}

impl CellRef {
    /// The cell without its sheet, such as `C7`.
    pub fn address(&self) -> String {
        format!("{}{}", column_letters(self.column), self.row + 1)
    }
}

/// The letters of a column counted from 0: `A` to `XFD`.
pub fn column_letters(column: u16) -> String {
    let mut letters = Vec::new();
    let mut rest = u32::from(column) + 1;
    while rest > 0 {
        let digit = u8::try_from((rest - 1) % 26).unwrap_or(0);
        letters.push(char::from(b'A' + digit));
        rest = (rest - 1) / 26;
    }
    letters.iter().rev().collect()
}

#[cfg(test)]
mod tests {
    use super::{CellRef, column_letters};

    #[test]
    fn columns_are_lettered_as_spreadsheets_do() {
        let letters: Vec<_> = [0, 25, 26, 701, 702, 16383].map(column_letters).to_vec();
        assert_eq!(letters, ["A", "Z", "AA", "ZZ", "AAA", "XFD"]);
    }

    #[test]
    fn a_cell_prints_as_the_user_would_type_it() {
        let cell = |sheet: &str| CellRef {
            sheet: sheet.into(),
            row: 6,
            column: 2,
        };
        assert_eq!(cell("Substances").to_string(), "Substances!C7");
        assert_eq!(cell("Site's list").to_string(), "'Site''s list'!C7");
    }
}
