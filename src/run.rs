//! A run: the row's way in order.
//!
//! One thread reads rows, the rayon pool judges a batch at a time, and this thread writes them in the order they were
//! read. Rows are judged alone, so the number of threads changes no byte of the output.

mod conflicts;
mod judged_row;
mod output;
mod plan;
mod register;
mod sheets;
mod standing;
mod summing_up;
mod tables;
mod widths;

use std::collections::BTreeMap;
use std::path::PathBuf;
use std::sync::mpsc::{Receiver, SyncSender, sync_channel};

use rayon::iter::{IntoParallelIterator, ParallelIterator};

pub use judged_row::JudgedRow;
pub use plan::{RecognisedSheet, recognise_columns};

use crate::columns::{BUILT_IN_COLUMN_WORDS, ColumnOverride, ColumnWords};
use crate::fault::{CellFault, ConflictCounts, FaultTally, FileFault, Refusal};
use crate::judge::{Judge, Verdict};
use crate::quantity::Date;
use crate::report::ReasoningMode;
use crate::rules::{RuleSet, RuleText, load_rule_set};
use crate::substance::UnstatedBasis;
use crate::workbook::{Cell, CellContent, Inventory, Overwrite, Row, open_inventory};
use judged_row::judge_row;
use output::Output;
use plan::{Plan, SheetPlan};
use tables::Tables;

/// What a run is asked to do.
#[derive(Debug, Clone)]
pub struct ScreenSettings {
    /// The inventory.
    pub inventory: PathBuf,
    /// The annotated workbook.
    pub output: PathBuf,
    /// What happens to an output that exists.
    pub overwrite: Overwrite,
    /// Rulebooks by id, file or folder; empty for the default set.
    pub rulebooks: Vec<String>,
    /// Names of the sheets to screen; empty for every sheet with a recognised header.
    pub sheets: Vec<String>,
    /// What columns hold, as the user says.
    pub columns: Vec<ColumnOverride>,
    /// What a value without a word on its basis counts as.
    pub unstated: UnstatedBasis,
    /// Which lines the Reasoning sheet holds.
    pub reasoning: ReasoningChoice,
    /// Threads that judge; none for one a core.
    pub threads: Option<usize>,
    /// The day of the run.
    pub date: Date,
}

/// Which lines the Reasoning sheet shall hold.
#[derive(Debug, Clone, Copy, PartialEq, Eq)]
pub enum ReasoningChoice {
    /// All lines up to 200,000, else those at `unresolved` or above.
    Auto,
    /// This, whatever the size.
    Always(ReasoningMode),
}

/// What came out of a run.
#[derive(Debug, Clone, PartialEq)]
pub struct Summary {
    /// The annotated workbook.
    pub output: PathBuf,
    /// Rows that were screened.
    pub screened: usize,
    /// Rows that were left aside below the header of another table: the sheet, the header's row as the user counts it,
    /// and how many.
    pub unscreened: Vec<(String, u32, usize)>,
    /// Sheets that were screened and sheets that were copied.
    pub sheets: (usize, usize),
    /// For each rulebook, its short name and how many headlines have each verdict; listed rows apart.
    pub headlines: Vec<(String, BTreeMap<Verdict, usize>, usize)>,
    /// Tests that no row's data reached: rulebook, criterion and property.
    pub unreached: Vec<String>,
    /// Remarks on columns, each with its sheet.
    pub column_remarks: Vec<String>,
    /// Columns with a header that is not recognised, each sheet in one sentence.
    pub unrecognised: Vec<String>,
    /// How the file was read where it does not say so itself, such as its encoding.
    pub how_read: Vec<String>,
    /// Which rows were left aside, in sentences.
    pub rows_aside: Vec<String>,
    /// Hidden sheets that were screened, a sentence each.
    pub hidden: Vec<String>,
    /// Sheets with a header and no row to screen, a sentence each.
    pub without_rows: Vec<String>,
    /// What could not be carried over.
    pub not_carried: Vec<String>,
    /// Cells that could not be read, the first of them.
    pub faults: Vec<CellFault>,
    /// All of them, counted.
    pub tally: FaultTally,
    /// The sheet that lists them.
    pub conflicts_sheet: String,
    /// What that sheet counts.
    pub conflicts: ConflictCounts,
}

/// Rows that travel together.
const ROWS_A_BATCH: usize = 512;
/// Text that travels together, in bytes; rows of an inventory have some hundred each.
const BYTES_A_BATCH: usize = 4 << 20;
/// Batches that may wait between two stages.
const BATCHES_WAITING: usize = 4;

