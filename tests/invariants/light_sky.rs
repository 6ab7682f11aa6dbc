//! What holds for any sky, any magnitude and any photon count.

use longember::physics::light::{
    Atmosphere, Gas, SkyScene, Viewing, absolute_bolometric_magnitude, apparent_magnitude, correlated_temperature,
    degree_of_adaptation, disc, illuminance_of_magnitude_lx, light_through_air, luminous_flux_lm, photosynthetic_light,
    seen, sky, spectral_radiance_w_m2_sr_nm, twilight, ultraviolet_light, visual_photometry,
};
use longember::physics::light::{Surround, flower_colour_mag, torres_correction_mag};
use proptest::prelude::*;

fn any_gas() -> impl Strategy<Value = Gas> {
    prop_oneof![Just(Gas::Air), Just(Gas::CarbonDioxide)]
}

fn any_scene() -> impl Strategy<Value = SkyScene> {
    ((2.6..5.5_f64, -3.0..7.0_f64, 0.0..=90.0_f64), (any_gas(), -4.0..3.0_f64, -1.0..2.0_f64, 0.0..=1.0_f64)).prop_map(
        |((log_t, log_flux, altitude_deg), (gas, log_bar, log_g, ground_albedo))| SkyScene {
            star_temperature_k: 10.0_f64.powf(log_t),
            irradiance_w_m2: 10.0_f64.powf(log_flux),
            altitude_deg,
            atmosphere: Atmosphere {
                gas,
                surface_pressure_bar: 10.0_f64.powf(log_bar),
                surface_gravity_m_s2: 10.0_f64.powf(log_g),
                ground_albedo,
            },
        },
    )
}

proptest! {
    #[test]
    fn every_sky_is_finite_and_never_brighter_than_its_star(scene in any_scene()) {
        let found = sky(&scene).expect("in range");
        let lights = [found.star_above_air, found.disc, found.dome, found.zenith_scattered_once.unwrap_or_default()];
        for light in lights {
            prop_assert!(light.to_array().iter().all(|value| value.is_finite() && *value >= 0.0));
        }
        prop_assert!(found.disc.y <= found.star_above_air.y * (1.0 + 1e-12));
        prop_assert!(found.total_lx().is_finite());
        for viewing in Viewing::ALL {
            if let Some(light) = seen(found.dome, found.star_above_air, viewing) {
                prop_assert!(light.chromaticity.x.is_finite());
                let _ = correlated_temperature(light.chromaticity);
            }
        }
    }

    #[test]
    fn over_black_ground_no_light_is_made(scene in any_scene()) {
        let black = Atmosphere { ground_albedo: 0.0, ..scene.atmosphere };
        let found = sky(&SkyScene { atmosphere: black, ..scene }).expect("in range");
        // The dome is lit along the curved path, one over the air mass, which near the horizon exceeds the sine.
        let lit = found.star_above_air.y / found.air_mass;
        prop_assert!(found.dome.y + found.disc.y / found.air_mass <= lit * (1.0 + 1e-9));
    }

    #[test]
    fn a_sinking_star_reddens_and_dims(
        star_temperature_k in 2000.0..40_000.0_f64, altitude_deg in 1.0..90.0_f64, drop in 0.1..0.9_f64,
    ) {
        let at = |altitude_deg| sky(&SkyScene {
            star_temperature_k, irradiance_w_m2: 1361.0, altitude_deg, atmosphere: Atmosphere::EARTH,
        }).expect("in range");
        let (high, low) = (at(altitude_deg), at(altitude_deg * drop));
        prop_assert!(low.disc.y < high.disc.y && low.total_lx() < high.total_lx());
        let x = |light: longember::physics::light::Tristimulus| light.chromaticity().expect("light").x;
        prop_assert!(x(low.disc) > x(high.disc));
    }

    #[test]
    fn more_air_lets_less_light_through(
        temperature_k in 2000.0..40_000.0_f64, few in 0.0..20.0_f64, more in 0.1..20.0_f64, gas in any_gas(),
    ) {
        let atmosphere = Atmosphere { gas, ..Atmosphere::EARTH };
        let through = |air_masses| light_through_air(temperature_k, 1.0, &atmosphere, air_masses).expect("in range").y;
        prop_assert!(through(few + more) < through(few));
    }

    #[test]
    fn any_numbers_give_a_finite_answer_or_a_refusal(a in any::<f64>(), b in any::<f64>()) {
        let plain = [
            spectral_radiance_w_m2_sr_nm(a, b),
            luminous_flux_lm(a, b),
            absolute_bolometric_magnitude(a),
            apparent_magnitude(a, b),
            illuminance_of_magnitude_lx(a),
            flower_colour_mag(a),
            torres_correction_mag(a),
            degree_of_adaptation(a, Surround::Average),
            photosynthetic_light(a, b).map(|light| light.photon_flux_umol_m2_s),
            ultraviolet_light(a, b).map(|light| light.uvc_w_m2),
            visual_photometry(a, b).map(|light| light.bolometric_correction_mag + light.b_minus_v_mag),
            twilight(a, b).map(|light| light.illuminance_lx.unwrap_or_default()),
            disc(a, b).map(|disc| disc.diameter_deg + disc.solid_angle_sr),
            sky(&SkyScene { star_temperature_k: a, irradiance_w_m2: b, altitude_deg: 40.0, atmosphere: Atmosphere::EARTH })
                .map(|sky| sky.total_lx()),
        ];
        for value in plain.into_iter().flatten() {
            prop_assert!(value.is_finite());
        }
    }

    #[test]
    fn every_star_in_range_has_its_photometry(log_t in 3.463..7.0_f64, log_g_dex in -1.0..9.0_f64) {
        let found = visual_photometry(10.0_f64.powf(log_t), log_g_dex).expect("in range");
        prop_assert!((-0.4..2.3).contains(&found.b_minus_v_mag));
        prop_assert!((-25.0..0.1).contains(&found.bolometric_correction_mag));
        prop_assert!(found.uncertainty_mag > 0.0);
    }

    #[test]
    fn photosynthetic_photons_never_outnumber_all(temperature_k in 500.0..1e6_f64, flux in 0.0..1e5_f64) {
        let light = photosynthetic_light(flux, temperature_k).expect("in range");
        let all = longember::physics::light::photon_flux_umol_m2_s(flux, temperature_k).expect("in range");
        prop_assert!(light.photon_flux_umol_m2_s + light.far_red_photon_flux_umol_m2_s <= all * (1.0 + 1e-12));
        prop_assert!(light.irradiance_w_m2 <= flux);
    }
}
