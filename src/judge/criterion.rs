//! The steps of a criterion in order, until one decides.

use crate::judge::band::rate;
use crate::judge::deciding::find_deciding_data;
use crate::judge::step::judge_step;
use crate::judge::test::judge_test;
use crate::judge::{
    Carries, Closeness, Context, CriterionJudgement, Decision, StepJudgement, StepState, Stop, StoppedClear,
    TestJudgement, Verdict,
};
use crate::rules::{Combine, Criterion, Decides, Guards, OnlyIf, Rulebook, Step, Weight};

/// Judges one criterion.
pub(crate) fn judge_criterion(context: Context, criterion: &Criterion) -> CriterionJudgement {
    let scope = context.cautions.iter().map(|raised| raised.caution).find(|index| {
        let caution = context.rules.cautions.get(*index);
        caution.is_some_and(|caution| context.rulebook.out_of_scope.contains(&caution.id))
    });
    if let Some(caution) = scope {
        return without_steps(Verdict::OutOfScope, Decision::OutOfScope(caution));
    }
    if criterion.assess.is_some() {
        return without_steps(Verdict::Unresolved, Decision::Assess);
    }
    if !criterion.bands.is_empty() {
        let (ratings, rated) = rate(context, criterion);
        let verdict = if rated.is_some() { Verdict::Unresolved } else { Verdict::NoData };
        return CriterionJudgement { ratings, rated, ..without_steps(verdict, Decision::Rating) };
    }
    let tests = criterion
        .steps
        .iter()
        .map(|step| step.tests.iter().map(|test| judge_test(context, step, test)).collect())
        .collect();
    let mut judged = decide(context.rulebook, criterion, tests);
    if !judged.verdict.is_decided() {
        judged.deciding = Some(find_deciding_data(context, criterion, &judged));
    }
    judged
}

fn without_steps(verdict: Verdict, decision: Decision) -> CriterionJudgement {
    CriterionJudgement {
        verdict,
        closeness: Closeness::Clear,
        decision,
        stopped: Vec::new(),
        steps: Vec::new(),
        ratings: Vec::new(),
        rated: None,
        deciding: None,
    }
}

/// Takes the steps in order, given what their tests came to.
pub(crate) fn decide(
    rulebook: &Rulebook,
    criterion: &Criterion,
    tests: Vec<Vec<TestJudgement>>,
) -> CriterionJudgement {
    let mut steps: Vec<StepJudgement> =
        criterion.steps.iter().zip(tests).map(|(step, tests)| judge_step(step, tests)).collect();
    skip_steps(criterion, &mut steps);
    let (decision, stopped) = take_steps(rulebook, criterion, &steps);
    let verdict = word(rulebook, criterion, &steps, decision);
    let closeness = closeness(criterion, &steps, decision, &stopped);
    CriterionJudgement { closeness, stopped, steps, ..without_steps(verdict, decision) }
}

/// An `only-if` step is not taken when an earlier deciding step had any data.
fn skip_steps(criterion: &Criterion, steps: &mut [StepJudgement]) {
    let mut data_before = false;
    for (step, judged) in criterion.steps.iter().zip(steps) {
        match step.only_if {
            OnlyIf::NoDataBefore if data_before => judged.state = StepState::Skipped,
            OnlyIf::NoDataBefore | OnlyIf::Always => {}
        }
        let deciding = matches!(step.weight, Weight::Definitive | Weight::Screening);
        data_before |= deciding && !matches!(judged.state, StepState::Empty | StepState::Skipped);
    }
}

fn take_steps(
    rulebook: &Rulebook,
    criterion: &Criterion,
    steps: &[StepJudgement],
) -> (Decision, Vec<StoppedClear>) {
    let mut stopped: Vec<StoppedClear> = Vec::new();
    let mut doubt = false;
    for (index, (step, judged)) in criterion.steps.iter().zip(steps).enumerate() {
        match step.weight {
            Weight::Supporting | Weight::Concern => continue,
            Weight::Screening | Weight::Definitive => {}
        }
        match judged.state {
            StepState::Fired if step.decides != Decides::Out => return (Decision::In(index), stopped),
            StepState::Clear if step.decides != Decides::In => {
                let mut against = stops_of_tests(step.combine, judged);
                against.extend(guards(rulebook, criterion, steps, index));
                if doubt {
                    against.push(Stop::EarlierDoubt);
                }
                if against.is_empty() {
                    return (Decision::Out(index), stopped);
                }
                stopped.push(StoppedClear { step: index, stops: against });
                doubt = true;
            }
            StepState::Undecided if step.weight == Weight::Definitive => doubt = true,
            StepState::Fired
            | StepState::Clear
            | StepState::Undecided
            | StepState::Partial
            | StepState::Empty
            | StepState::Skipped => {}
        }
    }
    (Decision::Open, stopped)
}

