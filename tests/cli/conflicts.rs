//! What the Conflicts sheet lists, read back from the output, and what the terminal says of it.

use std::io::Read;

use crate::place::{Place, Rows};
use crate::sheets::{HEADER, Put, rows_with_a_fault, sound_rows, texts};

const COLUMNS: [&str; 10] = [
    "Sheet",
    "Cell",
    "Row id",
    "Name",
    "CAS or EC number",
    "Column",
    "Kind",
    "Found",
    "What is wrong",
    "What to do",
];

/// What stands above the list, and its lines below the header.
fn listed(rows: &Rows) -> (Vec<String>, Vec<Vec<String>>) {
    let texts: Vec<Vec<String>> =
        rows.0.iter().map(|row| row.iter().map(ToString::to_string).collect()).collect();
    match texts.iter().position(|row| *row == COLUMNS) {
        Some(header) => (column(&texts[..header], 0), texts[header + 1..].to_vec()),
        None => (column(&texts, 0), Vec::new()),
    }
}

fn column(lines: &[Vec<String>], column: usize) -> Vec<String> {
    lines.iter().map(|line| line[column].clone()).collect()
}

fn lines_of(place: &Place) -> Vec<Vec<String>> {
    listed(&place.screened("Conflicts")).1
}

/// Sheet, cell, kind and what is wrong of each line.
fn brief(place: &Place) -> Vec<[String; 4]> {
    lines_of(place).iter().map(|line| [0, 1, 6, 8].map(|column| line[column].clone())).collect()
}

#[test]
fn a_cell_that_cannot_be_read_is_listed_with_its_row_and_what_to_do() {
    let mut rows = rows_with_a_fault();
    rows[0].push(Put::Text("Material no."));
    rows[2].push(Put::Text("M-7"));
    let place = Place::with_rows(rows);
    assert_eq!(place.screen(&[]).status, 1);
    let (head, lines) = listed(&place.screened("Conflicts"));
    assert_eq!(head[0], "1 cell could not be read or used.");
    assert_eq!(
        lines,
        [[
            "Substances",
            "E3",
            "M-7",
            "Phenol",
            "108-95-2",
            "Half-life soil (d)",
            "not a value of its column",
            "soon",
            "`soon` is no half-life in soil.",
            "Write, for example, `40 d`."
        ]]
    );
}

#[test]
fn where_there_is_nothing_to_list_the_sheet_says_what_was_looked_for() {
    let place = Place::with_rows(sound_rows());
    let run = place.screen(&[]);
    assert_eq!((run.status, run.complained.as_str()), (0, ""));
    assert!(!run.said.contains("Conflicts"), "{}", run.said);
    assert_eq!(
        place.screened("Conflicts").text(),
        "Nothing to list: every cell could be read, no row was left aside, no column is in doubt or left unused, and \
         no CAS number, EC number or name stands on more than one row."
    );
    assert!(place.screened("Run record").text().contains("Cells that could not be read or used: 0|"));
}

#[test]
fn a_sheet_of_the_user_called_conflicts_keeps_its_name() {
    let place = Place::with_sheets(&[("Substances", rows_with_a_fault()), ("conflicts", sound_rows())]);
    let run = place.screen(&["--sheet", "Substances"]);
    assert!(run.complained.contains("the sheet `Conflicts (screened)` says"), "{}", run.complained);
    assert_eq!(listed(&place.screened("Conflicts (screened)")).1.len(), 1);
    assert!(place.screened("Run record").text().contains("The sheet Conflicts (screened) says"));
}

