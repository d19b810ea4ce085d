//! Columns that are left aside or remarked on, because what their header says is not certain.

use kowledger::columns::{ColumnOverride, Recognised, recognise};
use kowledger::substance::{DegradationTest, Field, Property};
use kowledger::workbook::{CellContent, Row};

use crate::sheet::{columns_of, content_row, read_last, text_row, words};

/// A sheet of one column beside a CAS number.
fn sheet(header: &str, values: &[f64]) -> Vec<Row> {
    let data = values
        .iter()
        .enumerate()
        .map(|(place, value)| content_row(place + 1, &[CellContent::Empty, CellContent::Number(*value)]));
    std::iter::once(text_row(0, &["CAS", header])).chain(data).collect()
}

fn takes(recognised: &Recognised, property: Property) -> bool {
    recognised.columns.iter().any(|column| column.field == Field::Property(property))
}

const LOGARITHMS: [f64; 5] = [3.2, 4.15, 2.9, 1.8, 3.3];

#[test]
fn numbers_that_look_like_logarithms_keep_a_column_from_clearing_until_the_user_says_what_it_holds() {
    for (header, property) in [("BCF", Property::Bcf), ("Koc", Property::Koc), ("BAF", Property::Baf)] {
        let recognised = columns_of(&sheet(header, &LOGARITHMS)).unwrap();
        assert!(!takes(&recognised, property), "{header}");
        assert_eq!(
            recognised.remarks,
            [format!(
                "Sheet: column B (`{header}`) is left aside, because its numbers look like logarithms and its header \
                 does not say so; write `log {header}` as its header if they are, or say that they are none: --column \
                 '{header}={}'",
                property.id()
            )]
        );
        assert_eq!(recognised.unknown, [(1, header.to_owned())]);
    }
}

#[test]
fn a_header_with_log_or_a_word_from_the_user_settles_it() {
    assert!(takes(&columns_of(&sheet("log BCF", &LOGARITHMS)).unwrap(), Property::Bcf));
    let told = [ColumnOverride::parse("BCF=bcf").unwrap()];
    let recognised = recognise("Sheet", &sheet("BCF", &LOGARITHMS), words().unwrap(), &told).unwrap();
    assert!(takes(&recognised, Property::Bcf) && recognised.remarks.is_empty());
}

#[test]
fn a_header_with_its_unit_is_believed_and_remarked_on() {
    let recognised = columns_of(&sheet("BCF (L/kg)", &LOGARITHMS)).unwrap();
    assert!(takes(&recognised, Property::Bcf));
    assert_eq!(
        recognised.remarks,
        [
            "Sheet: column B (`BCF (L/kg)`) holds numbers that look like logarithms; they are read in L/kg, as the header \
             says; write `log BCF` as its header if they are logarithms"
        ]
    );
}

#[test]
fn only_five_numbers_with_decimals_and_none_above_eight_look_like_logarithms() {
    for (values, taken) in [
        (&[3.2, 4.1, 2.9, 1.8][..], true),
        (&[3.2, 4.1, 2.9, 1.8, 3.3], false),
        (&[3.2, 4.1, 2.9, 1.8, 8.0], false),
        (&[3.2, 4.1, 2.9, 1.8, 8.1], true),
        (&[3.2, 4.1, 2.9, 1.8, -1.0], false),
        (&[3.2, 4.1, 2.9, 1.8, 120.0], true),
        (&[3.0, 4.0, 2.0, 1.0, 8.0], true),
        (&[3.0, 4.0, 2.9, 1.8, 8.5, 3.1], true),
        (&[3.0, 4.0, 2.9, 1.8], true),
        (&[3.0, 4.0, 2.0, 1.8, 1.2, 3.1], false),
    ] {
        let recognised = columns_of(&sheet("BCF", values)).unwrap();
        assert_eq!(takes(&recognised, Property::Bcf), taken, "{values:?}");
    }
}

