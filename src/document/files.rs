//! Files: read whole with every problem, written whole or not at all.

use super::problem::{Fault, Place, Problem, Subject};
use super::ron_text::{Lines, SyntaxFault};
use super::scenario::Scenario;
use super::scenario_form::{ScenarioText, parse_scenario_text, scenario_text};
use std::fs::{self, File};
use std::io::{self, Read, Write};
use std::path::{Path, PathBuf};
use thiserror::Error;

/// Files larger than this are not read: no scenario comes near it.
pub const LARGEST_FILE_BYTES: u64 = 4 << 20;

/// Why a document could not be read.
#[derive(Debug, Error)]
pub enum LoadError {
    /// The file can't be read.
    #[error("{} can't be read: {source}; {}", path.display(), read_remedy(source))]
    Unreadable {
        /// The file.
        path: PathBuf,
        /// What the system says.
        source: io::Error,
    },
    /// The text holds no sound scenario; one problem a line.
    #[error("{}", lines_of(problems))]
    Unsound {
        /// Everything that is wrong, in the order of the text.
        problems: Vec<Problem>,
    },
}

/// Why a file could not be written. The file under that name, if there was one, is as it was.
#[derive(Debug, Error)]
pub enum WriteError {
    /// The system refused.
    #[error("{} can't be written: {source}; {}", path.display(), write_remedy(source))]
    Unwritable {
        /// The file.
        path: PathBuf,
        /// What the system says.
        source: io::Error,
    },
    /// Something else than a file has that name.
    #[error("{} is no file, allowed a file; choose another name", path.display())]
    NotAFile {
        /// The path.
        path: PathBuf,
    },
    /// The file is marked as one not to be changed.
    #[error("{} is read-only; change its permissions or choose another name", path.display())]
    ReadOnly {
        /// The file.
        path: PathBuf,
    },
    /// A file of that name is there and was not to be replaced.
    #[error("{} exists already; choose another name or ask for it to be replaced", path.display())]
    Exists {
        /// The file.
        path: PathBuf,
    },
    /// The scenario can't be saved as it is; one problem a line.
    #[error("{}", lines_of(problems))]
    Unsound {
        /// Everything that is wrong.
        problems: Vec<Problem>,
    },
}

/// Reads a scenario from a file.
///
/// # Errors
/// [`LoadError`] with every problem of the file.
pub fn read_scenario(path: &Path) -> Result<Scenario, LoadError> {
    read_scenario_text(path).map(|read| read.scenario)
}

/// Reads a scenario from a file, and what its text held besides.
///
/// # Errors
/// [`LoadError`] with every problem of the file.
pub fn read_scenario_text(path: &Path) -> Result<ScenarioText, LoadError> {
    scenario_from_bytes(&read_bytes(path)?, &shown_name(path))
}

/// The name of a file as problems show it: without its folder.
pub(super) fn shown_name(path: &Path) -> String {
    path.file_name().unwrap_or(path.as_os_str()).to_string_lossy().into_owned()
}

/// Reads a scenario from bytes, such as standard input; `name` is what problems call it.
///
/// # Errors
/// [`LoadError::Unsound`] with every problem.
pub fn scenario_from_bytes(bytes: &[u8], name: &str) -> Result<ScenarioText, LoadError> {
    if bytes.len() as u64 > LARGEST_FILE_BYTES {
        let fault = SyntaxFault::TooLarge { bytes: bytes.len() as u64, most: LARGEST_FILE_BYTES };
        return Err(LoadError::Unsound { problems: vec![problem_at(name, (1, 1), fault)] });
    }
    let text = String::from_utf8_lossy(bytes);
    let mut problems = foreign_bytes(bytes, &text, name);
    match parse_scenario_text(&text, name) {
        Ok(read) if problems.is_empty() => Ok(read),
        Ok(_) => Err(LoadError::Unsound { problems }),
        Err(others) => {
            problems.extend(others);
            let place = |problem: &Problem| problem.place.as_ref().map(|place| (place.line, place.column));
            problems.sort_by_key(place);
            Err(LoadError::Unsound { problems })
        }
    }
}

