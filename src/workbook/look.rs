//! How our own cells look. The words of a cell tell; the look only repeats them for the eye.
//!
//! Verdicts are shades of one plum: the deeper, the more concern, and so in greyscale, too. What is not known is
//! hatched or dotted and framed, never pale. There are no traffic lights.

use rust_xlsxwriter::{Color, Format, FormatAlign, FormatBorder, FormatPattern, FormatUnderline};

/// The look of one of our cells.
#[derive(Debug, Clone, Copy, PartialEq, Eq)]
pub enum Look {
    /// The head of a column.
    Header,
    /// Text on one line.
    Text,
    /// Text over several lines.
    Wrapped,
    /// Text over several lines that does not make its row higher: the rest shows when the cell is clicked.
    Aside,
    /// A number, as the spreadsheet program shows numbers.
    Number,
    /// A number to two decimals, such as a standard deviation or a chance.
    TwoDecimals,
    /// The heading of a sheet.
    Title,
    /// Text that stands back.
    Subtle,
    /// Something to click on.
    Link,
    /// A cell with one of the words of a verdict.
    Verdict(Shade),
}

/// The shade of a verdict.
#[derive(Debug, Clone, Copy, PartialEq, Eq)]
pub enum Shade {
    /// The substance is on a list.
    Listed,
    /// The criterion is fulfilled.
    Fulfilled,
    /// It screens in.
    ScreensIn,
    /// The data do not settle it.
    Unresolved,
    /// There is nothing to judge by.
    NoData,
    /// It screens out.
    ScreensOut,
    /// The criterion is not fulfilled.
    NotFulfilled,
    /// The instrument does not look at such substances.
    OutOfScope,
}

const INK: Color = Color::RGB(0x2B_1B2F);
const DEEPEST: Color = Color::RGB(0x4A_1D54);
const MIDDLE: Color = Color::RGB(0xB9_8CC4);
const PALE: Color = Color::RGB(0xE4_D5E8);
const MISTY: Color = Color::RGB(0xEF_EAF1);
const PALEST: Color = Color::RGB(0xF7_F2F8);
const FRAME: Color = Color::RGB(0x7B_5A86);
const GREY: Color = Color::RGB(0x66_6670);
const HEADER: Color = Color::RGB(0xDF_E6EE);
const WHITE: Color = Color::RGB(0xFF_FFFF);

/// The formats of all looks, built once: each differing format a workbook uses counts against a limit.
pub(super) struct Looks {
    header: Format,
    text: Format,
    wrapped: Format,
    number: Format,
    two_decimals: Format,
    title: Format,
    subtle: Format,
    link: Format,
    listed: Format,
    fulfilled: Format,
    screens_in: Format,
    unresolved: Format,
    no_data: Format,
    screens_out: Format,
    not_fulfilled: Format,
    out_of_scope: Format,
}

impl Looks {
    pub(super) fn new() -> Self {
        let top = || Format::new().set_align(FormatAlign::Top);
        // A step in from the edge keeps the words off the frame and off the number before them.
        let indented = || top().set_align(FormatAlign::Left).set_indent(1);
        let verdict = || indented().set_font_color(INK);
        let framed = |line| verdict().set_border(line).set_border_color(FRAME);
        Self {
            header: top()
                .set_bold()
                .set_text_wrap()
                .set_background_color(HEADER)
                .set_border_bottom(FormatBorder::Thin),
            text: top(),
            wrapped: top().set_text_wrap(),
            number: top().set_align(FormatAlign::Right),
            two_decimals: top().set_align(FormatAlign::Right).set_num_format("0.00"),
            title: top().set_bold().set_font_size(14.0).set_font_color(DEEPEST),
            subtle: top().set_font_color(GREY),
            link: top().set_font_color(FRAME).set_underline(FormatUnderline::Single),
            listed: indented()
                .set_bold()
                .set_font_color(WHITE)
                .set_background_color(DEEPEST)
                .set_border(FormatBorder::Double)
                .set_border_color(MIDDLE),
            fulfilled: indented().set_bold().set_font_color(WHITE).set_background_color(DEEPEST),
            screens_in: verdict().set_bold().set_background_color(MIDDLE),
            unresolved: framed(FormatBorder::Thin)
                .set_pattern(FormatPattern::LightUp)
                .set_foreground_color(MIDDLE)
                .set_background_color(PALE),
            no_data: framed(FormatBorder::Dashed)
                .set_pattern(FormatPattern::Gray125)
                .set_foreground_color(FRAME)
                .set_background_color(MISTY),
            screens_out: verdict().set_background_color(PALEST),
            not_fulfilled: framed(FormatBorder::Hair),
            out_of_scope: indented().set_italic().set_font_color(GREY),
        }
    }

    pub(super) fn format(&self, look: Look) -> &Format {
        match look {
            Look::Header => &self.header,
            Look::Text => &self.text,
            Look::Wrapped | Look::Aside => &self.wrapped,
            Look::Number => &self.number,
            Look::TwoDecimals => &self.two_decimals,
            Look::Title => &self.title,
            Look::Subtle => &self.subtle,
            Look::Link => &self.link,
            Look::Verdict(shade) => match shade {
                Shade::Listed => &self.listed,
                Shade::Fulfilled => &self.fulfilled,
                Shade::ScreensIn => &self.screens_in,
                Shade::Unresolved => &self.unresolved,
                Shade::NoData => &self.no_data,
                Shade::ScreensOut => &self.screens_out,
                Shade::NotFulfilled => &self.not_fulfilled,
                Shade::OutOfScope => &self.out_of_scope,
            },
        }
    }
}
