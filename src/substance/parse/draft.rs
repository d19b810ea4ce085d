//! A row while its cells are read: values wait until the columns that speak of them are known.

use std::sync::Arc;

use super::cell::{self, Expected};
use super::companions::{self, Companions};
use super::doubt::doubt_in;
use super::identity::{self, IdentityCells};
use super::remark::{self, Said};
use super::{UnstatedBasis, degradability, inherent, kinds, statements};
use crate::columns::Column;
use crate::fault::{CellFault, CellFaultKind};
use crate::quantity::Quantity;
use crate::substance::{
    Basis, Cited, Compartment, Completeness, Conditions, Field, HazardStatements, Property, Reading, RowType,
    Substance,
};
use crate::workbook::{Cell, CellContent, CellRef};

/// A value whose basis and conditions still wait for the columns that speak of it.
struct Waiting<T> {
    value: T,
    said: Said,
    header: Said,
    cell: CellRef,
}

enum AnyValue {
    Property(Property, Waiting<Quantity>),
    Tonnage(Waiting<Quantity>),
    Content(Waiting<Quantity>),
    Ready(Waiting<degradability::ReadyCell>),
    Inherent(Waiting<inherent::InherentCell>),
}

impl AnyValue {
    /// Whether it is a logarithm of exactly zero that is not said to be measured.
    fn is_zero_logarithm(&self) -> bool {
        match self {
            Self::Property(Property::LogKow | Property::LogD | Property::LogKoa, waiting) => {
                let is_zero = waiting.value.single().is_some_and(|number| number.abs() < f64::MIN_POSITIVE);
                is_zero && waiting.said.basis != Some(Basis::Measured)
            }
            Self::Property(..) | Self::Tonnage(_) | Self::Content(_) | Self::Ready(_) | Self::Inherent(_) => {
                false
            }
        }
    }
}

/// A row on its way to a [`Substance`].
pub(super) struct Draft {
    substance: Substance,
    identity: IdentityCells,
    companions: Companions,
    values: Vec<AnyValue>,
    /// Whether every cell of hazard statements was read; one that was not may hold any code.
    statements: Completeness,
    molar_mass: Option<f64>,
}

const PH_RANGE: (f64, f64) = (-2.0, 16.0);

impl Draft {
    /// A row of which nothing is read yet.
    pub(super) fn new(sheet: Arc<str>, row: u32) -> Self {
        Self {
            substance: Substance::unknown(sheet, row),
            identity: IdentityCells::default(),
            companions: Companions::default(),
            values: Vec::new(),
            statements: Completeness::Complete,
            molar_mass: None,
        }
    }

    /// Takes a cell as what its column holds.
    pub(super) fn take(&mut self, column: &Column, cell: &Cell) {
        let place = CellRef {
            sheet: Arc::clone(&self.substance.sheet),
            row: self.substance.row,
            column: column.index,
        };
        let result = match &cell.content {
            CellContent::Empty if cell.formula => Err(CellFaultKind::FormulaWithoutResult),
            CellContent::Empty => Ok(()),
            CellContent::Error(_) => Err(CellFaultKind::SheetError),
            content => self.take_content(column, content, place.clone()),
        };
        if let Err(kind) = result {
            if column.field == Field::HazardStatements {
                self.statements = Completeness::Incomplete;
            }
            self.fault(&cell.content, place, kind);
        }
    }

    /// Takes a cell that shows its number in thousands; where a number is asked for, either may be meant.
    pub(super) fn take_scaled(&mut self, column: &Column, cell: &Cell, shown: String) {
        let names = [Field::RowId, Field::Name, Field::CasNumber, Field::EcNumber];
        if names.contains(&column.field) {
            return self.take(column, cell);
        }
        let (sheet, row) = (Arc::clone(&self.substance.sheet), self.substance.row);
        let place = CellRef { sheet, row, column: column.index };
        self.fault(&cell.content, place, CellFaultKind::ShownInThousands { shown });
    }

    /// Takes a cell for which something else than its own content tells that it cannot be read.
    pub(super) fn refuse(&mut self, column: &Column, cell: &Cell, kind: CellFaultKind) {
        let (sheet, row) = (Arc::clone(&self.substance.sheet), self.substance.row);
        self.fault(&cell.content, CellRef { sheet, row, column: column.index }, kind);
    }

