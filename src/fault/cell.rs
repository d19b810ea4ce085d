//! Faults of single cells and columns. A row with faults is still screened with what remains.
//!
//! What is said of each kind stands in `wording`.

mod wording;

use std::borrow::Cow;
use std::fmt;

use crate::quantity::Unit;
use crate::workbook::CellRef;
pub use wording::Wording;

/// A cell that could not be read as what its column promises.
#[derive(Debug, Clone, PartialEq, Eq)]
pub struct CellFault {
    /// Where it stands.
    pub cell: CellRef,
    /// The text as found.
    pub found: String,
    /// What is wrong with it.
    pub kind: CellFaultKind,
}

/// What can be wrong with a cell.
#[derive(Debug, Clone, PartialEq, Eq)]
pub enum CellFaultKind {
    /// Not a value of the field at all.
    NotA {
        /// The field's title, for example `half-life in soil`.
        what: &'static str,
        /// What could stand there, for example `40 d`.
        example: &'static str,
    },
    /// A word such as `miscible` where a number is needed.
    WordNoNumber {
        /// The field's title.
        what: &'static str,
        /// What could stand there.
        example: &'static str,
    },
    /// Digits that make no number, such as `1.2.3`.
    BadNumber {
        /// What could stand there.
        example: &'static str,
    },
    /// More than one value, and no range.
    SeveralValues {
        /// The field's title.
        what: &'static str,
    },
    /// A word where the unit should be that is no unit.
    UnknownUnit {
        /// The word.
        word: String,
        /// The unit it may have been meant to be.
        nearest: Option<&'static str>,
        /// What could stand there.
        example: &'static str,
    },
    /// A unit that does not measure this.
    WrongUnit {
        /// The unit.
        unit: Unit,
        /// The field's title.
        what: &'static str,
        /// What could stand there.
        example: &'static str,
    },
    /// A molar concentration in a row without a molar mass.
    NeedsMolarMass,
    /// A number that no substance can have.
    OutOfSense {
        /// The field's title.
        what: &'static str,
    },
    /// A range whose ends are the wrong way round, or a number out of any sense.
    BadRange {
        /// The field's title.
        what: &'static str,
    },
    /// A negative number of something that cannot be negative.
    Negative {
        /// The field's title.
        what: &'static str,
    },
    /// A zero of something that cannot be zero; exports write it for a missing value.
    Zero {
        /// The field's title.
        what: &'static str,
        /// What could stand there where the value lies below what can be measured.
        example: &'static str,
    },
    /// A date where a number is needed, for which spreadsheets mistake `4.5` or `1-2`.
    BecameDate {
        /// The field's title.
        what: &'static str,
    },
    /// A text too long to be a value.
    TooLong,
    /// A formula whose result the file does not hold.
    FormulaWithoutResult,
    /// The spreadsheet shows an error.
    SheetError,
    /// A number whose check digit is wrong.
    CheckDigit {
        /// `CAS number` or `EC number`.
        what: &'static str,
        /// The digit that would fit.
        expected: u8,
        /// The number with that digit.
        corrected: String,
    },
    /// No EC number starts with these characters.
    NoSuchEcNumber,
    /// A date in the CAS column that is no CAS number either.
    DateIsNoCas,
    /// More than one CAS or EC number in a cell.
    SeveralIdentities {
        /// `CAS numbers` or `EC numbers`.
        what: &'static str,
    },
    /// A valid number in the column of the other kind of number.
    NumberOfOtherKind {
        /// What the column holds, `CAS number` or `EC number`.
        what: &'static str,
        /// What stands there, the other of the two.
        found: &'static str,
    },
    /// A number beside a different one of the same kind in the same row.
    OtherIdentity {
        /// `CAS number` or `EC number`.
        what: &'static str,
        /// The other number.
        number: String,
        /// Where the other number stands.
        other: CellRef,
    },
    /// The header of another table below the one that is screened.
    SecondHeader,
    /// A row that describes a mixture.
    MixtureRow,
    /// A row that describes an article.
    ArticleRow,
    /// The bare word `inherently` where ready biodegradability is asked for.
    InherentlySettlesNothing,
    /// A number from 0 to 1 that may be a fraction or a percentage.
    FractionOrPercent,
    /// The words of a cell say one thing and its number another.
    WordsAgainstNumber,
    /// A text without code, class or word for none where hazard statements are asked for.
    NoStatement,
    /// A hazard class without its category.
    ClassWithoutCategory {
        /// The class as found, for example `Carc.`.
        class: String,
    },
    /// A part of a cell of hazard statements that may be one and was not read as such.
    StatementUnread {
        /// The part, for example `350`.
        part: String,
    },
    /// A field to the right of the header's last one, in a file whose lines are cut into fields.
    BeyondHeader {
        /// How many fields the row has.
        fields: usize,
        /// How many the header has.
        header: usize,
    },
    /// A word that is none of those a column of kinds may hold.
    NotOneOf {
        /// What the column holds, for example `row type`.
        what: &'static str,
        /// The words that it may hold.
        words: &'static str,
    },
    /// The index number of a harmonised classification, which looks like a CAS or EC number.
    IndexNumber {
        /// What the column holds, `CAS number` or `EC number`.
        what: &'static str,
        /// What could stand there.
        example: &'static str,
    },
    /// The label of a row that holds a total and no substance.
    TotalsRow,
    /// A risk phrase of the system before hazard statements.
    RiskPhrase {
        /// The phrase as found, for example `R45`.
        phrase: String,
    },
    /// A hazard class with a category 2 that may be one of the system before, where it meant what is 1B today.
    OldCategory {
        /// The class and category as found.
        class: String,
    },
    /// The words of a cell say yes and no.
    SaysBoth,
    /// A test of another kind where ready biodegradability is asked for.
    OtherDegradationTest {
        /// The test as found, for example `oecd 306`.
        test: String,
    },
    /// A number too large to be the logarithm that is asked for.
    NotALogarithm {
        /// The field's title.
        what: &'static str,
        /// How to write the value itself, for example `Kow = 50000`.
        example: &'static str,
    },
    /// A negative number where its logarithm may have been written.
    MayBeLogarithm {
        /// The field's title.
        what: &'static str,
        /// How to write the logarithm, for example `log BCF = 3.2`.
        example: &'static str,
    },
    /// A small number said to be a value where its logarithm is asked for.
    LogarithmOrNot {
        /// The field's title.
        what: &'static str,
        /// How to write the logarithm, for example `log Kow = 4.5`.
        example: &'static str,
    },
    /// `j` without a word that tells whether days or years are meant.
    DaysOrYears,
    /// Henry's law constant without a unit, which stands for a ratio of concentrations.
    DimensionlessHenry,
    /// A number that its cell shows divided by thousands, without a word that says so.
    ShownInThousands {
        /// The number as shown.
        shown: String,
    },
    /// A heading above a group of rows.
    HeadingRow,
    /// A note or footnote among the rows.
    NoteRow,
    /// The number of a printed page among the rows.
    PageLabelRow,
    /// Words of a cell name another quantity, organism or medium than its column asks for.
    SpeaksOfOther {
        /// What they name, for example `log d`.
        found: String,
        /// The field's title.
        what: &'static str,
    },
    /// A value that its words make one of another field, where it only supports.
    CountsAs {
        /// The title of the field it counts as.
        other: &'static str,
        /// The title of the field of the column.
        what: &'static str,
    },
    /// A number that exports write for a missing value.
    Placeholder {
        /// The field's title.
        what: &'static str,
    },
    /// A CAS or EC number beside a word by which it belongs to another substance.
    NumberOfAnother {
        /// `CAS number` or `EC number`.
        what: &'static str,
        /// The word, folded.
        word: String,
    },
    /// A row of units among the rows.
    UnitsRow,
    /// A separator before exactly three digits, and no cell that shows what it is.
    ThousandsOrDecimals {
        /// The number with decimals.
        with_decimals: String,
        /// The number with thousands.
        with_thousands: String,
    },
    /// A value whose column of units holds what is no unit of it.
    UnitBeside {
        /// What that column holds.
        unit: String,
    },
    /// A value whose column of units holds another unit than its header names.
    UnitsDiffer {
        /// What that column holds.
        unit: String,
        /// What the header names.
        header: Unit,
    },
    /// A value that cannot be read with what its column of signs holds.
    SignBeside {
        /// What that column holds.
        sign: String,
    },
}

