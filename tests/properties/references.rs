//! Columns of sources and references: where they say how a value was obtained.

use kowledger::substance::{Basis, Property};

use crate::sheet::read_last;

/// The basis of the first value of a property in a row of three columns.
fn basis_beside(header: &str, source_header: &str, source: &str, property: Property) -> Option<Basis> {
    let substance = read_last(&[&["CAS", header, source_header], &["50-29-3", "4.5", source]]).ok()?;
    substance.readings.get(&property).and_then(|readings| readings.first()).map(|reading| reading.basis)
}

#[test]
fn a_source_named_with_a_property_says_how_its_value_was_obtained() {
    for (header, source_header, source, property, basis) in [
        ("log_kow", "log_kow_source", "exp", Property::LogKow, Basis::Measured),
        ("log_kow", "log_kow_source", "calc", Property::LogKow, Basis::Calculated),
        ("log_kow", "log_kow_source", "measured?", Property::LogKow, Basis::Unstated),
        ("log_kow", "log_kow_source", "Hansch 1995", Property::LogKow, Basis::Unstated),
        ("log Kow (measured)", "Quelle log Kow", "QSAR", Property::LogKow, Basis::Calculated),
        ("BCF (L/kg)", "BCF source", "exp", Property::Bcf, Basis::Measured),
        ("BCF (L/kg)", "BCF source", "est.", Property::Bcf, Basis::Calculated),
        ("BCF (L/kg)", "BCF source", "predicted by a QSAR, version 3", Property::Bcf, Basis::Calculated),
        ("BCF, measured (L/kg)", "Referenz BCF", "berechnet", Property::Bcf, Basis::Calculated),
        ("BCF, measured (L/kg)", "BCF source", "measured or estimated", Property::Bcf, Basis::Unstated),
        // The title of a journal makes nothing measured.
        ("BCF (L/kg)", "BCF source", "J Exp Bot 12 (1998)", Property::Bcf, Basis::Unstated),
        ("Koc (L/kg)", "BCF source", "calc", Property::Koc, Basis::Unstated),
    ] {
        let found = basis_beside(header, source_header, source, property);
        assert_eq!(found, Some(basis), "{header}, {source_header}: {source}");
    }
}

#[test]
fn a_source_of_the_row_lowers_the_basis_in_a_few_words_only_and_never_raises_it() {
    for (source, basis) in [
        ("QSAR", Basis::Calculated),
        ("model estimate", Basis::Calculated),
        ("exp", Basis::Unstated),
        ("Model inventory of the northern site", Basis::Unstated),
    ] {
        assert_eq!(basis_beside("log Kow", "Source", source, Property::LogKow), Some(basis), "{source}");
    }
}

#[test]
fn of_several_columns_of_sources_all_are_read() {
    let rows: [&[&str]; 2] = [
        &["CAS", "log Kow", "log Kow source", "log Kow method", "BCF", "Source", "BCF source"],
        &["50-29-3", "6.9", "measured", "QSAR", "1200", "list 3", "calc"],
    ];
    let substance = read_last(&rows).unwrap();
    for property in [Property::LogKow, Property::Bcf] {
        let bases: Vec<Basis> = substance.readings[&property].iter().map(|reading| reading.basis).collect();
        assert_eq!(bases, [Basis::Calculated], "{property:?}");
    }
}
