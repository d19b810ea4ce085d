//! Rulebooks in short, for a list or after a check.

use std::path::PathBuf;

use super::built_in::BUILT_IN;
use super::folder::{CAUTIONS_FILE, RELATIONS_FILE};
use super::{Checked, RuleSource, RuleSources, Rulebook};
use crate::columns::ColumnWords;
use crate::fault::{RuleFault, RuleFaults, RuleMistake};
use crate::quantity::Date;

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
        Ok(named.map(|(source, rulebook)| RulebookSummary::new(&source.name, rulebook)).collect())
    }
}

const COLUMNS_FILE: &str = "columns.toml";

/// The words of columns have a form of their own; the parser names the line.
fn check_columns(source: &RuleSource) -> Option<RuleFault> {
    let reason = ColumnWords::load(&source.text).err()?;
    Some(RuleFault {
        file: source.name.clone(),
        text: None,
        span: None,
        mistake: RuleMistake::Syntax { reason },
    })
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
                Some(COLUMNS_FILE) => faults.extend(check_columns(&source)),
                Some(_) | None => sources.add(source),
            })
        };
        faults.extend(added.err().map_or_else(Vec::new, |found| found.0));
    }
    match sources.summaries() {
        Ok(summaries) if faults.is_empty() => Ok(summaries),
        Ok(_) => Err(RuleFaults(faults)),
        Err(found) => Err(RuleFaults(faults.into_iter().chain(found.0).collect())),
    }
}
