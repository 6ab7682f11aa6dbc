//! The light of star and planets at moments of a history, worked out where it is asked for.

use super::history::History;
use super::light_notes;
use super::moment::Moment;
use super::notes::Note;
use super::planet_light::{PlanetLight, clear_air};
use super::starlight::Starlight;
use crate::physics::light::{ClearAir, VisibleSpectrum};

/// The light at one moment.
#[derive(Clone, Debug, PartialEq)]
pub struct MomentLight {
    /// Light of the star; `None` where none is modelled.
    pub star: Option<Starlight>,
    /// Light on each planet, in the order of the system; `None` where the planet has no star or no light.
    pub planets: Vec<Option<PlanetLight>>,
    /// What a reader must know about single figures of light.
    pub notes: Vec<Note>,
}

/// Reads light at moments; what does not change with time is made ready once.
#[derive(Debug)]
pub struct LightReader<'h> {
    history: &'h History,
    airs: Vec<Option<ClearAir>>,
}

impl<'h> LightReader<'h> {
    /// A reader of a history, with the star at an altitude over every planet's horizon, degrees.
    #[must_use]
    pub fn new(history: &'h History, altitude_deg: f64) -> Self {
        let airs = history.system().planets.iter().map(|planet| clear_air(planet, altitude_deg, true)).collect();
        Self { history, airs }
    }

    /// The light at a moment of that history.
    #[must_use]
    pub fn at(&self, moment: &Moment) -> MomentLight {
        let star = Starlight::of(&moment.star);
        let spectrum = star.as_ref().and_then(|star| VisibleSpectrum::of_blackbody(star.temperature_k).ok());
        let planets: Vec<Option<PlanetLight>> = moment
            .planets
            .iter()
            .zip(&self.airs)
            .map(|(planet, air)| {
                PlanetLight::of(&moment.star, star.as_ref()?, spectrum.as_ref()?, planet, air.as_ref())
            })
            .collect();
        let notes = light_notes::of(&self.history.system().planets, moment, star.as_ref(), &planets);
        MomentLight { star, planets, notes }
    }
}
