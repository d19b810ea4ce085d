//! Applying the equations to a log Kow: the leading value, the spread of the others in domain, the low side, and the
//! error that comes out of the error that went in.

use crate::quantity::{Bound, Interval, chance_beyond, normal_cumulative};
use crate::relations::{Relation, Relations, Side};
use crate::substance::Property;

/// A log Kow and its standard deviation, as it enters a relation.
#[derive(Debug, Clone, Copy, PartialEq)]
pub struct LogKow {
    /// What it may be.
    pub interval: Interval,
    /// Its standard deviation, log units; none for open intervals and ranges.
    pub sd: Option<f64>,
}

/// What the relations make of a log Kow; all numbers are log10 of the target in its canonical unit.
#[derive(Debug, Clone, PartialEq)]
pub struct Estimate {
    /// The leading relation, an index into [`Relations::relations`].
    pub leading: usize,
    /// What the leading relation gives.
    pub log_value: Interval,
    /// The standard deviation of a single value: that of the log Kow through the slope, and that of the relation.
    pub sd: Option<f64>,
    /// The other central relations in domain: index and value at the same log Kow.
    pub others: Vec<(usize, f64)>,
    /// The lowest value, less one standard deviation of its relation, that any line could give for this log Kow:
    /// index and value.
    pub low_side: Option<(usize, f64)>,
}

impl Relation {
    /// log10 of the target at a log Kow.
    pub fn log_value(&self, log_kow: f64) -> f64 {
        self.coefficients.iter().rev().fold(0.0, |sum, coefficient| sum * log_kow + coefficient)
    }

    fn slope(&self, log_kow: f64) -> f64 {
        let mut power = 0.0;
        let mut weighted = Vec::with_capacity(self.coefficients.len());
        for coefficient in &self.coefficients {
            weighted.push(power * coefficient);
            power += 1.0;
        }
        weighted.iter().skip(1).rev().fold(0.0, |sum, coefficient| sum * log_kow + coefficient)
    }

    fn is_curved(&self) -> bool {
        self.coefficients.len() > 2
    }

    /// Whether the whole interval lies in the domain.
    fn holds_for(&self, interval: Interval) -> bool {
        match (interval.low().number(), interval.high().number()) {
            (Some(low), Some(high)) => self.domain.contains(low) && self.domain.contains(high),
            (None, _) | (_, None) => false,
        }
    }

    /// The values over an interval inside the domain, found on a fine grid so that a maximum inside is not missed.
    fn log_values(&self, interval: Interval) -> Option<Interval> {
        const STEPS: u32 = 256;
        let (low, high) = (interval.low().number()?, interval.high().number()?);
        let values = (0..=STEPS).map(|step| {
            let share = f64::from(step) / f64::from(STEPS);
            self.log_value(low + (high - low) * share)
        });
        let (smallest, largest) = values.fold((f64::INFINITY, f64::NEG_INFINITY), |(small, large), value| {
            (small.min(value), large.max(value))
        });
        Interval::new(Bound::Included(smallest), Bound::Included(largest)).ok()
    }
}

impl Relations {
    /// The estimate of a property from a log Kow, or nothing where no leading relation holds.
    ///
    /// For a molar relation the caller adds the logarithm of the molar mass in mg/mmol.
    pub fn estimate(&self, to: Property, log_kow: LogKow) -> Option<Estimate> {
        let of_target = || self.relations.iter().enumerate().filter(move |(_, relation)| relation.to == to);
        let (leading, relation) = of_target()
            .find(|(_, relation)| relation.side == Side::Central && relation.holds_for(log_kow.interval))?;
        let log_value = match log_kow.interval.single() {
            Some(value) => Interval::point(relation.log_value(value)).ok()?,
            None => relation.log_values(log_kow.interval)?,
        };
        let middle = log_kow.interval.representative()?;
        let others = of_target()
            .filter(|(index, other)| {
                *index != leading && other.side == Side::Central && other.holds_for(log_kow.interval)
            })
            .map(|(index, other)| (index, other.log_value(middle)))
            .collect();
        Some(Estimate {
            leading,
            log_value,
            sd: log_kow
                .interval
                .single()
                .zip(log_kow.sd)
                .map(|(value, sd)| (relation.slope(value) * sd).hypot(relation.sd)),
            others,
            low_side: self.low_side(to, log_kow.interval),
        })
    }

    /// The class of a substance is not known without its structure, so every line in domain could apply; and a
    /// substance that ionises, or may, is also held against the lines for the ionised form.
    fn low_side(&self, to: Property, log_kow: Interval) -> Option<(usize, f64)> {
        let ends = [log_kow.low().number()?, log_kow.high().number()?];
        self.relations
            .iter()
            .enumerate()
            .filter(|(_, relation)| relation.to == to)
            .filter(|(_, relation)| match relation.side {
                Side::Central | Side::Class => relation.holds_for(log_kow),
                Side::Ionised => true,
            })
            .flat_map(|(index, relation)| ends.map(|end| (index, relation.log_value(end) - relation.sd)))
            .min_by(|one, other| one.1.total_cmp(&other.1))
    }

    /// The chance that an estimated property lies above a limit (log10), given the errors of log Kow and relation.
    ///
    /// Straight relations propagate the error; curved ones are integrated over the distribution of log Kow, since near
    /// their top a slope says nothing.
    pub fn chance_of_estimate(&self, leading: usize, log_kow: f64, sd: f64, log_limit: f64) -> Option<f64> {
        let relation = self.relations.get(leading)?;
        if !relation.is_curved() {
            let spread = (relation.slope(log_kow) * sd).hypot(relation.sd);
            return Some(chance_beyond(relation.log_value(log_kow), spread, log_limit));
        }
        Some(self.integrated_chance(leading, log_kow, sd, log_limit))
    }

