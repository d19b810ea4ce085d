//! Faults of whole files: the inventory cannot be used, or the output cannot be written.

use std::fmt;

use super::LinesFault;
use crate::workbook::CellRef;

/// Why an inventory could not be read or an output not written.
#[derive(Debug, thiserror::Error)]
pub enum FileFault {
    /// No file at the path.
    #[error("{path}: there is no such file; check the path")]
    Missing {
        /// The path as given.
        path: String,
    },
    /// A folder where a file is needed.
    #[error("{path}: is a folder; name the workbook inside it")]
    Folder {
        /// The path as given.
        path: String,
    },
    /// The system would not let the file be read.
    #[error(
        "{path}: cannot be read ({reason}); check that you may open it and that no other program holds it"
    )]
    Unreadable {
        /// The path as given.
        path: String,
        /// What the system said.
        reason: String,
    },
    /// A file of another kind, whatever its name says.
    #[error("{path}: {found}; {}", .found.remedy())]
    AnotherKind {
        /// The path as given.
        path: String,
        /// What the content is.
        found: FileKind,
    },
    /// A workbook that is cut off, contradicts itself or is not built as the format says.
    #[error(
        "{path}: the workbook is damaged ({what}); open it in a spreadsheet program, save it again as xlsx and use that file"
    )]
    Damaged {
        /// The path as given.
        path: String,
        /// What was found.
        what: String,
    },
    /// A workbook that unpacks to more than an inventory can be.
    #[error(
        "{path}: {part} unpacks to {found}, more than an inventory can need ({limit}); if the file is yours, \
         split it into several workbooks"
    )]
    TooLarge {
        /// The path as given.
        path: String,
        /// The part of the workbook.
        part: String,
        /// How much was found.
        found: String,
        /// How much is accepted.
        limit: String,
    },
    /// A sheet whose cells cannot be trusted to stand where they say.
    #[error("{path}: {fault}; open it in a spreadsheet program, save it again as xlsx and use that file")]
    Sheet {
        /// The path as given.
        path: String,
        /// What is wrong, and in which sheet or cell.
        fault: SheetFault,
    },
    /// No sheet has a header that is known.
    #[error(
        "{path}: no sheet has a header that is recognised ({}); a header stands within the first 30 rows that hold anything and needs a column for a CAS number, an EC number or a structure, or a name beside another known column. `kowledger columns` shows what was found, and `--column 'Header=field'` names a column{}", .sheets.join(", "), sentences_behind(.how_read)
    )]
    NoHeader {
        /// The path as given.
        path: String,
        /// How the file was read where it does not say so itself, in sentences.
        how_read: Vec<String>,
        /// The sheets that were looked at.
        sheets: Vec<String>,
    },
    /// The sheet is too wide for the added columns.
    #[error(
        "sheet {sheet}: {used} columns are used and {needed} more are needed, but a sheet has 16384; remove columns that stand far to the right, or apply fewer rulebooks"
    )]
    NoRoom {
        /// The sheet.
        sheet: String,
        /// Columns in use.
        used: usize,
        /// Columns to add.
        needed: usize,
    },
    /// The inventory is an output of this program.
    #[error(
        "{path}: has been screened already (it holds the hidden sheet `Record`); screen the inventory it was made from, which the sheet `Run record` names"
    )]
    AlreadyScreened {
        /// The path as given.
        path: String,
    },
    /// The output exists and may not be replaced.
    #[error("{path}: exists already; add `--force` to replace it, or choose another `--output`")]
    OutputExists {
        /// The path as given.
        path: String,
    },
    /// The output would replace a file the run reads.
    #[error("{path}: is read by this run and is never written over; choose another `--output`")]
    OutputIsInput {
        /// The path as given.
        path: String,
    },
    /// The output's folder is not there.
    #[error("{folder}: there is no such folder; create it, or choose another `--output`")]
    OutputFolderMissing {
        /// The folder.
        folder: String,
    },
    /// The output's folder cannot be written into.
    #[error("{folder}: cannot be written into ({reason}); choose another `--output`")]
    OutputFolderClosed {
        /// The folder.
        folder: String,
        /// What the system said.
        reason: String,
    },
    /// Lines of text that cannot be cut into the cells of a table.
    #[error("{path}: {fault}")]
    Lines {
        /// The path as given.
        path: String,
        /// What is wrong, and in which row and line.
        fault: LinesFault,
    },
    /// Writing began and failed.
    #[error(
        "{path}: could not be written ({reason}); nothing was left there. Check the space on the disk, \
         or choose another `--output`"
    )]
    OutputFailed {
        /// The path as given.
        path: String,
        /// What the system or the writer said.
        reason: String,
    },
}

