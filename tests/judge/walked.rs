//! Cases walked by hand, each with the reason for its verdict.

use kowledger::judge::Verdict::{NoData, NotFulfilled, OutOfScope, ScreensIn, ScreensOut, Unresolved};
use kowledger::substance::{Basis, Conditions, DegradationTest, Property, SubstanceType};

use crate::support::{Value, row};

/// Fish metabolise many PAHs, air-breathing animals meet them by another way: a fish BCF alone does not clear.
#[test]
fn a_pah_with_a_fish_bcf_of_1500_and_a_high_log_koa_does_not_clear_b() {
    let judged = row()
        .named("benzo[a]pyrene")
        .measured(Property::Bcf, Value::Point(1500.0))
        .measured(Property::LogKoa, Value::Point(10.8))
        .measured(Property::LogKow, Value::Point(6.1))
        .judged();
    assert_eq!(judged.verdict("REACH", "B"), ScreensIn);
    let sentence = judged.sentence("REACH", "B");
    assert!(sentence.contains("log Koa"), "{sentence}");
}

/// Perfluorinated acids bind to proteins; a low BCF in fish is not evidence of low accumulation.
#[test]
fn a_perfluorinated_acid_with_a_bcf_of_4_does_not_clear() {
    let judged = row()
        .named("perfluorooctanoic acid")
        .measured(Property::Bcf, Value::Point(4.0))
        .measured(Property::LogKow, Value::Point(1.0))
        .judged();
    for (book, criterion) in
        [("REACH", "B"), ("REACH", "vB"), ("CLP", "B"), ("STOCKHOLM", "B"), ("CANADA", "B")]
    {
        assert_eq!(judged.verdict(book, criterion), Unresolved, "{book} {criterion}");
    }
}

#[test]
fn acute_data_never_clear_t() {
    let judged = row().measured(Property::AcuteToxicity, Value::Point(500.0)).statements(&["H302"]).judged();
    assert_eq!(judged.verdict("REACH", "T"), Unresolved);
    assert_eq!(
        row().measured(Property::AcuteToxicity, Value::Point(500.0)).judged().verdict("CLP", "T"),
        Unresolved
    );
}

#[test]
fn a_straddling_bcf_is_not_overruled_by_a_low_log_kow() {
    let judged = row()
        .measured(Property::Bcf, Value::Range(1500.0, 2500.0))
        .measured(Property::LogKow, Value::Point(1.0))
        .judged();
    assert_eq!(judged.cell("REACH", "B"), "unresolved (close call)");
}

/// A long-chain alcohol such as 1-dodecanol: degrades readily, and its log Kow alone screens it into B.
#[test]
fn a_readily_biodegradable_alcohol_with_log_kow_5_screens_into_b_but_out_of_p_and_pbt() {
    let judged = row()
        .named("1-dodecanol")
        .ready(DegradationTest::Ready)
        .measured(Property::LogKow, Value::Point(5.13))
        .judged();
    assert_eq!(judged.verdict("REACH", "B"), ScreensIn);
    assert_eq!(judged.verdict("REACH", "P"), ScreensOut);
    assert_eq!(judged.cell("REACH", "PBT"), "screens out");
    assert_eq!(judged.cell("CANADA", "PB"), "screens out");
}

#[test]
fn a_metal_salt_is_out_of_scope_under_reach_and_never_cleared_elsewhere() {
    let judged = row().named("zinc oxide").of_type(SubstanceType::Inorganic).judged();
    assert_eq!(judged.verdict("REACH", "P"), OutOfScope);
    assert_eq!(judged.verdict("CANADA", "B"), NoData);
    assert_eq!(judged.cell("STOCKHOLM", "Annex D indicators"), "unresolved");
}

#[test]
fn a_polymer_clears_nothing_whatever_its_data_say() {
    let judged = row()
        .of_type(SubstanceType::Polymer)
        .ready(DegradationTest::Ready)
        .measured(Property::Bcf, Value::Point(3.0))
        .measured(Property::LogKow, Value::Point(-1.0))
        .judged();
    let sorbing = row().of_type(SubstanceType::Polymer).measured(Property::Koc, Value::Point(1e6)).judged();
    assert_eq!(sorbing.verdict("CLP", "M"), Unresolved);
    for (book, criterion) in
        [("REACH", "P"), ("REACH", "B"), ("STOCKHOLM", "B"), ("CANADA", "P"), ("CANADA", "B")]
    {
        assert_eq!(judged.verdict(book, criterion), Unresolved, "{book} {criterion}");
    }
}

