//! Where each value of a scenario stands in its text.

use crate::document::problem::Subject;
use crate::system::specification::Body;
use std::collections::HashMap;

/// What a value belongs to.
#[derive(Clone, Copy, Debug, PartialEq, Eq, Hash)]
pub(super) enum Owner {
    /// The scenario as a whole.
    Whole,
    /// The star or a planet.
    Body(Body),
    /// A statement, by its index.
    Statement(usize),
    /// A cue, by its index.
    Cue(usize),
}

impl From<&Subject> for Owner {
    fn from(subject: &Subject) -> Self {
        match subject {
            Subject::Whole => Self::Whole,
            Subject::Star { .. } => Self::Body(Body::Star),
            Subject::Planet { index, .. } => Self::Body(Body::Planet(*index)),
            Subject::Statement { index } => Self::Statement(*index),
            Subject::Cue { index } => Self::Cue(*index),
        }
    }
}

/// Where each value stands that was read.
pub(super) type Places = HashMap<(Owner, &'static str), usize>;
