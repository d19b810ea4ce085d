//! Fonts, fills, borders and alignments by the codes both binary formats use, in the terms of the reading library, which
//! [`Appearance`](crate::workbook::Appearance) is made of.

use calamine::{
    Alignment, Border, BorderStyle, Borders, Color, Fill, FillPattern, Font, FontStyle, FontWeight,
    HorizontalAlignment, NumberFormat, TextRotation, UnderlineStyle, VerticalAlignment,
};

/// Colours 8 to 63 of a workbook that brings none of its own (ECMA-376 part 1, 18.8.27).
const USUAL_COLOURS: [u32; 56] = [
    0x00_0000, 0xFF_FFFF, 0xFF_0000, 0x00_FF00, 0x00_00FF, 0xFF_FF00, 0xFF_00FF, 0x00_FFFF, 0x80_0000,
    0x00_8000, 0x00_0080, 0x80_8000, 0x80_0080, 0x00_8080, 0xC0_C0C0, 0x80_8080, 0x99_99FF, 0x99_3366,
    0xFF_FFCC, 0xCC_FFFF, 0x66_0066, 0xFF_8080, 0x00_66CC, 0xCC_CCFF, 0x00_0080, 0xFF_00FF, 0xFF_FF00,
    0x00_FFFF, 0x80_0080, 0x80_0000, 0x00_8080, 0x00_00FF, 0x00_CCFF, 0xCC_FFFF, 0xCC_FFCC, 0xFF_FF99,
    0x99_CCFF, 0xFF_99CC, 0xCC_99FF, 0xFF_CC99, 0x33_66FF, 0x33_CCCC, 0x99_CC00, 0xFF_CC00, 0xFF_9900,
    0xFF_6600, 0x66_6699, 0x96_9696, 0x00_3366, 0x33_9966, 0x00_3300, 0x33_3300, 0x99_3300, 0x99_3366,
    0x33_3399, 0x33_3333,
];

/// The colours of a workbook by number; some numbers mean the usual colour of text or paper.
#[derive(Debug, Clone)]
pub(in crate::workbook::read) struct Palette(Vec<Color>);

impl Default for Palette {
    fn default() -> Self {
        Self(USUAL_COLOURS.iter().map(|colour| colour_of(colour.to_be_bytes())).collect())
    }
}

fn colour_of([_, red, green, blue]: [u8; 4]) -> Color {
    Color::new(255, red, green, blue)
}

impl Palette {
    /// Replaces colours from 8 on.
    pub(in crate::workbook::read) fn replace(&mut self, colours: impl Iterator<Item = Color>) {
        for (known, colour) in self.0.iter_mut().zip(colours) {
            *known = colour;
        }
    }

    /// The colour of a number, if it has one of its own.
    pub(in crate::workbook::read) fn colour(&self, number: u16) -> Option<Color> {
        let place = if number < 8 { number } else { number - 8 };
        self.0.get(usize::from(place)).copied()
    }
}

/// A font by what its record says.
pub(in crate::workbook::read) fn font(
    name: String,
    twentieths: u16,
    flags: u16,
    weight: u16,
    underline: u8,
    colour: Option<Color>,
) -> Font {
    let mut font = Font::default();
    font.name = Some(name).filter(|name| !name.is_empty());
    font.size = Some(f64::from(twentieths) / 20.0).filter(|size| *size >= 1.0);
    // 400 is usual, 700 bold.
    if weight >= 600 {
        font.weight = FontWeight::Bold;
    }
    if flags & 2 != 0 {
        font.style = FontStyle::Italic;
    }
    font.strikethrough = flags & 8 != 0;
    font.underline = match underline {
        0x01 => UnderlineStyle::Single,
        0x02 => UnderlineStyle::Double,
        0x21 => UnderlineStyle::SingleAccounting,
        0x22 => UnderlineStyle::DoubleAccounting,
        _ => UnderlineStyle::None,
    };
    font.color = colour;
    font
}

