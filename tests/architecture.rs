//! Holds the source to its shape: which layer may use which, units in names, sizes of files, words that stay out.
//!
//! A scanner of lines, not a compiler: it reads what is written between comments, and that is enough.

use std::fs;
use std::path::{Path, PathBuf};

/// Each layer with the layers it may use.
const LAYERS: [(&str, &[&str]); 9] = [
    ("units", &[]),
    ("physics", &["units"]),
    ("system", &["physics", "units"]),
    ("figure", &["system", "physics", "units"]),
    ("document", &["system", "physics", "units"]),
    ("drawing", &["figure", "system", "physics", "units"]),
    ("handover", &["document", "drawing", "figure", "system", "physics", "units"]),
    ("command_line", &["handover", "drawing", "document", "figure", "system", "physics", "units"]),
    ("window", &["handover", "drawing", "document", "figure", "system", "physics", "units"]),
];
/// Parts of physics that do not know each other.
const BRANCHES: [&str; 3] = ["light", "planet", "star"];
/// Names from outside, and where alone they may stand (beginnings of paths under `src`).
const CONFINED: [(&str, &[&str]); 17] = [
    ("eframe", &["window/"]),
    ("egui", &["window/"]),
    ("egui_winit", &["window/software/"]),
    ("winit", &["window/software/"]),
    ("softbuffer", &["window/software/"]),
    ("rfd", &["window/file_dialogs.rs"]),
    // Frames of a show are drawn on every core; no other command is worth it.
    (
        "std::thread",
        &["window/file_dialogs.rs", "window/jobs.rs", "window/software/canvas.rs", "command_line/frame_crew.rs"],
    ),
    ("std::fs", &["document/", "command_line/"]),
    ("std::env", &["document/", "main.rs"]),
    ("std::process", &["document/", "main.rs"]),
    // The writers of frames want something to seek in; theirs is memory.
    ("std::io", &["document/", "command_line/", "main.rs", "drawing/frames/encoding.rs"]),
    ("std::time", &["command_line/", "document/", "window/"]),
    ("tempfile", &["document/"]),
    ("directories", &["document/"]),
    ("clap", &["command_line/"]),
    ("serde_json", &["document/", "handover/", "window/"]),
    ("serde", &[]),
];
/// Ends of names that say the unit; the Earth, the Sun and the Earth's oceans are units too.
const UNIT_ENDS: &str = "_k _m _au _rsun _rearth _kg _msun _mearth _w _lsun _w_m2 _s _h _yr _myr _gyr _nm _um _dex _deg _rad _sr \
    _bar _pc _px _mag _lx _lm _cd_m2 _m_s2 _kg_m3 _g_cm3 _thz _de00 _earth _over_sun _oceans";
/// Last words of names that are numbers without a unit.
const PURE_ENDS: &str = "fraction share factor ratio efficiency albedo eccentricity emissivity index quality exponent";
/// Whole names without a unit.
const PURE_NAMES: &str = "x y z duv degree value difference lowest highest height ultraviolet visible infrared air_mass air_masses \
    molecular_mass optical_depth optical_depth_550 heavy_elements envelope_measure relative_brightness most_decades text_scale \
    quality_high quality_low love_number place visibility steps";
/// Where names of numbers are free: formulas in the letters of their paper, and places on a picture.
const FREE_NAMES: [&str; 4] = ["physics/star/analytic/", "figure/sky_picture.rs", "drawing/", "window/"];
/// Folders of the window whose `mod.rs` draws the frame around its parts.
const DRAWING_MODULES: [&str; 5] = [
    "window/dialogs/mod.rs",
    "window/life_strip/mod.rs",
    "window/moment_panel/mod.rs",
    "window/pages/mod.rs",
    "window/system_panel/mod.rs",
];
/// Most lines of a file before its tests.
const MOST_LINES: usize = 700;

/// Words that stay out: the project stands alone. Written in two pieces so that this file does not find itself.
const FOREIGN: [&str; 7] = [
    concat!("lec", "ture"),
    concat!("lec", "tures"),
    concat!("seed doc", "ument"),
    concat!("seed doc", "uments"),
    concat!("/work/sh", "ared"),
    concat!("../sh", "ared"),
    concat!("./iss", "ues"),
];
/// Capitals that name a piece of work elsewhere when the word below stands before them.
const PIECES: std::ops::RangeInclusive<char> = 'A'..='H';
const PIECE: &str = concat!("iss", "ue ");

