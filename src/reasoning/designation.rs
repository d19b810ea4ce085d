//! Verdict cells, the headline of a rulebook and the one sentence beside it.

use crate::judge::{
    Closeness, CriterionJudgement, Decision, DesignationJudgement, Headline, StepJudgement, Verdict,
};
use crate::reasoning::criterion::shown_step;
use crate::reasoning::sentence::{deciding_sentence, places_with_value};
use crate::reasoning::value::{listed, telling_tests, test_brief};
use crate::reasoning::{Book, Told};
use crate::rules::{Criterion, Designation, DesignationPart, Step, Weight};
use crate::substance::Identity;

/// The words of a criterion's cell: the verdict, or the ratings its value may have.
pub fn verdict_text(criterion: &Criterion, judged: &CriterionJudgement) -> String {
    if judged.decision == Decision::Rating && judged.rated.is_some() {
        let ratings: Vec<&str> = judged
            .ratings
            .iter()
            .filter_map(|index| criterion.bands.get(*index))
            .map(|band| band.rating.as_str())
            .collect();
        if !ratings.is_empty() {
            return ratings.join(" or ");
        }
    }
    with_closeness(judged.verdict, judged.closeness)
}

/// A verdict with ` (close call)` after it where so.
pub fn with_closeness(verdict: Verdict, closeness: Closeness) -> String {
    match closeness {
        Closeness::Clear => verdict.words().to_owned(),
        Closeness::CloseCall => format!("{} (close call)", verdict.words()),
    }
}

/// The headline cell: `PBT: screens in`, `listed: ...`, or the worst criterion where there is no designation.
pub fn headline(book: Book) -> String {
    match book.judged.headline {
        Headline::Listed(listing) => {
            let title = book.rulebook.listings.get(listing).map_or("", |listing| listing.title.as_str());
            format!("listed: {title}")
        }
        Headline::Designation(index) => designation_at(book, index)
            .map_or(String::new(), |(rule, judged)| {
                format!("{}: {}", rule.id, with_closeness(judged.verdict, judged.closeness))
            }),
        Headline::Criterion(index) => criterion_at(book, index)
            .map_or(String::new(), |(rule, judged)| format!("{}: {}", rule.id, verdict_text(rule, judged))),
    }
}

/// The verdict that a headline cell stands for; a listing stands above all.
pub fn headline_verdict(book: Book) -> Option<Verdict> {
    match book.judged.headline {
        Headline::Listed(_) => None,
        Headline::Designation(index) => designation_at(book, index).map(|(_, judged)| judged.verdict),
        Headline::Criterion(index) => criterion_at(book, index).map(|(_, judged)| judged.verdict),
    }
}

fn designation_at(book: Book<'_>, index: usize) -> Option<(&Designation, &DesignationJudgement)> {
    Some((book.rulebook.designations.get(index)?, book.judged.designations.get(index)?))
}

fn criterion_at(book: Book<'_>, index: usize) -> Option<(&Criterion, &CriterionJudgement)> {
    Some((book.rulebook.criteria.get(index)?, book.judged.criteria.get(index)?))
}

/// One sentence that says why the headline is as it is.
pub fn why(book: Book) -> String {
    let text = match book.judged.headline {
        Headline::Listed(listing) => book.rulebook.listings.get(listing).map_or(String::new(), |listing| {
            format!(
                "The number of the row is on the list `{}` of {} ({})",
                listing.title, listing.date, listing.source
            )
        }),
        Headline::Designation(index) => designation_why(book, index),
        Headline::Criterion(index) => criterion_at(book, index)
            .map_or(String::new(), |(rule, judged)| criterion_brief(book.told, rule, judged)),
    };
    if text.is_empty() || text.ends_with('.') { text } else { format!("{text}.") }
}

