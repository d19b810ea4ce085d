//! From a command to the library and back to the console.

use kowledger::fault::Refusal;
use kowledger::run;

use crate::args::{Command, RulesCommand};
use crate::console;

/// How a command ended that was not refused.
pub(crate) enum Outcome {
    Done,
    DoneWithFaults,
}

/// Runs a command.
pub(crate) fn dispatch(command: Command) -> Result<Outcome, Refusal> {
    match command {
        Command::Screen(arguments) => {
            let console = console::Console::new(arguments.quiet);
            let summary = run::screen(&arguments.into_settings()?)?;
            console.summary(&summary);
            Ok(if summary.tally.total() == 0 { Outcome::Done } else { Outcome::DoneWithFaults })
        }
        Command::Columns(arguments) => {
            console::columns(&run::recognise_columns(&arguments.inventory, &arguments.overrides()?)?);
            Ok(Outcome::Done)
        }
        Command::Rules(RulesCommand::List) => {
            console::rulebooks(&kowledger::rules::summaries()?);
            Ok(Outcome::Done)
        }
        Command::Rules(RulesCommand::Check { paths }) => {
            console::checked(&kowledger::rules::check_paths(&paths)?);
            Ok(Outcome::Done)
        }
    }
}
