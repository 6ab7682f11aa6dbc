//! The matter of a red dwarf by itself, at any density and temperature.

use super::composition::Composition;
use super::gas::{Gas, gas};
use super::life::{ConvectiveError, ConvectiveInput, SurfaceOpacity};
use super::opacity::{Opacity, RadiativeOpacity};

/// Pressure unit, erg cm⁻³.
const BAR: f64 = 1e6;

/// Gas and opacity of a star's matter at birth, as the structure equations see them.
///
/// # Source
/// That of [`compute`](super::compute).
/// # Valid for
/// Matter as it is met inside red dwarfs. In a gas hotter and thinner than theirs (10⁷ K at 0.001 g cm⁻³) conduction is
/// overestimated, and the opacity too low.
/// # Example
/// ```
/// use longember::physics::star::convective::{ConvectiveInput, StarMatter, SurfaceOpacity};
/// let input = ConvectiveInput { mass_msun: 0.12, metallicity_dex: 0.0 };
/// let matter = StarMatter::new(input, SurfaceOpacity::Modern)?;
/// let centre = matter.gas(300.0, 5e6, None).ok_or("no such gas")?;
/// assert!(centre.pressure_bar() > 1e11 && matter.opacity_cm2_g(&centre) > 0.1);
/// # Ok::<(), Box<dyn std::error::Error>>(())
/// ```
#[derive(Clone, Debug)]
pub struct StarMatter {
    composition: Composition,
    opacity: Opacity,
}

/// The gas at one density and temperature.
#[derive(Clone, Copy, Debug)]
pub struct GasState {
    ln_density: f64,
    ln_temperature: f64,
    gas: Gas,
}

impl StarMatter {
    /// Densities that can be asked for, g cm⁻³.
    pub const DENSITY_RANGE_G_CM3: [f64; 2] = [1e-10, 1e7];
    /// Temperatures that can be asked for, K.
    pub const TEMPERATURE_RANGE_K: [f64; 2] = [1000.0, 1e8];

    /// The matter of which a star is born.
    ///
    /// # Errors
    /// [`ConvectiveError::OutOfRange`], [`ConvectiveError::DamagedTable`].
    pub fn new(input: ConvectiveInput, surface: SurfaceOpacity) -> Result<Self, ConvectiveError> {
        input.check()?;
        let composition = input.composition();
        let tables = RadiativeOpacity::new(composition.metals).ok_or(ConvectiveError::DamagedTable)?;
        Ok(Self { composition, opacity: Opacity::new(tables, surface.molecules()) })
    }

    /// The gas at a density and a temperature; the search starts from a similar state where one is known.
    ///
    /// Nothing outside [`Self::DENSITY_RANGE_G_CM3`] and [`Self::TEMPERATURE_RANGE_K`], and where the gas has no neutral
    /// state.
    #[must_use]
    pub fn gas(&self, density_g_cm3: f64, temperature_k: f64, similar: Option<&GasState>) -> Option<GasState> {
        let is_inside = |value: f64, [least, most]: [f64; 2]| (least..=most).contains(&value);
        if !is_inside(density_g_cm3, Self::DENSITY_RANGE_G_CM3) || !is_inside(temperature_k, Self::TEMPERATURE_RANGE_K)
        {
            return None;
        }
        let [ln_density, ln_temperature] = [density_g_cm3.ln(), temperature_k.ln()];
        let guess = similar.map_or(0.0, |state| state.gas.ln_f.value);
        let gas = gas(&self.composition, ln_density, ln_temperature, guess)?;
        Some(GasState { ln_density, ln_temperature, gas })
    }

    /// Opacity to radiation and conduction together, cm² g⁻¹.
    #[must_use]
    pub fn opacity_cm2_g(&self, state: &GasState) -> f64 {
        let GasState { ln_density, ln_temperature, gas } = state;
        self.opacity.ln_opacity(&self.composition, *ln_density, *ln_temperature, gas.electrons_per_cm3).value.exp()
    }
}

impl GasState {
    /// Pressure, bar.
    #[must_use]
    pub fn pressure_bar(&self) -> f64 {
        self.gas.ln_pressure.value.exp() / BAR
    }

    /// Adiabatic gradient dlnT/dlnP.
    #[must_use]
    pub fn adiabatic_gradient(&self) -> f64 {
        self.gas.adiabatic_gradient.value
    }
}

#[cfg(test)]
mod tests {
    use super::*;

    fn matter() -> StarMatter {
        let input = ConvectiveInput { mass_msun: 0.12, metallicity_dex: 0.0 };
        StarMatter::new(input, SurfaceOpacity::Modern).expect("in range")
    }

    #[test]
    fn a_thin_hot_plasma_is_ideal_gas_and_radiation() {
        let state = matter().gas(1e-4, 3e6, None).expect("a plasma");
        // ρkT/(μ mᵤ) + aT⁴/3 with 1/μ = 2 × 0.711/1.00784 + 3 × 0.2737/4.0026 + 9 × 0.0153/17 = 1.624.
        let expected_bar = (1e-4 * 8.314463e7 * 3e6 * 1.624 + 7.56573e-15 * 3e6_f64.powi(4) / 3.0) / 1e6;
        assert!((state.pressure_bar() / expected_bar - 1.0).abs() < 5e-3, "{} {expected_bar}", state.pressure_bar());
        assert!((0.24..0.27).contains(&state.adiabatic_gradient()), "{}", state.adiabatic_gradient());
    }

    #[test]
    fn a_core_like_the_suns_is_about_as_opaque_as_the_sun_is() {
        let matter = matter();
        let state = matter.gas(150.0, 1.57e7, None).expect("a core");
        // From memory: 1.2 cm² g⁻¹ at the centre of the Sun, which has less hydrogen.
        let opacity = matter.opacity_cm2_g(&state);
        assert!((0.8..2.4).contains(&opacity), "{opacity}");
    }

    #[test]
    fn where_the_search_starts_changes_nothing() {
        let matter = matter();
        let near = matter.gas(320.0, 4.7e6, None);
        let (cold, warm) = (matter.gas(300.0, 4.6e6, None), matter.gas(300.0, 4.6e6, near.as_ref()));
        let [cold, warm] = [cold, warm].map(|state| state.expect("a core").pressure_bar());
        assert!((cold / warm - 1.0).abs() < 1e-9, "{cold} {warm}");
    }

    #[test]
    fn what_is_no_density_has_no_gas() {
        for [density_g_cm3, temperature_k] in [[f64::NAN, 1e6], [-1.0, 1e6], [1.0, 0.0], [1e9, 1e6], [1.0, f64::NAN]] {
            assert!(matter().gas(density_g_cm3, temperature_k, None).is_none(), "{density_g_cm3} {temperature_k}");
        }
    }
}
