//! What one user prefers. Reading never fails: what can't be understood is warned about and takes its usual value.

use super::files::{self, LoadError, WriteError};
use super::problem::Subject;
use super::record_reading::Reading;
use super::ron_text::{Field, Node, Value, Writer, quoted};
use super::user_folders::config_folder;
use crate::units::time_words::SpanStyle;
use std::fs;
use std::path::{Path, PathBuf};

/// More recent files than this are not remembered.
pub const MOST_RECENT_FILES: usize = 10;
/// Permitted enlargements of all text, dimensionless.
pub const TEXT_SCALE_RANGE: (f64, f64) = (0.75, 3.0);
/// Permitted widths of the panels beside the stage, in logical pixels.
pub const SIDE_WIDTH_RANGE: (f64, f64) = (220.0, 420.0);
/// Usual width of the panels beside the stage, in logical pixels.
const SIDE_WIDTH_PX: f64 = 252.0;
/// Permitted widths and heights of the window, in logical pixels.
pub const WINDOW_SIDE_RANGE: (f64, f64) = (320.0, 16384.0);

const NAME: &str = "LongemberSettings";
const FILE: &str = "settings.ron";
const THEMES: &[&str] = &["Dark", "Light", "Dome"];
const SPAN_STYLES: &[&str] = &["Symbols", "Words"];

/// The colours of the window.
#[derive(Clone, Copy, Debug, Default, PartialEq, Eq, Hash)]
pub enum Theme {
    /// Near-black ground.
    #[default]
    Dark,
    /// Light ground, for print and daylight.
    Light,
    /// Dim amber on black, for a control room at night.
    Dome,
}

impl Theme {
    /// Every theme, in the order they are offered.
    pub const ALL: [Self; 3] = [Self::Dark, Self::Light, Self::Dome];

    /// The theme in words for people; also its name in the file.
    #[must_use]
    pub fn name(self) -> &'static str {
        match self {
            Self::Dark => THEMES[0],
            Self::Light => THEMES[1],
            Self::Dome => THEMES[2],
        }
    }
}

/// The panels beside the stage: whether they are shown, and how wide they are.
#[derive(Clone, Debug, PartialEq)]
pub struct Panels {
    /// The panel of the inputs is shown.
    pub shows_system: bool,
    /// The panel of the figures at the moment is shown.
    pub shows_moment: bool,
    /// Width of the panel of the inputs, in logical pixels.
    pub system_width_px: f64,
    /// Width of the panel of the figures, in logical pixels.
    pub moment_width_px: f64,
}

impl Default for Panels {
    fn default() -> Self {
        Self { shows_system: true, shows_moment: true, system_width_px: SIDE_WIDTH_PX, moment_width_px: SIDE_WIDTH_PX }
    }
}

/// A user's preferences.
#[derive(Clone, Debug, PartialEq)]
pub struct Settings {
    /// The colours of the window.
    pub theme: Theme,
    /// Machine name of the time scale, such as `paced`.
    pub time_scale: String,
    /// How spans of time are written.
    pub span_style: SpanStyle,
    /// Enlargement of all text, dimensionless.
    pub text_scale: f64,
    /// Width and height of the window when it is not maximised, in logical pixels.
    pub window_size_px: (f64, f64),
    /// The window fills the screen.
    pub is_maximised: bool,
    /// The panels beside the stage.
    pub panels: Panels,
    /// The folder file dialogs begin in.
    pub folder: Option<PathBuf>,
    /// Files opened or saved lately, the latest first.
    recent_files: Vec<PathBuf>,
    /// Keys of a newer version with their text: written back as they were.
    unknown: Vec<(String, String)>,
    /// The file could not be read as a whole: it is set aside before the first writing.
    is_damaged: bool,
}

impl Default for Settings {
    fn default() -> Self {
        Self {
            theme: Theme::default(),
            time_scale: "paced".to_owned(),
            span_style: SpanStyle::default(),
            text_scale: 1.0,
            window_size_px: (1280.0, 800.0),
            is_maximised: false,
            panels: Panels::default(),
            folder: None,
            recent_files: Vec::new(),
            unknown: Vec::new(),
            is_damaged: false,
        }
    }
}

