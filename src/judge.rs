//! A substance and its evidence held against a rule set.
//!
//! Pure: no text is composed here and nothing is gathered. The judgement says what was decided, by which test of which
//! step, and everything that kept another answer from being given; [`reasoning`](crate::reasoning) words it.

mod band;
mod compare;
mod criterion;
mod deciding;
mod designation;
mod found;
mod judgement;
mod step;
mod test;
mod words;

use std::collections::BTreeSet;

pub use deciding::Deciding;
pub use designation::DesignationJudgement;
use found::Found;
pub use judgement::{
    Adjustment, Answer, Carries, Closeness, CriterionJudgement, Decision, Headline, Judgement, RaisedCaution,
    RulebookJudgement, StepJudgement, Stop, StoppedClear, TestJudgement, TestOutcome, Used, Verdict,
};
pub use step::StepState;

use crate::evidence::EvidenceSet;
use crate::rules::{Blocks, Listing, ListingEntry, RuleSet, Rulebook, Subject};
use crate::substance::Substance;

/// What the parts of a judgement look at.
#[derive(Clone, Copy)]
pub(crate) struct Context<'run> {
    pub(crate) substance: &'run Substance,
    pub(crate) evidence: &'run EvidenceSet,
    pub(crate) rules: &'run RuleSet,
    pub(crate) rulebook: &'run Rulebook,
    pub(crate) cautions: &'run [RaisedCaution],
    pub(crate) found: &'run Found,
}

impl Context<'_> {
    /// The raised cautions that keep the subject, or a value derived from `derived_from`, from clearing.
    pub(crate) fn blocking(
        &self,
        subject: Subject,
        derived_from: Option<Subject>,
    ) -> impl Iterator<Item = usize> {
        self.cautions.iter().map(|raised| raised.caution).filter(move |index| {
            self.rules.cautions.get(*index).is_some_and(|caution| match &caution.blocks {
                Blocks::Everything => true,
                Blocks::Subjects(subjects) => covers(subjects, subject, derived_from),
            })
        })
    }

    /// Whether a raised caution lets the subject fire as screening only.
    pub(crate) fn fires_as_screening_only(&self, subject: Subject, derived_from: Option<Subject>) -> bool {
        self.cautions
            .iter()
            .filter_map(|raised| self.rules.cautions.get(raised.caution))
            .any(|caution| covers(&caution.at_most_screening, subject, derived_from))
    }
}

fn covers(subjects: &BTreeSet<Subject>, subject: Subject, derived_from: Option<Subject>) -> bool {
    subjects.contains(&subject) || derived_from.is_some_and(|origin| subjects.contains(&origin))
}

/// Holds substances against a rule set. It may be shared between threads; the order of substances changes nothing.
#[derive(Debug)]
pub struct Judge<'rules> {
    rules: &'rules RuleSet,
    found: Found,
}

impl<'rules> Judge<'rules> {
    /// A judge by these rules.
    pub fn new(rules: &'rules RuleSet) -> Self {
        Self { rules, found: Found::default() }
    }

    /// The rules it judges by.
    pub fn rules(&self) -> &'rules RuleSet {
        self.rules
    }

    /// Holds a substance against every rulebook of the set.
    pub fn judge(&self, substance: &Substance, evidence: &EvidenceSet) -> Judgement {
        let rules = self.rules;
        let cautions: Vec<RaisedCaution> = rules
            .cautions
            .iter()
            .enumerate()
            .filter_map(|(caution, rule)| {
                rule.is_raised_by(substance).map(|reason| RaisedCaution { caution, reason })
            })
            .collect();
        let context = |rulebook| Context {
            substance,
            evidence,
            rules,
            rulebook,
            cautions: &cautions,
            found: &self.found,
        };
        let rulebooks = rules.rulebooks.iter().map(|rulebook| judge_rulebook(context(rulebook))).collect();
        Judgement { cautions, rulebooks }
    }
}

/// Holds one substance against every rulebook of the set.
pub fn judge(substance: &Substance, evidence: &EvidenceSet, rules: &RuleSet) -> Judgement {
    Judge::new(rules).judge(substance, evidence)
}

fn judge_rulebook(context: Context) -> RulebookJudgement {
    let criteria: Vec<_> = context
        .rulebook
        .criteria
        .iter()
        .map(|criterion| criterion::judge_criterion(context, criterion))
        .collect();
    let designations = designation::judge_designations(context, &criteria);
    let headline = headline(context, &criteria, &designations);
    RulebookJudgement { headline, criteria, designations }
}

fn headline(
    context: Context,
    criteria: &[CriterionJudgement],
    designations: &[DesignationJudgement],
) -> Headline {
    if let Some(listing) =
        context.rulebook.listings.iter().position(|listing| is_listed(context.substance, listing))
    {
        return Headline::Listed(listing);
    }
    let worst_designation = first_worst(designations.iter().map(|designation| designation.verdict));
    let worst_criterion = first_worst(criteria.iter().map(|criterion| criterion.verdict)).unwrap_or(0);
    worst_designation.map_or(Headline::Criterion(worst_criterion), Headline::Designation)
}

/// The first of the verdicts of most concern.
fn first_worst(verdicts: impl Iterator<Item = Verdict>) -> Option<usize> {
    let mut worst: Option<(usize, Verdict)> = None;
    for (index, verdict) in verdicts.enumerate() {
        if worst.is_none_or(|(_, so_far)| verdict > so_far) {
            worst = Some((index, verdict));
        }
    }
    worst.map(|(index, _)| index)
}

fn is_listed(substance: &Substance, listing: &Listing) -> bool {
    listing.entries.iter().any(|entry| match entry {
        ListingEntry::Cas(number) => substance.cas.as_ref().is_some_and(|cas| cas.value == *number),
        ListingEntry::Ec(number) => substance.ec.as_ref().is_some_and(|ec| ec.value == *number),
    })
}
