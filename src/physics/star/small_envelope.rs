//! Giants with little envelope left: on the way from the giant to its bare core.

/// Luminosity and radius of the bare core, or of the whole star, solar units.
pub(super) type Surface = (f64, f64);

/// How far the envelope is from vanishing; below one the core shows through.
///
/// # Source
/// Hurley, Pols & Tout 2000, MNRAS 315, 543, eq. 97.
pub(super) fn envelope_measure(mass_msun: f64, core_msun: f64, luminosity_lsun: f64) -> f64 {
    (mass_msun - core_msun) / mass_msun * (7e4 / luminosity_lsun).sqrt().clamp(1.2, 5.0)
}

/// The same for helium giants, whose core can reach `largest_core_msun` (eq. 98).
pub(super) fn helium_envelope_measure(largest_core_msun: f64, core_msun: f64) -> f64 {
    5.0 * (largest_core_msun - core_msun) / largest_core_msun
}

/// Measure at which luminosity is halfway (in logarithm) to the bare core's, and below which the core outshines the
/// envelope (b of eq. 101).
pub(super) fn thin_envelope_measure(mass_msun: f64) -> f64 {
    0.002 * (2.5 / mass_msun).max(1.0)
}

/// Luminosity and radius of a star whose thin envelope lets its core show.
///
/// # Source
/// Hurley, Pols & Tout 2000, MNRAS 315, 543, eqs. 99–105.
pub(super) fn shown_through(star: Surface, core: Surface, measure: f64, mass_msun: f64) -> Surface {
    let ((l, r), (l_core, r_core)) = (star, core);
    if measure >= 1.0 || r <= r_core {
        return star;
    }
    let mu = measure.max(0.0);
    let b = thin_envelope_measure(mass_msun);
    let c = 3.0 * b;
    let blend = |half: f64| (1.0 + half.powi(3)) * (mu / half).powi(3) / (1.0 + (mu / half).powi(3));
    let s = blend(b);
    let q = (r / r_core).ln();
    let t = blend(c) * mu.powf(0.1 / q);
    (l_core * (l / l_core).powf(s), r_core * (r / r_core).powf(t))
}

#[cfg(test)]
mod tests {
    use super::*;

    #[test]
    fn it_joins_the_full_star_and_the_bare_core() {
        let (star, core) = ((5000.0, 200.0), (3000.0, 0.05));
        assert_eq!(shown_through(star, core, 1.0, 0.6), star);
        let (l, r) = shown_through(star, core, 1.0 - 1e-9, 0.6);
        assert!((l / star.0 - 1.0).abs() < 1e-6 && (r / star.1 - 1.0).abs() < 1e-6);
        assert_eq!(shown_through(star, core, 0.0, 0.6), core);
        assert_eq!(shown_through(star, core, -0.1, 0.6), core);
    }
}
