//! Rows that share a number or a name, without an inventory around them.

use std::num::NonZeroU64;
use std::sync::Arc;

use super::{Details, Group, Register};
use crate::fault::SharedBy;
use crate::report::RowName;
use crate::run::standing::Standing;
use crate::substance::{CasNumber, EcNumber};

const RULEBOOKS: [&str; 2] = ["REACH", "CLP"];

fn standing(cas: Option<&str>, ec: Option<&str>, name: u64) -> Standing {
    Standing {
        name: Arc::new(RowName { row_id: "M-1".into(), name: format!("name {name}"), number: String::new() }),
        cas: cas.map(|cas| (CasNumber::parse(cas).unwrap(), 1)),
        ec: ec.map(|ec| (EcNumber::parse(ec).unwrap(), 2)),
        folded_name: NonZeroU64::new(name).map(|name| (name, 0)),
        headlines: vec!["PBT: unresolved".to_owned(), "PMT: no data".to_owned()],
        data: vec![("log Kow", 7)],
    }
}

fn with_log_kow(digest: u32) -> Standing {
    Standing { data: vec![("log Kow", digest)], ..standing(Some("50-29-3"), None, 0) }
}

fn register(rows: impl IntoIterator<Item = Standing>) -> Register {
    let mut register = Register::new(vec!["Substances".into()]);
    for (row, standing) in (1..).zip(rows) {
        register.add(0, row, standing);
    }
    register
}

/// Title and what is wrong of every line.
fn lines(register: &Register) -> Vec<(&'static str, String)> {
    let rulebooks = RULEBOOKS.map(str::to_owned);
    let groups = register.groups();
    let rows = groups.iter().flat_map(|group| register.rows_of(group, &rulebooks).collect::<Vec<_>>());
    rows.map(|row| crate::fault::Conflict::Shared(row.shared).wording())
        .map(|said| (said.title, said.wrong))
        .collect()
}

#[test]
fn rows_that_share_nothing_make_no_group() {
    let register = register([
        standing(Some("50-29-3"), None, 1),
        standing(Some("108-95-2"), None, 2),
        standing(None, None, 0),
    ]);
    assert!(register.groups().is_empty());
}

#[test]
fn a_group_by_ec_number_or_name_adds_nothing_where_the_cas_number_says_it() {
    let row = || standing(Some("50-29-3"), Some("200-024-3"), 1);
    let by: Vec<SharedBy> = register([row(), row()]).groups().iter().map(Group::by).collect();
    assert_eq!(by, [SharedBy::Cas]);
    let without_cas = || standing(None, Some("200-024-3"), 1);
    let by: Vec<SharedBy> = register([row(), without_cas()]).groups().iter().map(Group::by).collect();
    assert_eq!(by, [SharedBy::Ec]);
}

#[test]
fn each_row_says_its_own_headline_and_the_different_ones_of_the_others() {
    let with = |headline: &str| Standing {
        headlines: vec![headline.to_owned(), "PMT: no data".to_owned()],
        ..standing(Some("50-29-3"), None, 0)
    };
    let said = lines(&register([with("a"), with("b"), with("a"), with("c"), with("d"), with("e")]));
    let place =
        "CAS number 50-29-3 stands in Substances!B3, Substances!B4, Substances!B5 and 2 more rows as well";
    assert_eq!(said[0].1, format!("{place}; REACH: `a` here, `b` or `c` or `d` there"));
    let place =
        "CAS number 50-29-3 stands in Substances!B2, Substances!B3, Substances!B4 and 2 more rows as well";
    assert_eq!(said[5].1, format!("{place}; REACH: `e` here, `a` or `b` or `c` there"));
    assert_eq!(said[5].0, "same CAS number, headlines differ");
}

#[test]
fn rows_without_kept_details_still_say_that_their_data_differ() {
    let mut register = register([]);
    register.details = Details::with_room(20);
    for row in 1..10 {
        register.add(0, row, with_log_kow(row));
    }
    let groups = register.groups();
    let rows: Vec<_> = register.rows_of(&groups[0], &[]).collect();
    assert_eq!(rows[0].name.row_id, "M-1");
    assert_eq!(rows[8].name, RowName::default(), "there was no room for it");
    assert_eq!((rows[8].row, rows.len()), (9, 9));
    let (title, wrong) = lines(&register).swap_remove(0);
    assert_eq!(title, "same CAS number, data differ");
    assert!(wrong.ends_with("and 5 more rows as well; the rows differ in their data"), "{wrong}");
}

#[test]
fn names_are_kept_row_by_row_whatever_they_hold() {
    let named = |name: &str| Standing {
        name: Arc::new(RowName { row_id: String::new(), name: name.to_owned(), number: "50-29-3".into() }),
        ..standing(Some("50-29-3"), None, 0)
    };
    let register = register([named("DDT"), named(""), named("a\u{1f}b"), named("名前")]);
    let groups = register.groups();
    let kept: Vec<String> = register.rows_of(&groups[0], &[]).map(|row| row.name.name).collect();
    assert_eq!(kept, ["DDT", "", "ab", "名前"]);
    assert!(register.rows_of(&groups[0], &[]).all(|row| row.name.number == "50-29-3"));
}
