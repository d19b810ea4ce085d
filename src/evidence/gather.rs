//! From the row's readings to evidence, and from its log Kow to estimates.

use crate::evidence::{Evidence, EvidenceSet, Origin, Standing, best_ranked};
use crate::quantity::{Bound, Interval, Unit};
use crate::relations::{Estimate, LogKow, Relations};
use crate::substance::{Basis, Conditions, Property, Reading, Substance};

/// Everything the row says and everything the relations make of it.
pub fn gather_evidence(substance: &Substance, relations: &Relations) -> EvidenceSet {
    let mut evidence = EvidenceSet::default();
    for (property, readings) in &substance.readings {
        for reading in readings {
            evidence.push(from_reading(*property, reading, substance, relations));
        }
    }
    for (property, end) in
        [(Property::Bcf, End::High), (Property::Koc, End::Low), (Property::AcuteToxicity, End::High)]
    {
        if let Some(estimate) = estimate(property, end, &evidence, substance, relations) {
            evidence.push(estimate);
        }
    }
    evidence
}

fn from_reading(
    property: Property,
    reading: &Reading,
    substance: &Substance,
    relations: &Relations,
) -> Evidence {
    let mut interval = reading.quantity.interval;
    let mut lower_bound_by_ionisation = None;
    if property == Property::LogKow
        && let Some(neutral) = neutral_share(reading, substance)
        && neutral < LEAST_NEUTRAL_SHARE
        && let Ok(opened) = Interval::new(interval.low(), Bound::Unbounded)
    {
        interval = opened;
        lower_bound_by_ionisation = Some(neutral);
    }
    Evidence {
        property,
        interval,
        sd: interval.single().map(|value| standard_deviation(property, reading, value, relations)),
        basis: reading.basis,
        origin: Origin::Cell(reading.cell.clone()),
        standing: Standing::of_reliability(reading.conditions.reliability),
        conditions: reading.conditions.clone(),
        reported: reading.quantity.reported.clone(),
        unit: reading.quantity.unit,
        lower_bound_by_ionisation,
    }
}

/// Below this neutral share a measured log Kow is only a lower bound of that of the neutral form (common practice).
const LEAST_NEUTRAL_SHARE: f64 = 0.9;

/// The least share of the neutral form at the pH of the measurement that the row's pKa leave possible, where it gives
/// that pH and a pKa.
///
/// Acid 1 / (1 + 10^(pH - pKa)), base 1 / (1 + 10^(pKa - pH)): the mass action law for one group.
fn neutral_share(reading: &Reading, substance: &Substance) -> Option<f64> {
    let ph = reading.conditions.ph?;
    let intervals =
        |property| substance.readings_of(property).iter().map(|reading| reading.quantity.interval);
    // An open end leaves room for a group that is ionised altogether.
    let acids = intervals(Property::PkaAcid)
        .map(|pka| pka.low().number().map_or(0.0, |pka| 1.0 / (1.0 + 10f64.powf(ph - pka))));
    let bases = intervals(Property::PkaBase)
        .map(|pka| pka.high().number().map_or(0.0, |pka| 1.0 / (1.0 + 10f64.powf(pka - ph))));
    acids.chain(bases).min_by(f64::total_cmp)
}

/// The SD in log units: as written with `±`, else the default, doubled for `~` and `ca.`.
fn standard_deviation(property: Property, reading: &Reading, value: f64, relations: &Relations) -> f64 {
    // No value is known without error: an SD of zero is none that was found.
    let written = reading
        .quantity
        .written_sd
        .filter(|sd| *sd > 0.0)
        .and_then(|sd| log_sd(property, reading.quantity.unit, sd, value));
    written.unwrap_or_else(|| {
        let default = relations.default_sd(property, reading.basis, value);
        if reading.quantity.approximate { 2.0 * default } else { default }
    })
}

fn log_sd(property: Property, unit: Unit, written: f64, value: f64) -> Option<f64> {
    if unit == Unit::Ratio {
        // `Kow = 50000 ± 5000`: the error is that of the ratio.
        return Some(written / 10f64.powf(value) / std::f64::consts::LN_10);
    }
    if property.is_logarithmic() || matches!(unit, Unit::LogLitrePerKilogram | Unit::LogarithmOfRatio) {
        return Some(written);
    }
    // A standard deviation converts like the value itself, since every unit of these properties is a plain factor.
    let converted = unit.to_canonical(written, None)?;
    (value > 0.0).then(|| converted / value / std::f64::consts::LN_10)
}

