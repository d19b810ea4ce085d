//! Names of sheets: what a spreadsheet program accepts, and a free one if the name is taken.

/// What a sheet's or column's name of ours gets if the user has it already.
const OURS: &str = " (screened)";

/// The longest name of a sheet, in UTF-16 units as spreadsheet programs count.
const LONGEST: usize = 31;

/// A name for a sheet that no sheet has yet, as close to `wanted` as can be.
pub fn free_sheet_name<'name>(wanted: &str, taken: impl IntoIterator<Item = &'name str>) -> String {
    let taken: Vec<String> = taken.into_iter().map(str::to_lowercase).collect();
    let is_free = |name: &str| !taken.contains(&name.to_lowercase());
    let wanted = acceptable(wanted);
    let plain = cut(&wanted, LONGEST);
    if is_free(&plain) {
        return plain;
    }
    let mut ending = OURS.to_owned();
    let mut number = 1_u32;
    loop {
        let name = format!("{}{ending}", cut(&wanted, LONGEST.saturating_sub(ending.len())));
        if is_free(&name) {
            return name;
        }
        number = number.saturating_add(1);
        ending = format!(" (screened {number})");
    }
}

/// The name with what no sheet name may hold replaced.
fn acceptable(name: &str) -> String {
    let replaced: String = name
        .chars()
        .map(|character| match character {
            '*' | '?' | ':' | '[' | ']' | '\\' | '/' => '_',
            other if other.is_control() => '_',
            other => other,
        })
        .collect();
    let trimmed = replaced.trim_matches('\'');
    if trimmed.is_empty() { "Sheet".to_owned() } else { trimmed.to_owned() }
}

/// The beginning of a text, as many UTF-16 units long at most.
pub(super) fn cut(text: &str, longest: usize) -> String {
    let mut units = 0;
    text.chars()
        .take_while(|character| {
            units += character.len_utf16();
            units <= longest
        })
        .collect()
}

#[cfg(test)]
mod tests {
    use super::free_sheet_name;

    #[test]
    fn a_name_is_kept_if_it_is_free_and_marked_as_ours_if_not() {
        assert_eq!(free_sheet_name("Reasoning", ["Substances"]), "Reasoning");
        assert_eq!(free_sheet_name("Reasoning", ["REASONING"]), "Reasoning (screened)");
        assert_eq!(
            free_sheet_name("Reasoning", ["Reasoning", "Reasoning (screened)"]),
            "Reasoning (screened 2)"
        );
    }

    #[test]
    fn a_name_stays_within_31_characters_and_the_signs_a_sheet_may_have() {
        let long = "Substances of the northern works 2026";
        assert_eq!(free_sheet_name(long, []), "Substances of the northern work");
        let taken = free_sheet_name(long, ["Substances of the northern work"]);
        assert_eq!(taken, "Substances of the no (screened)");
        assert_eq!(taken.len(), 31);
        assert_eq!(free_sheet_name("'a/b'", []), "a_b");
    }
}
