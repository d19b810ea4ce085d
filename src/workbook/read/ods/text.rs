//! The text of a cell, put together from its paragraphs as the format says white space counts.

/// A cell's text while its paragraphs are read.
///
/// Runs of white space count as one space, and none at the ends of a paragraph (OpenDocument 1.3 part 3, 6.1.2);
/// spaces, tabs and line breaks that are meant have elements of their own. LibreOffice, though, stores a last single space
/// as it is, and it is kept.
#[derive(Debug, Default)]
pub(super) struct CellText {
    text: String,
    paragraphs: usize,
    gap: Gap,
}

/// What stands between the text so far and what comes next.
#[derive(Debug, Clone, Copy, PartialEq, Eq, Default)]
enum Gap {
    /// The paragraph begins: white space does not count.
    #[default]
    Beginning,
    /// Nothing.
    None,
    /// A space.
    Space,
    /// White space of other kinds or length, which is one space if text follows.
    Spaces,
}

impl CellText {
    /// A paragraph begins, on a line of its own.
    pub(super) fn begin_paragraph(&mut self) {
        self.keep_last_space();
        if self.paragraphs > 0 {
            self.text.push('\n');
        }
        self.paragraphs += 1;
        self.gap = Gap::Beginning;
    }

    /// Text as it stands in the file.
    pub(super) fn push(&mut self, text: &str) {
        for character in text.chars() {
            if matches!(character, ' ' | '\t' | '\r' | '\n') {
                self.gap = match self.gap {
                    Gap::Beginning => Gap::Beginning,
                    Gap::None if character == ' ' => Gap::Space,
                    Gap::None | Gap::Space | Gap::Spaces => Gap::Spaces,
                };
            } else {
                self.push_meant(character);
            }
        }
    }

    /// A character that is meant, be it a space.
    pub(super) fn push_meant(&mut self, character: char) {
        if self.gap == Gap::Spaces || self.gap == Gap::Space {
            self.text.push(' ');
        }
        self.gap = Gap::None;
        self.text.push(character);
    }

    fn keep_last_space(&mut self) {
        if self.gap == Gap::Space {
            self.text.push(' ');
        }
        self.gap = Gap::Beginning;
    }

    /// How many bytes there are so far.
    pub(super) fn len(&self) -> usize {
        self.text.len()
    }

    /// The whole text; none if the cell has no paragraph.
    pub(super) fn into_text(mut self) -> Option<String> {
        self.keep_last_space();
        (self.paragraphs > 0).then_some(self.text)
    }
}

#[cfg(test)]
mod tests {
    use super::CellText;

    #[test]
    fn white_space_counts_once_within_a_paragraph_and_not_at_its_ends() {
        let mut text = CellText::default();
        text.begin_paragraph();
        text.push("\n  log  ");
        text.push(" Kow\t(20 °C) \n");
        text.begin_paragraph();
        text.push("second");
        assert_eq!(text.into_text().as_deref(), Some("log Kow (20 °C)\nsecond"));
    }

    #[test]
    fn spaces_that_are_meant_all_count() {
        let mut text = CellText::default();
        text.begin_paragraph();
        text.push_meant(' ');
        text.push("a ");
        text.push_meant(' ');
        text.push("b");
        text.push_meant('\n');
        text.push("c ");
        assert_eq!(text.into_text().as_deref(), Some(" a  b\nc "));
    }

    #[test]
    fn a_cell_without_paragraph_is_not_a_cell_with_an_empty_one() {
        assert_eq!(CellText::default().into_text(), None);
        let mut text = CellText::default();
        text.begin_paragraph();
        assert_eq!(text.into_text().as_deref(), Some(""));
    }
}
