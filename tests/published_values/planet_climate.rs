//! The climate model against published values and an independent implementation of the same equations.

use crate::planet_check::{near, near_share};
use longember::physics::planet::climate::reflection::{ice_albedo, open_surface_gain};
use longember::physics::planet::climate::{ClimateCurve, IceLineModel, OutgoingInfrared, WaterWorldAir};
use longember::physics::planet::habitable_zone::{ZoneLimit, limit_flux};

const POLYNOMIAL: &str = "Williams & Kasting 1997, polynomial";

fn air(carbon_dioxide_bar: f64) -> WaterWorldAir {
    WaterWorldAir { carbon_dioxide_bar, ..WaterWorldAir::default() }
}

fn model(carbon_dioxide_bar: f64, teff_k: f64) -> IceLineModel {
    IceLineModel::new(&air(carbon_dioxide_bar), teff_k).unwrap()
}

fn runaway(teff_k: f64) -> f64 {
    limit_flux(ZoneLimit::RunawayGreenhouse, teff_k, 1.0).unwrap().insolation_earth
}

#[test]
fn outgoing_infrared() {
    let of = |t, p| OutgoingInfrared::new(p).unwrap().flux_w_m2(t);
    near("288 K, 0.33 mbar", of(288.0, 3.3e-4), 236.3, 0.2, POLYNOMIAL);
    near("273 K, 0.1 bar", of(273.0, 0.1), 167.9, 0.1, POLYNOMIAL);
    near("250 K, 1 bar", of(250.0, 1.0), 93.0, 0.1, POLYNOMIAL);
    let doubling = of(288.0, 3e-4) - of(288.0, 6e-4);
    near("doubling carbon dioxide, W/m2", doubling, 1.7, 0.2, "evaluated; Myhre et al. 1998 find 3.7");
}

#[test]
fn colours_of_stars() {
    for (teff_k, albedo) in [(6600.0, 0.604), (5772.0, 0.566), (4500.0, 0.481), (3400.0, 0.375), (2600.0, 0.275)] {
        near("ice albedo", ice_albedo(teff_k).unwrap(), albedo, 1e-3, "independent evaluation of the same bands");
    }
    for (teff_k, gain) in [(2600.0, 1.21), (3400.0, 1.19), (5772.0, 1.0), (6600.0, 0.91)] {
        near("open water's gain", open_surface_gain(teff_k).unwrap(), gain, 0.01, "Kopparapu et al. 2014");
    }
}

#[test]
fn the_earth() {
    let earth = model(2.8e-4, 5772.0).from_warm(1.0).unwrap();
    near("mean", earth.mean_k, 288.0, 0.2, "observed, fitted");
    near("ice line", earth.ice_line_deg.unwrap(), 72.0, 0.5, "North 1975, fitted");
    near("equator", earth.equator_k, 301.9, 0.2, "independent implementation");
    near("pole", earth.pole_k, 258.4, 0.3, "independent implementation");
    near("planetary albedo", earth.planetary_albedo, 0.3075, 1e-3, "independent implementation");
}

#[test]
fn means_along_both_branches() {
    let source = "independent implementation";
    let sun = model(2.8e-4, 5772.0);
    for (s, mean_k) in [
        (0.92, 265.4),
        (0.94, 273.5),
        (0.96, 278.9),
        (0.98, 283.6),
        (1.02, 292.1),
        (1.05, 297.0),
        (1.1, 305.9),
        (1.107, 307.2),
    ] {
        near(&format!("open at {s}"), sun.from_warm(s).unwrap().mean_k, mean_k, 0.3, source);
    }
    for (s, mean_k) in [(0.4, 196.3), (0.6, 210.8), (0.8, 225.2), (1.0, 239.7), (1.1, 247.1), (1.15, 251.0)] {
        near(&format!("frozen at {s}"), sun.from_frozen(s).unwrap().mean_k, mean_k, 0.3, source);
    }
}

#[test]
fn freezing_of_planets_of_other_stars() {
    let source = "Shields et al. 2013 (abstract), three-dimensional";
    let freeze = |teff_k| ClimateCurve::follow(&model(2.8e-4, teff_k), 1.3).freeze_insolation_earth;
    near("G star", freeze(5772.0), 0.92, 0.01, source);
    near("M star", freeze(3400.0), 0.73, 0.01, source);
    near("F star", freeze(6600.0), 0.98, 0.04, source);
}

#[test]
fn thawing_meets_the_runaway_limit_for_white_stars_only() {
    let thaw = |p, teff_k| ClimateCurve::follow(&model(p, teff_k), 1.4).thaw_insolation_earth;
    near("thaw of a G star's planet", thaw(2.8e-4, 5772.0), 1.16, 0.005, "independent implementation");
    let ratio = |teff_k| thaw(2.8e-4, teff_k) / runaway(teff_k);
    near("thaw over runaway, G", ratio(5772.0), 1.05, 0.03, "Yang et al. 2017: above one");
    assert!(ratio(6600.0) > 1.0, "Yang et al. 2017: F stars' planets go from ice to steam");
    assert!(ratio(3400.0) < 1.0, "Yang et al. 2017: M stars' planets have a mild phase");
    // Carbon dioxide that thaws a planet in 0.94 of the Earth's sunlight: 0.12 bar to a factor of two.
    assert!(thaw(0.06, 5772.0) > 0.94 && thaw(0.24, 5772.0) < 0.94, "Caldeira & Kasting 1992 (recalled)");
}

#[test]
fn the_ice_albedo_decides_the_thaw_of_red_and_white_stars_alike() {
    near_share("thaw at 2600 K over thaw at 7200 K", thaw_ratio(), 0.704 / 1.347, 0.01, "independent implementation");
}

