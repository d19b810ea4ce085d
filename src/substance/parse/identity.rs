//! Which substance a row means, and how sure that is.

use std::fmt::Display;
use std::sync::LazyLock;

use regex::Regex;

use super::cell;
use super::pattern::fixed;
use crate::fault::{CellFault, CellFaultKind};
use crate::quantity::{Date, is_missing, tidy};
use crate::substance::{
    CasError, CasNumber, Cited, EcError, EcNumber, Field, Identity, RowType, Substance, SubstanceType,
};
use crate::workbook::{CellContent, CellRef};

static CAS: LazyLock<Regex> = LazyLock::new(|| fixed(r"\b\d{2,7} ?- ?\d{2} ?- ?\d\b"));
static EC: LazyLock<Regex> = LazyLock::new(|| fixed(r"\b[0-9A-Z]\d{2} ?- ?\d{3} ?- ?\d\b"));
static ISO_DATE: LazyLock<Regex> = LazyLock::new(|| fixed(r"^(\d{4})-(\d{1,2})-(\d{2})(?:[ T]00:00.*)?$"));
static POINT_DATE: LazyLock<Regex> = LazyLock::new(|| fixed(r"^(\d{1,2})\.(\d{1,2})\.(\d{4})$"));
static INCHI_KEY: LazyLock<Regex> = LazyLock::new(|| fixed(r"^(?:InChIKey=)?([A-Z]{14}-[A-Z]{10}-[A-Z])$"));

/// How the number columns of a row were read.
#[derive(Debug, Clone, PartialEq, Default)]
pub(super) struct IdentityCells {
    reading: NumberReading,
    /// The CAS column and the EC column, where two cells of the row disagree.
    contradicted: Vec<Field>,
    /// A CAS number that stands in an EC column.
    misplaced_cas: Option<Cited<CasNumber>>,
    /// An EC number that stands in a CAS column.
    misplaced_ec: Option<Cited<EcNumber>>,
}

/// How sure the numbers of a row are.
#[derive(Debug, Clone, Copy, PartialEq, Eq, PartialOrd, Ord, Default)]
enum NumberReading {
    /// As they stand.
    #[default]
    AsWritten,
    /// The CAS number from a date.
    FromDate,
    /// A cell holds several numbers, or two cells disagree.
    Several,
}

/// What a CAS cell holds.
enum CasCell {
    Missing,
    Number(CasNumber),
    FromDate(CasNumber),
    Misplaced(EcNumber),
}

/// What an EC cell holds.
enum EcCell {
    Missing,
    Number(EcNumber),
    Misplaced(CasNumber),
}

impl IdentityCells {
    /// Takes a cell of a CAS column.
    pub(super) fn take_cas(
        &mut self,
        substance: &mut Substance,
        content: &CellContent,
        cell: CellRef,
    ) -> Result<(), CellFaultKind> {
        let (value, how) = match read_cas(content).inspect_err(|fault| self.note_several(fault))? {
            CasCell::Missing => return Ok(()),
            CasCell::Number(number) => (number, NumberReading::AsWritten),
            CasCell::FromDate(number) => (number, NumberReading::FromDate),
            CasCell::Misplaced(value) => {
                self.misplaced_ec.get_or_insert(Cited { value, cell });
                return Err(CellFaultKind::NumberOfOtherKind { what: CAS_NUMBER, found: EC_NUMBER });
            }
        };
        match &substance.cas {
            None => {
                self.reading = self.reading.max(how);
                substance.cas = Some(Cited { value, cell });
            }
            Some(other) if other.value != value => {
                return Err(self.contradiction(Field::CasNumber, CAS_NUMBER, other));
            }
            // A number as written confirms the one from a date.
            Some(_) if self.reading == NumberReading::FromDate => self.reading = how,
            Some(_) => {}
        }
        Ok(())
    }

