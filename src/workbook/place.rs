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
        let plain = self.sheet.chars().all(|character| character.is_alphanumeric() || character == '_');
        if plain {
            write!(formatter, "{}!{}", self.sheet, self.address())
        } else {
            write!(formatter, "'{}'!{}", self.sheet.replace('\'', "''"), self.address())
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

/// The last column of a sheet (`XFD`), counted from 0 (ECMA-376 leaves it open; all spreadsheet programs agree).
pub(super) const LAST_COLUMN: u16 = 16_383;

/// The last row of a sheet (1,048,576), counted from 0.
pub(super) const LAST_ROW: u32 = 1_048_575;

/// Row and column, counted from 0, of a reference such as `C7`, if a sheet has that cell.
pub(super) fn parse_reference(text: &str) -> Option<(u32, u16)> {
    let digits = text.find(|character: char| character.is_ascii_digit())?;
    let (letters, digits) = text.split_at_checked(digits)?;
    let mut column = 0_u32;
    for letter in letters.bytes() {
        if !letter.is_ascii_alphabetic() {
            return None;
        }
        let digit = u32::from(letter.to_ascii_uppercase() - b'A') + 1;
        column = column.checked_mul(26)?.checked_add(digit)?;
    }
    let column = u16::try_from(column.checked_sub(1)?).ok()?;
    (column <= LAST_COLUMN).then_some((parse_row(digits)?, column))
}

/// The row, counted from 0, of a row number such as `7`, if a sheet has that row.
pub(super) fn parse_row(text: &str) -> Option<u32> {
    if !text.bytes().all(|byte| byte.is_ascii_digit()) {
        return None;
    }
    let row = text.parse::<u32>().ok()?.checked_sub(1)?;
    (row <= LAST_ROW).then_some(row)
}

#[cfg(test)]
mod tests {
    use super::{CellRef, column_letters, parse_reference};

    #[test]
    fn a_reference_is_read_up_to_the_last_cell_of_a_sheet_and_not_beyond() {
        assert_eq!(parse_reference("C7"), Some((6, 2)));
        assert_eq!(parse_reference("XFD1048576"), Some((1_048_575, 16_383)));
        for none in
            ["XFE1", "A1048577", "A0", "7", "C", "", "C-7", "C7D", "ÄA1", "AAAAAAAAAA1", "A99999999999"]
        {
            assert_eq!(parse_reference(none), None, "{none}");
        }
    }

    #[test]
    fn columns_are_lettered_as_spreadsheets_do() {
        let letters: Vec<_> = [0, 25, 26, 701, 702, 16383].map(column_letters).to_vec();
        assert_eq!(letters, ["A", "Z", "AA", "ZZ", "AAA", "XFD"]);
    }

    #[test]
    fn a_cell_prints_as_the_user_would_type_it() {
        let cell = |sheet: &str| CellRef { sheet: sheet.into(), row: 6, column: 2 };
        assert_eq!(cell("Substances").to_string(), "Substances!C7");
        assert_eq!(cell("Site's list").to_string(), "'Site''s list'!C7");
    }
}
