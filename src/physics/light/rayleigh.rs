//! Scattering of light by the molecules of a clear atmosphere.

use super::range::{OutOfRange, within};
use crate::units::constants::ATOMIC_MASS_KG;

/// What an atmosphere is made of, as far as scattering goes.
#[derive(Clone, Copy, Debug, Default, PartialEq, Eq, Hash)]
pub enum Gas {
    /// Dry air as on Earth.
    #[default]
    Air,
    /// Pure carbon dioxide.
    CarbonDioxide,
}

impl Gas {
    /// Both gases.
    pub const ALL: [Self; 2] = [Self::Air, Self::CarbonDioxide];

    /// The gas in words for people.
    #[must_use]
    pub fn name(self) -> &'static str {
        match self {
            Self::Air => "Earth-like air",
            Self::CarbonDioxide => "carbon dioxide",
        }
    }

    /// Mean molecular mass, u. Air: US Standard Atmosphere 1976; CO₂: IUPAC atomic weights.
    #[must_use]
    pub fn molecular_mass_u(self) -> f64 {
        match self {
            Self::Air => 28.9644,
            Self::CarbonDioxide => 44.0095,
        }
    }
}

/// A clear atmosphere over one place.
#[derive(Clone, Copy, Debug, PartialEq)]
pub struct Atmosphere {
    /// What it is made of.
    pub gas: Gas,
    /// Pressure at the surface, bar.
    pub surface_pressure_bar: f64,
    /// Gravity at the surface, m s⁻².
    pub surface_gravity_m_s2: f64,
    /// Share of light the ground throws back, grey.
    pub ground_albedo: f64,
}

impl Atmosphere {
    /// The Earth's air at mean sea level over ground of albedo 0.2.
    pub const EARTH: Self =
        Self { gas: Gas::Air, surface_pressure_bar: 1.01325, surface_gravity_m_s2: 9.80665, ground_albedo: 0.2 };

    /// Column of molecules, m⁻²: P/(g m).
    ///
    /// # Source
    /// Hydrostatic balance.
    ///
    /// # Errors
    /// [`OutOfRange`] for a pressure outside 0 to 10⁶ bar, a gravity outside 10⁻³ to 10⁶ m s⁻² or a ground
    /// albedo outside 0 to 1.
    pub fn column_per_m2(&self) -> Result<f64, OutOfRange> {
        let pressure_bar = within("surface_pressure_bar", self.surface_pressure_bar, 0.0, 1e6, "0 to 1e6 bar")?;
        let gravity_m_s2 = within("surface_gravity_m_s2", self.surface_gravity_m_s2, 1e-3, 1e6, "0.001 to 1e6 m/s2")?;
        within("ground_albedo", self.ground_albedo, 0.0, 1.0, "0 to 1")?;
        Ok(pressure_bar * 1e5 / (gravity_m_s2 * self.gas.molecular_mass_u() * ATOMIC_MASS_KG))
    }

    /// Vertical optical depth at one wavelength.
    ///
    /// # Source
    /// Cross-section by [`rayleigh_cross_section_m2`] times the column.
    ///
    /// # Errors
    /// As [`Atmosphere::column_per_m2`] and [`rayleigh_cross_section_m2`].
    pub fn optical_depth(&self, wavelength_nm: f64) -> Result<f64, OutOfRange> {
        Ok(rayleigh_cross_section_m2(wavelength_nm, self.gas)? * self.column_per_m2()?)
    }
}

/// Rayleigh scattering cross-section of one molecule, m².
///
/// # Source
/// Air: Bucholtz (1995), Applied Optics 34, 2765, equation 8 and table 3, with a step of 0.3 % at 500 nm.
/// CO₂: Sneep & Ubachs (2005), JQSRT 92, 293, equations 2 and 13, with the coefficient of equation 13 read as
/// 1.1427·10³ (misprinted as 10⁶), King factor from the same paper.
///
/// # Valid for
/// 350 to 850 nm, which holds the whole visible band; good to 1 % for air. For CO₂ the cross-section that the
/// same paper measured at 532 nm is about 7 % lower (from memory).
///
/// # Errors
/// [`OutOfRange`] for a wavelength outside 350 to 850 nm.
pub fn rayleigh_cross_section_m2(wavelength_nm: f64, gas: Gas) -> Result<f64, OutOfRange> {
    Ok(cross_section_unchecked_m2(within("wavelength_nm", wavelength_nm, 350.0, 850.0, "350 to 850 nm")?, gas))
}

/// [`rayleigh_cross_section_m2`] for a wavelength known to be in range.
pub(super) fn cross_section_unchecked_m2(wavelength_nm: f64, gas: Gas) -> f64 {
    match gas {
        Gas::Air => air_m2(wavelength_nm * 1e-3),
        Gas::CarbonDioxide => carbon_dioxide_m2(1e7 / wavelength_nm),
    }
}

/// σ = A λ^−(B + Cλ + D/λ), σ in cm², λ in µm.
fn air_m2(wavelength_um: f64) -> f64 {
    let [a, b, c, d] = if wavelength_um <= 0.5 {
        [3.01577e-28, 3.55212, 1.35579, 0.11563]
    } else {
        [4.01061e-28, 3.99668, 1.10298e-3, 2.71393e-2]
    };
    a * wavelength_um.powf(-(b + c * wavelength_um + d / wavelength_um)) * 1e-4
}

/// σ = 24π³ν⁴/N² ((n²−1)/(n²+2))² F, with ν in cm⁻¹ and N = 2.547·10¹⁹ cm⁻³ at 15 °C and 1013.25 hPa.
fn carbon_dioxide_m2(wavenumber_per_cm: f64) -> f64 {
    const NUMBER_DENSITY_PER_CM3: f64 = 2.546_899e19;
    const DISPERSION: [[f64; 2]; 5] =
        [[5799.25, 128_908.9], [120.05, 89_223.8], [5.3334, 75_037.5], [4.3244, 67_837.7], [0.121_814_5, 2418.136]];
    let squared = wavenumber_per_cm * wavenumber_per_cm;
    let refractivity: f64 =
        1.1427e3 * DISPERSION.iter().map(|[strength, line]| strength / (line * line - squared)).sum::<f64>();
    let index_squared = (1.0 + refractivity).powi(2);
    let king_factor = 1.1364 + 25.3e-12 * squared;
    let polarisability = (index_squared - 1.0) / (index_squared + 2.0);
    24.0 * std::f64::consts::PI.powi(3) * squared * squared / NUMBER_DENSITY_PER_CM3.powi(2)
        * polarisability.powi(2)
        * king_factor
        * 1e-4
}

#[cfg(test)]
mod tests {
    use super::*;

    #[test]
    fn shorter_waves_scatter_more_in_both_gases() {
        for gas in Gas::ALL {
            let sections: Vec<f64> = (350..=850)
                .map(|wavelength_nm| rayleigh_cross_section_m2(f64::from(wavelength_nm), gas))
                .collect::<Result<_, _>>()
                .expect("in range");
            assert!(sections.windows(2).all(|pair| pair[1] < pair[0]), "{gas:?}");
        }
    }

    #[test]
    fn impossible_atmospheres_are_refused() {
        for wrong in [
            Atmosphere { surface_pressure_bar: -1.0, ..Atmosphere::EARTH },
            Atmosphere { surface_gravity_m_s2: 0.0, ..Atmosphere::EARTH },
            Atmosphere { ground_albedo: 1.1, ..Atmosphere::EARTH },
        ] {
            assert!(wrong.column_per_m2().is_err());
        }
        assert!(Atmosphere::EARTH.optical_depth(200.0).is_err());
    }
}