#[test]
fn the_source_keeps_its_shape() {
    let root = Path::new(env!("CARGO_MANIFEST_DIR"));
    let mut complaints = Vec::new();
    let mut count = 0;
    for path in files(&root.join("src"), "rs") {
        let text = fs::read_to_string(&path).expect("readable");
        let name = path.strip_prefix(root.join("src")).expect("inside").to_string_lossy().replace('\\', "/");
        complaints.extend(shape(&name, &text));
        count += 1;
    }
    assert!(count > 100, "only {count} files were found");
    assert!(complaints.is_empty(), "\n{}\n", complaints.join("\n"));
}

#[test]
fn the_project_stands_alone() {
    let root = Path::new(env!("CARGO_MANIFEST_DIR"));
    let mut paths = ["README.md", "DEVELOPERS.md", "Cargo.toml", ".ci/run"].map(|name| root.join(name)).to_vec();
    for (folder, extension) in
        [("src", "rs"), ("tests", "rs"), ("tests", "sh"), ("scenarios", "ron"), ("scenarios", "md"), ("assets", "md")]
    {
        paths.extend(files(&root.join(folder), extension));
    }
    let texts = paths.iter().filter_map(|path| Some((path.display().to_string(), fs::read_to_string(path).ok()?)));
    let complaints: Vec<String> = texts.flat_map(|(name, text)| foreign_words(&name, &text)).collect();
    assert!(complaints.is_empty(), "\n{}\n", complaints.join("\n"));
}

#[test]
fn the_scanner_sees_what_it_looks_for() {
    let long = "fn a() {}\n".repeat(MOST_LINES + 1);
    for (name, text, word) in [
        ("units/a.rs", "use crate::system::History;", "may not use system"),
        ("document/a.rs", "use crate::figure::Chart;", "may not use figure"),
        ("figure/a.rs", "use crate::document::Scenario;", "may not use document"),
        ("handover/a.rs", "    let a = crate::window::run();", "may not use window"),
        ("figure/a.rs", "use super::super::document::Scenario;", "may not use document"),
        ("system/a.rs", "use crate::{physics::star::Track, units};", "one layer a line"),
        ("window/a.rs", "use longember::system::History;", "crate::"),
        ("physics/star/a.rs", "use crate::physics::light::Swatch;", "does not know light"),
        ("physics/planet/tides/a.rs", "use super::super::super::star::Track;", "does not know star"),
        ("physics/star/mod.rs", "use super::planet;", "does not know planet"),
        ("physics/light/a.rs", "use serde::Serialize;", "serde"),
        ("physics/light/a.rs", "let now = std::time::Instant::now();", "std::time"),
        ("system/a.rs", "fn paint(ui: &egui::Ui) {}", "egui"),
        ("window/menu_bar.rs", "use std::thread;", "std::thread"),
        ("window/menu_bar.rs", "rfd::FileDialog::new()", "rfd"),
        ("system/a.rs", "pub struct A {\n    pub mass_msun: f64,\n    pub radius: f64,\n}", "radius"),
        ("system/a.rs", "    pub star_mass: f64,", "star_mass"),
        ("system/a.rs", "    pub luminosity: Option<f64>,", "luminosity"),
        ("physics/planet/a.rs", "pub fn flux(\n    at_k: f64,\n    distance: f64,\n) -> f64 {", "distance"),
        ("physics/planet/mod.rs", "pub mod orbit;\nfn year() {}", "holds docs"),
        ("system/util.rs", "", "says nothing"),
        ("system/a.rs", "#[allow(dead_code)]\nfn a() {}", "expect"),
        ("system/a.rs", long.as_str(), "lines"),
    ] {
        let found = shape(name, text);
        assert!(found.len() == 1 && found[0].contains(word), "{name}: {text:.60}: {found:?}");
    }
    let tested = format!("fn a() {{}}\n#[cfg(test)]\nmod tests {{\n{long}}}");
    for (name, text) in [
        ("physics/star/a.rs", "use crate::units::constants::AU_M;\nuse super::super::star::b;"),
        ("physics/light/a.rs", "// std::fs and crate::window are only spoken of\nfn serde_like() {}"),
        ("physics/star/analytic/a.rs", "pub fn t_bgb(m: f64) -> f64 {"),
        ("physics/star/a.rs", "#[cfg(test)]\nmod tests {\n    use super::super::star::b;\n}"),
        ("system/a.rs", "pub fn at(time_yr: f64, bond_albedo: f64) -> f64 {"),
        ("system/mod.rs", "//! Docs.\n\nmod a;\n#[cfg(test)]\nmod b;\npub use a::{\n    B, C,\n};"),
        ("window/file_dialogs.rs", "use std::thread;\nrfd::FileDialog::new()"),
        ("system/a.rs", tested.as_str()),
    ] {
        assert_eq!(shape(name, text), Vec::<String>::new(), "{name}");
    }
    for word in FOREIGN {
        assert_eq!(foreign_words("a", &format!("one\nsee the {} for this", word.to_uppercase())).len(), 1, "{word}");
    }
    assert_eq!(foreign_words("a", &format!("// {PIECE}B brings it")).len(), 1);
    assert_eq!(foreign_words("a", "What an issue at hand: to issue a warning, structures, Issue At."), [""; 0]);
}

