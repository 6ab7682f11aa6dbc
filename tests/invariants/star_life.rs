//! What must hold for every star at every age.

use longember::physics::star::{
    END_YR, FITTED_MASS_RANGE_MSUN, METALLICITY_RANGE_DEX, Phase, StarError, StarEventKind, StarInput, StarState, Track,
};
use proptest::prelude::*;

const MASSES: u32 = 60;
const METALLICITIES: [f64; 6] = [-2.0, -1.3, -0.7, -0.3, 0.0, 0.2];

fn grid() -> impl Iterator<Item = StarInput> {
    let (least, most) = FITTED_MASS_RANGE_MSUN;
    METALLICITIES.into_iter().flat_map(move |metallicity_dex| {
        (0..MASSES).map(move |step| {
            let place = f64::from(step) / f64::from(MASSES - 1);
            let mass_msun = (least * (most / least).powf(place)).clamp(least, most);
            StarInput { mass_msun, metallicity_dex }
        })
    })
}

/// Why a state cannot be one of a star; nothing if it can.
fn fault(state: &StarState) -> Option<String> {
    let figures = [
        state.age_yr,
        state.mass_msun,
        state.luminosity_lsun,
        state.radius_rsun,
        state.effective_temperature_k,
        state.core_mass_msun,
        state.mass_loss_msun_yr,
    ];
    let complain = |what: &str| Some(format!("{what}: {state:?}"));
    if figures.iter().any(|figure| !figure.is_finite() || *figure < 0.0) {
        return complain("not finite or negative");
    }
    if state.core_mass_msun > state.mass_msun {
        return complain("core heavier than the star");
    }
    if state.phase.is_dark() {
        if state.luminosity_lsun != 0.0 || state.effective_temperature_k != 0.0 {
            return complain("a dark remnant shines");
        }
        let is_there = state.phase != Phase::NoRemnant;
        return if (state.mass_msun > 0.0) == is_there && (state.radius_rsun > 0.0) == is_there {
            None
        } else {
            complain("mass or size of a dark remnant")
        };
    }
    if !(1e-21..1e7).contains(&state.luminosity_lsun) {
        return complain("luminosity");
    }
    if !(1e-4..1e4).contains(&state.radius_rsun) {
        return complain("radius");
    }
    let hottest = if state.phase == Phase::MainSequence { 7e4 } else { 8e5 };
    if !(2.724..hottest).contains(&state.effective_temperature_k) {
        return complain("temperature");
    }
    if state.phase.is_giant() && state.effective_temperature_k < 1500.0 {
        return complain("giant too cold");
    }
    match state.core_hydrogen_fraction {
        Some(hydrogen) if (0.0..0.77).contains(&hydrogen) && !state.phase.is_remnant() => None,
        None if state.phase.is_remnant() => None,
        _ => complain("core hydrogen"),
    }
}

#[test]
fn every_life_of_the_grid_is_whole_and_smooth() {
    let mut wrong = Vec::new();
    for input in grid() {
        let track = Track::compute(input).unwrap();
        let ages = track.node_ages_yr();
        if ages.first() != Some(&0.0) || ages.last() != Some(&END_YR) || !ages.windows(2).all(|pair| pair[0] < pair[1])
        {
            wrong.push(format!("{input:?}: node ages"));
        }
        if ages.len() > 2500 {
            wrong.push(format!("{input:?}: {} nodes", ages.len()));
        }
        let mut before: Option<StarState> = None;
        for pair in ages.windows(2) {
            for age in [pair[0], 0.5 * (pair[0] + pair[1])] {
                let state = track.state_at(age);
                wrong.extend(fault(&state).map(|why| format!("{input:?}: {why}")));
                if let Some(before) = before {
                    if state.mass_msun > before.mass_msun * (1.0 + 1e-14) {
                        wrong.push(format!("{input:?}: mass grows at {age}"));
                    }
                    if state.phase < before.phase {
                        wrong.push(format!("{input:?}: {:?} after {:?}", state.phase, before.phase));
                    }
                    let steps = [
                        (state.luminosity_lsun, before.luminosity_lsun),
                        (state.radius_rsun, before.radius_rsun),
                        (state.effective_temperature_k, before.effective_temperature_k),
                    ];
                    if !state.phase.is_dark() && steps.iter().any(|(now, then)| (now / then).ln().abs() > 0.25) {
                        wrong.push(format!("{input:?}: step at {age} from {before:?} to {state:?}"));
                    }
                }
                before = Some(state);
            }
        }
    }
    assert!(wrong.is_empty(), "{} faults, the first\n{}", wrong.len(), wrong[..wrong.len().min(10)].join("\n"));
}

