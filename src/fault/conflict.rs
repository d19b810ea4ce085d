//! What else stands apart in an inventory: rows left aside, doubtful columns, one substance on several rows.
//!
//! None of these is a cell that could not be read, so they do not change the exit status.

use super::cell::Wording;
use super::count;
use crate::workbook::CellRef;

/// Something of a row or sheet that a reader has to look at.
#[derive(Debug, Clone, PartialEq, Eq)]
pub enum Conflict {
    /// Rows below the header of another table.
    RowsLeftAside {
        /// How many.
        rows: usize,
        /// The row of that header, as the user counts it.
        header: u32,
    },
    /// A remark on the columns of a sheet, as the columns' room words it.
    Columns {
        /// The remark.
        remark: String,
    },
    /// A row that shares its number or name with other rows.
    Shared(Shared),
    /// A remark on the header of a sheet that is about no single column.
    Header {
        /// The remark.
        remark: String,
    },
    /// A column that holds data and is not used.
    Unused {
        /// Its letters.
        letters: String,
        /// Its header; none where it has none.
        header: Option<String>,
        /// How many screened rows hold something in it.
        rows: usize,
        /// Why it is not used, if there is more to say than that its header is not recognised.
        why: Option<String>,
    },
}

/// What rows share, and in what they differ.
#[derive(Debug, Clone, PartialEq, Eq)]
pub struct Shared {
    /// What they share.
    pub by: SharedBy,
    /// The number or name.
    pub named: String,
    /// The first of the other rows' cells with it.
    pub others: Vec<CellRef>,
    /// How many other rows there are.
    pub other_rows: usize,
    /// How far the rows agree.
    pub agreement: Agreement,
    /// Other numbers and headlines that differ.
    pub contrasts: Vec<Contrast>,
    /// Titles of data that differ between rows that have them.
    pub differing: Vec<&'static str>,
    /// Titles of data that some of the rows lack.
    pub lacking: Vec<&'static str>,
}

/// Something that one row says otherwise than others.
#[derive(Debug, Clone, PartialEq, Eq)]
pub struct Contrast {
    /// The other number or the rulebook.
    pub what: String,
    /// What this row says; none where it says nothing.
    pub here: Option<String>,
    /// The first of the different things that the others say.
    pub there: Vec<String>,
}

/// What rows share.
#[derive(Debug, Clone, Copy, PartialEq, Eq, PartialOrd, Ord)]
pub enum SharedBy {
    /// The CAS number.
    Cas,
    /// The EC number.
    Ec,
    /// The name, without one number that all of them share.
    Name,
}

/// How far rows with the same number or name agree, the most serious first.
#[derive(Debug, Clone, Copy, PartialEq, Eq, PartialOrd, Ord)]
pub enum Agreement {
    /// Their other numbers contradict each other.
    OtherNumbers,
    /// Their headlines differ.
    Verdicts,
    /// Their data differ, their headlines do not.
    Data,
    /// Nothing that was read differs.
    Same,
}

impl Conflict {
    /// What is said of it.
    pub fn wording(&self) -> Wording {
        match self {
            Self::RowsLeftAside { rows, header } => Wording {
                title: "rows not screened",
                wrong: format!(
                    "{} not screened, below the header of another table in row {header}",
                    count(*rows, "row was", "rows were")
                ),
                remedy: "put that table on a sheet of its own and screen again".to_owned(),
            },
            Self::Columns { remark } => Wording {
                title: "doubtful column",
                wrong: remark.clone(),
                remedy: "check the column and how it was read; the Run record says what each column was taken for"
                    .to_owned(),
            },
            Self::Shared(shared) => shared.wording(),
            Self::Header { remark } => Wording {
                title: "doubtful header",
                wrong: remark.clone(),
                remedy: "check that the right row was read as the header; the Run record names it".to_owned(),
            },
            Self::Unused { letters, header, rows, why } => Wording {
                title: "column not used",
                wrong: unused(letters, header.as_deref(), *rows, why.as_deref()),
                remedy: match header {
                    Some(_) => {
                        "nothing, if it holds nothing to screen with; otherwise say what it holds with `--column \
                         'Header=field'`"
                    }
                    None => "nothing, if it holds nothing to screen with; otherwise give it a header",
                }
                .to_owned(),
            },
        }
    }
}

/// `column AB is carried along only: its header is not recognised; 12 screened rows hold something in it`.
fn unused(letters: &str, header: Option<&str>, rows: usize, why: Option<&str>) -> String {
    let why = match (header, why) {
        (_, Some(why)) => why,
        (Some(_), None) => "its header is not recognised",
        (None, None) => "it has no header",
    };
    let rows = count(rows, "screened row holds", "screened rows hold");
    format!("column {letters} is carried along only: {why}; {rows} something in it")
}

