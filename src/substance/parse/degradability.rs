//! Cells on ready biodegradability, and what they share with those on inherent biodegradability.
//!
//! At least 70 % is ready; 60 to 70 % only with a named O2 or CO2 measure; below 60 % is not (OECD 301, pass levels).
//! A pass reached after more than 28 days is open, and so is a level missed before 28 days are over.

use std::sync::LazyLock;

use regex::Regex;

use super::cell::value_text;
use super::pattern::fixed;
use super::remark::Said;
use crate::fault::CellFaultKind;
use crate::quantity::{
    Comparison, DecimalStyle, Dimension, Interval, Outcome, ReadAs, Scale, Unit, parse_quantity, plain_words,
};
use crate::substance::{Basis, DegradationTest, ReadyBiodegradability};
use crate::workbook::CellContent;

/// Pass level for dissolved organic carbon and for an unnamed measure, %.
const PASS_ANY_MEASURE: f64 = 70.0;
/// Pass level for oxygen uptake and carbon dioxide, %.
const PASS_O2_OR_CO2: f64 = 60.0;
/// Length of the test, days.
const TEST_DAYS: f64 = 28.0;

/// A phrase on the 10-day window neither passes nor fails the test.
static WINDOW: LazyLock<Regex> = LazyLock::new(|| {
    fixed(concat!(
        r"(but |aber )?(fail\w*|not meet\w*|not fulfill\w*|meet\w*|fulfill\w*|pass\w*|without|with|ohne|mit|within|in) ",
        r"?(the |das |dem )?10 ?(d|day|days|tage?|tages?) ?(window|zeitfenster|fenster)( (failed|passed|met|not met|",
        r"nicht erfullt|erfullt|nicht eingehalten|eingehalten))?|10 ?(d|day|days|tages?) ?(window|zeitfenster|fenster)",
        r"( (failed|passed|met|not met|nicht erfullt|erfullt|nicht eingehalten|eingehalten|criterion))*"
    ))
});
/// Nothing was found out, or not for good.
static NO_RESULT: LazyLock<Regex> = LazyLock::new(|| {
    fixed(concat!(
        r"\b(no|not|keine?|nicht|ohne) (\w+ )?(data|information|results?|stud(y|ies)|tests?|tested|determined|conducted|performed|",
        r"available|assessed|investigated|known|daten|angaben?|informationen|ergebnis\w*|pruf\w*|gepruft|getestet|bestimmt|",
        r"untersucht|verfugbar|bekannt|bewertet)\b|",
        r"\b(unknown|unbekannt|untested|ungepruft|inconclusive|planned|geplant|pending|unclear|unklar|to be \w+)\b"
    ))
});
/// A result with a changed inoculum is none on ready biodegradability (OECD 301, inoculum).
static ADAPTED: LazyLock<Regex> = LazyLock::new(|| {
    fixed(
        r"\b(after|with|nach|mit) (\w+ )?(adapt\w*|acclimat\w*|preadapt\w*|akklimat\w*|pre exposed)\b|\badapted\b|\badaptiert\w*",
    )
});
/// Any word of denial: beside it a word for ready is not believed.
static DENIAL: LazyLock<Regex> = LazyLock::new(|| {
    fixed(
        r"\b(no|not|non|never|neither|nor|cannot|without|unlikely|negative?|false|isn|doesn|nicht|kein\w*|nein|weder|ohne|negativ|falsch|kaum)\b",
    )
});
pub(super) static NEGATIVE: LazyLock<Regex> = LazyLock::new(|| {
    fixed(concat!(
        r"\b(not|non|no|cannot|isn t|unlikely|neither|nicht|keine?|weder) ((?:\w+ ){0,5}(?:readily|ready|easily|leicht\w*)\b|(?:\w+ )?(?:readily|ready|easily|leicht\w*|bio|biologisch\w*|biodegrad\w*|degrad\w*|",
        r"abbaubar\w*|bestanden|passed|met|erfullt)\b)|\bnonbiodegrad\w*\b|\bnot (bio)?degrad\w*|\bfail\w*|\bschwer abbaubar|",
        r"\bschwer biologisch|\bpoorly|\bpersistent|\b(bio)?degradation fails|^(no|nein|n|false|falsch|negative?|negativ|not|",
        r"nicht)\b"
    ))
});
pub(super) static POSITIVE: LazyLock<Regex> = LazyLock::new(|| {
    fixed(concat!(
        r"\breadily\b|\bready (bio)?degradable\b|\bleicht\w* (biologisch\w* )?abbau\w*|\b(passed|bestanden)\b|",
        r"^(ready|pass|yes|ja|y|j|true|wahr|positive?|positiv|leicht|easily|easily biodegradable)( \d.*| oecd.*)?$"
    ))
});
/// With one of these left over, a word for ready is no result: `not tested for ready biodegradability`.
static UNCERTAIN: LazyLock<Regex> = LazyLock::new(|| {
    fixed(concat!(
        r"\b(not|no|non|nicht|kein\w*|unknown|unbekannt|unclear|unklar|untested|pending|planned|geplant|ongoing|laufend|",
        r"expected|erwartet|likely|wahrscheinlich|probably|vermutlich|possibly|moglicherweise|may|might|could|",
        r"partially|partly|teilweise|if|unless|without|ohne|doubtful|fraglich|inconclusive)\b"
    ))
});
pub(super) static INHERENT: LazyLock<Regex> =
    LazyLock::new(|| fixed(r"\b(inherent\w*|inharent\w*|inhaerent\w*|potenziell abbaubar)\b"));
