//! A substance and its evidence held against a rule set.
//!
//! Pure: no text is composed here and nothing is gathered. The judgement says what was decided, by which test of which
//! step, and everything that kept another answer from being given; [`reasoning`](crate::reasoning) words it.

mod band;
mod compare;
mod criterion;
mod deciding;
mod designation;
mod step;
mod test;

use std::collections::BTreeSet;

pub use deciding::Deciding;
use deciding::Found;
pub use designation::DesignationJudgement;
pub use step::StepState;

use crate::evidence::EvidenceSet;
use crate::quantity::Interval;
use crate::rules::{Blocks, Listing, ListingEntry, RuleSet, Rulebook, Subject};
use crate::substance::{Property, Substance};

/// The answer to a criterion or designation. Greater is of more concern; `OutOfScope` stands apart.
#[derive(Debug, Clone, Copy, PartialEq, Eq, PartialOrd, Ord, Hash)]
pub enum Verdict {
    /// The instrument does not cover the substance.
    OutOfScope,
    /// Measured data show that the criterion is not met.
    NotFulfilled,
    /// Screening information points away from the criterion.
    ScreensOut,
    /// Nothing is known that the criterion asks for.
    NoData,
    /// Something is known, but it does not answer.
    Unresolved,
    /// Screening information points to the criterion.
    ScreensIn,
    /// Measured data, or a statement in the row, show that the criterion is met.
    Fulfilled,
}

impl Verdict {
    /// Every verdict, of most concern first, `out of scope` last.
    pub const ALL: [Self; 7] = [
        Self::Fulfilled,
        Self::ScreensIn,
        Self::Unresolved,
        Self::NoData,
        Self::ScreensOut,
        Self::NotFulfilled,
        Self::OutOfScope,
    ];

    /// The words in the output, exactly.
    pub fn words(self) -> &'static str {
        match self {
            Self::Fulfilled => "fulfilled",
            Self::ScreensIn => "screens in",
            Self::Unresolved => "unresolved",
            Self::NoData => "no data",
            Self::ScreensOut => "screens out",
            Self::NotFulfilled => "not fulfilled",
            Self::OutOfScope => "out of scope",
        }
    }

    /// Whether a question is answered either way.
    pub fn is_decided(self) -> bool {
        match self {
            Self::Fulfilled | Self::ScreensIn | Self::ScreensOut | Self::NotFulfilled => true,
            Self::Unresolved | Self::NoData | Self::OutOfScope => false,
        }
    }
}

/// Whether a limit lies within one SD of the value, or inside its interval.
#[derive(Debug, Clone, Copy, PartialEq, Eq, PartialOrd, Ord, Hash)]
pub enum Closeness {
    /// It does not.
    Clear,
    /// It does.
    CloseCall,
}

impl Closeness {
    fn from_condition(close: bool) -> Self {
        if close { Self::CloseCall } else { Self::Clear }
    }
}

/// A caution that the substance raises.
#[derive(Debug, Clone, PartialEq, Eq)]
pub struct RaisedCaution {
    /// Index into the rule set's cautions.
    pub caution: usize,
    /// What raised it, for example the word of the name.
    pub reason: String,
}

/// What one test came to.
#[derive(Debug, Clone, Copy, PartialEq, Eq, PartialOrd, Ord, Hash)]
pub enum TestOutcome {
    /// No value that the test accepts.
    Missing,
    /// The whole value is on the unconcerning side.
    Clear,
    /// The value straddles the limit.
    Undecided,
    /// The whole value is beyond the limit.
    Fired,
}

/// A change made to a value before it was compared.
#[derive(Debug, Clone, Copy, PartialEq)]
pub enum Adjustment {
    /// A half-life with a stated test temperature, moved to the rulebook's.
    HalfLifeTemperature {
        /// Test temperature, °C.
        from: f64,
        /// The rulebook's, °C.
        to: f64,
        /// The factor.
        factor: f64,
    },
    /// A half-life without test temperature: it may be longer by the factor at the rulebook's temperature.
    HalfLifeTemperatureUnstated {
        /// The test temperature it may have had, °C.
        from: f64,
        /// The rulebook's, °C.
        to: f64,
        /// The factor.
        factor: f64,
    },
    /// A BCF whose lipid content may be a fraction or a percentage: both readings are kept.
    LipidDoubtful {
        /// Lipid content as written.
        from: f64,
        /// The rulebook's, %.
        to: f64,
    },
    /// A BCF moved to the rulebook's lipid content.
    Lipid {
        /// Lipid content of the fish, %.
        from: f64,
        /// The rulebook's, %.
        to: f64,
    },
}

/// A value as it was held against a limit.
#[derive(Debug, Clone, PartialEq)]
pub struct Used {
    /// The property of the evidence.
    pub property: Property,
    /// Its place among the evidence on that property.
    pub index: usize,
    /// The interval that was compared.
    pub compared: Interval,
    /// What was done to the value first.
    pub adjustment: Option<Adjustment>,
    /// How it stands to the limit.
    pub outcome: crate::quantity::Outcome,
    /// Whether the limit is close.
    pub closeness: Closeness,
    /// Log units beyond the limit; negative on the unconcerning side.
    pub margin: Option<f64>,
    /// The chance that the value lies beyond the limit, given its error.
    pub chance: Option<f64>,
}

