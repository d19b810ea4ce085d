//! A doubt beside a value: a question mark or a word for it. What is doubted does not count as measured.

use std::sync::LazyLock;

use regex::Regex;

use super::pattern::fixed;
use super::remark::{Said, folded};

/// Whether words doubt a value.
#[derive(Debug, Clone, Copy, PartialEq, Eq, Default)]
pub(crate) enum Doubt {
    /// They do not.
    #[default]
    None,
    /// They do.
    Voiced,
}

// In the eight languages, folded.
static DOUBTFUL: LazyLock<Regex> = LazyLock::new(|| {
    fixed(concat!(
        r"\b(?:doubt\w*|questionable|uncertain|unconfirmed|not confirmed|unsure|dubious|fraglich\w*|fragwurdig\w*|zweifelhaft\w*|",
        r"unsicher\w*|ungewiss\w*|unbestatigt\w*|nicht bestatigt|douteu(?:x|se)s?|incertain\w*|non confirme\w*|a confirmer|",
        r"dudos[oa]s?|inciert[oa]s?|sin confirmar|no confirmad[oa]|dubbi[oa]|incert[oa]|non confermat[oa]|da confermare|",
        r"twijfelachtig\w*|onzeker\w*|niet bevestigd|onbevestigd)\b|",
        r"疑わし|疑問|不確か|不確実|要確認|未確認|存疑|可疑|不确定|不確定|待确认|待確認|未确认"
    ))
});

impl Doubt {
    /// What a text says of it.
    pub(super) fn of(text: &str) -> Self {
        let doubts = text.contains(['?', '？']) || DOUBTFUL.is_match(&folded(text));
        if doubts { Self::Voiced } else { Self::None }
    }
}

/// What the remarks of a cell say, with the doubt they voice; a lone question mark is kept as it is written.
pub(super) fn said_in(remarks: &[String]) -> Said {
    let mut said = Said::in_remarks(remarks);
    for remark in remarks.iter().filter(|remark| Doubt::of(remark) == Doubt::Voiced) {
        said.doubt = Doubt::Voiced;
        let method = said.conditions.method.get_or_insert_default();
        if !method.contains(remark.trim()) {
            let separator = if method.is_empty() { "" } else { "; " };
            method.push_str(separator);
            method.push_str(remark.trim());
        }
    }
    said
}
