//! Numbers and errors as the binary formats code them.

/// A number stored in four bytes: two flags, and 30 bits of a whole number or of the upper half of a floating-point one
/// (MS-XLS 2.5.217, `RkNumber`).
pub(in crate::workbook::read) fn short_number(stored: u32) -> f64 {
    let value = if stored & 2 == 0 {
        f64::from_bits(u64::from(stored & !3) << 32)
    } else {
        f64::from(stored.cast_signed() >> 2)
    };
    if stored & 1 == 0 { value } else { value / 100.0 }
}

/// An error as the spreadsheet shows it (MS-XLS 2.5.10, `BErr`).
pub(in crate::workbook::read) fn error_text(code: u8) -> String {
    match code {
        0x00 => "#NULL!",
        0x07 => "#DIV/0!",
        0x0F => "#VALUE!",
        0x17 => "#REF!",
        0x1D => "#NAME?",
        0x24 => "#NUM!",
        0x2A => "#N/A",
        0x2B => "#GETTING_DATA",
        other => return format!("#ERROR {other}!"),
    }
    .to_owned()
}

#[cfg(test)]
mod tests {
    use super::short_number;

    #[test]
    fn a_number_of_four_bytes_is_whole_or_floating_and_may_be_in_hundredths() {
        for (stored, number) in [
            ((7 << 2) | 2, 7.0),
            (((-7_i32).cast_unsigned() << 2) | 2, -7.0),
            ((691 << 2) | 3, 6.91),
            (0x3FF0_0000, 1.0),
            (0x405E_DC00, 123.4375),
            (0x3FF0_0001, 0.01),
        ] {
            assert!((short_number(stored) - number).abs() < 1e-9, "{stored:#x} is {}", short_number(stored));
        }
    }
}
