//! One cell as text or as a quantity, with its faults in words of the field.

use crate::columns::Column;
use crate::fault::{CellFaultKind, nearest};
use crate::quantity::{
    Bound, Date, Dimension, Interval, Quantity, QuantityFault, ReadAs, is_missing, parse_quantity,
    quantity_of_number, tidy, unit_words,
};
use crate::substance::Property;
use crate::substance::parse::Said;
use crate::workbook::CellContent;

/// What a numeric column promises.
#[derive(Debug, Clone, Copy)]
pub(super) struct Expected {
    what: &'static str,
    example: &'static str,
    bound_example: &'static str,
    dimension: Dimension,
    sign: Sign,
    sensible: (f64, f64),
}

/// Which numbers a field can have.
#[derive(Debug, Clone, Copy, PartialEq, Eq)]
enum Sign {
    Any,
    NotNegative,
    Positive,
}

impl Expected {
    pub(super) const TONNAGE: Self = Self {
        what: "tonnes per year",
        example: "25 t/a",
        bound_example: "< 1 t/a",
        dimension: Dimension::Tonnage,
        sign: Sign::NotNegative,
        sensible: (0.0, 1e12),
    };

    pub(super) const fn percent(what: &'static str, example: &'static str) -> Self {
        Self {
            what,
            example,
            bound_example: "< 0.1 %",
            dimension: Dimension::Percent,
            sign: Sign::NotNegative,
            sensible: (0.0, 100.0),
        }
    }

    pub(super) const fn temperature(what: &'static str) -> Self {
        Self {
            what,
            example: "20 °C",
            bound_example: "< 20 °C",
            dimension: Dimension::Temperature,
            sign: Sign::Any,
            sensible: (-273.15, 1e4),
        }
    }

    /// A bare number between two ends: a pH, a standard deviation.
    pub(super) const fn bare(what: &'static str, example: &'static str, sensible: (f64, f64)) -> Self {
        Self {
            what,
            example,
            bound_example: example,
            dimension: Dimension::Dimensionless,
            sign: Sign::NotNegative,
            sensible,
        }
    }

    pub(super) fn property(property: Property) -> Self {
        let dimension = property.dimension();
        let (example, bound_example) = examples(dimension);
        // Far outside what any substance has; catches a Kow where its logarithm belongs, and lost decimal separators.
        let sensible = match property {
            Property::LogKow | Property::LogD => (-15.0, 20.0),
            Property::LogKoa => (-10.0, 30.0),
            Property::PkaAcid | Property::PkaBase => (-60.0, 60.0),
            Property::MeltingPoint | Property::BoilingPoint => (-273.15, 1e4),
            Property::WaterSolubility
            | Property::VapourPressure
            | Property::HenryConstant
            | Property::Koc
            | Property::Bcf
            | Property::Baf
            | Property::Bmf
            | Property::Tmf
            | Property::HalfLife(_)
            | Property::HydrolysisHalfLife
            | Property::PhotolysisHalfLife
            | Property::DissipationHalfLife
            | Property::LongTermToxicity
            | Property::AcuteToxicity
            | Property::MolarMass => (0.0, 1e15),
        };
        Self {
            what: property.title(),
            example,
            bound_example,
            dimension,
            sign: if property.may_be_negative() { Sign::Any } else { Sign::Positive },
            sensible,
        }
    }

    fn not_a(self) -> CellFaultKind {
        CellFaultKind::NotA { what: self.what, example: self.example }
    }
}

fn examples(dimension: Dimension) -> (&'static str, &'static str) {
    match dimension {
        Dimension::Dimensionless => ("4.5", "> 6"),
        Dimension::Time => ("40 d", "< 1 d"),
        Dimension::Concentration => ("0.5 mg/L", "< 0.01 mg/L"),
        Dimension::VolumePerMass => ("1500 L/kg", "< 10 L/kg"),
        Dimension::Pressure => ("0.02 Pa", "< 1E-6 Pa"),
        Dimension::Temperature => ("80 °C", "< 20 °C"),
        Dimension::MolarMass => ("250 g/mol", "> 1000 g/mol"),
        Dimension::Henry => ("1.5 Pa m3/mol", "< 0.01 Pa m3/mol"),
        Dimension::Percent => ("12 %", "< 0.1 %"),
        Dimension::Tonnage => ("25 t/a", "< 1 t/a"),
        Dimension::MolarEnergy => ("65 kJ/mol", "< 65 kJ/mol"),
    }
}

