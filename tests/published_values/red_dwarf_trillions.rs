//! The far future of red dwarfs against Laughlin, Bodenheimer & Adams 1997, Astrophys. J. 482, 420 ("LBA97"), and Adams,
//! Bodenheimer & Laughlin 2005, AN 326, 913.
//!
//! LBA97's numbers were taken from transcriptions, not from the paper itself; the tolerances allow for that. Their
//! stars are fainter than today's models because their surfaces were more opaque, so their ages are compared with a
//! life that has such a surface.

use crate::red_dwarf_lives::{M008, M010, M010_OF_1997, M015, M020, M030, brightest, hottest_k, since_birth};
use longember::physics::star::convective::{Ending, Stage};

fn within(what: &str, ours: f64, published: f64, share: f64) {
    assert!((ours / published - 1.0).abs() < share, "{what}: {ours} against {published}");
}

#[test]
fn a_tenth_of_a_solar_mass_with_the_surface_of_1997() {
    let life = &*M010_OF_1997;
    // LBA97: arrives at T_eff 2228 K, log L −3.38, ρ_c 309 g cm⁻³.
    let young = since_birth(life, 2e9_f64.max(life.contraction_yr));
    within("T_eff on arrival", young.effective_temperature_k, 2228.0, 0.02);
    within("L on arrival", young.luminosity_lsun, 10_f64.powf(-3.38), 0.10);
    within("central density on arrival", young.core_density_g_cm3, 309.0, 0.15);
    // LBA97: the centre stops mixing at 5.742 trillion years, log L −2.54.
    let onset = life.nodes.iter().find(|node| node.stage == Stage::RadiativeCore).expect("a radiative core");
    within("age of the radiative core", onset.age_yr, 5.742e12, 0.20);
    // LBA97: hottest 5807 K; brightest about 0.01 solar luminosities; burns for "somewhat more than" 6 trillion years.
    within("highest T_eff", hottest_k(life), 5807.0, 0.05);
    within("highest L", brightest(life).luminosity_lsun, 0.01, 0.15);
    assert!((6.0e12..8.0e12).contains(&brightest(life).age_yr), "brightest at {}", brightest(life).age_yr);
}

#[test]
fn helium_3_piles_up_and_swells_the_core() {
    // LBA97: 9.95 % of ³He at most; meanwhile the central density falls by a third.
    let life = &*M010;
    let peak = life.nodes.iter().map(|node| node.core_helium3_fraction).fold(0.0, f64::max);
    within("helium-3", peak, 0.0995, 0.05);
    let on_arrival = life.at_age(0.0).expect("arrival").core_density_g_cm3;
    let burning = life.nodes.iter().filter(|node| node.stage == Stage::MainSequence);
    let least = burning.map(|node| node.core_density_g_cm3).fold(f64::INFINITY, f64::min);
    within("fall of the central density", least / on_arrival, 204.0 / 309.0, 0.12);
}

#[test]
fn the_white_dwarf_of_a_tenth_of_a_solar_mass() {
    // LBA97 end at T_eff 1651 K, log L −5.287; radius then from L and T_eff.
    let life = &*M010;
    let cold = life.nodes.iter().rev().find(|node| node.effective_temperature_k > 1651.0).expect("a cooling star");
    within("L at 1651 K", cold.luminosity_lsun, 10_f64.powf(-5.287), 0.10);
    // Mass–radius relation of helium at zero temperature (Eggleton's fit in Verbunt & Rappaport 1988, Astrophys. J. 332, 193;
    // from memory): 0.0253 and 0.0202; a warm star is somewhat larger.
    for (life, radius) in [(&*M010, 0.0253), (&*M020, 0.0202)] {
        let last = life.nodes[life.nodes.len() - 1];
        assert!((1.0..1.07).contains(&(last.radius_rsun / radius)), "{}", last.radius_rsun);
    }
}

