//! Published equations between properties, with their domain and error, and the standard deviation of a value of which
//! only the basis is known.
//!
//! Equations and their numbers live in `rules/relations.toml`; this module applies them. It ranks and judges nothing.

mod estimate;
mod file;

pub use estimate::{Estimate, LogKow};
pub(crate) use file::read_relations;

use crate::quantity::Interval;
use crate::rules::Checked;
use crate::substance::{Basis, Property};

/// The relations of a run.
#[derive(Debug, Clone, PartialEq)]
pub struct Relations {
    /// The equations, in file order: the first whose domain holds leads.
    pub relations: Vec<Relation>,
    /// Default standard deviations, in file order: the first that fits counts.
    pub default_sds: Vec<DefaultSd>,
}

/// The standard deviation of a value for which no default is given, log units (assumed).
const ASSUMED_SD: f64 = 0.3;

impl Relations {
    /// The standard deviation, in log units, of a value of which only property and basis are known.
    pub fn default_sd(&self, property: Property, basis: Basis, value: f64) -> f64 {
        self.default_sds
            .iter()
            .find(|default| default.holds_for(property, basis, value))
            .map_or(ASSUMED_SD, |default| default.sd)
    }
}

/// A published equation: log10 of `to` as a polynomial of `from`.
#[derive(Debug, Clone, PartialEq)]
pub struct Relation {
    /// Name in rule files, for example `veith-1979`.
    pub id: String,
    /// Author, year, journal.
    pub citation: String,
    /// The property it starts from.
    pub from: Property,
    /// The property it gives.
    pub to: Property,
    /// Coefficients of `from` to the power 0, 1, 2, ...
    pub coefficients: Vec<f64>,
    /// Values of `from` for which it was made.
    pub domain: Interval,
    /// Its standard deviation, log units.
    pub sd: f64,
    /// How sure its coefficients are.
    pub checked: Checked,
    /// Which side of the estimates it serves.
    pub side: Side,
    /// The substances it was made for.
    pub class: String,
    /// The result is in mol/L and becomes mg/L with the molar mass.
    pub molar: bool,
}

/// Which side of the estimates a relation serves.
#[derive(Debug, Clone, Copy, PartialEq, Eq, PartialOrd, Ord, Hash)]
pub enum Side {
    /// It may lead; the others in domain show the spread.
    Central,
    /// A line that could apply while the class of the substance is unknown: it limits what an estimate may clear.
    Class,
    /// A line for the ionised form: it limits what an estimate may clear while ionisation is unknown or known to occur.
    Ionised,
}

/// The standard deviation of a value of which only property and basis are known.
#[derive(Debug, Clone, PartialEq)]
pub struct DefaultSd {
    /// The property by its [`Property::id`]; `half-life` for every half-life, `any` for every property.
    pub property: String,
    /// The bases it holds for; all when empty.
    pub bases: Vec<Basis>,
    /// It holds above this value only.
    pub above: Option<f64>,
    /// Log units.
    pub sd: f64,
    /// Where it comes from, or `assumed`.
    pub source: String,
}

impl DefaultSd {
    fn holds_for(&self, property: Property, basis: Basis, value: f64) -> bool {
        let family = match property {
            Property::HalfLife(_)
            | Property::HydrolysisHalfLife
            | Property::PhotolysisHalfLife
            | Property::DissipationHalfLife => "half-life",
            Property::LogKow
            | Property::LogD
            | Property::LogKoa
            | Property::WaterSolubility
            | Property::MeltingPoint
            | Property::BoilingPoint
            | Property::VapourPressure
            | Property::HenryConstant
            | Property::PkaAcid
            | Property::PkaBase
            | Property::Koc
            | Property::Bcf
            | Property::Baf
            | Property::Bmf
            | Property::Tmf
            | Property::LongTermToxicity
            | Property::AcuteToxicity
            | Property::MolarMass => property.id(),
        };
        let names_it = self.property == "any" || self.property == family || self.property == property.id();
        let knows_it = self.bases.is_empty() || self.bases.contains(&basis);
        names_it && knows_it && self.above.is_none_or(|above| value > above)
    }
}
