//! Each limit of the four rulebooks: below, at and above it, as `<` and `>`, straddling it, on every basis, with all
//! other data missing.
//!
//! The limits are written here by hand from the published texts (sources beside them), not read from the rule files.

use kowledger::judge::Verdict::{self, Fulfilled, NoData, NotFulfilled, ScreensIn, ScreensOut, Unresolved};
use kowledger::substance::{Basis, Compartment, Property};

use crate::support::{Value, row};

const FRESH: Property = Property::HalfLife(Compartment::FreshWater);
const MARINE: Property = Property::HalfLife(Compartment::MarineWater);
const WATER: Property = Property::HalfLife(Compartment::Water);
const FRESH_SEDIMENT: Property = Property::HalfLife(Compartment::FreshSediment);
const MARINE_SEDIMENT: Property = Property::HalfLife(Compartment::MarineSediment);
const SEDIMENT: Property = Property::HalfLife(Compartment::Sediment);
const SOIL: Property = Property::HalfLife(Compartment::Soil);
const AIR: Property = Property::HalfLife(Compartment::Air);

/// How the text words the limit.
#[derive(Debug, Clone, Copy, PartialEq, Eq)]
enum Worded {
    Above,
    AtLeast,
    Below,
}
use Worded::{Above, AtLeast, Below};

/// A limit, and what a measured value on either side of it gives while everything else is missing.
struct Limit {
    book: &'static str,
    criterion: &'static str,
    property: Property,
    worded: Worded,
    value: f64,
    /// A measured value beyond the limit.
    beyond: Verdict,
    /// A measured value on the other side.
    within: Verdict,
    /// A straddling range.
    straddling: Verdict,
}

#[expect(clippy::too_many_arguments, reason = "a line of a table, read as a line")]
const fn limit(
    book: &'static str,
    criterion: &'static str,
    property: Property,
    worded: Worded,
    value: f64,
    beyond: Verdict,
    within: Verdict,
    straddling: Verdict,
) -> Limit {
    Limit { book, criterion, property, worded, value, beyond, within, straddling }
}

/// 2 months and 6 months at 30.4375 d each.
const TWO_MONTHS: f64 = 60.875;
const SIX_MONTHS: f64 = 182.625;

