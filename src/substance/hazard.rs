//! Hazard statements, as codes.

use std::collections::BTreeSet;

/// The statement codes of a filled cell, for example `H350` or `EUH440`, in capitals and without spaces.
///
/// A filled cell without any code (`none`, `not classified`) is an empty set: the row says that it carries none.
#[derive(Debug, Clone, PartialEq, Eq, Default)]
pub struct HazardStatements {
    codes: BTreeSet<String>,
    completeness: Completeness,
}

/// Whether a cell could be read to its end.
#[derive(Debug, Clone, Copy, PartialEq, Eq, PartialOrd, Ord, Hash, Default)]
pub enum Completeness {
    /// Every part of the cell was understood: a code that is not there is not stated.
    #[default]
    Complete,
    /// A hazard class stands without its category: a code that is not there may still be meant.
    Incomplete,
}

impl HazardStatements {
    /// The statements with these codes.
    pub fn new(codes: impl IntoIterator<Item = String>) -> Self {
        Self { codes: codes.into_iter().collect(), completeness: Completeness::Complete }
    }

    /// The statements with these codes, of a cell that says more than could be read.
    pub fn incomplete(codes: impl IntoIterator<Item = String>) -> Self {
        Self { codes: codes.into_iter().collect(), completeness: Completeness::Incomplete }
    }

    /// Whether a code that is not there is known not to be stated.
    pub fn completeness(&self) -> Completeness {
        self.completeness
    }

    /// The statements of two cells of one row.
    #[must_use]
    pub fn united(&self, other: &Self) -> Self {
        Self {
            codes: self.codes.union(&other.codes).cloned().collect(),
            completeness: self.completeness.max(other.completeness),
        }
    }

    /// The codes, in order.
    pub fn codes(&self) -> impl Iterator<Item = &str> {
        self.codes.iter().map(String::as_str)
    }

    /// The row's code that meets a rule's code: the code itself, or one of its family (`H360` is met by `H360FD`).
    pub fn find(&self, rule_code: &str) -> Option<&str> {
        self.codes().find(|code| belongs_to_family(code, rule_code))
    }
}

fn belongs_to_family(code: &str, rule_code: &str) -> bool {
    code.strip_prefix(rule_code)
        .is_some_and(|rest| rest.chars().all(|character| character.is_ascii_alphabetic()))
}

#[cfg(test)]
mod tests {
    use super::HazardStatements;

    #[test]
    fn a_family_is_met_by_its_members_and_not_by_longer_numbers() {
        let statements = HazardStatements::new(["H360FD".to_owned(), "EUH441".to_owned()]);
        assert_eq!(statements.find("H360"), Some("H360FD"));
        assert_eq!(statements.find("H36"), None);
        assert_eq!(statements.find("H361"), None);
        assert_eq!(statements.find("EUH441"), Some("EUH441"));
    }
}
