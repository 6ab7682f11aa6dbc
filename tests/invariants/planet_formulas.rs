//! What must hold for the formulas of planets at any input, and what they refuse.

use longember::physics::planet::bulk::{default_radius_rearth, density_kg_m3, escape_speed_km_s, gravity_m_s2};
use longember::physics::planet::climate::{ClimateCurve, IceLineModel, OutgoingInfrared, WaterWorldAir};
use longember::physics::planet::deep_time::{InnerHeat, background_temperature_k};
use longember::physics::planet::habitable_zone::{ZoneLimit, limit_flux, zone_place};
use longember::physics::planet::irradiation::{
    equilibrium_temperature_k, extreme_insolation_earth, flux_w_m2, orbit_mean_insolation_earth,
    time_mean_temperature_k,
};
use longember::physics::planet::orbit::{AfterSuddenLoss, after_sudden_loss, period_yr};
use longember::physics::planet::tides::equilibrium_tide::{TidalPair, orbit_rates};
use longember::physics::planet::{OrbitHistory, OrbitInput, PlanetHistory, PlanetInput, StarPoint, Tides};
use proptest::prelude::*;

fn any_number() -> impl Strategy<Value = f64> {
    prop_oneof![
        any::<f64>(),
        Just(f64::NAN),
        Just(f64::INFINITY),
        Just(0.0),
        Just(-1.0),
        (-30.0_f64..30.0).prop_map(|exponent| 10.0_f64.powf(exponent))
    ]
}

proptest! {
    #![proptest_config(ProptestConfig { cases: 3000, failure_persistence: None, ..ProptestConfig::default() })]

    #[test]
    fn any_number_is_answered_with_a_finite_figure_or_refused(
        a in any_number(), b in any_number(), c in any_number(), d in any_number(), e in any_number(),
    ) {
        let finite = |answer: Result<f64, longember::physics::planet::OutOfRange>| answer.is_ok_and(f64::is_finite) || answer.is_err();
        prop_assert!(finite(flux_w_m2(a, b)));
        prop_assert!(finite(orbit_mean_insolation_earth(a, b, c)));
        prop_assert!(finite(equilibrium_temperature_k(a, b, c, d)));
        prop_assert!(finite(time_mean_temperature_k(a, b, c, d, e)));
        prop_assert!(finite(period_yr(a, b, c)));
        prop_assert!(finite(gravity_m_s2(a, b)));
        prop_assert!(finite(escape_speed_km_s(a, b)));
        prop_assert!(finite(density_kg_m3(a, b)));
        prop_assert!(finite(default_radius_rearth(a).map(|radius| radius.radius_rearth)));
        prop_assert!(finite(limit_flux(ZoneLimit::RunawayGreenhouse, a, b).and_then(|flux| flux.distance_au(c))));
        prop_assert!(zone_place(a, b, c).is_ok() || !(a >= 0.0 && b > 0.0 && c > 0.0) || a > 1e29 || b.max(c) > 1e29 || b.min(c) < 1e-29);
        prop_assert!(finite(InnerHeat::default().with_floor_k(a, b)));
        if let Ok(AfterSuddenLoss::Bound { semi_major_axis_au, eccentricity }) = after_sudden_loss(a, b, c, d) {
            prop_assert!(semi_major_axis_au.is_finite() && (0.0..1.0).contains(&eccentricity));
        }
        let pair = TidalPair {
            star_mass_msun: a.abs().clamp(0.05, 150.0), star_radius_rsun: b.abs().clamp(1e-3, 1500.0),
            planet_mass_mearth: c.abs().clamp(1e-6, 3e4), planet_radius_rearth: d.abs().clamp(0.01, 30.0),
            semi_major_axis_au: e.abs().clamp(1e-5, 1e6), eccentricity: (a * 1e3).fract().abs(),
        };
        if let Ok(rates) = orbit_rates(&pair, &Tides::usual(1.0)) {
            prop_assert!(rates.axis_per_yr.is_finite() && rates.eccentricity_per_yr.is_finite());
        }
    }

    #[test]
    fn a_walk_answers_or_refuses_whatever_it_is_given(
        axis in any_number(), e in any_number(), mass in any_number(), radius in any_number(),
        star in any_number(), light in any_number(), teff in any_number(), age in any_number(),
    ) {
        let orbit = OrbitInput { semi_major_axis_au: axis, eccentricity: e, mass_mearth: mass, radius_rearth: radius };
        let point = |age_yr, mass_msun, luminosity_lsun, effective_temperature_k| StarPoint {
            age_yr, mass_msun, luminosity_lsun, radius_rsun: 1.0, effective_temperature_k, envelope_mass_msun: 0.0,
            is_giant: false, is_remnant: false, lost_mass_suddenly: false,
        };
        let track = [point(0.0, 1.0, 1.0, 5772.0), point(age, star, light, teff)];
        if let Ok(history) = OrbitHistory::walk(&orbit, &track) {
            prop_assert!(history.nodes().iter().all(|node| node.semi_major_axis_au.is_finite()));
        }
        if let Ok(history) = PlanetHistory::walk(&PlanetInput::usual(orbit), &track) {
            prop_assert!(history.events().iter().all(|event| event.age_yr.is_finite()));
        }
    }

    #[test]
    fn more_light_is_warmer_and_farther_is_colder(l in 1e-6_f64..1e6, a in 1e-3_f64..1e4, albedo in 0.0_f64..0.99) {
        let at = |l, a| equilibrium_temperature_k(flux_w_m2(l, a).unwrap(), albedo, 0.25, 1.0).unwrap();
        prop_assert!(at(2.0 * l, a) > at(l, a) && at(l, 2.0 * a) < at(l, a));
        // Twice as far halves the square of the temperature.
        prop_assert!((at(l, a) / at(l, 4.0 * a) - 2.0).abs() < 1e-12);
    }

    #[test]
    fn the_mean_flux_lies_between_the_extremes(e in 0.0_f64..0.99) {
        let mean = orbit_mean_insolation_earth(1.0, 1.0, e).unwrap();
        let extremes = extreme_insolation_earth(1.0, 1.0, e).unwrap();
        prop_assert!(mean <= extremes.periastron_insolation_earth && mean >= extremes.apastron_insolation_earth);
    }

    #[test]
    fn zone_limits_keep_their_order(teff in 500.0_f64..2e5, mass in 0.01_f64..20.0) {
        let of = |limit| limit_flux(limit, teff, mass).unwrap().insolation_earth;
        prop_assert!(of(ZoneLimit::RecentVenus) > of(ZoneLimit::RunawayGreenhouse));
        prop_assert!(of(ZoneLimit::RunawayGreenhouse) > of(ZoneLimit::MaximumGreenhouse));
        prop_assert!(of(ZoneLimit::MaximumGreenhouse) > of(ZoneLimit::EarlyMars));
        prop_assert!(of(ZoneLimit::EarlyMars) > 0.0);
    }

    #[test]
    fn the_sky_only_cools(early in 1e8_f64..1e15, later in 1.0_f64..100.0) {
        prop_assert!(background_temperature_k(early * later) <= background_temperature_k(early));
        prop_assert!(background_temperature_k(early * later) > 0.0);
    }
}

