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
    /// Those of them because of which rows were not screened.
    stopping: usize,
    kinds: BTreeMap<&'static str, usize>,
    gathered: Vec<Gathered>,
    known: BTreeMap<Alike, usize>,
    /// Rows without a substance, by what they hold.
    asides: BTreeMap<&'static str, usize>,
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
    /// Counts a fault, or a row without a substance apart. Faults come in the order of the sheets' rows.
    pub fn add(&mut self, fault: &CellFault) {
        let title = fault.kind.wording().title;
        if fault.kind.tells_no_substance() {
            *self.asides.entry(title).or_default() += 1;
            return;
        }
        self.total += 1;
        self.stopping += usize::from(fault.kind.stops_screening());
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

    /// How many rows held no substance.
    pub fn asides(&self) -> usize {
        self.asides.values().sum()
    }

    /// How many rows held no substance and what they hold, in a sentence; none where every row holds one.
    pub fn told_asides(&self, sheet: &str) -> Option<String> {
        let mut asides: Vec<(&str, usize)> =
            self.asides.iter().map(|(title, rows)| (*title, *rows)).collect();
        asides.sort_by_key(|(_, rows)| std::cmp::Reverse(*rows));
        let parts: Vec<String> =
            asides.iter().map(|(title, rows)| count(*rows, title, &format!("{title}s"))).collect();
        (!parts.is_empty()).then(|| {
            format!(
                "{} no substance and {} not screened: {}; each says so in its row, and the sheet `{sheet}` lists them.",
                count(self.asides(), "row holds", "rows hold"),
                if self.asides() == 1 { "was" } else { "were" },
                parts.join(", ")
            )
        })
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
                "{}. {}he sheet `{sheet}` says cell by cell what to do.",
                self.total_by_kind(),
                match self.stopping {
                    0 => "The rows were screened with what remains; t",
                    stopping if stopping == self.total => "T",
                    _ => "The other rows were screened with what remains; t",
                }
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

    #[test]
    fn rows_without_a_substance_are_no_faults_and_are_told_apart() {
        let mut tally = FaultTally::default();
        let of = |kind, row| CellFault { kind, ..fault(row, 0, "Total") };
        tally.add(&of(CellFaultKind::TotalsRow, 1));
        let told = "1 row holds no substance and was not screened: 1 total; each says so in its row, and the sheet \
                    `Conflicts` lists them.";
        assert_eq!(tally.told_asides("Conflicts").as_deref(), Some(told));
        (2..5).for_each(|row| tally.add(&of(CellFaultKind::HeadingRow, row)));
        let told = "4 rows hold no substance and were not screened: 3 headings, 1 total; each says so in its row, and \
                    the sheet `Conflicts` lists them.";
        assert_eq!(tally.told_asides("Conflicts").as_deref(), Some(told));
        assert_eq!((tally.total(), tally.asides(), tally.lines(20, "Conflicts").len()), (0, 4, 0));
        assert_eq!(FaultTally::default().told_asides("Conflicts"), None);
    }

    #[test]
    fn what_is_said_of_the_rows_holds_for_those_that_were_not_screened() {
        let beyond =
            CellFault { kind: CellFaultKind::BeyondHeader { fields: 4, header: 3 }, ..fault(1, 3, "x") };
        let last = |faults: &[CellFault]| {
            let mut tally = FaultTally::default();
            for fault in faults {
                tally.add(fault);
            }
            tally.lines(20, "Conflicts").pop().unwrap_or_default()
        };
        let end = "the sheet `Conflicts` says cell by cell what to do.";
        assert!(
            last(&[fault(1, 2, "x")])
                .ends_with(&format!(". The rows were screened with what remains; {end}"))
        );
        let both = last(&[fault(1, 2, "x"), beyond.clone()]);
        assert!(
            both.ends_with(&format!(". The other rows were screened with what remains; {end}")),
            "{both}"
        );
        assert!(
            last(&[beyond])
                .ends_with("row with too many fields. The sheet `Conflicts` says cell by cell what to do.")
        );
    }
}
