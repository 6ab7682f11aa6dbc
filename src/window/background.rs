//! Files the window keeps by itself: settings, and a copy of unsaved work that survives a crash.

use crate::document::recovery::RecoveryCopy;
use crate::document::{Session, Settings};
use std::path::PathBuf;

/// Keeps settings and unsaved work, in a real window; keeps nothing in a test.
#[derive(Debug, Default)]
pub struct Keeper {
    settings_path: Option<PathBuf>,
    copy: Option<RecoveryCopy>,
    is_real: bool,
    has_complained: bool,
}

impl Keeper {
    /// A keeper that touches no file.
    #[must_use]
    pub fn none() -> Self {
        Self::default()
    }

    /// A keeper for a real window; where a place is missing, that one thing is not kept.
    #[must_use]
    pub fn new(settings_path: Option<PathBuf>, copy: Option<RecoveryCopy>) -> Self {
        Self { settings_path, copy, is_real: true, has_complained: false }
    }

    /// Whether this is a real window.
    #[must_use]
    pub fn is_real(&self) -> bool {
        self.is_real
    }

    /// Writes the settings.
    ///
    /// # Errors
    /// One sentence when they cannot be written.
    pub fn keep_settings(&self, settings: &mut Settings) -> Result<(), String> {
        self.settings_path.as_ref().map_or(Ok(()), |path| settings.write(path).map_err(|error| error.to_string()))
    }

    /// Brings the copy of unsaved work up to date; cheap when nothing changed.
    ///
    /// # Errors
    /// One sentence, once, when the copy cannot be written.
    pub fn keep_unsaved(&mut self, session: &Session) -> Result<(), String> {
        let kept = self.copy.as_mut().map_or(Ok(()), |copy| copy.update(session));
        match kept {
            Err(error) if !self.has_complained => {
                self.has_complained = true;
                Err(format!("{error}; unsaved work would not survive a crash"))
            }
            _ => Ok(()),
        }
    }

    /// The window closes and nothing unsaved is wanted any more.
    pub fn close(&mut self) {
        if let Some(copy) = self.copy.take() {
            // What cannot be removed is offered at the next start, which loses nothing.
            let _ = copy.close();
        }
    }
}
