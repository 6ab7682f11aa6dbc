//! What can be wrong with a text before it says anything.

use thiserror::Error;

/// A fault in the form of a text.
#[derive(Clone, Debug, Error, PartialEq, Eq)]
pub enum SyntaxFault {
    /// Bytes that are no text.
    #[error("the bytes here are no UTF-8 text; save the file as UTF-8")]
    NotUtf8,
    /// A file larger than any scenario.
    #[error("the file has {bytes} bytes, allowed at most {most}; this is hardly a file of Longember")]
    TooLarge {
        /// Its size.
        bytes: u64,
        /// The largest permitted size.
        most: u64,
    },
    /// Nothing but space and comments.
    #[error("the file is empty, allowed one {wanted}(…)")]
    Empty {
        /// The name of the outermost struct.
        wanted: &'static str,
    },
    /// Something else than the form asks for.
    #[error("found {found}, allowed {wanted}{}", remedy_clause(remedy.as_ref()))]
    Unexpected {
        /// What stands there.
        found: String,
        /// What may stand there.
        wanted: &'static str,
        /// How to mend it, where that can be guessed.
        remedy: Option<String>,
    },
    /// A bracket that is never closed.
    #[error("\"{bracket}\" is never closed; add \"{closing}\"")]
    UnclosedBracket {
        /// The opening bracket.
        bracket: char,
        /// What would close it.
        closing: char,
    },
    /// A string that is never closed.
    #[error("the text that begins here is never closed; add \"")]
    UnclosedText,
    /// A comment that is never closed.
    #[error("the comment that begins here is never closed; add */")]
    UnclosedComment,
    /// An escape that means nothing.
    #[error(
        "the escape {escape} means nothing, allowed \\\" \\' \\\\ \\n \\r \\t \\0 \\xHH \\u{{HHHH}} and \\ at the end of a line"
    )]
    BadEscape {
        /// The escape as written.
        escape: String,
    },
    /// A word that starts like a number and is none.
    #[error("{text} is not a number, allowed decimal numbers such as 0.3, -20, 1_000 or 2.5e9")]
    BadNumber {
        /// The word as written.
        text: String,
    },
    /// A number beyond the largest that can be held.
    #[error("{text} is too large, allowed up to 1.8e308")]
    NumberTooLarge {
        /// The number as written.
        text: String,
    },
    /// Brackets in brackets in brackets.
    #[error("brackets are nested more than {most} deep, allowed {most}")]
    TooDeep {
        /// The deepest permitted nesting.
        most: usize,
    },
    /// So many faults that listing on helps nobody.
    #[error("there are more than {most} problems; those after this place are not listed")]
    TooMany {
        /// How many are listed.
        most: usize,
    },
}

fn remedy_clause(remedy: Option<&String>) -> String {
    remedy.map_or_else(String::new, |remedy| format!("; {remedy}"))
}

/// Collected faults with the byte offsets they stand at, up to a number that a person could still read.
#[derive(Debug, Default)]
pub(super) struct Faults {
    pub(super) found: Vec<(usize, SyntaxFault)>,
    pub(super) full: bool,
}

impl Faults {
    /// More problems than this are not listed.
    pub(super) const MOST: usize = 100;

    pub(super) fn push(&mut self, offset: usize, fault: SyntaxFault) {
        if self.full {
            return;
        }
        if self.found.len() == Self::MOST {
            self.full = true;
            self.found.push((offset, SyntaxFault::TooMany { most: Self::MOST }));
        } else {
            self.found.push((offset, fault));
        }
    }
}
