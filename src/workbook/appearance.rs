//! How a cell of the inventory looks, translated once from the reading library's terms to the writing library's.

use std::borrow::Cow;

use super::number_format::NumberFormat;
use calamine::{
    Border, BorderStyle, Color, Fill, FillPattern, Font, HorizontalAlignment, Style, TextRotation,
    UnderlineStyle, VerticalAlignment,
};
use rust_xlsxwriter::{Format, FormatAlign, FormatBorder, FormatPattern, FormatUnderline};

/// Number, font, fill, border and alignment of a cell format.
///
/// Names of cell styles, protection, diagonal borders and gradients are not part of it.
#[derive(Debug, Clone, PartialEq, Default)]
pub struct Appearance {
    format: Format,
    numbers: Numbers,
    lines: Lines,
    shown: Option<NumberFormat>,
}

/// Whether a text runs over several lines.
#[derive(Debug, Clone, Copy, PartialEq, Eq, Default)]
pub(super) enum Lines {
    #[default]
    One,
    Wrapped,
}

/// Whether the format says how numbers are shown.
#[derive(Debug, Clone, Copy, PartialEq, Eq, Default)]
enum Numbers {
    #[default]
    AsTyped,
    Formatted,
}

impl Appearance {
    /// The format to write a cell with.
    pub(super) fn format(&self) -> &Format {
        &self.format
    }

    /// The format to write a date with: the same, unless that would show the date as a number.
    pub(super) fn format_for_dates(&self) -> Cow<'_, Format> {
        match self.numbers {
            Numbers::AsTyped => Cow::Owned(self.format.clone().set_num_format("yyyy-mm-dd")),
            Numbers::Formatted => Cow::Borrowed(&self.format),
        }
    }

    /// What it shows of a number, where that is more than digits.
    pub fn number_format(&self) -> Option<&NumberFormat> {
        self.shown.as_ref()
    }

    /// Whether its text runs over several lines.
    pub(super) fn lines(&self) -> Lines {
        self.lines
    }

    /// It adds nothing to a cell without any format.
    pub(super) fn is_plain(&self) -> bool {
        self == &Self::default()
    }

    /// Nothing but a way to show numbers, written as spreadsheet programs write it.
    pub(super) fn of_numbers(code: &str) -> Self {
        Self {
            format: Format::new().set_num_format(code),
            numbers: Numbers::Formatted,
            shown: NumberFormat::of_code(code),
            lines: Lines::One,
        }
    }

    /// Nothing but room for several lines of text.
    pub(super) fn of_several_lines() -> Self {
        Self { format: Format::new().set_text_wrap(), lines: Lines::Wrapped, ..Self::default() }
    }
}

impl From<&Style> for Appearance {
    fn from(style: &Style) -> Self {
        let (mut format, numbers) = number_format(style.number_format.as_ref());
        if let Some(font) = &style.font {
            format = with_font(format, font);
        }
        if let Some(fill) = &style.fill {
            format = with_fill(format, fill);
        }
        if let Some(borders) = &style.borders {
            format = with_borders(format, [&borders.left, &borders.right, &borders.top, &borders.bottom]);
        }
        if let Some(alignment) = &style.alignment {
            format = with_alignment(format, alignment);
        }
        let wraps = style.alignment.as_ref().is_some_and(|alignment| alignment.wrap_text);
        let shown = style.number_format.as_ref().and_then(shown_by);
        Self { format, numbers, lines: if wraps { Lines::Wrapped } else { Lines::One }, shown }
    }
}

/// Built-in formats keep their number: spreadsheet programs show some of them by the user's region.
fn number_format(number: Option<&calamine::NumberFormat>) -> (Format, Numbers) {
    let format = Format::new();
    let Some(number) = number else {
        return (format, Numbers::AsTyped);
    };
    match number.format_id.map(u8::try_from) {
        Some(Ok(0)) => (format, Numbers::AsTyped),
        Some(Ok(built_in @ 1..=58)) => (format.set_num_format_index(built_in), Numbers::Formatted),
        _ if number.format_code == "General" => (format, Numbers::AsTyped),
        _ => (format.set_num_format(number.format_code.as_str()), Numbers::Formatted),
    }
}

