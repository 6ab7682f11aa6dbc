//! Limits of the zone where water can stay liquid on a rocky surface.

use super::range::{OutOfRange, non_negative, positive};

/// Effective temperatures between which the limits were computed, K.
const COOLEST_STAR_K: f64 = 2600.0;
const HOTTEST_STAR_K: f64 = 7200.0;

/// A limit of the habitable zone, inner ones first.
#[derive(Clone, Copy, Debug, PartialEq, Eq, Hash)]
pub enum ZoneLimit {
    /// Starlight of Venus at the time it last may have had water: optimistic inner limit.
    RecentVenus,
    /// Oceans evaporate without end: conservative inner limit, depends on the planet's mass.
    RunawayGreenhouse,
    /// Water starts to leak through the upper air in one-dimensional models: pessimistic, superseded.
    MoistGreenhouse,
    /// More carbon dioxide no longer warms: conservative outer limit.
    MaximumGreenhouse,
    /// Starlight of Mars when it had rivers: optimistic outer limit.
    EarlyMars,
}

impl ZoneLimit {
    /// Every limit from the star outwards.
    pub const ALL: [Self; 5] =
        [Self::RecentVenus, Self::RunawayGreenhouse, Self::MoistGreenhouse, Self::MaximumGreenhouse, Self::EarlyMars];

    /// Stable machine name.
    #[must_use]
    pub fn key(self) -> &'static str {
        match self {
            Self::RecentVenus => "recent_venus",
            Self::RunawayGreenhouse => "runaway_greenhouse",
            Self::MoistGreenhouse => "moist_greenhouse",
            Self::MaximumGreenhouse => "maximum_greenhouse",
            Self::EarlyMars => "early_mars",
        }
    }

    /// The limit in words for people.
    #[must_use]
    pub fn name(self) -> &'static str {
        match self {
            Self::RecentVenus => "recent Venus",
            Self::RunawayGreenhouse => "runaway greenhouse",
            Self::MoistGreenhouse => "moist greenhouse (2013)",
            Self::MaximumGreenhouse => "maximum greenhouse",
            Self::EarlyMars => "early Mars",
        }
    }
}

/// The five coefficients of `S_eff = s + a t + b t² + c t³ + d t⁴`, `t = T_eff − 5780 K`.
type Coefficients = [f64; 5];

// Kopparapu et al. 2014, ApJL 787, L29, table 1 (the runaway rows are for 1, 5 and 0.1 Earth masses).
const RECENT_VENUS: Coefficients = [1.776, 2.136e-4, 2.533e-8, -1.332e-11, -3.097e-15];
const RUNAWAY_1: Coefficients = [1.107, 1.332e-4, 1.580e-8, -8.308e-12, -1.931e-15];
const RUNAWAY_5: Coefficients = [1.188, 1.433e-4, 1.707e-8, -8.968e-12, -2.084e-15];
const RUNAWAY_01: Coefficients = [0.99, 1.209e-4, 1.404e-8, -7.418e-12, -1.713e-15];
const MAXIMUM_GREENHOUSE: Coefficients = [0.356, 6.171e-5, 1.698e-9, -3.198e-12, -5.575e-16];
const EARLY_MARS: Coefficients = [0.32, 5.547e-5, 1.526e-9, -2.874e-12, -5.011e-16];
// Kopparapu et al. 2013, ApJ 765, 131, erratum 770, 82.
const MOIST_2013: Coefficients = [1.0146, 8.1884e-5, 1.9394e-9, -4.3618e-12, -6.8260e-16];

/// The starlight at a limit of the habitable zone.
#[derive(Clone, Copy, Debug, PartialEq)]
pub struct LimitFlux {
    /// Flux at the limit, units of 1361.17 W m⁻².
    pub insolation_earth: f64,
    /// The star is cooler than 2600 K or hotter than 7200 K, for which no limit was ever computed.
    pub extrapolated: bool,
}

