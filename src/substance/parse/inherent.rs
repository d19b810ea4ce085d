//! Cells on inherent biodegradability: guideline, percentage and days.

use std::sync::LazyLock;

use regex::Regex;

use super::cell::value_text;
use super::degradability::{
    Read, bare_number, days_in, percentage_of_number, percentages, says_inherent, says_ready_or_not,
};
use super::pattern::fixed;
use super::remark::Said;
use crate::fault::CellFaultKind;
use crate::quantity::{DecimalStyle, Interval, plain_words};
use crate::substance::{Basis, InherentBiodegradability};
use crate::workbook::CellContent;

static INHERENT_GUIDELINE: LazyLock<Regex> = LazyLock::new(|| fixed(r"\b302 ?([abc])\b"));

/// A cell on inherent biodegradability whose basis is still open.
#[derive(Debug, Clone, PartialEq)]
pub(super) struct InherentCell {
    guideline: Option<String>,
    degraded: Option<Interval>,
    days: Option<f64>,
    reported: String,
}

impl InherentCell {
    pub(super) fn known_by(self, basis: Basis, reliability: Option<u8>) -> InherentBiodegradability {
        InherentBiodegradability {
            guideline: self.guideline,
            degraded: self.degraded,
            days: self.days,
            basis,
            reliability,
            reported: self.reported,
        }
    }
}

/// What a cell says of inherent biodegradability.
pub(super) fn read_inherent(content: &CellContent, decimal: DecimalStyle) -> Read<(InherentCell, Said)> {
    let not_a = CellFaultKind::NotA {
        what: "result of an inherent biodegradability test",
        example: "75 %, 28 d, OECD 302B",
    };
    let Some(text) = value_text(content) else {
        return Ok(None);
    };
    let plain = plain_words(&text);
    let bare = match content {
        CellContent::Number(number) => Some(*number),
        CellContent::Text(_) => bare_number(&text, decimal),
        CellContent::Empty | CellContent::Error(_) => None,
        CellContent::Boolean(_) | CellContent::DateTime(_) => return Err(not_a),
    };
    let degraded = match bare {
        Some(number) => Some(percentage_of_number(number)?),
        // Of several results the one of most concern.
        None => percentages(&text, decimal)
            .into_iter()
            .min_by(|one, other| lowest(*one).total_cmp(&lowest(*other))),
    };
    let guideline = inherent_guideline(&plain);
    let in_words = says_inherent(&text) || says_ready_or_not(&text);
    if degraded.is_none() && guideline.is_none() && !in_words {
        return Err(not_a);
    }
    let said = Said::in_remarks(std::slice::from_ref(&text));
    let days = days_in(&text);
    Ok(Some((InherentCell { guideline, degraded, days, reported: text }, said)))
}

fn lowest(interval: Interval) -> f64 {
    interval.low().number().unwrap_or(f64::NEG_INFINITY)
}

fn inherent_guideline(plain: &str) -> Option<String> {
    if let Some(letter) = INHERENT_GUIDELINE.captures(plain).and_then(|found| found.get(1)) {
        return Some(format!("OECD 302{}", letter.as_str().to_uppercase()));
    }
    // Names of the methods in OECD 302 A to C.
    [("scas", "OECD 302A"), ("zahn wellens", "OECD 302B"), ("miti ii", "OECD 302C")]
        .into_iter()
        .find(|(name, _)| plain.contains(name))
        .map(|(_, guideline)| guideline.to_owned())
}
