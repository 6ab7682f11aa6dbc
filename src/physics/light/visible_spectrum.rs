//! The visible spectrum of a star, worked out once for everything that looks at it.

use super::observer::PREPARED;
use super::observer_table::OBSERVER_ROWS;
use super::occupation::occupations;
use super::range::{OutOfRange, temperature};

/// How strongly a blackbody shines at each wavelength of the observer's table.
#[derive(Clone, Debug, PartialEq)]
pub struct VisibleSpectrum {
    temperature_k: f64,
    occupations: [f64; OBSERVER_ROWS],
}

impl VisibleSpectrum {
    /// The spectrum of a blackbody.
    ///
    /// # Source
    /// Planck's law.
    ///
    /// # Errors
    /// [`OutOfRange`] for a temperature outside 1 to 10⁹ K.
    pub fn of_blackbody(temperature_k: f64) -> Result<Self, OutOfRange> {
        let temperature_k = temperature(temperature_k)?;
        Ok(Self { temperature_k, occupations: occupations(&PREPARED.exponents_k, temperature_k) })
    }

    /// The temperature it belongs to, K.
    #[must_use]
    pub fn temperature_k(&self) -> f64 {
        self.temperature_k
    }

    /// Photon occupation numbers 1/(eˣ − 1) at the wavelengths of the observer's table.
    pub(super) fn occupations(&self) -> &[f64; OBSERVER_ROWS] {
        &self.occupations
    }
}
