//! Where the table of a sheet ends: rows are told apart by the headers above them, in the order they are read.

use rayon::iter::{IntoParallelRefIterator, ParallelIterator};

use crate::columns::{ColumnWords, HeaderAgain};
use crate::run::plan::SheetPlan;
use crate::workbook::Row;

/// A row's place among the headers of its sheet.
#[derive(Debug, Clone, Copy, PartialEq, Eq)]
pub(crate) enum RowPlace {
    /// Above the data or in the table that is screened.
    InTable,
    /// The header of that table once more.
    RepeatedHeader,
    /// The header of another table.
    SecondHeader,
    /// Below the header of another table, in the row named here, counted from 0.
    BelowSecondHeader(u32),
}

/// What is known of a sheet's tables from the rows so far.
#[derive(Debug, Default)]
pub(crate) struct Tables {
    second_header: Option<u32>,
}

impl Tables {
    /// The place of each of these rows, the next ones of the sheet. Headers are looked for on all threads of the pool
    /// this is called in.
    pub(crate) fn place(
        &mut self,
        rows: Vec<Row>,
        sheet: &SheetPlan,
        words: &ColumnWords,
    ) -> Vec<(Row, RowPlace)> {
        let headers: Vec<HeaderAgain> = match (&sheet.screened, self.second_header) {
            (Some(screened), None) => {
                rows.par_iter().map(|row| screened.recognised.header_again(row, words)).collect()
            }
            (Some(_) | None, _) => vec![HeaderAgain::No; rows.len()],
        };
        rows.into_iter()
            .zip(headers)
            .map(|(row, header)| {
                let place = self.place_of(&row, header);
                (row, place)
            })
            .collect()
    }

    fn place_of(&mut self, row: &Row, header: HeaderAgain) -> RowPlace {
        if let Some(second) = self.second_header {
            return RowPlace::BelowSecondHeader(second);
        }
        match header {
            HeaderAgain::No => RowPlace::InTable,
            HeaderAgain::Repeated => RowPlace::RepeatedHeader,
            HeaderAgain::Other => {
                self.second_header = Some(row.index);
                RowPlace::SecondHeader
            }
        }
    }
}
