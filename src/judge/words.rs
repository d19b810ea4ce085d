//! Tests that ask for words: ready and inherent biodegradability, hazard statements.

use crate::evidence::Standing;
use crate::judge::compare::outcome_of;
use crate::judge::test::{counts, limit_stops};
use crate::judge::{Answer, Carries, Closeness, Context, Stop, TestJudgement, TestOutcome};
use crate::quantity::Outcome;
use crate::rules::{Checked, Limit, Step, Test};
use crate::substance::{Basis, Completeness, DegradationTest};

fn in_words(
    context: Context,
    test: &Test,
    outcome: TestOutcome,
    answer: Answer,
    carries: Carries,
) -> TestJudgement {
    let mut stops = limit_stops(test);
    stops.extend(context.blocking(test.subject, None).map(Stop::Caution));
    let carries = if test.checked == Checked::Memory { Carries::Screening } else { carries };
    TestJudgement {
        outcome,
        used: Vec::new(),
        answer: Some(answer),
        closeness: Closeness::from_condition(outcome == TestOutcome::Undecided),
        carries,
        stops,
    }
}

fn carried_by(basis: Basis) -> Carries {
    match basis {
        Basis::Measured => Carries::Definitive,
        Basis::Unstated | Basis::Calculated | Basis::Estimated => Carries::Screening,
    }
}

pub(crate) fn judge_ready(context: Context, step: &Step, test: &Test) -> Option<TestJudgement> {
    let Limit::Is(wanted) = test.limit else {
        return None;
    };
    let accepted: Vec<_> = context
        .substance
        .ready
        .iter()
        .enumerate()
        .filter(|(_, entry)| test.bases.contains(&entry.value.basis))
        .filter(|(_, entry)| counts(Standing::of_reliability(entry.value.reliability), step.weight))
        .collect();
    let best = accepted.iter().map(|(_, entry)| entry.value.basis).min()?;
    accepted
        .into_iter()
        .filter(|(_, entry)| entry.value.basis == best)
        .map(|(index, entry)| (ready_outcome(entry.value.result, wanted), std::cmp::Reverse(index)))
        .max()
        .map(|(outcome, std::cmp::Reverse(index))| {
            in_words(context, test, outcome, Answer::Ready(index), carried_by(best))
        })
}

fn ready_outcome(found: DegradationTest, wanted: DegradationTest) -> TestOutcome {
    match found {
        DegradationTest::Open => TestOutcome::Undecided,
        DegradationTest::Ready | DegradationTest::NotReady if found == wanted => TestOutcome::Fired,
        DegradationTest::Ready | DegradationTest::NotReady => TestOutcome::Clear,
    }
}

/// An inherent test counts only if it followed the guideline and the level was reached, or missed, in time.
pub(crate) fn judge_inherent(context: Context, step: &Step, test: &Test) -> Option<TestJudgement> {
    let guideline = test.guideline.as_deref();
    context
        .substance
        .inherent
        .iter()
        .enumerate()
        .filter(|(_, entry)| test.bases.contains(&entry.value.basis))
        .filter(|(_, entry)| counts(Standing::of_reliability(entry.value.reliability), step.weight))
        .filter(|(_, entry)| guideline.is_none_or(|wanted| entry.value.guideline.as_deref() == Some(wanted)))
        .filter_map(|(index, entry)| {
            let outcome = outcome_of(test, entry.value.degraded?);
            let in_time =
                test.within.is_none_or(|within| entry.value.days.is_some_and(|days| days <= within));
            let outcome = match (outcome, in_time) {
                (Outcome::Clear, true) => TestOutcome::Clear,
                (Outcome::Clear, false) | (Outcome::Undecided, _) => TestOutcome::Undecided,
                (Outcome::Fired, _) => TestOutcome::Fired,
            };
            Some((outcome, std::cmp::Reverse(index), entry.value.basis))
        })
        .max()
        .map(|(outcome, std::cmp::Reverse(index), basis)| {
            in_words(context, test, outcome, Answer::Inherent(index), carried_by(basis))
        })
}

/// A filled cell that lacks the codes is clear; one that was not read to its end leaves it open; an empty cell says
/// nothing.
pub(crate) fn judge_statements(context: Context, test: &Test) -> Option<TestJudgement> {
    let Limit::AnyOfWords(codes) = &test.limit else {
        return None;
    };
    let statements = &context.substance.hazard_statements.as_ref()?.value;
    let found = codes.iter().find_map(|code| statements.find(code));
    // The classification in force is itself what the instruments ask for, so a stated one counts in full.
    let (outcome, answer, carries) = match (found, statements.completeness()) {
        (Some(code), _) => (TestOutcome::Fired, Answer::Statement(code.to_owned()), Carries::Definitive),
        (None, Completeness::Complete) => (TestOutcome::Clear, Answer::NoStatement, Carries::Screening),
        (None, Completeness::Incomplete) => (TestOutcome::Undecided, Answer::NoStatement, Carries::Screening),
    };
    Some(in_words(context, test, outcome, answer, carries))
}
