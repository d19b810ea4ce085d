//! Fonts, colours and cell formats of an xls workbook, from their records (MS-XLS 2.4.122, 2.4.188, 2.4.353; those of 1993
//! from memory and held against files).

use std::collections::BTreeMap;

use calamine::{Color, Style};

use super::texts::{Alphabet, Pieces, Version};
use crate::workbook::read::binary::bytes::{bits, byte, long, short};
use crate::workbook::read::binary::formats::{Shown, shown_by_built_in, shown_by_code};
use crate::workbook::read::binary::looks::{Palette, Placed, alignment, borders, fill, font, number_format};

/// A font whose colour is still a number.
#[derive(Debug)]
pub(super) struct FontRecord {
    name: String,
    twentieths: u16,
    flags: u16,
    colour: u16,
    weight: u16,
    underline: u8,
}

/// Reads a font; one that cannot be read leaves the usual font in its place.
pub(super) fn font_record(data: &[u8], version: Version, alphabet: Alphabet) -> FontRecord {
    let unreadable = FontRecord {
        name: String::new(),
        twentieths: 0,
        flags: 0,
        colour: u16::MAX,
        weight: 400,
        underline: 0,
    };
    let read = || {
        Some(FontRecord {
            twentieths: short(data, 0)?,
            flags: short(data, 2)?,
            colour: short(data, 4)?,
            weight: short(data, 6)?,
            underline: byte(data, 10)?,
            name: Pieces::new(vec![data.get(14..)?]).short_text(version, alphabet).ok()?,
        })
    };
    read().unwrap_or(unreadable)
}

impl FontRecord {
    pub(super) fn with_colours(self, palette: &Palette) -> calamine::Font {
        let colour = palette.colour(self.colour);
        font(self.name, self.twentieths, self.flags, self.weight, self.underline, colour)
    }
}

/// Takes in the workbook's own colours: their number, then four bytes each.
pub(super) fn replace_colours(palette: &mut Palette, data: &[u8]) {
    let colours = data.get(2..).unwrap_or_default().chunks_exact(4).map(|colour| match colour {
        [red, green, blue, _] => Color::new(255, *red, *green, *blue),
        _ => Color::new(255, 0, 0, 0),
    });
    palette.replace(colours);
}

/// A cell format as its record says it.
#[derive(Debug, Clone, Copy, Default)]
pub(super) struct CellFormat {
    font: u16,
    number: u16,
    placed: Placed,
    pattern: u8,
    front: u8,
    back: u8,
    /// Left, right, top and bottom: the code of the line and its colour.
    lines: [(u8, u8); 4],
}

/// Reads a cell format; none if it is cut off.
pub(super) fn cell_format(data: &[u8], version: Version) -> Option<CellFormat> {
    match version {
        Version::Biff8 => cell_format_of_1997(data),
        Version::Biff5 => cell_format_of_1993(data),
    }
}

fn cell_format_of_1997(data: &[u8]) -> Option<CellFormat> {
    let (place, more) = (u32::from(byte(data, 6)?), u32::from(byte(data, 8)?));
    let (sides, ends) = (long(data, 10)?, long(data, 14)?);
    let colours = u32::from(short(data, 18)?);
    Some(CellFormat {
        font: short(data, 0)?,
        number: short(data, 2)?,
        placed: Placed {
            horizontal: bits(place, 0, 3),
            wraps: bits(place, 3, 1) == 1,
            vertical: bits(place, 4, 3),
            turned: byte(data, 7)?,
            indent: bits(more, 0, 4),
            shrinks: bits(more, 4, 1) == 1,
        },
        pattern: bits(ends, 26, 6),
        front: bits(colours, 0, 7),
        back: bits(colours, 7, 7),
        lines: [
            (bits(sides, 0, 4), bits(sides, 16, 7)),
            (bits(sides, 4, 4), bits(sides, 23, 7)),
            (bits(sides, 8, 4), bits(ends, 0, 7)),
            (bits(sides, 12, 4), bits(ends, 7, 7)),
        ],
    })
}

fn cell_format_of_1993(data: &[u8]) -> Option<CellFormat> {
    let (place, more) = (u32::from(byte(data, 6)?), byte(data, 7)?);
    let (fore, below) = (u32::from(short(data, 8)?), u32::from(short(data, 10)?));
    let (top, sides) = (u32::from(short(data, 12)?), u32::from(short(data, 14)?));
    Some(CellFormat {
        font: short(data, 0)?,
        number: short(data, 2)?,
        placed: Placed {
            horizontal: bits(place, 0, 3),
            wraps: bits(place, 3, 1) == 1,
            vertical: bits(place, 4, 3),
            turned: match more & 3 {
                1 => 255,
                2 => 90,
                3 => 180,
                _ => 0,
            },
            indent: 0,
            shrinks: false,
        },
        pattern: bits(below, 0, 6),
        front: bits(fore, 0, 7),
        back: bits(fore, 7, 7),
        lines: [
            (bits(top, 3, 3), bits(sides, 0, 7)),
            (bits(top, 6, 3), bits(sides, 7, 7)),
            (bits(top, 0, 3), bits(top, 9, 7)),
            (bits(below, 6, 3), bits(below, 9, 7)),
        ],
    })
}

impl CellFormat {
    /// What a number under the format is.
    pub(super) fn shown(&self, formats: &BTreeMap<u16, String>) -> Shown {
        formats.get(&self.number).map_or_else(|| shown_by_built_in(self.number), |code| shown_by_code(code))
    }

    /// How a cell with the format looks.
    pub(super) fn style(
        &self,
        formats: &BTreeMap<u16, String>,
        fonts: &[calamine::Font],
        palette: &Palette,
    ) -> Style {
        let colour = |number: u8| palette.colour(number.into());
        let mut style = Style::default();
        // There is no font 4: the fifth is number 5.
        let place = if self.font > 4 { self.font - 1 } else { self.font };
        style.font = fonts.get(usize::from(place)).cloned();
        style.fill = fill(self.pattern, colour(self.front), colour(self.back));
        style.borders = borders(self.lines.map(|(line, number)| (line, colour(number))));
        style.alignment = Some(alignment(self.placed));
        let code = formats.get(&self.number).map(String::as_str);
        style.number_format = Some(number_format(self.number, code));
        style
    }
}
