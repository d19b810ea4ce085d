//! What of a cell may be a hazard statement and was not read as one.

use std::sync::LazyLock;

use regex::Regex;

use super::codes::doubted;
use crate::fault::CellFaultKind;
use crate::substance::parse::pattern::fixed;

/// A risk phrase of the old system, alone or the first of several.
static RISK_PHRASE: LazyLock<Regex> =
    LazyLock::new(|| fixed(r"(?:^|[^A-Z0-9])(R ?[:-]? ?\d{1,2}(?:[/-]\d{1,2})*)(?:[^0-9A-Z%]|$)"));
/// The letter of a statement with something like three digits: a digit too few or too many, or letters in their place.
static BROKEN_CODE: LazyLock<Regex> =
    LazyLock::new(|| fixed(r"(?:^|[^A-Z0-9])((?:EU)?H ?-? ?\d[0-9OQISLZB]{0,5}[A-Z]{0,2})(?:[^A-Z0-9]|$)"));
/// Formulas that a sentence about hazards may name.
const FORMULAS: [&str; 8] = ["H2", "H2O", "H2S", "H2SO", "H2O2", "H2SO4", "H3PO4", "H1"];
/// A number without its letter between two separators.
static NUMBER_ALONE: LazyLock<Regex> =
    LazyLock::new(|| fixed(r"(?:^|[,;/+&\s-])([234]\d{2}[a-z]{0,2})\s*(?:[,;/+&-]|$)"));
static CMR: LazyLock<Regex> = LazyLock::new(|| fixed(r"(?:^|[^A-Z0-9])(CMR)(?:[^A-Z0-9]|$)"));
/// The list goes on in a place that is not known.
static AND_SO_ON: LazyLock<Regex> = LazyLock::new(|| {
    fixed(concat!(
        r"\b(etc|usw|u\. ?a|u\. ?v\. ?m|i\. ?a|others|and more|inter alia|incomplete|partial|partly|series|for example|e\. ?g|",
        r"preliminary|provisional|draft|excerpt|weitere[nrs]?|andere|unter anderem|unvollständig|teilweise|auszug|auszugsweise|",
        r"vorläufig|reihe|gruppe|z\. ?b|zum beispiel|autres|incompl[eè]te?|incomplet[oa]|par exemple|p\. ?ex|provisoire|",
        r"entre otr[oa]s|y otr[oa]s|otr[oa]s|por ejemplo|p\. ?ej|provisionale?|altri|tra l'altro|ad esempio|ecc|enz|e\. ?a|",
        r"onder andere|o\. ?a|onvolledig|bijvoorbeeld|bijv|voorlopig|enzovoort|et cetera|etcetera)\b|",
        r"(\.\.\.|…)|(など|等|その他|不完全|不完整|及其他|系列|例えば|例如)"
    ))
});

/// The first part of a cell, its codes left out, that may be a statement; most of these tell only beside codes, because
/// a cell without any is no cell of statements at all.
pub(super) fn unread_part(rest: &str, in_codes: bool) -> Option<CellFaultKind> {
    let first = |pattern: &Regex| {
        let found = pattern.captures(rest)?;
        found.iter().skip(1).flatten().next().map(|part| part.as_str().trim().to_owned())
    };
    if let Some(part) = doubted(rest) {
        return Some(CellFaultKind::StatementUnread { part: part.to_owned() });
    }
    if let Some(phrase) = first(&RISK_PHRASE) {
        return Some(CellFaultKind::RiskPhrase { phrase });
    }
    let broken = BROKEN_CODE.captures_iter(rest).filter_map(|found| found.get(1));
    let mut broken = broken.map(|part| part.as_str().trim().to_owned());
    if let Some(part) = broken.find(|part| !FORMULAS.contains(&part.as_str())) {
        return Some(CellFaultKind::StatementUnread { part });
    }
    let part = first(&NUMBER_ALONE).or_else(|| first(&CMR)).or_else(|| first(&AND_SO_ON))?;
    in_codes.then_some(CellFaultKind::StatementUnread { part })
}
