//! The whole window, driven without a display by pointer, keys and names.

#![expect(clippy::expect_used, reason = "a test that cannot go on has failed")]

mod climate;
mod commands;
mod cues;
mod curves;
mod dialogs;
mod driver;
mod editing;
mod exports;
mod files;
mod glyphs;
mod interior;
mod layout;
mod light_pages;
mod looks;
mod many_planets;
mod opening;
mod pages;
mod pictures;
mod planets;
mod playing;
mod statements;
mod time;
mod typed_moment;
mod undo;
mod unsaved;
