//! The typed record of one row, and one parser for each kind of cell.
//!
//! Everything a row says about its substance stands here with the cell it came from. It holds no estimate and judges
//! nothing.

mod cas;
mod degradability;
mod ec;
mod field;
mod hazard;
mod kind;
mod parse;
mod property;

use std::collections::{BTreeMap, BTreeSet};
use std::sync::Arc;

pub use cas::{CasError, CasNumber};
pub use degradability::{DegradationTest, InherentBiodegradability, ReadyBiodegradability};
pub use ec::{EcError, EcNumber};
pub use field::Field;
pub use hazard::{Completeness, HazardStatements};
pub use kind::{RowType, SubstanceType};
pub use parse::{RowReader, UnstatedBasis};
pub(crate) use parse::{Said, names_ready_test};
pub use property::{Compartment, Property};

use crate::fault::CellFault;
use crate::quantity::Quantity;
use crate::workbook::CellRef;

/// A value with the cell it was read from.
#[derive(Debug, Clone, PartialEq)]
pub struct Cited<T> {
    /// The value.
    pub value: T,
    /// Where it stands.
    pub cell: CellRef,
}

/// How a value is known. Smaller ranks higher.
#[derive(Debug, Clone, Copy, PartialEq, Eq, PartialOrd, Ord, Hash)]
pub enum Basis {
    /// Said to be measured: measured, experimental, a test guideline, a study.
    Measured,
    /// A value with no word on how.
    Unstated,
    /// Said to be calculated or predicted.
    Calculated,
    /// Estimated by kowledger.
    Estimated,
}

impl Basis {
    /// Every basis, in order of rank.
    pub const ALL: [Self; 4] = [Self::Measured, Self::Unstated, Self::Calculated, Self::Estimated];

    /// The word in rule files and in the output.
    pub fn word(self) -> &'static str {
        match self {
            Self::Measured => "measured",
            Self::Unstated => "unstated",
            Self::Calculated => "calculated",
            Self::Estimated => "estimated",
        }
    }
}

/// Whether a half-life is of complete degradation.
#[derive(Debug, Clone, Copy, PartialEq, Eq, PartialOrd, Ord, Hash, Default)]
pub enum DegradationKind {
    /// Not said.
    #[default]
    NotStated,
    /// Ultimate degradation, mineralisation.
    Ultimate,
    /// Primary degradation: only the parent substance disappears.
    Primary,
}

/// What was said about how a value was obtained.
#[derive(Debug, Clone, PartialEq, Default)]
pub struct Conditions {
    /// Test temperature, °C.
    pub temperature: Option<f64>,
    /// pH of the test.
    pub ph: Option<f64>,
    /// Lipid content of the fish, % of wet weight.
    pub lipid: Option<f64>,
    /// Test guideline or method, as written.
    pub method: Option<String>,
    /// Test organism, as written.
    pub organism: Option<String>,
    /// Reliability score, 1 to 4.
    pub reliability: Option<u8>,
    /// Kind of degradation, for half-lives.
    pub degradation: DegradationKind,
    /// Year of the study or its publication.
    pub year: Option<u16>,
    /// A doubt about the value, as written: `?`, `unsicher`.
    pub doubt: Option<String>,
}

/// A numeric value of the row.
#[derive(Debug, Clone, PartialEq)]
pub struct Reading {
    /// The value.
    pub quantity: Quantity,
    /// How it is said to be known.
    pub basis: Basis,
    /// Under which conditions.
    pub conditions: Conditions,
    /// Where it stands.
    pub cell: CellRef,
}

/// How sure it is which substance the row means.
#[derive(Debug, Clone, Copy, PartialEq, Eq, PartialOrd, Ord, Hash)]
pub enum Identity {
    /// By a CAS or EC number with a right check digit, or by a structure.
    Identified,
    /// By a CAS number that a spreadsheet had turned into a date and nothing else.
    RepairedDate,
    /// By its name or the user's own number alone.
    NameAlone,
    /// Several substances in one cell, or a mixture or article row.
    NotIdentified,
    /// By a CAS or EC number that had lost its hyphens and nothing else.
    BareNumber,
}