#[rustfmt::skip]
const LIMITS: &[Limit] = &[
    // Regulation (EC) No 1907/2006, Annex XIII, 1.1.1 and 1.2.1. One compartment alone clears nothing.
    limit("REACH", "P", FRESH, Above, 40.0, Fulfilled, Unresolved, Unresolved),
    limit("REACH", "P", MARINE, Above, 60.0, Fulfilled, Unresolved, Unresolved),
    limit("REACH", "P", FRESH_SEDIMENT, Above, 120.0, Fulfilled, Unresolved, Unresolved),
    limit("REACH", "P", MARINE_SEDIMENT, Above, 180.0, Fulfilled, Unresolved, Unresolved),
    limit("REACH", "P", SOIL, Above, 120.0, Fulfilled, Unresolved, Unresolved),
    limit("REACH", "vP", FRESH, Above, 60.0, Fulfilled, Unresolved, Unresolved),
    limit("REACH", "vP", MARINE, Above, 60.0, Fulfilled, Unresolved, Unresolved),
    limit("REACH", "vP", FRESH_SEDIMENT, Above, 180.0, Fulfilled, Unresolved, Unresolved),
    limit("REACH", "vP", MARINE_SEDIMENT, Above, 180.0, Fulfilled, Unresolved, Unresolved),
    limit("REACH", "vP", SOIL, Above, 180.0, Fulfilled, Unresolved, Unresolved),
    // Annex XIII, 1.1.2 and 1.2.2.
    limit("REACH", "B", Property::Bcf, Above, 2000.0, Fulfilled, NotFulfilled, Unresolved),
    limit("REACH", "vB", Property::Bcf, Above, 5000.0, Fulfilled, NotFulfilled, Unresolved),
    // Agency guidance R.11: log Kow 4.5 screens; above 2 the missing log Koa keeps it from screening out.
    limit("REACH", "B", Property::LogKow, Above, 4.5, ScreensIn, Unresolved, ScreensIn),
    limit("REACH", "vB", Property::LogKow, Above, 4.5, ScreensIn, Unresolved, ScreensIn),
    // Annex XIII, 1.1.3 (a); acute data never exclude T, and a NOEC alone does not without the classification.
    limit("REACH", "T", Property::LongTermToxicity, Below, 0.01, Fulfilled, Unresolved, Unresolved),
    limit("REACH", "T", Property::AcuteToxicity, Below, 0.1, ScreensIn, Unresolved, ScreensIn),
    // Regulation (EC) No 1272/2008, Annex I, 4.3.2 and 4.4.2, added by Regulation (EU) 2023/707.
    limit("CLP", "P", FRESH, Above, 40.0, Fulfilled, Unresolved, Unresolved),
    limit("CLP", "P", MARINE, Above, 60.0, Fulfilled, Unresolved, Unresolved),
    limit("CLP", "P", FRESH_SEDIMENT, Above, 120.0, Fulfilled, Unresolved, Unresolved),
    limit("CLP", "P", MARINE_SEDIMENT, Above, 180.0, Fulfilled, Unresolved, Unresolved),
    limit("CLP", "P", SOIL, Above, 120.0, Fulfilled, Unresolved, Unresolved),
    limit("CLP", "vP", FRESH, Above, 60.0, Fulfilled, Unresolved, Unresolved),
    limit("CLP", "vP", MARINE, Above, 60.0, Fulfilled, Unresolved, Unresolved),
    limit("CLP", "vP", FRESH_SEDIMENT, Above, 180.0, Fulfilled, Unresolved, Unresolved),
    limit("CLP", "vP", MARINE_SEDIMENT, Above, 180.0, Fulfilled, Unresolved, Unresolved),
    limit("CLP", "vP", SOIL, Above, 180.0, Fulfilled, Unresolved, Unresolved),
    limit("CLP", "B", Property::Bcf, Above, 2000.0, Fulfilled, NotFulfilled, Unresolved),
    limit("CLP", "vB", Property::Bcf, Above, 5000.0, Fulfilled, NotFulfilled, Unresolved),
    limit("CLP", "B", Property::LogKow, Above, 4.5, ScreensIn, Unresolved, ScreensIn),
    limit("CLP", "vB", Property::LogKow, Above, 4.5, ScreensIn, Unresolved, ScreensIn),
    limit("CLP", "T", Property::LongTermToxicity, Below, 0.01, Fulfilled, Unresolved, Unresolved),
    limit("CLP", "T", Property::AcuteToxicity, Below, 0.1, ScreensIn, Unresolved, ScreensIn),
    // log Koc below 3 and below 2.
    limit("CLP", "M", Property::Koc, Below, 1000.0, Fulfilled, NotFulfilled, Unresolved),
    limit("CLP", "vM", Property::Koc, Below, 100.0, Fulfilled, NotFulfilled, Unresolved),
    // Stockholm Convention, Annex D, 1 (b) to (d); the committee decides, so nothing is more than screening.
    limit("STOCKHOLM", "P", WATER, Above, TWO_MONTHS, ScreensIn, Unresolved, Unresolved),
    limit("STOCKHOLM", "P", SOIL, Above, SIX_MONTHS, ScreensIn, Unresolved, Unresolved),
    limit("STOCKHOLM", "P", SEDIMENT, Above, SIX_MONTHS, ScreensIn, Unresolved, Unresolved),
    limit("STOCKHOLM", "B", Property::Bcf, Above, 5000.0, ScreensIn, ScreensOut, Unresolved),
    limit("STOCKHOLM", "B", Property::Baf, Above, 5000.0, ScreensIn, ScreensOut, Unresolved),
    limit("STOCKHOLM", "B", Property::LogKow, Above, 5.0, ScreensIn, ScreensOut, ScreensIn),
    limit("STOCKHOLM", "LRT", AIR, Above, 2.0, ScreensIn, Unresolved, Unresolved),
    // SOR/2000-107, sections 3 and 4.
    limit("CANADA", "P", AIR, AtLeast, 2.0, Fulfilled, Unresolved, Unresolved),
    limit("CANADA", "P", WATER, AtLeast, 182.0, Fulfilled, Unresolved, Unresolved),
    limit("CANADA", "P", SEDIMENT, AtLeast, 365.0, Fulfilled, Unresolved, Unresolved),
    limit("CANADA", "P", SOIL, AtLeast, 182.0, Fulfilled, Unresolved, Unresolved),
    limit("CANADA", "B", Property::Baf, AtLeast, 5000.0, Fulfilled, NotFulfilled, Unresolved),
    limit("CANADA", "B", Property::Bcf, AtLeast, 5000.0, Fulfilled, NotFulfilled, Unresolved),
    limit("CANADA", "B", Property::LogKow, AtLeast, 5.0, ScreensIn, ScreensOut, ScreensIn),
];

impl Limit {
    fn verdict(&self, value: Value, basis: Basis) -> Verdict {
        row().with(self.property, value, basis).judged().verdict(self.book, self.criterion)
    }

    fn name(&self) -> String {
        format!("{} {} {} {:?} {}", self.book, self.criterion, self.property.title(), self.worded, self.value)
    }

