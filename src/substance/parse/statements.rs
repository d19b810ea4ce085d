//! Cells with hazard statements or hazard classes.

use std::sync::LazyLock;

use regex::Regex;

use super::cell::value_text;
use super::pattern::{fixed, fixed_by_parts};
use crate::fault::CellFaultKind;
use crate::quantity::plain_words;
use crate::substance::HazardStatements;
use crate::workbook::CellContent;

/// A code with what may follow after a slash: `H301/311`.
static CODE: LazyLock<Regex> =
    LazyLock::new(|| fixed(r"\b(EUH|H)\s*-?\s*(\d{3})(?:\s?(FD|DF|F|D|i|A)\b)?((?:\s*/\s*\d{3}\b)*)"));
/// Lists of precautionary statements, `P305+351+338`, which say nothing of hazards.
static PRECAUTION: LazyLock<Regex> = LazyLock::new(|| fixed(r"\bP\s*-?\s*\d{3}(?:\s*[+/]\s*P?\s*\d{3})*"));
/// What may be a statement and was not read: a number without its letter between two separators, a risk phrase of the
/// old system, a hazard without its class.
static UNREAD: LazyLock<Regex> = LazyLock::new(|| {
    fixed(
        r"(?:^|[,;/+&\s-])([234]\d{2}[a-z]{0,2})\s*(?:[,;/+&-]|$)|\b(R\s?\d{2})(?:\D|$)|\b(CMR|carcinogen\w*|mutagen\w*)\b",
    )
});
static FURTHER_CODE: LazyLock<Regex> = LazyLock::new(|| fixed(r"\d{3}"));

/// Classes in folded words and the code of each category (Regulation (EC) No 1272/2008, Annex VI and, for the EUH
/// classes, as amended by Regulation (EU) 2023/707; common practice).
static CLASSES: LazyLock<Vec<Class>> = LazyLock::new(|| {
    vec![
        Class::new(
            r"(carc\w*|karz\w*|krebserz\w*)",
            &[("1a", "H350"), ("1b", "H350"), ("1", "H350"), ("2", "H351")],
        ),
        Class::new(
            r"(muta\w*|keimzellmut\w*)",
            &[("1a", "H340"), ("1b", "H340"), ("1", "H340"), ("2", "H341")],
        ),
        Class::new(
            r"(repr\w*(?: tox\w*)?|(?:toxic )?(?:for|to) reproduction|fortpfl\w*(?: \w+)?)",
            &[("1a", "H360"), ("1b", "H360"), ("1", "H360"), ("2", "H361")],
        ),
        Class::new(
            r"(stot|specific target organ tox\w*|spezifische zielorgan ?tox\w*) (re|rep\w*|wdh\w*|wiederholt\w*)(?: exp\w*)?",
            &[("1", "H372"), ("2", "H373")],
        ),
        Class::new(
            r"(ed hh|endocrine disrupt\w*(?: for)? human health)",
            &[("1", "EUH380"), ("2", "EUH381")],
        ),
        Class::new(
            r"(ed env|endocrine disrupt\w*(?: for)?(?: the)? environment)",
            &[("1", "EUH430"), ("2", "EUH431")],
        ),
        Class::new(r"aquatic acute", &[("1", "H400")]),
        Class::new(r"aquatic chronic", &[("1", "H410"), ("2", "H411"), ("3", "H412"), ("4", "H413")]),
    ]
});
/// Whole cells only: `no data` and `not classified due to lack of data` are no statement that there is none.
static NONE: LazyLock<Regex> = LazyLock::new(|| {
    fixed(concat!(
        r"^(none|no|not classified|unclassified|not hazardous|non hazardous|no hazards?|no classification|not dangerous|",
        r"no (h|hazard) (statements?|phrases?|codes?)|keine?|keine? (h satze|einstufung|gefahrenhinweise|kennzeichnung|",
        r"gefahrstoff|gefahrlicher stoff)|nicht eingestuft|nicht klassifiziert|nicht kennzeichnungspflichtig|",
        r"kein gefahrstoff|ohne|nicht gefahrlich|not subject to classification|no labelling)",
        r"( (as|als) (hazardous|dangerous|gefahrlich\w*).*| (according|in accordance|under|nach|gemass|laut|im sinne) .*|",
        r" (required|erforderlich|applicable))?$"
    ))
});
/// A classification that was not made is no word for none.
static NOT_ASSESSED: LazyLock<Regex> = LazyLock::new(|| {
    fixed(concat!(
        r"\b(data|daten\w*|datenlage|lack\w*|insufficient|information|info|angaben?|mangels|fehlend\w*|unbekannt|unknown|known|",
        r"available|verfugbar|yet|noch|sds|possible|moglich|inconclusive|assessed|bewertet|pending|tested|gepruft)\b"
    ))
});
struct Class {
    with_category: Regex,
    alone: Regex,
    codes: &'static [(&'static str, &'static str)],
}

