//! What a row says of ready and inherent biodegradability.

use crate::quantity::Interval;
use crate::substance::Basis;

/// The result of a screening test of ready biodegradability.
#[derive(Debug, Clone, Copy, PartialEq, Eq, PartialOrd, Ord, Hash)]
pub enum DegradationTest {
    /// The pass level is reached, or the cell says so in words.
    Ready,
    /// The pass level is missed, or the cell says so in words.
    NotReady,
    /// The number could mean either, for example 65 % of an unnamed measure.
    Open,
}

/// A cell on ready biodegradability.
#[derive(Debug, Clone, PartialEq, Eq)]
pub struct ReadyBiodegradability {
    /// What it comes to.
    pub result: DegradationTest,
    /// How it is said to be known.
    pub basis: Basis,
    /// Reliability score, 1 to 4.
    pub reliability: Option<u8>,
    /// The text as it stood in the cell.
    pub reported: String,
}

/// A cell on inherent biodegradability.
#[derive(Debug, Clone, PartialEq)]
pub struct InherentBiodegradability {
    /// The guideline, normalised, for example `OECD 302B`; none where the cell names none.
    pub guideline: Option<String>,
    /// Degradation, %; none where the cell holds words only.
    pub degraded: Option<Interval>,
    /// Days after which the degradation was reached.
    pub days: Option<f64>,
    /// How it is said to be known.
    pub basis: Basis,
    /// Reliability score, 1 to 4.
    pub reliability: Option<u8>,
    /// The text as it stood in the cell.
    pub reported: String,
}
