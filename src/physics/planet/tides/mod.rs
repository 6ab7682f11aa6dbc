//! Tides between a star and its planet: what they do to the orbit and to the length of the day.
//!
//! Dissipation is the least known number in the field. Each effect is therefore offered in two published
//! forms, and everything here is good to an order of magnitude only.

pub mod equilibrium_tide;
pub mod giant_drag;
pub mod law;
pub mod locking;

pub use equilibrium_tide::{OrbitRates, TidalPair};
pub use law::{GiantDrag, TideForm, Tides};
pub use locking::{LockLevel, Spin};
