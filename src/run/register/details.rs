//! Names of rows and digests of their data, one after the other, for as many rows as fit.

use crate::report::RowName;

/// What separates a row's own number from its name and the name from the CAS or EC number.
const SEPARATOR: char = '\u{1f}';

/// The details of the first rows.
#[derive(Debug)]
pub(super) struct Details {
    /// Bytes that may be kept.
    room: usize,
    text: String,
    data: Vec<(u8, u32)>,
    /// Where the text and the data of each row end.
    ends: Vec<(usize, usize)>,
    titles: Vec<&'static str>,
    full: bool,
}

impl Details {
    /// No details yet, and so many bytes of room.
    pub(super) fn with_room(room: usize) -> Self {
        Self {
            room,
            text: String::new(),
            data: Vec::new(),
            ends: Vec::new(),
            titles: Vec::new(),
            full: false,
        }
    }

    /// Keeps the details of the next row, if there is room.
    pub(super) fn add(&mut self, name: &RowName, data: &[(&'static str, u32)]) {
        let size = self.text.len() + (self.data.len() + data.len()) * 8 + self.ends.len() * 16;
        self.full |= size > self.room;
        if self.full {
            return;
        }
        for (place, part) in [&name.row_id, &name.name, &name.number].into_iter().enumerate() {
            if place > 0 {
                self.text.push(SEPARATOR);
            }
            self.text.extend(part.chars().filter(|character| *character != SEPARATOR).take(200));
        }
        for (title, digest) in data {
            let place = self.place_of(title);
            self.data.push((place, *digest));
        }
        self.ends.push((self.text.len(), self.data.len()));
    }

    fn place_of(&mut self, title: &'static str) -> u8 {
        let known = self.titles.iter().position(|other| *other == title);
        let place = known.unwrap_or_else(|| {
            self.titles.push(title);
            self.titles.len() - 1
        });
        // There are some thirty data a row can have.
        u8::try_from(place).unwrap_or(u8::MAX)
    }

    /// What a row is called; nothing for rows that did not fit.
    pub(super) fn name(&self, place: u32) -> RowName {
        let text = self.range(place, |(text, _)| text).and_then(|(start, end)| self.text.get(start..end));
        let mut parts = text.unwrap_or_default().split(SEPARATOR).map(str::to_owned);
        let mut next = || parts.next().unwrap_or_default();
        RowName { row_id: next(), name: next(), number: next() }
    }

    /// The title and digest of each datum of a row; none for rows that did not fit.
    pub(super) fn data(&self, place: u32) -> Option<impl Iterator<Item = (&'static str, u32)>> {
        let (start, end) = self.range(place, |(_, data)| data)?;
        let data = self.data.get(start..end)?.iter();
        Some(data.filter_map(|(title, digest)| Some((*self.titles.get(usize::from(*title))?, *digest))))
    }

    fn range(&self, place: u32, of: impl Fn((usize, usize)) -> usize) -> Option<(usize, usize)> {
        let place = usize::try_from(place).ok()?;
        let end = self.ends.get(place).copied().map(&of)?;
        let start = place.checked_sub(1).and_then(|before| self.ends.get(before).copied()).map_or(0, &of);
        Some((start, end))
    }
}

/// One digest of all data of a row.
pub(super) fn digest_of(data: &[(&'static str, u32)]) -> u32 {
    use std::hash::{DefaultHasher, Hash, Hasher};
    let mut hasher = DefaultHasher::new();
    data.hash(&mut hasher);
    let [first, second, third, fourth, ..] = hasher.finish().to_le_bytes();
    u32::from_le_bytes([first, second, third, fourth])
}
