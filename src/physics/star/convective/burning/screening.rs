//! How electrons and neighbouring ions help nuclei to meet.
//!
//! The exponent is the smaller of weak screening and of the strong ion-sphere limit, joined smoothly.
//! # Source
//! Salpeter 1954, Aust. J. Phys. 7, 373 (weak, with the electrons' degeneracy; ion sphere). Coefficients: *common
//! practice*.

use super::super::composition::Composition;
use super::super::numbers::{Dual, Number};

/// Sharpness of the joint between both limits.
const SHARPNESS: i32 = 20;
/// Largest exponent.
const LARGEST: f64 = 5.0;

/// What all reactions at one place share.
pub(super) struct Screening {
    /// Weak exponent per product of charges.
    weak: Dual<2>,
    /// Ion-sphere exponent per difference of Z^(5/3).
    strong: Dual<2>,
}

impl Screening {
    /// Screening at a place; `psi` is the electrons' degeneracy.
    pub(super) fn new(composition: &Composition, density: Dual<2>, temperature: Dual<2>, psi: Dual<2>) -> Self {
        let millions = temperature * 1e-6;
        let degeneracy = (psi.at_most(27.0).exp() * 0.6 + 1.0).sqrt().recip();
        let [hydrogen, helium, metals] = composition.nuclei();
        let squares = hydrogen + 4.0 * helium + 64.0 * metals;
        let charges = hydrogen + 2.0 * helium + 8.0 * metals;
        let strength = (degeneracy * charges + squares).sqrt();
        let per_electron = 0.5 * (1.0 + composition.hydrogen);
        let weak = strength * (density / (millions.square() * millions)).sqrt() * 0.188;
        Self { weak, strong: (density * per_electron).cbrt() * 0.205 / millions }
    }

    /// Factor on the rate of nuclei whose charges have this product and this (Z₁+Z₂)^5/3 − Z₁^5/3 − Z₂^5/3.
    pub(super) fn factor(&self, product: f64, sphere: f64) -> Dual<2> {
        let (weak, strong) = (self.weak * product, self.strong * sphere);
        let (low, high) = if weak.value < strong.value { (weak, strong) } else { (strong, weak) };
        let ratio = low / high;
        let value = ratio.value.powi(SHARPNESS);
        let exponent = if value < 1e-17 {
            low
        } else {
            let sharpness = f64::from(SHARPNESS);
            let power = ratio.chain(value, sharpness * value / ratio.value, 0.0);
            low * ((power + 1.0).ln() * (-1.0 / sharpness)).exp()
        };
        exponent.at_most(LARGEST).exp()
    }
}
