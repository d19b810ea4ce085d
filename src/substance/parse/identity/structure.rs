//! SMILES and InChI keys, by their characters only; whether it is a molecule is for the structure to find.

use std::collections::BTreeMap;
use std::sync::LazyLock;

use regex::Regex;

use super::words::absence;
use crate::fault::CellFaultKind;
use crate::quantity::{is_missing, tidy};
use crate::substance::parse::cell;
use crate::substance::parse::pattern::fixed;
use crate::workbook::CellContent;

/// The ninth letter of the second block says whether the key is a standard one.
static INCHI_KEY: LazyLock<Regex> = LazyLock::new(|| fixed(r"(?-u:\b)[A-Z]{14}-[A-Z]{8}[SN]A-[A-Z](?-u:\b)"));
static KEY_ALONE: LazyLock<Regex> =
    LazyLock::new(|| fixed(r"^(?:InChI ?Key)? ?[=:]? ?([A-Z]{14}-[A-Z]{8}[SN]A-[A-Z])$"));

/// The SMILES of a cell.
pub(super) fn read_smiles(content: &CellContent) -> Result<Option<String>, CellFaultKind> {
    let Some(text) = cell::text_of(content) else {
        return Ok(None);
    };
    if looks_like_smiles(&text) {
        return Ok(Some(text));
    }
    let tidied = tidy(&text);
    // `[Na+` is no word for missing.
    if (is_missing(&tidied) && !tidied.contains('[')) || absence(&tidied).is_some() {
        return Ok(None);
    }
    let separators = |character: char| character.is_whitespace() || matches!(character, ';' | ',' | '|');
    let mut parts = text.split(separators).filter(|part| !part.is_empty());
    Err(if parts.clone().count() > 1 && parts.all(looks_like_smiles) {
        CellFaultKind::SeveralIdentities { what: "SMILES" }
    } else {
        CellFaultKind::NotA { what: "SMILES", example: "CCO" }
    })
}

/// Words in capitals that could be read as a structure.
const WORDS: [&str; 6] = ["NO", "ON", "IN", "SO", "NON", "SI"];

fn looks_like_smiles(text: &str) -> bool {
    const BONDS_AND_RINGS: &str = "-=#$:/\\.%()+@*~0123456789";
    let mut in_bracket = false;
    let mut before = ' ';
    for character in text.chars() {
        let belongs = match character {
            '[' => !std::mem::replace(&mut in_bracket, true),
            ']' => std::mem::replace(&mut in_bracket, false),
            _ if in_bracket => character.is_ascii_graphic(),
            'l' => before == 'C',
            'r' => before == 'B',
            'B' | 'C' | 'N' | 'O' | 'P' | 'S' | 'F' | 'I' | 'b' | 'c' | 'n' | 'o' | 'p' | 's' => true,
            _ => BONDS_AND_RINGS.contains(character),
        };
        if !belongs {
            return false;
        }
        before = character;
    }
    // Aromatic atoms make rings, and a ring has its number: `no` and `con` are words.
    let without_halogens = text.replace("Cl", "").replace("Br", "");
    let aromatic = without_halogens.contains(|letter: char| letter.is_ascii_lowercase());
    let has_digit = text.contains(|character: char| character.is_ascii_digit());
    let is_word = !text.contains('[') && ((aromatic && !has_digit) || WORDS.contains(&text));
    let has_atom = text.contains(|character: char| character.is_ascii_alphabetic() || character == '*');
    let ends_in_bond = text.ends_with(['-', '=', '#', '$', ':', '/', '\\', '.', '(', '%']);
    !in_bracket && !is_word && has_atom && !ends_in_bond && is_closed(text)
}

/// Whether branches and rings that begin end as well: `CCl4` and `CO2` are formulas.
fn is_closed(text: &str) -> bool {
    let mut branches = 0usize;
    let mut rings: BTreeMap<u32, bool> = BTreeMap::new();
    let mut characters = text.chars();
    while let Some(character) = characters.next() {
        match character {
            '[' => while characters.next().is_some_and(|inside| inside != ']') {},
            '(' => branches += 1,
            ')' if branches == 0 => return false,
            ')' => branches -= 1,
            '%' => {
                let (tens, ones) = (characters.next(), characters.next());
                let digit = |character: Option<char>| character.and_then(|character| character.to_digit(10));
                let Some((tens, ones)) = digit(tens).zip(digit(ones)) else {
                    return false;
                };
                let open = rings.entry(tens * 10 + ones).or_default();
                *open = !*open;
            }
            _ => {
                if let Some(number) = character.to_digit(10) {
                    let open = rings.entry(number).or_default();
                    *open = !*open;
                }
            }
        }
    }
    branches == 0 && rings.values().all(|open| !open)
}

/// The InChI key of a cell.
pub(super) fn read_inchi_key(content: &CellContent) -> Result<Option<String>, CellFaultKind> {
    let Some(text) = cell::value_text(content) else {
        return Ok(None);
    };
    if absence(&text).is_some() {
        return Ok(None);
    }
    if let Some(key) = KEY_ALONE.captures(&text).and_then(|found| found.get(1)) {
        return Ok(Some(key.as_str().to_uppercase()));
    }
    Err(if INCHI_KEY.find_iter(&text).count() > 1 {
        CellFaultKind::SeveralIdentities { what: "InChI keys" }
    } else {
        CellFaultKind::NotA { what: "InChI key", example: "LFQSCWFLJHTTHZ-UHFFFAOYSA-N" }
    })
}
