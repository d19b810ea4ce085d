//! One cell as text or as a quantity, with its faults in words of the field.

use std::sync::LazyLock;

use regex::Regex;

use super::against::{named_against, names_log_kow, says_logarithm};
use super::pattern::fixed;
use crate::columns::Column;
use crate::fault::{CellFaultKind, nearest};
use crate::quantity::{
    Bound, DAYS_PER_MONTH, Date, Dimension, LetterA, Parsed, Quantity, QuantityFault, ReadAs, Scale, Unit,
    is_missing, parse_quantities, quantity_of_number, tidy, unit_words,
};
use crate::substance::parse::Said;
use crate::substance::parse::doubt::said_in;
pub(super) use crate::substance::parse::expected::Expected;
use crate::substance::parse::expected::Sign;
use crate::substance::parse::remark::{Degraded, folded};
use crate::substance::{Basis, Property};
use crate::workbook::CellContent;

/// A quantity and what the remarks beside it say.
pub(super) type Read = (Quantity, Said);

/// The one quantity of a cell; `None` where the cell says that there is none.
pub(super) fn read_quantity(
    content: &CellContent,
    column: &Column,
    expected: Expected,
    molar_mass: Option<f64>,
) -> Result<Option<Read>, CellFaultKind> {
    let mut read = read_quantities(content, column, expected, molar_mass)?;
    let first = read.pop();
    if read.is_empty() { Ok(first) } else { Err(CellFaultKind::SeveralValues { what: expected.what }) }
}

/// The quantities of a cell; none where the cell says that there is none.
pub(super) fn read_quantities(
    content: &CellContent,
    column: &Column,
    expected: Expected,
    molar_mass: Option<f64>,
) -> Result<Vec<Read>, CellFaultKind> {
    let default_unit = column.unit.unwrap_or_else(|| expected.dimension.canonical());
    let scale = expected.scale(default_unit);
    let dimension = expected.dimension;
    let letter_a = if names_to_as_a(&column.header) { LetterA::To } else { LetterA::Year };
    let read_as = ReadAs { dimension, default_unit, decimal: column.decimal, scale, molar_mass, letter_a };
    let read: Result<Vec<Read>, QuantityFault> = match content {
        CellContent::Number(number) => {
            quantity_of_number(*number, read_as).map(|quantity| vec![(quantity, Said::default())])
        }
        CellContent::Text(text) if speaks_of_other_toxicity(text, expected) => return Err(expected.not_a()),
        CellContent::Text(text) => match parse_quantities(text, read_as) {
            Ok(values) => {
                if let Some(found) = named_against_of(text, column, expected) {
                    return Err(CellFaultKind::SpeaksOfOther { found, what: expected.what });
                }
                check_logarithms(&values, expected)?;
                Ok(of_equal_rank(values.into_iter().map(|parsed| read_of(parsed, expected)).collect()))
            }
            Err(fault) => Err(fault),
        },
        CellContent::DateTime(_) => return Err(CellFaultKind::BecameDate { what: expected.what }),
        CellContent::Boolean(_) => return Err(expected.not_a()),
        CellContent::Empty => return Ok(Vec::new()),
        CellContent::Error(_) => return Err(CellFaultKind::SheetError),
    };
    match read {
        Ok(values) => {
            for (quantity, said) in &values {
                check_sense(quantity, expected, scale)?;
                check_words(quantity, said, column, expected)?;
            }
            Ok(values)
        }
        Err(QuantityFault::NoValue) => Ok(Vec::new()),
        // `miscible` is how the trade writes it; it holds no number, and nothing is lost by saying so to nobody.
        Err(QuantityFault::WordOnly) if expected.property == Some(Property::WaterSolubility) => {
            Ok(Vec::new())
        }
        Err(fault) => Err(word_fault(fault, expected, scale)),
    }
}

fn named_against_of(text: &str, column: &Column, expected: Expected) -> Option<String> {
    expected.property.and_then(|property| named_against(property, &column.header, text))
}

/// `2.5 (log BCF)` is a logarithm or no logarithm, `100 (log BCF 4)` neither.
fn check_logarithms(values: &[Parsed], expected: Expected) -> Result<(), CellFaultKind> {
    let Some(example) = expected.logged() else {
        return Ok(());
    };
    let linear = |parsed: &&Parsed| {
        matches!(parsed.quantity.unit, Unit::LitrePerKilogram | Unit::LitrePerGram | Unit::One)
    };
    let is_logarithmic = expected.property.is_some_and(Property::is_logarithmic);
    let doubtful =
        values.iter().filter(linear).any(|parsed| says_logarithm(&parsed.remarks, parsed.quantity.single()));
    if doubtful && !is_logarithmic {
        return Err(CellFaultKind::LogarithmOrNot { what: expected.what, example });
    }
    Ok(())
}

