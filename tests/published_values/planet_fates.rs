//! Whole lives of planets against what is published of them.

#[path = "../invariants/planet_track.rs"]
mod track;

use crate::planet_check::{near, near_share};
use longember::physics::planet::history::SurfaceTemperature;
use longember::physics::planet::{
    CarbonCycle, Caution, ClimateState, OrbitEnd, OrbitInput, PlanetEventKind, PlanetHistory, PlanetInput, WaterWorld,
};

/// The Sun's age, yr (common value).
const NOW_YR: f64 = 4.57e9;

fn earth_like(semi_major_axis_au: f64, water: WaterWorld) -> PlanetInput {
    let orbit = OrbitInput { semi_major_axis_au, eccentricity: 0.0167, mass_mearth: 1.0, radius_rearth: 1.0 };
    PlanetInput { water: Some(water), ..PlanetInput::usual(orbit) }
}

fn first(history: &PlanetHistory, kind: PlanetEventKind) -> Option<f64> {
    history.events().iter().find(|event| event.kind == kind).map(|event| event.age_yr)
}

#[test]
fn the_earth_stays_mild_until_it_runs_away() {
    let track = track::sun_like(2000);
    let history = PlanetHistory::walk(&earth_like(1.0, WaterWorld::default()), &track).unwrap();
    assert_eq!(first(&history, PlanetEventKind::Freezes), None, "liquid water for 4 Gyr (geology)");
    let now = track.iter().find(|star| star.age_yr >= NOW_YR).unwrap();
    let today = history.at(now).unwrap().unwrap();
    near("mean temperature today", today.surface.value_k(), 288.0, 0.5, "observed");
    let climate = today.climate.unwrap();
    assert_eq!(climate.state, ClimateState::Temperate);
    near_share("carbon dioxide today, bar", climate.carbon_dioxide_bar.unwrap(), 2.8e-4, 0.5, "before industry");
    let early = track.iter().find(|star| star.age_yr >= 0.8e9).unwrap();
    let air = history.at(early).unwrap().unwrap().climate.unwrap().carbon_dioxide_bar.unwrap();
    // 0.2 bar is the textbook need of a faint young Sun; 0.03 to 0.3 bar are in print.
    assert!((0.02..0.4).contains(&air), "{air} bar at 0.8 Gyr (Kasting 1993 and others)");
    let runaway_yr = first(&history, PlanetEventKind::RunawayGreenhouse).unwrap() - NOW_YR;
    near("runaway greenhouse, from now", runaway_yr / 1e9, 1.0, 0.2, "Leconte et al. 2013 (abstract)");
    let dry_yr = first(&history, PlanetEventKind::WaterGone).unwrap() - NOW_YR - runaway_yr;
    assert!((0.1e9..6e9).contains(&dry_yr), "{dry_yr}: energy-limited loss of one ocean takes some Gyr");
    let end = history.events().iter().rev().find(|event| event.kind == PlanetEventKind::Engulfed).unwrap();
    near("engulfment", end.age_yr / 1e9, 12.0, 0.05, "tip of the giant branch of this track");
    assert_eq!(end.caution, Some(Caution::Undecided), "solar models disagree (Schröder & Smith 2008)");
}

#[test]
fn with_todays_air_the_young_earth_freezes_and_thaws_to_steam() {
    let held = WaterWorld { carbon: CarbonCycle::Held, ..WaterWorld::default() };
    let history = PlanetHistory::walk(&earth_like(1.0, held), &track::sun_like(2000)).unwrap();
    assert_eq!(history.climate_state_at(2e9), Some(ClimateState::Frozen), "Sagan & Mullen 1972: faint young Sun");
    assert!(first(&history, PlanetEventKind::ThawsToSteam).is_some(), "Yang et al. 2017: no mild phase at a G star");
    assert_eq!(first(&history, PlanetEventKind::Thaws), None);
}

#[test]
fn venus_loses_its_ocean_early() {
    let track = track::sun_like(2000);
    let history = PlanetHistory::walk(&earth_like(0.723, WaterWorld::default()), &track).unwrap();
    let dry_yr = first(&history, PlanetEventKind::WaterGone).unwrap() - track[0].age_yr;
    assert!(dry_yr < 1e9, "{dry_yr}: Kasting 1988: within some hundred million years");
}