/// Reads a file that is not larger than any of ours.
///
/// # Errors
/// [`LoadError`] when the system refuses or the file is too large.
pub fn read_bytes(path: &Path) -> Result<Vec<u8>, LoadError> {
    let unreadable = |source| LoadError::Unreadable { path: path.to_owned(), source };
    let file = File::open(path).map_err(unreadable)?;
    let metadata = file.metadata().map_err(unreadable)?;
    if metadata.is_dir() {
        return Err(unreadable(io::Error::from(io::ErrorKind::IsADirectory)));
    }
    let mut bytes = Vec::new();
    // A pipe has no length to ask for.
    file.take(LARGEST_FILE_BYTES + 1).read_to_end(&mut bytes).map_err(unreadable)?;
    if bytes.len() as u64 > LARGEST_FILE_BYTES {
        let name = shown_name(path);
        let fault = SyntaxFault::TooLarge { bytes: metadata.len().max(bytes.len() as u64), most: LARGEST_FILE_BYTES };
        return Err(LoadError::Unsound { problems: vec![problem_at(&name, (1, 1), fault)] });
    }
    Ok(bytes)
}

/// Every place where the bytes are no UTF-8, up to ten: a file in another encoding has thousands.
fn foreign_bytes(bytes: &[u8], text: &str, name: &str) -> Vec<Problem> {
    const MOST: usize = 10;
    let lines = Lines::new(text);
    let mut offset = 0;
    let mut problems = Vec::new();
    for chunk in bytes.utf8_chunks() {
        offset += chunk.valid().len();
        if chunk.invalid().is_empty() || problems.len() == MOST {
            break;
        }
        problems.push(problem_at(name, lines.line_and_column(offset), SyntaxFault::NotUtf8));
        // The lossy text holds one replacement character here.
        offset += char::REPLACEMENT_CHARACTER.len_utf8();
    }
    problems
}

fn problem_at(file: &str, (line, column): (usize, usize), fault: SyntaxFault) -> Problem {
    let place = Some(Place { file: file.to_owned(), line, column });
    Problem { subject: Subject::Whole, key: None, fault: Fault::Syntax(fault), place }
}

/// Writes a sound scenario to a file, replacing what was there.
///
/// # Errors
/// [`WriteError`]; the old file is then as it was.
pub fn write_scenario(path: &Path, scenario: &Scenario) -> Result<(), WriteError> {
    write_atomically(path, sound_text(scenario, "")?.as_bytes())
}

/// The text of a scenario under a leading comment, unless it has problems.
///
/// # Errors
/// [`WriteError::Unsound`] with every problem.
pub fn sound_text(scenario: &Scenario, header: &str) -> Result<String, WriteError> {
    let problems = scenario.problems();
    if !problems.is_empty() {
        return Err(WriteError::Unsound { problems });
    }
    let gap = if header.is_empty() { "" } else { "\n" };
    Ok(format!("{header}{gap}{}", scenario_text(scenario)))
}

/// Writes a file whole or not at all, replacing what was there.
///
/// The bytes go to a temporary file in the same folder, reach the disk, and then take the name over.
/// Permissions of an old file are kept; a symbolic link stays one and its target is replaced.
/// Owner, access lists and hard links of the old file are not carried over.
///
/// # Errors
/// [`WriteError`]; the old file is then as it was.
pub fn write_atomically(path: &Path, bytes: &[u8]) -> Result<(), WriteError> {
    let target = followed(path).map_err(|source| unwritable(path, source))?;
    let old = match fs::metadata(&target) {
        Ok(metadata) if !metadata.is_file() => return Err(WriteError::NotAFile { path: path.to_owned() }),
        Ok(metadata) if metadata.permissions().readonly() => {
            return Err(WriteError::ReadOnly { path: path.to_owned() });
        }
        Ok(metadata) => Some(metadata.permissions()),
        Err(error) if error.kind() == io::ErrorKind::NotFound => None,
        Err(source) => return Err(unwritable(path, source)),
    };
    let temporary = written_beside(&target, bytes, old).map_err(|source| unwritable(path, source))?;
    temporary.persist(&target).map_err(|error| unwritable(path, error.error))?;
    sync_folder(&target);
    Ok(())
}

