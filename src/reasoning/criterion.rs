//! One criterion in words: a line of the Reasoning sheet.

use crate::judge::{CriterionJudgement, Deciding, Decision, StepJudgement, StepState, TestJudgement, Used};
use crate::quantity::format_interval;
use crate::reasoning::stops::stops_phrase;
use crate::reasoning::value::{
    basis_phrase, evidence_of, limit_phrase, listed, origin_phrase, test_clause, titles, value_phrase,
};
use crate::reasoning::{Book, Told, verdict_text};
use crate::rules::{Checked, Criterion, Step, Test, Weight};

/// What the Reasoning sheet says of one criterion.
#[derive(Debug, Clone, PartialEq, Default)]
pub struct Line {
    /// The verdict cell's words.
    pub verdict: String,
    /// The deciding value, in the unit beside it.
    pub value: String,
    /// Its unit.
    pub unit: String,
    /// Its standard deviation, log units.
    pub sd: Option<f64>,
    /// How it is known.
    pub basis: String,
    /// Its cell, or the method that gave it.
    pub origin: String,
    /// The limit with its comparison.
    pub limit: String,
    /// Log units beyond the limit.
    pub margin: Option<f64>,
    /// The chance that the value lies beyond the limit.
    pub chance: Option<f64>,
    /// The reasoning.
    pub sentence: String,
    /// The cautions that touched the criterion.
    pub cautions: String,
    /// Paragraph of the legal text and how the limit was checked.
    pub source: String,
    /// The data that would settle it, where it is open.
    pub would_settle: String,
}

/// The line of one criterion.
pub fn criterion_line(book: Book, criterion: &Criterion, judged: &CriterionJudgement) -> Line {
    let mut line = Line {
        verdict: verdict_text(criterion, judged),
        sentence: sentence(book, criterion, judged),
        cautions: cautions(book.told, judged),
        would_settle: would_settle(judged),
        ..Line::default()
    };
    if let Some((test, came_out)) = shown_test(criterion, judged) {
        line.limit = limit_phrase(test);
        line.source = source(test);
        if let Some(used) = came_out.used.first() {
            fill_value(&mut line, book.told, used);
        }
    } else if let Some(rated) = &judged.rated {
        fill_value(&mut line, book.told, rated);
    }
    line
}

fn would_settle(judged: &CriterionJudgement) -> String {
    match &judged.deciding {
        Some(Deciding::Data(subjects)) => listed(&titles(subjects.iter().copied())),
        Some(Deciding::ExpertJudgement) => "expert judgement".to_owned(),
        None => String::new(),
    }
}

fn fill_value(line: &mut Line, told: Told, used: &Used) {
    line.value = format_interval(used.compared, crate::quantity::Unit::One);
    line.unit = used.property.default_unit().symbol().to_owned();
    line.margin = used.margin;
    line.chance = used.chance;
    if let Some(evidence) = evidence_of(told, used) {
        line.sd = evidence.sd;
        line.basis = basis_phrase(evidence.basis).to_owned();
        line.origin = origin_phrase(told, evidence);
    }
}

fn source(test: &Test) -> String {
    match test.checked {
        Checked::Seen => test.source.clone(),
        Checked::SecondHand => format!("{} (second-hand)", test.source),
        Checked::Memory => {
            format!(
                "{} (from memory: check the current text before relying on this)",
                test.source
            )
        }
    }
}

/// The test a line shows: of the deciding step; else of the first stopped clear; else of the first step with data.
fn shown_test<'run>(
    criterion: &'run Criterion,
    judged: &'run CriterionJudgement,
) -> Option<(&'run Test, &'run TestJudgement)> {
    let step = match judged.decision {
        Decision::In(step) | Decision::Out(step) => Some(step),
        Decision::Open => judged.stopped.first().map(|clear| clear.step).or_else(|| {
            judged
                .steps
                .iter()
                .position(|step| !matches!(step.state, StepState::Empty | StepState::Skipped))
        }),
        Decision::Assess | Decision::OutOfScope(_) | Decision::Rating => None,
    }?;
    let (rule, came_out) = (criterion.steps.get(step)?, judged.steps.get(step)?);
    let with_value = came_out
        .tests
        .iter()
        .position(|test| !test.used.is_empty() || test.answer.is_some());
    let chosen = match came_out.state {
        StepState::Partial => with_value.or(came_out.by.first().copied()),
        StepState::Fired
        | StepState::Clear
        | StepState::Undecided
        | StepState::Empty
        | StepState::Skipped => came_out.by.first().copied(),
    }?;
    Some((rule.tests.get(chosen)?, came_out.tests.get(chosen)?))
}

