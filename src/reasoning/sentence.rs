//! The sentences behind a verdict.

use crate::judge::{
    Carries, Closeness, CriterionJudgement, Deciding, Decision, StepJudgement, StepState, TestJudgement,
    Verdict,
};
use crate::reasoning::absence::absence;
use crate::reasoning::designation::out_of_scope;
use crate::reasoning::stops::stops_phrase;
use crate::reasoning::value::{listed, telling_tests, test_clause, titles, value_phrase};
use crate::reasoning::{Book, Told};
use crate::rules::{Criterion, Step, Weight};

/// Why a criterion came out as it did.
pub(crate) fn sentence(book: Book, criterion: &Criterion, judged: &CriterionJudgement) -> String {
    let told = book.told;
    let id = &criterion.id;
    let mut sentences = match judged.decision {
        Decision::In(step) | Decision::Out(step) => {
            let finding = match judged.verdict {
                Verdict::Fulfilled => format!("{id} is fulfilled"),
                Verdict::NotFulfilled => format!("{id} is not fulfilled"),
                Verdict::ScreensOut => format!("Points away from {id}"),
                Verdict::ScreensIn | Verdict::Unresolved | Verdict::NoData | Verdict::OutOfScope => {
                    format!("Points to {id}")
                }
            };
            decided(book, criterion, judged, step, &finding)
        }
        Decision::Open => open(told, criterion, judged),
        Decision::Assess => vec![criterion.assess.clone().unwrap_or_default()],
        Decision::OutOfScope(caution) => vec![out_of_scope(book, caution)],
        Decision::Rating => vec![rating(told, criterion, judged)],
    };
    sentences.extend(beside(told, criterion, judged));
    let text: Vec<String> = sentences.iter().map(|sentence| closed(sentence)).collect();
    text.join(" ")
}

/// A sentence with its capital and its full stop.
fn closed(sentence: &str) -> String {
    let sentence = sentence.trim();
    let mut characters = sentence.chars();
    // Names such as `log Kow` and `vB` keep their small letter, which is how the trade writes them.
    let keeps_small = ["log ", "pKa", "vP", "vB", "vM"].iter().any(|start| sentence.starts_with(start));
    let capital = match characters.next() {
        Some(first) if !keeps_small => first.to_uppercase().chain(characters).collect(),
        Some(_) | None => sentence.to_owned(),
    };
    if capital.ends_with(['.', '!', '?']) { capital } else { format!("{capital}.") }
}

fn decided(
    book: Book,
    criterion: &Criterion,
    judged: &CriterionJudgement,
    step: usize,
    finding: &str,
) -> Vec<String> {
    let (Some(rule), Some(came_out)) = (criterion.steps.get(step), judged.steps.get(step)) else {
        return Vec::new();
    };
    let because = listed(&clauses(book.told, rule, came_out));
    let mut sentences = vec![format!("{finding} because {because}")];
    sentences.extend(margin(rule, came_out));
    match came_out.closeness {
        Closeness::Clear => {}
        Closeness::CloseCall => sentences.push(
            "A close call: the limit lies inside the value's range or within one standard deviation of it"
                .into(),
        ),
    }
    sentences.extend(weight_remark(book, rule, came_out));
    sentences.extend(passed_over(book.told, criterion, judged, step));
    sentences
}

fn clauses(told: Told, rule: &Step, came_out: &StepJudgement) -> Vec<String> {
    clauses_at(told, rule, came_out, &came_out.by)
}

fn clauses_at(told: Told, rule: &Step, came_out: &StepJudgement, places: &[usize]) -> Vec<String> {
    telling_tests(rule, came_out, places).iter().map(|telling| test_clause(told, telling)).collect()
}

/// The places of a step's tests that found a value or an answer.
pub(crate) fn places_with_value(came_out: &StepJudgement) -> Vec<usize> {
    let found = |test: &TestJudgement| !test.used.is_empty() || test.answer.is_some();
    came_out.tests.iter().enumerate().filter(|(_, test)| found(test)).map(|(place, _)| place).collect()
}

