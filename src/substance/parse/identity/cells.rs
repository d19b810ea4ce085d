//! Cells of CAS and EC columns.

use super::dates::{cas_of_dates, dates_in};
use super::numbers::{bare_digits, numbers_in};
use super::words::{Absent, absence, says_mixture, word_of_another};
use super::{CAS_NUMBER, EC_NUMBER};
use crate::fault::CellFaultKind;
use crate::quantity::Date;
use crate::substance::parse::cell;
use crate::substance::{CasError, CasNumber, EcError, EcNumber};
use crate::workbook::CellContent;

const CAS_EXAMPLE: &str = "50-29-3";
const EC_EXAMPLE: &str = "200-024-3";

/// How a number stood in its cell. Smaller is surer.
#[derive(Debug, Clone, Copy, PartialEq, Eq, PartialOrd, Ord)]
pub(super) enum Written {
    /// With its hyphens.
    InFull,
    /// As a date that a spreadsheet made of it.
    AsDate,
    /// Without its hyphens.
    Bare,
}

/// What a CAS cell holds.
pub(super) enum CasCell {
    Missing,
    Mixture,
    Number(CasNumber, Written),
    Misplaced(EcNumber),
}

/// What an EC cell holds.
pub(super) enum EcCell {
    Missing,
    Mixture,
    Number(EcNumber, Written),
    Misplaced(CasNumber),
}

/// What a cell of a CAS column holds.
pub(super) fn read_cas(content: &CellContent) -> Result<CasCell, CellFaultKind> {
    let read = read_cas_number(content)?;
    match read {
        CasCell::Missing | CasCell::Mixture => Ok(read),
        CasCell::Number(..) | CasCell::Misplaced(_) => refuse_of_another(content, CAS_NUMBER).map(|()| read),
    }
}

/// What a cell of an EC column holds.
pub(super) fn read_ec(content: &CellContent) -> Result<EcCell, CellFaultKind> {
    let read = read_ec_number(content)?;
    match read {
        EcCell::Missing | EcCell::Mixture => Ok(read),
        EcCell::Number(..) | EcCell::Misplaced(_) => refuse_of_another(content, EC_NUMBER).map(|()| read),
    }
}

/// A number beside words by which it belongs to another substance, or perhaps does.
fn refuse_of_another(content: &CellContent, what: &'static str) -> Result<(), CellFaultKind> {
    match cell::value_text(content).as_deref().and_then(word_of_another) {
        Some(word) => Err(CellFaultKind::NumberOfAnother { what, word }),
        None => Ok(()),
    }
}

fn read_cas_number(content: &CellContent) -> Result<CasCell, CellFaultKind> {
    let not_a = CellFaultKind::NotA { what: CAS_NUMBER, example: CAS_EXAMPLE };
    if let CellContent::DateTime(serial) = content {
        let date = Date::from_serial(*serial).ok_or(CellFaultKind::DateIsNoCas)?;
        return from_dates(&dates_in(&date.to_string()).unwrap_or_default());
    }
    let Some(text) = cell::value_text(content).filter(|text| !is_placeholder(text)) else {
        return Ok(CasCell::Missing);
    };
    if let Some(dates) = dates_in(&text).filter(|_| !is_of_one_digit(&text)) {
        return from_dates(&dates);
    }
    let numbers = numbers_in(&text);
    let bare = numbers.bare.iter().filter(|digits| cas_from_digits(digits).is_ok()).count();
    match (numbers.cas.as_slice(), bare) {
        ([_], 1..) | ([], 2..) | ([_, _, ..], _) => {
            Err(CellFaultKind::SeveralIdentities { what: "CAS numbers" })
        }
        ([_], 0) if says_mixture(&text) => Err(CellFaultKind::MixtureRow),
        ([number], 0) => CasNumber::parse(number)
            .map(|value| CasCell::Number(value, Written::InFull))
            .map_err(|error| cas_fault(number, error)),
        ([], 0..=1) => match (numbers.ec.as_slice(), absence(&text)) {
            ([number], _) => EcNumber::parse(number).map(CasCell::Misplaced).map_err(|_| not_a),
            (_, _) if numbers.index_number => {
                Err(CellFaultKind::IndexNumber { what: CAS_NUMBER, example: CAS_EXAMPLE })
            }
            (_, Some(Absent::Withheld)) => Ok(CasCell::Missing),
            (_, Some(Absent::Mixture)) => Ok(CasCell::Mixture),
            (_, None) => read_cas_digits(&bare_digits(&text, [2..=10, 2..=2, 1..=1]).ok_or(not_a)?),
        },
    }
}

/// `000-000-0`, `0-00-0`: zeros in the form of a number, where there is none.
fn is_placeholder(text: &str) -> bool {
    text.contains('0') && text.contains('-') && text.bytes().all(|byte| matches!(byte, b'0' | b'-' | b' '))
}

/// `1-11-11`: one digit throughout fills the cell where there is no number, and is no date.
fn is_of_one_digit(text: &str) -> bool {
    let mut digits = text.bytes().filter(u8::is_ascii_digit);
    digits.next().is_some_and(|first| digits.all(|digit| digit == first))
}

