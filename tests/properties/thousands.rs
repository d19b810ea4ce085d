//! Separators before exactly three digits: read where a cell shows what they are or one reading alone makes sense.

#![expect(clippy::expect_used, reason = "a helper that cannot go on stops the test that asks for it")]

use kowledger::fault::CellFaultKind;
use kowledger::substance::Property;

use crate::sheet::read_last;

/// What the last of several BCF, log Kow or other cells is read as; the fault where it is none.
fn last_of(header: &str, cells: &[&str]) -> Result<Option<f64>, CellFaultKind> {
    let header_row = ["CAS", header];
    let rows: Vec<[&str; 2]> = cells.iter().map(|cell| ["50-29-3", *cell]).collect();
    let rows: Vec<&[&str]> =
        std::iter::once(header_row.as_slice()).chain(rows.iter().map(<[&str; 2]>::as_slice)).collect();
    let substance = read_last(&rows).expect("a sheet that is recognised");
    match substance.faults.into_iter().next() {
        Some(fault) => Err(fault.kind),
        None => {
            Ok(substance.readings.values().flatten().next().and_then(|reading| reading.quantity.single()))
        }
    }
}

fn doubtful(with_decimals: &str, with_thousands: &str) -> Result<Option<f64>, CellFaultKind> {
    Err(CellFaultKind::ThousandsOrDecimals {
        with_decimals: with_decimals.to_owned(),
        with_thousands: with_thousands.to_owned(),
    })
}

#[test]
fn what_makes_sense_both_ways_is_not_read_where_no_cell_shows_which() {
    for (header, cells, expected) in [
        ("BCF", vec!["1.300", "4.800", "2.500"], doubtful("2.5", "2500")),
        ("BCF", vec!["1,500"], doubtful("1.5", "1500")),
        ("BCF", vec!["> 2.500 L/kg"], doubtful("2.5", "2500")),
        ("BCF", vec!["300-1.500"], doubtful("1.5", "1500")),
        ("NOEC (mg/L)", vec!["1.250"], doubtful("1.25", "1250")),
        ("Half-life in soil (d)", vec!["1,250"], doubtful("1.25", "1250")),
    ] {
        assert_eq!(last_of(header, &cells), expected, "{header} {cells:?}");
    }
}

#[test]
fn it_is_read_where_another_cell_shows_which_or_one_reading_alone_makes_sense() {
    for (header, cells, expected) in [
        ("BCF", vec!["12,5", "2.500"], 2500.0),
        ("BCF", vec!["12.5", "2.500"], 2.5),
        ("BCF", vec!["12.5", "2,500"], 2500.0),
        ("BCF", vec!["0.500"], 0.5),
        ("BCF", vec!["2500.0"], 2500.0),
        ("BCF", vec!["1.500E3"], 1500.0),
        ("BCF", vec!["1,500E3"], 1500.0),
        ("log BCF", vec!["3.625"], 3.625),
        ("log Kow", vec!["5.625"], 5.625),
        ("log Kow", vec!["5,625"], 5.625),
        ("Molar mass (g/mol)", vec!["228.291"], 228.291),
    ] {
        let read = last_of(header, &cells).unwrap().unwrap();
        let read = if header == "log BCF" { read.log10() } else { read };
        assert!((read - expected).abs() < 1e-9, "{header} {cells:?}: {read}");
    }
}

#[test]
fn a_number_that_the_file_stores_as_one_is_in_no_doubt() {
    use crate::sheet::read_cells;
    use kowledger::workbook::CellContent;
    let cells = [CellContent::Text("50-29-3".to_owned()), CellContent::Number(1.234)];
    let substance = read_cells(&["CAS", "BCF"], &cells).unwrap();
    assert!(substance.faults.is_empty());
    assert_eq!(substance.readings[&Property::Bcf][0].quantity.single(), Some(1.234));
}
