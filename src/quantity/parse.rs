//! The one text parser for quantities, in cells and rule files alike.

use crate::quantity::{Dimension, Quantity, Unit};

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
    /// A word where the unit should be that is no unit.
    UnknownUnit(String),
    /// A unit that does not measure this.
    WrongDimension(Unit),
    /// A molar concentration without a molar mass in the row.
    NeedsMolarMass,
    /// A range whose ends are the wrong way round, or a number out of any sense.
    BadRange,
}

/// Reads a quantity.
pub fn parse_quantity(_text: &str, _read_as: ReadAs) -> Result<Parsed, QuantityFault> {
    Err(QuantityFault::NoNumber)
}

/// Reads a limit of a rule file: one number and its unit, no qualifier, no range.
pub fn parse_limit(text: &str, dimension: Dimension) -> Result<f64, QuantityFault> {
    let (number, word) = text.trim().split_once(' ').unwrap_or((text.trim(), ""));
    let number: f64 = number.parse().map_err(|_| QuantityFault::NoNumber)?;
    let unit = match word {
        "" => Unit::One,
        "h" => Unit::Hour,
        "d" | "days" => Unit::Day,
        "month" | "months" => Unit::Month,
        "mg/L" => Unit::MilligramPerLitre,
        "L/kg" => Unit::LitrePerKilogram,
        "Pa" => Unit::Pascal,
        "°C" => Unit::Celsius,
        "g/mol" => Unit::GramPerMole,
        "%" => Unit::Percent,
        "kJ/mol" => Unit::KilojoulePerMole,
        unknown => return Err(QuantityFault::UnknownUnit(unknown.to_owned())),
    };
    if unit.dimension() != dimension {
        return Err(QuantityFault::WrongDimension(unit));
    }
    unit.to_canonical(number, None).ok_or(QuantityFault::NoNumber)
}

/// A number as a reader writes it: four significant digits, no trailing zeros, thousands not grouped.
pub fn format_number(number: f64) -> String {
    format!("{number}")
}

/// The interval as a reader writes it.
pub fn format_interval(_interval: crate::quantity::Interval, _unit: Unit) -> String {
    String::new()
}