fn thaw_ratio() -> f64 {
    let thaw = |teff_k| ClimateCurve::follow(&model(2.8e-4, teff_k), 1.4).thaw_insolation_earth;
    thaw(2600.0) / thaw(7200.0)
}

/// Effective temperature, K; carbon dioxide, bar; freeze; thaw; mean just after the thaw, K. Every equation solved by
/// relaxation and bisection in an independent implementation, to 5e-4.
const THRESHOLDS: [(f64, f64, f64, f64, f64); 63] = [
    (2600.0, 2.8e-4, 0.676, 0.704, 266.0),
    (3000.0, 2.8e-4, 0.702, 0.755, 273.5),
    (3400.0, 2.8e-4, 0.726, 0.811, 282.8),
    (3800.0, 2.8e-4, 0.750, 0.869, 292.6),
    (4400.0, 2.8e-4, 0.790, 0.958, 305.0),
    (5000.0, 2.8e-4, 0.839, 1.048, 314.4),
    (5772.0, 2.8e-4, 0.917, 1.160, 320.1),
    (6500.0, 2.8e-4, 1.000, 1.260, 318.0),
    (7200.0, 2.8e-4, 1.072, 1.347, 316.6),
    (2600.0, 0.001, 0.667, 0.695, 266.1),
    (3000.0, 0.001, 0.693, 0.745, 273.7),
    (3400.0, 0.001, 0.716, 0.800, 283.0),
    (3800.0, 0.001, 0.740, 0.857, 292.8),
    (4400.0, 0.001, 0.779, 0.945, 305.4),
    (5000.0, 0.001, 0.827, 1.034, 315.0),
    (5772.0, 0.001, 0.905, 1.145, 321.0),
    (6500.0, 0.001, 0.986, 1.243, 318.7),
    (7200.0, 0.001, 1.058, 1.330, 317.3),
    (2600.0, 0.01, 0.627, 0.653, 266.1),
    (3000.0, 0.01, 0.651, 0.701, 273.4),
    (3400.0, 0.01, 0.674, 0.752, 282.2),
    (3800.0, 0.01, 0.695, 0.806, 291.2),
    (4400.0, 0.01, 0.732, 0.888, 302.2),
    (5000.0, 0.01, 0.777, 0.972, 310.0),
    (5772.0, 0.01, 0.850, 1.076, 313.6),
    (6500.0, 0.01, 0.927, 1.168, 312.4),
    (7200.0, 0.01, 0.994, 1.249, 311.6),
    (2600.0, 0.1, 0.536, 0.557, 266.4),
    (3000.0, 0.1, 0.556, 0.598, 273.2),
    (3400.0, 0.1, 0.574, 0.641, 280.8),
    (3800.0, 0.1, 0.593, 0.687, 288.2),
    (4400.0, 0.1, 0.624, 0.757, 296.9),
    (5000.0, 0.1, 0.662, 0.828, 302.5),
    (5772.0, 0.1, 0.724, 0.917, 304.9),
    (6500.0, 0.1, 0.789, 0.996, 304.1),
    (7200.0, 0.1, 0.847, 1.065, 303.5),
    (2600.0, 0.3, 0.470, 0.489, 267.2),
    (3000.0, 0.3, 0.488, 0.525, 273.7),
    (3400.0, 0.3, 0.504, 0.563, 281.0),
    (3800.0, 0.3, 0.519, 0.603, 287.5),
    (4400.0, 0.3, 0.545, 0.665, 295.3),
    (5000.0, 0.3, 0.579, 0.728, 300.2),
    (5772.0, 0.3, 0.633, 0.806, 302.3),
    (6500.0, 0.3, 0.690, 0.875, 301.6),
    (7200.0, 0.3, 0.740, 0.936, 301.1),
    (2600.0, 1.0, 0.382, 0.399, 269.1),
    (3000.0, 1.0, 0.396, 0.429, 275.7),
    (3400.0, 1.0, 0.408, 0.460, 282.4),
    (3800.0, 1.0, 0.419, 0.493, 288.4),
    (4400.0, 1.0, 0.440, 0.544, 295.7),
    (5000.0, 1.0, 0.465, 0.594, 300.1),
    (5772.0, 1.0, 0.509, 0.658, 302.0),
    (6500.0, 1.0, 0.555, 0.715, 301.4),
    (7200.0, 1.0, 0.595, 0.765, 301.0),
    (2600.0, 3.0, 0.288, 0.305, 273.9),
    (3000.0, 3.0, 0.297, 0.328, 280.9),
    (3400.0, 3.0, 0.304, 0.352, 287.8),
    (3800.0, 3.0, 0.311, 0.378, 294.1),
    (4400.0, 3.0, 0.324, 0.417, 301.3),
    (5000.0, 3.0, 0.342, 0.456, 305.6),
    (5772.0, 3.0, 0.373, 0.505, 307.3),
    (6500.0, 3.0, 0.407, 0.548, 306.8),
    (7200.0, 3.0, 0.437, 0.586, 306.3),
];

#[test]
fn freeze_and_thaw_of_an_independent_implementation() {
    for (teff_k, p, freeze, thaw, after_k) in THRESHOLDS {
        let curve = ClimateCurve::follow(&model(p, teff_k), 1.4);
        let at = format!("{teff_k} K, {p} bar");
        near(&format!("freeze, {at}"), curve.freeze_insolation_earth, freeze, 0.002, "independent implementation");
        near(&format!("thaw, {at}"), curve.thaw_insolation_earth, thaw, 0.002, "independent implementation");
        let after = curve.open_climate(thaw + 0.001).unwrap();
        near(&format!("after the thaw, {at}"), after.mean_k, after_k, 0.5, "independent implementation");
    }
}
