//! A judgement in words: the sentence behind every verdict, the one beside every headline, and the cells that sum up a
//! row.
//!
//! It receives a [`Judgement`](crate::judge::Judgement) and compares nothing.

mod absence;
mod criterion;
mod designation;
mod row;
mod sentence;
mod stops;
mod value;

pub use criterion::{Line, criterion_line};
pub use designation::{headline, headline_verdict, verdict_text, why, with_closeness};
pub use row::{LogKowCells, cautions_text, deciding_text, log_kow_cells};
pub use value::limit_phrase;

use crate::evidence::EvidenceSet;
use crate::judge::{CriterionJudgement, Judgement, RulebookJudgement};
use crate::rules::{Criterion, RuleSet, Rulebook};
use crate::substance::Substance;

/// A judged row, with everything a sentence may speak of.
#[derive(Clone, Copy)]
pub struct Told<'run> {
    /// The row.
    pub substance: &'run Substance,
    /// What was known of it.
    pub evidence: &'run EvidenceSet,
    /// The rules it was held against.
    pub rules: &'run RuleSet,
    /// What came out.
    pub judgement: &'run Judgement,
}

/// A rulebook and what it made of the row.
#[derive(Clone, Copy)]
pub struct Book<'run> {
    /// The row.
    pub told: Told<'run>,
    /// The rulebook.
    pub rulebook: &'run Rulebook,
    /// What came out.
    pub judged: &'run RulebookJudgement,
}

impl<'run> Told<'run> {
    /// The rulebooks, in the order of the run.
    pub fn books(self) -> impl Iterator<Item = Book<'run>> {
        let pairs = self.rules.rulebooks.iter().zip(&self.judgement.rulebooks);
        pairs.map(move |(rulebook, judged)| Book { told: self, rulebook, judged })
    }
}

impl<'run> Book<'run> {
    /// The criteria and what they came to, in file order.
    pub fn criteria(self) -> impl Iterator<Item = (&'run Criterion, &'run CriterionJudgement)> {
        self.rulebook.criteria.iter().zip(&self.judged.criteria)
    }
}
