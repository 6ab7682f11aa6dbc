//! How a year's starlight falls on the latitudes of a tilted planet.

use std::f64::consts::{PI, TAU};

/// Steps along the year. The orbit is circular, so equal steps of longitude are equal steps of time.
const STEPS: u32 = 120;

/// The annual mean starlight at a latitude over the flux at the planet, dimensionless, before normalising:
/// `⟨(H sin φ sin δ + cos φ cos δ sin H)/π⟩`, sin δ = sin ε sin λ, cos H = −tan φ tan δ.
///
/// # Source
/// Daily mean insolation (textbook form, e.g. Berger 1978) averaged over a circular orbit.
pub(crate) fn annual_share(sine_of_latitude: f64, obliquity_rad: f64) -> f64 {
    let cosine = (1.0 - sine_of_latitude * sine_of_latitude).max(0.0).sqrt();
    let tilt = obliquity_rad.sin();
    // The year is symmetric about its solstices, so one half of it tells all.
    let half = STEPS / 2;
    let mut sum = 0.0;
    for step in 0..half {
        let longitude = (f64::from(step) + 0.5) * TAU / f64::from(STEPS) - 0.5 * PI;
        let sin_d = tilt * longitude.sin();
        let cos_d = (1.0 - sin_d * sin_d).sqrt();
        let up = sine_of_latitude * sin_d;
        let across = cosine * cos_d;
        let cos_h = if across > 1e-12 {
            (-up / across).clamp(-1.0, 1.0)
        } else if up > 0.0 {
            -1.0
        } else {
            1.0
        };
        let h = cos_h.acos();
        sum += (h * up + across * (1.0 - cos_h * cos_h).sqrt()) / PI;
    }
    sum / f64::from(half)
}

#[cfg(test)]
mod tests {
    use super::*;

    #[test]
    fn the_pole_receives_the_sine_of_the_tilt_over_pi() {
        for obliquity_deg in [10.0_f64, 23.44, 60.0, 90.0] {
            let tilt = obliquity_deg.to_radians();
            let share = annual_share(1.0 - 1e-12, tilt);
            assert!((share / (tilt.sin() / PI) - 1.0).abs() < 3e-4, "{obliquity_deg}: {share}");
        }
    }

    #[test]
    fn the_earths_second_legendre_coefficient_is_the_published_one() {
        // q = (1 + s₂ P₂)/4 on the sine of latitude: s₂ = 5 ∫ 4q P₂ dx over half the globe. North 1975: −0.477.
        let steps = 2000;
        let sum: f64 = (0..steps)
            .map(|i| {
                let x = (f64::from(i) + 0.5) / f64::from(steps);
                annual_share(x, 23.44_f64.to_radians()) * 0.5 * (3.0 * x * x - 1.0)
            })
            .sum();
        let s2 = 5.0 * 4.0 * sum / f64::from(steps);
        assert!((s2 + 0.477).abs() < 2e-3, "{s2}");
    }

    #[test]
    fn an_upright_planet_has_the_cosine_law() {
        for sine in [0.0_f64, 0.3, 0.8] {
            assert!((annual_share(sine, 0.0) - (1.0 - sine * sine).sqrt() / PI).abs() < 1e-12);
        }
    }
}