#[test]
fn many_cells_of_a_column_with_the_same_text_are_told_in_one_sentence_and_listed_one_by_one() {
    let mut rows = sound_rows();
    let numbers = ["71-43-2", "108-88-3", "67-64-1", "64-17-5"];
    rows.extend(numbers.map(|cas| texts(&["", cas, "see file", "17", "3"])));
    rows.extend((0..25).map(|_| texts(&["", "", "", "", ""])));
    let odd: Vec<String> = ('a'..='y').map(|letter| format!("soon {letter}")).collect();
    for (row, text) in rows.iter_mut().skip(7).zip(&odd) {
        row[1] = Put::Text("50-29-4");
        row[4] = Put::Text(text);
    }
    let place = Place::with_rows(rows);
    let run = place.screen(&["--quiet", "--threads", "2"]);
    assert_eq!((run.status, run.said.as_str()), (1, ""));
    let told: Vec<&str> = run.complained.lines().collect();
    assert_eq!(
        told[0],
        "Substances!C4: `see file` is no log Kow; write, for example, `4.5` (and 3 more cells of this column like it)"
    );
    assert_eq!(
        told[1],
        "Substances!B8: `50-29-4` is no CAS number: its check digit should be 3; look the number up, and write \
         `50-29-3` if the other digits are right, or correct them (and 24 more cells of this column like it)"
    );
    assert_eq!(told[2], "Substances!E8: `soon a` is no half-life in soil; write, for example, `40 d`");
    assert_eq!(told.len(), 22, "twenty faults, the rest and the total: {}", run.complained);
    // 4 + 25 + 18 of the 54 are told.
    assert_eq!(told[20], "... and 7 more");
    assert_eq!(
        told[21],
        "54 cells could not be read or used: 29 not a value of its column, 25 check digit. The rows were screened with \
         what remains; the sheet `Conflicts` says cell by cell what to do."
    );
    let lines = lines_of(&place);
    assert_eq!(column(&lines, 1)[..6], ["C4", "C5", "C6", "C7", "B8", "E8"], "by row, then by column");
    assert_eq!(lines.len(), 54);
}

/// DDT with data on one sheet, and once more without on another.
fn ddt_twice(other_spelling: Put<'static>) -> Place {
    let second = vec![texts(&["CAS-Nr.", "Stoff"]), vec![other_spelling, Put::Text("Dicophan")]];
    Place::with_sheets(&[("Substances", sound_rows()), ("Liste 2", second)])
}

#[test]
fn a_substance_on_two_sheets_is_listed_on_both_rows_however_its_number_is_spelt() {
    for spelling in
        [Put::Text("50-29-3"), Put::Text(" 50 - 29 - 3 "), Put::Text("CAS 50-29-3"), Put::Number(50293.0)]
    {
        let place = ddt_twice(spelling);
        let run = place.screen(&[]);
        assert_eq!((run.status, run.complained.as_str()), (0, ""), "a substance on two rows is no fault");
        assert!(
            run.said.contains(
                "\n1 CAS or EC number stands on more than one row; the sheet `Conflicts` says where they differ.\n"
            ),
            "{}",
            run.said
        );
        let lines = lines_of(&place);
        let names: Vec<_> = lines.iter().map(|line| [0, 1, 3, 4].map(|place| line[place].as_str())).collect();
        assert_eq!(names, [["Substances", "B2", "DDT", "50-29-3"], ["Liste 2", "A2", "Dicophan", "50-29-3"]]);
        assert_eq!(column(&lines, 6), ["same CAS number, headlines differ"; 2]);
        let (one, other) = (
            place.screened("Substances").under(1, "REACH", 2),
            place.screened("Liste 2").under(1, "REACH", 2),
        );
        assert_ne!(one, other);
        let start = format!(
            "CAS number 50-29-3 stands in 'Liste 2'!A2 as well; REACH: `{one}` here, `{other}` there; "
        );
        assert!(lines[0][8].starts_with(&start), "{}", lines[0][8]);
        assert!(
            lines[0][8].ends_with("; not all of them have log Kow, BCF and half-life in soil."),
            "{}",
            lines[0][8]
        );
        let start = format!(
            "CAS number 50-29-3 stands in Substances!B2 as well; REACH: `{other}` here, `{one}` there; "
        );
        assert!(lines[1][8].starts_with(&start), "{}", lines[1][8]);
    }
}

