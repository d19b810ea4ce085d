//! The text outside brackets, and what stands in each of them.

/// Stands in the outside text where a bracket stood. It is white space, and tidied text holds no other of its kind.
pub(super) const MARK: char = '\u{2003}';

/// A bracket that stands in no other.
#[derive(Debug, Clone, PartialEq, Eq)]
pub(super) struct Bracket {
    pub(super) text: String,
    pub(super) shape: Shape,
}

/// Square brackets often hold the number of a reference.
#[derive(Debug, Clone, Copy, PartialEq, Eq)]
pub(super) enum Shape {
    Round,
    Square,
}

/// The text outside brackets, a [`MARK`] where each stood, and the brackets in order.
pub(super) fn take_brackets(text: &str) -> (String, Vec<Bracket>) {
    let mut taking = Taking::default();
    for character in text.chars() {
        taking.push(character);
    }
    if !taking.current.trim().is_empty() {
        taking.close();
    }
    (taking.outside, taking.inside)
}

#[derive(Default)]
struct Taking {
    outside: String,
    inside: Vec<Bracket>,
    depth: usize,
    current: String,
    square: bool,
    /// A power in brackets belongs to its number.
    in_power: bool,
}

impl Taking {
    fn push(&mut self, character: char) {
        match character {
            '(' if self.depth == 0 && (self.outside.ends_with('^') || self.outside.ends_with("**")) => {
                self.in_power = true;
                self.outside.push(character);
            }
            ')' if self.in_power => {
                self.in_power = false;
                self.outside.push(character);
            }
            '(' | '[' | '{' => {
                if self.depth == 0 {
                    self.square = character == '[';
                } else {
                    self.current.push(' ');
                }
                self.depth += 1;
            }
            ')' | ']' | '}' if self.depth > 0 => {
                self.depth -= 1;
                if self.depth == 0 {
                    self.close();
                } else {
                    self.current.push(' ');
                }
            }
            ')' | ']' | '}' => self.outside.push(' '),
            _ if self.depth > 0 => self.current.push(character),
            _ => self.outside.push(character),
        }
    }

    fn close(&mut self) {
        let text = std::mem::take(&mut self.current).trim().to_owned();
        if text.is_empty() {
            self.outside.push(' ');
            return;
        }
        let shape = if self.square { Shape::Square } else { Shape::Round };
        self.inside.push(Bracket { text, shape });
        self.outside.push(MARK);
    }
}
