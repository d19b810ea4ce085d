//! Values and limits in words.

use crate::evidence::{Evidence, Origin};
use crate::judge::{Adjustment, Answer, TestJudgement, TestOutcome, Used};
use crate::quantity::{Comparison, format_interval, format_number};
use crate::reasoning::Told;
use crate::rules::{Limit, Subject, Test};
use crate::substance::{Basis, DegradationTest};

/// The evidence behind a value that was held against a limit.
pub(crate) fn evidence_of<'run>(told: Told<'run>, used: &Used) -> Option<&'run Evidence> {
    told.evidence.of(used.property).get(used.index)
}

/// How a value is known, for a reader: `measured`, `basis not stated`, ...
pub(crate) fn basis_phrase(basis: Basis) -> &'static str {
    match basis {
        Basis::Measured => "measured",
        Basis::Unstated => "basis not stated",
        Basis::Calculated => "calculated",
        Basis::Estimated => "estimated",
    }
}

/// Where a value stands, or how it was estimated.
pub(crate) fn origin_phrase(told: Told, evidence: &Evidence) -> String {
    match &evidence.origin {
        Origin::Cell(cell) => cell.to_string(),
        Origin::Relation {
            relation,
            log_kow,
            log_kow_cell,
            ..
        } => {
            let citation = told
                .rules
                .relations
                .relations
                .get(*relation)
                .map_or("", |line| line.citation.as_str());
            let log_kow = format_interval(*log_kow, crate::quantity::Unit::One);
            format!(
                "from log Kow {log_kow} in {log_kow_cell} by {}",
                short_citation(citation)
            )
        }
    }
}

/// Author and year, without the journal.
pub(crate) fn short_citation(citation: &str) -> &str {
    citation
        .split_once(", J")
        .map_or(citation, |(short, _)| short)
        .split(';')
        .next()
        .unwrap_or(citation)
}

/// `BCF 2300 L/kg (measured, Substances!K12)`, with the value as compared where it was adjusted.
pub(crate) fn value_phrase(told: Told, used: &Used) -> String {
    let Some(evidence) = evidence_of(told, used) else {
        return used.property.title().to_owned();
    };
    let unit = used.property.default_unit();
    let value = format_interval(evidence.interval, unit);
    let basis = basis_phrase(evidence.basis);
    let origin = origin_phrase(told, evidence);
    let mut beside = vec![format!("{basis}, {origin}")];
    match used.adjustment {
        Some(Adjustment::HalfLifeTemperature { from, to, factor }) => beside.push(format!(
            "tested at {} °C, {} at {} °C, factor {}",
            format_number(from),
            format_interval(used.compared, unit),
            format_number(to),
            format_number(factor)
        )),
        Some(Adjustment::HalfLifeTemperatureUnstated { from, to, factor }) => beside.push(format!(
            "test temperature not stated: at {} °C up to {} times longer, had it been tested at {} °C",
            format_number(to),
            format_number(factor),
            format_number(from)
        )),
        Some(Adjustment::Lipid { from, to }) => beside.push(format!(
            "fish with {} % lipid; {} at {} % lipid",
            format_number(from),
            format_interval(used.compared, unit),
            format_number(to)
        )),
        None => {}
    }
    if evidence.lower_bound_by_ionisation.is_some() {
        beside.push("a lower bound, since the substance was partly ionised at the pH of the test".to_owned());
    }
    format!("{} {value} ({})", used.property.title(), beside.join("; "))
}

/// The limit as a reader knows it: `> 2000 L/kg`, `H350 or H340`, `not readily biodegradable`.
pub fn limit_phrase(test: &Test) -> String {
    match &test.limit {
        Limit::Number { comparison, .. } => format!("{} {}", comparison.sign(), test.limit_text),
        Limit::Between { .. } => test.limit_text.clone(),
        Limit::AnyOfWords(codes) => codes.join(", "),
        Limit::Is(DegradationTest::Ready) => "readily biodegradable".to_owned(),
        Limit::Is(DegradationTest::NotReady) => "not readily biodegradable".to_owned(),
        Limit::Is(DegradationTest::Open) => "open".to_owned(),
    }
}

/// The test in one clause: `BCF 2300 L/kg (measured, Substances!K12) is above the limit of 2000 L/kg`.
pub(crate) fn test_clause(told: Told, test: &Test, judged: &TestJudgement) -> String {
    if let Some(answer) = &judged.answer {
        return answer_clause(told, test, judged.outcome, answer);
    }
    let Some(used) = judged.used.first() else {
        return format!("no {} is in the inventory", test.subject.title());
    };
    let value = value_phrase(told, used);
    match &test.limit {
        Limit::Number { comparison, .. } => {
            format!(
                "{value} {} {}",
                standing(*comparison, judged.outcome),
                test.limit_text
            )
        }
        Limit::Between { .. } | Limit::AnyOfWords(_) | Limit::Is(_) => {
            format!("{value} against {}", limit_phrase(test))
        }
    }
}

