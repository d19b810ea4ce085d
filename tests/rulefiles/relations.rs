//! The relations file against worked values and the published domains and errors.

use kowledger::relations::{Relation, Relations, Side};
use kowledger::rules::{Checked, load_rule_set};
use kowledger::substance::{Basis, Property};

fn relations() -> Relations {
    load_rule_set(&[]).unwrap().relations
}

fn value(relation: &Relation, log_kow: f64) -> f64 {
    relation.coefficients.iter().rev().fold(0.0, |sum, coefficient| sum * log_kow + coefficient)
}

fn find<'r>(relations: &'r Relations, id: &str) -> &'r Relation {
    relations.relations.iter().find(|relation| relation.id == id).unwrap()
}

fn leading(relations: &Relations, to: Property, log_kow: f64) -> Option<&str> {
    let leads = |relation: &&Relation| {
        relation.to == to && relation.side == Side::Central && relation.domain.contains(log_kow)
    };
    relations.relations.iter().find(leads).map(|relation| relation.id.as_str())
}

/// Values worked by hand from the published equations (see the citation of each in the file).
#[test]
fn equations_give_their_worked_values() {
    let relations = relations();
    for (id, log_kow, expected) in [
        ("veith-1979", 3.0, 1.850),
        ("veith-1979", 6.0, 4.400),
        ("eu-parabola", 7.0, 4.660),
        ("eu-parabola", 9.0, 3.740),
        ("mackay-1982", 4.0, 2.680),
        ("veith-kosian-1983", 5.0, 3.550),
        ("isnard-lambert-1988", 7.0, 5.080),
        ("sabljic-1995-hydrophobics", 4.0, 3.340),
        // Published in an agency registration dossier summary: log Kow 3.3 gives log Koc 2.736.
        ("sabljic-1995-nonhydrophobics", 3.3, 2.736),
        ("us-epa-1996", 4.0, 3.246),
        ("franco-trapp-2008-anion", 4.0, 1.980),
        // 16.2 µmol/L at log Kow 4 (computed from the equation).
        ("verhaar-baseline-fish", 4.0, -4.790),
    ] {
        let found = value(find(&relations, id), log_kow);
        assert!((found - expected).abs() < 5e-4, "{id} at {log_kow}: {found}");
    }
}

#[test]
fn the_first_equation_whose_domain_holds_leads() {
    let relations = relations();
    for (to, log_kow, expected) in [
        (Property::Bcf, 0.9, None),
        (Property::Bcf, 1.0, Some("veith-1979")),
        (Property::Bcf, 6.0, Some("veith-1979")),
        (Property::Bcf, 6.01, Some("eu-parabola")),
        (Property::Bcf, 10.0, Some("eu-parabola")),
        (Property::Bcf, 10.1, None),
        (Property::Koc, -2.0, Some("sabljic-1995-nonhydrophobics")),
        (Property::Koc, 0.99, Some("sabljic-1995-nonhydrophobics")),
        (Property::Koc, 1.0, Some("sabljic-1995-hydrophobics")),
        (Property::Koc, 7.6, Some("sabljic-1995-nonhydrophobics")),
        (Property::AcuteToxicity, 6.0, Some("verhaar-baseline-fish")),
        (Property::AcuteToxicity, 6.1, None),
    ] {
        assert_eq!(leading(&relations, to, log_kow), expected, "{to:?} at {log_kow}");
    }
}

#[test]
fn class_lines_and_the_anion_line_never_lead() {
    let relations = relations();
    let count = |side: Side| relations.relations.iter().filter(|relation| relation.side == side).count();
    assert_eq!((count(Side::Central), count(Side::Class), count(Side::Ionised)), (9, 16, 1));
    let class_lines = relations.relations.iter().filter(|relation| relation.side == Side::Class);
    assert!(class_lines.into_iter().all(|relation| relation.checked == Checked::Memory));
    assert!(find(&relations, "verhaar-baseline-fish").molar);
}

#[test]
fn default_deviations_follow_property_basis_and_value() {
    let relations = relations();
    let fresh_water = Property::HalfLife(kowledger::substance::Compartment::FreshWater);
    for (property, basis, value, expected) in [
        (Property::LogKow, Basis::Measured, 5.0, 0.2),
        (Property::LogKow, Basis::Measured, 5.1, 0.3),
        (Property::LogKow, Basis::Unstated, 6.0, 0.4),
        (Property::LogKow, Basis::Calculated, 3.0, 0.5),
        (Property::Bcf, Basis::Measured, 2500.0, 0.21),
        (Property::Bcf, Basis::Unstated, 2500.0, 0.3),
        (fresh_water, Basis::Measured, 40.0, 0.3),
        (Property::HydrolysisHalfLife, Basis::Measured, 40.0, 0.3),
        (Property::Koc, Basis::Measured, 1000.0, 0.4),
        (Property::AcuteToxicity, Basis::Unstated, 1.0, 0.3),
        (Property::LogKoa, Basis::Measured, 8.0, 0.3),
    ] {
        let found = relations.default_sd(property, basis, value);
        assert!((found - expected).abs() < 1e-12, "{property:?} {basis:?} {value}: {found}");
    }
}
