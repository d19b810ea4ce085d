//! Which substance a row means, and how sure that is.

mod cells;
mod dates;
mod numbers;
mod structure;
mod words;

use std::fmt::Display;

use super::cell;
use crate::fault::{CellFault, CellFaultKind};
use crate::quantity::{is_missing, tidy};
use crate::substance::{CasNumber, Cited, EcNumber, Field, Identity, RowType, Substance, SubstanceType};
use crate::workbook::{CellContent, CellRef};
use cells::{CasCell, EcCell, Written, read_cas, read_ec};

/// How the identity cells of a row were read.
#[derive(Debug, Clone, PartialEq, Default)]
pub(super) struct IdentityCells {
    /// How the CAS number of the row stood in its cell.
    cas: Option<Written>,
    /// How the EC number of the row stood in its cell.
    ec: Option<Written>,
    several: Several,
    /// The CAS column and the EC column, where two cells of the row disagree.
    contradicted: Vec<Field>,
    /// A CAS number that stands in an EC column.
    misplaced_cas: Option<Cited<CasNumber>>,
    /// An EC number that stands in a CAS column.
    misplaced_ec: Option<Cited<EcNumber>>,
}

/// Whether the row speaks of more than one substance.
#[derive(Debug, Clone, Copy, PartialEq, Eq, Default)]
enum Several {
    #[default]
    No,
    /// A cell holds several numbers or says that they are several, or two cells disagree.
    Yes,
}

impl IdentityCells {
    /// Takes a cell of a CAS column.
    pub(super) fn take_cas(
        &mut self,
        substance: &mut Substance,
        content: &CellContent,
        cell: CellRef,
    ) -> Result<(), CellFaultKind> {
        let (value, how) = match read_cas(content).inspect_err(|fault| self.note_several(fault))? {
            CasCell::Missing => return Ok(()),
            CasCell::Mixture => {
                self.several = Several::Yes;
                return Ok(());
            }
            CasCell::Number(number, how) => (number, how),
            CasCell::Misplaced(value) => {
                self.misplaced_ec.get_or_insert(Cited { value, cell });
                return Err(CellFaultKind::NumberOfOtherKind { what: CAS_NUMBER, found: EC_NUMBER });
            }
        };
        if let Some(other) = substance.cas.as_ref().filter(|other| other.value != value) {
            return Err(self.contradiction(Field::CasNumber, CAS_NUMBER, other));
        }
        // A number as written confirms one from a date.
        self.cas = Some(self.cas.map_or(how, |before| before.min(how)));
        substance.cas.get_or_insert(Cited { value, cell });
        Ok(())
    }

    /// Takes a cell of an EC column.
    pub(super) fn take_ec(
        &mut self,
        substance: &mut Substance,
        content: &CellContent,
        cell: CellRef,
    ) -> Result<(), CellFaultKind> {
        let (value, how) = match read_ec(content).inspect_err(|fault| self.note_several(fault))? {
            EcCell::Missing => return Ok(()),
            EcCell::Mixture => {
                self.several = Several::Yes;
                return Ok(());
            }
            EcCell::Number(number, how) => (number, how),
            EcCell::Misplaced(value) => {
                self.misplaced_cas.get_or_insert(Cited { value, cell });
                return Err(CellFaultKind::NumberOfOtherKind { what: EC_NUMBER, found: CAS_NUMBER });
            }
        };
        if let Some(other) = substance.ec.as_ref().filter(|other| other.value != value) {
            return Err(self.contradiction(Field::EcNumber, EC_NUMBER, other));
        }
        self.ec = Some(self.ec.map_or(how, |before| before.min(how)));
        substance.ec.get_or_insert(Cited { value, cell });
        Ok(())
    }

    /// Takes a cell of a SMILES column.
    pub(super) fn take_smiles(
        &mut self,
        substance: &mut Substance,
        content: &CellContent,
        cell: CellRef,
    ) -> Result<(), CellFaultKind> {
        let smiles = structure::read_smiles(content).inspect_err(|fault| self.note_several(fault))?;
        if let Some(value) = smiles {
            substance.smiles = Some(Cited { value, cell });
        }
        Ok(())
    }

