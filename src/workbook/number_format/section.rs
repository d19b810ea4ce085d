//! The sections of a number format's code, piece by piece.

use std::iter::Peekable;
use std::str::Chars;

/// A piece of a section, in the order it is shown.
#[derive(Debug, Clone, PartialEq)]
pub(super) enum Piece {
    /// Shown as it is.
    Literal(String),
    /// A place for a digit before the decimal point: `0`, `#` or `?`.
    Digit(char),
    /// Decimals, an exponent or a fraction; nothing of them counts, because the number is taken in full.
    Rest,
    /// A place for the whole number or text: `General`, `@`.
    Whole,
}

/// One of the sections that semicolons part.
#[derive(Debug, Clone, PartialEq, Default)]
pub(super) struct Section {
    pub(super) condition: Option<Condition>,
    pub(super) pieces: Vec<Piece>,
    /// By how many thousands the number is divided.
    pub(super) thousands: u8,
    scale: Scale,
    letters: Letters,
    texts: Texts,
}

#[derive(Debug, Clone, Copy, PartialEq, Eq, Default)]
enum Scale {
    #[default]
    Itself,
    Percent,
}

/// Whether letters that stand for parts of a date were found.
#[derive(Debug, Clone, Copy, PartialEq, Eq, Default)]
enum Letters {
    #[default]
    None,
    OfDates,
}

/// Whether there is a place for a text.
#[derive(Debug, Clone, Copy, PartialEq, Eq, Default)]
enum Texts {
    #[default]
    None,
    Held,
}

/// `[<1]`: the numbers a section is for.
#[derive(Debug, Clone, PartialEq)]
pub(super) struct Condition {
    sign: String,
    limit: f64,
}

impl Condition {
    fn of(inner: &str) -> Option<Self> {
        let limit_at = inner.find(|character: char| !matches!(character, '<' | '>' | '='))?;
        let (sign, limit) = inner.split_at_checked(limit_at)?;
        let known = ["<", "<=", ">", ">=", "=", "<>"].contains(&sign);
        known.then(|| limit.trim().parse().ok()).flatten().map(|limit| Self { sign: sign.to_owned(), limit })
    }

    pub(super) fn holds(&self, number: f64) -> bool {
        match self.sign.as_str() {
            "<" => number < self.limit,
            "<=" => number <= self.limit,
            ">" => number > self.limit,
            ">=" => number >= self.limit,
            sign => number.total_cmp(&self.limit).is_eq() == (sign == "="),
        }
    }

    /// `[<0]`: the section shows the sign itself.
    pub(super) fn is_of_negatives(&self) -> bool {
        self.sign == "<" && self.limit == 0.0
    }
}

/// The sections of a code; more than four say nothing.
pub(super) fn sections(code: &str) -> Vec<Section> {
    let mut sections = vec![Section::default()];
    let mut characters = code.chars().peekable();
    while let Some(character) = characters.next() {
        if character == ';' {
            sections.push(Section::default());
        } else if let Some(section) = sections.last_mut() {
            section.take(character, &mut characters);
        }
    }
    sections.truncate(4);
    sections
}

impl Section {
    fn take(&mut self, character: char, characters: &mut Peekable<Chars<'_>>) {
        match character {
            '"' => {
                let text: String = characters.by_ref().take_while(|inner| *inner != '"').collect();
                self.literal(&text);
            }
            '\\' => {
                if let Some(next) = characters.next() {
                    self.literal(next.encode_utf8(&mut [0; 4]));
                }
            }
            // A gap as wide as the next character, and one that fills the cell.
            '_' => {
                characters.next();
                self.literal(" ");
            }
            '*' => drop(characters.next()),
            '[' => {
                let inner: String = characters.by_ref().take_while(|inner| *inner != ']').collect();
                self.take_bracketed(&inner);
            }
            '0' | '#' | '?' => self.digit(character),
            '.' if self.holds_number() => self.pieces.push(Piece::Rest),
            ',' if self.holds_number() => self.take_comma(characters),
            '%' => {
                self.scale = Scale::Percent;
                self.literal(" %");
            }
            'E' | 'e' if self.holds_number() && matches!(characters.peek(), Some('+' | '-')) => {
                characters.next();
                self.pieces.push(Piece::Rest);
            }
            '/' if self.is_last_digit() && matches!(characters.peek(), Some('0'..='9' | '#' | '?')) => {
                while characters.next_if(char::is_ascii_digit).is_some() {}
                self.pieces.push(Piece::Rest);
            }
            '@' => {
                self.texts = Texts::Held;
                self.pieces.push(Piece::Whole);
            }
            'g' | 'G' if takes(characters, "eneral") => self.pieces.push(Piece::Whole),
            's' | 'S' if takes(characters, "tandard") => self.pieces.push(Piece::Whole),
            other => {
                if matches!(other.to_ascii_lowercase(), 'd' | 'm' | 'y' | 'h' | 's') {
                    self.letters = Letters::OfDates;
                }
                self.literal(other.encode_utf8(&mut [0; 4]));
            }
        }
    }

    /// `[<1]` is a condition, `[$€-407]` shows a currency, `[Red]` nothing.
    fn take_bracketed(&mut self, inner: &str) {
        if let Some(currency) = inner.strip_prefix('$') {
            let shown = currency.split_once('-').map_or(currency, |(shown, _)| shown);
            self.literal(shown);
        } else if let Some(condition) = Condition::of(inner) {
            self.condition = Some(condition);
        }
    }