/// A log Kow that was measured does not make another value measured.
fn read_of(parsed: Parsed, expected: Expected) -> Read {
    let mut said = said_in(&parsed.remarks);
    let of_other = expected.property != Some(Property::LogKow) && names_log_kow(&parsed.remarks);
    if of_other && said.basis == Some(Basis::Measured) {
        said.basis = Some(Basis::Unstated);
    }
    (parsed.quantity, said)
}

/// A value said to be measured outranks none in the same cell of which nothing is said: `300 (measured); 9000`.
fn of_equal_rank(mut values: Vec<Read>) -> Vec<Read> {
    let is_open = |(_, said): &Read| matches!(said.basis, None | Some(Basis::Unstated));
    if values.iter().any(is_open) {
        for (_, said) in values.iter_mut().filter(|(_, said)| said.basis == Some(Basis::Measured)) {
            said.basis = None;
        }
    }
    values
}

fn word_fault(fault: QuantityFault, expected: Expected, scale: Scale) -> CellFaultKind {
    let Expected { what, example, .. } = expected;
    match fault {
        QuantityFault::NoValue | QuantityFault::NoNumber => expected.not_a(),
        QuantityFault::WordOnly => CellFaultKind::WordNoNumber { what, example: expected.bound_example },
        QuantityFault::BadNumber => CellFaultKind::BadNumber { example },
        QuantityFault::SeveralValues => CellFaultKind::SeveralValues { what },
        QuantityFault::UnknownUnit(word) => {
            let nearest = nearest_unit(&word, expected.dimension);
            CellFaultKind::UnknownUnit { word, nearest, example }
        }
        QuantityFault::WrongDimension(Unit::One) if expected.dimension == Dimension::Henry => {
            CellFaultKind::DimensionlessHenry
        }
        QuantityFault::WrongDimension(unit) => CellFaultKind::WrongUnit { unit, what, example },
        QuantityFault::NeedsMolarMass => CellFaultKind::NeedsMolarMass,
        QuantityFault::BadRange => CellFaultKind::BadRange { what },
        QuantityFault::NotFinite => match (scale, expected.unlogged()) {
            (Scale::Logarithm, Some(example)) => CellFaultKind::NotALogarithm { what, example },
            (Scale::Linear | Scale::Logarithm, _) => CellFaultKind::BadRange { what },
        },
        QuantityFault::TooLong => CellFaultKind::TooLong,
        QuantityFault::LogarithmOrNot => {
            CellFaultKind::LogarithmOrNot { what, example: expected.logged().unwrap_or(example) }
        }
    }
}

/// The spelling a misspelt unit is close to; one that begins otherwise may differ by a factor of a thousand.
fn nearest_unit(word: &str, dimension: Dimension) -> Option<&'static str> {
    let word = word.to_lowercase();
    // Parts per trillion in one country are parts per thousand in another.
    if word.starts_with("ppt") {
        return None;
    }
    let first = word.chars().next();
    nearest(&word, unit_words(dimension).filter(|known| known.to_lowercase().chars().next() == first))
}

/// No partition coefficient is larger.
const LARGEST_RATIO: f64 = 1e20;

fn check_sense(quantity: &Quantity, expected: Expected, scale: Scale) -> Result<(), CellFaultKind> {
    let what = expected.what;
    let interval = quantity.interval;
    let ends = [interval.low().number(), interval.high().number()];
    let (least, most) = expected.sensible;
    let below_zero = |end: &f64| *end < 0.0;
    if expected.sign != Sign::Any && ends.iter().flatten().any(below_zero) {
        return Err(match expected.logged() {
            Some(example) => CellFaultKind::MayBeLogarithm { what, example },
            None => CellFaultKind::Negative { what },
        });
    }
    let reaches_zero_only = match interval.high() {
        Bound::Included(high) | Bound::Excluded(high) => high <= 0.0,
        Bound::Unbounded => false,
    };
    if expected.sign == Sign::Positive && reaches_zero_only {
        return Err(CellFaultKind::Zero { what, example: expected.bound_example });
    }
    if ends.iter().flatten().any(|end| *end < least || *end > most) {
        // What is no value either has no name to be written with.
        let logged = quantity.unit == Unit::LogLitrePerKilogram;
        let too_high = ends.iter().flatten().any(|end| *end > most && (logged || *end <= LARGEST_RATIO));
        let bare = logged || quantity.unit == Unit::One;
        return Err(match expected.unlogged() {
            Some(example) if too_high && bare && scale == Scale::Logarithm => {
                CellFaultKind::NotALogarithm { what, example }
            }
            Some(_) | None => CellFaultKind::OutOfSense { what },
        });
    }
    Ok(())
}

