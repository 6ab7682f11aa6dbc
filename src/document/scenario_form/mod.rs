//! The file form of a scenario, version 1: `Longember(version: 1, title: …, star: (…), planets: [(…), …])`.
//!
//! Reading is strict and reports everything at once; writing is in a fixed order with every key written out,
//! so that a saved file shows each assumption and a change of one value is a change of one line.
//! `scenarios/README.md` is the reference for people.

mod keys;
mod places;
pub(super) mod read;
mod read_rows;
pub(super) mod write;

pub use keys::CURRENT_VERSION;
pub use read::{ScenarioText, parse_scenario, parse_scenario_text};
pub use write::scenario_text;
