//! Inventories as other programs write them (`tests/fixtures/inventories`), held against what must be recognised in
//! them, which was written down by hand.

#![expect(
    clippy::indexing_slicing,
    clippy::panic,
    clippy::unwrap_used,
    reason = "a fixture that cannot be read has to stop the test"
)]

mod cells;
mod columns;
mod expected;
mod kinds;
mod screened;
