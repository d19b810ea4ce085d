//! Numbers out of a record, by their place in it; none where the record is too short.

/// One byte.
pub(in crate::workbook::read) fn byte(record: &[u8], at: usize) -> Option<u8> {
    record.get(at).copied()
}

/// Two bytes, the lower first.
pub(in crate::workbook::read) fn short(record: &[u8], at: usize) -> Option<u16> {
    record.get(at..)?.first_chunk().map(|bytes| u16::from_le_bytes(*bytes))
}

/// Four bytes, the lowest first.
pub(in crate::workbook::read) fn long(record: &[u8], at: usize) -> Option<u32> {
    record.get(at..)?.first_chunk().map(|bytes| u32::from_le_bytes(*bytes))
}

/// A floating-point number of eight bytes.
pub(in crate::workbook::read) fn real(record: &[u8], at: usize) -> Option<f64> {
    record.get(at..)?.first_chunk().map(|bytes| f64::from_le_bytes(*bytes))
}

/// The `count` bits from bit `from` on.
pub(in crate::workbook::read) fn bits(number: u32, from: u32, count: u32) -> u8 {
    u8::try_from((number >> from) & ((1 << count) - 1)).unwrap_or(0)
}
