//! The compound file an old binary workbook stands in: a small file system of streams. It does not know what they mean.

use std::fs::File;
use std::io::{BufReader, Error, Read, Result, Seek, SeekFrom};

use cfb::CompoundFile;

use super::caught::without_panic;

/// The bytes a compound file begins with.
pub(super) const MAGIC: [u8; 8] = [0xD0, 0xCF, 0x11, 0xE0, 0xA1, 0xB1, 0x1A, 0xE1];

/// A sector reference from here on up refers to no sector (MS-CFB 2.1).
const NO_SECTOR: u32 = 0xFFFF_FFFA;

/// A compound file, opened.
pub(super) struct Compound {
    file: CompoundFile<BufReader<File>>,
    length: u64,
}

impl Compound {
    /// Lists the streams; an error if the file cannot be one, is cut off or refers to itself in a circle.
    pub(super) fn open(mut file: File) -> Result<Self> {
        let length = file.seek(SeekFrom::End(0))?;
        check_index(&mut file, length)?;
        file.seek(SeekFrom::Start(0))?;
        let file = contained(|| CompoundFile::open(BufReader::new(file)))?;
        Ok(Self { file, length })
    }

    /// The names of the streams and folders at the top.
    pub(super) fn names(&self) -> Vec<String> {
        self.file.read_root_storage().map(|entry| entry.name().to_owned()).collect()
    }

    /// The whole of a stream at the top; none if there is none of this name.
    pub(super) fn stream(&mut self, name: &str) -> Result<Option<Vec<u8>>> {
        let path = format!("/{name}");
        if !self.file.is_stream(&path) {
            return Ok(None);
        }
        let length = self.file.entry(&path)?.len();
        if length > self.length {
            return Err(Error::other(format!("`{name}` claims to be larger than the file")));
        }
        let mut content = Vec::new();
        contained(|| self.file.open_stream(&path)?.take(length).read_to_end(&mut content))?;
        if u64::try_from(content.len()) == Ok(length) {
            Ok(Some(content))
        } else {
            Err(Error::other(format!("`{name}` is cut off")))
        }
    }
}

fn contained<Outcome>(work: impl FnOnce() -> Result<Outcome>) -> Result<Outcome> {
    without_panic(work).map_err(Error::other)?
}

/// The library reads the index of the sectors as often as the file asks for it, so a small file could fill the memory:
/// a sound index is never longer than the file has sectors.
fn check_index(file: &mut File, length: u64) -> Result<()> {
    let circle = || Error::other("its index refers to itself");
    let mut head = [0; 512];
    file.seek(SeekFrom::Start(0))?;
    file.read_exact(&mut head)?;
    let number = |bytes: &[u8], at: usize| {
        let bytes = bytes.get(at..)?.first_chunk::<4>()?;
        Some(u32::from_le_bytes(*bytes))
    };
    let size: u64 = if head.get(30) == Some(&12) { 4096 } else { 512 };
    let sectors = length / size;
    // Each further sector of the list of index sectors names 127 (or 1,023) of them, each for 128 (or 1,024) sectors.
    let per_sector = size / 4;
    let most = sectors / (per_sector * (per_sector - 1)) + 2;
    let mut next = number(&head, 68).unwrap_or(NO_SECTOR);
    let mut count = 0_u64;
    while next < NO_SECTOR {
        count += 1;
        if count > most {
            return Err(circle());
        }
        file.seek(SeekFrom::Start((u64::from(next) + 2) * size - 4))?;
        let mut link = [0; 4];
        file.read_exact(&mut link)?;
        next = u32::from_le_bytes(link);
    }
    Ok(())
}
