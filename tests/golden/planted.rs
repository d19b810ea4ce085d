//! What was planted in the example to be found.

use crate::annotated::EXAMPLE;

fn fault_at(cell: &str) -> String {
    let fault = EXAMPLE.summary.faults.iter().map(ToString::to_string).find(|fault| fault.starts_with(cell));
    fault.unwrap_or_default()
}

#[test]
fn planted_faults_are_named_by_cell_with_what_to_write() {
    for (cell, says) in [
        ("Substances!B19:", "its check digit should be 7"),
        ("Substances!B28:", "holds several CAS numbers"),
        ("Substances!H30:", "oz/gal"),
        ("Substances!F60:", "is no log Kow"),
        ("Rohstoffe!C36:", "its check digit should be 5"),
        ("Rohstoffe!B37:", "its check digit should be 4"),
        ("Rohstoffe!B51:", "is no CAS number"),
        ("Rohstoffe!F65:", "is no log Kow"),
    ] {
        assert!(fault_at(cell).contains(says), "{cell} {}", fault_at(cell));
    }
}

#[test]
fn a_fault_stands_in_the_row_as_well() {
    assert!(EXAMPLE.cell("Substances", 60, "Cautions").contains("not read: Substances!F60"));
}

#[test]
fn a_date_read_back_as_a_cas_number_raises_a_caution_and_clears_nothing() {
    assert!(EXAMPLE.cell("Substances", 106, "Cautions").contains("identity-by-repaired-date"));
    let header = EXAMPLE.header("Substances").1;
    for (place, name) in header.iter().enumerate() {
        let verdict = &EXAMPLE.sheets["Substances"][105][place];
        assert!(
            !verdict.starts_with("screens out") && !verdict.starts_with("not fulfilled"),
            "{name}: {verdict}"
        );
    }
}

#[test]
fn a_name_alone_and_a_mixture_clear_nothing() {
    for row in [107, 108] {
        for criterion in ["REACH P", "REACH B", "REACH T", "CLP M", "STOCKHOLM B", "CANADA P", "CANADA B"] {
            let verdict = EXAMPLE.cell("Substances", row, criterion);
            assert!(["no data", "unresolved"].contains(&verdict), "row {row} {criterion}: {verdict}");
        }
    }
}

#[test]
fn a_blank_row_stays_blank_and_the_sheet_of_text_is_copied() {
    assert!(EXAMPLE.sheets["Substances"][62].iter().all(String::is_empty));
    assert!(EXAMPLE.sheets["Read me"].iter().flatten().all(|cell| cell != "log Kow used"));
    assert_eq!(EXAMPLE.summary.sheets, (2, 1));
}

#[test]
fn the_added_headers_are_those_of_the_documentation() {
    let header = EXAMPLE.header("Substances").1;
    let first = header.iter().position(|cell| cell == "log Kow used").unwrap();
    let expected = "log Kow used|log Kow SD|log Kow basis|\
        REACH|REACH why|REACH P|REACH vP|REACH B|REACH vB|REACH T|REACH PBT|REACH vPvB|\
        CLP|CLP why|CLP P|CLP vP|CLP B|CLP vB|CLP M|CLP vM|CLP T|CLP PBT|CLP vPvB|CLP PMT|CLP vPvM|\
        STOCKHOLM|STOCKHOLM why|STOCKHOLM P|STOCKHOLM B|STOCKHOLM LRT|STOCKHOLM adverse effects|STOCKHOLM Annex D indicators|\
        CANADA|CANADA why|CANADA P|CANADA B|CANADA PB|\
        Cautions|Deciding data|Assessor verdict|Assessor reason|Assessor|Assessed on";
    assert_eq!(header[first..].join("|"), expected);
}

#[test]
fn the_sheets_are_those_of_the_documentation() {
    let names: Vec<&str> = EXAMPLE.sheets.keys().map(String::as_str).collect();
    assert_eq!(
        names,
        ["Conflicts", "Read me", "Reasoning", "Record", "Rohstoffe", "Rulebooks", "Run record", "Substances"]
    );
}

#[test]
fn every_screened_row_has_a_line_for_each_rulebook_and_criterion() {
    let criteria = 5 + 7 + 4 + 2;
    assert_eq!(EXAMPLE.sheets["Reasoning"].len(), 1 + EXAMPLE.summary.screened * criteria);
}

/// The guard that every inventory passes looks at the order of rows and cells, so the output has to pass it as well.
#[test]
fn the_output_is_itself_a_sound_workbook() {
    let folder = tempfile::tempdir().unwrap();
    let output = folder.path().join("screened.xlsx");
    kowledger::run::screen(&crate::annotated::settings(&output)).unwrap();
    let mut again = kowledger::workbook::open_inventory(&output).unwrap();
    for sheet in 0..again.sheets().len() {
        let mut rows = 0;
        again
            .stream_rows(sheet, |_| {
                rows += 1;
                std::ops::ControlFlow::Continue(())
            })
            .unwrap();
        assert!(rows > 0, "sheet {sheet}");
    }
}
