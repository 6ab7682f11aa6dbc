//! Show time as people at a desk write it: `m:ss.ff`, minutes, seconds, hundredths.

use super::number_text::{TRUE_MINUS, parse_number};
use thiserror::Error;

/// Why a text is no show time.
#[derive(Clone, Debug, Error, PartialEq, Eq)]
#[error("\"{text}\" is no show time; write minutes and seconds such as 1:23.50, or seconds such as 83.5")]
pub struct NotAShowTime {
    /// The text as it was given.
    pub text: String,
}

/// Writes a show time in seconds with hundredths: `1:23.50`, `1:02:03.00` from an hour on.
///
/// # Example
/// ```
/// use longember::units::show_time::show_time_text;
/// assert_eq!(show_time_text(83.5), "1:23.50");
/// ```
#[must_use]
pub fn show_time_text(show_time_s: f64) -> String {
    let sign = if show_time_s < 0.0 { TRUE_MINUS.to_string() } else { String::new() };
    let hundredths = (show_time_s.abs() * 100.0).round() as u64;
    let (hours, minutes) = (hundredths / 360_000, hundredths / 6000 % 60);
    let (seconds, rest) = (hundredths / 100 % 60, hundredths % 100);
    if hours > 0 {
        return format!("{sign}{hours}:{minutes:02}:{seconds:02}.{rest:02}");
    }
    format!("{sign}{minutes}:{seconds:02}.{rest:02}")
}

/// Reads `83.5`, `83.5 s`, `1:23.50` or `1:02:03` as seconds.
///
/// # Errors
/// [`NotAShowTime`] for anything else, and for minutes or seconds of sixty and more behind a colon.
pub fn parse_show_time(text: &str) -> Result<f64, NotAShowTime> {
    let trimmed = text.trim();
    let refused = || NotAShowTime { text: trimmed.chars().take(40).collect() };
    let plain = trimmed.strip_suffix('s').unwrap_or(trimmed).trim_end();
    let parts: Vec<&str> = plain.split(':').collect();
    if parts.len() > 3 {
        return Err(refused());
    }
    let mut seconds = 0.0;
    for (index, part) in parts.iter().enumerate() {
        let value = parse_number(part).filter(|value| *value >= 0.0).ok_or_else(refused)?;
        let is_last = index + 1 == parts.len();
        if (index > 0 && value >= 60.0) || (!is_last && value.fract() != 0.0) {
            return Err(refused());
        }
        seconds = 60.0 * seconds + value;
    }
    // Sixtieths and hundredths are no binary fractions: without their noise what is written reads back the same.
    Ok(format!("{seconds:.6}").parse().unwrap_or(seconds))
}

#[cfg(test)]
mod tests {
    use super::*;

    #[test]
    fn hundredths_come_back() {
        for hundredths in [0, 1, 99, 100, 5999, 6000, 8350, 359_999, 360_000, 8_639_900] {
            let seconds = f64::from(hundredths) / 100.0;
            assert_eq!(parse_show_time(&show_time_text(seconds)), Ok(seconds));
        }
        assert_eq!(show_time_text(59.999), "1:00.00");
        assert_eq!(parse_show_time(" 83.5 s "), Ok(83.5));
    }

    #[test]
    fn what_is_no_show_time_is_refused() {
        for text in ["", "1:60", "-3", "1:2:3:4", "1.5:00", "soon", "1::2", "nan"] {
            assert!(parse_show_time(text).is_err(), "{text}");
        }
    }
}