fn designation_why(book: Book, index: usize) -> String {
    let Some((rule, judged)) = designation_at(book, index) else {
        return String::new();
    };
    if let Some(code) = &judged.stated {
        return format!("{} as stated in the inventory by {code}", rule.id);
    }
    if judged.verdict == Verdict::OutOfScope {
        return scope_caution(book).map_or(String::new(), |caution| out_of_scope(book, caution));
    }
    let parts: Vec<String> = rule.parts.iter().map(|part| part_brief(book, *part)).collect();
    let doubt = match book.told.substance.identity {
        Identity::Identified => "",
        Identity::NameAlone | Identity::RepairedDate | Identity::BareNumber | Identity::NotIdentified => {
            "The row may mean another substance, so nothing clears it; "
        }
    };
    let unseen = match (book.rulebook.strongest, judged.verdict) {
        (Weight::Screening, Verdict::ScreensOut) => {
            "; other evidence that the instrument takes was not looked at"
        }
        (_, _) => "",
    };
    format!("{doubt}{}{unseen}", parts.join("; "))
}

/// Which caution puts the substance outside the instrument, and what raised it.
pub(crate) fn out_of_scope(book: Book, caution: usize) -> String {
    let raised = book.told.judgement.cautions.iter().find(|raised| raised.caution == caution);
    let id = book.told.rules.cautions.get(caution).map_or("", |caution| caution.id.as_str());
    let reason = raised.map_or("", |raised| raised.reason.as_str());
    format!("Outside the scope of {} by the caution `{id}`: {reason}", book.rulebook.short)
}

fn scope_caution(book: Book) -> Option<usize> {
    book.judged.criteria.iter().find_map(|criterion| match criterion.decision {
        Decision::OutOfScope(caution) => Some(caution),
        Decision::In(_) | Decision::Out(_) | Decision::Open | Decision::Assess | Decision::Rating => None,
    })
}

fn part_brief(book: Book, part: DesignationPart) -> String {
    match part {
        DesignationPart::Criterion(index) => criterion_at(book, index)
            .map_or(String::new(), |(rule, judged)| criterion_brief(book.told, rule, judged)),
        DesignationPart::Designation(index) => designation_at(book, index)
            .map_or(String::new(), |(rule, judged)| {
                format!("{} {}", rule.id, with_closeness(judged.verdict, judged.closeness))
            }),
    }
}

/// `B fulfilled: BCF 6300 L/kg (measured), above 2000 L/kg`.
fn criterion_brief(told: Told, rule: &Criterion, judged: &CriterionJudgement) -> String {
    let words = verdict_text(rule, judged);
    let reason = match judged.decision {
        Decision::In(step) | Decision::Out(step) => rule
            .steps
            .get(step)
            .zip(judged.steps.get(step))
            .map_or(String::new(), |(rule, came_out)| step_brief(told, rule, came_out)),
        Decision::Open => open_brief(told, rule, judged),
        Decision::Assess => "no number settles it".to_owned(),
        Decision::OutOfScope(_) | Decision::Rating => String::new(),
    };
    if reason.is_empty() { format!("{} {words}", rule.id) } else { format!("{} {words}: {reason}", rule.id) }
}

/// The first reasons of a step; the Reasoning sheet has them all.
fn step_brief(told: Told, rule: &Step, came_out: &StepJudgement) -> String {
    const REASONS: usize = 2;
    let telling = telling_tests(rule, came_out, &came_out.by);
    let briefs: Vec<String> = telling.iter().map(|telling| test_brief(told, telling)).collect();
    match briefs.get(..REASONS) {
        Some(first) if briefs.len() > REASONS => {
            format!("{} and {} more", first.join(", "), briefs.len() - REASONS)
        }
        Some(_) | None => listed(&briefs),
    }
}

/// What is known of an open criterion, and what would settle it.
fn open_brief(told: Told, rule: &Criterion, judged: &CriterionJudgement) -> String {
    let known = shown_step(judged).and_then(|step| {
        let (rule, came_out) = (rule.steps.get(step)?, judged.steps.get(step)?);
        let with_value = places_with_value(came_out);
        let telling = telling_tests(rule, came_out, &with_value);
        telling.first().map(|telling| test_brief(told, telling))
    });
    let settled = judged.deciding.as_ref().map(deciding_sentence);
    known.into_iter().chain(settled).collect::<Vec<_>>().join("; ")
}