/// How far, and how sure, where a single value decided.
fn margin(rule: &Step, came_out: &StepJudgement) -> Option<String> {
    let telling = telling_tests(rule, came_out, &came_out.by);
    let [only] = telling.as_slice() else {
        return None;
    };
    let used = only.judged.used.first()?;
    let chance = used.chance.map_or(String::new(), |chance| {
        let percent = percent(chance);
        format!("; given its error, the chance that the value lies beyond the limit is {percent} %")
    });
    Some(format!("Distance from the limit: {} log units{chance}", signed(used.margin?)))
}

fn percent(chance: f64) -> String {
    let percent = chance * 100.0;
    if percent < 1.0 {
        "below 1".to_owned()
    } else if percent > 99.0 {
        "above 99".to_owned()
    } else {
        format!("{percent:.0}")
    }
}

fn signed(margin: f64) -> String {
    format!("{margin:+.2}").replace('-', "\u{2212}")
}

/// Why the words are no stronger than they are.
fn weight_remark(book: Book, rule: &Step, came_out: &StepJudgement) -> Option<String> {
    let carried = came_out
        .by
        .iter()
        .filter_map(|index| came_out.tests.get(*index))
        .any(|test| test.carries == Carries::Definitive);
    let strongest = book.rulebook.strongest;
    match rule.weight {
        Weight::Definitive if strongest != Weight::Definitive => Some(format!(
            "{} also takes evidence that no number settles and leaves the decision to a review, so this is a screening result",
            book.rulebook.short
        )),
        Weight::Definitive if !carried => Some(
            "A screening result, since the value is not said to be measured in the way the criterion asks"
                .into(),
        ),
        Weight::Screening => Some("A screening result".into()),
        Weight::Definitive | Weight::Concern | Weight::Supporting => None,
    }
}

/// What the deciding steps before `end` came to; those without any data in one sentence.
fn passed_over(told: Told, criterion: &Criterion, judged: &CriterionJudgement, end: usize) -> Vec<String> {
    let mut sentences = Vec::new();
    let mut absent = Vec::new();
    let mut said = Vec::new();
    for (index, (rule, came_out)) in criterion.steps.iter().zip(&judged.steps).enumerate().take(end) {
        match rule.weight {
            Weight::Supporting | Weight::Concern => {}
            Weight::Screening | Weight::Definitive if came_out.state == StepState::Empty => {
                absent.extend(rule.tests.iter().map(|test| test.subject));
            }
            Weight::Screening | Weight::Definitive => {
                sentences.extend(step_sentence(told, criterion, judged, index, &mut said));
            }
        }
    }
    // What a sentence before has told to be missing need not be told again.
    let absent: Vec<String> =
        titles(absent.into_iter()).into_iter().filter(|title| !said.contains(title)).collect();
    sentences.extend(absence(told, absent));
    sentences
}

/// `a`, `a or b`, `a, b or c`.
pub(super) fn alternatives(parts: &[String]) -> String {
    match parts {
        [first @ .., last] if !first.is_empty() => format!("{} or {last}", first.join(", ")),
        _ => listed(parts),
    }
}

