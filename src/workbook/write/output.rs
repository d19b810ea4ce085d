//! Where the output goes: checked before the work begins, filled under a temporary name, renamed at the end.

use std::fs::File;
use std::io::{BufWriter, Write};
use std::path::{Path, PathBuf};

use tempfile::NamedTempFile;

use crate::fault::FileFault;

use super::Overwrite;

/// A place for the output that was free when the run began.
pub(super) struct Output {
    target: PathBuf,
    folder: PathBuf,
    overwrite: Overwrite,
}

impl Output {
    /// Checks that the target may be written.
    pub(super) fn check(target: &Path, inputs: &[&Path], overwrite: Overwrite) -> Result<Self, FileFault> {
        let path = target.display().to_string();
        let folder = match target.parent() {
            Some(folder) if folder.as_os_str().is_empty() => PathBuf::from("."),
            Some(folder) => folder.to_path_buf(),
            None => return Err(FileFault::Folder { path }),
        };
        if folder.exists() && !folder.is_dir() {
            return Err(FileFault::OutputFolderClosed {
                folder: folder.display().to_string(),
                reason: "it is a file, not a folder".to_owned(),
            });
        }
        if !folder.is_dir() {
            return Err(FileFault::OutputFolderMissing { folder: folder.display().to_string() });
        }
        if target.is_dir() {
            return Err(FileFault::Folder { path });
        }
        if inputs.iter().any(|input| is_same_file(input, target)) {
            return Err(FileFault::OutputIsInput { path });
        }
        match overwrite {
            // A link that leads nowhere is in the way, too.
            Overwrite::Refuse if target.symlink_metadata().is_ok() => Err(FileFault::OutputExists { path }),
            Overwrite::Refuse | Overwrite::Replace => {
                Ok(Self { target: target.to_path_buf(), folder, overwrite })
            }
        }
    }

    pub(super) fn folder(&self) -> &Path {
        &self.folder
    }

    /// A fault that says why the output could not be written.
    pub(super) fn failed(&self, reason: &dyn std::fmt::Display) -> FileFault {
        FileFault::OutputFailed { path: self.target.display().to_string(), reason: reason.to_string() }
    }

    /// Fills a temporary file beside the target and renames it; if `fill` fails the temporary file is gone.
    pub(super) fn fill(
        &self,
        fill: impl FnOnce(&mut BufWriter<&File>) -> Result<(), FileFault>,
    ) -> Result<(), FileFault> {
        let temporary = self.temporary_file()?;
        let mut writer = BufWriter::with_capacity(1 << 16, temporary.as_file());
        let filled = fill(&mut writer);
        let flushed = writer.flush();
        // Only the file itself is left to be dropped; what a failed write left in the buffer must not be tried again.
        let (_file, _rest) = writer.into_parts();
        filled?;
        flushed.map_err(|error| self.failed(&error))?;
        temporary.as_file().sync_all().map_err(|error| self.failed(&error))?;
        match self.overwrite {
            Overwrite::Replace => temporary.persist(&self.target),
            Overwrite::Refuse => temporary.persist_noclobber(&self.target),
        }
        .map(|_file| ())
        .map_err(|error| self.not_renamed(&error.error))
    }

    fn not_renamed(&self, error: &std::io::Error) -> FileFault {
        if error.kind() == std::io::ErrorKind::AlreadyExists {
            FileFault::OutputExists { path: self.target.display().to_string() }
        } else {
            self.failed(error)
        }
    }

    fn temporary_file(&self) -> Result<NamedTempFile, FileFault> {
        let mut builder = tempfile::Builder::new();
        builder.prefix(".unfinished-").suffix(".xlsx");
        #[cfg(unix)]
        {
            use std::os::unix::fs::PermissionsExt;
            // The output is a file like any other of the user's; the usual temporary one would be for the owner only.
            builder.permissions(std::fs::Permissions::from_mode(0o666));
        }
        builder.tempfile_in(&self.folder).map_err(|error| FileFault::OutputFolderClosed {
            folder: self.folder.display().to_string(),
            reason: error.to_string(),
        })
    }
}

fn is_same_file(one: &Path, other: &Path) -> bool {
    match (one.canonicalize(), other.canonicalize()) {
        (Ok(one), Ok(other)) => one == other,
        _ => false,
    }
}
