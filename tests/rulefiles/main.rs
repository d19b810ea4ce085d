//! Rule files: the built-in ones against the published criteria, and what a faulty one is answered.

#![expect(
    clippy::unwrap_used,
    clippy::expect_used,
    clippy::indexing_slicing,
    reason = "a test program: what fails here fails the test"
)]

mod cautions;
mod faults;
mod keys;
mod limits;
mod loading;
mod relations;