#[test]
fn another_number_is_another_substance_and_a_cell_that_gives_none_shares_nothing() {
    for other in [Put::Text("108-95-2"), Put::Text("50-29-4"), Put::Text("50-29-3 / 71-43-2"), Put::Text("-")]
    {
        let place = ddt_twice(other);
        place.screen(&[]);
        let shared = lines_of(&place).iter().filter(|line| line[7] == "50-29-3").count();
        assert_eq!(shared, 0);
    }
}

#[test]
fn rows_that_agree_and_rows_that_differ_in_their_data_are_told_apart() {
    let row = ["DDT", "50-29-3", "6.91", "12000", "2000"];
    let other = ["DDT", "50-29-3", "6.36", "12000 L/kg", "2000 d"];
    let same = Place::with_rows(vec![texts(&HEADER), texts(&row), texts(&row), texts(&row)]);
    assert_eq!(same.screen(&[]).status, 0);
    let lines = brief(&same);
    assert_eq!(lines.len(), 3);
    assert_eq!(
        lines[1],
        [
            "Substances",
            "B3",
            "same CAS number, same data",
            "CAS number 50-29-3 stands in Substances!B2 and Substances!B4 as well."
        ]
    );
    let differing = Place::with_rows(vec![texts(&HEADER), texts(&row), texts(&other)]);
    differing.screen(&[]);
    assert_eq!(
        brief(&differing)[0],
        [
            "Substances",
            "B2",
            "same CAS number, data differ",
            "CAS number 50-29-3 stands in Substances!B3 as well; the rows differ in log Kow."
        ],
        "a unit that is the column's own makes no difference"
    );
}

#[test]
fn of_many_rows_the_first_others_are_named_and_the_rest_counted() {
    let mut rows = vec![texts(&["CAS", "log Kow"])];
    rows.extend(vec![texts(&["50-29-3", "6.91"]); 6]);
    let place = Place::with_rows(rows);
    place.screen(&[]);
    let lines = brief(&place);
    assert_eq!(
        lines[0][3],
        "CAS number 50-29-3 stands in Substances!A3, Substances!A4, Substances!A5 and 2 more rows as well."
    );
    assert_eq!(
        lines[5][3],
        "CAS number 50-29-3 stands in Substances!A2, Substances!A3, Substances!A4 and 2 more rows as well."
    );
}

#[test]
fn numbers_that_contradict_each_other_come_first() {
    let place = Place::with_rows(vec![
        texts(&["Name", "CAS No.", "EC number", "log Kow"]),
        texts(&["Phenol", "108-95-2", "203-632-7", "1.46"]),
        texts(&["Phenol", "108-95-2", "203-632-7", "1.5"]),
        texts(&["DDT", "50-29-3", "200-024-3", "6.91"]),
        texts(&["DDT", "50-29-3", "204-211-0", "6.91"]),
        texts(&["DEHP", "117-81-7", "204-211-0", "7.5"]),
    ]);
    let run = place.screen(&[]);
    assert_eq!(run.status, 0);
    let lines = brief(&place);
    let kinds: Vec<(&str, &str)> = lines.iter().map(|line| (line[1].as_str(), line[2].as_str())).collect();
    assert_eq!(
        kinds,
        [
            ("B4", "same CAS number, other EC numbers"),
            ("B5", "same CAS number, other EC numbers"),
            ("C5", "same EC number, other CAS numbers"),
            ("C6", "same EC number, other CAS numbers"),
            ("B2", "same CAS number, data differ"),
            ("B3", "same CAS number, data differ"),
        ]
    );
    assert_eq!(
        lines[0][3],
        "CAS number 50-29-3 stands in Substances!B5 as well; EC number: `200-024-3` here, `204-211-0` there."
    );
    assert!(
        lines[3][3].starts_with(
            "EC number 204-211-0 stands in Substances!C5 as well; CAS number: `117-81-7` here, `50-29-3` there"
        ),
        "{}",
        lines[3][3]
    );
}

