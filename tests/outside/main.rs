//! Checks against what others have published: each table under `tests/fixtures` names its source line by line.

#![expect(clippy::expect_used, reason = "a table that cannot be read has to stop the test")]

mod numbers;
mod relations;
mod table;
