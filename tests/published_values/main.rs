//! Figures against papers, tables, measurements and independent programs; the source stands beside each.

#![expect(clippy::expect_used, clippy::unwrap_used, reason = "a test that cannot go on has failed")]

mod cues;
mod light_blackbody;
mod light_blackbody_rows;
mod light_colour;
mod light_dwarf_rows;
mod light_photometry;
mod light_sky;
mod light_sky_rows;
mod planet_bodies;
mod planet_check;
mod planet_climate;
mod planet_fates;
mod planet_light_and_temperature;
mod red_dwarf_inside;
mod red_dwarf_lives;
mod red_dwarf_table;
mod red_dwarf_today;
mod red_dwarf_trade;
mod red_dwarf_trillions;
mod star_ends;
mod star_fit;
mod star_fit_data;
mod star_sun;
