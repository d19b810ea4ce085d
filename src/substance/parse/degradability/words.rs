//! Words on ready biodegradability, in the eight languages.
//!
//! A text is cut at its commas, brackets and colons, and each part says yes, no or nothing. A word for ready counts only
//! where no word of denial or doubt stands anywhere in the cell, so that a negation that is not understood is never lost.

use std::sync::LazyLock;

use regex::Regex;

use super::denials::{denies, is_uncertain, names_other_conditions, says_no_result, without_harmless};
use super::window::without_window;
use crate::quantity::plain_words;
use crate::substance::parse::pattern::fixed;

/// What the words of a cell come to.
#[derive(Debug, Clone, Copy, PartialEq, Eq)]
pub(super) enum Words {
    /// Ready.
    Yes,
    /// Not ready.
    No,
    /// One part says yes and another no.
    Both,
    /// Ready beside a denial, a question or other conditions than those of the test.
    Doubtful,
    /// That there is no result.
    NoResult,
    /// Nothing.
    Silent,
}

/// A part of the cell that denies.
static NEGATIVE: LazyLock<Regex> = LazyLock::new(|| {
    fixed(concat!(
        r"\b(not|non|no|cannot|isn t|unlikely|neither|nicht|keine?|weder|pas|ne|niet|geen|mai|nunca|jamais|nooit) ",
        r"((?:\w+ ){0,5}(?:readily|ready|easily|rapidly|leicht\w*|schnell\w*|facil\w*|aisement|rapid\w*|prontamente|",
        r"gemakkelijk|licht|snel)\b|(?:\w+ )?(?:bio\w*|degrad\w*|abbaubar\w*|afbreekba\w*|bestanden|passed|met|erfullt|",
        r"superad[oa]|superat[oa]|geslaagd|reussi\w*)\b)|",
        r"\bnonbiodegrad\w*\b|\bnot (bio)?degrad\w*|\bfail\w*|\b(schwer|kaum|schlecht|langsam) (biologisch \w*|abbaubar\w*)|",
        r"\b(poorly|hardly|barely|scarcely|slowly)\b|\b(difficil\w*|dificil\w*|peu|poco|mal|lentement|lentamente|scarsamente|",
        r"moeilijk|slecht|langzaam|weinig) (\w+ )?(biodegrad\w*|degrad\w*|biologisch \w*|afbreekba\w*)|",
        r"\bpersistent\w*|\bpersistant\w*|\b(bio)?degradation fails|\bechoue\w*|\bechec\b|\bfallid[oa]|\bfallit[oa]|\bmislukt\b|",
        r"(?:[不难難非未沒没]|无法|無法|并非|不是)(?:能|可|是|易|于|於|容易|快速|迅速|被|良|生物|微生物|生)*(?:降解|分解)性?|",
        r"[易良生容快速物]*(?:降解|分解)性?(?:では|で|は|が|じゃ)?(?:ない|なし|無し|無|ありません|認められない)|",
        r"不合格|未通过|未通過|不通过"
    ))
});
/// A part of the cell that affirms.
static POSITIVE: LazyLock<Regex> = LazyLock::new(|| {
    fixed(concat!(
        r"\breadily\b|\bready (bio)?degradable\b|\b(easily|rapidly) biodegradable\b|",
        r"\bleicht\w* (biologisch\w* )?abbau\w*|\bbiologisch (leicht|schnell) abbaubar\w*|\bschnell biologisch abbaubar\w*|",
        r"\b(facilement|aisement|rapidement) biodegradables?\b|\b(facil|facilmente|rapidamente|prontamente) biodegradabl?[eil]\w*|",
        r"\b(gemakkelijk|licht) (biologisch )?afbreekba\w*|\bbiologisch (gemakkelijk|licht|snel) afbreekba\w*|",
        r"\bsnel biologisch afbreekba\w*|\b(passed|bestanden|reussi|superado|superato|geslaagd)\b|",
        r"[易良]生?分解|易(?:于|於|被)?生物(?:降解|分解)|容易(?:被)?生物(?:降解|分解)|(?:快速|迅速)生物(?:降解|分解)|通过测试"
    ))
});
/// Ready, by name: `passed` and `yes` may be said of any test.
static READY: LazyLock<Regex> = LazyLock::new(|| {
    fixed(concat!(
        r"\b(readily|ready|leicht\w*|facilement|facil|facilmente|prontamente|rapidamente|rapidement|gemakkelijk)\b|",
        r"[易良]生?分解|易(?:于|於|被)?生物(?:降解|分解)|容易(?:被)?生物(?:降解|分解)|(?:快速|迅速)生物(?:降解|分解)|易降解"
    ))
});
/// The tests of ready biodegradability.
static READY_TEST: LazyLock<Regex> = LazyLock::new(|| {
    fixed(concat!(
        r"\b(?:oecd|ocde|ocse|oeso) ?(?:tg |no |nr |test |guideline |guidelines )*(?:301|310) ?[a-f]?\b|",
        r"\b301[a-f]\b"
    ))
});
/// A whole part that answers.
static YES: LazyLock<Regex> = LazyLock::new(|| {
    fixed(concat!(
        r"^(ready|pass|yes|ja|y|j|true|wahr|positive?|positiv|leicht|easily|oui|si|vrai|positif|verdadero|positivo|vero|waar|",
        r"positief|はい|是|合格|通过)( \d.*| oecd.*)?$"
    ))
});
static NO: LazyLock<Regex> = LazyLock::new(|| {
    fixed(concat!(
        r"^(no|nein|n|false|falsch|negative?|negativ|not|nicht|not ready|non|faux|negatif|falso|negativo|nee|onwaar|negatief|",
        r"いいえ|否|不是)( \d.*| oecd.*)?$"
    ))
});
const DENIED_AT_THE_END: [&str; 13] = [
    " no",
    " nein",
    " negative",
    " negativ",
    " false",
    " falsch",
    " non",
    " nee",
    " faux",
    " falso",
    " negatif",
    " negativo",
    " negatief",
];

