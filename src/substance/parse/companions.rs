//! Columns that speak of other columns' values: method, guideline, temperature, pH, lipid, reliability.

use std::sync::LazyLock;

use regex::Regex;

use super::cell::{self, Expected};
use super::doubt::doubt_in;
use super::pattern::fixed;
use super::remark::{Said, basis_said, folded, reliability_in_words};
use crate::columns::Column;
use crate::fault::CellFaultKind;
use crate::substance::{Basis, Compartment, Property, Reading};
use crate::workbook::CellContent;

static TEST_NUMBER: LazyLock<Regex> =
    LazyLock::new(|| fixed(r"\b(?:oecd|tg|guideline)[a-z ]*(\d{3})[a-z]?\b"));
static STUDY_WORD: LazyLock<Regex> = LazyLock::new(|| {
    fixed(
        r"\b(study|studie|test|versuch|etude|essai|estudio|ensayo|studio|prova|proef|onderzoek)\b|試験|试验",
    )
});
static SCORE: LazyLock<Regex> =
    LazyLock::new(|| fixed(r"^(?:\D*[\s=:(])?([1-4])[a-e]?(?:\.0)?(?:\W.*)?$|^rl ?([1-4])$"));

/// What one companion column says, and of which property, if its header tells.
#[derive(Debug, Clone, PartialEq)]
struct Speaking<T> {
    about: Option<Property>,
    value: T,
}

/// A guideline as written and the number of the test, if it names one.
#[derive(Debug, Clone, PartialEq)]
struct Guideline {
    said: Said,
    number: Option<String>,
}

/// The companion columns of a row.
#[derive(Debug, Clone, PartialEq, Default)]
pub(super) struct Companions {
    methods: Vec<Said>,
    pub(super) log_kow_sd: Option<f64>,
    pub(super) log_kow_temperature: Option<f64>,
    pub(super) log_kow_ph: Option<f64>,
    pub(super) koc_ph: Option<f64>,
    pub(super) bcf_lipid: Option<f64>,
    half_life_temperature: Vec<Speaking<f64>>,
    reliability: Vec<Speaking<u8>>,
    guidelines: Vec<Speaking<Guideline>>,
}

impl Companions {
    /// Takes a cell of the column on how the log Kow was obtained.
    pub(super) fn take_method(&mut self, content: &CellContent) {
        if let Some(text) = cell::value_text(content) {
            self.methods.push(said_by_method(&text));
        }
    }

    /// Takes a cell of the column of half-life temperatures.
    pub(super) fn take_half_life_temperature(
        &mut self,
        column: &Column,
        content: &CellContent,
    ) -> Result<(), CellFaultKind> {
        let expected = Expected::temperature("temperature of the half-life");
        if let Some(value) = single(content, column, expected)? {
            self.half_life_temperature.push(Speaking { about: column.about, value });
        }
        Ok(())
    }

    /// Takes a cell of a column of reliability scores.
    pub(super) fn take_reliability(
        &mut self,
        about: Option<Property>,
        content: &CellContent,
    ) -> Result<(), CellFaultKind> {
        if let Some(value) = read_reliability(content)? {
            self.reliability.push(Speaking { about, value });
        }
        Ok(())
    }

    /// Takes a cell of a column of guidelines.
    pub(super) fn take_guideline(&mut self, about: Option<Property>, content: &CellContent) {
        let Some(text) = cell::value_text(content) else {
            return;
        };
        let plain = folded(&text);
        // A column of guidelines may leave `OECD` out.
        let bare = plain.len() <= 4 && plain.starts_with(|first: char| first.is_ascii_digit());
        let plain = if bare { format!("oecd {plain}") } else { plain };
        let mut said = said_by_method(&text);
        let study = || STUDY_WORD.is_match(&plain).then_some(Basis::Measured);
        said.basis = basis_said(&text, &plain).or_else(study);
        let number = TEST_NUMBER.captures(&plain).and_then(|found| Some(found.get(1)?.as_str().to_owned()));
        self.guidelines.push(Speaking { about, value: Guideline { said, number } });
    }

    /// Takes a cell of a column of references: `QSAR` lowers the basis of the value it stands beside, and `exp` alone tells
    /// it. Titles of journals hold such words, too, so nothing longer makes a value measured.
    pub(super) fn take_reference(&mut self, about: Option<Property>, content: &CellContent) {
        const MOST_WORDS_OF_ROW: usize = 3;
        let Some(text) = cell::value_text(content) else {
            return;
        };
        let plain = folded(&text);
        let words = plain.split(' ').count();
        if about.is_none() && words > MOST_WORDS_OF_ROW {
            return;
        }
        let is_told = match (basis_said(&text, &plain), about) {
            (None, _) => false,
            (Some(Basis::Measured), about) => about.is_some() && words == 1,
            (Some(Basis::Unstated | Basis::Calculated | Basis::Estimated), _) => true,
        };
        if is_told {
            let said = Said { basis: basis_said(&text, &plain), ..Said::default() };
            self.guidelines.push(Speaking { about, value: Guideline { said, number: None } });
        }
    }

    /// What method and guideline columns say of a property; `properties` are those the row has values of.
    pub(super) fn of_property(&self, property: Property, properties: &[Property]) -> Vec<&Said> {
        let only_one = properties.iter().all(|other| *other == property);
        let method = self.methods.iter().filter(|_| property == Property::LogKow);
        let guidelines = self.guidelines.iter().filter(|guideline| {
            let number = guideline.value.number.as_deref().and_then(tested_by);
            match (number, guideline.about) {
                (Some(tested), _) => tested(property),
                (None, Some(about)) => about == property,
                // A calculation may be of any of them; a study is of one of them, and nobody knows which.
                (None, None) => only_one || guideline.value.said.basis == Some(Basis::Calculated),
            }
        });
        method.chain(guidelines.map(|guideline| &guideline.value.said)).collect()
    }

