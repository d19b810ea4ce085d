//! A doubt beside a value: a question mark or a word for it. What is doubted does not count as measured.

use std::sync::LazyLock;

use regex::Regex;

use super::pattern::fixed;
use super::remark::{Said, folded};

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

/// A text that doubts a value, as written.
pub(super) fn doubt_in(text: &str) -> Option<String> {
    let doubts = text.contains(['?', '？']) || DOUBTFUL.is_match(&folded(text));
    doubts.then(|| text.trim().to_owned())
}

/// What the remarks of a cell say, with the doubt they voice.
pub(super) fn said_in(remarks: &[String]) -> Said {
    let mut said = Said::in_remarks(remarks);
    said.conditions.doubt = remarks.iter().find_map(|remark| doubt_in(remark));
    said
}
