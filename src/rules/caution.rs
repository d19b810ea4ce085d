//! Cautions: what a name, a type or a pattern in the data warns of, and which clearings it stops.

use std::collections::BTreeSet;

use regex::Regex;

use crate::rules::Subject;
use crate::substance::{Identity, RowType, SubstanceType};

/// A sentence for the user and what it stops.
#[derive(Debug, Clone)]
pub struct Caution {
    /// Name in rule files, kebab-case.
    pub id: String,
    /// The sentence.
    pub sentence: String,
    /// Where it comes from.
    pub source: String,
    /// What raises it; any one is enough.
    pub triggers: Triggers,
    /// What it keeps from clearing.
    pub blocks: Blocks,
    /// Subjects that fire at most as screening under it.
    pub at_most_screening: BTreeSet<Subject>,
}

/// What raises a caution; any one is enough.
#[derive(Debug, Clone, Default)]
pub struct Triggers {
    /// The row states one of these types.
    pub substance_types: BTreeSet<SubstanceType>,
    /// The row is one of these.
    pub row_types: BTreeSet<RowType>,
    /// The row's identity is one of these.
    pub identities: BTreeSet<Identity>,
    /// The name matches.
    pub name_pattern: Option<Regex>,
    /// The name matches, but this one does not: an exception to `name_pattern`.
    pub unless_name: Option<Regex>,
    /// The formula holds no carbon, or is of a carbonate, cyanide, carbide and the like.
    pub inorganic_formula: bool,
    /// A pKa of the row puts its ionisation between pH 4 and 9.
    pub ionisable: bool,
}

/// What a caution keeps from clearing.
#[derive(Debug, Clone, PartialEq, Eq)]
pub enum Blocks {
    /// Every clearing.
    Everything,
    /// A clearing by these, and by every value derived from them. May be empty.
    Subjects(BTreeSet<Subject>),
}

impl Caution {
    /// What in the substance raises the caution, if anything does.
    pub fn is_raised_by(&self, _substance: &crate::substance::Substance) -> Option<String> {
        None
    }
}
