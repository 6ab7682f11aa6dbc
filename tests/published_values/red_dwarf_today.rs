//! Red dwarfs of today's ages against evolutionary models with detailed atmospheres.
//!
//! Source of every row: Baraffe, Homeier, Allard & Chabrier 2015, A&A 577, A42, tracks and structure tables.

use crate::red_dwarf_lives::{M008, M010, M015, M020, M030, M040, since_birth};
use longember::physics::star::convective::Life;

/// Mass; log₁₀ L, R, `T_eff`, log₁₀ `T_c`, log₁₀ `ρ_c` at 5 Gyr.
fn rows() -> [(&'static Life, [f64; 5]); 6] {
    [
        (&M008, [-3.5770, 0.0990, 2343.0, 6.557, 2.8047]),
        (&M010, [-3.0610, 0.1240, 2811.0, 6.661, 2.6031]),
        (&M015, [-2.5800, 0.1748, 3131.0, 6.761, 2.3428]),
        (&M020, [-2.3161, 0.2180, 3262.0, 6.813, 2.1841]),
        (&M030, [-1.9612, 0.2990, 3416.0, 6.8692, 1.9556]),
        (&M040, [-1.7060, 0.3770, 3521.0, 6.8990, 1.8511]),
    ]
}

#[test]
fn luminosity_radius_and_temperature_at_five_billion_years() {
    for (life, [log_luminosity, radius, temperature, ..]) in rows() {
        let star = since_birth(life, 5e9);
        let mass = star.mass_msun;
        let luminosity = star.luminosity_lsun / 10_f64.powf(log_luminosity);
        assert!((luminosity - 1.0).abs() < 0.07, "L of {mass}: {luminosity}");
        assert!((star.radius_rsun / radius - 1.0).abs() < 0.025, "R of {mass}: {}", star.radius_rsun);
        let t = star.effective_temperature_k;
        assert!((t / temperature - 1.0).abs() < 0.025, "T of {mass}: {t}");
    }
}

#[test]
fn centre_at_five_billion_years() {
    for (life, [.., log_temperature, log_density]) in rows() {
        let star = since_birth(life, 5e9);
        let mass = star.mass_msun;
        let hotter = star.core_temperature_k / 10_f64.powf(log_temperature);
        assert!((hotter - 1.0).abs() < 0.03, "T_c of {mass}: {hotter}");
        let denser = star.core_density_g_cm3 / 10_f64.powf(log_density);
        assert!((denser - 1.0).abs() < 0.08, "rho_c of {mass}: {denser}");
    }
}

#[test]
fn the_young_star_contracts_on_the_published_track() {
    // 0.1 and 0.2 solar masses at 100 Myr: log₁₀ L, R, T_eff.
    let rows = [(&*M010, [-2.6052, 0.1856, 2993.9]), (&*M020, [-2.1382, 0.2658, 3272.0])];
    for (life, [log_luminosity, radius, temperature]) in rows {
        let star = since_birth(life, 1e8);
        let mass = star.mass_msun;
        assert!(star.age_yr < 0.0, "{mass} contracts for longer than 100 Myr");
        let luminosity = star.luminosity_lsun / 10_f64.powf(log_luminosity);
        assert!((luminosity - 1.0).abs() < 0.08, "L of {mass}: {luminosity}");
        assert!((star.radius_rsun / radius - 1.0).abs() < 0.04, "R of {mass}: {}", star.radius_rsun);
        let t = star.effective_temperature_k;
        assert!((t / temperature - 1.0).abs() < 0.03, "T of {mass}: {t}");
    }
}