#[test]
fn texts_count_as_numbers_and_cells_with_their_unit_do_not() {
    let rows = |texts: &[&str]| -> Vec<Row> {
        let data = texts.iter().enumerate().map(|(place, text)| text_row(place + 1, &["", text]));
        std::iter::once(text_row(0, &["CAS", "BCF"])).chain(data).collect()
    };
    let like_logarithms = rows(&["3,2", "< 4,1", "2,9", "1,8", "3,3"]);
    assert!(!takes(&columns_of(&like_logarithms).unwrap(), Property::Bcf));
    let with_unit = rows(&["3.2 L/kg", "4.1 L/kg", "2.9 L/kg", "1.8 L/kg", "3.3 L/kg"]);
    assert!(takes(&columns_of(&with_unit).unwrap(), Property::Bcf));
}

#[test]
fn a_number_above_ten_is_no_logarithm() {
    assert!(takes(&columns_of(&sheet("log Koc", &[2.5, 10.0])).unwrap(), Property::Koc));
    // Alone, a number up to 15 would be taken by its cell; a higher one is faulted there.
    assert!(!takes(&columns_of(&sheet("log Koc", &[12.0])).unwrap(), Property::Koc));
    assert!(takes(&columns_of(&sheet("log Koc", &[480.0])).unwrap(), Property::Koc));
    let recognised = columns_of(&sheet("log Koc", &[2.5, 480.0])).unwrap();
    assert!(!takes(&recognised, Property::Koc));
    assert_eq!(
        recognised.remarks,
        [
            "Sheet: column B (`log Koc`) is left aside, because it holds 480, which is too high for a logarithm; write \
             `Koc (L/kg)` as its header if its numbers are no logarithms, or correct the number, or say that they are: \
             --column 'log Koc=koc'"
        ]
    );
}

/// The remark on one header beside a CAS number; none where there is none.
fn remark_on(header: &str) -> Result<Option<String>, String> {
    Ok(columns_of(&[text_row(0, &["CAS", header])])?.remarks.into_iter().next())
}

#[test]
fn a_header_that_leaves_something_open_is_remarked_on_with_the_way_out() {
    for (header, part) in [
        ("pKa", "does not say whether its pKa is of an acid or a base: --column 'pKa=pka-acid' or --column"),
        ("酸解離定数", "does not say whether its pKa is of an acid or a base"),
        (
            "Half-life",
            "names no compartment, so it is left aside; for soil, for example: --column 'Half-life=",
        ),
        ("Demi-vie (jours)", "names no compartment"),
        ("Halfwaardetijd meer", "says `meer`, a lake in Dutch and the sea in German, so it is left aside"),
        ("半衰期", "names no compartment"),
        ("Half-life (see note)", "names no compartment"),
        (
            "DT50 water/sediment",
            "names water and sediment together, so it is left aside; if it is one of them: --column 'DT50 \
             water/sediment=half-life-water' or --column 'DT50 water/sediment=half-life-sediment'",
        ),
        ("Demi-vie eau/sédiment", "names water and sediment together"),
        ("DT50 soil, air", "names more than one compartment"),
        ("Kow", "does not say whether it holds the logarithm; if it does: --column 'Kow=log-kow'"),
        ("Kd (L/kg)", "which is no Koc, so it is left aside"),
        ("LOEC fish (mg/L)", "which lies above the NOEC"),
        ("NOEC / LC50 fish", "names acute and long-term values together"),
        ("Primary biodegradation (%)", "which is no ready biodegradability"),
        ("Anaerobe Abbaubarkeit", "which is no ready biodegradability"),
    ] {
        let remark = remark_on(header).unwrap();
        assert!(remark.as_ref().is_some_and(|remark| remark.contains(part)), "{header}: {remark:?}");
    }
}

