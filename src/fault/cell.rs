//! Faults of single cells and columns. A row with faults is still screened with what remains.

use std::fmt;

use crate::quantity::Unit;
use crate::workbook::CellRef;

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
}

impl fmt::Display for CellFault {
    fn fmt(&self, formatter: &mut fmt::Formatter<'_>) -> fmt::Result {
        write!(formatter, "{}: `{}` {}", self.cell, shortened(&self.found), self.kind)
    }
}

/// A cell may hold 32,767 characters; a message shows the first ones.
fn shortened(found: &str) -> String {
    const SHOWN: usize = 60;
    if found.chars().count() <= SHOWN {
        return found.to_owned();
    }
    let mut start: String = found.chars().take(SHOWN).collect();
    start.push('…');
    start
}

impl fmt::Display for CellFaultKind {
    #[expect(clippy::too_many_lines, reason = "one sentence for each kind and nothing else")]
    fn fmt(&self, formatter: &mut fmt::Formatter<'_>) -> fmt::Result {
        match self {
            Self::NotA { what, example } => {
                write!(formatter, "is no {what}; write, for example, `{example}`")
            }
            Self::WordNoNumber { what, example } => write!(
                formatter,
                "is a word and no number for {what}; write a number, or a bound with `<` or `>`, for example `{example}`"
            ),
            Self::BadNumber { example } => write!(
                formatter,
                "cannot be read as one number; write it with one decimal separator, for example `{example}`"
            ),
            Self::SeveralValues { what } => write!(
                formatter,
                "holds more than one value of {what} and cannot be taken apart; write one, a range such as `3–5`, or \
                 whole values with semicolons between, and remarks in brackets"
            ),
            Self::UnknownUnit { word, nearest: Some(unit), .. } => {
                write!(formatter, "has the unknown unit `{word}`; did you mean `{unit}`?")
            }
            Self::UnknownUnit { word, nearest: None, example } => write!(
                formatter,
                "has the unknown unit `{word}`; write, for example, `{example}`, and remarks in brackets"
            ),
            Self::WrongUnit { unit, what, example } if unit.symbol().is_empty() => {
                write!(
                    formatter,
                    "is said to have no unit, but {what} has one; write, for example, `{example}`"
                )
            }
            Self::WrongUnit { unit, what, example } => write!(
                formatter,
                "is in {}, which does not measure {what}; write, for example, `{example}`",
                unit.symbol()
            ),
            Self::NeedsMolarMass => write!(
                formatter,
                "is in moles, but the row has no molar mass; add a molar mass in g/mol or write it in mg/L"
            ),
            Self::OutOfSense { what } => write!(
                formatter,
                "is far outside what {what} can be; check the number, its unit and its decimal separator"
            ),
            Self::BadRange { what } => write!(
                formatter,
                "is no sensible {what}: its ends are the wrong way round or the number is out of any range; \
                 write the lower end first and check the unit"
            ),
            Self::Negative { what } => {
                write!(
                    formatter,
                    "is negative, which {what} cannot be; check the sign or leave the cell empty"
                )
            }
            Self::Zero { what, example } => write!(
                formatter,
                "is zero, which {what} cannot be; leave the cell empty if there is no value, or write the bound \
                 that was measured, for example `{example}`"
            ),
            Self::BecameDate { what } => write!(
                formatter,
                "is a date; a spreadsheet may have made it of a number such as `4.5`. Format the column as text or \
                 number and write the {what} again"
            ),
            Self::TooLong => write!(
                formatter,
                "is too long to be a value; write the value alone and keep the rest in a column of its own"
            ),
            Self::FormulaWithoutResult => write!(
                formatter,
                "is a formula without a stored result; open the workbook in a spreadsheet program, save it and use \
                 that file"
            ),
            Self::SheetError => {
                write!(
                    formatter,
                    "is an error of the spreadsheet; correct the formula or leave the cell empty"
                )
            }
            Self::CheckDigit { what, expected, corrected } => write!(
                formatter,
                "is no {what}: its check digit should be {expected}; write `{corrected}` if the other digits are \
                 right, or correct them"
            ),
            Self::NoSuchEcNumber => write!(
                formatter,
                "is no EC number: none starts with these six characters; write, for example, `200-024-3`"
            ),
            Self::DateIsNoCas => write!(
                formatter,
                "is a date and gives no CAS number when read back; format the column as text and write the number \
                 again, for example `50-29-3`"
            ),
            Self::SeveralIdentities { what } => {
                write!(formatter, "holds several {what}, so the row is not identified; write one a row")
            }
            Self::NumberOfOtherKind { what, found } => write!(
                formatter,
                "is no {what} but {} {found}, which belongs in a column of its own; put it in one with the header \
                 `{found}`",
                if *found == "EC number" { "an" } else { "a" }
            ),
            Self::OtherIdentity { what, number, other } => write!(
                formatter,
                "is another {what} than `{number}` in {other}, so the row is not identified; correct one of them, or \
                 give each substance a row of its own"
            ),
            Self::SecondHeader => write!(
                formatter,
                "begins the header of another table, whose columns may hold other things; the rows from here on are \
                 not screened: put that table on a sheet of its own"
            ),
            Self::MixtureRow => write!(
                formatter,
                "says that the row is a mixture; mixtures are screened by their components: give each a row of its own"
            ),
            Self::ArticleRow => write!(
                formatter,
                "says that the row is an article; articles are screened by their substances: give each a row of its own"
            ),
            Self::InherentlySettlesNothing => write!(
                formatter,
                "speaks of inherent biodegradability, which does not settle ready biodegradability; write `ready`, \
                 `not ready` or the result, for example `82 %, 28 d, OECD 301B`"
            ),
            Self::FractionOrPercent => write!(
                formatter,
                "may be a fraction or a percentage; write it with its sign, for example `82 %`"
            ),
            Self::WordsAgainstNumber => write!(
                formatter,
                "says one thing in words and another in its number; it counts as open: correct one of them"
            ),
            Self::NoStatement => write!(
                formatter,
                "names no hazard statement; write the codes, for example `H350; H361d`, or `none`"
            ),
            Self::ClassWithoutCategory { class } => write!(
                formatter,
                "names the hazard class `{class}` without its category; write, for example, `Carc. 1B` or `H350`"
            ),
            Self::StatementUnread { part } => write!(
                formatter,
                "holds `{part}`, which may be a hazard statement and was not read; write each code in full, for example \
                 `H302; H350`"
            ),
            Self::NotALogarithm { what, example } => write!(
                formatter,
                "is far outside what {what} can be as a logarithm; if it is the value itself, write it with its name, for \
                 example `{example}`"
            ),
            Self::MayBeLogarithm { what, example } => write!(
                formatter,
                "is negative, which {what} cannot be; if it is a logarithm, write, for example, `{example}`, else check \
                 the sign"
            ),
            Self::LogarithmOrNot { what, example } => write!(
                formatter,
                "may be a value of {what} or its logarithm; write `{example}` for the logarithm, and the value in a column \
                 without `log` in its header"
            ),
            Self::DaysOrYears => write!(
                formatter,
                "may be in days or in years, since `j` stands for both; write `d` or `a`, for example `40 d`"
            ),
            Self::DimensionlessHenry => write!(
                formatter,
                "has no unit; as a ratio of concentrations it depends on a temperature that is not certain: write it in \
                 Pa m3/mol, for example `1.5 Pa m3/mol`"
            ),
        }
    }
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
        let text = message(&"x".repeat(30_000), CellFaultKind::TooLong);
        assert!(text.len() < 250, "{text}");
    }
}
