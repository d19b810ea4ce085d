//! Options and commands: what each changes, and how a wrong one is told.

use std::process::Stdio;

use crate::place::Place;
use crate::sheets::{rows_with_a_fault, sound_rows, texts};

const BAD_BOOK: &str = r#"[rulebook]
id = "house-rules"
short = "HOUSE"
title = "House rules"
source = "Invented"
edition = 2026-01-01
strongest = "definitive"

[[criterion]]
id = "B"
title = "Bioaccumulative"

[[criterion.step]]
weight = "definitive"
combine = "any"
[[criterion.step.test]]
property = "bcff"
above = "2000 L/kg"
source = "Invented, 1"
checked = "seen"
"#;

#[test]
fn an_option_that_means_nothing_says_what_to_write() {
    let place = Place::with_rows(sound_rows());
    for (words, message) in [
        (
            ["--date", "2026-02-30"],
            "--date 2026-02-30: not a day of the calendar; write, for example, 2026-01-31",
        ),
        (["--threads", "0"], "--threads 0: at least one thread is needed; write 1 or more"),
        (
            ["--threads", "999999999"],
            "--threads: at most 1024 can be asked for; more threads than cores gain nothing",
        ),
        (
            ["--sheet", "Substance"],
            "--sheet Substance: the inventory has no sheet of that name; it has Substances. Did you mean `Substances`?",
        ),
        (
            ["--column", "Stoff"],
            "`Stoff` names no field; write --column 'Header=field', for example --column 'Stoff=name', or 'Header=ignore'",
        ),
        (["--column", "Name=nam"], "there is no field `nam`; did you mean `name`?"),
        (
            ["--column", "Nam=name"],
            "--column: no sheet has a column with the header `Nam`; write the header as it stands in the sheet \
             (`kowledger columns` lists them). Did you mean `Name`?",
        ),
        (
            ["--rulebook", "eu-reach-pbr"],
            "`eu-reach-pbr` is no rulebook, file or folder. Did you mean `eu-reach-pbt`? Built in are `eu-reach-pbt`, \
             `eu-clp-pbt-pmt`, `un-stockholm-annex-d`, `ca-persistence-bioaccumulation`; `all` takes them all.",
        ),
    ] {
        place.refuses(&["screen", "inventory.xlsx", words[0], words[1]], message);
    }
    assert_eq!(place.run(&["screen"]).status, 2);
    assert_eq!(place.screen(&["--threads", "many"]).status, 2);
}

#[test]
fn a_broken_rulebook_is_drawn_under_its_text_and_nothing_is_written() {
    let place = Place::with_rows(sound_rows());
    std::fs::write(place.path("house.toml"), BAD_BOOK).unwrap();
    for words in
        [&["screen", "inventory.xlsx", "--rulebook", "house.toml"][..], &["rules", "check", "house.toml"]]
    {
        let run = place.run(words);
        assert_eq!(run.status, 2);
        for part in ["house.toml:17:12", "property = \"bcff\"", "^^^^^^", "`bcf`"] {
            assert!(run.complained.contains(part), "{part} in {}", run.complained);
        }
    }
    assert_eq!(place.files(), ["house.toml", "inventory.xlsx"]);
}

#[test]
fn rules_check_reads_files_and_folders_and_names_a_path_that_is_not_there() {
    let place = Place::new();
    let good = BAD_BOOK.replace("bcff", "bcf");
    std::fs::create_dir(place.path("rules")).unwrap();
    std::fs::write(place.path("rules/house.toml"), good).unwrap();
    for path in ["rules", "rules/house.toml"] {
        let run = place.run(&["rules", "check", path]);
        assert_eq!(run.status, 0, "{}", run.complained);
        assert!(run.said.starts_with("house-rules"), "{}", run.said);
        assert!(run.said.ends_with("1 rulebook is in order.\n"), "{}", run.said);
    }
    let run = place.run(&["rules", "check", "none"]);
    assert_eq!(run.status, 2);
    assert!(run.complained.contains("there is no such file or folder"), "{}", run.complained);
    std::fs::create_dir(place.path("empty")).unwrap();
    let run = place.run(&["rules", "check", "empty"]);
    assert_eq!(run.status, 2);
    assert!(run.complained.contains("the folder holds no rulebook"), "{}", run.complained);
}

#[test]
fn the_list_of_rulebooks_keeps_its_columns_apart() {
    let run = Place::new().run(&["rules", "list"]);
    assert_eq!(run.status, 0);
    for (line, id) in run.said.lines().zip([
        "eu-reach-pbt",
        "eu-clp-pbt-pmt",
        "un-stockholm-annex-d",
        "ca-persistence-bioaccumulation",
    ]) {
        assert!(line.starts_with(&format!("{id} ")), "{line}");
    }
}

