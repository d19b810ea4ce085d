//! Answers of the search for deciding data, kept so that rows that came out the same ask once.

use std::collections::HashMap;
use std::sync::RwLock;

use crate::judge::{Context, Deciding, Stop, TestJudgement};
use crate::rules::Criterion;

/// What was found before. Rows whose tests came out the same ask the same question, and most rows do.
#[derive(Debug, Default)]
pub(crate) struct Found(RwLock<HashMap<Vec<u8>, Deciding>>);

impl Found {
    /// More questions than an inventory can ask in practice; beyond it nothing is kept, and nothing changes.
    const MOST: usize = 100_000;

    pub(crate) fn get(&self, question: &[u8]) -> Option<Deciding> {
        self.0.read().ok()?.get(question).cloned()
    }

    pub(crate) fn keep(&self, question: Vec<u8>, deciding: Deciding) {
        if let Ok(mut found) = self.0.write()
            && found.len() < Self::MOST
        {
            found.insert(question, deciding);
        }
    }
}

/// Everything that the search looks at, as bytes: the criterion, the cautions raised, and what each test came to.
pub(crate) fn question(context: Context, criterion: &Criterion, known: &[Vec<TestJudgement>]) -> Vec<u8> {
    let mut bytes = format!("{}\n{}\n", context.rulebook.id, criterion.id).into_bytes();
    let number = |bytes: &mut Vec<u8>, number: usize| bytes.extend(number.to_le_bytes());
    for raised in context.cautions {
        number(&mut bytes, raised.caution);
    }
    for test in known.iter().flatten() {
        bytes.extend([b'|', test.outcome as u8, test.carries as u8]);
        for stop in &test.stops {
            let (kind, index) = match *stop {
                Stop::Caution(index) => (0, index),
                Stop::WithinOneSd => (1, 0),
                Stop::RelationFromMemory(index) => (2, index),
                Stop::LimitFromMemory => (3, 0),
                Stop::LowSide { relation, .. } => (4, relation),
                Stop::Guard(step) => (5, step),
                Stop::OpenGuard(step) => (6, step),
                Stop::EarlierDoubt => (7, 0),
            };
            bytes.push(kind);
            number(&mut bytes, index);
        }
    }
    bytes
}