    /// Takes a cell of an EC column.
    pub(super) fn take_ec(
        &mut self,
        substance: &mut Substance,
        content: &CellContent,
        cell: CellRef,
    ) -> Result<(), CellFaultKind> {
        let value = match read_ec(content).inspect_err(|fault| self.note_several(fault))? {
            EcCell::Missing => return Ok(()),
            EcCell::Number(number) => number,
            EcCell::Misplaced(value) => {
                self.misplaced_cas.get_or_insert(Cited { value, cell });
                return Err(CellFaultKind::NumberOfOtherKind { what: EC_NUMBER, found: CAS_NUMBER });
            }
        };
        match &substance.ec {
            None => substance.ec = Some(Cited { value, cell }),
            Some(other) if other.value != value => {
                return Err(self.contradiction(Field::EcNumber, EC_NUMBER, other));
            }
            Some(_) => {}
        }
        Ok(())
    }

    fn note_several(&mut self, fault: &CellFaultKind) {
        if matches!(fault, CellFaultKind::SeveralIdentities { .. }) {
            self.reading = NumberReading::Several;
        }
    }

    fn contradiction<T: Display>(
        &mut self,
        field: Field,
        what: &'static str,
        other: &Cited<T>,
    ) -> CellFaultKind {
        self.reading = NumberReading::Several;
        self.contradicted.push(field);
        let (number, other) = (other.value.to_string(), other.cell.clone());
        CellFaultKind::OtherIdentity { what, number, other }
    }

    /// Sets how sure the identity of the row is.
    pub(super) fn conclude(mut self, substance: &mut Substance) {
        self.place_misplaced(substance);
        if self.contradicted.contains(&Field::CasNumber) {
            substance.cas = None;
        }
        if self.contradicted.contains(&Field::EcNumber) {
            substance.ec = None;
        }
        let is_mixture = match substance.row_type {
            RowType::Mixture | RowType::Article => true,
            RowType::Substance => false,
            RowType::NotStated => {
                substance.substance_type.as_ref().map(|cited| cited.value) == Some(SubstanceType::Mixture)
            }
        };
        let second_identifier =
            substance.ec.is_some() || substance.smiles.is_some() || substance.inchi_key.is_some();
        substance.identity = match self.reading {
            NumberReading::Several => Identity::NotIdentified,
            NumberReading::AsWritten | NumberReading::FromDate if is_mixture => Identity::NotIdentified,
            NumberReading::AsWritten | NumberReading::FromDate if second_identifier => Identity::Identified,
            NumberReading::AsWritten if substance.cas.is_some() => Identity::Identified,
            NumberReading::FromDate => Identity::RepairedDate,
            NumberReading::AsWritten => Identity::NameAlone,
        };
    }

    /// A number in the other number's column names the row where nothing else does, and must not contradict one in
    /// its own column.
    fn place_misplaced(&mut self, substance: &mut Substance) {
        let (cas, ec) = (self.misplaced_cas.take(), self.misplaced_ec.take());
        if let Some((own, found)) = substance.cas.as_ref().zip(cas.as_ref())
            && own.value != found.value
        {
            let kind = self.contradiction(Field::CasNumber, CAS_NUMBER, own);
            substance.faults.push(fault_at(found, kind));
        }
        if let Some((own, found)) = substance.ec.as_ref().zip(ec.as_ref())
            && own.value != found.value
        {
            let kind = self.contradiction(Field::EcNumber, EC_NUMBER, own);
            substance.faults.push(fault_at(found, kind));
        }
        let named = substance.cas.is_some()
            || substance.ec.is_some()
            || substance.smiles.is_some()
            || substance.inchi_key.is_some();
        if !named {
            substance.cas = cas;
            substance.ec = ec;
        }
    }
}

const CAS_NUMBER: &str = "CAS number";
const EC_NUMBER: &str = "EC number";

fn fault_at<T: Display>(found: &Cited<T>, kind: CellFaultKind) -> CellFault {
    CellFault { cell: found.cell.clone(), found: found.value.to_string(), kind }
}

