//! Writing a run: the user's sheets row by row, then the added sheets.

use std::collections::BTreeMap;

use crate::fault::{ConflictCounts, Refusal};
use crate::judge::Verdict;
use crate::report::{
    Entry, RECORD_SHEET, ReasoningMode, RunFacts, SheetFacts, record_head, rulebooks_table, run_record_table,
    unscreened_entries,
};
use crate::rules::RuleSet;
use crate::run::conflicts::{Conflicts, Written};
use crate::run::judged_row::{Added, JudgedRow, Outcome};
use crate::run::plan::{Plan, SheetPlan};
use crate::run::sheets::{
    SheetWriter, lay_out_added, new_reasoning_sheet, span, write_entry, write_line, write_table,
};
use crate::run::summing_up::{
    column_remarks, hidden, options, rows_aside, unreached, unrecognised, without_rows,
};
use crate::run::{ScreenSettings, Summary};
use crate::workbook::{AnnotatedWorkbook, Inventory, Look, SheetId, Value, Visibility, fingerprint_of_text};

/// Rows of a sheet, less the header.
const LINES_A_SHEET: u32 = 1_048_575;

/// The annotated workbook in the making, and the counts of the run.
pub(crate) struct Output {
    workbook: AnnotatedWorkbook,
    sheets: Vec<SheetId>,
    reasoning: Option<SheetWriter>,
    record: SheetWriter,
    screened: Vec<usize>,
    /// For each sheet, the row of another table's header and how many rows were left aside below it.
    unscreened: Vec<Option<(u32, usize)>>,
    /// Rows whose values may stand in wrong columns.
    left_aside: usize,
    headlines: Vec<(BTreeMap<Verdict, usize>, usize)>,
    reached: Vec<bool>,
    conflicts: Conflicts,
}

impl Output {
    pub(crate) fn create(
        settings: &ScreenSettings,
        inventory: &Inventory,
        plan: &Plan,
        rules: &RuleSet,
    ) -> Result<Self, Refusal> {
        let appearances = inventory.appearances();
        let mut workbook = AnnotatedWorkbook::create(
            &settings.output,
            &[&settings.inventory],
            settings.overwrite,
            settings.date,
            appearances,
        )?;
        let mut sheets = Vec::new();
        for (sheet, survey) in plan.sheets.iter().zip(inventory.sheets()) {
            let id = workbook.add_sheet(&sheet.name, survey.visibility)?;
            for layout in &survey.column_widths {
                workbook.set_columns(id, *layout)?;
            }
            for (column, width) in &sheet.widths {
                workbook.set_column_width(id, *column, *column, *width)?;
            }
            lay_out_added(&mut workbook, id, sheet)?;
            sheets.push(id);
        }
        let reasoning = match plan.reasoning {
            ReasoningMode::All | ReasoningMode::Concern => Some(new_reasoning_sheet(&mut workbook, 1)?),
            ReasoningMode::None => None,
        };
        let record = SheetWriter {
            name: RECORD_SHEET,
            sheet: workbook.add_sheet(RECORD_SHEET, Visibility::VeryHidden)?,
            next_row: 0,
            part: 1,
        };
        let mut output = Self {
            workbook,
            sheets,
            reasoning,
            record,
            screened: vec![0; plan.sheets.len()],
            unscreened: vec![None; plan.sheets.len()],
            left_aside: 0,
            headlines: vec![(BTreeMap::new(), 0); rules.rulebooks.len()],
            reached: Vec::new(),
            conflicts: Conflicts::new(plan.sheets.iter().map(|sheet| sheet.name.clone()).collect()),
        };
        let spans: Vec<_> = plan.sheets.iter().filter_map(span).collect();
        for row in record_head(rules, &spans) {
            output.write_record(&row)?;
        }
        Ok(output)
    }

