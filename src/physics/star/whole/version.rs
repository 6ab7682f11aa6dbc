//! Which structure calculation made a life.

/// Number of the structure calculation: raised with every change after which computed lives differ, so that lives kept
/// from before are not taken for new ones.
pub const STRUCTURE_VERSION: u32 = 2;
