//! Which substance a row means: numbers, structures, dates that were numbers, mixtures.

use kowledger::substance::{Identity, Substance};
use kowledger::workbook::CellContent;

use crate::sheet::{read_cells, read_last};

fn row(cas: &str, ec: &str, smiles: &str) -> Result<Substance, String> {
    read_last(&[&["Name", "CAS", "EC number", "SMILES"], &["a name", cas, ec, smiles]])
}

fn faults(substance: &Substance) -> Vec<String> {
    substance.faults.iter().map(ToString::to_string).collect()
}

fn cas_cell(content: CellContent) -> Result<Substance, String> {
    read_cells(&["CAS"], &[content])
}

#[test]
fn a_cas_number_is_read_in_every_usual_form() {
    for text in [
        "50-29-3",
        " 50-29-3 ",
        "50‑29‑3",
        "CAS 50-29-3",
        "CAS: 50-29-3",
        "50 - 29 - 3",
        "50-29-3 (tech.)",
        "50-29-3; 50-29-3",
    ] {
        let substance = row(text, "", "").unwrap();
        assert_eq!(substance.cas.map(|cas| cas.value.to_string()).as_deref(), Some("50-29-3"), "{text}");
        assert_eq!(substance.identity, Identity::Identified, "{text}");
        assert!(substance.faults.is_empty(), "{text}");
    }
}

#[test]
fn a_number_without_hyphens_is_read_where_its_check_digit_agrees_and_identifies_beside_a_second_one_only() {
    for content in [CellContent::Number(50_293.0), CellContent::Text("50293".to_owned())] {
        let number = cas_cell(content).unwrap();
        assert_eq!(number.cas.map(|cas| cas.value.to_string()).as_deref(), Some("50-29-3"));
        assert_eq!(number.identity, Identity::BareNumber);
        assert!(number.faults.is_empty());
    }
    assert_eq!(row("50293", "200-024-3", "").unwrap().identity, Identity::Identified);
    assert_eq!(row("50294", "", "").unwrap().identity, Identity::NameAlone);
}

#[test]
fn a_wrong_check_digit_is_a_fault_that_names_the_right_one() {
    let substance = row("50-29-4", "", "").unwrap();
    assert_eq!(
        faults(&substance),
        [
            "Sheet!B2: `50-29-4` is no CAS number: its check digit should be 3; look the number up, and write `50-29-3` \
          if the other digits are right, or correct them"
        ]
    );
    assert_eq!((substance.cas, substance.identity), (None, Identity::NameAlone));
    let substance = row("", "200-024-4", "").unwrap();
    assert!(faults(&substance)[0].contains("write `200-024-3`"), "{:?}", substance.faults);
}

#[test]
fn two_cas_numbers_in_a_cell_identify_nothing_even_beside_an_ec_number() {
    for text in ["50-29-3, 7732-18-5", "50-29-3; 50-29-4", "50-29-3/7732-18-5", "50-29-3\n7732-18-5"] {
        let substance = row(text, "200-024-3", "").unwrap();
        assert_eq!(substance.identity, Identity::NotIdentified, "{text}");
        assert!(faults(&substance)[0].contains("holds several CAS numbers"), "{text}");
    }
}

#[test]
fn any_one_identifier_identifies_and_a_name_or_row_number_alone_does_not() {
    assert_eq!(row("50-29-3", "", "").unwrap().identity, Identity::Identified);
    assert_eq!(row("", "200-024-3", "").unwrap().identity, Identity::Identified);
    assert_eq!(row("", "", "Clc1ccc(cc1)C(c1ccc(Cl)cc1)C(Cl)(Cl)Cl").unwrap().identity, Identity::Identified);
    assert_eq!(row("", "", "").unwrap().identity, Identity::NameAlone);
    assert_eq!(row("n.a.", "-", "k.A.").unwrap().identity, Identity::NameAlone);
    let by_key = read_last(&[&["InChIKey"], &["InChIKey=YVGGHNCTFXOJCH-UHFFFAOYSA-N"]]).unwrap();
    assert_eq!(by_key.identity, Identity::Identified);
    assert_eq!(by_key.inchi_key.map(|key| key.value).as_deref(), Some("YVGGHNCTFXOJCH-UHFFFAOYSA-N"));
}