fn cas_from_digits(digits: &str) -> Result<CasNumber, CasError> {
    digits.parse().map_err(|_| CasError::Form).and_then(CasNumber::from_digits)
}

/// A number whose hyphens are lost, as 50293.
fn read_cas_digits(digits: &str) -> Result<CasCell, CellFaultKind> {
    match cas_from_digits(digits) {
        Ok(number) => Ok(CasCell::Number(number, Written::Bare)),
        Err(CasError::CheckDigit { .. }) if ec_from_digits(digits).is_some_and(|ec| ec.is_ok()) => {
            Err(CellFaultKind::NumberOfOtherKind { what: CAS_NUMBER, found: EC_NUMBER })
        }
        Err(error) => {
            let (rest, check) = digits.split_at_checked(digits.len().saturating_sub(1)).unwrap_or_default();
            let (first, second) = rest.split_at_checked(rest.len().saturating_sub(2)).unwrap_or_default();
            Err(cas_fault(&format!("{first}-{second}-{check}"), error))
        }
    }
}

fn cas_fault(number: &str, error: CasError) -> CellFaultKind {
    match error {
        CasError::Form => CellFaultKind::NotA { what: CAS_NUMBER, example: CAS_EXAMPLE },
        CasError::CheckDigit { expected } => CellFaultKind::CheckDigit {
            what: CAS_NUMBER,
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

fn from_dates(dates: &[(String, u32, u32)]) -> Result<CasCell, CellFaultKind> {
    let number = cas_of_dates(dates).ok_or(CellFaultKind::DateIsNoCas)?;
    Ok(CasCell::Number(number, Written::AsDate))
}

fn read_ec_number(content: &CellContent) -> Result<EcCell, CellFaultKind> {
    let not_a = CellFaultKind::NotA { what: EC_NUMBER, example: EC_EXAMPLE };
    if matches!(content, CellContent::DateTime(_)) {
        return Err(not_a);
    }
    let Some(text) = cell::value_text(content).filter(|text| !is_placeholder(text)) else {
        return Ok(EcCell::Missing);
    };
    let numbers = numbers_in(&text);
    let is_ec = |digits: &&String| ec_from_digits(digits).is_some_and(|number| number.is_ok());
    let bare = numbers.bare.iter().filter(is_ec).count();
    match (numbers.ec.as_slice(), bare) {
        ([_], 1..) | ([], 2..) | ([_, _, ..], _) => {
            Err(CellFaultKind::SeveralIdentities { what: "EC numbers" })
        }
        ([number], 0) => EcNumber::parse(number)
            .map(|value| EcCell::Number(value, Written::InFull))
            .map_err(|error| ec_fault(number, error)),
        ([], 0..=1) => match (numbers.cas.as_slice(), absence(&text)) {
            ([number], _) => CasNumber::parse(number).map(EcCell::Misplaced).map_err(|_| not_a),
            (_, _) if numbers.index_number => {
                Err(CellFaultKind::IndexNumber { what: EC_NUMBER, example: EC_EXAMPLE })
            }
            (_, Some(Absent::Withheld)) => Ok(EcCell::Missing),
            (_, Some(Absent::Mixture)) => Ok(EcCell::Mixture),
            (_, None) => read_ec_digits(&bare_digits(&text, [3..=3, 3..=3, 1..=1]).ok_or(not_a)?),
        },
    }
}

/// A number whose hyphens are lost, as 2000243.
fn read_ec_digits(digits: &str) -> Result<EcCell, CellFaultKind> {
    match ec_from_digits(digits) {
        Some(Ok(number)) => Ok(EcCell::Number(number, Written::Bare)),
        Some(Err((_, _))) | None if cas_from_digits(digits).is_ok() => {
            Err(CellFaultKind::NumberOfOtherKind { what: EC_NUMBER, found: CAS_NUMBER })
        }
        Some(Err((number, error))) => Err(ec_fault(&number, error)),
        None => Err(CellFaultKind::NotA { what: EC_NUMBER, example: EC_EXAMPLE }),
    }
}

/// The EC number of seven digits; beside the error the digits with hyphens.
fn ec_from_digits(digits: &str) -> Option<Result<EcNumber, (String, EcError)>> {
    let (first, rest) = digits.split_at_checked(3).filter(|_| digits.len() == 7)?;
    let (second, check) = rest.split_at_checked(3)?;
    let number = format!("{first}-{second}-{check}");
    Some(EcNumber::parse(&number).map_err(|error| (number, error)))
}

fn ec_fault(number: &str, error: EcError) -> CellFaultKind {
    match error {
        EcError::Form => CellFaultKind::NotA { what: EC_NUMBER, example: EC_EXAMPLE },
        EcError::NoSuchNumber => CellFaultKind::NoSuchEcNumber,
        EcError::CheckDigit { expected } => CellFaultKind::CheckDigit {
            what: EC_NUMBER,
            expected,
            corrected: with_last_digit(number, expected),
        },
    }
}
