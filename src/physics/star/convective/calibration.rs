//! The four numbers fitted to published stars, and what they were fitted to.
//!
//! Fitted by least squares to luminosity and radius of Baraffe et al. 2015 (A&A 577, A42) at 5 Gyr for
//! 0.08–0.30 solar masses, then adjusted by hand to bring in 0.08–0.09. The mixing length was not fitted.

/// Factor on the Coulomb pressure below 3000 g cm⁻³.
pub(super) const COULOMB_FACTOR: f64 = 2.2;
/// Factor on every reaction rate.
pub(super) const RATE_FACTOR: f64 = 0.90;
/// Mixing length over pressure scale height. *Common practice*; 2.2 shortens the life of 0.16 solar masses by 2 %.
pub(super) const MIXING_LENGTH: f64 = 1.6;

/// How opaque the molecules of the surface are.
#[derive(Clone, Copy, Debug, PartialEq)]
pub(super) struct MolecularOpacity {
    /// Factor on the opacity below about 4000 K.
    pub(super) factor: f64,
    /// Extra log₁₀ of opacity per log₁₀ of temperature below 2900 K (condensates).
    pub(super) slope: f64,
    /// The factor is whole below the first and gone above the second log₁₀ of temperature.
    pub(super) fades: [f64; 2],
}

/// Surfaces as opaque as today's model atmospheres.
pub(super) const MODERN_SURFACE: MolecularOpacity = MolecularOpacity { factor: 0.86, slope: 5.0, fades: [3.56, 3.66] };
/// Surfaces as opaque as those of the 1997 calculations, which makes lives 1.7 times longer. So large a factor fades out
/// slowly, or else a surface at 4500 K has two structures between which it would have to jump.
pub(super) const SURFACE_1997: MolecularOpacity = MolecularOpacity { factor: 45.0, slope: 0.0, fades: [3.50, 3.76] };
