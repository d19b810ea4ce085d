//! The words of every fault of a rule file: what is wrong, beside the text, and what to write instead.

use super::RuleMistake;

impl RuleMistake {
    /// What is wrong, in a sentence.
    pub(super) fn message(&self) -> String {
        match self {
            Self::Unreadable { reason } => format!("the file cannot be read: {reason}"),
            Self::NoSuchFile => "there is no such file or folder".into(),
            Self::NotUtf8 { line } => format!("line {line} is not UTF-8 text"),
            Self::NoRulebooks => "the folder holds no rulebook".into(),
            Self::Syntax { reason } => format!("this is not TOML: {reason}"),
            Self::UnknownKey { key, table, .. } => format!("{table} has no key `{key}`"),
            Self::MissingKey { example, table } => {
                format!("{table} needs `{}`", key_of(example))
            }
            Self::WrongKind { key, wanted, found } => format!("`{key}` takes {wanted}, not {found}"),
            Self::EmptyText { key } => format!("`{key}` is empty"),
            Self::EmptyList { key } => format!("`{key}` is an empty list"),
            Self::UnknownWord { key, found, .. } => format!("`{found}` is not a word for `{key}`"),
            Self::NotKebabCase { found } => format!("`{found}` cannot be used as a name on the command line"),
            Self::NotADay { found } => format!("`{found}` is not a day of the calendar"),
            Self::NoUnit { number, property, .. } => {
                format!("`{number}` has no unit, and {property} needs one")
            }
            Self::WrongUnit { found, property, .. } => {
                format!("the unit in `{found}` does not measure {property}")
            }
            Self::NotAQuantity { found, property, .. } => format!("`{found}` is not a limit for {property}"),
            Self::Impossible { found, property } => format!("{property} cannot be {found}"),
            Self::NoLimit { .. } => "the test has no limit".into(),
            Self::SeveralLimits { keys } => {
                format!("the test has {} limits: `{}`", keys.len(), keys.join("`, `"))
            }
            Self::LimitDoesNotFit { key, property, .. } => {
                format!("{property} cannot be compared with `{key}`")
            }
            Self::OutOfPlace { key, .. } => format!("`{key}` has no meaning here"),
            Self::ReversedRange => "the range ends below its start".into(),
            Self::ClearBelowContradicts { limit, clear_below } => {
                format!("`clear-below` {clear_below} does not lie below the limit {limit}")
            }
            Self::NotAHazardCode { found } => format!("`{found}` is not a hazard statement code"),
            Self::NotANumberOfASubstance { found, reason } => format!("`{found}`: {reason}"),
            Self::EmptyCriterion { criterion } => format!("criterion `{criterion}` asks nothing"),
            Self::MixedCriterion { criterion } => {
                format!("criterion `{criterion}` is answered in more than one manner")
            }
            Self::EmptyStep => "the step has no test".into(),
            Self::NoCombine => "the step does not say how its tests count together".into(),
            Self::NoCriteria => "the rulebook has no criterion".into(),
            Self::DuplicateName { name, first, line } => {
                format!("`{name}` is already the name of the {} on line {line}", first.word())
            }
            Self::NameTaken { key, name, other } => format!("`{key}` `{name}` is already taken by {other}"),
            Self::UnknownPart { found, .. } => {
                format!("`{found}` is neither a criterion nor a designation of this rulebook")
            }
            Self::BandedPart { criterion } => {
                format!("`{criterion}` gives ratings, which cannot be part of a designation")
            }
            Self::Circular { path } => {
                format!("the designation goes round in a circle: {}", path.join(" -> "))
            }
            Self::AllOrAny => "a designation needs either `all-of` or `any-of`".into(),
            Self::BadPattern { reason } => format!("the pattern is not a regular expression: {reason}"),
            Self::NoTrigger { caution } => format!("nothing can raise the caution `{caution}`"),
            Self::NoDefaultSd => "there is no standard deviation for all other properties".into(),
        }
    }

    /// The few words under the offending text.
    pub(super) fn label(&self) -> String {
        match self {
            Self::Syntax { .. } => "here".into(),
            Self::UnknownKey { .. } | Self::UnknownWord { .. } | Self::UnknownPart { .. } => {
                "not known".into()
            }
            Self::MissingKey { example, .. } => format!("without `{}`", key_of(example)),
            Self::WrongKind { found, .. } => format!("this is {found}"),
            Self::EmptyText { .. } | Self::EmptyList { .. } => "empty".into(),
            Self::NotKebabCase { .. } => "not in kebab-case".into(),
            Self::NotADay { .. } => "no such day".into(),
            Self::NoUnit { .. } => "no unit".into(),
            Self::WrongUnit { .. } => "another kind of unit".into(),
            Self::NotAQuantity { .. } => "not one number with its unit".into(),
            Self::Impossible { .. } => "impossible".into(),
            Self::NoLimit { .. } => "without a limit".into(),
            Self::SeveralLimits { .. } => "one limit too many".into(),
            Self::LimitDoesNotFit { .. } => "does not fit the property".into(),
            Self::OutOfPlace { .. } => "out of place".into(),
            Self::ReversedRange => "wrong way round".into(),
            Self::ClearBelowContradicts { .. } => "contradicts the limit".into(),
            Self::NotAHazardCode { .. } => "not a code".into(),
            Self::NotANumberOfASubstance { .. } => "not a number of a substance".into(),
            Self::EmptyCriterion { .. } | Self::EmptyStep => "nothing to answer".into(),
            Self::MixedCriterion { .. } => "answered twice".into(),
            Self::NoCombine => "`any` or `all`?".into(),
            Self::NoCriteria => "nothing to ask".into(),
            Self::DuplicateName { .. } | Self::NameTaken { .. } => "taken".into(),
            Self::BandedPart { .. } => "gives ratings".into(),
            Self::Circular { .. } => "leads back to itself".into(),
            Self::AllOrAny => "one of the two".into(),
            Self::BadPattern { .. } => "cannot be used".into(),
            Self::NoTrigger { .. } => "never raised".into(),
            Self::NoDefaultSd => "the last of these lacks `property = \"any\"`".into(),
            Self::Unreadable { .. } | Self::NoSuchFile | Self::NotUtf8 { .. } | Self::NoRulebooks => {
                String::new()
            }
        }
    }

