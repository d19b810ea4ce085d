//! Faults of text files whose lines cannot be cut into the cells of a table. Rows and lines are counted from 1, and differ
//! where a text runs over several lines.

/// Why the lines of a file are no table.
#[derive(Debug, Clone, PartialEq, Eq, thiserror::Error)]
pub enum LinesFault {
    /// A quotation mark opens a text that nothing closes.
    #[error(
        "row {row} (line {line}): a quotation mark at the beginning of a field opens a text that is not closed, so that \
         the rows below it belong to it; close it at the end of the field or, where it is a character of the text, put \
         the field into quotation marks and write it twice"
    )]
    NotClosed {
        /// The row.
        row: u64,
        /// The line of the quotation mark.
        line: u64,
    },
    /// A quotation mark opens a text that swallows whole rows before another mark closes it.
    #[error(
        "row {row} (line {line}): a quotation mark at the beginning of a field opens a text that runs over whole rows \
         before another one closes it; close it at the end of the field or, where it is a character of the text, put \
         the field into quotation marks and write it twice"
    )]
    Swallowed {
        /// The row.
        row: u64,
        /// The line of the quotation mark.
        line: u64,
    },
    /// A row longer than any can be.
    #[error(
        "row {row} (line {line}): has more than {limit} characters, which no row of a table has; the file is no list, or \
         its line breaks are lost: export it again, or save it as xlsx"
    )]
    RowTooLong {
        /// The row.
        row: u64,
        /// Its first line.
        line: u64,
        /// How many there may be.
        limit: u64,
    },
    /// More columns than a sheet has.
    #[error(
        "row {row} (line {line}): has more than 16384 filled columns, the most a sheet can have; perhaps a line break is \
         missing, or the file has to be split into several"
    )]
    TooManyColumns {
        /// The row.
        row: u64,
        /// Its first line.
        line: u64,
    },
    /// More rows than a sheet has.
    #[error(
        "has more than 1048576 rows, the most a sheet can have; split the file into several, each with the header"
    )]
    TooManyRows,
    /// The system stopped giving the file.
    #[error("could not be read to its end ({reason})")]
    BrokenOff {
        /// What the system said.
        reason: String,
    },
}
