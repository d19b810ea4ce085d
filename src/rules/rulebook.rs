//! A rulebook: the criteria of one instrument.

use std::collections::BTreeSet;

use crate::quantity::{Comparison, Date};
use crate::substance::{Basis, CasNumber, DegradationTest, EcNumber, Property};

/// The criteria of one instrument.
#[derive(Debug, Clone, PartialEq)]
pub struct Rulebook {
    /// Name on the command line, kebab-case.
    pub id: String,
    /// Prefix of its columns.
    pub short: String,
    /// Title.
    pub title: String,
    /// The legal text.
    pub source: String,
    /// Date of the text the rulebook follows.
    pub edition: Date,
    /// Never loaded by `all`, only when named.
    pub by_name_only: bool,
    /// `Screening` where the instrument has alternatives that no number can settle.
    pub strongest: Weight,
    /// Cautions that put a substance outside the instrument.
    pub out_of_scope: Vec<String>,
    /// Content in a mixture from which a component counts, %.
    pub mixture_limit: Option<f64>,
    /// BCF of fish with a stated lipid content is compared at this content, %; `None` compares it as reported.
    pub bcf_at_lipid: Option<f64>,
    /// Half-lives are compared at this temperature; `None` compares them as reported.
    pub half_life_at: Option<HalfLifeReference>,
    /// The criteria, in file order.
    pub criteria: Vec<Criterion>,
    /// The designations, in file order.
    pub designations: Vec<Designation>,
    /// Lists of substances.
    pub listings: Vec<Listing>,
    /// What a reader of the instrument should know, shown on the Rulebooks sheet.
    pub note: Option<String>,
}

impl Rulebook {
    /// Every test of its steps and bands, in file order.
    pub fn tests(&self) -> impl Iterator<Item = &Test> {
        self.criteria.iter().flat_map(|criterion| {
            let in_steps = criterion.steps.iter().flat_map(|step| &step.tests);
            in_steps.chain(criterion.bands.iter().map(|band| &band.test))
        })
    }
}

/// The temperature at which half-lives are compared, and how they get there.
#[derive(Debug, Clone, Copy, PartialEq)]
pub struct HalfLifeReference {
    /// °C.
    pub temperature: f64,
    /// Activation energy, kJ/mol.
    pub activation_energy: f64,
    /// The test temperature a half-life without one may have had, °C: it clears only if it would from there.
    pub unstated_temperature: f64,
}

/// The weight of a step.
#[derive(Debug, Clone, Copy, PartialEq, Eq, PartialOrd, Ord, Hash)]
pub enum Weight {
    /// Shown, never decides, never guards.
    Supporting,
    /// Never decides by itself, may stop a clearing.
    Concern,
    /// Decides as `screens in` or `screens out`.
    Screening,
    /// Decides as `fulfilled` or `not fulfilled` where the value is measured.
    Definitive,
}

/// How the tests of a step count together.
#[derive(Debug, Clone, Copy, PartialEq, Eq, PartialOrd, Ord, Hash)]
pub enum Combine {
    /// One fired test fires the step.
    Any,
    /// All tests must fire.
    All,
}

/// In which direction a step may decide.
#[derive(Debug, Clone, Copy, PartialEq, Eq, PartialOrd, Ord, Hash)]
pub enum Decides {
    /// Both ways.
    Both,
    /// Towards concern only.
    In,
    /// Away from concern only.
    Out,
}

/// When a step stops a clearing by any other step of the criterion.
#[derive(Debug, Clone, Copy, PartialEq, Eq, PartialOrd, Ord, Hash)]
pub enum Guards {
    /// It does not.
    Never,
    /// When it fired.
    Fired,
    /// When it fired; left open, it stops screening clears.
    FiredOrOpen,
}

/// What an `any` step needs in order to be clear.
#[derive(Debug, Clone, Copy, PartialEq, Eq, PartialOrd, Ord, Hash)]
pub enum ClearsOn {
    /// Every test that is not optional is clear.
    All,
    /// One test is clear and none is missing data that points the other way.
    Some,
}

/// When a step is taken.
#[derive(Debug, Clone, Copy, PartialEq, Eq, PartialOrd, Ord, Hash)]
pub enum OnlyIf {
    /// Always.
    Always,
    /// Only if no earlier deciding step had any data.
    NoDataBefore,
}

/// How sure it is that a limit stands in the legal text.
#[derive(Debug, Clone, Copy, PartialEq, Eq, PartialOrd, Ord, Hash)]
pub enum Checked {
    /// Read in the text or in a published reproduction of it.
    Seen,
    /// Read in a text that quotes it.
    SecondHand,
    /// From memory: the current text is to be checked before relying on it.
    Memory,
}

impl Checked {
    /// The word in rule files and in the output.
    pub fn word(self) -> &'static str {
        match self {
            Self::Seen => "seen",
            Self::SecondHand => "second-hand",
            Self::Memory => "memory",
        }
    }
}

/// One question of a rulebook.
#[derive(Debug, Clone, PartialEq)]
pub struct Criterion {
    /// `P`, `vP`, ...
    pub id: String,
    /// What it asks.
    pub title: String,
    /// No number settles it: always unresolved, with this sentence.
    pub assess: Option<String>,
    /// Steps in order; empty under `assess` and for bands.
    pub steps: Vec<Step>,
    /// Ratings instead of verdicts; they take no part in designations.
    pub bands: Vec<Band>,
}

