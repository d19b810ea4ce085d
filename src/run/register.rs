//! Every screened row by its numbers and its name, so that rows about the same substance are found at the end.
//!
//! A row takes some 60 bytes; its name and what its data are called are kept besides for as many rows as fit in
//! [`DETAIL`]. Rows come in the order of the inventory, so the threads change nothing.

mod details;
mod group;
#[cfg(test)]
mod tests;

use std::collections::BTreeMap;
use std::num::NonZeroU64;
use std::sync::Arc;

use crate::fault::SharedBy;
use crate::run::standing::Standing;
use crate::substance::{CasNumber, EcNumber};
use details::Details;
pub(crate) use group::{Group, SharedRow};

/// A row in few bytes.
#[derive(Debug, Clone)]
struct Entry {
    cas: Option<CasNumber>,
    name: Option<NonZeroU64>,
    ec: Option<EcNumber>,
    row: u32,
    sheet: u16,
    /// The columns of the CAS number, the EC number and the name.
    columns: [u16; 3],
    /// Which set of headlines.
    headlines: u32,
    /// A digest of all data.
    data: u32,
}

/// Bytes of names and digests that are kept; 200,000 rows and more of a usual inventory.
const DETAIL: usize = 48 << 20;

/// The screened rows of a run.
#[derive(Debug)]
pub(crate) struct Register {
    /// The names of the sheets.
    sheets: Vec<Arc<str>>,
    rows: Vec<Entry>,
    headlines: Headlines,
    details: Details,
}

/// The sets of headlines that rows had, each once: there are few.
#[derive(Debug, Default)]
struct Headlines {
    known: BTreeMap<Vec<String>, u32>,
    sets: Vec<Vec<String>>,
}

impl Headlines {
    fn number_of(&mut self, set: Vec<String>) -> u32 {
        let next = u32::try_from(self.sets.len()).unwrap_or(u32::MAX);
        if let Some(known) = self.known.get(&set) {
            return *known;
        }
        self.sets.push(set.clone());
        self.known.insert(set, next);
        next
    }

    fn get(&self, number: u32) -> &[String] {
        usize::try_from(number).ok().and_then(|number| self.sets.get(number)).map_or(&[], Vec::as_slice)
    }
}

impl Register {
    /// A register of no rows yet, for sheets of these names.
    pub(crate) fn new(sheets: Vec<Arc<str>>) -> Self {
        let details = Details::with_room(DETAIL);
        Self { sheets, rows: Vec::new(), headlines: Headlines::default(), details }
    }

    /// Takes the next screened row.
    pub(crate) fn add(&mut self, sheet: u16, row: u32, standing: Standing) {
        let Standing { name, cas, ec, folded_name, headlines, data } = standing;
        if cas.is_none() && ec.is_none() && folded_name.is_none() {
            return;
        }
        let column = |of: Option<u16>| of.unwrap_or(0);
        let entry = Entry {
            cas: cas.map(|(number, _)| number),
            ec: ec.map(|(number, _)| number),
            name: folded_name.map(|(digest, _)| digest),
            row,
            sheet,
            columns: [
                column(cas.map(|(_, column)| column)),
                column(ec.map(|(_, column)| column)),
                column(folded_name.map(|(_, column)| column)),
            ],
            headlines: self.headlines.number_of(headlines),
            data: details::digest_of(&data),
        };
        self.details.add(&name, &data);
        self.rows.push(entry);
    }

    /// The groups of rows that share a number or a name, the most serious first, each kind in the order of its first row.
    pub(crate) fn groups(&self) -> Vec<Group> {
        let mut groups = self.groups_by(SharedBy::Cas, |row| row.cas);
        groups.extend(self.groups_by(SharedBy::Ec, |row| row.ec));
        groups.extend(self.groups_by(SharedBy::Name, |row| row.name));
        // Sorting keeps the order of groups that rank alike.
        groups.sort_by_key(Group::rank);
        groups
    }

    fn groups_by<Key: Ord>(&self, by: SharedBy, key: impl Fn(&Entry) -> Option<Key>) -> Vec<Group> {
        let key_of = |place: &u32| self.row(*place).and_then(&key);
        let all = 0..u32::try_from(self.rows.len()).unwrap_or(u32::MAX);
        let mut order: Vec<u32> = all.filter(|place| key_of(place).is_some()).collect();
        order.sort_by_key(key_of);
        let alike = order.chunk_by(|one, other| key_of(one) == key_of(other));
        alike.filter(|rows| rows.len() > 1).filter_map(|rows| self.group(by, rows)).collect()
    }

    fn row(&self, place: u32) -> Option<&Entry> {
        self.rows.get(usize::try_from(place).ok()?)
    }
}
