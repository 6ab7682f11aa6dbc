//! Unsaved work survives a crash: a copy beside the real file's life, found at the next start.
//!
//! Each open session keeps one copy in the state folder and holds a lock while its process lives.
//! A copy whose lock is free was left behind by a crash. No clock is asked and no process number trusted.

use super::files::{self, WriteError};
use super::problem::{Fault, Problem, Subject};
use super::record_reading::Reading;
use super::ron_text::{Writer, quoted};
use super::scenario::Scenario;
use super::scenario_form::read::read_scenario_node;
use super::scenario_form::write::write_scenario_member;
use super::session::Session;
use std::fs::{self, File, TryLockError};
use std::io;
use std::path::{Path, PathBuf};
use thiserror::Error;

const NAME: &str = "LongemberRecovery";
const KEYS: &[&str] = &["file", "scenario"];
const PREFIX: &str = "session-";

/// Why unsaved work could not be kept safe.
#[derive(Debug, Error)]
pub enum RecoveryError {
    /// The folder can't be used.
    #[error("unsaved work can't be kept safe in {}: {source}; save the scenario now", folder.display())]
    Folder {
        /// The folder.
        folder: PathBuf,
        /// What the system says.
        source: io::Error,
    },
    /// The copy can't be written.
    #[error("unsaved work can't be kept safe: {0}; save the scenario now")]
    Write(#[from] WriteError),
}

/// The recovery copy of one open session.
#[derive(Debug)]
pub struct RecoveryCopy {
    copy: PathBuf,
    lock_path: PathBuf,
    /// Held for as long as this lives; the system lets go of it when the process ends in any way.
    _lock: File,
    /// What the copy holds, if there is one.
    written: Option<(Scenario, Option<PathBuf>)>,
}

impl RecoveryCopy {
    /// Makes a place for the copy of one session in a folder, which is made if need be.
    ///
    /// # Errors
    /// [`RecoveryError::Folder`] when the folder can't be written to.
    pub fn begin(folder: &Path) -> Result<Self, RecoveryError> {
        let trouble = |source| RecoveryError::Folder { folder: folder.to_owned(), source };
        fs::create_dir_all(folder).map_err(trouble)?;
        let lock_file = tempfile::Builder::new().prefix(PREFIX).suffix(".lock").tempfile_in(folder).map_err(trouble)?;
        // A file system without locks still keeps the copy; only a second window could then mistake it for a crash's.
        let _ = lock_file.as_file().try_lock();
        let (lock, lock_path) = lock_file.keep().map_err(|error| trouble(error.error))?;
        Ok(Self { copy: lock_path.with_extension("ron"), lock_path, _lock: lock, written: None })
    }

    /// Brings the copy up to date: written if there is unsaved work that it does not hold yet,
    /// removed if there is none. Cheap when nothing changed, so it may be called often.
    ///
    /// # Errors
    /// [`RecoveryError`] when the folder can't be written to.
    pub fn update(&mut self, session: &Session) -> Result<(), RecoveryError> {
        if !session.is_dirty() {
            if self.written.take().is_some() {
                remove(&self.copy).map_err(|source| self.trouble(source))?;
            }
            return Ok(());
        }
        let is_current = self
            .written
            .as_ref()
            .is_some_and(|(scenario, file)| scenario == session.scenario() && file.as_deref() == session.path());
        if !is_current {
            files::write_atomically(&self.copy, copy_text(session).as_bytes())?;
            self.written = Some((session.scenario().clone(), session.path().map(Path::to_owned)));
        }
        Ok(())
    }

    /// Removes the copy: the session was closed by its user.
    ///
    /// # Errors
    /// [`RecoveryError`] when the folder can't be written to.
    pub fn close(self) -> Result<(), RecoveryError> {
        remove(&self.copy).and_then(|()| remove(&self.lock_path)).map_err(|source| self.trouble(source))
    }