#[test]
fn an_ec_number_joins_a_row_with_a_cas_number_and_one_without() {
    let place = Place::with_rows(vec![
        texts(&["CAS No.", "EC number", "log Kow"]),
        texts(&["50-29-3", "200-024-3", "6.91"]),
        texts(&["", "200-024-3", "6.91"]),
    ]);
    assert_eq!(place.screen(&[]).status, 0);
    let lines = brief(&place);
    assert_eq!(lines.len(), 2);
    assert_eq!(
        lines[1],
        [
            "Substances",
            "B3",
            "same EC number, same data",
            "EC number 200-024-3 stands in Substances!B2 as well; CAS number: none here, `50-29-3` there."
        ]
    );
}

#[test]
fn a_name_alone_makes_no_duplicate_but_is_named_as_a_doubt() {
    let place = Place::with_rows(vec![
        texts(&HEADER),
        texts(&["DDT", "50-29-3", "6.91", "", ""]),
        texts(&["ddt ", "", "6.91", "", ""]),
        texts(&["Xylene", "1330-20-7", "3.2", "", ""]),
        texts(&["Xylene", "106-42-3", "3.15", "", ""]),
        texts(&["Phenol", "108-95-2", "1.46", "", ""]),
        texts(&["Phenol ", "108-95-2", "1.46", "", ""]),
    ]);
    let run = place.screen(&[]);
    assert_eq!(run.status, 0);
    assert!(
        run.said.contains(
            "1 CAS or EC number stands on more than one row; 2 names stand on more than one row without one number for \
             all of them; the sheet"
        ),
        "{}",
        run.said
    );
    let lines = lines_of(&place);
    let kinds: Vec<(&str, &str)> = lines.iter().map(|line| (line[1].as_str(), line[6].as_str())).collect();
    assert_eq!(
        kinds,
        [
            ("A4", "same name, other numbers"),
            ("A5", "same name, other numbers"),
            ("B6", "same CAS number, same data"),
            ("B7", "same CAS number, same data"),
            ("A2", "same name, number missing"),
            ("A3", "same name, number missing"),
        ]
    );
    assert!(
        lines[5][8].starts_with(
            "The name `ddt` stands in Substances!A2 as well; CAS number: none here, `50-29-3` there"
        ),
        "{}",
        lines[5][8]
    );
    assert!(lines[5][9].ends_with("by a name alone nothing is cleared."), "{}", lines[5][9]);
}

#[test]
fn the_name_of_a_product_on_rows_of_many_substances_is_no_doubt() {
    let header = texts(&["Name", "CAS No."]);
    let numbers = ["50-29-3", "108-95-2", "1330-20-7", "106-42-3"];
    for (rows, lines) in [(3, 3), (4, 0)] {
        let substances = numbers[..rows].iter().map(|cas| texts(&["Primer 400", cas]));
        let place = Place::with_rows(std::iter::once(header.clone()).chain(substances).collect());
        place.screen(&[]);
        assert_eq!(lines_of(&place).len(), lines, "{rows} rows");
    }
}

#[test]
fn a_mixture_shares_no_number_with_its_component() {
    let place = Place::with_rows(vec![
        texts(&["Name", "CAS No.", "Row type"]),
        texts(&["Paste", "94-36-0", "mixture"]),
        texts(&["Dibenzoyl peroxide", "94-36-0", "substance"]),
    ]);
    assert_eq!(place.screen(&[]).status, 1);
    assert_eq!(column(&lines_of(&place), 6), ["mixture"]);
}

#[test]
fn doubtful_columns_and_rows_left_aside_are_listed_in_the_place_they_have() {
    let place = Place::with_rows(vec![
        texts(&["Name", "Name (old)", "CAS", "log Kow"]),
        texts(&["Phenol", "DDT", "50-29-3", "soon"]),
        vec![],
        texts(&["Name", "CAS", "BCF (L/kg)", "log Kow"]),
        texts(&["DDT", "50-29-3", "12000", "6.91"]),
        texts(&["DDT", "50-29-3", "12000", "6.91"]),
    ]);
    assert_eq!(place.screen(&[]).status, 1);
    let lines = brief(&place);
    let kinds: Vec<(&str, &str)> = lines.iter().map(|line| (line[1].as_str(), line[2].as_str())).collect();
    assert_eq!(
        kinds,
        [
            ("B1", "doubtful column"),
            ("D2", "not a value of its column"),
            ("A4", "header of another table"),
            ("A5", "rows not screened")
        ]
    );
    assert!(
        lines[0][3].starts_with("Columns A (`Name`) and B (`Name (old)`) both name name"),
        "{}",
        lines[0][3]
    );
    assert_eq!(lines[3][3], "2 rows were not screened, below the header of another table in row 4.");
    assert_eq!(
        listed(&place.screened("Conflicts")).0[0],
        "2 cells could not be read or used; 2 rows were not screened; 1 column or header is in doubt."
    );
}

