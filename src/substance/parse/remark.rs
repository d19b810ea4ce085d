//! What remarks beside a value say: how it was obtained and under which conditions.
//!
//! A text that says nothing known is kept as the method. Calculated beats measured, because an estimate is never shown
//! as measured.

use std::sync::LazyLock;

use regex::Regex;

use super::pattern::fixed;
use crate::quantity::{Unit, plain_words};
use crate::substance::{Basis, Conditions, DegradationKind, Property};

/// Basis and conditions as far as a text names them.
#[derive(Debug, Clone, PartialEq, Default)]
pub(crate) struct Said {
    /// How the value was obtained.
    pub(crate) basis: Option<Basis>,
    /// Under which conditions.
    pub(crate) conditions: Conditions,
    /// The half-life meant, where the words name another than that of degradation.
    pub(crate) other_half_life: Option<Property>,
}

// These look at words folded by `plain_words`.
static CALCULATED: LazyLock<Regex> = LazyLock::new(|| {
    fixed(concat!(
        r"\b(calc|calcd|calculat\w+|comput\w+|predict\w*|estimat\w*|est|qsars?|qspr|model|models|modell\w*|modeling|",
        r"in silico|read across|simul\w*|regression\w*|group contribution\w*|theor\w*|expected|presum\w*|probabl\w*|",
        r"likely|expert (judge?ment|opinion|estimate)|expertenurteil|extrapolat\w*|interpolat\w*|assum\w+|default|",
        r"worst case|analogues?|berechn\w*|rechnerisch\w*|kalkul\w*|(ab)?geschatzt\w*|(ab)?geschaetzt\w*|",
        r"(ab)?schatz\w*|vorhergesagt\w*|vorhersag\w*|angenommen\w*|vermut\w*|voraussichtlich\w*|analogie\w*)\b"
    ))
});
static NOT_MEASURED: LazyLock<Regex> = LazyLock::new(|| {
    fixed(
        r"\b(not|non|nicht|no|keine?|ohne|without|instead of|statt|anstatt) (\w+ ){0,2}(measured|experiment\w*|gemessen\w*|messung|messwert|stud(y|ie)|test|versuch|glp|oecd)\b",
    )
});
static MEASURED: LazyLock<Regex> = LazyLock::new(|| {
    fixed(concat!(
        r"\b(measured|meas|experiment\w*|exp|expt|exptl|glp|study|studie|versuch|gemessen\w*|messwert|messung|",
        r"shake flask|slow stir\w*|generator column|hplc|schuttel\w*)\b"
    ))
});
static GUIDELINE: LazyLock<Regex> = LazyLock::new(|| {
    fixed(concat!(
        r"\boecd (tg |no |nr |guideline |test |test guideline |method )?\d{3}[a-z]?\b|\boecd\d{3}[a-z]?\b|",
        r"\b(eu|ec|eg) (test )?(method |methode )?[abc] \d{1,2}\b|\b(oppts|ocspp) \d{3}\b|\biso \d{4,5}\b|",
        r"\bastm e ?\d{3,4}\b|\bdin (en )?(iso )?\d{4,5}\b|^[abc] \d{1,2}( [a-f])?$"
    ))
});
static ULTIMATE: LazyLock<Regex> =
    LazyLock::new(|| fixed(r"\b(ultimate|ultimativ\w*|mineralis\w*|mineraliz\w*|endabbau)\b"));
/// A denial makes no degradation ultimate.
static NOT_ULTIMATE: LazyLock<Regex> = LazyLock::new(|| {
    fixed(concat!(
        r"\b(no|not|non|without|incomplete|partial|little|low|nicht|keine?|ohne|geringe?|unvollstandige?|teilweise) ",
        r"(\w+ )?(ultimate|ultimativ\w*|mineralis\w*|mineraliz\w*|endabbau)\b"
    ))
});
/// Ways in which a substance goes that are not its degradation by organisms; the test guidelines by their titles.
static DISSIPATION: LazyLock<Regex> =
    LazyLock::new(|| fixed(r"\b(dissipat\w*|disappear\w*|verschwind\w*|volatili[sz]\w*|fluchtig\w*)\b"));
static HYDROLYSIS: LazyLock<Regex> =
    LazyLock::new(|| fixed(r"\b(hydrolys\w*|hydrolyt\w*|oecd (tg |no |test |guideline )?111)\b"));
