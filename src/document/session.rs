//! A scenario being worked on: its file, what was saved last, and the way back.

use super::built_in::BuiltIn;
use super::edited_field::EditedField;
use super::files::{self, LoadError, WriteError};
use super::history::History;
use super::problem::Problem;
use super::scenario::Scenario;
use std::fs;
use std::path::{Path, PathBuf};
use std::sync::atomic::{AtomicU64, Ordering};
use thiserror::Error;

/// Why a session could not be saved. The file is as it was.
#[derive(Debug, Error)]
pub enum SaveError {
    /// It has no file yet.
    #[error("the scenario has no file yet; choose a name for it")]
    NoFile,
    /// The file was changed by someone else since it was read or written here.
    #[error("{} was changed by another program; save under another name, or replace it knowingly", path.display())]
    ChangedElsewhere {
        /// The file.
        path: PathBuf,
    },
    /// The file can't be written.
    #[error(transparent)]
    Write(#[from] WriteError),
}

/// A scenario with its file and its history.
#[derive(Clone, Debug)]
pub struct Session {
    scenario: Scenario,
    history: History<Scenario>,
    /// What would be lost by closing is the difference from this; none when nothing of it is safe.
    saved: Option<Scenario>,
    path: Option<PathBuf>,
    /// The bytes of the file as they were last read or written here.
    known_bytes: Option<Vec<u8>>,
    header: String,
    inner_comments: usize,
    revision: u64,
}

impl Session {
    /// A new scenario without a file.
    #[must_use]
    pub fn new_untitled() -> Self {
        Self::of(Scenario::new_untitled())
    }

    /// A scenario without a file that is nowhere lost, such as one from standard input.
    #[must_use]
    pub fn of(scenario: Scenario) -> Self {
        Self {
            saved: Some(scenario.clone()),
            scenario,
            history: History::new(),
            path: None,
            known_bytes: None,
            header: String::new(),
            inner_comments: 0,
            revision: next_revision(),
        }
    }

    /// A built-in scenario, to be saved under a name of its own.
    ///
    /// # Errors
    /// Every problem of the text. The project's tests hold that there is none.
    pub fn from_built_in(built_in: &BuiltIn) -> Result<Self, Vec<Problem>> {
        built_in.scenario().map(Self::of)
    }

    /// Opens a file.
    ///
    /// # Errors
    /// [`LoadError`] with every problem of the file.
    pub fn open(path: &Path) -> Result<Self, LoadError> {
        let bytes = files::read_bytes(path)?;
        let read = files::scenario_from_bytes(&bytes, &files::shown_name(path))?;
        Ok(Self {
            path: Some(path.to_owned()),
            known_bytes: Some(bytes),
            header: read.header,
            inner_comments: read.inner_comments,
            ..Self::of(read.scenario)
        })
    }

    /// Takes up a scenario that survived a crash: unsaved work on the file at `path`, if it had one.
    #[must_use]
    pub fn recovered(scenario: Scenario, path: Option<PathBuf>) -> Self {
        let original = path.as_deref().and_then(|path| files::read_scenario_text(path).ok());
        let known_bytes = path.as_deref().and_then(|path| fs::read(path).ok());
        let (header, inner_comments) =
            original.map_or_else(Default::default, |read| (read.header, read.inner_comments));
        Self { saved: None, path, known_bytes, header, inner_comments, ..Self::of(scenario) }
    }

    /// The scenario.
    #[must_use]
    pub fn scenario(&self) -> &Scenario {
        &self.scenario
    }

    /// The file, once it has one.
    #[must_use]
    pub fn path(&self) -> Option<&Path> {
        self.path.as_deref()
    }

    /// The scenario as it was saved or opened last; none when it never was.
    #[must_use]
    pub fn saved(&self) -> Option<&Scenario> {
        self.saved.as_ref()
    }

    /// Whether another program wrote the file since it was read or written here.
    #[must_use]
    pub fn is_changed_elsewhere(&self) -> bool {
        let bytes = self.path.as_deref().and_then(|path| fs::read(path).ok());
        bytes.is_some() && bytes != self.known_bytes
    }

    /// Takes the file as it is now for known: it may be replaced by saving.
    pub fn accept_file(&mut self) {
        self.known_bytes = self.path.as_deref().and_then(|path| fs::read(path).ok());
    }

    /// Whether there is something that closing would lose.
    #[must_use]
    pub fn is_dirty(&self) -> bool {
        self.saved.as_ref() != Some(&self.scenario)
    }