static O2_OR_CO2: LazyLock<Regex> = LazyLock::new(|| {
    fixed(
        r"\b(t?bod\d*|bsb\d*|th?co2|co2|thod|th o2|o2|oxygen|sauerstoff\w*|carbon dioxide|kohlendioxid|oecd 301 ?[bcdf]|301 ?[bcdf]|oecd 310|310)\b",
    )
});
/// Dissolved organic carbon has the higher pass level, whatever the guideline.
static CARBON: LazyLock<Regex> =
    LazyLock::new(|| fixed(r"\b(doc|toc|dissolved organic carbon|kohlenstoff\w*)\b"));
static PERCENTAGE: LazyLock<Regex> = LazyLock::new(|| {
    fixed(
        r"(?:[<>≤≥~]=?\s*|ca\.?\s*)?\d+(?:[.,]\d+)?\s*(?:%?\s*(?:-|to|bis)\s*(?:[<>≤≥]=?\s*)?\d+(?:[.,]\d+)?\s*)?(?:%|percent|prozent)",
    )
});
static DAYS: LazyLock<Regex> = LazyLock::new(|| fixed(r"(\d+(?:[.,]\d+)?)\s*-?\s*(?:d|days?|tage?n?)\b"));

/// A cell on ready biodegradability whose basis is still open.
#[derive(Debug, Clone, PartialEq, Eq)]
pub(super) struct ReadyCell {
    result: DegradationTest,
    reported: String,
}

impl ReadyCell {
    pub(super) fn known_by(self, basis: Basis, reliability: Option<u8>) -> ReadyBiodegradability {
        ReadyBiodegradability { result: self.result, basis, reliability, reported: self.reported }
    }
}

pub(super) type Read<T> = Result<Option<T>, CellFaultKind>;

const NOT_READY_CELL: CellFaultKind =
    CellFaultKind::NotA { what: "result of a ready biodegradability test", example: "82 %, 28 d, OECD 301B" };

/// What a cell says of ready biodegradability, with a fault where its words and numbers disagree.
pub(super) fn read_ready(
    content: &CellContent,
    decimal: DecimalStyle,
) -> Read<(ReadyCell, Said, Option<CellFaultKind>)> {
    let plain_cell =
        |result, reported: String| Ok(Some((ReadyCell { result, reported }, Said::default(), None)));
    match content {
        CellContent::Boolean(true) => return plain_cell(DegradationTest::Ready, "TRUE".to_owned()),
        CellContent::Boolean(false) => return plain_cell(DegradationTest::NotReady, "FALSE".to_owned()),
        CellContent::Number(number) => {
            let degraded = percentage_of_number(*number)?;
            return plain_cell(result_of(degraded, None, Measure::Unnamed), number.to_string());
        }
        CellContent::DateTime(_) => return Err(NOT_READY_CELL),
        CellContent::Empty | CellContent::Text(_) | CellContent::Error(_) => {}
    }
    let Some(text) = value_text(content) else {
        return Ok(None);
    };
    if let Some(number) = bare_number(&text, decimal) {
        let degraded = percentage_of_number(number)?;
        return plain_cell(result_of(degraded, None, Measure::Unnamed), text);
    }
    let words = result_in_words(&text)?;
    let numbers = result_in_numbers(&text, decimal);
    let speaks_of_inherent = INHERENT.is_match(&plain_words(&text));
    if speaks_of_inherent && words != Some(DegradationTest::NotReady) {
        return Err(CellFaultKind::InherentlySettlesNothing);
    }
    let (result, fault) = combined(words, numbers, days_in(&text))?;
    let said = Said::in_remarks(std::slice::from_ref(&text));
    Ok(Some((ReadyCell { result, reported: text }, said, fault)))
}

/// Words that say it and numbers that say otherwise leave it open.
fn combined(
    words: Option<DegradationTest>,
    numbers: Option<DegradationTest>,
    days: Option<f64>,
) -> Result<(DegradationTest, Option<CellFaultKind>), CellFaultKind> {
    let late = days.is_some_and(|days| days > TEST_DAYS);
    match (words, numbers) {
        (None, None) => Err(NOT_READY_CELL),
        (Some(DegradationTest::Ready), None | Some(DegradationTest::Open)) if late => {
            Ok((DegradationTest::Open, None))
        }
        (Some(words), None | Some(DegradationTest::Open)) => Ok((words, None)),
        (None | Some(DegradationTest::Open), Some(numbers)) => Ok((numbers, None)),
        (Some(words), Some(numbers)) if words == numbers => Ok((words, None)),
        (Some(_), Some(_)) => Ok((DegradationTest::Open, Some(CellFaultKind::WordsAgainstNumber))),
    }
}

