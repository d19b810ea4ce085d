//! Percentages, days and measures in a text on biodegradation, in the eight languages.
//!
//! A bound in words or the other end of a range beside a percentage must not be lost: `less than 75 %` and `60 à 75 %`
//! reach no level of 70 %.

use std::sync::LazyLock;

use regex::{Captures, Regex};

use super::window::without_window_as_written;
use crate::quantity::{
    DecimalStyle, Dimension, Interval, LetterA, ReadAs, Scale, Unit, parse_quantity, plain_words,
};
use crate::substance::parse::pattern::fixed;

/// Days of a month, to tell a test of some months from one of 28 days.
const DAYS_A_MONTH: f64 = 30.0;
const DAYS_A_YEAR: f64 = 365.0;

static O2_OR_CO2: LazyLock<Regex> = LazyLock::new(|| {
    fixed(concat!(
        r"\b(t?bod\d*|bsb\d*|dbo\d*|bzv\d*|th?co2|co2|thod|dtho|th o2|o2|oxygen|oxygene|oxigeno|ossigeno|zuurstof\w*|",
        r"sauerstoff\w*|carbon dioxide|kohlendioxid|dioxyde de carbone|dioxido de carbono|anidride carbonica|",
        r"koolstofdioxide|oecd 301 ?[bcdf]|301 ?[bcdf]|oecd 310|310)\b|酸素|二酸化炭素|氧|二氧化碳|(?-u:\b)(?:bod|co2|thod)(?-u:\b)"
    ))
});
/// Dissolved organic carbon has the higher pass level, whatever the guideline.
static CARBON: LazyLock<Regex> = LazyLock::new(|| {
    fixed(concat!(
        r"\b(doc|toc|cod|dissolved organic carbon|kohlenstoff\w*|carbone organique|carbono organico|carbonio organico|",
        r"organisch koolstof|opgeloste organische koolstof)\b|有機炭素|有机碳|有機碳|(?-u:\b)(?:doc|toc)(?-u:\b)"
    ))
});
/// A percentage, with the other end of its range before it.
static PERCENTAGE: LazyLock<Regex> = LazyLock::new(|| {
    fixed(concat!(
        r"(?:(\d+(?:[.,]\d+)?)\s*%?\s*(?:-|–|~|〜|/|\.\.\.?|to|bis|à|a|al|tot|et|und|and|y|e|en|or|oder|ou|o|of|至|到|から|",
        r"と|或)\s*)?([<>≤≥~]=?|=[<>]|ca\.?)?\s*(\d+(?:[.,]\d+)?)\s*(?:%|per ?cent(?:o|age)?|prozent|pour ?cent|por ciento|",
        r"procent|パーセント)"
    ))
});
static BEFORE: LazyLock<Regex> = LazyLock::new(|| {
    fixed(concat!(
        r"(?:(?P<most>(?:less|lower|smaller) than|below|under|up to|at most|(?:not?|no) more than|not exceeding|max(?:imum|imal)?|",
        r"(?:weniger|kleiner|niedriger|nicht mehr) als|unter|bis(?: zu)?|hochstens|(?:pas )?moins d[eu]|pas plus de|",
        r"inferieure? a|jusqu a|au (?:plus|maximum)|en dessous de|menos del?|inferior(?:e)? al?|hasta(?: un| el)?|no mas de|",
        r"(?:como )?maximo|por debajo del?|meno d(?:i|el)|fino al?|non piu di|(?:al )?massimo|sotto (?:il|al)|minder dan|",
        r"lager dan|niet meer dan|onder|tot|hoogstens|maximaal|最大で?|最多|至多|低于|小于|少于|不到|不足|不超过|不高于|低於|小於)|",
        r"(?P<least>more than|greater than|higher than|over|above|at least|(?:not?|no) less than|exceed(?:s|ing)|min(?:imum)?|",
        r"(?:mehr|grosser|hoher|nicht weniger) als|uber|mindestens|plus de|pas moins de|superieure? a|au (?:moins|minimum)|",
        r"mas del?|no menos de|superior(?:e)? al?|al menos|por lo menos|como minimo|piu d(?:i|el)|non meno di|oltre(?: il)?|",
        r"almeno|(?:meer|hoger|niet minder) dan|boven|minstens|ten minste|minimaal|大于|高于|超过|超過|多于|至少|不低于|不少于|",
        r"大於|高於|最低)|(?P<about>about|approximately|approx|around|circa|ca|etwa|rund|ungefahr|environ|aproximadamente|unos|",
        r"cerca de|circa il|ongeveer|约|約|大约|およそ))$"
    ))
});
static AFTER: LazyLock<Regex> = LazyLock::new(|| {
    fixed(concat!(
        r"^(?:(?P<most>or (?:less|lower|below)|oder weniger|und weniger|ou moins|o menos|o meno|of minder|max|以下|以内|未満|",
        r"未满|未滿|より低い)|(?P<least>or (?:more|higher|above)|and more|oder mehr|und mehr|ou plus|o mas|o piu|of meer|min|",
        r"以上|超|より高い))"
    ))
});
static TIME: LazyLock<Regex> = LazyLock::new(|| {
    fixed(concat!(
        r"(\d+(?:[.,]\d+)?)\s*-?\s*(?:(?:(?P<day>d|days?|tage?n?|tg|jours?|jrs?|j|d[ií]as?|giorn[oi]|gg|dag(?:en)?)|",
        r"(?P<hour>h|hrs?|hours?|stunden?|std|heures?|horas?|ore|uur|uren)|",
        r"(?P<week>wks?|weeks?|woche?n?|semaines?|semanas?|settiman[ae]|weken|week)|",
        r"(?P<month>months?|monate?n?|mois|mes(?:es|i|e)?|maand(?:en)?)|",
        r"(?P<year>yrs?|years?|jahre?n?|ans?|a[nñ]os?|ann[oi]|jaar|jaren))(?-u:\b)|",
        r"(?P<cjk_day>日|天)|(?P<cjk_hour>時間|小时|小時)|(?P<cjk_week>週|周)|(?P<cjk_month>か月|ヶ月|カ月|个月|個月)|(?P<cjk_year>年))"
    ))
});

