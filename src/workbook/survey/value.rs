//! Whether the reading library takes a stored value for what it is meant to be.

/// Error values the reading library knows (calamine 0.38, `CellErrorType`).
const KNOWN_ERRORS: [&str; 7] = ["#DIV/0!", "#N/A", "#NAME?", "#NULL!", "#NUM!", "#REF!", "#VALUE!"];

/// What the reading library makes of a value.
#[derive(Debug, Clone, Copy, PartialEq, Eq)]
pub(super) enum ReadAs {
    /// What it is meant to be.
    Meant,
    /// Nothing: it is an error value from a later time than the library.
    Unknown,
}

/// Whether values of this type are text, which may hold references to characters.
pub(super) fn is_text(kind: &str) -> bool {
    matches!(kind, "str" | "d" | "inlineStr" | "is")
}

/// Refuses a value the reading library would take for another one, or fail on without saying where.
///
/// `kind` is the type as stored, `pieces` into how many pieces the XML breaks the value.
pub(super) fn value_of(kind: &str, text: &str, pieces: u32, shared_texts: u64) -> Result<ReadAs, String> {
    if is_text(kind) {
        return Ok(ReadAs::Meant);
    }
    if pieces > 1 {
        return Err("a value interrupted by something else".to_owned());
    }
    let sound = match kind {
        "" => true,
        "s" => text.is_empty() || is_index(text, shared_texts),
        "n" => text.is_empty() || text.parse::<f64>().is_ok(),
        "b" => ["", "0", "1", "true", "false"].contains(&text.trim().to_ascii_lowercase().as_str()),
        "e" if KNOWN_ERRORS.contains(&text) => true,
        "e" => return Ok(ReadAs::Unknown),
        other => return Err(format!("a value of the unknown type `{other}`")),
    };
    match kind {
        _ if sound => Ok(ReadAs::Meant),
        "s" => Err(format!("a reference to text number `{text}`, which is not stored")),
        "n" => Err(format!("`{text}`, said to be a number")),
        _ => Err(format!("`{text}`, said to be true or false")),
    }
}

/// The reading library takes an index it cannot read for 0, and so one text for another.
fn is_index(text: &str, shared_texts: u64) -> bool {
    text.bytes().all(|byte| byte.is_ascii_digit())
        && text.parse::<u64>().is_ok_and(|index| index < shared_texts)
}
