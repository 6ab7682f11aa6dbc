//! What a life is computed from.

use super::super::calibration::{MODERN_SURFACE, MolecularOpacity, SURFACE_1997};
use super::super::composition::Composition;
use super::super::evolution::Resolution;
use super::error::ConvectiveError;

/// Metal mass fraction at metallicity zero: that of the models the calibration follows.
///
/// Source: Baraffe et al. 2015, A&A 577, A42 (mixture of Caffau et al. 2011).
const SOLAR_METALS: f64 = 0.0153;
/// Helium made with the universe, mass fraction. Source: Planck Collaboration 2020, A&A 641, A6 (0.2470 ± 0.0002,
/// rounded up with Aver et al. 2015 to 0.2477).
const PRIMORDIAL_HELIUM: f64 = 0.2477;
/// Helium made with each gram of metals: what joins that to Y = 0.274 of the calibration's models.
const HELIUM_PER_METALS: f64 = 1.70;
/// ³He at birth, mass fraction. *Common practice* (protosolar).
const HELIUM3_AT_BIRTH: f64 = 3e-5;

/// The star's mass and metallicity.
#[derive(Clone, Copy, Debug, PartialEq)]
pub struct ConvectiveInput {
    /// Mass, solar masses: [`ConvectiveInput::MASS_RANGE_MSUN`].
    pub mass_msun: f64,
    /// log₁₀ of metals over those at metallicity zero (Z = 0.0153): [`ConvectiveInput::METALLICITY_RANGE_DEX`].
    pub metallicity_dex: f64,
}

/// How opaque the molecules of the star's surface are.
#[derive(Clone, Copy, Debug, Default, PartialEq, Eq, Hash)]
pub enum SurfaceOpacity {
    /// As in today's model atmospheres (calibrated to Baraffe et al. 2015).
    #[default]
    Modern,
    /// As in the calculations of Laughlin, Bodenheimer & Adams 1997: fainter stars that live some 1.7 times longer.
    Of1997,
}

/// How a life is computed.
#[derive(Clone, Copy, Debug, Default, PartialEq, Eq, Hash)]
pub struct Options {
    /// Fineness of shells and steps.
    pub resolution: Resolution,
    /// Opacity of the surface's molecules.
    pub surface: SurfaceOpacity,
}

impl SurfaceOpacity {
    pub(in super::super) fn molecules(self) -> MolecularOpacity {
        match self {
            Self::Modern => MODERN_SURFACE,
            Self::Of1997 => SURFACE_1997,
        }
    }
}

impl ConvectiveInput {
    /// Masses that can be computed, solar masses; lighter ones, and metal-poor ones near the lower end, are brown dwarfs.
    pub const MASS_RANGE_MSUN: [f64; 2] = [0.07, 0.5];
    /// Metallicities that can be computed, dex: metals up to 0.03; below 0.001 with the opacity of 0.001.
    pub const METALLICITY_RANGE_DEX: [f64; 2] = [-2.0, 0.29];

    /// Checks both inputs.
    pub(in super::super) fn check(&self) -> Result<(), ConvectiveError> {
        let inputs = [
            ("mass_msun", self.mass_msun, Self::MASS_RANGE_MSUN),
            ("metallicity_dex", self.metallicity_dex, Self::METALLICITY_RANGE_DEX),
        ];
        for (what, value, allowed) in inputs {
            if !(allowed[0]..=allowed[1]).contains(&value) {
                return Err(ConvectiveError::OutOfRange { what, value, allowed });
            }
        }
        Ok(())
    }

    /// Composition at birth.
    pub(in super::super) fn composition(&self) -> Composition {
        let metals = SOLAR_METALS * 10_f64.powf(self.metallicity_dex);
        let helium = PRIMORDIAL_HELIUM + HELIUM_PER_METALS * metals;
        Composition { hydrogen: 1.0 - helium - metals, helium3: HELIUM3_AT_BIRTH, metals }
    }
}

#[cfg(test)]
mod tests {
    use super::*;

    #[test]
    fn metallicity_zero_is_the_mixture_of_the_calibration() {
        let composition = ConvectiveInput { mass_msun: 0.1, metallicity_dex: 0.0 }.composition();
        assert!((composition.hydrogen - 0.711).abs() < 1e-4 && (composition.metals - 0.0153).abs() < 1e-12);
    }

    #[test]
    fn inputs_outside_are_named() {
        let error = ConvectiveInput { mass_msun: f64::NAN, metallicity_dex: 0.0 }.check().unwrap_err();
        assert!(matches!(error, ConvectiveError::OutOfRange { what: "mass_msun", .. }));
        let error = ConvectiveInput { mass_msun: 0.1, metallicity_dex: 0.5 }.check().unwrap_err();
        assert_eq!(error.to_string(), "metallicity_dex is 0.5, allowed -2 to 0.29");
    }
}
