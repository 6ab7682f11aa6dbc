//! What to know about a show before an audience sees it: flashes, cuts and jumps.

use super::flashes::{FlashKind, Flashing, Light, flashing};
use super::frame_rate::FrameRate;
use super::schedule::Schedule;
use crate::physics::light::blackbody_swatch;
use crate::system::history::History;
use crate::units::number_text::number;
use crate::units::show_time::show_time_text;

/// Factor of light from one frame to the next that is a jump to the eye: 0.3 in its decimal logarithm. Own choice.
const JUMP_FACTOR: f64 = 2.0;

/// What fills the picture while flashes are looked for.
#[derive(Clone, Copy, Debug, PartialEq, Eq, Hash)]
pub enum Picture {
    /// The star's colour, as bright as the screen can show it.
    Colour,
    /// The star's light in proportion, the brightest moment of the show as bright as the screen can show it.
    Brightness,
}

/// Something to know about a show.
#[derive(Clone, Copy, Debug, PartialEq)]
pub enum ShowWarning {
    /// More than three flashes in a second.
    Flashes(Picture, Flashing),
    /// A cut changes the light at once.
    Cut {
        /// Show time, s.
        show_time_s: f64,
        /// Light after over light before, the larger over the smaller.
        factor: f64,
        /// Whether it becomes brighter.
        is_brighter: bool,
    },
    /// Between two frames of an even motion the light changes at once.
    Jump {
        /// Show time of the frame before, s.
        from_s: f64,
        /// Show time of the frame after, s.
        to_s: f64,
        /// The larger light over the smaller.
        factor: f64,
    },
}

impl ShowWarning {
    /// Whether it can do harm; the others are only worth knowing.
    #[must_use]
    pub fn is_harmful(&self) -> bool {
        matches!(self, Self::Flashes(..))
    }

    /// The warning in one sentence with its remedy.
    #[must_use]
    pub fn text(&self) -> String {
        let at = show_time_text;
        match self {
            Self::Flashes(picture, Flashing { kind, from_s, to_s, changes }) => {
                let what = match picture {
                    Picture::Colour => "the star's colour filling the picture",
                    Picture::Brightness => "the star's brightness filling the picture",
                };
                let red = if *kind == FlashKind::Red { " of saturated red" } else { "" };
                format!(
                    "{} to {}: {what} makes {changes} opposing changes{red} in one second, more than three flashes (WCAG 2.2, 2.3.1); this can \
                     trigger seizures: give this part more show time, or show it smaller than a quarter of 10 degrees of view",
                    at(*from_s),
                    at(*to_s)
                )
            }
            Self::Cut { show_time_s, factor, is_brighter } => {
                let more = if *is_brighter { "brighter" } else { "fainter" };
                format!("{}: a cut; the star is {} times {more} at once", at(*show_time_s), number(*factor, 2))
            }
            Self::Jump { from_s, to_s, factor } => format!(
                "{} to {}: from one frame to the next the light changes by a factor of {}; give this part more show time or fade over it",
                at(*from_s),
                at(*to_s),
                number(*factor, 2)
            ),
        }
    }
}

/// What one frame shows of the star.
#[derive(Clone, Copy)]
struct Seen {
    show_time_s: f64,
    rgb: [f64; 3],
    /// None where no light is modelled.
    luminosity_lsun: Option<f64>,
}

/// Everything to know about a show at a rate of frames, harmful things first.
#[must_use]
pub fn warnings(schedule: &Schedule, history: &History, rate: FrameRate) -> Vec<ShowWarning> {
    let seen: Vec<Seen> = schedule.frames(rate).map(|frame| see(history, frame.show_time_s, frame.time_yr)).collect();
    let most = seen.iter().filter_map(|seen| seen.luminosity_lsun).fold(0.0, f64::max);
    let light =
        |seen: &Seen, scale: f64| Light { show_time_s: seen.show_time_s, rgb: seen.rgb.map(|part| part * scale) };
    let colour: Vec<Light> = seen.iter().map(|seen| light(seen, 1.0)).collect();
    let share = |seen: &Seen| if most > 0.0 { seen.luminosity_lsun.unwrap_or(0.0) / most } else { 0.0 };
    let brightness: Vec<Light> = seen.iter().map(|seen| light(seen, share(seen))).collect();
    let mut found: Vec<ShowWarning> =
        flashing(&colour).into_iter().map(|flashing| ShowWarning::Flashes(Picture::Colour, flashing)).collect();
    found.extend(flashing(&brightness).into_iter().map(|flashing| ShowWarning::Flashes(Picture::Brightness, flashing)));
    let cuts = cuts(schedule, history);
    found.extend(jumps(&seen, &cuts, rate));
    found.extend(cuts.into_iter().map(|(show_time_s, factor, is_brighter)| ShowWarning::Cut {
        show_time_s,
        factor,
        is_brighter,
    }));
    found
}

fn see(history: &History, show_time_s: f64, time_yr: f64) -> Seen {
    let star = history.star_at(time_yr);
    if star.phase.is_dark() {
        return Seen { show_time_s, rgb: [0.0; 3], luminosity_lsun: None };
    }
    let rgb = blackbody_swatch(star.effective_temperature_k).srgb.map(linear);
    Seen { show_time_s, rgb, luminosity_lsun: Some(star.luminosity_lsun) }
}

/// Linear light of an encoded channel.
///
/// # Source
/// IEC 61966-2-1 (sRGB).
fn linear(encoded: u8) -> f64 {
    let value = f64::from(encoded) / 255.0;
    if value <= 0.040_45 { value / 12.92 } else { ((value + 0.055) / 1.055).powf(2.4) }
}

/// Show time of every cut, the factor of its change of light, and whether it becomes brighter.
fn cuts(schedule: &Schedule, history: &History) -> Vec<(f64, f64, bool)> {
    let pairs = schedule.stops().windows(2).filter(|pair| pair[1].transition.scale().is_none());
    let light = |time_yr: f64| see(history, 0.0, time_yr).luminosity_lsun.filter(|light| *light > 0.0);
    let cuts = pairs.map(|pair| {
        let ratio = light(pair[0].time_yr).zip(light(pair[1].time_yr)).map_or(1.0, |(before, after)| after / before);
        (pair[1].show_time_s, ratio.max(1.0 / ratio), ratio >= 1.0)
    });
    cuts.collect()
}

/// Jumps between neighbouring frames that are no cut; jumps in a row are one.
fn jumps(seen: &[Seen], cuts: &[(f64, f64, bool)], rate: FrameRate) -> Vec<ShowWarning> {
    let mut found: Vec<ShowWarning> = Vec::new();
    let frame_s = rate.show_time_s(1);
    for pair in seen.windows(2) {
        let Some((before, after)) = pair[0].luminosity_lsun.zip(pair[1].luminosity_lsun) else { continue };
        let is_cut =
            cuts.iter().any(|(cut_s, ..)| *cut_s > pair[0].show_time_s && *cut_s <= pair[1].show_time_s + 1e-6);
        let step = if before > 0.0 && after > 0.0 { (after / before).max(before / after) } else { 1.0 };
        if is_cut || step < JUMP_FACTOR {
            continue;
        }
        match found.last_mut() {
            Some(ShowWarning::Jump { to_s, factor, .. }) if pair[0].show_time_s - *to_s < 1.5 * frame_s => {
                *to_s = pair[1].show_time_s;
                *factor = factor.max(step);
            }
            _ => found.push(ShowWarning::Jump { from_s: pair[0].show_time_s, to_s: pair[1].show_time_s, factor: step }),
        }
    }
    found
}
