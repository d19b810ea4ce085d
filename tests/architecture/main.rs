//! The structure of the code: which room may name which, and which room names each outside crate.

use std::fs;
use std::io;
use std::path::{Path, PathBuf};

/// Every source file: the room it belongs to (the folder or file below `src`), its path and its text.
fn sources() -> io::Result<Vec<(String, PathBuf, String)>> {
    let top = Path::new(env!("CARGO_MANIFEST_DIR")).join("src");
    let mut found = Vec::new();
    let mut folders = vec![top.clone()];
    while let Some(folder) = folders.pop() {
        for entry in fs::read_dir(folder)? {
            let path = entry?.path();
            if path.is_dir() {
                folders.push(path);
            } else if path.extension().is_some_and(|extension| extension == "rs") {
                let below = path.strip_prefix(&top).map_err(io::Error::other)?;
                let first =
                    below.components().next().map(|part| part.as_os_str().to_string_lossy().into_owned());
                let room = first.unwrap_or_default().trim_end_matches(".rs").to_owned();
                let text = fs::read_to_string(&path)?;
                found.push((room, path, text));
            }
        }
    }
    Ok(found)
}

#[test]
fn the_sources_are_found() {
    assert!(sources().unwrap().len() > 30);
}

/// The lines that are code, so that prose may name anything.
fn code(text: &str) -> impl Iterator<Item = &str> {
    text.lines().map(str::trim_start).filter(|line| !line.starts_with("//"))
}

#[test]
fn imports_point_one_way() {
    let chain = ["quantity", "substance", "evidence", "judge", "reasoning", "report", "run"];
    for (room, path, text) in sources().unwrap() {
        let Some(place) = chain.iter().position(|name| *name == room) else {
            continue;
        };
        for later in &chain[place + 1..] {
            let import = format!("crate::{later}");
            let offending = code(&text).find(|line| line.contains(&import));
            assert_eq!(offending, None, "{} names `{later}`, which comes after `{room}`", path.display());
        }
    }
}

#[test]
fn each_outside_crate_is_named_in_its_own_rooms() {
    let table: &[(&str, &[&str])] = &[
        ("calamine", &["workbook"]),
        ("rust_xlsxwriter", &["workbook"]),
        ("zip", &["workbook"]),
        ("quick_xml", &["workbook"]),
        ("encoding_rs", &["workbook"]),
        ("chardetng", &["workbook"]),
        ("tempfile", &["workbook"]),
        ("sha2", &["workbook"]),
        ("rayon", &["run"]),
        ("toml", &["rules", "columns"]),
        ("serde", &["columns"]),
        ("regex", &["rules", "columns", "substance"]),
        ("annotate_snippets", &["fault"]),
        ("strsim", &["fault"]),
        ("libm", &["quantity"]),
        ("jiff", &["quantity"]),
        ("clap", &["bin"]),
        ("codepage", &["workbook"]),
        ("unicode_normalization", &["columns"]),
        ("unicode_width", &["bin"]),
    ];
    for &(name, rooms) in table {
        let (path, import) = (format!("{name}::"), format!("use {name}"));
        let mut named = false;
        for (room, file, text) in sources().unwrap() {
            let names_it = code(&text).any(|line| line.starts_with(&import) || names_crate(line, &path));
            named |= names_it;
            assert!(!names_it || rooms.contains(&room.as_str()), "{} names `{name}`", file.display());
        }
        assert!(named, "`{name}` is named somewhere, or should leave Cargo.toml");
    }
}

/// Whether a line uses a path that starts with the crate's name and not with a longer word that ends in it.
fn names_crate(line: &str, path: &str) -> bool {
    line.match_indices(path).any(|(place, _)| {
        let before = line[..place].chars().next_back();
        !before.is_some_and(|character| character.is_alphanumeric() || matches!(character, '_' | ':'))
    })
}

#[test]
fn only_the_console_prints() {
    for (_, path, text) in sources().unwrap() {
        let prints = code(&text).any(|line| line.contains("stdout()") || line.contains("stderr()"));
        assert!(!prints || path.ends_with("bin/kowledger/console.rs"), "{} prints", path.display());
    }
}
