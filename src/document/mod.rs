//! Documents: scenarios, their file form, undo, sessions, safe files, recovery after a crash, settings, kept lives.

pub mod built_in;
mod edited_field;
mod files;
mod history;
mod life_form;
mod life_store;
mod problem;
mod record_reading;
pub mod recovery;
pub mod ron_text;
mod scenario;
mod scenario_form;
mod session;
pub mod settings;
mod user_folders;

pub use edited_field::{EditedField, body_name};
pub use files::{
    LARGEST_FILE_BYTES, LoadError, WriteError, create_atomically, read_bytes, read_scenario, read_scenario_text,
    scenario_from_bytes, sound_text, write_atomically, write_scenario,
};
pub use history::{History, MOST_STEPS};
pub use life_store::LifeStore;
pub use problem::{Fault, Place, Problem, Subject};
pub use scenario::{LONGEST_ABOUT, LONGEST_NOTE, LONGEST_TITLE, Scenario};
pub use scenario_form::{CURRENT_VERSION, ScenarioText, parse_scenario, parse_scenario_text, scenario_text};
pub use session::{SaveError, Session};
pub use settings::{Settings, Theme};
pub use user_folders::{CACHE_VARIABLE, CONFIG_VARIABLE, STATE_VARIABLE, cache_folder, config_folder, state_folder};
