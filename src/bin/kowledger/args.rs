//! The command line's arguments and their conversion into settings.

use std::path::PathBuf;

use clap::{Parser, Subcommand, ValueEnum};
use kowledger::columns::ColumnOverride;
use kowledger::fault::Refusal;
use kowledger::quantity::Date;
use kowledger::report::ReasoningMode;
use kowledger::run::{ReasoningChoice, ScreenSettings};
use kowledger::substance::UnstatedBasis;
use kowledger::workbook::Overwrite;

/// Screens chemical inventories for persistence, bioaccumulation, mobility and toxicity.
///
/// A screening is not a regulatory decision: the current legal text prevails and a qualified person must confirm every
/// verdict. The absence of a flag is not evidence of safety.
#[derive(Debug, Parser)]
#[command(version, about, max_term_width = 110)]
pub(crate) struct Arguments {
    #[command(subcommand)]
    pub(crate) command: Command,
}

#[derive(Debug, Subcommand)]
pub(crate) enum Command {
    /// Screen an inventory and write it back, annotated
    #[command(after_help = EXIT_STATUSES)]
    Screen(ScreenArguments),
    /// Show which columns of an inventory were recognised, and why
    Columns(ColumnsArguments),
    /// Look at the rule files
    #[command(subcommand)]
    Rules(RulesCommand),
}

const EXIT_STATUSES: &str =
    "Exit status: 0 done; 1 done, but some cells could not be read; 2 nothing written.";

#[derive(Debug, clap::Args)]
pub(crate) struct ScreenArguments {
    /// The inventory: a workbook with one substance a row
    inventory: PathBuf,
    /// Where to write [default: <name>-screened.xlsx beside the inventory]
    #[arg(long, value_name = "FILE")]
    output: Option<PathBuf>,
    /// A rulebook: the id of a built-in one, a file, a folder, or `all`; may be repeated [default: all built-in ones]
    #[arg(long, value_name = "ID|FILE|FOLDER|all")]
    rulebook: Vec<String>,
    /// Screen this sheet only; may be repeated [default: every sheet with a recognised header]
    #[arg(long, value_name = "NAME")]
    sheet: Vec<String>,
    /// Say what a column holds, for example `--column 'Pow=log-kow'`, or `'Pow=ignore'`, or by its letter, `'H:H=log-kow'`
    /// or `'Sheet1!H:H=log-kow'`; may be repeated
    #[arg(long, value_name = "HEADER=FIELD")]
    column: Vec<String>,
    /// What a value counts as that does not say how it was obtained
    #[arg(long, value_name = "BASIS", default_value = "unstated")]
    unstated: CountsAs,
    /// Lines of the Reasoning sheet; auto: all up to 200,000 lines, else those at `unresolved` or above
    #[arg(long, value_name = "MODE", default_value = "auto")]
    reasoning: Reasoning,
    /// Threads that judge rows [default: one a core]
    #[arg(long, value_name = "N")]
    threads: Option<usize>,
    /// The day to write into the output [default: today]
    #[arg(long, value_name = "YYYY-MM-DD")]
    date: Option<String>,
    /// Replace the output if it exists
    #[arg(long)]
    force: bool,
    /// Print faults only
    #[arg(long)]
    pub(crate) quiet: bool,
}

#[derive(Debug, clap::Args)]
pub(crate) struct ColumnsArguments {
    /// The inventory
    pub(crate) inventory: PathBuf,
    /// Say what a column holds, as for `screen`
    #[arg(long, value_name = "HEADER=FIELD")]
    column: Vec<String>,
}

#[derive(Debug, Subcommand)]
pub(crate) enum RulesCommand {
    /// List the built-in rulebooks
    List,
    /// Check rule files without an inventory
    Check {
        /// Rulebook files or folders
        #[arg(required = true)]
        paths: Vec<PathBuf>,
    },
}

#[derive(Debug, Clone, Copy, ValueEnum)]
enum CountsAs {
    Measured,
    Unstated,
    Calculated,
}

#[derive(Debug, Clone, Copy, ValueEnum)]
enum Reasoning {
    Auto,
    All,
    Concern,
    None,
}

impl ScreenArguments {
    /// The settings of the run, or what is wrong with the arguments.
    pub(crate) fn into_settings(self) -> Result<ScreenSettings, Refusal> {
        let date = match self.date.as_deref() {
            None => Date::today(),
            Some(text) => Date::parse(text).ok_or_else(|| {
                Refusal::Usage(format!(
                    "--date {text}: not a day of the calendar; write, for example, 2026-01-31"
                ))
            })?,
        };
        if self.threads == Some(0) {
            return Err(Refusal::Usage(
                "--threads 0: at least one thread is needed; write 1 or more".to_owned(),
            ));
        }
        if self.threads.is_some_and(|threads| threads > MOST_THREADS) {
            return Err(Refusal::Usage(format!(
                "--threads: at most {MOST_THREADS} can be asked for; more threads than cores gain nothing"
            )));
        }
        if let Some(output) = &self.output {
            refuse_other_kind(output)?;
        }
        let output = self.output.unwrap_or_else(|| beside(&self.inventory));
        Ok(ScreenSettings {
            output,
            inventory: self.inventory,
            overwrite: if self.force { Overwrite::Replace } else { Overwrite::Refuse },
            rulebooks: self.rulebook,
            sheets: self.sheet,
            columns: overrides(&self.column)?,
            unstated: match self.unstated {
                CountsAs::Measured => UnstatedBasis::Measured,
                CountsAs::Unstated => UnstatedBasis::Unstated,
                CountsAs::Calculated => UnstatedBasis::Calculated,
            },
            reasoning: match self.reasoning {
                Reasoning::Auto => ReasoningChoice::Auto,
                Reasoning::All => ReasoningChoice::Always(ReasoningMode::All),
                Reasoning::Concern => ReasoningChoice::Always(ReasoningMode::Concern),
                Reasoning::None => ReasoningChoice::Always(ReasoningMode::None),
            },
            threads: self.threads,
            date,
        })
    }
}

impl ColumnsArguments {
    /// The column overrides, or what is wrong with them.
    pub(crate) fn overrides(&self) -> Result<Vec<ColumnOverride>, Refusal> {
        overrides(&self.column)
    }
}

/// More threads take minutes to start, and no machine has the cores.
const MOST_THREADS: usize = 1024;

/// A spreadsheet program does not open a workbook that is named as something else.
fn refuse_other_kind(output: &std::path::Path) -> Result<(), Refusal> {
    let is_xlsx = output.extension().is_some_and(|extension| extension.eq_ignore_ascii_case("xlsx"));
    if is_xlsx || output.is_dir() {
        return Ok(());
    }
    Err(Refusal::Usage(format!(
        "--output {}: the output is an xlsx workbook; write a name that ends in .xlsx",
        output.display()
    )))
}

fn overrides(texts: &[String]) -> Result<Vec<ColumnOverride>, Refusal> {
    texts.iter().map(|text| ColumnOverride::parse(text).map_err(Refusal::Usage)).collect()
}

/// `<name>-screened.xlsx` in the inventory's folder.
fn beside(inventory: &std::path::Path) -> PathBuf {
    let stem =
        inventory.file_stem().map_or_else(|| "inventory".into(), |stem| stem.to_string_lossy().into_owned());
    inventory.with_file_name(format!("{stem}-screened.xlsx"))
}
