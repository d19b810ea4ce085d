//! The rule files of a folder.

use std::path::{Path, PathBuf};

use crate::fault::{RuleFaults, RuleMistake};

/// The rule files beside the rulebooks; a folder may hold its own.
pub(super) const CAUTIONS_FILE: &str = "cautions.toml";
pub(super) const RELATIONS_FILE: &str = "relations.toml";
const COLUMNS_FILE: &str = "columns.toml";

/// The rulebooks of a folder and of its `rulebooks` folder, by file name.
pub(super) fn rulebook_files(folder: &Path) -> Result<Vec<PathBuf>, RuleFaults> {
    let mut files = toml_files(folder)?;
    let inner = folder.join("rulebooks");
    if inner.is_dir() {
        files.extend(toml_files(&inner)?);
    }
    files.retain(|file| {
        let name = file.file_name().and_then(|name| name.to_str());
        ![Some(CAUTIONS_FILE), Some(RELATIONS_FILE), Some(COLUMNS_FILE)].contains(&name)
    });
    if files.is_empty() {
        return Err(fault_of(folder, RuleMistake::NoRulebooks));
    }
    Ok(files)
}

fn toml_files(folder: &Path) -> Result<Vec<PathBuf>, RuleFaults> {
    let unreadable = |error: std::io::Error| {
        let reason = error.to_string();
        fault_of(folder, RuleMistake::Unreadable { reason })
    };
    let mut files = Vec::new();
    for entry in std::fs::read_dir(folder).map_err(unreadable)? {
        let path = entry.map_err(unreadable)?.path();
        if path.extension().is_some_and(|extension| extension == "toml") {
            files.push(path);
        }
    }
    files.sort();
    Ok(files)
}

fn fault_of(path: &Path, mistake: RuleMistake) -> RuleFaults {
    RuleFaults::of_file(&path.display().to_string(), mistake)
}