    /// Values on the concerning side, far enough not to be close.
    fn beyond_values(&self) -> Vec<Value> {
        let (limit, log) = (self.value, self.property.is_logarithmic());
        let far_up = if log { limit + 2.0 } else { limit * 50.0 };
        match self.worded {
            Above => vec![Value::Point(nudged_up(limit)), Value::Point(far_up), Value::Greater(limit)],
            AtLeast => vec![Value::Point(limit), Value::Point(far_up), Value::Greater(limit)],
            // Far below 0.1 mg/L an acute value would meet the definitive limit of 0.01 mg/L as well.
            Below if self.property == Property::AcuteToxicity => {
                vec![
                    Value::Point(nudged_down(limit)),
                    Value::Point(limit / 5.0),
                    Value::Range(0.02, limit * 0.99),
                ]
            }
            Below => vec![Value::Point(nudged_down(limit)), Value::Point(limit / 50.0), Value::Less(limit)],
        }
    }

    /// Values on the other side.
    fn within_values(&self) -> Vec<Value> {
        let (limit, log) = (self.value, self.property.is_logarithmic());
        let far_down = if log { limit - 1.5 } else { limit / 50.0 };
        match self.worded {
            Above => vec![Value::Point(limit), Value::Point(far_down)],
            AtLeast => vec![Value::Point(nudged_down(limit)), Value::Point(far_down), Value::Less(limit)],
            Below => vec![Value::Point(limit), Value::Point(limit * 50.0), Value::Greater(limit)],
        }
    }

    fn straddling_values(&self) -> Vec<Value> {
        let (low, high) = (self.value * 0.9, self.value * 1.1);
        vec![Value::Range(low, high), Value::Less(high), Value::Greater(low)]
    }
}

fn nudged_up(limit: f64) -> f64 {
    limit * (1.0 + 1e-9)
}

fn nudged_down(limit: f64) -> f64 {
    limit * (1.0 - 1e-9)
}

#[test]
fn a_measured_value_beyond_each_limit_fires_however_near() {
    for limit in LIMITS {
        for value in limit.beyond_values() {
            assert_eq!(
                limit.verdict(value, Basis::Measured),
                limit.beyond,
                "{} with {value:?}",
                limit.name()
            );
        }
    }
}

#[test]
fn a_measured_value_at_or_within_each_limit_does_not_fire() {
    for limit in LIMITS {
        for value in limit.within_values() {
            assert_eq!(
                limit.verdict(value, Basis::Measured),
                limit.within,
                "{} with {value:?}",
                limit.name()
            );
        }
    }
}

#[test]
fn a_range_or_qualifier_that_straddles_a_limit_clears_nothing() {
    for limit in LIMITS {
        for value in limit.straddling_values() {
            let judged = row().measured(limit.property, value).judged();
            let name = format!("{} with {value:?}", limit.name());
            assert_eq!(judged.verdict(limit.book, limit.criterion), limit.straddling, "{name}");
            assert!(judged.is_close(limit.book, limit.criterion), "{name} is a close call");
        }
    }
}

#[test]
fn without_the_word_measured_no_verdict_is_more_than_screening() {
    let screening = |verdict| match verdict {
        Fulfilled | ScreensIn => ScreensIn,
        NotFulfilled | ScreensOut => ScreensOut,
        other => other,
    };
    for limit in LIMITS {
        for basis in [Basis::Unstated, Basis::Calculated] {
            for (values, expected) in
                [(limit.beyond_values(), limit.beyond), (limit.within_values(), limit.within)]
            {
                // The far value, which no standard deviation reaches.
                let verdict = limit.verdict(values[1], basis);
                assert_eq!(verdict, screening(expected), "{} with {:?}, {basis:?}", limit.name(), values[1]);
            }
        }
    }
}

#[test]
fn an_estimate_never_stands_in_for_a_given_value() {
    for limit in LIMITS.iter().filter(|limit| limit.property != Property::LogKow) {
        let given_only = matches!(limit.property, Property::Bcf | Property::Baf | Property::LongTermToxicity);
        if given_only {
            let verdict = limit.verdict(limit.beyond_values()[1], Basis::Estimated);
            assert_eq!(verdict, NoData, "{}", limit.name());
        }
    }
}

#[test]
fn a_row_without_data_is_without_data_everywhere_and_nothing_else() {
    let judged = row().judged();
    for limit in LIMITS {
        assert_eq!(judged.verdict(limit.book, limit.criterion), NoData, "{}", limit.name());
    }
    for (book, designation) in
        [("REACH", "PBT"), ("REACH", "vPvB"), ("CLP", "PMT"), ("CLP", "vPvM"), ("CANADA", "PB")]
    {
        assert_eq!(judged.cell(book, designation), "unresolved");
    }
}
