//! A value as a text says it, in the text's own units.

use super::QuantityFault;
use crate::quantity::{Bound, Unit};

/// One end of an interval as written, with its own unit if it names one.
#[derive(Debug, Clone, Copy, PartialEq)]
pub(super) struct End {
    pub(super) bound: Bound,
    pub(super) unit: Option<Unit>,
}

impl End {
    pub(super) const OPEN: Self = Self { bound: Bound::Unbounded, unit: None };

    pub(super) fn convert(
        self,
        convert: impl Fn(f64, Option<Unit>) -> Result<f64, QuantityFault>,
    ) -> Result<Bound, QuantityFault> {
        Ok(match self.bound {
            Bound::Unbounded => Bound::Unbounded,
            Bound::Included(number) => Bound::Included(convert(number, self.unit)?),
            Bound::Excluded(number) => Bound::Excluded(convert(number, self.unit)?),
        })
    }
}

/// A value as written.
#[derive(Debug, Clone, PartialEq)]
pub(super) struct Expression {
    pub(super) low: End,
    pub(super) high: End,
    pub(super) unit: Option<Unit>,
    pub(super) written_sd: Option<f64>,
    pub(super) approximate: bool,
    /// What stands before the number, after it and in brackets beside it.
    pub(super) remarks: Vec<String>,
    /// The words before the number; the values after it in a list have them, too.
    pub(super) label: Option<String>,
    /// Whether `=` or `:` ends words before the number that nobody knows.
    pub(super) signed: bool,
    /// The part of the text that says this value.
    pub(super) written: String,
}

impl Expression {
    /// A value of which only the unit is known yet.
    pub(super) fn of_unit(unit: Option<Unit>) -> Self {
        Self {
            low: End::OPEN,
            high: End::OPEN,
            unit,
            written_sd: None,
            approximate: false,
            remarks: Vec::new(),
            label: None,
            signed: false,
            written: String::new(),
        }
    }

    /// Gives the value and both its ends a unit.
    pub(super) fn set_unit(&mut self, unit: Option<Unit>) {
        self.unit = unit;
        (self.low.unit, self.high.unit) = (None, None);
    }

    /// Whether it is more than a single number.
    pub(super) fn is_range(&self) -> bool {
        self.low.bound != self.high.bound
    }

    /// The numbers of its ends, as written.
    pub(super) fn numbers(&self) -> impl Iterator<Item = f64> {
        [self.low.bound, self.high.bound].into_iter().filter_map(Bound::number)
    }
}