fn standing(comparison: Comparison, outcome: TestOutcome) -> &'static str {
    match (outcome, comparison) {
        (TestOutcome::Fired, Comparison::Above) => "is above the limit of",
        (TestOutcome::Fired, Comparison::AtLeast) => "reaches the limit of",
        (TestOutcome::Fired, Comparison::Below) => "is below the limit of",
        (TestOutcome::Fired, Comparison::AtMost) => "is not above the limit of",
        (TestOutcome::Clear, Comparison::Above) => "is not above the limit of",
        (TestOutcome::Clear, Comparison::AtLeast) => "stays below the limit of",
        (TestOutcome::Clear, Comparison::Below) => "is not below the limit of",
        (TestOutcome::Clear, Comparison::AtMost) => "is above the limit of",
        (TestOutcome::Undecided | TestOutcome::Missing, _) => "may lie on either side of the limit of",
    }
}

fn answer_clause(told: Told, test: &Test, outcome: TestOutcome, answer: &Answer) -> String {
    match answer {
        Answer::Ready(index) => {
            let Some(entry) = told.substance.ready.get(*index) else {
                return String::new();
            };
            let meaning = match entry.value.result {
                DegradationTest::Ready => "readily biodegradable",
                DegradationTest::NotReady => "not readily biodegradable",
                DegradationTest::Open => "not clear whether readily biodegradable",
            };
            format!(
                "{meaning}: {} says `{}` ({})",
                entry.cell,
                entry.value.reported,
                basis_phrase(entry.value.basis)
            )
        }
        Answer::Inherent(index) => {
            let Some(entry) = told.substance.inherent.get(*index) else {
                return String::new();
            };
            let against = match outcome {
                TestOutcome::Clear => "reaches",
                TestOutcome::Fired => "misses",
                TestOutcome::Undecided | TestOutcome::Missing => "does not clearly reach",
            };
            format!(
                "the inherent test in {}, `{}`, {against} {}",
                entry.cell, entry.value.reported, test.limit_text
            )
        }
        Answer::Statement(code) => {
            let cell = told
                .substance
                .hazard_statements
                .as_ref()
                .map(|statements| statements.cell.to_string());
            format!("{} states {code}", cell.unwrap_or_default())
        }
        Answer::NoStatement => {
            let cell = told
                .substance
                .hazard_statements
                .as_ref()
                .map(|statements| statements.cell.to_string());
            format!(
                "the hazard statements in {} hold none of {}",
                cell.unwrap_or_default(),
                limit_phrase(test)
            )
        }
    }
}

/// The same in a few words, for the sentence beside a headline: `BCF 2300 L/kg (measured) > 2000 L/kg`.
pub(crate) fn test_brief(told: Told, test: &Test, judged: &TestJudgement) -> String {
    match (&judged.answer, judged.used.first()) {
        (Some(Answer::Ready(index)), _) => {
            match told.substance.ready.get(*index).map(|entry| entry.value.result) {
                Some(DegradationTest::Ready) => "readily biodegradable".to_owned(),
                Some(DegradationTest::NotReady) => "not readily biodegradable".to_owned(),
                Some(DegradationTest::Open) | None => "ready biodegradability not clear".to_owned(),
            }
        }
        (Some(Answer::Inherent(index)), _) => {
            let reported = told
                .substance
                .inherent
                .get(*index)
                .map(|entry| entry.value.reported.clone());
            format!("inherent test {}", reported.unwrap_or_default())
        }
        (Some(Answer::Statement(code)), _) => format!("{code} stated"),
        (Some(Answer::NoStatement), _) => "no such hazard statement".to_owned(),
        (None, Some(used)) => {
            let value = format_interval(used.compared, used.property.default_unit());
            let basis = evidence_of(told, used).map_or("", |evidence| basis_phrase(evidence.basis));
            let sign = match (&test.limit, judged.outcome) {
                (Limit::Number { comparison, .. }, TestOutcome::Fired) => comparison.sign(),
                (Limit::Number { comparison, .. }, TestOutcome::Clear) => comparison.opposite_sign(),
                (_, _) => "straddles",
            };
            format!(
                "{} {value} ({basis}) {sign} {}",
                used.property.title(),
                test.limit_text
            )
        }
        (None, None) => format!("{} missing", test.subject.title()),
    }
}

/// A list a reader can follow: `a`, `a and b`, `a, b and c`.
pub(crate) fn listed(parts: &[String]) -> String {
    match parts {
        [] => String::new(),
        [only] => only.clone(),
        [first @ .., last] => format!("{} and {last}", first.join(", ")),
    }
}

/// The titles of subjects, in order and each once.
pub(crate) fn titles(subjects: impl Iterator<Item = Subject>) -> Vec<String> {
    let mut titles: Vec<String> = Vec::new();
    for subject in subjects {
        let title = subject.title().to_owned();
        if !titles.contains(&title) {
            titles.push(title);
        }
    }
    titles
}
