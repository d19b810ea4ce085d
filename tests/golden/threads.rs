//! The number of threads, the name of the output and its folder change no byte.

use std::fs;

use kowledger::run::screen;

use crate::annotated::settings;

#[test]
fn one_two_and_eight_threads_give_the_same_bytes_wherever_they_are_written() {
    let folder = tempfile::tempdir().unwrap();
    let mut first: Option<Vec<u8>> = None;
    for threads in [1, 2, 8] {
        let place = folder.path().join(format!("folder-{threads}"));
        fs::create_dir(&place).unwrap();
        let output = place.join(format!("output-{threads}.xlsx"));
        let mut settings = settings(&output);
        settings.threads = Some(threads);
        screen(&settings).unwrap();
        let bytes = fs::read(&output).unwrap();
        assert!(bytes.len() > 100_000);
        match &first {
            Some(first) => assert!(*first == bytes, "{threads} threads give other bytes than one"),
            None => first = Some(bytes),
        }
    }
}
