//! What would settle an open criterion: the smallest set of data whose arrival gives an answer whichever way it falls.
//!
//! Found by asking, not by rule of thumb: each candidate is imagined measured on every side of the limits it is held
//! against, and the steps are taken again.

use crate::judge::compare::outcome_of;
use crate::judge::criterion::decide;
use crate::judge::found::question;
use crate::judge::test::limit_stops;
use crate::judge::{Carries, Closeness, Context, CriterionJudgement, Stop, TestJudgement, TestOutcome};
use crate::quantity::{Interval, Outcome};
use crate::rules::{Checked, Criterion, Limit, Subject, Test, Weight};
use crate::substance::Property;

/// What would settle an open criterion.
#[derive(Debug, Clone, PartialEq, Eq)]
pub enum Deciding {
    /// These data together.
    Data(Vec<Subject>),
    /// No set settles it whichever way it falls, but each of these would if it pointed to concern.
    Perhaps(Vec<Subject>),
    /// No data that the criterion asks for.
    ExpertJudgement,
}

/// No more data than this are combined in the search.
const LARGEST_SET: usize = 4;

/// No more combinations of results are tried for one set.
const MOST_COMBINATIONS: usize = 4096;

/// A result that a missing datum could have.
#[derive(Debug, Clone, Copy, PartialEq)]
enum Imagined {
    Number(f64),
    Fires,
    Clears,
}

/// Searches sets of growing size; among sets of one size those that spare animals come first.
pub(crate) fn find_deciding_data(
    context: Context,
    criterion: &Criterion,
    judged: &CriterionJudgement,
) -> Deciding {
    let known = bare_outcomes(judged);
    let question = question(context, criterion, &known);
    if let Some(found) = context.found.get(&question) {
        return found;
    }
    let deciding = search(context, criterion, judged, &known);
    context.found.keep(question, deciding.clone());
    deciding
}

fn search(
    context: Context,
    criterion: &Criterion,
    judged: &CriterionJudgement,
    known: &[Vec<TestJudgement>],
) -> Deciding {
    let mut candidates = candidates(criterion, judged);
    candidates.sort_by_key(|subject| burden(*subject));
    (1..=LARGEST_SET)
        .flat_map(|size| sets(&candidates, size))
        .find(|set| settles(context, criterion, known, set))
        .map_or_else(|| perhaps(context, criterion, known, &candidates), Deciding::Data)
}

/// What the tests came to, without the values behind it: the search takes the steps hundreds of times.
fn bare_outcomes(judged: &CriterionJudgement) -> Vec<Vec<TestJudgement>> {
    let bare = |test: &TestJudgement| TestJudgement {
        used: Vec::new(),
        answer: None,
        stops: test.stops.clone(),
        ..*test
    };
    judged.steps.iter().map(|step| step.tests.iter().map(bare).collect()).collect()
}

/// The data of which some result would give an answer.
fn perhaps(
    context: Context,
    criterion: &Criterion,
    known: &[Vec<TestJudgement>],
    candidates: &[Subject],
) -> Deciding {
    let telling: Vec<Subject> = candidates
        .iter()
        .copied()
        .filter(|subject| {
            let results = possible_results(criterion, *subject);
            results.iter().any(|result| decides(context, criterion, known, &[*subject], &[*result]))
        })
        .collect();
    if telling.is_empty() { Deciding::ExpertJudgement } else { Deciding::Perhaps(telling) }
}

/// Existing statements and physico-chemical data, then degradation tests, then animal tests (common practice: animal
/// tests are the last resort).
fn burden(subject: Subject) -> u8 {
    match subject {
        Subject::HazardStatements => 0,
        Subject::ReadyBiodegradability | Subject::InherentBiodegradability => 2,
        Subject::Property(property) => match property {
            Property::LogKow
            | Property::LogD
            | Property::LogKoa
            | Property::WaterSolubility
            | Property::MeltingPoint
            | Property::BoilingPoint
            | Property::VapourPressure
            | Property::HenryConstant
            | Property::PkaAcid
            | Property::PkaBase
            | Property::Koc
            | Property::MolarMass => 1,
            Property::HalfLife(_)
            | Property::HydrolysisHalfLife
            | Property::PhotolysisHalfLife
            | Property::DissipationHalfLife => 3,
            Property::LongTermToxicity | Property::AcuteToxicity => 4,
            Property::Bcf | Property::Baf | Property::Bmf | Property::Tmf => 5,
        },
    }
}

/// The subjects of the deciding steps that are missing, straddle, or rest on less than a measurement.
fn candidates(criterion: &Criterion, judged: &CriterionJudgement) -> Vec<Subject> {
    let mut subjects = Vec::new();
    for (step, judged_step) in criterion.steps.iter().zip(&judged.steps) {
        for (test, judged_test) in step.tests.iter().zip(&judged_step.tests) {
            let settled =
                judged_test.outcome == TestOutcome::Fired || judged_test.carries == Carries::Definitive;
            if step.weight > Weight::Concern && !settled && !subjects.contains(&test.subject) {
                subjects.push(test.subject);
            }
        }
    }
    subjects
}