    fn trouble(&self, source: io::Error) -> RecoveryError {
        RecoveryError::Folder { folder: self.copy.parent().unwrap_or(&self.copy).to_owned(), source }
    }
}

/// What earlier crashes left behind.
#[derive(Debug, Default)]
pub struct LeftBehind {
    /// Unsaved work that can be taken up again.
    pub copies: Vec<Recovered>,
    /// Copies that can't be read, set aside under the paths given here.
    pub damaged: Vec<Damaged>,
}

/// A copy that can't be read.
#[derive(Debug)]
pub struct Damaged {
    /// Where it is now.
    pub path: PathBuf,
    /// What is wrong with it.
    pub problems: Vec<Problem>,
}

/// Unsaved work of a crashed session.
#[derive(Debug)]
pub struct Recovered {
    /// The scenario as it was.
    pub scenario: Scenario,
    /// The file it belongs to, if it had one.
    pub file: Option<PathBuf>,
    copy: PathBuf,
    lock_path: PathBuf,
    /// Held so that a second window starting now does not offer the same work.
    _lock: Option<File>,
}

impl Recovered {
    /// The work as a session with unsaved changes. The copy stays until [`Recovered::discard`].
    #[must_use]
    pub fn session(&self) -> Session {
        Session::recovered(self.scenario.clone(), self.file.clone())
    }

    /// When the copy was written, if the file system tells.
    #[must_use]
    pub fn written(&self) -> Option<std::time::SystemTime> {
        fs::metadata(&self.copy).and_then(|metadata| metadata.modified()).ok()
    }

    /// Removes the copy: the work was taken up, in a session with a copy of its own, or is not wanted.
    ///
    /// # Errors
    /// The system's error when the copy can't be removed; it is then found again at the next start.
    pub fn discard(self) -> io::Result<()> {
        remove(&self.copy).and_then(|()| remove(&self.lock_path))
    }
}

/// Looks for what earlier crashes left in a folder. Copies of sessions that are open now are left alone.
///
/// # Errors
/// The system's error when there is a folder that can't be read.
pub fn left_behind(folder: &Path) -> io::Result<LeftBehind> {
    let mut found = LeftBehind::default();
    let entries = match fs::read_dir(folder) {
        Ok(entries) => entries,
        Err(error) if error.kind() == io::ErrorKind::NotFound => return Ok(found),
        Err(error) => return Err(error),
    };
    let mut paths: Vec<PathBuf> = entries.filter_map(|entry| entry.ok().map(|entry| entry.path())).collect();
    paths.sort();
    for path in paths {
        let is_ours = path.file_name().is_some_and(|name| name.to_string_lossy().starts_with(PREFIX));
        let is = |extension: &str| is_ours && path.extension().is_some_and(|found| found == extension);
        if is("ron") {
            take_up(&path, &mut found);
        } else if is("lock") && !path.with_extension("ron").exists() && free_lock(&path).is_some() {
            // A session that crashed without unsaved work; it is of no account if this fails.
            let _ = remove(&path);
        }
    }
    Ok(found)
}

fn take_up(copy: &Path, found: &mut LeftBehind) {
    let lock_path = copy.with_extension("lock");
    let Some(lock) = free_lock(&lock_path) else { return };
    match read_copy(copy) {
        Ok((scenario, file)) => {
            found.copies.push(Recovered { scenario, file, copy: copy.to_owned(), lock_path, _lock: lock });
        }
        Err(problems) => {
            let aside = copy.with_extension("damaged");
            let path = if fs::rename(copy, &aside).is_ok() { aside } else { copy.to_owned() };
            let _ = remove(&lock_path);
            found.damaged.push(Damaged { path, problems });
        }
    }
}

/// Takes a lock that nobody holds: none if a living session holds it, `Some(None)` if there is no lock to hold.
#[expect(clippy::option_option, reason = "held by another, taken, and not there are three answers")]
fn free_lock(path: &Path) -> Option<Option<File>> {
    let Ok(file) = File::options().read(true).write(true).open(path) else { return Some(None) };
    match file.try_lock() {
        Ok(()) => Some(Some(file)),
        Err(TryLockError::WouldBlock) => None,
        // A file system without locks: nobody can hold one.
        Err(TryLockError::Error(_)) => Some(None),
    }
}

fn copy_text(session: &Session) -> String {
    let mut writer = Writer::new();
    writer.open("", NAME, '(');
    // A path that is no text can't be written down; such work is saved under a new name.
    match session.path().and_then(Path::to_str) {
        Some(path) => writer.field("file", &format!("Some({})", quoted(path))),
        None => writer.field("file", "None"),
    }
    write_scenario_member(&mut writer, "scenario", session.scenario());
    writer.close(')');
    writer.finish()
}

fn read_copy(path: &Path) -> Result<(Scenario, Option<PathBuf>), Vec<Problem>> {
    let bytes = files::read_bytes(path).map_err(|error| match error {
        files::LoadError::Unsound { problems } => problems,
        files::LoadError::Unreadable { .. } => Vec::new(),
    })?;
    let text = String::from_utf8_lossy(&bytes);
    let name = files::shown_name(path);
    let (mut reading, parsed) = Reading::begin(&text, &name, NAME);
    let mut read = None;
    if let Some(root) = &parsed.root
        && let Some(fields) = reading.fields(root, NAME, "the copy", KEYS, Subject::Whole)
    {
        let file = match fields.given("file") {
            Some(node) => reading.text(node, &Subject::Whole, "file").map(PathBuf::from),
            None => None,
        };
        if let Some(node) = reading.required(&fields, "scenario", "a scenario") {
            read = read_scenario_node(&mut reading, node)?.map(|scenario| (scenario, file));
        }
    }
    let problems = reading.finish();
    // Work in progress may hold values that can't be saved; it is still the user's work.
    let as_it_was =
        |problem: &Problem| matches!(problem.fault, Fault::Input(_) | Fault::EmptyText { .. } | Fault::BadText { .. });
    match read {
        Some(read) if problems.iter().all(as_it_was) => Ok(read),
        _ => Err(problems),
    }
}

/// Removes a file that may be gone already.
fn remove(path: &Path) -> io::Result<()> {
    match fs::remove_file(path) {
        Err(error) if error.kind() != io::ErrorKind::NotFound => Err(error),
        _ => Ok(()),
    }
}

#[cfg(test)]
mod tests {
    use super::*;

