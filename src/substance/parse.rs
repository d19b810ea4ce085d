//! From the cells of a row to a [`Substance`](crate::substance::Substance).

/// What a value without a word on how it was obtained counts as (`--unstated`).
#[derive(Debug, Clone, Copy, PartialEq, Eq, Default)]
pub enum UnstatedBasis {
    /// As measured.
    Measured,
    /// As a rank of its own between measured and calculated.
    #[default]
    Unstated,
    /// As calculated.
    Calculated,
}

/// Reads rows of one sheet.
#[derive(Debug)]
pub struct RowReader {}
