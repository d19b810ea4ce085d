//! Sheets laid out in ways nobody planned for.

use crate::place::Place;
use crate::sheets::{HEADER, Put, sound_rows, texts};

#[test]
fn doubled_columns_are_told_with_the_way_out_which_works() {
    let place = Place::with_rows(vec![
        texts(&["Name", "Name (old)", "CAS", "log Kow"]),
        texts(&["Phenol", "DDT", "50-29-3", "6.91"]),
    ]);
    let remark = "Columns of Substances: columns A (`Name`) and B (`Name (old)`) both name name; A is taken; to take \
                  the other: --column 'Name=ignore' --column 'Name (old)=name'\n";
    let run = place.screen(&[]);
    assert_eq!(run.status, 0);
    assert!(run.said.contains(remark), "{}", run.said);
    let run = place.screen(&["--force", "--column", "Name=ignore", "--column", "Name (old)=name"]);
    assert_eq!(run.status, 0);
    assert!(!run.said.contains("both name"), "{}", run.said);
    assert!(place.screened("Record").text().contains("|DDT|"));
}

#[test]
fn quiet_still_tells_remarks_on_columns() {
    let rows = vec![texts(&["Name", "Name (old)", "CAS"]), texts(&["Phenol", "DDT", "50-29-3"])];
    let run = Place::with_rows(rows).screen(&["--quiet"]);
    assert_eq!((run.status, run.said.as_str()), (0, ""));
    assert!(run.complained.starts_with("Columns of Substances: columns A"), "{}", run.complained);
}

#[test]
fn two_columns_of_cas_numbers_that_disagree_clear_nothing() {
    let place = Place::with_rows(vec![
        texts(&["Name", "CAS", "CAS Nr.", "log Kow", "BCF (L/kg)"]),
        texts(&["Phenol", "108-95-2", "50-29-3", "1.46", "17"]),
        texts(&["Phenol", "108-95-2", "108-95-2", "1.46", "17"]),
        texts(&["Phenol", "", "108-95-2", "1.46", "17"]),
    ]);
    let run = place.screen(&[]);
    assert_eq!(run.status, 1);
    assert!(
        run.said.contains(
            "both name cas-number; both are read, and a row in which they differ is not identified; to take one \
             alone: --column 'CAS=ignore' or --column 'CAS Nr.=ignore'"
        ),
        "{}",
        run.said
    );
    assert!(
        run.complained.starts_with(
            "Substances!C2: `50-29-3` is another CAS number than `108-95-2` in Substances!B2, so the row is not \
             identified;"
        ),
        "{}",
        run.complained
    );
    let written = place.screened("Substances");
    assert_eq!(written.under(1, "REACH B", 2), "unresolved");
    assert_eq!(written.under(1, "REACH B", 3), "screens out");
    assert_eq!(written.under(1, "REACH B", 4), "screens out");
    assert_eq!(place.screen(&["--force", "--column", "CAS Nr.=ignore"]).status, 0);
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

/// Two tables one below the other; in the second one BCF and log Kow are the other way round, and DDT would be cleared
/// by a BCF of 6.91.
fn stacked(rows_between: usize) -> Vec<Vec<Put<'static>>> {
    let mut rows = vec![texts(&["Name", "CAS", "log Kow", "BCF (L/kg)"])];
    rows.extend(vec![texts(&["Phenol", "108-95-2", "1.46", "17"]); rows_between]);
    rows.push(vec![]);
    rows.push(texts(&["Name", "CAS", "BCF (L/kg)", "log Kow"]));
    rows.push(texts(&["DDT", "50-29-3", "12000", "6.91"]));
    rows.push(vec![]);
    rows.push(texts(&["DDT", "50-29-3", "12000", "6.91"]));
    rows
}

#[test]
fn rows_below_the_header_of_another_table_are_not_screened_at_any_depth() {
    for between in [1, 198, 199, 1500] {
        let place = Place::with_rows(stacked(between));
        let run = place.screen(&[]);
        let header = between + 3;
        assert_eq!(run.status, 1);
        assert!(run.said.starts_with(&format!("Screened {between} row")), "{}", run.said);
        assert_eq!(
            run.complained,
            format!(
                "Substances!A{header}: `Name` begins the header of another table, whose columns may hold other \
                 things, so the rows from here on are not screened; put that table on a sheet of its own\n1 cell could \
                 not be read or used: 1 header of another table. The sheet \
                 `Conflicts` says cell by cell what to do.\nSubstances: 2 rows were not screened, below the header of \
                 another table in row {header}.\n"
            )
        );
        let written = place.screened("Substances");
        assert_eq!(written.under(1, "REACH B", header - 2), "screens out");
        for row in header..header + 2 {
            assert_eq!(written.under(1, "REACH B", row), "");
            assert!(written.under(1, "Cautions", row).starts_with("not screened: "));
        }
        assert_eq!(written.under(1, "BCF (L/kg)", header + 1), "6.91", "the user's cells stay");
        let told =
            format!("Rows not screened|2; they stand below the header of another table in row {header}");
        assert!(place.screened("Run record").text().contains(&told));
    }
}