/// The quantity of a cell and what its remarks say; `None` where the cell says that there is none.
pub(super) fn read_quantity(
    content: &CellContent,
    column: &Column,
    expected: Expected,
    molar_mass: Option<f64>,
) -> Result<Option<(Quantity, Said)>, CellFaultKind> {
    let default_unit = column.unit.unwrap_or_else(|| expected.dimension.canonical());
    let read_as = ReadAs { dimension: expected.dimension, default_unit, decimal: column.decimal, molar_mass };
    let read = match content {
        CellContent::Number(number) => {
            quantity_of_number(*number, read_as).map(|quantity| (quantity, Said::default()))
        }
        CellContent::Text(text) => {
            parse_quantity(text, read_as).map(|parsed| (parsed.quantity, Said::in_remarks(&parsed.remarks)))
        }
        CellContent::DateTime(_) => return Err(CellFaultKind::BecameDate { what: expected.what }),
        CellContent::Boolean(_) => return Err(expected.not_a()),
        CellContent::Empty => return Ok(None),
        CellContent::Error(_) => return Err(CellFaultKind::SheetError),
    };
    match read {
        Ok((quantity, said)) => {
            check_sense(quantity.interval, expected)?;
            Ok(Some((quantity, said)))
        }
        Err(QuantityFault::NoValue) => Ok(None),
        // `miscible` is how the trade writes it; it holds no number, and nothing is lost by saying so to nobody.
        Err(QuantityFault::WordOnly) if expected.what == Property::WaterSolubility.title() => Ok(None),
        Err(fault) => Err(word_fault(fault, expected)),
    }
}

fn word_fault(fault: QuantityFault, expected: Expected) -> CellFaultKind {
    let Expected { what, example, .. } = expected;
    match fault {
        QuantityFault::NoValue | QuantityFault::NoNumber => expected.not_a(),
        QuantityFault::WordOnly => CellFaultKind::WordNoNumber { what, example: expected.bound_example },
        QuantityFault::BadNumber => CellFaultKind::BadNumber { example },
        QuantityFault::SeveralValues => CellFaultKind::SeveralValues { what },
        QuantityFault::UnknownUnit(word) => {
            let nearest = nearest(&word.to_lowercase(), unit_words(expected.dimension));
            CellFaultKind::UnknownUnit { word, nearest, example }
        }
        QuantityFault::WrongDimension(unit) => CellFaultKind::WrongUnit { unit, what, example },
        QuantityFault::NeedsMolarMass => CellFaultKind::NeedsMolarMass,
        QuantityFault::BadRange => CellFaultKind::BadRange { what },
        QuantityFault::TooLong => CellFaultKind::TooLong,
    }
}

fn check_sense(interval: Interval, expected: Expected) -> Result<(), CellFaultKind> {
    let what = expected.what;
    let ends = [interval.low().number(), interval.high().number()];
    let (least, most) = expected.sensible;
    let below_zero = |end: &f64| *end < 0.0;
    if expected.sign != Sign::Any && ends.iter().flatten().any(below_zero) {
        return Err(CellFaultKind::Negative { what });
    }
    let reaches_zero_only = match interval.high() {
        Bound::Included(high) | Bound::Excluded(high) => high <= 0.0,
        Bound::Unbounded => false,
    };
    if expected.sign == Sign::Positive && reaches_zero_only {
        return Err(CellFaultKind::Zero { what, example: expected.bound_example });
    }
    if ends.iter().flatten().any(|end| *end < least || *end > most) {
        return Err(CellFaultKind::OutOfSense { what });
    }
    Ok(())
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
