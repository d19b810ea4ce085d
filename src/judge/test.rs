//! One test of a step: which value counts, how it stands to the limit, and what a clear by it could not stand against.

use crate::evidence::{Evidence, Origin, Standing};
use crate::judge::compare::{hold_against, outcome_of, reaches_within_one_sd};
use crate::judge::words::{judge_inherent, judge_ready, judge_statements};
use crate::judge::{Carries, Closeness, Context, Stop, TestJudgement, TestOutcome, Used};
use crate::quantity::{Interval, Outcome};
use crate::rules::{Checked, Limit, Step, Subject, Test, Weight, WhenMissing};
use crate::substance::{Basis, Compartment, DegradationKind, Property};

/// Judges one test of a step.
pub(crate) fn judge_test(context: Context, step: &Step, test: &Test) -> TestJudgement {
    let judged = match test.subject {
        Subject::Property(property) => judge_number(context, step, test, property),
        Subject::ReadyBiodegradability => judge_ready(context, step, test),
        Subject::InherentBiodegradability => judge_inherent(context, step, test),
        Subject::HazardStatements => judge_statements(context, test),
    };
    match (judged, test.missing) {
        (Some(judged), _) => judged,
        (None, WhenMissing::Open) => without_value(TestOutcome::Missing),
        (None, WhenMissing::Fires) => without_value(TestOutcome::Fired),
    }
}

fn without_value(outcome: TestOutcome) -> TestJudgement {
    TestJudgement {
        outcome,
        used: Vec::new(),
        answer: None,
        closeness: Closeness::Clear,
        carries: Carries::Screening,
        stops: Vec::new(),
    }
}

fn judge_number(context: Context, step: &Step, test: &Test, property: Property) -> Option<TestJudgement> {
    let mut used: Vec<Used> = match property {
        Property::HalfLife(Compartment::Water) => together(context, step, test, WATERS),
        Property::HalfLife(Compartment::Sediment) => together(context, step, test, SEDIMENTS),
        _ => {
            let own = most_concerning(context, step, test, property, |interval| outcome_of(test, interval));
            own.or_else(|| unspecified(context, step, test, property)).into_iter().collect()
        }
    };
    used.sort_by(|one, other| concern(test, other).total_cmp(&concern(test, one)));
    used.sort_by_key(|value| std::cmp::Reverse(outcome_rank(value.outcome)));
    let deciding = used.first()?;
    let outcome = match deciding.outcome {
        Outcome::Fired => TestOutcome::Fired,
        Outcome::Undecided => TestOutcome::Undecided,
        Outcome::Clear => TestOutcome::Clear,
    };
    let closeness = deciding.closeness;
    let carries = carries(context, test, outcome, &used);
    let stops = stops(context, test, &used);
    Some(TestJudgement { outcome, used, answer: None, closeness, carries, stops })
}

const WATERS: [Property; 3] = [
    Property::HalfLife(Compartment::FreshWater),
    Property::HalfLife(Compartment::MarineWater),
    Property::HalfLife(Compartment::Water),
];
const SEDIMENTS: [Property; 3] = [
    Property::HalfLife(Compartment::FreshSediment),
    Property::HalfLife(Compartment::MarineSediment),
    Property::HalfLife(Compartment::Sediment),
];

/// The value of each compartment that has one.
fn together(context: Context, step: &Step, test: &Test, compartments: [Property; 3]) -> Vec<Used> {
    compartments
        .into_iter()
        .filter_map(|property| {
            most_concerning(context, step, test, property, |interval| outcome_of(test, interval))
        })
        .collect()
}

/// A half-life in a compartment not further specified stands for each such compartment that has no value of its own:
/// beyond the highest limit it could stand for it fires, within the lowest it is clear.
fn unspecified(context: Context, step: &Step, test: &Test, property: Property) -> Option<Used> {
    let (unspecified, group) = match property {
        Property::HalfLife(Compartment::FreshWater | Compartment::MarineWater) => {
            (Property::HalfLife(Compartment::Water), WATERS)
        }
        Property::HalfLife(Compartment::FreshSediment | Compartment::MarineSediment) => {
            (Property::HalfLife(Compartment::Sediment), SEDIMENTS)
        }
        _ => return None,
    };
    let standing_for: Vec<&Test> = step
        .tests
        .iter()
        .filter(|other| match other.subject {
            Subject::Property(other_property) => {
                group.contains(&other_property)
                    && counted(context, step, other, other_property).next().is_none()
            }
            Subject::ReadyBiodegradability
            | Subject::InherentBiodegradability
            | Subject::HazardStatements => false,
        })
        .collect();
    most_concerning(context, step, test, unspecified, |interval| {
        let outcomes: Vec<Outcome> = standing_for.iter().map(|other| outcome_of(other, interval)).collect();
        if outcomes.iter().all(|outcome| *outcome == Outcome::Fired) {
            Outcome::Fired
        } else if outcomes.iter().all(|outcome| *outcome == Outcome::Clear) {
            Outcome::Clear
        } else {
            Outcome::Undecided
        }
    })
}

/// The values of a property that the test accepts, those of the best basis only.
fn counted<'run>(
    context: Context<'run>,
    step: &Step,
    test: &Test,
    property: Property,
) -> impl Iterator<Item = (usize, &'run Evidence)> {
    let bases = test.bases.clone();
    let weight = step.weight;
    let accepted =
        move |evidence: &Evidence| bases.contains(&evidence.basis) && counts(evidence.standing, weight);
    let values = context.evidence.of(property);
    let best = values.iter().filter(|evidence| accepted(evidence)).map(|evidence| evidence.basis).min();
    values.iter().enumerate().filter(move |(_, evidence)| accepted(evidence) && Some(evidence.basis) == best)
}

