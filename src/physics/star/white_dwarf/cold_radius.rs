//! Radius of a cold white dwarf.

use crate::physics::star::analytic::CHANDRASEKHAR_MSUN;

/// Radius of a cold white dwarf, solar radii: 0.0115 √[(1.44/M)^(2/3) − (M/1.44)^(2/3)].
///
/// # Source
/// Hurley, Pols & Tout 2000, MNRAS 315, 543, eq. 91 (after Tout et al. 1997).
///
/// # Valid for
/// Up to the limiting mass of 1.44 solar masses, where it ends at the radius of a neutron star.
#[must_use]
pub fn cold_radius_rsun(mass_msun: f64) -> f64 {
    let ratio = (CHANDRASEKHAR_MSUN / mass_msun).cbrt().powi(2);
    (0.0115 * (ratio - 1.0 / ratio).max(0.0).sqrt()).max(1.4e-5)
}

#[cfg(test)]
mod tests {
    use super::*;

    #[test]
    fn heavier_white_dwarfs_are_smaller() {
        assert!((cold_radius_rsun(0.6) - 0.0125).abs() < 0.0005);
        let radii: Vec<f64> = (2..=14).map(|tenth| cold_radius_rsun(f64::from(tenth) / 10.0)).collect();
        assert!(radii.windows(2).all(|pair| pair[1] < pair[0]));
        assert_eq!(cold_radius_rsun(1.5), 1.4e-5);
    }
}