impl CellFaultKind {
    /// Whether it tells that a row holds no substance, where no cell is wrong.
    pub fn tells_no_substance(&self) -> bool {
        matches!(
            self,
            Self::TotalsRow | Self::HeadingRow | Self::NoteRow | Self::PageLabelRow | Self::UnitsRow
        )
    }

    /// Whether rows are not screened because of it.
    pub(super) fn stops_screening(&self) -> bool {
        self.tells_no_substance() || matches!(self, Self::SecondHeader | Self::BeyondHeader { .. })
    }
}

impl CellFault {
    /// The text as found, on one line and short enough for a message.
    pub fn shown(&self) -> Cow<'_, str> {
        shown(&self.found)
    }
}

impl fmt::Display for CellFault {
    fn fmt(&self, formatter: &mut fmt::Formatter<'_>) -> fmt::Result {
        write!(formatter, "{}: `{}` {}", self.cell, self.shown(), self.kind)
    }
}

impl fmt::Display for CellFaultKind {
    fn fmt(&self, formatter: &mut fmt::Formatter<'_>) -> fmt::Result {
        let Wording { wrong, remedy, .. } = self.wording();
        write!(formatter, "{wrong}; {remedy}")
    }
}

/// A cell may hold 32,767 characters and line breaks; a message shows the first ones on one line.
pub(super) fn shown(found: &str) -> Cow<'_, str> {
    const SHOWN: usize = 60;
    let end = found.char_indices().nth(SHOWN).map(|(end, _)| end);
    let start = end.and_then(|end| found.get(..end)).unwrap_or(found);
    if end.is_none() && !start.contains(char::is_control) {
        return Cow::Borrowed(found);
    }
    let mut start = start.replace(char::is_control, " ");
    if end.is_some() {
        start.push('…');
    }
    Cow::Owned(start)
}

