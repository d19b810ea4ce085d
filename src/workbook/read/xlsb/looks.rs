//! Number formats, fonts, fills, borders and cell formats of an xlsb workbook (MS-XLSB 2.1.7.50).

use std::collections::BTreeMap;
use std::ops::ControlFlow;

use calamine::{Borders, Color, Fill, Font, Style};

use super::for_each_record;
use crate::fault::FileFault;
use crate::workbook::package::Package;
use crate::workbook::read::binary::bytes::{bits, byte, long, short};
use crate::workbook::read::binary::formats::{Shown, shown_by_built_in, shown_by_code};
use crate::workbook::read::binary::looks::{Palette, Placed, alignment, borders, fill, font, number_format};
use crate::workbook::read::binary::texts::wide_text;

/// More entries of a kind than this no program writes: their numbers have two bytes.
const MOST_ENTRIES: usize = 65_536;

/// What a workbook says of looks.
#[derive(Default)]
pub(super) struct Looks {
    formats: BTreeMap<u16, String>,
    fonts: Vec<Font>,
    fills: Vec<Option<Fill>>,
    borders: Vec<Option<Borders>>,
    cell_formats: Vec<CellFormat>,
    palette: Palette,
}

struct CellFormat {
    number: u16,
    font: u16,
    fill: u16,
    border: u16,
    placed: Placed,
}

/// Which list of cell formats the pass is in; the named ones that cells are only derived from come before.
#[derive(Clone, Copy, PartialEq, Eq)]
enum Inside {
    CellFormats,
    Elsewhere,
}

impl Looks {
    /// Reads the part with the formats.
    pub(super) fn read(package: &mut Package, part: &str) -> Result<Self, FileFault> {
        let mut looks = Self::default();
        let mut inside = Inside::Elsewhere;
        for_each_record(package, part, |kind, data| {
            match kind {
                0x0269 => inside = Inside::CellFormats,
                0x026A => inside = Inside::Elsewhere,
                _ => looks.note(kind, data, inside).ok_or("one of its formats is cut off")?,
            }
            let lists = [looks.fonts.len(), looks.fills.len(), looks.borders.len(), looks.cell_formats.len()];
            if lists.iter().any(|length| *length > MOST_ENTRIES) {
                return Err(format!("it lists more than {MOST_ENTRIES} fonts, fills, borders or formats"));
            }
            Ok(ControlFlow::Continue(()))
        })?;
        Ok(looks)
    }

    fn note(&mut self, kind: u16, data: &[u8], inside: Inside) -> Option<()> {
        match kind {
            0x002C => {
                let mut code = String::new();
                wide_text(data, 2, &mut code)?;
                self.formats.insert(short(data, 0)?, code);
            }
            0x002B => {
                let mut name = String::new();
                wide_text(data, 21, &mut name)?;
                let colour = self.colour(data, 12);
                let [size, flags, weight] = [short(data, 0)?, short(data, 2)?, short(data, 4)?];
                self.fonts.push(font(name, size, flags, weight, byte(data, 8)?, colour));
            }
            0x002D => {
                let pattern = u8::try_from(long(data, 0)?).unwrap_or(0);
                self.fills.push(fill(pattern, self.colour(data, 4), self.colour(data, 12)));
            }
            0x002E => {
                // Ten bytes a line, after one of flags: top, bottom, left, right.
                let line = |at| Some((byte(data, at)?, self.colour(data, at + 2)));
                let lines = [line(21)?, line(31)?, line(1)?, line(11)?];
                self.borders.push(borders(lines));
            }
            0x002F if inside == Inside::CellFormats => self.cell_formats.push(cell_format(data)?),
            _ => {}
        }
        Some(())
    }

    /// The colour a record has at a place (MS-XLSB 2.5.19), if it is one of its own.
    fn colour(&self, data: &[u8], at: usize) -> Option<Color> {
        let flags = byte(data, at)?;
        let known = flags & 1 != 0;
        match flags >> 1 {
            1 => self.palette.colour(byte(data, at + 1)?.into()),
            2 | 3 if known => {
                Some(Color::new(255, byte(data, at + 4)?, byte(data, at + 5)?, byte(data, at + 6)?))
            }
            _ => None,
        }
    }

    /// What a number under each format is.
    pub(super) fn shown(&self) -> Vec<Shown> {
        self.cell_formats
            .iter()
            .map(|format| {
                let code = self.formats.get(&format.number);
                code.map_or_else(|| shown_by_built_in(format.number), |code| shown_by_code(code))
            })
            .collect()
    }

    /// How cells with each format look.
    pub(super) fn styles(&self) -> Vec<Style> {
        self.cell_formats.iter().map(|format| self.style(format)).collect()
    }

    fn style(&self, format: &CellFormat) -> Style {
        let mut style = Style::default();
        style.font = self.fonts.get(usize::from(format.font)).cloned();
        style.fill = self.fills.get(usize::from(format.fill)).cloned().flatten();
        style.borders = self.borders.get(usize::from(format.border)).cloned().flatten();
        style.alignment = Some(alignment(format.placed));
        let code = self.formats.get(&format.number).map(String::as_str);
        style.number_format = Some(number_format(format.number, code));
        style
    }
}

fn cell_format(data: &[u8]) -> Option<CellFormat> {
    let place = u32::from(short(data, 12)?);
    Some(CellFormat {
        number: short(data, 2)?,
        font: short(data, 4)?,
        fill: short(data, 6)?,
        border: short(data, 8)?,
        placed: Placed {
            turned: byte(data, 10)?,
            indent: byte(data, 11)?,
            horizontal: bits(place, 0, 3),
            vertical: bits(place, 3, 3),
            wraps: bits(place, 6, 1) == 1,
            shrinks: bits(place, 8, 1) == 1,
        },
    })
}
