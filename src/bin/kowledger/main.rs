//! The command line of kowledger: arguments in, exit status out.

mod args;
mod console;
mod dispatch;
mod listing;

use std::process::ExitCode;

use args::Arguments;
use clap::Parser;
use dispatch::{Outcome, dispatch};

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
