//! From the cells of a row to a [`Substance`].
//!
//! What a cell says of itself counts first, then the columns that speak of it (method, guideline, temperature,
//! reliability), then its header. Whatever cannot be read becomes a fault; the rest of the row stands.

mod cell;
mod companions;
mod degradability;
mod identity;
mod kinds;
mod pattern;
mod remark;
mod statements;

use std::sync::Arc;

pub(crate) use remark::Said;

use crate::columns::{Column, Recognised};
use crate::fault::{CellFault, CellFaultKind};
use crate::quantity::Quantity;
use crate::substance::{Basis, Cited, Conditions, Field, Property, Reading, RowType, Substance};
use crate::workbook::{Cell, CellContent, CellRef, Row};
use cell::Expected;
use companions::Companions;
use identity::IdentityCells;

/// What a value without a word on how it was obtained counts as (`--unstated`).
#[derive(Debug, Clone, Copy, PartialEq, Eq, Default)]
pub enum UnstatedBasis {
    /// As measured.
    Measured,
    /// As a rank of its own between measured and calculated.
    #[default]
    Unstated,
    /// As calculated.
    Calculated,
}

impl UnstatedBasis {
    fn basis(self) -> Basis {
        match self {
            Self::Measured => Basis::Measured,
            Self::Unstated => Basis::Unstated,
            Self::Calculated => Basis::Calculated,
        }
    }
}

/// Reads rows of one sheet.
#[derive(Debug, Clone)]
pub struct RowReader {
    sheet: Arc<str>,
    /// Molar mass first, because molar concentrations need it.
    columns: Vec<Column>,
    unstated: UnstatedBasis,
}

impl RowReader {
    /// A reader for the rows of a sheet whose columns were recognised.
    pub fn new(sheet: Arc<str>, columns: &Recognised, unstated: UnstatedBasis) -> Self {
        let mut columns = columns.columns.clone();
        columns.sort_by_key(|column| column.field != Field::Property(Property::MolarMass));
        Self {
            sheet,
            columns,
            unstated,
        }
    }

    /// What the row says of its substance.
    pub fn read(&self, row: &Row) -> Substance {
        let mut draft = Draft {
            substance: Substance::unknown(Arc::clone(&self.sheet), row.index),
            identity: IdentityCells::default(),
            companions: Companions::default(),
            values: Vec::new(),
            molar_mass: None,
        };
        for column in &self.columns {
            if let Some(cell) = row.cell(column.index) {
                draft.take(column, cell);
            }
        }
        draft.finish(self.unstated)
    }
}

/// A value whose basis and conditions still wait for the columns that speak of it.
struct Value<T> {
    value: T,
    said: Said,
    header: Said,
    cell: CellRef,
}

enum AnyValue {
    Property(Property, Value<Quantity>),
    Tonnage(Value<Quantity>),
    Content(Value<Quantity>),
    Ready(Value<degradability::ReadyCell>),
    Inherent(Value<degradability::InherentCell>),
}

struct Draft {
    substance: Substance,
    identity: IdentityCells,
    companions: Companions,
    values: Vec<AnyValue>,
    molar_mass: Option<f64>,
}

impl Draft {
    fn take(&mut self, column: &Column, cell: &Cell) {
        let place = CellRef {
            sheet: Arc::clone(&self.substance.sheet),
            row: self.substance.row,
            column: column.index,
        };
        let result = match &cell.content {
            CellContent::Empty => Ok(()),
            CellContent::Error(_) => Err(CellFaultKind::SheetError),
            content => self.take_content(column, content, &place),
        };
        if let Err(kind) = result {
            self.fault(&cell.content, place, kind);
        }
    }

    fn fault(&mut self, content: &CellContent, cell: CellRef, kind: CellFaultKind) {
        let found = cell::shown(content);
        self.substance.faults.push(CellFault { cell, found, kind });
    }

    fn take_content(
        &mut self,
        column: &Column,
        content: &CellContent,
        place: &CellRef,
    ) -> Result<(), CellFaultKind> {
        match column.field {
            Field::RowId
            | Field::Name
            | Field::CasNumber
            | Field::EcNumber
            | Field::Smiles
            | Field::InchiKey
            | Field::Formula => self
                .identity
                .take(&mut self.substance, column.field, content, place),
            Field::RowType => self.take_row_type(content),
            Field::SubstanceType => {
                if let Some(value) = kinds::read_substance_type(content)? {
                    self.substance.substance_type = Some(Cited {
                        value,
                        cell: place.clone(),
                    });
                }
                Ok(())
            }
            Field::Property(property) => self.take_property(property, column, content, place),
            Field::LogKowMethod
            | Field::LogKowSd
            | Field::LogKowTemperature
            | Field::LogKowPh
            | Field::KocPh
            | Field::BcfLipid
            | Field::HalfLifeTemperature
            | Field::Reliability => self.companions.take(column, content),
            Field::Guideline => {
                self.carry_text(column.field, content, place);
                self.companions.take(column, content)
            }
            Field::ReadyBiodegradability => self.take_ready(column, content, place),
            Field::InherentBiodegradability => self.take_inherent(column, content, place),
            Field::HazardStatements => self.take_statements(content, place),
            Field::Content => {
                let expected = Expected::percent("content", "12 %");
                if let Some((value, said)) = cell::read_quantity(content, column, expected, None)? {
                    self.values
                        .push(AnyValue::Content(self.value(column, value, said, place)));
                }
                Ok(())
            }
            Field::Tonnage => {
                if let Some((value, said)) = cell::read_quantity(content, column, Expected::TONNAGE, None)? {
                    self.values
                        .push(AnyValue::Tonnage(self.value(column, value, said, place)));
                }
                Ok(())
            }
            Field::Reference
            | Field::Year
            | Field::Product
            | Field::Supplier
            | Field::Use
            | Field::SubstituteFor
            | Field::ConstituentOf
            | Field::TransformsTo
            | Field::AssessorVerdict
            | Field::AssessorReason
            | Field::Assessor
            | Field::AssessedOn => {
                self.carry_text(column.field, content, place);
                Ok(())
            }
        }
    }