/// Decades of pH from its pKa at which a tenth of a group is left in the other form: log10(9).
const NINE_TO_ONE: f64 = 0.954_242_509_439_324_9;
/// The environment's pH, lowest and highest, as rulebooks on mobility take it.
const ENVIRONMENTAL_PH: (f64, f64) = (4.0, 9.0);

/// One row of an inventory, as far as it could be read.
#[derive(Debug, Clone, PartialEq)]
pub struct Substance {
    /// The sheet it stands on.
    pub sheet: Arc<str>,
    /// Its row, counted from 0.
    pub row: u32,
    /// Substance, mixture or article.
    pub row_type: RowType,
    /// The user's own number.
    pub row_id: Option<Cited<String>>,
    /// Its name.
    pub name: Option<Cited<String>>,
    /// Its CAS number.
    pub cas: Option<Cited<CasNumber>>,
    /// Its EC number.
    pub ec: Option<Cited<EcNumber>>,
    /// Its SMILES, as written.
    pub smiles: Option<Cited<String>>,
    /// Its InChI key, as written.
    pub inchi_key: Option<Cited<String>>,
    /// Its formula, as written.
    pub formula: Option<Cited<String>>,
    /// Its type.
    pub substance_type: Option<Cited<SubstanceType>>,
    /// Further types that the same cell names.
    pub further_types: BTreeSet<SubstanceType>,
    /// How sure its identity is.
    pub identity: Identity,
    /// Its numeric values by property, in order of column.
    pub readings: BTreeMap<Property, Vec<Reading>>,
    /// What is said of ready biodegradability.
    pub ready: Vec<Cited<ReadyBiodegradability>>,
    /// What is said of inherent biodegradability.
    pub inherent: Vec<Cited<InherentBiodegradability>>,
    /// Its hazard statements; `Some` as soon as the cell is filled.
    pub hazard_statements: Option<Cited<HazardStatements>>,
    /// Tonnes per year.
    pub tonnage: Option<Reading>,
    /// Content in the product, % w/w.
    pub content: Option<Reading>,
    /// Texts that are carried along: product, supplier, use, assessor's cells and the like.
    pub texts: BTreeMap<Field, Cited<String>>,
    /// What could not be read.
    pub faults: Vec<CellFault>,
}

impl Substance {
    /// A row of which nothing is known yet.
    pub fn unknown(sheet: Arc<str>, row: u32) -> Self {
        Self {
            sheet,
            row,
            row_type: RowType::NotStated,
            row_id: None,
            name: None,
            cas: None,
            ec: None,
            smiles: None,
            inchi_key: None,
            formula: None,
            substance_type: None,
            further_types: BTreeSet::new(),
            identity: Identity::NameAlone,
            readings: BTreeMap::new(),
            ready: Vec::new(),
            inherent: Vec::new(),
            hazard_statements: None,
            tonnage: None,
            content: None,
            texts: BTreeMap::new(),
            faults: Vec::new(),
        }
    }

    /// The pKa of the row that puts at least a tenth of the substance into its ionised form somewhere from pH 4 to 9.
    pub fn ionising_pka(&self) -> Option<(Property, &Reading)> {
        let acid = self.readings_of(Property::PkaAcid).iter().find(|reading| {
            let low = reading.quantity.interval.low().number();
            low.is_none_or(|low| low < ENVIRONMENTAL_PH.1 + NINE_TO_ONE)
        });
        let base = self.readings_of(Property::PkaBase).iter().find(|reading| {
            let high = reading.quantity.interval.high().number();
            high.is_none_or(|high| high > ENVIRONMENTAL_PH.0 - NINE_TO_ONE)
        });
        let acid = acid.map(|reading| (Property::PkaAcid, reading));
        acid.or_else(|| base.map(|reading| (Property::PkaBase, reading)))
    }

    /// The values of a property, in order of column.
    pub fn readings_of(&self, property: Property) -> &[Reading] {
        self.readings.get(&property).map_or(&[], Vec::as_slice)
    }
}
