//! What must hold for every input: finite and in range, continuous, in order, the same after writing and reading.

#![expect(clippy::expect_used, reason = "a test that cannot go on has failed")]

mod document_scenario_file;
mod document_settings;
mod light_colour;
mod light_scrubbing;
mod light_sky;
mod planet_formulas;
mod planet_lives;
mod planet_systems;
mod planet_track;
mod red_dwarf_lives;
mod star_life;
mod star_whole_life;
