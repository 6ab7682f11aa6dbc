//! Playing a life: the moment moves along the time axis at an even pace.

use crate::system::TimeAxis;

/// Seconds that a whole life may take.
pub(crate) const LIFE_SECONDS: [f64; 5] = [15.0, 30.0, 60.0, 120.0, 300.0];

/// A life being played.
#[derive(Clone, Copy, Debug, PartialEq)]
pub struct Playback {
    /// Seconds that the whole axis takes.
    pub life_seconds: f64,
    /// Whether it runs.
    pub is_running: bool,
}

impl Default for Playback {
    fn default() -> Self {
        Self { life_seconds: 60.0, is_running: false }
    }
}

impl Playback {
    /// The age after some seconds of playing; stops at the end of the axis.
    pub fn advance(&mut self, axis: &TimeAxis, from_yr: f64, elapsed_s: f64) -> f64 {
        let fraction = axis.fraction_at(from_yr) + elapsed_s / self.life_seconds;
        if fraction >= 1.0 {
            self.is_running = false;
        }
        axis.age_at(fraction)
    }
}
