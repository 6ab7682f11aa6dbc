//! Longember: a star's whole life and the fate of its planets, at any moment, with sources.

pub mod physics;
pub mod units;
