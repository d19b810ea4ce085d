//! Verdict cells, the headline of a rulebook and the one sentence beside it.

use crate::judge::{
    Closeness, CriterionJudgement, Deciding, Decision, DesignationJudgement, Headline, Verdict,
};
use crate::reasoning::value::{listed, test_brief, titles};
use crate::reasoning::{Book, Told};
use crate::rules::{Criterion, Designation, DesignationPart};

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
            let title = book
                .rulebook
                .listings
                .get(listing)
                .map_or("", |listing| listing.title.as_str());
            format!("listed: {title}")
        }
        Headline::Designation(index) => {
            designation_at(book, index).map_or(String::new(), |(rule, judged)| {
                format!(
                    "{}: {}",
                    rule.id,
                    with_closeness(judged.verdict, judged.closeness)
                )
            })
        }
        Headline::Criterion(index) => criterion_at(book, index).map_or(String::new(), |(rule, judged)| {
            format!("{}: {}", rule.id, verdict_text(rule, judged))
        }),
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

fn designation_at<'run>(
    book: Book<'run>,
    index: usize,
) -> Option<(&'run Designation, &'run DesignationJudgement)> {
    Some((
        book.rulebook.designations.get(index)?,
        book.judged.designations.get(index)?,
    ))
}

fn criterion_at<'run>(book: Book<'run>, index: usize) -> Option<(&'run Criterion, &'run CriterionJudgement)> {
    Some((
        book.rulebook.criteria.get(index)?,
        book.judged.criteria.get(index)?,
    ))
}

/// One sentence that says why the headline is as it is.
pub fn why(book: Book) -> String {
    let text = match book.judged.headline {
        Headline::Listed(listing) => book
            .rulebook
            .listings
            .get(listing)
            .map_or(String::new(), |listing| {
                format!(
                    "The number of the row is on the list `{}` of {} ({})",
                    listing.title, listing.date, listing.source
                )
            }),
        Headline::Designation(index) => designation_why(book, index),
        Headline::Criterion(index) => criterion_at(book, index).map_or(String::new(), |(rule, judged)| {
            criterion_brief(book.told, rule, judged)
        }),
    };
    if text.is_empty() || text.ends_with('.') {
        text
    } else {
        format!("{text}.")
    }
}

fn designation_why(book: Book, index: usize) -> String {
    let Some((rule, judged)) = designation_at(book, index) else {
        return String::new();
    };
    if let Some(code) = &judged.stated {
        return format!("{} as stated in the inventory by {code}", rule.id);
    }
    if judged.verdict == Verdict::OutOfScope {
        return out_of_scope(book);
    }
    let parts: Vec<String> = rule.parts.iter().map(|part| part_brief(book, *part)).collect();
    parts.join("; ")
}

fn out_of_scope(book: Book) -> String {
    let caution = book
        .judged
        .criteria
        .iter()
        .find_map(|criterion| match criterion.decision {
            Decision::OutOfScope(caution) => book.told.rules.cautions.get(caution),
            Decision::In(_) | Decision::Out(_) | Decision::Open | Decision::Assess | Decision::Rating => None,
        });
    let sentence = caution.map_or("", |caution| caution.sentence.as_str());
    format!("{} does not cover it: {sentence}", book.rulebook.short)
}

fn part_brief(book: Book, part: DesignationPart) -> String {
    match part {
        DesignationPart::Criterion(index) => criterion_at(book, index)
            .map_or(String::new(), |(rule, judged)| {
                criterion_brief(book.told, rule, judged)
            }),
        DesignationPart::Designation(index) => designation_at(book, index)
            .map_or(String::new(), |(rule, judged)| {
                format!("{} {}", rule.id, with_closeness(judged.verdict, judged.closeness))
            }),
    }
}

/// `B fulfilled, BCF 6300 L/kg (measured) > 2000 L/kg`.
fn criterion_brief(told: Told, rule: &Criterion, judged: &CriterionJudgement) -> String {
    let words = verdict_text(rule, judged);
    let reason = match judged.decision {
        Decision::In(step) | Decision::Out(step) => {
            let briefs = rule
                .steps
                .get(step)
                .zip(judged.steps.get(step))
                .map(|(rule, came_out)| {
                    came_out
                        .by
                        .iter()
                        .filter_map(|index| {
                            Some(test_brief(
                                told,
                                rule.tests.get(*index)?,
                                came_out.tests.get(*index)?,
                            ))
                        })
                        .collect::<Vec<_>>()
                });
            listed(&briefs.unwrap_or_default())
        }
        Decision::Open => match &judged.deciding {
            Some(Deciding::Data(subjects)) => {
                format!(
                    "a measured {} would settle it",
                    listed(&titles(subjects.iter().copied()))
                )
            }
            Some(Deciding::ExpertJudgement) | None => "expert judgement needed".to_owned(),
        },
        Decision::Assess => "no number settles it".to_owned(),
        Decision::OutOfScope(_) | Decision::Rating => String::new(),
    };
    if reason.is_empty() {
        format!("{} {words}", rule.id)
    } else {
        format!("{} {words}, {reason}", rule.id)
    }
}
