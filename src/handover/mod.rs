//! What is handed to people and other programs: tables, states, events and sources as text.
//!
//! Everything here turns computed data into text and does nothing else: no file, no screen, no printing.
//! Numbers for machines are locale-free and read back to the same `f64`; what has no value is an empty
//! cell or a null with a remark that says why, never a NaN.

mod bodies;
mod cell;
mod checked_statements;
mod comma_separated;
mod cue_table;
mod dated_events;
mod enhanced_table;
mod fact_sheet;
mod figure_sentence;
mod figures;
mod history_table;
mod instant_json;
mod instant_text;
mod light_figures;
mod lines;
mod named_list;
mod remarks;
mod source_list;
mod table_ages;
mod table_columns;

pub use checked_statements::{JudgedStatement, checked_json, checked_text, model_text};
pub use cue_table::cue_table_csv;
pub use dated_events::{doubt, events_csv, events_json, events_text};
pub use fact_sheet::{FactSheet, fact_sheet, sheet_html, sheet_markdown, sheet_text};
pub use figure_sentence::FigureSentence;
pub use history_table::{TableRequest, table_csv, table_ecsv, table_json};
pub use instant_json::instant_json;
pub use instant_text::instant_text;
pub use named_list::named_list;
pub use remarks::{Remark, remarks};
pub use source_list::{sources_json, sources_text};
pub use table_ages::{POINTS_RANGE, TableAgesProblem, node_ages, table_ages};
pub use table_columns::{Column, ColumnsProblem, chosen_columns, table_columns};
