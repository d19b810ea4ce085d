//! What is said of data that a step asks for and the row does not give.

use crate::evidence::Standing;
use crate::reasoning::Told;
use crate::reasoning::sentence::alternatives;
use crate::reasoning::value::listed;
use crate::rules::Subject;
use crate::substance::{Compartment, Property};

/// What the inventory does not hold, apart from values that it holds and that only support.
pub(super) fn absence(told: Told, absent: Vec<String>) -> Vec<String> {
    let (unreliable, absent): (Vec<String>, Vec<String>) =
        absent.into_iter().partition(|title| is_held_unreliable(told, title));
    let mut sentences = Vec::new();
    if !unreliable.is_empty() {
        sentences.push(format!(
            "Of {} the inventory holds only values of reliability 3 or 4, which do not decide",
            listed(&unreliable)
        ));
    }
    if !absent.is_empty() {
        sentences.push(format!(
            "The inventory holds no {}, which does not mean that there is none",
            alternatives(&absent)
        ));
    }
    sentences
}

/// Whether the row has values with this title, each of a reliability that keeps it from deciding.
fn is_held_unreliable(told: Told, title: &str) -> bool {
    let substance = told.substance;
    let asks_for = |property: &Property| {
        let of = |compartment| Property::HalfLife(compartment).title() == title;
        property.title() == title
            || match property {
                Property::HalfLife(Compartment::FreshWater | Compartment::MarineWater) => {
                    of(Compartment::Water)
                }
                Property::HalfLife(Compartment::FreshSediment | Compartment::MarineSediment) => {
                    of(Compartment::Sediment)
                }
                _ => false,
            }
    };
    let numbers = substance.readings.iter().filter(|(property, _)| asks_for(property));
    let of_numbers = numbers.flat_map(|(_, readings)| readings).map(|reading| reading.conditions.reliability);
    let is_ready = title == Subject::ReadyBiodegradability.title();
    let of_ready = substance.ready.iter().filter(|_| is_ready).map(|entry| entry.value.reliability);
    let is_inherent = title == Subject::InherentBiodegradability.title();
    let of_inherent = substance.inherent.iter().filter(|_| is_inherent).map(|entry| entry.value.reliability);
    let standings: Vec<Standing> =
        of_numbers.chain(of_ready).chain(of_inherent).map(Standing::of_reliability).collect();
    !standings.is_empty() && standings.iter().all(|standing| *standing == Standing::SupportingOnly)
}
