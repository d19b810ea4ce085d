//! What remarks beside a value say: how it was obtained and under which conditions.
//!
//! A text that says nothing known is kept as the method. Calculated beats measured, because an estimate is never shown
//! as measured.

mod reliability;
mod words;

use std::sync::LazyLock;

use regex::Regex;

use super::pattern::fixed;
use crate::quantity::{Unit, part_scripts, plain_words, tidy};
pub(super) use reliability::in_words as reliability_in_words;

use crate::substance::{Basis, Conditions, DegradationKind, Property};
use words::{
    CALCULATED, DISSIPATION, DOUBT, GUIDELINE, HYDROLYSIS, MEASURED, MEASURED_OR_CALCULATED, NO_DEGRADATION,
    NOT_MEASURED, NOT_OF_DEGRADATION, NOT_ULTIMATE, ORGANISM, PHOTOLYSIS, PLANNED, PRIMARY, ULTIMATE,
    VALUE_NAME,
};

/// Basis and conditions as far as a text names them.
#[derive(Debug, Clone, PartialEq, Default)]
pub(crate) struct Said {
    /// How the value was obtained.
    pub(crate) basis: Option<Basis>,
    /// Under which conditions.
    pub(crate) conditions: Conditions,
    /// The half-life meant, where the words name another than that of degradation.
    pub(crate) other_half_life: Option<Property>,
    /// Whether a remark says that nothing was degraded, or how much.
    pub(crate) degraded: Degraded,
}

/// What remarks say of how much was degraded.
#[derive(Debug, Clone, Copy, PartialEq, Eq, Default)]
pub(crate) enum Degraded {
    /// Nothing.
    #[default]
    NotSaid,
    /// That there was no degradation, or its percentage: a number of days beside it is the length of the test.
    Said,
}

// These look at the text as written.
static TEMPERATURE: LazyLock<Regex> = LazyLock::new(|| {
    fixed(concat!(
        r"(?:^|[^\d.,\-])(-?\d{1,4}(?:[.,]\d+)?)\s*(?:(°\s*C|deg\.?\s*C|(?:Grad|degr[ée]s?|degrees?|grados?|gradi|graden)\s*C|C|",
        r"°\s*F|K)(?:\W|$)|((?:摄氏|攝氏)?度))"
    ))
});
static PH: LazyLock<Regex> = LazyLock::new(|| {
    fixed(
        r"\bpH[\s=:]*(?:(?:value|of|von|de|di|van|値|值)\s*)?(\d{1,2}(?:[.,]\d+)?)(\s*(?:-|to|bis|à|a|tot|~)\s*\d)?",
    )
});
static LIPID: LazyLock<Regex> = LazyLock::new(|| {
    fixed(concat!(
        r"(\d{1,2}(?:[.,]\d+)?)\s*%\s*(?:(?:de|di|en|of)\s+)?(?:l[ií]pid|fett|vet\b|graisse|gras|脂)|",
        r"(?:l[ií]pid|fett|vetgehalte|脂[質质肪])\w*(?:\s+(?:content|gehalt|含量))?[\s=:]*(\d{1,2}(?:[.,]\d+)?)\s*%"
    ))
});
static YEAR: LazyLock<Regex> =
    LazyLock::new(|| fixed(r"(?:^|[\s,(])((?:19[3-9]|20[0-4])\d)(?:\s*年)?[.):]?$"));
/// Standards have numbers that look like years.
static NUMBER_OF_A_STANDARD: LazyLock<Regex> =
    LazyLock::new(|| fixed(r"\b(?:iso|din|en|astm|jis|no|nr|report|page|p)\.?\s*[a-z]?\s*\d{4}\)?$"));

impl Said {
    /// What the remarks of a cell say.
    pub(crate) fn in_remarks(remarks: &[String]) -> Self {
        let mut said = Self::default();
        for part in remarks.iter().flat_map(|remark| parts(remark)) {
            said.read_part(part);
        }
        said
    }

    /// What a header says beside the name of its field: words that are no guideline are no method.
    pub(crate) fn in_header(header: &str) -> Self {
        let mut said = Self::default();
        let plain = folded(header);
        said.read_part(header);
        if !GUIDELINE.is_match(&plain) {
            said.conditions.method = None;
        }
        // A year in a header is that of a tonnage or a revision.
        said.conditions.year = None;
        said.conditions.organism = ORGANISM.find(&plain).map(|found| found.as_str().to_owned());
        said
    }

