//! Values and limits in words.

use crate::evidence::{Evidence, Origin};
use crate::judge::{Adjustment, Answer, StepJudgement, TestJudgement, TestOutcome, Used};
use crate::quantity::{Comparison, format_interval, format_number};
use crate::reasoning::Told;
use crate::rules::{Limit, Step, Subject, Test};
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
        Origin::Relation { relation, log_kow, log_kow_cell, .. } => {
            let citation =
                told.rules.relations.relations.get(*relation).map_or("", |line| line.citation.as_str());
            let log_kow = format_interval(*log_kow, crate::quantity::Unit::One);
            format!("from log Kow {log_kow} in {log_kow_cell} by {}", short_citation(citation))
        }
    }
}

/// Author and year, as a sentence names a publication: `Mackay 1982`, `Veith & Kosian 1983`, `Veith et al. 1979`.
pub(crate) fn short_citation(citation: &str) -> String {
    let Some((authors, rest)) = citation.split_once(" (") else { return citation.to_owned() };
    let year = rest.split(')').next().unwrap_or_default();
    let surname = |author: &str| {
        let words: Vec<&str> = author.split(' ').collect();
        match words.as_slice() {
            // A surname and initials; an organisation has a whole name.
            [surname, initials] if is_initials(initials) && !is_initials(surname) => (*surname).to_owned(),
            _ => author.to_owned(),
        }
    };
    let names: Vec<&str> = authors.split(", ").collect();
    match names.as_slice() {
        [one] => match one.split_once(" and others") {
            Some((first, _)) => format!("{} et al. {year}", surname(first)),
            None => format!("{} {year}", surname(one)),
        },
        [one, other] => format!("{} & {} {year}", surname(one), surname(other)),
        [first, ..] => format!("{} et al. {year}", surname(first)),
        [] => citation.to_owned(),
    }
}

fn is_initials(word: &str) -> bool {
    word.len() <= 4 && word.chars().all(|character| character.is_ascii_uppercase())
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
            "tested at {} °C; {} at {} °C, {factor:.2} times that",
            format_number(from),
            format_interval(used.compared, unit),
            format_number(to)
        )),
        Some(Adjustment::HalfLifeTemperatureUnstated { to, factor, .. }) => beside.push(format!(
            "test temperature not stated, so up to {factor:.2} times longer at {} °C",
            format_number(to)
        )),
        Some(Adjustment::LipidDoubtful { from, to }) => beside.push(format!(
            "the lipid content of the fish, {}, may be a fraction or a percentage; {} at {} % lipid",
            format_number(from),
            format_interval(used.compared, unit),
            format_number(to)
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
            format!("{value} {} {}", standing(*comparison, judged.outcome), test.limit_text)
        }
        Limit::Between { .. } | Limit::AnyOfWords(_) | Limit::Is(_) => {
            format!("{value} against {}", limit_phrase(test))
        }
    }
}

fn standing(comparison: Comparison, outcome: TestOutcome) -> &'static str {
    match (outcome, comparison) {
        (TestOutcome::Fired, Comparison::Above) | (TestOutcome::Clear, Comparison::AtMost) => {
            "is above the limit of"
        }
        (TestOutcome::Fired, Comparison::AtLeast) => "reaches the limit of",
        (TestOutcome::Fired, Comparison::Below) => "is below the limit of",
        (TestOutcome::Fired, Comparison::AtMost) | (TestOutcome::Clear, Comparison::Above) => {
            "is not above the limit of"
        }
        (TestOutcome::Clear, Comparison::AtLeast) => "stays below the limit of",
        (TestOutcome::Clear, Comparison::Below) => "is not below the limit of",
        (TestOutcome::Undecided | TestOutcome::Missing, _) => "may lie on either side of the limit of",
    }
}