/// The user's settings file; none on a machine without a home folder.
#[must_use]
pub fn settings_path() -> Option<PathBuf> {
    config_folder().map(|folder| folder.join(FILE))
}

impl Settings {
    /// Reads settings, with a warning about what could not be understood. No file means the usual settings.
    #[must_use]
    pub fn read(path: &Path) -> (Self, Option<LoadError>) {
        let bytes = match files::read_bytes(path) {
            Ok(bytes) => bytes,
            Err(LoadError::Unreadable { source, .. }) if source.kind() == std::io::ErrorKind::NotFound => {
                return (Self::default(), None);
            }
            Err(error) => return (Self { is_damaged: true, ..Self::default() }, Some(error)),
        };
        let text = String::from_utf8_lossy(&bytes);
        let name = files::shown_name(path);
        let (mut reading, parsed) = Reading::begin(&text, &name, NAME);
        let mut settings = Self::default();
        match parsed.root.as_ref().map(|root| (root, &root.value)) {
            Some((_, Value::Record(record))) => {
                settings.is_damaged = record.damaged;
                for field in &record.fields {
                    settings.take(&mut reading, field, &text);
                }
            }
            Some((root, _)) => {
                settings.is_damaged = true;
                reading.wrong_kind(root, &Subject::Whole, "the file", format!("{NAME}(…)"));
            }
            None => {}
        }
        let problems = reading.finish();
        settings.is_damaged |= problems.iter().any(|problem| matches!(problem.fault, super::Fault::Syntax(_)));
        if settings.is_damaged {
            // Their text may be the damaged part; the whole file is set aside instead.
            settings.unknown.clear();
        }
        (settings, (!problems.is_empty()).then_some(LoadError::Unsound { problems }))
    }

    /// Writes the settings whole or not at all; makes the folder if need be.
    ///
    /// A file that could not be read before is kept beside it as `settings.damaged`.
    ///
    /// # Errors
    /// [`WriteError`]; the old file is then as it was.
    pub fn write(&mut self, path: &Path) -> Result<(), WriteError> {
        let unwritable = |source| WriteError::Unwritable { path: path.to_owned(), source };
        if let Some(folder) = path.parent() {
            fs::create_dir_all(folder).map_err(unwritable)?;
        }
        if self.is_damaged && path.is_file() {
            fs::copy(path, path.with_extension("damaged")).map_err(unwritable)?;
        }
        files::write_atomically(path, self.text().as_bytes())?;
        self.is_damaged = false;
        Ok(())
    }

    /// Files opened or saved lately, the latest first.
    #[must_use]
    pub fn recent_files(&self) -> &[PathBuf] {
        &self.recent_files
    }

    /// Puts a file at the head of the recent ones.
    pub fn remember_file(&mut self, path: &Path) {
        // A path is remembered so that it means the same file from any folder.
        let path = std::path::absolute(path).unwrap_or_else(|_| path.to_owned());
        self.folder = path.parent().map(Path::to_owned);
        self.forget_file(&path);
        self.recent_files.insert(0, path);
        self.recent_files.truncate(MOST_RECENT_FILES);
    }

    /// Takes a file out of the recent ones, such as one that is gone.
    pub fn forget_file(&mut self, path: &Path) {
        self.recent_files.retain(|recent| recent != path);
    }

