//! The compound file an old binary workbook stands in: a small file system of streams in sectors (MS-CFB). It does not know
//! what the streams mean.
//!
//! The crate for such files refuses what a widely used writer makes (it fills up its list of sectors with other marks than
//! the standard asks for), so this reads them itself, and only as much as a workbook needs.

use std::fs::File;
use std::io::{Error, Read, Result, Seek, SeekFrom};

/// The bytes a compound file begins with.
pub(super) const MAGIC: [u8; 8] = [0xD0, 0xCF, 0x11, 0xE0, 0xA1, 0xB1, 0x1A, 0xE1];

/// From here on up a reference is to no sector (MS-CFB 2.1).
const NO_SECTOR: u32 = 0xFFFF_FFFA;

/// Shorter streams stand together in one, in sectors of this size.
const SMALL_STREAM: u64 = 4096;
const SMALL_SECTOR: u64 = 64;

/// The size of an entry in the list of streams.
const ENTRY: usize = 128;

/// A compound file, opened.
pub(super) struct Compound {
    file: File,
    length: u64,
    sector_size: u64,
    /// The sector that follows each sector.
    next: Vec<u32>,
    next_small: Vec<u32>,
    entries: Vec<Entry>,
}

/// A stream or a folder.
#[derive(Debug, Clone, PartialEq, Eq)]
struct Entry {
    name: String,
    kind: u8,
    neighbours: [u32; 2],
    child: u32,
    start: u32,
    length: u64,
}

fn broken(what: &str) -> Error {
    Error::other(what.to_owned())
}

fn number(bytes: &[u8], at: usize) -> Result<u32> {
    let bytes = bytes.get(at..).and_then(|rest| rest.first_chunk::<4>());
    bytes.map(|bytes| u32::from_le_bytes(*bytes)).ok_or_else(|| broken("it is cut off"))
}

fn numbers(bytes: &[u8]) -> impl Iterator<Item = u32> {
    bytes.as_chunks::<4>().0.iter().map(|bytes| u32::from_le_bytes(*bytes))
}

impl Compound {
    /// Reads the lists of sectors and streams; an error if the file cannot be one, is cut off or refers to itself in a
    /// circle.
    pub(super) fn open(mut file: File) -> Result<Self> {
        let length = file.seek(SeekFrom::End(0))?;
        let mut head = [0; 512];
        file.seek(SeekFrom::Start(0))?;
        file.read_exact(&mut head).map_err(|_short| broken("it is cut off"))?;
        let sector_size = match head.get(30..34) {
            Some([9, 0, 6, 0]) => 512,
            Some([12, 0, 6, 0]) => 4096,
            _ => return Err(broken("its sectors have a size no program uses")),
        };
        let mut compound =
            Self { file, length, sector_size, next: Vec::new(), next_small: Vec::new(), entries: Vec::new() };
        compound.next = compound.read_index(&head)?;
        let list = compound.read_chain(number(&head, 48)?, u64::MAX)?;
        compound.entries =
            list.chunks_exact(ENTRY).map(|entry| compound.entry(entry)).collect::<Result<_>>()?;
        let small = number(&head, 60)?;
        if small < NO_SECTOR && number(&head, 64)? > 0 {
            compound.next_small = numbers(&compound.read_chain(small, u64::MAX)?).collect();
        }
        Ok(compound)
    }

    /// The names of the streams and folders at the top.
    pub(super) fn names(&self) -> Result<Vec<String>> {
        Ok(self.top()?.into_iter().map(|entry| entry.name.clone()).collect())
    }

    /// The whole of a stream at the top; none if there is none of this name.
    pub(super) fn stream(&mut self, name: &str) -> Result<Option<Vec<u8>>> {
        let found =
            self.top()?.into_iter().find(|entry| entry.kind == 2 && entry.name.eq_ignore_ascii_case(name));
        let Some(entry) = found.cloned() else {
            return Ok(None);
        };
        let content = if entry.length < SMALL_STREAM {
            self.read_small(&entry)?
        } else {
            self.read_chain(entry.start, entry.length)?
        };
        if u64::try_from(content.len()) == Ok(entry.length) {
            Ok(Some(content))
        } else {
            Err(broken(&format!("its stream `{name}` is cut off")))
        }
    }

    /// How many sectors the file has, the last perhaps in part.
    fn sectors(&self) -> u64 {
        self.length.div_ceil(self.sector_size).saturating_sub(1)
    }

    /// Which sector follows which. The list stands in sectors that the head of the file names, and for large files in
    /// further ones; what goes beyond the sectors of the file is not believed.
    fn read_index(&mut self, head: &[u8]) -> Result<Vec<u32>> {
        // A further sector names 127 sectors of the list (or 1,023), each for 128 sectors of the file (or 1,024).
        let a_sector = self.sector_size / 4;
        let most = self.sectors() / (a_sector * (a_sector - 1)) + 2;
        let mut visited = 0;
        let needed = usize::try_from(self.sectors()).map_err(Error::other)?;
        let mut index = Vec::new();
        let mut places: Vec<u32> = numbers(head.get(76..).unwrap_or_default()).collect();
        let mut further = number(head, 68)?;
        loop {
            for place in places.drain(..).filter(|place| *place < NO_SECTOR) {
                if index.len() >= needed {
                    index.truncate(needed);
                    return Ok(index);
                }
                let sector = self.read_sectors(place, 1)?;
                index.extend(numbers(&sector));
            }
            if further >= NO_SECTOR {
                index.truncate(needed);
                return Ok(index);
            }
            visited += 1;
            if visited > most {
                return Err(broken("its list of sectors refers to itself"));
            }
            let sector = self.read_sectors(further, 1)?;
            places.extend(numbers(&sector));
            further = places.pop().unwrap_or(NO_SECTOR);
        }
    }

