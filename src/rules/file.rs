//! Rule files as text: where they come from, and their TOML as a tree in which every value knows its place.
//!
//! It knows the grammar of TOML and nothing of criteria: what a key means is for [`validate`](super::validate) and its
//! neighbours to say. Only this folder names the TOML crate.

mod section;
mod value;

use std::cell::RefCell;
use std::ops::Range;
use std::path::Path;
use std::sync::Arc;

use toml::de::DeTable;

pub(crate) use section::Section;
pub(crate) use value::{Located, Scalar};

use crate::fault::{RuleFault, RuleFaults, RuleMistake};

/// A rule file: its name and its text.
#[derive(Debug, Clone, PartialEq, Eq)]
pub struct RuleSource {
    /// `built in: eu-reach-pbt`, or the path as the user gave it.
    pub name: String,
    /// The whole text.
    pub text: Arc<str>,
}

impl RuleSource {
    /// A file that is part of the program.
    pub fn built_in(id: &str, text: &str) -> Self {
        Self { name: format!("built in: {id}"), text: text.into() }
    }

    /// Reads a file; refused if it cannot be read or is not UTF-8.
    pub fn read(path: &Path) -> Result<Self, RuleFaults> {
        let name = path.display().to_string();
        let fault = |mistake| RuleFaults::of_file(&name, mistake);
        let bytes = std::fs::read(path).map_err(|error| {
            fault(match error.kind() {
                std::io::ErrorKind::NotFound => RuleMistake::NoSuchFile,
                _ => RuleMistake::Unreadable { reason: error.to_string() },
            })
        })?;
        let text = String::from_utf8(bytes).map_err(|error| {
            let valid = error.as_bytes().iter().take(error.utf8_error().valid_up_to());
            fault(RuleMistake::NotUtf8 { line: 1 + valid.filter(|byte| **byte == b'\n').count() })
        })?;
        let text = text.strip_prefix('\u{feff}').unwrap_or(&text).into();
        Ok(Self { name, text })
    }

    /// The name without folders, so that a record of a run does not depend on where its files stood.
    pub(crate) fn short_name(&self) -> String {
        let file_name = Path::new(&self.name).file_name().and_then(|name| name.to_str());
        file_name.unwrap_or(&self.name).to_owned()
    }

    /// A fault at a key of the file's head.
    pub(crate) fn fault_at_head(&self, key: &str, mistake: RuleMistake) -> RuleFault {
        let span = self.build(|file| file.section("rulebook", "[rulebook]")?.text(key));
        RuleFault {
            file: self.name.clone(),
            text: Some(self.text.clone()),
            span: span.ok().map(|text| text.span),
            mistake,
        }
    }

    /// Reads the tree with `read` and gives what it built, or every fault found on the way.
    pub(crate) fn build<Built>(
        &self,
        read: impl FnOnce(&Section<'_>) -> Option<Built>,
    ) -> Result<Built, RuleFaults> {
        let faults = FaultList::new(self);
        let (tree, errors) = DeTable::parse_recoverable(&self.text);
        for error in errors {
            let span = error.span().unwrap_or(0..0);
            let reason = error.message().to_owned();
            let found = faults.text(span.clone()).to_owned();
            let mistake = if reason.starts_with("invalid date") {
                RuleMistake::NotADay { found }
            } else {
                RuleMistake::Syntax { reason }
            };
            faults.report(span, mistake);
        }
        // A tree mended by the parser would only give faults that nobody wrote.
        if !faults.is_empty() {
            return Err(faults.into_faults());
        }
        match read(&Section::root(&faults, &tree)) {
            Some(result) if faults.is_empty() => Ok(result),
            Some(_) | None => Err(faults.into_faults()),
        }
    }
}

/// Collects the faults of one rule file.
#[derive(Debug)]
pub(crate) struct FaultList {
    source: RuleSource,
    faults: RefCell<Vec<RuleFault>>,
}

impl FaultList {
    fn new(source: &RuleSource) -> Self {
        Self { source: source.clone(), faults: RefCell::new(Vec::new()) }
    }

    pub(crate) fn report(&self, span: Range<usize>, mistake: RuleMistake) {
        self.faults.borrow_mut().push(RuleFault {
            file: self.source.name.clone(),
            text: Some(self.source.text.clone()),
            span: Some(span),
            mistake,
        });
    }

    pub(crate) fn text(&self, span: Range<usize>) -> &str {
        self.source.text.get(span).unwrap_or("")
    }

    pub(crate) fn line(&self, span: &Range<usize>) -> usize {
        1 + self.text(0..span.start).matches('\n').count()
    }

    fn is_empty(&self) -> bool {
        self.faults.borrow().is_empty()
    }

    /// In the order in which they stand in the file.
    fn into_faults(self) -> RuleFaults {
        let mut faults = self.faults.into_inner();
        faults.sort_by_key(|fault| fault.span.as_ref().map(|span| (span.start, span.end)));
        // A name that two readers look at is reported by both.
        faults.dedup();
        RuleFaults(faults)
    }
}