    fn fault(&mut self, content: &CellContent, cell: CellRef, kind: CellFaultKind) {
        let found = if kind == CellFaultKind::FormulaWithoutResult {
            "=…".to_owned()
        } else {
            cell::shown(content)
        };
        self.substance.faults.push(CellFault { cell, found, kind });
    }

    fn take_content(
        &mut self,
        column: &Column,
        content: &CellContent,
        cell: CellRef,
    ) -> Result<(), CellFaultKind> {
        let bare =
            |what, example, range| companions::single(content, column, Expected::bare(what, example, range));
        match column.field {
            Field::RowId => self.substance.row_id = cited(cell::text_of(content), cell),
            Field::Name => self.substance.name = cited(identity::read_name(content), cell),
            Field::Formula => self.substance.formula = cited(identity::read_name(content), cell),
            Field::CasNumber => self.identity.take_cas(&mut self.substance, content, cell)?,
            Field::EcNumber => self.identity.take_ec(&mut self.substance, content, cell)?,
            Field::Smiles => self.identity.take_smiles(&mut self.substance, content, cell)?,
            Field::InchiKey => self.identity.take_inchi_key(&mut self.substance, content, cell)?,
            Field::RowType => self.take_row_type(content)?,
            Field::SubstanceType => self.take_substance_type(content, cell)?,
            Field::Property(property) => self.take_property(property, column, content, &cell)?,
            Field::LogKowMethod => self.companions.take_method(content),
            Field::LogKowSd => {
                self.companions.log_kow_sd = bare("standard deviation of the log Kow", "0.3", (0.0, 10.0))?;
            }
            Field::LogKowTemperature => {
                let expected = Expected::temperature("temperature of the log Kow");
                self.companions.log_kow_temperature = companions::single(content, column, expected)?;
            }
            Field::LogKowPh => self.companions.log_kow_ph = bare("pH of the log Kow", "7", PH_RANGE)?,
            Field::KocPh => self.companions.koc_ph = bare("pH of the Koc", "7", PH_RANGE)?,
            Field::BcfLipid => {
                let expected = Expected::percent("lipid content", "5 %");
                self.companions.bcf_lipid = companions::single(content, column, expected)?;
            }
            Field::HalfLifeTemperature => self.companions.take_half_life_temperature(column, content)?,
            Field::Reliability => self.companions.take_reliability(column.about, content)?,
            Field::Guideline => {
                self.companions.take_guideline(column.about, content);
                self.carry_text(column.field, content, cell);
            }
            Field::ReadyBiodegradability => self.take_ready(column, content, &cell)?,
            Field::InherentBiodegradability => self.take_inherent(column, content, &cell)?,
            Field::HazardStatements => self.take_statements(content, cell)?,
            Field::Content | Field::Tonnage => self.take_amount(column, content, &cell)?,
            Field::Reference => {
                self.companions.take_reference(column.about, content);
                self.carry_text(column.field, content, cell);
            }
            Field::Year
            | Field::Product
            | Field::Supplier
            | Field::Use
            | Field::SubstituteFor
            | Field::ConstituentOf
            | Field::TransformsTo
            | Field::AssessorVerdict
            | Field::AssessorReason
            | Field::Assessor
            | Field::AssessedOn => self.carry_text(column.field, content, cell),
            // Read with the value they belong to.
            Field::UnitOfValue | Field::QualifierOfValue => {}
        }
        Ok(())
    }

    fn take_amount(
        &mut self,
        column: &Column,
        content: &CellContent,
        cell: &CellRef,
    ) -> Result<(), CellFaultKind> {
        let is_content = column.field == Field::Content;
        let expected = if is_content { Expected::percent("content", "12 %") } else { Expected::TONNAGE };
        if let Some((quantity, said)) = cell::read_quantity(content, column, expected, None)? {
            let waiting = waiting(column, quantity, said, cell);
            self.values.push(if is_content {
                AnyValue::Content(waiting)
            } else {
                AnyValue::Tonnage(waiting)
            });
        }
        Ok(())
    }

    fn carry_text(&mut self, field: Field, content: &CellContent, cell: CellRef) {
        if let Some(value) = cell::text_of(content) {
            let cited = Cited { value, cell };
            self.substance.texts.entry(field).or_insert(cited);
        }
    }

