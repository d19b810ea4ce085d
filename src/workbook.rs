//! Workbooks in and out: what stands in their cells and how it looks, without any meaning given to it.

mod appearance;
mod caught;
mod compound;
mod content;
mod contents;
mod encoding;
mod guard;
mod look;
mod not_carried;
mod number_format;
mod package;
mod place;
mod read;
mod serial;
mod survey;
mod write;

pub use appearance::Appearance;
pub use content::{Cell, CellContent, Row, StyleId};
pub use look::{Look, Shade};
pub use number_format::{NumberFormat, ShownNumber};
pub use place::{CellRef, column_letters};
pub use read::{Inventory, fingerprint_of_text, open_inventory};
pub use survey::{ColumnLayout, SheetSurvey, Visibility, WideMerges};
pub use write::{AnnotatedWorkbook, Overwrite, SheetId, Target, Value, free_sheet_name};