#[test]
fn nothing_jumps_between_phases_but_a_supernova() {
    for input in grid() {
        let track = Track::compute(input).unwrap();
        for pair in track.spans().windows(2) {
            assert_eq!(pair[0].to_yr, pair[1].from_yr);
            assert!(pair[0].from_yr < pair[0].to_yr);
            let (before, after) = (track.state_at(pair[0].to_yr.next_down()), track.state_at(pair[1].from_yr));
            assert_eq!((before.phase, after.phase), (pair[0].phase, pair[1].phase));
            if pair[1].phase.is_dark() {
                continue;
            }
            for (now, then, allowed) in [
                (after.luminosity_lsun, before.luminosity_lsun, 1e-3),
                (after.radius_rsun, before.radius_rsun, 1e-3),
                (after.mass_msun, before.mass_msun, 1e-3),
            ] {
                assert!((now / then).ln().abs() < allowed, "{input:?}\n{before:?}\n{after:?}");
            }
        }
        assert_eq!(track.spans()[0].from_yr, 0.0);
        assert_eq!(track.spans().last().unwrap().to_yr, END_YR);
        assert!(track.spans().last().unwrap().phase.is_remnant());
    }
}

#[test]
fn events_come_in_the_order_of_a_life() {
    use StarEventKind as E;
    let order = |kind: E| match kind {
        E::MainSequenceStart => Some(0),
        E::MainSequenceEnd => Some(1),
        E::GiantBranchBase => Some(2),
        E::HeliumIgnition { .. } => Some(3),
        E::CoreHeliumEnd => Some(4),
        E::ThermalPulsesStart => Some(5),
        E::SupernovaCollapse | E::ThermonuclearDisruption => Some(6),
        E::WhiteDwarfBirth | E::NeutronStarBirth | E::BlackHoleBirth => Some(7),
        E::BlackDwarfBirth => Some(8),
        E::EnvelopeLost | E::LargestRadius | E::HighestLuminosity => None,
        // Red dwarfs are not made from these fits.
        E::MixingEnds | E::BlueDwarfStart | E::HottestSurface => panic!("{kind:?} in the life of a heavier star"),
    };
    for input in grid() {
        let track = Track::compute(input).unwrap();
        let events = track.events();
        assert!(events.windows(2).all(|pair| pair[0].age_yr <= pair[1].age_yr));
        let ranks: Vec<u8> = events.iter().filter_map(|event| order(event.kind)).collect();
        assert!(ranks.is_sorted_by(|a, b| a < b), "{input:?} {events:?}");
        let count = |wanted: &dyn Fn(E) -> bool| events.iter().filter(|event| wanted(event.kind)).count();
        assert_eq!(count(&|kind| kind == E::LargestRadius), 1);
        assert_eq!(count(&|kind| kind == E::HighestLuminosity), 1);
        assert!(count(&|kind| kind == E::EnvelopeLost) <= 1);
        let end = track.spans().last().unwrap().phase;
        assert_eq!(count(&|kind| kind == E::WhiteDwarfBirth) == 1, end.is_white_dwarf());
        assert_eq!(count(&|kind| kind == E::SupernovaCollapse) == 1, track.collapse().is_some());
    }
}

#[test]
fn the_summits_are_summits() {
    for input in grid().step_by(7) {
        let track = Track::compute(input).unwrap();
        let end = track.spans().last().unwrap().from_yr;
        let at = |kind: StarEventKind| track.state_at(track.age_of_yr(kind).unwrap());
        let largest = at(StarEventKind::LargestRadius).radius_rsun * (1.0 + 1e-6);
        let brightest = at(StarEventKind::HighestLuminosity).luminosity_lsun * (1.0 + 1e-6);
        for &age in track.node_ages_yr().iter().take_while(|&&age| age < end) {
            let state = track.state_at(age);
            assert!(state.radius_rsun <= largest && state.luminosity_lsun <= brightest, "{input:?} {state:?}");
        }
    }
}

