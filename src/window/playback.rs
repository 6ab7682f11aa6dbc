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
    /// Places on the axis between which it goes round.
    pub loop_fractions: Option<[f64; 2]>,
}

impl Default for Playback {
    fn default() -> Self {
        Self { life_seconds: 60.0, is_running: false, loop_fractions: None }
    }
}

impl Playback {
    /// The age after some seconds of playing; stops at the end of the axis.
    pub fn advance(&mut self, axis: &TimeAxis, from_yr: f64, elapsed_s: f64) -> f64 {
        let fraction = axis.fraction_at(from_yr) + elapsed_s / self.life_seconds;
        if let Some([begin, end]) = self.loop_fractions
            && fraction >= end
        {
            return axis.age_at(begin);
        }
        if fraction >= 1.0 {
            self.is_running = false;
        }
        axis.age_at(fraction)
    }

    /// Lets the loop begin at a place; an end before it moves to the end of the axis.
    pub fn begin_loop(&mut self, fraction: f64) {
        let end = self.loop_fractions.map_or(1.0, |[_, end]| end);
        self.loop_fractions = Some([fraction, if end > fraction { end } else { 1.0 }]);
    }

    /// Lets the loop end at a place; a beginning after it moves to birth.
    pub fn end_loop(&mut self, fraction: f64) {
        let begin = self.loop_fractions.map_or(0.0, |[begin, _]| begin);
        self.loop_fractions = Some([if begin < fraction { begin } else { 0.0 }, fraction]);
    }
}
