//! Every message a user can get: what was found, where, and what to write instead.
//!
//! Faults carry data; their wording lives here and nowhere else.

mod cell;
mod conflict;
mod conflict_counts;
mod file;
mod lines;
mod rule;
mod tally;

pub use cell::{CellFault, CellFaultKind, Wording};
pub use conflict::{Agreement, Conflict, Contrast, Shared, SharedBy};
pub use conflict_counts::ConflictCounts;
pub use file::{FileFault, FileKind, SheetFault};
pub use lines::LinesFault;
pub use rule::{Drawing, OwnerKind, RuleFault, RuleFaults, RuleMistake, unknown_rulebook};
pub use tally::FaultTally;

/// Why nothing could be written.
#[derive(Debug, thiserror::Error)]
pub enum Refusal {
    /// The inventory or the output could not be used.
    #[error(transparent)]
    File(#[from] FileFault),
    /// A rule file means nothing that can be applied.
    #[error(transparent)]
    Rules(#[from] RuleFaults),
    /// The command line asks for something that is not there.
    #[error("{0}")]
    Usage(String),
}

/// The known word closest to one that is not known, if any is close.
pub fn nearest<'word>(unknown: &str, known: impl IntoIterator<Item = &'word str>) -> Option<&'word str> {
    known
        .into_iter()
        .map(|word| (strsim::damerau_levenshtein(unknown, word), word))
        .filter(|(distance, word)| *distance <= 1 + word.len() / 4 && *distance < unknown.len())
        .min()
        .map(|(_, word)| word)
}

/// How many letters differ between two words, two that changed places as one.
pub(crate) fn edits(one: &str, other: &str) -> usize {
    strsim::damerau_levenshtein(one, other)
}

/// A noun with its number: `1 row`, `2 rows`.
pub fn count(number: usize, singular: &str, plural: &str) -> String {
    if number == 1 { format!("1 {singular}") } else { format!("{number} {plural}") }
}

#[cfg(test)]
mod tests {
    use super::nearest;

    #[test]
    fn only_a_close_word_is_suggested() {
        let known = ["eu-reach-pbt", "eu-clp-pbt-pmt", "un-stockholm-annex-d"];
        assert_eq!(nearest("eu-reach-pbr", known), Some("eu-reach-pbt"));
        assert_eq!(nearest("kinetics", known), None);
        assert_eq!(nearest("T", ["P", "B"]), None);
    }
}
