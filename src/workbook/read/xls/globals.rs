//! What an xls workbook says of itself before its first sheet: sheets, shared texts, formats, alphabet and first day.

use std::collections::{BTreeMap, BTreeSet};

use super::looks::{self, CellFormat};
use super::records::{CutOff, Record, Records};
use super::texts::{Alphabet, Pieces, Version, read_shared_texts};
use crate::workbook::read::binary::bytes::{byte, long, short};
use crate::workbook::read::binary::looks::Palette;
use crate::workbook::read::binary::rows::DayZero;
use crate::workbook::read::binary::texts::SharedTexts;
use crate::workbook::survey::Visibility;

/// What the workbook says of itself.
#[derive(Debug)]
pub(super) struct Globals {
    pub(super) version: Version,
    pub(super) alphabet: Alphabet,
    pub(super) day_zero: DayZero,
    pub(super) sheets: Vec<SheetEntry>,
    pub(super) texts: SharedTexts,
    /// How many of them change their font within the text.
    pub(super) mixed_texts: u64,
    pub(super) formats: BTreeMap<u16, String>,
    pub(super) fonts: Vec<calamine::Font>,
    pub(super) cell_formats: Vec<CellFormat>,
    pub(super) palette: Palette,
    /// A program that computes formulas has written it.
    pub(super) computed: Computed,
    pub(super) defined_names: usize,
    /// Links to other workbooks.
    pub(super) links: usize,
    /// The fonts wait for the colours, which come later.
    waiting_fonts: Vec<looks::FontRecord>,
}

/// More sheets, fonts or cell formats than this no program writes: the numbers of fonts and formats have two bytes.
const MOST_ENTRIES: usize = 65_536;

/// Whether the workbook names the version of the program that last computed its formulas.
#[derive(Debug, Clone, Copy, PartialEq, Eq)]
pub(super) enum Computed {
    NotSaid,
    Said,
}

/// A sheet and where it begins.
#[derive(Debug)]
pub(super) struct SheetEntry {
    pub(super) name: String,
    pub(super) visibility: Visibility,
    pub(super) kind: SheetKind,
    pub(super) begin: usize,
}

/// What a sheet is.
#[derive(Debug, Clone, Copy, PartialEq, Eq)]
pub(super) enum SheetKind {
    Worksheet,
    /// A chart, a sheet of old macros, or a module.
    Other,
}

/// Why the workbook cannot be read.
#[derive(Debug, PartialEq, Eq)]
pub(super) enum Refused {
    /// It needs a password.
    Encrypted,
    /// It is from before 1993.
    TooOld,
    /// It is not what the format says.
    Damaged(String),
}

impl From<CutOff> for Refused {
    fn from(CutOff: CutOff) -> Self {
        Self::Damaged("it is cut off".to_owned())
    }
}

fn damaged(what: impl Into<String>) -> Refused {
    Refused::Damaged(what.into())
}

/// The version a stream begins with.
fn version_of(stream: &[u8]) -> Result<Version, Refused> {
    match (short(stream, 0), short(stream, 4)) {
        (Some(0x0809), Some(0x0600)) => Ok(Version::Biff8),
        (Some(0x0809), Some(0x0500)) => Ok(Version::Biff5),
        (Some(0x0009 | 0x0209 | 0x0409), _) => Err(Refused::TooOld),
        _ => Err(damaged("it does not begin as a workbook does")),
    }
}

impl Globals {
    /// Reads up to the end of what stands before the first sheet.
    pub(super) fn read(stream: &[u8]) -> Result<Self, Refused> {
        let mut globals = Self {
            version: version_of(stream)?,
            alphabet: Alphabet::NotSaid,
            day_zero: DayZero::In1900,
            sheets: Vec::new(),
            texts: SharedTexts::default(),
            mixed_texts: 0,
            formats: BTreeMap::new(),
            fonts: Vec::new(),
            cell_formats: Vec::new(),
            palette: Palette::default(),
            computed: Computed::NotSaid,
            defined_names: 0,
            links: 0,
            waiting_fonts: Vec::new(),
        };
        let mut records = Records::new(stream, 0);
        // The alphabet stands behind the names of the sheets in no workbook, but nothing forbids it.
        let mut listed = Vec::new();
        while let Some(record) = records.next() {
            let record = record?;
            match record.kind {
                0x000A => return globals.complete(&listed),
                0x0085 => listed.push(record),
                _ => globals.note(&record, &records)?,
            }
            let entries = [listed.len(), globals.cell_formats.len(), globals.waiting_fonts.len()];
            if entries.iter().any(|number| *number > MOST_ENTRIES) {
                return Err(damaged(format!("it lists more than {MOST_ENTRIES} sheets, fonts or formats")));
            }
        }
        Err(CutOff.into())
    }

