//! One criterion in words: a line of the Reasoning sheet.

use crate::judge::{Answer, CriterionJudgement, Decision, StepState, TestJudgement, Used};
use crate::quantity::format_interval;
use crate::reasoning::row::deciding_phrase;
use crate::reasoning::sentence::sentence;
use crate::reasoning::value::{evidence_of, limit_phrase, origin_phrase};
use crate::reasoning::{Book, Told, verdict_text};
use crate::rules::{Checked, Criterion, Test};
use crate::substance::DegradationTest;

/// What the Reasoning sheet says of one criterion.
#[derive(Debug, Clone, PartialEq, Default)]
pub struct Line {
    /// The verdict cell's words.
    pub verdict: String,
    /// The deciding value, in the unit beside it, if it is a single one.
    pub number: Option<f64>,
    /// The deciding value in words, if it is a range or an open interval.
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
        match (&came_out.answer, came_out.used.first()) {
            (Some(answer), _) => fill_answer(&mut line, book.told, answer),
            (None, Some(used)) => fill_value(&mut line, book.told, used),
            (None, None) => {}
        }
    } else if let Some(rated) = &judged.rated {
        fill_value(&mut line, book.told, rated);
    }
    line
}

fn would_settle(judged: &CriterionJudgement) -> String {
    judged.deciding.as_ref().map_or(String::new(), deciding_phrase)
}

fn fill_value(line: &mut Line, told: Told, used: &Used) {
    line.number = used.compared.single();
    if line.number.is_none() {
        line.value = format_interval(used.compared, crate::quantity::Unit::One);
    }
    used.property.default_unit().symbol().clone_into(&mut line.unit);
    line.margin = used.margin;
    line.chance = used.chance;
    if let Some(evidence) = evidence_of(told, used) {
        line.sd = evidence.sd;
        line.basis = match used.adjustment {
            None => evidence.basis.word().to_owned(),
            Some(_) => format!("{}, converted", evidence.basis.word()),
        };
        line.origin = origin_phrase(told, evidence);
    }
}

/// What a cell says in words, and where it stands.
fn fill_answer(line: &mut Line, told: Told, answer: &Answer) {
    let (value, basis, cell) = match answer {
        Answer::Ready(index) => {
            let Some(entry) = told.substance.ready.get(*index) else { return };
            let value = with_meaning(&entry.value.reported, entry.value.result);
            (value, entry.value.basis.word(), &entry.cell)
        }
        Answer::Inherent(index) => {
            let Some(entry) = told.substance.inherent.get(*index) else { return };
            (entry.value.reported.clone(), entry.value.basis.word(), &entry.cell)
        }
        Answer::Statement(code) => {
            let Some(statements) = &told.substance.hazard_statements else { return };
            (code.clone(), "", &statements.cell)
        }
        Answer::NoStatement => {
            let Some(statements) = &told.substance.hazard_statements else { return };
            let codes: Vec<&str> = statements.value.codes().collect();
            let codes = if codes.is_empty() { "no hazard statement".to_owned() } else { codes.join(", ") };
            (codes, "", &statements.cell)
        }
    };
    line.value = value;
    basis.clone_into(&mut line.basis);
    line.origin = cell.to_string();
}

/// What a cell says of ready biodegradability, and what it was taken for if it says so in other words.
fn with_meaning(reported: &str, result: DegradationTest) -> String {
    let meaning = match result {
        DegradationTest::Ready => "readily biodegradable",
        DegradationTest::NotReady => "not readily biodegradable",
        DegradationTest::Open => "not clear",
    };
    if reported.trim().eq_ignore_ascii_case(meaning) {
        return meaning.to_owned();
    }
    format!("{meaning}: `{}`", reported.trim())
}

fn source(test: &Test) -> String {
    match test.checked {
        Checked::Seen => test.source.clone(),
        Checked::SecondHand => format!("{} (second-hand)", test.source),
        Checked::Memory => {
            format!("{} (from memory: check the current text before relying on this)", test.source)
        }
    }
}

/// The step a line shows: the deciding one; else that of the first stopped clear; else the first with data.
pub(crate) fn shown_step(judged: &CriterionJudgement) -> Option<usize> {
    match judged.decision {
        Decision::In(step) | Decision::Out(step) => Some(step),
        Decision::Open => judged.stopped.first().map(|clear| clear.step).or_else(|| {
            judged.steps.iter().position(|step| !matches!(step.state, StepState::Empty | StepState::Skipped))
        }),
        Decision::Assess | Decision::OutOfScope(_) | Decision::Rating => None,
    }
}

/// The test a line shows: of the deciding step; else of the first stopped clear; else of the first step with data.
fn shown_test<'run>(
    criterion: &'run Criterion,
    judged: &'run CriterionJudgement,
) -> Option<(&'run Test, &'run TestJudgement)> {
    let step = shown_step(judged)?;
    let (rule, came_out) = (criterion.steps.get(step)?, judged.steps.get(step)?);
    let has_value = |test: &TestJudgement| !test.used.is_empty() || test.answer.is_some();
    let with_value = came_out.tests.iter().position(has_value);
    let deciding =
        || came_out.by.iter().copied().find(|place| came_out.tests.get(*place).is_some_and(has_value));
    let chosen = match came_out.state {
        StepState::Partial => with_value.or(came_out.by.first().copied()),
        StepState::Fired
        | StepState::Clear
        | StepState::Undecided
        | StepState::Empty
        | StepState::Skipped => deciding().or(came_out.by.first().copied()),
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

#[cfg(test)]
mod tests {
    use super::with_meaning;
    use crate::substance::DegradationTest;

    #[test]
    fn a_word_of_another_language_stands_beside_what_it_was_taken_for() {
        let table = [
            ("Readily biodegradable ", DegradationTest::Ready, "readily biodegradable"),
            ("ja (90,4 %, 28 d)", DegradationTest::Ready, "readily biodegradable: `ja (90,4 %, 28 d)`"),
            ("nein", DegradationTest::NotReady, "not readily biodegradable: `nein`"),
            ("65 %", DegradationTest::Open, "not clear: `65 %`"),
        ];
        for (reported, result, expected) in table {
            assert_eq!(with_meaning(reported, result), expected);
        }
    }
}
