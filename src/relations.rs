//! Published equations between properties, with their domain and error, and the standard deviation of a value of which
//! only the basis is known.
//!
//! Equations and their numbers live in `rules/relations.toml`; this module applies them. It ranks and judges nothing.

mod estimate;

pub use estimate::{Estimate, Ionisation, LogKow};

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
    /// The property; half-lives by their family, see [`Property::id`] without the compartment.
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

impl Relations {
    /// The default standard deviation of a value, log units; 0.3 where no line of the file fits.
    pub fn default_sd(&self, property: Property, basis: Basis, value: f64) -> f64 {
        const WHERE_NOTHING_FITS: f64 = 0.3;
        let family = family(property);
        self.default_sds
            .iter()
            .find(|line| {
                (line.property == property.id() || line.property == family || line.property == "any")
                    && (line.bases.is_empty() || line.bases.contains(&basis))
                    && line.above.is_none_or(|above| value > above)
            })
            .map_or(WHERE_NOTHING_FITS, |line| line.sd)
    }
}

/// The name under which a group of properties shares a default standard deviation.
fn family(property: Property) -> &'static str {
    match property {
        Property::HalfLife(_)
        | Property::HydrolysisHalfLife
        | Property::PhotolysisHalfLife
        | Property::DissipationHalfLife => "half-life",
        Property::LongTermToxicity | Property::AcuteToxicity => "toxicity",
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
        | Property::MolarMass => property.id(),
    }
}