/// Writes a new file whole or not at all; a file that is there already stays as it is.
///
/// # Errors
/// [`WriteError::Exists`] when there is something of that name, else as [`write_atomically`].
pub fn create_atomically(path: &Path, bytes: &[u8]) -> Result<(), WriteError> {
    let exists = || WriteError::Exists { path: path.to_owned() };
    if path.symlink_metadata().is_ok() {
        return Err(exists());
    }
    let temporary = written_beside(path, bytes, None).map_err(|source| unwritable(path, source))?;
    temporary.persist_noclobber(path).map_err(|error| match error.error.kind() {
        io::ErrorKind::AlreadyExists => exists(),
        _ => unwritable(path, error.error),
    })?;
    sync_folder(path);
    Ok(())
}

fn written_beside(
    target: &Path,
    bytes: &[u8],
    permissions: Option<fs::Permissions>,
) -> io::Result<tempfile::NamedTempFile> {
    let mut builder = tempfile::Builder::new();
    builder.prefix(".longember-").suffix(".tmp");
    #[cfg(unix)]
    {
        use std::os::unix::fs::PermissionsExt;
        // What a new file gets; the process's mask takes its share away.
        builder.permissions(fs::Permissions::from_mode(0o666));
    }
    let mut temporary = builder.tempfile_in(folder_of(target))?;
    temporary.write_all(bytes)?;
    temporary.flush()?;
    if let Some(permissions) = permissions {
        temporary.as_file().set_permissions(permissions)?;
    }
    temporary.as_file().sync_all()?;
    Ok(temporary)
}

/// Makes the new name itself reach the disk, where the system lets folders be synchronised.
fn sync_folder(target: &Path) {
    if cfg!(unix) {
        // The bytes are safe by now: a system that refuses this loses at most the renaming.
        let _ = File::open(folder_of(target)).and_then(|folder| folder.sync_all());
    }
}

fn folder_of(path: &Path) -> &Path {
    match path.parent() {
        Some(folder) if !folder.as_os_str().is_empty() => folder,
        _ => Path::new("."),
    }
}

/// The path behind any symbolic links, also where the last one points at nothing yet.
fn followed(path: &Path) -> io::Result<PathBuf> {
    const MOST_LINKS: usize = 40;
    let mut path = path.to_owned();
    for _ in 0..MOST_LINKS {
        match fs::symlink_metadata(&path) {
            Ok(metadata) if metadata.is_symlink() => {
                let target = fs::read_link(&path)?;
                path = folder_of(&path).join(target);
            }
            Ok(_) => return Ok(path),
            Err(error) if error.kind() == io::ErrorKind::NotFound => return Ok(path),
            Err(error) => return Err(error),
        }
    }
    Err(io::Error::other("symbolic links lead in a circle"))
}

fn unwritable(path: &Path, source: io::Error) -> WriteError {
    WriteError::Unwritable { path: path.to_owned(), source }
}

fn read_remedy(error: &io::Error) -> &'static str {
    match error.kind() {
        io::ErrorKind::NotFound => "check the name and the folder",
        io::ErrorKind::PermissionDenied => "ask for permission to read it, or copy it elsewhere",
        io::ErrorKind::IsADirectory => "name a file in it",
        _ => "check that the disk is there and works",
    }
}

fn write_remedy(error: &io::Error) -> &'static str {
    match error.kind() {
        io::ErrorKind::NotFound | io::ErrorKind::NotADirectory => "make the folder first or choose another",
        io::ErrorKind::PermissionDenied | io::ErrorKind::ReadOnlyFilesystem => "choose a folder you may write to",
        io::ErrorKind::StorageFull | io::ErrorKind::QuotaExceeded => "make room on the disk or choose another",
        _ => "choose another folder; nothing was changed",
    }
}

fn lines_of(problems: &[Problem]) -> String {
    problems.iter().map(ToString::to_string).collect::<Vec<_>>().join("\n")
}

#[cfg(test)]
mod tests {
    use super::*;

    fn folder() -> tempfile::TempDir {
        tempfile::tempdir().expect("a temporary folder")
    }

    fn names(folder: &Path) -> Vec<String> {
        let mut names: Vec<_> = fs::read_dir(folder)
            .expect("readable")
            .map(|entry| entry.expect("entry").file_name().to_string_lossy().into_owned())
            .collect();
        names.sort();
        names
    }