#[test]
fn light_stars_become_blue_dwarfs_and_heavier_ones_giants() {
    // LBA97, abstract: no red giants below 0.20 solar masses; fully convective for most of life below 0.25.
    for life in [&*M008, &*M010, &*M015, &*M020] {
        assert_eq!(life.ending, Ending::BlackDwarf);
        let largest = life.nodes.iter().filter(|n| n.age_yr >= 0.0).map(|n| n.radius_rsun).fold(0.0, f64::max);
        assert!(largest < 2.5, "{largest}");
        assert!(life.nodes.iter().any(|node| node.stage == Stage::BlueDwarf));
        assert!(life.nodes.iter().any(|node| node.stage == Stage::HeliumWhiteDwarf));
    }
    assert!(M030.nodes.iter().any(|node| node.stage == Stage::GiantBranch));
    assert!(!M030.nodes.iter().any(|node| node.stage == Stage::BlueDwarf));
    let onset = M015.nodes.iter().find(|node| node.stage == Stage::RadiativeCore).expect("a radiative core");
    assert!(onset.age_yr > 0.75 * brightest(&M015).age_yr);
}

#[test]
fn a_small_giant_shines_as_its_core_tells() {
    // Hurley, Pols & Tout 2000, MNRAS 315, 543, eq. 37 and section 5.2: L = D M_c⁶ with log₁₀ D = 5.37 on the lower
    // giant branch of stars of a solar mass (Z = 0.02). Less light is expected here: ¹⁴N burns at half the rate used
    // there, and the core of so small a star is counted from where hydrogen is spent, inside the burning shell.
    let life = &*M030;
    for core_msun in [0.22, 0.24, 0.26] {
        let giant = life.nodes.iter().find(|node| node.helium_core_mass_msun > core_msun).expect("a growing core");
        assert_eq!(giant.stage, Stage::GiantBranch);
        let published = 10_f64.powf(5.37) * giant.helium_core_mass_msun.powi(6);
        assert!((0.45..0.9).contains(&(giant.luminosity_lsun / published)), "{} of {published}", giant.luminosity_lsun);
    }
    let last = life.nodes[life.nodes.len() - 1];
    assert!((0.25..0.29).contains(&last.mass_msun), "white dwarf of {}", last.mass_msun);
}

#[test]
fn some_star_shines_steadily_for_billions_of_years_near_its_end() {
    // Adams, Graves & Laughlin 2004, Rev. Mex. A&A Conf. Ser. 22, 46 (from memory): some 5 Gyr at about a third of the
    // Sun's light. Here that star has 0.15 solar masses.
    let life = &*M015;
    let peak = brightest(life).luminosity_lsun;
    within("peak L of 0.15", peak, 0.30, 0.15);
    let bright: f64 = life
        .nodes
        .windows(2)
        .filter(|pair| pair[0].luminosity_lsun > 0.5 * peak && pair[0].age_yr > 0.0)
        .map(|pair| pair[1].age_yr - pair[0].age_yr)
        .sum();
    within("years above half of the peak", bright, 5e9, 0.2);
}

#[test]
fn burning_sets_free_what_the_nuclei_hold() {
    // Four protons to ⁴He without neutrinos through the first chain: 2 × 6.67 + 12.86 = 26.20 MeV, 6.27 × 10¹⁸ erg per
    // gram of hydrogen; the CN cycle's 24.97 MeV and unburnt ³He take up to 1.5 % away.
    const YEAR_S: f64 = 3.155_76e7;
    const SUN_ERG_S: f64 = 3.828e33;
    const SUN_G: f64 = 1.988_41e33;
    for life in [&*M008, &*M010, &*M015, &*M020] {
        let heat: f64 = life
            .nodes
            .windows(2)
            .map(|p| 0.5 * (p[0].nuclear_luminosity_lsun + p[1].nuclear_luminosity_lsun) * (p[1].age_yr - p[0].age_yr))
            .sum();
        let [first, last] = [life.nodes[0], life.nodes[life.nodes.len() - 1]];
        let burnt = (first.mean_hydrogen_fraction - last.mean_hydrogen_fraction) * first.mass_msun;
        within("erg per gram", heat * SUN_ERG_S * YEAR_S / (burnt * SUN_G), 6.27e18, 0.015);
    }
}
