//! What can be wrong with a rule file, as data.

/// A fault of meaning or form in a rule file.
#[derive(Debug, Clone, PartialEq, Eq)]
pub enum RuleMistake {
    /// The file cannot be read.
    Unreadable {
        /// What the system says.
        reason: String,
    },
    /// There is no file of that name.
    NoSuchFile,
    /// The bytes are not UTF-8.
    NotUtf8 {
        /// The line of the first wrong byte, counted from 1.
        line: usize,
    },
    /// A folder without a rulebook in it.
    NoRulebooks,
    /// Not TOML.
    Syntax {
        /// What the TOML parser says.
        reason: String,
    },
    /// A key that does not belong here.
    UnknownKey {
        /// The key.
        key: String,
        /// The table it stands in.
        table: &'static str,
        /// The known key it was probably meant to be.
        nearest: Option<&'static str>,
        /// The known keys.
        known: Vec<&'static str>,
    },
    /// A key that is needed and absent.
    MissingKey {
        /// The key with an example of its value.
        example: &'static str,
        /// The table it is missing from.
        table: &'static str,
    },
    /// A value of another kind than the key takes.
    WrongKind {
        /// The key.
        key: String,
        /// What it takes.
        wanted: &'static str,
        /// What stands there.
        found: &'static str,
    },
    /// An empty text.
    EmptyText {
        /// The key.
        key: String,
    },
    /// An empty list.
    EmptyList {
        /// The key.
        key: String,
    },
    /// A word that is not one of those the key takes.
    UnknownWord {
        /// The key.
        key: String,
        /// The word.
        found: String,
        /// The word it was probably meant to be.
        nearest: Option<String>,
        /// The words the key takes.
        known: Vec<String>,
    },
    /// A name that is not kebab-case.
    NotKebabCase {
        /// The name.
        found: String,
    },
    /// A day the calendar does not have, or a time beside it.
    NotADay {
        /// The text.
        found: String,
    },
    /// A number without the unit its property needs.
    NoUnit {
        /// The number as written.
        number: String,
        /// The property.
        property: &'static str,
        /// A unit that measures it.
        unit: &'static str,
    },
    /// A unit that does not measure the property.
    WrongUnit {
        /// The text.
        found: String,
        /// The property.
        property: &'static str,
        /// A unit that measures it.
        unit: &'static str,
    },
    /// A text that is no number with a unit.
    NotAQuantity {
        /// The text.
        found: String,
        /// The property.
        property: &'static str,
        /// A unit that measures it.
        unit: &'static str,
    },
    /// A number the property cannot have: infinite, negative, over 100 %.
    Impossible {
        /// The number as written.
        found: String,
        /// The property.
        property: &'static str,
    },
    /// A test without a limit.
    NoLimit {
        /// How a limit for the property is written.
        example: &'static str,
    },
    /// A test with more than one limit.
    SeveralLimits {
        /// The keys, in order.
        keys: Vec<&'static str>,
    },
    /// A limit of a kind that the property cannot be held against.
    LimitDoesNotFit {
        /// The key of the limit.
        key: &'static str,
        /// The property.
        property: &'static str,
        /// How a limit for the property is written.
        example: &'static str,
    },
    /// A key that belongs to other tests or steps.
    OutOfPlace {
        /// The key.
        key: &'static str,
        /// Where it belongs.
        belongs: &'static str,
    },
    /// The ends of a range are the wrong way round.
    ReversedRange,
    /// `clear-below` is not below the limit.
    ClearBelowContradicts {
        /// The limit as written.
        limit: String,
        /// `clear-below` as written.
        clear_below: String,
    },
    /// Not a hazard statement code.
    NotAHazardCode {
        /// The text.
        found: String,
    },
    /// Not a CAS or EC number.
    NotANumberOfASubstance {
        /// The text.
        found: String,
        /// Why.
        reason: String,
    },
    /// A criterion without steps, bands or `assess`.
    EmptyCriterion {
        /// Its name.
        criterion: String,
    },
    /// A criterion with two of steps, bands and `assess`.
    MixedCriterion {
        /// Its name.
        criterion: String,
    },
    /// A step without tests.
    EmptyStep,
    /// Several tests and no word on how they count together.
    NoCombine,
    /// A rulebook without criteria.
    NoCriteria,
    /// A name used twice in one file.
    DuplicateName {
        /// The name.
        name: String,
        /// What bears it already.
        first: OwnerKind,
        /// On which line, counted from 1.
        line: usize,
    },
    /// A name that another rulebook of the run bears.
    NameTaken {
        /// The key, `id` or `short`.
        key: &'static str,
        /// The name.
        name: String,
        /// The file that bears it.
        other: String,
    },
    /// A designation that names nothing known.
    UnknownPart {
        /// The name.
        found: String,
        /// The name it was probably meant to be.
        nearest: Option<String>,
        /// The names of the rulebook.
        known: Vec<String>,
    },
    /// A designation names a criterion that gives ratings.
    BandedPart {
        /// The criterion.
        criterion: String,
    },
    /// A designation names itself, directly or through others.
    Circular {
        /// The way back to itself.
        path: Vec<String>,
    },
    /// A designation with neither or both of `all-of` and `any-of`.
    AllOrAny,
    /// A pattern that is no regular expression.
    BadPattern {
        /// Why.
        reason: String,
    },
    /// A caution that nothing can raise.
    NoTrigger {
        /// Its name.
        caution: String,
    },
    /// No default standard deviation for a property that has no line of its own.
    NoDefaultSd,
}

/// What bears a name in a rule file.
#[derive(Debug, Clone, Copy, PartialEq, Eq)]
pub enum OwnerKind {
    /// A criterion.
    Criterion,
    /// A designation.
    Designation,
    /// A caution.
    Caution,
    /// A relation.
    Relation,
}

impl OwnerKind {
    /// The word in a sentence.
    pub fn word(self) -> &'static str {
        match self {
            Self::Criterion => "criterion",
            Self::Designation => "designation",
            Self::Caution => "caution",
            Self::Relation => "relation",
        }
    }
}
