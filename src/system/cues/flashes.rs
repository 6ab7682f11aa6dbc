//! Flashes that can bring on seizures in people with photosensitive epilepsy.
//!
//! # Source
//! W3C Web Content Accessibility Guidelines 2.2, success criterion 2.3.1 and its definition of general flash and red
//! flash thresholds; the definition of a saturated red transition after ISO 9241-391.

/// Least change of relative luminance that counts, of the brightest white as 1.
pub const LEAST_CHANGE: f64 = 0.10;
/// A change counts only where its darker end is below this.
pub const DARKER_BELOW: f64 = 0.80;
/// Most flashes in any one second.
pub const MOST_FLASHES: usize = 3;
/// Share of red in linear light from which on it is saturated.
pub const RED_SHARE: f64 = 0.8;
/// Distance in the CIE 1976 diagram that a transition of red has to cover to count.
pub const RED_DISTANCE: f64 = 0.2;
/// The stretch that flashes are counted in, s.
const WINDOW_S: f64 = 1.0;
/// What the times of frames may be off by, s.
const ROUNDING_S: f64 = 1e-6;

/// A picture at one show time: a single colour that fills it.
#[derive(Clone, Copy, Debug, PartialEq)]
pub struct Light {
    /// Show time, s.
    pub show_time_s: f64,
    /// Linear light of red, green and blue primaries of sRGB, 0 to 1.
    pub rgb: [f64; 3],
}

/// What kind of flash.
#[derive(Clone, Copy, Debug, PartialEq, Eq, Hash)]
pub enum FlashKind {
    /// Of brightness.
    General,
    /// To or from a saturated red.
    Red,
}

impl FlashKind {
    /// The kind in words for people.
    #[must_use]
    pub fn name(self) -> &'static str {
        match self {
            Self::General => "flashes",
            Self::Red => "red flashes",
        }
    }
}

/// A stretch of a show in which there are more flashes than anybody should be shown.
#[derive(Clone, Copy, Debug, PartialEq)]
pub struct Flashing {
    /// What kind.
    pub kind: FlashKind,
    /// Its start, s.
    pub from_s: f64,
    /// Its end, s.
    pub to_s: f64,
    /// Most opposing changes in one second of it; two make a flash.
    pub changes: usize,
}

impl Light {
    /// Relative luminance, 0 to 1.
    ///
    /// # Source
    /// WCAG 2.2, relative luminance: 0.2126 R + 0.7152 G + 0.0722 B in linear light.
    #[must_use]
    pub fn relative_luminance(self) -> f64 {
        let [red, green, blue] = self.rgb;
        0.2126 * red + 0.7152 * green + 0.0722 * blue
    }

    fn is_saturated_red(self) -> bool {
        let sum: f64 = self.rgb.iter().sum();
        sum > 0.0 && self.rgb[0] / sum >= RED_SHARE
    }

    /// CIE 1976 u′, v′; the white point where there is no light.
    fn u_v(self) -> [f64; 2] {
        // IEC 61966-2-1: primaries of sRGB with the white D65.
        let [red, green, blue] = self.rgb;
        let x = 0.4124 * red + 0.3576 * green + 0.1805 * blue;
        let y = self.relative_luminance();
        let z = 0.0193 * red + 0.1192 * green + 0.9505 * blue;
        let sum = x + 15.0 * y + 3.0 * z;
        if sum <= 0.0 { [0.1978, 0.4683] } else { [4.0 * x / sum, 9.0 * y / sum] }
    }

    fn distance(self, other: Self) -> f64 {
        let (here, there) = (self.u_v(), other.u_v());
        (here[0] - there[0]).hypot(here[1] - there[1])
    }
}

/// Every stretch with more than three flashes in a second, in order of kind and time.
///
/// A flash is a pair of opposing changes. Counted are changes between neighbouring peaks and valleys: more than six of
/// them in a second are more than three flashes, a half one counted as begun. The area of the picture that flashes is
/// taken to be all of it, so the exception for small areas is not used.
#[must_use]
pub fn flashing(lights: &[Light]) -> Vec<Flashing> {
    let mut found = stretches(FlashKind::General, &general_changes(lights));
    found.extend(stretches(FlashKind::Red, &red_changes(lights)));
    found
}

/// Show times at which a change of brightness is large enough to count.
fn general_changes(lights: &[Light]) -> Vec<f64> {
    let mut times = Vec::new();
    let Some(first) = lights.first() else { return times };
    let (mut valley, mut peak) = (first.relative_luminance(), first.relative_luminance());
    let mut rises: Option<bool> = None;
    for light in lights {
        let now = light.relative_luminance();
        if rises != Some(true) && now - valley >= LEAST_CHANGE && valley < DARKER_BELOW {
            times.push(light.show_time_s);
            rises = Some(true);
            peak = now;
        } else if rises != Some(false) && peak - now >= LEAST_CHANGE && now < DARKER_BELOW {
            times.push(light.show_time_s);
            rises = Some(false);
            valley = now;
        }
        if rises != Some(false) {
            peak = peak.max(now);
        }
        if rises != Some(true) {
            valley = valley.min(now);
        }
    }
    times
}

/// Show times at which a change to or from saturated red is large enough to count.
fn red_changes(lights: &[Light]) -> Vec<f64> {
    let mut times = Vec::new();
    let Some(first) = lights.first() else { return times };
    let counts = |from: &Light, to: &Light| {
        from.distance(*to) > RED_DISTANCE && (from.is_saturated_red() || to.is_saturated_red())
    };
    // The end of the last change, and how far the colour has gone since the one before.
    let (mut start, mut end) = (*first, *first);
    for light in lights {
        if counts(&end, light) {
            times.push(light.show_time_s);
            start = end;
            end = *light;
        } else if start.distance(*light) > start.distance(end) {
            end = *light;
        }
    }
    times
}

/// Stretches in which more changes fall into one second than three flashes make.
fn stretches(kind: FlashKind, times: &[f64]) -> Vec<Flashing> {
    let mut found: Vec<Flashing> = Vec::new();
    let mut first = 0;
    for (last, to_s) in times.iter().enumerate() {
        // Changes a whole second apart are not within one: three flashes a second for ever are three in any second.
        while to_s - times[first] > WINDOW_S - ROUNDING_S {
            first += 1;
        }
        let changes = last + 1 - first;
        if changes <= 2 * MOST_FLASHES {
            continue;
        }
        match found.last_mut() {
            Some(open) if times[first] <= open.to_s => {
                open.to_s = *to_s;
                open.changes = open.changes.max(changes);
            }
            _ => found.push(Flashing { kind, from_s: times[first], to_s: *to_s, changes }),
        }
    }
    found
}