/// A log Kow of an ion that sits at interfaces says nothing about accumulation; a measured BCF still does.
#[test]
fn a_quaternary_ammonium_surfactant_does_not_clear_by_log_kow() {
    let named = || row().named("hexadecyltrimethylammonium bromide").of_type(SubstanceType::Surfactant);
    let by_log_kow = named().measured(Property::LogKow, Value::Point(1.8)).judged();
    assert_eq!(by_log_kow.verdict("REACH", "B"), Unresolved);
    assert_eq!(by_log_kow.verdict("CANADA", "B"), Unresolved);
    let by_bcf = named().measured(Property::Bcf, Value::Point(30.0)).judged();
    assert_eq!(by_bcf.verdict("REACH", "B"), NotFulfilled);
}

#[test]
fn a_row_with_a_name_only_has_no_data_and_nothing_is_cleared() {
    let judged = row().by_name_alone().judged();
    assert_eq!(judged.verdict("REACH", "P"), NoData);
    assert_eq!(judged.cell("REACH", "PBT"), "unresolved");
    assert!(judged.cautions().contains(&"identity-by-name-alone"));
}

#[test]
fn a_row_identified_by_name_alone_may_fire_but_not_clear() {
    let fires = row().by_name_alone().measured(Property::Bcf, Value::Point(30_000.0)).judged();
    assert_eq!(fires.cell("REACH", "vB"), "fulfilled");
    let clears = row().by_name_alone().measured(Property::Bcf, Value::Point(3.0)).judged();
    assert_eq!(clears.verdict("REACH", "vB"), Unresolved);
}

/// `> 6` lies beyond every log Kow limit whatever the value is, and gives no estimate of BCF.
#[test]
fn log_kow_greater_than_6_screens_in_everywhere_without_a_close_call() {
    let judged = row().measured(Property::LogKow, Value::Greater(6.0)).judged();
    for book in ["REACH", "CLP", "STOCKHOLM", "CANADA"] {
        assert_eq!(judged.cell(book, "B"), "screens in", "{book}");
    }
    assert!(!judged.sentence("REACH", "B").contains("estimated"), "{}", judged.sentence("REACH", "B"));
}

#[test]
fn a_bcf_is_compared_at_5_percent_lipid_under_the_eu_rules_and_as_reported_elsewhere() {
    let lipid = |percent| Conditions { lipid: Some(percent), ..Conditions::default() };
    let fat_fish = row().under(Property::Bcf, Value::Point(6000.0), Basis::Measured, lipid(10.0)).judged();
    // 6000 x 5 / 10 = 3000: beyond 2000 either way, on either side of 5000.
    assert_eq!(fat_fish.cell("REACH", "B"), "fulfilled (close call)");
    assert_eq!(fat_fish.cell("REACH", "vB"), "unresolved (close call)");
    assert_eq!(fat_fish.cell("CANADA", "B"), "fulfilled (close call)");
    let lean_fish = row().under(Property::Bcf, Value::Point(1200.0), Basis::Measured, lipid(2.5)).judged();
    // 1200 x 5 / 2.5 = 2400.
    assert_eq!(lean_fish.cell("REACH", "B"), "fulfilled (close call)");
}

#[test]
fn in_canada_baf_goes_before_bcf_and_bcf_before_log_kow() {
    let judged = row()
        .measured(Property::Baf, Value::Point(100.0))
        .measured(Property::Bcf, Value::Point(9000.0))
        .measured(Property::LogKow, Value::Point(7.0))
        .judged();
    assert_eq!(judged.verdict("CANADA", "B"), NotFulfilled);
    let judged = row()
        .measured(Property::Bcf, Value::Point(100.0))
        .measured(Property::LogKow, Value::Point(7.0))
        .judged();
    assert_eq!(judged.verdict("CANADA", "B"), NotFulfilled);
}

/// The strict order stands, and so does the doubt: a straddling BAF is not passed over for the next property.
#[test]
fn in_canada_a_straddling_baf_is_not_passed_over() {
    let judged = row()
        .measured(Property::Baf, Value::Range(4000.0, 6000.0))
        .measured(Property::Bcf, Value::Point(9000.0))
        .judged();
    assert_eq!(judged.cell("CANADA", "B"), "unresolved (close call)");
}
