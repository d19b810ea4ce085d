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
    panic
        .downcast_ref::<&str>()
        .map(|message| (*message).to_owned())
        .or_else(|| panic.downcast_ref::<String>().cloned())
        .unwrap_or_else(|| "the library gave up".to_owned())
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
}