    /// What guideline columns say of tests with these numbers.
    pub(super) fn of_tests(&self, numbers: &[&str]) -> Vec<&Said> {
        let named = |guideline: &&Speaking<Guideline>| {
            guideline.value.number.as_deref().is_some_and(|number| numbers.contains(&number))
        };
        self.guidelines.iter().filter(named).map(|guideline| &guideline.value.said).collect()
    }

    /// The reliability of a test that gives words, from its cell, else from a column that names no property.
    pub(super) fn reliability_of_tests(&self, said: &Said) -> Option<u8> {
        let of_row = || self.reliability.iter().find(|score| score.about.is_none());
        said.conditions.reliability.or_else(|| of_row().map(|score| score.value))
    }

    /// Fills in what the cell and its header left open.
    pub(super) fn complete(&self, property: Property, reading: &mut Reading) {
        let conditions = &mut reading.conditions;
        match property {
            Property::LogKow => {
                reading.quantity.written_sd = reading.quantity.written_sd.or(self.log_kow_sd);
                conditions.temperature = conditions.temperature.or(self.log_kow_temperature);
                conditions.ph = conditions.ph.or(self.log_kow_ph);
            }
            Property::Koc => conditions.ph = conditions.ph.or(self.koc_ph),
            Property::Bcf => conditions.lipid = conditions.lipid.or(self.bcf_lipid),
            Property::HalfLife(_)
            | Property::HydrolysisHalfLife
            | Property::PhotolysisHalfLife
            | Property::DissipationHalfLife => {
                conditions.temperature =
                    conditions.temperature.or_else(|| spoken_of(&self.half_life_temperature, property));
            }
            Property::LogD
            | Property::LogKoa
            | Property::WaterSolubility
            | Property::MeltingPoint
            | Property::BoilingPoint
            | Property::VapourPressure
            | Property::HenryConstant
            | Property::PkaAcid
            | Property::PkaBase
            | Property::Baf
            | Property::Bmf
            | Property::Tmf
            | Property::LongTermToxicity
            | Property::AcuteToxicity
            | Property::MolarMass => {}
        }
        conditions.reliability = conditions.reliability.or_else(|| spoken_of(&self.reliability, property));
    }
}

/// The value that names the property, else one that names none.
fn spoken_of<T: Copy>(speaking: &[Speaking<T>], property: Property) -> Option<T> {
    let about =
        |wanted: Option<Property>| speaking.iter().find(|one| one.about == wanted).map(|one| one.value);
    about(Some(property)).or_else(|| about(None))
}

/// The number of a cell, if it holds a single one.
pub(super) fn single(
    content: &CellContent,
    column: &Column,
    expected: Expected,
) -> Result<Option<f64>, CellFaultKind> {
    let read = cell::read_quantity(content, column, expected, None)?;
    Ok(read.and_then(|(quantity, _)| quantity.single()))
}

fn said_by_method(text: &str) -> Said {
    let mut said = Said::in_remarks(&[text.to_owned()]);
    said.conditions.doubt = doubt_in(text);
    said.conditions.method = Some(text.to_owned());
    said
}

/// The properties that a test with this number measures (titles of the OECD test guidelines, common practice).
fn tested_by(number: &str) -> Option<fn(Property) -> bool> {
    let in_water = |property| {
        matches!(
            property,
            Property::HalfLife(Compartment::FreshWater | Compartment::MarineWater | Compartment::Water)
        )
    };
    Some(match number {
        "102" => |property| property == Property::MeltingPoint,
        "103" => |property| property == Property::BoilingPoint,
        "104" => |property| property == Property::VapourPressure,
        "105" => |property| property == Property::WaterSolubility,
        "106" | "121" => |property| property == Property::Koc,
        "107" | "117" | "123" => |property| property == Property::LogKow,
        "111" => |property| property == Property::HydrolysisHalfLife,
        "112" => |property| matches!(property, Property::PkaAcid | Property::PkaBase),
        "201" | "221" => |property| matches!(property, Property::AcuteToxicity | Property::LongTermToxicity),
        "202" | "203" | "236" => |property| property == Property::AcuteToxicity,
        "210" | "211" | "212" | "215" => |property| property == Property::LongTermToxicity,
        "301" | "302" | "310" => |_| false,
        "305" => |property| matches!(property, Property::Bcf | Property::Bmf),
        "307" => |property| property == Property::HalfLife(Compartment::Soil),
        "308" => |property| {
            matches!(property, Property::HalfLife(compartment) if compartment != Compartment::Air
            && compartment != Compartment::Soil)
        },
        "309" => in_water,
        "316" => |property| property == Property::PhotolysisHalfLife,
        _ => return None,
    })
}

/// A reliability score from 1 (reliable without restriction) to 4 (not assignable).
fn read_reliability(content: &CellContent) -> Result<Option<u8>, CellFaultKind> {
    let Some(text) = cell::value_text(content) else {
        return Ok(None);
    };
    let plain = folded(&text);
    let score =
        SCORE.captures(&text).and_then(|found| found.get(1).or_else(|| found.get(2))?.as_str().parse().ok());
    let in_words = reliability_in_words(&plain);
    let not_a = CellFaultKind::NotA { what: "reliability score from 1 to 4", example: "2" };
    score.or(in_words).map(Some).ok_or(not_a)
}
