//! Longember: a star's whole life and the fate of its planets, at any moment, with sources.

pub mod command_line;
pub mod document;
pub mod drawing;
pub mod figure;
pub mod handover;
pub mod physics;
pub mod system;
pub mod units;
pub mod window;
