//! What the header of one column names, alone or with the group above it.

use super::ColumnOverride;
use super::choice::dimension_of;
use super::folding::header_words;
use super::header::{Header, Named};
use super::reading::Reading;
use super::stack::{Above, Extent, Stacked};
use super::words::ColumnWords;
use crate::quantity::{Dimension, Unit, tidy};
use crate::substance::{Basis, Field, Said};

/// A header and what it may name.
#[derive(Debug, Clone)]
pub(super) struct HeaderCell {
    pub(super) column: u16,
    /// As written, of all rows that were read together.
    pub(super) text: String,
    pub(super) header: Option<Header>,
    pub(super) meaning: Meaning,
    /// The header of the lowest row and those above it, where they were read together.
    parts: Vec<Header>,
    /// The rows that were read together, counted from 0; a single one is not told.
    pub(super) rows: Vec<u32>,
    /// Other ways in which the user may write this header.
    names: Vec<String>,
}

/// What a header names.
#[derive(Debug, Clone, PartialEq, Eq)]
pub(super) enum Meaning {
    /// A field, by its words.
    Named(Named),
    /// A field, because the user says so.
    Told(Field),
    /// Nothing, because the user says so.
    LeftAside,
    /// A field by its own words, but no field together with the group above it.
    NotInGroup(Field),
    /// No field that is known.
    Unknown,
}

/// Where a unit of a header stands.
#[derive(Debug, Clone, Copy, PartialEq, Eq)]
pub(super) enum UnitFrom {
    Header,
    GroupAbove,
}

impl HeaderCell {
    /// A header of one row.
    pub(super) fn alone(
        column: u16,
        text: String,
        words: &ColumnWords,
        overrides: &[ColumnOverride],
    ) -> Self {
        let header = Header::new(&text);
        let named = header.as_ref().and_then(|header| header.field(words));
        let meaning = named.map_or(Meaning::Unknown, Meaning::Named);
        Self { column, text, header, meaning, parts: Vec::new(), rows: Vec::new(), names: Vec::new() }
            .told(overrides)
    }

    /// A header of several rows.
    pub(super) fn stacked(stacked: Stacked, words: &ColumnWords, overrides: &[ColumnOverride]) -> Self {
        let Stacked { column, own, name, rows, above } = stacked;
        let mut cell = Self::alone(column, own, words, &[]);
        cell.rows.clone_from(&rows);
        cell.names = vec![name];
        let groups: Vec<Above> =
            above.iter().filter(|above| is_group_text(&above.text, words)).cloned().collect();
        if !groups.is_empty() && cell.is_understood(words) {
            cell.join(&groups, words);
        }
        if cell.meaning == Meaning::Unknown
            && let Some(name) = above.iter().rev().find(|above| above.start == column)
        {
            cell.take_name(name, words);
        }
        cell.told(overrides)
    }

    pub(super) fn field(&self) -> Option<Field> {
        match &self.meaning {
            Meaning::Named(named) => Some(named.field),
            Meaning::Told(field) => Some(*field),
            Meaning::LeftAside | Meaning::NotInGroup(_) | Meaning::Unknown => None,
        }
    }

    /// The unit the header names, in its own row before those above.
    pub(super) fn unit(&self, dimension: Dimension) -> Option<(Unit, UnitFrom)> {
        if self.parts.is_empty() {
            return Some((self.header.as_ref()?.unit(dimension)?, UnitFrom::Header));
        }
        // `log` may stand in one row and `BCF` in another.
        let whole = self.header.as_ref().and_then(|header| header.unit(dimension));
        if whole == Some(Unit::LogLitrePerKilogram) {
            return whole.map(|unit| (unit, UnitFrom::Header));
        }
        self.parts.iter().enumerate().find_map(|(place, part)| {
            let from = if place == 0 { UnitFrom::Header } else { UnitFrom::GroupAbove };
            part.unit(dimension).map(|unit| (unit, from))
        })
    }

    /// Whether the user speaks of this column.
    pub(super) fn is_spoken_of(&self, told: &ColumnOverride) -> bool {
        told.is_for_column(self.column)
            || told.is_for(&self.text)
            || is_for_name(told, &self.text)
            || self.names.iter().any(|name| told.is_for(name))
    }

    /// Words that may be a unit and may mean something else, where no other unit is named.
    pub(super) fn doubtful_unit(&self, dimension: Dimension) -> Option<String> {
        if !matches!(self.meaning, Meaning::Named(_)) {
            return None;
        }
        let parts = || self.parts.iter().chain(self.header.as_ref().filter(|_| self.parts.is_empty()));
        if let Some(scale) = parts().find_map(|part| part.unread_scale(dimension)) {
            return Some(scale);
        }
        if self.unit(dimension).is_some() {
            return None;
        }
        parts().find_map(|part| part.doubtful_unit(dimension))
    }

    /// A unit in brackets that does not measure what the column holds.
    pub(super) fn strange_unit(&self, dimension: Dimension) -> Option<Unit> {
        self.parts.first().or(self.header.as_ref())?.strange_unit(dimension)
    }

