//! Rows that share a number or a name: how far they agree, and what is said of each.

use std::collections::BTreeMap;

use super::{Entry, Register};
use crate::fault::{Agreement, Contrast, Shared, SharedBy};
use crate::report::RowName;
use crate::workbook::CellRef;

/// Other rows and other values that are named one by one.
const NAMED: usize = 3;
/// Data that are named one by one.
const DATA_NAMED: usize = 6;
/// A name that stands with more different numbers than this is that of a product or a class, not of a substance.
const NUMBERS_OF_A_NAME: usize = 3;

/// Rows that share a number or a name.
#[derive(Debug, Clone)]
pub(crate) struct Group {
    by: SharedBy,
    agreement: Agreement,
    rows: Vec<u32>,
}

/// One row of a group, for the Conflicts sheet.
#[derive(Debug, Clone)]
pub(crate) struct SharedRow {
    /// The place of its sheet.
    pub(crate) sheet: u16,
    /// The row, counted from 0.
    pub(crate) row: u32,
    /// The column of the number or name.
    pub(crate) column: u16,
    /// What the row is called, if that was kept.
    pub(crate) name: RowName,
    /// What it shares, and in what the rows differ.
    pub(crate) shared: Shared,
}

impl Group {
    /// Contradictions first, then what changes a headline, then what differs in data; by CAS number first.
    pub(super) fn rank(&self) -> (Agreement, SharedBy) {
        (self.agreement, self.by)
    }

    /// What the rows share.
    pub(crate) fn by(&self) -> SharedBy {
        self.by
    }

    /// How many rows there are.
    pub(crate) fn len(&self) -> usize {
        self.rows.len()
    }
}

/// What the rows of a group say, compared once for all of them.
struct Compared {
    cas: Vec<String>,
    ec: Vec<String>,
    /// For each rulebook, the first different headlines.
    headlines: Vec<Vec<String>>,
    differing: Vec<&'static str>,
    lacking: Vec<&'static str>,
}

impl Register {
    /// The group of these rows; none where another group says all there is to say.
    pub(super) fn group(&self, by: SharedBy, rows: &[u32]) -> Option<Group> {
        let entries = || rows.iter().filter_map(|place| self.row(*place));
        let cas = distinct(entries().map(|row| row.cas));
        let ec = distinct(entries().map(|row| row.ec));
        let one_cas = cas.len() == 1 && entries().all(|row| row.cas.is_some());
        let one_ec = ec.len() == 1 && entries().all(|row| row.ec.is_some());
        let of_no_substance = cas.len() > NUMBERS_OF_A_NAME || ec.len() > NUMBERS_OF_A_NAME;
        let contradiction = match by {
            SharedBy::Cas => ec.len() > 1,
            SharedBy::Ec if one_cas => return None,
            SharedBy::Ec => cas.len() > 1,
            SharedBy::Name if one_cas || one_ec || of_no_substance => return None,
            SharedBy::Name => cas.len() > 1 || ec.len() > 1,
        };
        let agreement = if contradiction {
            Agreement::OtherNumbers
        } else if by == SharedBy::Name {
            Agreement::Same
        } else if distinct(entries().map(|row| Some(row.headlines))).len() > 1 {
            Agreement::Verdicts
        } else if distinct(entries().map(|row| Some(row.data))).len() > 1 {
            Agreement::Data
        } else {
            Agreement::Same
        };
        Some(Group { by, agreement, rows: rows.to_vec() })
    }

