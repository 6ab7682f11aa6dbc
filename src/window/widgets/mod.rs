//! Small controls used by several panels.

pub(crate) mod choice;
pub(crate) mod draft;
pub(crate) mod figure_row;
pub(crate) mod heading;
pub(crate) mod icon;
pub(crate) mod state_mark;
pub(crate) mod text_entry;
pub(crate) mod value_entry;
pub(crate) mod verdict_mark;
