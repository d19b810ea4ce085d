//! CAS and EC numbers in a text, whatever stands around them.
//!
//! Numbers with hyphens are told by the lengths of their groups; whether a check digit is right is for the caller.
//! Digits without hyphens are given apart, because a check digit alone lets one number in ten pass.

use std::sync::LazyLock;

use regex::Regex;

use crate::quantity::plain_words;
use crate::substance::parse::pattern::fixed;

/// Groups of letters and digits with hyphens between them.
static CHAIN: LazyLock<Regex> = LazyLock::new(|| fixed(r"[0-9A-Z]+(?: ?- ?[0-9A-Z]+)+"));
/// A number of digits and zeros behind its separator, as a table of numbers exports it.
static WHOLE_NUMBER: LazyLock<Regex> = LazyLock::new(|| fixed(r"^(\d+)[.,]0+$"));
static SCIENTIFIC: LazyLock<Regex> = LazyLock::new(|| fixed(r"^(\d)[.,](\d+)E\+?(\d{1,2})$"));

/// Letters that stand before a number without a space, as in `CAS50-29-3`.
const LABELS: [&str; 12] =
    ["CAS", "CASRN", "CASNR", "CASNO", "RN", "NR", "NO", "EC", "EG", "CE", "EINECS", "ELINCS"];
/// Words before digits that leave them the only number of the cell, folded.
const LABEL_WORDS: &str = concat!(
    "cas casrn casnr casno rn r nr no n num number nummer numero numer registry ec eg ce einecs elincs nlp list ",
    "liste listennummer listennr cas番号 cas号 cas號 ec番号 ec号"
);

/// What of registry numbers a text holds.
#[derive(Debug, Default)]
pub(super) struct Numbers {
    /// Each group of digits that has the form of a CAS number, once, without leading zeros.
    pub(super) cas: Vec<String>,
    /// Each one that has the form of an EC number, once.
    pub(super) ec: Vec<String>,
    /// Whether it holds an index number, as 601-043-00-3.
    pub(super) index_number: bool,
    /// Numbers without hyphens beside them.
    pub(super) bare: Vec<String>,
}

/// The numbers of a tidied text.
pub(super) fn numbers_in(text: &str) -> Numbers {
    // A long vowel mark is typed for a hyphen.
    let text = text.replace('ー', "-");
    let mut numbers = Numbers::default();
    for chain in CHAIN.find_iter(&text) {
        let groups: Vec<&str> = chain.as_str().split('-').map(str::trim).collect();
        numbers.take_chain(&groups);
    }
    let rest = CHAIN.replace_all(&text, " ");
    let beside = rest.split(|character: char| !character.is_ascii_alphanumeric());
    numbers.bare =
        beside.filter(|word| is_digits(word, 5..=usize::MAX)).map(|word| unpadded(word).to_owned()).collect();
    numbers
}

impl Numbers {
    fn take_chain(&mut self, groups: &[&str]) {
        if groups.windows(4).any(is_index_number) {
            self.index_number = true;
            return;
        }
        let has_digit = |group: &&str| group.contains(|character: char| character.is_ascii_digit());
        for run in groups.split(|group| !has_digit(group)) {
            let mut run = run.to_vec();
            if let Some(first) = run.first_mut() {
                *first = without_label(first);
            }
            let forms: Vec<Option<Form>> = run.chunks(3).map(form_of).collect();
            if forms.iter().all(Option::is_some) {
                for form in forms.into_iter().flatten() {
                    self.add(form);
                }
            }
        }
    }

    fn add(&mut self, form: Form) {
        let (known, number) = match form {
            Form::Cas(number) => (&mut self.cas, number),
            Form::Ec(number) => (&mut self.ec, number),
        };
        // Two are as many as it takes to be several.
        if known.len() < 2 && !known.contains(&number) {
            known.push(number);
        }
    }
}

/// Which kind of number three groups can be.
enum Form {
    Cas(String),
    Ec(String),
}

fn form_of(groups: &[&str]) -> Option<Form> {
    let [first, second, check] = groups else {
        return None;
    };
    if !is_digits(check, 1..=1) {
        return None;
    }
    let unpadded = unpadded(first);
    if is_digits(first, 2..=10) && is_digits(second, 2..=2) && unpadded.len() <= 7 {
        return Some(Form::Cas(format!("{unpadded:0>2}-{second}-{check}")));
    }
    let is_ec = is_digits(second, 3..=3) && starts_ec_number(first);
    is_ec.then(|| Form::Ec(format!("{}-{second}-{check}", first.to_uppercase())))
}

/// Three digits, or a letter and two.
fn starts_ec_number(group: &str) -> bool {
    let digits = group.strip_prefix(|first: char| first.is_ascii_alphabetic()).unwrap_or(group);
    group.len() == 3 && is_digits(digits, 2..=3)
}

fn is_index_number(groups: &[&str]) -> bool {
    let [first, second, third, check] = groups else {
        return false;
    };
    is_digits(first, 3..=3)
        && is_digits(second, 3..=3)
        && is_digits(third, 2..=2)
        && (is_digits(check, 1..=1) || check.eq_ignore_ascii_case("X"))
}

fn is_digits(text: &str, lengths: std::ops::RangeInclusive<usize>) -> bool {
    lengths.contains(&text.len()) && text.bytes().all(|byte| byte.is_ascii_digit())
}

fn unpadded(digits: &str) -> &str {
    digits.trim_start_matches('0')
}

fn without_label(group: &str) -> &str {
    let digits = group.trim_start_matches(|character: char| character.is_ascii_alphabetic());
    let label = group.strip_suffix(digits).unwrap_or_default();
    if LABELS.iter().any(|known| known.eq_ignore_ascii_case(label)) { digits } else { group }
}

/// The digits of a text that holds one number and its label only: whole, in groups without hyphens, with zeros behind
/// a separator, or with an exponent that hides none of them.
pub(super) fn bare_digits(text: &str, groups: [std::ops::RangeInclusive<usize>; 3]) -> Option<String> {
    if text.starts_with('-') {
        return None;
    }
    if let Some(found) = SCIENTIFIC.captures(text) {
        let part = |group| found.get(group).map_or("", |part: regex::Match<'_>| part.as_str());
        let complete = part(3).parse() == Ok(part(2).len());
        return complete.then(|| format!("{}{}", part(1), part(2)));
    }
    let whole = WHOLE_NUMBER.captures(text).and_then(|found| found.get(1));
    let plain = plain_words(whole.map_or(text, |whole| whole.as_str()));
    let words: Vec<&str> =
        plain.split(' ').filter(|word| !LABEL_WORDS.split(' ').any(|label| label == *word)).collect();
    match words.as_slice() {
        [digits] if is_digits(digits, 1..=20) => Some(unpadded(digits).to_owned()),
        [first, second, check] => {
            let fits =
                [first, second, check].iter().zip(groups).all(|(group, length)| is_digits(group, length));
            fits.then(|| format!("{}{second}{check}", unpadded(first)))
        }
        _ => None,
    }
}
