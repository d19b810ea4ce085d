//! Writes the Conflicts sheet line by line.

use std::sync::Arc;

use super::columns::headers_of;
use super::{About, Item, Written};
use crate::fault::{Conflict, ConflictCounts, Refusal, Wording};
use crate::report::{CONFLICT_COLUMNS, ConflictLine, Entry, RowName, conflict_entries};
use crate::run::plan::SheetPlan;
use crate::run::register::SharedRow;
use crate::run::sheets::{SheetWriter, write_line};
use crate::workbook::{AnnotatedWorkbook, CellRef, Look, Visibility};

const NAME: &str = "Conflicts";

/// Lines whose rows are made high enough for their sentences: each such row stays in memory until the end.
const LINES_FITTED: u32 = 20_000;

/// The sheet in the making.
pub(super) struct ConflictsSheet<'run> {
    workbook: &'run mut AnnotatedWorkbook,
    writer: SheetWriter,
    header_row: u32,
    plans: &'run [SheetPlan],
    /// The names of the inventory's sheets in the output.
    names: Vec<Arc<str>>,
}

impl<'run> ConflictsSheet<'run> {
    /// Adds the sheet and writes what stands above its list.
    pub(super) fn begin(
        workbook: &'run mut AnnotatedWorkbook,
        written: Written<'run>,
        counts: &ConflictCounts,
    ) -> Result<Self, Refusal> {
        let names = written.ids.iter().map(|id| Arc::from(workbook.sheet_name(*id))).collect();
        let sheet = workbook.add_sheet(NAME, Visibility::Visible)?;
        for (column, (_, width)) in (0u16..).zip(CONFLICT_COLUMNS) {
            workbook.set_column_width(sheet, column, column, width)?;
        }
        workbook.print_across(sheet, None)?;
        let mut writer = SheetWriter { name: NAME, sheet, next_row: 0, part: 1 };
        for line in counts.heading() {
            write_line(workbook, &mut writer, &[Entry::text(line, Look::Text)])?;
        }
        Ok(Self { workbook, header_row: writer.next_row, writer, plans: written.plans, names })
    }

    /// The name the sheet got.
    pub(super) fn name(&self) -> String {
        self.workbook.sheet_name(self.writer.sheet).to_owned()
    }

    /// Writes the header of the list.
    pub(super) fn write_header(&mut self) -> Result<(), Refusal> {
        let header = CONFLICT_COLUMNS.map(|(header, _)| Entry::text(header, Look::Header));
        write_line(self.workbook, &mut self.writer, &header)?;
        self.workbook.freeze(self.writer.sheet, self.writer.next_row, 0)?;
        self.workbook.print_across(self.writer.sheet, Some(self.header_row))?;
        Ok(())
    }

    /// Writes the line of something that is about one place.
    pub(super) fn write_item(&mut self, item: &Item) -> Result<(), Refusal> {
        let cell = self.cell(item.sheet, item.row, item.column);
        match &item.about {
            About::Cell(line) => {
                let header = self.header_of(item.sheet, item.column);
                let wording = line.fault.kind.wording();
                let found = line.fault.shown();
                let wording = Wording { wrong: format!("`{found}` {}", wording.wrong), ..wording };
                self.write(&cell, line.row.as_deref(), header, &found, &wording)
            }
            About::Sheet(conflict) => {
                let header = match conflict {
                    Conflict::Columns { .. } | Conflict::Unused { .. } => {
                        self.header_of(item.sheet, item.column)
                    }
                    Conflict::RowsLeftAside { .. } | Conflict::Header { .. } | Conflict::Shared(_) => "",
                };
                self.write(&cell, None, header, "", &conflict.wording())
            }
        }
    }

    /// Writes the line of a row that shares its number or name.
    pub(super) fn write_shared(&mut self, row: SharedRow) -> Result<(), Refusal> {
        let SharedRow { sheet, row, column, name, shared } = row;
        let sheet = usize::from(sheet);
        let cell = self.cell(sheet, row, column);
        let header = self.header_of(sheet, column);
        let found = shared.named.clone();
        self.write(&cell, Some(&name), header, &found, &Conflict::Shared(shared).wording())
    }

    /// Gives the list its filter buttons.
    pub(super) fn finish(self) -> Result<(), Refusal> {
        let last_row = self.writer.next_row.saturating_sub(1);
        let last_column = u16::try_from(CONFLICT_COLUMNS.len()).unwrap_or(u16::MAX).saturating_sub(1);
        self.workbook.filter(self.writer.sheet, self.header_row, last_row, last_column)?;
        Ok(())
    }

    fn write(
        &mut self,
        cell: &CellRef,
        row: Option<&RowName>,
        header: &str,
        found: &str,
        wording: &Wording,
    ) -> Result<(), Refusal> {
        let fitted = self.writer.next_row <= LINES_FITTED;
        let sentences = if fitted { Look::Wrapped } else { Look::Aside };
        let line = ConflictLine { cell, row, header, found, wording };
        write_line(self.workbook, &mut self.writer, &conflict_entries(&line, sentences))
    }

    fn cell(&self, sheet: usize, row: u32, column: u16) -> CellRef {
        CellRef { sheet: self.names.get(sheet).cloned().unwrap_or_default(), row, column }
    }

    fn header_of(&self, sheet: usize, column: u16) -> &'run str {
        let screened = self.plans.get(sheet).and_then(|plan| plan.screened.as_ref());
        let known = screened
            .and_then(|screened| headers_of(&screened.recognised).find(|(index, _)| *index == column));
        known.map_or("", |(_, header)| header)
    }
}
