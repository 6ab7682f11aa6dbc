//! The analytic fits against checkpoints evaluated outside this project.

use crate::star_fit_data::{FIXED, Fixed, LIVED};
use longember::physics::star::analytic::{Anchors, Fit};
use longember::physics::star::remnant::linear_remnant_mass_msun;
use longember::physics::star::{Phase, StarEventKind, Track};

/// The fits' value of a checkpoint; nothing for an unknown name.
fn fixed_value(fit: &Fit, m: f64, anchors: &Anchors, name: &str) -> Option<f64> {
    let ms = &anchors.main_sequence;
    let pair = |(l, r): (f64, f64)| if name.starts_with("L_") || name.starts_with("CHeB_L") { l } else { r };
    if let Some(time) = name.strip_prefix("L_at_").or_else(|| name.strip_prefix("R_at_")) {
        let (number, unit) = time.split_once('_')?;
        let number: f64 = number.parse().ok()?;
        let age = match unit {
            "Gyr" => 1000.0 * number,
            "tMS" => number * ms.end_myr,
            "thook" => number * ms.hook_myr,
            _ => return None,
        };
        return Some(pair(ms.at(age)));
    }
    if let Some(fraction) = name.strip_prefix("CHeB_L_").or_else(|| name.strip_prefix("CHeB_R_")) {
        return Some(pair(fit.core_helium_burning(anchors, m, fraction.parse().ok()?)));
    }
    Some(match name {
        "M_hook" => fit.critical_masses().hook_msun,
        "M_HeF" => fit.critical_masses().flash_msun,
        "M_FGB" => fit.critical_masses().blue_ignition_msun,
        "L_ZAMS" => ms.zero_age_luminosity_lsun,
        "R_ZAMS" => ms.zero_age_radius_rsun,
        "t_MS" => ms.end_myr,
        "t_hook" => ms.hook_myr,
        "t_BGB" => ms.base_myr,
        "L_TMS" => ms.end_luminosity_lsun,
        "R_TMS" => ms.end_radius_rsun,
        "L_BGB" => anchors.base_lsun,
        "R_giant_at_L_BGB" => fit.giant_radius_rsun(m, anchors.base_lsun),
        "Mc_BGB" => anchors.base_core_msun,
        "t_HeI" => anchors.ignition_myr,
        "L_HeI" => anchors.ignition_lsun,
        "R_giant_at_L_HeI" => fit.giant_radius_rsun(m, anchors.ignition_lsun),
        "R_HeI" => fit.helium_ignition_radius_rsun(anchors, m),
        "Mc_HeI" => anchors.ignition_core_msun,
        "t_He" => anchors.core_helium_myr,
        "tau_bl" => anchors.blue_fraction,
        "L_BAGB" => anchors.asymptotic_base_lsun,
        "R_AGB_at_L_BAGB" => fit.asymptotic_radius_rsun(m, anchors.asymptotic_base_lsun),
        "Mc_BAGB" => anchors.asymptotic_base_core_msun,
        "t_DU" => anchors.pulses_myr?,
        "L_DU" => anchors.pulses_lsun,
        "L_TP_0.2Myr" => {
            let growth = anchors.pulse_growth?;
            growth.relation().luminosity_lsun(growth.core_msun(anchors.pulses_myr? + 0.2))
        }
        _ => return None,
    })
}

fn check_fixed(of: &Fixed, wrong: &mut Vec<String>) {
    let fit = Fit::new(of.heavy_elements).unwrap();
    let m = if of.mass_msun > 0.0 { of.mass_msun } else { 1.0 };
    let anchors = fit.anchors(m);
    for &(name, wanted) in of.values {
        match fixed_value(&fit, m, &anchors, name) {
            // Six digits are printed.
            Some(got) if (got - wanted).abs() <= 1e-5 * wanted => {}
            got => wrong.push(format!("Z {} M {m} {name}: {got:?}, wanted {wanted}", of.heavy_elements)),
        }
    }
}

#[test]
fn fixed_points_agree_to_five_digits() {
    let count: usize = FIXED.iter().map(|of| of.values.len()).sum();
    assert!(count >= 600, "{count}");
    let mut wrong = Vec::new();
    for of in FIXED {
        check_fixed(of, &mut wrong);
    }
    assert!(wrong.is_empty(), "{} of {count}\n{}", wrong.len(), wrong.join("\n"));
}