fn cautions(told: Told, judged: &CriterionJudgement) -> String {
    let mut ids: Vec<String> = Vec::new();
    for stop in judged.stopped.iter().flat_map(|clear| &clear.stops) {
        if let crate::judge::Stop::Caution(index) = stop
            && let Some(caution) = told.rules.cautions.get(*index)
            && !ids.contains(&caution.id)
        {
            ids.push(caution.id.clone());
        }
    }
    ids.join(", ")
}

fn sentence(book: Book, criterion: &Criterion, judged: &CriterionJudgement) -> String {
    let mut sentences = match judged.decision {
        Decision::In(step) => decided(book, criterion, judged, step, "Points to"),
        Decision::Out(step) => decided(book, criterion, judged, step, "Points away from"),
        Decision::Open => open(book.told, criterion, judged),
        Decision::Assess => vec![criterion.assess.clone().unwrap_or_default()],
        Decision::OutOfScope(caution) => {
            let caution = book.told.rules.cautions.get(caution);
            vec![format!(
                "{} does not cover it: {}",
                book.rulebook.short,
                caution.map_or("", |caution| caution.sentence.as_str())
            )]
        }
        Decision::Rating => vec![rating(book.told, criterion, judged)],
    };
    sentences.extend(supporting(book.told, criterion, judged));
    let text: Vec<String> = sentences.into_iter().map(|sentence| closed(&sentence)).collect();
    text.join(" ")
}

/// A sentence with its capital and its full stop.
fn closed(sentence: &str) -> String {
    let sentence = sentence.trim();
    let mut characters = sentence.chars();
    // Names such as `log Kow` keep their small letter, which is how the trade writes them.
    let keeps_small = ["log ", "pKa"].iter().any(|start| sentence.starts_with(start));
    let capital = match characters.next() {
        Some(first) if !keeps_small => first.to_uppercase().chain(characters).collect(),
        Some(_) | None => sentence.to_owned(),
    };
    if capital.ends_with(['.', '!', '?']) {
        capital
    } else {
        format!("{capital}.")
    }
}

fn decided(
    book: Book,
    criterion: &Criterion,
    judged: &CriterionJudgement,
    step: usize,
    direction: &str,
) -> Vec<String> {
    let (Some(rule), Some(came_out)) = (criterion.steps.get(step), judged.steps.get(step)) else {
        return Vec::new();
    };
    let clauses = clauses(book.told, rule, came_out);
    let mut sentences = vec![format!(
        "{direction} {} because {}",
        criterion.id,
        listed(&clauses)
    )];
    sentences.extend(margin(came_out));
    if came_out.closeness == crate::judge::Closeness::CloseCall {
        sentences.push(
            "A close call: the limit lies inside the value's range or within one standard deviation".into(),
        );
    }
    sentences.extend(weight_remark(book, rule, came_out));
    sentences.extend(before(book.told, criterion, judged, step));
    sentences
}

fn clauses(told: Told, rule: &Step, came_out: &StepJudgement) -> Vec<String> {
    came_out
        .by
        .iter()
        .filter_map(|index| {
            Some(test_clause(
                told,
                rule.tests.get(*index)?,
                came_out.tests.get(*index)?,
            ))
        })
        .collect()
}

