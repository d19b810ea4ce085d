//! A number with its unit, its interval and what the text said beside it.
//!
//! One text parser serves cells and rule files alike; past it no text stands for a number. It knows nothing of
//! substances, columns or criteria.

mod chance;
mod date;
mod interval;
mod parse;
mod unit;

pub use chance::{chance_beyond, normal_cumulative};
pub use date::Date;
pub use interval::{Bound, Comparison, Interval, IntervalError, Outcome};
pub use parse::{
    DecimalStyle, LetterA, Parsed, QuantityFault, ReadAs, Scale, format_interval, format_number, is_missing,
    parse_limit, parse_quantities, parse_quantity, parse_unit, parse_unit_of, part_scripts, plain_words,
    quantity_of_number, tidy, unit_words,
};
pub use unit::{DAYS_PER_MONTH, Dimension, Unit};

/// A value as it was written, in the canonical unit of its dimension.
#[derive(Debug, Clone, PartialEq)]
pub struct Quantity {
    /// What the value may be, in the canonical unit of `unit`'s dimension.
    pub interval: Interval,
    /// The unit it was written or assumed in.
    pub unit: Unit,
    /// The standard deviation written with `±`, in the unit as written.
    pub written_sd: Option<f64>,
    /// Written with `~`, `ca.` or the like: the default standard deviation is doubled.
    pub approximate: bool,
    /// The text as it stood in the cell or rule file.
    pub reported: String,
}

impl Quantity {
    /// The value if it is a single one, in the canonical unit.
    pub fn single(&self) -> Option<f64> {
        self.interval.single()
    }
}