    /// A number that changes whenever the scenario does and that no other session shares:
    /// results made for another one are stale.
    #[must_use]
    pub fn revision(&self) -> u64 {
        self.revision
    }

    /// How many comments of the file saving would lose; the one at its top is kept.
    #[must_use]
    pub fn comments_lost_by_saving(&self) -> usize {
        self.inner_comments
    }

    /// Changes the scenario as a step of its own: adding a planet, choosing from a list.
    ///
    /// An edit that changes nothing leaves no step.
    pub fn edit(&mut self, label: impl Into<String>, change: impl FnOnce(&mut Scenario)) {
        self.end_interaction();
        if let Some(before) = self.change(change) {
            self.history.record(label.into(), before);
        }
    }

    /// Changes the scenario as part of the step before, when that was such a change with the same label: a key held
    /// down or a drag makes one step.
    pub fn edit_joined(&mut self, label: impl Into<String>, change: impl FnOnce(&mut Scenario)) {
        self.end_interaction();
        if let Some(before) = self.change(change) {
            self.history.record_joined(label.into(), before);
        }
    }

    /// Changes one field as part of a drag or of typing: all changes of it make one step
    /// until [`Session::end_interaction`] or an edit of something else.
    pub fn edit_field(&mut self, field: EditedField, change: impl FnOnce(&mut Scenario)) {
        let label = field.change_label(&self.scenario);
        if let Some(before) = self.change(change) {
            self.history.record_in_interaction(field, label, before);
        }
    }

    /// Says that a drag or a stretch of typing is over.
    pub fn end_interaction(&mut self) {
        self.history.end_interaction(&self.scenario);
    }

    /// Takes the last step back and returns its label.
    pub fn undo(&mut self) -> Option<String> {
        let label = self.history.undo(&mut self.scenario)?;
        self.revision = next_revision();
        Some(label)
    }

    /// Takes the step last undone again and returns its label.
    pub fn redo(&mut self) -> Option<String> {
        let label = self.history.redo(&mut self.scenario)?;
        self.revision = next_revision();
        Some(label)
    }

    /// What undo would take back.
    #[must_use]
    pub fn undo_label(&self) -> Option<&str> {
        self.history.undo_label()
    }

    /// What redo would take.
    #[must_use]
    pub fn redo_label(&self) -> Option<&str> {
        self.history.redo_label()
    }

    /// Saves to the session's file, unless another program changed that since.
    ///
    /// # Errors
    /// [`SaveError`]; the file is then as it was.
    pub fn save(&mut self) -> Result<(), SaveError> {
        let path = self.path.clone().ok_or(SaveError::NoFile)?;
        // A file that is gone or can't be read is no reason to keep the work from the disk.
        let changed = fs::read(&path).is_ok_and(|bytes| self.known_bytes.as_ref() != Some(&bytes));
        if changed {
            return Err(SaveError::ChangedElsewhere { path });
        }
        self.save_as(&path)
    }

    /// Saves to a file, whatever it holds, and makes it the session's own.
    ///
    /// # Errors
    /// [`SaveError::Write`]; the file is then as it was and the session keeps its own.
    pub fn save_as(&mut self, path: &Path) -> Result<(), SaveError> {
        self.end_interaction();
        let bytes = files::sound_text(&self.scenario, &self.header)?.into_bytes();
        files::write_atomically(path, &bytes)?;
        self.saved = Some(self.scenario.clone());
        self.path = Some(path.to_owned());
        self.known_bytes = Some(bytes);
        self.inner_comments = 0;
        Ok(())
    }

    /// Applies a change and returns the value before it, or nothing if it changed nothing.
    fn change(&mut self, change: impl FnOnce(&mut Scenario)) -> Option<Scenario> {
        let before = self.scenario.clone();
        change(&mut self.scenario);
        if before == self.scenario {
            return None;
        }
        self.revision = next_revision();
        Some(before)
    }
}

fn next_revision() -> u64 {
    static NEXT: AtomicU64 = AtomicU64::new(0);
    NEXT.fetch_add(1, Ordering::Relaxed)
}

#[cfg(test)]
mod tests {
    use super::*;
    use crate::system::specification::Body;

    const ALBEDO: EditedField = EditedField { body: Some(Body::Planet(0)), key: "bond_albedo" };

    fn drag(session: &mut Session, values: &[f64]) {
        for value in values {
            session.edit_field(ALBEDO, |scenario| scenario.system.planets[0].bond_albedo = *value);
        }
        session.end_interaction();
    }