    fn take(&mut self, reading: &mut Reading<'_>, field: &Field, text: &str) {
        let whole = &Subject::Whole;
        let node = &field.value;
        match field.key.as_str() {
            "theme" => {
                if let Some(index) = reading.choice(node, whole, "theme", THEMES) {
                    self.theme = Theme::ALL[index];
                }
            }
            "time_scale" => {
                if let Some(key) = reading.text(node, whole, "time_scale") {
                    key.clone_into(&mut self.time_scale);
                }
            }
            "span_style" => {
                if let Some(index) = reading.choice(node, whole, "span_style", SPAN_STYLES) {
                    self.span_style = if index == 0 { SpanStyle::Symbols } else { SpanStyle::Words };
                }
            }
            "text_scale" => set(&mut self.text_scale, number(reading, node, "text_scale", TEXT_SCALE_RANGE)),
            "window_width_px" => {
                set(&mut self.window_size_px.0, number(reading, node, "window_width_px", WINDOW_SIDE_RANGE));
            }
            "window_height_px" => {
                set(&mut self.window_size_px.1, number(reading, node, "window_height_px", WINDOW_SIDE_RANGE));
            }
            "is_maximised" => truth(reading, node, "is_maximised", &mut self.is_maximised),
            "shows_system" => truth(reading, node, "shows_system", &mut self.panels.shows_system),
            "shows_moment" => truth(reading, node, "shows_moment", &mut self.panels.shows_moment),
            "system_width_px" => {
                set(&mut self.panels.system_width_px, number(reading, node, "system_width_px", SIDE_WIDTH_RANGE));
            }
            "moment_width_px" => {
                set(&mut self.panels.moment_width_px, number(reading, node, "moment_width_px", SIDE_WIDTH_RANGE));
            }
            "folder" => self.folder = reading.text(node, whole, "folder").map(PathBuf::from),
            "recent_files" => {
                let items = reading.list(node, whole, "recent_files").unwrap_or_default();
                let paths = items.iter().filter_map(|item| reading.text(item, whole, "recent_files"));
                self.recent_files = paths.take(MOST_RECENT_FILES).map(PathBuf::from).collect();
            }
            _ if node.value != Value::Broken => {
                self.unknown.push((field.key.clone(), text[node.span.start..node.span.end].to_owned()));
            }
            _ => {}
        }
    }

    fn text(&self) -> String {
        let mut writer = Writer::new();
        writer.open("", NAME, '(');
        writer.field("theme", self.theme.name());
        writer.string("time_scale", &self.time_scale);
        writer.field("span_style", SPAN_STYLES[usize::from(self.span_style == SpanStyle::Words)]);
        writer.number("text_scale", in_range(self.text_scale, TEXT_SCALE_RANGE, 1.0));
        writer.number("window_width_px", in_range(self.window_size_px.0, WINDOW_SIDE_RANGE, 1280.0));
        writer.number("window_height_px", in_range(self.window_size_px.1, WINDOW_SIDE_RANGE, 800.0));
        writer.field("is_maximised", &self.is_maximised.to_string());
        writer.field("shows_system", &self.panels.shows_system.to_string());
        writer.field("shows_moment", &self.panels.shows_moment.to_string());
        writer.number("system_width_px", in_range(self.panels.system_width_px, SIDE_WIDTH_RANGE, SIDE_WIDTH_PX));
        writer.number("moment_width_px", in_range(self.panels.moment_width_px, SIDE_WIDTH_RANGE, SIDE_WIDTH_PX));
        // A path that is no text can't be written down.
        if let Some(folder) = self.folder.as_deref().and_then(Path::to_str) {
            writer.string("folder", folder);
        }
        writer.open("recent_files", "", '[');
        for path in self.recent_files.iter().filter_map(|path| path.to_str()) {
            writer.field("", &quoted(path));
        }
        writer.close(']');
        for (key, value) in &self.unknown {
            writer.field(key, value);
        }
        writer.close(')');
        writer.finish()
    }
}

fn set(target: &mut f64, value: Option<f64>) {
    if let Some(value) = value {
        *target = value;
    }
}

fn truth(reading: &mut Reading<'_>, node: &Node, key: &'static str, target: &mut bool) {
    match node.value {
        Value::Truth(truth) => *target = truth,
        _ => reading.wrong_kind(node, &Subject::Whole, key, "true or false".to_owned()),
    }
}

fn number(reading: &mut Reading<'_>, node: &Node, key: &'static str, range: (f64, f64)) -> Option<f64> {
    let allowed = format!("{} to {}", range.0, range.1);
    let number = reading.number(node, &Subject::Whole, key, &allowed)?;
    if (range.0..=range.1).contains(&number) {
        return Some(number);
    }
    reading.wrong_kind(node, &Subject::Whole, key, allowed);
    None
}