    /// Some sectors that stand side by side; the last of the file may be short.
    fn read_sectors(&mut self, first: u32, count: u64) -> Result<Vec<u8>> {
        let begin = (u64::from(first) + 1) * self.sector_size;
        if begin >= self.length {
            return Err(broken("it is cut off or refers to a sector it does not have"));
        }
        self.file.seek(SeekFrom::Start(begin))?;
        let mut content = Vec::new();
        self.file.by_ref().take(count * self.sector_size).read_to_end(&mut content)?;
        Ok(content)
    }

    /// The content of a chain of sectors, up to a length.
    fn read_chain(&mut self, start: u32, length: u64) -> Result<Vec<u8>> {
        let mut content = Vec::new();
        for (first, count) in runs(start, &self.next, length.div_ceil(self.sector_size))? {
            content.extend(self.read_sectors(first, count)?);
        }
        content.truncate(usize::try_from(length).unwrap_or(usize::MAX));
        Ok(content)
    }

    /// A short stream: in small sectors, which stand in a stream of their own.
    fn read_small(&mut self, entry: &Entry) -> Result<Vec<u8>> {
        let root = self.entries.first().ok_or_else(|| broken("it lists no stream"))?;
        let (start, length) = (root.start, root.length);
        let all = self.read_chain(start, length)?;
        let mut content = Vec::new();
        for (first, count) in runs(entry.start, &self.next_small, entry.length.div_ceil(SMALL_SECTOR))? {
            let place = |sector: u64| usize::try_from(sector * SMALL_SECTOR).unwrap_or(usize::MAX);
            let (begin, end) = (place(first.into()), place(u64::from(first) + count));
            let piece =
                all.get(begin..end.min(all.len())).ok_or_else(|| broken("a short stream is cut off"))?;
            content.extend_from_slice(piece);
        }
        content.truncate(usize::try_from(entry.length).unwrap_or(usize::MAX));
        Ok(content)
    }

    fn entry(&self, bytes: &[u8]) -> Result<Entry> {
        let units = bytes.get(..64).unwrap_or_default().as_chunks::<2>().0;
        let units = units.iter().map(|unit| u16::from_le_bytes(*unit)).take_while(|unit| *unit != 0);
        let upper = if self.sector_size == 512 { 0 } else { number(bytes, 124)? };
        Ok(Entry {
            name: char::decode_utf16(units).map(|unit| unit.unwrap_or(char::REPLACEMENT_CHARACTER)).collect(),
            kind: bytes.get(66).copied().unwrap_or(0),
            neighbours: [number(bytes, 68)?, number(bytes, 72)?],
            child: number(bytes, 76)?,
            start: number(bytes, 116)?,
            length: u64::from(number(bytes, 120)?) | (u64::from(upper) << 32),
        })
    }

    /// The entries at the top: the tree below the first entry, without what is inside of folders.
    fn top(&self) -> Result<Vec<&Entry>> {
        let find = |place: u32| usize::try_from(place).ok().and_then(|place| self.entries.get(place));
        let mut waiting: Vec<u32> = self.entries.first().map(|root| root.child).into_iter().collect();
        let mut found = Vec::new();
        while let Some(place) = waiting.pop() {
            let Some(entry) = find(place).filter(|_| place < NO_SECTOR) else {
                continue;
            };
            if found.len() >= self.entries.len() {
                return Err(broken("its list of streams refers to itself"));
            }
            found.push(entry);
            waiting.extend(entry.neighbours);
        }
        Ok(found)
    }
}

/// A chain of sectors as runs of neighbours, each by its first and its length, until `most` sectors are found.
fn runs(start: u32, next: &[u32], most: u64) -> Result<Vec<(u32, u64)>> {
    let mut runs: Vec<(u32, u64)> = Vec::new();
    let mut visited = vec![false; next.len()];
    let (mut sector, mut count) = (start, 0);
    while sector < NO_SECTOR && count < most {
        let place = usize::try_from(sector).unwrap_or(usize::MAX);
        let (Some(following), Some(visited)) = (next.get(place), visited.get_mut(place)) else {
            return Err(broken("it is cut off or refers to a sector it does not have"));
        };
        if std::mem::replace(visited, true) {
            return Err(broken("a chain of its sectors refers to itself"));
        }
        match runs.last_mut() {
            Some((first, length)) if u64::from(*first) + *length == u64::from(sector) => *length += 1,
            _ => runs.push((sector, 1)),
        }
        count += 1;
        sector = *following;
    }
    Ok(runs)
}
