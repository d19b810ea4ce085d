//! The one text parser for quantities, in cells and rule files alike.
//!
//! It finds the number, its qualifier or range and its unit, and hands everything else on as remarks without asking
//! what they mean. Linear in the length of the text, which is capped.

mod brackets;
mod expression;
mod fold;
mod format;
mod label;
mod leftover;
mod number;
mod qualifier;
mod range;
mod segment;
mod several;
mod symbols;
mod text;
mod units;
mod value;
mod words;

pub use fold::{part_scripts, plain_words};
pub use format::{format_interval, format_number};
pub use text::tidy;
pub use units::{parse_unit, parse_unit_of, unit_words};
pub use words::is_missing;

use crate::quantity::{Dimension, Interval, IntervalError, Quantity, Unit};
use expression::Expression;
use several::read_all;
use words::is_missing_number;

/// The longest text, in bytes, in which a quantity is looked for.
const LONGEST: usize = 2_000;
/// Exports leave them around texts.
const QUOTES: &str = "\"“”„«»";
/// More values than a cell can mean.
const MOST_VALUES: usize = 20;
/// Of a value that is written without `log` where its logarithm is asked for, numbers up to this one may be the logarithm
/// all the same.
const LARGEST_LOGARITHM: f64 = 20.0;

/// How a column of a sheet writes decimals; decides only where a separator is followed by exactly three digits.
#[derive(Debug, Clone, Copy, PartialEq, Eq, Default)]
pub enum DecimalStyle {
    /// Decimal point; a comma before three digits groups thousands.
    #[default]
    Point,
    /// Decimal comma; a point before three digits groups thousands.
    Comma,
}

/// Whether a field holds values or their logarithms.
#[derive(Debug, Clone, Copy, PartialEq, Eq, Default)]
pub enum Scale {
    /// Values: a BCF, a half-life, a BMF.
    #[default]
    Linear,
    /// Logarithms: log Kow, pKa, a column of log Koc.
    Logarithm,
}

/// What a bare `a` between two numbers of time is; alone it is always a year.
#[derive(Debug, Clone, Copy, PartialEq, Eq, Default)]
pub enum LetterA {
    /// A year, or nobody knows.
    #[default]
    Year,
    /// `to`, as in Spanish, Italian and Portuguese: `50 a 120`.
    To,
}

/// What a text is expected to hold.
#[derive(Debug, Clone, Copy, PartialEq)]
pub struct ReadAs {
    /// What the number measures.
    pub dimension: Dimension,
    /// The unit where the text names none.
    pub default_unit: Unit,
    /// How decimals are written around it.
    pub decimal: DecimalStyle,
    /// Whether logarithms are expected.
    pub scale: Scale,
    /// Molar mass, g/mol, for molar concentrations.
    pub molar_mass: Option<f64>,
    /// What a bare `a` between two times is.
    pub letter_a: LetterA,
}

/// What a text held.
#[derive(Debug, Clone, PartialEq)]
pub struct Parsed {
    /// The value.
    pub quantity: Quantity,
    /// What else the text says, each remark as written: `OECD 117`, `25 °C`, `calculated`. Their meaning is for
    /// [`substance`](crate::substance) to find.
    pub remarks: Vec<String>,
}

/// Why a text holds no quantity.
#[derive(Debug, Clone, PartialEq, Eq)]
pub enum QuantityFault {
    /// One of the words for missing: `n.d.`, `-`, `n/a`: no fault, there is no value.
    NoValue,
    /// No number found.
    NoNumber,
    /// A word that says something of the value but not how much: `miscible`, `insoluble`.
    WordOnly,
    /// Digits that make no number: `1.2.3`, `1,23.4`.
    BadNumber,
    /// More than one value where they cannot be told apart, or where one is asked for.
    SeveralValues,
    /// A word where the unit should be that is no unit.
    UnknownUnit(String),
    /// A unit that does not measure this.
    WrongDimension(Unit),
    /// A molar concentration without a molar mass in the row.
    NeedsMolarMass,
    /// A range whose ends are the wrong way round, or a number out of any sense.
    BadRange,
    /// A text too long to be a value.
    TooLong,
    /// A small number said to be a value where its logarithm is asked for: `Kow = 4.5` may be either.
    LogarithmOrNot,
    /// A number too large for any, such as ten to the power of a BCF that is no logarithm.
    NotFinite,
}

/// Reads the one quantity of a text.
pub fn parse_quantity(text: &str, read_as: ReadAs) -> Result<Parsed, QuantityFault> {
    let mut parsed = parse_quantities(text, read_as)?;
    match (parsed.pop(), parsed.is_empty()) {
        (Some(only), true) => Ok(only),
        (Some(_), false) => Err(QuantityFault::SeveralValues),
        (None, _) => Err(QuantityFault::NoNumber),
    }
}

