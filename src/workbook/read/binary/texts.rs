//! The texts that cells share, kept one behind the other: a short text takes little more memory than its letters.

/// Texts by number.
#[derive(Debug, Clone, Default)]
pub(in crate::workbook::read) struct SharedTexts {
    all: String,
    ends: Vec<usize>,
}

impl SharedTexts {
    /// Adds a text that `write` appends to those before it; none if it could not.
    pub(in crate::workbook::read) fn add<Outcome>(
        &mut self,
        write: impl FnOnce(&mut String) -> Option<Outcome>,
    ) -> Option<Outcome> {
        let outcome = write(&mut self.all)?;
        self.ends.push(self.all.len());
        Some(outcome)
    }

    /// A text by its number.
    pub(in crate::workbook::read) fn get(&self, number: u32) -> Option<&str> {
        let place = usize::try_from(number).ok()?;
        let begin = match place.checked_sub(1) {
            Some(before) => *self.ends.get(before)?,
            None => 0,
        };
        self.all.get(begin..*self.ends.get(place)?)
    }
}

/// The text a record has at a place, by its length in four bytes and in UTF-16, appended to `text`; where it ends.
pub(in crate::workbook::read) fn wide_text(record: &[u8], at: usize, text: &mut String) -> Option<usize> {
    let count = usize::try_from(super::bytes::long(record, at)?).ok()?;
    let begin = at + 4;
    let end = begin.checked_add(count.checked_mul(2)?)?;
    let units = record.get(begin..end)?.chunks_exact(2).filter_map(|pair| super::bytes::short(pair, 0));
    text.extend(char::decode_utf16(units).map(|unit| unit.unwrap_or(char::REPLACEMENT_CHARACTER)));
    Some(end)
}