    fn take_row_type(&mut self, content: &CellContent) -> Result<(), CellFaultKind> {
        if let Some(row_type) = kinds::read_row_type(content)? {
            self.substance.row_type = row_type;
        }
        match self.substance.row_type {
            RowType::Mixture => Err(CellFaultKind::MixtureRow),
            RowType::Article => Err(CellFaultKind::ArticleRow),
            RowType::NotStated | RowType::Substance => Ok(()),
        }
    }

    fn take_substance_type(&mut self, content: &CellContent, cell: CellRef) -> Result<(), CellFaultKind> {
        if let Some((value, further)) = kinds::read_substance_type(content)? {
            self.substance.substance_type = Some(Cited { value, cell });
            self.substance.further_types = further;
        }
        Ok(())
    }

    fn take_property(
        &mut self,
        property: Property,
        column: &Column,
        content: &CellContent,
        place: &CellRef,
    ) -> Result<(), CellFaultKind> {
        let expected = Expected::property(property);
        if property == Property::MolarMass {
            // Molar concentrations are converted by it: there can be one only.
            let read = cell::read_quantity(content, column, expected, None)?;
            self.molar_mass =
                self.molar_mass.or_else(|| read.as_ref().and_then(|(quantity, _)| quantity.single()));
            self.wait(property, column, read, place);
            return Ok(());
        }
        let read = cell::read_quantities(content, column, expected, self.molar_mass)?;
        self.wait(property, column, read, place);
        Ok(())
    }

    /// Keeps the values of a cell until the columns that speak of them are known.
    fn wait(
        &mut self,
        property: Property,
        column: &Column,
        read: impl IntoIterator<Item = cell::Read>,
        place: &CellRef,
    ) {
        for (quantity, said) in read {
            let value = waiting(column, quantity, said, place);
            self.values.push(AnyValue::Property(property, value));
        }
    }

    fn take_ready(
        &mut self,
        column: &Column,
        content: &CellContent,
        place: &CellRef,
    ) -> Result<(), CellFaultKind> {
        let Some((ready, said, fault)) = degradability::read_ready(content, column.decimal)? else {
            return Ok(());
        };
        if let Some(kind) = fault {
            self.fault(content, place.clone(), kind);
        }
        let ready = ready.below(column.readiness);
        self.values.push(AnyValue::Ready(waiting(column, ready, said, place)));
        Ok(())
    }

    fn take_inherent(
        &mut self,
        column: &Column,
        content: &CellContent,
        place: &CellRef,
    ) -> Result<(), CellFaultKind> {
        if let Some((inherent, said)) = inherent::read_inherent(content, column.decimal)? {
            self.values.push(AnyValue::Inherent(waiting(column, inherent, said, place)));
        }
        Ok(())
    }

    /// Several columns, for example one of codes and one of classes, add up.
    fn take_statements(&mut self, content: &CellContent, place: CellRef) -> Result<(), CellFaultKind> {
        let (statements, fault) = statements::read_statements(content)?;
        if let Some(value) = statements {
            let before = self.substance.hazard_statements.take();
            let (value, cell) = match before {
                Some(earlier) => (earlier.value.united(&value), earlier.cell),
                None => (value, place),
            };
            self.substance.hazard_statements = Some(Cited { value, cell });
        }
        fault.map_or(Ok(()), Err)
    }

    /// The substance, once every cell of the row was taken.
    pub(super) fn finish(mut self, unstated: UnstatedBasis) -> Substance {
        let values = std::mem::take(&mut self.values);
        let properties: Vec<Property> = values
            .iter()
            .filter_map(|value| match value {
                AnyValue::Property(property, _) => Some(*property),
                AnyValue::Tonnage(_) | AnyValue::Content(_) | AnyValue::Ready(_) | AnyValue::Inherent(_) => {
                    None
                }
            })
            .collect();
        for value in self.without_placeholders(values) {
            self.settle(value, &properties, unstated);
        }
        if self.statements == Completeness::Incomplete
            && let Some(cited) = &mut self.substance.hazard_statements
        {
            cited.value = cited.value.united(&HazardStatements::incomplete([]));
        }
        self.identity.conclude(&mut self.substance);
        self.substance
    }