#[test]
fn mars_with_volcanoes_and_seas_would_thaw_one_day() {
    let history = PlanetHistory::walk(&earth_like(1.524, WaterWorld::default()), &track::sun_like(2000)).unwrap();
    assert_eq!(history.climate_state_at(NOW_YR), Some(ClimateState::Frozen));
    let thaw_yr = first(&history, PlanetEventKind::Thaws).unwrap();
    assert!(thaw_yr > NOW_YR && thaw_yr < 1.1e10, "{thaw_yr}");
}

#[test]
fn a_red_dwarf_dries_its_planet_before_it_reaches_the_main_sequence() {
    let track = track::red_dwarf(1500);
    let planet = earth_like(0.05, WaterWorld { ocean_after_yr: 1e7, ..WaterWorld::default() });
    let history = PlanetHistory::walk(&planet, &track).unwrap();
    let dry_yr = first(&history, PlanetEventKind::WaterGone).unwrap();
    assert!(dry_yr < 0.0, "{dry_yr}: Luger & Barnes 2015: oceans lost while the star contracts");
    assert!(first(&history, PlanetEventKind::Locked).is_some_and(|age_yr| age_yr < 0.0), "Barnes 2017: locked at once");
    // Beyond the reach of the young star an ocean lasts.
    let far = PlanetHistory::walk(&earth_like(0.12, WaterWorld::default()), &track).unwrap();
    assert_eq!(first(&far, PlanetEventKind::WaterGone).filter(|age_yr| *age_yr < 1e10), None);
}

#[test]
fn steam_is_never_given_a_temperature() {
    let track = track::sun_like(500);
    let history =
        PlanetHistory::walk(&earth_like(0.9, WaterWorld { water_oceans: 100.0, ..WaterWorld::default() }), &track)
            .unwrap();
    let star = track.iter().find(|star| star.age_yr >= NOW_YR).unwrap();
    let moment = history.at(star).unwrap().unwrap();
    assert_eq!(moment.climate.unwrap().state, ClimateState::Runaway);
    assert_eq!(moment.surface, SurfaceTemperature::HotterThan(1400.0), "Goldblatt & Watson 2012");
}

#[test]
fn a_supernova_sets_its_planets_free() {
    let history = PlanetHistory::walk(&earth_like(50.0, WaterWorld::default()), &track::exploding(300)).unwrap();
    assert_eq!(history.orbit().end(), Some((1.3e7, OrbitEnd::Unbound)), "Blaauw 1961: more than half the mass is lost");
}

#[test]
fn the_fate_of_a_hot_giant_hangs_on_its_tides() {
    let orbit = OrbitInput { semi_major_axis_au: 0.0185, eccentricity: 0.0, mass_mearth: 560.0, radius_rearth: 13.0 };
    let mut input = PlanetInput::usual(orbit);
    input.tides.star_quality = 1e7;
    let track: Vec<_> = track::sun_like(2000).into_iter().filter(|star| star.age_yr >= 0.0).collect();
    let history = PlanetHistory::walk(&input, &track).unwrap();
    let (lag_yr, quality_yr) = (history.orbit().end().unwrap().0, history.orbit_by_second_opinion().end().unwrap().0);
    let (free_yr, _) = history.orbit_without_tides().end().unwrap();
    assert!(lag_yr < quality_yr && quality_yr < free_yr, "{lag_yr} {quality_yr} {free_yr}");
    // 2/13 of a/|da/dt| at constant Q (Levrard et al. 2009), less the last stretch inside the Roche limit.
    let n_per_yr = std::f64::consts::TAU / 0.0185_f64.powf(1.5);
    let reach = 0.0185 / (0.004_650_47 * track[0].radius_rsun);
    let inspiral_yr = 2.0 / 13.0 * 2.0 / 9.0 * 1e7 / n_per_yr / (560.0 / 332_946.0) * reach.powi(5);
    assert!(quality_yr < inspiral_yr && quality_yr > 0.6 * inspiral_yr, "{quality_yr} {inspiral_yr}");
}
