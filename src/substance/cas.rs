//! CAS Registry Numbers and their check digit.

use std::fmt;

/// A CAS Registry Number whose check digit is right.
#[derive(Debug, Clone, Copy, PartialEq, Eq, PartialOrd, Ord, Hash)]
pub struct CasNumber(u64);

/// Why a text is no CAS number.
#[derive(Debug, Clone, Copy, PartialEq, Eq, thiserror::Error)]
pub enum CasError {
    /// Not two to seven digits, two digits, one digit.
    #[error("a CAS number has two to seven digits, two digits and a check digit, for example 50-29-3")]
    Form,
    /// The check digit does not fit the other digits.
    #[error("the check digit should be {expected}")]
    CheckDigit {
        /// The digit that would fit.
        expected: u8,
    },
}

impl CasNumber {
    /// The number made of the digits without hyphens, for example 50293 for 50-29-3.
    ///
    /// From the right, the check digit left out, the digits are multiplied by 1, 2, 3, ... and added; the sum modulo
    /// 10 is the check digit (published rule of the registry).
    pub fn from_digits(digits: u64) -> Result<Self, CasError> {
        // The registry begins at 50-00-0; nines alone, like zeros, stand for no number.
        if !(50_000..9_999_999_990).contains(&digits) {
            return Err(CasError::Form);
        }
        let expected = check_digit(digits / 10);
        if digits % 10 == u64::from(expected) {
            Ok(Self(digits))
        } else {
            Err(CasError::CheckDigit { expected })
        }
    }

    /// The number written with hyphens.
    pub fn parse(text: &str) -> Result<Self, CasError> {
        let mut groups = text.split('-');
        let (first, second, check) = (groups.next(), groups.next(), groups.next());
        let (Some(first), Some(second), Some(check), None) = (first, second, check, groups.next()) else {
            return Err(CasError::Form);
        };
        let only_digits =
            [first, second, check].iter().all(|group| group.bytes().all(|byte| byte.is_ascii_digit()));
        if !only_digits || !(2..=7).contains(&first.len()) || second.len() != 2 || check.len() != 1 {
            return Err(CasError::Form);
        }
        let digits = format!("{first}{second}{check}").parse().map_err(|_| CasError::Form)?;
        Self::from_digits(digits)
    }
}

fn check_digit(mut digits: u64) -> u8 {
    let mut sum = 0;
    let mut factor = 1;
    while digits > 0 {
        sum += factor * (digits % 10);
        digits /= 10;
        factor += 1;
    }
    u8::try_from(sum % 10).unwrap_or(0)
}

impl fmt::Display for CasNumber {
    fn fmt(&self, formatter: &mut fmt::Formatter<'_>) -> fmt::Result {
        write!(formatter, "{}-{:02}-{}", self.0 / 1000, self.0 / 10 % 100, self.0 % 10)
    }
}

#[cfg(test)]
mod tests {
    use super::{CasError, CasNumber};

    #[test]
    fn well_known_numbers_are_read_and_written_the_same() {
        // DDT, water, hexachlorobenzene, DEHP, PFOA, 4-nonylphenol branched.
        for text in ["50-29-3", "7732-18-5", "118-74-1", "117-81-7", "335-67-1", "84852-15-3"] {
            assert_eq!(CasNumber::parse(text).unwrap().to_string(), text);
        }
    }

    #[test]
    fn a_wrong_check_digit_is_refused_with_the_right_one() {
        assert_eq!(CasNumber::parse("50-29-4"), Err(CasError::CheckDigit { expected: 3 }));
    }

    #[test]
    fn the_first_number_of_the_registry_is_read_and_placeholders_are_not() {
        assert!(CasNumber::parse("50-00-0").is_ok());
        for text in ["49-99-7", "10-00-4", "00-00-0", "000-00-0", "0000000-00-0", "9999999-99-5"] {
            assert_eq!(CasNumber::parse(text), Err(CasError::Form), "{text}");
        }
    }

    #[test]
    fn other_forms_are_refused() {
        for text in ["", "50-29", "5-29-3", "50-2-93", "12345678-12-1", "a0-29-3", "50-29-3-1"] {
            assert_eq!(CasNumber::parse(text), Err(CasError::Form), "{text}");
        }
    }
}
