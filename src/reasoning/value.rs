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
    if evidence.unit.is_rescaled() {
        beside.push(format!("written as {}", as_written(evidence)));
    }
    if let Some(doubt) = &evidence.conditions.doubt {
        beside.push(format!("doubted where it stands: `{doubt}`"));
    }
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
            at_lipid(evidence, from, to),
            format_number(to)
        )),
        None => {}
    }
    if evidence.lower_bound_by_ionisation.is_some() {
        beside.push("a lower bound, since the substance was partly ionised at the pH of the test".to_owned());
    }
    format!("{} {value} ({})", used.property.title(), beside.join("; "))
}

/// What the cell says where the value is kept as its logarithm or without it.
fn as_written(evidence: &Evidence) -> String {
    let bare = evidence.reported.parse::<f64>().is_ok();
    if bare { format!("the logarithm {}", evidence.reported) } else { format!("`{}`", evidence.reported) }
}

/// The limit as a reader knows it: `> 2000 L/kg`, `H350 or H340`, `not readily biodegradable`.
pub fn limit_phrase(test: &Test) -> String {
    match &test.limit {
        Limit::Number { comparison, .. } => format!("{} {}", comparison.sign(), limit_text(test)),
        Limit::Between { .. } => test.limit_text.clone(),
        Limit::AnyOfWords(codes) => codes.join(", "),
        Limit::Is(DegradationTest::Ready) => "readily biodegradable".to_owned(),
        Limit::Is(DegradationTest::NotReady) => "not readily biodegradable".to_owned(),
        Limit::Is(DegradationTest::Open) => "open".to_owned(),
    }
}

/// The test in one clause: `BCF 2300 L/kg (measured, Substances!K12) is above the limit of 2000 L/kg`.
pub(crate) fn test_clause(told: Told, telling: &Telling) -> String {
    let Some(test) = telling.tests.first() else { return String::new() };
    let judged = telling.judged;
    if let Some(answer) = &judged.answer {
        return answer_clause(told, test, judged.outcome, answer);
    }
    let Some(used) = judged.used.first() else {
        return format!("no {} is in the inventory", test.subject.title());
    };
    let value = value_phrase(told, used);
    match &test.limit {
        Limit::Number { comparison, .. } => {
            format!("{value} {} the {}", standing(*comparison, judged.outcome), telling.limits())
        }
        Limit::Between { .. } | Limit::AnyOfWords(_) | Limit::Is(_) => {
            format!("{value} against {}", limit_phrase(test))
        }
    }
}

fn standing(comparison: Comparison, outcome: TestOutcome) -> &'static str {
    match (outcome, comparison) {
        (TestOutcome::Fired, Comparison::Above) | (TestOutcome::Clear, Comparison::AtMost) => "is above",
        (TestOutcome::Fired, Comparison::AtLeast) => "reaches",
        (TestOutcome::Fired, Comparison::Below) => "is below",
        (TestOutcome::Fired, Comparison::AtMost) | (TestOutcome::Clear, Comparison::Above) => "is not above",
        (TestOutcome::Clear, Comparison::AtLeast) => "stays below",
        (TestOutcome::Clear, Comparison::Below) => "is not below",
        (TestOutcome::Undecided | TestOutcome::Missing, _) => "may lie on either side of",
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
pub(crate) fn test_brief(told: Told, telling: &Telling) -> String {
    let Some(test) = telling.tests.first() else { return String::new() };
    let judged = telling.judged;
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
            let standing = match &test.limit {
                Limit::Number { comparison, .. } => brief_standing(*comparison, judged.outcome),
                Limit::Between { .. } | Limit::AnyOfWords(_) | Limit::Is(_) => "against",
            };
            format!(
                "{}, {standing} {}",
                brief_value(told, used),
                telling.limits().trim_start_matches("limit of ").trim_start_matches("limits of ")
            )
        }
        (None, None) => format!("{} missing", test.subject.title()),
    }
}

/// A value, or an answer, and the tests of a step that it was held against.
pub(crate) struct Telling<'run> {
    /// The tests; a half-life in water not further specified stands for several compartments.
    pub(crate) tests: Vec<&'run Test>,
    /// What the first of them came to.
    pub(crate) judged: &'run TestJudgement,
}

/// The tests of a step at these places, each value once.
pub(crate) fn telling_tests<'run>(
    rule: &'run Step,
    came_out: &'run StepJudgement,
    places: &[usize],
) -> Vec<Telling<'run>> {
    let mut telling: Vec<Telling> = Vec::new();
    let tests =
        places.iter().filter_map(|place| Some((rule.tests.get(*place)?, came_out.tests.get(*place)?)));
    for (test, judged) in tests {
        let same_value =
            telling.iter_mut().find(|known| match (known.judged.used.first(), judged.used.first()) {
                (Some(known), Some(used)) => (known.property, known.index) == (used.property, used.index),
                (None, _) | (_, None) => false,
            });
        match same_value {
            Some(known) => known.tests.push(test),
            None => telling.push(Telling { tests: vec![test], judged }),
        }
    }
    telling
}

impl Telling<'_> {
    /// `limit of 40 d`, `limits of 40 d and 60 d`.
    fn limits(&self) -> String {
        let mut limits: Vec<String> = Vec::new();
        for text in self.tests.iter().map(|test| limit_text(test)) {
            if !limits.contains(&text) {
                limits.push(text);
            }
        }
        let noun = if limits.len() > 1 { "limits" } else { "limit" };
        format!("{noun} of {}", listed(&limits))
    }
}

/// `BCF 5800 L/kg (measured; 3494 L/kg at 5 % lipid)`: what the row says first, what was made of it after.
fn brief_value(told: Told, used: &Used) -> String {
    let unit = used.property.default_unit();
    let Some(evidence) = evidence_of(told, used) else { return used.property.title().to_owned() };
    let value = format_interval(evidence.interval, unit);
    let converted = match used.adjustment {
        None => String::new(),
        Some(Adjustment::HalfLifeTemperature { to, .. }) => {
            format!("; {} at {} °C", format_interval(used.compared, unit), format_number(to))
        }
        Some(Adjustment::HalfLifeTemperatureUnstated { to, factor, .. }) => {
            format!("; up to {factor:.2} times longer at {} °C", format_number(to))
        }
        Some(Adjustment::Lipid { from, to } | Adjustment::LipidDoubtful { from, to }) => {
            format!("; {} at {} % lipid", at_lipid(evidence, from, to), format_number(to))
        }
    };
    format!("{} {value} ({}{converted})", used.property.title(), basis_phrase(evidence.basis))
}

/// The value at another lipid content, as the judge converts it.
fn at_lipid(evidence: &Evidence, from: f64, to: f64) -> String {
    let converted = evidence.interval.map_increasing(|bcf| bcf * to / from);
    converted.map_or(String::new(), |converted| format_interval(converted, evidence.property.default_unit()))
}

/// The limit as the rule file writes it; months with the days they were counted as.
pub(crate) fn limit_text(test: &Test) -> String {
    match test.limit {
        Limit::Number { value, .. } if test.limit_text.contains("month") => {
            format!("{} ({value:.1} d)", test.limit_text)
        }
        Limit::Number { .. } | Limit::Between { .. } | Limit::AnyOfWords(_) | Limit::Is(_) => {
            test.limit_text.clone()
        }
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
