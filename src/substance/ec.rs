//! EC numbers and their check digit.

use std::fmt;

/// An EC number (or list number) whose check digit is right, written `NNN-NNN-R`.
#[derive(Debug, Clone, Copy, PartialEq, Eq, PartialOrd, Ord, Hash)]
pub struct EcNumber([u8; 7]);

/// Why a text is no EC number.
#[derive(Debug, Clone, Copy, PartialEq, Eq, thiserror::Error)]
pub enum EcError {
    /// Not three, three and one characters.
    #[error("an EC number has three, three and one characters, for example 200-024-3")]
    Form,
    /// The check digit does not fit.
    #[error("the check digit should be {expected}")]
    CheckDigit {
        /// The digit that would fit.
        expected: u8,
    },
    /// The first six characters leave a remainder of 10, for which no digit exists, or the first one is 0 or 1, with
    /// which no number begins.
    #[error("no EC number starts with these six characters")]
    NoSuchNumber,
}

impl EcNumber {
    /// The number written with hyphens.
    ///
    /// (N1 + 2 N2 + 3 N3 + 4 N4 + 5 N5 + 6 N6) mod 11 is the check digit. Where the remainder is 10, numbers of the
    /// 4xx series were issued with check digit 1 (second-hand). Letters count A = 10, B = 11, ... without I, L and O.
    pub fn parse(text: &str) -> Result<Self, EcError> {
        let groups: Vec<&str> = text.split('-').collect();
        let (3, [3, 3, 1]) =
            (groups.len(), [0, 1, 2].map(|place| groups.get(place).map_or(0, |group| group.len())))
        else {
            return Err(EcError::Form);
        };
        let written = groups.concat().to_ascii_uppercase();
        let (body, check) = written.split_at_checked(6).ok_or(EcError::Form)?;
        let mut sum = 0;
        for (factor, byte) in (1u32..).zip(body.bytes()) {
            sum += factor * character_value(byte).ok_or(EcError::Form)?;
        }
        if body.starts_with(['0', '1']) {
            return Err(EcError::NoSuchNumber);
        }
        let found = check.parse::<u32>().map_err(|_| EcError::Form)?;
        let expected = sum % 11;
        let issued_with_one = expected == 10 && body.starts_with('4') && found == 1;
        if expected == found || issued_with_one {
            let digits = written.as_bytes().try_into().map_err(|_| EcError::Form)?;
            Ok(Self(digits))
        } else if expected == 10 {
            Err(EcError::NoSuchNumber)
        } else {
            Err(EcError::CheckDigit { expected: u8::try_from(expected).map_err(|_| EcError::Form)? })
        }
    }
}

fn character_value(byte: u8) -> Option<u32> {
    const LETTERS: &[u8] = b"ABCDEFGHJKMNPQRSTUVWXYZ";
    if byte.is_ascii_digit() {
        return Some(u32::from(byte - b'0'));
    }
    let position = LETTERS.iter().position(|letter| *letter == byte)?;
    u32::try_from(position).ok().map(|place| place + 10)
}

impl fmt::Display for EcNumber {
    fn fmt(&self, formatter: &mut fmt::Formatter<'_>) -> fmt::Result {
        for (place, byte) in self.0.iter().enumerate() {
            if matches!(place, 3 | 6) {
                formatter.write_str("-")?;
            }
            write!(formatter, "{}", char::from(*byte))?;
        }
        Ok(())
    }
}

#[cfg(test)]
mod tests {
    use super::{EcError, EcNumber};

    #[test]
    fn well_known_numbers_are_read_and_written_the_same() {
        // Formaldehyde, DDT, DEHP; a list number with a letter as published in the agency's announcement.
        for text in ["200-001-8", "200-024-3", "204-211-0", "A00-001-5"] {
            assert_eq!(EcNumber::parse(text).unwrap().to_string(), text);
        }
    }

    #[test]
    fn a_wrong_check_digit_is_refused_with_the_right_one() {
        assert_eq!(EcNumber::parse("200-024-4"), Err(EcError::CheckDigit { expected: 3 }));
    }

    #[test]
    fn a_remainder_of_ten_is_accepted_with_one_in_the_4xx_series_only() {
        // 4 + 0 + 0 + 0 + 0 + 6 x 1 = 10.
        assert!(EcNumber::parse("400-001-1").is_ok());
        // 2 + 2 + 0 + 0 + 0 + 6 x 1 = 10.
        assert_eq!(EcNumber::parse("210-001-1"), Err(EcError::NoSuchNumber));
    }

    #[test]
    fn no_number_begins_with_zero_or_one_whatever_its_check_digit() {
        for text in ["000-000-0", "123-456-3"] {
            assert_eq!(EcNumber::parse(text), Err(EcError::NoSuchNumber), "{text}");
        }
        assert!(EcNumber::parse("200-001-8").is_ok());
    }

    #[test]
    fn other_forms_are_refused() {
        for text in ["", "200-024", "200-024-33", "2OO-024-3", "200/024/3"] {
            assert_eq!(EcNumber::parse(text), Err(EcError::Form), "{text}");
        }
    }
}
