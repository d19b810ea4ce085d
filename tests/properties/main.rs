//! What holds for every text, number and header, and tables of cells and headers that read as documentation.

mod cells;
mod columns;
mod identity;
mod quantity;
mod sheet;
mod words;