static PHOTOLYSIS: LazyLock<Regex> = LazyLock::new(|| {
    fixed(
        r"\b(photolys\w*|photolyt\w*|photodegrad\w*|photooxid\w*|photo ?abbau|oecd (tg |no |test |guideline )?316)\b",
    )
});
static PRIMARY: LazyLock<Regex> = LazyLock::new(|| fixed(r"\b(primary|primar\w*|primaer\w*)\b"));
static ORGANISM: LazyLock<Regex> = LazyLock::new(|| {
    fixed(concat!(
        r"\b(fish|fische?n?|daphni\w*|algae?|algal|algen?|grunalgen?|carp|karpfen|\w*trout|\w*forellen?|zebrafish|",
        r"zebrabarbling|\w*minnow|medaka|bluegill|invertebrates?|wirbellosen?|mysids?|crustacea\w*|krebstiere?|mussels?|",
        r"oncorhynchus|danio|cyprinus|pimephales|lemna|chironom\w*|pseudokirchneriella|raphidocelis|desmodesmus)\b"
    ))
});
/// The names of the values themselves say nothing on how they were obtained.
static VALUE_NAME: LazyLock<Regex> = LazyLock::new(|| {
    fixed(concat!(
        r"^((log|lg) ?(k?ow|pow|p|d|koa|koc|bcf|baf|kow)|dt ?50|t ?1 2|t half|bcf|baf|bmf|tmf|k?oc|lc ?50|ec ?50|noec|",
        r"ec ?10|half life|halbwertszeit|pka|mw|mp|bp|vp|ww|wwt|wet weight|log k ?ow|log p ?ow|value|wert)( value| wert)?$"
    ))
});

// These look at the text as written.
static TEMPERATURE: LazyLock<Regex> = LazyLock::new(|| {
    fixed(r"(?:^|[^\d.,\-])(-?\d{1,4}(?:[.,]\d+)?)\s*(°\s*C|deg\.?\s*C|Grad\s*C|C|°\s*F|K)(?:\W|$)")
});
static PH: LazyLock<Regex> =
    LazyLock::new(|| fixed(r"\bpH[\s=:]*(?:of\s*|von\s*)?(\d{1,2}(?:[.,]\d+)?)(\s*(?:-|to|bis)\s*\d)?"));
static LIPID: LazyLock<Regex> = LazyLock::new(|| {
    fixed(
        r"(\d{1,2}(?:[.,]\d+)?)\s*%\s*(?:lipid|fett)|(?:lipid|fett)\w*(?:\s+content)?[\s=:]*(\d{1,2}(?:[.,]\d+)?)\s*%",
    )
});
static RELIABILITY: LazyLock<Regex> = LazyLock::new(|| {
    fixed(r"\b(?:reliability|klimisch|zuverl(?:ä|ae)ssigkeit|rl)(?:\s+(?:score|code|index))?[\s=:]*([1-4])\b")
});

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
        said.read_part(header);
        if !GUIDELINE.is_match(&plain_words(header)) {
            said.conditions.method = None;
        }
        said.conditions.organism = ORGANISM.find(&plain_words(header)).map(|found| found.as_str().to_owned());
        said
    }

    fn read_part(&mut self, part: &str) {
        let plain = plain_words(part);
        if plain.is_empty() || VALUE_NAME.is_match(&plain) {
            return;
        }
        let is_guideline = GUIDELINE.is_match(&plain);
        self.other_half_life = self.other_half_life.or_else(|| other_half_life(&plain));
        let basis = basis_in(&plain);
        if basis.is_some() && self.basis != Some(Basis::Calculated) {
            self.basis = basis;
        }
        let understood =
            self.read_conditions(part, &plain) || (basis.is_some() && plain.split(' ').count() == 1);
        if is_guideline || !understood {
            let method = self.conditions.method.get_or_insert_default();
            if !method.is_empty() {
                method.push_str("; ");
            }
            method.push_str(part);
        }
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
        let reliability = RELIABILITY.captures(part).and_then(|found| found.get(1)?.as_str().parse().ok());
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

fn other_half_life(plain: &str) -> Option<Property> {
    if HYDROLYSIS.is_match(plain) {
        Some(Property::HydrolysisHalfLife)
    } else if PHOTOLYSIS.is_match(plain) {
        Some(Property::PhotolysisHalfLife)
    } else {
        DISSIPATION.is_match(plain).then_some(Property::DissipationHalfLife)
    }
}

/// How a folded text says that a value was obtained.
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
        let in_number = bytes.get(position + 1).is_some_and(u8::is_ascii_digit);
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
    let written = found.get(2)?.as_str();
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
