//! What the user is told of a text file: how it was read, and what of it the annotated copy shows otherwise.

use crate::fault::count;
use crate::workbook::encoding::{KnownBy, TextEncoding};

use super::dialect::Dialect;
use super::survey::{Count, Surveyed};

/// How encoding and separator were decided, and what did not fit.
pub(super) fn how_read(encoding: &TextEncoding, dialect: &Dialect, surveyed: &Surveyed) -> Vec<String> {
    let mut sentences = vec![
        encoding_in_words(encoding, surveyed),
        format!("Separator of the fields: {}.", dialect.in_words()),
    ];
    if let Some(first) = &surveyed.broken.first {
        sentences.push(format!(
            "{} not in this encoding and read as `\u{FFFD}`, the first in {first}; export the list again as UTF-8, or \
             save it as xlsx.",
            count(surveyed.broken.number, "character is", "characters are")
        ));
    }
    if let Some(first) = &surveyed.controls.first {
        sentences.push(format!(
            "{} no text, the first in {first}; if letters are missing there, the encoding is another one: save the list \
             as UTF-8 or xlsx.",
            count(surveyed.controls.number, "character is", "characters are")
        ));
    }
    if let Some(first) = &surveyed.short.first {
        sentences.push(format!(
            "{} fewer fields than the others, the first is row {}; if a line break within a text cut such a row in two, \
             put the text into quotation marks.",
            count(surveyed.short.number, "row has", "rows have"),
            first.row + 1
        ));
    }
    if surveyed.zeros > 0 {
        let number = usize::try_from(surveyed.zeros).unwrap_or(usize::MAX);
        sentences.push(format!("{} left out.", count(number, "zero character was", "zero characters were")));
    }
    if let Some(first) = &surveyed.unwrapped.first {
        sentences.push(format!(
            "{} written as a formula (`=\"...\"`) and read as the text within, the first in {first}.",
            count(surveyed.unwrapped.number, "text is", "texts are")
        ));
    }
    sentences
}

fn encoding_in_words(encoding: &TextEncoding, surveyed: &Surveyed) -> String {
    let name = encoding.encoding.name();
    let words: Vec<String> = surveyed.words.iter().map(|word| format!("`{word}`")).collect();
    let shown = if words.is_empty() { String::new() } else { format!(", for example {}", words.join(", ")) };
    match encoding.known_by {
        KnownBy::Mark => format!("Encoding: {name}, as the file's first bytes say."),
        KnownBy::Zeros => format!("Encoding: {name}, as every second byte shows."),
        KnownBy::Ascii => "Encoding: ASCII.".to_owned(),
        KnownBy::Soundness => format!("Encoding: {name}, in which every character is sound."),
        KnownBy::NearSoundness => format!("Encoding: {name}, in which nearly every character is sound."),
        KnownBy::Guess => format!(
            "Encoding: {name}, as its characters suggest{shown}; if such words look wrong, save the list as UTF-8 or xlsx."
        ),
    }
}

/// What the annotated copy shows otherwise.
pub(super) fn not_carried(surveyed: &Surveyed) -> Vec<String> {
    let mut sentences = vec![format!(
        "Sheet `{}`: every cell is written as text, as in the file, so that no number or identifier is changed; a \
         spreadsheet program may mark numbers that are stored as text.",
        surveyed.sheet.name
    )];
    if let Count { number, first: Some(first) } = &surveyed.overlong {
        sentences.push(format!(
            "Sheet `{}`: {} longer than the 32767 characters a cell can hold and cut, the first in {first}.",
            surveyed.sheet.name,
            count(*number, "text is", "texts are")
        ));
    }
    sentences
}
