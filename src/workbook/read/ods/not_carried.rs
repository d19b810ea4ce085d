//! Which parts of an OpenDocument workbook an annotated copy lacks, in sentences for the user.

use crate::fault::count;
use crate::workbook::package::folded;
use crate::workbook::survey::SheetSurvey;

use super::walk::BookExtras;

/// What is stored in parts of their own, in words.
pub(super) fn parts<'name>(names: impl Iterator<Item = &'name str>) -> Vec<String> {
    let (mut macros, mut objects, mut images) = (false, 0_usize, 0_usize);
    for name in names.map(folded) {
        macros |= name.starts_with("basic/") || name.starts_with("scripts/");
        let object = name.strip_prefix("object ").and_then(|rest| rest.split_once('/'));
        objects += usize::from(object.is_some_and(|(_, part)| part == "content.xml"));
        images += usize::from(name.starts_with("pictures/") && !name.ends_with('/'));
    }
    let mut things = Vec::new();
    if macros {
        things.push("macros".to_owned());
    }
    if objects > 0 {
        things.push(count(objects, "chart or embedded object", "charts or embedded objects"));
    }
    if images > 0 {
        things.push(count(images, "image", "images"));
    }
    things
}

/// What is not carried over, a sentence for each kind of thing.
pub(super) fn sentences(mut parts: Vec<String>, book: &BookExtras, sheets: &[SheetSurvey]) -> Vec<String> {
    let mut sentences = vec![
        "Workbook, not carried over: cell formats (fonts, colours, borders, number formats); dates are shown as \
         2026-12-31, and percentages as percentages."
            .to_owned(),
    ];
    if book.pivot_tables > 0 {
        parts.push(count(book.pivot_tables, "pivot table", "pivot tables"));
    }
    if book.filters > 0 {
        parts.push(count(book.filters, "filter", "filters"));
    }
    if book.named > 0 {
        parts.push(count(book.named, "defined name", "defined names"));
    }
    if !parts.is_empty() {
        sentences.push(format!("Workbook, not carried over: {}.", parts.join(", ")));
    }
    if book.mixed_texts > 0 {
        let number = usize::try_from(book.mixed_texts).unwrap_or(usize::MAX);
        sentences.push(format!(
            "Workbook: {} within a cell; the output shows each in one font.",
            count(number, "text changes its font", "texts change their font")
        ));
    }
    sentences.extend(sheets.iter().flat_map(SheetSurvey::not_carried));
    sentences
}
