//! What the example workbook's sheets hold and how wide, in which order and under which header.
//! Not the values: those stand in the table.

/// What a column's cells hold.
#[derive(Clone, Copy)]
pub enum Holds {
    /// Text; `\n` in the table is a line break.
    Words,
    /// CAS or EC numbers: as text, as a number without hyphens, and as the day that a spreadsheet made of one.
    RegistryNumbers,
    /// Numbers in this number format, and the texts that are no plain number.
    Numbers(&'static str),
    /// Kilograms, worked out from the table's tonnes, in this number format.
    Kilograms(&'static str),
    /// Tonnes as a formula over the kilograms in the column to the left, in this number format.
    TonnesOfKilograms(&'static str),
    /// Days.
    Dates,
}

/// One column of a sheet.
pub struct Column {
    /// The heading of the table's column.
    pub field: &'static str,
    /// The header in the workbook.
    pub header: &'static str,
    /// What stands below the header, where the sheet has a row of units.
    pub unit: &'static str,
    /// Width in characters.
    pub width: u32,
    /// What its cells hold.
    pub holds: Holds,
    /// Fill of its cells, as RGB.
    pub fill: Option<u32>,
    /// Whether a user sees it.
    pub visibility: Visibility,
}

/// Whether a user sees a column.
#[derive(Clone, Copy, PartialEq, Eq)]
pub enum Visibility {
    /// As usual.
    Shown,
    /// Folded away.
    Hidden,
}

/// Where the units of a sheet stand.
#[derive(Clone, Copy, PartialEq, Eq)]
pub enum Units {
    /// In the headers.
    InHeaders,
    /// In a second row below the headers.
    RowBelow,
}

/// Where a heading between groups of rows stands.
#[derive(Clone, Copy, PartialEq, Eq)]
pub enum Heading {
    /// In the column of names.
    AmongNames,
    /// Across the first columns, whose cells are merged.
    Across(u16),
}

/// One inventory sheet.
pub struct Layout {
    /// Name of the sheet.
    pub sheet: &'static str,
    /// The lines above the header.
    pub titles: &'static [&'static str],
    /// How days are shown.
    pub date_format: &'static str,
    /// Where the units stand.
    pub units: Units,
    /// Where the headings between groups stand.
    pub heading: Heading,
    /// The columns from the left.
    pub columns: &'static [Column],
}

impl Column {
    const fn plain(field: &'static str, header: &'static str, width: u32, holds: Holds) -> Self {
        Self { field, header, unit: "", width, holds, fill: None, visibility: Visibility::Shown }
    }

    const fn in_unit(
        field: &'static str,
        (header, unit): (&'static str, &'static str),
        width: u32,
        holds: Holds,
    ) -> Self {
        Self { field, header, unit, width, holds, fill: None, visibility: Visibility::Shown }
    }

    const fn filled(field: &'static str, header: &'static str, width: u32, holds: Holds) -> Self {
        Self { field, header, unit: "", width, holds, fill: Some(0xFF_F2CC), visibility: Visibility::Shown }
    }

    const fn hidden(field: &'static str, header: &'static str, width: u32, holds: Holds) -> Self {
        Self { field, header, unit: "", width, holds, fill: None, visibility: Visibility::Hidden }
    }
}

/// The sheets that hold an inventory.
pub const LAYOUTS: [Layout; 2] = [
    Layout {
        sheet: "Substances",
        titles: &[
            "Grenwick & Aldermoor Surface Technologies: raw material inventory, site North",
            "Export of 30 November 2026. Empty cells: no data on file. Supplier column maintained by purchasing.",
        ],
        date_format: "dd mmm yyyy",
        units: Units::InHeaders,
        heading: Heading::AmongNames,
        columns: &SUBSTANCES,
    },
    Layout {
        sheet: "Rohstoffe",
        titles: &["Grenwick & Aldermoor Surface Technologies: Rohstoffliste Werk Süd, Stand 30.11.2026"],
        date_format: "dd.mm.yyyy",
        units: Units::RowBelow,
        heading: Heading::Across(4),
        columns: &ROHSTOFFE,
    },
];

const SUBSTANCES: [Column; 32] = [
    Column::plain("row-id", "Material no.", 11, Holds::Words),
    Column::plain("cas-number", "CAS No.", 22, Holds::RegistryNumbers),
    Column::plain("ec-number", "EC No.", 13, Holds::RegistryNumbers),
    Column::plain("name", "Substance name", 60, Holds::Words),
    Column::plain("substance-type", "Substance type", 16, Holds::Words),
    Column::plain("log-kow", "log Kow", 25, Holds::Numbers("0.00")),
    Column::plain("log-kow-method", "log Kow method", 17, Holds::Words),
    Column::plain("water-solubility", "Water solubility (mg/L)", 14, Holds::Numbers("General")),
    Column::plain("melting-point", "Melting point (°C)", 11, Holds::Numbers("0.0")),
    Column::plain("vapour-pressure", "Vapour pressure (Pa)", 11, Holds::Numbers("General")),
    Column::plain("log-koc", "log Koc", 16, Holds::Numbers("0.00")),
    Column::plain("log-koa", "log Koa", 9, Holds::Numbers("0.00")),
    Column::plain("bcf", "BCF fish, measured (L/kg)", 12, Holds::Numbers("General")),
    Column::plain("bcf-lipid", "BCF lipid content (%)", 10, Holds::Numbers("0.0")),
    Column::plain("half-life-water", "Half-life water (d)", 12, Holds::Numbers("General")),
    Column::plain("half-life-sediment", "Half-life sediment (d)", 22, Holds::Numbers("General")),
    Column::plain("half-life-soil", "Half-life soil (d)", 12, Holds::Numbers("General")),
    Column::plain("half-life-air", "Half-life air (d)", 12, Holds::Numbers("General")),
    Column::plain("half-life-hydrolysis", "Hydrolysis half-life (d)", 12, Holds::Numbers("General")),
    Column::plain("half-life-temperature", "Half-life test temperature (°C)", 13, Holds::Numbers("General")),
    Column::plain("ready-biodegradability", "Ready biodegradability", 40, Holds::Words),
    Column::plain("long-term-toxicity", "Long-term NOEC/EC10 aquatic (mg/L)", 15, Holds::Numbers("General")),
    Column::plain("acute-toxicity", "Acute LC50/EC50 aquatic (mg/L)", 15, Holds::Numbers("General")),
    Column::plain("hazard-statements", "Hazard statements", 44, Holds::Words),
    Column::plain("product", "Product", 24, Holds::Words),
    Column::filled("supplier", "Supplier", 26, Holds::Words),
    Column::plain("content", "Content (% w/w)", 10, Holds::Numbers("0.0#")),
    Column::hidden("tonnes-per-year", "Purchased (kg)", 12, Holds::Kilograms("#,##0.##")),
    Column::plain("tonnes-per-year", "Tonnes per year", 11, Holds::TonnesOfKilograms("#,##0.0##")),
    Column::plain("use", "Use", 34, Holds::Words),
    Column::plain("reference", "Reference", 60, Holds::Words),
    Column::plain("last-reviewed", "Last reviewed", 13, Holds::Dates),
];

const ROHSTOFFE: [Column; 30] = [
    Column::plain("row-id", "Artikelnr.", 11, Holds::Words),
    Column::plain("cas-number", "CAS-Nr.", 22, Holds::RegistryNumbers),
    Column::plain("ec-number", "EG-Nummer", 13, Holds::RegistryNumbers),
    Column::plain("name", "Bezeichnung", 60, Holds::Words),
    Column::plain("substance-type", "Stoffart", 17, Holds::Words),
    Column::in_unit("log-kow", ("log Pow", "-"), 25, Holds::Numbers("0.00")),
    Column::plain("log-kow-method", "Methode log Pow", 15, Holds::Words),
    Column::in_unit("water-solubility", ("Wasserlöslichkeit", "mg/l"), 18, Holds::Numbers("General")),
    Column::in_unit("melting-point", ("Schmelzpunkt", "°C"), 13, Holds::Numbers("0.0")),
    Column::in_unit("vapour-pressure", ("Dampfdruck", "Pa"), 12, Holds::Numbers("General")),
    Column::in_unit("koc", ("Koc", "l/kg"), 10, Holds::Numbers("General")),
    Column::in_unit("log-koa", ("log Koa", "-"), 9, Holds::Numbers("0.00")),
    Column::in_unit("bcf", ("BCF Fisch", "l/kg"), 12, Holds::Numbers("General")),
    Column::in_unit("bcf-lipid", ("BCF Lipidgehalt", "%"), 12, Holds::Numbers("0.0")),
    Column::in_unit("half-life-water", ("Halbwertszeit Wasser", "d"), 14, Holds::Numbers("General")),
    Column::in_unit(
        "half-life-marine-water",
        ("Halbwertszeit Meerwasser", "d"),
        18,
        Holds::Numbers("General"),
    ),
    Column::in_unit("half-life-sediment", ("Halbwertszeit Sediment", "d"), 22, Holds::Numbers("General")),
    Column::in_unit("half-life-soil", ("Halbwertszeit Boden", "[d]"), 14, Holds::Numbers("General")),
    Column::in_unit(
        "half-life-temperature",
        ("Prüftemperatur Halbwertszeit", "°C"),
        14,
        Holds::Numbers("General"),
    ),
    Column::plain("ready-biodegradability", "leicht biologisch abbaubar", 23, Holds::Words),
    Column::in_unit(
        "long-term-toxicity",
        ("NOEC/EC10 chronisch aquatisch", "mg/l"),
        16,
        Holds::Numbers("General"),
    ),
    Column::in_unit("acute-toxicity", ("LC50/EC50 akut aquatisch", "mg/l"), 15, Holds::Numbers("General")),
    Column::plain("hazard-statements", "Gefahrenhinweise", 44, Holds::Words),
    Column::plain("product", "Produkt", 24, Holds::Words),
    Column::filled("supplier", "Lieferant", 26, Holds::Words),
    Column::in_unit("content", ("Gehalt", "%"), 10, Holds::Numbers("0.0#")),
    Column::in_unit("tonnes-per-year", ("Menge", "t/a"), 11, Holds::Numbers("#,##0.0##")),
    Column::plain("use", "Verwendung", 34, Holds::Words),
    Column::plain("reference", "Quelle", 60, Holds::Words),
    Column::plain("last-reviewed", "zuletzt geprüft", 14, Holds::Dates),
];

/// The lines of the sheet that is no inventory.
pub const NOTES: [&str; 8] = [
    "About this workbook",
    "Grenwick & Aldermoor Surface Technologies, its sites, products and suppliers, and every material number, content, tonnage, \
     use and review date are invented. Any likeness to a real firm is chance.",
    "The substances are real. Their property values are taken from published sources or recalled from the published \
     literature; the reference column says which, and says so where a value is from memory.",
    "Hazard statements follow the harmonised classification as remembered, without the labelling details; check the legal \
     text before use.",
    "Cells are untidy or wrong on purpose, to show how they are read and how faults are reported: numbers with a wrong \
     check digit or without hyphens, numbers that became days, two numbers in one cell, units that change within a \
     column, an unknown unit, two values in a cell, unreadable values, headings and a total among the rows.",
    "Empty cells are not zeros. Most inventories hold few data, and so does this one.",
    "This is an example, not reference data: do not classify, assess or buy by it.",
    "Half-lives given as ranges from a handbook are judgements over several studies, not single tests.",
];