static INHERENT: LazyLock<Regex> = LazyLock::new(|| {
    fixed(concat!(
        r"\b(inherent\w*|inharent\w*|inhaerent\w*|intrins\w*|potenziell abbaubar)\b|本質的|固有(的)?(可)?(生物|生分解)|",
        r"内在(的)?(可)?生物"
    ))
});
static OTHER: LazyLock<Regex> = LazyLock::new(|| {
    fixed(concat!(
        r"(zahn wellens|\bscas\b|\bmiti ii\b|\biso 9888\b|\b(?:oecd|ocde|ocse|oeso) ?(?:tg |no |nr |test |guideline )?302 ?[abc]?\b|",
        r"\b302 ?[abc]\b)|\b((?:oecd|ocde|ocse|oeso) ?(?:tg |no |nr |test |guideline )?(?:30[3-9]|31[1-9]) ?[ab]?)\b"
    ))
});

/// A test that is none of ready biodegradability.
#[derive(Debug, Clone, PartialEq, Eq)]
pub(super) enum OtherTest {
    /// Of inherent biodegradability.
    Inherent(String),
    /// Of something else.
    Further(String),
}

/// The words of a text with `¦` where it is cut.
fn folded(text: &str) -> String {
    const CUTS: &str = ",;:()[]|/\n\r、，；：（）［］／。・•";
    let text = text.replace(" - ", " ; ");
    let parts = text.split(|character: char| CUTS.contains(character)).map(plain_words);
    parts.filter(|part| !part.is_empty()).collect::<Vec<_>>().join(" ¦ ")
}

/// Whether a text has a word for ready.
pub(super) fn says_ready(text: &str) -> bool {
    READY.is_match(&folded(text))
}

/// Whether a text names a test of ready biodegradability, such as OECD 301B.
pub(crate) fn names_ready_test(text: &str) -> bool {
    READY_TEST.is_match(&folded(text))
}

/// What the words of a cell say.
pub(super) fn words_of(text: &str) -> Words {
    let folded = without_harmless(&without_window(&folded(text)));
    if says_no_result(&folded) && !text.contains('%') {
        return Words::NoResult;
    }
    let parts: Vec<&str> = folded.split('¦').map(str::trim).filter(|part| !part.is_empty()).collect();
    let said: Vec<(Said, &str)> = parts.iter().map(|part| (said_in(part), *part)).collect();
    let yes = said.iter().enumerate().any(|(place, (said, _))| match said {
        Said::Both => true,
        // `readily biodegradable: no` is asked and answered.
        Said::Yes => !(text.contains([':', '：']) && said_no_alone(parts.get(place + 1))),
        Said::No | Said::Nothing => false,
    });
    let no = said.iter().any(|(said, _)| matches!(said, Said::No | Said::Both));
    match (yes, no) {
        (true, true) => Words::Both,
        (false, true) => Words::No,
        (false, false) => Words::Silent,
        (true, false) if denies(&folded) || is_limited(text, &folded) => Words::Doubtful,
        (true, false) if is_uncertain(&folded) => Words::Silent,
        (true, false) => Words::Yes,
    }
}

/// What a part of a cell says.
#[derive(Debug, Clone, Copy, PartialEq, Eq)]
enum Said {
    Yes,
    No,
    Both,
    Nothing,
}

fn said_in(part: &str) -> Said {
    if NO.is_match(part) {
        return Said::No;
    }
    let rest = NEGATIVE.replace_all(part, " ");
    let denied = rest.len() != part.len();
    let affirmed = POSITIVE.is_match(&rest) || YES.is_match(rest.trim());
    let denied_at_the_end = DENIED_AT_THE_END.iter().any(|denial| part.ends_with(denial));
    match (affirmed, denied) {
        (true, true) => Said::Both,
        (true, false) if denied_at_the_end => Said::No,
        (true, false) => Said::Yes,
        (false, true) => Said::No,
        (false, false) => Said::Nothing,
    }
}

fn said_no_alone(part: Option<&&str>) -> bool {
    part.is_some_and(|part| NO.is_match(part))
}

fn is_limited(text: &str, folded: &str) -> bool {
    names_other_conditions(folded) || text.contains(['?', '？'])
}

/// Whether the words beside a passing number keep it from counting.
pub(super) fn is_doubtful(text: &str) -> bool {
    let folded = without_harmless(&without_window(&folded(text)));
    denies(&folded) || is_limited(text, &folded) || is_uncertain(&folded)
}

/// Whether a text speaks of inherent biodegradability.
pub(in crate::substance::parse) fn says_inherent(text: &str) -> bool {
    INHERENT.is_match(&plain_words(text))
}

/// Whether a text says that something is ready, passed or not.
pub(in crate::substance::parse) fn says_ready_or_not(text: &str) -> bool {
    match words_of(text) {
        Words::Yes | Words::No | Words::Both | Words::Doubtful => true,
        Words::NoResult | Words::Silent => false,
    }
}

/// Another test that a text names.
pub(super) fn other_test(text: &str) -> Option<OtherTest> {
    let plain = plain_words(text);
    let found = OTHER.captures(&plain)?;
    let part = |group| found.get(group).map(|part: regex::Match<'_>| part.as_str().to_owned());
    part(1).map(OtherTest::Inherent).or_else(|| part(2).map(OtherTest::Further))
}