fn read_cas(content: &CellContent) -> Result<CasCell, CellFaultKind> {
    if let CellContent::DateTime(serial) = content {
        let date = Date::from_serial(*serial).ok_or(CellFaultKind::DateIsNoCas)?;
        let (year, month, day) = date.parts();
        return from_date(i64::from(year), i64::from(month), i64::from(day));
    }
    let Some(text) = cell::value_text(content) else {
        return Ok(CasCell::Missing);
    };
    if let Some((year, month, day)) = date_in(&text) {
        return from_date(year, month, day);
    }
    let mut found: Vec<String> =
        CAS.find_iter(&text).map(|number| number.as_str().replace(' ', "")).collect();
    found.dedup();
    match found.as_slice() {
        [] => match ec_alone(&text) {
            Some(number) => Ok(CasCell::Misplaced(number)),
            None => read_cas_digits(&text),
        },
        [number] => CasNumber::parse(number).map(CasCell::Number).map_err(|error| cas_fault(number, error)),
        [_, _, ..] => Err(CellFaultKind::SeveralIdentities { what: "CAS numbers" }),
    }
}

/// The one EC number of a text, if its check digit is right.
fn ec_alone(text: &str) -> Option<EcNumber> {
    let mut found = EC.find_iter(text);
    let number = found.next().filter(|_| found.next().is_none())?;
    EcNumber::parse(&number.as_str().replace(' ', "")).ok()
}

/// The one CAS number of a text, if its check digit is right.
fn cas_alone(text: &str) -> Option<CasNumber> {
    let mut found = CAS.find_iter(text);
    let number = found.next().filter(|_| found.next().is_none())?;
    CasNumber::parse(&number.as_str().replace(' ', "")).ok()
}

/// A number whose hyphens are lost, as 50293.
fn read_cas_digits(text: &str) -> Result<CasCell, CellFaultKind> {
    let not_a = CellFaultKind::NotA { what: "CAS number", example: "50-29-3" };
    let only_digits = text.bytes().all(|byte| byte.is_ascii_digit());
    let digits: u64 = text.parse().ok().filter(|_| only_digits && text.len() <= 10).ok_or(not_a.clone())?;
    let written = format!("{}-{:02}-{}", digits / 1000, digits / 10 % 100, digits % 10);
    match CasNumber::from_digits(digits) {
        Ok(number) => Ok(CasCell::Number(number)),
        Err(CasError::Form) => Err(not_a),
        Err(error @ CasError::CheckDigit { .. }) => Err(cas_fault(&written, error)),
    }
}

fn cas_fault(number: &str, error: CasError) -> CellFaultKind {
    match error {
        CasError::Form => CellFaultKind::NotA { what: "CAS number", example: "50-29-3" },
        CasError::CheckDigit { expected } => CellFaultKind::CheckDigit {
            what: "CAS number",
            expected,
            corrected: with_last_digit(number, expected),
        },
    }
}

fn with_last_digit(number: &str, digit: u8) -> String {
    let mut corrected = number.to_owned();
    corrected.pop();
    corrected.push(char::from(b'0' + digit.min(9)));
    corrected
}

/// Year, month and day of `1918-02-01` or `01.02.1918`.
fn date_in(text: &str) -> Option<(i64, i64, i64)> {
    let number = |found: &regex::Captures<'_>, group| found.get(group)?.as_str().parse().ok();
    if let Some(found) = ISO_DATE.captures(text) {
        return Some((number(&found, 1)?, number(&found, 2)?, number(&found, 3)?));
    }
    let found = POINT_DATE.captures(text)?;
    Some((number(&found, 3)?, number(&found, 2)?, number(&found, 1)?))
}