impl LimitFlux {
    /// The distance of the limit from a star of a luminosity, au: d = √(L/S). Zero for a dark star.
    ///
    /// # Errors
    /// [`OutOfRange`] for a negative luminosity.
    pub fn distance_au(&self, luminosity_lsun: f64) -> Result<f64, OutOfRange> {
        Ok((non_negative("luminosity_lsun", luminosity_lsun)? / self.insolation_earth).sqrt())
    }
}

/// The starlight at a limit of the habitable zone for a star's temperature and a planet's mass.
///
/// `S_eff = s + a t + b t² + c t³ + d t⁴`, `t = T_eff − 5780 K`. The mass matters to the runaway limit only,
/// which is interpolated linearly in log M between 0.1, 1 and 5 M⊕ and held outside (our own choice).
///
/// # Source
/// Kopparapu et al. 2014, `ApJL` 787, L29, table 1; moist limit: Kopparapu et al. 2013 with its erratum.
/// # Valid for
/// 2600 to 7200 K. Outside, the end value is kept and `extrapolated` is set: the polynomial turns over at 7979 K.
/// # Accuracy
/// One-dimensional, cloudless models; a three-dimensional one puts the Sun's runaway limit at 1.10 as well
/// (Leconte et al. 2013).
/// # Errors
/// [`OutOfRange`] for a temperature or mass that is not positive.
///
/// # Example
/// ```
/// use longember::physics::planet::habitable_zone::{limit_flux, ZoneLimit};
/// let inner = limit_flux(ZoneLimit::RunawayGreenhouse, 5780.0, 1.0).unwrap();
/// assert!((inner.distance_au(1.0).unwrap() - 0.9504).abs() < 1e-4);
/// ```
pub fn limit_flux(
    limit: ZoneLimit,
    effective_temperature_k: f64,
    planet_mass_mearth: f64,
) -> Result<LimitFlux, OutOfRange> {
    let teff_k = positive("effective_temperature_k", effective_temperature_k)?;
    let mass = positive("planet_mass_mearth", planet_mass_mearth)?;
    let insolation_earth = match limit {
        ZoneLimit::RecentVenus => polynomial(&RECENT_VENUS, teff_k),
        ZoneLimit::RunawayGreenhouse => runaway_insolation_earth(teff_k, mass),
        ZoneLimit::MoistGreenhouse => polynomial(&MOIST_2013, teff_k),
        ZoneLimit::MaximumGreenhouse => polynomial(&MAXIMUM_GREENHOUSE, teff_k),
        ZoneLimit::EarlyMars => polynomial(&EARLY_MARS, teff_k),
    };
    Ok(LimitFlux { insolation_earth, extrapolated: is_extrapolated(teff_k) })
}

/// Whether a star is outside the temperatures the limits were computed for.
pub(crate) fn is_extrapolated(effective_temperature_k: f64) -> bool {
    !(COOLEST_STAR_K..=HOTTEST_STAR_K).contains(&effective_temperature_k)
}

/// The runaway limit for checked input, units of 1361.17 W m⁻².
pub(crate) fn runaway_insolation_earth(teff_k: f64, mass_mearth: f64) -> f64 {
    let log_mass = mass_mearth.clamp(0.1, 5.0).log10();
    let earth = polynomial(&RUNAWAY_1, teff_k);
    if log_mass < 0.0 {
        let light = polynomial(&RUNAWAY_01, teff_k);
        earth + (earth - light) * log_mass
    } else {
        let heavy = polynomial(&RUNAWAY_5, teff_k);
        earth + (heavy - earth) * log_mass / 5.0_f64.log10()
    }
}

/// The maximum-greenhouse limit for a checked temperature, units of 1361.17 W m⁻².
pub(crate) fn maximum_greenhouse_insolation_earth(teff_k: f64) -> f64 {
    polynomial(&MAXIMUM_GREENHOUSE, teff_k)
}

