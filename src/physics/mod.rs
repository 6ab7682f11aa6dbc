//! Pure functions and solvers: stars, light, planets.
//!
//! Nothing here knows a file, a clock, a screen, a thread or a serialisation format.

pub mod light;
pub mod planet;
pub mod star;
