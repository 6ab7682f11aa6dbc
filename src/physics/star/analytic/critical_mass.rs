//! The masses at which the course of a life changes.

/// Critical masses of one composition, solar masses.
///
/// # Source
/// Hurley, Pols & Tout 2000, MNRAS 315, 543, eqs. 1–3.
#[derive(Clone, Copy, Debug, PartialEq)]
pub struct CriticalMasses {
    /// Above it the track has a hook at the end of the main sequence (the core is convective).
    pub hook_msun: f64,
    /// Below it helium lights in a degenerate core, in a flash.
    pub flash_msun: f64,
    /// At and above it helium lights before the star reaches the giant branch.
    pub blue_ignition_msun: f64,
}

impl CriticalMasses {
    /// Critical masses at heavy-element mass fraction `z`.
    pub(super) fn new(z: f64) -> Self {
        let zeta = (z / 0.02).log10();
        Self {
            hook_msun: 1.0185 + 0.16015 * zeta + 0.0892 * zeta * zeta,
            flash_msun: 1.995 + 0.25 * zeta + 0.087 * zeta * zeta,
            blue_ignition_msun: 13.048 * (z / 0.02).powf(0.06) / (1.0 + 0.0012 * (0.02 / z).powf(1.27)),
        }
    }
}
