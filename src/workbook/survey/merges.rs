//! Merged ranges across columns, by their first cell: a heading among the rows is often written in one.

use std::collections::BTreeMap;

/// Ranges that are kept; a row whose range is not known is taken for one without.
const MOST_KEPT: usize = 100_000;

/// The merged ranges of a sheet that are two or more columns wide.
#[derive(Debug, Clone, Default, PartialEq, Eq)]
pub struct WideMerges {
    /// By row and first column, the last column.
    ranges: BTreeMap<(u32, u16), u16>,
}

impl WideMerges {
    /// Notes a merged range that begins in `row` and reaches from the column `first` to the column `last`.
    pub fn note(&mut self, row: u32, first: u16, last: u16) {
        if first < last && self.ranges.len() < MOST_KEPT {
            self.ranges.insert((row, first), last);
        }
    }

    /// The last column of the range that begins in this cell.
    pub fn last_column(&self, row: u32, first: u16) -> Option<u16> {
        self.ranges.get(&(row, first)).copied()
    }
}

#[cfg(test)]
mod tests {
    use super::{MOST_KEPT, WideMerges};

    #[test]
    fn a_range_is_known_by_its_first_cell_from_two_columns_on() {
        let mut merges = WideMerges::default();
        merges.note(3, 0, 4);
        merges.note(5, 2, 3);
        merges.note(7, 2, 2);
        merges.note(8, 3, 2);
        assert_eq!([merges.last_column(3, 0), merges.last_column(5, 2)], [Some(4), Some(3)]);
        for (row, column) in [(3, 1), (4, 0), (7, 2), (8, 3)] {
            assert_eq!(merges.last_column(row, column), None, "{row} {column}");
        }
    }

    #[test]
    fn no_more_are_kept_than_a_sheet_can_need() {
        let mut merges = WideMerges::default();
        (0..200_000).for_each(|row| merges.note(row, 0, 1));
        assert_eq!(merges.ranges.len(), MOST_KEPT);
        assert_eq!((merges.last_column(99_999, 0), merges.last_column(100_000, 0)), (Some(1), None));
    }
}
