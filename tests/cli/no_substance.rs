//! Rows among the data that hold no substance: told, not screened, and no fault of the inventory.

use crate::place::Place;
use crate::sheets::texts;

#[test]
fn a_row_of_totals_is_copied_told_once_and_not_screened() {
    let place = Place::with_rows(vec![
        texts(&["Name", "CAS", "log Kow", "BCF (L/kg)", "Tonnes per year"]),
        texts(&["Phenol", "108-95-2", "1.46", "17", "12"]),
        texts(&["Total petroleum hydrocarbons", "", "", "", "3"]),
        texts(&["Total", "", "", "", "15"]),
    ]);
    let run = place.screen(&[]);
    assert_eq!((run.status, run.complained.as_str()), (0, ""));
    let told = "1 row holds no substance and was not screened: 1 total; each says so in its row, and the sheet \
                `Conflicts` lists them.";
    assert!(run.said.contains(told), "{}", run.said);
    let written = place.screened("Substances");
    assert_eq!(written.under(1, "REACH B", 2), "screens out");
    assert_eq!(written.under(1, "REACH B", 3), "no data");
    assert_eq!(written.under(1, "REACH B", 4), "");
    assert_eq!(written.under(1, "Tonnes per year", 4), "15");
    let why = "Substances!A4: `Total` says that the row holds a total, so it was not screened; if it is a substance, \
               give it a CAS number";
    assert!(written.under(1, "Cautions", 4).contains(why), "{}", written.text());
    let conflicts = place.screened("Conflicts").text();
    assert_eq!(conflicts.matches("says that the row holds a total").count(), 1, "{conflicts}");
    assert!(conflicts.contains("1 row holds no substance."), "{conflicts}");
    assert!(place.screened("Run record").text().contains(told));
}

#[test]
fn headings_notes_and_page_numbers_are_not_screened_and_names_alone_are() {
    let place = Place::with_rows(vec![
        texts(&["Name", "CAS", "log Kow", "BCF (L/kg)", "Tonnes per year"]),
        texts(&["Solvents:"]),
        texts(&["Phenol", "108-95-2", "1.46", "17", "12"]),
        texts(&["Page 2 of 2"]),
        texts(&["Solvents"]),
        texts(&["(1R)-(+)-alpha-Pinene"]),
        texts(&["* mean of two determinations"]),
        texts(&["", "Note: as delivered"]),
    ]);
    let run = place.screen(&[]);
    assert_eq!((run.status, run.complained.as_str()), (0, ""));
    assert!(run.said.starts_with("Screened 3 rows on 1 sheet"), "{}", run.said);
    let told = "4 rows hold no substance and were not screened: 2 notes, 1 heading, 1 page label; each says so in its \
                row, and the sheet `Conflicts` lists them.";
    assert!(run.said.contains(told), "{}", run.said);
    let written = place.screened("Substances");
    for (row, verdict) in
        [(2, ""), (3, "screens out"), (4, ""), (5, "no data"), (6, "no data"), (7, ""), (8, "")]
    {
        assert_eq!(written.under(1, "REACH B", row), verdict, "row {row}");
        assert_eq!(
            written.under(1, "Cautions", row).starts_with("not screened: "),
            verdict.is_empty(),
            "row {row}"
        );
    }
}

#[test]
fn a_cell_that_cannot_be_read_is_a_fault_beside_them_still() {
    let place = Place::with_rows(vec![
        texts(&["Name", "CAS", "log Kow", "BCF (L/kg)"]),
        texts(&["Solvents:"]),
        texts(&["Phenol", "108-95-2", "soon", "17"]),
    ]);
    let run = place.screen(&[]);
    assert_eq!(run.status, 1);
    assert!(run.complained.contains("\n1 cell could not be read or used: "), "{}", run.complained);
    assert!(!run.complained.contains("Solvents"), "{}", run.complained);
    assert!(run.said.contains("1 row holds no substance and was not screened: 1 heading;"), "{}", run.said);
}