#[test]
fn every_caution_is_about_a_quantity_of_the_state() {
    let known = [
        "age_yr",
        "mass_msun",
        "luminosity_lsun",
        "radius_rsun",
        "effective_temperature_k",
        "core_mass_msun",
        "mass_loss_msun_yr",
        "core_hydrogen_fraction",
    ];
    let mut seen = std::collections::BTreeSet::new();
    for input in grid().step_by(3) {
        let track = Track::compute(input).unwrap();
        for span in track.spans() {
            for age in [span.from_yr, 0.5 * (span.from_yr + span.to_yr)] {
                for caution in track.cautions_at(age) {
                    assert!(known.contains(&caution.about()));
                    seen.insert(caution);
                }
            }
        }
    }
    assert!(seen.len() >= 12, "{seen:?}");
}

fn any_star() -> impl Strategy<Value = StarInput> {
    let mass = (FITTED_MASS_RANGE_MSUN.0.ln()..=FITTED_MASS_RANGE_MSUN.1.ln())
        .prop_map(|log| log.exp().clamp(FITTED_MASS_RANGE_MSUN.0, FITTED_MASS_RANGE_MSUN.1));
    (mass, METALLICITY_RANGE_DEX.0..=METALLICITY_RANGE_DEX.1)
        .prop_map(|(mass_msun, metallicity_dex)| StarInput { mass_msun, metallicity_dex })
}

proptest! {
    #![proptest_config(ProptestConfig::with_cases(96))]

    #[test]
    fn any_age_of_any_star_has_a_state(input in any_star(), logs in prop::collection::vec(-2.0..15.0_f64, 24)) {
        let track = Track::compute(input).unwrap();
        let mut ages: Vec<f64> = logs.into_iter().map(|log| 10.0_f64.powf(log)).collect();
        ages.extend([f64::NAN, f64::INFINITY, f64::NEG_INFINITY, -1.0, 0.0, END_YR]);
        for age in ages {
            let state = track.state_at(age);
            prop_assert!(fault(&state).is_none(), "{:?}", fault(&state));
            prop_assert!((0.0..=END_YR).contains(&state.age_yr));
            let convective = track.convective_envelope_msun(age);
            prop_assert!(convective >= 0.0 && convective <= state.mass_msun);
        }
    }

    #[test]
    fn a_little_later_is_a_little_different(input in any_star(), place in 0.0..1.0_f64) {
        let track = Track::compute(input).unwrap();
        let ages = track.node_ages_yr();
        // Spread over nodes, so that short phases are visited as often as long ones.
        #[expect(clippy::cast_possible_truncation, clippy::cast_sign_loss, reason = "an index below the length")]
        let index = ((ages.len() - 1) as f64 * place) as usize;
        let (from, to) = (ages[index], ages[index + 1]);
        let age = from + 0.37 * (to - from);
        let later = age + 1e-4 * (to - from);
        let (now, then) = (track.state_at(age), track.state_at(later));
        if !then.phase.is_dark() {
            prop_assert!((now.luminosity_lsun / then.luminosity_lsun).ln().abs() < 1e-3);
            prop_assert!((now.radius_rsun / then.radius_rsun).ln().abs() < 1e-3);
        }
        prop_assert!(then.mass_msun <= now.mass_msun * (1.0 + 1e-14));
    }

    #[test]
    fn heavier_stars_leave_the_main_sequence_earlier(input in any_star(), factor in 1.01..1.5_f64) {
        let heavier = StarInput { mass_msun: input.mass_msun * factor, ..input };
        prop_assume!(heavier.mass_msun <= FITTED_MASS_RANGE_MSUN.1);
        let end = |star: StarInput| Track::compute(star).unwrap().age_of_yr(StarEventKind::MainSequenceEnd).unwrap();
        prop_assert!(end(heavier) < end(input));
    }

    #[test]
    fn what_is_out_of_range_is_named(mass in prop_oneof![-1e3..0.349_f64, 100.01..1e6_f64], dex in 0.21..9.0_f64) {
        let mass_error = Track::compute(StarInput { mass_msun: mass, metallicity_dex: 0.0 }).unwrap_err();
        let named = matches!(mass_error, StarError::Mass { .. } | StarError::BelowFits { .. } | StarError::BrownDwarf { .. });
        prop_assert!(named, "{mass_error}");
        let dex_error = Track::compute(StarInput { mass_msun: 1.0, metallicity_dex: dex }).unwrap_err();
        let named = matches!(dex_error, StarError::Metallicity { .. });
        prop_assert!(named, "{dex_error}");
    }
}
