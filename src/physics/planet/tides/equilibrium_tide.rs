//! Tides raised on the planet and on a star that is no giant: decay and circularisation of the orbit.

use super::super::range::{OutOfRange, closed_eccentricity, positive};
use super::law::{REFERENCE_PERIOD_S, TideForm, Tides};
use crate::units::constants::{
    AU_M, EARTH_MASSES_PER_SOLAR_MASS, EARTH_RADIUS_AU, SOLAR_GM_M3_S2, SOLAR_RADIUS_AU, YEAR_S,
};
use std::f64::consts::TAU;

/// Star, planet and the orbit between them at one moment.
#[derive(Clone, Copy, Debug, PartialEq)]
pub struct TidalPair {
    /// Mass of the star, solar masses.
    pub star_mass_msun: f64,
    /// Radius of the star, solar radii.
    pub star_radius_rsun: f64,
    /// Mass of the planet, Earth masses.
    pub planet_mass_mearth: f64,
    /// Radius of the planet, Earth radii.
    pub planet_radius_rearth: f64,
    /// Semi-major axis, au.
    pub semi_major_axis_au: f64,
    /// Eccentricity, dimensionless.
    pub eccentricity: f64,
}

/// How fast an orbit changes.
#[derive(Clone, Copy, Debug, Default, PartialEq)]
pub struct OrbitRates {
    /// Relative change of the semi-major axis, (da/dt)/a, yr⁻¹.
    pub axis_per_yr: f64,
    /// Relative change of the eccentricity, (de/dt)/e, yr⁻¹; its limit for e → 0 on a circular orbit.
    pub eccentricity_per_yr: f64,
}

impl OrbitRates {
    pub(crate) fn plus(self, other: Self) -> Self {
        Self {
            axis_per_yr: self.axis_per_yr + other.axis_per_yr,
            eccentricity_per_yr: self.eccentricity_per_yr + other.eccentricity_per_yr,
        }
    }
}

impl TidalPair {
    /// Checks every field.
    ///
    /// # Errors
    /// [`OutOfRange`] naming the first field that cannot be used.
    pub fn check(&self) -> Result<(), OutOfRange> {
        positive("star_mass_msun", self.star_mass_msun)?;
        positive("star_radius_rsun", self.star_radius_rsun)?;
        positive("planet_mass_mearth", self.planet_mass_mearth)?;
        positive("planet_radius_rearth", self.planet_radius_rearth)?;
        positive("semi_major_axis_au", self.semi_major_axis_au)?;
        closed_eccentricity(self.eccentricity)?;
        Ok(())
    }

    /// Mean motion, s⁻¹.
    pub(crate) fn mean_motion_per_s(&self) -> f64 {
        let a_m = self.semi_major_axis_au * AU_M;
        (SOLAR_GM_M3_S2 * (self.star_mass_msun + self.planet_mass_mearth / EARTH_MASSES_PER_SOLAR_MASS) / a_m).sqrt()
            / a_m
    }

    /// `(M/m)(R_p/a)⁵` for the planet's tide and `(m/M)(R★/a)⁵` for the star's.
    fn leverages(&self) -> (f64, f64) {
        let mass_ratio = self.planet_mass_mearth / (self.star_mass_msun * EARTH_MASSES_PER_SOLAR_MASS);
        let on_planet = (self.planet_radius_rearth * EARTH_RADIUS_AU / self.semi_major_axis_au).powi(5) / mass_ratio;
        let on_star = (self.star_radius_rsun * SOLAR_RADIUS_AU / self.semi_major_axis_au).powi(5) * mass_ratio;
        (on_planet, on_star)
    }
}

/// How fast the tides of star and planet change the orbit.
///
/// The planet turns with its orbit (pseudo-synchronously), the star slowly. Constant Q, with `X = (M/m)(R_p/a)⁵/Q'_p`
/// and `Y = (m/M)(R★/a)⁵/Q'★`: `ȧ/a = −n (63/2 e² X + 9/2 (1 + 57/4 e²) Y)`, `ė/e = −n (63/4 X + 171/16 Y)`.
/// Constant lag: Hut's series in e, with the lag that gives the same dissipation at a period of 5 d.
///
/// # Source
/// Jackson, Greenberg & Barnes 2008, `ApJ` 678, 1396, equations 1 and 2 (recalled; e² term of the star: 2009).
/// Hut 1981, A&A 99, 126; Leconte et al. 2010, A&A 516, A64 (recalled).
/// # Valid for
/// Constant Q: small eccentricities. Constant lag: any, for slow tides. A star that rotates faster than the planet
/// orbits pushes it outwards instead; that is not included.
/// # Accuracy
/// Order of magnitude.
/// # Errors
/// [`OutOfRange`] for values that describe no star, planet or closed orbit.
pub fn orbit_rates(pair: &TidalPair, tides: &Tides) -> Result<OrbitRates, OutOfRange> {
    pair.check()?;
    tides.check()?;
    Ok(rates(pair, tides, true))
}

