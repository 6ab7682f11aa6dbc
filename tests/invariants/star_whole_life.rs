//! One life for every star: no seam where the structure calculation passes over into the fits, and nothing broken.
//!
//! Red dwarfs are looked at through the quick look, whose lives the structure calculation made; one of them is held to the
//! exact life.

use longember::physics::star::convective::{ConvectiveInput, Options, Resolution, SurfaceOpacity, compute_with};
use longember::physics::star::quick_look::{GridLife, deviation_from_grid};
use longember::physics::star::{
    END_YR, LifeOptions, Phase, StarCaution, StarError, StarEventKind, StarInput, StarState, WholeLife,
};
use proptest::prelude::*;
use std::ops::ControlFlow;

fn life(mass_msun: f64, metallicity_dex: f64) -> WholeLife {
    let input = StarInput { mass_msun, metallicity_dex };
    WholeLife::quick_look(input, LifeOptions::default()).unwrap_or_else(|| exact(mass_msun, metallicity_dex))
}

fn exact(mass_msun: f64, metallicity_dex: f64) -> WholeLife {
    let input = StarInput { mass_msun, metallicity_dex };
    WholeLife::compute(input, LifeOptions::default(), &mut |_| ControlFlow::Continue(())).expect("in range")
}

/// The star at equal points of its life: shares of its burning up to the spent core, of the way from there to the white
/// dwarf, and years of cooling, after the last hydrogen has flared up.
fn points(life: &WholeLife) -> Vec<StarState> {
    let spent_yr = life.age_of_yr(StarEventKind::MainSequenceEnd).expect("it burns");
    let dwarf_yr = life.age_of_yr(StarEventKind::WhiteDwarfBirth).expect("it ends");
    let burning = [0.0, 0.1, 0.3, 0.5, 0.7, 0.9].map(|share| share * spent_yr);
    let late = [0.0, 0.3, 0.6, 0.8].map(|share| spent_yr + share * (dwarf_yr - spent_yr));
    let cooling = [1e9, 3e9, 1e10].map(|cooling_yr| dwarf_yr + cooling_yr);
    burning.iter().chain(&late).chain(&cooling).map(|age_yr| life.state_at(*age_yr)).collect()
}

/// Largest change of age, light and radius at equal points between two lives, as natural logarithms.
fn jump(a: &WholeLife, b: &WholeLife) -> f64 {
    let log = |x: f64, y: f64| if x > 0.0 && y > 0.0 { (x / y).ln().abs() } else { 0.0 };
    let pairs = points(a).into_iter().zip(points(b));
    pairs
        .map(|(a, b)| {
            log(a.age_yr, b.age_yr)
                .max(log(a.luminosity_lsun, b.luminosity_lsun))
                .max(log(a.radius_rsun, b.radius_rsun))
                .max(log(a.mass_msun, b.mass_msun))
        })
        .fold(0.0, f64::max)
}

#[test]
fn nothing_jumps_as_the_mass_slides_from_red_dwarf_to_fit() {
    for metallicity in [0.0, -1.0] {
        let mut before = life(0.30, metallicity);
        for step in 1..=150 {
            let mass = 0.30 + 0.002 * f64::from(step);
            let now = life(mass, metallicity);
            let jump = jump(&before, &now);
            assert!(jump < 0.12, "{mass} solar masses, {metallicity} dex: {jump}");
            before = now;
        }
    }
}

#[test]
fn the_ends_of_the_blend_are_the_engines_themselves() {
    for (below, above) in [(0.40 - 1e-7, 0.40 + 1e-7), (0.50 - 1e-7, 0.50)] {
        let jump = jump(&life(below, 0.0), &life(above, 0.0));
        assert!(jump < 5e-3, "{below} to {above}: {jump}");
    }
}

#[test]
fn the_quick_look_is_close_to_the_exact_life() {
    // Stated: light and radius 2 %, ages 1 % at a mass of the grid; ages 2 %, light 10 % between.
    for (mass, ages, light) in [(0.10, 0.01, 0.03), (0.125, 0.02, 0.10)] {
        let (quick, exact) = (life(mass, 0.0), exact(mass, 0.0));
        assert!(quick.is_quick_look() && !exact.is_quick_look());
        assert!(quick.cautions_at(1e9).contains(&StarCaution::QuickLook));
        for kind in [
            StarEventKind::MainSequenceEnd,
            StarEventKind::HighestLuminosity,
            StarEventKind::WhiteDwarfBirth,
            StarEventKind::BlackDwarfBirth,
        ] {
            let [a, b] = [&quick, &exact].map(|life| life.age_of_yr(kind).expect("it happens"));
            assert!((a / b - 1.0).abs() < ages, "{mass}: {kind:?} {a} {b}");
        }
        for (a, b) in points(&quick).iter().zip(points(&exact)) {
            assert!((a.luminosity_lsun / b.luminosity_lsun - 1.0).abs() < light, "{mass}: {a:?} {b:?}");
            assert!((a.radius_rsun / b.radius_rsun - 1.0).abs() < 0.03, "{mass}: {a:?} {b:?}");
        }
    }
}

#[test]
fn the_shipped_grid_is_what_the_structure_calculation_makes() {
    for (mass_msun, metallicity_dex, surface) in
        [(0.10, 0.0, SurfaceOpacity::Modern), (0.13, -1.0, SurfaceOpacity::Modern), (0.12, 0.2, SurfaceOpacity::Of1997)]
    {
        let input = ConvectiveInput { mass_msun, metallicity_dex };
        let options = Options { resolution: Resolution::Standard, surface };
        let life = compute_with(input, options, &mut |_| ControlFlow::Continue(())).expect("in range");
        let deviation = deviation_from_grid(&GridLife { input, surface, life }).expect("a record");
        assert!(deviation < 1e-3, "{mass_msun} {metallicity_dex} {surface:?}: {deviation}");
    }
}