    fn read_part(&mut self, part: &str) {
        let part = self.without_year(part);
        let plain = folded(part);
        if plain.is_empty() || VALUE_NAME.is_match(&plain) {
            return;
        }
        let against = NOT_OF_DEGRADATION.replace_all(&plain, " ");
        if NO_DEGRADATION.is_match(&against) || says_percentage(part, &plain) {
            self.degraded = Degraded::Said;
        }
        let is_guideline = GUIDELINE.is_match(&plain);
        self.other_half_life = self.other_half_life.or_else(|| other_half_life(&against));
        let basis = basis_said(part, &plain);
        self.basis = weaker(self.basis, basis);
        // `measured?` is kept as written.
        let is_certain = matches!(basis, Some(Basis::Measured | Basis::Calculated));
        let understood = self.read_conditions(part, &plain) || (is_certain && plain.split(' ').count() == 1);
        if is_guideline || !understood {
            let method = self.conditions.method.get_or_insert_default();
            if !method.is_empty() {
                method.push_str("; ");
            }
            method.push_str(part);
        }
    }

    /// Takes the year at the end of a part: `Smith et al. 1998`, `1998`.
    fn without_year<'part>(&mut self, part: &'part str) -> &'part str {
        let Some(found) = YEAR.captures(part).and_then(|found| found.get(1)) else {
            return part;
        };
        if NUMBER_OF_A_STANDARD.is_match(part) {
            return part;
        }
        self.conditions.year = self.conditions.year.or(found.as_str().parse().ok());
        part.get(..found.start()).unwrap_or_default().trim_end_matches([' ', ',', '(', ':'])
    }

    /// Whether the part speaks of a condition.
    fn read_conditions(&mut self, part: &str, plain: &str) -> bool {
        let conditions = &mut self.conditions;
        let temperature = temperature_in(part);
        let ph = PH
            .captures(part)
            .filter(|found| found.get(2).is_none())
            .and_then(|found| decimal(found.get(1)?.as_str()));
        let lipid =
            LIPID.captures(part).and_then(|found| decimal(found.get(1).or_else(|| found.get(2))?.as_str()));
        let reliability = reliability::reliability_in(part, plain);
        // `mineralisation 12 %` is how far it went, not what the half-life is of.
        let ultimate = ULTIMATE.is_match(plain) && !NOT_ULTIMATE.is_match(plain) && !part.contains('%');
        let degradation = match (ultimate, PRIMARY.is_match(plain)) {
            (true, false) => DegradationKind::Ultimate,
            (false, true) => DegradationKind::Primary,
            (false, false) | (true, true) => DegradationKind::NotStated,
        };
        let organism = ORGANISM.is_match(plain);
        conditions.temperature = conditions.temperature.or(temperature);
        conditions.ph = conditions.ph.or(ph);
        conditions.lipid = conditions.lipid.or(lipid);
        conditions.reliability = conditions.reliability.or(reliability);
        if conditions.degradation == DegradationKind::NotStated {
            conditions.degradation = degradation;
        }
        if organism && conditions.organism.is_none() {
            conditions.organism = Some(part.to_owned());
        }
        temperature.is_some()
            || ph.is_some()
            || lipid.is_some()
            || reliability.is_some()
            || degradation != DegradationKind::NotStated
            || organism
    }
}

/// A text folded as the patterns of [`words`] need it.
pub(super) fn folded(text: &str) -> String {
    plain_words(&part_scripts(tidy(text)))
}

/// `5 %`, `5 % degradation`: how much was degraded in the time beside it. With a time of its own, or of another measure
/// such as carbon dioxide, it says nothing of that time.
fn says_percentage(part: &str, plain: &str) -> bool {
    static BARE: LazyLock<Regex> = LazyLock::new(|| fixed(r"^[<>≤≥~=]*\s*(?:ca\.?\s*)?\d+(?:[.,]\d+)?\s*%$"));
    static AMOUNT: LazyLock<Regex> = LazyLock::new(|| {
        fixed(r"degrad|abbau|abgebaut|afbraak|afgebroken|elimin|removal|remaining|分解|降解")
    });
    static OWN_TIME: LazyLock<Regex> = LazyLock::new(|| {
        fixed(
            r"\d ?(?:(?:d|h|days?|tage?n?|jours?|dias?|giorni|dagen|hours?|weeks?|wk|wochen?)\b|日|天|週|周)",
        )
    });
    part.contains('%')
        && (BARE.is_match(part.trim()) || (AMOUNT.is_match(plain) && !OWN_TIME.is_match(plain)))
}