/// The CAS number of which a spreadsheet made this date. A year of the last or this century may have been written
/// with two digits; the check digit never fits both readings.
fn from_date(year: i64, month: i64, day: i64) -> Result<CasCell, CellFaultKind> {
    let short = (1930..2030).contains(&year).then(|| format!("{:02}-{month:02}-{day}", year % 100));
    let candidates = [Some(format!("{year}-{month:02}-{day}")), short];
    candidates
        .into_iter()
        .flatten()
        .find_map(|candidate| CasNumber::parse(&candidate).ok())
        .map(CasCell::FromDate)
        .ok_or(CellFaultKind::DateIsNoCas)
}

fn read_ec(content: &CellContent) -> Result<EcCell, CellFaultKind> {
    let not_a = CellFaultKind::NotA { what: EC_NUMBER, example: "200-024-3" };
    if matches!(content, CellContent::DateTime(_)) {
        return Err(not_a);
    }
    let Some(text) = cell::value_text(content) else {
        return Ok(EcCell::Missing);
    };
    let mut found: Vec<String> =
        EC.find_iter(&text).map(|number| number.as_str().replace(' ', "").to_uppercase()).collect();
    found.dedup();
    let number = match found.as_slice() {
        [] => match (cas_alone(&text), ec_from_digits(&text)) {
            (Some(number), _) => return Ok(EcCell::Misplaced(number)),
            (None, Some(number)) => number,
            (None, None) => return Err(not_a),
        },
        [number] => number.clone(),
        [_, _, ..] => return Err(CellFaultKind::SeveralIdentities { what: "EC numbers" }),
    };
    EcNumber::parse(&number).map(EcCell::Number).map_err(|error| match error {
        EcError::Form => not_a,
        EcError::NoSuchNumber => CellFaultKind::NoSuchEcNumber,
        EcError::CheckDigit { expected } => CellFaultKind::CheckDigit {
            what: EC_NUMBER,
            expected,
            corrected: with_last_digit(&number, expected),
        },
    })
}

/// A number whose hyphens are lost, as 2000243.
fn ec_from_digits(text: &str) -> Option<String> {
    let only_digits = text.len() == 7 && text.bytes().all(|byte| byte.is_ascii_digit());
    let (first, rest) = text.split_at_checked(3).filter(|_| only_digits)?;
    let (second, check) = rest.split_at_checked(3)?;
    Some(format!("{first}-{second}-{check}"))
}

/// A SMILES by its characters only; whether it is a molecule is for the structure to find.
pub(super) fn read_smiles(content: &CellContent) -> Result<Option<String>, CellFaultKind> {
    let Some(text) = cell::text_of(content) else {
        return Ok(None);
    };
    if is_missing(&tidy(&text)) {
        return Ok(None);
    }
    if looks_like_smiles(&text) {
        Ok(Some(text))
    } else {
        Err(CellFaultKind::NotA { what: "SMILES", example: "CCO" })
    }
}

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
    !in_bracket && !is_word && text.contains(|character: char| character.is_ascii_alphabetic())
}

/// Words in capitals that could be read as a structure.
const WORDS: [&str; 6] = ["NO", "ON", "IN", "SO", "NON", "SI"];

pub(super) fn read_inchi_key(content: &CellContent) -> Result<Option<String>, CellFaultKind> {
    let Some(text) = cell::value_text(content) else {
        return Ok(None);
    };
    let key = INCHI_KEY.captures(&text).and_then(|found| Some(found.get(1)?.as_str().to_uppercase()));
    let not_a = CellFaultKind::NotA { what: "InChI key", example: "LFQSCWFLJHTTHZ-UHFFFAOYSA-N" };
    key.map(Some).ok_or(not_a)
}

/// A name or formula as written. `Na`, `Nb` and `Nd` are elements and no words for missing.
pub(super) fn read_name(content: &CellContent) -> Option<String> {
    let text = cell::text_of(content)?;
    let is_element = matches!(text.as_str(), "Na" | "Nb" | "Nd");
    (is_element || !is_missing(&tidy(&text))).then_some(text)
}
