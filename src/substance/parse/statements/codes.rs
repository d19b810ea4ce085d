//! Codes of hazard statements in a text.

use std::sync::LazyLock;

use regex::{Captures, Regex};

use crate::substance::parse::pattern::fixed;

/// A code with what may follow after a slash: `H301/311`. Word ends are those of Latin letters, because other scripts
/// write their words beside it without a space.
static CODE: LazyLock<Regex> = LazyLock::new(|| {
    fixed(
        r"(?-u:\b)(EUH|H)\s*-?\s*(\d{3})(?:\s?(FD|DF|F|D|i|A))?((?:\s*/\s*\d{3}(?-u:\b))*)((?-u:\b)|[^A-Z0-9])",
    )
});
static FURTHER_CODE: LazyLock<Regex> = LazyLock::new(|| fixed(r"\d{3}"));
/// Lists of precautionary statements, `P305+351+338`, which say nothing of hazards.
static PRECAUTION: LazyLock<Regex> =
    LazyLock::new(|| fixed(r"(?-u:\b)P\s*-?\s*\d{3}(?:\s*[+/]\s*P?\s*\d{3})*"));
/// A code that is denied or doubted is none: `not H350`, `suspicion of H351`, `H350?`, `H350: no`, `H300-series`.
static DOUBTED: LazyLock<Regex> = LazyLock::new(|| {
    fixed(concat!(
        r"((?-u:\b)(?:not|no|non|without|kein\w*|nicht|ohne|pas|sans|aucun\w*|sin|senza|nessun\w*|geen|niet|zonder|",
        r"verdacht|suspected|suspicion|suspect[eé]?|possibl[ey]|probabl[ey]|perhaps|maybe|evtl\.?|eventuell|vielleicht|",
        r"möglich\w*|vermutlich|soupçon\w*|sospech\w*|sospett\w*|verdenking|vermoed\w*|mogelijk)",
        r"(?: (?:as|als|classified|eingestuft|clas\w*|ingedeeld|de|con|come|como|mit|with|for|für|auf|of|pour|por|per|voor|",
        r"di|van|op)){0,3}|不是|非|疑い：?|疑似)",
        r" ?(?-u:\b)(?:EUH|H)\s?-?\s?\d{3}[A-Z]{0,2}(?-u:\b)|(?-u:\b)(?:EUH|H)\s?-?\s?\d{3}[A-Z]{0,2} ?\?|",
        r"(?-u:\b)(?:EUH|H)\s?-?\s?\d{3} ?-? ?(?:series|serie|série|reihe|er|ff|xx)(?-u:\b)|",
        r"(?-u:\b)(?:EUH|H)\s?-?\s?\d{3}[A-Z]{0,2} ?[:=：(–-]? ?(?:",
        r"no|nein|non|nee|none|not|nicht|keine?|pas|niet|entfällt|trifft nicht zu|nicht zutreffend|nicht eingestuft|",
        r"not applicable|not classified|does not apply|no data|keine daten|non applicable|non classé|ne s'applique pas|",
        r"no aplica|no clasificado|non applicabile|non classificato|niet van toepassing|niet ingedeeld|n\.? ?[av]\.? ?t?\.?|n/a|",
        r"否|无|無|なし|該当しない|不适用|不適用|いいえ) ?(?:$|[,;.)|\n])"
    ))
});

/// The statements of the globally harmonised system and of Regulation (EC) No 1272/2008, Annexes III and VI, as amended by
/// Regulation (EU) 2023/707 (from memory), without letters behind.
const KNOWN: &str = concat!(
    "200 201 202 203 204 205 206 207 208 209 210 211 220 221 222 223 224 225 226 227 228 229 230 231 232 240 241 242 250 ",
    "251 252 260 261 270 271 272 280 281 282 283 284 290 300 301 302 303 304 305 310 311 312 313 314 315 316 317 318 319 ",
    "320 330 331 332 333 334 335 336 340 341 350 351 360 361 362 370 371 372 373 400 401 402 410 411 412 413 420"
);
const KNOWN_EUH: &str = concat!(
    "001 006 009 014 018 019 029 031 032 044 059 066 070 071 201 202 203 204 205 206 207 208 209 210 211 212 380 381 401 ",
    "430 431 440 441 450 451"
);

fn is_known(prefix: &str, number: &str) -> bool {
    let known = if prefix == "H" { KNOWN } else { KNOWN_EUH };
    known.split(' ').any(|code| code == number)
}

/// The codes of a text in the order they stand, and the text without them and without precautionary statements. What
/// only looks like a code stays in the text.
pub(super) fn codes_in(text: &str) -> (Vec<String>, String) {
    let mut codes = Vec::new();
    let mut rest = String::with_capacity(text.len());
    let mut end = 0;
    for doubted in DOUBTED.find_iter(text) {
        rest.push_str(&without_codes(text.get(end..doubted.start()).unwrap_or_default(), &mut codes));
        rest.push_str(doubted.as_str());
        end = doubted.end();
    }
    rest.push_str(&without_codes(text.get(end..).unwrap_or_default(), &mut codes));
    (codes, PRECAUTION.replace_all(&rest, " ").into_owned())
}

/// What is denied or doubted in the rest of a text.
pub(super) fn doubted(rest: &str) -> Option<&str> {
    DOUBTED.find(rest).map(|found| found.as_str().trim().trim_end_matches([',', ';', '.', '|']))
}

fn without_codes(text: &str, codes: &mut Vec<String>) -> String {
    CODE.replace_all(text, |found: &Captures<'_>| {
        let part = |group| found.get(group).map_or("", |part: regex::Match<'_>| part.as_str());
        let prefix = part(1).to_uppercase();
        let further: Vec<&str> = FURTHER_CODE.find_iter(part(4)).map(|number| number.as_str()).collect();
        if !is_known(&prefix, part(2)) || !further.iter().all(|number| is_known(&prefix, number)) {
            return part(0).to_owned();
        }
        codes.push(format!("{prefix}{}{}", part(2), part(3)));
        codes.extend(further.iter().map(|number| format!("{prefix}{number}")));
        format!(";{}", part(5))
    })
    .into_owned()
}