#[test]
fn a_quick_look_is_there_for_every_red_dwarf_and_surface() {
    for surface in [SurfaceOpacity::Modern, SurfaceOpacity::Of1997] {
        for metallicity_dex in [-2.0, -1.2, -0.5, 0.0, 0.2] {
            for step in 0..=40 {
                let input = StarInput { mass_msun: 0.09 + 0.01 * f64::from(step), metallicity_dex };
                let look = WholeLife::quick_look(input, LifeOptions { surface });
                assert!(look.is_some(), "{input:?} {surface:?}");
            }
        }
    }
}

#[test]
fn phases_are_those_of_the_mass() {
    use Phase::{
        BlackDwarf, BlueDwarf, FirstGiantBranch, FullyMixedMainSequence, HeliumWhiteDwarf, HertzsprungGap,
        MainSequence, RadiativeCore,
    };
    let phases = |mass| life(mass, 0.0).spans().iter().map(|span| span.phase).collect::<Vec<_>>();
    assert_eq!(phases(0.12), [FullyMixedMainSequence, RadiativeCore, BlueDwarf, HeliumWhiteDwarf, BlackDwarf]);
    let giant = [FullyMixedMainSequence, RadiativeCore, HertzsprungGap, FirstGiantBranch, HeliumWhiteDwarf, BlackDwarf];
    assert_eq!(phases(0.25), giant);
    let unmixed = [MainSequence, HertzsprungGap, FirstGiantBranch, HeliumWhiteDwarf, BlackDwarf];
    for mass in [0.40, 0.45, 0.50] {
        assert_eq!(phases(mass), unmixed, "{mass}");
    }
    // The edge of full convection is one edge, not several.
    let is_mixed = |step: i32| phases(0.24 + 0.004 * f64::from(step))[0] == FullyMixedMainSequence;
    let mixed: Vec<bool> = (0..60).map(is_mixed).collect();
    assert!(mixed[0] && mixed.is_sorted_by(|lighter, heavier| lighter >= heavier), "{mixed:?}");
    // 0.20 solar masses never become a giant, 0.25 do.
    assert!(phases(0.20).contains(&BlueDwarf) && !phases(0.20).contains(&FirstGiantBranch));
}

#[test]
fn what_never_burns_is_refused_with_the_reason() {
    for mass_msun in [0.001, 0.05, 0.0699] {
        let input = StarInput { mass_msun, metallicity_dex: 0.0 };
        let error = WholeLife::compute(input, LifeOptions::default(), &mut |_| ControlFlow::Continue(()));
        let error = error.expect_err("too light");
        assert!(matches!(error, StarError::BrownDwarf { .. }) && error.to_string().contains("brown dwarf"), "{error}");
    }
    let input = StarInput { mass_msun: 0.1, metallicity_dex: 0.0 };
    let stopped = WholeLife::compute(input, LifeOptions::default(), &mut |_| ControlFlow::Break(()));
    assert_eq!(stopped.map(|_| ()), Err(StarError::Cancelled));
}

proptest! {
    #![proptest_config(ProptestConfig::with_cases(64))]

    #[test]
    fn every_life_is_whole(mass in 0.085..0.6_f64, metallicity in -1.9..0.2_f64, ages in prop::collection::vec(0.0..14.0_f64, 30)) {
        let life = life(mass, metallicity);
        prop_assert_eq!(life.spans()[0].from_yr, 0.0);
        prop_assert!(life.spans().windows(2).all(|pair| pair[0].to_yr == pair[1].from_yr && pair[0].phase < pair[1].phase));
        prop_assert_eq!(life.spans()[life.spans().len() - 1].to_yr, END_YR);
        let nodes = life.node_ages_yr();
        prop_assert!(nodes[0] == 0.0 && nodes[nodes.len() - 1] == END_YR && nodes.windows(2).all(|pair| pair[0] < pair[1]));
        prop_assert!(life.events().windows(2).all(|pair| pair[0].age_yr <= pair[1].age_yr));
        for age_yr in ages.iter().map(|log| 10_f64.powf(*log)).chain([-1.0, 0.0, 2e14, f64::NAN, f64::INFINITY]) {
            let state = life.state_at(age_yr);
            for value in [state.luminosity_lsun, state.radius_rsun, state.effective_temperature_k, state.mass_msun] {
                prop_assert!(value.is_finite() && value > 0.0, "{:?}", state);
            }
            prop_assert!((0.0..=state.mass_msun).contains(&state.core_mass_msun), "{:?}", state);
            prop_assert!(state.mass_loss_msun_yr >= 0.0 && state.mass_msun <= mass * (1.0 + 1e-6), "{:?}", state);
            prop_assert!(state.core_hydrogen_fraction.is_none_or(|share| (0.0..0.8).contains(&share)), "{:?}", state);
            let envelope_msun = life.convective_envelope_msun(age_yr);
            prop_assert!((0.0..=state.mass_msun * (1.0 + 1e-9)).contains(&envelope_msun), "{}", envelope_msun);
            if let Some(inside) = life.interior_at(age_yr) {
                prop_assert!(inside.core_temperature_k > 0.0 && inside.core_density_g_cm3 > 0.0, "{:?}", inside);
                prop_assert!((0.0..=1.0).contains(&inside.mixed_mass_fraction), "{:?}", inside);
                prop_assert!((0.0..0.8).contains(&inside.mean_hydrogen_fraction), "{:?}", inside);
            }
        }
    }
}
