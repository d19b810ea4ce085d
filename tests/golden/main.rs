//! The annotated example, as a user gets it.

#![expect(
    clippy::expect_used,
    clippy::indexing_slicing,
    reason = "an example that cannot be read has to stop the test"
)]

mod added;
mod annotated;
mod beside;
mod certain;
mod planted;
mod sources;
mod threads;
