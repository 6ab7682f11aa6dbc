//! Starlight, equilibrium temperatures, greenhouse and the habitable zone against published values.

use crate::planet_check::{near, near_share};
use longember::physics::planet::Redistribution;
use longember::physics::planet::greenhouse::{Greenhouse, grey_optical_depth};
use longember::physics::planet::habitable_zone::{ZoneLimit, limit_flux};
use longember::physics::planet::irradiation::{
    equilibrium_temperature_k, extreme_insolation_earth, flux_w_m2, orbit_mean_insolation_earth,
    time_mean_temperature_k,
};
use longember::units::constants as c;

const STANDARD: &str = "IAU 2015 Resolution B3, CODATA 2022, SI 2019";

#[test]
fn constants_are_the_standard_ones() {
    for (what, ours, published) in [
        ("nominal solar luminosity", c::SOLAR_LUMINOSITY_W, 3.828e26),
        ("nominal solar radius", c::SOLAR_RADIUS_M, 6.957e8),
        ("nominal solar GM", c::SOLAR_GM_M3_S2, 1.3271244e20),
        ("nominal equatorial radius of the Earth", c::EARTH_RADIUS_M, 6.3781e6),
        ("nominal GM of the Earth", c::EARTH_GM_M3_S2, 3.986004e14),
        ("nominal equatorial radius of Jupiter", c::JUPITER_RADIUS_M, 7.1492e7),
        ("nominal GM of Jupiter", c::JUPITER_GM_M3_S2, 1.2668653e17),
        ("zero point of bolometric magnitude", c::BOLOMETRIC_ZERO_W, 3.0128e28),
        ("astronomical unit", c::AU_M, 1.495978707e11),
        ("constant of gravitation", c::GRAVITATION_M3_KG_S2, 6.6743e-11),
        ("Julian year", c::YEAR_S, 31_557_600.0),
    ] {
        near_share(what, ours, published, 0.0, STANDARD);
    }
    near_share("parsec", c::PARSEC_M, 3.085677581491367e16, 1e-12, STANDARD);
    near_share("Stefan-Boltzmann", c::STEFAN_BOLTZMANN_W_M2_K4, 5.670374419184431e-8, 1e-12, STANDARD);
    near_share("solar mass", c::SOLAR_MASS_KG, 1.98841e30, 1e-5, STANDARD);
    let teff_k = (c::SOLAR_LUMINOSITY_W
        / (4.0 * std::f64::consts::PI * c::SOLAR_RADIUS_M.powi(2) * c::STEFAN_BOLTZMANN_W_M2_K4))
        .powf(0.25);
    near("solar effective temperature", teff_k, 5772.0, 0.1, STANDARD);
    near("sunlight at 1 au", flux_w_m2(1.0, 1.0).unwrap(), 1361.17, 0.01, STANDARD);
}

#[test]
fn equilibrium_temperatures_of_the_solar_system() {
    let sheet = "planetary fact sheet (space agency, public)";
    let of_flux = |s: f64, albedo: f64| equilibrium_temperature_k(s, albedo, 0.25, 1.0).unwrap();
    near("Earth, 1361.0 W/m2", of_flux(1361.0, 0.306), 254.0, 0.1, sheet);
    near("Moon, 1361.0 W/m2", of_flux(1361.0, 0.11), 270.4, 0.1, sheet);
    near("Mars, 589.2 W/m2", of_flux(589.2, 0.25), 210.1, 0.1, "older edition of the fact sheet");
    near("Earth, 1367.6 W/m2", of_flux(1367.6, 0.306), 254.3, 0.1, "older edition of the fact sheet");
    // Distances and albedos of the same sheet, recalled.
    for (name, a_au, albedo, published_k) in [
        ("Mercury", 0.387098, 0.068, 439.6),
        ("Venus", 0.723332, 0.77, 226.6),
        ("Mars", 1.52368, 0.25, 209.8),
        ("Jupiter", 5.2044, 0.343, 109.9),
        ("Saturn", 9.5826, 0.342, 81.0),
        ("Uranus", 19.2184, 0.3, 58.1),
        ("Neptune", 30.11, 0.29, 46.6),
    ] {
        near(name, of_flux(flux_w_m2(1.0, a_au).unwrap(), albedo), published_k, 0.2, "fact sheet (from memory)");
    }
}

