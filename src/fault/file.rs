//! Faults of whole files: nothing is written.

/// Why an inventory could not be read or an output not written.
#[derive(Debug, thiserror::Error)]
pub enum FileFault {
    /// No file at the path.
    #[error("{path}: there is no such file; check the path")]
    Missing {
        /// The path as given.
        path: String,
    },
}