/// A fill by the code of its pattern.
pub(in crate::workbook::read) fn fill(
    pattern: u8,
    front: Option<Color>,
    back: Option<Color>,
) -> Option<Fill> {
    let pattern = match pattern {
        1 => FillPattern::Solid,
        2 => FillPattern::MediumGray,
        3 => FillPattern::DarkGray,
        4 => FillPattern::LightGray,
        5 => FillPattern::DarkHorizontal,
        6 => FillPattern::DarkVertical,
        7 => FillPattern::DarkDown,
        8 => FillPattern::DarkUp,
        9 => FillPattern::DarkGrid,
        10 => FillPattern::DarkTrellis,
        11 => FillPattern::LightHorizontal,
        12 => FillPattern::LightVertical,
        13 => FillPattern::LightDown,
        14 => FillPattern::LightUp,
        15 => FillPattern::LightGrid,
        16 => FillPattern::LightTrellis,
        17 => FillPattern::Gray125,
        18 => FillPattern::Gray0625,
        _ => return None,
    };
    let mut fill = Fill::default();
    fill.pattern = pattern;
    fill.foreground_color = front;
    fill.background_color = back;
    Some(fill)
}

/// The lines on the left, right, top and bottom, each by its code and colour.
pub(in crate::workbook::read) fn borders(lines: [(u8, Option<Color>); 4]) -> Option<Borders> {
    if lines.iter().all(|(code, _)| *code == 0) {
        return None;
    }
    let mut borders = Borders::default();
    let [left, right, top, bottom] = lines.map(|(code, colour)| border(code, colour));
    borders.left = left;
    borders.right = right;
    borders.top = top;
    borders.bottom = bottom;
    Some(borders)
}

fn border(code: u8, colour: Option<Color>) -> Border {
    let mut border = Border::default();
    border.style = match code {
        1 => BorderStyle::Thin,
        2 => BorderStyle::Medium,
        3 => BorderStyle::Dashed,
        4 => BorderStyle::Dotted,
        5 => BorderStyle::Thick,
        6 => BorderStyle::Double,
        7 => BorderStyle::Hair,
        8 => BorderStyle::MediumDashed,
        9 => BorderStyle::DashDot,
        10 => BorderStyle::MediumDashDot,
        11 => BorderStyle::DashDotDot,
        12 => BorderStyle::MediumDashDotDot,
        13 => BorderStyle::SlantDashDot,
        _ => BorderStyle::None,
    };
    border.color = colour;
    border
}

/// What a cell format says about the place of the text in its cell, by the codes of its record.
#[derive(Debug, Clone, Copy, Default)]
pub(in crate::workbook::read) struct Placed {
    pub(in crate::workbook::read) horizontal: u8,
    pub(in crate::workbook::read) vertical: u8,
    pub(in crate::workbook::read) turned: u8,
    pub(in crate::workbook::read) indent: u8,
    pub(in crate::workbook::read) wraps: bool,
    pub(in crate::workbook::read) shrinks: bool,
}

/// The alignment by its codes.
pub(in crate::workbook::read) fn alignment(placed: Placed) -> Alignment {
    let mut alignment = Alignment::default();
    alignment.horizontal = match placed.horizontal {
        1 => HorizontalAlignment::Left,
        2 => HorizontalAlignment::Center,
        3 => HorizontalAlignment::Right,
        4 => HorizontalAlignment::Fill,
        5 => HorizontalAlignment::Justify,
        6 => HorizontalAlignment::CenterContinuous,
        7 => HorizontalAlignment::Distributed,
        _ => HorizontalAlignment::General,
    };
    alignment.vertical = match placed.vertical {
        0 => VerticalAlignment::Top,
        1 => VerticalAlignment::Center,
        3 => VerticalAlignment::Justify,
        4 => VerticalAlignment::Distributed,
        _ => VerticalAlignment::Bottom,
    };
    alignment.text_rotation = match placed.turned {
        0 => TextRotation::None,
        255 => TextRotation::Stacked,
        degrees => TextRotation::Degrees(degrees.into()),
    };
    alignment.indent = Some(placed.indent).filter(|indent| *indent > 0);
    alignment.wrap_text = placed.wraps;
    alignment.shrink_to_fit = placed.shrinks;
    alignment
}

/// A number format: as written out in the workbook, or built in.
pub(in crate::workbook::read) fn number_format(number: u16, code: Option<&str>) -> NumberFormat {
    let mut format = NumberFormat::default();
    match code {
        Some(code) => code.clone_into(&mut format.format_code),
        None if number == 0 => {}
        None => format.format_id = Some(number.into()),
    }
    format
}