/// What a test found where it asks for words, not numbers.
#[derive(Debug, Clone, PartialEq, Eq)]
pub enum Answer {
    /// The entry of ready biodegradability at this place of the row's list.
    Ready(usize),
    /// The entry of inherent biodegradability at this place of the row's list.
    Inherent(usize),
    /// This hazard statement.
    Statement(String),
    /// The hazard statement cell is filled and holds none of the codes.
    NoStatement,
}

/// What keeps a clearing from standing.
#[derive(Debug, Clone, Copy, PartialEq, PartialOrd)]
pub enum Stop {
    /// A caution blocks the deciding value; index into the rule set's cautions.
    Caution(usize),
    /// A calculated or estimated value lies within one SD of its limit.
    WithinOneSd,
    /// The value comes from a relation whose coefficients are from memory.
    RelationFromMemory(usize),
    /// The limit itself is from memory.
    LimitFromMemory,
    /// A line that could apply, less one SD, gives a value beyond the limit.
    LowSide {
        /// The relation.
        relation: usize,
        /// What it gives less one SD, log10 of the canonical unit.
        log_value: f64,
    },
    /// A guarding step fired.
    Guard(usize),
    /// A guarding step could not be answered, which stops screening clears.
    OpenGuard(usize),
    /// An earlier clear was stopped or a definitive step was undecided.
    EarlierDoubt,
}

/// How much weight the outcome of a test can carry.
#[derive(Debug, Clone, Copy, PartialEq, Eq, PartialOrd, Ord, Hash)]
pub enum Carries {
    /// It supports a screening word only.
    Screening,
    /// It supports a definitive word.
    Definitive,
}

/// One test as it came out.
#[derive(Debug, Clone, PartialEq)]
pub struct TestJudgement {
    /// What it came to.
    pub outcome: TestOutcome,
    /// The values held against the limit, the deciding one first.
    pub used: Vec<Used>,
    /// The words found, where the test asks for words.
    pub answer: Option<Answer>,
    /// Whether the limit is close.
    pub closeness: Closeness,
    /// How much weight the outcome can carry.
    pub carries: Carries,
    /// What keeps a clearing by this test from standing.
    pub stops: Vec<Stop>,
}

/// A step as it came out.
#[derive(Debug, Clone, PartialEq)]
pub struct StepJudgement {
    /// What it came to.
    pub state: StepState,
    /// Whether the outcome would change within the error of its values.
    pub closeness: Closeness,
    /// The tests that make the outcome, indices into `tests`.
    pub by: Vec<usize>,
    /// Its tests.
    pub tests: Vec<TestJudgement>,
}

/// A clear that did not stand.
#[derive(Debug, Clone, PartialEq)]
pub struct StoppedClear {
    /// The step that would have cleared.
    pub step: usize,
    /// What stopped it.
    pub stops: Vec<Stop>,
}

/// How a criterion came to its verdict.
#[derive(Debug, Clone, Copy, PartialEq, Eq, PartialOrd, Ord, Hash)]
pub enum Decision {
    /// The step decided towards concern.
    In(usize),
    /// The step decided away from concern.
    Out(usize),
    /// No step decided.
    Open,
    /// No number can settle it.
    Assess,
    /// The instrument does not cover the substance; index into the rule set's cautions.
    OutOfScope(usize),
    /// It is a rating.
    Rating,
}

/// A criterion as it came out.
#[derive(Debug, Clone, PartialEq)]
pub struct CriterionJudgement {
    /// The verdict; `Unresolved` for ratings, which take no part in designations.
    pub verdict: Verdict,
    /// Whether it is a close call.
    pub closeness: Closeness,
    /// How it was reached.
    pub decision: Decision,
    /// Clears that did not stand, in order of step.
    pub stopped: Vec<StoppedClear>,
    /// Its steps.
    pub steps: Vec<StepJudgement>,
    /// The bands its value may lie in, indices into the criterion's bands.
    pub ratings: Vec<usize>,
    /// The value that was rated.
    pub rated: Option<Used>,
    /// What would settle it, where it is unresolved or without data.
    pub deciding: Option<Deciding>,
}

/// What heads the row for a rulebook.
#[derive(Debug, Clone, Copy, PartialEq, Eq, PartialOrd, Ord, Hash)]
pub enum Headline {
    /// A listing names the substance.
    Listed(usize),
    /// The designation of most concern.
    Designation(usize),
    /// The criterion of most concern, where there is no designation.
    Criterion(usize),
}

/// A rulebook as it came out.
#[derive(Debug, Clone, PartialEq)]
pub struct RulebookJudgement {
    /// What heads the row.
    pub headline: Headline,
    /// Its criteria.
    pub criteria: Vec<CriterionJudgement>,
    /// Its designations.
    pub designations: Vec<DesignationJudgement>,
}

/// A substance as it came out.
#[derive(Debug, Clone, PartialEq)]
pub struct Judgement {
    /// The cautions it raises, in file order.
    pub cautions: Vec<RaisedCaution>,
    /// The rulebooks, in the order of the run.
    pub rulebooks: Vec<RulebookJudgement>,
}

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