impl Class {
    fn new(words: &'static str, codes: &'static [(&'static str, &'static str)]) -> Self {
        let with_category = format!(r"\b{words}(?: (?:cat|category|kat|kategorie))? ?(1a|1b|[1-4])\b");
        let alone = format!(r"\b{words}\b");
        Self { with_category: fixed_by_parts(&with_category), alone: fixed_by_parts(&alone), codes }
    }
}

/// The statements of a cell, and a fault where something of it could not be read. A cell that says `none` holds an
/// empty set; a cell without code, class or such a word holds no set at all.
pub(super) fn read_statements(
    content: &CellContent,
) -> Result<(Option<HazardStatements>, Option<CellFaultKind>), CellFaultKind> {
    // `none` is a word for missing elsewhere; here it says that there is no statement.
    let text = match content {
        CellContent::Text(text) if says_none(text) => {
            return Ok((Some(HazardStatements::default()), None));
        }
        CellContent::Text(_) => value_text(content),
        CellContent::Empty => None,
        CellContent::Number(_)
        | CellContent::Boolean(_)
        | CellContent::DateTime(_)
        | CellContent::Error(_) => {
            return Err(CellFaultKind::NoStatement);
        }
    };
    let Some(text) = text else {
        return Ok((None, None));
    };
    let mut codes = codes_in(&text);
    let unread = read_classes(&plain_words(&text), &mut codes)
        .map(|class| CellFaultKind::ClassWithoutCategory { class })
        .or_else(|| unread_part(&text, &codes).map(|part| CellFaultKind::StatementUnread { part }));
    match (codes.is_empty(), unread) {
        (true, None) => Err(CellFaultKind::NoStatement),
        (true, Some(fault)) => Err(fault),
        (false, None) => Ok((Some(HazardStatements::new(codes)), None)),
        (false, Some(fault)) => Ok((Some(HazardStatements::incomplete(codes)), Some(fault))),
    }
}

fn says_none(text: &str) -> bool {
    let plain = plain_words(text);
    NONE.is_match(&plain) && !NOT_ASSESSED.is_match(&plain) && !CODE.is_match(text)
}

/// What of a text may be a statement beside the codes that were found; nothing where there are none, because such a
/// cell is no cell of statements at all.
fn unread_part(text: &str, codes: &[String]) -> Option<String> {
    if codes.is_empty() {
        return None;
    }
    let without_codes = CODE.replace_all(text, ";");
    let rest = PRECAUTION.replace_all(&without_codes, " ");
    let found = UNREAD.captures(&rest)?;
    let part = found.iter().skip(1).flatten().next()?.as_str();
    let is_class = part.starts_with(|first: char| first.is_ascii_alphabetic() && first != 'R');
    let explained = is_class && codes.iter().any(|code| code.starts_with("H34") || code.starts_with("H35"));
    (!explained).then(|| part.to_owned())
}

fn codes_in(text: &str) -> Vec<String> {
    let mut codes = Vec::new();
    for found in CODE.captures_iter(text) {
        let part = |group| found.get(group).map_or("", |part: regex::Match<'_>| part.as_str());
        let prefix = part(1).to_uppercase();
        codes.push(format!("{prefix}{}{}", part(2), part(3)));
        codes.extend(FURTHER_CODE.find_iter(part(4)).map(|number| format!("{prefix}{}", number.as_str())));
    }
    codes
}

/// Adds the codes of the classes; gives back a class that stands without category and whose codes are not there.
fn read_classes(plain: &str, codes: &mut Vec<String>) -> Option<String> {
    let mut unread = None;
    for class in CLASSES.iter() {
        let mut found_category = false;
        for found in class.with_category.captures_iter(plain) {
            let category = found.iter().flatten().last().map_or("", |part| part.as_str());
            let code = class.codes.iter().find(|(known, _)| *known == category).map(|(_, code)| *code);
            // A code of the same family in the cell says more: `Repr. 1B; H360FD`.
            if let Some(code) = code {
                found_category = true;
                if !codes.iter().any(|known| known.starts_with(code)) {
                    codes.push(code.to_owned());
                }
            }
        }
        let has_code = |code: &str| codes.iter().any(|known| known.starts_with(code));
        let explained = found_category || class.codes.iter().any(|(_, code)| has_code(code));
        if !explained && let Some(found) = class.alone.find(plain) {
            unread.get_or_insert_with(|| found.as_str().to_owned());
        }
    }
    unread
}
