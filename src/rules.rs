//! The rule set of a run: criteria as data.
//!
//! `file` reads TOML, `validate` turns it into these types and collects every fault; whatever stands here has been
//! checked and can be applied without further questions. It decides nothing about substances.

mod built_in;
mod caution;
pub(crate) mod file;
mod folder;
mod formula;
mod load;
mod rulebook;
mod summary;
pub(crate) mod validate;

pub use built_in::{built_in_rule_files, built_in_rulebooks};
pub use caution::{Blocks, Caution, Triggers};
pub use file::RuleSource;
pub use load::{RuleSources, load_rule_set};
pub use rulebook::{
    Band, Checked, ClearsOn, Combine, Criterion, Decides, Designation, DesignationPart, Guards,
    HalfLifeReference, Limit, Listing, ListingEntry, OnlyIf, Rulebook, Step, Subject, Test, Weight,
    WhenMissing,
};
pub use summary::{RulebookSummary, check_paths, summaries};

use crate::relations::Relations;

/// Everything that rule files say, checked.
#[derive(Debug, Clone)]
pub struct RuleSet {
    /// The rulebooks of the run, in the order of their columns.
    pub rulebooks: Vec<Rulebook>,
    /// The cautions, in file order.
    pub cautions: Vec<Caution>,
    /// The relations and default standard deviations.
    pub relations: Relations,
    /// The texts of the rule files, for the Run record: name and content.
    pub texts: Vec<RuleText>,
}

/// A rule file as it was applied.
#[derive(Debug, Clone, PartialEq, Eq)]
pub struct RuleText {
    /// `built in: eu-reach-pbt` or the file's name.
    pub name: String,
    /// The whole text.
    pub text: String,
}