/// [`orbit_rates`] for checked input; the star's share can be left out (giants and remnants).
pub(crate) fn rates(pair: &TidalPair, tides: &Tides, star_dissipates: bool) -> OrbitRates {
    let n = pair.mean_motion_per_s();
    let (on_planet, mut on_star) = pair.leverages();
    if !star_dissipates {
        on_star = 0.0;
    }
    let e2 = pair.eccentricity * pair.eccentricity;
    match tides.form {
        TideForm::Off => OrbitRates::default(),
        TideForm::ConstantQuality => {
            let x = on_planet / tides.planet_quality;
            let y = on_star / tides.star_quality;
            OrbitRates {
                axis_per_yr: -n * YEAR_S * (31.5 * e2 * x + 4.5 * (1.0 + 14.25 * e2) * y),
                eccentricity_per_yr: -n * YEAR_S * (15.75 * x + 10.6875 * y),
            }
        }
        TideForm::ConstantLag => {
            // The lag whose dissipation at the reference period is 1/Q': a synchronous planet sees the frequency n,
            // a star that hardly turns sees 2n.
            let reference_n = TAU / REFERENCE_PERIOD_S;
            let planet_lag_s = 3.0 / (2.0 * tides.planet_quality * reference_n);
            let star_lag_s = 3.0 / (4.0 * tides.star_quality * reference_n);
            let series = HutSeries::new(e2);
            let (x, y) = (n * n * planet_lag_s * on_planet, n * n * star_lag_s * on_star);
            OrbitRates {
                axis_per_yr: 6.0 * YEAR_S * (x * series.planet_axis - y * series.star_axis),
                eccentricity_per_yr: 16.5 * YEAR_S * (x * series.planet_eccentricity - y * series.star_eccentricity),
            }
        }
    }
}

/// The brackets of the constant-lag equations at one eccentricity.
struct HutSeries {
    planet_axis: f64,
    planet_eccentricity: f64,
    star_axis: f64,
    star_eccentricity: f64,
}

impl HutSeries {
    fn new(e2: f64) -> Self {
        if e2 <= 0.0 {
            let star_eccentricity = 18.0 / 11.0;
            return Self {
                planet_axis: 0.0,
                planet_eccentricity: 1.0 - star_eccentricity,
                star_axis: 1.0,
                star_eccentricity,
            };
        }
        let beta2 = 1.0 - e2;
        let beta = beta2.sqrt();
        let f1 = 1.0 + e2 * (15.5 + e2 * (255.0 / 8.0 + e2 * (185.0 / 16.0 + e2 * 25.0 / 64.0)));
        let f2 = 1.0 + e2 * (7.5 + e2 * (45.0 / 8.0 + e2 * 5.0 / 16.0));
        let f3 = 1.0 + e2 * (3.75 + e2 * (15.0 / 8.0 + e2 * 5.0 / 64.0));
        let f4 = 1.0 + e2 * (1.5 + e2 / 8.0);
        let f5 = 1.0 + e2 * (3.0 + e2 * 0.375);
        // Pseudo-synchronous rotation of the planet over its mean motion.
        let spin = f2 / (beta2 * beta * f5);
        let (b10, b12) = (beta2.powi(5), beta2.powi(6));
        let (b13, b15) = (b12 * beta, b12 * beta2 * beta);
        Self {
            planet_axis: f2 / b12 * spin - f1 / b15,
            planet_eccentricity: f4 / b10 * spin - 18.0 / 11.0 * f3 / b13,
            star_axis: f1 / b15,
            star_eccentricity: 18.0 / 11.0 * f3 / b13,
        }
    }
}

#[cfg(test)]
mod tests {
    use super::*;

    fn pair(period_d: f64, eccentricity: f64) -> TidalPair {
        TidalPair {
            star_mass_msun: 1.0,
            star_radius_rsun: 1.0,
            planet_mass_mearth: 317.8,
            planet_radius_rearth: 11.2,
            semi_major_axis_au: (period_d / 365.25_f64).powf(2.0 / 3.0),
            eccentricity,
        }
    }

    #[test]
    fn both_forms_agree_at_the_reference_period_and_differ_elsewhere() {
        let lag = Tides::usual(317.8);
        let quality = lag.second_opinion();
        let of = |period_d, tides: &Tides| orbit_rates(&pair(period_d, 1e-4), tides).expect("in range");
        let (a, b) = (of(5.0, &lag), of(5.0, &quality));
        assert!((a.eccentricity_per_yr / b.eccentricity_per_yr - 1.0).abs() < 2e-3);
        assert!((of(1.0, &lag).axis_per_yr / of(1.0, &quality).axis_per_yr - 5.0).abs() < 0.05);
    }

    #[test]
    fn tides_only_shrink_and_round_an_orbit_round_a_slow_star() {
        for eccentricity in [0.0, 0.05, 0.3, 0.7, 0.95, 0.999] {
            for tides in [Tides::usual(317.8), Tides::usual(317.8).second_opinion()] {
                let rates = orbit_rates(&pair(4.0, eccentricity), &tides).expect("in range");
                assert!(rates.axis_per_yr < 0.0 && rates.eccentricity_per_yr < 0.0);
                assert!(rates.axis_per_yr.is_finite() && rates.eccentricity_per_yr.is_finite());
            }
        }
    }

    #[test]
    fn the_planets_own_tide_keeps_the_angular_momentum() {
        // L ~ sqrt(a (1 - e^2)): dL/L = (da/a)/2 - e^2/(1 - e^2) (de/e).
        let mut tides = Tides::usual(317.8);
        tides.star_quality = 1e12;
        for e in [0.1, 0.5, 0.9] {
            let rates = rates(&pair(4.0, e), &tides, false);
            let change = 0.5 * rates.axis_per_yr - e * e / (1.0 - e * e) * rates.eccentricity_per_yr;
            assert!((change / rates.axis_per_yr).abs() < 1e-9, "e = {e}: {change}");
        }
    }
}
