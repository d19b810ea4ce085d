//! Says what a file is by its content, before any library opens it. It reads no cells.

use std::fs::File;
use std::io::{Read, Seek, SeekFrom};
use std::path::Path;

use crate::fault::{FileFault, FileKind};

use super::compound::{Compound, MAGIC};
use super::encoding::wide_encoding;
use super::package::Package;

/// How much of a damaged container is searched for the names of its streams, in bytes.
const SEARCHED: u64 = 32 << 20;

/// How much of a text is looked at to tell what kind it is, in bytes.
const GLANCED_AT: u64 = 8192;

/// One control character in so many bytes is a slip of an export; more of them are no text.
const BYTES_A_CONTROL: usize = 50;

/// A file that may hold an inventory, by how it begins.
pub(super) enum Container {
    /// A zip container; what is in it shows later.
    Zip(File),
    /// A workbook of the old binary format, in its compound file or bare.
    Compound(File),
    /// Lines of text.
    Text(File),
    /// An OpenDocument workbook written as one XML file.
    FlatOds(File),
}

/// Opens a file that may hold an inventory; anything else is named as what it is.
pub(super) fn open(path: &Path) -> Result<Container, FileFault> {
    let shown = path.display().to_string();
    let unreadable = |error: std::io::Error| FileFault::Unreadable {
        path: path.display().to_string(),
        reason: error.to_string(),
    };
    let details = match std::fs::metadata(path) {
        Ok(details) => details,
        Err(error) if error.kind() == std::io::ErrorKind::NotFound => {
            return Err(FileFault::Missing { path: shown });
        }
        Err(error) => return Err(unreadable(error)),
    };
    if details.is_dir() {
        return Err(FileFault::Folder { path: shown });
    }
    if !details.is_file() {
        return Err(FileFault::Unreadable { path: shown, reason: "it is not a regular file".to_owned() });
    }
    let mut file = File::open(path).map_err(unreadable)?;
    let found = kind_by_content(&mut file).map_err(unreadable)?;
    file.seek(SeekFrom::Start(0)).map_err(unreadable)?;
    match found {
        None => Ok(Container::Zip(file)),
        Some(FileKind::Xls) => Ok(Container::Compound(file)),
        Some(FileKind::Text) => Ok(Container::Text(file)),
        Some(FileKind::Ods) => Ok(Container::FlatOds(file)),
        Some(found) => Err(FileFault::AnotherKind { path: shown, found }),
    }
}

/// What the file is, or none if it begins as a zip container does.
fn kind_by_content(file: &mut File) -> std::io::Result<Option<FileKind>> {
    let mut beginning = Vec::new();
    file.by_ref().take(GLANCED_AT).read_to_end(&mut beginning)?;
    file.seek(SeekFrom::Start(0))?;
    if beginning.starts_with(b"PK\x03\x04") || beginning.starts_with(b"PK\x05\x06") {
        return Ok(None);
    }
    if beginning.starts_with(&MAGIC) {
        return kind_of_compound_file(file).map(Some);
    }
    Ok(Some(kind_of_flat_file(&beginning)))
}

/// An encrypted workbook stands in the same container as an old binary one; the names of the streams tell.
fn kind_of_compound_file(file: &mut File) -> std::io::Result<FileKind> {
    match Compound::open(file.try_clone()?).and_then(|compound| compound.names()) {
        Ok(names) => Ok(kind_by_streams(|name| names.iter().any(|known| known.eq_ignore_ascii_case(name)))),
        Err(_damaged) => kind_of_damaged_compound_file(file),
    }
}

/// Where the container cannot be listed, the names of its streams may still be found. They often stand at its end, so that
/// none is found in a file that was cut off: opening it as a workbook will then say that.
fn kind_of_damaged_compound_file(file: &mut File) -> std::io::Result<FileKind> {
    let mut content = Vec::new();
    file.seek(SeekFrom::Start(0))?;
    file.take(SEARCHED).read_to_end(&mut content)?;
    let found = kind_by_streams(|name| {
        let wide: Vec<u8> = name.encode_utf16().flat_map(u16::to_le_bytes).collect();
        content.windows(wide.len()).any(|window| window == wide)
    });
    Ok(if found == FileKind::Unknown { FileKind::Xls } else { found })
}

