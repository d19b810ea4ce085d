//! The command line of kowledger: arguments in, exit status out.

mod args;
mod console;

use std::process::ExitCode;

use args::{Arguments, Command, RulesCommand};
use clap::Parser;
use kowledger::fault::Refusal;
use kowledger::run;

fn main() -> ExitCode {
    match dispatch(Arguments::parse().command) {
        Ok(Outcome::Done) => ExitCode::from(0),
        Ok(Outcome::DoneWithFaults) => ExitCode::from(1),
        Err(refusal) => {
            console::refuse(&refusal);
            ExitCode::from(2)
        }
    }
}

/// How a command ended that was not refused.
enum Outcome {
    Done,
    DoneWithFaults,
}

fn dispatch(command: Command) -> Result<Outcome, Refusal> {
    match command {
        Command::Screen(arguments) => {
            let console = console::Console::new(arguments.quiet);
            let summary = run::screen(&arguments.into_settings()?)?;
            console.summary(&summary);
            Ok(if summary.fault_total == 0 { Outcome::Done } else { Outcome::DoneWithFaults })
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
