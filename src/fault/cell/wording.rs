//! What is said of each kind of fault: its title, what is wrong, and what to do about it.
//!
//! One arm a kind. The title counts kinds and filters the Conflicts sheet; what is wrong follows the text as found
//! (`12 wekks` has ...); what to do is an order to the user.

use super::CellFaultKind;

/// What is said of a fault.
#[derive(Debug, Clone, PartialEq, Eq)]
pub struct Wording {
    /// The kind, in a few words.
    pub title: &'static str,
    /// What is wrong, to follow the text as found.
    pub wrong: String,
    /// What to write or do instead.
    pub remedy: String,
}

fn say(title: &'static str, wrong: impl Into<String>, remedy: impl Into<String>) -> Wording {
    Wording { title, wrong: wrong.into(), remedy: remedy.into() }
}

impl CellFaultKind {
    /// What is said of this kind.
    #[expect(clippy::too_many_lines, reason = "one arm for each kind and nothing else")]
    pub fn wording(&self) -> Wording {
        match self {
            Self::NotA { what, example } => say(
                "not a value of its column",
                format!("is no {what}"),
                format!("write, for example, `{example}`"),
            ),
            Self::WordNoNumber { what, example } => say(
                "word instead of a number",
                format!("is a word and no number for {what}"),
                format!("write a number, or a bound with `<` or `>`, for example `{example}`"),
            ),
            Self::BadNumber { example } => say(
                "malformed number",
                "cannot be read as one number",
                format!("write it with one decimal separator, for example `{example}`"),
            ),
            Self::SeveralValues { what } => say(
                "more than one value",
                format!("holds more than one value of {what} and cannot be taken apart"),
                "write one, a range such as `3–5`, or whole values with semicolons between, and remarks in brackets",
            ),
            Self::UnknownUnit { word, nearest: Some(unit), .. } => say(
                "unknown unit",
                format!("has the unknown unit `{word}`"),
                format!("did you mean `{unit}`?"),
            ),
            Self::UnknownUnit { word, nearest: None, example } => say(
                "unknown unit",
                format!("has the unknown unit `{word}`"),
                format!("write, for example, `{example}`, and put remarks in brackets"),
            ),
            Self::WrongUnit { unit, what, example } if unit.symbol().is_empty() => say(
                "unit that does not fit",
                format!("is said to have no unit, but {what} has one"),
                format!("write, for example, `{example}`"),
            ),
            Self::WrongUnit { unit, what, example } => say(
                "unit that does not fit",
                format!("is in {}, which does not measure {what}", unit.symbol()),
                format!("write, for example, `{example}`"),
            ),
            Self::NeedsMolarMass => say(
                "molar mass missing",
                "is in moles, but the row has no molar mass",
                "add a molar mass in g/mol, or write the value in mg/L",
            ),
            Self::OutOfSense { what } => say(
                "far out of range",
                format!("is far outside what {what} can be"),
                "check the number, its unit and its decimal separator",
            ),
            Self::BadRange { what } => say(
                "no sensible range",
                format!(
                    "is no sensible {what}: its ends are the wrong way round or the number is out of any range"
                ),
                "write the lower end first and check the unit",
            ),
            Self::Negative { what } => say(
                "negative number",
                format!("is negative, which {what} cannot be"),
                "check the sign or leave the cell empty",
            ),
            Self::Zero { what, example } => say(
                "zero",
                format!("is zero, which {what} cannot be"),
                format!(
                    "leave the cell empty if there is no value, or write the bound that was measured, for example \
                     `{example}`"
                ),
            ),
            Self::BecameDate { what } => say(
                "date instead of a number",
                "is a date, which a spreadsheet may have made of a number such as `4.5`",
                format!("format the column as text or number and write the {what} again"),
            ),
            Self::TooLong => say(
                "text too long",
                "is too long to be a value",
                "write the value alone and keep the rest in a column of its own",
            ),
            Self::FormulaWithoutResult => say(
                "formula without a result",
                "is a formula without a stored result",
                "open the workbook in a spreadsheet program, save it and use that file",
            ),
            Self::SheetError => say(
                "error of the spreadsheet",
                "is an error of the spreadsheet",
                "correct the formula or leave the cell empty",
            ),
            Self::CheckDigit { what, expected, corrected } => say(
                "check digit",
                format!("is no {what}: its check digit should be {expected}"),
                format!(
                    "look the number up, and write `{corrected}` if the other digits are right, or correct them"
                ),
            ),
            Self::NoSuchEcNumber => say(
                "no such EC number",
                "is no EC number: none starts with these six characters",
                "look the number up and write it again, for example `200-024-3`",
            ),
            Self::DateIsNoCas => say(
                "date instead of a CAS number",
                "is a date and gives no CAS number when read back",
                "format the column as text and write the number again, for example `50-29-3`",
            ),
            Self::SeveralIdentities { what } => say(
                "more than one substance",
                format!("holds several {what}, so the row is not identified"),
                "give each substance a row of its own",
            ),
            Self::NumberOfOtherKind { what, found } => say(
                "number in another column",
                format!(
                    "is no {what} but {} {found}, which belongs in a column of its own",
                    if *found == "EC number" { "an" } else { "a" }
                ),
                format!("put it in one with the header `{found}`"),
            ),
            Self::OtherIdentity { what, number, other } => say(
                "numbers that contradict each other",
                format!("is another {what} than `{number}` in {other}, so the row is not identified"),
                "correct one of them, or give each substance a row of its own",
            ),
            Self::SecondHeader => say(
                "header of another table",
                "begins the header of another table, whose columns may hold other things, so the rows from here on \
                 are not screened",
                "put that table on a sheet of its own",
            ),
            Self::MixtureRow => say(
                "mixture",
                "says that the row is a mixture, and mixtures are screened by their components",
                "give each component a row of its own",
            ),
            Self::ArticleRow => say(
                "article",
                "says that the row is an article, and articles are screened by their substances",
                "give each substance a row of its own",
            ),
            Self::InherentlySettlesNothing => say(
                "inherent biodegradability",
                "speaks of inherent biodegradability, which does not settle ready biodegradability",
                "write `ready`, `not ready` or the result, for example `82 %, 28 d, OECD 301B`",
            ),
            Self::FractionOrPercent => say(
                "fraction or percentage",
                "may be a fraction or a percentage",
                "write it with its sign, for example `82 %`",
            ),
            Self::WordsAgainstNumber => say(
                "words against number",
                "says one thing in words and another in its number, and counts as open",
                "correct one of them",
            ),
            Self::NoStatement => say(
                "no hazard statement",
                "names no hazard statement",
                "write the codes, for example `H350; H361d`, or `none`",
            ),
            Self::ClassWithoutCategory { class } => say(
                "hazard class without category",
                format!("names the hazard class `{class}` without its category"),
                "write, for example, `Carc. 1B` or `H350`",
            ),
            Self::StatementUnread { part } => say(
                "hazard statement not read",
                format!("holds `{part}`, which may be a hazard statement and was not read"),
                "write each code in full, for example `H302; H350`",
            ),
            Self::BeyondHeader { fields, header } => say(
                "row with too many fields",
                format!(
                    "is field {fields} of its row, but the header has {header}, so that a separator within a text or \
                     number may have moved the values into wrong columns, and the row is not screened"
                ),
                "put that text into quotation marks, or give the column a header",
            ),
            Self::NotOneOf { what, words } => {
                say("word that is not known", format!("is no {what}"), format!("write one of: {words}"))
            }
            Self::IndexNumber { what, example } => say(
                "index number",
                format!("is an index number of a harmonised classification and no {what}"),
                format!("write, for example, `{example}`"),
            ),
            Self::TotalsRow => say(
                "total",
                "says that the row holds a total, so it was not screened",
                "if it is a substance, give it a CAS number",
            ),
            Self::RiskPhrase { phrase } => say(
                "risk phrase",
                format!(
                    "holds the risk phrase `{phrase}` of the system before hazard statements, which is not read"
                ),
                "write the hazard statement of today, for example `H350`",
            ),
            Self::OldCategory { class } => say(
                "category of the old system",
                format!("names `{class}`, which in the old system meant what is category 1B today"),
                "write the hazard statement, for example `H350` or `H351`",
            ),
            Self::SaysBoth => say(
                "says yes and no",
                "says both yes and no, and counts as open",
                "write `ready`, `not ready` or the result, for example `82 %, 28 d, OECD 301B`",
            ),
            Self::OtherDegradationTest { test } => say(
                "test of another kind",
                format!("names `{test}`, which does not settle ready biodegradability"),
                "write `ready`, `not ready` or the result of a test for it, for example `82 %, 28 d, OECD 301B`",
            ),
            Self::NotALogarithm { what, example } => say(
                "logarithm expected",
                format!("is far outside what {what} can be as a logarithm"),
                format!("if it is the value itself, write it with its name, for example `{example}`"),
            ),
            Self::MayBeLogarithm { what, example } => say(
                "negative number",
                format!("is negative, which {what} cannot be"),
                format!("if it is a logarithm, write, for example, `{example}`, else check the sign"),
            ),
            Self::LogarithmOrNot { what, example } => say(
                "logarithm or not",
                format!("may be a value of {what} or its logarithm"),
                format!(
                    "write `{example}` for the logarithm, and the value in a column without `log` in its header"
                ),
            ),
            Self::DaysOrYears => say(
                "days or years",
                "may be in days or in years, since `j` stands for both",
                "write `d` or `a`, for example `40 d`",
            ),
            Self::DimensionlessHenry => say(
                "unit missing",
                "has no unit, and as a ratio of concentrations it depends on a temperature that is not certain",
                "write it in Pa m3/mol, for example `1.5 Pa m3/mol`",
            ),
            Self::ShownInThousands { shown } => say(
                "shown in thousands",
                format!("is shown as {shown} by the format of its cell, and either number may be meant"),
                "give the cell a format that shows the number in full, or write the number with its unit",
            ),
            Self::HeadingRow => say(
                "heading",
                "stands alone in its row as a heading does, so the row was not screened",
                "if it is a substance, give it a CAS number",
            ),
            Self::NoteRow => say(
                "note",
                "reads as a note and no substance, so the row was not screened",
                "if it is a substance, give it a CAS number",
            ),
            Self::PageLabelRow => say(
                "page label",
                "is the number of a printed page, so the row was not screened",
                "if it is a substance, give it a CAS number",
            ),
            Self::SpeaksOfOther { found, what } => say(
                "speaks of something else",
                format!("speaks of `{found}` and was not read as {what}"),
                "put that value in a column of its own, and write here only what the header says",
            ),
            Self::CountsAs { other, what } => say(
                "counts as another value",
                format!("counts as {other}, which supports only, and does not stand for {what}"),
                format!("if it is the {what}, take that word out, else put it in a column of its own"),
            ),
            Self::Placeholder { what } => say(
                "looks like a placeholder",
                format!("looks like a number that stands for a missing value and was not read as {what}"),
                "leave the cell empty if there is no value, or write `(measured)` behind the number if it is one",
            ),
            Self::NumberOfAnother { what, word } => say(
                "number of another substance",
                format!("says `{word}` beside a {what}, so the row is not identified by it")
                    .replace("a EC", "an EC"),
                "write the number of the substance of this row alone, for example `50-29-3`, and the rest elsewhere",
            ),
            Self::UnitsRow => say(
                "row of units",
                "begins a row of units without a substance, which was not screened; the rows below it may be in those \
                 units and were read in the units of the header",
                "write the unit into each header or beside each value",
            ),
            Self::ThousandsOrDecimals { with_decimals, with_thousands } => say(
                "thousands or decimals",
                format!("may be {with_decimals} or {with_thousands}, and no other cell shows which"),
                "write it without a separator for thousands",
            ),
            Self::UnitBeside { unit } => say(
                "unit beside not read",
                format!(
                    "cannot be read with `{}`, which stands in the column of its unit",
                    super::shown(unit)
                ),
                "write the value with its unit in its own cell",
            ),
            Self::UnitsDiffer { unit, header } => say(
                "two units",
                format!(
                    "has `{}` in the column of its unit, but its header names {}",
                    super::shown(unit),
                    header.symbol()
                ),
                "write the value with its unit in its own cell",
            ),
            Self::SignBeside { sign } => say(
                "sign beside not read",
                format!(
                    "cannot be read with `{}`, which stands in the column of its sign",
                    super::shown(sign)
                ),
                "write the sign before the value in its own cell, for example `> 100`",
            ),
        }
    }
}