    pub(crate) fn write_row(&mut self, sheet: &SheetPlan, row: JudgedRow) -> Result<(), Refusal> {
        let Some(id) = self.sheets.get(sheet.index).copied() else {
            return Ok(());
        };
        let index = row.row.index;
        if sheet.wraps(index) {
            self.workbook.write_wrapped_row(id, &row.row)?;
        } else {
            self.workbook.write_row(id, &row.row)?;
        }
        let Some(screened) = &sheet.screened else {
            return Ok(());
        };
        if index == screened.recognised.header_row {
            for (column, header) in (screened.first_added..).zip(&screened.added.headers) {
                self.workbook.write(id, index, column, &Value::Text(header), Look::Header)?;
            }
        }
        let added = &screened.added;
        if let Outcome::Screened(_) = &row.outcome {
            self.conflicts.take_cells(sheet.index, &row.row);
        }
        match row.outcome {
            Outcome::Copied => {}
            Outcome::Screened(row) => {
                if let Some(count) = self.screened.get_mut(sheet.index) {
                    *count += 1;
                }
                self.write_added(id, index, screened.first_added, &row.entries)?;
                self.count(sheet.index, index, *row)?;
            }
            Outcome::SecondHeader(fault) => {
                if let Some(unscreened) = self.unscreened.get_mut(sheet.index) {
                    *unscreened = Some((index, 0));
                }
                let why = unscreened_entries(added, &fault.to_string());
                self.write_added(id, index, screened.first_added, &why)?;
                self.conflicts.take_faults(sheet.index, vec![fault], None);
            }
            Outcome::LeftAside(fault) => {
                self.left_aside += usize::from(!fault.kind.tells_no_substance());
                let why = unscreened_entries(added, &fault.to_string());
                self.write_added(id, index, screened.first_added, &why)?;
                self.conflicts.take_faults(sheet.index, vec![fault], None);
            }
            Outcome::BelowSecondHeader(header) => {
                if let Some(Some((_, left))) = self.unscreened.get_mut(sheet.index) {
                    *left += 1;
                }
                let why = format!("row {} is the header of another table", header + 1);
                self.write_added(id, index, screened.first_added, &unscreened_entries(added, &why))?;
            }
        }
        Ok(())
    }

    fn write_added(&mut self, id: SheetId, row: u32, first: u16, entries: &[Entry]) -> Result<(), Refusal> {
        for (column, entry) in (first..).zip(entries) {
            write_entry(&mut self.workbook, id, row, column, entry)?;
        }
        Ok(())
    }

    fn count(&mut self, sheet: usize, row: u32, added: Added) -> Result<(), Refusal> {
        for line in &added.lines {
            self.write_reasoning(line)?;
        }
        self.write_record(&added.record)?;
        for ((counts, listed), verdict) in self.headlines.iter_mut().zip(added.headlines) {
            match verdict {
                Some(verdict) => *counts.entry(verdict).or_default() += 1,
                None => *listed += 1,
            }
        }
        if self.reached.len() < added.reached.len() {
            self.reached.resize(added.reached.len(), false);
        }
        for (so_far, reached) in self.reached.iter_mut().zip(added.reached) {
            *so_far |= reached;
        }
        self.conflicts.take_faults(sheet, added.faults, Some(&added.standing.name));
        self.conflicts.take_row(sheet, row, added.standing);
        Ok(())
    }

    fn write_reasoning(&mut self, line: &[Entry]) -> Result<(), Refusal> {
        let Some(writer) = &mut self.reasoning else {
            return Ok(());
        };
        if writer.next_row > LINES_A_SHEET {
            *writer = new_reasoning_sheet(&mut self.workbook, writer.part + 1)?;
        }
        write_line(&mut self.workbook, writer, line)
    }

    fn write_record(&mut self, line: &[Entry]) -> Result<(), Refusal> {
        if self.record.next_row > LINES_A_SHEET {
            let part = self.record.part + 1;
            let sheet =
                self.workbook.add_sheet(&format!("{} {part}", self.record.name), Visibility::VeryHidden)?;
            self.record = SheetWriter { name: self.record.name, sheet, next_row: 0, part };
        }
        write_line(&mut self.workbook, &mut self.record, line)
    }

