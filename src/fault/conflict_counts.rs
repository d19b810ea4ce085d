//! How much stands apart in an inventory, and what the Conflicts sheet says of it above its list.

use super::count;

/// How much of each kind an inventory holds, and how much of it the Conflicts sheet lists.
#[derive(Debug, Clone, PartialEq, Eq, Default)]
pub struct ConflictCounts {
    /// Cells that could not be read or used.
    pub cells: usize,
    /// Those of them that are listed.
    pub cells_listed: usize,
    /// Rows left aside below the header of another table.
    pub rows_left: usize,
    /// Rows that hold no substance, such as totals and headings.
    pub rows_aside: usize,
    /// Those of them that are listed.
    pub rows_aside_listed: usize,
    /// Remarks on columns and headers.
    pub columns: usize,
    /// Columns that hold data and are not used.
    pub unused: usize,
    /// CAS and EC numbers that stand on more than one row.
    pub numbers: usize,
    /// Names that stand on more than one row without one number that all of these share.
    pub names: usize,
    /// Rows that share a number or a name, once for each.
    pub rows: usize,
    /// Those of them that are listed.
    pub rows_listed: usize,
}

impl ConflictCounts {
    /// What the sheet says above its list.
    pub fn heading(&self) -> Vec<String> {
        let mut found = Vec::new();
        if self.cells > 0 {
            found.push(format!("{} could not be read or used", count(self.cells, "cell", "cells")));
        }
        if self.rows_left > 0 {
            found.push(format!("{} not screened", count(self.rows_left, "row was", "rows were")));
        }
        if self.rows_aside > 0 {
            found.push(format!("{} no substance", count(self.rows_aside, "row holds", "rows hold")));
        }
        if self.columns > 0 {
            found.push(format!(
                "{} in doubt",
                count(self.columns, "column or header is", "columns or headers are")
            ));
        }
        if self.unused > 0 {
            found.push(format!(
                "{} not used",
                count(self.unused, "column with data is", "columns with data are")
            ));
        }
        found.extend(self.repeated());
        if found.is_empty() {
            return vec![
                "Nothing to list: every cell could be read, no row was left aside, no column is in doubt or left unused, and no CAS \
                 number, EC number or name stands on more than one row."
                    .to_owned(),
            ];
        }
        let mut lines = vec![
            format!("{}.", found.join("; ")),
            "Rows are screened alone, each on what could be read of it: nothing that is listed here changed another row."
                .to_owned(),
        ];
        lines.extend(self.cut());
        lines
    }

    /// What stands on more than one row, in a phrase for each of numbers and names.
    pub fn repeated(&self) -> Vec<String> {
        let mut phrases = Vec::new();
        if self.numbers > 0 {
            let numbers = count(self.numbers, "CAS or EC number stands", "CAS or EC numbers stand");
            phrases.push(format!("{numbers} on more than one row"));
        }
        if self.names > 0 {
            let names = count(self.names, "name stands", "names stand");
            phrases.push(format!("{names} on more than one row without one number for all of them"));
        }
        phrases
    }

    fn cut(&self) -> Vec<String> {
        let mut lines = Vec::new();
        if self.cells > self.cells_listed {
            lines.push(format!(
                "Only the first {} of the {} cells are listed; each of the others stands in the Cautions cell of its row.",
                self.cells_listed, self.cells
            ));
        }
        if self.rows_aside > self.rows_aside_listed {
            lines.push(format!(
                "Only the first {} of the {} rows without a substance are listed; each of the others says so itself.",
                self.rows_aside_listed, self.rows_aside
            ));
        }
        if self.rows > self.rows_listed {
            lines.push(format!(
                "Only {} of the {} lines on rows that share a number or a name are listed, the most serious first.",
                self.rows_listed, self.rows
            ));
        }
        lines
    }
}
