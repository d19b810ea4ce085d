//! The words of `rules/columns.toml`: concepts by language, and fields as combinations of concepts.

use std::collections::{BTreeMap, BTreeSet};

use serde::Deserialize;

use super::phrase::{KnownPart, Phrase, PhraseIndex};
use crate::fault::nearest;
use crate::substance::Field;

/// What headers are recognised by.
#[derive(Debug, Clone)]
pub struct ColumnWords {
    pub(super) concepts: Vec<Concept>,
    pub(super) rules: Vec<FieldRule>,
    pub(super) never: ConceptSet,
    pub(super) not_a_value: ConceptSet,
    pub(super) never_a_value: ConceptSet,
    pub(super) conditions: ConceptSet,
    pub(super) index: PhraseIndex,
}

/// Places in [`ColumnWords::concepts`].
pub(super) type ConceptSet = BTreeSet<usize>;

/// A thing that headers speak of.
#[derive(Debug, Clone)]
pub(super) struct Concept {
    pub(super) id: String,
    pub(super) phrases: Vec<Phrase>,
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
    #[serde(default)]
    never_a_value: Vec<String>,
    #[serde(default)]
    conditions: Vec<String>,
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
        let mut index = PhraseIndex::default();
        for (place, concept) in concepts.iter().enumerate() {
            concept.phrases.iter().for_each(|phrase| index.add(place, phrase));
        }
        Ok(Self {
            rules,
            never: set(&file.never)?,
            not_a_value: set(&file.not_a_value)?,
            never_a_value: set(&file.never_a_value)?,
            conditions: set(&file.conditions)?,
            concepts,
            index,
        })
    }

    /// The place of a concept.
    pub(super) fn concept(&self, id: &str) -> Option<usize> {
        self.concepts.iter().position(|concept| concept.id == id)
    }

    /// Every part of every word, for the nearest one to a word that is not known.
    pub(super) fn known_parts(&self) -> impl Iterator<Item = (usize, KnownPart<'_>)> {
        self.concepts.iter().enumerate().flat_map(|(place, concept)| {
            concept.phrases.iter().flat_map(Phrase::parts).map(move |part| (place, part))
        })
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
        if phrases.iter().any(Phrase::is_empty) {
            return Err(format!("the concept `{}` has a word without letters", concept.id));
        }
        Ok(Self { id: concept.id, phrases })
    }
}

#[cfg(test)]
mod tests {
    use super::ColumnWords;

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