    /// A log Kow of exactly zero in a row whose other zeros were refused stands for a missing value as they do.
    fn without_placeholders(&mut self, values: Vec<AnyValue>) -> Vec<AnyValue> {
        let is_zero = |fault: &CellFault| matches!(fault.kind, CellFaultKind::Zero { .. });
        if !self.substance.faults.iter().any(is_zero) {
            return values;
        }
        let (doubted, kept): (Vec<_>, Vec<_>) = values.into_iter().partition(AnyValue::is_zero_logarithm);
        for value in doubted {
            if let AnyValue::Property(property, Waiting { value, cell, .. }) = value {
                let kind = CellFaultKind::Placeholder { what: property.title() };
                self.substance.faults.push(CellFault { cell, found: value.reported, kind });
            }
        }
        kept
    }

    fn settle(&mut self, value: AnyValue, properties: &[Property], unstated: UnstatedBasis) {
        let substance = &mut self.substance;
        match value {
            AnyValue::Property(property, value) => {
                let property = match (property, value.said.other_half_life) {
                    // In air, light and hydroxyl radicals are how a substance degrades.
                    (Property::HalfLife(compartment), Some(other)) if compartment != Compartment::Air => {
                        let kind = CellFaultKind::CountsAs { other: other.title(), what: property.title() };
                        let found = value.value.reported.clone();
                        substance.faults.push(CellFault { cell: value.cell.clone(), found, kind });
                        other
                    }
                    (property, _) => property,
                };
                let speaking = self.companions.of_property(property, properties);
                let mut reading = reading(value, &speaking, unstated);
                self.companions.complete(property, &mut reading);
                substance.readings.entry(property).or_default().push(reading);
            }
            AnyValue::Tonnage(value) => {
                substance.tonnage.get_or_insert(reading(value, &[], unstated));
            }
            AnyValue::Content(value) => {
                substance.content.get_or_insert(reading(value, &[], unstated));
            }
            AnyValue::Ready(value) => {
                let basis = basis_of(
                    &value.said,
                    &value.header,
                    &self.companions.of_tests(&["301", "310"]),
                    unstated,
                );
                let reliability = self.companions.reliability_of_tests(&value.said);
                substance
                    .ready
                    .push(Cited { value: value.value.known_by(basis, reliability), cell: value.cell });
            }
            AnyValue::Inherent(value) => {
                let basis =
                    basis_of(&value.said, &value.header, &self.companions.of_tests(&["302"]), unstated);
                let reliability = self.companions.reliability_of_tests(&value.said);
                substance
                    .inherent
                    .push(Cited { value: value.value.known_by(basis, reliability), cell: value.cell });
            }
        }
    }
}

fn cited<T>(value: Option<T>, cell: CellRef) -> Option<Cited<T>> {
    value.map(|value| Cited { value, cell })
}

fn waiting<T>(column: &Column, value: T, said: Said, cell: &CellRef) -> Waiting<T> {
    let mut conditions = column.conditions.clone();
    conditions.doubt = doubt_in(&column.header);
    let header = Said { basis: column.basis, conditions, ..Said::default() };
    Waiting { value, said, header, cell: cell.clone() }
}

/// The cell's own word first; then calculated if anything beside it says so, because an estimate is never shown as
/// measured. Nor is what anyone doubts.
fn basis_of(cell: &Said, header: &Said, beside: &[&Said], unstated: UnstatedBasis) -> Basis {
    let others = || beside.iter().map(|said| said.basis).chain([header.basis]).flatten();
    let basis = cell
        .basis
        .or_else(|| others().find(|basis| *basis == Basis::Calculated))
        .or_else(|| others().next())
        .unwrap_or_else(|| unstated.basis());
    // What the cell says of itself, nothing beside it doubts.
    let beside = beside.iter().chain([&header]).filter(|_| cell.basis.is_none());
    let doubted = beside.chain([&cell]).any(|said| said.conditions.doubt.is_some());
    if doubted && basis == Basis::Measured { Basis::Unstated } else { basis }
}

fn reading(value: Waiting<Quantity>, beside: &[&Said], unstated: UnstatedBasis) -> Reading {
    let basis = basis_of(&value.said, &value.header, beside, unstated);
    let mut conditions: Conditions = value.said.conditions;
    for said in beside {
        remark::fill_conditions(&mut conditions, &said.conditions);
    }
    remark::fill_conditions(&mut conditions, &value.header.conditions);
    if value.said.basis.is_none() {
        let doubts = beside.iter().chain([&&value.header]).find_map(|said| said.conditions.doubt.clone());
        conditions.doubt = conditions.doubt.or(doubts);
    }
    Reading { quantity: value.value, basis, conditions, cell: value.cell }
}
