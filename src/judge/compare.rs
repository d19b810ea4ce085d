//! One value against one limit: the outcome, the adjustment made first, the margin, the closeness and the chance.

use crate::evidence::{Evidence, Origin};
use crate::judge::{Adjustment, Closeness, Context, Used};
use crate::quantity::{Bound, Comparison, Interval, Outcome, chance_beyond};
use crate::rules::{HalfLifeReference, Limit, Test};
use crate::substance::{Compartment, Property};

/// The value as it is compared under the rulebook, and what was done to it.
pub(crate) fn as_compared(context: Context, evidence: &Evidence) -> (Interval, Option<Adjustment>) {
    let unchanged = (evidence.interval, None);
    match (evidence.property, context.rulebook.half_life_at, context.rulebook.bcf_at_lipid) {
        (Property::HalfLife(compartment), Some(reference), _) if compartment != Compartment::Air => {
            at_temperature(evidence, reference).unwrap_or(unchanged)
        }
        (Property::Bcf, _, Some(lipid)) => at_lipid(evidence, lipid).unwrap_or(unchanged),
        _ => unchanged,
    }
}

/// No test of degradation is run in ice: a lower number is no test temperature, °C (common practice).
const COLDEST_TEST: f64 = 0.0;

fn at_temperature(
    evidence: &Evidence,
    reference: HalfLifeReference,
) -> Option<(Interval, Option<Adjustment>)> {
    let to = reference.temperature;
    if let Some(from) = evidence.conditions.temperature.filter(|from| *from >= COLDEST_TEST) {
        let factor = arrhenius_factor(reference.activation_energy, from, to);
        let moved = evidence.interval.map_increasing(|days| days * factor).ok()?;
        return Some((moved, Some(Adjustment::HalfLifeTemperature { from, to, factor })));
    }
    let from = reference.unstated_temperature;
    let factor = arrhenius_factor(reference.activation_energy, from, to);
    let longer = evidence.interval.map_increasing(|days| days * factor).ok()?;
    let widened = Interval::new(evidence.interval.low(), longer.high()).ok()?;
    Some((widened, Some(Adjustment::HalfLifeTemperatureUnstated { from, to, factor })))
}

/// How many times longer a half-life is at `to` than at `from` (°C), by the Arrhenius equation.
pub(crate) fn arrhenius_factor(activation_energy: f64, from: f64, to: f64) -> f64 {
    // The molar gas constant in kJ/(mol K), CODATA.
    const GAS_CONSTANT: f64 = 0.008_314_462_618;
    const KELVIN: f64 = 273.15;
    (activation_energy / GAS_CONSTANT * (1.0 / (to + KELVIN) - 1.0 / (from + KELVIN))).exp()
}

/// A lower lipid content may be a fraction: a cell formatted as a percentage holds 0.05 for 5 % (assumed), %.
const LEANEST_FISH: f64 = 1.0;

/// BCF at the rulebook's lipid content: BCF x lipid / lipid of the fish (OECD 305).
///
/// The conversion is practice and not in the instruments' text, so it may fire a test and does not clear one that the
/// value as reported does not clear: a reported value above the converted one widens the interval.
fn at_lipid(evidence: &Evidence, to: f64) -> Option<(Interval, Option<Adjustment>)> {
    let from = evidence.conditions.lipid.filter(|lipid| *lipid > 0.0)?;
    let at = |percent: f64| evidence.interval.map_increasing(|bcf| bcf * to / percent).ok();
    let moved = at(from)?;
    if from < LEANEST_FISH {
        return Some((moved.hull(at(from * 100.0)?), Some(Adjustment::LipidDoubtful { from, to })));
    }
    let compared = if from > to { moved.hull(evidence.interval) } else { moved };
    Some((compared, Some(Adjustment::Lipid { from, to })))
}

/// How an interval stands to the limit of a test.
pub(crate) fn outcome_of(test: &Test, interval: Interval) -> Outcome {
    match &test.limit {
        Limit::Number { comparison, value } => {
            let outcome = interval.compare(*comparison, *value);
            let certainly_clear = test
                .clear_below
                .is_none_or(|below| interval.compare(Comparison::Below, below) == Outcome::Fired);
            if outcome == Outcome::Clear && !certainly_clear { Outcome::Undecided } else { outcome }
        }
        Limit::Between { low, high } => {
            match (interval.compare(Comparison::AtLeast, *low), interval.compare(Comparison::Below, *high)) {
                (Outcome::Fired, Outcome::Fired) => Outcome::Fired,
                (Outcome::Clear, _) | (_, Outcome::Clear) => Outcome::Clear,
                (Outcome::Fired | Outcome::Undecided, Outcome::Fired | Outcome::Undecided) => {
                    Outcome::Undecided
                }
            }
        }
        // Validation refuses words as the limit of a number.
        Limit::AnyOfWords(_) | Limit::Is(_) => Outcome::Undecided,
    }
}

