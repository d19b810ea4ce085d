//! The words of `rules/columns.toml`: concepts by language, and fields as combinations of concepts.

use std::collections::{BTreeMap, BTreeSet};

use serde::Deserialize;

use super::header::header_words;
use crate::fault::nearest;
use crate::substance::Field;

/// What headers are recognised by.
#[derive(Debug, Clone)]
pub struct ColumnWords {
    pub(super) concepts: Vec<Concept>,
    pub(super) rules: Vec<FieldRule>,
    pub(super) never: ConceptSet,
    pub(super) not_a_value: ConceptSet,
}

/// Places in [`ColumnWords::concepts`].
pub(super) type ConceptSet = BTreeSet<usize>;

/// A thing that headers speak of.
#[derive(Debug, Clone)]
pub(super) struct Concept {
    pub(super) id: String,
    pub(super) phrases: Vec<Phrase>,
}

/// Words that stand one after the other.
#[derive(Debug, Clone, PartialEq, Eq)]
pub(super) struct Phrase(Vec<WordPattern>);

/// A word, with `*` at either end for any letters and within for any letters between.
#[derive(Debug, Clone, PartialEq, Eq)]
struct WordPattern {
    parts: Vec<String>,
}

/// One way of naming a field.
#[derive(Debug, Clone)]
pub(super) struct FieldRule {
    pub(super) field: Field,
    pub(super) needs: ConceptSet,
    pub(super) without: ConceptSet,
}

#[derive(Deserialize)]
#[serde(deny_unknown_fields, rename_all = "kebab-case")]
struct File {
    #[serde(default)]
    never: Vec<String>,
    #[serde(default)]
    not_a_value: Vec<String>,
    concept: Vec<FileConcept>,
    field: Vec<FileField>,
}

#[derive(Deserialize)]
#[serde(deny_unknown_fields, rename_all = "kebab-case")]
struct FileConcept {
    id: String,
    words: BTreeMap<String, Vec<String>>,
}

#[derive(Deserialize)]
#[serde(deny_unknown_fields, rename_all = "kebab-case")]
struct FileField {
    id: String,
    needs: Vec<String>,
    #[serde(default)]
    without: Vec<String>,
}

/// The text of the built-in file, for export and the Run record.
pub const BUILT_IN_COLUMN_WORDS: &str = include_str!("../../rules/columns.toml");

impl ColumnWords {
    /// The words that come with the program.
    pub fn built_in() -> Result<Self, String> {
        Self::load(BUILT_IN_COLUMN_WORDS)
    }

    /// The words of a file; what is wrong with it in words.
    pub fn load(text: &str) -> Result<Self, String> {
        let file: File = toml::from_str(text).map_err(|error| error.to_string())?;
        let mut places = BTreeMap::new();
        let mut concepts = Vec::new();
        for concept in file.concept {
            if places.insert(concept.id.clone(), concepts.len()).is_some() {
                return Err(format!("the concept `{}` stands twice; put its words together", concept.id));
            }
            concepts.push(Concept::new(concept)?);
        }
        let set =
            |ids: &[String]| ids.iter().map(|id| place_of(&places, id)).collect::<Result<ConceptSet, _>>();
        let mut rules = Vec::new();
        for field in &file.field {
            if field.needs.is_empty() {
                return Err(format!("the field `{}` needs no concept; name at least one", field.id));
            }
            let known = Field::from_id(&field.id).ok_or_else(|| unknown_field(&field.id))?;
            rules.push(FieldRule { field: known, needs: set(&field.needs)?, without: set(&field.without)? });
        }
        Ok(Self { concepts, rules, never: set(&file.never)?, not_a_value: set(&file.not_a_value)? })
    }

    /// Every word of every phrase, for the nearest one to a word that is not known.
    pub(super) fn all_words(&self) -> impl Iterator<Item = &str> {
        self.concepts
            .iter()
            .flat_map(|concept| &concept.phrases)
            .flat_map(|phrase| &phrase.0)
            .filter_map(|word| word.parts.iter().find(|part| part.len() >= 3).map(String::as_str))
    }
}

fn place_of(places: &BTreeMap<String, usize>, id: &str) -> Result<usize, String> {
    places.get(id).copied().ok_or_else(|| {
        let hint = nearest(id, places.keys().map(String::as_str));
        with_hint(&format!("there is no concept `{id}`"), hint)
    })
}

