//! What the named styles of a workbook say about sheets, columns and rows. It looks at no cell format.

use std::collections::{BTreeMap, BTreeSet};

use quick_xml::events::{BytesStart, Event};

use super::walk::named;

/// Pixels of an inch, as spreadsheet programs count.
const PIXELS_AN_INCH: f64 = 96.0;

/// Pixels of a character of the usual font, in which widths are counted.
const PIXELS_A_CHARACTER: f64 = 7.0;

/// Styles by their names.
#[derive(Debug, Default)]
pub(super) struct Styles {
    hidden_sheets: BTreeSet<String>,
    widths: BTreeMap<String, f64>,
    set_heights: BTreeSet<String>,
    name: String,
}

impl Styles {
    /// Takes note of what an element says.
    pub(super) fn visit(&mut self, event: &Event<'_>) {
        let Event::Start(element) = event else {
            return;
        };
        match element.name().as_ref() {
            "style:style" => self.name = named(element, "style:name").unwrap_or_default(),
            "style:table-properties" if said(element, "table:display", "false") => {
                self.hidden_sheets.insert(self.name.clone());
            }
            "style:table-column-properties" => {
                if let Some(width) = named(element, "style:column-width").as_deref().and_then(characters) {
                    self.widths.insert(self.name.clone(), width);
                }
            }
            "style:table-row-properties" if said(element, "style:use-optimal-row-height", "false") => {
                self.set_heights.insert(self.name.clone());
            }
            _ => {}
        }
    }

    /// Whether sheets of this style are hidden.
    pub(super) fn hides(&self, style: &str) -> bool {
        self.hidden_sheets.contains(style)
    }

    /// How wide columns of this style are, in characters.
    pub(super) fn width(&self, style: &str) -> Option<f64> {
        self.widths.get(style).copied()
    }

    /// Whether rows of this style have a height that someone set.
    pub(super) fn sets_height(&self, style: &str) -> bool {
        self.set_heights.contains(style)
    }
}

fn said(element: &BytesStart<'_>, name: &str, value: &str) -> bool {
    named(element, name).is_some_and(|found| found == value)
}

/// A length such as `2.258cm`, in characters.
fn characters(length: &str) -> Option<f64> {
    let number_end = length.find(|character: char| character.is_ascii_alphabetic())?;
    let (number, unit) = length.split_at_checked(number_end)?;
    let inches_a_unit = match unit {
        "in" => 1.0,
        "cm" => 1.0 / 2.54,
        "mm" => 1.0 / 25.4,
        "pt" => 1.0 / 72.0,
        "pc" => 1.0 / 6.0,
        "px" => 1.0 / PIXELS_AN_INCH,
        _ => return None,
    };
    let inches = number.trim().parse::<f64>().ok()? * inches_a_unit;
    let characters = inches * PIXELS_AN_INCH / PIXELS_A_CHARACTER;
    (0.0..=255.0).contains(&characters).then_some(characters)
}

#[cfg(test)]
mod tests {
    use super::characters;

    #[test]
    fn a_width_in_any_unit_becomes_characters() {
        for length in ["0.875in", "2.2225cm", "22.225mm", "63pt", "84px"] {
            let width = characters(length).unwrap();
            assert!((width - 12.0).abs() < 1e-9, "{length}: {width}");
        }
        for none in ["", "12", "50%", "-1cm", "1000in", "cm"] {
            assert_eq!(characters(none), None, "{none}");
        }
    }
}
