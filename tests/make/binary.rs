//! Makes xls and xlsb workbooks record by record, sound ones and ones that are broken on purpose.

use std::io::Result;
use std::path::Path;

/// The size of a sector, in bytes.
const SECTOR: usize = 512;

/// An xls workbook as records.
#[derive(Clone)]
pub struct RawXls {
    version: u16,
    globals: Vec<u8>,
    sheets: Vec<RawSheet>,
}

/// A sheet: its name, its kind and visibility as they are stored, and its records.
#[derive(Clone)]
struct RawSheet {
    name: String,
    kind: u8,
    visibility: u8,
    records: Vec<u8>,
}

/// One record of an xls workbook.
pub fn record(kind: u16, data: &[u8]) -> Vec<u8> {
    let mut bytes = kind.to_le_bytes().to_vec();
    bytes.extend(u16::try_from(data.len()).unwrap_or(u16::MAX).to_le_bytes());
    bytes.extend(data);
    bytes
}

/// The data of a record: numbers of two bytes, then the rest.
pub fn shorts(numbers: &[u16], rest: &[u8]) -> Vec<u8> {
    numbers.iter().flat_map(|number| number.to_le_bytes()).chain(rest.iter().copied()).collect()
}

/// A number in a cell.
pub fn number(row: u16, column: u16, value: f64) -> Vec<u8> {
    record(0x0203, &shorts(&[row, column, 0], &value.to_le_bytes()))
}

/// A formula with its stored result, as eight bytes, and its flags.
pub fn formula(row: u16, column: u16, result: [u8; 8], flags: u16) -> Vec<u8> {
    let mut data = shorts(&[row, column, 0], &result);
    data.extend(shorts(&[flags, 0, 0, 0], &[]));
    record(0x0006, &data)
}

/// A text in the cell's own record, in the short form of UTF-16.
pub fn label(row: u16, column: u16, text: &[u8]) -> Vec<u8> {
    let mut data = shorts(&[row, column, 0, u16::try_from(text.len()).unwrap_or(0)], &[0]);
    data.extend(text);
    record(0x0204, &data)
}

impl RawXls {
    /// A workbook of 1997 whose only sheet, `Substances`, holds these records.
    pub fn with_records(records: &[u8]) -> Self {
        Self { version: 0x0600, globals: Vec::new(), sheets: Vec::new() }.sheet("Substances", 0, 0, records)
    }

    /// The same of the version of 1993.
    pub fn of_1993(records: &[u8]) -> Self {
        Self { version: 0x0500, ..Self::with_records(records) }
    }

    /// Adds a record before the sheets.
    pub fn global(mut self, record: &[u8]) -> Self {
        self.globals.extend(record);
        self
    }

    /// Adds a sheet.
    pub fn sheet(mut self, name: &str, kind: u8, visibility: u8, records: &[u8]) -> Self {
        self.sheets.push(RawSheet { name: name.to_owned(), kind, visibility, records: records.to_vec() });
        self
    }

    /// All records in a row.
    pub fn stream(&self) -> Vec<u8> {
        let begin = |kind: u16| record(0x0809, &shorts(&[self.version, kind, 0, 0], &[0; 8]));
        let entry = |sheet: &RawSheet, place: usize| {
            let mut data = u32::try_from(place).unwrap_or(0).to_le_bytes().to_vec();
            data.extend([sheet.visibility, sheet.kind, u8::try_from(sheet.name.len()).unwrap_or(0)]);
            if self.version == 0x0600 {
                data.push(0);
            }
            data.extend(sheet.name.bytes());
            record(0x0085, &data)
        };
        let end = record(0x000A, &[]);
        let bodies: Vec<Vec<u8>> = self
            .sheets
            .iter()
            .map(|sheet| [begin(0x10), sheet.records.clone(), end.clone()].concat())
            .collect();
        let head = begin(0x05).len()
            + self.sheets.iter().map(|sheet| entry(sheet, 0).len()).sum::<usize>()
            + self.globals.len()
            + end.len();
        let mut place = head;
        let mut stream = begin(0x05);
        stream.extend(&self.globals);
        for (sheet, body) in self.sheets.iter().zip(&bodies) {
            stream.extend(entry(sheet, place));
            place += body.len();
        }
        stream.extend(end);
        stream.extend(bodies.concat());
        stream
    }

    /// Writes the workbook.
    pub fn write(&self, path: &Path) -> Result<()> {
        std::fs::write(path, compound_file("Workbook", &self.stream()))
    }
}

/// How many sectors the head of a compound file can name as its list of sectors.
const NAMED: usize = 109;

