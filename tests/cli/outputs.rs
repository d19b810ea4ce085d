//! Where the output goes, what is never written over, and that the same run gives the same bytes.

use crate::place::Place;
use crate::sheets::{rows_with_a_fault, sound_rows};

#[test]
fn an_output_that_exists_is_untouched_without_force_and_replaced_with_it() {
    let place = Place::with_rows(sound_rows());
    std::fs::write(place.path("inventory-screened.xlsx"), "mine").unwrap();
    place.refuses(
        &["screen", "inventory.xlsx"],
        "inventory-screened.xlsx: exists already; add `--force` to replace it, or choose another `--output`",
    );
    assert_eq!(std::fs::read(place.path("inventory-screened.xlsx")).unwrap(), b"mine");
    assert_eq!(place.screen(&["--force"]).status, 0);
    assert_eq!(
        place.names_of_sheets("inventory-screened.xlsx"),
        ["Substances", "Reasoning", "Record", "Conflicts", "Rulebooks", "Run record"]
    );
    assert_eq!(place.files(), ["inventory-screened.xlsx", "inventory.xlsx"]);
}

#[test]
fn the_input_is_never_written_over() {
    let place = Place::with_rows(sound_rows());
    let before = std::fs::read(place.path("inventory.xlsx")).unwrap();
    std::fs::create_dir(place.path("sub")).unwrap();
    for output in ["inventory.xlsx", "./inventory.xlsx", "sub/../inventory.xlsx"] {
        place.refuses(
            &["screen", "inventory.xlsx", "--output", output, "--force"],
            &format!("{output}: is read by this run and is never written over; choose another `--output`"),
        );
    }
    assert_eq!(std::fs::read(place.path("inventory.xlsx")).unwrap(), before);
}

#[test]
fn an_output_that_has_no_place_is_refused_with_the_reason() {
    let place = Place::with_rows(sound_rows());
    std::fs::write(place.path("note.txt"), "a file").unwrap();
    std::fs::create_dir(place.path("folder")).unwrap();
    for (output, message) in [
        ("none/out.xlsx", "none: there is no such folder; create it, or choose another `--output`"),
        // A file in the folder's place, because the superuser may write into any folder.
        (
            "note.txt/out.xlsx",
            "note.txt: cannot be written into (it is a file, not a folder); choose another `--output`",
        ),
        ("folder", "folder: is a folder; name the workbook inside it"),
        ("out.csv", "--output out.csv: the output is an xlsx workbook; write a name that ends in .xlsx"),
        ("out", "--output out: the output is an xlsx workbook; write a name that ends in .xlsx"),
    ] {
        place.refuses(&["screen", "inventory.xlsx", "--output", output], message);
    }
}

#[test]
fn the_number_of_threads_and_the_place_of_the_output_change_no_byte() {
    let mut rows = rows_with_a_fault();
    let more: Vec<_> = rows[1..].to_vec();
    rows.extend(std::iter::repeat_n(more, 700).flatten());
    let place = Place::with_rows(rows);
    std::fs::create_dir(place.path("sub")).unwrap();
    let mut outputs = Vec::new();
    for (threads, output) in [("1", "one.xlsx"), ("2", "sub/another name.xlsx"), ("8", "eight.xlsx")] {
        assert_eq!(place.screen(&["--threads", threads, "--output", output]).status, 1);
        outputs.push(std::fs::read(place.path(output)).unwrap());
    }
    assert!(outputs[0] == outputs[1], "one thread and two");
    assert!(outputs[0] == outputs[2], "one thread and eight");
}

#[test]
fn the_name_of_the_inventory_stands_in_the_run_record_and_nowhere_else() {
    let place = Place::with_rows(sound_rows());
    std::fs::copy(place.path("inventory.xlsx"), place.path("copy.xlsx")).unwrap();
    assert_eq!(place.screen(&[]).status, 0);
    let run = place.run(&["screen", "copy.xlsx", "--date", "2026-12-01"]);
    assert_eq!(run.status, 0);
    for sheet in place.names_of_sheets("copy-screened.xlsx") {
        let (one, other) = (place.screened(&sheet), place.rows_of("copy-screened.xlsx", &sheet));
        assert_eq!(one.text().replace("inventory.xlsx", "copy.xlsx"), other.text(), "{sheet}");
        assert_eq!(one.text() == other.text(), sheet != "Run record", "{sheet}");
    }
}

#[test]
fn another_day_is_another_date_in_the_run_record() {
    let place = Place::with_rows(sound_rows());
    place.run(&["screen", "inventory.xlsx", "--date", "2026-12-02"]);
    assert!(place.screened("Run record").text().contains("Date of the run|2026-12-02"));
}

#[test]
fn an_output_fed_in_again_is_refused_and_says_what_to_screen() {
    let place = Place::with_rows(sound_rows());
    place.run(&["screen", "inventory.xlsx", "--output", "once.xlsx"]);
    let again = place.run(&["screen", "once.xlsx", "--output", "twice.xlsx"]);
    assert_eq!(again.status, 2);
    assert!(again.complained.contains("has been screened already"), "{}", again.complained);
    assert!(!place.path("twice.xlsx").exists());
}
