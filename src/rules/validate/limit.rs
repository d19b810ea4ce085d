//! The limit of a test: which kind it is, whether it measures the property, and its number in the canonical unit.

use super::written_text;
use crate::fault::RuleMistake;
use crate::quantity::{Comparison, Dimension, QuantityFault, parse_limit};
use crate::rules::file::{Located, Scalar, Section};
use crate::rules::{Limit, Subject};
use crate::substance::DegradationTest;

/// What a quantity of a rule file measures, and how a message names it.
#[derive(Debug, Clone, Copy)]
pub(crate) struct Measured {
    pub title: &'static str,
    pub dimension: Dimension,
    may_be_negative: bool,
}

impl Measured {
    /// A quantity that is no property of a substance.
    pub const fn new(title: &'static str, dimension: Dimension) -> Self {
        Self { title, dimension, may_be_negative: matches!(dimension, Dimension::Temperature) }
    }

    /// What the numbers of a subject measure; `None` for those that are words.
    pub fn of(subject: Subject) -> Option<Self> {
        match subject {
            Subject::Property(property) => Some(Self {
                title: property.title(),
                dimension: property.dimension(),
                may_be_negative: property.may_be_negative(),
            }),
            Subject::InherentBiodegradability => Some(Self::new(subject.title(), Dimension::Percent)),
            Subject::ReadyBiodegradability | Subject::HazardStatements => None,
        }
    }
}

/// The keys of a limit that is a number.
const COMPARISONS: [(&str, Comparison); 4] = [
    ("above", Comparison::Above),
    ("at-least", Comparison::AtLeast),
    ("below", Comparison::Below),
    ("at-most", Comparison::AtMost),
];
pub(super) const LIMIT_KEYS: [&str; 7] =
    ["above", "at-least", "below", "at-most", "between", "any-of-words", "is"];

/// The limit of a test and its text for sentences.
pub(super) fn read_limit(test: &Section<'_>, subject: Subject) -> Option<(Limit, String)> {
    let keys: Vec<&'static str> = LIMIT_KEYS.into_iter().filter(|key| test.key_span(key).is_some()).collect();
    match keys.as_slice() {
        [] if LIMIT_KEYS.iter().any(|key| test.is_misspelt(key)) => None,
        [] => {
            let example = example_of(subject);
            test.report(test.span(), RuleMistake::NoLimit { example });
            None
        }
        [key] => read_one(test, subject, key),
        [_, second, ..] => {
            let span = test.key_span(second).unwrap_or(test.span());
            test.report(span, RuleMistake::SeveralLimits { keys });
            None
        }
    }
}

fn read_one(test: &Section<'_>, subject: Subject, key: &'static str) -> Option<(Limit, String)> {
    let comparison = COMPARISONS.iter().find(|(word, _)| *word == key);
    match (Measured::of(subject), comparison, key) {
        (Some(measured), Some((_, comparison)), _) => {
            let written = test.scalar(key)?;
            let limit = Limit::Number { comparison: *comparison, value: quantity(test, &written, measured)? };
            Some((limit, written_text(&written.value)))
        }
        (Some(measured), None, "between") => read_range(test, measured),
        (None, None, "any-of-words") if subject == Subject::HazardStatements => {
            let codes = read_codes(test, "any-of-words")?;
            let joined = codes.join(", ");
            Some((Limit::AnyOfWords(codes), joined))
        }
        (None, None, "is") if subject == Subject::ReadyBiodegradability => {
            let words = [
                ("ready", (DegradationTest::Ready, "ready")),
                ("not ready", (DegradationTest::NotReady, "not ready")),
            ];
            let (result, word) = test.word("is", &words)?;
            Some((Limit::Is(result), word.to_owned()))
        }
        (Some(_) | None, _, _) => {
            let mistake =
                RuleMistake::LimitDoesNotFit { key, property: subject.title(), example: example_of(subject) };
            test.report(test.key_span(key).unwrap_or(test.span()), mistake);
            None
        }
    }
}

fn read_range(test: &Section<'_>, measured: Measured) -> Option<(Limit, String)> {
    let ends = test.pair("between")?;
    let [low, high] = ends.value.each_ref().map(|end| quantity(test, end, measured));
    let (low, high) = (low?, high?);
    if low >= high {
        test.report(ends.span, RuleMistake::ReversedRange);
        return None;
    }
    let [low_text, high_text] = ends.value.each_ref().map(|end| written_text(&end.value));
    Some((Limit::Between { low, high }, format!("{low_text} to below {high_text}")))
}