fn sets(candidates: &[Subject], size: usize) -> Vec<Vec<Subject>> {
    if size == 0 {
        return vec![Vec::new()];
    }
    let mut found = Vec::new();
    for (position, first) in candidates.iter().enumerate() {
        let rest = candidates.get(position + 1..).unwrap_or_default();
        for mut set in sets(rest, size - 1) {
            set.insert(0, *first);
            found.push(set);
        }
    }
    found
}

/// Whether every combination of results of the imagined data gives an answer.
fn settles(context: Context, criterion: &Criterion, known: &[Vec<TestJudgement>], set: &[Subject]) -> bool {
    let results: Vec<Vec<Imagined>> =
        set.iter().map(|subject| possible_results(criterion, *subject)).collect();
    // A rulebook of very many limits would ask for more combinations than anybody waits for.
    let count = results.iter().fold(1_usize, |product, choices| product.saturating_mul(choices.len()));
    count <= MOST_COMBINATIONS
        && combinations(&results)
            .iter()
            .all(|combination| decides(context, criterion, known, set, combination))
}

/// Whether the criterion is answered once the data of the set have these results.
fn decides(
    context: Context,
    criterion: &Criterion,
    known: &[Vec<TestJudgement>],
    set: &[Subject],
    results: &[Imagined],
) -> bool {
    let imagined_for = |test: &Test| {
        let place = set.iter().position(|subject| *subject == test.subject)?;
        results.get(place).copied()
    };
    let tests = criterion
        .steps
        .iter()
        .zip(known)
        .map(|(step, judged_step)| {
            let tests = step.tests.iter().zip(judged_step);
            tests
                .map(|(test, judged_test)| match imagined_for(test) {
                    Some(result) => imagine(context, test, result),
                    None => judged_test.clone(),
                })
                .collect()
        })
        .collect();
    decide(context.rulebook, criterion, tests).verdict.is_decided()
}

fn combinations(results: &[Vec<Imagined>]) -> Vec<Vec<Imagined>> {
    results.iter().fold(vec![Vec::new()], |so_far, choices| {
        so_far
            .iter()
            .flat_map(|begun| choices.iter().map(|choice| [begun.as_slice(), &[*choice]].concat()))
            .collect()
    })
}

/// A value below all limits the subject is held against, one between each two of them, and one above all.
fn possible_results(criterion: &Criterion, subject: Subject) -> Vec<Imagined> {
    let tests = || criterion.steps.iter().flat_map(|step| &step.tests).filter(|test| test.subject == subject);
    if !matches!(subject, Subject::Property(_)) {
        return vec![Imagined::Fires, Imagined::Clears];
    }
    let mut limits: Vec<f64> = tests().flat_map(numbers).collect();
    limits.sort_by(f64::total_cmp);
    limits.dedup_by(|one, other| one.total_cmp(other).is_eq());
    let (Some(lowest), Some(highest)) = (limits.first(), limits.last()) else {
        return Vec::new();
    };
    let beyond = highest.abs() + 1.0;
    let between = limits.windows(2).filter_map(|pair| match pair {
        [low, high] => Some(f64::midpoint(*low, *high)),
        _ => None,
    });
    std::iter::once(lowest - beyond)
        .chain(between)
        .chain(std::iter::once(highest + beyond))
        .map(Imagined::Number)
        .collect()
}

fn numbers(test: &Test) -> Vec<f64> {
    let mut numbers = match &test.limit {
        Limit::Number { value, .. } => vec![*value],
        Limit::Between { low, high } => vec![*low, *high],
        Limit::AnyOfWords(_) | Limit::Is(_) => Vec::new(),
    };
    numbers.extend(test.clear_below);
    numbers
}

/// How much weight a measured value would carry with this outcome.
fn imagined_weight(context: Context, test: &Test, outcome: TestOutcome) -> Carries {
    let screening_only = match (test.subject, outcome) {
        (Subject::HazardStatements, TestOutcome::Clear) => true,
        (subject @ Subject::Property(_), TestOutcome::Fired) => {
            context.fires_as_screening_only(subject, None)
        }
        _ => false,
    };
    if screening_only || test.checked == Checked::Memory { Carries::Screening } else { Carries::Definitive }
}

/// A measured value; cautions that block it still do.
fn imagine(context: Context, test: &Test, result: Imagined) -> TestJudgement {
    let outcome = match result {
        Imagined::Fires => TestOutcome::Fired,
        Imagined::Clears => TestOutcome::Clear,
        Imagined::Number(number) => match Interval::point(number).map(|value| outcome_of(test, value)) {
            Ok(Outcome::Fired) => TestOutcome::Fired,
            Ok(Outcome::Clear) => TestOutcome::Clear,
            Ok(Outcome::Undecided) | Err(_) => TestOutcome::Undecided,
        },
    };
    let mut stops = limit_stops(test);
    stops.extend(context.blocking(test.subject, None).map(Stop::Caution));
    TestJudgement {
        outcome,
        used: Vec::new(),
        answer: None,
        closeness: Closeness::Clear,
        carries: imagined_weight(context, test, outcome),
        stops,
    }
}