    /// What to write instead.
    pub(super) fn help(&self) -> String {
        match self {
            Self::Unreadable { .. } => "check who may read it, and that it is a file".into(),
            Self::NoSuchFile => "check the path".into(),
            Self::NotUtf8 { .. } => "save the file again with the encoding UTF-8".into(),
            Self::NoRulebooks => {
                "a rulebook is a file that ends in .toml and starts with `[rulebook]`".into()
            }
            Self::Syntax { .. } => {
                "a line is `key = value`, `[table]` or `[[table]]`; text stands in quotes".into()
            }
            Self::UnknownKey { nearest: Some(nearest), .. } => format!("did you mean `{nearest}`?"),
            Self::UnknownKey { nearest: None, known, .. } => format!("it may have {}", listed(known)),
            Self::MissingKey { example, .. } => format!("add, for example, `{example}`"),
            Self::WrongKind { wanted, .. } => format!("write {wanted}"),
            Self::EmptyText { .. } => "write the text, or leave the key out where it is not needed".into(),
            Self::EmptyList { .. } => "name at least one, or leave the key out where it is not needed".into(),
            Self::UnknownWord { nearest: Some(nearest), .. }
            | Self::UnknownPart { nearest: Some(nearest), .. } => {
                format!("did you mean `{nearest}`?")
            }
            Self::UnknownWord { nearest: None, known, .. }
            | Self::UnknownPart { nearest: None, known, .. } => {
                format!("it may be {}", listed(known))
            }
            Self::NotKebabCase { .. } => {
                "use small letters, digits and hyphens, a letter first: `eu-reach-pbt`".into()
            }
            Self::NotADay { .. } => "write year, month and day without quotes, for example 2023-03-31".into(),
            Self::NoUnit { number, unit, .. } => format!("write the unit, in quotes: \"{number} {unit}\""),
            Self::WrongUnit { unit, .. } => format!("use a unit such as {unit}"),
            Self::NotAQuantity { unit, .. } => {
                format!("write one number and its unit, for example \"{}\"", example(unit))
            }
            Self::Impossible { .. } => "check the sign and the decimal point".into(),
            Self::NoLimit { example } => format!("add the limit, for example `{example}`"),
            Self::SeveralLimits { .. } => {
                "keep one; a second limit is a second test, a range is `between = [low, high]`".into()
            }
            Self::LimitDoesNotFit { example, .. } => format!("write, for example, `{example}`"),
            Self::OutOfPlace { belongs, .. } => format!("it belongs {belongs}; take it out here"),
            Self::ReversedRange => "write the low end first".into(),
            Self::ClearBelowContradicts { .. } => {
                "between the two a value is undecided, so it must be below the limit".into()
            }
            Self::NotAHazardCode { .. } => {
                "write the code alone, such as \"H350\" or \"EUH440\"; H360 covers H360FD".into()
            }
            Self::NotANumberOfASubstance { .. } => {
                "check the number against the list it was taken from".into()
            }
            Self::EmptyCriterion { .. } => {
                "add `[[criterion.step]]`, `[[criterion.band]]`, or `assess = \"...\"`".into()
            }
            Self::MixedCriterion { .. } => {
                "keep one: steps for a verdict, bands for a rating, `assess` for no number".into()
            }
            Self::EmptyStep => "add `[[criterion.step.test]]` below it, or take the step out".into(),
            Self::NoCombine => {
                "add `combine = \"any\"` if one test is enough, `combine = \"all\"` if all must be met".into()
            }
            Self::NoCriteria => "add `[[criterion]]` with its steps".into(),
            Self::DuplicateName { .. } => {
                "give each criterion, designation, caution and relation a name of its own".into()
            }
            Self::NameTaken { .. } => "change it, or select only one of the two files".into(),
            Self::BandedPart { .. } => "name a criterion that has steps".into(),
            Self::Circular { .. } => "let the chain end at criteria".into(),
            Self::AllOrAny => "keep `all-of` if every part is needed, `any-of` if one is enough".into(),
            Self::BadPattern { .. } => {
                "use single quotes, and a backslash before ( ) [ ] . + * ? meant as such".into()
            }
            Self::NoTrigger { .. } => {
                "add `name-patterns`, `substance-types` or another key that raises it".into()
            }
            Self::NoDefaultSd => "end with a `[[default-sd]]` of `property = \"any\"` without `basis`".into(),
        }
    }
}

fn key_of(example: &str) -> &str {
    example.split(" = ").next().unwrap_or(example)
}

fn example(unit: &str) -> String {
    format!("40 {unit}").trim_end().to_owned()
}

/// Words in backquotes: `a`, `b` or `c`.
fn listed<Word: AsRef<str>>(words: &[Word]) -> String {
    let quoted: Vec<String> = words.iter().map(|word| format!("`{}`", word.as_ref())).collect();
    match quoted.split_last() {
        Some((last, [])) => last.clone(),
        Some((last, rest)) => format!("{} or {last}", rest.join(", ")),
        None => "nothing".into(),
    }
}