#[test]
fn averages_over_an_eccentric_orbit() {
    let a_au = 0.387098;
    let e = 0.20563;
    let at_axis = flux_w_m2(1.0, a_au).unwrap();
    let mean_k = time_mean_temperature_k(at_axis, 0.088, 0.25, 1.0, e).unwrap();
    near("Mercury, time mean", mean_k, 436.3, 0.6, "Mallama 2017 (abstract)");
    let gain = orbit_mean_insolation_earth(1.0, 1.0, e).unwrap();
    near("mean flux of Mercury's orbit", gain, 1.021837, 1e-6, "1/sqrt(1 - e^2), exact");
    let extremes = extreme_insolation_earth(1.0, 1.0, e).unwrap();
    let ratio = extremes.periastron_insolation_earth / extremes.apastron_insolation_earth;
    near("nearest over farthest", ratio, ((1.0 + e) / (1.0 - e)).powi(2), 1e-12, "inverse square");
}

#[test]
fn redistribution_factors() {
    let of = |spread: Redistribution| equilibrium_temperature_k(1361.0, 0.0, spread.factor(), 1.0).unwrap();
    near("whole planet", of(Redistribution::WholePlanet), 278.32, 0.02, "closed form");
    near("day side seen full", of(Redistribution::DaySideFullPhase), 355.66, 0.02, "closed form");
    near("sub-stellar point", of(Redistribution::SubStellar), 278.32 * 2.0_f64.sqrt(), 0.03, "closed form");
}

#[test]
fn grey_optical_depths_of_earth_and_venus() {
    near("Earth", grey_optical_depth(288.0, 254.0).unwrap(), 0.87, 0.005, "closed form");
    near("Venus", grey_optical_depth(737.0, 226.6).unwrap(), 147.9, 0.5, "closed form");
    let earth_k = Greenhouse::FixedIncrement { increment_k: 34.0 }.surface_temperature_k(254.0).unwrap();
    near("Earth by increment", earth_k, 288.0, 0.1, "fact sheet");
}

#[test]
fn habitable_zone_of_the_sun() {
    let source = "Kopparapu et al. 2014, ApJL 787, L29, table 1";
    let of = |limit, mass| limit_flux(limit, 5780.0, mass).unwrap().distance_au(1.0).unwrap();
    near("recent Venus", of(ZoneLimit::RecentVenus, 1.0), 0.7504, 1e-4, source);
    near("runaway greenhouse", of(ZoneLimit::RunawayGreenhouse, 1.0), 0.9504, 1e-4, source);
    near("maximum greenhouse", of(ZoneLimit::MaximumGreenhouse, 1.0), 1.676, 1e-4, source);
    near("early Mars", of(ZoneLimit::EarlyMars, 1.0), 1.7678, 1e-4, source);
    near("runaway, 5 Earth masses", of(ZoneLimit::RunawayGreenhouse, 5.0), 0.9175, 1e-4, source);
    near("runaway, 0.1 Earth masses", of(ZoneLimit::RunawayGreenhouse, 0.1), 1.005, 1e-4, source);
    near("moist, 2013", of(ZoneLimit::MoistGreenhouse, 1.0), 0.99, 0.005, "Kopparapu et al. 2013 (0.99 au recalled)");
    near(
        "maximum greenhouse, 2013",
        of(ZoneLimit::MaximumGreenhouse, 1.0),
        1.69,
        0.02,
        "Kopparapu et al. 2013, erratum",
    );
}

#[test]
fn habitable_zone_limits_of_other_stars() {
    let source = "Kopparapu et al. 2014, coefficients evaluated";
    let of = |limit, teff_k| limit_flux(limit, teff_k, 1.0).unwrap().insolation_earth;
    near("runaway at 2600 K", of(ZoneLimit::RunawayGreenhouse, 2600.0), 0.9129, 2e-4, source);
    near("maximum greenhouse at 3700 K", of(ZoneLimit::MaximumGreenhouse, 3700.0), 0.2533, 2e-4, source);
    near("runaway at 7200 K", of(ZoneLimit::RunawayGreenhouse, 7200.0), 1.2964, 2e-4, source);
    // The polynomial turns over at 7979 K, so it may not be followed there: the value at 7200 K is kept.
    near("runaway at 7979 K", of(ZoneLimit::RunawayGreenhouse, 7979.0), 1.2964, 2e-4, "held outside its range");
    assert!(limit_flux(ZoneLimit::RunawayGreenhouse, 7979.0, 1.0).unwrap().extrapolated);
    let three_d = 375.0 / (1361.0 / 4.0);
    near("runaway against a 3-D model", of(ZoneLimit::RunawayGreenhouse, 5772.0), three_d, 0.01, "Leconte et al. 2013");
}