    fn dirty(title: &str) -> Session {
        let mut session = Session::new_untitled();
        session.edit("Rename", |scenario| scenario.title = title.to_owned());
        session
    }

    fn names(folder: &Path) -> usize {
        fs::read_dir(folder).map_or(0, Iterator::count)
    }

    #[test]
    fn work_left_by_a_crash_is_found_once() {
        let folder = tempfile::tempdir().expect("a folder");
        let home = folder.path().join("state");
        let path = folder.path().join("a.ron");
        let mut session = dirty("Half done");
        session.save_as(&path).expect("saved");
        session.edit("Empty", |scenario| scenario.title = String::new());
        let mut copy = RecoveryCopy::begin(&home).expect("a place");
        copy.update(&session).expect("kept");
        assert!(left_behind(&home).expect("readable").copies.is_empty(), "the session lives");
        drop(copy); // As a crash does: nothing is cleaned up.
        let mut found = left_behind(&home).expect("readable");
        assert!(left_behind(&home).expect("readable").copies.is_empty(), "another window holds it");
        let recovered = found.copies.pop().expect("found");
        assert_eq!(recovered.scenario, *session.scenario());
        assert_eq!(recovered.file.as_deref(), Some(path.as_path()));
        assert!(recovered.written().is_some());
        let mut again = recovered.session();
        assert!(again.is_dirty());
        recovered.discard().expect("removed");
        assert!(left_behind(&home).expect("readable").copies.is_empty());
        assert_eq!(names(&home), 0);
        again.edit("Title", |scenario| scenario.title = "Done".to_owned());
        again.save().expect("to the old file");
    }

    #[test]
    fn saving_and_closing_remove_the_copy() {
        let folder = tempfile::tempdir().expect("a folder");
        let mut session = dirty("A");
        let mut copy = RecoveryCopy::begin(folder.path()).expect("a place");
        copy.update(&session).expect("kept");
        assert_eq!(names(folder.path()), 2);
        session.undo();
        copy.update(&session).expect("removed");
        assert_eq!(names(folder.path()), 1);
        session.redo();
        copy.update(&session).expect("kept again");
        assert_eq!(names(folder.path()), 2);
        copy.close().expect("closed");
        assert_eq!(names(folder.path()), 0);
    }

    #[test]
    fn a_damaged_copy_is_set_aside() {
        let folder = tempfile::tempdir().expect("a folder");
        fs::write(folder.path().join("session-x.ron"), "LongemberRecovery(file: None, sce").expect("written");
        fs::write(folder.path().join("session-y.lock"), "").expect("written");
        fs::write(folder.path().join("other.ron"), "mine").expect("written");
        let found = left_behind(folder.path()).expect("readable");
        assert_eq!((found.copies.len(), found.damaged.len()), (0, 1));
        assert!(!found.damaged[0].problems.is_empty());
        assert!(folder.path().join("session-x.damaged").exists());
        assert_eq!(names(folder.path()), 2);
        assert!(left_behind(folder.path()).expect("readable").damaged.is_empty());
    }
}
