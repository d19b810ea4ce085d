//! What separates the fields of a text, decided from its first lines.

use std::io::Cursor;

use super::records::{Record, Records};

/// Separators that lists come with, in the order in which equal ones are preferred: the comma also stands in numbers.
const CANDIDATES: [(u8, &str); 4] =
    [(b'\t', "tab"), (b';', "semicolon"), (b'|', "vertical bar"), (b',', "comma")];

/// Rows that are looked at.
const ROWS: usize = 500;

/// How a text is cut into fields.
#[derive(Debug, Clone, Copy, PartialEq, Eq)]
pub(super) struct Dialect {
    /// What stands between fields; none if a row is one field.
    pub(super) separator: Option<u8>,
    /// How it is known.
    pub(super) why: Why,
    /// How many fields most rows have.
    pub(super) usual_fields: usize,
}

/// How the separator is known.
#[derive(Debug, Clone, Copy, PartialEq, Eq)]
pub(super) enum Why {
    /// The first line says so (`sep=;`), and is no row.
    Told,
    /// It cuts the rows into the same number of fields most often.
    Fits,
    /// It does, and this one does as well.
    FitsLike(u8),
    /// It stands in nearly all rows, in different numbers.
    Stands,
    /// None cuts the rows into fields.
    None,
}

impl Dialect {
    /// In words, for the user.
    pub(super) fn in_words(&self) -> String {
        let separator = self.separator.map_or("none", name_of);
        match self.why {
            Why::Told => format!("{separator}, as the first line says"),
            Why::Fits => format!("{separator}, which cuts most rows into {} fields", self.usual_fields),
            Why::FitsLike(other) => format!(
                "{separator}, which cuts most rows into {} fields; the {} would fit as well",
                self.usual_fields,
                name_of(other)
            ),
            Why::Stands => format!("{separator}, though rows differ in how many fields it cuts them into"),
            Why::None => "none, so that each row is one cell".to_owned(),
        }
    }
}

/// The name of a separator.
fn name_of(separator: u8) -> &'static str {
    let known = CANDIDATES.iter().find(|(candidate, _)| *candidate == separator);
    known.map_or("another character", |(_, name)| *name)
}

/// How a separator cuts the first rows.
#[derive(Debug, Clone, Copy)]
struct Cut {
    separator: u8,
    rows: usize,
    /// Rows it cuts into the most frequent number of fields.
    alike: usize,
    /// That number.
    fields: usize,
    /// Rows it cuts at all.
    divided: usize,
}

/// Decides from the beginning of a text, which ends with a line if the text goes on.
pub(super) fn decide(beginning: &[u8]) -> Dialect {
    if let Some(separator) = told(beginning) {
        let usual_fields = cut(beginning, separator).fields;
        return Dialect { separator: Some(separator), why: Why::Told, usual_fields };
    }
    let cuts = CANDIDATES.map(|(separator, _)| cut(beginning, separator));
    // Title lines and stray rows are allowed for: every second row has to be alike.
    let fitting = cuts.iter().filter(|cut| cut.fields > 1 && cut.alike * 2 >= cut.rows);
    // The first of equals, hence from behind.
    if let Some(best) = fitting.clone().rev().max_by_key(|cut| (cut.alike, cut.fields)) {
        let like = fitting.clone().find(|cut| cut.separator != best.separator && cut.alike == best.alike);
        let why = like.map_or(Why::Fits, |cut| Why::FitsLike(cut.separator));
        return Dialect { separator: Some(best.separator), why, usual_fields: best.fields };
    }
    // Exports that leave blank fields at the end of a row out.
    let standing = cuts.iter().filter(|cut| cut.divided * 5 >= cut.rows * 4 && cut.divided > 1);
    if let Some(best) = standing.rev().max_by_key(|cut| cut.divided) {
        return Dialect { separator: Some(best.separator), why: Why::Stands, usual_fields: best.fields };
    }
    Dialect { separator: None, why: Why::None, usual_fields: 1 }
}

