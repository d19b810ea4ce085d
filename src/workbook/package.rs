//! The zip container of a workbook: finds a part and unpacks it within limits. It does not know what a part means.

use std::collections::BTreeMap;
use std::fs::File;
use std::io::{BufRead, BufReader, Read, Seek, SeekFrom};
use std::path::Path;

use quick_xml::Reader;
use quick_xml::events::{BytesStart, Event};
use zip::ZipArchive;
use zip::result::ZipError;

use crate::fault::FileFault;

/// How far a workbook may unpack.
#[derive(Debug, Clone, Copy)]
pub(super) struct Limits {
    /// Bytes all parts together may unpack to.
    pub(super) total: u64,
    /// Bytes the parts that stay in memory may unpack to: shared texts, formats and lists.
    pub(super) held: u64,
    /// Bytes a part may unpack to for each byte it takes in the file.
    pub(super) ratio: u64,
    /// Bytes from which the ratio counts; below, a part is harmless whatever its ratio.
    pub(super) ratio_from: u64,
}

impl Limits {
    /// A sheet of 1,048,576 rows and 60 filled columns unpacks to about 3 GiB, at a ratio of 5 to 30; only a file made
    /// to exhaust memory goes beyond these (our own choice, from sheets we made).
    pub(super) const USUAL: Self = Self { total: 4 << 30, held: 1 << 30, ratio: 250, ratio_from: 16 << 20 };
}

/// A workbook's container, opened.
pub(super) struct Package {
    pub(super) path: String,
    archive: ZipArchive<BufReader<File>>,
    /// The names of the parts by their lower-case form with forward slashes.
    parts: BTreeMap<String, String>,
    limits: Limits,
    allowed: u64,
    unpacked: u64,
}

impl Package {
    /// Lists the container's parts, refusing one that cannot be listed.
    pub(super) fn new(path: &Path, file: File, limits: Limits) -> Result<Self, FileFault> {
        let path = path.display().to_string();
        let damaged = |error: ZipError| FileFault::Damaged {
            path: path.clone(),
            what: format!("its list of parts cannot be read, perhaps the file was cut off: {error}"),
        };
        let archive = ZipArchive::new(BufReader::new(file)).map_err(damaged)?;
        let mut parts = BTreeMap::new();
        for name in archive.file_names() {
            let name = name.map_err(damaged)?.into_owned();
            let key = folded(&name);
            if parts.insert(key, name.clone()).is_some() {
                return Err(FileFault::Damaged {
                    what: format!("the part `{name}` is there twice"),
                    path: path.clone(),
                });
            }
        }
        Ok(Self { path, archive, parts, limits, allowed: limits.held, unpacked: 0 })
    }

    /// From here on sheets are read, which pass by and are not held.
    pub(super) fn allow_sheets(&mut self) {
        self.allowed = self.limits.total;
    }

    /// A sheet is read once more: what was unpacked before does not add to it.
    pub(super) fn read_again(&mut self) {
        self.unpacked = 0;
    }

    /// The names of all parts, as they are stored.
    pub(super) fn part_names(&self) -> impl Iterator<Item = &str> {
        self.parts.values().map(String::as_str)
    }

    /// Whether there is such a part.
    pub(super) fn has(&self, part: &str) -> bool {
        self.parts.contains_key(&folded(part))
    }

    /// A fault that says the workbook contradicts itself.
    pub(super) fn damaged(&self, what: impl Into<String>) -> FileFault {
        FileFault::Damaged { path: self.path.clone(), what: what.into() }
    }

    /// The first bytes of a part, as text; empty if there is no such part.
    pub(super) fn beginning_of(&mut self, part: &str) -> String {
        let Some(name) = self.parts.get(&folded(part)) else {
            return String::new();
        };
        let mut text = Vec::new();
        if let Ok(entry) = self.archive.by_name(name) {
            // What cannot be read has no beginning; opening the part properly will say why.
            let _unread = entry.take(256).read_to_end(&mut text);
        }
        String::from_utf8_lossy(&text).into_owned()
    }

