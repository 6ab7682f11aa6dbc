//! The layers of red dwarfs against the theory of gas spheres and against published structures.

use crate::red_dwarf_lives::{M010, M015, M020, M040};
use longember::physics::star::convective::{Life, Profile};

const GRAVITATION: f64 = 6.674_3e-8;
const SUN_G: f64 = 1.988_41e33;
const SUN_CM: f64 = 6.957e10;
const BAR: f64 = 1e6;

fn inside(life: &Life, age_yr: f64) -> Profile {
    life.profile_at(age_yr).expect("a structure")
}

#[test]
fn a_mixed_star_is_the_gas_sphere_of_index_three_halves() {
    // Chandrasekhar 1939, An Introduction to the Study of Stellar Structure, table 4: ρ_c over the mean 5.9907,
    // P_c = 0.7702 GM²/R⁴ for n = 1.5. Coulomb forces, partial ionisation and the surface bend the star away from it.
    for life in [&*M010, &*M015, &*M020] {
        let (star, layers) = (life.at_age(5e9).expect("a star"), inside(life, 5e9).layers);
        let radius_cm = star.radius_rsun * SUN_CM;
        let mean = star.mass_msun * SUN_G / (4.0 / 3.0 * std::f64::consts::PI * radius_cm.powi(3));
        let condensed = layers[0].density_g_cm3 / mean;
        assert!((condensed / 5.9907 - 1.0).abs() < 0.12, "{}: {condensed}", star.mass_msun);
        let unit = GRAVITATION * (star.mass_msun * SUN_G).powi(2) / radius_cm.powi(4);
        let pressed = layers[0].pressure_bar * BAR / unit;
        assert!((pressed / 0.7702 - 1.0).abs() < 0.15, "{}: {pressed}", star.mass_msun);
        assert!(layers.iter().all(|layer| layer.is_convective), "{} is not mixed throughout", star.mass_msun);
    }
}

#[test]
fn the_still_core_of_a_heavier_red_dwarf_is_where_it_was_published() {
    // Baraffe et al. 2015, A&A 577, A42, structure table: 0.4 solar masses at 5 Gyr has a radiative core of 0.187. Below
    // the envelope radiation only just suffices, so that a small difference in opacity moves the boundary far.
    let profile = inside(&M040, 5e9 - M040.contraction_yr);
    let zones = profile.convective_zones();
    let envelope = zones.iter().find(|zone| profile.layers[zone[1]].mass_fraction() > 0.999).expect("an envelope");
    let still_msun = 0.4 * profile.layers[envelope[0]].mass_fraction();
    assert!((still_msun / 0.187 - 1.0).abs() < 0.25, "{still_msun}");
}

#[test]
fn layers_stand_in_order_and_agree_with_the_moment() {
    for life in [&*M010, &*M015, &*M020, &*M040] {
        let last_yr = life.profiles[life.profiles.len() - 1].age_yr;
        for step in 0..200 {
            let age_yr = last_yr * (f64::from(step) / 200.0).powf(0.2);
            let (star, layers) = (life.at_age(age_yr).expect("a star"), inside(life, age_yr).layers);
            let [centre, surface] = [layers[0], layers[layers.len() - 1]];
            let label = format!("{} at {age_yr:e}", star.mass_msun);
            assert!((centre.temperature_k / star.core_temperature_k).ln().abs() < 0.05, "{label}");
            assert!((centre.density_g_cm3 / star.core_density_g_cm3).ln().abs() < 0.15, "{label}");
            assert!(
                (surface.temperature_k / star.effective_temperature_k).ln().abs() < 0.1,
                "{label}: {surface:?} {star:?}"
            );
            assert!(
                (centre.degeneracy_ratio / star.core_degeneracy_ratio()).ln().abs() < 0.1,
                "{label}: {surface:?} {star:?}"
            );
            assert_eq!((centre.mass_fraction(), centre.radius_fraction), (0.0, 0.0), "{label}");
            assert_eq!((surface.mass_fraction(), surface.radius_fraction), (1.0, 1.0), "{label}");
            for pair in layers.windows(2) {
                assert!(pair[1].mass_fraction() >= pair[0].mass_fraction(), "{label}");
                assert!(pair[1].radius_fraction > 0.999 * pair[0].radius_fraction, "{label}");
                assert!(pair[1].pressure_bar < 1.001 * pair[0].pressure_bar, "{label}");
            }
            for layer in &layers {
                let parts = [layer.hydrogen_fraction, layer.helium3_fraction, layer.helium4_fraction];
                assert!(parts.iter().all(|part| (0.0..=1.0).contains(part)), "{label}: {layer:?}");
                assert!((0.98..0.99).contains(&parts.iter().sum::<f64>()), "{label}: {layer:?}");
                assert!(layer.degeneracy_ratio > 0.0 && layer.luminosity_fraction.is_finite(), "{label}: {layer:?}");
            }
        }
    }
}
