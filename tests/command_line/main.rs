//! The program as a shell sees it: results, messages, files and exit codes of the real binary.

#![expect(clippy::expect_used, clippy::panic, reason = "a test that cannot go on has failed")]

mod bad_input;
mod check;
mod cues;
mod demos;
mod events;
mod figures;
mod files;
mod frames;
mod help;
mod light;
mod moments;
mod program;
mod sheets;
mod states;
mod tables;