#[test]
fn quiet_prints_faults_only() {
    let place = Place::with_rows(rows_with_a_fault());
    let run = place.screen(&["--quiet"]);
    assert_eq!((run.status, run.said.as_str()), (1, ""));
    assert_eq!(
        run.complained,
        "Substances!E3: `soon` is no half-life in soil; write, for example, `40 d`\n\
         1 cell could not be read or used: 1 not a value of its column. The rows were screened with what remains; the \
         sheet `Conflicts` says cell by cell what to do.\n"
    );
}

#[test]
fn reasoning_is_written_in_full_in_part_or_not_at_all() {
    let place = Place::with_rows(sound_rows());
    let lines = |mode: &str| {
        assert_eq!(place.screen(&["--force", "--reasoning", mode]).status, 0);
        place
            .names_of_sheets("inventory-screened.xlsx")
            .contains(&"Reasoning".to_owned())
            .then(|| place.screened("Reasoning").0.len() - 1)
    };
    let all = lines("all").unwrap();
    let concern = lines("concern").unwrap();
    assert_eq!(lines("none"), None);
    assert_eq!(lines("auto"), Some(all));
    assert_eq!(all, 2 * (5 + 7 + 4 + 2), "a line for every row and criterion");
    assert!(0 < concern && concern < all, "{concern} of {all}");
}

#[test]
fn what_unstated_values_count_as_changes_the_words() {
    let place = Place::with_rows(sound_rows());
    let verdict_of = |unstated: &str| {
        place.screen(&["--force", "--unstated", unstated]);
        let rows = place.screened("Substances");
        (rows.under(1, "REACH vB", 2), rows.under(1, "log Kow basis", 2))
    };
    let pair = |one: &str, other: &str| (one.to_owned(), other.to_owned());
    assert_eq!(verdict_of("measured"), pair("fulfilled", "measured"));
    assert_eq!(verdict_of("unstated"), pair("screens in", "unstated"));
    assert_eq!(verdict_of("calculated"), pair("screens in", "calculated"));
}

