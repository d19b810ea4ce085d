//! Whether a number format shows percentages.

/// Whether the part for positive numbers has a percent sign that is not shown as mere text.
pub(super) fn has_percent_sign(format_code: &str) -> bool {
    let mut quoted = false;
    let mut characters = format_code.chars();
    while let Some(character) = characters.next() {
        match character {
            '"' => quoted = !quoted,
            // The next character is shown as it is, or left as wide a gap.
            '\\' | '_' | '*' if !quoted => {
                characters.next();
            }
            ';' if !quoted => return false,
            '%' if !quoted => return true,
            _ => {}
        }
    }
    false
}

#[cfg(test)]
mod tests {
    use super::has_percent_sign;

    #[test]
    fn a_percent_sign_counts_where_the_format_shows_numbers_by_it() {
        for code in ["0%", "0.00%", "0.0 %", "[Red]0%", "#,##0.0%;-0%"] {
            assert!(has_percent_sign(code), "{code}");
        }
        for code in ["0.00", "General", "0\" %\"", "0\\%", "0;0%", ""] {
            assert!(!has_percent_sign(code), "{code}");
        }
    }
}