    fn value<T>(&self, column: &Column, value: T, said: Said, cell: &CellRef) -> Value<T> {
        let header = Said {
            basis: column.basis,
            conditions: column.conditions.clone(),
        };
        Value {
            value,
            said,
            header,
            cell: cell.clone(),
        }
    }

    fn carry_text(&mut self, field: Field, content: &CellContent, cell: &CellRef) {
        if let Some(value) = cell::text_of(content) {
            let cited = Cited {
                value,
                cell: cell.clone(),
            };
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

    fn take_property(
        &mut self,
        property: Property,
        column: &Column,
        content: &CellContent,
        place: &CellRef,
    ) -> Result<(), CellFaultKind> {
        let expected = Expected::property(property);
        let Some((quantity, said)) = cell::read_quantity(content, column, expected, self.molar_mass)? else {
            return Ok(());
        };
        if property == Property::MolarMass {
            self.molar_mass = self.molar_mass.or(quantity.single());
        }
        let value = self.value(column, quantity, said, place);
        self.values.push(AnyValue::Property(property, value));
        Ok(())
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
        self.values
            .push(AnyValue::Ready(self.value(column, ready, said, place)));
        Ok(())
    }

    fn take_inherent(
        &mut self,
        column: &Column,
        content: &CellContent,
        place: &CellRef,
    ) -> Result<(), CellFaultKind> {
        if let Some((inherent, said)) = degradability::read_inherent(content, column.decimal)? {
            self.values
                .push(AnyValue::Inherent(self.value(column, inherent, said, place)));
        }
        Ok(())
    }

    /// Several columns, for example one of codes and one of classes, add up.
    fn take_statements(&mut self, content: &CellContent, place: &CellRef) -> Result<(), CellFaultKind> {
        let (statements, fault) = statements::read_statements(content)?;
        if let Some(value) = statements {
            let before = self.substance.hazard_statements.take();
            let (value, cell) = match before {
                Some(earlier) => (earlier.value.united(&value), earlier.cell),
                None => (value, place.clone()),
            };
            self.substance.hazard_statements = Some(Cited { value, cell });
        }
        fault.map_or(Ok(()), Err)
    }

    fn finish(mut self, unstated: UnstatedBasis) -> Substance {
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
        for value in values {
            self.settle(value, &properties, unstated);
        }
        self.identity.conclude(&mut self.substance);
        self.substance
    }

    fn settle(&mut self, value: AnyValue, properties: &[Property], unstated: UnstatedBasis) {
        let substance = &mut self.substance;
        match value {
            AnyValue::Property(property, value) => {
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
                substance.ready.push(Cited {
                    value: value.value.with_basis(basis),
                    cell: value.cell,
                });
            }
            AnyValue::Inherent(value) => {
                let basis = basis_of(
                    &value.said,
                    &value.header,
                    &self.companions.of_tests(&["302"]),
                    unstated,
                );
                substance.inherent.push(Cited {
                    value: value.value.with_basis(basis),
                    cell: value.cell,
                });
            }
        }
    }
}

/// The cell's own word first; then calculated if anything beside it says so, because an estimate is never shown as
/// measured.
fn basis_of(cell: &Said, header: &Said, beside: &[&Said], unstated: UnstatedBasis) -> Basis {
    let others = || {
        beside
            .iter()
            .map(|said| said.basis)
            .chain([header.basis])
            .flatten()
    };
    cell.basis
        .or_else(|| others().find(|basis| *basis == Basis::Calculated))
        .or_else(|| others().next())
        .unwrap_or_else(|| unstated.basis())
}

fn reading(value: Value<Quantity>, beside: &[&Said], unstated: UnstatedBasis) -> Reading {
    let basis = basis_of(&value.said, &value.header, beside, unstated);
    let mut conditions: Conditions = value.said.conditions;
    for said in beside {
        remark::fill_conditions(&mut conditions, &said.conditions);
    }
    remark::fill_conditions(&mut conditions, &value.header.conditions);
    Reading {
        quantity: value.value,
        basis,
        conditions,
        cell: value.cell,
    }
}