/// Hazard statement codes of a list.
pub(super) fn read_codes(section: &Section<'_>, key: &str) -> Option<Vec<String>> {
    let texts = section.texts(key)?;
    for text in &texts {
        if !is_hazard_code(&text.value) {
            let found = text.value.clone();
            section.report(text.span.clone(), RuleMistake::NotAHazardCode { found });
        }
    }
    Some(texts.into_iter().map(|text| text.value).collect())
}

/// `H` or `EUH`, three digits, and the letters of its family, for example `H360FD`.
fn is_hazard_code(text: &str) -> bool {
    let Some(rest) = text.strip_prefix("EUH").or_else(|| text.strip_prefix('H')) else {
        return false;
    };
    let digits = rest.bytes().take_while(u8::is_ascii_digit).count();
    digits == 3 && rest.bytes().skip(3).all(|byte| byte.is_ascii_alphabetic())
}

/// The number of a written quantity in the canonical unit.
pub(crate) fn quantity(section: &Section<'_>, written: &Located<Scalar>, measured: Measured) -> Option<f64> {
    measured.number(&written.value).map_err(|mistake| section.report(written.span.clone(), mistake)).ok()
}

impl Measured {
    fn number(self, written: &Scalar) -> Result<f64, RuleMistake> {
        let found = written_text(written);
        let (property, unit) = (self.title, self.dimension.canonical().symbol());
        let bare = match written {
            Scalar::Number(number, _) => Some(*number),
            Scalar::Text(text) => text.trim().parse().ok(),
        };
        let number = match bare {
            Some(number) if self.dimension == Dimension::Dimensionless => number,
            Some(_) => {
                return Err(RuleMistake::NoUnit { number: found.trim().to_owned(), property, unit });
            }
            // One plain number: no qualifier, no range, and no comma, which groups here and divides there.
            None if found.contains(['<', '>', '≤', '≥', '~', '±', ',']) => {
                return Err(RuleMistake::NotAQuantity { found, property, unit });
            }
            None => parse_limit(&found, self.dimension).map_err(|fault| match fault {
                QuantityFault::WrongDimension(_) | QuantityFault::UnknownUnit(_) => {
                    let found = found.clone();
                    RuleMistake::WrongUnit { found, property, unit }
                }
                QuantityFault::NoValue
                | QuantityFault::NoNumber
                | QuantityFault::NeedsMolarMass
                | QuantityFault::WordOnly
                | QuantityFault::BadNumber
                | QuantityFault::SeveralValues
                | QuantityFault::TooLong
                | QuantityFault::BadRange
                | QuantityFault::LogarithmOrNot
                | QuantityFault::NotFinite => {
                    let found = found.clone();
                    RuleMistake::NotAQuantity { found, property, unit }
                }
            })?,
        };
        if number.is_finite() && (number >= 0.0 || self.may_be_negative) {
            Ok(number)
        } else {
            Err(RuleMistake::Impossible { found, property })
        }
    }
}

/// How a limit for the subject is written.
fn example_of(subject: Subject) -> &'static str {
    let Some(measured) = Measured::of(subject) else {
        return match subject {
            Subject::HazardStatements => "any-of-words = [\"H350\"]",
            Subject::ReadyBiodegradability => "is = \"not ready\"",
            Subject::Property(_) | Subject::InherentBiodegradability => "above = 4.5",
        };
    };
    match measured.dimension {
        Dimension::Dimensionless => "above = 4.5",
        Dimension::Time => "above = \"40 d\"",
        Dimension::Concentration => "below = \"0.01 mg/L\"",
        Dimension::VolumePerMass => "above = \"2000 L/kg\"",
        Dimension::Pressure => "below = \"1000 Pa\"",
        Dimension::Temperature => "below = \"25 °C\"",
        Dimension::MolarMass => "above = \"1100 g/mol\"",
        Dimension::Henry => "above = \"1 Pa m³/mol\"",
        Dimension::Percent => "below = \"70 %\"",
        Dimension::Tonnage => "above = \"1 t/a\"",
        Dimension::MolarEnergy => "above = \"65.4 kJ/mol\"",
    }
}
