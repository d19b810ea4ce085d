//! Which parts of an inventory an annotated copy lacks, in sentences for the user.

use crate::fault::count;

use super::contents::Contents;
use super::package::folded;

/// A kind of part: where it is stored, and what the user calls it (one, several).
const KINDS: [(&str, &str, &str); 8] = [
    ("xl/vbaproject.bin", "macro project", "macro projects"),
    ("xl/charts/chart", "chart", "charts"),
    ("xl/media/", "image", "images"),
    ("xl/pivottables/pivottable", "pivot table", "pivot tables"),
    ("xl/slicers/", "slicer", "slicers"),
    ("xl/externallinks/externallink", "link to another workbook", "links to other workbooks"),
    ("xl/connections.xml", "data connection", "data connections"),
    ("xl/embeddings/", "embedded file", "embedded files"),
];

/// What of the workbook as a whole is not carried over.
pub(super) fn parts_not_carried<'name>(
    parts: impl Iterator<Item = &'name str>,
    contents: &Contents,
) -> Vec<String> {
    let mut found = [0_usize; KINDS.len()];
    for part in parts.map(folded).filter(|part| !part.contains("/_rels/")) {
        for (number, (place, ..)) in found.iter_mut().zip(KINDS) {
            if part.starts_with(place) {
                *number += 1;
            }
        }
    }
    let mut things: Vec<String> = found
        .into_iter()
        .zip(KINDS)
        .filter(|(number, _)| *number > 0)
        .map(|(number, (_, one, several))| count(number, one, several))
        .collect();
    if contents.defined_names > 0 {
        things.push(count(contents.defined_names, "defined name", "defined names"));
    }
    let mut sentences = Vec::new();
    if !things.is_empty() {
        sentences.push(format!("Workbook, not carried over: {}.", things.join(", ")));
    }
    if !contents.other_sheets.is_empty() {
        let names: Vec<String> = contents.other_sheets.iter().map(|name| format!("`{name}`")).collect();
        sentences.push(format!(
            "Workbook, not carried over: {} {}, without cells.",
            if names.len() == 1 { "sheet" } else { "sheets" },
            names.join(", ")
        ));
    }
    if contents.mixed_texts > 0 {
        let number = usize::try_from(contents.mixed_texts).unwrap_or(usize::MAX);
        sentences.push(format!(
            "Workbook: {} within a cell; the output shows each in the cell's font.",
            count(number, "text changes its font", "texts change their font")
        ));
    }
    sentences
}