    #[test]
    fn what_is_written_is_read() {
        let folder = folder();
        let path = folder.path().join("a.ron");
        let mut scenario = Scenario::new_untitled();
        write_scenario(&path, &scenario).expect("written");
        scenario.title = "Second".to_owned();
        write_scenario(&path, &scenario).expect("written over");
        assert_eq!(read_scenario(&path).expect("read"), scenario);
        assert_eq!(names(folder.path()), ["a.ron"]);
    }

    #[test]
    fn an_unsound_scenario_leaves_the_old_file() {
        let folder = folder();
        let path = folder.path().join("a.ron");
        let mut scenario = Scenario::new_untitled();
        write_scenario(&path, &scenario).expect("written");
        scenario.system.star.mass_msun = f64::NAN;
        let error = write_scenario(&path, &scenario).expect_err("not a number");
        assert!(error.to_string().starts_with("star \"Star\": mass_msun is NaN, allowed"), "{error}");
        assert!(read_scenario(&path).is_ok());
    }

    #[test]
    fn a_new_file_never_replaces_one() {
        let folder = folder();
        let path = folder.path().join("a.txt");
        create_atomically(&path, b"one").expect("new");
        assert!(matches!(create_atomically(&path, b"two"), Err(WriteError::Exists { .. })));
        assert_eq!(fs::read(&path).expect("read"), b"one");
    }

    #[test]
    fn trouble_is_named_with_a_remedy() {
        let folder = folder();
        let error = read_scenario(&folder.path().join("no.ron")).expect_err("not there");
        assert!(error.to_string().ends_with("; check the name and the folder"), "{error}");
        assert!(matches!(read_scenario(folder.path()), Err(LoadError::Unreadable { .. })));
        assert!(matches!(write_atomically(folder.path(), b""), Err(WriteError::NotAFile { .. })));
        let error = write_atomically(&folder.path().join("no/a.ron"), b"").expect_err("no folder");
        assert!(error.to_string().ends_with("; make the folder first or choose another"), "{error}");
        assert_eq!(names(folder.path()), Vec::<String>::new());
    }

    #[test]
    fn a_huge_file_is_refused_unread() {
        let folder = folder();
        let path = folder.path().join("a.ron");
        File::create(&path).and_then(|file| file.set_len(LARGEST_FILE_BYTES * 1000)).expect("a sparse file");
        let error = read_scenario(&path).expect_err("too large").to_string();
        assert!(error.contains("allowed at most 4194304"), "{error}");
    }

    #[test]
    fn foreign_bytes_have_a_place() {
        let Err(LoadError::Unsound { problems }) = scenario_from_bytes(b"(\n  title: \"caf\xe9\xff\",\n", "a.ron")
        else {
            panic!("no UTF-8");
        };
        let lines: Vec<_> = problems.iter().map(ToString::to_string).collect();
        assert_eq!(lines[1], "the bytes here are no UTF-8 text; save the file as UTF-8 (a.ron:2:14)", "{lines:?}");
        assert_eq!(lines[2], "the bytes here are no UTF-8 text; save the file as UTF-8 (a.ron:2:15)");
    }

    #[cfg(unix)]
    #[test]
    fn permissions_are_kept_and_links_followed() {
        use std::os::unix::fs::{PermissionsExt, symlink};
        let folder = folder();
        let (target, link, far) = (folder.path().join("a"), folder.path().join("l"), folder.path().join("far"));
        write_atomically(&target, b"one").expect("new");
        fs::set_permissions(&target, fs::Permissions::from_mode(0o640)).expect("set");
        symlink("a", &link).expect("link");
        write_atomically(&link, b"two").expect("through the link");
        assert!(fs::symlink_metadata(&link).expect("there").is_symlink());
        assert_eq!(fs::read(&target).expect("read"), b"two");
        assert_eq!(fs::metadata(&target).expect("there").permissions().mode() & 0o777, 0o640);
        symlink("nothing", &far).expect("link");
        write_atomically(&far, b"three").expect("through a dangling link");
        assert_eq!(fs::read(folder.path().join("nothing")).expect("read"), b"three");
        symlink("circle", folder.path().join("circle")).expect("link");
        assert!(write_atomically(&folder.path().join("circle"), b"").is_err());
        fs::set_permissions(&target, fs::Permissions::from_mode(0o440)).expect("set");
        assert!(matches!(write_atomically(&target, b"four"), Err(WriteError::ReadOnly { .. })));
    }
}
