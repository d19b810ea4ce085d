//! Cuts lines of text into rows of fields, one row at a time and in bounded memory.
//!
//! A general reader for csv skips blank lines, which a spreadsheet counts, and says nothing of a quotation mark that is
//! never closed, which swallows the rows below it. Hence this one; a test holds it against such a reader.

mod cutter;

use std::io::BufRead;

use crate::fault::LinesFault;
use crate::workbook::place::LAST_ROW;

use cutter::{Cutter, Step};

/// Rows of fields, one after the other.
pub(super) struct Records<R> {
    source: R,
    cutter: Cutter,
    next_row: u64,
}

/// One row of fields.
#[derive(Debug, Default)]
pub(super) struct Record {
    /// The row, counted from 0.
    pub(super) row: u64,
    /// Its first line, counted from 1.
    pub(super) line: u64,
    text: Vec<u8>,
    ends: Vec<usize>,
    /// How many fields there are, those right of the last column of a sheet among them.
    pub(super) fields: usize,
    /// Fields that hold line breaks: which, and the line where they begin.
    pub(super) of_several_lines: Vec<(usize, u64)>,
}

impl Record {
    /// The fields in order.
    pub(super) fn iter(&self) -> impl Iterator<Item = &str> {
        let starts = std::iter::once(0).chain(self.ends.iter().copied());
        starts.zip(&self.ends).map(|(start, end)| self.slice(start, *end))
    }

    /// One of the fields.
    pub(super) fn get(&self, field: usize) -> &str {
        let start = field.checked_sub(1).and_then(|before| self.ends.get(before)).copied().unwrap_or(0);
        self.ends.get(field).map_or("", |end| self.slice(start, *end))
    }

    /// Whether no field holds anything.
    pub(super) fn is_blank(&self) -> bool {
        self.iter().all(|field| field.trim().is_empty())
    }

    fn slice(&self, start: usize, end: usize) -> &str {
        // Cut at ASCII characters only, so that it stays sound.
        self.text.get(start..end).and_then(|bytes| std::str::from_utf8(bytes).ok()).unwrap_or_default()
    }

    fn begin(&mut self, row: u64, line: u64) {
        self.row = row;
        self.line = line;
        self.text.clear();
        self.ends.clear();
        self.of_several_lines.clear();
        self.fields = 0;
    }

    fn begin_of_field(&self) -> usize {
        self.ends.last().copied().unwrap_or(0)
    }
}

impl<R: BufRead> Records<R> {
    /// Rows of fields between these separators; of one field each if there is none.
    pub(super) fn new(source: R, separator: Option<u8>) -> Self {
        Self { source, cutter: Cutter::new(separator), next_row: 0 }
    }

    /// Passes the first line by, which then counts as no row.
    pub(super) fn pass_line_by(&mut self) -> Result<(), LinesFault> {
        self.next(&mut Record::default())?;
        self.next_row = 0;
        Ok(())
    }

    /// Zero characters so far, which no cell can hold and which are left out.
    pub(super) fn zeros(&self) -> u64 {
        self.cutter.zeros
    }

    /// Reads the next row into `record`; false at the end.
    pub(super) fn next(&mut self, record: &mut Record) -> Result<bool, LinesFault> {
        record.begin(self.next_row, self.cutter.line);
        self.cutter.begin();
        let mut any = false;
        loop {
            let chunk = match self.source.fill_buf() {
                Ok(chunk) => chunk,
                Err(error) if error.kind() == std::io::ErrorKind::Interrupted => continue,
                Err(error) => return Err(LinesFault::BrokenOff { reason: error.to_string() }),
            };
            if chunk.is_empty() {
                any |= self.cutter.finish(record)?;
                return if any { self.end_record(record) } else { Ok(false) };
            }
            let mut used = 0;
            for byte in chunk {
                used += 1;
                match self.cutter.step(*byte, record)? {
                    Step::Nothing => {}
                    Step::Within => any = true,
                    Step::EndOfRecord => {
                        self.source.consume(used);
                        return self.end_record(record);
                    }
                }
            }
            self.source.consume(used);
        }
    }

    /// Blank rows may go on below the last row a sheet can have.
    fn end_record(&mut self, record: &Record) -> Result<bool, LinesFault> {
        self.next_row = self.next_row.saturating_add(1);
        if record.row > u64::from(LAST_ROW) && !record.is_blank() {
            return Err(LinesFault::TooManyRows);
        }
        Ok(true)
    }
}

#[cfg(test)]
mod tests {
    use proptest::prelude::*;

    use super::{Record, Records};
    use crate::fault::LinesFault;

    fn rows(text: &str, separator: u8) -> Result<Vec<(u64, Vec<String>)>, LinesFault> {
        // A small buffer, so that every state meets the end of a portion.
        let mut records =
            Records::new(std::io::BufReader::with_capacity(3, text.as_bytes()), Some(separator));
        let (mut record, mut rows) = (Record::default(), Vec::new());
        while records.next(&mut record)? {
            rows.push((record.row, record.iter().map(str::to_owned).collect()));
        }
        Ok(rows)
    }

