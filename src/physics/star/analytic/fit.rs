//! The fits at one composition.

use super::composition::Coefficients;
use super::critical_mass::CriticalMasses;
use crate::physics::star::error::StarError;

/// Heavy-element mass fractions the fits cover.
pub const HEAVY_ELEMENTS_RANGE: (f64, f64) = (1e-4, 0.03);

/// The analytic fits at one composition.
///
/// # Source
/// Tout, Pols, Eggleton & Han 1996, MNRAS 281, 257; Hurley, Pols & Tout 2000, MNRAS 315, 543.
///
/// # Valid for
/// 0.5 to 50 solar masses as published; smooth to 0.35 and 100.
///
/// # Example
/// ```
/// use longember::physics::star::analytic::Fit;
/// let fit = Fit::new(0.02)?;
/// assert!((fit.main_sequence(1.0).end_myr - 11_003.0).abs() < 1.0);
/// # Ok::<(), longember::physics::star::StarError>(())
/// ```
#[derive(Clone, Debug)]
pub struct Fit {
    pub(in crate::physics::star) z: f64,
    pub(super) zeta: f64,
    pub(in crate::physics::star) critical: CriticalMasses,
    pub(super) c: Coefficients,
    /// α of eq. 49: makes the ignition luminosity continuous at the flash mass.
    pub(super) ignition_alpha: f64,
    /// α of eq. 56: makes the luminosity at the asymptotic base continuous at the flash mass.
    pub(super) asymptotic_alpha: f64,
    /// α of eq. 57: makes the helium-burning time continuous at the flash mass.
    pub(super) burning_alpha: f64,
    /// Least luminosity of the blue phase at the flash mass.
    pub(super) flash_blue_least_lsun: f64,
    /// C of eq. 44 for the base of the giant branch.
    pub(super) base_core_constant: f64,
    /// C of eq. 44 for helium ignition.
    pub(super) ignition_core_constant: f64,
    /// f of eq. 58 at the mass of blue ignition.
    pub(super) blue_extent_at_ignition: f64,
}

impl Fit {
    /// The fits at heavy-element mass fraction `z`.
    ///
    /// # Errors
    /// [`StarError::HeavyElements`] outside [`HEAVY_ELEMENTS_RANGE`].
    pub fn new(z: f64) -> Result<Self, StarError> {
        let (least, most) = HEAVY_ELEMENTS_RANGE;
        if !(least..=most).contains(&z) {
            return Err(StarError::HeavyElements { value: z, least, most });
        }
        Ok(Self::evaluated(z))
    }

    fn evaluated(z: f64) -> Self {
        let critical = CriticalMasses::new(z);
        let c = Coefficients::new(z, &critical);
        let mut fit = Self {
            z,
            zeta: (z / 0.02).log10(),
            critical,
            c,
            ignition_alpha: 0.0,
            asymptotic_alpha: 0.0,
            burning_alpha: 0.0,
            flash_blue_least_lsun: 0.0,
            base_core_constant: 0.0,
            ignition_core_constant: 0.0,
            blue_extent_at_ignition: 1.0,
        };
        // At the flash mass itself every formula takes its upper branch, which needs none of the constants below.
        let flash = fit.critical.flash_msun;
        let b = fit.c.b;
        let ignition = fit.helium_ignition_luminosity_lsun(flash);
        let asymptotic = fit.asymptotic_base_luminosity_lsun(flash);
        fit.ignition_alpha = b[9] * flash.powf(b[10]) / ignition - 1.0;
        fit.asymptotic_alpha = b[29] * flash.powf(b[30]) / asymptotic - 1.0;
        fit.burning_alpha = fit.core_helium_myr(flash, 0.0) / b[39] - 1.0;
        fit.flash_blue_least_lsun = fit.blue_least_luminosity_lsun(flash);
        fit.base_core_constant = fit.core_constant(fit.giant_branch_base_luminosity_lsun(flash));
        fit.ignition_core_constant = fit.core_constant(ignition);
        fit.blue_extent_at_ignition = fit.blue_extent(fit.critical.blue_ignition_msun);
        fit
    }

    /// Heavy-element mass fraction.
    #[must_use]
    pub fn heavy_elements(&self) -> f64 {
        self.z
    }

    /// Masses at which the course of a life changes.
    #[must_use]
    pub fn critical_masses(&self) -> CriticalMasses {
        self.critical
    }
}