fn result_in_words(text: &str) -> Read<DegradationTest> {
    let plain = plain_words(text);
    let without_window = WINDOW.replace_all(&plain, " ");
    let plain = without_window.trim();
    let says_ready = POSITIVE.is_match(plain);
    if NO_RESULT.is_match(plain) && !text.contains('%') {
        return Err(NOT_READY_CELL);
    }
    Ok(if NEGATIVE.is_match(plain) {
        Some(DegradationTest::NotReady)
    } else if says_ready && (DENIAL.is_match(plain) || ADAPTED.is_match(plain) || text.contains('?')) {
        // `readily biodegradable: no` denies it; what else is denied, nobody knows.
        Some(if DENIED_AT_THE_END.iter().any(|denial| plain.ends_with(denial)) {
            DegradationTest::NotReady
        } else {
            DegradationTest::Open
        })
    } else {
        (says_ready && !UNCERTAIN.is_match(plain)).then_some(DegradationTest::Ready)
    })
}

const DENIED_AT_THE_END: [&str; 6] = [" no", " nein", " negative", " negativ", " false", " falsch"];

/// Whether oxygen or carbon dioxide was measured.
#[derive(Debug, Clone, Copy, PartialEq, Eq)]
enum Measure {
    O2OrCo2,
    Unnamed,
}

fn result_in_numbers(text: &str, decimal: DecimalStyle) -> Option<DegradationTest> {
    let plain = plain_words(text);
    let measure = if O2_OR_CO2.is_match(&plain) && !CARBON.is_match(&plain) {
        Measure::O2OrCo2
    } else {
        Measure::Unnamed
    };
    let days = days_in(text);
    let mut results =
        percentages(text, decimal).into_iter().map(|degraded| result_of(degraded, days, measure));
    let first = results.next()?;
    Some(if results.all(|result| result == first) { first } else { DegradationTest::Open })
}

fn result_of(degraded: Interval, days: Option<f64>, measure: Measure) -> DegradationTest {
    let reaches = |level| degraded.compare(Comparison::AtLeast, level) == Outcome::Fired;
    let passes = reaches(PASS_ANY_MEASURE) || (measure == Measure::O2OrCo2 && reaches(PASS_O2_OR_CO2));
    let misses = degraded.compare(Comparison::Below, PASS_O2_OR_CO2) == Outcome::Fired;
    let (late, early) = days.map_or((false, false), |days| (days > TEST_DAYS, days < TEST_DAYS));
    match (passes, misses) {
        (true, _) if !late => DegradationTest::Ready,
        (_, true) if !early => DegradationTest::NotReady,
        (_, _) => DegradationTest::Open,
    }
}

/// Numbers from 0 to 1 may be fractions; zero is no degradation either way.
pub(super) fn percentage_of_number(number: f64) -> Result<Interval, CellFaultKind> {
    if !(0.0..=150.0).contains(&number) {
        return Err(NOT_READY_CELL);
    }
    if number > 0.0 && number <= 1.0 {
        return Err(CellFaultKind::FractionOrPercent);
    }
    Interval::point(number).map_err(|_| NOT_READY_CELL)
}

const fn percent(decimal: DecimalStyle) -> ReadAs {
    ReadAs {
        dimension: Dimension::Percent,
        default_unit: Unit::Percent,
        decimal,
        scale: Scale::Linear,
        molar_mass: None,
    }
}

pub(super) fn bare_number(text: &str, decimal: DecimalStyle) -> Option<f64> {
    let only_digits =
        text.chars().all(|character| character.is_ascii_digit() || matches!(character, '.' | ','));
    if !only_digits {
        return None;
    }
    parse_quantity(text, percent(decimal)).ok()?.quantity.single()
}

pub(super) fn percentages(text: &str, decimal: DecimalStyle) -> Vec<Interval> {
    PERCENTAGE
        .find_iter(text)
        .filter_map(|found| parse_quantity(found.as_str(), percent(decimal)).ok())
        .map(|parsed| parsed.quantity.interval)
        .collect()
}

/// The longest time a text names, the 10-day window left out.
pub(super) fn days_in(text: &str) -> Option<f64> {
    static WINDOW_AS_WRITTEN: LazyLock<Regex> =
        LazyLock::new(|| fixed(r"10\s*-?\s*(?:d|days?|tages?)\s*-?\s*(?:window|zeitfenster|fenster)"));
    let text = WINDOW_AS_WRITTEN.replace_all(text, " ");
    DAYS.captures_iter(&text)
        .filter_map(|found| found.get(1)?.as_str().replace(',', ".").parse().ok())
        .reduce(f64::max)
}