/// Which end of several log Kow values points to more concern for the target.
#[derive(Debug, Clone, Copy, PartialEq, Eq)]
enum End {
    Low,
    High,
}

impl End {
    fn of(self, interval: Interval) -> Option<f64> {
        match self {
            Self::Low => interval.low().number(),
            Self::High => interval.high().number(),
        }
    }
}

fn estimate(
    property: Property,
    end: End,
    known: &EvidenceSet,
    substance: &Substance,
    relations: &Relations,
) -> Option<Evidence> {
    let mut values: Vec<&Evidence> = best_ranked(known.of(Property::LogKow)).collect();
    match end {
        End::High => {
            values.reverse();
            values.sort_by(|one, other| other.upper_value().total_cmp(&one.upper_value()));
        }
        End::Low => values.sort_by(|one, other| one.lower_value().total_cmp(&other.lower_value())),
    }
    let at = |interval, sd| relations.estimate(property, LogKow { interval, sd });
    let (place, log_kow, estimate) = values
        .iter()
        .enumerate()
        .find_map(|(place, log_kow)| Some((place, *log_kow, at(log_kow.interval, log_kow.sd)?)))?;
    let relation = relations.relations.get(estimate.leading)?;
    let shift = if relation.molar { molar_shift(substance)? } else { 0.0 };
    let Origin::Cell(log_kow_cell) = &log_kow.origin else {
        return None;
    };
    let Estimate { leading, log_value, sd, others, low_side } = estimate;
    let (log_value, sd) = match values.get(..place) {
        None | Some([]) => (log_value, sd),
        Some(passed_over) => {
            let bounds = passed_over.iter().map(|log_kow| {
                let nearest = end.of(log_kow.interval)?;
                at(Interval::point(nearest).ok()?, None)?.log_value.single()
            });
            let bounds: Option<Vec<f64>> = bounds.collect();
            (opened(end, property, log_value, bounds.as_deref())?, None)
        }
    };
    Some(Evidence {
        property,
        interval: log_value.map_increasing(|log| 10f64.powf(log + shift)).ok()?,
        sd,
        basis: Basis::Estimated,
        origin: Origin::Relation {
            relation: leading,
            log_kow: log_kow.interval,
            log_kow_sd: log_kow.sd,
            log_kow_cell: log_kow_cell.clone(),
            others: others.into_iter().map(|(index, value)| (index, value + shift)).collect(),
            low_side: low_side.map(|(index, value)| (index, value + shift)),
        },
        standing: Standing::Full,
        conditions: Conditions::default(),
        reported: String::new(),
        unit: property.default_unit(),
        lower_bound_by_ionisation: None,
    })
}

/// A log Kow of more concern that no relation takes, such as `> 5`, widens the estimate on its side of concern: to what a
/// relation makes of the end that is known, or without bound where none does. It may then fire and does not clear.
fn opened(end: End, property: Property, log_value: Interval, bounds: Option<&[f64]>) -> Option<Interval> {
    let far = |pick: fn(f64, f64) -> f64, start: Option<f64>| match (bounds, start) {
        (Some(bounds), Some(start)) => Bound::Included(bounds.iter().copied().fold(start, pick)),
        (None, _) | (_, None) => Bound::Unbounded,
    };
    match (property, end) {
        // A high log Kow means a high BCF, but only up to the top of its curve.
        (Property::Bcf, _) => Interval::new(log_value.low(), Bound::Unbounded).ok(),
        // Low log Kow, little sorption; high log Kow, low effect concentrations: both are of concern downward.
        (_, End::Low | End::High) => {
            Interval::new(far(f64::min, log_value.low().number()), log_value.high()).ok()
        }
    }
}

/// log10 of the factor from mol/L to mg/L, where the row gives the molar mass.
fn molar_shift(substance: &Substance) -> Option<f64> {
    let molar_mass =
        substance.readings_of(Property::MolarMass).iter().find_map(|reading| reading.quantity.single())?;
    (molar_mass > 0.0).then(|| molar_mass.log10() + 3.0)
}
