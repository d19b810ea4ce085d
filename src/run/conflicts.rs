//! Collects what the Conflicts sheet lists, and writes it when all rows are done.

mod columns;
mod sheet;

use std::sync::Arc;

use crate::columns::Recognised;
use crate::fault::{CellFault, Conflict, ConflictCounts, FaultTally, Refusal, SharedBy};
use crate::report::RowName;
use crate::rules::RuleSet;
use crate::run::plan::SheetPlan;
use crate::run::register::{Group, Register};
use crate::run::standing::Standing;
use crate::workbook::{AnnotatedWorkbook, Row, SheetId};
use columns::{FilledColumns, columns_apart};
use sheet::ConflictsSheet;

/// Cells that are listed; the others are counted by kind and stand in the Cautions cell of their row.
const CELLS_LISTED: usize = 100_000;
/// Lines on rows that share a number or a name.
const ROWS_LISTED: usize = 50_000;
/// Characters of a text that are kept; more than a message shows.
const TEXT_KEPT: usize = 80;

/// What was found so far.
#[derive(Debug)]
pub(crate) struct Conflicts {
    cells: Vec<CellLine>,
    tally: FaultTally,
    register: Register,
    /// For each sheet.
    filled: Vec<FilledColumns>,
}

#[derive(Debug)]
struct CellLine {
    sheet: usize,
    fault: CellFault,
    row: Option<Arc<RowName>>,
}

/// What is about one place of the inventory.
struct Item<'run> {
    sheet: usize,
    row: u32,
    column: u16,
    about: About<'run>,
}

enum About<'run> {
    Cell(&'run CellLine),
    Sheet(Conflict),
}

/// Where the sheets of the run are, and what was left aside on each.
#[derive(Clone, Copy)]
pub(crate) struct Written<'run> {
    pub(crate) plans: &'run [SheetPlan],
    pub(crate) ids: &'run [SheetId],
    /// The row of another table's header, counted from 0, and how many rows were left aside below it.
    pub(crate) unscreened: &'run [Option<(u32, usize)>],
    pub(crate) rules: &'run RuleSet,
}

impl Conflicts {
    /// Nothing yet, for sheets of these names.
    pub(crate) fn new(sheets: Vec<Arc<str>>) -> Self {
        let filled = vec![FilledColumns::default(); sheets.len()];
        Self { cells: Vec::new(), tally: FaultTally::default(), register: Register::new(sheets), filled }
    }

    /// Takes the faults of a row, which `row` names if it was screened.
    pub(crate) fn take_faults(&mut self, sheet: usize, faults: Vec<CellFault>, row: Option<&Arc<RowName>>) {
        for mut fault in faults {
            self.tally.add(&fault);
            if self.cells.len() < CELLS_LISTED {
                if let Some((end, _)) = fault.found.char_indices().nth(TEXT_KEPT) {
                    fault.found.truncate(end);
                }
                fault.found.shrink_to_fit();
                self.cells.push(CellLine { sheet, fault, row: row.cloned() });
            }
        }
    }

    /// Notes which columns of a screened row hold something.
    pub(crate) fn take_cells(&mut self, sheet: usize, row: &Row) {
        if let Some(filled) = self.filled.get_mut(sheet) {
            filled.take(row);
        }
    }

    /// Takes a screened row, in the order of the inventory.
    pub(crate) fn take_row(&mut self, sheet: usize, row: u32, standing: Standing) {
        self.register.add(u16::try_from(sheet).unwrap_or(u16::MAX), row, standing);
    }

    /// The faults, counted.
    pub(crate) fn tally(&self) -> &FaultTally {
        &self.tally
    }

    /// The faults with their wording, the first of them; rows without a substance are none.
    pub(crate) fn into_faults(self) -> Vec<CellFault> {
        let faults = self.cells.into_iter().map(|line| line.fault);
        faults.filter(|fault| !fault.kind.tells_no_substance()).collect()
    }