#[test]
fn a_header_with_one_misspelt_word_is_told_the_nearest_field() {
    for (header, field) in [
        ("log kwo", "log-kow"),
        ("Half-lfe soil", "half-life-soil"),
        ("Half-life siol", "half-life-soil"),
        ("Water solubillity", "water-solubility"),
        ("Melitng point", "melting-point"),
        ("Wasserlöslichkiet", "water-solubility"),
        ("Halbwertzeti Boden", "half-life-soil"),
        ("Schmezpunkt", "melting-point"),
        ("Dampfdurck", "vapour-pressure"),
        ("Solubillité dans l'eau", "water-solubility"),
        ("Demi-vei sol", "half-life-soil"),
        ("Fournisseru", "supplier"),
        ("Solubildad en agua", "water-solubility"),
        ("Provedor", "supplier"),
        ("Solubiltà in acqua", "water-solubility"),
        ("Fornitoer", "supplier"),
        ("Oplosbaarhied in water", "water-solubility"),
        ("Smletpunt", "melting-point"),
        ("Leverancir", "supplier"),
    ] {
        // Some are near enough to be taken at once.
        let recognised = columns_of(&[text_row(0, &["CAS", header])]).unwrap();
        let taken = recognised.columns.get(1).map(|column| column.field.id());
        // An apostrophe would end the text in quotation marks.
        let named = if header.contains('\'') { "Sheet!B:B" } else { header };
        let way_out = format!("is not recognised; if it is {field}: --column '{named}={field}'");
        let hinted = recognised.remarks.iter().any(|remark| remark.contains(&way_out));
        assert!(taken == Some(field) || hinted, "{header}: {taken:?} {:?}", recognised.remarks);
    }
}

#[test]
fn a_header_that_resembles_none_is_not_remarked_on() {
    for header in [
        "Colour",
        "Stock",
        "Lot no",
        "Price (EUR)",
        "Lagerort",
        "Couleur",
        "Ubicación",
        "Colore",
        "Kleur",
        "備考",
        "颜色",
        "Demi-vie sol",
        "Storage class",
        "Plant",
        "Note",
        "Warehouse",
        "Buyer",
        "Cost centre",
        "Date",
        "Sol",
        "Air",
        "Preis",
        "Comment on BCF",
        "P flag",
        "LD50 oral rat",
        "Purity",
        "DT90",
        "log Kaw",
        "Kom",
        "BSAF",
        "NOAEL",
        "EC20",
        "log Poa",
        "c50",
        "Last reviewed",
        "HWZ im Blut",
    ] {
        assert_eq!(remark_on(header), Ok(None), "{header}");
    }
}

#[test]
fn a_column_whose_unit_is_not_certain_is_left_aside_until_the_user_names_it() {
    for (header, unit) in [
        ("DT50 soil min", "`min`"),
        ("dt50_soil_m", "`m`"),
        ("DT50 soil (days/weeks)", "`days/weeks`"),
        ("dt50_soil_c", "`c`"),
    ] {
        let recognised = columns_of(&[text_row(0, &["CAS", header])]).unwrap();
        assert_eq!(recognised.columns.len(), 1, "{header}");
        let expected = format!(
            "Sheet: column B (`{header}`) is left aside, because {unit} may be a unit and may mean something else; write \
             the unit in brackets, such as `(d)`, or say that its numbers are in d where a cell names no unit: --column \
             '{header}=half-life-soil'"
        );
        assert_eq!(recognised.remarks, [expected], "{header}");
        assert_eq!(recognised.not_taken.get(&1), Some(&format!("left aside; {unit} may be a unit or not")));
        let told = ColumnOverride::parse(&format!("{header}=half-life-soil")).unwrap();
        let rows = [text_row(0, &["CAS", header]), text_row(1, &["50-29-3", "30"])];
        let recognised = recognise("Sheet", &rows, words().unwrap(), &[told]).unwrap();
        assert_eq!(recognised.columns.get(1).map(|column| column.unit), Some(None), "{header}");
    }
}

#[test]
fn a_column_whose_header_has_an_apostrophe_is_named_by_its_letter() {
    let header = "Demi-vie dans l'eau et le sol";
    let recognised = columns_of(&[text_row(0, &["CAS", header])]).unwrap();
    let remark = recognised.remarks.first().unwrap();
    assert!(remark.ends_with(": --column 'Sheet!B:B=half-life-soil'"), "{remark}");
    assert!(
        ColumnOverride::parse("Sheet!B:B=half-life-soil").is_ok_and(|told| recognised.has_column_of(&told))
    );
}

#[test]
fn a_header_of_a_limit_a_count_or_former_values_is_told_with_the_way_out() {
    for header in ["BCF > 2000", "BCF limit", "BCF n", "BCF old", "BCF class", "Δ BCF"] {
        let remark = remark_on(header).unwrap();
        let expected = format!(
            "Sheet: column B (`{header}`) speaks of a limit, a class, a count, a difference or former values, so it is left \
             aside; if it holds values of bcf: --column '{header}=bcf'"
        );
        assert_eq!(remark, Some(expected));
    }
}