fn kind_by_streams(has: impl Fn(&str) -> bool) -> FileKind {
    if has("EncryptedPackage") {
        FileKind::Encrypted
    } else if has("Workbook") || has("Book") {
        FileKind::Xls
    } else if has("WordDocument") || has("PowerPoint Document") {
        FileKind::Document
    } else {
        FileKind::Unknown
    }
}

fn kind_of_flat_file(beginning: &[u8]) -> FileKind {
    if beginning.is_empty() {
        return FileKind::Empty;
    }
    // BIFF2 to BIFF4, which stood alone in a file.
    if beginning.starts_with(&[0x09, 0x00])
        || beginning.starts_with(&[0x09, 0x02])
        || beginning.starts_with(&[0x09, 0x04])
    {
        return FileKind::Xls;
    }
    if beginning.starts_with(b"%PDF") {
        return FileKind::Pdf;
    }
    if beginning.starts_with(b"{\\rtf") {
        return FileKind::Document;
    }
    if [&b"\x1F\x8B"[..], b"7z\xBC\xAF", b"Rar!", b"BZh", b"\xFD7zXZ"]
        .iter()
        .any(|magic| beginning.starts_with(magic))
    {
        return FileKind::Archive;
    }
    text_of(beginning).map_or(FileKind::Unknown, |text| kind_of_text(&text))
}

/// The beginning as lower-case text, if it looks like text in some encoding.
fn text_of(beginning: &[u8]) -> Option<String> {
    if let Some((encoding, _)) = wide_encoding(beginning) {
        let (text, _) = encoding.decode_with_bom_removal(beginning);
        return few_controls(text.chars().map(u32::from), text.chars().count()).then(|| text.to_lowercase());
    }
    // Telling the kind of a text needs its ASCII letters only.
    few_controls(beginning.iter().copied().map(u32::from), beginning.len())
        .then(|| String::from_utf8_lossy(beginning).to_lowercase())
}

/// What is no text has many characters that control a device; the text of an export has a slip at most.
fn few_controls(characters: impl Iterator<Item = u32>, length: usize) -> bool {
    let controls = characters
        .filter(|character| *character < 0x20 && !matches!(*character, 0x09 | 0x0A | 0x0C | 0x0D | 0x1A))
        .count();
    controls * BYTES_A_CONTROL <= length
}

fn kind_of_text(text: &str) -> FileKind {
    let text = text.trim_start_matches('\u{feff}').trim_start();
    if text.is_empty() {
        FileKind::Empty
    } else if text.starts_with('{') || text.starts_with("[{") || text.starts_with("[[") {
        FileKind::Json
    } else if !text.starts_with('<') {
        FileKind::Text
    } else if text.contains("application/vnd.oasis.opendocument.spreadsheet") {
        FileKind::Ods
    } else if text.contains("schemas-microsoft-com:office:spreadsheet") && !text.contains("<html") {
        FileKind::XmlSpreadsheet
    } else if ["<html", "<!doctype html", "<table", "<head", "<body", "<meta"]
        .iter()
        .any(|tag| text.contains(tag))
    {
        FileKind::Html
    } else {
        FileKind::Xml
    }
}

/// What a zip container holds, as far as the names of its parts tell; an xlsx workbook is an archive here.
pub(super) fn kind_of_package(package: &mut Package) -> FileKind {
    let media_type = package.beginning_of("mimetype");
    kind_of_parts(package.part_names(), &media_type)
}

/// What a container without an xlsx workbook holds, by the names of its parts.
fn kind_of_parts<'name>(names: impl Iterator<Item = &'name str>, media_type: &str) -> FileKind {
    if media_type.starts_with("application/vnd.oasis.opendocument.spreadsheet") {
        return FileKind::Ods;
    }
    if media_type.starts_with("application/vnd.oasis.opendocument") {
        return FileKind::Document;
    }
    let mut found = FileKind::Archive;
    let mut open_document = (false, false);
    for name in names {
        open_document.0 |= name == "content.xml";
        open_document.1 |= name == "META-INF/manifest.xml";
        if name.eq_ignore_ascii_case("xl/workbook.bin") {
            return FileKind::Xlsb;
        }
        if name.starts_with("word/") || name.starts_with("ppt/") {
            found = FileKind::Document;
        }
    }
    // Packed anew by a program that left the media type out; the content will say which kind it is.
    if found == FileKind::Archive && open_document == (true, true) { FileKind::Ods } else { found }
}
