//! Small controls used by several panels.

pub mod choice;
pub mod draft;
pub mod heading;
pub mod icon;
pub mod state_mark;
pub mod text_entry;
pub mod value_entry;
