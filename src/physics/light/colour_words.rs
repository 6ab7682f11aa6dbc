//! The colour of a light in plain words, so that colour alone never carries the meaning.

use super::rgb::{RgbSpace, largest_channel_one, to_f32};
use super::{chromaticity::Tristimulus, gamut::JUST_NOTICEABLE};
use color::{ColorSpace, Oklab};
use std::fmt;

/// A word and the temperature up to which it describes a blackbody, K.
///
/// The cuts are where Oklab chroma over lightness and hue of the locus cross those of [`colour_name`].
const BLACKBODY_WORDS: [(f64, &str); 11] = [
    (798.0, "no visible glow"),
    (933.0, "deep red"),
    (1512.0, "deep reddish orange"),
    (2364.0, "orange"),
    (3413.0, "light orange"),
    (4570.0, "pale orange"),
    (5726.0, "cream white"),
    (7133.0, "white"),
    (9941.0, "bluish white"),
    (24_840.0, "pale blue"),
    (f64::INFINITY, "light blue"),
];

/// How far a temperature may pass a cut before the word follows, so that it does not flicker.
const STEADINESS: f64 = 0.002;

/// The colour of a blackbody in words.
///
/// # Source
/// Own cut points on the Planckian locus in Oklab (Ottosson 2020), in units of the just noticeable difference
/// 0.02 of CSS Color 4; glow threshold Draper (1847). Plain words, no standard.
///
/// # Valid for
/// Any number; what is no temperature has no visible glow.
///
/// # Example
/// ```
/// use longember::physics::light::colour_words;
/// assert_eq!(colour_words(5772.0), "white");
/// assert_eq!(colour_words(2800.0), "light orange");
/// ```
#[must_use]
pub fn colour_words(effective_temperature_k: f64) -> &'static str {
    BLACKBODY_WORDS[word_index(effective_temperature_k)].1
}

/// [`colour_words`] that keeps the word shown before until the temperature is 0.2 % past a cut.
///
/// A word that is none of ours counts as none shown before.
#[must_use]
pub fn steady_colour_words(shown_before: Option<&str>, effective_temperature_k: f64) -> &'static str {
    let plain = word_index(effective_temperature_k);
    let before = shown_before.and_then(|shown| BLACKBODY_WORDS.iter().position(|(_, word)| *word == shown));
    match before {
        // No visible glow is a threshold of seeing, not a shade: it holds to the kelvin.
        Some(before) if before > 0 && plain > 0 => {
            let low_k = BLACKBODY_WORDS[before - 1].0 * (1.0 - STEADINESS);
            let high_k = BLACKBODY_WORDS[before].0 * (1.0 + STEADINESS);
            let kept = (low_k..high_k).contains(&effective_temperature_k);
            BLACKBODY_WORDS[if kept { before } else { plain }].1
        }
        _ => BLACKBODY_WORDS[plain].1,
    }
}

fn word_index(effective_temperature_k: f64) -> usize {
    if effective_temperature_k.is_nan() {
        return 0;
    }
    let cuts = &BLACKBODY_WORDS[..BLACKBODY_WORDS.len() - 1];
    cuts.iter().position(|(below_k, _)| effective_temperature_k < *below_k).unwrap_or(cuts.len())
}

/// A light's colour in words: how strong, and which hue.
#[derive(Clone, Copy, Debug, PartialEq, Eq)]
pub struct ColourName {
    /// How much colour there is.
    pub strength: Strength,
    /// The hue, which means nothing where the strength is [`Strength::White`].
    pub hue: &'static str,
}

/// How much colour a light has, by Oklab chroma over lightness.
#[derive(Clone, Copy, Debug, PartialEq, Eq, PartialOrd, Ord)]
pub enum Strength {
    /// Less than one just noticeable step from white.
    White,
    /// Up to 0.06.
    Tinted,
    /// Up to 0.12.
    Pale,
    /// Up to 0.20.
    Light,
    /// Up to 0.30.
    Plain,
    /// Beyond 0.30.
    Deep,
}

impl fmt::Display for ColourName {
    fn fmt(&self, formatter: &mut fmt::Formatter<'_>) -> fmt::Result {
        let hue = self.hue;
        match self.strength {
            Strength::White => formatter.write_str("white"),
            Strength::Tinted => write!(formatter, "{} white", tint(hue)),
            Strength::Pale => write!(formatter, "pale {hue}"),
            Strength::Light => write!(formatter, "light {hue}"),
            Strength::Plain => formatter.write_str(hue),
            Strength::Deep => write!(formatter, "deep {hue}"),
        }
    }
}

/// The name of any light's colour against a D65 white, or `None` where there is no light.
///
/// Chroma over lightness in Oklab does not change with exposure, so brightness plays no part.
///
/// # Source
/// Oklab: Ottosson (2020), through the crate `color`; own cut points in steps of the just noticeable difference.
#[must_use]
pub fn colour_name(light: Tristimulus) -> Option<ColourName> {
    let (ratio, hue_deg) = ratio_and_hue(light)?;
    Some(named(ratio, hue_deg))
}