#[test]
fn the_columns_command_tells_of_another_table_below() {
    let run = Place::with_rows(stacked(1)).run(&["columns", "inventory.xlsx"]);
    assert!(run.said.contains("Substances!A4: `Name` begins the header of another table"), "{}", run.said);
    let run = Place::with_rows(sound_rows()).run(&["columns", "inventory.xlsx"]);
    assert!(!run.said.contains("another table"), "{}", run.said);
}

#[test]
fn another_header_is_known_wherever_its_columns_stand() {
    for header in [
        ["CAS number", "Name", "BCF (L/kg)", "log Kow", ""],
        ["Stoffname", "CAS-Nr.", "log Kow", "BKF", "Halbwertszeit Boden"],
        // The same words with another unit.
        ["Name", "CAS No.", "log Kow", "BCF (L/kg)", "Half-life soil (h)"],
        ["", "", "CAS", "log Kow", ""],
        ["Name", "CAS No.", "2023", "BCF", "log Kow"],
    ] {
        let mut rows = sound_rows();
        rows.extend([texts(&header), texts(&["DDT", "50-29-3", "6.91", "3", "2000"])]);
        let run = Place::with_rows(rows).screen(&[]);
        assert_eq!(run.status, 1, "{header:?}");
        assert!(run.said.starts_with("Screened 2 rows"), "{header:?} {}", run.said);
        assert!(run.complained.contains("not screened"), "{header:?} {}", run.complained);
    }
}

#[test]
fn the_same_header_again_is_passed_over_and_the_rows_below_it_are_screened() {
    let mut rows = sound_rows();
    rows.extend([texts(&HEADER), texts(&["DDT", "50-29-3", "6.91", "12000", "2000"])]);
    let place = Place::with_rows(rows);
    let run = place.screen(&[]);
    assert_eq!((run.status, run.complained.as_str()), (0, ""));
    assert!(run.said.starts_with("Screened 3 rows"), "{}", run.said);
    let written = place.screened("Substances");
    assert_eq!(written.under(1, "REACH", 4), "");
    assert_eq!(written.under(1, "REACH", 5), "vPvB: screens in");
}

#[test]
fn a_header_of_two_rows_is_passed_over_when_it_comes_again() {
    let names = texts(&["Name", "CAS", "Half-life soil", "BCF"]);
    let units = texts(&["", "", "d", "L/kg"]);
    let ddt = texts(&["DDT", "50-29-3", "2000", "12000"]);
    let rows = vec![names.clone(), units.clone(), ddt.clone(), names, units, ddt];
    let run = Place::with_rows(rows).screen(&[]);
    assert_eq!((run.status, run.complained.as_str()), (0, ""));
    assert!(run.said.starts_with("Screened 2 rows"), "{}", run.said);
}

#[test]
fn a_substance_with_the_name_of_a_field_is_no_header() {
    let mut rows = vec![texts(&["Name", "CAS", "log Kow", "Row type", "Guideline", "Remarks"])];
    rows.extend([
        texts(&["Name", "n.a.", "n.a.", "Substance", "OECD 117", "Reference"]),
        texts(&["Water solubility standard", "", "", "Substance", "OECD 117", "CAS"]),
        texts(&["CAS", "", "3.2", "Substance", "OECD 117", "log Kow"]),
        texts(&["Name", "CAS", "", "", "", ""]).into_iter().take(1).collect(),
        texts(&["DDT", "50-29-3", "6.91", "", "", ""]),
    ]);
    let run = Place::with_rows(rows).screen(&[]);
    assert!(run.said.starts_with("Screened 5 rows"), "{} {}", run.said, run.complained);
    assert!(!run.complained.contains("not screened"), "{}", run.complained);
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
            "Conflicts",
            "Rulebooks (screened)",
            "Run record (screened)",
        ]
    );
    let written = place.screened("Reasoning");
    for (header, held) in [("REACH", "old"), ("Cautions", "mine"), ("REACH (screened)", "older")] {
        assert_eq!(written.under(1, header, 2), held);
    }
    assert_eq!(written.under(1, "REACH (screened 2)", 2), "vPvB: screens in");
    assert!(written.under(1, "Cautions (screened)", 2).starts_with("none raised"));
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