/// Of the built-in formats, 9 and 10 show percentages, and 41 to 44 show a zero as a dash.
fn shown_by(number: &calamine::NumberFormat) -> Option<NumberFormat> {
    match number.format_id {
        Some(9 | 10) => NumberFormat::of_code("0%"),
        Some(41..=44) => NumberFormat::of_code("0;-0;\"-\""),
        Some(_) | None => NumberFormat::of_code(&number.format_code),
    }
}

fn with_font(mut format: Format, font: &Font) -> Format {
    // The usual font keeps its tie to the workbook's theme.
    if let Some(name) = font.name.as_deref().filter(|name| *name != "Calibri") {
        format = format.set_font_name(name);
    }
    if let Some(size) = font.size.filter(|size| size.is_finite()) {
        format = format.set_font_size(size);
    }
    if font.is_bold() {
        format = format.set_bold();
    }
    if font.is_italic() {
        format = format.set_italic();
    }
    if font.has_strikethrough() {
        format = format.set_font_strikethrough();
    }
    if let Some(colour) = font.color.filter(|colour| !colour.is_black()) {
        format = format.set_font_color(translate_colour(colour));
    }
    match font.underline {
        UnderlineStyle::Single => format.set_underline(FormatUnderline::Single),
        UnderlineStyle::Double => format.set_underline(FormatUnderline::Double),
        UnderlineStyle::SingleAccounting => format.set_underline(FormatUnderline::SingleAccounting),
        UnderlineStyle::DoubleAccounting => format.set_underline(FormatUnderline::DoubleAccounting),
        _ => format,
    }
}

fn with_fill(mut format: Format, fill: &Fill) -> Format {
    let pattern = translate_pattern(fill.pattern);
    if pattern == FormatPattern::None {
        return format;
    }
    if pattern == FormatPattern::Solid {
        return match fill.get_color() {
            Some(colour) => format.set_background_color(translate_colour(colour)),
            None => format,
        };
    }
    format = format.set_pattern(pattern);
    if let Some(colour) = fill.foreground_color {
        format = format.set_foreground_color(translate_colour(colour));
    }
    if let Some(colour) = fill.background_color {
        format = format.set_background_color(translate_colour(colour));
    }
    format
}

fn with_borders(mut format: Format, [left, right, top, bottom]: [&Border; 4]) -> Format {
    let line = |border: &Border| translate_line(border.style);
    format = format
        .set_border_left(line(left))
        .set_border_right(line(right))
        .set_border_top(line(top))
        .set_border_bottom(line(bottom));
    let colour = |border: &Border| border.color.filter(|_| border.is_visible()).map(translate_colour);
    if let Some(colour) = colour(left) {
        format = format.set_border_left_color(colour);
    }
    if let Some(colour) = colour(right) {
        format = format.set_border_right_color(colour);
    }
    if let Some(colour) = colour(top) {
        format = format.set_border_top_color(colour);
    }
    if let Some(colour) = colour(bottom) {
        format = format.set_border_bottom_color(colour);
    }
    format
}

