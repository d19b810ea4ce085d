//! What comes out of judging: verdicts, and everything that made them.
//!
//! Types only; who fills them stands in the rooms beside.

use crate::judge::{Deciding, DesignationJudgement, StepState};
use crate::quantity::{Interval, Outcome};
use crate::substance::Property;

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
    pub(crate) fn from_condition(close: bool) -> Self {
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
    pub outcome: Outcome,
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