/// Holds a value against a test; `outcome` decides how the compared interval stands.
pub(crate) fn hold_against(
    context: Context,
    test: &Test,
    index: usize,
    evidence: &Evidence,
    outcome: impl Fn(Interval) -> Outcome,
) -> Used {
    let (compared, adjustment) = as_compared(context, evidence);
    let outcome = outcome(compared);
    let margin = margin(test, evidence.property, compared);
    let within_one_sd = nearest_distance(test, evidence.property, compared)
        .zip(evidence.sd)
        .is_some_and(|(distance, sd)| distance <= sd);
    Used {
        property: evidence.property,
        index,
        compared,
        adjustment,
        outcome,
        closeness: Closeness::from_condition(outcome == Outcome::Undecided || within_one_sd),
        margin,
        chance: chance(context, test, evidence, compared),
    }
}

fn in_log_units(property: Property, value: f64) -> Option<f64> {
    if property.is_logarithmic() {
        return Some(value);
    }
    (value > 0.0).then(|| value.log10())
}

/// Log units from the limit to the nearer end of the value.
fn nearest_distance(test: &Test, property: Property, compared: Interval) -> Option<f64> {
    let Limit::Number { value: limit, .. } = test.limit else {
        return None;
    };
    let limit = in_log_units(property, limit)?;
    let ends = [compared.low(), compared.high()].into_iter().filter_map(Bound::number);
    ends.filter_map(|end| Some((in_log_units(property, end)? - limit).abs())).min_by(f64::total_cmp)
}

/// Log units by which a single value lies beyond the limit.
fn margin(test: &Test, property: Property, compared: Interval) -> Option<f64> {
    let Limit::Number { comparison, value: limit } = test.limit else {
        return None;
    };
    let distance = in_log_units(property, compared.single()?)? - in_log_units(property, limit)?;
    Some(if comparison.looks_upward() { distance } else { -distance })
}

/// Whether the end of a value that points to the limit lies within one SD of it. A range has no SD of its own, so that
/// of a single value at that end counts.
pub(crate) fn reaches_within_one_sd(
    context: Context,
    test: &Test,
    evidence: &Evidence,
    compared: Interval,
) -> bool {
    let Limit::Number { comparison, value: limit } = test.limit else {
        return false;
    };
    let end = if comparison.looks_upward() { compared.high() } else { compared.low() };
    let distance = end.number().and_then(|end| {
        let property = evidence.property;
        Some((end, (in_log_units(property, end)? - in_log_units(property, limit)?).abs()))
    });
    let relations = &context.rules.relations;
    distance.is_some_and(|(end, distance)| {
        let sd = evidence.sd.unwrap_or_else(|| match evidence.origin {
            Origin::Cell(_) => relations.default_sd(evidence.property, evidence.basis, end),
            Origin::Relation { relation, .. } => {
                relations.relations.get(relation).map_or(f64::INFINITY, |line| line.sd)
            }
        });
        distance <= sd
    })
}

fn chance(context: Context, test: &Test, evidence: &Evidence, compared: Interval) -> Option<f64> {
    let Limit::Number { comparison, value: limit } = test.limit else {
        return None;
    };
    let value = in_log_units(evidence.property, compared.single()?)?;
    let limit = in_log_units(evidence.property, limit)?;
    let above = match &evidence.origin {
        Origin::Cell(_) => chance_beyond(value, evidence.sd?, limit),
        Origin::Relation { relation, log_kow, log_kow_sd, .. } => {
            let log_kow = log_kow.single()?;
            let shift = value - context.rules.relations.relations.get(*relation)?.log_value(log_kow);
            context.rules.relations.chance_of_estimate(*relation, log_kow, (*log_kow_sd)?, limit - shift)?
        }
    };
    Some(if comparison.looks_upward() { above } else { 1.0 - above })
}

#[cfg(test)]
mod tests {
    use super::arrhenius_factor;

    #[test]
    fn half_lives_at_twelve_degrees_are_longer_as_published() {
        // EU practice since 2017 (EFSA Journal 622, 2007): 65.4 kJ/mol gives 2.12 from 20 °C and 3.33 from 25 °C.
        assert!((arrhenius_factor(65.4, 20.0, 12.0) - 2.12).abs() < 0.005);
        assert!((arrhenius_factor(65.4, 25.0, 12.0) - 3.33).abs() < 0.005);
        assert!((arrhenius_factor(65.4, 12.0, 12.0) - 1.0).abs() < 1e-12);
    }
}
