//! The properties that rules, relations and cells speak of.

use crate::quantity::{Dimension, Unit};

/// A compartment of the environment in which a half-life was measured.
#[derive(Debug, Clone, Copy, PartialEq, Eq, PartialOrd, Ord, Hash)]
pub enum Compartment {
    /// Fresh or estuarine water.
    FreshWater,
    /// Marine water.
    MarineWater,
    /// Water, not said which.
    Water,
    /// Fresh water or estuarine sediment.
    FreshSediment,
    /// Marine sediment.
    MarineSediment,
    /// Sediment, not said which.
    Sediment,
    /// Soil.
    Soil,
    /// Air.
    Air,
}

/// A numeric property of a substance.
#[derive(Debug, Clone, Copy, PartialEq, Eq, PartialOrd, Ord, Hash)]
pub enum Property {
    /// log10 of the octanol-water partition coefficient of the neutral form.
    LogKow,
    /// log10 of the octanol-water distribution ratio at a pH.
    LogD,
    /// log10 of the octanol-air partition coefficient.
    LogKoa,
    /// Solubility in water.
    WaterSolubility,
    /// Melting point.
    MeltingPoint,
    /// Boiling point.
    BoilingPoint,
    /// Vapour pressure.
    VapourPressure,
    /// Henry's law constant.
    HenryConstant,
    /// pKa of the (strongest) acid group.
    PkaAcid,
    /// pKa of the conjugate acid of the (strongest) base group.
    PkaBase,
    /// Organic carbon-water partition coefficient.
    Koc,
    /// Bioconcentration factor in aquatic species, wet weight.
    Bcf,
    /// Bioaccumulation factor.
    Baf,
    /// Biomagnification factor.
    Bmf,
    /// Trophic magnification factor.
    Tmf,
    /// Degradation half-life in a compartment.
    HalfLife(Compartment),
    /// Half-life of hydrolysis; supporting only.
    HydrolysisHalfLife,
    /// Half-life of photolysis; supporting only.
    PhotolysisHalfLife,
    /// Dissipation half-life; supporting only.
    DissipationHalfLife,
    /// Long-term NOEC or EC10 in aquatic organisms.
    LongTermToxicity,
    /// Acute L(E)C50 in aquatic organisms.
    AcuteToxicity,
    /// Molar mass.
    MolarMass,
}

impl Property {
    /// Every property, in the order in which reports list them.
    pub const ALL: [Self; 29] = [
        Self::LogKow,
        Self::LogD,
        Self::LogKoa,
        Self::WaterSolubility,
        Self::MeltingPoint,
        Self::BoilingPoint,
        Self::VapourPressure,
        Self::HenryConstant,
        Self::PkaAcid,
        Self::PkaBase,
        Self::Koc,
        Self::Bcf,
        Self::Baf,
        Self::Bmf,
        Self::Tmf,
        Self::HalfLife(Compartment::FreshWater),
        Self::HalfLife(Compartment::MarineWater),
        Self::HalfLife(Compartment::Water),
        Self::HalfLife(Compartment::FreshSediment),
        Self::HalfLife(Compartment::MarineSediment),
        Self::HalfLife(Compartment::Sediment),
        Self::HalfLife(Compartment::Soil),
        Self::HalfLife(Compartment::Air),
        Self::HydrolysisHalfLife,
        Self::PhotolysisHalfLife,
        Self::DissipationHalfLife,
        Self::LongTermToxicity,
        Self::AcuteToxicity,
        Self::MolarMass,
    ];