proptest! {
    #![proptest_config(ProptestConfig { cases: 40, failure_persistence: None, ..ProptestConfig::default() })]

    #[test]
    fn folds_are_where_relaxing_climates_fall_over(
        log_p in -4.0_f64..0.477, obliquity_deg in 0.0_f64..90.0, heat in 0.3_f64..3.0, teff in 2600.0_f64..7200.0,
    ) {
        let air = WaterWorldAir {
            carbon_dioxide_bar: 10.0_f64.powf(log_p).min(3.0), obliquity_deg, heat_transport_w_m2_k: heat,
        };
        let model = IceLineModel::new(&air, teff).unwrap();
        let curve = ClimateCurve::follow(&model, 1.4);
        let warmest_k = |s: f64, warm: bool| {
            if warm { model.from_warm(s) } else { model.from_frozen(s) }.unwrap().warmest_k
        };
        prop_assert!(warmest_k(1.01 * curve.freeze_insolation_earth, true) > 263.0, "{air:?} {teff} {curve:?}");
        prop_assert!(warmest_k(0.99 * curve.freeze_insolation_earth, true) < 263.3, "{air:?} {teff} {curve:?}");
        prop_assert!(warmest_k(1.01 * curve.thaw_insolation_earth, false) > 265.0, "{air:?} {teff} {curve:?}");
        prop_assert!(warmest_k(0.99 * curve.thaw_insolation_earth, false) < 265.3, "{air:?} {teff} {curve:?}");
    }
}

proptest! {
    #![proptest_config(ProptestConfig { cases: 150, failure_persistence: None, ..ProptestConfig::default() })]

    #[test]
    fn every_climate_curve_has_its_folds_in_order(
        log_p in -4.0_f64..0.477, obliquity_deg in 0.0_f64..90.0, heat in 0.3_f64..3.0, teff in 2600.0_f64..7200.0,
    ) {
        let air = WaterWorldAir {
            carbon_dioxide_bar: 10.0_f64.powf(log_p).min(3.0), obliquity_deg, heat_transport_w_m2_k: heat,
        };
        let model = IceLineModel::new(&air, teff).unwrap();
        let curve = ClimateCurve::follow(&model, 1.4);
        prop_assert!(curve.freeze_insolation_earth > 0.15 && curve.freeze_insolation_earth < 1.6, "{air:?} {teff}");
        prop_assert!(curve.thaw_insolation_earth >= curve.freeze_insolation_earth - 2e-3, "{air:?} {teff}");
        prop_assert!(curve.thaw_insolation_earth < 2.5, "{air:?} {teff}");
        let mut previous_k = 0.0;
        for step in 0..40 {
            let s = curve.freeze_insolation_earth * (1.0 + 0.02 * f64::from(step));
            let climate = curve.open_climate(s).unwrap();
            // Steep tilts have belts of ice that come and go at one starlight; the mean may dip where they do.
            prop_assert!(climate.mean_k >= previous_k - 0.5, "{air:?} {teff} {s}");
            previous_k = climate.mean_k;
        }
    }

    #[test]
    fn a_relaxed_climate_radiates_what_it_absorbs(
        log_p in -4.0_f64..0.0, teff in 2600.0_f64..7200.0, s in 0.3_f64..1.05,
    ) {
        let carbon_dioxide_bar = 10.0_f64.powf(log_p);
        let air = WaterWorldAir { carbon_dioxide_bar, heat_transport_w_m2_k: 3.0, ..WaterWorldAir::default() };
        let climate = IceLineModel::new(&air, teff).unwrap().from_frozen(s).unwrap();
        // With strong transport the planet is nearly uniform: the infrared of its mean is its mean infrared.
        let infrared = OutgoingInfrared::new(carbon_dioxide_bar).unwrap().flux_w_m2(climate.mean_k);
        let absorbed = 0.25 * 1361.17 * s * (1.0 - climate.planetary_albedo);
        prop_assert!((infrared - absorbed).abs() < 2.0, "{infrared} {absorbed}");
    }
}
