//! A made-up but lifelike star for the tests of planets: a star of one solar mass from birth to cold white dwarf.

use longember::physics::planet::StarPoint;

fn point(age_yr: f64, mass_msun: f64, luminosity_lsun: f64, effective_temperature_k: f64) -> StarPoint {
    StarPoint {
        age_yr,
        mass_msun,
        luminosity_lsun,
        radius_rsun: luminosity_lsun.sqrt() * (5772.0 / effective_temperature_k).powi(2),
        effective_temperature_k,
        envelope_mass_msun: 0.0,
        is_giant: false,
        is_remnant: false,
        lost_mass_suddenly: false,
    }
}

/// Contraction, main sequence, red giant, clump, asymptotic giant, white dwarf; about `nodes` nodes in all.
///
/// The brightening on the main sequence is that of Gough 1981, extended; the giant's tip has 2730 L☉ and 256 R☉ at
/// 0.668 M☉ (Schröder & Smith 2008).
pub(crate) fn sun_like(nodes: u32) -> Vec<StarPoint> {
    let each = (nodes / 5).max(8);
    let share = |i: u32| f64::from(i) / f64::from(each - 1);
    let mut track = Vec::new();
    for i in 0..each {
        let x = share(i);
        track.push(point(-4e7 + 4e7 * x, 1.0, 3.0 * (0.7_f64 / 3.0).powf(x), 4300.0 + 1350.0 * x));
    }
    for i in 1..each {
        let x = share(i);
        let age_yr = 1.1e10 * x;
        let luminosity_lsun = 1.0 / (1.0 + 0.4 * (1.0 - (age_yr / 4.57e9).min(1.6))) * (1.0 + 0.5 * x.powi(6));
        track.push(point(age_yr, 1.0, luminosity_lsun, 5650.0 + 150.0 * (3.0 * x).sin()));
    }
    let start = track[track.len() - 1];
    for i in 1..each {
        let x = share(i);
        // Luminosity grows as a power of the time left; most mass goes near the tip.
        let left = 1.0 - x * 0.9999;
        let luminosity_lsun = start.luminosity_lsun * (2730.0 / start.luminosity_lsun).powf(left.ln() / 1e-4_f64.ln());
        let growth = (luminosity_lsun / 2730.0).clamp(0.0, 1.0);
        let mass_msun = 1.0 - 0.332 * growth;
        let radius_rsun = start.radius_rsun
            * (256.0 / start.radius_rsun)
                .powf((luminosity_lsun / start.luminosity_lsun).ln() / (2730.0 / start.luminosity_lsun).ln());
        let teff_k = 5772.0 * (luminosity_lsun / radius_rsun.powi(2)).powf(0.25);
        let mut node = point(1.1e10 + 1e9 * (x * 0.9999), mass_msun, luminosity_lsun, teff_k);
        node.is_giant = true;
        node.envelope_mass_msun = mass_msun - 0.25 - 0.2 * growth;
        track.push(node);
    }
    for i in 0..each {
        let x = share(i);
        let mut node =
            point(1.2e10 + 1e6 + 1e8 * x, 0.667, 50.0 * (1.0 + 60.0 * x.powi(8)), 4700.0 - 1500.0 * x.powi(6));
        node.is_giant = true;
        node.envelope_mass_msun = 0.2 * (1.0 - x).max(0.01);
        track.push(node);
    }
    let end_yr = track[track.len() - 1].age_yr;
    for i in 0..each {
        let x = share(i);
        let age_yr = 10.0_f64.powf(4.0 + 11.0 * x);
        let luminosity_lsun = 100.0 * (age_yr / 1e4).powf(-1.4);
        let mut node = point(end_yr + age_yr, 0.54, luminosity_lsun, 1.0);
        node.radius_rsun = 0.0125;
        node.effective_temperature_k = 5772.0 * (luminosity_lsun / 0.0125_f64.powi(2)).powf(0.25);
        node.is_remnant = true;
        track.push(node);
    }
    track
}

/// A red dwarf of 0.1 M☉: a billion years of contraction, then a very slow brightening.
pub(crate) fn red_dwarf(nodes: u32) -> Vec<StarPoint> {
    (0..nodes)
        .map(|i| {
            let x = f64::from(i) / f64::from(nodes - 1);
            if x < 0.3 {
                // L ~ t^-0.74 from 5 Myr (Baraffe et al. 2015, read off).
                let t_yr = 5e6 * 200.0_f64.powf(x / 0.3);
                point(t_yr - 1e9, 0.1, 0.00085 * (t_yr / 1e9).powf(-0.74), 2850.0)
            } else {
                let age_yr = 5e12 * ((x - 0.3) / 0.7).powi(3);
                point(age_yr, 0.1, 0.00085 * (1.0 + 3.0 * (age_yr / 5e12).powi(2)), 2850.0 + 900.0 * (age_yr / 5e12))
            }
        })
        .collect()
}

/// A star of 15 M☉ that explodes and leaves 1.4 M☉ at once.
pub(crate) fn exploding(nodes: u32) -> Vec<StarPoint> {
    let mut track: Vec<StarPoint> = (0..nodes)
        .map(|i| {
            let x = f64::from(i) / f64::from(nodes - 1);
            let mut node = point(1.3e7 * x, 15.0 - 2.0 * x, 2e4 * (1.0 + 3.0 * x), 30_000.0 - 26_000.0 * x.powi(20));
            node.is_giant = x > 0.95;
            node.envelope_mass_msun = if node.is_giant { 6.0 } else { 0.0 };
            node
        })
        .collect();
    let mut rest = point(1.3e7, 1.4, 1e-3, 1e6);
    rest.radius_rsun = 2e-5;
    rest.is_remnant = true;
    rest.lost_mass_suddenly = true;
    track.push(rest);
    let mut later = rest;
    later.age_yr = 1e10;
    later.luminosity_lsun = 1e-9;
    later.lost_mass_suddenly = false;
    track.push(later);
    track
}
