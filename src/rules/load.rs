//! Which rule files a run takes, and the rule set they make together.
//!
//! A choice is the id of a built-in rulebook, `all`, a file or a folder. What the files mean is for `validate`.

use std::path::Path;

use super::built_in::{BUILT_IN, CAUTIONS, RELATIONS};
use super::file::RuleSource;
use super::folder::{CAUTIONS_FILE, RELATIONS_FILE, rulebook_files};
use super::validate::{read_cautions, read_rulebook};
use super::{Caution, RuleSet, RuleText, Rulebook};
use crate::fault::{Refusal, RuleFault, RuleFaults, RuleMistake, unknown_rulebook};
use crate::relations::read_relations;

/// The rule files of a run, not read yet for what they mean.
#[derive(Debug, Clone, PartialEq, Eq)]
pub struct RuleSources {
    /// The rulebooks, in the order of their columns.
    pub rulebooks: Vec<RuleSource>,
    /// The cautions.
    pub cautions: RuleSource,
    /// The relations.
    pub relations: RuleSource,
}

impl RuleSources {
    /// The built-in cautions and relations, and no rulebook yet.
    pub(super) fn without_rulebooks() -> Self {
        Self {
            rulebooks: Vec::new(),
            cautions: RuleSource::built_in("cautions", CAUTIONS),
            relations: RuleSource::built_in("relations", RELATIONS),
        }
    }

    /// The files that the choices of a command line mean; none chosen is every built-in rulebook.
    ///
    /// A folder stands for its rulebooks (its own and those in its `rulebooks` folder, by file name), and its
    /// `cautions.toml` and `relations.toml` take the place of the built-in ones.
    pub fn chosen(choices: &[String]) -> Result<Self, Refusal> {
        let mut sources = Self::without_rulebooks();
        let mut faults = Vec::new();
        if choices.is_empty() {
            sources.add_all_built_in()?;
        }
        for choice in choices {
            let path = Path::new(choice);
            if let Some((id, text)) = BUILT_IN.iter().find(|(id, _)| id == choice) {
                sources.add(RuleSource::built_in(id, text));
            } else if choice == "all" {
                sources.add_all_built_in()?;
            } else if path.is_dir() {
                faults.extend(sources.add_folder(path).err().map_or_else(Vec::new, |found| found.0));
            } else if path.exists() || looks_like_a_path(choice) {
                match RuleSource::read(path) {
                    Ok(source) => sources.add(source),
                    Err(found) => faults.extend(found.0),
                }
            } else {
                return Err(unknown_rulebook(choice, &BUILT_IN.map(|(id, _)| id)));
            }
        }
        if faults.is_empty() { Ok(sources) } else { Err(RuleFaults(faults).into()) }
    }

    /// Adds a rulebook unless the same file is there already.
    pub(super) fn add(&mut self, source: RuleSource) {
        if !self.rulebooks.iter().any(|present| present.name == source.name) {
            self.rulebooks.push(source);
        }
    }

    fn add_all_built_in(&mut self) -> Result<(), RuleFaults> {
        for (id, text) in BUILT_IN {
            self.add_unless_by_name_only(RuleSource::built_in(id, text))?;
        }
        Ok(())
    }

    fn add_unless_by_name_only(&mut self, source: RuleSource) -> Result<(), RuleFaults> {
        let head = source.build(|file| {
            let head = file.section("rulebook", "[rulebook]")?;
            Some(head.flag("by-name-only"))
        });
        if head? {
            return Ok(());
        }
        self.add(source);
        Ok(())
    }

    pub(super) fn add_folder(&mut self, folder: &Path) -> Result<(), RuleFaults> {
        let files = rulebook_files(folder)?;
        for file in files {
            self.add(RuleSource::read(&file)?);
        }
        for (name, source) in [(CAUTIONS_FILE, &mut self.cautions), (RELATIONS_FILE, &mut self.relations)] {
            let path = folder.join(name);
            if path.is_file() {
                *source = RuleSource::read(&path)?;
            }
        }
        Ok(())
    }

    /// Reads all files; nothing is given if any of them has a fault.
    pub fn load(&self) -> Result<RuleSet, RuleFaults> {
        let mut faults = Vec::new();
        let mut keep = |found: RuleFaults| faults.extend(found.0);
        let cautions = read_cautions(&self.cautions).map_err(&mut keep).ok();
        let relations = read_relations(&self.relations).map_err(&mut keep).ok();
        let rulebooks = self.read_rulebooks(cautions.as_deref()).map_err(&mut keep).ok();
        match (rulebooks, cautions, relations) {
            (Some(rulebooks), Some(cautions), Some(relations)) => {
                Ok(RuleSet { rulebooks, cautions, relations, texts: self.texts() })
            }
            (None | Some(_), None | Some(_), None | Some(_)) => Err(RuleFaults(faults)),
        }
    }

    /// The checked rulebooks. Without sound cautions of the run, `out-of-scope` is held against the built-in ones.
    fn read_rulebooks(&self, cautions: Option<&[Caution]>) -> Result<Vec<Rulebook>, RuleFaults> {
        let built_in;
        let cautions = if let Some(cautions) = cautions {
            cautions
        } else {
            built_in = read_cautions(&RuleSource::built_in("cautions", CAUTIONS))?;
            built_in.as_slice()
        };
        let ids: Vec<&str> = cautions.iter().map(|caution| caution.id.as_str()).collect();
        let mut faults = Vec::new();
        let mut rulebooks: Vec<Rulebook> = Vec::new();
        let mut owners: Vec<&str> = Vec::new();
        for source in &self.rulebooks {
            match read_rulebook(source, &ids) {
                Ok(rulebook) => {
                    faults.extend(taken_names(source, &rulebook, &rulebooks, &owners));
                    rulebooks.push(rulebook);
                    owners.push(&source.name);
                }
                Err(found) => faults.extend(found.0),
            }
        }
        if faults.is_empty() { Ok(rulebooks) } else { Err(RuleFaults(faults)) }
    }

    fn texts(&self) -> Vec<RuleText> {
        self.rulebooks
            .iter()
            .chain([&self.cautions, &self.relations])
            .map(|source| RuleText { name: source.short_name(), text: source.text.to_string() })
            .collect()
    }
}

/// The rule set that the choices of a command line mean; see [`RuleSources::chosen`].
pub fn load_rule_set(choices: &[String]) -> Result<RuleSet, Refusal> {
    Ok(RuleSources::chosen(choices)?.load()?)
}

/// The ids and shorts of a rulebook that another one of the run bears.
fn taken_names(
    source: &RuleSource,
    rulebook: &Rulebook,
    earlier: &[Rulebook],
    owners: &[&str],
) -> Vec<RuleFault> {
    let mut faults = Vec::new();
    for (other, owner) in earlier.iter().zip(owners) {
        let names = [
            ("id", &rulebook.id, other.id == rulebook.id),
            ("short", &rulebook.short, other.short == rulebook.short),
        ];
        for (key, name, is_taken) in names {
            if is_taken {
                let mistake = RuleMistake::NameTaken { key, name: name.clone(), other: (*owner).to_owned() };
                faults.push(source.fault_at_head(key, mistake));
            }
        }
    }
    faults
}

fn looks_like_a_path(choice: &str) -> bool {
    let is_toml =
        Path::new(choice).extension().is_some_and(|extension| extension.eq_ignore_ascii_case("toml"));
    is_toml || choice.contains(['/', '\\'])
}
