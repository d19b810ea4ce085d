//! What holds for every spelling: a CAS number reads the same however it is written, a negation is never lost, and no
//! text that is put together from the words of the trade panics.

use kowledger::substance::{DegradationTest, Identity};
use proptest::prelude::{Strategy, any};
use proptest::sample::select;

use crate::sheet::read_last;

const DASHES: [&str; 10] = ["-", "‐", "‑", "‒", "–", "—", "−", "－", " - ", "\u{A0}–\u{A0}"];
const BEFORE: [&str; 12] = [
    "",
    " ",
    "CAS ",
    "CAS: ",
    "CAS-Nr. ",
    "CAS RN® ",
    "CASRN ",
    "N° CAS : ",
    "CAS番号：",
    "CAS号：",
    "[",
    "'",
];
const AFTER: [&str; 7] = ["", " ", "\u{A0}", ";", " (technical)", "*", "\n"];

/// A CAS number with its right check digit, as three groups.
fn cas_number() -> impl Strategy<Value = (String, String, String)> {
    (50u32..=9_999_999, 0u32..=99).prop_map(|(first, second)| {
        let digits = format!("{first}{second:02}");
        let sum: u32 = digits
            .chars()
            .rev()
            .zip(1..)
            .filter_map(|(digit, factor)| Some(digit.to_digit(10)? * factor))
            .sum();
        (first.to_string(), format!("{second:02}"), (sum % 10).to_string())
    })
}

fn full_width(text: &str) -> String {
    text.chars()
        .map(|character| match character.to_digit(10) {
            Some(digit) => char::from_u32(0xFF10 + digit).unwrap_or(character),
            None => character,
        })
        .collect()
}

/// Words for ready, each with the words that deny it in its language.
const DENIED: [(&str, &[&str]); 12] = [
    ("readily biodegradable", &["not", "non", "never", "cannot be", "is not", "in no way"]),
    ("ready biodegradable", &["not", "no", "non"]),
    ("leicht biologisch abbaubar", &["nicht", "ist nicht", "keinesfalls nicht", "niemals", "kaum"]),
    ("leicht abbaubar", &["nicht", "nicht biologisch"]),
    ("facilement biodégradable", &["pas", "n'est pas", "non", "jamais"]),
    ("fácilmente biodegradable", &["no", "no es", "nunca", "ni"]),
    ("facilmente biodegradabile", &["non", "non è", "mai", "né"]),
    ("rapidamente biodegradabile", &["non", "non è"]),
    ("gemakkelijk biologisch afbreekbaar", &["niet", "is niet", "nooit", "geen"]),
    ("易分解性", &["非", "不", "難"]),
    ("易生物降解", &["不", "非", "难", "不是", "并非", "未能"]),
    ("良分解性", &["非", "不"]),
];
const DENIED_BEHIND: [(&str, &[&str]); 8] = [
    (
        "readily biodegradable",
        &[": no", " - no", " (no)", ", not", "? No", " not", "/not readily biodegradable"],
    ),
    ("leicht biologisch abbaubar", &[": nein", " (nein)", " nicht", ", nicht erfüllt"]),
    ("facilement biodégradable", &[" : non", " (non)", ", non atteint"]),
    ("fácilmente biodegradable", &[": no", " (no)", ", no cumple"]),
    ("facilmente biodegradabile", &[": no", " (no)", ", non raggiunto"]),
    ("gemakkelijk biologisch afbreekbaar", &[": nee", " (nee)", ", niet gehaald"]),
    ("易分解性", &["ではない", "でない", "なし", "：いいえ", "は認められない", "とはいえない"]),
    ("易生物降解", &["：否", "（否）", "：不是", "，不", "无"]),
];
const AROUND: [&str; 6] = ["", " (82 %, 28 d)", ", OECD 301B", " in 28 days", " 82%", ", 10-day window met"];

fn ready(text: &str) -> Option<DegradationTest> {
    let substance = read_last(&[&["CAS", "Ready biodegradability"], &["50-29-3", text]]).ok()?;
    substance.ready.first().map(|cited| cited.value.result)
}