fn brief_standing(comparison: Comparison, outcome: TestOutcome) -> &'static str {
    match (outcome, comparison) {
        (TestOutcome::Fired, Comparison::Above) | (TestOutcome::Clear, Comparison::AtMost) => "above",
        (TestOutcome::Fired, Comparison::AtLeast) => "at least",
        (TestOutcome::Fired, Comparison::Below) | (TestOutcome::Clear, Comparison::AtLeast) => "below",
        (TestOutcome::Fired, Comparison::AtMost) | (TestOutcome::Clear, Comparison::Above) => "not above",
        (TestOutcome::Clear, Comparison::Below) => "not below",
        (TestOutcome::Undecided | TestOutcome::Missing, _) => "on either side of",
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
            let cell =
                told.substance.hazard_statements.as_ref().map(|statements| statements.cell.to_string());
            format!("{} states {code}", cell.unwrap_or_default())
        }
        Answer::NoStatement => {
            let cell =
                told.substance.hazard_statements.as_ref().map(|statements| statements.cell.to_string());
            let unread = match outcome {
                TestOutcome::Undecided => ", but not all that the row says of its hazards was read",
                TestOutcome::Missing | TestOutcome::Clear | TestOutcome::Fired => "",
            };
            let codes = limit_phrase(test);
            format!("the hazard statements in {} hold none of {codes}{unread}", cell.unwrap_or_default())
        }
    }
}

/// The same in a few words, for the sentence beside a headline: `BCF 2300 L/kg (measured), above 2000 L/kg`.
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
            let reported = told.substance.inherent.get(*index).map(|entry| entry.value.reported.clone());
            format!("inherent test {}", reported.unwrap_or_default())
        }
        (Some(Answer::Statement(code)), _) => format!("{code} stated"),
        (Some(Answer::NoStatement), _) => match judged.outcome {
            TestOutcome::Undecided => "hazard statements not read to the end".to_owned(),
            TestOutcome::Missing | TestOutcome::Clear | TestOutcome::Fired => {
                "no such hazard statement".to_owned()
            }
        },
        (None, Some(used)) => {
            let value = format_interval(used.compared, used.property.default_unit());
            let basis = evidence_of(told, used).map_or("", |evidence| basis_phrase(evidence.basis));
            let standing = match &test.limit {
                Limit::Number { comparison, .. } => brief_standing(*comparison, judged.outcome),
                Limit::Between { .. } | Limit::AnyOfWords(_) | Limit::Is(_) => "against",
            };
            format!("{} {value} ({basis}), {standing} {}", used.property.title(), test.limit_text)
        }
        (None, None) => format!("{} missing", test.subject.title()),
    }
}

/// The tests that make a step's outcome, each value once: a value that stands for two compartments is named with the
/// higher of its limits, which it meets as well.
pub(crate) fn telling_tests<'run>(
    rule: &'run Step,
    came_out: &'run StepJudgement,
) -> Vec<(&'run Test, &'run TestJudgement)> {
    let mut telling: Vec<(&Test, &TestJudgement)> = Vec::new();
    let tests =
        came_out.by.iter().filter_map(|index| Some((rule.tests.get(*index)?, came_out.tests.get(*index)?)));
    for (test, judged) in tests {
        let same_value =
            telling.iter_mut().find(|(_, known)| match (known.used.first(), judged.used.first()) {
                (Some(known), Some(used)) => (known.property, known.index) == (used.property, used.index),
                (None, _) | (_, None) => false,
            });
        match same_value {
            Some(known) => *known = (test, judged),
            None => telling.push((test, judged)),
        }
    }
    telling
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

#[cfg(test)]
mod tests {
    use super::short_citation;

    #[test]
    fn publications_are_named_by_author_and_year() {
        let table = [
            ("Mackay D (1982) Environ Sci Technol 16:274-278", "Mackay 1982"),
            ("Veith GD, Kosian P (1983) in a book", "Veith & Kosian 1983"),
            (
                "Veith GD, DeFoe DL, Bergstedt BV (1979) J Fish Res Board Can 36:1040-1048",
                "Veith et al. 1979",
            ),
            ("European Commission (2003) Technical Guidance Document", "European Commission 2003"),
            ("US EPA (1996) Soil Screening Guidance", "US EPA 1996"),
            (
                "Verhaar HJM and others in European Commission (2003) Technical Guidance",
                "Verhaar et al. 2003",
            ),
        ];
        for (citation, expected) in table {
            assert_eq!(short_citation(citation), expected);
        }
    }
}
