//! Everything at one instant.

use super::notes::Note;
use crate::physics::light::{Swatch, blackbody_swatch, colour_words};
use crate::physics::planet::Caution;
use crate::physics::planet::habitable_zone::{ZoneLimit, ZonePlace, limit_flux};
use crate::physics::planet::tides::LockLevel;
use crate::physics::star::{Interior, Phase, StarState};
use crate::units::constants::WIEN_M_K;

/// The state of a system at one instant.
#[derive(Clone, Debug, PartialEq)]
pub struct Moment {
    /// Time since the star reached the main sequence, yr.
    pub time_yr: f64,
    /// The star.
    pub star: StarMoment,
    /// The planets, in the order of the system.
    pub planets: Vec<PlanetMoment>,
    /// What a reader must know about single figures: extrapolated, held fixed, not modelled.
    pub notes: Vec<Note>,
}

/// A star at one instant. Light is `None` for objects whose light is not modelled.
#[derive(Clone, Debug, PartialEq)]
pub struct StarMoment {
    /// Phase of life.
    pub phase: Phase,
    /// Mass, solar masses.
    pub mass_msun: f64,
    /// Bolometric luminosity, solar luminosities.
    pub luminosity_lsun: Option<f64>,
    /// Photospheric radius, solar radii; of a black hole, the radius of its horizon.
    pub radius_rsun: Option<f64>,
    /// Effective temperature, K.
    pub effective_temperature_k: Option<f64>,
    /// Mass of the core that no longer burns hydrogen, solar masses.
    pub core_mass_msun: Option<f64>,
    /// Mass lost in the wind, solar masses per year.
    pub mass_loss_msun_yr: f64,
    /// Share of hydrogen by mass at the centre, on the main sequence.
    pub core_hydrogen_fraction: Option<f64>,
    /// The inside of a red dwarf, whose structure is computed.
    pub interior: Option<Interior>,
    /// How long a red dwarf contracted before its hydrogen burnt steadily, yr.
    pub contraction_yr: Option<f64>,
    /// Whether a red dwarf's surface was asked to be as opaque as in calculations of 1997.
    pub has_old_surface: bool,
    /// Wavelength of the strongest spectral radiance, nm.
    pub peak_wavelength_nm: Option<f64>,
    /// True colour of the light.
    pub swatch: Option<Swatch>,
    /// The colour in words; says so where there is no visible glow.
    pub colour: &'static str,
    /// Inner and outer limit of the conservative habitable zone for an Earth-mass planet, au.
    pub habitable_zone_au: Option<[f64; 2]>,
}

impl StarMoment {
    /// What the state of a star means to the eye and to planets.
    #[must_use]
    pub fn new(state: &StarState, interior: Option<Interior>) -> Self {
        let shines = !state.phase.is_dark();
        let temperature_k = shines.then_some(state.effective_temperature_k);
        let swatch = temperature_k.map(blackbody_swatch);
        Self {
            phase: state.phase,
            mass_msun: state.mass_msun,
            luminosity_lsun: shines.then_some(state.luminosity_lsun),
            radius_rsun: (state.radius_rsun > 0.0).then_some(state.radius_rsun),
            effective_temperature_k: temperature_k,
            core_mass_msun: (!state.phase.is_dark()).then_some(state.core_mass_msun),
            mass_loss_msun_yr: state.mass_loss_msun_yr,
            core_hydrogen_fraction: state.core_hydrogen_fraction,
            interior,
            contraction_yr: None,
            has_old_surface: false,
            peak_wavelength_nm: temperature_k.map(|temperature_k| WIEN_M_K / temperature_k * 1e9),
            swatch,
            colour: temperature_k.map_or("no light modelled", colour_words),
            habitable_zone_au: zone_au(state),
        }
    }
}

/// The conservative zone, left out where the star no longer burns and no climate was ever computed.
fn zone_au(state: &StarState) -> Option<[f64; 2]> {
    if state.phase.is_dark() {
        return None;
    }
    let at = |limit| {
        limit_flux(limit, state.effective_temperature_k, 1.0)
            .and_then(|flux| flux.distance_au(state.luminosity_lsun))
            .ok()
            .filter(|distance_au| *distance_au > 0.0)
    };
    Some([at(ZoneLimit::RunawayGreenhouse)?, at(ZoneLimit::MaximumGreenhouse)?])
}

/// What a planet is like, in one word.
#[derive(Clone, Copy, Debug, PartialEq, Eq, Hash, PartialOrd, Ord)]
pub enum PlanetState {
    /// Ice from pole to pole; without a climate model, a mean surface temperature below the freezing point of water.
    Frozen,
    /// Open water; without a climate model, a mean surface temperature between freezing and boiling at 1 bar.
    Temperate,
    /// Open water under a wet upper air, from which hydrogen leaks away.
    Moist,
    /// The oceans are steam.
    Runaway,
    /// The water is gone for good.
    Dry,
    /// Without a climate model: the mean surface temperature is above the boiling point of water at 1 bar.
    TooHot,
    /// The star's tide tore the planet apart.
    TornApart,
    /// The star swallowed the planet.
    Engulfed,
    /// The planet left the star.
    Unbound,
    /// The planet still orbits a star whose light is not modelled.
    Dark,
}