/// Everything a file of the source does against the rules; `name` is its path under `src`.
fn shape(name: &str, text: &str) -> Vec<String> {
    let code: Vec<&str> = text.lines().map(|line| line.split("//").next().unwrap_or_default()).collect();
    let first_test = code.iter().position(|line| line.starts_with("#[cfg(test)]") && !is_module_line(&code, line));
    let length = first_test.unwrap_or(code.len());
    let mut found = Vec::new();
    for (index, line) in code.iter().enumerate() {
        let mut complain = |what: String| found.push(format!("src/{name}:{}: {what}", index + 1));
        for used in paths_of_ours(&module_of(name), line, index > length) {
            arrow(name, &used).into_iter().for_each(&mut complain);
        }
        for (outside, places) in CONFINED {
            if has_name(line, outside) && !places.iter().any(|place| name.starts_with(place)) {
                complain(format!("{outside} stands only in {places:?}"));
            }
        }
        if line.contains("#[allow(") || line.contains("#![allow(") {
            complain("a lint is set aside with expect and a reason".to_owned());
        }
    }
    if length > MOST_LINES {
        found.push(format!("src/{name}: {length} lines before its tests, at most {MOST_LINES}"));
    }
    if !FREE_NAMES.iter().any(|free| name.starts_with(free)) {
        let bare = numbers_in_public(&code[..length]).into_iter().filter(|number| !says_its_unit(number));
        found.extend(bare.map(|number| format!("src/{name}: {number} is a bare f64 and its name says no unit")));
    }
    let stem = name.trim_end_matches(".rs").rsplit('/').next().unwrap_or_default();
    if ["util", "utils", "common", "misc", "helpers", "manager"].contains(&stem) {
        found.push(format!("src/{name}: the name says nothing"));
    }
    if stem == "mod" && !DRAWING_MODULES.contains(&name) && !holds_only_modules(&code[..length]) {
        found.push(format!("src/{name}: a mod.rs holds docs, modules and re-exports only"));
    }
    found
}

/// Whether a `#[cfg(test)]` belongs to the line `mod name;` below it, which has no body.
fn is_module_line(code: &[&str], line: &&str) -> bool {
    let next = code.iter().skip_while(|other| !std::ptr::eq(**other, *line)).nth(1);
    next.is_some_and(|next| next.trim_end().ends_with(';'))
}

/// The path of a file's module under the crate.
fn module_of(name: &str) -> Vec<String> {
    let mut parts: Vec<String> = name.trim_end_matches(".rs").split('/').map(str::to_owned).collect();
    if matches!(parts.last().map(String::as_str), Some("mod" | "lib" | "main")) {
        parts.pop();
    }
    parts
}

/// Absolute paths of our own that a line names through `crate::` or two and more `super::`.
fn paths_of_ours(module: &[String], line: &str, in_tests: bool) -> Vec<Vec<String>> {
    let words = |rest: &str| -> Vec<String> {
        let end = rest.find(|sign: char| !(sign.is_alphanumeric() || sign == '_' || sign == ':' || sign == '{'));
        rest[..end.unwrap_or(rest.len())].split("::").map(str::to_owned).collect()
    };
    let mut found = Vec::new();
    for (at, _) in line.match_indices("crate::") {
        found.push(words(&line[at + "crate::".len()..]));
    }
    let mut rest = line;
    while let Some(at) = rest.find("super::") {
        let tail = rest[at..].trim_start_matches("super::");
        let up = (rest.len() - at - tail.len()) / "super::".len();
        let depth = module.len() + usize::from(in_tests);
        let mut path = module[..depth.saturating_sub(up).min(module.len())].to_vec();
        path.extend(words(tail));
        found.push(path);
        rest = tail;
    }
    if has_name(line, "longember::") && !module.is_empty() {
        found.push(vec!["longember".to_owned()]);
    }
    found
}

