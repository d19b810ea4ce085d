//! Cautions: what a name, a type or a pattern in the data warns of, and which clearings it stops.

use std::collections::BTreeSet;

use regex::Regex;

use super::formula::{holds_organic_carbon, is_inorganic};
use crate::quantity::format_number;
use crate::rules::Subject;
use crate::substance::{Identity, Property, RowType, Substance, SubstanceType};

/// A sentence for the user and what it stops.
#[derive(Debug, Clone)]
pub struct Caution {
    /// Name in rule files, kebab-case.
    pub id: String,
    /// The sentence.
    pub sentence: String,
    /// Where it comes from.
    pub source: String,
    /// What raises it; any one is enough.
    pub triggers: Triggers,
    /// What it keeps from clearing.
    pub blocks: Blocks,
    /// Subjects that fire at most as screening under it.
    pub at_most_screening: BTreeSet<Subject>,
}

/// What raises a caution; any one is enough.
#[derive(Debug, Clone, Default)]
pub struct Triggers {
    /// The row states one of these types.
    pub substance_types: BTreeSet<SubstanceType>,
    /// The row is one of these.
    pub row_types: BTreeSet<RowType>,
    /// The row's identity is one of these.
    pub identities: BTreeSet<Identity>,
    /// The name matches.
    pub name_pattern: Option<Regex>,
    /// An exception to `name_pattern`; where inorganic formulas raise the caution, also to a stated type.
    pub unless_name: Option<Regex>,
    /// The formula holds no carbon, or is of a carbonate, cyanide, carbide and the like.
    pub inorganic_formula: bool,
    /// A pKa of the row puts its ionisation between pH 4 and 9.
    pub ionisable: bool,
    /// The single values of log Kow in the row lie further apart than this, log units.
    pub log_kow_spread: Option<f64>,
    /// The row holds neither a name that the patterns could match nor a type that tells more than `organic`.
    pub nothing_to_look_at: bool,
}

/// What a caution keeps from clearing.
#[derive(Debug, Clone, PartialEq, Eq)]
pub enum Blocks {
    /// Every clearing.
    Everything,
    /// A clearing by these, and by every value derived from them. May be empty.
    Subjects(BTreeSet<Subject>),
}

impl Caution {
    /// What of the substance raises the caution, in words; `None` if nothing does.
    pub fn is_raised_by(&self, substance: &Substance) -> Option<String> {
        let triggers = &self.triggers;
        self.stated_type(substance)
            .or_else(|| triggers.row_types.contains(&substance.row_type).then(|| row_reason(substance)))
            .or_else(|| {
                let identity = substance.identity;
                triggers.identities.contains(&identity).then(|| identity_reason(identity))
            })
            .or_else(|| triggers.name_reason(substance))
            .or_else(|| triggers.formula_reason(substance))
            .or_else(|| triggers.ionisation_reason(substance))
            .or_else(|| triggers.spread_reason(substance))
            .or_else(|| triggers.nothing_reason(substance))
    }

    fn stated_type(&self, substance: &Substance) -> Option<String> {
        let stated = substance.substance_type.as_ref()?;
        if self.triggers.inorganic_formula && self.triggers.says_organic(substance) {
            return None;
        }
        let mut types = std::iter::once(&stated.value).chain(&substance.further_types);
        types
            .find(|kind| self.triggers.substance_types.contains(*kind))
            .map(|kind| format!("the substance type is `{}`", kind.id()))
    }
}

impl Triggers {
    fn name_reason(&self, substance: &Substance) -> Option<String> {
        let name = substance.name.as_ref()?.value.trim();
        let found = self.name_pattern.as_ref()?.find(name)?;
        (!self.is_excepted(name)).then(|| format!("the name holds `{}`", found.as_str().trim()))
    }

    fn is_excepted(&self, name: &str) -> bool {
        self.unless_name.as_ref().is_some_and(|unless| unless.is_match(name))
    }

    /// A type is a word that somebody chose; the formula or the name of an organic substance contradicts `inorganic`.
    fn says_organic(&self, substance: &Substance) -> bool {
        let by_formula = substance.formula.as_ref().is_some_and(|cited| holds_organic_carbon(&cited.value));
        let by_name = substance.name.as_ref().is_some_and(|cited| self.is_excepted(&cited.value));
        by_formula || by_name
    }

    fn formula_reason(&self, substance: &Substance) -> Option<String> {
        let formula = substance.formula.as_ref()?.value.as_str();
        (self.inorganic_formula && is_inorganic(formula)).then(|| format!("the formula is `{formula}`"))
    }

    fn spread_reason(&self, substance: &Substance) -> Option<String> {
        let allowed = self.log_kow_spread?;
        let readings = substance.readings_of(Property::LogKow);
        let values: Vec<f64> = readings.iter().filter_map(|reading| reading.quantity.single()).collect();
        let lowest = values.iter().copied().min_by(f64::total_cmp)?;
        let highest = values.iter().copied().max_by(f64::total_cmp)?;
        let (low, high) = (format_number(lowest), format_number(highest));
        (highest - lowest > allowed).then(|| format!("the row gives log Kow from {low} to {high}"))
    }

    fn nothing_reason(&self, substance: &Substance) -> Option<String> {
        let types = substance.substance_type.iter().map(|cited| &cited.value).chain(&substance.further_types);
        let tells = types.into_iter().any(|kind| *kind != SubstanceType::Organic);
        let formula = substance.formula.as_ref().is_some_and(|cited| is_inorganic(&cited.value));
        let name = substance.name.as_ref().map(|cited| cited.value.as_str());
        if !self.nothing_to_look_at || tells || formula || name.is_some_and(is_in_latin_letters) {
            return None;
        }
        let reason = name.map_or("it has no name", |_| "its name is not in Latin letters");
        Some(reason.to_owned())
    }

    /// A pKa at which more than 10 % is ionised somewhere in the range of pH.
    fn ionisation_reason(&self, substance: &Substance) -> Option<String> {
        if !self.ionisable {
            return None;
        }
        let (property, reading) = substance.ionising_pka()?;
        Some(format!("the {} is {}", property.title(), reading.quantity.reported))
    }
}

/// Two Latin letters or more in a row, and as many as of other scripts: `DDT`, `α-Pinene`, `PFOSカリウム`.
fn is_in_latin_letters(name: &str) -> bool {
    let is_latin = |letter: &char| {
        letter.is_alphabetic() && (*letter < '\u{250}' || ('\u{1E00}'..'\u{1F00}').contains(letter))
    };
    let latin = name.chars().filter(is_latin).count();
    let letters = name.chars().filter(|letter| letter.is_alphabetic()).count();
    let side_by_side =
        name.chars().zip(name.chars().skip(1)).any(|(one, next)| is_latin(&one) && is_latin(&next));
    side_by_side && 2 * latin >= letters
}

fn row_reason(substance: &Substance) -> String {
    let word = match substance.row_type {
        RowType::NotStated | RowType::Substance => "substance",
        RowType::Mixture => "mixture",
        RowType::Article => "article",
    };
    format!("the row is of the type `{word}`")
}

fn identity_reason(identity: Identity) -> String {
    match identity {
        Identity::Identified => "the row names one substance",
        Identity::RepairedDate => "the CAS number was read back from a date",
        Identity::NameAlone => "the row has a name or a number of its own only",
        Identity::NotIdentified => "the row does not say which one substance it means",
        Identity::BareNumber => "the number was written without its hyphens",
    }
    .to_owned()
}
