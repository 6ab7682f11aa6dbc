//! Time codes: hours, minutes, seconds and frames of a day.

use super::frame_rate::FrameRate;

/// The time code of a frame, `hh:mm:ss:ff`; drop-frame counts are marked by a semicolon before the frames.
///
/// At 29.97 frames per second the numbers 0 and 1 are left out at the start of every minute but each tenth, so that the
/// count keeps to the clock.
///
/// # Source
/// SMPTE ST 12-1, drop-frame compensated counting; after 24 hours it begins anew.
#[must_use]
pub fn time_code(frame: u64, rate: FrameRate) -> String {
    let nominal = u64::from(rate.nominal());
    let (counted, mark) = if rate.drops_frames() { (counted(frame, nominal), ';') } else { (frame, ':') };
    let seconds = counted / nominal;
    let (hours, minutes) = (seconds / 3600 % 24, seconds / 60 % 60);
    format!("{hours:02}:{minutes:02}:{:02}{mark}{:02}", seconds % 60, counted % nominal)
}

/// The count with the numbers that were left out.
fn counted(frame: u64, nominal: u64) -> u64 {
    let dropped = nominal / 15;
    let in_minute = 60 * nominal - dropped;
    let in_ten_minutes = 600 * nominal - 9 * dropped;
    let (tens, rest) = (frame / in_ten_minutes, frame % in_ten_minutes);
    // The first minute of ten is whole.
    let minutes = if rest < 60 * nominal { 0 } else { 1 + (rest - 60 * nominal) / in_minute };
    frame + dropped * (9 * tens + minutes)
}
