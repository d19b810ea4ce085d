//! What a written value may be: an interval with open or closed ends.
//!
//! A qualifier or a range is part of the value, so `> 6.2` is the interval above 6.2 and two comparisons with a limit
//! cover every form a cell can take.

/// One end of an interval.
#[derive(Debug, Clone, Copy, PartialEq)]
pub enum Bound {
    /// Nothing is said about this side.
    Unbounded,
    /// The number itself belongs to the interval.
    Included(f64),
    /// The number itself does not belong to the interval.
    Excluded(f64),
}

impl Bound {
    /// The number at this end, if there is one.
    pub fn number(self) -> Option<f64> {
        match self {
            Self::Unbounded => None,
            Self::Included(number) | Self::Excluded(number) => Some(number),
        }
    }

    fn map(self, convert: impl Fn(f64) -> f64) -> Self {
        match self {
            Self::Unbounded => Self::Unbounded,
            Self::Included(number) => Self::Included(convert(number)),
            Self::Excluded(number) => Self::Excluded(convert(number)),
        }
    }
}

/// The values a quantity may have. Never empty, never holding NaN.
#[derive(Debug, Clone, Copy, PartialEq)]
pub struct Interval {
    low: Bound,
    high: Bound,
}

/// How a limit is worded: `>`, `>=`, `<` or `<=`.
#[derive(Debug, Clone, Copy, PartialEq, Eq, PartialOrd, Ord, Hash)]
pub enum Comparison {
    /// The text says "greater than": the limit itself does not meet it.
    Above,
    /// The text says "at least": the limit itself meets it.
    AtLeast,
    /// The text says "less than": the limit itself does not meet it.
    Below,
    /// The text says "at most": the limit itself meets it.
    AtMost,
}

impl Comparison {
    /// The sign a reader knows.
    pub fn sign(self) -> &'static str {
        match self {
            Self::Above => ">",
            Self::AtLeast => "≥",
            Self::Below => "<",
            Self::AtMost => "≤",
        }
    }

    /// The sign of the opposite statement.
    pub fn opposite_sign(self) -> &'static str {
        match self {
            Self::Above => "≤",
            Self::AtLeast => "<",
            Self::Below => "≥",
            Self::AtMost => ">",
        }
    }

    /// Whether larger values are of more concern.
    pub fn looks_upward(self) -> bool {
        match self {
            Self::Above | Self::AtLeast => true,
            Self::Below | Self::AtMost => false,
        }
    }
}

/// How an interval stands to a limit.
#[derive(Debug, Clone, Copy, PartialEq, Eq, PartialOrd, Ord, Hash)]
pub enum Outcome {
    /// The whole interval is beyond the limit.
    Fired,
    /// The interval straddles the limit.
    Undecided,
    /// The whole interval is on the unconcerning side of the limit.
    Clear,
}

/// Why two ends make no interval.
#[derive(Debug, Clone, Copy, PartialEq, Eq, thiserror::Error)]
pub enum IntervalError {
    /// The number is NaN or infinite.
    #[error("not a finite number")]
    NotFinite,
    /// The low end lies above the high end.
    #[error("the low end lies above the high end")]
    Reversed,
}

impl Interval {
    /// A single value.
    pub fn point(value: f64) -> Result<Self, IntervalError> {
        Self::new(Bound::Included(value), Bound::Included(value))
    }

    /// All values between two ends.
    pub fn new(low: Bound, high: Bound) -> Result<Self, IntervalError> {
        let finite = |bound: Bound| bound.number().is_none_or(f64::is_finite);
        if !finite(low) || !finite(high) {
            return Err(IntervalError::NotFinite);
        }
        match (low, high) {
            (Bound::Included(low_end), Bound::Included(high_end)) if low_end > high_end => {
                Err(IntervalError::Reversed)
            }
            (Bound::Excluded(low_end), Bound::Included(high_end) | Bound::Excluded(high_end))
            | (Bound::Included(low_end), Bound::Excluded(high_end))
                if low_end >= high_end =>
            {
                Err(IntervalError::Reversed)
            }
            _ => Ok(Self { low, high }),
        }
    }

    /// The low end.
    pub fn low(self) -> Bound {
        self.low
    }

    /// The high end.
    pub fn high(self) -> Bound {
        self.high
    }

    /// The value, if it is a single one.
    pub fn single(self) -> Option<f64> {
        match (self.low, self.high) {
            (Bound::Included(low), Bound::Included(high)) if low.total_cmp(&high).is_eq() => Some(low),
            _ => None,
        }
    }

    /// The middle of a closed interval, the finite end of a half-open one.
    pub fn representative(self) -> Option<f64> {
        match (self.low.number(), self.high.number()) {
            (Some(low), Some(high)) => Some(f64::midpoint(low, high)),
            (Some(end), None) | (None, Some(end)) => Some(end),
            (None, None) => None,
        }
    }

    /// The interval with an increasing conversion applied to both ends, for example a change of unit.
    pub fn map_increasing(self, convert: impl Fn(f64) -> f64) -> Result<Self, IntervalError> {
        Self::new(self.low.map(&convert), self.high.map(&convert))
    }

    /// The interval with a decreasing conversion applied, so that its ends change places.
    pub fn map_decreasing(self, convert: impl Fn(f64) -> f64) -> Result<Self, IntervalError> {
        Self::new(self.high.map(&convert), self.low.map(&convert))
    }

    /// The smallest interval that holds both.
    #[must_use]
    pub fn hull(self, other: Self) -> Self {
        Self { low: lower(self.low, other.low), high: higher(self.high, other.high) }
    }

