//! Spans of time as words, both ways: `7.6 Gyr`, `2 trillion years`, `3e12 yr`.
//!
//! A year is the Julian year of 365.25 days throughout.

use super::number_text::{USUAL_DIGITS, number, parse_number};
use thiserror::Error;

/// Unit names with their length in years, largest first; the first of each row is how we write it.
const UNITS: &[(f64, &[&str])] = &[
    (1e12, &["Tyr", "trillion years", "trillion yr", "trillion year", "trillion"]),
    (1e9, &["Gyr", "Ga", "billion years", "billion yr", "billion year", "billion"]),
    (1e6, &["Myr", "Ma", "million years", "million yr", "million year", "million"]),
    (1e3, &["kyr", "ka", "thousand years", "thousand yr", "thousand year", "thousand"]),
    (1.0, &["yr", "a", "years", "year", "y"]),
    (1.0 / 365.25, &["d", "days", "day"]),
    (1.0 / 8766.0, &["h", "hours", "hour"]),
];

/// How spans are written for people.
#[derive(Clone, Copy, Debug, Default, PartialEq, Eq)]
pub enum SpanStyle {
    /// `7.600 Gyr`.
    #[default]
    Symbols,
    /// `7.600 billion years`.
    Words,
}

/// Why a text is no span of time.
#[derive(Clone, Debug, Error, PartialEq, Eq)]
#[error("\"{text}\" is not a span of time; write a number and a unit, such as 7.6 Gyr, 2 trillion years or 3e12 yr")]
pub struct NotASpan {
    /// The text as it was given.
    pub text: String,
}

/// Writes a span with `digits` significant digits in its natural unit.
///
/// # Example
/// ```
/// use longember::units::time_words::{span, SpanStyle};
/// assert_eq!(span(7.6e9, 2, SpanStyle::Symbols), "7.6 Gyr");
/// assert_eq!(span(2e12, 1, SpanStyle::Words), "2 trillion years");
/// ```
#[must_use]
pub fn span(time_yr: f64, digits: usize, style: SpanStyle) -> String {
    if time_yr == 0.0 {
        return if style == SpanStyle::Symbols { "0 yr" } else { "0 years" }.to_owned();
    }
    // Half a unit in the last digit may carry into the next unit: 999.99 Myr at 4 digits is 1.000 Gyr.
    let rounded_yr = format!("{:.*e}", digits.clamp(1, 17) - 1, time_yr).parse::<f64>().unwrap_or(time_yr);
    let (length_yr, names) = UNITS
        .iter()
        .find(|(length_yr, _)| rounded_yr.abs() >= *length_yr * 0.999_999_999)
        .unwrap_or(&UNITS[UNITS.len() - 1]);
    let unit = match style {
        SpanStyle::Symbols => names[0],
        SpanStyle::Words if *length_yr < 1.0 => names[1],
        SpanStyle::Words if *length_yr == 1.0 => "years",
        SpanStyle::Words => names.iter().find(|name| name.ends_with("years")).unwrap_or(&names[0]),
    };
    format!("{} {unit}", number(time_yr / length_yr, digits))
}

/// Most digits that [`spans_apart`] uses: beyond them two dates count as one.
const MOST_DIGITS_APART: usize = 10;

/// Writes spans in order, each with the fewest digits (at least four) that tell it from its neighbours.
///
/// # Example
/// ```
/// use longember::units::time_words::{SpanStyle, spans_apart};
/// assert_eq!(spans_apart(&[1e9, 1.477_1e9, 1.477_2e9], SpanStyle::Symbols), ["1.000 Gyr", "1.4771 Gyr", "1.4772 Gyr"]);
/// ```
#[must_use]
pub fn spans_apart(times_yr: &[f64], style: SpanStyle) -> Vec<String> {
    (0..times_yr.len())
        .map(|index| {
            let time_yr = times_yr[index];
            let neighbours = [index.checked_sub(1).and_then(|before| times_yr.get(before)), times_yr.get(index + 1)];
            let others = || neighbours.into_iter().flatten().filter(|other_yr| **other_yr != time_yr);
            let is_apart = |digits: &usize| {
                let text = span(time_yr, *digits, style);
                others().all(|other_yr| span(*other_yr, *digits, style) != text)
            };
            let digits = (USUAL_DIGITS..MOST_DIGITS_APART).find(is_apart).unwrap_or(MOST_DIGITS_APART);
            span(time_yr, digits, style)
        })
        .collect()
}