#[cfg(test)]
mod tests {
    use super::{CellFault, CellFaultKind};
    use crate::quantity::Unit;
    use crate::workbook::CellRef;

    fn message(found: &str, kind: CellFaultKind) -> String {
        let cell = CellRef { sheet: "Substances".into(), row: 6, column: 2 };
        CellFault { cell, found: found.to_owned(), kind }.to_string()
    }

    #[test]
    fn a_message_says_where_what_and_what_to_write_instead() {
        let what = "half-life in soil";
        let example = "40 d";
        assert_eq!(
            message("soon", CellFaultKind::NotA { what, example }),
            "Substances!C7: `soon` is no half-life in soil; write, for example, `40 d`"
        );
        assert_eq!(
            message(
                "12 wekks",
                CellFaultKind::UnknownUnit { word: "wekks".to_owned(), nearest: Some("weeks"), example }
            ),
            "Substances!C7: `12 wekks` has the unknown unit `wekks`; did you mean `weeks`?"
        );
        assert_eq!(
            message("3 mg/L", CellFaultKind::WrongUnit { unit: Unit::MilligramPerLitre, what, example }),
            "Substances!C7: `3 mg/L` is in mg/L, which does not measure half-life in soil; write, for example, `40 d`"
        );
    }

    #[test]
    fn a_long_text_is_shortened_in_the_message() {
        let long = "x".repeat(61);
        let text = message(&long[1..], CellFaultKind::TooLong);
        assert!(text.starts_with(&format!("Substances!C7: `{}` is", &long[1..])), "{text}");
        let text = message(&long, CellFaultKind::TooLong);
        assert!(text.starts_with(&format!("Substances!C7: `{}…` is", &long[1..])), "{text}");
        assert!(message(&"ä".repeat(30_000), CellFaultKind::TooLong).chars().count() < 250);
    }

    #[test]
    fn a_message_stays_on_one_line_whatever_the_cell_holds() {
        let text = message("4.5\n\u{1b}[31mred\t", CellFaultKind::TooLong);
        assert!(text.starts_with("Substances!C7: `4.5  [31mred ` is too long"), "{text}");
    }
}