    /// Writes the sheet; its name in the output, and what it counts.
    pub(crate) fn write(
        &self,
        workbook: &mut AnnotatedWorkbook,
        written: Written,
    ) -> Result<(String, ConflictCounts), Refusal> {
        let groups = self.register.groups();
        let apart = self.columns_apart(written);
        let counts = self.counts(written, &groups, &apart);
        let mut sheet = ConflictsSheet::begin(workbook, written, &counts)?;
        let name = sheet.name();
        if counts == ConflictCounts::default() {
            return Ok((name, counts));
        }
        sheet.write_header()?;
        for item in self.in_order(written, apart) {
            sheet.write_item(&item)?;
        }
        let rulebooks: Vec<String> = written.rules.rulebooks.iter().map(|book| book.short.clone()).collect();
        let mut left = ROWS_LISTED;
        for group in &groups {
            for row in self.register.rows_of(group, &rulebooks).take(left) {
                left -= 1;
                sheet.write_shared(row)?;
            }
        }
        sheet.finish()?;
        Ok((name, counts))
    }

    fn counts(&self, written: Written, groups: &[Group], apart: &[Item]) -> ConflictCounts {
        let of_numbers = |group: &&Group| match group.by() {
            SharedBy::Cas | SharedBy::Ec => true,
            SharedBy::Name => false,
        };
        let numbers = groups.iter().filter(of_numbers).count();
        let rows = groups.iter().map(Group::len).sum::<usize>();
        let unused =
            apart.iter().filter(|item| matches!(item.about, About::Sheet(Conflict::Unused { .. }))).count();
        let aside_listed = self.cells.iter().filter(|line| line.fault.kind.tells_no_substance()).count();
        ConflictCounts {
            cells: self.tally.total(),
            cells_listed: self.cells.len() - aside_listed,
            rows_left: written.unscreened.iter().flatten().map(|(_, left)| left).sum(),
            rows_aside: self.tally.asides(),
            rows_aside_listed: aside_listed,
            columns: apart.len() - unused,
            unused,
            numbers,
            names: groups.len() - numbers,
            rows,
            rows_listed: rows.min(ROWS_LISTED),
        }
    }

    /// Doubtful headers and columns, and columns that are not used.
    fn columns_apart<'run>(&self, written: Written) -> Vec<Item<'run>> {
        let mut items = Vec::new();
        for (sheet, recognised) in written.recognised() {
            let name = written.plans.get(sheet).map_or("", |plan| &*plan.name);
            let filled = self.filled.get(sheet).cloned().unwrap_or_default();
            items.extend(columns_apart(name, recognised, &filled).into_iter().map(|(column, conflict)| {
                Item {
                    sheet,
                    row: recognised.header_row,
                    column: column.unwrap_or(0),
                    about: About::Sheet(conflict),
                }
            }));
        }
        items
    }

    /// What is about one place of the inventory, in its order.
    fn in_order<'run>(&'run self, written: Written<'run>, apart: Vec<Item<'run>>) -> Vec<Item<'run>> {
        let mut items = apart;
        items.extend(self.cells.iter().map(|line| Item {
            sheet: line.sheet,
            row: line.fault.cell.row,
            column: line.fault.cell.column,
            about: About::Cell(line),
        }));
        for (sheet, left) in written.unscreened.iter().enumerate() {
            if let Some((header, rows @ 1..)) = *left {
                let conflict = Conflict::RowsLeftAside { rows, header: header + 1 };
                items.push(Item { sheet, row: header + 1, column: 0, about: About::Sheet(conflict) });
            }
        }
        items.sort_by_key(|item| (item.sheet, item.row, item.column));
        items
    }
}

impl<'run> Written<'run> {
    fn recognised(self) -> impl Iterator<Item = (usize, &'run Recognised)> {
        let plans = self.plans.iter().enumerate();
        plans.filter_map(|(sheet, plan)| Some((sheet, &plan.screened.as_ref()?.recognised)))
    }
}