/// Screens an inventory and writes it back, annotated.
pub fn screen(settings: &ScreenSettings) -> Result<Summary, Refusal> {
    let rules = load_rules(settings)?;
    let mut inventory = open_inventory(&settings.inventory)?;
    let plan = Plan::new(&mut inventory, &rules, settings)?;
    let mut output = Output::create(settings, &inventory, &plan, &rules)?;
    let pool = rayon::ThreadPoolBuilder::new().num_threads(settings.threads.unwrap_or(0)).build().map_err(
        |error| Refusal::Usage(format!("the threads could not be started ({error}); try --threads 1")),
    )?;
    let bench = Bench { judge: Judge::new(&rules), words: &plan.words, reasoning: plan.reasoning, pool };
    for sheet in &plan.sheets {
        stream_sheet(&mut inventory, sheet, &bench, &mut output)?;
    }
    output.finish(settings, &inventory, &plan, &rules)
}

fn load_rules(settings: &ScreenSettings) -> Result<RuleSet, Refusal> {
    let mut rules = load_rule_set(&settings.rulebooks)?;
    let columns = RuleText { name: "built in: columns".to_owned(), text: BUILT_IN_COLUMN_WORDS.to_owned() };
    rules.texts.push(columns);
    Ok(rules)
}

/// Who judges rows, and on how many threads.
struct Bench<'rules> {
    judge: Judge<'rules>,
    words: &'rules ColumnWords,
    reasoning: ReasoningMode,
    pool: rayon::ThreadPool,
}

/// Reads, judges and writes one sheet, the three at the same time.
fn stream_sheet(
    inventory: &mut Inventory,
    sheet: &SheetPlan,
    bench: &Bench,
    output: &mut Output,
) -> Result<(), Refusal> {
    std::thread::scope(|scope| {
        let (to_judge, rows) = sync_channel(BATCHES_WAITING);
        let (to_write, judged) = sync_channel(BATCHES_WAITING);
        scope.spawn(move || read_batches(inventory, sheet, &to_judge));
        scope.spawn(move || judge_batches(&rows, sheet, bench, &to_write));
        for batch in judged {
            for row in batch? {
                output.write_row(sheet, row)?;
            }
        }
        Ok(())
    })
}

type Batch<T> = Result<Vec<T>, FileFault>;

/// A closed channel means that a later stage gave up, with the reason on its own way to the user.
fn read_batches(inventory: &mut Inventory, sheet: &SheetPlan, to_judge: &SyncSender<Batch<Row>>) {
    let mut batch = Vec::with_capacity(ROWS_A_BATCH);
    let mut bytes = 0_usize;
    let read = inventory.stream_rows(sheet.index, |row| {
        bytes = bytes.saturating_add(bytes_of_texts(&row));
        batch.push(row);
        if batch.len() < ROWS_A_BATCH && bytes < BYTES_A_BATCH {
            return std::ops::ControlFlow::Continue(());
        }
        bytes = 0;
        match to_judge.send(Ok(std::mem::replace(&mut batch, Vec::with_capacity(ROWS_A_BATCH)))) {
            Ok(()) => std::ops::ControlFlow::Continue(()),
            Err(_) => std::ops::ControlFlow::Break(()),
        }
    });
    let _ = to_judge.send(read.map(|()| batch));
}

fn bytes_of_texts(row: &Row) -> usize {
    let of_cell = |cell: &Cell| match &cell.content {
        CellContent::Text(text) | CellContent::Error(text) => text.len(),
        CellContent::Empty | CellContent::Number(_) | CellContent::Boolean(_) | CellContent::DateTime(_) => 0,
    };
    row.cells.iter().map(of_cell).sum()
}

fn judge_batches(
    rows: &Receiver<Batch<Row>>,
    sheet: &SheetPlan,
    bench: &Bench,
    to_write: &SyncSender<Batch<JudgedRow>>,
) {
    let mut tables = Tables::default();
    for batch in rows {
        let judged = batch.map(|rows| {
            bench.pool.install(|| {
                let placed = tables.place(rows, sheet, bench.words).into_par_iter();
                placed.map(|row| judge_row(row, sheet, bench.reasoning, &bench.judge)).collect::<Vec<_>>()
            })
        });
        if to_write.send(judged).is_err() {
            return;
        }
    }
}