impl PlanetState {
    /// Every state.
    pub const ALL: [Self; 10] = [
        Self::Frozen,
        Self::Temperate,
        Self::Moist,
        Self::Runaway,
        Self::Dry,
        Self::TooHot,
        Self::TornApart,
        Self::Engulfed,
        Self::Unbound,
        Self::Dark,
    ];

    /// Stable machine name.
    #[must_use]
    pub fn key(self) -> &'static str {
        match self {
            Self::Frozen => "frozen",
            Self::Temperate => "temperate",
            Self::Moist => "moist",
            Self::Runaway => "runaway",
            Self::Dry => "dry",
            Self::TooHot => "too_hot",
            Self::TornApart => "torn_apart",
            Self::Engulfed => "engulfed",
            Self::Unbound => "unbound",
            Self::Dark => "dark",
        }
    }

    /// The state in words for people.
    #[must_use]
    pub fn name(self) -> &'static str {
        match self {
            Self::Frozen => "frozen",
            Self::Temperate => "temperate",
            Self::Moist => "moist",
            Self::Runaway => "runaway",
            Self::Dry => "dry",
            Self::TooHot => "too hot",
            Self::TornApart => "torn apart",
            Self::Engulfed => "engulfed",
            Self::Unbound => "unbound",
            Self::Dark => "dark",
        }
    }

    /// Whether the planet still exists and orbits the star.
    #[must_use]
    pub fn orbits(self) -> bool {
        !matches!(self, Self::Engulfed | Self::TornApart | Self::Unbound)
    }
}

/// A planet at one instant. What no longer applies is `None`.
#[derive(Clone, Debug, PartialEq)]
pub struct PlanetMoment {
    /// Its name.
    pub name: String,
    /// Its state in one word.
    pub state: PlanetState,
    /// Semi-major axis, au.
    pub semi_major_axis_au: Option<f64>,
    /// Orbital eccentricity.
    pub eccentricity: Option<f64>,
    /// Orbital period, yr.
    pub period_yr: Option<f64>,
    /// Starlight received, mean over the orbit, in units of the Earth's.
    pub insolation_earth: Option<f64>,
    /// Equilibrium temperature, K.
    pub equilibrium_temperature_k: Option<f64>,
    /// Mean surface temperature, K; `None` where only a bound is known.
    pub surface_temperature_k: Option<f64>,
    /// The mean surface temperature is above this, K, and by how much is not known.
    pub surface_hotter_than_k: Option<f64>,
    /// How far the surface temperature can be trusted.
    pub surface_caution: Option<Caution>,
    /// Share of the surface under ice.
    pub ice_fraction: Option<f64>,
    /// Latitude of the ice line, degrees.
    pub ice_line_deg: Option<f64>,
    /// Surface temperature at the equator and at the poles, K.
    pub equator_pole_k: Option<(f64, f64)>,
    /// Partial pressure of carbon dioxide, bar.
    pub carbon_dioxide_bar: Option<f64>,
    /// Share of the starlight that a planet with a climate reflects.
    pub planetary_albedo: Option<f64>,
    /// Gravity at the surface, m s⁻².
    pub surface_gravity_m_s2: Option<f64>,
    /// Speed needed to leave the surface for good, km s⁻¹.
    pub escape_speed_km_s: Option<f64>,
    /// How firmly gravity holds hydrogen atoms against the heat of the upper air.
    pub jeans_hydrogen_ratio: Option<f64>,
    /// How firmly gravity holds nitrogen molecules against the heat of the upper air.
    pub jeans_nitrogen_ratio: Option<f64>,
    /// Water left, oceans of the Earth.
    pub water_oceans: Option<f64>,
    /// High-energy light received, W m⁻².
    pub high_energy_w_m2: Option<f64>,
    /// Place against the shoreline of air, 1 for the Earth today.
    pub shoreline_ratio: Option<f64>,
    /// Whether the planet keeps one face to the star.
    pub lock: Option<LockLevel>,
    /// How far the orbit's fate can be trusted.
    pub orbit_caution: Option<Caution>,
    /// Angle that the star's disc fills in the planet's sky at mean distance, degrees.
    pub star_angular_diameter_deg: Option<f64>,
    /// Place in the habitable zone.
    pub zone: Option<ZonePlace>,
}

impl PlanetMoment {
    /// A planet of which nothing can be said.
    #[must_use]
    pub(super) fn nothing(name: String) -> Self {
        Self {
            name,
            state: PlanetState::Dark,
            semi_major_axis_au: None,
            eccentricity: None,
            period_yr: None,
            insolation_earth: None,
            equilibrium_temperature_k: None,
            surface_temperature_k: None,
            surface_hotter_than_k: None,
            surface_caution: None,
            ice_fraction: None,
            ice_line_deg: None,
            equator_pole_k: None,
            carbon_dioxide_bar: None,
            planetary_albedo: None,
            surface_gravity_m_s2: None,
            escape_speed_km_s: None,
            jeans_hydrogen_ratio: None,
            jeans_nitrogen_ratio: None,
            water_oceans: None,
            high_energy_w_m2: None,
            shoreline_ratio: None,
            lock: None,
            orbit_caution: None,
            star_angular_diameter_deg: None,
            zone: None,
        }
    }
}
