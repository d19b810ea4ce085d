//! Sheets laid out in ways nobody planned for.

use crate::place::Place;
use crate::sheets::{HEADER, Put, sound_rows, texts};

#[test]
fn doubled_columns_are_told_with_the_way_out_which_works() {
    let place = Place::with_rows(vec![
        texts(&["Name", "CAS", "CAS Nr.", "log Kow"]),
        texts(&["DDT", "108-95-2", "50-29-3", "6.91"]),
    ]);
    let remark = "Columns of Substances: columns B (`CAS`) and C (`CAS Nr.`) both name cas-number; B is taken; to take \
                  the other: --column 'CAS=ignore' --column 'CAS Nr.=cas-number'\n";
    let run = place.screen(&[]);
    assert_eq!(run.status, 0);
    assert!(run.said.contains(remark), "{}", run.said);
    let run = place.screen(&["--force", "--column", "CAS=ignore", "--column", "CAS Nr.=cas-number"]);
    assert_eq!(run.status, 0);
    assert!(!run.said.contains("both name"), "{}", run.said);
    assert!(place.screened("Record").text().contains("50-29-3"));
}

#[test]
fn a_second_table_beside_the_first_lends_it_no_values() {
    let header: Vec<&str> = HEADER.iter().chain(&[""]).chain(&HEADER).copied().collect();
    let place = Place::with_rows(vec![
        texts(&header),
        texts(&["Phenol", "108-95-2", "1.46", "17", "3", "", "DDT", "50-29-3", "6.91", "12000", "2000"]),
    ]);
    let run = place.screen(&[]);
    assert_eq!(run.status, 0);
    assert!(
        run.said.contains(
            "headers repeat from column H on, as if a second table stood there; the columns from there on are left \
             aside: give each table a sheet of its own"
        ),
        "{}",
        run.said
    );
    assert_eq!(place.screened("Substances").under(1, "REACH B", 2), "screens out");
}

#[test]
fn a_table_above_a_wider_one_is_told_to_be_passed_over() {
    let mut rows = vec![texts(&["CAS", "log Kow"]), texts(&["50-29-3", "6.91"]), vec![]];
    rows.extend(sound_rows());
    let run = Place::with_rows(rows).screen(&[]);
    assert!(
        run.said.contains(
            "row 1 looks like a header, too, but row 4 names more columns; rows above it are not screened: give each \
             table a sheet of its own"
        ),
        "{}",
        run.said
    );
}

#[test]
fn a_table_below_the_first_is_told_to_be_read_with_its_columns() {
    let mut rows = sound_rows();
    rows.extend([vec![], texts(&["CAS", "BCF", "log Kow"]), texts(&["50-29-3", "12000", "6.91"])]);
    let run = Place::with_rows(rows).screen(&[]);
    assert_eq!(run.status, 1, "the second header is no data");
    assert!(
        run.said.contains(
            "row 5 looks like a header, too, but the rows below it are read with the columns of row 1; give each \
             table a sheet of its own"
        ),
        "{}",
        run.said
    );
    assert!(!Place::with_rows(sound_rows()).screen(&[]).said.contains("looks like a header"));
}

#[test]
fn blank_rows_between_are_passed_over_and_stay() {
    let mut rows = sound_rows();
    rows.insert(2, vec![]);
    rows.insert(2, vec![]);
    let place = Place::with_rows(rows);
    let run = place.screen(&[]);
    assert!(run.said.starts_with("Screened 2 rows"), "{}", run.said);
    let written = place.screened("Substances");
    assert_eq!(written.under(1, "Name", 5), "Phenol");
    assert_eq!(written.under(1, "REACH", 3), "");
    assert!(!written.under(1, "REACH", 5).is_empty());
}

#[test]
fn names_of_the_user_stay_and_ours_give_way() {
    let mut rows = sound_rows();
    rows[0].extend(texts(&["REACH", "Cautions", "REACH (screened)"]));
    rows[1].extend(texts(&["old", "mine", "older"]));
    let sheets = ["Run record", "Record", "Rulebooks"].map(|name| (name, vec![texts(&["a note"])]));
    let mut book = vec![("Reasoning", rows)];
    book.extend(sheets);
    let place = Place::with_sheets(&book);
    assert_eq!(place.screen(&[]).status, 0);
    assert_eq!(
        place.names_of_sheets("inventory-screened.xlsx"),
        [
            "Reasoning",
            "Run record",
            "Record",
            "Rulebooks",
            "Reasoning (screened)",
            "Record (screened)",
            "Rulebooks (screened)",
            "Run record (screened)",
        ]
    );
    let written = place.screened("Reasoning");
    for (header, held) in [("REACH", "old"), ("Cautions", "mine"), ("REACH (screened)", "older")] {
        assert_eq!(written.under(1, header, 2), held);
    }
    assert_eq!(written.under(1, "REACH (screened 2)", 2), "vPvB: screens in");
    assert_eq!(written.under(1, "Cautions (screened)", 2), "");
}

#[test]
fn a_name_in_the_upper_row_of_a_header_is_taken_too() {
    let place = Place::with_rows(vec![
        texts(&["CAS", "Half-life soil", "BCF", "REACH"]),
        texts(&["", "d", "L/kg", ""]),
        texts(&["50-29-3", "2000", "12000", "old"]),
    ]);
    assert_eq!(place.screen(&[]).status, 0);
    assert_eq!(place.screened("Substances").under(2, "REACH (screened)", 3), "vPvB: screens in");
}

#[test]
fn two_hundred_columns_of_the_user_stand_before_ours() {
    let names: Vec<String> = (0..200).map(|number| format!("Column {number}")).collect();
    let mut rows = sound_rows();
    rows[0].extend(names.iter().map(|name| Put::Text(name)));
    rows[1].extend((0..200).map(|number| Put::Number(f64::from(number))));
    let place = Place::with_rows(rows);
    assert_eq!(place.screen(&[]).status, 0);
    let written = place.screened("Substances");
    assert_eq!(written.under(1, "Column 199", 2), "199");
    assert_eq!(written.0[0][205].to_string(), "log Kow used");
    assert_eq!(written.under(1, "log Kow used", 2), "6.91");
}
