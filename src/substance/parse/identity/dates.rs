//! Dates that a spreadsheet made of CAS numbers, as text or as a cell of a date.
//!
//! 1918-02-1 becomes 1 February 1918 and 75-05-8 becomes 8 May 1975. A date is read back where exactly one CAS number
//! with a right check digit can have been there.

use std::collections::BTreeSet;
use std::sync::LazyLock;

use regex::Regex;

use crate::quantity::plain_words;
use crate::substance::CasNumber;
use crate::substance::parse::pattern::fixed;

static MIDNIGHT: LazyLock<Regex> = LazyLock::new(|| fixed(r"(?:[ T]0?0:00.*|[ ,]+12:00(?::00)? AM)$"));
static YEAR_FIRST: LazyLock<Regex> =
    LazyLock::new(|| fixed(r"^(\d{4})(?:-|/|\.|年)(\d{1,2})(?:-|/|\.|月)(\d{1,2})日?$"));
static YEAR_LAST: LazyLock<Regex> =
    LazyLock::new(|| fixed(r"^(\d{1,2})([-/.]) ?(\d{1,2})[-/.] ?(\d{4}|\d{2})$"));
static WITHOUT_DAY: LazyLock<Regex> = LazyLock::new(|| fixed(r"^(?:\d{1,2}[-/.]\d{4}|\d{4}[-/.]\d{1,2})$"));

/// First letters of the months, folded, in English, German, French, Spanish, Italian and Dutch.
const MONTHS: [&[&str]; 12] = [
    &["jan", "ene", "gen"],
    &["feb", "fev"],
    &["mar", "mrz", "maa", "mrt"],
    &["apr", "avr", "abr"],
    &["may", "mai", "mag", "mei"],
    &["jun", "juin", "giu"],
    &["jul", "juil", "lug"],
    &["aug", "aou", "ago"],
    &["sep", "set"],
    &["oct", "okt", "ott"],
    &["nov"],
    &["dec", "dez", "dic"],
];

/// Year as written, month and day.
type Parts = (String, u32, u32);

/// The dates a text can mean; `None` where it is no date. A month without a day gives none of them.
pub(super) fn dates_in(text: &str) -> Option<Vec<Parts>> {
    let text = MIDNIGHT.replace(text, "");
    let text = text.trim();
    if let Some(found) = YEAR_FIRST.captures(text) {
        let part = |group| found.get(group).map_or("", |part: regex::Match<'_>| part.as_str());
        // Written like this it is a CAS number still.
        let in_full = text.contains('-') && part(2).len() == 2 && part(3).len() == 1;
        return (!in_full).then(|| dated(part(1), part(2), part(3)).into_iter().collect());
    }
    if let Some(found) = YEAR_LAST.captures(text) {
        let part = |group| found.get(group).map_or("", |part: regex::Match<'_>| part.as_str());
        // With hyphens and a short year it is rather a CAS number that was mistyped.
        if part(2) == "-" && part(4).len() < 4 {
            return None;
        }
        let day_first = dated(part(4), part(3), part(1));
        let month_first = dated(part(4), part(1), part(3)).filter(|_| part(2) != ".");
        let dates: Vec<Parts> = [day_first, month_first].into_iter().flatten().collect();
        return (!dates.is_empty()).then_some(dates);
    }
    if WITHOUT_DAY.is_match(text) {
        return Some(Vec::new());
    }
    with_named_month(text)
}

/// `1 Feb 1918`, `February 1, 1918`, `Feb-18`.
fn with_named_month(text: &str) -> Option<Vec<Parts>> {
    if text.len() > 40 {
        return None;
    }
    let plain = plain_words(text);
    let words: Vec<&str> = plain.split(' ').filter(|word| !matches!(*word, "de" | "st" | "of")).collect();
    let month = |word: &str| {
        let named = |starts: &&[&str]| starts.iter().any(|start| word.starts_with(start)) && word.len() < 11;
        MONTHS.iter().zip(1u32..).find(|(starts, _)| named(starts)).map(|(_, number)| number.to_string())
    };
    let number = |word: &str| word.bytes().all(|byte| byte.is_ascii_digit()) && word.len() <= 4;
    match words.as_slice() {
        [day, name, year] if number(day) && number(year) => {
            Some(dated(year, &month(name)?, day).into_iter().collect())
        }
        [name, day, year] if number(day) && number(year) => {
            Some(dated(year, &month(name)?, day).into_iter().collect())
        }
        [name, year] if number(year) => month(name).map(|_| Vec::new()),
        _ => None,
    }
}

fn dated(year: &str, month: &str, day: &str) -> Option<Parts> {
    let (month, day) = (month.parse().ok()?, day.parse().ok()?);
    ((1..=12).contains(&month) && (1..=31).contains(&day)).then(|| (year.to_owned(), month, day))
}

/// The one CAS number of which a spreadsheet can have made one of these dates.
///
/// A year of the last or this century may have been written with two digits, and a year shown with two digits may be of
/// either.
pub(super) fn cas_of_dates(dates: &[Parts]) -> Option<CasNumber> {
    let mut numbers: BTreeSet<CasNumber> = BTreeSet::new();
    for (year, month, day) in dates {
        let mut years = vec![year.clone()];
        match year.parse::<u32>() {
            Ok(short @ 0..100) => years.extend([format!("19{short:02}"), format!("20{short:02}")]),
            Ok(long @ 1930..2030) => years.push(format!("{:02}", long % 100)),
            Ok(_) | Err(_) => {}
        }
        let written = years.iter().map(|year| format!("{year}-{month:02}-{day}"));
        numbers.extend(written.filter_map(|text| CasNumber::parse(&text).ok()));
    }
    let mut numbers = numbers.into_iter();
    numbers.next().filter(|_| numbers.next().is_none())
}