/// Tests that count together.
#[derive(Debug, Clone, PartialEq)]
pub struct Step {
    /// Its weight.
    pub weight: Weight,
    /// How its tests count together.
    pub combine: Combine,
    /// In which direction it may decide.
    pub decides: Decides,
    /// When it stops a clearing.
    pub guards: Guards,
    /// What an `any` step needs in order to be clear.
    pub clears_on: ClearsOn,
    /// When it is taken.
    pub only_if: OnlyIf,
    /// Its tests.
    pub tests: Vec<Test>,
}

/// What a test looks at.
#[derive(Debug, Clone, Copy, PartialEq, Eq, PartialOrd, Ord, Hash)]
pub enum Subject {
    /// A number. `half-life-water` and `half-life-sediment` stand for their compartments together.
    Property(Property),
    /// Ready biodegradability, in words.
    ReadyBiodegradability,
    /// Inherent biodegradability by a guideline, in % after days.
    InherentBiodegradability,
    /// Hazard statements.
    HazardStatements,
}

impl Subject {
    /// The name in rule files.
    pub fn id(self) -> &'static str {
        match self {
            Self::Property(property) => property.id(),
            Self::ReadyBiodegradability => "ready-biodegradability",
            Self::InherentBiodegradability => "inherent-biodegradability",
            Self::HazardStatements => "hazard-statements",
        }
    }

    /// How a sentence names it.
    pub fn title(self) -> &'static str {
        match self {
            Self::Property(property) => property.title(),
            Self::ReadyBiodegradability => "ready biodegradability",
            Self::InherentBiodegradability => "inherent biodegradability",
            Self::HazardStatements => "hazard statements",
        }
    }
}

/// What a missing value does.
#[derive(Debug, Clone, Copy, PartialEq, Eq, PartialOrd, Ord, Hash)]
pub enum WhenMissing {
    /// It leaves the test without an answer.
    Open,
    /// It fires, because the instrument says so.
    Fires,
}

/// The limit of a test, in the canonical unit of its property.
#[derive(Debug, Clone, PartialEq)]
pub enum Limit {
    /// A number and how it is worded.
    Number {
        /// The wording.
        comparison: Comparison,
        /// The number.
        value: f64,
    },
    /// From `low` to below `high`.
    Between {
        /// Lowest value that counts.
        low: f64,
        /// Lowest value that counts no more.
        high: f64,
    },
    /// Any of these statement codes, each with its family.
    AnyOfWords(Vec<String>),
    /// This result of a degradation test.
    Is(DegradationTest),
}

/// One property against one limit.
#[derive(Debug, Clone, PartialEq)]
pub struct Test {
    /// What it looks at.
    pub subject: Subject,
    /// Which bases count.
    pub bases: BTreeSet<Basis>,
    /// The limit.
    pub limit: Limit,
    /// The limit as the rule file writes it, for sentences: `2000 L/kg`.
    pub limit_text: String,
    /// Below this the test is clear; between it and the limit it is undecided.
    pub clear_below: Option<f64>,
    /// The guideline an inherent test must follow.
    pub guideline: Option<String>,
    /// Days within which an inherent test must reach its level.
    pub within: Option<f64>,
    /// Its absence does not keep a step from being clear.
    pub optional: bool,
    /// What a missing value does.
    pub missing: WhenMissing,
    /// Paragraph of the legal text.
    pub source: String,
    /// How sure the limit is.
    pub checked: Checked,
    /// What a reader should know about it.
    pub note: Option<String>,
}

/// A rating: the first property with data decides.
#[derive(Debug, Clone, PartialEq)]
pub struct Band {
    /// What the cell says, for example `rating 3`.
    pub rating: String,
    /// The range that gives it.
    pub test: Test,
}

/// A part of a designation.
#[derive(Debug, Clone, Copy, PartialEq, Eq, PartialOrd, Ord, Hash)]
pub enum DesignationPart {
    /// Index into the rulebook's criteria.
    Criterion(usize),
    /// Index into the rulebook's designations; never circular.
    Designation(usize),
}

/// Criteria or other designations combined.
#[derive(Debug, Clone, PartialEq, Eq)]
pub struct Designation {
    /// `PBT`, `vPvB`, ...
    pub id: String,
    /// What it means.
    pub title: String,
    /// All or any of the parts.
    pub combine: Combine,
    /// The parts, in file order.
    pub parts: Vec<DesignationPart>,
    /// Hazard statements that say so.
    pub stated_by: Vec<String>,
}

/// A list of substances by number.
#[derive(Debug, Clone, PartialEq, Eq)]
pub struct Listing {
    /// Title of the list.
    pub title: String,
    /// Where it was published.
    pub source: String,
    /// Its date.
    pub date: Date,
    /// Its substances.
    pub entries: Vec<ListingEntry>,
}

/// One number of a list.
#[derive(Debug, Clone, Copy, PartialEq, Eq, PartialOrd, Ord, Hash)]
pub enum ListingEntry {
    /// By CAS number.
    Cas(CasNumber),
    /// By EC number.
    Ec(EcNumber),
}