    #[test]
    fn a_drag_is_one_step_and_undoing_it_is_clean_again() {
        let mut session = Session::new_untitled();
        drag(&mut session, &[0.4, 0.5, 0.6]);
        assert!(session.is_dirty());
        assert_eq!(session.undo_label(), Some("Change Bond albedo of Planet"));
        assert_eq!(session.undo().as_deref(), Some("Change Bond albedo of Planet"));
        assert!(!session.is_dirty());
        assert_eq!(session.undo(), None);
        assert_eq!(session.redo().as_deref(), Some("Change Bond albedo of Planet"));
        assert!((session.scenario().system.planets[0].bond_albedo - 0.6).abs() < 1e-15);
    }

    #[test]
    fn joined_edits_are_one_step_until_something_else_happens() {
        let mut session = Session::new_untitled();
        let nudge = |session: &mut Session, mass_msun: f64| {
            session.edit_joined("Change mass", |scenario| scenario.system.star.mass_msun = mass_msun);
        };
        for mass_msun in [1.01, 1.02, 1.03] {
            nudge(&mut session, mass_msun);
        }
        session.undo();
        assert!(!session.is_dirty());
        session.redo();
        session.edit("Change mass", |scenario| scenario.system.star.mass_msun = 2.0);
        nudge(&mut session, 2.02);
        session.undo();
        assert_eq!(session.scenario().system.star.mass_msun, 2.0, "an edit of its own is not joined");
        nudge(&mut session, 2.01);
        session.undo();
        assert_eq!(session.scenario().system.star.mass_msun, 2.0);
    }

    #[test]
    fn an_edit_that_changes_nothing_is_no_step() {
        let mut session = Session::new_untitled();
        session.edit("Nothing", |_| {});
        drag(&mut session, &[0.4, 0.3]);
        assert_eq!((session.undo_label(), session.is_dirty()), (None, false));
    }

    #[test]
    fn saving_makes_clean_and_keeps_the_leading_comment() {
        let folder = tempfile::tempdir().expect("a folder");
        let path = folder.path().join("a.ron");
        let mut session = Session::new_untitled();
        assert!(matches!(session.save(), Err(SaveError::NoFile)));
        session.save_as(&path).expect("saved");
        let text = fs::read_to_string(&path).expect("read");
        fs::write(&path, format!("// by hand\n/* two */\n{}", text.replace("star", "/* x */ star"))).expect("written");
        let mut session = Session::open(&path).expect("sound");
        assert_eq!(session.comments_lost_by_saving(), 1);
        session.edit("Rename", |scenario| scenario.title = "Other".to_owned());
        assert!(session.is_dirty());
        session.save().expect("saved");
        assert!(!session.is_dirty());
        let saved = fs::read_to_string(&path).expect("read");
        assert!(saved.starts_with("// by hand\n/* two */\nLongember(\n"), "{saved}");
        assert_eq!(Session::open(&path).expect("sound").scenario(), session.scenario());
        session.undo();
        assert!(session.is_dirty());
    }

    #[test]
    fn a_file_changed_elsewhere_is_not_overwritten() {
        let folder = tempfile::tempdir().expect("a folder");
        let path = folder.path().join("a.ron");
        let mut session = Session::new_untitled();
        session.save_as(&path).expect("saved");
        fs::write(&path, "// another program was here").expect("written");
        assert!(matches!(session.save(), Err(SaveError::ChangedElsewhere { .. })));
        fs::remove_file(&path).expect("removed");
        session.save().expect("a file that is gone is written anew");
        fs::write(&path, "again").expect("written");
        session.save_as(&path).expect("knowingly");
        session.save().expect("known again");
    }

    #[test]
    fn a_failed_save_stays_dirty() {
        let folder = tempfile::tempdir().expect("a folder");
        let mut session = Session::new_untitled();
        session.edit("Rename", |scenario| scenario.title = "Other".to_owned());
        assert!(session.save_as(&folder.path().join("no/a.ron")).is_err());
        assert!(session.is_dirty());
        assert_eq!(session.path(), None);
    }

    #[test]
    fn the_revision_follows_every_change() {
        let mut session = Session::new_untitled();
        let mut seen = vec![session.revision()];
        drag(&mut session, &[0.5]);
        seen.push(session.revision());
        session.undo();
        seen.push(session.revision());
        session.redo();
        seen.push(session.revision());
        seen.push(Session::new_untitled().revision());
        seen.sort_unstable();
        seen.dedup();
        assert_eq!(seen.len(), 5);
    }
}