    /// Takes a cell of a column of InChI keys.
    pub(super) fn take_inchi_key(
        &mut self,
        substance: &mut Substance,
        content: &CellContent,
        cell: CellRef,
    ) -> Result<(), CellFaultKind> {
        let key = structure::read_inchi_key(content).inspect_err(|fault| self.note_several(fault))?;
        if let Some(value) = key {
            substance.inchi_key = Some(Cited { value, cell });
        }
        Ok(())
    }

    fn note_several(&mut self, fault: &CellFaultKind) {
        if matches!(fault, CellFaultKind::SeveralIdentities { .. } | CellFaultKind::MixtureRow) {
            self.several = Several::Yes;
        }
    }

    fn contradiction<T: Display>(
        &mut self,
        field: Field,
        what: &'static str,
        other: &Cited<T>,
    ) -> CellFaultKind {
        self.several = Several::Yes;
        self.contradicted.push(field);
        let (number, other) = (other.value.to_string(), other.cell.clone());
        CellFaultKind::OtherIdentity { what, number, other }
    }

    /// Sets how sure the identity of the row is.
    pub(super) fn conclude(mut self, substance: &mut Substance) {
        self.place_misplaced(substance);
        if self.contradicted.contains(&Field::CasNumber) {
            substance.cas = None;
        }
        if self.contradicted.contains(&Field::EcNumber) {
            substance.ec = None;
        }
        let is_mixture = match substance.row_type {
            RowType::Mixture | RowType::Article => true,
            RowType::Substance => false,
            RowType::NotStated => {
                let stated = substance.substance_type.as_ref().map(|cited| cited.value);
                stated == Some(SubstanceType::Mixture)
                    || substance.further_types.contains(&SubstanceType::Mixture)
            }
        };
        substance.identity = match self.several {
            Several::Yes => Identity::NotIdentified,
            Several::No if is_mixture => Identity::NotIdentified,
            Several::No => self.by_identifiers(substance),
        };
    }

    /// A number that was mended may be another one: a date or digits without hyphens pass a check digit by chance in
    /// one case of ten. Two such numbers, or one beside a number in full or a structure, agree.
    fn by_identifiers(&self, substance: &Substance) -> Identity {
        let has_structure = substance.smiles.is_some() || substance.inchi_key.is_some();
        match (self.cas, self.ec) {
            (_, _) if has_structure => Identity::Identified,
            (Some(Written::InFull), _) | (_, Some(Written::InFull)) | (Some(_), Some(_)) => {
                Identity::Identified
            }
            (Some(Written::AsDate), None) | (None, Some(Written::AsDate)) => Identity::RepairedDate,
            (Some(Written::Bare), None) | (None, Some(Written::Bare)) => Identity::BareNumber,
            (None, None) => Identity::NameAlone,
        }
    }

    /// A number in the other number's column names the row where nothing else does, and must not contradict one in
    /// its own column.
    fn place_misplaced(&mut self, substance: &mut Substance) {
        let (cas, ec) = (self.misplaced_cas.take(), self.misplaced_ec.take());
        if let Some((own, found)) = substance.cas.as_ref().zip(cas.as_ref())
            && own.value != found.value
        {
            let kind = self.contradiction(Field::CasNumber, CAS_NUMBER, own);
            substance.faults.push(fault_at(found, kind));
        }
        if let Some((own, found)) = substance.ec.as_ref().zip(ec.as_ref())
            && own.value != found.value
        {
            let kind = self.contradiction(Field::EcNumber, EC_NUMBER, own);
            substance.faults.push(fault_at(found, kind));
        }
        let named = substance.cas.is_some()
            || substance.ec.is_some()
            || substance.smiles.is_some()
            || substance.inchi_key.is_some();
        if !named {
            self.cas = cas.as_ref().map(|_| Written::InFull);
            self.ec = ec.as_ref().map(|_| Written::InFull);
            substance.cas = cas;
            substance.ec = ec;
        }
    }
}

const CAS_NUMBER: &str = "CAS number";
const EC_NUMBER: &str = "EC number";

fn fault_at<T: Display>(found: &Cited<T>, kind: CellFaultKind) -> CellFault {
    CellFault { cell: found.cell.clone(), found: found.value.to_string(), kind }
}

/// A name or formula as written. `Na`, `Nb` and `Nd` are elements and no words for missing.
pub(super) fn read_name(content: &CellContent) -> Option<String> {
    let text = cell::text_of(content)?;
    let is_element = matches!(text.as_str(), "Na" | "Nb" | "Nd");
    (is_element || !is_missing(&tidy(&text))).then_some(text)
}