/// The message for a field name that does not exist.
pub(super) fn unknown_field(id: &str) -> String {
    with_hint(&format!("there is no field `{id}`"), nearest(id, Field::all().map(Field::id)))
}

fn with_hint(message: &str, nearest: Option<&str>) -> String {
    nearest.map_or_else(|| message.to_owned(), |word| format!("{message}; did you mean `{word}`?"))
}

impl Concept {
    fn new(concept: FileConcept) -> Result<Self, String> {
        let phrases: Vec<Phrase> = concept.words.values().flatten().map(|words| Phrase::new(words)).collect();
        if phrases.iter().any(|phrase| phrase.0.is_empty()) {
            return Err(format!("the concept `{}` has a word without letters", concept.id));
        }
        Ok(Self { id: concept.id, phrases })
    }
}

impl Phrase {
    fn new(words: &str) -> Self {
        let patterns = words.split_whitespace().map(WordPattern::new);
        Self(patterns.filter(|pattern| pattern.parts.iter().any(|part| !part.is_empty())).collect())
    }

    /// How many words of a header the phrase covers from a place on; none if it does not stand there.
    pub(super) fn length_at(&self, words: &[String], start: usize) -> Option<usize> {
        let here = words.get(start..start + self.0.len())?;
        let fits = self.0.iter().zip(here).all(|(pattern, word)| pattern.fits(word));
        fits.then_some(self.0.len())
    }
}

impl WordPattern {
    fn new(word: &str) -> Self {
        let fold = |part: &str| header_words(part).concat();
        Self { parts: word.split('*').map(fold).collect() }
    }

    fn fits(&self, word: &str) -> bool {
        let [first, middle @ .., last] = self.parts.as_slice() else {
            return self.parts.first().is_some_and(|only| only == word);
        };
        let Some(inner) = word.strip_prefix(first.as_str()).and_then(|rest| rest.strip_suffix(last.as_str()))
        else {
            return false;
        };
        let mut rest = inner;
        middle.iter().all(|part| match rest.find(part.as_str()) {
            Some(position) => {
                rest = rest.get(position + part.len()..).unwrap_or_default();
                true
            }
            None => false,
        })
    }
}

#[cfg(test)]
mod tests {
    use super::{ColumnWords, Phrase};

    fn words(text: &str) -> Vec<String> {
        text.split(' ').map(str::to_owned).collect()
    }

    #[test]
    fn stars_stand_for_any_letters() {
        for (pattern, word, fits) in [
            ("*solubility", "watersolubility", true),
            ("*solubility", "solubility", true),
            ("boden*", "bodenhalbwertszeit", true),
            ("*halbwertszeit*", "bodenhalbwertszeit", true),
            ("cas*number", "casnumber", true),
            ("cas", "case", false),
            ("*oktanol*wasser*", "noktanolwasserkoeffizient", true),
        ] {
            assert_eq!(Phrase::new(pattern).length_at(&words(word), 0).is_some(), fits, "{pattern} {word}");
        }
        assert_eq!(Phrase::new("half life").length_at(&words("soil half life"), 1), Some(2));
    }

    #[test]
    fn a_file_that_means_nothing_is_refused_with_the_nearest_word() {
        let concept = "[[concept]]\nid = \"soil\"\nwords.en = [\"soil\"]\n";
        for (field, message) in [
            (
                "id = \"half-life-soul\"\nneeds = [\"soil\"]",
                "there is no field `half-life-soul`; did you mean `half-life-soil`?",
            ),
            (
                "id = \"half-life-soil\"\nneeds = [\"soill\"]",
                "there is no concept `soill`; did you mean `soil`?",
            ),
            (
                "id = \"half-life-soil\"\nneeds = []",
                "the field `half-life-soil` needs no concept; name at least one",
            ),
        ] {
            let text = format!("{concept}[[field]]\n{field}\n");
            assert_eq!(ColumnWords::load(&text).unwrap_err(), message);
        }
        assert!(ColumnWords::load("[[concepts]]").is_err());
    }

    #[test]
    fn the_built_in_words_are_valid() {
        assert!(ColumnWords::built_in().is_ok());
    }
}
