//! Toxicity by hazard statements, and designations that a statement of the row fulfils.

use kowledger::judge::Verdict::{Fulfilled, NoData, ScreensOut, Unresolved};
use kowledger::substance::Property;

use crate::support::{Value, row};

#[test]
fn each_statement_of_the_list_makes_the_substance_toxic() {
    // Annex XIII, 1.1.3 (b) and (c): Carc. and Muta. 1A or 1B, Repr. 1A, 1B or 2, STOT RE 1 or 2.
    for code in ["H340", "H350", "H350i", "H360", "H360FD", "H361", "H361d", "H372", "H373"] {
        for book in ["REACH", "CLP"] {
            assert_eq!(row().statements(&[code]).judged().verdict(book, "T"), Fulfilled, "{book} {code}");
        }
    }
}

#[test]
fn endocrine_disruption_makes_it_toxic_under_clp_only() {
    for code in ["EUH380", "EUH430"] {
        assert_eq!(row().statements(&[code]).judged().verdict("CLP", "T"), Fulfilled, "{code}");
        assert_eq!(row().statements(&[code]).judged().verdict("REACH", "T"), Unresolved, "{code}");
    }
}

#[test]
fn category_two_statements_and_others_are_not_on_the_list() {
    for code in ["H341", "H351", "H302", "H410"] {
        assert_eq!(row().statements(&[code]).judged().verdict("REACH", "T"), Unresolved, "{code}");
    }
}

#[test]
fn an_empty_statement_cell_says_nothing_and_a_filled_one_alone_does_not_clear() {
    assert_eq!(row().judged().verdict("REACH", "T"), NoData);
    assert_eq!(row().statements(&[]).judged().verdict("REACH", "T"), Unresolved);
}

#[test]
fn toxicity_screens_out_only_with_both_statements_and_a_long_term_value() {
    let both = row().statements(&["H302"]).measured(Property::LongTermToxicity, Value::Point(1.0));
    assert_eq!(both.judged().verdict("REACH", "T"), ScreensOut);
    let straddling = row().statements(&["H302"]).measured(Property::LongTermToxicity, Value::Less(0.02));
    assert_eq!(straddling.judged().verdict("REACH", "T"), Unresolved);
}

#[test]
fn a_statement_of_the_class_fulfils_the_designation_as_stated_in_the_inventory() {
    let table = [("EUH440", "PBT"), ("EUH441", "vPvB"), ("EUH450", "PMT"), ("EUH451", "vPvM")];
    for (code, designation) in table {
        let judged = row().statements(&[code]).judged();
        for (other_code, other) in table {
            let expected = if code == other_code { "fulfilled" } else { "unresolved" };
            assert_eq!(judged.cell("CLP", other), expected, "{code} for {designation}, read at {other}");
        }
    }
}
