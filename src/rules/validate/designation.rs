//! The designations of a rulebook: criteria or other designations combined, never in a circle.

use super::criterion::refuse_duplicate;
use super::limit::read_codes;
use crate::fault::{OwnerKind, RuleMistake, nearest};
use crate::rules::file::{Located, Section};
use crate::rules::{Combine, Criterion, Designation, DesignationPart};

/// A designation whose parts are names still.
struct Draft<'file> {
    section: Section<'file>,
    id: String,
    title: String,
    combine: Combine,
    parts: Vec<Located<String>>,
    stated_by: Vec<String>,
}

/// The designations of a file, in order; `None` if one of them means nothing.
pub(super) fn read_designations(file: &Section<'_>, criteria: &[Criterion]) -> Option<Vec<Designation>> {
    let criterion_lines: Vec<(String, usize)> = file
        .sections("criterion", "[[criterion]]")
        .iter()
        .filter_map(|section| Some((section.text("id")?.value, section.line(&section.span()))))
        .collect();
    let sections = file.sections("designation", "[[designation]]");
    let mut names = Vec::new();
    let mut drafts = Vec::new();
    for section in &sections {
        if let Some(draft) = read_draft(section) {
            match criterion_lines.iter().find(|(id, _)| *id == draft.id) {
                Some(taken) => {
                    refuse_duplicate(section, &draft.id, &mut vec![taken.clone()], OwnerKind::Criterion);
                }
                None => refuse_duplicate(section, &draft.id, &mut names, OwnerKind::Designation),
            }
            drafts.push(draft);
        }
    }
    // Without all names, names that are right would be reported as unknown.
    if drafts.len() < sections.len() || criteria.len() < criterion_lines.len() {
        return None;
    }
    let designations: Option<Vec<Designation>> =
        drafts.iter().map(|draft| resolve(draft, &drafts, criteria)).collect();
    let designations = designations?;
    for (index, draft) in drafts.iter().enumerate() {
        // Each circle is told once, at its first designation.
        if let Some(circle) =
            way_back(index, &designations).filter(|circle| circle.iter().all(|part| *part >= index))
        {
            let path = circle.iter().filter_map(|part| Some(drafts.get(*part)?.id.clone())).collect();
            let span = draft.parts.first().map_or(draft.section.span(), |part| part.span.clone());
            draft.section.report(span, RuleMistake::Circular { path });
        }
    }
    Some(designations)
}

fn read_draft<'file>(section: &Section<'file>) -> Option<Draft<'file>> {
    section.allow(&["id", "title", "all-of", "any-of", "stated-by"]);
    section.need("id = \"PBT\"");
    let (id, title) = (section.text("id"), section.text("title"));
    let stated_by = read_codes(section, "stated-by").unwrap_or_default();
    let (all, any) = (section.texts("all-of"), section.texts("any-of"));
    let spans = ["all-of", "any-of"].map(|key| section.key_span(key));
    if let [None, None] | [Some(_), Some(_)] = &spans {
        let [_, second] = spans;
        section.report(second.unwrap_or(section.span()), RuleMistake::AllOrAny);
    }
    let (combine, parts) = match (all, any) {
        (Some(parts), None) => (Combine::All, parts),
        (None, Some(parts)) => (Combine::Any, parts),
        (None, None) | (Some(_), Some(_)) => return None,
    };
    let id = id?.value;
    Some(Draft {
        section: section.clone(),
        title: title.map_or_else(|| id.clone(), |title| title.value),
        id,
        combine,
        parts,
        stated_by,
    })
}

fn resolve(draft: &Draft<'_>, drafts: &[Draft<'_>], criteria: &[Criterion]) -> Option<Designation> {
    let parts: Vec<Option<DesignationPart>> =
        draft.parts.iter().map(|part| resolve_part(draft, part, drafts, criteria)).collect();
    Some(Designation {
        id: draft.id.clone(),
        title: draft.title.clone(),
        combine: draft.combine,
        parts: parts.into_iter().collect::<Option<_>>()?,
        stated_by: draft.stated_by.clone(),
    })
}

fn resolve_part(
    draft: &Draft<'_>,
    part: &Located<String>,
    drafts: &[Draft<'_>],
    criteria: &[Criterion],
) -> Option<DesignationPart> {
    let by_criterion = criteria.iter().position(|criterion| criterion.id == part.value);
    let by_designation = drafts.iter().position(|other| other.id == part.value);
    match (by_criterion, by_designation) {
        (Some(index), _) => {
            if criteria.get(index).is_some_and(|criterion| !criterion.bands.is_empty()) {
                let criterion = part.value.clone();
                draft.section.report(part.span.clone(), RuleMistake::BandedPart { criterion });
            }
            Some(DesignationPart::Criterion(index))
        }
        (None, Some(index)) => Some(DesignationPart::Designation(index)),
        (None, None) => {
            let known: Vec<String> = criteria
                .iter()
                .map(|criterion| criterion.id.clone())
                .chain(drafts.iter().map(|other| other.id.clone()))
                .collect();
            let mistake = RuleMistake::UnknownPart {
                found: part.value.clone(),
                nearest: nearest(&part.value, known.iter().map(String::as_str)).map(str::to_owned),
                known,
            };
            draft.section.report(part.span.clone(), mistake);
            None
        }
    }
}

/// The places on the way from a designation back to itself, if there is such a way.
fn way_back(start: usize, designations: &[Designation]) -> Option<Vec<usize>> {
    let mut ways = vec![vec![start]];
    let mut seen = vec![start];
    while let Some(way) = ways.pop() {
        let here = designations.get(*way.last()?)?;
        for part in &here.parts {
            let DesignationPart::Designation(next) = part else {
                continue;
            };
            let mut longer = way.clone();
            longer.push(*next);
            if *next == start {
                return Some(longer);
            }
            if !seen.contains(next) {
                seen.push(*next);
                ways.push(longer);
            }
        }
    }
    None
}