    /// A comma among the places for digits groups them, one after the last divides by a thousand.
    fn take_comma(&mut self, characters: &mut Peekable<Chars<'_>>) {
        let mut commas = 1_u8;
        while characters.next_if_eq(&',').is_some() {
            commas = commas.saturating_add(1);
        }
        if !matches!(characters.peek(), Some('0' | '#' | '?')) {
            self.thousands = self.thousands.saturating_add(commas);
        }
    }

    fn digit(&mut self, place: char) {
        let after_rest = self.pieces.contains(&Piece::Rest);
        self.pieces.push(if after_rest { Piece::Rest } else { Piece::Digit(place) });
    }

    fn literal(&mut self, text: &str) {
        match self.pieces.last_mut() {
            Some(Piece::Literal(before)) if before.ends_with(' ') => before.push_str(text.trim_start()),
            Some(Piece::Literal(before)) => before.push_str(text),
            _ => self.pieces.push(Piece::Literal(text.to_owned())),
        }
    }

    fn is_last_digit(&self) -> bool {
        matches!(self.pieces.last(), Some(Piece::Digit(_)))
    }

    pub(super) fn holds_number(&self) -> bool {
        self.pieces.iter().any(is_number)
    }

    /// Letters of dates beside places for digits are words.
    pub(super) fn holds_date(&self) -> bool {
        self.letters == Letters::OfDates && !self.holds_number()
    }

    pub(super) fn holds_text(&self) -> bool {
        self.texts == Texts::Held
    }

    pub(super) fn percent_shift(&self) -> i32 {
        match self.scale {
            Scale::Itself => 0,
            Scale::Percent => 2,
        }
    }

    /// What is shown before the number and after it; without a number all is before.
    pub(super) fn around(&self) -> (String, String) {
        let first = self.pieces.iter().position(is_number).unwrap_or(self.pieces.len());
        let last = self.pieces.iter().rposition(is_number).map_or(self.pieces.len(), |last| last + 1);
        (
            literals(self.pieces.get(..first).unwrap_or_default()),
            literals(self.pieces.get(last..).unwrap_or_default()),
        )
    }

    /// What is shown within the number.
    pub(super) fn between(&self) -> String {
        literals(self.inner())
    }

    fn inner(&self) -> &[Piece] {
        let first = self.pieces.iter().position(is_number).unwrap_or(0);
        let last = self.pieces.iter().rposition(is_number).map_or(0, |last| last + 1);
        self.pieces.get(first..last).unwrap_or_default()
    }

    /// Whether zero leaves no digit: no place is a `0`, and no decimals follow.
    pub(super) fn hides_zero(&self) -> bool {
        self.inner().iter().all(|piece| match piece {
            Piece::Digit(place) => *place != '0',
            Piece::Literal(_) => true,
            Piece::Rest | Piece::Whole => false,
        })
    }

    /// A whole number with its digits where the format places them, if it places them at all.
    pub(super) fn digits_of(&self, number: f64) -> Option<String> {
        const LARGEST: f64 = 1e15;
        let zeros = self.pieces.iter().filter(|piece| **piece == Piece::Digit('0')).count();
        let placed = zeros > 1 || !self.between().trim().is_empty();
        let whole = number.fract() == 0.0 && number.abs() < LARGEST;
        let simple = self.thousands == 0 && self.scale == Scale::Itself;
        let only_places = !self.pieces.iter().any(|piece| matches!(piece, Piece::Rest | Piece::Whole));
        if !(placed && whole && simple && only_places) {
            return None;
        }
        let digits = format!("{}", number.abs());
        let mut left: Vec<char> = digits.chars().collect();
        let mut shown: Vec<char> = Vec::new();
        // `#-00` shows 12 as `12`, and `0-00` as `0-12`.
        let pads = matches!(self.inner().first(), Some(Piece::Digit('0')));
        for piece in self.inner().iter().rev() {
            match piece {
                Piece::Digit(place) => shown.extend(left.pop().or((*place == '0').then_some('0'))),
                Piece::Literal(text) if left.is_empty() && !text.contains(char::is_alphanumeric) => {
                    if pads {
                        shown.extend(text.chars().rev());
                    }
                }
                Piece::Literal(text) => shown.extend(text.chars().rev()),
                Piece::Rest | Piece::Whole => {}
            }
        }
        shown.extend(left.iter().rev());
        if number < 0.0 {
            shown.push('-');
        }
        Some(shown.iter().rev().collect())
    }
}

fn is_number(piece: &Piece) -> bool {
    match piece {
        Piece::Digit(_) | Piece::Rest | Piece::Whole => true,
        Piece::Literal(_) => false,
    }
}

fn literals(pieces: &[Piece]) -> String {
    let mut shown = String::new();
    for piece in pieces {
        match piece {
            Piece::Literal(text) => shown.push_str(text),
            Piece::Digit(_) | Piece::Rest | Piece::Whole => {}
        }
    }
    shown
}

/// Takes the rest of a word, in letters of either case, if it follows.
fn takes(characters: &mut Peekable<Chars<'_>>, rest: &str) -> bool {
    let mut ahead = characters.clone();
    let follows =
        rest.chars().all(|expected| ahead.next().is_some_and(|next| next.eq_ignore_ascii_case(&expected)));
    if follows {
        *characters = ahead;
    }
    follows
}
