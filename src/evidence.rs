//! What is known of a substance, and what can be estimated from it: each value with its interval, basis, error and
//! origin.
//!
//! It gathers and ranks; it holds nothing against a limit and adjusts nothing to a rulebook's conditions.

mod gather;

use std::collections::BTreeMap;

pub use gather::gather_evidence;

use crate::quantity::{Interval, Unit};
use crate::substance::{Basis, Conditions, Property};
use crate::workbook::CellRef;

/// Where a value comes from.
#[derive(Debug, Clone, PartialEq)]
pub enum Origin {
    /// A cell of the inventory.
    Cell(CellRef),
    /// A relation applied to a log Kow.
    Relation {
        /// Index into the rule set's relations.
        relation: usize,
        /// The log Kow that entered.
        log_kow: Interval,
        /// Its standard deviation.
        log_kow_sd: Option<f64>,
        /// Where the log Kow stands.
        log_kow_cell: CellRef,
        /// The other relations in domain: index and log10 of their value.
        others: Vec<(usize, f64)>,
        /// The lowest line that could apply, less one SD: index and log10 of its value.
        low_side: Option<(usize, f64)>,
    },
}

/// Whether a value counts in full.
#[derive(Debug, Clone, Copy, PartialEq, Eq, PartialOrd, Ord, Hash)]
pub enum Standing {
    /// It may decide.
    Full,
    /// Reliability 3 or 4: supporting steps only.
    SupportingOnly,
}

impl Standing {
    /// The standing that a reliability score leaves.
    pub fn of_reliability(score: Option<u8>) -> Self {
        match score {
            Some(score) if score >= 3 => Self::SupportingOnly,
            Some(_) | None => Self::Full,
        }
    }
}

/// A value of a property.
#[derive(Debug, Clone, PartialEq)]
pub struct Evidence {
    /// The property.
    pub property: Property,
    /// What the value may be, in the canonical unit.
    pub interval: Interval,
    /// Standard deviation in log units; none for open intervals and ranges.
    pub sd: Option<f64>,
    /// How it is known.
    pub basis: Basis,
    /// Where it comes from.
    pub origin: Origin,
    /// Whether it counts in full.
    pub standing: Standing,
    /// Under which conditions it was obtained.
    pub conditions: Conditions,
    /// The text of the cell; for an estimate, empty.
    pub reported: String,
    /// The unit in which the cell writes it; for an estimate, that of the interval.
    pub unit: Unit,
    /// The interval was opened upward because the substance was partly ionised when log Kow was measured.
    pub lower_bound_by_ionisation: Option<f64>,
}

/// All evidence on one substance.
#[derive(Debug, Clone, PartialEq, Default)]
pub struct EvidenceSet {
    by_property: BTreeMap<Property, Vec<Evidence>>,
}

impl EvidenceSet {
    /// The values of a property, those of the row in order of column, then estimates.
    pub fn of(&self, property: Property) -> &[Evidence] {
        self.by_property.get(&property).map_or(&[], Vec::as_slice)
    }

    /// Every value.
    pub fn iter(&self) -> impl Iterator<Item = &Evidence> {
        self.by_property.values().flatten()
    }

    /// The log Kow used for bioaccumulation: of the best basis, the highest.
    pub fn log_kow_used(&self) -> Option<&Evidence> {
        best_ranked(self.of(Property::LogKow))
            .max_by(|one, other| one.upper_value().total_cmp(&other.upper_value()))
    }

    fn push(&mut self, evidence: Evidence) {
        self.by_property.entry(evidence.property).or_default().push(evidence);
    }
}

impl Evidence {
    /// The value at its high end, infinite where that is open.
    pub fn upper_value(&self) -> f64 {
        self.interval.high().number().unwrap_or(f64::INFINITY)
    }

    /// The value at its low end, minus infinity where that is open.
    pub fn lower_value(&self) -> f64 {
        self.interval.low().number().unwrap_or(f64::NEG_INFINITY)
    }
}

/// The values of full standing that share the best basis.
pub fn best_ranked(values: &[Evidence]) -> impl Iterator<Item = &Evidence> {
    let full = |evidence: &&Evidence| evidence.standing == Standing::Full;
    let best = values.iter().filter(full).map(|evidence| evidence.basis).min();
    values.iter().filter(full).filter(move |evidence| Some(evidence.basis) == best)
}