/// Words of the cell or its header that speak against the number or its unit.
fn check_words(
    quantity: &Quantity,
    said: &Said,
    column: &Column,
    expected: Expected,
) -> Result<(), CellFaultKind> {
    if quantity.unit == Unit::Jour && !is_french(&column.header) {
        return Err(CellFaultKind::DaysOrYears);
    }
    // `2019年` is a date.
    if said.basis != Some(Basis::Measured) && is_placeholder(&quantity.reported, expected) {
        return Err(CellFaultKind::Placeholder { what: expected.what });
    }
    let days_a_year = 12.0 * DAYS_PER_MONTH;
    let dates = 1900.0 * days_a_year..2100.0 * days_a_year;
    if quantity.unit == Unit::Year && quantity.single().is_some_and(|days| dates.contains(&days)) {
        return Err(expected.not_a());
    }
    // `28 d (no degradation)` is the length of a test; `> 365 d (stable)` is a half-life.
    let ends = quantity.interval.high() != Bound::Unbounded;
    if expected.dimension == Dimension::Time && said.degraded == Degraded::Said && ends {
        return Err(CellFaultKind::WordsAgainstNumber);
    }
    Ok(())
}

/// Numbers that stand for a missing value in exports, where nothing but a unit follows.
fn is_placeholder(reported: &str, expected: Expected) -> bool {
    let reported = reported.replace('\u{2212}', "-");
    let number = reported.trim().split(' ').next().unwrap_or_default();
    let number = number.strip_suffix(".0").unwrap_or(number);
    match expected.property {
        None | Some(Property::MeltingPoint | Property::BoilingPoint | Property::MolarMass) => false,
        Some(property) if property.is_logarithmic() => matches!(number, "-9" | "-9.9" | "-9.99" | "-9.0"),
        Some(_) => matches!(number, "999" | "9999" | "99999" | "999999"),
    }
}

/// Whether a cell of long-term toxicity names an acute value, or the reverse: `LC50: 0.3 mg/L` is no NOEC.
fn speaks_of_other_toxicity(text: &str, expected: Expected) -> bool {
    static ACUTE: LazyLock<Regex> =
        LazyLock::new(|| fixed(r"\b(?:l|e|er|eb|ey|i)c ?50\b|\bl d ?50\b|\bacute|\bakut"));
    static LONG_TERM: LazyLock<Regex> =
        LazyLock::new(|| fixed(r"\b(?:noec|noel|loec|ec ?10|erc ?10)\b|\bchron|\blong term|\blangzeit"));
    match expected.property {
        Some(Property::LongTermToxicity) => ACUTE.is_match(&folded(text)),
        Some(Property::AcuteToxicity) => LONG_TERM.is_match(&folded(text)),
        _ => false,
    }
}

/// Whether a header has a French word that no other language has.
fn is_french(header: &str) -> bool {
    const FRENCH: [&str; 14] = [
        "demi", "vie", "sol", "sols", "eau", "eaux", "douce", "mer", "temps", "jours", "dans", "periode",
        "duree", "marine",
    ];
    folded(header).split(' ').any(|word| FRENCH.contains(&word))
}

/// Whether a header is in a language in which `a` between numbers is `to`: it has a word that only those have.
fn names_to_as_a(header: &str) -> bool {
    const SPANISH_ITALIAN_PORTUGUESE: [&str; 16] = [
        "vida", "semivida", "suelo", "suelos", "agua", "aguas", "dias", "tiempo", "dulce", "emivita",
        "semivita", "suolo", "suoli", "acqua", "acque", "giorni",
    ];
    folded(header).split(' ').any(|word| SPANISH_ITALIAN_PORTUGUESE.contains(&word))
}

/// The cell as a user would read it; nothing for an empty cell.
pub(super) fn text_of(content: &CellContent) -> Option<String> {
    let text = shown(content);
    let trimmed = text.trim();
    (!trimmed.is_empty()).then(|| trimmed.to_owned())
}

/// The tidied text of a cell, unless it is empty or one of the words for missing.
pub(super) fn value_text(content: &CellContent) -> Option<String> {
    let text = tidy(&text_of(content)?);
    (!is_missing(&text)).then_some(text)
}

/// Whether a number is shown in full; spreadsheet programs show others with an exponent.
fn plain(number: f64) -> bool {
    number.abs() < f64::MIN_POSITIVE || (1e-9..1e15).contains(&number.abs())
}

/// The content of a cell in a message.
pub(super) fn shown(content: &CellContent) -> String {
    match content {
        CellContent::Empty => String::new(),
        CellContent::Text(text) | CellContent::Error(text) => text.clone(),
        CellContent::Number(number) if !plain(*number) => format!("{number:E}"),
        CellContent::Number(number) => number.to_string(),
        CellContent::Boolean(true) => "TRUE".to_owned(),
        CellContent::Boolean(false) => "FALSE".to_owned(),
        CellContent::DateTime(serial) => {
            Date::from_serial(*serial).map_or_else(|| serial.to_string(), |date| date.to_string())
        }
    }
}
