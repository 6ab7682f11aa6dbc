//! The fact sheet: one page on one moment or several, every number with a mark that leads to its source line.

mod chronicle;
mod content;
mod html;
mod markdown;
mod marks;
mod plain;

pub use content::{FactSheet, fact_sheet};
pub use html::sheet_html;
pub use markdown::sheet_markdown;
pub use plain::sheet_text;
