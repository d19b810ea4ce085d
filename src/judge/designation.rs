//! Criteria and other designations combined.

use crate::judge::{Closeness, Context, CriterionJudgement, Verdict};
use crate::rules::{Combine, Designation, DesignationPart};

/// A designation as it came out.
#[derive(Debug, Clone, PartialEq, Eq)]
pub struct DesignationJudgement {
    /// The verdict.
    pub verdict: Verdict,
    /// Whether a criterion that decides it is a close call.
    pub closeness: Closeness,
    /// The parts that make the verdict.
    pub by: Vec<DesignationPart>,
    /// The hazard statement that says so, if one does.
    pub stated: Option<String>,
}

/// Judges the designations of a rulebook, in file order.
pub(crate) fn judge_designations(
    context: Context,
    criteria: &[CriterionJudgement],
) -> Vec<DesignationJudgement> {
    let count = context.rulebook.designations.len();
    let mut judged: Vec<Option<DesignationJudgement>> = vec![None; count];
    // Designations never go round in circles (validation refuses that), so that each round judges one more at least.
    for _ in 0..count {
        for (index, designation) in context.rulebook.designations.iter().enumerate() {
            let ready = designation.parts.iter().all(|part| match *part {
                DesignationPart::Criterion(_) => true,
                DesignationPart::Designation(other) => judged.get(other).is_none_or(Option::is_some),
            });
            if !ready || judged.get(index).is_none_or(Option::is_some) {
                continue;
            }
            let verdict = judge_designation(context, designation, criteria, &judged);
            if let Some(place) = judged.get_mut(index) {
                *place = Some(verdict);
            }
        }
        if judged.iter().all(Option::is_some) {
            break;
        }
    }
    judged.into_iter().flatten().collect()
}

fn judge_designation(
    context: Context,
    designation: &Designation,
    criteria: &[CriterionJudgement],
    judged: &[Option<DesignationJudgement>],
) -> DesignationJudgement {
    if let Some(stated) = stated(context, designation) {
        return DesignationJudgement {
            verdict: Verdict::Fulfilled,
            closeness: Closeness::Clear,
            by: Vec::new(),
            stated: Some(stated),
        };
    }
    let parts: Vec<(DesignationPart, Verdict, Closeness)> = designation
        .parts
        .iter()
        .filter_map(|part| {
            let (verdict, closeness) = match *part {
                DesignationPart::Criterion(index) => {
                    criteria.get(index).map(|criterion| (criterion.verdict, criterion.closeness))?
                }
                DesignationPart::Designation(index) => {
                    let other = judged.get(index)?.as_ref()?;
                    (other.verdict, other.closeness)
                }
            };
            Some((*part, verdict, closeness))
        })
        .collect();
    let verdicts: Vec<Verdict> = parts.iter().map(|(_, verdict, _)| *verdict).collect();
    let verdict = combined(designation.combine, &verdicts);
    let makes_it = |part: &&(DesignationPart, Verdict, Closeness)| match verdict {
        Verdict::Unresolved | Verdict::NoData => matches!(part.1, Verdict::Unresolved | Verdict::NoData),
        Verdict::OutOfScope
        | Verdict::NotFulfilled
        | Verdict::ScreensOut
        | Verdict::ScreensIn
        | Verdict::Fulfilled => part.1 == verdict,
    };
    let deciding: Vec<_> = parts.iter().filter(makes_it).collect();
    DesignationJudgement {
        verdict,
        closeness: Closeness::from_condition(closeness(designation.combine, verdict, &deciding)),
        by: deciding.iter().map(|(part, _, _)| *part).collect(),
        stated: None,
    }
}

fn stated(context: Context, designation: &Designation) -> Option<String> {
    let statements = &context.substance.hazard_statements.as_ref()?.value;
    designation.stated_by.iter().find_map(|code| statements.find(code)).map(str::to_owned)
}

