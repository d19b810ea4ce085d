//! What a screened row is held against other rows by: its numbers, its name, its headlines and its data.
//!
//! Data stand here as digests: enough to say which of them differ between two rows, not what they are.

use std::hash::{DefaultHasher, Hash, Hasher};
use std::num::NonZeroU64;
use std::sync::Arc;

use crate::quantity::{Bound, Interval};
use crate::reasoning::{Told, headline};
use crate::report::RowName;
use crate::substance::{
    CasNumber, Cited, EcNumber, Identity, InherentBiodegradability, Reading, ReadyBiodegradability, Substance,
};

/// A row as other rows see it.
#[derive(Debug, Clone)]
pub(crate) struct Standing {
    /// What the row is called.
    pub(crate) name: Arc<RowName>,
    /// Its CAS number and the column it stands in.
    pub(crate) cas: Option<(CasNumber, u16)>,
    /// Its EC number and the column it stands in.
    pub(crate) ec: Option<(EcNumber, u16)>,
    /// A digest of its name, folded, and the column the name stands in.
    pub(crate) folded_name: Option<(NonZeroU64, u16)>,
    /// The headline of each rulebook.
    pub(crate) headlines: Vec<String>,
    /// The title and a digest of each of its data.
    pub(crate) data: Vec<(&'static str, u32)>,
}

impl Standing {
    /// What a judged row is held against others by. A row that is not identified, as a mixture, shares nothing.
    pub(crate) fn of(told: Told) -> Self {
        let substance = told.substance;
        let identified = match substance.identity {
            Identity::Identified | Identity::RepairedDate | Identity::BareNumber | Identity::NameAlone => {
                Some(substance)
            }
            Identity::NotIdentified => None,
        };
        let cas = identified.and_then(|row| row.cas.as_ref());
        let ec = identified.and_then(|row| row.ec.as_ref());
        let name = identified.and_then(|row| row.name.as_ref());
        Self {
            name: Arc::new(row_name(substance)),
            cas: cas.map(|cited| (cited.value, cited.cell.column)),
            ec: ec.map(|cited| (cited.value, cited.cell.column)),
            folded_name: name.and_then(|cited| Some((folded(&cited.value)?, cited.cell.column))),
            headlines: told.books().map(headline).collect(),
            data: data_of(substance),
        }
    }
}

fn row_name(substance: &Substance) -> RowName {
    let text =
        |cited: &Option<Cited<String>>| cited.as_ref().map_or(String::new(), |cited| cited.value.clone());
    let ec = || substance.ec.as_ref().map(|ec| ec.value.to_string());
    let number = substance.cas.as_ref().map(|cas| cas.value.to_string()).or_else(ec);
    RowName {
        row_id: text(&substance.row_id),
        name: text(&substance.name),
        number: number.unwrap_or_default(),
    }
}

/// Case and spaces do not make another name.
fn folded(name: &str) -> Option<NonZeroU64> {
    let name = name.to_lowercase();
    let mut words = name.split_whitespace().peekable();
    words.peek()?;
    let mut hasher = DefaultHasher::new();
    words.for_each(|word| word.hash(&mut hasher));
    NonZeroU64::new(hasher.finish())
}

fn data_of(substance: &Substance) -> Vec<(&'static str, u32)> {
    let mut data: Vec<(&'static str, u32)> = substance
        .readings
        .iter()
        .map(|(property, readings)| (property.title(), digest(readings, hash_reading)))
        .collect();
    if !substance.ready.is_empty() {
        data.push((
            "ready biodegradability",
            digest(&substance.ready, |cited, hasher| hash_ready(&cited.value, hasher)),
        ));
    }
    if !substance.inherent.is_empty() {
        let hash = |cited: &Cited<_>, hasher: &mut _| hash_inherent(&cited.value, hasher);
        data.push(("inherent biodegradability", digest(&substance.inherent, hash)));
    }
    if let Some(cited) = &substance.hazard_statements {
        let hash = |codes: &Vec<&str>, hasher: &mut DefaultHasher| {
            (codes, cited.value.completeness()).hash(hasher);
        };
        data.push(("hazard statements", digest(&[cited.value.codes().collect()], hash)));
    }
    if let Some(cited) = &substance.substance_type {
        data.push(("substance type", digest(&[cited.value], Hash::hash)));
    }
    data
}

fn digest<Item>(items: &[Item], hash: impl Fn(&Item, &mut DefaultHasher)) -> u32 {
    let mut hasher = DefaultHasher::new();
    for item in items {
        hash(item, &mut hasher);
    }
    let [first, second, third, fourth, ..] = hasher.finish().to_le_bytes();
    u32::from_le_bytes([first, second, third, fourth])
}

/// The value and everything said of it that can change a verdict; how it was spelt does not.
fn hash_reading(reading: &Reading, hasher: &mut DefaultHasher) {
    hash_interval(reading.quantity.interval, hasher);
    let conditions = &reading.conditions;
    for number in [reading.quantity.written_sd, conditions.temperature, conditions.ph, conditions.lipid] {
        number.map(f64::to_bits).hash(hasher);
    }
    (reading.basis, reading.quantity.approximate, conditions.reliability, conditions.degradation)
        .hash(hasher);
}

fn hash_ready(ready: &ReadyBiodegradability, hasher: &mut DefaultHasher) {
    (ready.result, ready.basis, ready.reliability).hash(hasher);
}

fn hash_inherent(inherent: &InherentBiodegradability, hasher: &mut DefaultHasher) {
    (&inherent.guideline, inherent.basis, inherent.reliability, inherent.days.map(f64::to_bits)).hash(hasher);
    if let Some(degraded) = inherent.degraded {
        hash_interval(degraded, hasher);
    }
}

fn hash_interval(interval: Interval, hasher: &mut DefaultHasher) {
    for bound in [interval.low(), interval.high()] {
        match bound {
            Bound::Unbounded => 0_u8.hash(hasher),
            Bound::Included(number) => (1_u8, number.to_bits()).hash(hasher),
            Bound::Excluded(number) => (2_u8, number.to_bits()).hash(hasher),
        }
    }
}
