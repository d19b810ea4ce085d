//! How high a row must be for its wrapped texts. Not every spreadsheet program works that out when it opens a file.

/// The usual height of a line, in points.
const LINE: f64 = 15.0;

/// More lines than this a row cannot show (409 points, the format's limit).
const MOST_LINES: u32 = 27;

/// The usual width of a column, in characters with padding.
pub(super) const USUAL_WIDTH: f64 = 9.14;

/// What padding takes of a column's width, in characters.
const PADDING: f64 = 0.7;

/// The height of a row of so many lines, in points.
pub(super) fn height_of(lines: u32) -> f64 {
    LINE * f64::from(lines.min(MOST_LINES))
}

/// How many lines a text takes in a column of a width in characters, broken between words.
pub(super) fn lines_of(text: &str, width: f64) -> u32 {
    #[expect(
        clippy::cast_possible_truncation,
        clippy::cast_sign_loss,
        reason = "bounded to the widths a column can have"
    )]
    let room = (width - PADDING).clamp(1.0, 255.0) as usize;
    let lines: usize = text.lines().map(|paragraph| lines_of_paragraph(paragraph, room)).sum();
    u32::try_from(lines).unwrap_or(MOST_LINES).clamp(1, MOST_LINES)
}

fn lines_of_paragraph(paragraph: &str, room: usize) -> usize {
    let mut lines = 1;
    let mut used = 0;
    for word in paragraph.split(' ') {
        let length = word.chars().count();
        let wanted = if used == 0 { length } else { used + 1 + length };
        if wanted <= room {
            used = wanted;
            continue;
        }
        lines += usize::from(used > 0) + length.saturating_sub(1) / room;
        used = length - (length.saturating_sub(1) / room) * room;
    }
    lines
}

#[cfg(test)]
mod tests {
    use super::{height_of, lines_of};

    #[test]
    fn a_text_is_broken_between_words_and_long_words_within() {
        assert_eq!(lines_of("", 10.0), 1);
        assert_eq!(lines_of("log Kow", 10.0), 1);
        assert_eq!(lines_of("log Kow used", 10.0), 2);
        assert_eq!(lines_of("one\ntwo\nthree", 30.0), 3);
        assert_eq!(lines_of("abcdefghijklmnopqrst", 11.5), 2);
        assert_eq!(lines_of("ab abcdefghijklmnopqrst", 11.5), 3);
    }

    #[test]
    fn a_row_is_never_higher_than_a_row_can_be() {
        assert!(height_of(lines_of(&"word ".repeat(9000), 10.0)) < 409.0);
    }
}
