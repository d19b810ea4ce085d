//! How the tests of a step count together.

use crate::judge::{Closeness, StepJudgement, TestJudgement, TestOutcome};
use crate::rules::{ClearsOn, Combine, Step, Weight};

/// What a step came to.
#[derive(Debug, Clone, Copy, PartialEq, Eq, PartialOrd, Ord, Hash)]
pub enum StepState {
    /// Not taken: an earlier deciding step had data.
    Skipped,
    /// No data at all.
    Empty,
    /// Some tests lack data and the others do not settle it.
    Partial,
    /// Clear.
    Clear,
    /// A value straddles its limit.
    Undecided,
    /// Fired.
    Fired,
}

/// Counts the tests of a step together.
pub(crate) fn judge_step(step: &Step, tests: Vec<TestJudgement>) -> StepJudgement {
    let state = match step.combine {
        Combine::Any => any_of(step, &tests),
        Combine::All => all_of(step, &tests),
    };
    let by = responsible(state, step, &tests);
    let closeness = closeness(state, step, &by, &tests);
    StepJudgement { state, closeness, by, tests }
}

/// In a screening step an undecided test counts as fired, as a close call.
fn outcome(step: &Step, test: &TestJudgement) -> TestOutcome {
    match (test.outcome, step.weight) {
        (TestOutcome::Undecided, Weight::Screening) => TestOutcome::Fired,
        (outcome, _) => outcome,
    }
}

fn any_of(step: &Step, tests: &[TestJudgement]) -> StepState {
    let has = |wanted| tests.iter().any(|test| outcome(step, test) == wanted);
    let lacks_needed = step
        .tests
        .iter()
        .zip(tests)
        .any(|(rule, test)| test.outcome == TestOutcome::Missing && !rule.optional);
    if has(TestOutcome::Fired) {
        StepState::Fired
    } else if has(TestOutcome::Undecided) {
        StepState::Undecided
    } else if !has(TestOutcome::Clear) {
        StepState::Empty
    } else {
        match step.clears_on {
            ClearsOn::All if lacks_needed => StepState::Partial,
            ClearsOn::All | ClearsOn::Some => StepState::Clear,
        }
    }
}

fn all_of(step: &Step, tests: &[TestJudgement]) -> StepState {
    let has = |wanted| tests.iter().any(|test| outcome(step, test) == wanted);
    if has(TestOutcome::Clear) {
        StepState::Clear
    } else if tests.iter().all(|test| outcome(step, test) == TestOutcome::Fired) {
        StepState::Fired
    } else if has(TestOutcome::Undecided) {
        StepState::Undecided
    } else if tests.iter().all(|test| test.outcome == TestOutcome::Missing) {
        StepState::Empty
    } else {
        StepState::Partial
    }
}

fn responsible(state: StepState, step: &Step, tests: &[TestJudgement]) -> Vec<usize> {
    let wanted = match state {
        StepState::Fired => TestOutcome::Fired,
        StepState::Clear => TestOutcome::Clear,
        StepState::Undecided => TestOutcome::Undecided,
        StepState::Partial | StepState::Empty | StepState::Skipped => TestOutcome::Missing,
    };
    tests
        .iter()
        .enumerate()
        .filter(|(_, test)| outcome(step, test) == wanted)
        .map(|(index, _)| index)
        .collect()
}

/// A step is a close call if its outcome rests on close tests: one far beyond the limit makes an `any` step safe.
fn closeness(state: StepState, step: &Step, by: &[usize], tests: &[TestJudgement]) -> Closeness {
    let mut close =
        by.iter().filter_map(|index| tests.get(*index)).map(|test| test.closeness == Closeness::CloseCall);
    Closeness::from_condition(match (state, step.combine) {
        (StepState::Undecided, _) => true,
        (StepState::Fired, Combine::Any) | (StepState::Clear, Combine::All) => close.all(|close| close),
        (StepState::Fired, Combine::All) | (StepState::Clear, Combine::Any) => close.any(|close| close),
        (StepState::Partial | StepState::Empty | StepState::Skipped, _) => false,
    })
}
