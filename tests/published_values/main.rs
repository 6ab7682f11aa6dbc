//! Figures against papers, tables, measurements and independent programs; the source stands beside each.

#![expect(clippy::expect_used, clippy::panic, reason = "a test that cannot go on has failed")]

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
mod planet_light_and_temperature;
mod star_ends;
mod star_fit;
mod star_fit_data;
mod star_sun;
