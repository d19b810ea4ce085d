//! A table of a rule file: which keys it has, which it lacks, and the tables inside it.
//!
//! What stands at a key is read in `value`.

use std::cell::RefCell;
use std::ops::Range;

use toml::Spanned;
use toml::de::{DeTable, DeValue};

use super::FaultList;
use super::value::number;
use crate::fault::{RuleMistake, nearest};

/// A table of a rule file.
#[derive(Debug, Clone)]
pub(crate) struct Section<'file> {
    pub(super) faults: &'file FaultList,
    table: &'file DeTable<'file>,
    span: Range<usize>,
    title: &'static str,
    /// The known keys that unknown ones were probably meant to be.
    misspelt: RefCell<Vec<&'static str>>,
}

impl<'file> Section<'file> {
    pub(super) fn root(faults: &'file FaultList, tree: &'file Spanned<DeTable<'file>>) -> Self {
        Self {
            faults,
            table: tree.get_ref(),
            span: 0..0,
            title: "the file",
            misspelt: RefCell::new(Vec::new()),
        }
    }

    /// Where the table stands.
    pub fn span(&self) -> Range<usize> {
        self.span.clone()
    }

    /// The line of a place, counted from 1.
    pub fn line(&self, span: &Range<usize>) -> usize {
        self.faults.line(span)
    }

    /// Reports a fault at a place.
    pub fn report(&self, span: Range<usize>, mistake: RuleMistake) {
        self.faults.report(span, mistake);
    }

    /// Refuses every key that is not among `known`.
    pub fn allow(&self, known: &[&'static str]) {
        for key in self.table.keys() {
            let name: &str = key.get_ref();
            if known.contains(&name) {
                continue;
            }
            let near = nearest(name, known.iter().copied());
            let near = known.iter().copied().find(|word| Some(*word) == near && self.value(word).is_none());
            self.misspelt.borrow_mut().extend(near);
            let mistake = RuleMistake::UnknownKey {
                key: name.to_owned(),
                table: self.title,
                nearest: near,
                known: known.to_vec(),
            };
            self.report(key.span(), mistake);
        }
    }

    /// The place of a key, if the table has it.
    pub fn key_span(&self, key: &str) -> Option<Range<usize>> {
        self.table.keys().find(|name| name.get_ref() == key).map(Spanned::span)
    }

    pub(super) fn value(&self, key: &str) -> Option<&'file Spanned<DeValue<'file>>> {
        self.table.iter().find(|(name, _)| name.get_ref() == key).map(|(_, value)| value)
    }

    /// Whether the key stands there under a wrong spelling, which is reported already.
    pub fn is_misspelt(&self, key: &str) -> bool {
        self.misspelt.borrow().contains(&key)
    }

    /// Reports that the key in `example` is missing, where it is; to be asked after [`Self::allow`].
    pub fn need(&self, example: &'static str) {
        let key = example.split(" = ").next().unwrap_or(example).trim_matches(['[', ']']);
        if self.value(key).is_none() && !self.is_misspelt(key) {
            self.report(self.span(), RuleMistake::MissingKey { example, table: self.title });
        }
    }

    pub(super) fn wrong_kind(&self, key: &str, wanted: &'static str, value: &Spanned<DeValue<'_>>) {
        let mistake = RuleMistake::WrongKind { key: key.to_owned(), wanted, found: kind_of(value.get_ref()) };
        self.report(value.span(), mistake);
    }

    pub(super) fn list(&self, key: &str, wanted: &'static str) -> Option<&'file [Spanned<DeValue<'file>>]> {
        let value = self.value(key)?;
        let list = value.get_ref().as_array();
        if list.is_none() {
            self.wrong_kind(key, wanted, value);
        }
        list.map(AsRef::as_ref)
    }

    /// A table inside this one.
    pub fn section(&self, key: &str, title: &'static str) -> Option<Section<'file>> {
        let value = self.value(key)?;
        let table = value.get_ref().as_table();
        if table.is_none() {
            self.wrong_kind(key, "a table", value);
        }
        table.map(|table| self.inner(table, value.span(), title))
    }

    /// The tables of a list of tables, in file order.
    pub fn sections(&self, key: &str, title: &'static str) -> Vec<Section<'file>> {
        let items = self.list(key, "a list of tables").unwrap_or_default();
        let mut sections = Vec::new();
        for item in items {
            match item.get_ref().as_table() {
                Some(table) => sections.push(self.inner(table, item.span(), title)),
                None => self.wrong_kind(key, "a list of tables", item),
            }
        }
        sections
    }

    fn inner(&self, table: &'file DeTable<'file>, span: Range<usize>, title: &'static str) -> Self {
        Self { faults: self.faults, table, span, title, misspelt: RefCell::new(Vec::new()) }
    }
}

fn kind_of(value: &DeValue<'_>) -> &'static str {
    match value {
        DeValue::String(_) => "a text",
        DeValue::Integer(_) | DeValue::Float(_) => match number(value) {
            Some(_) => "a number",
            None => "no finite decimal number",
        },
        DeValue::Boolean(_) => "true or false",
        DeValue::Datetime(_) => "a date",
        DeValue::Array(_) => "a list",
        DeValue::Table(_) => "a table",
    }
}
