//! The one text parser for quantities, in cells and rule files alike.
//!
//! It finds the number, its qualifier or range and its unit, and hands everything else on as remarks without asking
//! what they mean. Linear in the length of the text, which is capped.

mod expression;
mod format;
mod number;
mod qualifier;
mod text;
mod units;
mod value;
mod words;

pub use format::{format_interval, format_number};
pub use text::{plain_words, tidy};
pub use units::{parse_unit, unit_words};
pub use words::is_missing;

use crate::quantity::{Dimension, Interval, Quantity, Unit};
use expression::Expression;

/// The longest text, in bytes, in which a quantity is looked for.
const LONGEST: usize = 2_000;

/// How a column of a sheet writes decimals; decides only where a separator is followed by exactly three digits.
#[derive(Debug, Clone, Copy, PartialEq, Eq, Default)]
pub enum DecimalStyle {
    /// Decimal point; a comma before three digits groups thousands.
    #[default]
    Point,
    /// Decimal comma; a point before three digits groups thousands.
    Comma,
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
    /// Molar mass, g/mol, for molar concentrations.
    pub molar_mass: Option<f64>,
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
    /// More than one value, and no range.
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
}

/// Reads a quantity.
pub fn parse_quantity(text: &str, read_as: ReadAs) -> Result<Parsed, QuantityFault> {
    if text.len() > LONGEST {
        return Err(QuantityFault::TooLong);
    }
    let tidied = tidy(text);
    if is_missing(&tidied) {
        return Err(QuantityFault::NoValue);
    }
    let expression = Expression::read(&tidied, read_as)?;
    let unit = expression.unit.unwrap_or(read_as.default_unit);
    let convert = |number: f64, own: Option<Unit>| {
        let unit = own.unwrap_or(unit);
        if unit.dimension() != read_as.dimension {
            return Err(QuantityFault::WrongDimension(unit));
        }
        unit.to_canonical(number, read_as.molar_mass).ok_or(QuantityFault::NeedsMolarMass)
    };
    let low = expression.low.convert(convert)?;
    let high = expression.high.convert(convert)?;
    let interval = Interval::new(low, high).map_err(|_| QuantityFault::BadRange)?;
    Ok(Parsed {
        quantity: Quantity {
            interval,
            unit,
            written_sd: expression.written_sd,
            approximate: expression.approximate,
            reported: text.trim().to_owned(),
        },
        remarks: expression.remarks,
    })
}

/// The quantity of a cell that holds a number already.
pub fn quantity_of_number(number: f64, read_as: ReadAs) -> Result<Quantity, QuantityFault> {
    let unit = read_as.default_unit;
    if unit.dimension() != read_as.dimension {
        return Err(QuantityFault::WrongDimension(unit));
    }
    let canonical = unit.to_canonical(number, read_as.molar_mass).ok_or(QuantityFault::NeedsMolarMass)?;
    Ok(Quantity {
        interval: Interval::point(canonical).map_err(|_| QuantityFault::BadRange)?,
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
        parse_unit(rest).ok_or_else(|| QuantityFault::UnknownUnit(rest.to_owned()))?
    };
    if unit.dimension() != dimension {
        return Err(QuantityFault::WrongDimension(unit));
    }
    unit.to_canonical(number, None).filter(|value| value.is_finite()).ok_or(QuantityFault::NeedsMolarMass)
}
