//! CAS and EC numbers that exist, and the same with one digit changed.

use kowledger::substance::{CasError, CasNumber, EcError, EcNumber};

use crate::table::lines;

#[test]
fn published_cas_numbers_are_accepted_and_changed_ones_refused() {
    let lines = lines("cas_numbers.tsv");
    assert!(lines.len() >= 80);
    for line in lines {
        let text = &line["cas-number"];
        match (line["check"].as_str(), CasNumber::parse(text)) {
            ("right", Ok(number)) => assert_eq!(number.to_string(), *text),
            ("wrong", Err(CasError::CheckDigit { .. })) => {}
            (check, parsed) => assert_eq!(check, "", "{text}: {parsed:?}"),
        }
    }
}

#[test]
fn published_ec_numbers_are_accepted_and_changed_ones_refused() {
    let lines = lines("ec_numbers.tsv");
    assert!(lines.len() >= 40);
    for line in lines {
        let text = &line["ec-number"];
        match (line["check"].as_str(), EcNumber::parse(text)) {
            ("right", Ok(number)) => assert_eq!(number.to_string(), *text),
            ("wrong", Err(EcError::CheckDigit { .. } | EcError::NoSuchNumber)) => {}
            (check, parsed) => assert_eq!(check, "", "{text}: {parsed:?}"),
        }
    }
}