/// Largest luminosity and radius of a phase, its last moment included.
fn extremes(track: &Track, phase: Phase) -> Option<(f64, f64)> {
    let span = track.spans().iter().find(|span| span.phase == phase)?;
    // The settling after the flash starts core helium burning of light stars at the tip of the giant branch.
    let flash = track.age_of_yr(StarEventKind::HeliumIgnition { flash: true });
    let from_yr = span.from_yr + if flash == Some(span.from_yr) { 1e4 } else { 0.0 };
    let mut most = (0.0_f64, 0.0_f64);
    for &age in track.node_ages_yr().iter().filter(|&&age| age >= from_yr && age < span.to_yr) {
        let state = track.state_at(age);
        most = (most.0.max(state.luminosity_lsun), most.1.max(state.radius_rsun));
    }
    Some(most)
}

fn lived_value(track: &Track, name: &str) -> Option<f64> {
    let span = |phase: Phase| track.spans().iter().find(|span| span.phase == phase);
    let lasts_myr = |phase: Phase| span(phase).map(|span| (span.to_yr - span.from_yr) / 1e6);
    if let Some((which, phase)) = name.split_once("max_") {
        let phase = match phase {
            "RGB" => Phase::FirstGiantBranch,
            "CHeB" => Phase::CoreHeliumBurning,
            "EAGB" => Phase::EarlyAsymptoticGiant,
            "TPAGB" => Phase::PulsingAsymptoticGiant,
            _ => return None,
        };
        let most = extremes(track, phase)?;
        return Some(if which == "L" { most.0 } else { most.1 });
    }
    let end = track.spans().last()?;
    Some(match name {
        "t_end" => end.from_yr / 1e6,
        "t_He" => lasts_myr(Phase::CoreHeliumBurning)?,
        "t_TPAGB" => lasts_myr(Phase::PulsingAsymptoticGiant)?,
        "M_at_RGBtip" => track.state_at(span(Phase::CoreHeliumBurning)?.from_yr).mass_msun,
        // The checkpoint of the collapse was made with the older remnant formula.
        "remnant_mass" => track.collapse().map_or(track.state_at(end.from_yr).mass_msun, |collapse| {
            linear_remnant_mass_msun(collapse.explosive_core_msun)
        }),
        _ => return None,
    })
}

#[test]
fn whole_lives_with_winds_agree() {
    let mut wrong = Vec::new();
    let mut count = 0;
    for of in LIVED {
        let track = Track::compute_with(of.mass_msun, &Fit::new(0.02).unwrap()).unwrap();
        for &(name, wanted) in of.values {
            count += 1;
            let tolerance = if name == "t_TPAGB" { 0.01 } else { 0.003 };
            match lived_value(&track, name) {
                Some(got) if (got / wanted - 1.0).abs() < tolerance => {}
                got => wrong.push(format!("M {} {name}: {got:?}, wanted {wanted}", of.mass_msun)),
            }
        }
    }
    assert!(count >= 60, "{count}");
    assert!(wrong.is_empty(), "{}", wrong.join("\n"));
}

#[test]
fn ends_are_of_the_right_kind() {
    // Common practice: below about 0.8 solar masses no helium ignition with this wind; above 8 a collapse.
    for (mass, end) in [
        (0.5, Phase::HeliumWhiteDwarf),
        (1.0, Phase::CarbonOxygenWhiteDwarf),
        (5.0, Phase::CarbonOxygenWhiteDwarf),
        (8.0, Phase::OxygenNeonWhiteDwarf),
    ] {
        let track = Track::compute_with(mass, &Fit::new(0.02).unwrap()).unwrap();
        assert_eq!(track.state_at(1e14).phase, end, "{mass}");
    }
}

#[test]
fn a_track_follows_the_formula_between_its_nodes() {
    // No wind below 4000 solar luminosities, so that the main sequence is the formula itself.
    let mut worst = (0.0_f64, String::new());
    for z in [1e-4, 1e-3, 0.01, 0.0184, 0.03] {
        let fit = Fit::new(z).unwrap();
        for mass in [0.35, 0.5, 0.8, 1.0, 1.1, 1.15, 1.3, 1.47, 1.6, 2.0, 3.0, 5.0] {
            let track = Track::compute_with(mass, &fit).unwrap();
            let main_sequence = fit.main_sequence(mass);
            for step in 0..2000 {
                let myr = main_sequence.end_myr * (f64::from(step) + 0.5) / 2000.0;
                let (luminosity, radius) = main_sequence.at(myr);
                let state = track.state_at(myr * 1e6);
                let error =
                    (state.luminosity_lsun / luminosity).ln().abs().max((state.radius_rsun / radius).ln().abs());
                if error > worst.0 {
                    worst = (error, format!("Z {z} M {mass} {myr} Myr"));
                }
            }
        }
    }
    assert!(worst.0 < 1.5e-3, "{worst:?}");
}
