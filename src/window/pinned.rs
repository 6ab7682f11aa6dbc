//! A system kept as a pale reference beside the one that is open.

use crate::system::History;
use std::sync::Arc;

/// The reference.
#[derive(Clone, Debug)]
pub struct Pinned {
    /// Title of its scenario.
    pub label: String,
    /// Its history.
    pub history: Arc<History>,
}
