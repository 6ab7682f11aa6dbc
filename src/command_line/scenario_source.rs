//! Where a scenario comes from.

use super::streams::Streams;
use super::trouble::Trouble;
use crate::document::built_in::BuiltIn;
use crate::document::{LARGEST_FILE_BYTES, Scenario, built_in, read_scenario, scenario_from_bytes};
use std::ffi::OsString;
use std::io::Read;
use std::path::PathBuf;

/// What starts the name of a built-in scenario.
const DEMO_PREFIX: &str = "demo:";

/// A scenario as the command line names it.
#[derive(Clone, Debug, PartialEq, Eq)]
pub enum ScenarioSource {
    /// A file.
    File(PathBuf),
    /// The built-in scenario of this name.
    Demo(String),
    /// Standard input.
    StandardInput,
}

impl ScenarioSource {
    /// Reads a command-line word; every word names some source.
    pub(super) fn parse(word: OsString) -> Self {
        match word.to_str() {
            Some("-") => Self::StandardInput,
            Some(text) => match text.strip_prefix(DEMO_PREFIX) {
                Some(name) => Self::Demo(name.to_owned()),
                None => Self::File(PathBuf::from(word)),
            },
            None => Self::File(PathBuf::from(word)),
        }
    }

    /// Reads the scenario.
    pub(super) fn load(&self, streams: &mut Streams<'_>) -> Result<Scenario, Trouble> {
        match self {
            Self::File(path) => Ok(read_scenario(path)?),
            Self::Demo(name) => find_demo(name)?.scenario().map_err(|problems| Trouble::BuiltIn { problems }),
            Self::StandardInput => {
                let mut bytes = Vec::new();
                // One byte more than allowed is enough to be told that it is too much.
                streams.input.take(LARGEST_FILE_BYTES + 1).read_to_end(&mut bytes).map_err(Trouble::StandardInput)?;
                Ok(scenario_from_bytes(&bytes, "standard input")?.scenario)
            }
        }
    }
}

/// The built-in scenario of a name.
pub(super) fn find_demo(name: &str) -> Result<&'static BuiltIn, Trouble> {
    built_in::find(name).ok_or_else(|| Trouble::NoSuchDemo { name: name.to_owned() })
}

#[cfg(test)]
mod tests {
    use super::*;

    #[test]
    fn a_word_names_a_file_a_demo_or_standard_input() {
        let parse = |word: &str| ScenarioSource::parse(OsString::from(word));
        assert_eq!(parse("-"), ScenarioSource::StandardInput);
        assert_eq!(parse("demo:one"), ScenarioSource::Demo("one".to_owned()));
        assert_eq!(parse("./demo:one"), ScenarioSource::File(PathBuf::from("./demo:one")));
        assert_eq!(parse("a b.ron"), ScenarioSource::File(PathBuf::from("a b.ron")));
    }

    #[cfg(unix)]
    #[test]
    fn a_path_need_not_be_unicode() {
        use std::os::unix::ffi::OsStringExt;
        let word = OsString::from_vec(b"caf\xe9.ron".to_vec());
        assert_eq!(ScenarioSource::parse(word.clone()), ScenarioSource::File(PathBuf::from(word)));
    }
}
