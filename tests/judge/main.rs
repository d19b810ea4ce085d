//! Verdicts of the built-in rulebooks, held against tables written by hand from the published criteria.

mod close_calls;
mod half_lives;
mod limits;
mod statements;
mod stops;
mod support;
mod walked;
mod words;
