//! How stars end: lifetimes, remnants, cooling.

use longember::physics::star::white_dwarf::WhiteDwarf;
use longember::physics::star::{Phase, StarEventKind, StarInput, Track};

fn life(mass_msun: f64, metallicity_dex: f64) -> Track {
    Track::compute(StarInput { mass_msun, metallicity_dex }).unwrap()
}

#[test]
fn white_dwarfs_are_as_heavy_as_those_of_known_parents() {
    // Cummings, Kalirai, Tremblay, Ramirez-Ruiz & Choi 2018, ApJ 866, 21, eqs. 4–6 (from memory); their scatter is a few
    // hundredths of a solar mass. The model's white dwarfs lie within a tenth.
    let published = |m: f64| match m {
        m if m < 2.85 => 0.080 * m + 0.489,
        m if m < 3.60 => 0.187 * m + 0.184,
        _ => 0.107 * m + 0.471,
    };
    for tenth in 10..=65 {
        let mass = f64::from(tenth) / 10.0;
        let end = life(mass, 0.0).state_at(1e14);
        assert!(end.phase.is_white_dwarf());
        let ratio = end.mass_msun / published(mass);
        assert!((0.90..1.10).contains(&ratio), "{mass}: {} against {}", end.mass_msun, published(mass));
    }
}

#[test]
fn white_dwarfs_cool_by_the_published_table() {
    // Bédard, Bergeron, Brassard & Fontaine 2020, ApJ 901, 93: mass, effective temperature, log age, log luminosity.
    for (mass, temperature, log_age, log_luminosity) in [
        (0.2, 10_000.0, 8.310, -2.2064),
        (0.2, 5000.0, 9.188, -3.6268),
        (0.6, 1500.0, 10.167, -6.1688),
        (1.0, 1500.0, 10.036, -6.5480),
        (1.2, 2000.0, 9.855, -6.3416),
    ] {
        let (luminosity, _, kelvin) = WhiteDwarf::new(mass).at(10.0_f64.powf(log_age));
        assert!((kelvin / temperature - 1.0).abs() < 1e-6, "{mass} {kelvin}");
        assert!((luminosity.log10() - log_luminosity).abs() < 1e-3, "{mass} {luminosity}");
    }
    // The same source: a white dwarf of 0.6 solar masses needs about 2 Gyr to 7000 K and 8 to 10 Gyr to 4000 K.
    let dwarf = WhiteDwarf::new(0.6);
    assert!(dwarf.at(1e9).2 > 7000.0 && dwarf.at(3e9).2 < 7000.0);
    assert!(dwarf.at(6e9).2 > 4000.0 && dwarf.at(1e10).2 < 4000.0);
}

#[test]
fn a_star_of_five_suns_is_still_on_the_main_sequence_at_90_myr() {
    // Schaller, Schaerer, Meynet & Maeder 1992, A&AS 96, 269: 94.5 Myr of hydrogen burning.
    let star = life(5.0, 0.0);
    assert_eq!(star.state_at(9e7).phase, Phase::MainSequence);
    let end = star.age_of_yr(StarEventKind::MainSequenceEnd).unwrap();
    assert!((end / 94.5e6 - 1.0).abs() < 0.12, "{end}");
}

#[test]
fn hydrogen_burns_as_long_as_in_full_models() {
    // Schaller, Schaerer, Meynet & Maeder 1992, A&AS 96, 269, Z = 0.02: Myr of hydrogen burning.
    for (mass, myr) in
        [(2.0, 1115.0), (3.0, 352.0), (9.0, 26.4), (15.0, 11.6), (25.0, 6.41), (40.0, 4.30), (60.0, 3.45)]
    {
        let end = life(mass, 0.0).age_of_yr(StarEventKind::MainSequenceEnd).unwrap() / 1e6;
        assert!((end / myr - 1.0).abs() < 0.20, "{mass}: {end} against {myr}");
    }
}

#[test]
fn the_most_massive_stars_live_a_few_million_years() {
    // Common practice.
    for mass in [50.0, 75.0, 100.0] {
        for metallicity in [-2.0, -1.0, 0.0, 0.2] {
            let star = life(mass, metallicity);
            let death = star.age_of_yr(StarEventKind::SupernovaCollapse).unwrap();
            assert!((2e6..6e6).contains(&death), "{mass} {metallicity}: {death}");
        }
    }
}

#[test]
fn a_star_of_25_suns_leaves_a_compact_remnant() {
    let star = life(25.0, 0.0);
    let end = star.state_at(1e9);
    assert!(matches!(end.phase, Phase::NeutronStar | Phase::BlackHole));
    // Fryer et al. 2012, ApJ 749, 91, figure 4, delayed: between 2 and 10 solar masses at solar composition.
    assert!((2.0..10.0).contains(&end.mass_msun), "{end:?}");
    assert_eq!((end.luminosity_lsun, end.effective_temperature_k), (0.0, 0.0));
    let collapse = star.collapse().unwrap();
    assert!(collapse.carbon_oxygen_core_msun < collapse.mass_msun && end.mass_msun < collapse.mass_msun);
}

#[test]
fn metal_poor_massive_stars_leave_heavier_black_holes() {
    // Belczynski et al. 2010, ApJ 714, 1217: weaker winds, up to some tens of solar masses instead of about fifteen.
    let (poor, rich) = (life(40.0, -2.0).state_at(1e9), life(40.0, 0.2).state_at(1e9));
    assert_eq!((poor.phase, rich.phase), (Phase::BlackHole, Phase::BlackHole));
    assert!(poor.mass_msun > 2.0 * rich.mass_msun && (10.0..40.0).contains(&poor.mass_msun), "{poor:?} {rich:?}");
}

#[test]
fn neutron_stars_weigh_what_neutron_stars_weigh() {
    // Özel & Freire 2016, ARA&A 54, 401: 1.1 to about 2 solar masses; Fryer et al. 2012 let them reach 2.5.
    let mut count = 0;
    for tenth in 80..=200 {
        let end = life(f64::from(tenth) / 10.0, 0.0).state_at(1e14);
        if end.phase == Phase::NeutronStar {
            count += 1;
            assert!((1.1..2.5).contains(&end.mass_msun), "{end:?}");
            assert!((end.radius_rsun * 695_700.0 - 12.0).abs() < 0.1);
        }
    }
    assert!(count > 60, "{count}");
}

#[test]
fn the_least_star_to_collapse_has_about_eight_suns() {
    // Smartt 2009, ARA&A 47, 63: 8 ± 1 solar masses.
    let least = (60..120).map(|tenth| f64::from(tenth) / 10.0).find(|&mass| life(mass, 0.0).collapse().is_some());
    assert!((7.0..9.0).contains(&least.unwrap()), "{least:?}");
}

#[test]
fn light_stars_shine_for_longer_than_the_universe_has_lasted() {
    // Planck Collaboration 2020, A&A 641, A6: 13.8 Gyr.
    for mass in [0.35, 0.5, 0.7] {
        for metallicity in [-2.0, 0.0, 0.2] {
            let star = life(mass, metallicity);
            assert_eq!(star.state_at(1.38e10).phase, Phase::MainSequence, "{mass} {metallicity}");
        }
    }
}