    fn note(&mut self, record: &Record<'_>, records: &Records<'_>) -> Result<(), Refused> {
        let data = record.data;
        match record.kind {
            0x002F => return Err(Refused::Encrypted),
            0x0042 => self.alphabet = Alphabet::of_code_page(short(data, 0).unwrap_or(0)),
            0x0022 if short(data, 0) == Some(1) => self.day_zero = DayZero::In1904,
            0x00FC => {
                (self.texts, self.mixed_texts) = read_shared_texts(Pieces::new(records.pieces(record)?))
                    .ok_or_else(|| damaged("its list of shared texts is cut off"))?;
            }
            0x041E => self.note_format(data)?,
            0x0031 => self.waiting_fonts.push(looks::font_record(data, self.version, self.alphabet)),
            0x00E0 => {
                let format = looks::cell_format(data, self.version)
                    .ok_or_else(|| damaged("one of its cell formats is cut off"))?;
                self.cell_formats.push(format);
            }
            0x0092 => looks::replace_colours(&mut self.palette, data),
            0x01C1 => self.computed = Computed::Said,
            0x0018 => self.defined_names += 1,
            // A workbook's own sheets are listed as if they were links, too, and so are functions of add-ins.
            0x01AE if !matches!(short(data, 2), Some(0x0401 | 0x3A01)) => self.links += 1,
            _ => {}
        }
        Ok(())
    }

    fn note_format(&mut self, data: &[u8]) -> Result<(), Refused> {
        let mut pieces = Pieces::new(vec![data]);
        let number = pieces.short().unwrap_or(0);
        let code = match self.version {
            Version::Biff8 => pieces.text(self.version, self.alphabet),
            Version::Biff5 => pieces.short_text(self.version, self.alphabet),
        };
        self.formats.insert(number, code.map_err(|what| damaged(format!("it names {what}")))?);
        Ok(())
    }

    fn complete(mut self, listed: &[Record<'_>]) -> Result<Self, Refused> {
        let (mut names, mut places) = (BTreeSet::new(), BTreeSet::new());
        for record in listed {
            let entry = self.sheet_entry(record.data)?;
            if !names.insert(entry.name.to_lowercase()) {
                return Err(damaged(format!("it has two sheets named `{}`", entry.name)));
            }
            if !places.insert(entry.begin) {
                return Err(damaged(format!("its sheet `{}` begins where another does", entry.name)));
            }
            self.sheets.push(entry);
        }
        let fonts = std::mem::take(&mut self.waiting_fonts);
        self.fonts = fonts.into_iter().map(|font| font.with_colours(&self.palette)).collect();
        Ok(self)
    }

    fn sheet_entry(&self, data: &[u8]) -> Result<SheetEntry, Refused> {
        let cut_off = || damaged("its list of sheets is cut off");
        let begin = long(data, 0).and_then(|place| usize::try_from(place).ok()).ok_or_else(cut_off)?;
        let visibility = match byte(data, 4).ok_or_else(cut_off)? & 3 {
            0 => Visibility::Visible,
            1 => Visibility::Hidden,
            _ => Visibility::VeryHidden,
        };
        let kind = match byte(data, 5).ok_or_else(cut_off)? {
            0 => SheetKind::Worksheet,
            _ => SheetKind::Other,
        };
        let rest = data.get(6..).ok_or_else(cut_off)?;
        let name = Pieces::new(vec![rest])
            .short_text(self.version, self.alphabet)
            .map_err(|what| damaged(format!("its list of sheets holds {what}")))?;
        Ok(SheetEntry { name, visibility, kind, begin })
    }
}
