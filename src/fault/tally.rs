//! The faults of a run counted by kind, and gathered where many cells of a column hold the same.

use std::collections::BTreeMap;
use std::sync::Arc;

use super::{CellFault, count};

/// Different faults that are kept one by one; the others are counted by kind.
const GATHERED: usize = 100;

/// The faults of a run, counted.
#[derive(Debug, Clone, PartialEq, Default)]
pub struct FaultTally {
    total: usize,
    kinds: BTreeMap<&'static str, usize>,
    gathered: Vec<Gathered>,
    known: BTreeMap<Alike, usize>,
}

/// A fault and how many more cells of its column hold the same.
#[derive(Debug, Clone, PartialEq)]
struct Gathered {
    first: CellFault,
    more: usize,
}

/// What faults are gathered by: sheet, column, kind and the text as a message shows it.
type Alike = (Arc<str>, u16, &'static str, String);

impl FaultTally {
    /// Counts a fault. Faults come in the order of the sheets' rows.
    pub fn add(&mut self, fault: &CellFault) {
        let title = fault.kind.wording().title;
        self.total += 1;
        *self.kinds.entry(title).or_default() += 1;
        let alike = (Arc::clone(&fault.cell.sheet), fault.cell.column, title, fault.shown().into_owned());
        let known = self.known.get(&alike).copied();
        if let Some(gathered) = known.and_then(|place| self.gathered.get_mut(place)) {
            gathered.more += 1;
        } else if self.gathered.len() < GATHERED {
            self.known.insert(alike, self.gathered.len());
            self.gathered.push(Gathered { first: fault.clone(), more: 0 });
        }
    }

    /// How many cells had a fault.
    pub fn total(&self) -> usize {
        self.total
    }

    /// How many cells had a fault of each kind, the most frequent first.
    pub fn kinds(&self) -> Vec<(&'static str, usize)> {
        let mut kinds: Vec<_> = self.kinds.iter().map(|(title, number)| (*title, *number)).collect();
        kinds.sort_by_key(|(_, number)| std::cmp::Reverse(*number));
        kinds
    }

    /// The first faults, a sentence each, how many cells more there are, and the total by kind with the sheet that lists
    /// them. Nothing where there was no fault.
    pub fn lines(&self, most: usize, sheet: &str) -> Vec<String> {
        let told: Vec<&Gathered> = self.gathered.iter().take(most).collect();
        let mut lines: Vec<String> = told.iter().map(|gathered| gathered.sentence()).collect();
        let more = self.total - told.iter().map(|gathered| 1 + gathered.more).sum::<usize>();
        if more > 0 {
            lines.push(format!("... and {more} more"));
        }
        if self.total > 0 {
            lines.push(format!(
                "{}. The rows were screened with what remains; the sheet `{sheet}` says cell by cell what to do.",
                self.total_by_kind()
            ));
        }
        lines
    }

    /// `12 cells could not be read or used: 8 unknown unit, 4 check digit`.
    fn total_by_kind(&self) -> String {
        let kinds: Vec<String> =
            self.kinds().iter().map(|(title, number)| format!("{number} {title}")).collect();
        format!("{} could not be read or used: {}", count(self.total, "cell", "cells"), kinds.join(", "))
    }
}

impl Gathered {
    fn sentence(&self) -> String {
        match self.more {
            0 => self.first.to_string(),
            more => format!(
                "{} (and {} of this column like it)",
                self.first,
                count(more, "more cell", "more cells")
            ),
        }
    }
}

#[cfg(test)]
mod tests {
    use super::{FaultTally, GATHERED};
    use crate::fault::{CellFault, CellFaultKind};
    use crate::workbook::CellRef;

    fn fault(row: u32, column: u16, found: &str) -> CellFault {
        let cell = CellRef { sheet: "Substances".into(), row, column };
        let kind = CellFaultKind::NotA { what: "log Kow", example: "4.5" };
        CellFault { cell, found: found.to_owned(), kind }
    }

    #[test]
    fn no_fault_is_nothing_to_tell() {
        assert_eq!(FaultTally::default().lines(20, "Conflicts"), Vec::<String>::new());
    }

    #[test]
    fn the_same_text_in_a_column_is_told_once_and_in_another_column_again() {
        let mut tally = FaultTally::default();
        for row in 1..=5000 {
            tally.add(&fault(row, 2, "n/v"));
        }
        tally.add(&fault(7, 3, "n/v"));
        tally.add(&CellFault { kind: CellFaultKind::TooLong, ..fault(8, 2, "n/v") });
        assert_eq!(
            tally.lines(2, "Conflicts"),
            [
                "Substances!C2: `n/v` is no log Kow; write, for example, `4.5` (and 4999 more cells of this column \
                 like it)",
                "Substances!D8: `n/v` is no log Kow; write, for example, `4.5`",
                "... and 1 more",
                "5002 cells could not be read or used: 5001 not a value of its column, 1 text too long. The rows were \
                 screened with what remains; the sheet `Conflicts` says cell by cell what to do."
            ]
        );
    }

    #[test]
    fn beyond_those_that_are_kept_every_cell_still_counts() {
        let mut tally = FaultTally::default();
        for row in 0..1000 {
            tally.add(&fault(row, 2, &format!("x{row}")));
        }
        tally.add(&fault(1000, 2, "x999"));
        tally.add(&fault(1001, 2, "x0"));
        assert_eq!((tally.total(), tally.gathered.len()), (1002, GATHERED));
        assert_eq!(tally.kinds(), [("not a value of its column", 1002)]);
        let lines = tally.lines(20, "Conflicts");
        assert_eq!(lines.len(), 22);
        assert_eq!(lines[20], "... and 981 more", "the last cell is one of the first twenty");
    }
}
