//! The young star with which a life begins, and one step of its time.

use super::super::cgs::SOLAR_MASS;
use super::super::evolution::{Stepper, contracting_star};
use super::super::matter::Microphysics;
use super::super::opacity::{Opacity, RadiativeOpacity};
use super::super::structure::{Mesh, Model};
use super::error::ConvectiveError;
use super::input::{ConvectiveInput, Options};

/// A step of this share of the thermal time is far from any that fails.
const SAFE_STEP: f64 = 0.01;

/// A contracting star whose structure is solved, ready to be followed.
///
/// [`compute`](super::compute()) begins with one; by itself it shows what one step costs.
pub struct YoungStar {
    pub(super) stepper: Stepper,
    pub(super) model: Model,
}

impl YoungStar {
    /// Finds the star, some nine times as large as it will be on the main sequence.
    ///
    /// # Errors
    /// [`ConvectiveError::OutOfRange`], [`ConvectiveError::DamagedTable`], [`ConvectiveError::NoStart`].
    pub fn new(input: ConvectiveInput, options: Options) -> Result<Self, ConvectiveError> {
        input.check()?;
        let composition = input.composition();
        let tables = RadiativeOpacity::new(composition.metals).ok_or(ConvectiveError::DamagedTable)?;
        let opacity = Opacity::new(tables, options.surface.molecules());
        let laws = Microphysics { opacity, cn_ceiling_k: None };
        let mass_msun = input.mass_msun;
        let mesh = Mesh::new(mass_msun * SOLAR_MASS, options.resolution.spacing());
        let model = contracting_star(&laws, &mesh, composition).ok_or(ConvectiveError::NoStart { mass_msun })?;
        Ok(Self { stepper: Stepper { laws, mesh, stride: options.resolution.stride() }, model })
    }

    /// Number of mass shells.
    #[must_use]
    pub fn shells(&self) -> usize {
        self.stepper.mesh.len()
    }

    /// Solves the structure a hundredth of the thermal time later, twice as every step does, and returns how often the
    /// second solution was corrected. The star stays as it was.
    ///
    /// Nothing if no structure is found.
    #[must_use]
    pub fn step_corrections(&self) -> Option<usize> {
        let step_s = SAFE_STEP * self.model.thermal_time_s(&self.stepper.mesh);
        Some(self.stepper.advance(&self.model, None, step_s)?.iterations)
    }
}

#[cfg(test)]
mod tests {
    use super::*;

    #[test]
    fn a_small_step_settles_soon() {
        let input = ConvectiveInput { mass_msun: 0.1, metallicity_dex: 0.0 };
        let star = YoungStar::new(input, Options::default()).expect("a young star");
        assert!(star.shells() > 200, "{}", star.shells());
        let corrections = star.step_corrections().expect("a structure");
        assert!((1..10).contains(&corrections), "{corrections}");
    }

    #[test]
    fn what_cannot_be_a_star_is_named() {
        let input = ConvectiveInput { mass_msun: 3.0, metallicity_dex: 0.0 };
        let error = YoungStar::new(input, Options::default()).err();
        assert!(matches!(error, Some(ConvectiveError::OutOfRange { what: "mass_msun", .. })), "{error:?}");
    }
}
