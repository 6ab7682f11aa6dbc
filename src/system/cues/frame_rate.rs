//! Frames per second as exact ratios.

use thiserror::Error;

/// Rates that are spoken of by a rounded number, with their exact ratio.
///
/// # Source
/// SMPTE ST 12-1: rates of 24, 30 and 60 divided by 1.001.
const ROUNDED: [(&str, u32, u32); 6] = [
    ("23.976", 24_000, 1001),
    ("23.98", 24_000, 1001),
    ("29.97", 30_000, 1001),
    ("47.952", 48_000, 1001),
    ("59.94", 60_000, 1001),
    ("119.88", 120_000, 1001),
];
/// Fastest rate, frames per second.
const FASTEST: u32 = 1000;

/// A rate of frames: `numerator / denominator` per second.
#[derive(Clone, Copy, Debug, PartialEq, Eq, Hash)]
pub struct FrameRate {
    numerator: u32,
    denominator: u32,
}

/// Why a text is no rate of frames.
#[derive(Clone, Debug, Error, PartialEq, Eq)]
#[error(
    "\"{text}\" is no frame rate, allowed whole numbers of frames per second from 1 to {FASTEST}, 23.976, 29.97, 59.94, or a ratio such as 30000/1001"
)]
pub struct NoFrameRate {
    /// The text as it was given.
    pub text: String,
}

impl FrameRate {
    /// Thirty frames per second.
    pub const THIRTY: Self = Self { numerator: 30, denominator: 1 };

    /// Reads `30`, `29.97` or `30000/1001`.
    ///
    /// # Errors
    /// [`NoFrameRate`] for anything else, and for rates below one or above a thousand per second.
    pub fn parse(text: &str) -> Result<Self, NoFrameRate> {
        let trimmed = text.trim();
        let refused = || NoFrameRate { text: trimmed.chars().take(40).collect() };
        let rounded = ROUNDED.iter().find(|(known, ..)| *known == trimmed).map(|(_, over, under)| (*over, *under));
        let ratio = || {
            let (over, under) = trimmed.split_once('/').unwrap_or((trimmed, "1"));
            Some((over.trim().parse().ok()?, under.trim().parse().ok()?))
        };
        let (numerator, denominator) = rounded.or_else(ratio).ok_or_else(refused)?;
        let is_allowed = denominator > 0
            && numerator >= denominator
            && u64::from(numerator) <= u64::from(FASTEST) * u64::from(denominator);
        if is_allowed { Ok(Self { numerator, denominator }) } else { Err(refused()) }
    }

    /// Show time at which a frame begins, s.
    #[must_use]
    pub fn show_time_s(self, frame: u64) -> f64 {
        // Exact as long as the product is, which is some ten thousand hours.
        frame as f64 * f64::from(self.denominator) / f64::from(self.numerator)
    }

    /// The frame that is shown at a show time, s.
    #[must_use]
    pub fn frame_at(self, show_time_s: f64) -> u64 {
        let exact = show_time_s * f64::from(self.numerator) / f64::from(self.denominator);
        // A show time that was worked out from a frame may fall short of it by rounding.
        (exact + 1e-6).floor().max(0.0) as u64
    }

    /// The whole number by which a time code counts: 30 for 29.97.
    #[must_use]
    pub fn nominal(self) -> u32 {
        (f64::from(self.numerator) / f64::from(self.denominator)).ceil() as u32
    }

    /// Whether numbers are dropped so that the time code keeps to the clock: 29.97 and its multiples.
    ///
    /// # Source
    /// SMPTE ST 12-1; slowed rates of 24 have no drop-frame count.
    #[must_use]
    pub fn drops_frames(self) -> bool {
        self.denominator == 1001 && self.numerator.is_multiple_of(30_000)
    }

    /// The rate for people: `30`, `30000/1001`.
    #[must_use]
    pub fn text(self) -> String {
        if self.denominator == 1 {
            self.numerator.to_string()
        } else {
            format!("{}/{}", self.numerator, self.denominator)
        }
    }
}

#[cfg(test)]
mod tests {
    use super::*;

    #[test]
    fn rates_are_read_exactly() {
        let rate = FrameRate::parse("29.97").expect("known");
        assert_eq!(rate, FrameRate::parse("30000/1001").expect("a ratio"));
        assert_eq!((rate.nominal(), rate.drops_frames()), (30, true));
        assert_eq!(FrameRate::parse(" 24 ").map(FrameRate::nominal), Ok(24));
        assert!(!FrameRate::parse("23.976").expect("known").drops_frames());
        for odd in ["", "0", "-30", "1/0", "2000", "29.9", "NaN", "1/2", "99999999999", "30fps"] {
            assert!(FrameRate::parse(odd).is_err(), "{odd}");
        }
    }

    #[test]
    fn a_frame_is_shown_from_its_own_time_on() {
        for text in ["24", "25", "29.97", "30", "59.94", "119.88"] {
            let rate = FrameRate::parse(text).expect("known");
            for frame in [0, 1, 2, 29, 30, 1799, 1800, 17_982, 107_892, 2_589_407] {
                assert_eq!(rate.frame_at(rate.show_time_s(frame)), frame, "{text}");
            }
        }
    }
}