/// The moist limit of 2013 for a checked temperature, units of 1361.17 W m⁻².
pub(crate) fn moist_insolation_earth(teff_k: f64) -> f64 {
    polynomial(&MOIST_2013, teff_k)
}

fn polynomial(coefficients: &Coefficients, teff_k: f64) -> f64 {
    let t = teff_k.clamp(COOLEST_STAR_K, HOTTEST_STAR_K) - 5780.0;
    let [s, a, b, c, d] = *coefficients;
    s + t * (a + t * (b + t * (c + t * d)))
}

/// Where a planet stands against the habitable zone of the moment.
#[derive(Clone, Copy, Debug, PartialEq, Eq, Hash)]
pub enum ZonePlace {
    /// Inside the optimistic inner limit.
    TooMuchLight,
    /// Between the optimistic and the conservative inner limit.
    InnerOptimistic,
    /// Between the conservative limits.
    Conservative,
    /// Between the conservative and the optimistic outer limit.
    OuterOptimistic,
    /// Beyond the optimistic outer limit.
    TooLittleLight,
}

impl ZonePlace {
    /// Stable machine name.
    #[must_use]
    pub fn key(self) -> &'static str {
        match self {
            Self::TooMuchLight => "too_much_light",
            Self::InnerOptimistic => "inner_optimistic",
            Self::Conservative => "conservative",
            Self::OuterOptimistic => "outer_optimistic",
            Self::TooLittleLight => "too_little_light",
        }
    }

    /// The place in words for people.
    #[must_use]
    pub fn name(self) -> &'static str {
        match self {
            Self::TooMuchLight => "too much light",
            Self::InnerOptimistic => "optimistic zone, inner edge",
            Self::Conservative => "conservative habitable zone",
            Self::OuterOptimistic => "optimistic zone, outer edge",
            Self::TooLittleLight => "too little light",
        }
    }
}

/// The place of a planet in the habitable zone, from the starlight it receives.
///
/// # Source
/// As [`limit_flux`].
/// # Errors
/// [`OutOfRange`] as [`limit_flux`], and for a negative insolation.
pub fn zone_place(
    insolation_earth: f64,
    effective_temperature_k: f64,
    planet_mass_mearth: f64,
) -> Result<ZonePlace, OutOfRange> {
    let s = non_negative("insolation_earth", insolation_earth)?;
    let at = |limit| limit_flux(limit, effective_temperature_k, planet_mass_mearth).map(|flux| flux.insolation_earth);
    Ok(if s > at(ZoneLimit::RecentVenus)? {
        ZonePlace::TooMuchLight
    } else if s > at(ZoneLimit::RunawayGreenhouse)? {
        ZonePlace::InnerOptimistic
    } else if s >= at(ZoneLimit::MaximumGreenhouse)? {
        ZonePlace::Conservative
    } else if s >= at(ZoneLimit::EarlyMars)? {
        ZonePlace::OuterOptimistic
    } else {
        ZonePlace::TooLittleLight
    })
}

#[cfg(test)]
mod tests {
    use super::*;

    #[test]
    fn outside_the_computed_stars_the_end_value_is_kept_and_said() {
        for limit in ZoneLimit::ALL {
            let end = limit_flux(limit, 7200.0, 1.0).expect("in range");
            let hot = limit_flux(limit, 120_000.0, 1.0).expect("answered");
            assert!(!end.extrapolated && hot.extrapolated);
            assert!((end.insolation_earth - hot.insolation_earth).abs() < 1e-15);
        }
    }

    #[test]
    fn places_follow_the_light() {
        let place = |insolation_earth| zone_place(insolation_earth, 5772.0, 1.0).expect("in range");
        assert_eq!(place(1.9), ZonePlace::TooMuchLight);
        assert_eq!(place(1.3), ZonePlace::InnerOptimistic);
        assert_eq!(place(1.0), ZonePlace::Conservative);
        assert_eq!(place(0.34), ZonePlace::OuterOptimistic);
        assert_eq!(place(0.0), ZonePlace::TooLittleLight);
    }
}