/// [`colour_name`] that keeps the name shown before as long as a change of 1 % in chroma and of 1° in hue could bring it
/// back, so that it does not flicker at a cut.
#[must_use]
pub fn steady_colour_name(shown_before: Option<ColourName>, light: Tristimulus) -> Option<ColourName> {
    let (ratio, hue_deg) = ratio_and_hue(light)?;
    let near = |before: &ColourName| {
        [0.99, 1.0, 1.01].into_iter().any(|factor| {
            [-1.0, 0.0, 1.0].into_iter().any(|step_deg| named(ratio * factor, hue_deg + step_deg) == *before)
        })
    };
    shown_before.filter(near).or_else(|| Some(named(ratio, hue_deg)))
}

/// Chroma over lightness, and hue in degrees, in Oklab.
fn ratio_and_hue(light: Tristimulus) -> Option<(f64, f64)> {
    let linear = largest_channel_one(RgbSpace::Rec709.linear(light))?;
    let [l, a, b] = Oklab::from_linear_srgb(linear.map(to_f32)).map(f64::from);
    (l > 0.0).then(|| (a.hypot(b) / l, b.atan2(a).to_degrees()))
}

fn named(ratio: f64, hue_deg: f64) -> ColourName {
    let strength = match ratio {
        _ if ratio < f64::from(JUST_NOTICEABLE) => Strength::White,
        _ if ratio < 0.06 => Strength::Tinted,
        _ if ratio < 0.12 => Strength::Pale,
        _ if ratio < 0.20 => Strength::Light,
        _ if ratio < 0.30 => Strength::Plain,
        _ => Strength::Deep,
    };
    ColourName { strength, hue: hue_word(hue_deg.rem_euclid(360.0)) }
}

fn hue_word(hue_deg: f64) -> &'static str {
    const HUES: [(f64, &str); 11] = [
        (32.0, "red"),
        (47.0, "reddish orange"),
        (72.0, "orange"),
        (90.0, "yellowish orange"),
        (110.0, "yellow"),
        (150.0, "yellow-green"),
        (190.0, "green"),
        (225.0, "greenish blue"),
        (285.0, "blue"),
        (315.0, "violet"),
        (345.0, "purple"),
    ];
    HUES.iter().find(|(below_deg, _)| hue_deg < *below_deg).map_or("red", |(_, word)| word)
}

/// The hue as an adjective of white.
fn tint(hue: &'static str) -> &'static str {
    match hue {
        "red" => "reddish",
        "reddish orange" | "orange" => "cream",
        "yellowish orange" | "yellow" => "yellowish",
        "yellow-green" | "green" => "greenish",
        "greenish blue" | "blue" | "violet" => "bluish",
        _ => "purplish",
    }
}

#[cfg(test)]
mod tests {
    use super::super::observer::blackbody_tristimulus;
    use super::*;

    #[test]
    fn the_table_of_temperatures_follows_the_rule_for_any_light() {
        for step in 0..600 {
            let temperature_k = 800.0 * 1.012_f64.powi(step);
            let near_a_cut = BLACKBODY_WORDS.iter().any(|(cut_k, _)| (temperature_k / cut_k - 1.0).abs() < 0.004);
            if near_a_cut || (1503.0..1512.0).contains(&temperature_k) {
                continue;
            }
            let light = blackbody_tristimulus(temperature_k).expect("in range");
            let named = colour_name(light).expect("light").to_string();
            assert_eq!(named, colour_words(temperature_k), "{temperature_k} K");
        }
    }

    #[test]
    fn what_is_no_temperature_does_not_glow() {
        for odd in [f64::NAN, -3.0, f64::NEG_INFINITY, 797.0] {
            assert_eq!(colour_words(odd), "no visible glow");
        }
        assert_eq!(colour_words(f64::INFINITY), "light blue");
        assert_eq!(colour_name(Tristimulus::default()), None);
    }

    #[test]
    fn a_name_once_shown_outlasts_a_small_step_over_the_cut() {
        let at = |temperature_k| blackbody_tristimulus(temperature_k).expect("in range");
        let name = |temperature_k| colour_name(at(temperature_k)).expect("light");
        let shown = name(4575.0);
        assert_ne!(shown, name(4565.0));
        assert_eq!(steady_colour_name(Some(shown), at(4565.0)), Some(shown));
        assert_eq!(steady_colour_name(Some(shown), at(4400.0)), Some(name(4400.0)));
        assert_eq!(steady_colour_name(None, at(4565.0)), Some(name(4565.0)));
        assert_eq!(steady_colour_name(Some(shown), Tristimulus::default()), None);
    }

    #[test]
    fn a_word_once_shown_outlasts_a_small_step_over_the_cut() {
        assert_eq!(steady_colour_words(Some("white"), 5720.0), "white");
        assert_eq!(steady_colour_words(Some("cream white"), 5731.0), "cream white");
        assert_eq!(steady_colour_words(Some("white"), 5600.0), "cream white");
        assert_eq!(steady_colour_words(None, 5731.0), "white");
        assert_eq!(steady_colour_words(Some("deep red"), 797.5), "no visible glow");
    }
}
