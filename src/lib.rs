//! Screens a chemical inventory workbook: what is known and what can be estimated of each substance from its log Kow
//! and its other data is held against published criteria, and the workbook is written back, annotated.
//!
//! A row's way, room by room: [`workbook`] reads cells, [`columns`] says what each column holds, [`substance`] makes a
//! typed record of the row with each [`quantity`] as an interval with a unit, [`evidence`] gathers what is known and what
//! [`relations`] can estimate, [`judge`] holds it against [`rules`], [`reasoning`] words it, and [`report`] lays it out
//! for [`workbook`] to write. [`run`] has that way in order; [`fault`] words whatever goes wrong.

pub mod columns;
pub mod evidence;
pub mod fault;
pub mod judge;
pub mod quantity;
pub mod reasoning;
pub mod relations;
pub mod report;
pub mod rules;
pub mod run;
pub mod substance;
pub mod workbook;
