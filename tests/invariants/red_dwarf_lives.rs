//! What holds for every red dwarf, over masses and metallicities that no table lists.

use longember::physics::star::convective::{
    ConvectiveError, ConvectiveInput, Ending, Life, Node, Options, Resolution, Stage, SurfaceOpacity, compute_with,
};
use std::ops::ControlFlow;

fn life(mass_msun: f64, metallicity_dex: f64) -> Result<Life, ConvectiveError> {
    let options = Options { resolution: Resolution::Coarse, surface: SurfaceOpacity::Modern };
    let mut told = 0.0;
    compute_with(ConvectiveInput { mass_msun, metallicity_dex }, options, &mut |share| {
        assert!((0.0..=1.0).contains(&share) && share >= told, "progress falls from {told} to {share}");
        told = share;
        ControlFlow::Continue(())
    })
}

fn numbers(node: &Node) -> [f64; 13] {
    [
        node.age_yr,
        node.mass_msun,
        node.luminosity_lsun,
        node.radius_rsun,
        node.effective_temperature_k,
        node.nuclear_luminosity_lsun,
        node.core_temperature_k,
        node.core_density_g_cm3,
        node.core_hydrogen_fraction,
        node.core_helium3_fraction,
        node.mean_hydrogen_fraction,
        node.surface_hydrogen_fraction,
        node.still_core_mass_fraction,
    ]
}

/// Checks one life, whatever its mass and metallicity.
fn check(life: &Life, label: &str) {
    for node in &life.nodes {
        assert!(numbers(node).iter().all(|value| value.is_finite()), "{label}: {node:?}");
        assert!(numbers(node)[1..8].iter().all(|value| *value >= 0.0), "{label}: {node:?}");
        assert!(numbers(node)[8..].iter().all(|value| (0.0..=1.0).contains(value)), "{label}: {node:?}");
        // Stefan–Boltzmann: L = R² (T/5772 K)⁴ in solar units.
        let shining = node.radius_rsun.powi(2) * (node.effective_temperature_k / 5772.0).powi(4);
        assert!((shining / node.luminosity_lsun - 1.0).abs() < 5e-3, "{label}: {node:?}");
    }
    for pair in life.nodes.windows(2) {
        let [a, b] = [pair[0], pair[1]];
        assert!(b.age_yr > a.age_yr, "{label}: age stands still at {}", a.age_yr);
        assert!(b.mean_hydrogen_fraction <= a.mean_hydrogen_fraction + 1e-5, "{label}: hydrogen grows at {}", a.age_yr);
        assert!((b.luminosity_lsun / a.luminosity_lsun).ln().abs() < 0.6, "{label}: light jumps at {}", a.age_yr);
        assert!(b.mass_msun <= a.mass_msun, "{label}: mass grows at {}", a.age_yr);
        assert!(b.stage >= a.stage, "{label}: back from {:?} to {:?}", a.stage, b.stage);
    }
    let arrival = life.at_age(0.0).expect("arrival");
    assert_eq!(arrival.stage, Stage::MainSequence, "{label}");
    assert!((arrival.nuclear_luminosity_lsun / arrival.luminosity_lsun - 0.99).abs() < 2e-3, "{label}: {arrival:?}");
    assert!((life.nodes[0].age_yr + life.contraction_yr).abs() < 1.0, "{label}");
}

#[test]
fn every_life_is_whole_and_smooth() {
    let cases = [(0.075, 0.0), (0.087, -1.18), (0.128, 0.29), (0.208, 0.0), (0.25, -1.7)];
    for (mass, metallicity) in cases {
        let label = format!("{mass} solar masses, {metallicity} dex");
        let life = life(mass, metallicity).unwrap_or_else(|error| panic!("{label}: {error}"));
        check(&life, &label);
        assert_eq!(life.ending, Ending::BlackDwarf, "{label}");
        let last = life.nodes[life.nodes.len() - 1];
        assert_eq!(last.stage, Stage::BlackDwarf, "{label}");
        assert!(last.effective_temperature_k < 11.0, "{label}");
    }
}

#[test]
fn lighter_stars_live_longer_and_metals_redden() {
    let lives: Vec<Life> = [0.09, 0.13, 0.17].iter().map(|mass| life(*mass, 0.0).expect("in range")).collect();
    let lifetime = |life: &Life| {
        let spent = life.nodes.iter().find(|node| node.core_hydrogen_fraction < 0.01).expect("a spent core");
        spent.age_yr
    };
    assert!(lives.windows(2).all(|pair| lifetime(&pair[0]) > lifetime(&pair[1])));
    let poor = life(0.13, -0.8).expect("in range").at_age(4e9).expect("a main-sequence star");
    let solar = lives[1].at_age(4e9).expect("a main-sequence star");
    assert!(poor.effective_temperature_k > solar.effective_temperature_k + 100.0);
    assert!(poor.luminosity_lsun > solar.luminosity_lsun);
}

#[test]
fn inputs_outside_are_refused_by_name() {
    for (mass_msun, metallicity_dex, wanted) in [
        (0.05, 0.0, "mass_msun"),
        (0.8, 0.0, "mass_msun"),
        (f64::NAN, 0.0, "mass_msun"),
        (f64::INFINITY, 0.0, "mass_msun"),
        (0.1, 1.0, "metallicity_dex"),
        (0.1, -3.0, "metallicity_dex"),
        (0.1, f64::NAN, "metallicity_dex"),
    ] {
        match life(mass_msun, metallicity_dex) {
            Err(ConvectiveError::OutOfRange { what, .. }) => assert_eq!(what, wanted),
            other => panic!("{mass_msun} {metallicity_dex}: {other:?}"),
        }
    }
}

#[test]
fn a_metal_poor_star_at_the_lower_end_is_a_brown_dwarf() {
    assert_eq!(life(0.07, -1.0), Err(ConvectiveError::BrownDwarf { mass_msun: 0.07 }));
}

#[test]
fn a_computation_stops_when_told_to() {
    let mut calls = 0;
    let input = ConvectiveInput { mass_msun: 0.1, metallicity_dex: 0.0 };
    let result = compute_with(input, Options::default(), &mut |_| {
        calls += 1;
        if calls < 5 { ControlFlow::Continue(()) } else { ControlFlow::Break(()) }
    });
    assert_eq!(result, Err(ConvectiveError::Cancelled));
    assert_eq!(calls, 5);
}
