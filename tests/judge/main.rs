//! Verdicts of the built-in rulebooks, held against tables written by hand from the published criteria.

#![expect(
    clippy::expect_used,
    clippy::indexing_slicing,
    clippy::panic,
    reason = "a row that cannot be made for a test has to stop it"
)]

mod close_calls;
mod half_lives;
mod keys;
mod limits;
mod names;
mod review;
mod sampled;
mod statements;
mod steps;
mod stops;
mod support;
mod values;
mod walked;
mod words;
