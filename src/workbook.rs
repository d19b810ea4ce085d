//! Workbooks in and out: what stands in their cells and how it looks, without any meaning given to it.

mod appearance;
mod caught;
mod content;
mod contents;
mod guard;
mod not_carried;
mod package;
mod place;
mod read;
mod survey;

pub use appearance::Appearance;
pub use content::{Cell, CellContent, Row, StyleId};
pub use place::{CellRef, column_letters};
pub use read::{Inventory, open_inventory};
pub use survey::{ColumnLayout, SheetSurvey, Visibility};