/// How far, and how sure, where a single value decided.
fn margin(came_out: &StepJudgement) -> Option<String> {
    let [only] = came_out.by.as_slice() else {
        return None;
    };
    let used = came_out.tests.get(*only)?.used.first()?;
    let margin = used.margin?;
    let chance = used.chance.map(|chance| {
        format!(
            "; given its error, the chance that the value lies beyond the limit is {} %",
            percent(chance)
        )
    });
    Some(format!(
        "Distance from the limit: {} log units{}",
        signed(margin),
        chance.unwrap_or_default()
    ))
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
        .any(|test| test.carries == crate::judge::Carries::Definitive);
    match rule.weight {
        Weight::Definitive if book.rulebook.strongest != Weight::Definitive => Some(format!(
            "{} leaves the decision to a review, so this is a screening result",
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

/// What earlier steps came to.
fn before(told: Told, criterion: &Criterion, judged: &CriterionJudgement, deciding: usize) -> Vec<String> {
    let mut sentences = Vec::new();
    for (index, (rule, came_out)) in criterion
        .steps
        .iter()
        .zip(&judged.steps)
        .enumerate()
        .take(deciding)
    {
        if rule.weight <= Weight::Concern {
            continue;
        }
        sentences.extend(passed_over(told, criterion, judged, index, rule, came_out));
    }
    sentences
}

fn passed_over(
    told: Told,
    criterion: &Criterion,
    judged: &CriterionJudgement,
    index: usize,
    rule: &Step,
    came_out: &StepJudgement,
) -> Option<String> {
    if let Some(stopped) = judged.stopped.iter().find(|clear| clear.step == index) {
        let clauses = listed(&clauses(told, rule, came_out));
        return Some(format!(
            "{clauses}, but {}",
            stops_phrase(told, criterion, judged, stopped)
        ));
    }
    let missing = || {
        listed(&titles(
            came_out
                .by
                .iter()
                .filter_map(|test| rule.tests.get(*test))
                .map(|test| test.subject),
        ))
    };
    match came_out.state {
        StepState::Empty => {
            let asked = listed(&titles(rule.tests.iter().map(|test| test.subject)));
            Some(format!(
                "No {asked} in the inventory, which does not mean that none exists"
            ))
        }
        StepState::Partial => {
            let known: Vec<String> = rule
                .tests
                .iter()
                .zip(&came_out.tests)
                .filter(|(_, test)| !test.used.is_empty() || test.answer.is_some())
                .map(|(rule, test)| test_clause(told, rule, test))
                .collect();
            Some(format!("{}, but {} is missing", listed(&known), missing()))
        }
        StepState::Undecided => Some(listed(&clauses(told, rule, came_out))),
        StepState::Clear | StepState::Fired | StepState::Skipped => None,
    }
}

fn open(told: Told, criterion: &Criterion, judged: &CriterionJudgement) -> Vec<String> {
    let mut sentences = Vec::new();
    for (index, (rule, came_out)) in criterion.steps.iter().zip(&judged.steps).enumerate() {
        if rule.weight > Weight::Concern {
            sentences.extend(passed_over(told, criterion, judged, index, rule, came_out));
        }
    }
    let tail = match &judged.deciding {
        Some(Deciding::Data(subjects)) => {
            format!(
                "A measured {} would settle it",
                listed(&titles(subjects.iter().copied()))
            )
        }
        Some(Deciding::ExpertJudgement) => {
            "No single set of data settles it by number; a qualified person has to assess it".to_owned()
        }
        None => String::new(),
    };
    if !tail.is_empty() {
        sentences.push(tail);
    }
    sentences
}

fn rating(told: Told, criterion: &Criterion, judged: &CriterionJudgement) -> String {
    match &judged.rated {
        Some(rated) => {
            let ratings: Vec<String> = judged
                .ratings
                .iter()
                .filter_map(|index| criterion.bands.get(*index))
                .map(|band| format!("{} ({})", band.rating, band.test.limit_text))
                .collect();
            format!("{} falls in {}", value_phrase(told, rated), listed(&ratings))
        }
        None => {
            let asked = titles(criterion.bands.iter().map(|band| band.test.subject));
            format!("No {} in the inventory", listed(&asked))
        }
    }
}

/// What concern and supporting steps add, where they say something.
fn supporting(told: Told, criterion: &Criterion, judged: &CriterionJudgement) -> Vec<String> {
    criterion
        .steps
        .iter()
        .zip(&judged.steps)
        .filter(|(rule, came_out)| rule.weight <= Weight::Concern && came_out.state == StepState::Fired)
        .map(|(rule, came_out)| {
            let label = match rule.weight {
                Weight::Concern => "Of concern, without deciding",
                Weight::Supporting | Weight::Screening | Weight::Definitive => "Beside it, without deciding",
            };
            format!("{label}: {}", listed(&clauses(told, rule, came_out)))
        })
        .collect()
}

/// A number for a cell, shortened as sentences shorten it.
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
        assert_eq!(
            closed("log Kow 5.2 is above the limit"),
            "log Kow 5.2 is above the limit."
        );
        assert_eq!(signed(-0.25), "\u{2212}0.25");
    }
}