#[test]
fn words_are_no_smiles() {
    let substance = row("", "", "DDT technical").unwrap();
    assert_eq!((substance.smiles.is_none(), substance.identity), (true, Identity::NameAlone));
    assert!(faults(&substance)[0].ends_with("is no SMILES; write, for example, `CCO`"));
    for smiles in ["CCO", "[Na+].[Cl-]", "C[C@@H](N)C(=O)O", "F/C=C/F", "c1ccc2[nH]ccc2c1", "CC%10CC%10"] {
        assert!(row("", "", smiles).unwrap().smiles.is_some(), "{smiles}");
    }
}

#[test]
fn a_date_that_was_a_cas_number_is_read_back_when_its_check_digit_agrees() {
    // 1 February 1918 is serial 6607; 8 May 1975 is serial 27522. Acetonitrile is 75-05-8.
    for (content, number) in [
        (CellContent::DateTime(6607.0), "1918-02-1"),
        (CellContent::Text("1918-02-01".to_owned()), "1918-02-1"),
        (CellContent::Text("1918-02-01 00:00:00".to_owned()), "1918-02-1"),
        (CellContent::Text("01.02.1918".to_owned()), "1918-02-1"),
        (CellContent::DateTime(27_522.0), "75-05-8"),
    ] {
        let substance = cas_cell(content).unwrap();
        assert_eq!(substance.cas.as_ref().map(|cas| cas.value.to_string()).as_deref(), Some(number));
        assert_eq!(substance.identity, Identity::RepairedDate);
    }
}

#[test]
fn a_repaired_date_beside_a_second_identifier_is_identified() {
    assert_eq!(row("1918-02-01", "200-024-3", "").unwrap().identity, Identity::Identified);
    assert_eq!(row("1918-02-01", "", "CCO").unwrap().identity, Identity::Identified);
    assert_eq!(row("1918-02-01", "", "").unwrap().identity, Identity::RepairedDate);
}

#[test]
fn a_date_that_gives_no_cas_number_is_a_fault() {
    for content in [CellContent::DateTime(6608.0), CellContent::Text("1918-02-15".to_owned())] {
        let substance = cas_cell(content).unwrap();
        assert_eq!((substance.cas.is_none(), substance.identity), (true, Identity::NameAlone));
        assert!(faults(&substance)[0].contains("gives no CAS number when read back"));
    }
}

#[test]
fn an_ec_number_is_read_with_and_without_hyphens() {
    for text in ["200-024-3", "2000243", "EC 200-024-3", "200‑024‑3"] {
        assert_eq!(
            row("", text, "").unwrap().ec.map(|ec| ec.value.to_string()).as_deref(),
            Some("200-024-3"),
            "{text}"
        );
    }
    assert_eq!(row("", "200-024-3, 200-001-8", "").unwrap().identity, Identity::NotIdentified);
}

#[test]
fn mixtures_and_articles_are_not_identified_and_say_what_to_do() {
    for (words, part) in [
        ("Mixture", "mixtures are screened by their components"),
        ("Stoffgemisch", "mixtures are screened by their components"),
        ("Article", "articles are screened by their substances"),
        ("Erzeugnis", "articles are screened by their substances"),
    ] {
        let substance = read_last(&[&["CAS", "Row type"], &["50-29-3", words]]).unwrap();
        assert_eq!(substance.identity, Identity::NotIdentified, "{words}");
        assert!(faults(&substance)[0].contains(part), "{words}");
    }
    let substance = read_last(&[&["CAS", "Row type"], &["50-29-3", "Stoff"]]).unwrap();
    assert_eq!((substance.identity, substance.faults.len()), (Identity::Identified, 0));
    let by_type = read_last(&[&["CAS", "Substance type"], &["50-29-3", "Gemisch"]]).unwrap();
    assert_eq!(by_type.identity, Identity::NotIdentified);
}

#[test]
fn sodium_is_a_name_and_na_is_not() {
    for (text, name) in [("Na", Some("Na")), ("NA", None), ("n/a", None), ("DDT", Some("DDT"))] {
        let substance = read_last(&[&["CAS", "Name"], &["50-29-3", text]]).unwrap();
        assert_eq!(substance.name.map(|name| name.value).as_deref(), name, "{text}");
    }
}

#[test]
fn a_row_number_is_kept_as_shown() {
    let substance = read_cells(&["No.", "CAS"], &[CellContent::Number(17.0), CellContent::Empty]).unwrap();
    assert_eq!(substance.row_id.map(|id| id.value).as_deref(), Some("17"));
}