    /// Reads one XML part from end to end, handing every event to `visit`.
    ///
    /// `visit` stops the reading with a fault of its own; a part that is no XML, is cut off or unpacks too far is a
    /// fault, too. A missing part is none.
    pub(super) fn read_xml<Visit>(&mut self, part: &str, mut visit: Visit) -> Result<Found, FileFault>
    where
        Visit: FnMut(&Event<'_>) -> Result<(), FileFault>,
    {
        self.read_part(part, |source, damaged| read_events(source, &mut visit, damaged))
    }

    /// Hands one part to `work`, unpacked within the limits; `work` need not read it to its end.
    ///
    /// A part that unpacks too far is a fault. A missing part is none.
    pub(super) fn read_part<Work>(&mut self, part: &str, work: Work) -> Result<Found, FileFault>
    where
        Work: FnOnce(&mut dyn Read, &dyn Fn(&dyn std::fmt::Display) -> FileFault) -> Result<(), FileFault>,
    {
        let path = self.path.clone();
        let damaged = |error: &dyn std::fmt::Display| FileFault::Damaged {
            path: path.clone(),
            what: format!("the part `{part}` cannot be read: {error}"),
        };
        let Some(name) = self.parts.get(&folded(part)) else {
            return Ok(Found::No);
        };
        let entry = self.archive.by_name(name).map_err(|error| damaged(&error))?;
        let packed = entry.compressed_size();
        let mut counted = Counted {
            inner: entry,
            unpacked: 0,
            packed,
            limits: self.limits,
            allowed: self.allowed,
            before: self.unpacked,
            over: None,
        };
        let outcome = work(&mut counted, &damaged);
        self.unpacked = self.unpacked.saturating_add(counted.unpacked);
        if let Some((found, limit)) = counted.over {
            return Err(FileFault::TooLarge {
                path: path.clone(),
                part: format!("its part `{part}`"),
                found,
                limit,
            });
        }
        outcome.map(|()| Found::Yes)
    }
}

/// Reads an XML file that stands alone as [`Package::read_xml`] reads a part.
pub(super) fn read_flat_xml<Visit>(
    path: &Path,
    file: &mut File,
    limits: Limits,
    mut visit: Visit,
) -> Result<(), FileFault>
where
    Visit: FnMut(&Event<'_>) -> Result<(), FileFault>,
{
    let shown = path.display().to_string();
    let damaged =
        |error: &dyn std::fmt::Display| FileFault::Damaged { path: shown.clone(), what: error.to_string() };
    file.seek(SeekFrom::Start(0)).map_err(|error| damaged(&error))?;
    read_events(file.take(limits.total), &mut visit, &damaged)
}

/// Whether a part was there.
#[derive(Debug, Clone, Copy, PartialEq, Eq)]
pub(super) enum Found {
    /// It was, and was read.
    Yes,
    /// It was not.
    No,
}

/// A part's name as spreadsheet programs compare it.
pub(super) fn folded(part: &str) -> String {
    part.replace('\\', "/").to_ascii_lowercase()
}

/// The value of an attribute as it is written, by its local name.
pub(super) fn attribute(element: &BytesStart<'_>, name: &str) -> Option<String> {
    element
        .attributes()
        .filter_map(Result::ok)
        .find(|attribute| attribute.key.local_name().as_ref() == name)
        .map(|attribute| attribute.value.into_owned())
}

fn read_events(
    source: impl Read,
    visit: &mut dyn FnMut(&Event<'_>) -> Result<(), FileFault>,
    damaged: &dyn Fn(&dyn std::fmt::Display) -> FileFault,
) -> Result<(), FileFault> {
    let mut source = BufReader::with_capacity(1 << 16, Pieces { inner: source, since_last: 0 });
    refuse_other_encodings(&mut source, damaged)?;
    let mut reader = Reader::from_reader(source);
    reader.config_mut().expand_empty_elements = true;
    let mut depth = 0_usize;
    let mut buffer = Vec::with_capacity(1024);
    loop {
        buffer.clear();
        reader.get_mut().get_mut().since_last = 0;
        let event = reader.read_event_into(&mut buffer).map_err(|error| damaged(&error))?;
        match &event {
            Event::Eof if depth == 0 => return Ok(()),
            Event::Eof => return Err(damaged(&"it ends in the middle")),
            Event::DocType(_) => return Err(damaged(&"it declares a document type, which no workbook does")),
            Event::Start(_) if depth >= DEEPEST => {
                return Err(damaged(&format!("its elements stand within each other {DEEPEST} deep")));
            }
            Event::Start(_) => depth += 1,
            Event::End(_) => depth = depth.saturating_sub(1),
            Event::Decl(declaration) => {
                let encoding = declaration.encoding().and_then(Result::ok).unwrap_or_default();
                if !["", "utf-8", "utf8", "us-ascii"].contains(&encoding.to_lowercase().as_str()) {
                    return Err(damaged(&format!("it is written in {encoding} instead of UTF-8")));
                }
            }
            Event::Empty(_)
            | Event::Text(_)
            | Event::CData(_)
            | Event::Comment(_)
            | Event::PI(_)
            | Event::GeneralRef(_) => {}
        }
        visit(&event)?;
    }
}

/// A part in UTF-16 would read as if it were empty.
fn refuse_other_encodings(
    source: &mut impl BufRead,
    damaged: &dyn Fn(&dyn std::fmt::Display) -> FileFault,
) -> Result<(), FileFault> {
    let beginning = source.fill_buf().map_err(|error| damaged(&error))?;
    let wide = [&[0xFF, 0xFE][..], &[0xFE, 0xFF], b"<\0", b"\0<"];
    if wide.iter().any(|start| beginning.starts_with(start)) {
        return Err(damaged(&"it is written in UTF-16 instead of UTF-8"));
    }
    Ok(())
}

/// The most bytes of one tag, text or comment, which the XML library holds in memory whole; the longest text of a cell
/// takes a thousandth of it, a picture stored as text some.
const LONGEST_PIECE: u64 = 64 << 20;

/// Elements within elements; workbooks need about twenty.
const DEEPEST: usize = 1_000;

/// Stops a source of XML that does not come to the end of a piece.
struct Pieces<R> {
    inner: R,
    since_last: u64,
}

impl<R: Read> Read for Pieces<R> {
    fn read(&mut self, buffer: &mut [u8]) -> std::io::Result<usize> {
        let count = self.inner.read(buffer)?;
        self.since_last = self.since_last.saturating_add(u64::try_from(count).unwrap_or(u64::MAX));
        if self.since_last > LONGEST_PIECE {
            return Err(std::io::Error::other(format!(
                "one text in it is longer than {}",
                megabytes(LONGEST_PIECE)
            )));
        }
        Ok(count)
    }
}

/// Counts what is really unpacked; the sizes a container declares may be false.
struct Counted<R> {
    inner: R,
    unpacked: u64,
    packed: u64,
    limits: Limits,
    allowed: u64,
    before: u64,
    over: Option<(String, String)>,
}

impl<R: Read> Read for Counted<R> {
    fn read(&mut self, buffer: &mut [u8]) -> std::io::Result<usize> {
        let count = self.inner.read(buffer)?;
        self.unpacked = self.unpacked.saturating_add(u64::try_from(count).unwrap_or(u64::MAX));
        let total = self.before.saturating_add(self.unpacked);
        if total > self.allowed {
            self.over = Some((format!("over {}", megabytes(total)), megabytes(self.allowed)));
        } else if self.unpacked > self.limits.ratio_from
            && self.unpacked > self.packed.saturating_mul(self.limits.ratio)
        {
            self.over = Some((
                format!("over {} times its size in the file", self.limits.ratio),
                format!("{} times", self.limits.ratio),
            ));
        }
        if self.over.is_some() {
            return Err(std::io::Error::other("it unpacks too far"));
        }
        Ok(count)
    }
}

fn megabytes(bytes: u64) -> String {
    format!("{} MB", bytes / 1_000_000)
}