/// Whether something of this standing counts in a step of this weight.
pub(crate) fn counts(standing: Standing, weight: Weight) -> bool {
    match (standing, weight) {
        (Standing::Full, _) | (Standing::SupportingOnly, Weight::Supporting) => true,
        (Standing::SupportingOnly, Weight::Concern | Weight::Screening | Weight::Definitive) => false,
    }
}

/// Of several values of the best basis, the one that points to more concern for this test.
fn most_concerning(
    context: Context,
    step: &Step,
    test: &Test,
    property: Property,
    outcome: impl Fn(Interval) -> Outcome,
) -> Option<Used> {
    counted(context, step, test, property)
        .map(|(index, evidence)| hold_against(context, test, index, evidence, &outcome))
        .max_by(|one, other| {
            outcome_rank(one.outcome)
                .cmp(&outcome_rank(other.outcome))
                .then(concern(test, one).total_cmp(&concern(test, other)))
                // `max_by` keeps the last of equals; the first column is the one to name.
                .then(other.index.cmp(&one.index))
        })
}

fn outcome_rank(outcome: Outcome) -> u8 {
    match outcome {
        Outcome::Clear => 0,
        Outcome::Undecided => 1,
        Outcome::Fired => 2,
    }
}

/// How far a value reaches towards the limit's concerning side.
fn concern(test: &Test, used: &Used) -> f64 {
    let upward = match &test.limit {
        Limit::Number { comparison, .. } => comparison.looks_upward(),
        Limit::Between { .. } | Limit::AnyOfWords(_) | Limit::Is(_) => true,
    };
    if upward {
        used.compared.high().number().unwrap_or(f64::INFINITY)
    } else {
        -used.compared.low().number().unwrap_or(f64::NEG_INFINITY)
    }
}

/// The evidence behind a used value.
fn evidence_of<'run>(context: Context<'run>, used: &Used) -> Option<&'run Evidence> {
    context.evidence.of(used.property).get(used.index)
}

fn derived_from(evidence: &Evidence) -> Option<Subject> {
    match evidence.origin {
        Origin::Cell(_) => None,
        Origin::Relation { .. } => Some(Subject::Property(Property::LogKow)),
    }
}

fn carries(context: Context, test: &Test, outcome: TestOutcome, used: &[Used]) -> Carries {
    let strong = |value: &Used| {
        evidence_of(context, value).is_some_and(|evidence| {
            evidence.basis == Basis::Measured
                && match outcome {
                    TestOutcome::Fired => {
                        let subject = Subject::Property(evidence.property);
                        !context.fires_as_screening_only(subject, derived_from(evidence))
                    }
                    TestOutcome::Clear => {
                        let half_life = matches!(evidence.property, Property::HalfLife(_));
                        !half_life || evidence.conditions.degradation == DegradationKind::Ultimate
                    }
                    TestOutcome::Undecided | TestOutcome::Missing => false,
                }
        })
    };
    let fired = |value: &&Used| value.outcome == Outcome::Fired;
    let carried = match outcome {
        TestOutcome::Fired => used.iter().filter(fired).any(strong),
        TestOutcome::Clear => used.iter().all(strong),
        TestOutcome::Undecided | TestOutcome::Missing => false,
    };
    if carried && test.checked != Checked::Memory { Carries::Definitive } else { Carries::Screening }
}

fn stops(context: Context, test: &Test, used: &[Used]) -> Vec<Stop> {
    let mut stops = limit_stops(test);
    for value in used {
        let Some(evidence) = evidence_of(context, value) else {
            continue;
        };
        let blocking = context.blocking(Subject::Property(evidence.property), derived_from(evidence));
        stops.extend(blocking.map(Stop::Caution));
        let modelled = matches!(evidence.basis, Basis::Calculated | Basis::Estimated);
        if modelled && reaches_within_one_sd(context, test, evidence, value.compared) {
            stops.push(Stop::WithinOneSd);
        }
        if let Origin::Relation { relation, low_side, .. } = &evidence.origin {
            if context
                .rules
                .relations
                .relations
                .get(*relation)
                .is_some_and(|line| line.checked == Checked::Memory)
            {
                stops.push(Stop::RelationFromMemory(*relation));
            }
            stops.extend(low_side.and_then(|(line, log_value)| low_side_stop(test, line, log_value)));
        }
    }
    stops.dedup();
    stops
}

/// For limits that look downward, such as mobility: the lowest line that could apply must clear as well.
fn low_side_stop(test: &Test, relation: usize, log_value: f64) -> Option<Stop> {
    let Limit::Number { comparison, .. } = test.limit else {
        return None;
    };
    let lowest = Interval::point(10f64.powf(log_value)).ok()?;
    let clears = outcome_of(test, lowest) == Outcome::Clear;
    (!comparison.looks_upward() && !clears).then_some(Stop::LowSide { relation, log_value })
}

pub(crate) fn limit_stops(test: &Test) -> Vec<Stop> {
    match test.checked {
        Checked::Memory => vec![Stop::LimitFromMemory],
        Checked::Seen | Checked::SecondHand => Vec::new(),
    }
}