#[test]
fn numbers_of_two_columns_must_agree_and_the_filled_one_counts_where_one_is_empty() {
    for (headers, one, other, kind) in [
        (["CAS", "CAS-Nr. (neu)"], "50-29-3", "108-95-2", "CAS number"),
        (["EC number", "EG-Nr."], "200-024-3", "200-001-8", "EC number"),
    ] {
        let read = |cells: [&str; 2]| read_last(&[&headers, &cells]).unwrap();
        let number = |substance: &Substance| {
            let cas = substance.cas.as_ref().map(|cas| cas.value.to_string());
            cas.or(substance.ec.as_ref().map(|ec| ec.value.to_string()))
        };
        let differing = read([one, other]);
        assert_eq!((differing.identity, number(&differing)), (Identity::NotIdentified, None));
        assert_eq!(
            faults(&differing),
            [format!(
                "Sheet!B2: `{other}` is another {kind} than `{one}` in Sheet!A2, so the row is not identified; correct \
                 one of them, or give each substance a row of its own"
            )]
        );
        for cells in [[one, one], [one, ""], ["", one], [one, "n.a."], ["n.a.", one]] {
            let substance = read(cells);
            assert_eq!(
                (substance.identity, number(&substance).as_deref()),
                (Identity::Identified, Some(one))
            );
            assert!(substance.faults.is_empty(), "{cells:?}");
        }
    }
}

#[test]
fn of_two_columns_a_faulty_number_leaves_the_valid_one_and_a_written_one_confirms_a_date() {
    let read = |cells: [&str; 2]| read_last(&[&["CAS", "CAS-Nr. (neu)"], &cells]).unwrap();
    let substance = read(["50-29-4", "50-29-3"]);
    assert_eq!((substance.identity, substance.faults.len()), (Identity::Identified, 1));
    assert_eq!(read(["1975-05-08", ""]).identity, Identity::RepairedDate);
    for cells in [["1975-05-08", "75-05-8"], ["75-05-8", "1975-05-08"]] {
        assert_eq!(read(cells).identity, Identity::Identified, "{cells:?}");
    }
    assert_eq!(read(["1975-05-08", "50-29-3"]).identity, Identity::NotIdentified);
}

#[test]
fn an_ec_number_in_the_cas_column_is_told_and_names_the_row_where_nothing_else_does() {
    let substance = row("203-441-9", "", "").unwrap();
    assert_eq!(
        faults(&substance),
        [
            "Sheet!B2: `203-441-9` is no CAS number but an EC number, which belongs in a column of its own; put it in one \
          with the header `EC number`"
        ]
    );
    assert_eq!((substance.identity, substance.cas.is_none()), (Identity::Identified, true));
    assert_eq!(substance.ec.unwrap().value.to_string(), "203-441-9");
    let beside = row("203-441-9", "", "CCO").unwrap();
    assert_eq!((beside.identity, beside.ec.is_none()), (Identity::Identified, true));
    let wrong = row("203-441-8", "", "").unwrap();
    assert_eq!((wrong.identity, wrong.ec.is_none()), (Identity::NameAlone, true));
}

#[test]
fn a_cas_number_in_the_ec_column_is_told_and_names_the_row_where_nothing_else_does() {
    let substance = row("", "50-29-3", "").unwrap();
    assert_eq!(
        faults(&substance),
        [
            "Sheet!C2: `50-29-3` is no EC number but a CAS number, which belongs in a column of its own; put it in one \
          with the header `CAS number`"
        ]
    );
    assert_eq!((substance.identity, substance.ec.is_none()), (Identity::Identified, true));
    assert_eq!(substance.cas.unwrap().value.to_string(), "50-29-3");
    let swapped = row("200-024-3", "50-29-3", "").unwrap();
    assert_eq!((swapped.identity, swapped.faults.len()), (Identity::Identified, 2));
    assert_eq!(swapped.cas.unwrap().value.to_string(), "50-29-3");
    assert_eq!(swapped.ec.unwrap().value.to_string(), "200-024-3");
}

#[test]
fn a_number_in_the_wrong_column_that_contradicts_its_own_identifies_nothing() {
    let agreeing = row("200-024-3", "200-024-3", "").unwrap();
    assert_eq!((agreeing.identity, agreeing.faults.len()), (Identity::Identified, 1));
    let differing = row("203-441-9", "200-024-3", "").unwrap();
    assert_eq!((differing.identity, differing.ec.is_none()), (Identity::NotIdentified, true));
    assert!(faults(&differing)[1].contains("is another EC number than `200-024-3` in Sheet!C2"));
    assert_eq!(row("50-29-3", "108-95-2", "").unwrap().identity, Identity::NotIdentified);
}
