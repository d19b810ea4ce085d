//! Faults of rule files, collected and drawn under the offending text.

use std::fmt;

/// One fault of meaning in a rule file.
#[derive(Debug, Clone, PartialEq, Eq)]
pub struct RuleFault {
    /// What is wrong, in a sentence.
    pub message: String,
}

/// All faults of the rule files of a run.
#[derive(Debug, Clone, PartialEq, Eq)]
pub struct RuleFaults(pub Vec<RuleFault>);

impl std::error::Error for RuleFaults {}

impl fmt::Display for RuleFaults {
    fn fmt(&self, formatter: &mut fmt::Formatter<'_>) -> fmt::Result {
        for fault in &self.0 {
            writeln!(formatter, "{}", fault.message)?;
        }
        Ok(())
    }
}
