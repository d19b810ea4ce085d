//! Patterns that are part of the program.

use regex::{Regex, RegexBuilder};

/// A pattern written in the code, without regard to case.
pub(super) fn fixed(pattern: &'static str) -> Regex {
    fixed_by_parts(pattern)
}

/// A pattern put together from parts written in the code.
#[expect(
    clippy::expect_used,
    reason = "the patterns are constants, and the tests of each module run every one"
)]
pub(super) fn fixed_by_parts(pattern: &str) -> Regex {
    RegexBuilder::new(pattern).case_insensitive(true).build().expect("a pattern in the code is valid")
}
