//! What kept a clearing from standing, in words.

use crate::judge::{CriterionJudgement, StepState, Stop, StoppedClear};
use crate::quantity::format_number;
use crate::reasoning::Told;
use crate::reasoning::value::{listed, short_citation, telling_tests, test_brief, titles};
use crate::relations::Side;
use crate::rules::Criterion;

/// Why a clear by a step did not stand.
pub(crate) fn stops_phrase(
    told: Told,
    criterion: &Criterion,
    judged: &CriterionJudgement,
    clear: &StoppedClear,
) -> String {
    let phrases: Vec<String> =
        clear.stops.iter().map(|stop| stop_phrase(told, criterion, judged, *stop)).collect();
    listed(&phrases)
}

fn stop_phrase(told: Told, criterion: &Criterion, judged: &CriterionJudgement, stop: Stop) -> String {
    match stop {
        Stop::Caution(index) => {
            let id = told.rules.cautions.get(index).map_or("", |caution| caution.id.as_str());
            format!("the caution `{id}` does not let this value clear")
        }
        Stop::WithinOneSd => {
            "the value is modelled and the limit lies within one standard deviation of it".to_owned()
        }
        Stop::RelationFromMemory(relation) => {
            format!("the coefficients of {} are from memory", citation(told, relation))
        }
        Stop::LimitFromMemory => {
            "the limit is from memory: check the current text before relying on it".to_owned()
        }
        Stop::LowSide { relation, log_value } => low_side_phrase(told, relation, log_value),
        Stop::Guard(guard) => {
            format!("this does not stand beside {}", guard_brief(told, criterion, judged, guard))
        }
        Stop::OpenGuard(guard) => {
            let named = listed(&guard_missing(criterion, judged, guard));
            match judged.steps.get(guard).map(|came_out| came_out.state) {
                Some(StepState::Clear) => {
                    format!("{named} is not sure enough to rule out that other data point the other way")
                }
                Some(_) | None => format!("{named} could point the other way and is not known"),
            }
        }
        Stop::EarlierDoubt => "an earlier step had already left doubt".to_owned(),
    }
}

/// Which line could apply that gives less, and to what kind of substance.
fn low_side_phrase(told: Told, relation: usize, log_value: f64) -> String {
    let value = format_number(10f64.powf(log_value));
    let Some(line) = told.rules.relations.relations.get(relation) else { return String::new() };
    let unit = line.to.default_unit().symbol();
    let kind = match line.side {
        Side::Ionised if told.substance.ionising_pka().is_some() => {
            "ionised, as its pKa says it is between pH 4 and 9"
        }
        Side::Ionised => "if it ionises between pH 4 and 9, which is not known",
        Side::Class | Side::Central => "if it belongs to another class of substances, which is not known",
    };
    format!(
        "{kind}, it could be as low as {value} {unit} ({} less one standard deviation)",
        citation(told, relation)
    )
}

fn citation(told: Told, relation: usize) -> String {
    let citation = told.rules.relations.relations.get(relation).map_or("", |line| line.citation.as_str());
    short_citation(citation)
}

fn guard_brief(told: Told, criterion: &Criterion, judged: &CriterionJudgement, step: usize) -> String {
    let (Some(rule), Some(came_out)) = (criterion.steps.get(step), judged.steps.get(step)) else {
        return String::new();
    };
    let telling = telling_tests(rule, came_out, &came_out.by);
    let briefs: Vec<String> = telling.iter().map(|telling| test_brief(told, telling)).collect();
    briefs.join("; ")
}

fn guard_missing(criterion: &Criterion, judged: &CriterionJudgement, step: usize) -> Vec<String> {
    let (Some(rule), Some(came_out)) = (criterion.steps.get(step), judged.steps.get(step)) else {
        return Vec::new();
    };
    titles(came_out.by.iter().filter_map(|index| rule.tests.get(*index)).map(|test| test.subject))
}
