//! Where a result goes: standard output or a file that appears whole.

use super::streams::Streams;
use super::trouble::Trouble;
use crate::document::{create_atomically, write_atomically};
use clap::Args;
use std::path::PathBuf;

/// The options that say where a result goes.
#[derive(Args, Clone, Debug, Default)]
pub(super) struct Destination {
    /// Write to this file instead of standard output
    #[arg(long, value_name = "FILE")]
    pub(super) out: Option<PathBuf>,
    /// Replace the file if it exists
    #[arg(long)]
    pub(super) force: bool,
}

impl Destination {
    /// Refuses early, before anything is computed, what could not be delivered later.
    pub(super) fn check(&self) -> Result<(), Trouble> {
        match &self.out {
            None if self.force => Err(Trouble::OptionNeeds { option: "--force", needs: "--out" }),
            Some(path) if !self.force && path.symlink_metadata().is_ok() => {
                Err(Trouble::FileExists { path: path.clone() })
            }
            _ => Ok(()),
        }
    }

    /// Delivers a result.
    pub(super) fn deliver(&self, text: &str, streams: &mut Streams<'_>) -> Result<(), Trouble> {
        self.deliver_bytes(text.as_bytes(), streams)
    }

    /// Delivers a result that is no text.
    pub(super) fn deliver_bytes(&self, bytes: &[u8], streams: &mut Streams<'_>) -> Result<(), Trouble> {
        match &self.out {
            None => streams.result_bytes(bytes).map_err(Trouble::StandardOutput),
            Some(path) if self.force => Ok(write_atomically(path, bytes)?),
            Some(path) => Ok(create_atomically(path, bytes)?),
        }
    }

    /// The file's extension in lower case, which names a format where none is asked for.
    pub(super) fn extension(&self) -> Option<String> {
        let extension = self.out.as_ref()?.extension()?.to_str()?;
        Some(extension.to_ascii_lowercase())
    }
}