/// Whether oxygen or carbon dioxide was measured.
#[derive(Debug, Clone, Copy, PartialEq, Eq)]
pub(super) enum Measure {
    O2OrCo2,
    Unnamed,
}

/// The measure a text names.
pub(super) fn measure_in(text: &str) -> Measure {
    let plain = plain_words(text);
    if O2_OR_CO2.is_match(&plain) && !CARBON.is_match(&plain) { Measure::O2OrCo2 } else { Measure::Unnamed }
}

const fn percent(decimal: DecimalStyle) -> ReadAs {
    ReadAs {
        dimension: Dimension::Percent,
        default_unit: Unit::Percent,
        decimal,
        scale: Scale::Linear,
        molar_mass: None,
        letter_a: LetterA::Year,
    }
}

/// The number of a text that holds nothing else.
pub(in crate::substance::parse) fn bare_number(text: &str, decimal: DecimalStyle) -> Option<f64> {
    let only_digits =
        text.chars().all(|character| character.is_ascii_digit() || matches!(character, '.' | ','));
    if !only_digits {
        return None;
    }
    parse_quantity(text, percent(decimal)).ok()?.quantity.single()
}

/// Every percentage of a text, as far as its words bound it.
pub(in crate::substance::parse) fn percentages(text: &str, decimal: DecimalStyle) -> Vec<Interval> {
    let found = PERCENTAGE.captures_iter(text);
    found.filter_map(|found| percentage(text, &found, decimal)).collect()
}

fn percentage(text: &str, found: &Captures<'_>, decimal: DecimalStyle) -> Option<Interval> {
    let part = |group| found.get(group).map(|part: regex::Match<'_>| part.as_str());
    let whole = found.get(0)?;
    let number = part(3)?;
    let read =
        |text: &str| parse_quantity(text, percent(decimal)).ok().map(|parsed| parsed.quantity.interval);
    if let Some(other) = part(1) {
        let ends = [read(&format!("{other} %"))?, read(&format!("{number} %"))?];
        let [one, two] = ends.map(|end| end.low().number());
        let (low, high) = (one?.min(two?), one?.max(two?));
        return read(&format!("{low} - {high} %"));
    }
    let sign = match part(2).map(str::to_lowercase).as_deref() {
        Some("~" | "~=" | "ca" | "ca.") => Some(Bounded::About),
        Some(sign) => return read(&format!("{sign} {number} %")),
        None => bounded_by_words(text.get(..whole.start())?, text.get(whole.end()..)?),
    };
    match sign {
        Some(Bounded::AtMost) => read(&format!("<= {number} %")),
        Some(Bounded::AtLeast) => read(&format!(">= {number} %")),
        // About 70 % may be less.
        Some(Bounded::About) => {
            let value = read(&format!("{number} %"))?.low().number()?;
            read(&format!("{} - {} %", value * 0.95, value * 1.05))
        }
        None => read(&format!("{number} %")),
    }
}

/// How words bound a number.
enum Bounded {
    AtMost,
    AtLeast,
    About,
}

/// Only the words next to the number are looked at.
fn bounded_by_words(before: &str, after: &str) -> Option<Bounded> {
    const NEAR: usize = 24;
    let start = before.char_indices().rev().take(NEAR).last().map_or(0, |(place, _)| place);
    let before = plain_words(before.get(start..).unwrap_or_default());
    let after = plain_words(&after.chars().take(NEAR).collect::<String>());
    for found in [BEFORE.captures(&before), AFTER.captures(&after)].into_iter().flatten() {
        if found.name("most").is_some() {
            return Some(Bounded::AtMost);
        }
        if found.name("least").is_some() {
            return Some(Bounded::AtLeast);
        }
        if found.name("about").is_some() {
            return Some(Bounded::About);
        }
    }
    None
}

/// The longest time a text names, in days, the 10-day window left out.
pub(in crate::substance::parse) fn days_in(text: &str) -> Option<f64> {
    let text = without_window_as_written(text);
    TIME.captures_iter(&text)
        .filter_map(|found| {
            let number: f64 = found.get(1)?.as_str().replace(',', ".").parse().ok()?;
            let is_in = |names: [&str; 2]| names.iter().any(|name| found.name(name).is_some());
            let days = match () {
                () if is_in(["day", "cjk_day"]) => number,
                () if is_in(["hour", "cjk_hour"]) => number / 24.0,
                () if is_in(["week", "cjk_week"]) => number * 7.0,
                () if is_in(["month", "cjk_month"]) => number * DAYS_A_MONTH,
                // The year of a study is no time.
                () if number >= 100.0 => return None,
                () => number * DAYS_A_YEAR,
            };
            Some(days)
        })
        .reduce(f64::max)
}