    fn fields(text: &str) -> Vec<Vec<String>> {
        rows(text, b';').unwrap().into_iter().map(|(_, fields)| fields).collect()
    }

    #[test]
    fn every_kind_of_line_end_ends_a_row_and_blank_lines_are_rows() {
        for text in ["a;b\n\nc;d\n", "a;b\r\n\r\nc;d\r\n", "a;b\r\rc;d\r", "a;b\n\nc;d"] {
            assert_eq!(fields(text), [vec!["a", "b"], vec![""], vec!["c", "d"]], "{text:?}");
        }
        assert!(fields("").is_empty());
        assert_eq!(fields(";"), [["", ""]]);
        assert_eq!(fields("\"\""), [[""]]);
    }

    #[test]
    fn quoted_fields_hold_separators_line_breaks_and_doubled_quotation_marks() {
        let text = "\"a;b\";\"two\r\nlines\";\"say \"\"so\"\"\"\nnext;row\n";
        assert_eq!(fields(text), [vec!["a;b", "two\nlines", "say \"so\""], vec!["next", "row"]]);
        assert_eq!(rows(text, b';').unwrap()[1].0, 1);
    }

    #[test]
    fn spaces_around_a_quoted_field_do_not_belong_to_it() {
        assert_eq!(fields("a; \"b;c\" ;d"), [["a", "b;c", "d"]]);
        assert_eq!(fields(" a ; b "), [[" a ", " b "]]);
    }

    #[test]
    fn a_quotation_mark_that_quotes_nothing_is_a_character() {
        assert_eq!(fields("2\"-deoxy;5\" pipe\n"), [["2\"-deoxy", "5\" pipe"]]);
        assert_eq!(fields("\"cis\" butene;x\n"), [["\"cis\" butene", "x"]]);
        assert_eq!(fields("\"a;b\" c;x\n"), [["\"a;b\" c", "x"]]);
    }

    #[test]
    fn a_quotation_mark_that_is_never_closed_is_named_with_its_row_and_line() {
        let text = "h;h\n\"two\nlines\";x\n\"open;y\nz;z\n";
        assert_eq!(rows(text, b';'), Err(LinesFault::NotClosed { row: 3, line: 4 }));
        let text = "h;h\nx;\"open\nz;z\n\"closed\";2\n";
        assert_eq!(rows(text, b';'), Err(LinesFault::Swallowed { row: 2, line: 2 }));
    }

    #[test]
    fn what_no_sheet_can_hold_is_refused_and_not_held() {
        let wide = |columns: usize| format!("{}x\n", ";".repeat(columns - 1));
        assert!(rows(&wide(16_384), b';').is_ok());
        assert_eq!(rows(&wide(16_385), b';'), Err(LinesFault::TooManyColumns { row: 1, line: 1 }));
        assert_eq!(fields(&";".repeat(20_000)).len(), 1);
        let long = |length: usize| "x".repeat(length);
        assert!(rows(&long(2 << 20), b';').is_ok());
        let refused = rows(&long((2 << 20) + 1), b';');
        assert_eq!(refused, Err(LinesFault::RowTooLong { row: 1, line: 1, limit: 2 << 20 }));
        let open = format!("\"{}", long(3 << 20));
        assert_eq!(rows(&open, b';'), Err(LinesFault::NotClosed { row: 1, line: 1 }));
        let blank = "\n".repeat(1_048_576);
        assert!(rows(&blank, b';').is_ok());
        assert_eq!(rows(&format!("{blank}x"), b';'), Err(LinesFault::TooManyRows));
        assert!(rows(&format!("{}x", &blank[1..]), b';').is_ok());
    }

    #[test]
    fn zero_characters_are_left_out_and_counted() {
        let mut records = Records::new(&b"a\0b;\0\n"[..], Some(b';'));
        let mut record = Record::default();
        assert!(records.next(&mut record).unwrap());
        assert_eq!(record.iter().collect::<Vec<_>>(), ["ab", ""]);
        assert_eq!(records.zeros(), 2);
    }

    proptest! {
        #[test]
        fn what_a_csv_writer_wrote_is_read_as_it_was(
            rows in prop::collection::vec(prop::collection::vec("[a-c;,\"\n é ]{0,6}", 2..5), 1..6),
            separator in prop::sample::select(vec![b';', b',', b'\t', b'|']),
        ) {
            let mut writer = csv::WriterBuilder::new().delimiter(separator).flexible(true).from_writer(Vec::new());
            for row in &rows {
                writer.write_record(row).unwrap();
            }
            let text = String::from_utf8(writer.into_inner().unwrap()).unwrap();
            let read: Vec<Vec<String>> =
                super::tests::rows(&text, separator).unwrap().into_iter().map(|(_, fields)| fields).collect();
            prop_assert_eq!(read, rows);
        }

        #[test]
        fn any_text_is_read_or_refused(text in "[a;\"\r\n ]{0,40}") {
            let _ = rows(&text, b';');
        }
    }
}
