//! What can be wrong with a document: what, value, allowed, remedy, place, in that order.

use super::ron_text::SyntaxFault;
use crate::system::MomentProblem;
use crate::system::specification;
use crate::system::statements::LineProblem;
use std::fmt;
use thiserror::Error;

/// One thing that is wrong, with the body it is about and the place in the file.
///
/// # Example
/// `planet 2 "Ember": bond_albedo is 1.4, allowed 0 to 1 (scenario.ron:14:22)`
#[derive(Clone, Debug, Error, PartialEq)]
#[error("{subject}{fault}{}", place_clause(place.as_ref()))]
pub struct Problem {
    /// The body it is about.
    pub subject: Subject,
    /// The key of the field it is about, where it is about one field.
    pub key: Option<&'static str>,
    /// What is wrong.
    pub fault: Fault,
    /// Where it stands; none for a document that is no file yet.
    pub place: Option<Place>,
}

/// What a problem is about.
#[derive(Clone, Debug, PartialEq, Eq, Hash)]
pub enum Subject {
    /// The file or the scenario as a whole.
    Whole,
    /// The star.
    Star {
        /// Its name, empty if it has none.
        name: String,
    },
    /// A planet.
    Planet {
        /// Its index, counted from 0.
        index: usize,
        /// Its name, empty if it has none.
        name: String,
    },
    /// A statement.
    Statement {
        /// Its index, counted from 0.
        index: usize,
    },
    /// A cue of the show.
    Cue {
        /// Its index, counted from 0.
        index: usize,
    },
}

/// A place in a file, counted from 1 as editors do.
#[derive(Clone, Debug, PartialEq, Eq, Hash)]
pub struct Place {
    /// The name of the file as it is shown.
    pub file: String,
    /// The line.
    pub line: usize,
    /// The column, in characters.
    pub column: usize,
}

/// What can be wrong.
#[derive(Clone, Debug, Error, PartialEq)]
pub enum Fault {
    /// The form of the text.
    #[error(transparent)]
    Syntax(#[from] SyntaxFault),
    /// The line of a statement.
    #[error(transparent)]
    Line(#[from] LineProblem),
    /// The moment of a cue.
    #[error(transparent)]
    Moment(#[from] MomentProblem),
    /// A number outside its range.
    #[error("{key} is {value}, allowed {allowed}")]
    OutOfRange {
        /// The key.
        key: &'static str,
        /// The value as given.
        value: f64,
        /// The permitted range in words.
        allowed: String,
    },
    /// A list that is too long.
    #[error("{key} holds {count} rows, allowed at most {most}")]
    TooMany {
        /// The key of the list.
        key: &'static str,
        /// How many there are.
        count: usize,
        /// How many there may be.
        most: usize,
    },
    /// An input of the system.
    #[error(transparent)]
    Input(#[from] specification::Fault),
    /// A key that means nothing here.
    #[error("{key} is no key here, allowed {}{}", allowed.join(", "), meant_clause(*meant))]
    UnknownKey {
        /// The key as written.
        key: String,
        /// The keys that are understood here.
        allowed: &'static [&'static str],
        /// The key that was probably meant.
        meant: Option<&'static str>,
    },
    /// A key that has to be there.
    #[error("{key} is missing, allowed {allowed}; add it")]
    MissingKey {
        /// The key.
        key: &'static str,
        /// What may stand there.
        allowed: String,
    },
    /// A key given twice.
    #[error("{key} is given a second time, allowed once; remove this one or the one in line {first_line}")]
    KeyTwice {
        /// The key.
        key: String,
        /// The line of the first one.
        first_line: usize,
    },
    /// A value of another kind than the key asks for.
    #[error("{key} is {found}, allowed {allowed}")]
    WrongKind {
        /// The key.
        key: &'static str,
        /// The value in words.
        found: String,
        /// What may stand there.
        allowed: String,
    },
    /// A name that is none of the choices.
    #[error("{key} is {found}, allowed {}{}", allowed.join(", "), meant_clause(*meant))]
    UnknownChoice {
        /// The key.
        key: &'static str,
        /// The name as written.
        found: String,
        /// The choices.
        allowed: &'static [&'static str],
        /// The choice that was probably meant.
        meant: Option<&'static str>,
    },
    /// A struct under another name than its own.
    #[error("the group is named {found}, allowed {allowed} or no name")]
    WrongName {
        /// The name as written.
        found: String,
        /// Its own name.
        allowed: &'static str,
    },
    /// A file of a version that comes after ours.
    #[error(
        "version is {found}, allowed up to {known}: the file was written by a newer Longember; open it with that one"
    )]
    NewerVersion {
        /// The version in the file.
        found: String,
        /// The newest version known here.
        known: u32,
    },
    /// A version that never was.
    #[error("version is {found}, allowed {known}")]
    BadVersion {
        /// The version in the file.
        found: String,
        /// The newest version known here.
        known: u32,
    },
    /// A text with nothing in it.
    #[error("{key} is empty, allowed 1 to {most} characters")]
    EmptyText {
        /// The key.
        key: &'static str,
        /// The longest permitted text.
        most: usize,
    },
    /// A text that is too long or holds control characters.
    #[error("{key} is {length} characters long or holds control characters, allowed up to {most} printable characters")]
    BadText {
        /// The key.
        key: &'static str,
        /// Its length in characters.
        length: usize,
        /// The longest permitted text.
        most: usize,
    },
}

impl fmt::Display for Subject {
    fn fmt(&self, formatter: &mut fmt::Formatter<'_>) -> fmt::Result {
        let (kind, name) = match self {
            Self::Whole => return Ok(()),
            Self::Star { name } => ("star".to_owned(), name),
            Self::Planet { index, name } => (format!("planet {}", index + 1), name),
            Self::Statement { index } => return write!(formatter, "statement {}: ", index + 1),
            Self::Cue { index } => return write!(formatter, "cue {}: ", index + 1),
        };
        if name.is_empty() {
            write!(formatter, "{kind}: ")
        } else {
            write!(formatter, "{kind} \"{}\": ", name.escape_debug())
        }
    }
}

impl fmt::Display for Place {
    fn fmt(&self, formatter: &mut fmt::Formatter<'_>) -> fmt::Result {
        write!(formatter, "{}:{}:{}", self.file, self.line, self.column)
    }
}

fn place_clause(place: Option<&Place>) -> String {
    place.map_or_else(String::new, |place| format!(" ({place})"))
}

fn meant_clause(meant: Option<&'static str>) -> String {
    meant.map_or_else(String::new, |meant| format!("; did you mean {meant}?"))
}