impl Shared {
    fn wording(&self) -> Wording {
        let mut parts = vec![format!("{} stands in {} as well", self.subject(), self.places())];
        parts.extend(self.contrasts.iter().map(Contrast::phrase));
        if !self.differing.is_empty() {
            parts.push(format!("the rows differ in {}", listed(&self.differing)));
        }
        if !self.lacking.is_empty() {
            parts.push(format!("not all of them have {}", listed(&self.lacking)));
        }
        Wording { title: self.title(), wrong: parts.join("; "), remedy: self.remedy().to_owned() }
    }

    fn title(&self) -> &'static str {
        match (self.by, self.agreement) {
            (SharedBy::Cas, Agreement::OtherNumbers) => "same CAS number, other EC numbers",
            (SharedBy::Cas, Agreement::Verdicts) => "same CAS number, headlines differ",
            (SharedBy::Cas, Agreement::Data) => "same CAS number, data differ",
            (SharedBy::Cas, Agreement::Same) => "same CAS number, same data",
            (SharedBy::Ec, Agreement::OtherNumbers) => "same EC number, other CAS numbers",
            (SharedBy::Ec, Agreement::Verdicts) => "same EC number, headlines differ",
            (SharedBy::Ec, Agreement::Data) => "same EC number, data differ",
            (SharedBy::Ec, Agreement::Same) => "same EC number, same data",
            (SharedBy::Name, Agreement::OtherNumbers) => "same name, other numbers",
            (SharedBy::Name, Agreement::Verdicts | Agreement::Data | Agreement::Same) => {
                "same name, number missing"
            }
        }
    }

    fn remedy(&self) -> &'static str {
        match (self.by, self.agreement) {
            (SharedBy::Cas | SharedBy::Ec, Agreement::OtherNumbers) => {
                "look up which numbers belong together and correct the wrong one; until then the rows may be about \
                 different substances"
            }
            (SharedBy::Cas | SharedBy::Ec, Agreement::Verdicts) => {
                "decide which row is right, or bring their data together; each was screened on its own data, and none \
                 is preferred"
            }
            (SharedBy::Cas | SharedBy::Ec, Agreement::Data) => {
                "decide which values are right, or bring them together; the headlines are the same"
            }
            (SharedBy::Cas | SharedBy::Ec, Agreement::Same) => {
                "nothing, if the substance is meant to stand on several rows, as in several products; otherwise delete \
                 what is doubled"
            }
            (SharedBy::Name, Agreement::OtherNumbers) => {
                "check the numbers: one may be wrong, or the name may stand for more than one substance"
            }
            (SharedBy::Name, Agreement::Verdicts | Agreement::Data | Agreement::Same) => {
                "if they are one substance, write its CAS or EC number on every row; by a name alone nothing is cleared"
            }
        }
    }

    fn subject(&self) -> String {
        match self.by {
            SharedBy::Cas => format!("CAS number {}", self.named),
            SharedBy::Ec => format!("EC number {}", self.named),
            SharedBy::Name if self.named.is_empty() => "its name".to_owned(),
            SharedBy::Name => format!("the name `{}`", super::cell::shown(&self.named)),
        }
    }

    /// `Substances!B7, Substances!B9 and 3 more rows`.
    fn places(&self) -> String {
        let mut places: Vec<String> = self.others.iter().map(ToString::to_string).collect();
        let more = self.other_rows.saturating_sub(places.len());
        if more > 0 {
            places.push(count(more, "more row", "more rows"));
        }
        listed(&places)
    }
}

impl Contrast {
    /// `REACH: ``PBT: screens in`` here, ``PBT: unresolved`` there`.
    fn phrase(&self) -> String {
        let here = self.here.as_ref().map_or("none".to_owned(), |here| format!("`{here}`"));
        let there: Vec<String> = self.there.iter().map(|there| format!("`{there}`")).collect();
        format!("{}: {here} here, {} there", self.what, there.join(" or "))
    }
}

/// `a`, `a and b`, `a, b and c`.
fn listed<Word: AsRef<str>>(words: &[Word]) -> String {
    let words: Vec<&str> = words.iter().map(AsRef::as_ref).collect();
    match words.as_slice() {
        [] => String::new(),
        [word] => (*word).to_owned(),
        [first @ .., last] => format!("{} and {last}", first.join(", ")),
    }
}