/// The separator a first line such as `sep=;` tells.
fn told(beginning: &[u8]) -> Option<u8> {
    let line = beginning.split(|byte| matches!(byte, b'\r' | b'\n')).next()?;
    let line = line.strip_prefix(b"\"").and_then(|line| line.strip_suffix(b"\"")).unwrap_or(line);
    let (word, rest) = line.split_at_checked(4)?;
    match rest {
        [separator] if word.eq_ignore_ascii_case(b"sep=") && separator.is_ascii() && *separator != b'"' => {
            Some(*separator)
        }
        _ => None,
    }
}

fn cut(beginning: &[u8], separator: u8) -> Cut {
    let mut records = Records::new(Cursor::new(beginning), Some(separator));
    let mut record = Record::default();
    let mut counts = std::collections::BTreeMap::<usize, usize>::new();
    let mut rows = 0;
    // Where the rows cannot be read on, those before tell.
    while rows < ROWS && records.next(&mut record).unwrap_or(false) {
        if !record.is_blank() {
            rows += 1;
            *counts.entry(record.fields).or_default() += 1;
        }
    }
    let several = counts.iter().filter(|(fields, _)| **fields > 1);
    let most = several.clone().max_by_key(|(fields, alike)| (**alike, **fields));
    Cut {
        separator,
        rows,
        alike: most.map_or(0, |(_, alike)| *alike),
        fields: most.map_or(1, |(fields, _)| *fields),
        divided: several.map(|(_, alike)| *alike).sum(),
    }
}

#[cfg(test)]
mod tests {
    use super::{Why, decide};

    #[test]
    fn the_separator_is_what_cuts_rows_alike() {
        for (text, separator, why) in [
            ("CAS;Name;log Kow\n50-29-3;DDT;6,91\n67-56-1;Methanol;-0,77\n", Some(b';'), Why::Fits),
            (
                "CAS,Name,log Kow\n50-29-3,DDT,6.91\n107-06-2,\"1,2-Dichloroethane\",1.48\n",
                Some(b','),
                Why::Fits,
            ),
            (
                "CAS\tName\tlog Kow\n107-06-2\t1,2-Dichloroethane\t1,48\n71-55-6\t1,1,1-Tri\t2,49\n",
                Some(b'\t'),
                Why::Fits,
            ),
            ("CAS|Name\n50-29-3|DDT\n", Some(b'|'), Why::Fits),
            // Decimal commas in every field, and title lines above.
            ("a;b;c\n1,5;2,5;3,5\n1,0;2,0;3,0\n", Some(b';'), Why::Fits),
            (
                "Inventory of the northern works\n\nCAS;Name;log Kow\n50-29-3;DDT;6,91\n67-56-1;x;-0,77\n",
                Some(b';'),
                Why::Fits,
            ),
            // A comma in the header as in every row.
            ("CAS;log Kow, exp.\n50-29-3;6,91\n67-56-1;-0,77\n", Some(b';'), Why::FitsLike(b',')),
            // Semicolons within the texts of a list with commas.
            (
                "CAS,Name,Other names (a; b)\n64-17-5,Ethanol,alcohol; EtOH\n67-56-1,Methanol,x; y\n",
                Some(b','),
                Why::FitsLike(b';'),
            ),
            // Blank fields at the end left out.
            ("a;b;c;d\n1;2;3\n1;2\n1;2;3;4;5\n1;2;3;4;5;6\n", Some(b';'), Why::Stands),
            ("CAS\n50-29-3\n67-56-1\n", None, Why::None),
            ("Dear colleague,\nplease find the list attached.\nKind regards\n", None, Why::None),
            ("", None, Why::None),
            ("sep=|\na;b|c\n", Some(b'|'), Why::Told),
            ("SEP=;\r\na;b\r\n", Some(b';'), Why::Told),
            ("\"sep=,\"\na,b\n", Some(b','), Why::Told),
            ("sep=\t\na\tb\n", Some(b'\t'), Why::Told),
        ] {
            let found = decide(text.as_bytes());
            assert_eq!((found.separator, found.why), (separator, why), "{text}");
        }
    }
}