#[test]
fn columns_tells_what_was_found_and_what_was_not() {
    let place = Place::with_rows(vec![
        texts(&["Site list 2026"]),
        texts(&["Name", "CAS No.", "log Kow", "CAS number", "Colour"]),
        texts(&["DDT", "50-29-3", "6.91", "50-29-3", "white"]),
    ]);
    let run = place.run(&["columns", "inventory.xlsx"]);
    assert_eq!(run.status, 0);
    insta::assert_snapshot!(run.said.trim_end(), @r"
    Substances: header in row 2.
      A  Name        name        named by `name`
      B  CAS No.     cas-number  named by `cas`
      C  log Kow     log-kow     named by `log kow`; decimal point, as the column's other cells show
      D  CAS number  cas-number  named by `cas`
      E  Colour      not used    not recognised
      Note: Substances: columns B (`CAS No.`) and D (`CAS number`) both name cas-number; both are read, and a row in which they differ is not identified; to take one alone: --column 'CAS No.=ignore' or --column 'CAS number=ignore'
    ");
    assert_eq!(place.files(), ["inventory.xlsx"]);
}

#[test]
fn columns_lines_up_headers_of_several_rows_and_wide_signs() {
    let place = Place::with_rows(vec![
        texts(&["物質名", "CAS番号", "土壌半減期", "", "Water solubility", "BCF", "Half-lfe air", "Stock"]),
        texts(&["", "", "測定", "推算", "mg/L", "fish", "", ""]),
        texts(&["DDT", "50-29-3", "2000", "1500", "0,005", "3,1", "", "12"]),
        texts(&["Phenol", "108-95-2", "3", "4", "84000", "1,2", "", "12"]),
        texts(&["a", "", "3", "4", "84000", "2,2", "", "12"]),
        texts(&["b", "", "3", "4", "84000", "4,5", "", "12"]),
        texts(&["c", "", "3", "4", "84000", "3,25", "", "12"]),
    ]);
    let run = place.run(&["columns", "inventory.xlsx"]);
    assert_eq!(run.status, 0);
    insta::assert_snapshot!(run.said.trim_end(), @r"
    Substances: header in rows 1 and 2, read together.
      A  物質名                   name              named by `物質名`
      B  CAS番号                  cas-number        named by `cas`
      C  土壌半減期: 測定         half-life-soil    named by `半減期` and `土壌`; rows 1 and 2 read together; d where a cell names no unit; values are taken as measured; decimal comma, as the sheet's other cells show
      D  土壌半減期: 推算         half-life-soil    named by `半減期` and `土壌`; rows 1 and 2 read together; d where a cell names no unit; values are taken as calculated; decimal comma, as the sheet's other cells show
      E  Water solubility [mg/L]  water-solubility  named by `solubility`; rows 1 and 2 read together; mg/L from the header; decimal comma, as the column's other cells show
      F  BCF: fish                not used          left aside; its numbers look like logarithms
      G  Half-lfe air             not used          not recognised; nearest field: half-life-air
      H  Stock                    not used          not recognised
      Note: Substances: column G (`Half-lfe air`) is not recognised; if it is half-life-air: --column 'Half-lfe air=half-life-air'
      Note: Substances: column F (`BCF: fish`) is left aside, because its numbers look like logarithms and its header does not say so; write `log BCF` as its header if they are, or say that they are none: --column 'BCF: fish=bcf'
    ");
}

#[test]
fn a_column_named_by_its_letter_is_taken_and_one_that_is_not_there_is_refused() {
    let place = Place::with_rows(sound_rows());
    assert_eq!(place.screen(&["--column", "Substances!A:A=ignore"]).status, 0);
    assert!(!place.screened("Record").text().contains("|DDT|"));
    for other in ["Z:Z=bcf", "Other!A:A=bcf"] {
        let run = place.run(&["columns", "inventory.xlsx", "--column", other]);
        assert_eq!(run.status, 2, "{other}");
        assert!(
            run.complained.starts_with("--column: no sheet has a column with the header"),
            "{}",
            run.complained
        );
    }
}

#[test]
fn a_reader_that_goes_away_makes_nobody_panic() {
    let place = Place::with_rows(sound_rows());
    for words in [&["rules", "list"][..], &["columns", "inventory.xlsx"], &["screen", "inventory.xlsx"]] {
        let mut child = std::process::Command::new(assert_cmd::cargo::cargo_bin("kowledger"))
            .current_dir(place.path("."))
            .args(words)
            .stdout(Stdio::piped())
            .stderr(Stdio::piped())
            .spawn()
            .unwrap();
        drop(child.stdout.take());
        let output = child.wait_with_output().unwrap();
        assert_eq!(String::from_utf8(output.stderr).unwrap(), "");
        assert_eq!(output.status.code(), Some(0));
    }
}

#[test]
fn the_record_and_the_summing_up_say_which_rows_are_the_header_and_why_a_column_is_not_used() {
    let place = Place::with_rows(vec![
        texts(&["Name", "CAS No.", "Half-life soil", "DT50 water", "Colour"]),
        texts(&["", "", "weeks", "min", ""]),
        texts(&["DDT", "50-29-3", "300", "150", "white"]),
    ]);
    let run = place.screen(&[]);
    let not_used = "D `DT50 water [min]` (left aside; `min` may be a unit or not), E `Colour`";
    assert!(run.said.contains(not_used), "{}", run.said);
    let record = place.screened("Run record").text();
    for told in [
        "Header in rows|1 and 2, read together",
        "D DT50 water [min]|not used, only carried along: left aside; `min` may be a unit or not",
        "E Colour|not used, only carried along: header not recognised",
    ] {
        assert!(record.contains(told), "{record}");
    }
}

#[test]
fn a_line_of_the_reasoning_names_the_words_it_relies_on_and_their_cell() {
    let place = Place::with_rows(vec![
        texts(&["Name", "CAS", "Ready biodegradability", "Hazard statements"]),
        texts(&["Phenol", "108-95-2", "readily biodegradable", "H341, H373"]),
        texts(&["DDT", "50-29-3", "not readily biodegradable", "H301"]),
        texts(&["Toluene", "108-88-3", "", ""]),
    ]);
    assert_eq!(place.screen(&["--rulebook", "eu-reach-pbt"]).status, 0);
    let rows = place.screened("Reasoning").0;
    let line = |row: &str, criterion: &str| {
        let texts = |line: &[calamine::Data]| [1, 5].map(|column| line[column].to_string());
        let found = rows.iter().find(|line| texts(line) == [row, criterion]);
        [7, 10, 11].map(|column| found.unwrap()[column].to_string())
    };
    assert_eq!(line("2", "P"), ["readily biodegradable", "unstated", "Substances!C2"]);
    assert_eq!(line("2", "T"), ["H373", "", "Substances!D2"]);
    assert_eq!(line("3", "P"), ["not readily biodegradable", "unstated", "Substances!C3"]);
    assert_eq!(line("3", "T"), ["H301", "", "Substances!D3"]);
    assert_eq!(line("4", "P"), ["", "", ""]);
}