fn other_half_life(plain: &str) -> Option<Property> {
    if HYDROLYSIS.is_match(plain) {
        Some(Property::HydrolysisHalfLife)
    } else if PHOTOLYSIS.is_match(plain) {
        Some(Property::PhotolysisHalfLife)
    } else {
        DISSIPATION.is_match(plain).then_some(Property::DissipationHalfLife)
    }
}

/// The basis that claims less: of a doubt and a word for measuring in the same remark, the doubt counts.
pub(super) fn weaker(one: Option<Basis>, other: Option<Basis>) -> Option<Basis> {
    let claims = |basis: Basis| match basis {
        Basis::Calculated | Basis::Estimated => 0,
        Basis::Unstated => 1,
        Basis::Measured => 2,
    };
    one.into_iter().chain(other).min_by_key(|basis| claims(*basis))
}

/// How a text says that a value was obtained: `measured?` and `measured or calculated` leave that open, whatever values
/// without a word count as.
pub(super) fn basis_said(written: &str, plain: &str) -> Option<Basis> {
    static STROKES: LazyLock<Regex> = LazyLock::new(|| fixed(r"[/|&+,;、・／]"));
    let basis = basis_in(plain)?;
    let is_asked = written.contains(['?', '？']) || DOUBT.is_match(plain);
    let names_both = || {
        let with_words = STROKES.replace_all(written, " or ");
        MEASURED.is_match(plain)
            && CALCULATED.is_match(plain)
            && MEASURED_OR_CALCULATED.is_match(&folded(&with_words))
    };
    match basis {
        Basis::Measured if is_asked || PLANNED.is_match(plain) => Some(Basis::Unstated),
        Basis::Calculated if names_both() => Some(Basis::Unstated),
        Basis::Measured | Basis::Unstated | Basis::Calculated | Basis::Estimated => Some(basis),
    }
}

/// How a text folded by [`folded`] says that a value was obtained.
pub(super) fn basis_in(plain: &str) -> Option<Basis> {
    if CALCULATED.is_match(plain) {
        return Some(Basis::Calculated);
    }
    let named = GUIDELINE.is_match(plain) || MEASURED.is_match(plain);
    let measured = named && !NOT_MEASURED.is_match(plain);
    measured.then_some(Basis::Measured)
}

/// Fills in the conditions that are not there yet.
pub(super) fn fill_conditions(conditions: &mut Conditions, others: &Conditions) {
    conditions.temperature = conditions.temperature.or(others.temperature);
    conditions.ph = conditions.ph.or(others.ph);
    conditions.lipid = conditions.lipid.or(others.lipid);
    conditions.reliability = conditions.reliability.or(others.reliability);
    conditions.year = conditions.year.or(others.year);
    if conditions.degradation == DegradationKind::NotStated {
        conditions.degradation = others.degradation;
    }
    if conditions.method.is_none() {
        conditions.method.clone_from(&others.method);
    }
    if conditions.organism.is_none() {
        conditions.organism.clone_from(&others.organism);
    }
}

/// The parts between semicolons and commas that stand in no number.
fn parts(remark: &str) -> Vec<&str> {
    let bytes = remark.as_bytes();
    let mut parts = Vec::new();
    let mut start = 0;
    for (position, byte) in bytes.iter().enumerate() {
        let digit = |position: usize| bytes.get(position).is_some_and(u8::is_ascii_digit);
        let in_number = digit(position + 1) && position.checked_sub(1).is_some_and(digit);
        if *byte == b';' || (*byte == b',' && !in_number) {
            parts.push(remark.get(start..position).unwrap_or_default().trim());
            start = position + 1;
        }
    }
    parts.push(remark.get(start..).unwrap_or_default().trim());
    parts.retain(|part| !part.is_empty());
    parts
}

fn temperature_in(part: &str) -> Option<f64> {
    let found = TEMPERATURE.captures(part)?;
    let number = decimal(found.get(1)?.as_str())?;
    let written = found.get(2).map_or("°C", |unit| unit.as_str());
    // `OECD 302 C` is a guideline.
    if written.len() == 1 && number > 100.0 && !written.eq_ignore_ascii_case("k") {
        return None;
    }
    let unit = match written.to_lowercase().chars().last() {
        Some('k') => Unit::Kelvin,
        Some('f') => Unit::Fahrenheit,
        _ => Unit::Celsius,
    };
    unit.to_canonical(number, None)
}

fn decimal(text: &str) -> Option<f64> {
    text.replace(',', ".").parse().ok()
}
