//! The few looks that are kept of an OpenDocument workbook: how dates, times, percentages and lines are shown, and
//! words around numbers.

use std::collections::BTreeMap;

use crate::workbook::appearance::Appearance;
use crate::workbook::content::StyleId;

pub(super) const DATE: StyleId = StyleId(1);
pub(super) const DATE_AND_TIME: StyleId = StyleId(2);
pub(super) const TIME: StyleId = StyleId(3);
pub(super) const SEVERAL_LINES: StyleId = StyleId(4);
/// Percentages without decimals; with them in the places that follow.
const PERCENTAGE: StyleId = StyleId(5);

const PERCENTAGES: [&str; 7] = ["0%", "0.0%", "0.00%", "0.000%", "0.0000%", "0.00000%", "0.000000%"];

/// More words around numbers than these no inventory has; what is beyond is kept as the text that is shown.
const MOST_WORDS: usize = 2_000;

/// The looks of a workbook, as far as they are known.
#[derive(Debug, Clone, Default)]
pub(super) struct Looks {
    /// Formats of numbers with words around them, and how many came before each.
    words: BTreeMap<String, u32>,
}

impl Looks {
    /// The looks in the order of their numbers; the first is that of every cell without one.
    pub(super) fn appearances(&self) -> Vec<Appearance> {
        let mut looks = vec![
            Appearance::default(),
            Appearance::of_numbers("yyyy-mm-dd"),
            Appearance::of_numbers("yyyy-mm-dd hh:mm:ss"),
            Appearance::of_numbers("[h]:mm:ss"),
            Appearance::of_several_lines(),
        ];
        looks.extend(PERCENTAGES.map(Appearance::of_numbers));
        let mut words: Vec<(&String, &u32)> = self.words.iter().collect();
        words.sort_by_key(|(_, place)| **place);
        looks.extend(words.into_iter().map(|(code, _)| Appearance::of_numbers(code)));
        looks
    }

    /// The look of numbers with this format; none where there are too many of them.
    pub(super) fn of_code(&mut self, code: String) -> Option<StyleId> {
        let first = PERCENTAGE.0 + u32::try_from(PERCENTAGES.len()).ok()?;
        let known = self.words.get(&code).copied();
        let place = match known {
            Some(place) => place,
            None if self.words.len() >= MOST_WORDS => return None,
            None => {
                let place = u32::try_from(self.words.len()).ok()?;
                self.words.insert(code, place);
                place
            }
        };
        Some(StyleId(first + place))
    }
}

/// A percentage with as many decimals as the cell shows.
pub(super) fn percentage(shown: &str) -> StyleId {
    let digits = shown.trim_end_matches(|character: char| !character.is_ascii_digit());
    let decimals = digits.rsplit_once(['.', ',']).map_or(0, |(_, decimals)| decimals.len());
    let place = u32::try_from(decimals.min(PERCENTAGES.len() - 1)).unwrap_or(0);
    StyleId(PERCENTAGE.0 + place)
}

#[cfg(test)]
mod tests {
    use super::{Looks, MOST_WORDS, percentage};
    use crate::workbook::appearance::Appearance;

    #[test]
    fn a_percentage_keeps_the_decimals_it_is_shown_with() {
        let looks = Looks::default().appearances();
        let look = |shown| looks[usize::try_from(percentage(shown).0).unwrap()].clone();
        assert_eq!(look("12 %"), Appearance::of_numbers("0%"));
        assert_eq!(look("12,5 %"), Appearance::of_numbers("0.0%"));
        assert_eq!(look("0.125%"), Appearance::of_numbers("0.000%"));
        assert_eq!(look("0.123456789%"), Appearance::of_numbers("0.000000%"));
        assert_eq!(look(""), Appearance::of_numbers("0%"));
    }

    #[test]
    fn words_around_numbers_have_a_look_each_up_to_a_limit() {
        let mut looks = Looks::default();
        let codes: Vec<String> = (0..=MOST_WORDS).map(|place| format!("0\" unit {place}\"")).collect();
        let styles: Vec<_> = codes.iter().map(|code| looks.of_code(code.clone())).collect();
        let appearances = looks.appearances();
        let look = |place: usize| appearances[usize::try_from(styles[place].unwrap().0).unwrap()].clone();
        assert_eq!(look(0), Appearance::of_numbers(&codes[0]));
        assert_eq!(look(MOST_WORDS - 1), Appearance::of_numbers(&codes[MOST_WORDS - 1]));
        assert_eq!(styles[MOST_WORDS], None);
        assert_eq!(looks.of_code(codes[0].clone()), styles[0]);
    }
}