/// Sentences behind one that has no full stop.
fn sentences_behind(sentences: &[String]) -> String {
    let text = sentences.join(" ");
    let text = text.trim_end_matches('.');
    if text.is_empty() { String::new() } else { format!(". {text}") }
}

/// What a file is, by its content, when it holds no inventory.
#[derive(Debug, Clone, Copy, PartialEq, Eq)]
pub enum FileKind {
    /// No content at all.
    Empty,
    /// A workbook that needs a password.
    Encrypted,
    /// A workbook of the binary format before 2007; as a fault, one from before 1993.
    Xls,
    /// A binary workbook in a zip container.
    Xlsb,
    /// A workbook of the OpenDocument format.
    Ods,
    /// A workbook written as one XML text.
    XmlSpreadsheet,
    /// A web page, often named xls by the program that exported it.
    Html,
    /// Some other XML.
    Xml,
    /// Lines of text with separators.
    Text,
    /// A document meant for reading.
    Pdf,
    /// A word processor's or presentation's file.
    Document,
    /// A container without a workbook in it.
    Archive,
    /// None of these.
    Unknown,
    /// Data written for programs.
    Json,
}

impl FileKind {
    /// What the user can do instead.
    fn remedy(self) -> &'static str {
        match self {
            Self::Empty => "check that the export or the download was finished",
            Self::Encrypted => "open it in a spreadsheet program, remove the password and save it as xlsx",
            Self::Xls | Self::Xlsb | Self::Ods | Self::XmlSpreadsheet | Self::Html | Self::Text => {
                "open it in a spreadsheet program, save it as xlsx and use that file"
            }
            Self::Xml | Self::Pdf | Self::Document | Self::Archive | Self::Unknown | Self::Json => {
                "name a workbook, or a csv, with one substance a row"
            }
        }
    }
}

impl fmt::Display for FileKind {
    fn fmt(&self, formatter: &mut fmt::Formatter<'_>) -> fmt::Result {
        formatter.write_str(match self {
            Self::Empty => "the file is empty",
            Self::Encrypted => "the workbook is protected by a password",
            Self::Xls => "this is a worksheet of a binary format from before 1993, which is not read",
            Self::Xlsb => "this is a binary workbook (xlsb) without its main part",
            Self::Ods => "this is an OpenDocument workbook (ods)",
            Self::XmlSpreadsheet => "this is a workbook written as XML text, which is not read",
            Self::Html => "this is a web page (HTML), whatever its name says",
            Self::Xml => "this is an XML file, not a workbook",
            Self::Text => "this is plain text",
            Self::Pdf => "this is a PDF, not a workbook",
            Self::Document => "this is a text document or a presentation, not a workbook",
            Self::Archive => "this is an archive without a workbook in it",
            Self::Unknown => "this is not a workbook",
            Self::Json => "this is a JSON file, not a table",
        })
    }
}

/// What is wrong with a sheet's cells.
#[derive(Debug, Clone, PartialEq, Eq, thiserror::Error)]
pub enum SheetFault {
    /// A reference no sheet has.
    #[error(
        "sheet `{sheet}` has a cell at `{reference}`, which is not a cell of any sheet (A1 to XFD1048576)"
    )]
    NoSuchCell {
        /// The sheet's name.
        sheet: String,
        /// The reference as written.
        reference: String,
    },
    /// The same cell twice, or a cell that stands behind a later one.
    #[error("{cell} is stored twice or out of order")]
    OutOfOrder {
        /// The cell.
        cell: CellRef,
    },
    /// A cell whose content cannot be what it says.
    #[error("{cell} holds {what}")]
    Unreadable {
        /// The cell.
        cell: CellRef,
        /// What was found.
        what: String,
    },
    /// The sheet as a whole.
    #[error("sheet `{sheet}` {what}")]
    Whole {
        /// The sheet's name.
        sheet: String,
        /// What was found.
        what: String,
    },
}
