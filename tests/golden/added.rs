//! The sheets, columns and lines that every output has.

use crate::annotated::EXAMPLE;

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
        [
            "Conflicts",
            "Read me",
            "Reasoning",
            "Record",
            "Rohstoffe",
            "Rulebooks",
            "Run record",
            "Sites and units",
            "Substances"
        ]
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