/// All-of: any `out of scope`, else any `not fulfilled`, else any `screens out`, else anything unanswered, else any
/// `screens in`, else `fulfilled`. Any-of mirrors it.
pub(crate) fn combined(combine: Combine, verdicts: &[Verdict]) -> Verdict {
    let any = |wanted: Verdict| verdicts.contains(&wanted);
    let unanswered = any(Verdict::Unresolved) || any(Verdict::NoData);
    if any(Verdict::OutOfScope) {
        return Verdict::OutOfScope;
    }
    let (first, second, fourth, last) = match combine {
        Combine::All => (Verdict::NotFulfilled, Verdict::ScreensOut, Verdict::ScreensIn, Verdict::Fulfilled),
        Combine::Any => (Verdict::Fulfilled, Verdict::ScreensIn, Verdict::ScreensOut, Verdict::NotFulfilled),
    };
    if any(first) {
        first
    } else if any(second) {
        second
    } else if unanswered {
        Verdict::Unresolved
    } else if any(fourth) {
        fourth
    } else {
        last
    }
}

/// Where one part is enough for the verdict, it is a close call only if every such part is; where all are needed, if
/// any is.
fn closeness(
    combine: Combine,
    verdict: Verdict,
    deciding: &[&(DesignationPart, Verdict, Closeness)],
) -> bool {
    let mut close = deciding.iter().map(|(_, _, closeness)| *closeness == Closeness::CloseCall);
    let one_is_enough = match verdict {
        Verdict::NotFulfilled | Verdict::ScreensOut => combine == Combine::All,
        Verdict::Fulfilled | Verdict::ScreensIn => combine == Combine::Any,
        Verdict::Unresolved | Verdict::NoData | Verdict::OutOfScope => false,
    };
    if one_is_enough { !deciding.is_empty() && close.all(|close| close) } else { close.any(|close| close) }
}

#[cfg(test)]
mod tests {
    use super::combined;
    use crate::judge::Verdict::{
        self, Fulfilled, NoData, NotFulfilled, OutOfScope, ScreensIn, ScreensOut, Unresolved,
    };
    use crate::rules::Combine;

    #[test]
    fn an_all_of_designation_takes_the_verdict_that_its_weakest_part_allows() {
        let table: [(&[Verdict], Verdict); 12] = [
            (&[Fulfilled, Fulfilled, Fulfilled], Fulfilled),
            (&[Fulfilled, ScreensIn, Fulfilled], ScreensIn),
            (&[ScreensIn, ScreensIn, ScreensIn], ScreensIn),
            (&[Fulfilled, Unresolved, Fulfilled], Unresolved),
            (&[Fulfilled, NoData, ScreensIn], Unresolved),
            (&[NoData, NoData, NoData], Unresolved),
            (&[Fulfilled, ScreensOut, Unresolved], ScreensOut),
            (&[NoData, ScreensOut, Fulfilled], ScreensOut),
            (&[NotFulfilled, ScreensOut, Fulfilled], NotFulfilled),
            (&[NotFulfilled, NoData, Unresolved], NotFulfilled),
            (&[OutOfScope, OutOfScope, OutOfScope], OutOfScope),
            (&[OutOfScope, NotFulfilled, Fulfilled], OutOfScope),
        ];
        for (parts, expected) in table {
            assert_eq!(combined(Combine::All, parts), expected, "{parts:?}");
        }
    }

    #[test]
    fn an_any_of_designation_takes_the_verdict_of_most_concern_that_is_answered() {
        let table: [(&[Verdict], Verdict); 9] = [
            (&[NotFulfilled, Fulfilled], Fulfilled),
            (&[NoData, Fulfilled], Fulfilled),
            (&[Unresolved, ScreensIn], ScreensIn),
            (&[ScreensOut, Unresolved], Unresolved),
            (&[NotFulfilled, NoData], Unresolved),
            (&[ScreensOut, NotFulfilled], ScreensOut),
            (&[NotFulfilled, NotFulfilled], NotFulfilled),
            (&[NoData, NoData], Unresolved),
            (&[OutOfScope, OutOfScope], OutOfScope),
        ];
        for (parts, expected) in table {
            assert_eq!(combined(Combine::Any, parts), expected, "{parts:?}");
        }
    }

    #[test]
    fn an_unanswered_part_never_lets_an_all_of_designation_be_fulfilled_nor_an_any_of_one_be_cleared() {
        for unanswered in [Unresolved, NoData] {
            for other in Verdict::ALL {
                assert!(!matches!(combined(Combine::All, &[unanswered, other]), Fulfilled | ScreensIn));
                assert!(!matches!(combined(Combine::Any, &[unanswered, other]), NotFulfilled | ScreensOut));
            }
        }
    }
}