/// Whether a file may name this path of ours.
fn arrow(name: &str, used: &[String]) -> Option<String> {
    let layer = name.split('/').next().unwrap_or_default();
    let first = used.first().map_or("", String::as_str);
    if first == "longember" {
        return Some("write crate:: inside the library".to_owned());
    }
    if first.starts_with('{') {
        return Some("name one layer a line, so that it is seen".to_owned());
    }
    let allowed = LAYERS.iter().find(|(known, _)| *known == layer).map(|(_, allowed)| *allowed)?;
    let is_layer = LAYERS.iter().any(|(known, _)| *known == first);
    if is_layer && first != layer && !allowed.contains(&first) {
        return Some(format!("{layer} may not use {first}"));
    }
    let branch = name.strip_prefix("physics/").and_then(|rest| rest.split('/').next())?;
    let other = used.get(1).filter(|_| first == "physics").map(String::as_str)?;
    (BRANCHES.contains(&other) && other != branch).then(|| format!("{branch} does not know {other}"))
}

/// Whether a line holds a name as a whole word.
fn has_name(line: &str, name: &str) -> bool {
    let joins = |sign: Option<char>| sign.is_some_and(|sign| sign.is_alphanumeric() || sign == '_');
    line.match_indices(name).any(|(at, _)| {
        !joins(line[..at].chars().next_back())
            && (name.ends_with(':') || !joins(line[at + name.len()..].chars().next()))
    })
}

/// Names of public fields and of parameters of public functions that are bare `f64`.
fn numbers_in_public(code: &[&str]) -> Vec<String> {
    let number_name = |piece: &str| {
        let (name, kind) = piece.split_once(':')?;
        let is_number = ["f64", "Option<f64>"].contains(&kind.trim().trim_end_matches(','));
        is_number.then(|| name.trim().trim_start_matches("pub ").to_owned())
    };
    let text = code.join("\n");
    let fields = code.iter().filter(|line| line.trim_start().starts_with("pub ") && !line.contains(" fn "));
    let mut found: Vec<String> = fields.filter_map(|line| number_name(line)).collect();
    for (at, _) in text.match_indices("pub fn ").chain(text.match_indices("pub const fn ")) {
        let head = text[at..].split(['{', ';']).next().unwrap_or_default();
        let inside = head.split_once('(').map_or("", |(_, inside)| inside);
        found.extend(inside.split([',', ')']).filter_map(number_name));
    }
    found
}

fn says_its_unit(name: &str) -> bool {
    UNIT_ENDS.split(' ').any(|end| name.ends_with(end))
        || PURE_NAMES.split(' ').any(|pure| name == pure)
        || PURE_ENDS.split(' ').any(|end| name.rsplit('_').next() == Some(end))
}

/// Whether every item is a `mod` line or a `use`.
fn holds_only_modules(code: &[&str]) -> bool {
    let text: Vec<&str> =
        code.iter().map(|line| line.trim()).filter(|line| !line.is_empty() && !line.starts_with('#')).collect();
    let joined = text.join(" ");
    let is_plain = |item: &str| {
        let after_pub = item.strip_prefix("pub").map_or(item, |rest| {
            let rest = rest.trim_start();
            rest.strip_prefix('(').and_then(|rest| rest.split_once(')')).map_or(rest, |(_, rest)| rest)
        });
        ["mod ", "use "].iter().any(|start| after_pub.trim_start().starts_with(start))
    };
    joined.split(';').map(str::trim).filter(|item| !item.is_empty()).all(is_plain)
}

/// Words of another place that a text holds as whole words.
fn foreign_words(name: &str, text: &str) -> Vec<String> {
    let mut found = Vec::new();
    for (index, line) in text.lines().enumerate() {
        let lower = line.to_lowercase();
        let pieces = PIECES.map(|capital| format!("{PIECE}{capital}"));
        let words = FOREIGN.iter().filter(|word| has_name(&lower, word)).map(|word| (*word).to_owned());
        for word in words.chain(pieces.filter(|piece| has_name(line, piece))) {
            found.push(format!("{name}:{}: holds \"{word}\"", index + 1));
        }
    }
    found
}

/// Every file under a folder whose name has this extension.
fn files(folder: &Path, extension: &str) -> Vec<PathBuf> {
    let mut found = Vec::new();
    for entry in fs::read_dir(folder).into_iter().flatten().flatten() {
        let path = entry.path();
        if path.is_dir() {
            found.extend(files(&path, extension));
        } else if path.extension().is_some_and(|own| own == extension) {
            found.push(path);
        }
    }
    found.sort();
    found
}
