//! Which rule files a run takes, and the rule set they make together.
//!
//! A choice is the id of a built-in rulebook, `all`, a file or a folder. What the files mean is for `validate`.

use std::path::{Path, PathBuf};

use super::file::RuleSource;
use super::validate::{read_cautions, read_rulebook};
use super::{Caution, Checked, RuleSet, RuleText, Rulebook};
use crate::fault::{Refusal, RuleFault, RuleFaults, RuleMistake, nearest};
use crate::quantity::Date;
use crate::relations::read_relations;

const BUILT_IN: [(&str, &str); 4] = [
    (
        "eu-reach-pbt",
        include_str!("../../rules/rulebooks/eu-reach-pbt.toml"),
    ),
    (
        "eu-clp-pbt-pmt",
        include_str!("../../rules/rulebooks/eu-clp-pbt-pmt.toml"),
    ),
    (
        "un-stockholm-annex-d",
        include_str!("../../rules/rulebooks/un-stockholm-annex-d.toml"),
    ),
    (
        "ca-persistence-bioaccumulation",
        include_str!("../../rules/rulebooks/ca-persistence-bioaccumulation.toml"),
    ),
];
const CAUTIONS: &str = include_str!("../../rules/cautions.toml");
const RELATIONS: &str = include_str!("../../rules/relations.toml");

/// The rule files beside the rulebooks; a folder may hold its own.
const CAUTIONS_FILE: &str = "cautions.toml";
const RELATIONS_FILE: &str = "relations.toml";
const COLUMNS_FILE: &str = "columns.toml";

/// Id and text of every built-in rulebook, in the order of their columns.
pub fn built_in_rulebooks() -> Vec<(&'static str, &'static str)> {
    BUILT_IN.to_vec()
}

/// Name and text of the other built-in rule files of this module: cautions and relations.
pub fn built_in_rule_files() -> Vec<(&'static str, &'static str)> {
    vec![(CAUTIONS_FILE, CAUTIONS), (RELATIONS_FILE, RELATIONS)]
}

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
    fn without_rulebooks() -> Self {
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
                faults.extend(sources.add_folder(path).err());
            } else if path.exists() || looks_like_a_path(choice) {
                match RuleSource::read(path) {
                    Ok(source) => sources.add(source),
                    Err(fault) => faults.push(fault),
                }
            } else {
                return Err(Refusal::Usage(unknown_choice(choice)));
            }
        }
        if faults.is_empty() {
            Ok(sources)
        } else {
            Err(RuleFaults(faults).into())
        }
    }

    /// Adds a rulebook unless the same file is there already.
    fn add(&mut self, source: RuleSource) {
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

    fn add_folder(&mut self, folder: &Path) -> Result<(), RuleFault> {
        let files = rulebook_files(folder)?;
        for file in files {
            self.add(RuleSource::read(&file)?);
        }
        for (name, source) in [
            (CAUTIONS_FILE, &mut self.cautions),
            (RELATIONS_FILE, &mut self.relations),
        ] {
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
            (Some(rulebooks), Some(cautions), Some(relations)) => Ok(RuleSet {
                rulebooks,
                cautions,
                relations,
                texts: self.texts(),
            }),
            (None | Some(_), None | Some(_), None | Some(_)) => Err(RuleFaults(faults)),
        }
    }

    /// The checked rulebooks. Without sound cautions of the run, `out-of-scope` is held against the built-in ones.
    fn read_rulebooks(&self, cautions: Option<&[Caution]>) -> Result<Vec<Rulebook>, RuleFaults> {
        let built_in;
        let cautions = match cautions {
            Some(cautions) => cautions,
            None => {
                built_in = read_cautions(&RuleSource::built_in("cautions", CAUTIONS))?;
                built_in.as_slice()
            }
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
        if faults.is_empty() {
            Ok(rulebooks)
        } else {
            Err(RuleFaults(faults))
        }
    }

    fn texts(&self) -> Vec<RuleText> {
        self.rulebooks
            .iter()
            .chain([&self.cautions, &self.relations])
            .map(|source| RuleText {
                name: source.short_name(),
                text: source.text.to_string(),
            })
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
                let mistake = RuleMistake::NameTaken {
                    key,
                    name: name.clone(),
                    other: (*owner).to_owned(),
                };
                faults.push(source.fault_at_head(key, mistake));
            }
        }
    }
    faults
}

/// The rulebooks of a folder and of its `rulebooks` folder, by file name.
fn rulebook_files(folder: &Path) -> Result<Vec<PathBuf>, RuleFault> {
    let mut files = toml_files(folder)?;
    let inner = folder.join("rulebooks");
    if inner.is_dir() {
        files.extend(toml_files(&inner)?);
    }
    files.retain(|file| {
        let name = file.file_name().and_then(|name| name.to_str());
        ![Some(CAUTIONS_FILE), Some(RELATIONS_FILE), Some(COLUMNS_FILE)].contains(&name)
    });
    if files.is_empty() {
        return Err(fault_of(folder, RuleMistake::NoRulebooks));
    }
    Ok(files)
}

