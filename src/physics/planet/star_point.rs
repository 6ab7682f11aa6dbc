//! The star as a planet feels it: one node of the star's life.

use super::range::{OutOfRange, non_negative, positive};

/// One time node of the star's life. A walk takes a slice of them, ordered by age.
///
/// Two nodes may share an age: the values before and after a sudden change.
#[derive(Clone, Copy, Debug, PartialEq)]
pub struct StarPoint {
    /// Age since the zero-age main sequence, yr; negative while the star still contracts.
    pub age_yr: f64,
    /// Mass, solar masses; zero when nothing is left.
    pub mass_msun: f64,
    /// Bolometric luminosity, solar luminosities.
    pub luminosity_lsun: f64,
    /// Photospheric radius, solar radii.
    pub radius_rsun: f64,
    /// Effective temperature, K.
    pub effective_temperature_k: f64,
    /// Mass of the convective envelope, solar masses; zero where there is none.
    pub envelope_mass_msun: f64,
    /// The star is a giant (red giant, core helium burning or asymptotic branch).
    pub is_giant: bool,
    /// The star is a remnant (white dwarf, neutron star, black hole) or gone.
    pub is_remnant: bool,
    /// The mass missing since the previous node was thrown off within days (a supernova),
    /// not blown away over thousands of orbits.
    pub lost_mass_suddenly: bool,
}

impl StarPoint {
    /// The star part of the way to the next node: every value runs straight, the phase is that of the next node.
    pub(crate) fn towards(&self, next: &Self, share: f64) -> Self {
        let mix = |from: f64, to: f64| from + share * (to - from);
        Self {
            age_yr: mix(self.age_yr, next.age_yr),
            mass_msun: mix(self.mass_msun, next.mass_msun),
            luminosity_lsun: mix(self.luminosity_lsun, next.luminosity_lsun),
            radius_rsun: mix(self.radius_rsun, next.radius_rsun),
            effective_temperature_k: mix(self.effective_temperature_k, next.effective_temperature_k),
            envelope_mass_msun: mix(self.envelope_mass_msun, next.envelope_mass_msun),
            ..*next
        }
    }
}

/// Checks that a track can be walked: nodes in order, every value finite and not negative.
///
/// # Errors
/// [`OutOfRange`] naming the first quantity that cannot be used.
pub fn check_track(track: &[StarPoint]) -> Result<(), OutOfRange> {
    if track.is_empty() {
        return Err(OutOfRange { what: "star_points", value: 0.0, allowed: "at least one" });
    }
    let mut previous_yr = f64::NEG_INFINITY;
    for point in track {
        if !point.age_yr.is_finite() || point.age_yr < previous_yr {
            return Err(OutOfRange { what: "age_yr", value: point.age_yr, allowed: "finite and in rising order" });
        }
        previous_yr = point.age_yr;
        non_negative("mass_msun", point.mass_msun)?;
        non_negative("luminosity_lsun", point.luminosity_lsun)?;
        non_negative("radius_rsun", point.radius_rsun)?;
        non_negative("envelope_mass_msun", point.envelope_mass_msun)?;
        non_negative("effective_temperature_k", point.effective_temperature_k)?;
    }
    positive("mass_msun", track[0].mass_msun)?;
    Ok(())
}
