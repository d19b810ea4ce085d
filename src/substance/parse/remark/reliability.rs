//! How reliable a value is said to be, from 1 (without restriction) to 4 (not assignable).

use std::sync::LazyLock;

use regex::Regex;

use crate::substance::parse::pattern::fixed;

static SCORE: LazyLock<Regex> = LazyLock::new(|| {
    fixed(concat!(
        r"(?:\b(?:reliability|klimisch|zuverl(?:ä|ae)ssigkeit|rl|fiabilit[ée]|fiabilidad|affidabilit[àa]|betrouwbaarheid)|信頼性|可靠性)",
        r"(?:\s*(?:score|code|index|klimisch|note|cat\.?|category|スコア|ランク|评分|等级))*[\s=:]*([1-4])\b"
    ))
});

/// A score in a remark, as a number or in words; `plain` is the same text folded.
pub(super) fn reliability_in(text: &str, plain: &str) -> Option<u8> {
    let score = SCORE.captures(text).and_then(|found| found.get(1)?.as_str().parse().ok());
    let speaks_of_it = RELIABLE.iter().any(|word| plain.contains(word));
    score.or_else(|| in_words(plain).filter(|_| speaks_of_it))
}

/// `without restriction` alone may be said of anything.
const RELIABLE: [&str; 10] = [
    "reliab",
    "zuverlassig",
    "valid",
    "bewertbar",
    "zuordenbar",
    "assignable",
    "fiab",
    "affidabil",
    "betrouwba",
    "信頼性",
];

/// A score in folded words of a column of scores.
pub(in crate::substance::parse) fn in_words(plain: &str) -> Option<u8> {
    let has = |words: &[&str]| words.iter().any(|phrase| plain.contains(phrase));
    if has(&[
        "not assignable",
        "nicht bewertbar",
        "nicht zuordenbar",
        "non assignable",
        "non attribuable",
        "no asignable",
        "non assegnabile",
        "niet toe te kennen",
        "niet toewijsbaar",
        "評価不能",
        "无法评估",
    ]) {
        Some(4)
    } else if has(&[
        "not reliable",
        "unreliable",
        "not valid",
        "invalid",
        "nicht zuverlassig",
        "unzuverlassig",
        "nicht valide",
        "ungultig",
        "non fiable",
        "pas fiable",
        "no fiable",
        "non affidabile",
        "niet betrouwbaar",
        "onbetrouwbaar",
        "信頼性なし",
        "不可靠",
    ]) {
        Some(3)
    } else if has(&[
        "without restriction",
        "without any restriction",
        "ohne einschrankung",
        "sans restriction",
        "sin restriccion",
        "senza restrizion",
        "zonder beperking",
        "制限なく",
        "制限なし",
        "无限制",
    ]) {
        Some(1)
    } else if has(&[
        "with restriction",
        "mit einschrankung",
        "avec restriction",
        "con restriccion",
        "con restrizion",
        "met beperking",
        "制限付き",
        "有限制",
        "限制性可靠",
    ]) {
        Some(2)
    } else {
        None
    }
}