#[test]
fn a_column_with_data_that_is_not_used_is_listed_and_one_without_is_not() {
    let place = Place::with_rows(vec![
        texts(&["Name", "CAS", "Shelf", "Colour", "", "log Kow"]),
        texts(&["Phenol", "108-95-2", "7", "", "x", "1.46"]),
        texts(&["DDT", "50-29-3", "8", "  ", "", "6.91"]),
    ]);
    assert_eq!(place.screen(&[]).status, 0);
    let (head, lines) = listed(&place.screened("Conflicts"));
    assert_eq!(head[0], "2 columns with data are not used.");
    let told: Vec<[&str; 5]> =
        lines.iter().map(|line| [1, 5, 6, 8, 9].map(|column| line[column].as_str())).collect();
    assert_eq!(
        told,
        [
            [
                "C1",
                "Shelf",
                "column not used",
                "Column C is carried along only: its header is not recognised; 2 screened rows hold something in it.",
                "Nothing, if it holds nothing to screen with; otherwise say what it holds with `--column \
                 'Header=field'`."
            ],
            [
                "E1",
                "",
                "column not used",
                "Column E is carried along only: it has no header; 1 screened row holds something in it.",
                "Nothing, if it holds nothing to screen with; otherwise give it a header."
            ]
        ]
    );
}

#[test]
fn a_doubtful_column_leads_to_its_header_and_names_it() {
    let place = Place::with_rows(vec![
        texts(&["Name", "CAS", "log Kow", "Koc (L/kg)"]),
        texts(&["Phenol", "108-95-2", "1.46", "1.500"]),
    ]);
    assert_eq!(place.screen(&[]).status, 0);
    let lines = lines_of(&place);
    let told: Vec<[&str; 3]> =
        lines.iter().map(|line| [1, 5, 6].map(|column| line[column].as_str())).collect();
    assert_eq!(told, [["D1", "Koc (L/kg)", "doubtful column"]]);
}

#[test]
fn each_line_leads_to_its_cell_and_the_list_can_be_filtered() {
    let name = "R&D 'old' <1>";
    let second = vec![texts(&HEADER), texts(&["DDT", "50-29-3", "", "", ""])];
    let place = Place::with_sheets(&[("2026", rows_with_a_fault()), (name, second)]);
    place.screen(&["--reasoning", "none"]);
    assert_eq!(
        place.names_of_sheets("inventory-screened.xlsx"),
        ["2026", name, "Record", "Conflicts", "Rulebooks", "Run record"]
    );
    let mut book =
        zip::ZipArchive::new(std::fs::File::open(place.path("inventory-screened.xlsx")).unwrap()).unwrap();
    let mut xml = String::new();
    book.by_name("xl/worksheets/sheet4.xml").unwrap().read_to_string(&mut xml).unwrap();
    for part in [
        r#"<hyperlink ref="B4" location="'2026'!E3""#,
        r#"<hyperlink ref="B5" location="'2026'!B2""#,
        r#"<hyperlink ref="B6" location="'R&amp;D ''old'' &lt;1&gt;'!B2""#,
        r#"<autoFilter ref="A3:J6"/>"#,
        r#"<pane ySplit="3" topLeftCell="A4""#,
    ] {
        assert!(xml.contains(part), "{part} in {}", &xml[xml.len() - 1500..]);
    }
}
