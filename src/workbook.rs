//! Workbooks in and out: what stands in their cells and how it looks, without any meaning given to it.

mod content;
mod place;

pub use content::{Cell, CellContent, Row, StyleId};
pub use place::{CellRef, column_letters};
