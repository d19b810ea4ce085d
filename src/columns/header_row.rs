//! Which rows of a sheet are its header: names, groups above them, units and conditions below.

use std::collections::BTreeSet;

use super::ColumnOverride;
use super::header_cell::{HeaderCell, is_group_text};
use super::lower_row::{Sign, holds_units, reads_as_header};
use super::second_header::{HeaderWatch, is_number};
use super::stack::stack;
use super::words::ColumnWords;
use crate::substance::Field;
use crate::workbook::{Cell, CellContent, Row};

/// Rows at the top of a sheet among which the header is looked for.
const HEADER_WITHIN: usize = 30;
/// Rows of groups above the names, and rows below them, that are read together with them.
const ROWS_BESIDE: usize = 2;

/// The header of a sheet.
#[derive(Debug, Clone)]
pub(super) struct Found {
    /// The first row of the header, counted from 0.
    pub(super) top: u32,
    /// The row in which our own headers go, counted from 0.
    pub(super) row: u32,
    pub(super) cells: Vec<HeaderCell>,
    /// Rows above it that could be a header, too.
    pub(super) others_above: Vec<u32>,
    /// Knows a header further down when it comes.
    pub(super) watch: HeaderWatch,
}

/// How headers are read.
#[derive(Clone, Copy)]
struct Reader<'sheet> {
    rows: &'sheet [Row],
    words: &'sheet ColumnWords,
    overrides: &'sheet [ColumnOverride],
}

/// Rows that are read together, by place, the last one included.
#[derive(Debug, Clone, Copy, PartialEq, Eq)]
struct Block {
    first: usize,
    last: usize,
}

/// The rows with the most recognised headers, of several such the ones with the most cells, then the first.
pub(super) fn find(first_rows: &[Row], words: &ColumnWords, overrides: &[ColumnOverride]) -> Option<Found> {
    let reader = Reader { rows: first_rows, words, overrides };
    let mut best: Option<((usize, usize), Block)> = None;
    let mut others_above = Vec::new();
    for place in 0..first_rows.len().min(HEADER_WITHIN) {
        let Some((rank, block)) = reader.inventory_at(place) else {
            continue;
        };
        if best.is_none_or(|(best_rank, _)| rank > best_rank) {
            others_above
                .extend(best.filter(|((recognised, _), _)| *recognised > 1).map(|(_, block)| block.last));
            best = Some((rank, block));
        }
    }
    let (_, names) = best?;
    let block = reader.with_groups(reader.with_rows_below(names));
    let rows = reader.of(block);
    let (top, row) = (rows.first()?.index, rows.last()?.index);
    let others_above = others_above.into_iter().filter(|place| *place < block.first);
    let others_above = others_above.filter_map(|place| Some(first_rows.get(place)?.index)).collect();
    Some(Found {
        top,
        row,
        cells: reader.with_nameless(reader.cells(block)),
        others_above,
        watch: HeaderWatch::new(&rows, overrides),
    })
}

