//! What the user says of a column: `--column 'Header=field'`.

use super::folding::header_words;
use super::one_line;
use super::words::unknown_field;
use crate::substance::Field;
use crate::workbook::column_letters;

/// `--column 'Header=field'`, or `--column 'H:H=field'` for the column with that letter.
#[derive(Debug, Clone, PartialEq, Eq)]
pub struct ColumnOverride {
    /// The header as written, compared after folding; or the column as written, such as `Substances!H:H`.
    pub header: String,
    /// The field; `None` leaves the column aside (`--column 'Header=ignore'`).
    pub field: Option<Field>,
    place: Option<Place>,
}

/// A column as spreadsheet programs write it, which no header is likely to be.
#[derive(Debug, Clone, PartialEq, Eq)]
struct Place {
    sheet: Option<String>,
    column: u16,
}

impl ColumnOverride {
    /// Reads `Header=field`, `H:H=field` or either with `ignore`; what is wrong with it in words.
    pub fn parse(text: &str) -> Result<Self, String> {
        let example = "write --column 'Header=field', for example --column 'Stoff=name', or 'Header=ignore'";
        let (header, field) =
            text.rsplit_once('=').ok_or_else(|| format!("`{text}` names no field; {example}"))?;
        if header_words(header).is_empty() {
            return Err(format!("`{text}` names no header; {example}"));
        }
        let id = field.trim();
        let field = match id {
            "ignore" => None,
            _ => Some(Field::from_id(id).ok_or_else(|| unknown_field(id))?),
        };
        let header = header.trim().to_owned();
        Ok(Self { place: Place::parse(&header), header, field })
    }

    /// Whether this speaks of a header.
    pub fn is_for(&self, header: &str) -> bool {
        header_words(&self.header) == header_words(header)
    }

    /// Whether this speaks of a sheet; one that names none speaks of all.
    pub(super) fn is_for_sheet(&self, sheet: &str) -> bool {
        self.place.as_ref().and_then(|place| place.sheet.as_deref()).is_none_or(|named| named == sheet)
    }

    /// Whether this names a column by its letter.
    pub(super) fn is_for_column(&self, column: u16) -> bool {
        self.column() == Some(column)
    }

    /// The column it names by its letter.
    pub(super) fn column(&self) -> Option<u16> {
        self.place.as_ref().map(|place| place.column)
    }
}

impl Place {
    fn parse(text: &str) -> Option<Self> {
        let (sheet, column) = match text.rsplit_once('!') {
            Some((sheet, column)) => (Some(sheet.trim_matches('\'').to_owned()), column),
            None => (None, text),
        };
        let (first, last) = column.trim().split_once(':')?;
        (first == last).then_some(())?;
        Some(Self { sheet, column: column_of_letters(first)? })
    }
}

/// The column with these capital letters, counted from 0.
fn column_of_letters(letters: &str) -> Option<u16> {
    const MOST_LETTERS: usize = 3;
    if letters.is_empty() || letters.len() > MOST_LETTERS {
        return None;
    }
    let number = letters.bytes().try_fold(0u32, |number, letter| {
        let digit = letter.is_ascii_uppercase().then(|| u32::from(letter - b'A') + 1)?;
        Some(number * 26 + digit)
    })?;
    u16::try_from(number.checked_sub(1)?).ok()
}

/// A column of a sheet as `--column` takes it between quotation marks: with the sheet, unless its name holds one.
pub(super) fn place_of(sheet: &str, column: u16) -> String {
    let letters = column_letters(column);
    if sheet.contains('\'') { format!("{letters}:{letters}") } else { format!("{sheet}!{letters}:{letters}") }
}

/// What the user may write to say what a column holds. A header with an apostrophe ends a text in quotation marks, so such
/// a column is named by its letter.
pub(super) fn option_for(sheet: &str, column: u16, header: &str, field: &str) -> String {
    let header = one_line(header);
    if header.contains('\'') {
        format!("--column '{}={field}'", place_of(sheet, column))
    } else {
        format!("--column '{header}={field}'")
    }
}

#[cfg(test)]
mod tests {
    use super::{ColumnOverride, place_of};

    #[test]
    fn a_column_is_named_by_its_letter_written_twice() {
        for (text, column, sheet) in [
            ("H:H=bcf", Some(7), None),
            ("XFD:XFD=ignore", Some(16_383), None),
            ("Substances!AA:AA=bcf", Some(26), Some("Substances")),
            ("'My sheet'!A:A=bcf", Some(0), Some("My sheet")),
            ("H=bcf", None, None),
            ("H:I=bcf", None, None),
            ("h:h=bcf", None, None),
            ("log Kow: value=log-kow", None, None),
        ] {
            let told = ColumnOverride::parse(text).unwrap();
            assert_eq!(told.column(), column, "{text}");
            assert!(told.is_for_sheet(sheet.unwrap_or("Any")), "{text}");
            assert_eq!(told.is_for_sheet("Another"), sheet.is_none(), "{text}");
        }
        assert_eq!(place_of("Substances", 26), "Substances!AA:AA");
    }
}