fn toml_files(folder: &Path) -> Result<Vec<PathBuf>, RuleFault> {
    let unreadable = |error: std::io::Error| {
        let reason = error.to_string();
        fault_of(folder, RuleMistake::Unreadable { reason })
    };
    let mut files = Vec::new();
    for entry in std::fs::read_dir(folder).map_err(unreadable)? {
        let path = entry.map_err(unreadable)?.path();
        if path.extension().is_some_and(|extension| extension == "toml") {
            files.push(path);
        }
    }
    files.sort();
    Ok(files)
}

fn fault_of(path: &Path, mistake: RuleMistake) -> RuleFault {
    RuleFault {
        file: path.display().to_string(),
        text: None,
        span: None,
        mistake,
    }
}

fn looks_like_a_path(choice: &str) -> bool {
    let is_toml = Path::new(choice)
        .extension()
        .is_some_and(|extension| extension.eq_ignore_ascii_case("toml"));
    is_toml || choice.contains(['/', '\\'])
}

fn unknown_choice(choice: &str) -> String {
    let ids = BUILT_IN.map(|(id, _)| id);
    let hint = nearest(choice, ids).map_or_else(String::new, |id| format!(" Did you mean `{id}`?"));
    format!(
        "`{choice}` is no rulebook, file or folder.{hint} Built in are {}; `all` takes them all.",
        ids.map(|id| format!("`{id}`")).join(", ")
    )
}

/// What a rulebook holds, in short.
#[derive(Debug, Clone, PartialEq, Eq)]
pub struct RulebookSummary {
    /// The file, `built in: eu-reach-pbt` or the path as given.
    pub file: String,
    /// Its name on the command line.
    pub id: String,
    /// The prefix of its columns.
    pub short: String,
    /// Its title.
    pub title: String,
    /// The date of the text it follows.
    pub edition: Date,
    /// Never loaded by `all`, only when named.
    pub by_name_only: bool,
    /// How many criteria it has.
    pub criteria: usize,
    /// How many limits were read in the text or a reproduction of it.
    pub seen: usize,
    /// How many were read in a text that quotes it.
    pub second_hand: usize,
    /// How many are from memory.
    pub memory: usize,
}

impl RulebookSummary {
    fn new(file: &str, rulebook: &Rulebook) -> Self {
        let limits = |checked: Checked| rulebook.tests().filter(|test| test.checked == checked).count();
        Self {
            file: file.to_owned(),
            id: rulebook.id.clone(),
            short: rulebook.short.clone(),
            title: rulebook.title.clone(),
            edition: rulebook.edition,
            by_name_only: rulebook.by_name_only,
            criteria: rulebook.criteria.len(),
            seen: limits(Checked::Seen),
            second_hand: limits(Checked::SecondHand),
            memory: limits(Checked::Memory),
        }
    }
}

/// The built-in rulebooks in short, those of `by-name-only` too.
pub fn summaries() -> Result<Vec<RulebookSummary>, RuleFaults> {
    let mut sources = RuleSources::without_rulebooks();
    for (id, text) in BUILT_IN {
        sources.add(RuleSource::built_in(id, text));
    }
    sources.summaries()
}

impl RuleSources {
    fn summaries(&self) -> Result<Vec<RulebookSummary>, RuleFaults> {
        let rule_set = self.load()?;
        let named = self.rulebooks.iter().zip(&rule_set.rulebooks);
        Ok(named
            .map(|(source, rulebook)| RulebookSummary::new(&source.name, rulebook))
            .collect())
    }
}

/// Checks rule files and folders without an inventory and gives their rulebooks in short.
pub fn check_paths(paths: &[PathBuf]) -> Result<Vec<RulebookSummary>, RuleFaults> {
    let mut sources = RuleSources::without_rulebooks();
    let mut faults = Vec::new();
    for path in paths {
        let name = path.file_name().and_then(|name| name.to_str());
        let added = if path.is_dir() {
            sources.add_folder(path)
        } else {
            RuleSource::read(path).map(|source| match name {
                Some(CAUTIONS_FILE) => sources.cautions = source,
                Some(RELATIONS_FILE) => sources.relations = source,
                Some(_) | None => sources.add(source),
            })
        };
        faults.extend(added.err());
    }
    match sources.summaries() {
        Ok(summaries) if faults.is_empty() => Ok(summaries),
        Ok(_) => Err(RuleFaults(faults)),
        Err(found) => Err(RuleFaults(faults.into_iter().chain(found.0).collect())),
    }
}