impl<'sheet> Reader<'sheet> {
    fn of(self, block: Block) -> Vec<&'sheet Row> {
        self.rows.get(block.first..=block.last).unwrap_or_default().iter().collect()
    }

    fn cells(self, block: Block) -> Vec<HeaderCell> {
        let rows = self.of(block);
        match rows.as_slice() {
            [row] => header_cells(texts_of(row), self.words, self.overrides),
            rows => stack(rows)
                .into_iter()
                .map(|column| HeaderCell::stacked(column, self.words, self.overrides))
                .collect(),
        }
    }

    /// Columns without a header that the user names by their letter.
    fn with_nameless(self, mut cells: Vec<HeaderCell>) -> Vec<HeaderCell> {
        for column in self.overrides.iter().filter_map(ColumnOverride::column) {
            let filled = |row: &Row| row.cell(column).is_some_and(|cell| cell.content != CellContent::Empty);
            if cells.iter().all(|cell| cell.column != column) && self.rows.iter().any(filled) {
                let name = "(no header)".to_owned();
                cells.push(HeaderCell::alone(column, name, self.words, self.overrides));
            }
        }
        cells.sort_by_key(|cell| cell.column);
        cells
    }

    /// The header of an inventory at a place, in one row or two, with its rank.
    fn inventory_at(self, place: usize) -> Option<((usize, usize), Block)> {
        let rank = |cells: &[HeaderCell]| (recognised(cells), cells.len());
        let alone = Block { first: place, last: place };
        let cells = self.cells(alone);
        if is_inventory(&cells) {
            return Some((rank(&cells), alone));
        }
        let (upper, lower) = (self.rows.get(place)?, self.rows.get(place + 1)?);
        if cells.is_empty() || is_title(upper, lower) || !self.is_below(alone) {
            return None;
        }
        let both = Block { first: place, last: place + 1 };
        let cells = self.cells(both);
        is_inventory(&cells).then(|| (rank(&cells), both))
    }

    fn with_rows_below(self, mut block: Block) -> Block {
        for _ in 0..ROWS_BESIDE {
            if !self.is_below(block) {
                break;
            }
            block.last += 1;
        }
        block
    }

    /// Whether the row below these is part of the same header.
    fn is_below(self, block: Block) -> bool {
        let (Some(upper), Some(lower)) = (self.rows.get(block.last), self.rows.get(block.last + 1)) else {
            return false;
        };
        if lower.index != upper.index + 1 {
            return false;
        }
        let before = self.cells(block);
        if holds_units(lower) {
            return true;
        }
        let Some(sign) = reads_as_header(lower, &before, self.words) else {
            return false;
        };
        let together = self.cells(Block { first: block.first, last: block.last + 1 });
        let gained = recognised(&together).checked_sub(recognised(&before));
        gained.is_some_and(|gained| gained > 0 || sign == Sign::Certain)
    }

    /// Rows of groups above the names.
    fn with_groups(self, mut block: Block) -> Block {
        for _ in 0..ROWS_BESIDE {
            if !self.is_groups_above(block) {
                break;
            }
            block.first -= 1;
        }
        block
    }

    fn is_groups_above(self, block: Block) -> bool {
        let Some(upper) = block.first.checked_sub(1).and_then(|place| self.rows.get(place)) else {
            return false;
        };
        let Some(lower) = self.rows.get(block.first) else {
            return false;
        };
        if upper.index + 1 != lower.index || upper.cells.iter().any(|cell| is_number(&cell.content)) {
            return false;
        }
        let texts = texts_of(upper);
        let groups = texts.iter().filter(|(_, text)| is_group_text(text, self.words)).count();
        !is_title(upper, lower) && groups > 0 && groups * 2 >= texts.len()
    }
}

/// A single text at the left above a row is its title.
fn is_title(upper: &Row, lower: &Row) -> bool {
    let first = |row: &Row| texts_of(row).first().map(|(column, _)| *column);
    texts_of(upper).len() < 2 && first(upper) <= first(lower)
}

fn recognised(cells: &[HeaderCell]) -> usize {
    cells.iter().filter(|cell| cell.field().is_some()).count()
}

pub(super) fn texts_of(row: &Row) -> Vec<(u16, String)> {
    row.cells.iter().filter_map(|cell| Some((cell.column, text_of(cell)?))).collect()
}

pub(super) fn text_of(cell: &Cell) -> Option<String> {
    match &cell.content {
        CellContent::Text(text) if !text.trim().is_empty() => Some(text.trim().to_owned()),
        CellContent::Text(_)
        | CellContent::Empty
        | CellContent::Number(_)
        | CellContent::Boolean(_)
        | CellContent::DateTime(_)
        | CellContent::Error(_) => None,
    }
}

pub(super) fn header_cells(
    texts: Vec<(u16, String)>,
    words: &ColumnWords,
    overrides: &[ColumnOverride],
) -> Vec<HeaderCell> {
    texts.into_iter().map(|(column, text)| HeaderCell::alone(column, text, words, overrides)).collect()
}

pub(super) fn is_inventory(cells: &[HeaderCell]) -> bool {
    let fields: BTreeSet<Field> = cells.iter().filter_map(HeaderCell::field).collect();
    // A product's name is the substance's where there is no other, see `choice`.
    let named = fields.iter().any(|field| matches!(field, Field::RowId | Field::Name | Field::Product));
    fields.iter().any(|field| field.identifies()) || (named && fields.len() >= 2)
}