#[test]
fn a_word_for_ready_that_is_denied_in_any_language_never_reads_as_ready() {
    let mut wrong = Vec::new();
    let before = DENIED.iter().flat_map(|(word, denials)| {
        let spaced = if word.is_ascii() || word.contains(' ') { " " } else { "" };
        denials.iter().map(move |denial| format!("{denial}{spaced}{word}"))
    });
    let behind = DENIED_BEHIND
        .iter()
        .flat_map(|(word, denials)| denials.iter().map(move |denial| format!("{word}{denial}")));
    let mut texts = 0;
    for text in before.chain(behind) {
        for around in AROUND {
            for written in [format!("{text}{around}"), format!("{}{around}", text.to_uppercase())] {
                texts += 1;
                if ready(&written) == Some(DegradationTest::Ready) {
                    wrong.push(written);
                }
            }
        }
    }
    assert!(texts > 800, "{texts}");
    assert!(wrong.is_empty(), "{}", wrong.join("\n"));
}

#[test]
fn a_word_for_ready_that_is_not_denied_reads_as_ready() {
    for (word, _) in DENIED {
        assert_eq!(ready(word), Some(DegradationTest::Ready), "{word}");
    }
}

const FRAGMENTS: [&str; 44] = [
    "50-29-3",
    "789-02-6",
    "200-024-3",
    "601-043-00-3",
    "1918-02-01",
    "-",
    "–",
    ", ",
    "; ",
    "\n",
    "/",
    " ",
    "CAS",
    "EC",
    "H350",
    "H36",
    "EUH",
    "H302/",
    "R45",
    "Carc. ",
    "Cat. 2",
    "1B",
    "none",
    "not ",
    "keine ",
    "pas ",
    "不",
    "ready",
    "readily biodegradable",
    "難分解性",
    "82 %",
    "28 d",
    "10-day window ",
    "bis ",
    "60 à ",
    "< ",
    "OECD 302B",
    "mixture",
    "Total",
    "合計",
    "InChIKey=",
    "YVGGHNCTFXOJCH-UHFFFAOYSA-N",
    "CCO",
    "[Na+",
];
const HEADERS: [&str; 9] = [
    "CAS",
    "EC number",
    "SMILES",
    "InChIKey",
    "Row type",
    "Substance type",
    "Ready biodegradability",
    "Inherent biodegradability",
    "Hazard statements",
];

proptest::proptest! {
    #![proptest_config(crate::sampling())]

    #[test]
    fn a_cas_number_reads_the_same_in_every_spelling(
        (first, second, check) in cas_number(),
        dash in select(&DASHES[..]),
        before in select(&BEFORE[..]),
        after in select(&AFTER[..]),
        zeros in 0usize..=3,
        wide in any::<bool>(),
    ) {
        let digits = format!("{}{first}{dash}{second}{dash}{check}", "0".repeat(zeros));
        let digits = if wide { full_width(&digits) } else { digits };
        let closing = if before == "[" { "]" } else { "" };
        let text = format!("{before}{digits}{closing}{after}");
        let substance = read_last(&[&["Name", "CAS"], &["a name", &text]]).unwrap();
        let read = substance.cas.map(|cas| cas.value.to_string());
        proptest::prop_assert_eq!(read, Some(format!("{first}-{second}-{check}")), "{}", text);
        proptest::prop_assert_eq!(substance.identity, Identity::Identified, "{}", text);
    }

    #[test]
    fn digits_without_hyphens_never_identify_alone(digits in 1u64..=9_999_999_999) {
        let substance = read_last(&[&["Name", "CAS"], &["a name", &digits.to_string()]]).unwrap();
        proptest::prop_assert_ne!(substance.identity, Identity::Identified);
    }

    #[test]
    fn no_text_of_the_trade_panics(parts in proptest::collection::vec(select(&FRAGMENTS[..]), 0..12)) {
        let text = parts.concat();
        let cells = [text.as_str(); 9];
        proptest::prop_assert!(read_last(&[&HEADERS, &cells]).is_ok());
    }
}
