//! Takes a text byte by byte and says where its fields and rows end. Separators, quotation marks and line ends are ASCII,
//! so that no byte of another character is taken for one.

use crate::fault::LinesFault;
use crate::workbook::place::LAST_COLUMN;

use super::Record;

/// The most bytes of a row; one of an inventory has some thousand.
const LONGEST_RECORD: usize = 2 << 20;

/// Where in a row the cutter stands.
#[derive(Debug, Clone, Copy, PartialEq, Eq)]
enum State {
    /// At the beginning of a field, perhaps behind spaces.
    Begin,
    /// In a field without quotation marks.
    Plain,
    /// Between quotation marks, the first of them in this line.
    Quoted(u64),
    /// Right behind a mark that may have closed the field.
    Closing(u64),
    /// Behind spaces after it.
    Closed(u64),
}

/// What a byte did.
#[derive(Debug, Clone, Copy, PartialEq, Eq)]
pub(super) enum Step {
    /// It was the second half of a line end.
    Nothing,
    /// It belongs to the row.
    Within,
    /// It ended the row.
    EndOfRecord,
}

/// The cutter.
#[derive(Debug)]
pub(super) struct Cutter {
    separator: Option<u8>,
    state: State,
    /// The line that is read, counted from 1.
    pub(super) line: u64,
    after_return: bool,
    /// A quoted field as it is written, should it turn out not to be one.
    written: Vec<u8>,
    /// Zero characters that were left out.
    pub(super) zeros: u64,
}

impl Cutter {
    pub(super) fn new(separator: Option<u8>) -> Self {
        Self { separator, state: State::Begin, line: 1, after_return: false, written: Vec::new(), zeros: 0 }
    }

    /// A row begins.
    pub(super) fn begin(&mut self) {
        self.state = State::Begin;
    }

    /// Takes the next byte.
    pub(super) fn step(&mut self, byte: u8, record: &mut Record) -> Result<Step, LinesFault> {
        if std::mem::take(&mut self.after_return) && byte == b'\n' {
            return Ok(Step::Nothing);
        }
        self.after_return = byte == b'\r';
        let line_end = byte == b'\n' || byte == b'\r';
        let line = self.line;
        self.line += u64::from(line_end);
        if byte == 0 {
            self.zeros += 1;
            return Ok(Step::Within);
        }
        match self.state {
            State::Quoted(opened) => self.step_quoted(byte, opened, record),
            State::Begin | State::Plain | State::Closing(_) | State::Closed(_) if line_end => {
                self.end_field(record)?;
                return Ok(Step::EndOfRecord);
            }
            State::Begin | State::Plain | State::Closing(_) | State::Closed(_)
                if Some(byte) == self.separator =>
            {
                self.end_field(record)?;
            }
            State::Begin if byte == b'"' => self.open_quotes(line, record),
            State::Closing(opened) | State::Closed(opened) => {
                self.step_behind_quotes(byte, opened, record)?;
            }
            State::Begin | State::Plain => {
                record.text.push(byte);
                if byte != b' ' {
                    self.state = State::Plain;
                }
            }
        }
        self.refuse_overlong(record)?;
        Ok(Step::Within)
    }

    fn step_quoted(&mut self, byte: u8, opened: u64, record: &mut Record) {
        match byte {
            b'"' => {
                self.written.push(byte);
                self.state = State::Closing(opened);
            }
            b'\r' => self.keep_quoted(b'\n', record),
            _ => self.keep_quoted(byte, record),
        }
    }

    fn step_behind_quotes(&mut self, byte: u8, opened: u64, record: &mut Record) -> Result<(), LinesFault> {
        match byte {
            // Written twice, it is a character.
            b'"' if self.state == State::Closing(opened) => {
                self.keep_quoted(byte, record);
                self.state = State::Quoted(opened);
            }
            b' ' => {
                self.written.push(byte);
                self.state = State::Closed(opened);
            }
            _ => self.take_as_written(opened, byte, record)?,
        }
        Ok(())
    }

    /// The text is at its end; whether that ended a field.
    pub(super) fn finish(&mut self, record: &mut Record) -> Result<bool, LinesFault> {
        match self.state {
            State::Quoted(line) => Err(LinesFault::NotClosed { row: record.row + 1, line }),
            State::Begin if record.fields == 0 && record.text.is_empty() => Ok(false),
            State::Begin | State::Plain | State::Closing(_) | State::Closed(_) => {
                self.end_field(record)?;
                Ok(true)
            }
        }
    }

    fn open_quotes(&mut self, line: u64, record: &mut Record) {
        let begin = record.begin_of_field();
        self.written.clear();
        self.written.extend(record.text.drain(begin..));
        self.written.push(b'"');
        self.state = State::Quoted(line);
    }

    fn keep_quoted(&mut self, byte: u8, record: &mut Record) {
        record.text.push(byte);
        self.written.push(byte);
    }

    /// Behind the closing mark comes more text: the marks are characters of the field, unless they hold line breaks; then
    /// they have swallowed rows.
    fn take_as_written(&mut self, opened: u64, byte: u8, record: &mut Record) -> Result<(), LinesFault> {
        if self.written.contains(&b'\n') {
            return Err(LinesFault::Swallowed { row: record.row + 1, line: opened });
        }
        record.text.truncate(record.begin_of_field());
        record.text.append(&mut self.written);
        record.text.push(byte);
        self.state = State::Plain;
        Ok(())
    }

    fn end_field(&mut self, record: &mut Record) -> Result<(), LinesFault> {
        let begin = record.begin_of_field();
        let filled = record.text.len() > begin;
        if let State::Closing(opened) | State::Closed(opened) = self.state
            && self.written.contains(&b'\n')
        {
            record.of_several_lines.push((record.fields, opened));
        }
        if record.fields <= usize::from(LAST_COLUMN) {
            record.ends.push(record.text.len());
        } else if filled {
            return Err(LinesFault::TooManyColumns { row: record.row + 1, line: record.line });
        }
        record.fields += 1;
        self.state = State::Begin;
        Ok(())
    }

    fn refuse_overlong(&self, record: &Record) -> Result<(), LinesFault> {
        if record.text.len() <= LONGEST_RECORD {
            return Ok(());
        }
        let row = record.row + 1;
        let limit = u64::try_from(LONGEST_RECORD).unwrap_or(u64::MAX);
        Err(match self.state {
            State::Quoted(line) => LinesFault::NotClosed { row, line },
            State::Begin | State::Plain | State::Closing(_) | State::Closed(_) => {
                LinesFault::RowTooLong { row, line: record.line, limit }
            }
        })
    }
}