fn with_alignment(mut format: Format, alignment: &calamine::Alignment) -> Format {
    let horizontal = match alignment.horizontal {
        HorizontalAlignment::Left => Some(FormatAlign::Left),
        HorizontalAlignment::Center => Some(FormatAlign::Center),
        HorizontalAlignment::CenterContinuous => Some(FormatAlign::CenterAcross),
        HorizontalAlignment::Right => Some(FormatAlign::Right),
        HorizontalAlignment::Justify => Some(FormatAlign::Justify),
        HorizontalAlignment::Distributed => Some(FormatAlign::Distributed),
        HorizontalAlignment::Fill => Some(FormatAlign::Fill),
        _ => None,
    };
    let vertical = match alignment.vertical {
        VerticalAlignment::Top => Some(FormatAlign::Top),
        VerticalAlignment::Center => Some(FormatAlign::VerticalCenter),
        VerticalAlignment::Justify => Some(FormatAlign::VerticalJustify),
        VerticalAlignment::Distributed => Some(FormatAlign::VerticalDistributed),
        _ => None,
    };
    for align in [horizontal, vertical].into_iter().flatten() {
        format = format.set_align(align);
    }
    if alignment.wrap_text {
        format = format.set_text_wrap();
    }
    if alignment.shrink_to_fit {
        format = format.set_shrink();
    }
    if let Some(indent) = alignment.indent.filter(|indent| (1..=15).contains(indent)) {
        format = format.set_indent(indent);
    }
    match alignment.text_rotation {
        // The file counts 91 to 180 for the first 90 degrees downwards.
        TextRotation::Degrees(degrees @ 1..=90) => format.set_rotation(i16::try_from(degrees).unwrap_or(0)),
        TextRotation::Degrees(degrees @ 91..=180) => {
            format.set_rotation(i16::try_from(degrees).map_or(0, |degrees| 90 - degrees))
        }
        TextRotation::Stacked => format.set_rotation(270),
        _ => format,
    }
}

fn translate_colour(colour: Color) -> rust_xlsxwriter::Color {
    rust_xlsxwriter::Color::RGB(
        u32::from(colour.red) << 16 | u32::from(colour.green) << 8 | u32::from(colour.blue),
    )
}

fn translate_line(style: BorderStyle) -> FormatBorder {
    match style {
        BorderStyle::Thin => FormatBorder::Thin,
        BorderStyle::Medium => FormatBorder::Medium,
        BorderStyle::Thick => FormatBorder::Thick,
        BorderStyle::Double => FormatBorder::Double,
        BorderStyle::Hair => FormatBorder::Hair,
        BorderStyle::Dashed => FormatBorder::Dashed,
        BorderStyle::Dotted => FormatBorder::Dotted,
        BorderStyle::MediumDashed => FormatBorder::MediumDashed,
        BorderStyle::DashDot => FormatBorder::DashDot,
        BorderStyle::MediumDashDot => FormatBorder::MediumDashDot,
        BorderStyle::DashDotDot => FormatBorder::DashDotDot,
        BorderStyle::MediumDashDotDot => FormatBorder::MediumDashDotDot,
        BorderStyle::SlantDashDot => FormatBorder::SlantDashDot,
        _ => FormatBorder::None,
    }
}

fn translate_pattern(pattern: FillPattern) -> FormatPattern {
    match pattern {
        FillPattern::Solid => FormatPattern::Solid,
        FillPattern::DarkGray => FormatPattern::DarkGray,
        FillPattern::MediumGray => FormatPattern::MediumGray,
        FillPattern::LightGray => FormatPattern::LightGray,
        FillPattern::Gray125 => FormatPattern::Gray125,
        FillPattern::Gray0625 => FormatPattern::Gray0625,
        FillPattern::DarkHorizontal => FormatPattern::DarkHorizontal,
        FillPattern::DarkVertical => FormatPattern::DarkVertical,
        FillPattern::DarkDown => FormatPattern::DarkDown,
        FillPattern::DarkUp => FormatPattern::DarkUp,
        FillPattern::DarkGrid => FormatPattern::DarkGrid,
        FillPattern::DarkTrellis => FormatPattern::DarkTrellis,
        FillPattern::LightHorizontal => FormatPattern::LightHorizontal,
        FillPattern::LightVertical => FormatPattern::LightVertical,
        FillPattern::LightDown => FormatPattern::LightDown,
        FillPattern::LightUp => FormatPattern::LightUp,
        FillPattern::LightGrid => FormatPattern::LightGrid,
        FillPattern::LightTrellis => FormatPattern::LightTrellis,
        _ => FormatPattern::None,
    }
}