#[test]
fn a_unit_that_is_not_understood_is_told_with_the_way_out() {
    for (header, unit) in [
        ("NOEC (?g/L)", "`?g/L`"),
        ("NOEC (10^-3 mg/L)", "`10^-3 mg/L`"),
        ("NOEC (mg/kg dw)", "`mg/kg dw`"),
        ("BCF (x1000)", "`x1000`"),
        ("DT50 soil (log d)", "`log d`"),
        ("log DT50 soil", "`log`"),
        ("Half life soil 1/d", "`1/d`"),
        ("BCF (L/kg lipid)", "lipid"),
    ] {
        let remark = remark_on(header).unwrap();
        let is_told = |remark: &String| {
            remark.contains("left aside") && remark.contains(unit) && remark.contains("--column '")
        };
        assert!(remark.as_ref().is_some_and(is_told), "{header}: {remark:?}");
    }
}

#[test]
fn below_a_header_of_biodegradability_in_general_only_a_cell_that_says_ready_counts_as_ready() {
    use DegradationTest::{NotReady, Open, Ready};
    let result = |header: &str, cell: &str| {
        let substance = read_last(&[&["CAS", header], &["108-88-3", cell]]).unwrap();
        substance.ready.first().map(|cited| cited.value.result)
    };
    for header in [
        "Biodegradability",
        "Biodegradable",
        "Biodegradability (%)",
        "Biologische Abbaubarkeit",
        "Biodégradabilité",
        "Biodegradabilidad",
        "Biodegradabilità",
        "Biologische afbreekbaarheid",
        "生分解性",
        "降解性",
    ] {
        for (cell, expected) in [
            ("yes", Open),
            ("95 % (28 d)", Open),
            ("95", Open),
            ("readily biodegradable", Ready),
            ("92 %, 28 d, OECD 301B", Ready),
            ("no", NotReady),
            ("5 % (28 d)", NotReady),
        ] {
            assert_eq!(result(header, cell), Some(expected), "{header}: {cell}");
        }
        let remark = remark_on(header).unwrap();
        let way_out = format!("--column '{header}=ready-biodegradability'");
        assert!(remark.is_some_and(|remark| remark.ends_with(&way_out)), "{header}");
    }
    for header in
        ["Ready biodegradability", "Biodegradability (OECD 301)", "leicht biologisch abbaubar", "良分解性"]
    {
        assert_eq!((result(header, "yes"), remark_on(header)), (Some(Ready), Ok(None)), "{header}");
    }
}

#[test]
fn several_readings_of_a_property_are_all_read_and_its_method_is_none() {
    let fields = |rows: &[Row]| -> Vec<String> {
        let recognised = columns_of(rows).unwrap();
        recognised.columns.iter().map(|column| format!("{} {}", column.index, column.field.id())).collect()
    };
    for (first, second) in
        [("min", "max"), ("von", "bis"), ("lowest", "highest"), ("study 1", "study 2"), ("最小", "最大")]
    {
        let rows = [
            text_row(0, &["CAS", "BCF", ""]),
            text_row(1, &["", first, second]),
            text_row(2, &["108-88-3", "13", "90"]),
        ];
        assert_eq!(fields(&rows), ["0 cas-number", "1 bcf", "2 bcf"], "{first} {second}");
    }
    for method in ["metodo", "method", "Methode", "方法"] {
        let rows = [
            text_row(0, &["CAS", "BCF", ""]),
            text_row(1, &["", "value", method]),
            text_row(2, &["108-88-3", "13", "OECD 305"]),
        ];
        assert!(!fields(&rows).contains(&"2 bcf".to_owned()), "{method}");
    }
    let rows = [
        text_row(0, &["CAS", "log Kow", ""]),
        text_row(1, &["", "value", "fonte"]),
        text_row(2, &["108-88-3", "2.7", "Rossi 1998"]),
    ];
    assert!(!fields(&rows).contains(&"2 log-kow".to_owned()));
}