/// What a step with data came to that did not decide; nothing where an earlier sentence said all of it.
fn step_sentence(
    told: Told,
    criterion: &Criterion,
    judged: &CriterionJudgement,
    index: usize,
    said: &mut Vec<String>,
) -> Option<String> {
    let (rule, came_out) = (criterion.steps.get(index)?, judged.steps.get(index)?);
    if let Some(stopped) = judged.stopped.iter().find(|clear| clear.step == index) {
        let clauses = listed(&clauses(told, rule, came_out));
        return Some(format!("{clauses}, but {}", stops_phrase(told, criterion, judged, stopped)));
    }
    let known = match came_out.state {
        StepState::Partial => clauses_at(told, rule, came_out, &places_with_value(came_out)),
        StepState::Undecided => clauses(told, rule, came_out),
        StepState::Empty | StepState::Clear | StepState::Fired | StepState::Skipped => return None,
    };
    if known.iter().all(|clause| said.contains(clause)) {
        return None;
    }
    let sentence = match came_out.state {
        StepState::Partial => {
            let missing = came_out.by.iter().filter_map(|test| rule.tests.get(*test));
            let needed = titles(missing.filter(|test| !test.optional).map(|test| test.subject));
            let sentence = format!("{}, but there is no {}", listed(&known), alternatives(&needed));
            said.extend(needed);
            sentence
        }
        StepState::Undecided
        | StepState::Empty
        | StepState::Clear
        | StepState::Fired
        | StepState::Skipped => listed(&known),
    };
    said.extend(known);
    Some(sentence)
}

fn open(told: Told, criterion: &Criterion, judged: &CriterionJudgement) -> Vec<String> {
    let mut sentences = passed_over(told, criterion, judged, criterion.steps.len());
    sentences.extend(judged.deciding.as_ref().map(deciding_sentence));
    sentences
}

/// What would settle an open criterion.
pub(crate) fn deciding_sentence(deciding: &Deciding) -> String {
    match deciding {
        Deciding::Data(subjects) => {
            let titles = titles(subjects.iter().copied());
            let together = if titles.len() > 1 { " together" } else { "" };
            format!("{} would settle it{together}", listed(&titles))
        }
        Deciding::Perhaps(subjects) => {
            const NAMED: usize = 3;
            let titles = titles(subjects.iter().copied());
            if titles.len() > NAMED {
                "no datum can clear it here, though some could show concern".to_owned()
            } else {
                format!("{} could show concern here, but not clear it", alternatives(&titles))
            }
        }
        Deciding::ExpertJudgement => {
            "no datum alone settles it; a qualified person has to assess it".to_owned()
        }
    }
}

fn rating(told: Told, criterion: &Criterion, judged: &CriterionJudgement) -> String {
    let Some(rated) = &judged.rated else {
        let asked = titles(criterion.bands.iter().map(|band| band.test.subject));
        return format!("The inventory holds no {}", alternatives(&asked));
    };
    let bands = judged.ratings.iter().filter_map(|index| criterion.bands.get(*index));
    let ratings: Vec<String> =
        bands.map(|band| format!("{} ({})", band.rating, band.test.limit_text)).collect();
    format!("{} falls in {}", value_phrase(told, rated), listed(&ratings))
}

/// What concern and supporting steps add, where they say something.
fn beside(told: Told, criterion: &Criterion, judged: &CriterionJudgement) -> Vec<String> {
    let steps = criterion.steps.iter().zip(&judged.steps);
    steps
        .filter(|(_, came_out)| came_out.state == StepState::Fired)
        .filter_map(|(rule, came_out)| {
            let label = match rule.weight {
                Weight::Concern => "Of concern, without deciding",
                Weight::Supporting => "Beside it, without deciding",
                Weight::Screening | Weight::Definitive => return None,
            };
            Some(format!("{label}: {}", listed(&clauses(told, rule, came_out))))
        })
        .collect()
}

#[cfg(test)]
mod tests {
    use super::{closed, percent, signed};

    #[test]
    fn chances_near_the_ends_are_not_shown_as_certain() {
        assert_eq!(percent(0.004), "below 1");
        assert_eq!(percent(0.996), "above 99");
        assert_eq!(percent(0.369), "37");
    }

    #[test]
    fn sentences_start_and_end_as_sentences_do() {
        assert_eq!(closed("no BCF in the inventory"), "No BCF in the inventory.");
        assert_eq!(closed("log Kow 5.2 is above the limit"), "log Kow 5.2 is above the limit.");
        assert_eq!(signed(-0.25), "\u{2212}0.25");
    }
}