/// Writes a span in symbols with the usual four digits.
#[must_use]
pub fn short_span(time_yr: f64) -> String {
    span(time_yr, 4, SpanStyle::Symbols)
}

/// Reads a span of time in years. A bare number means years.
///
/// # Errors
/// [`NotASpan`] when the text is not a number with a known unit.
///
/// # Example
/// ```
/// use longember::units::time_words::parse_span;
/// assert_eq!(parse_span("3e12 yr"), Ok(3e12));
/// assert_eq!(parse_span("2 trillion years"), Ok(2e12));
/// assert_eq!(parse_span("4.57Gyr"), Ok(4.57e9));
/// ```
pub fn parse_span(text: &str) -> Result<f64, NotASpan> {
    let trimmed = text.trim();
    let unknown = || NotASpan { text: trimmed.chars().take(60).collect() };
    // Symbols come first and with their case, so that "Ma" and "ma" stay apart.
    for (length_yr, names) in UNITS {
        for name in *names {
            let number_part = if name.len() <= 3 { trimmed.strip_suffix(name) } else { strip_word(trimmed, name) };
            if let Some(value) = number_part.and_then(parse_number) {
                return Ok(value * length_yr)
                    .and_then(|span_yr: f64| if span_yr.is_finite() { Ok(span_yr) } else { Err(unknown()) });
            }
        }
    }
    parse_number(trimmed).ok_or_else(unknown)
}

/// Removes a unit word from the end, whatever its case and however many spaces it was typed with.
fn strip_word<'a>(text: &'a str, word: &str) -> Option<&'a str> {
    let mut rest = text;
    for part in word.rsplit(' ') {
        let trimmed = rest.trim_end();
        let cut = trimmed.len().checked_sub(part.len())?;
        if !trimmed.is_char_boundary(cut) || !trimmed[cut..].eq_ignore_ascii_case(part) {
            return None;
        }
        rest = &trimmed[..cut];
    }
    Some(rest)
}

#[cfg(test)]
mod tests {
    use super::*;

    #[test]
    fn every_unit_is_read_in_every_spelling() {
        for (length_yr, names) in UNITS {
            for name in *names {
                let read_yr = parse_span(&format!("2.5 {name}")).expect("unit is known");
                assert!((read_yr / (2.5 * length_yr) - 1.0).abs() < 1e-12, "{name}");
            }
        }
        assert_eq!(parse_span("12 000 years"), Ok(12_000.0));
        assert_eq!(parse_span("1.5 Billion  Years"), Ok(1.5e9));
        assert_eq!(parse_span("-3 Gyr"), Ok(-3e9));
    }

    #[test]
    fn nonsense_is_refused_with_an_example() {
        for text in ["", "soon", "7 parsecs", "Gyr", "1e400 yr", "4,5 Gyr"] {
            let error = parse_span(text).expect_err("nonsense");
            assert!(error.to_string().contains("7.6 Gyr"), "{error}");
        }
    }

    #[test]
    fn rounding_carries_into_the_next_unit() {
        assert_eq!(short_span(999.999e6), "1.000 Gyr");
        assert_eq!(short_span(4.57e9), "4.570 Gyr");
        assert_eq!(short_span(0.5), "182.6 d");
        assert_eq!(span(1.2e12, 2, SpanStyle::Words), "1.2 trillion years");
    }
}
