//! The ribbon of a whole life: true colour and light at every place of the time axis.

use super::samples::Samples;
use crate::physics::star::Phase;

/// Decades of luminosity between the thinnest and the fullest ribbon.
const MOST_DECADES: f64 = 9.0;
/// Thinnest ribbon that is still seen, as a share of the full height.
const LEAST_HEIGHT: f64 = 0.03;

/// One upright of the ribbon.
#[derive(Clone, Copy, Debug, PartialEq)]
pub struct Upright {
    /// Place on the time axis, 0 to 1.
    pub fraction: f64,
    /// Share of the full height, following the logarithm of the luminosity; zero where no light is modelled.
    pub height: f64,
    /// True colour, sRGB.
    pub colour_srgb: [u8; 3],
    /// Whether the colour is visible light; a colder object is drawn as an outline.
    pub glows: bool,
}

/// Faintest and brightest luminosity of a whole life as logarithms: zooming must not change the ribbon's height.
#[derive(Clone, Copy, Debug, PartialEq)]
pub struct LightRange {
    faintest_log: f64,
    brightest_log: f64,
}

impl LightRange {
    /// The range over these samples.
    #[must_use]
    pub fn of(samples: &Samples) -> Self {
        let logs = || {
            samples
                .all
                .iter()
                .filter_map(|sample| sample.star.luminosity_lsun)
                .filter(|light| *light > 0.0)
                .map(f64::log10)
        };
        let brightest_log = logs().reduce(f64::max).unwrap_or(0.0);
        let faintest_log = logs().reduce(f64::min).unwrap_or(0.0).max(brightest_log - MOST_DECADES);
        Self { faintest_log: faintest_log.min(brightest_log - 0.5), brightest_log }
    }

    /// Share of the full height for a luminosity.
    fn height(self, luminosity_lsun: f64) -> f64 {
        let share = (luminosity_lsun.log10() - self.faintest_log) / (self.brightest_log - self.faintest_log);
        LEAST_HEIGHT + (1.0 - LEAST_HEIGHT) * share.clamp(0.0, 1.0)
    }
}

/// The ribbon with the phases under it.
#[derive(Clone, Debug, PartialEq)]
pub struct Ribbon {
    /// The uprights, from left to right.
    pub uprights: Vec<Upright>,
    /// Phases with the places where they begin and end.
    pub phases: Vec<(Phase, f64, f64)>,
}

impl Ribbon {
    /// The ribbon for these samples, its height measured against the light of the whole life.
    #[must_use]
    pub fn new(samples: &Samples, light: LightRange) -> Self {
        let uprights = samples
            .all
            .iter()
            .map(|sample| {
                let luminosity = sample.star.luminosity_lsun.filter(|luminosity_lsun| *luminosity_lsun > 0.0);
                let height = luminosity.map_or(0.0, |luminosity_lsun| light.height(luminosity_lsun));
                let swatch = sample.star.swatch.as_ref();
                Upright {
                    fraction: sample.fraction,
                    height,
                    colour_srgb: swatch.map_or([0, 0, 0], |swatch| swatch.srgb),
                    glows: swatch.is_some_and(|swatch| swatch.chromaticity.is_some()),
                }
            })
            .collect();
        Self { uprights, phases: phases(samples) }
    }
}

fn phases(samples: &Samples) -> Vec<(Phase, f64, f64)> {
    let mut found: Vec<(Phase, f64, f64)> = Vec::new();
    for sample in &samples.all {
        match found.last_mut() {
            Some((phase, _, to)) if *phase == sample.star.phase => *to = sample.fraction,
            _ => found.push((sample.star.phase, sample.fraction, sample.fraction)),
        }
    }
    found
}