    /// The name in rule files.
    pub fn id(self) -> &'static str {
        match self {
            Self::LogKow => "log-kow",
            Self::LogD => "log-d",
            Self::LogKoa => "log-koa",
            Self::WaterSolubility => "water-solubility",
            Self::MeltingPoint => "melting-point",
            Self::BoilingPoint => "boiling-point",
            Self::VapourPressure => "vapour-pressure",
            Self::HenryConstant => "henry-constant",
            Self::PkaAcid => "pka-acid",
            Self::PkaBase => "pka-base",
            Self::Koc => "koc",
            Self::Bcf => "bcf",
            Self::Baf => "baf",
            Self::Bmf => "bmf",
            Self::Tmf => "tmf",
            Self::HalfLife(Compartment::FreshWater) => "half-life-fresh-water",
            Self::HalfLife(Compartment::MarineWater) => "half-life-marine-water",
            Self::HalfLife(Compartment::Water) => "half-life-water",
            Self::HalfLife(Compartment::FreshSediment) => "half-life-fresh-sediment",
            Self::HalfLife(Compartment::MarineSediment) => "half-life-marine-sediment",
            Self::HalfLife(Compartment::Sediment) => "half-life-sediment",
            Self::HalfLife(Compartment::Soil) => "half-life-soil",
            Self::HalfLife(Compartment::Air) => "half-life-air",
            Self::HydrolysisHalfLife => "half-life-hydrolysis",
            Self::PhotolysisHalfLife => "half-life-photolysis",
            Self::DissipationHalfLife => "half-life-dissipation",
            Self::LongTermToxicity => "long-term-toxicity",
            Self::AcuteToxicity => "acute-toxicity",
            Self::MolarMass => "molar-mass",
        }
    }

    /// The property a rule file names.
    pub fn from_id(id: &str) -> Option<Self> {
        Self::ALL.into_iter().find(|property| property.id() == id)
    }

    /// How a sentence names it.
    pub fn title(self) -> &'static str {
        match self {
            Self::LogKow => "log Kow",
            Self::LogD => "log D",
            Self::LogKoa => "log Koa",
            Self::WaterSolubility => "water solubility",
            Self::MeltingPoint => "melting point",
            Self::BoilingPoint => "boiling point",
            Self::VapourPressure => "vapour pressure",
            Self::HenryConstant => "Henry constant",
            Self::PkaAcid => "pKa (acid)",
            Self::PkaBase => "pKa (base)",
            Self::Koc => "Koc",
            Self::Bcf => "BCF",
            Self::Baf => "BAF",
            Self::Bmf => "BMF",
            Self::Tmf => "TMF",
            Self::HalfLife(Compartment::FreshWater) => "half-life in fresh water",
            Self::HalfLife(Compartment::MarineWater) => "half-life in marine water",
            Self::HalfLife(Compartment::Water) => "half-life in water",
            Self::HalfLife(Compartment::FreshSediment) => "half-life in fresh water sediment",
            Self::HalfLife(Compartment::MarineSediment) => "half-life in marine sediment",
            Self::HalfLife(Compartment::Sediment) => "half-life in sediment",
            Self::HalfLife(Compartment::Soil) => "half-life in soil",
            Self::HalfLife(Compartment::Air) => "half-life in air",
            Self::HydrolysisHalfLife => "hydrolysis half-life",
            Self::PhotolysisHalfLife => "photolysis half-life",
            Self::DissipationHalfLife => "dissipation half-life",
            Self::LongTermToxicity => "long-term NOEC or EC10",
            Self::AcuteToxicity => "acute L(E)C50",
            Self::MolarMass => "molar mass",
        }
    }

    /// What its numbers measure.
    pub fn dimension(self) -> Dimension {
        match self {
            Self::LogKow
            | Self::LogD
            | Self::LogKoa
            | Self::PkaAcid
            | Self::PkaBase
            | Self::Bmf
            | Self::Tmf => Dimension::Dimensionless,
            Self::WaterSolubility | Self::LongTermToxicity | Self::AcuteToxicity => Dimension::Concentration,
            Self::MeltingPoint | Self::BoilingPoint => Dimension::Temperature,
            Self::VapourPressure => Dimension::Pressure,
            Self::HenryConstant => Dimension::Henry,
            Self::Koc | Self::Bcf | Self::Baf => Dimension::VolumePerMass,
            Self::HalfLife(_)
            | Self::HydrolysisHalfLife
            | Self::PhotolysisHalfLife
            | Self::DissipationHalfLife => Dimension::Time,
            Self::MolarMass => Dimension::MolarMass,
        }
    }

    /// The unit assumed where neither cell nor header names one.
    pub fn default_unit(self) -> Unit {
        self.dimension().canonical()
    }

    /// Whether its numbers are logarithms already, so that an SD in log units adds to them directly.
    pub fn is_logarithmic(self) -> bool {
        match self {
            Self::LogKow | Self::LogD | Self::LogKoa | Self::PkaAcid | Self::PkaBase => true,
            Self::WaterSolubility
            | Self::MeltingPoint
            | Self::BoilingPoint
            | Self::VapourPressure
            | Self::HenryConstant
            | Self::Koc
            | Self::Bcf
            | Self::Baf
            | Self::Bmf
            | Self::Tmf
            | Self::HalfLife(_)
            | Self::HydrolysisHalfLife
            | Self::PhotolysisHalfLife
            | Self::DissipationHalfLife
            | Self::LongTermToxicity
            | Self::AcuteToxicity
            | Self::MolarMass => false,
        }
    }

    /// Whether a number of this property can be negative.
    pub fn may_be_negative(self) -> bool {
        self.is_logarithmic() || self.dimension() == Dimension::Temperature
    }
}

#[cfg(test)]
mod tests {
    use super::Property;
    use std::collections::BTreeSet;

    #[test]
    fn every_property_is_found_by_its_name_in_rule_files() {
        let ids: BTreeSet<_> = Property::ALL.iter().map(|property| property.id()).collect();
        assert_eq!(ids.len(), Property::ALL.len());
        for property in Property::ALL {
            assert_eq!(Property::from_id(property.id()), Some(property));
        }
        assert_eq!(Property::from_id("half-life-ice"), None);
    }
}
