//! Faults of rule files, collected and drawn under the offending text.
//!
//! A fault carries data; [`RuleMistake`] is worded in `wording`, drawn here. Nothing of a rule file is applied while
//! one of these stands.

mod mistake;
mod wording;

use std::fmt;
use std::ops::Range;
use std::sync::Arc;

use annotate_snippets::{AnnotationKind, Group, Level, Origin, Renderer, Snippet};

use super::{Refusal, nearest};
pub use mistake::{OwnerKind, RuleMistake};

/// One fault of a rule file.
#[derive(Debug, Clone, PartialEq, Eq)]
pub struct RuleFault {
    /// The file as the user named it.
    pub file: String,
    /// Its whole text, where it could be read.
    pub text: Option<Arc<str>>,
    /// The offending bytes of the text; `None` where the fault is of the file as a whole.
    pub span: Option<Range<usize>>,
    /// What is wrong with them.
    pub mistake: RuleMistake,
}

/// All faults of the rule files of a run.
#[derive(Debug, Clone, PartialEq, Eq)]
pub struct RuleFaults(pub Vec<RuleFault>);

/// How faults are drawn.
#[derive(Debug, Clone, Copy, PartialEq, Eq, Default)]
pub enum Drawing {
    /// For files, pipes and terminals without colour.
    #[default]
    Plain,
    /// With the colours of a terminal.
    Coloured,
}

impl RuleFault {
    /// What is wrong, in a sentence.
    pub fn message(&self) -> String {
        self.mistake.message()
    }

    /// What to write instead.
    pub fn help(&self) -> String {
        self.mistake.help()
    }

    /// The line of the file on which the offending text starts, counted from 1.
    pub fn line(&self) -> Option<usize> {
        let (text, span) = (self.text.as_deref()?, self.span.as_ref()?);
        let before = text.get(..span.start)?;
        Some(1 + before.matches('\n').count())
    }

    /// The fault under the text it is about.
    pub fn draw(&self, drawing: Drawing) -> String {
        let renderer = match drawing {
            Drawing::Plain => Renderer::plain(),
            Drawing::Coloured => Renderer::styled(),
        };
        let (message, label, help) = (self.message(), self.mistake.label(), self.help());
        let title = Level::ERROR.primary_title(&message);
        let group = match (self.text.as_deref(), self.span.clone()) {
            (Some(text), Some(span)) => {
                let annotation = AnnotationKind::Primary.span(span).label(label.as_str());
                title.element(Snippet::source(text).path(self.file.as_str()).annotation(annotation))
            }
            _ => Group::with_title(title).element(Origin::path(self.file.as_str())),
        };
        renderer.render(&[group.element(Level::HELP.message(help.as_str()))])
    }
}

impl RuleFaults {
    /// One fault of a file as a whole.
    pub fn of_file(file: &str, mistake: RuleMistake) -> Self {
        Self(vec![RuleFault { file: file.to_owned(), text: None, span: None, mistake }])
    }

    /// All faults, one under the other, and how many there are.
    pub fn draw(&self, drawing: Drawing) -> String {
        let mut drawn: Vec<String> = self.0.iter().map(|fault| fault.draw(drawing)).collect();
        drawn.push(format!("{}; no rule was applied", super::count(self.0.len(), "fault", "faults")));
        drawn.join("\n\n")
    }
}

impl std::error::Error for RuleFaults {}

impl fmt::Display for RuleFaults {
    fn fmt(&self, formatter: &mut fmt::Formatter<'_>) -> fmt::Result {
        formatter.write_str(&self.draw(Drawing::Plain))
    }
}

/// The answer to a choice that is neither a built-in rulebook nor a file or folder.
pub fn unknown_rulebook(choice: &str, ids: &[&str]) -> Refusal {
    let hint =
        nearest(choice, ids.iter().copied()).map_or_else(String::new, |id| format!(" Did you mean `{id}`?"));
    let known: Vec<String> = ids.iter().map(|id| format!("`{id}`")).collect();
    let known = known.join(", ");
    Refusal::Usage(format!(
        "`{choice}` is no rulebook, file or folder.{hint} Built in are {known}; `all` takes them all."
    ))
}