    fn integrated_chance(&self, leading: usize, log_kow: f64, sd: f64, log_limit: f64) -> f64 {
        const STEPS: u32 = 400;
        const REACH: f64 = 5.0;
        let mut sum = 0.0;
        let mut weights = 0.0;
        for step in 0..=STEPS {
            let z = REACH * (2.0 * f64::from(step) / f64::from(STEPS) - 1.0);
            let weight = (-0.5 * z * z).exp();
            if let Some((value, error)) = self.value_at(leading, log_kow + z * sd) {
                sum += weight * (1.0 - normal_cumulative((log_limit - value) / error));
                weights += weight;
            }
        }
        if weights > 0.0 { sum / weights } else { 0.0 }
    }

    /// The value of the leading relation, or of the one that leads where the log Kow strays out of its domain.
    fn value_at(&self, leading: usize, log_kow: f64) -> Option<(f64, f64)> {
        let relation = self.relations.get(leading)?;
        if relation.domain.contains(log_kow) {
            return Some((relation.log_value(log_kow), relation.sd));
        }
        self.relations
            .iter()
            .find(|other| {
                other.to == relation.to && other.side == Side::Central && other.domain.contains(log_kow)
            })
            .map(|other| (other.log_value(log_kow), other.sd))
    }
}

#[cfg(test)]
mod tests {
    use super::LogKow;
    use crate::quantity::{Bound, Interval};
    use crate::relations::{Relation, Relations, Side};
    use crate::rules::Checked;
    use crate::substance::Property;

    fn line(id: &str, coefficients: &[f64], domain: (f64, f64), sd: f64, side: Side) -> Relation {
        Relation {
            id: id.into(),
            citation: String::new(),
            from: Property::LogKow,
            to: Property::Bcf,
            coefficients: coefficients.to_vec(),
            domain: Interval::new(Bound::Included(domain.0), Bound::Included(domain.1)).unwrap(),
            sd,
            checked: Checked::SecondHand,
            side,
            class: String::new(),
            molar: false,
        }
    }

    fn relations() -> Relations {
        Relations {
            relations: vec![
                line("straight", &[-0.70, 0.85], (1.0, 6.0), 0.5, Side::Central),
                line("curved", &[-4.72, 2.74, -0.20], (6.0, 10.0), 0.5, Side::Central),
                line("low", &[0.5, 0.39], (-1.0, 5.0), 0.4, Side::Class),
            ],
            default_sds: Vec::new(),
        }
    }

    fn point(value: f64, sd: f64) -> LogKow {
        LogKow { interval: Interval::point(value).unwrap(), sd: Some(sd) }
    }

    #[test]
    fn the_first_relation_whose_domain_holds_leads() {
        let relations = relations();
        let at = |value| relations.estimate(Property::Bcf, point(value, 0.2));
        assert_eq!(at(6.0).map(|estimate| estimate.leading), Some(0));
        assert_eq!(at(6.1).map(|estimate| estimate.leading), Some(1));
        assert_eq!(at(10.1), None);
        assert_eq!(at(0.9), None);
    }

    #[test]
    fn an_open_interval_gives_no_estimate() {
        let open =
            LogKow { interval: Interval::new(Bound::Excluded(6.0), Bound::Unbounded).unwrap(), sd: None };
        assert_eq!(relations().estimate(Property::Bcf, open), None);
    }

    #[test]
    fn a_range_over_the_top_of_a_curve_reaches_the_top() {
        let range =
            LogKow { interval: Interval::new(Bound::Included(6.2), Bound::Included(7.5)).unwrap(), sd: None };
        let estimate = relations().estimate(Property::Bcf, range).unwrap();
        // The parabola's maximum is -4.72 + 2.74^2 / (4 x 0.20) = 4.6645 at 6.85.
        assert!((estimate.log_value.high().number().unwrap() - 4.6645).abs() < 1e-4);
    }

    #[test]
    fn the_low_side_is_the_lowest_line_in_domain_less_its_error() {
        let estimate = relations().estimate(Property::Bcf, point(4.0, 0.2)).unwrap();
        let (index, lowest) = estimate.low_side.unwrap();
        assert_eq!(index, 2);
        assert!((lowest - (0.39 * 4.0 + 0.5 - 0.4)).abs() < 1e-12);
    }

    #[test]
    fn the_chance_over_a_limit_is_as_computed_independently() {
        // Computed with a straight line 0.85 L - 0.70 and a relation error of 0.5: BCF 2000 and 5000.
        let relations = relations();
        let cases = [
            (4.5, 0.2, 0.369, 0.139),
            (4.5, 0.5, 0.394, 0.191),
            (5.0, 0.2, 0.681, 0.389),
            (4.0, 0.5, 0.180, 0.064),
        ];
        for (log_kow, sd, above_2000, above_5000) in cases {
            let chance = |limit: f64| relations.chance_of_estimate(0, log_kow, sd, limit.log10()).unwrap();
            assert!((chance(2000.0) - above_2000).abs() < 6e-4, "{log_kow} {sd}: {}", chance(2000.0));
            assert!((chance(5000.0) - above_5000).abs() < 6e-4, "{log_kow} {sd}: {}", chance(5000.0));
        }
    }

    #[test]
    fn near_the_top_of_a_curve_the_chance_is_integrated() {
        // At the top the slope is 0, so a linear propagation would see the error of the relation only and no bias.
        let relations = relations();
        let linear = crate::quantity::chance_beyond(4.6645, 0.5, 4.5);
        let integrated = relations.chance_of_estimate(1, 6.85, 0.8, 4.5).unwrap();
        assert!(integrated < linear - 0.03, "{integrated} against {linear}");
    }
}
