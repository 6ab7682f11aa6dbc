//! What \[Fe/H\] = 0 means: the composition that makes the fits' one-solar-mass star the Sun today.

/// Age of the Sun since the zero-age main sequence, yr.
///
/// # Source
/// Bahcall, Pinsonneault & Wasserburg 1995, Rev. Mod. Phys. 67, 781 (appendix by Wasserburg): 4.57 Gyr.
pub const SOLAR_AGE_YR: f64 = 4.57e9;

/// Mass fraction of elements heavier than helium that stands for \[Fe/H\] = 0.
///
/// The fits' solar models had Z = 0.02 and other nuclear and atomic data than today's; taken literally they make the
/// Sun 4 % too faint. This value is the root of L(1 solar mass, 4.57 Gyr) = 1. It lies between the present photosphere's
/// 0.0134 (Asplund, Grevesse, Sauval & Scott 2009, ARA&A 47, 481) and the fits’ own 0.02.
pub const SOLAR_HEAVY_ELEMENTS: f64 = 0.0184;

/// Heavy-element mass fraction Z = `Z_sun` 10^\[Fe/H\].
#[must_use]
pub fn heavy_elements(metallicity_dex: f64) -> f64 {
    SOLAR_HEAVY_ELEMENTS * 10.0_f64.powf(metallicity_dex)
}

/// Metallicity \[Fe/H\] of a heavy-element mass fraction, dex: the inverse of [`heavy_elements`].
#[must_use]
pub fn metallicity_dex(heavy_elements: f64) -> f64 {
    (heavy_elements / SOLAR_HEAVY_ELEMENTS).log10()
}

/// Mass fraction of hydrogen at birth, X = 0.76 − 3 Z.
///
/// # Source
/// Pols, Schröder, Hurley, Tout & Eggleton 1998, MNRAS 298, 525, section 2.
#[must_use]
pub fn hydrogen_at_birth(heavy_elements: f64) -> f64 {
    0.76 - 3.0 * heavy_elements
}
