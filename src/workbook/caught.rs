//! Turns a panic inside a workbook library into a fault. Our own code panics nowhere and is not run in here.

use std::any::Any;
use std::cell::Cell;
use std::panic::{AssertUnwindSafe, catch_unwind, set_hook, take_hook};
use std::sync::Once;

thread_local! {
    static INSIDE: Cell<u32> = const { Cell::new(0) };
}

/// Runs a library's work; a panic in it comes back as its message and prints nothing.
///
/// The writing library panics on a full disk, and neither library promises not to on a file made to break it.
/// After a panic nothing the work has touched may be used again, except to be dropped.
pub(super) fn without_panic<Outcome>(work: impl FnOnce() -> Outcome) -> Result<Outcome, String> {
    quiet_inside();
    INSIDE.with(|inside| inside.set(inside.get().saturating_add(1)));
    let outcome = catch_unwind(AssertUnwindSafe(work));
    INSIDE.with(|inside| inside.set(inside.get().saturating_sub(1)));
    outcome.map_err(|panic| message_of(panic.as_ref()))
}

/// Keeps the panic report off the terminal while inside, on this thread only.
fn quiet_inside() {
    static ONCE: Once = Once::new();
    ONCE.call_once(|| {
        let usual = take_hook();
        set_hook(Box::new(move |report| {
            if INSIDE.with(Cell::get) == 0 {
                usual(report);
            }
        }));
    });
}

fn message_of(panic: &(dyn Any + Send)) -> String {
    let message = panic
        .downcast_ref::<&str>()
        .copied()
        .or_else(|| panic.downcast_ref::<String>().map(String::as_str))
        .unwrap_or("the library gave up");
    words_of_the_system(message).unwrap_or(message).to_owned()
}

/// What the system said, out of an error printed for programmers: `... message: "No space left on device" }`.
fn words_of_the_system(message: &str) -> Option<&str> {
    let (_, words) = message.split_once("message: \"")?;
    words.split_once('"').map(|(words, _)| words)
}

#[cfg(test)]
mod tests {
    use super::without_panic;

    #[test]
    fn a_panic_inside_becomes_its_message() {
        assert_eq!(without_panic(|| 7), Ok(7));
        let outcome: Result<(), String> = without_panic(|| panic!("no space left"));
        assert_eq!(outcome, Err("no space left".to_owned()));
    }

    #[test]
    fn the_words_of_the_system_are_taken_out_of_an_error_for_programmers() {
        // The number of a full disk on Linux.
        let full = std::io::Error::from_raw_os_error(28);
        let words = full.to_string();
        let outcome: Result<(), String> = without_panic(|| panic!("could not write: {full:?}"));
        assert_eq!(outcome.map_err(|said| words.starts_with(&said)), Err(true), "{words}");
    }
}