    /// The rows of a group in the order of the inventory, each with what is said of it. `rulebooks` are the short names
    /// of the run's rulebooks.
    pub(crate) fn rows_of<'run>(
        &'run self,
        group: &'run Group,
        rulebooks: &'run [String],
    ) -> impl Iterator<Item = SharedRow> + 'run {
        let compared = self.compare(group, rulebooks.len());
        group.rows.iter().filter_map(move |place| {
            let entry = self.row(*place)?;
            let name = self.details.name(*place);
            let others = group.rows.iter().filter(|other| *other != place).take(NAMED);
            let others = others.filter_map(|other| self.row(*other)).map(|other| self.cell(other, group.by));
            let named = match group.by {
                SharedBy::Cas => entry.cas.map(|number| number.to_string()),
                SharedBy::Ec => entry.ec.map(|number| number.to_string()),
                SharedBy::Name => Some(name.name.clone()),
            };
            let shared = Shared {
                by: group.by,
                named: named.unwrap_or_default(),
                others: others.collect(),
                other_rows: group.rows.len() - 1,
                agreement: group.agreement,
                contrasts: self.contrasts(entry, &compared, rulebooks),
                differing: compared.differing.clone(),
                lacking: compared.lacking.clone(),
            };
            let column = entry.column_of(group.by);
            Some(SharedRow { sheet: entry.sheet, row: entry.row, column, name, shared })
        })
    }

    fn cell(&self, entry: &Entry, by: SharedBy) -> CellRef {
        let sheet = self.sheets.get(usize::from(entry.sheet)).cloned().unwrap_or_default();
        CellRef { sheet, row: entry.row, column: entry.column_of(by) }
    }

    fn compare(&self, group: &Group, rulebooks: usize) -> Compared {
        let entries = || group.rows.iter().filter_map(|place| self.row(*place));
        let headlines = (0..rulebooks).map(|rulebook| {
            distinct(entries().map(|row| self.headlines.get(row.headlines).get(rulebook).cloned()))
        });
        let (differing, lacking) = self.compare_data(group);
        Compared {
            cas: distinct(entries().map(|row| row.cas)).iter().map(ToString::to_string).collect(),
            ec: distinct(entries().map(|row| row.ec)).iter().map(ToString::to_string).collect(),
            headlines: headlines.collect(),
            differing,
            lacking,
        }
    }

    /// Titles of data that differ, and of data that some rows lack, in the order of the first row.
    fn compare_data(&self, group: &Group) -> (Vec<&'static str>, Vec<&'static str>) {
        let entries = group.rows.iter().filter_map(|place| self.row(*place));
        if distinct(entries.map(|row| Some(row.data))).len() < 2 {
            return (Vec::new(), Vec::new());
        }
        let mut order = Vec::new();
        let mut seen: BTreeMap<&'static str, (u32, usize, bool)> = BTreeMap::new();
        for place in &group.rows {
            let Some(data) = self.details.data(*place) else {
                return (vec!["their data"], Vec::new());
            };
            for (title, digest) in data {
                let (first, rows, differs) = seen.entry(title).or_insert_with(|| {
                    order.push(title);
                    (digest, 0, false)
                });
                *rows += 1;
                *differs |= *first != digest;
            }
        }
        let titles = |wanted: &dyn Fn(&(u32, usize, bool)) -> bool| {
            let of = order.iter().filter(|title| seen.get(*title).is_some_and(wanted));
            let mut titles: Vec<&'static str> = of.copied().collect();
            if titles.len() > DATA_NAMED {
                titles.truncate(DATA_NAMED);
                titles.push("other data");
            }
            titles
        };
        (titles(&|(_, _, differs)| *differs), titles(&|(_, rows, _)| *rows < group.rows.len()))
    }

    fn contrasts(&self, entry: &Entry, compared: &Compared, rulebooks: &[String]) -> Vec<Contrast> {
        let headlines = self.headlines.get(entry.headlines);
        let numbers = [
            contrast("CAS number", entry.cas.map(|number| number.to_string()), &compared.cas),
            contrast("EC number", entry.ec.map(|number| number.to_string()), &compared.ec),
        ];
        let verdicts = rulebooks
            .iter()
            .zip(&compared.headlines)
            .enumerate()
            .map(|(place, (short, all))| contrast(short, headlines.get(place).cloned(), all));
        numbers.into_iter().chain(verdicts).flatten().collect()
    }
}

impl Entry {
    fn column_of(&self, by: SharedBy) -> u16 {
        let [cas, ec, name] = self.columns;
        match by {
            SharedBy::Cas => cas,
            SharedBy::Ec => ec,
            SharedBy::Name => name,
        }
    }
}

fn contrast(what: &str, here: Option<String>, all: &[String]) -> Option<Contrast> {
    let there: Vec<String> =
        all.iter().filter(|other| Some(*other) != here.as_ref()).take(NAMED).cloned().collect();
    (!there.is_empty()).then(|| Contrast { what: what.to_owned(), here, there })
}

/// The first different values, as many as are told apart.
fn distinct<Value: PartialEq>(values: impl Iterator<Item = Option<Value>>) -> Vec<Value> {
    let mut seen = Vec::new();
    for value in values.flatten() {
        if seen.len() > NAMED {
            break;
        }
        if !seen.contains(&value) {
            seen.push(value);
        }
    }
    seen
}
