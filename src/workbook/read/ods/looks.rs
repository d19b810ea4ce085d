//! The few looks that are kept of an OpenDocument workbook: how dates, times, percentages and lines are shown.

use crate::workbook::appearance::Appearance;
use crate::workbook::content::StyleId;

pub(super) const DATE: StyleId = StyleId(1);
pub(super) const DATE_AND_TIME: StyleId = StyleId(2);
pub(super) const TIME: StyleId = StyleId(3);
pub(super) const SEVERAL_LINES: StyleId = StyleId(4);
/// Percentages without decimals; with them in the places that follow.
const PERCENTAGE: StyleId = StyleId(5);

const PERCENTAGES: [&str; 7] = ["0%", "0.0%", "0.00%", "0.000%", "0.0000%", "0.00000%", "0.000000%"];

/// The looks in the order of their numbers; the first is that of every cell without one.
pub(super) fn appearances() -> Vec<Appearance> {
    let mut looks = vec![
        Appearance::default(),
        Appearance::of_numbers("yyyy-mm-dd"),
        Appearance::of_numbers("yyyy-mm-dd hh:mm:ss"),
        Appearance::of_numbers("[h]:mm:ss"),
        Appearance::of_several_lines(),
    ];
    looks.extend(PERCENTAGES.map(Appearance::of_numbers));
    looks
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
    use super::{appearances, percentage};
    use crate::workbook::appearance::Appearance;

    #[test]
    fn a_percentage_keeps_the_decimals_it_is_shown_with() {
        let looks = appearances();
        let look = |shown| looks[usize::try_from(percentage(shown).0).unwrap()].clone();
        assert_eq!(look("12 %"), Appearance::of_numbers("0%"));
        assert_eq!(look("12,5 %"), Appearance::of_numbers("0.0%"));
        assert_eq!(look("0.125%"), Appearance::of_numbers("0.000%"));
        assert_eq!(look("0.123456789%"), Appearance::of_numbers("0.000000%"));
        assert_eq!(look(""), Appearance::of_numbers("0%"));
    }
}