/// A clear `any` step rests on every clear test; a clear `all` step stands as long as one of them stands.
fn stops_of_tests(combine: Combine, judged: &StepJudgement) -> Vec<Stop> {
    let clear: Vec<&TestJudgement> = judged.by.iter().filter_map(|index| judged.tests.get(*index)).collect();
    if combine == Combine::All && clear.iter().any(|test| test.stops.is_empty()) {
        return Vec::new();
    }
    let mut stops = Vec::new();
    for stop in clear.iter().flat_map(|test| &test.stops) {
        if !stops.contains(stop) {
            stops.push(*stop);
        }
    }
    stops
}

fn guards(rulebook: &Rulebook, criterion: &Criterion, steps: &[StepJudgement], clearing: usize) -> Vec<Stop> {
    let screening_clear = word(rulebook, criterion, steps, Decision::Out(clearing)) == Verdict::ScreensOut;
    // A clear that could not stand by itself closes no guard either.
    let open = |step: &Step, judged: &StepJudgement| match judged.state {
        StepState::Partial | StepState::Undecided => true,
        StepState::Clear => !stops_of_tests(step.combine, judged).is_empty(),
        StepState::Skipped | StepState::Empty | StepState::Fired => false,
    };
    let guard = |index: usize, step: &Step, judged: &StepJudgement| match step.guards {
        Guards::Fired | Guards::FiredOrOpen if judged.state == StepState::Fired => Some(Stop::Guard(index)),
        Guards::FiredOrOpen if screening_clear && open(step, judged) => Some(Stop::OpenGuard(index)),
        Guards::Never | Guards::Fired | Guards::FiredOrOpen => None,
    };
    criterion
        .steps
        .iter()
        .zip(steps)
        .enumerate()
        .filter(|(index, _)| *index != clearing)
        .filter_map(|(index, (step, judged))| guard(index, step, judged))
        .collect()
}

fn word(rulebook: &Rulebook, criterion: &Criterion, steps: &[StepJudgement], decision: Decision) -> Verdict {
    let definitive = |index: usize, all: bool| {
        let step_is = criterion.steps.get(index).is_some_and(|step| step.weight == Weight::Definitive);
        let carried = steps.get(index).is_some_and(|judged| {
            let mut carries = judged
                .by
                .iter()
                .filter_map(|test| judged.tests.get(*test))
                .map(|test| test.carries == Carries::Definitive);
            if all { carries.all(|carries| carries) } else { carries.any(|carries| carries) }
        });
        step_is && carried && rulebook.strongest == Weight::Definitive
    };
    match decision {
        Decision::In(index) if definitive(index, false) => Verdict::Fulfilled,
        Decision::In(_) => Verdict::ScreensIn,
        Decision::Out(index) if definitive(index, true) => Verdict::NotFulfilled,
        Decision::Out(_) => Verdict::ScreensOut,
        Decision::OutOfScope(_) => Verdict::OutOfScope,
        Decision::Open | Decision::Assess | Decision::Rating => {
            let had_data = criterion.steps.iter().zip(steps).any(|(step, judged)| {
                step.weight != Weight::Supporting
                    && !matches!(judged.state, StepState::Empty | StepState::Skipped)
            });
            if had_data { Verdict::Unresolved } else { Verdict::NoData }
        }
    }
}

/// An open criterion is a close call if a value straddles its limit or a clear stopped at one SD.
fn closeness(
    criterion: &Criterion,
    steps: &[StepJudgement],
    decision: Decision,
    stopped: &[StoppedClear],
) -> Closeness {
    match decision {
        Decision::In(index) | Decision::Out(index) => {
            steps.get(index).map_or(Closeness::Clear, |judged| judged.closeness)
        }
        Decision::Open => {
            let straddles =
                criterion.steps.iter().zip(steps).any(|(step, judged)| {
                    step.weight > Weight::Concern && judged.state == StepState::Undecided
                });
            let within_one_sd = stopped.iter().any(|clear| clear.stops.contains(&Stop::WithinOneSd));
            Closeness::from_condition(straddles || within_one_sd)
        }
        Decision::Assess | Decision::OutOfScope(_) | Decision::Rating => Closeness::Clear,
    }
}
