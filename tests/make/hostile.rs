//! Makes workbooks part by part, sound ones and ones that are broken on purpose, for tests to be refused.

use std::fs::File;
use std::io::{Result, Write};
use std::path::Path;

use zip::ZipWriter;
use zip::write::SimpleFileOptions;

/// The first bytes of an OLE compound file.
const COMPOUND_FILE: [u8; 8] = [0xD0, 0xCF, 0x11, 0xE0, 0xA1, 0xB1, 0x1A, 0xE1];

/// A workbook as a list of parts with one worksheet, `Substances`.
pub struct RawBook {
    parts: Vec<(String, Vec<u8>)>,
}

impl RawBook {
    /// A sound workbook whose only sheet holds these rows, written as XML.
    pub fn with_rows(rows: &str) -> Self {
        Self::with_sheet(&format!("<sheetData>{rows}</sheetData>"))
    }

    /// A sound workbook whose only sheet holds these elements, written as XML.
    pub fn with_sheet(elements: &str) -> Self {
        let head = r#"<?xml version="1.0" encoding="UTF-8" standalone="yes"?>"#;
        let main = "http://schemas.openxmlformats.org/spreadsheetml/2006/main";
        let office = "http://schemas.openxmlformats.org/officeDocument/2006/relationships";
        let package = "http://schemas.openxmlformats.org/package/2006";
        let parts = [
            (
                "[Content_Types].xml",
                format!(
                    r#"{head}<Types xmlns="{package}/content-types"><Default Extension="xml" ContentType="application/xml"/></Types>"#
                ),
            ),
            (
                "_rels/.rels",
                format!(
                    r#"{head}<Relationships xmlns="{package}/relationships"><Relationship Id="rId1" Type="{office}/officeDocument" Target="xl/workbook.xml"/></Relationships>"#
                ),
            ),
            (
                "xl/workbook.xml",
                format!(
                    r#"{head}<workbook xmlns="{main}" xmlns:r="{office}"><sheets><sheet name="Substances" sheetId="1" r:id="rId1"/></sheets></workbook>"#
                ),
            ),
            (
                "xl/_rels/workbook.xml.rels",
                format!(
                    r#"{head}<Relationships xmlns="{package}/relationships"><Relationship Id="rId1" Type="{office}/worksheet" Target="worksheets/sheet1.xml"/></Relationships>"#
                ),
            ),
            (
                "xl/worksheets/sheet1.xml",
                format!(r#"{head}<worksheet xmlns="{main}">{elements}</worksheet>"#),
            ),
        ];
        Self {
            parts: parts.into_iter().map(|(name, content)| (name.to_owned(), content.into_bytes())).collect(),
        }
    }

    /// Adds a part, or replaces it.
    pub fn part(mut self, name: &str, content: impl Into<Vec<u8>>) -> Self {
        self.parts.retain(|(known, _)| known != name);
        self.parts.push((name.to_owned(), content.into()));
        self
    }

    /// Replaces a text within a part.
    pub fn edit(mut self, name: &str, from: &str, to: &str) -> Self {
        for (known, content) in &mut self.parts {
            if known == name {
                *content = String::from_utf8_lossy(content).replace(from, to).into_bytes();
            }
        }
        self
    }

    /// Writes the workbook.
    pub fn write(&self, path: &Path) -> Result<()> {
        let parts: Vec<(&str, &[u8])> =
            self.parts.iter().map(|(name, content)| (name.as_str(), content.as_slice())).collect();
        write_zip(path, &parts)
    }

    /// Writes the first half of the workbook's bytes only, as a broken download leaves it.
    pub fn write_cut_off(&self, path: &Path) -> Result<()> {
        self.write(path)?;
        let half = std::fs::metadata(path)?.len() / 2;
        File::options().write(true).open(path)?.set_len(half)
    }

    /// Writes the workbook with its sheet in UTF-16, which XML allows and the reading library reads as empty.
    pub fn write_in_utf16(mut self, path: &Path) -> Result<()> {
        for (name, content) in &mut self.parts {
            if name == "xl/worksheets/sheet1.xml" {
                let text = String::from_utf8_lossy(content).replace("UTF-8", "UTF-16");
                *content =
                    "\u{feff}".encode_utf16().chain(text.encode_utf16()).flat_map(u16::to_le_bytes).collect();
            }
        }
        self.write(path)
    }
}

/// A workbook whose sheet is many megabytes of spaces, which take a thousandth of that in the file.
pub fn write_bomb(path: &Path) -> Result<()> {
    let spaces = " ".repeat(40 << 20);
    RawBook::with_sheet(&format!("{spaces}<sheetData/>")).write(path)
}

/// A workbook that claims four billion shared texts and has one.
pub fn write_false_text_count(path: &Path) -> Result<()> {
    RawBook::with_rows(r#"<row r="1"><c r="A1" t="s"><v>0</v></c></row>"#)
        .part(
            "xl/sharedStrings.xml",
            r#"<sst count="4000000000" uniqueCount="4000000000"><si><t>CAS</t></si></sst>"#,
        )
        .write(path)
}

/// A text document in the container a workbook would have.
pub fn write_text_document(path: &Path) -> Result<()> {
    let relations = r#"<Relationships><Relationship Id="rId1" Type="http://schemas.openxmlformats.org/officeDocument/2006/relationships/officeDocument" Target="word/document.xml"/></Relationships>"#;
    write_zip(path, &[("_rels/.rels", relations.as_bytes()), ("word/document.xml", b"<document/>")])
}

/// An OpenDocument workbook, or what tells one.
pub fn write_open_document(path: &Path) -> Result<()> {
    write_zip(
        path,
        &[("mimetype", b"application/vnd.oasis.opendocument.spreadsheet"), ("content.xml", b"<content/>")],
    )
}

/// A binary workbook in a zip container, or what tells one.
pub fn write_xlsb(path: &Path) -> Result<()> {
    let relations = r#"<Relationships><Relationship Id="rId1" Type="http://schemas.openxmlformats.org/officeDocument/2006/relationships/officeDocument" Target="xl/workbook.bin"/></Relationships>"#;
    write_zip(path, &[("_rels/.rels", relations.as_bytes()), ("xl/workbook.bin", &[0x83, 0x01])])
}

/// The beginning of a compound file that has a stream of this name.
pub fn write_compound_file(path: &Path, stream: &str) -> Result<()> {
    let mut content = COMPOUND_FILE.to_vec();
    content.resize(1024, 0);
    content.extend(stream.encode_utf16().flat_map(u16::to_le_bytes));
    content.resize(2048, 0);
    std::fs::write(path, content)
}

/// A zip container with these parts.
pub fn write_zip(path: &Path, parts: &[(&str, &[u8])]) -> Result<()> {
    let mut writer = ZipWriter::new(File::create(path)?);
    for (name, content) in parts {
        writer.start_file(*name, SimpleFileOptions::default())?;
        writer.write_all(content)?;
    }
    writer.finish()?;
    Ok(())
}