/// A compound file with one stream at the top: the head, sectors with the list of sectors, one with the list of streams, the
/// stream, and for a large file sectors that name further ones of the list.
pub fn compound_file(name: &str, stream: &[u8]) -> Vec<u8> {
    let content = stream.len().max(4096).div_ceil(SECTOR);
    let a_sector = SECTOR / 4;
    let lists = (content + 4).div_ceil(a_sector - 2);
    let further = lists.saturating_sub(NAMED).div_ceil(a_sector - 1);
    let long = |number: usize| u32::try_from(number).unwrap_or(0);
    let (end, none) = (0xFFFF_FFFE, u32::MAX);
    let mut next: Vec<u32> = vec![0xFFFF_FFFD; lists];
    next.push(end);
    next.extend((1..).take(content - 1).map(|step| long(lists + 1) + step));
    next.push(end);
    next.extend(vec![0xFFFF_FFFC; further]);
    next.resize(lists * a_sector, none);
    let first_further = lists + 1 + content;
    let mut file = vec![0xD0, 0xCF, 0x11, 0xE0, 0xA1, 0xB1, 0x1A, 0xE1];
    file.extend([0; 16]);
    file.extend(shorts(&[0x3E, 3, 0xFFFE, 9, 6, 0, 0, 0, 0, 0], &[]));
    let begin = if further == 0 { end } else { long(first_further) };
    file.extend(longs(&[long(lists), long(lists), 0, 4096, end, 0, begin, long(further)], &[]));
    let mut named: Vec<u32> = (0..long(lists)).collect();
    named.resize(lists.max(NAMED), none);
    let later = named.split_off(NAMED);
    file.extend(longs(&named, &[]));
    file.extend(longs(&next, &[]));
    file.extend(entry("Root Entry", 5, 1, end, 0));
    file.extend(entry(name, 2, none, long(lists + 1), content * SECTOR));
    file.extend([0; 2 * 128]);
    file.extend(stream);
    file.resize((lists + 2 + content) * SECTOR, 0);
    for (place, piece) in (1..).zip(later.chunks(a_sector - 1)) {
        let mut sector = piece.to_vec();
        sector.resize(a_sector - 1, none);
        sector.push(if place == further { end } else { long(first_further + place) });
        file.extend(longs(&sector, &[]));
    }
    file
}

fn entry(name: &str, kind: u8, child: u32, start: u32, length: usize) -> Vec<u8> {
    let mut bytes: Vec<u8> = name.encode_utf16().flat_map(u16::to_le_bytes).collect();
    bytes.resize(64, 0);
    bytes.extend(u16::try_from(2 * name.len() + 2).unwrap_or(0).to_le_bytes());
    bytes.extend([kind, 1]);
    for number in [u32::MAX, u32::MAX, child] {
        bytes.extend(number.to_le_bytes());
    }
    bytes.resize(116, 0);
    bytes.extend(start.to_le_bytes());
    bytes.extend(u32::try_from(length).unwrap_or(0).to_le_bytes());
    bytes.resize(128, 0);
    bytes
}

/// One record of an xlsb workbook.
pub fn wide_record(kind: u16, data: &[u8]) -> Vec<u8> {
    let mut bytes = Vec::new();
    let low = u8::try_from(kind & 0x7F).unwrap_or(0);
    if kind < 0x80 {
        bytes.push(low);
    } else {
        bytes.extend([low | 0x80, u8::try_from(kind >> 7).unwrap_or(0)]);
    }
    let mut rest = data.len();
    loop {
        let low = u8::try_from(rest & 0x7F).unwrap_or(0);
        rest >>= 7;
        bytes.push(if rest == 0 { low } else { low | 0x80 });
        if rest == 0 {
            break;
        }
    }
    bytes.extend(data);
    bytes
}

/// The data of a record: numbers of four bytes, then the rest.
pub fn longs(numbers: &[u32], rest: &[u8]) -> Vec<u8> {
    numbers.iter().flat_map(|number| number.to_le_bytes()).chain(rest.iter().copied()).collect()
}

/// A text by its length, in UTF-16.
pub fn wide_text(text: &str) -> Vec<u8> {
    let units: Vec<u16> = text.encode_utf16().collect();
    let length = u32::try_from(units.len()).unwrap_or(0);
    longs(&[length], &shorts(&units, &[]))
}

/// The head of a row.
pub fn wide_row(row: u32) -> Vec<u8> {
    wide_record(0x0000, &longs(&[row, 0], &[0; 9]))
}

/// A number in a cell of the row that was begun last.
pub fn wide_number(column: u32, value: f64) -> Vec<u8> {
    wide_record(0x0005, &longs(&[column, 0], &value.to_le_bytes()))
}

/// The parts of an xlsb workbook whose only sheet, `Substances`, holds these records among its cells; `flags` are those of
/// the workbook.
pub fn xlsb_parts(cells: &[u8], flags: u32) -> Vec<(&'static str, Vec<u8>)> {
    let kinds = "http://schemas.openxmlformats.org/officeDocument/2006/relationships";
    let relations = |target: &str, kind: &str| {
        format!(r#"<Relationships><Relationship Id="rId1" Type="{kinds}/{kind}" Target="{target}"/></Relationships>"#)
            .into_bytes()
    };
    let listed = [longs(&[0, 1], &[]), wide_text("rId1"), wide_text("Substances")].concat();
    let workbook = [
        wide_record(0x0083, &[]),
        wide_record(0x0099, &longs(&[flags, 0, 0], &[])),
        wide_record(0x009C, &listed),
        wide_record(0x0084, &[]),
    ];
    let sheet =
        [wide_record(0x0081, &[]), wide_record(0x0091, &[]), cells.to_vec(), wide_record(0x0092, &[])];
    vec![
        ("_rels/.rels", relations("xl/workbook.bin", "officeDocument")),
        ("xl/_rels/workbook.bin.rels", relations("worksheets/sheet1.bin", "worksheet")),
        ("xl/workbook.bin", workbook.concat()),
        ("xl/worksheets/sheet1.bin", sheet.concat()),
    ]
}
