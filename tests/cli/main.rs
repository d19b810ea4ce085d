//! The command line as a user meets it: statuses, messages, and what is left in the folder.

#![expect(
    clippy::expect_used,
    clippy::indexing_slicing,
    clippy::panic,
    clippy::unwrap_used,
    reason = "a workbook that cannot be made for a test has to stop it"
)]

#[path = "../make/hostile.rs"]
#[expect(dead_code, reason = "other tests use the rest of the makers")]
mod hostile;
#[path = "../make/sheets.rs"]
mod sheets;

mod binary;
mod cells;
mod commands;
mod conflicts;
mod inputs;
mod kinds;
mod layouts;
mod no_substance;
mod outputs;
mod place;
mod wording;