    /// All ways in which the user may write this header.
    pub(super) fn names(&self) -> impl Iterator<Item = &String> {
        std::iter::once(&self.text).chain(&self.names)
    }

    fn told(mut self, overrides: &[ColumnOverride]) -> Self {
        match overrides.iter().find(|told| self.is_spoken_of(told)) {
            Some(ColumnOverride { field: Some(field), .. }) => self.meaning = Meaning::Told(*field),
            Some(ColumnOverride { field: None, .. }) => self.meaning = Meaning::LeftAside,
            None => {}
        }
        self
    }

    /// A group says nothing about a header of unknown words.
    fn is_understood(&self, words: &ColumnWords) -> bool {
        self.header.as_ref().is_some_and(|header| !Reading::new(header, words).mostly_unknown)
    }

    fn join(&mut self, above: &[Above], words: &ColumnWords) {
        let groups: Vec<&str> = above.iter().map(|above| above.text.as_str()).collect();
        let text = format!("{}: {}", groups.join(" "), self.text);
        let Some(header) = Header::new(&text) else {
            return;
        };
        let extent = if above.iter().all(|above| above.extent == Extent::Shown) {
            Extent::Shown
        } else {
            Extent::Assumed
        };
        let joined = header.field(words);
        let own = self.field();
        match decide(own, joined.as_ref().map(|named| named.field), extent, &groups) {
            Decision::Own => {}
            Decision::NotInGroup(field) => self.take(text, header, Meaning::NotInGroup(field), above),
            Decision::Joined => {
                let meaning = joined.map_or(Meaning::Unknown, Meaning::Named);
                self.take(text, header, meaning, above);
            }
        }
    }

    /// A name with a text below that says nothing known.
    fn take_name(&mut self, name: &Above, words: &ColumnWords) {
        let text = format!("{} [{}]", name.text, self.text);
        if let Some(header) = Header::new(&text)
            && let Some(named) = header.field(words)
        {
            self.take(text, header, Meaning::Named(named), std::slice::from_ref(name));
        }
    }

    fn take(&mut self, text: String, header: Header, meaning: Meaning, above: &[Above]) {
        let lowest = self.header.take();
        let higher = above.iter().rev().filter_map(|above| Header::new(&above.text));
        self.parts = lowest.into_iter().chain(higher).collect();
        let mut rows: Vec<u32> = above.iter().map(|above| above.row).collect();
        rows.append(&mut self.rows);
        self.rows = rows;
        self.names.push(std::mem::replace(&mut self.text, text));
        self.header = Some(header);
        self.meaning = meaning;
    }
}

/// Which reading of a header below a group holds.
enum Decision {
    /// What the lowest row says alone.
    Own,
    /// What the rows say together.
    Joined,
    /// None: the field of the lowest row is another one in this group.
    NotInGroup(Field),
}

fn decide(own: Option<Field>, joined: Option<Field>, extent: Extent, groups: &[&str]) -> Decision {
    let says_measured =
        || groups.iter().any(|group| Said::in_header(&tidy(group)).basis == Some(Basis::Measured));
    let is_value = |field: Field| {
        matches!(
            field,
            Field::Property(_)
                | Field::ReadyBiodegradability
                | Field::InherentBiodegradability
                | Field::HazardStatements
        )
    };
    let is_half_life = |field: Field| dimension_of(field) == Some(Dimension::Time);
    match (own, joined) {
        (None, _) => Decision::Joined,
        (Some(own), None) if is_value(own) => Decision::NotInGroup(own),
        (Some(_), None) => Decision::Own,
        // What the file does not show makes nothing measured.
        (Some(own), Some(joined)) if own == joined => match extent {
            Extent::Assumed if says_measured() => Decision::Own,
            Extent::Assumed | Extent::Shown => Decision::Joined,
        },
        (Some(own), Some(joined)) if own.property().is_some() && joined.property().is_some() => {
            if is_half_life(own) && is_half_life(joined) {
                Decision::Joined
            } else {
                Decision::Own
            }
        }
        (Some(own), Some(_)) if own.property().is_some() => Decision::Joined,
        // `Supplier` under `log Kow` is a supplier.
        (Some(_), Some(joined)) if is_value(joined) => Decision::Own,
        (Some(_), Some(_)) => match extent {
            Extent::Shown => Decision::Joined,
            Extent::Assumed => Decision::Own,
        },
    }
}

/// Whether a text of an upper row is a group: a few words, all of them known. Titles have others.
pub(super) fn is_group_text(text: &str, words: &ColumnWords) -> bool {
    const MOST_WORDS: usize = 10;
    let is_label = text.trim_end().ends_with([':', '：']);
    !is_label
        && Header::new(text).is_some_and(|header| {
            let reading = Reading::new(&header, words);
            header.words.len() <= MOST_WORDS && reading.wholly_known && !reading.covered.is_empty()
        })
}

/// The user may give a header of two rows without its unit.
pub(super) fn is_for_name(told: &ColumnOverride, text: &str) -> bool {
    text.rsplit_once(" [").is_some_and(|(name, _)| header_words(name) == header_words(&told.header))
}
