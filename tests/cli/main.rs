//! The command line as a user meets it: statuses, messages, and what is left in the folder.

#[path = "../make/hostile.rs"]
#[expect(dead_code, reason = "other tests use the rest of the makers")]
mod hostile;
#[path = "../make/sheets.rs"]
mod sheets;

mod cells;
mod commands;
mod inputs;
mod layouts;
mod outputs;
mod place;
