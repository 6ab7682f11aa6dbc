//! The star as one planet meets it, node by node.

use super::super::habitable_zone::{is_extrapolated, maximum_greenhouse_insolation_earth, runaway_insolation_earth};
use super::super::high_energy;
use super::super::orbit_history::{OrbitEnd, OrbitHistory, OrbitNode};
use super::super::range::OutOfRange;
use super::super::star_point::StarPoint;
use super::super::tides::{Spin, locking};
use super::input::PlanetInput;

/// What a planet meets at one node of the star's track.
#[derive(Clone, Copy, Debug)]
pub(super) struct Surroundings {
    pub(super) age_yr: f64,
    pub(super) semi_major_axis_au: f64,
    pub(super) star_mass_msun: f64,
    pub(super) effective_temperature_k: f64,
    /// Starlight averaged over the orbit, units of 1361.17 W m⁻²; never quite zero, so that it has a logarithm.
    pub(super) insolation_earth: f64,
    /// High-energy light averaged over the orbit, units of 1361.17 W m⁻²; zero where it is not known.
    pub(super) high_energy_earth: f64,
    /// Natural logarithms of the starlight over the inner and the outer limit of the habitable zone.
    pub(super) over_inner: f64,
    pub(super) over_outer: f64,
    pub(super) zone_extrapolated: bool,
    /// Rate at which rotation slows for Q = 1, s⁻¹ per year.
    pub(super) unit_braking_per_s_yr: f64,
    /// How much faster or slower than its orbit the planet turned at first, s⁻¹.
    pub(super) spin_excess_per_s: f64,
}

/// Starlight below which nothing distinguishes one darkness from another.
const DARK: f64 = 1e-30;

/// The star's high-energy history, as far as its mass fixes it.
#[derive(Clone, Copy, Debug)]
pub(super) struct HighEnergyHistory {
    saturation_age_yr: f64,
    born_yr: f64,
}

impl HighEnergyHistory {
    pub(super) fn of(track: &[StarPoint]) -> Result<Self, OutOfRange> {
        // A track that starts on the main sequence starts at zero; one that starts earlier was born with its first node.
        Ok(Self {
            saturation_age_yr: high_energy::saturation_age_yr(track[0].mass_msun)?,
            born_yr: track[0].age_yr.min(0.0),
        })
    }

    /// High-energy luminosity, solar luminosities; `None` for giants and remnants.
    pub(super) fn luminosity_lsun(&self, star: &StarPoint) -> Option<f64> {
        let age_yr = (star.age_yr - self.born_yr).max(0.0);
        let known = !star.is_giant && !star.is_remnant;
        known.then(|| high_energy::high_energy_of(star.luminosity_lsun, self.saturation_age_yr, age_yr))
    }
}

impl Surroundings {
    fn at(input: &PlanetInput, high_energy: &HighEnergyHistory, orbit: &OrbitNode, star: &StarPoint) -> Self {
        let a = orbit.semi_major_axis_au;
        let e = orbit.eccentricity;
        let per_luminosity = 1.0 / (a * a * (1.0 - e * e).sqrt());
        let teff_k = star.effective_temperature_k.max(1.0);
        let insolation_earth = (star.luminosity_lsun * per_luminosity).max(DARK);
        let mass = input.orbit.mass_mearth;
        let inner = runaway_insolation_earth(teff_k, mass);
        let outer = maximum_greenhouse_insolation_earth(teff_k);
        let log_light = insolation_earth.ln();
        let spin: &Spin = &input.spin;
        let star_mass_msun = star.mass_msun.max(1e-6);
        let braking_per_s2 = locking::unit_braking_per_s2(spin, a, star_mass_msun, mass, input.orbit.radius_rearth);
        Self {
            age_yr: orbit.age_yr,
            semi_major_axis_au: a,
            star_mass_msun,
            effective_temperature_k: teff_k,
            insolation_earth,
            high_energy_earth: high_energy.luminosity_lsun(star).unwrap_or(0.0) * per_luminosity,
            over_inner: log_light - inner.ln(),
            over_outer: log_light - outer.ln(),
            zone_extrapolated: is_extrapolated(teff_k),
            unit_braking_per_s_yr: braking_per_s2 * crate::units::constants::YEAR_S,
            spin_excess_per_s: (locking::initial_spin_per_s(spin) - locking::mean_motion_per_s(a, star_mass_msun))
                .abs(),
        }
    }

    /// Every node from the start to the end of the orbit. When the star takes the planet between two nodes, the last
    /// entry is the place where it was taken.
    pub(super) fn along(
        input: &PlanetInput,
        high_energy: &HighEnergyHistory,
        orbit: &OrbitHistory,
        track: &[StarPoint],
    ) -> Vec<Self> {
        let places = orbit.track_nodes();
        let mut met: Vec<Self> =
            places.iter().zip(track).map(|(place, star)| Self::at(input, high_energy, place, star)).collect();
        let taken = orbit.end().filter(|(_, kind)| *kind != OrbitEnd::Unbound);
        let last = orbit.nodes().last();
        let star = places.len().checked_sub(1).and_then(|at| track.get(at)).zip(track.get(places.len()));
        if let (Some(_), Some(place), Some((before, after))) = (taken, last, star) {
            let span_yr = after.age_yr - before.age_yr;
            let share = if span_yr > 0.0 { (place.age_yr - before.age_yr) / span_yr } else { 1.0 };
            met.push(Self::at(input, high_energy, place, &before.towards(after, share)));
        }
        met
    }
}
