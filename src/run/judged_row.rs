//! One row from cells to the cells, lines and counts that come out of it.

use crate::columns::second_header_fault;
use crate::evidence::gather_evidence;
use crate::fault::{CellFault, CellFaultKind};
use crate::judge::{Judge, Judgement, TestOutcome, Verdict};
use crate::reasoning::{Told, headline_verdict};
use crate::report::{Entry, ReasoningMode, added_entries, reasoning_entries, record_entries};
use crate::rules::RuleSet;
use crate::run::plan::{Screened, SheetPlan};
use crate::run::standing::Standing;
use crate::run::tables::RowPlace;
use crate::workbook::{Cell, CellContent, CellRef, Row};

/// A row with what is written for it.
#[derive(Debug)]
pub struct JudgedRow {
    /// The user's cells.
    pub(crate) row: Row,
    /// What is written beside them.
    pub(crate) outcome: Outcome,
}

/// What became of a row.
#[derive(Debug)]
pub(crate) enum Outcome {
    /// Nothing is added: rows above the data, blank rows, repeated headers and sheets that are only copied.
    Copied,
    /// It was screened.
    Screened(Box<Added>),
    /// It is the header of another table.
    SecondHeader(CellFault),
    /// It stands below the header of another table, in the row named here, counted from 0.
    BelowSecondHeader(u32),
    /// It holds no substance, or has more fields than the header, so that its values may stand in wrong columns.
    LeftAside(CellFault),
}

/// What is added for a screened row.
#[derive(Debug)]
pub(crate) struct Added {
    /// The added cells.
    pub(crate) entries: Vec<Entry>,
    /// The lines of the Reasoning sheet.
    pub(crate) lines: Vec<Vec<Entry>>,
    /// The line of the Record.
    pub(crate) record: Vec<Entry>,
    /// The verdict of each rulebook's headline; none where the row is listed.
    pub(crate) headlines: Vec<Option<Verdict>>,
    /// For each test of the rule set, in order, whether the row had a value for it.
    pub(crate) reached: Vec<bool>,
    /// Cells that could not be read.
    pub(crate) faults: Vec<CellFault>,
    /// What it is held against other rows by, at the end.
    pub(crate) standing: Standing,
}

/// Takes one row its whole way.
pub(crate) fn judge_row(
    (row, place): (Row, RowPlace),
    sheet: &SheetPlan,
    reasoning: ReasoningMode,
    judge: &Judge,
) -> JudgedRow {
    let Some(screened) = &sheet.screened else {
        return JudgedRow { row, outcome: Outcome::Copied };
    };
    let outcome = match place {
        RowPlace::InTable if holds_data(&row, screened) => {
            match beyond_header(&row, sheet, screened).or_else(|| screened.reader.no_substance(&row)) {
                Some(fault) => Outcome::LeftAside(fault),
                None => Outcome::Screened(Box::new(screen_row(&row, screened, reasoning, judge))),
            }
        }
        RowPlace::SecondHeader => {
            second_header_fault(&sheet.name, &row).map_or(Outcome::Copied, Outcome::SecondHeader)
        }
        RowPlace::BelowSecondHeader(header) if row.cells.iter().any(Cell::is_filled) => {
            Outcome::BelowSecondHeader(header)
        }
        RowPlace::InTable | RowPlace::RepeatedHeader | RowPlace::BelowSecondHeader(_) => Outcome::Copied,
    };
    JudgedRow { row, outcome }
}

fn holds_data(row: &Row, screened: &Screened) -> bool {
    row.index >= screened.recognised.first_data_row
        && screened.recognised.columns.iter().filter_map(|column| row.cell(column.index)).any(Cell::is_filled)
}

/// The first filled field to the right of the header's last one.
fn beyond_header(row: &Row, sheet: &SheetPlan, screened: &Screened) -> Option<CellFault> {
    let header = screened.header_fields?;
    let cell = row.cells.iter().find(|cell| usize::from(cell.column) >= header && cell.is_filled())?;
    let found = match &cell.content {
        CellContent::Text(text) | CellContent::Error(text) => text.clone(),
        CellContent::Empty | CellContent::Number(_) | CellContent::Boolean(_) | CellContent::DateTime(_) => {
            String::new()
        }
    };
    Some(CellFault {
        cell: CellRef { sheet: sheet.name.clone(), row: row.index, column: cell.column },
        found,
        kind: CellFaultKind::BeyondHeader { fields: usize::from(cell.column) + 1, header },
    })
}

fn screen_row(row: &Row, screened: &Screened, reasoning: ReasoningMode, judge: &Judge) -> Added {
    let rules = judge.rules();
    let substance = screened.reader.read(row);
    let evidence = gather_evidence(&substance, &rules.relations);
    let judgement = judge.judge(&substance, &evidence);
    let told = Told { substance: &substance, evidence: &evidence, rules, judgement: &judgement };
    let added = Added {
        entries: added_entries(told, &substance.faults),
        lines: reasoning_entries(told, reasoning),
        record: record_entries(told),
        headlines: told.books().map(headline_verdict).collect(),
        reached: reached(rules, &judgement),
        faults: Vec::new(),
        standing: Standing::of(told),
    };
    Added { faults: substance.faults, ..added }
}

/// Which tests found a value, in the order of the rule set; a criterion that took no steps reached none of its tests.
fn reached(rules: &RuleSet, judgement: &Judgement) -> Vec<bool> {
    let mut reached = Vec::new();
    for (rulebook, judged) in rules.rulebooks.iter().zip(&judgement.rulebooks) {
        for (criterion, judged) in rulebook.criteria.iter().zip(&judged.criteria) {
            for (number, step) in criterion.steps.iter().enumerate() {
                let tests = judged.steps.get(number).map_or(&[][..], |step| step.tests.as_slice());
                let found =
                    |place: usize| tests.get(place).is_some_and(|test| test.outcome != TestOutcome::Missing);
                reached.extend((0..step.tests.len()).map(found));
            }
        }
    }
    reached
}
