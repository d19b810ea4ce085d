//! What a numeric column promises: dimension, sign, sensible size, and what to write instead.

use crate::fault::CellFaultKind;
use crate::quantity::{Dimension, Scale, Unit};
use crate::substance::Property;

/// What a numeric column promises.
#[derive(Debug, Clone, Copy)]
pub(super) struct Expected {
    pub(super) what: &'static str,
    pub(super) example: &'static str,
    pub(super) bound_example: &'static str,
    pub(super) dimension: Dimension,
    pub(super) sign: Sign,
    pub(super) sensible: (f64, f64),
    /// The property, where it is one.
    pub(super) property: Option<Property>,
}

/// Which numbers a field can have.
#[derive(Debug, Clone, Copy, PartialEq, Eq)]
pub(super) enum Sign {
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
        property: None,
    };

    pub(super) const fn percent(what: &'static str, example: &'static str) -> Self {
        Self {
            what,
            example,
            bound_example: "< 0.1 %",
            dimension: Dimension::Percent,
            sign: Sign::NotNegative,
            sensible: (0.0, 100.0),
            property: None,
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
            property: None,
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
            property: None,
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
            property: Some(property),
        }
    }

    /// Whether logarithms are expected; a column of log Koc says so by its unit.
    pub(super) fn scale(self, default_unit: Unit) -> Scale {
        let logarithmic = self.property.is_some_and(Property::is_logarithmic);
        if logarithmic || default_unit == Unit::LogLitrePerKilogram {
            Scale::Logarithm
        } else {
            Scale::Linear
        }
    }

    /// How to write the value itself where its logarithm is expected.
    pub(super) fn unlogged(self) -> Option<&'static str> {
        match self.property? {
            Property::LogKow => Some("Kow = 50000"),
            Property::LogKoa => Some("Koa = 5E8"),
            Property::LogD => Some("D = 50000"),
            Property::Koc => Some("Koc = 1500"),
            Property::Bcf => Some("BCF = 1500"),
            Property::Baf => Some("BAF = 1500"),
            _ => None,
        }
    }

    /// How to write the logarithm where the value itself is expected, or where it is not clear which is meant.
    pub(super) fn logged(self) -> Option<&'static str> {
        match self.property? {
            Property::LogKow => Some("log Kow = 4.5"),
            Property::LogKoa => Some("log Koa = 8.7"),
            Property::LogD => Some("log D = 4.5"),
            Property::Koc => Some("log Koc = 3.2"),
            Property::Bcf => Some("log BCF = 3.2"),
            Property::Baf => Some("log BAF = 3.2"),
            Property::Bmf => Some("log BMF = -0.3"),
            Property::Tmf => Some("log TMF = -0.3"),
            _ => None,
        }
    }

    /// The fault of a cell that is no such value.
    pub(super) fn not_a(self) -> CellFaultKind {
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