/// Reads every quantity of a text, at least one and at most twenty. If a part cannot be read, none is.
pub fn parse_quantities(text: &str, read_as: ReadAs) -> Result<Vec<Parsed>, QuantityFault> {
    if text.len() > LONGEST {
        return Err(QuantityFault::TooLong);
    }
    let tidied = part_scripts(tidy(text));
    let tidied =
        tidied.trim_matches(|character: char| QUOTES.contains(character) || character.is_whitespace());
    if is_missing_number(tidied) {
        return Err(QuantityFault::NoValue);
    }
    let values = read_all(tidied, read_as)?;
    let several = values.len() > 1;
    let parsed = values.into_iter().map(|value| {
        let reported = if several { &value.written } else { text };
        let reported = reported.split_whitespace().collect::<Vec<_>>().join(" ");
        to_parsed(value, reported, read_as)
    });
    parsed.collect()
}

fn to_parsed(value: Expression, reported: String, read_as: ReadAs) -> Result<Parsed, QuantityFault> {
    let unit = value.unit.unwrap_or(read_as.default_unit);
    if may_be_logarithm(&value, unit, read_as) {
        return Err(QuantityFault::LogarithmOrNot);
    }
    let convert = |number: f64, own: Option<Unit>| {
        let unit = own.unwrap_or(unit);
        if unit.dimension() != read_as.dimension {
            return Err(QuantityFault::WrongDimension(unit));
        }
        unit.to_canonical(number, read_as.molar_mass).ok_or(QuantityFault::NeedsMolarMass)
    };
    let low = value.low.convert(convert)?;
    let high = value.high.convert(convert)?;
    let interval = Interval::new(low, high).map_err(fault_of_interval)?;
    Ok(Parsed {
        quantity: Quantity {
            interval,
            unit,
            written_sd: value.written_sd,
            approximate: value.approximate,
            reported,
        },
        remarks: value.remarks,
    })
}

fn fault_of_interval(error: IntervalError) -> QuantityFault {
    match error {
        IntervalError::NotFinite => QuantityFault::NotFinite,
        IntervalError::Reversed => QuantityFault::BadRange,
    }
}

/// Many who write `Kow = 4.5` or `3.4 L/kg` in a column of logarithms mean the logarithm.
fn may_be_logarithm(value: &Expression, unit: Unit, read_as: ReadAs) -> bool {
    let written_as_value = match read_as.dimension {
        Dimension::VolumePerMass => {
            unit.dimension() == read_as.dimension && unit != Unit::LogLitrePerKilogram
        }
        _ => unit == Unit::Ratio,
    };
    read_as.scale == Scale::Logarithm
        && written_as_value
        && value.numbers().any(|number| number <= LARGEST_LOGARITHM)
}

/// The quantity of a cell that holds a number already.
pub fn quantity_of_number(number: f64, read_as: ReadAs) -> Result<Quantity, QuantityFault> {
    let unit = read_as.default_unit;
    if unit.dimension() != read_as.dimension {
        return Err(QuantityFault::WrongDimension(unit));
    }
    let canonical = unit.to_canonical(number, read_as.molar_mass).ok_or(QuantityFault::NeedsMolarMass)?;
    Ok(Quantity {
        interval: Interval::point(canonical).map_err(fault_of_interval)?,
        unit,
        written_sd: None,
        approximate: false,
        reported: format::number_in_full(number),
    })
}

/// Reads a limit of a rule file: one number with a decimal point and its unit, no qualifier, no range. A bare number
/// is legal only where there is no unit to write.
pub fn parse_limit(text: &str, dimension: Dimension) -> Result<f64, QuantityFault> {
    if text.len() > LONGEST {
        return Err(QuantityFault::TooLong);
    }
    let tidied = tidy(text);
    if tidied.contains(',') {
        return Err(QuantityFault::BadNumber);
    }
    let (number, rest) = number::read_number(&tidied, DecimalStyle::Point)?.ok_or(QuantityFault::NoNumber)?;
    let rest = rest.trim();
    let unit = if rest.is_empty() {
        if dimension != Dimension::Dimensionless {
            return Err(QuantityFault::UnknownUnit(String::new()));
        }
        Unit::One
    } else {
        // `j` is a day in one language and a year in another.
        let unit = parse_unit_of(rest, dimension).filter(|unit| *unit != Unit::Jour);
        unit.ok_or_else(|| QuantityFault::UnknownUnit(rest.to_owned()))?
    };
    if unit.dimension() != dimension {
        return Err(QuantityFault::WrongDimension(unit));
    }
    unit.to_canonical(number, None).filter(|value| value.is_finite()).ok_or(QuantityFault::NeedsMolarMass)
}