    /// Whether the number belongs to the interval.
    pub fn contains(self, number: f64) -> bool {
        let above_low = match self.low {
            Bound::Unbounded => true,
            Bound::Included(low) => number >= low,
            Bound::Excluded(low) => number > low,
        };
        let below_high = match self.high {
            Bound::Unbounded => true,
            Bound::Included(high) => number <= high,
            Bound::Excluded(high) => number < high,
        };
        above_low && below_high
    }

    /// Fired if every value of the interval meets the comparison, clear if none does, else undecided.
    pub fn compare(self, comparison: Comparison, limit: f64) -> Outcome {
        let (all_meet, none_meets) = match comparison {
            Comparison::Above => (self.lies_above(limit), self.reaches_at_most(limit)),
            Comparison::AtLeast => (self.starts_at_least(limit), self.lies_below(limit)),
            Comparison::Below => (self.lies_below(limit), self.starts_at_least(limit)),
            Comparison::AtMost => (self.reaches_at_most(limit), self.lies_above(limit)),
        };
        match (all_meet, none_meets) {
            (true, _) => Outcome::Fired,
            (false, true) => Outcome::Clear,
            (false, false) => Outcome::Undecided,
        }
    }

    fn lies_above(self, limit: f64) -> bool {
        match self.low {
            Bound::Unbounded => false,
            Bound::Included(low) => low > limit,
            Bound::Excluded(low) => low >= limit,
        }
    }

    fn starts_at_least(self, limit: f64) -> bool {
        self.low.number().is_some_and(|low| low >= limit)
    }

    fn lies_below(self, limit: f64) -> bool {
        match self.high {
            Bound::Unbounded => false,
            Bound::Included(high) => high < limit,
            Bound::Excluded(high) => high <= limit,
        }
    }

    fn reaches_at_most(self, limit: f64) -> bool {
        self.high.number().is_some_and(|high| high <= limit)
    }
}

fn lower(one: Bound, other: Bound) -> Bound {
    match (one.number(), other.number()) {
        (None, _) | (_, None) => Bound::Unbounded,
        (Some(first), Some(second)) if first < second => one,
        (Some(first), Some(second)) if first > second => other,
        (Some(_), Some(_)) if matches!(one, Bound::Included(_)) => one,
        (Some(_), Some(_)) => other,
    }
}

fn higher(one: Bound, other: Bound) -> Bound {
    match (one.number(), other.number()) {
        (None, _) | (_, None) => Bound::Unbounded,
        (Some(first), Some(second)) if first > second => one,
        (Some(first), Some(second)) if first < second => other,
        (Some(_), Some(_)) if matches!(one, Bound::Included(_)) => one,
        (Some(_), Some(_)) => other,
    }
}

#[cfg(test)]
mod tests {
    use super::{Bound, Comparison, Interval, IntervalError, Outcome};

    fn interval(low: Bound, high: Bound) -> Interval {
        Interval::new(low, high).unwrap()
    }

    #[test]
    fn a_point_compares_as_the_text_of_the_limit_says() {
        let at_limit = Interval::point(2000.0).unwrap();
        assert_eq!(at_limit.compare(Comparison::Above, 2000.0), Outcome::Clear);
        assert_eq!(at_limit.compare(Comparison::AtLeast, 2000.0), Outcome::Fired);
        assert_eq!(at_limit.compare(Comparison::Below, 2000.0), Outcome::Clear);
        assert_eq!(at_limit.compare(Comparison::AtMost, 2000.0), Outcome::Fired);
    }

    #[test]
    fn above_the_limit_itself_is_fired_only_when_reported_as_greater() {
        let greater = interval(Bound::Excluded(4.5), Bound::Unbounded);
        let at_least = interval(Bound::Included(4.5), Bound::Unbounded);
        assert_eq!(greater.compare(Comparison::Above, 4.5), Outcome::Fired);
        assert_eq!(at_least.compare(Comparison::Above, 4.5), Outcome::Undecided);
        assert_eq!(at_least.compare(Comparison::AtLeast, 4.5), Outcome::Fired);
    }

    #[test]
    fn less_than_the_limit_is_clear_and_less_than_more_is_undecided() {
        let below_forty = interval(Bound::Unbounded, Bound::Excluded(40.0));
        assert_eq!(below_forty.compare(Comparison::Above, 40.0), Outcome::Clear);
        assert_eq!(below_forty.compare(Comparison::AtLeast, 40.0), Outcome::Clear);
        assert_eq!(below_forty.compare(Comparison::Above, 39.0), Outcome::Undecided);
        assert_eq!(below_forty.compare(Comparison::Below, 40.0), Outcome::Fired);
    }

    #[test]
    fn a_straddling_range_is_undecided_for_every_comparison() {
        let range = interval(Bound::Included(1500.0), Bound::Included(2500.0));
        for comparison in [Comparison::Above, Comparison::AtLeast, Comparison::Below, Comparison::AtMost] {
            assert_eq!(range.compare(comparison, 2000.0), Outcome::Undecided);
        }
    }

    #[test]
    fn ends_that_make_no_interval_are_refused() {
        assert_eq!(Interval::new(Bound::Included(2.0), Bound::Included(1.0)), Err(IntervalError::Reversed));
        assert_eq!(Interval::new(Bound::Excluded(1.0), Bound::Included(1.0)), Err(IntervalError::Reversed));
        assert_eq!(Interval::point(f64::NAN), Err(IntervalError::NotFinite));
        assert_eq!(Interval::point(f64::INFINITY), Err(IntervalError::NotFinite));
    }

    #[test]
    fn a_hull_keeps_the_wider_end() {
        let hull = interval(Bound::Included(1.0), Bound::Excluded(2.0))
            .hull(interval(Bound::Excluded(1.0), Bound::Included(2.0)));
        assert_eq!(hull, interval(Bound::Included(1.0), Bound::Included(2.0)));
    }
}