    /// Writes the added sheets, puts the workbook in its place and sums the run up.
    pub(crate) fn finish(
        mut self,
        settings: &ScreenSettings,
        inventory: &Inventory,
        plan: &Plan,
        rules: &RuleSet,
    ) -> Result<Summary, Refusal> {
        let written = Written { plans: &plan.sheets, ids: &self.sheets, unscreened: &self.unscreened, rules };
        let (conflicts_sheet, conflicts) = self.conflicts.write(&mut self.workbook, written)?;
        write_table(&mut self.workbook, &rulebooks_table(rules))?;
        let facts = self.facts(settings, inventory, plan, rules, (&conflicts_sheet, &conflicts));
        write_table(&mut self.workbook, &run_record_table(&facts, rules))?;
        self.workbook.finish()?;
        let copied = plan.sheets.iter().filter(|sheet| sheet.screened.is_none()).count();
        Ok(Summary {
            output: settings.output.clone(),
            screened: self.screened.iter().sum(),
            unscreened: plan
                .sheets
                .iter()
                .zip(&self.unscreened)
                .filter_map(|(sheet, left)| left.map(|(row, left)| (sheet.name.to_string(), row + 1, left)))
                .collect(),
            sheets: (plan.sheets.len() - copied, copied),
            headlines: rules
                .rulebooks
                .iter()
                .zip(self.headlines)
                .map(|(rulebook, (counts, listed))| (rulebook.short.clone(), counts, listed))
                .collect(),
            unreached: unreached(rules, &self.reached),
            column_remarks: column_remarks(plan),
            unrecognised: unrecognised(plan),
            how_read: facts.how_read,
            rows_aside: facts.rows_aside,
            hidden: hidden(plan),
            without_rows: without_rows(plan, &self.screened),
            not_carried: facts.not_carried,
            tally: self.conflicts.tally().clone(),
            faults: self.conflicts.into_faults(),
            conflicts_sheet,
            conflicts,
        })
    }

    fn facts(
        &self,
        settings: &ScreenSettings,
        inventory: &Inventory,
        plan: &Plan,
        rules: &RuleSet,
        (conflicts_sheet, conflicts): (&str, &ConflictCounts),
    ) -> RunFacts {
        let file_name = settings.inventory.file_name().map(|name| name.to_string_lossy().into_owned());
        RunFacts {
            date: settings.date,
            inventory: file_name.unwrap_or_default(),
            fingerprint: inventory.fingerprint().to_owned(),
            options: options(settings),
            rule_fingerprints: rules
                .texts
                .iter()
                .map(|rule| (rule.name.clone(), fingerprint_of_text(&rule.text)))
                .collect(),
            sheets: plan
                .sheets
                .iter()
                .zip(self.screened.iter().zip(&self.unscreened))
                .map(|(sheet, (screened, unscreened))| SheetFacts {
                    name: sheet.name.to_string(),
                    hidden: sheet.hidden(),
                    screened: *screened,
                    unscreened: *unscreened,
                    recognised: sheet.screened.as_ref().map(|screened| screened.recognised.clone()),
                    copied_because: sheet.copied_because.clone(),
                })
                .collect(),
            how_read: inventory.how_read().to_vec(),
            rows_aside: rows_aside(self.left_aside, self.conflicts.tally().told_asides(conflicts_sheet)),
            not_carried: inventory.not_carried().to_vec(),
            reasoning: match plan.reasoning {
                ReasoningMode::All => "a line for every row, rulebook and criterion".to_owned(),
                ReasoningMode::Concern => {
                    "only lines at `unresolved` or above; `--reasoning all` writes every line".to_owned()
                }
                ReasoningMode::None => "not written (`--reasoning none`)".to_owned(),
            },
            fault_kinds: self.conflicts.tally().kinds(),
            conflicts: conflicts.clone(),
            conflicts_sheet: conflicts_sheet.to_owned(),
        }
    }
}