/// A value that its own reader accepts: a window dragged to nothing is no reason for a warning at the next start.
fn in_range(value: f64, range: (f64, f64), usual: f64) -> f64 {
    if value.is_finite() { value.clamp(range.0, range.1) } else { usual }
}

#[cfg(test)]
mod tests {
    use super::*;

    fn path() -> (tempfile::TempDir, PathBuf) {
        let folder = tempfile::tempdir().expect("a folder");
        let path = folder.path().join("new").join(FILE);
        (folder, path)
    }

    fn read_text(text: &str) -> (Settings, String) {
        let (_folder, path) = path();
        fs::create_dir_all(path.parent().expect("a parent")).expect("made");
        fs::write(&path, text).expect("written");
        let (settings, warning) = Settings::read(&path);
        (settings, warning.map_or_else(String::new, |warning| warning.to_string()))
    }

    #[test]
    fn settings_come_back() {
        let (_folder, path) = path();
        assert_eq!(Settings::read(&path).0, Settings::default());
        let mut settings = Settings { theme: Theme::Dome, text_scale: 1.25, is_maximised: true, ..Settings::default() };
        settings.span_style = SpanStyle::Words;
        for index in 0..15 {
            settings.remember_file(Path::new(&format!("/work \"{index}\".ron")));
        }
        settings.remember_file(Path::new("/work \"7\".ron"));
        settings.write(&path).expect("written");
        let (read, warning) = Settings::read(&path);
        assert!(warning.is_none(), "{warning:?}");
        assert_eq!(read, settings);
        assert_eq!(read.recent_files().len(), MOST_RECENT_FILES);
        assert_eq!(read.recent_files()[0], Path::new("/work \"7\".ron"));
    }

    #[test]
    fn one_bad_value_costs_only_itself() {
        let (settings, warning) = read_text(
            "LongemberSettings(theme: Purple, text_scale: 99, window_width_px: \"wide\", is_maximised: true, time_scale: 3)",
        );
        assert!(settings.is_maximised);
        assert_eq!((settings.theme, settings.text_scale), (Theme::Dark, 1.0));
        let lines: Vec<_> = warning.lines().collect();
        assert_eq!(lines.len(), 4, "{warning}");
        assert_eq!(lines[0], "theme is Purple, allowed Dark, Light, Dome (settings.ron:1:26)");
        assert_eq!(lines[1], "text_scale is 99, allowed 0.75 to 3 (settings.ron:1:46)");
    }

    #[test]
    fn unknown_keys_are_written_back() {
        let (_folder, path) = path();
        let mut settings = read_text("(theme: Light, later: [Some(1), (a: \"b)\")],)").0;
        settings.write(&path).expect("written");
        let text = fs::read_to_string(&path).expect("read");
        assert!(text.contains("    later: [Some(1), (a: \"b)\")],\n"), "{text}");
        assert_eq!(Settings::read(&path).0, settings);
    }

    #[test]
    fn a_damaged_file_is_set_aside_before_it_is_replaced() {
        for text in ["(theme: Light, text_scale: ", "[1]", "\u{0}\u{1}", "(theme: Light, text_scale: 1.5 kg)"] {
            let (_folder, path) = path();
            fs::create_dir_all(path.parent().expect("a parent")).expect("made");
            fs::write(&path, text).expect("written");
            let (mut settings, warning) = Settings::read(&path);
            assert!(warning.is_some(), "{text}");
            settings.write(&path).expect("written");
            assert_eq!(fs::read_to_string(path.with_extension("damaged")).expect("kept"), text);
            assert!(Settings::read(&path).1.is_none());
        }
    }

    #[test]
    fn sizes_that_make_no_sense_are_never_written() {
        let (_folder, path) = path();
        let mut settings =
            Settings { text_scale: f64::NAN, window_size_px: (0.0, f64::INFINITY), ..Settings::default() };
        settings.write(&path).expect("written");
        let (read, warning) = Settings::read(&path);
        assert!(warning.is_none(), "{warning:?}");
        assert_eq!((read.text_scale, read.window_size_px), (1.0, (320.0, 800.0)));
    }
}
