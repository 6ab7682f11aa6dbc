//! What a layer is made of.

/// Mean mass number of the metals. *Common practice* (solar mixture, oxygen to iron).
pub(super) const METAL_MASS: f64 = 17.0;
/// Mean charge of the metals when stripped. *Common practice*.
pub(super) const METAL_CHARGE: f64 = 8.0;
/// Mass of ¹H, atomic mass units. AME 2020.
pub(super) const HYDROGEN_MASS: f64 = 1.00784;
/// Mass of ³He, atomic mass units. AME 2020.
pub(super) const HELIUM3_MASS: f64 = 3.016;
/// Mass of ⁴He, atomic mass units. AME 2020.
pub(super) const HELIUM4_MASS: f64 = 4.0026;

/// Mass fractions of one layer; ⁴He is the rest.
#[derive(Clone, Copy, Debug, PartialEq)]
pub(super) struct Composition {
    /// ¹H.
    pub(super) hydrogen: f64,
    /// ³He.
    pub(super) helium3: f64,
    /// Everything heavier than helium.
    pub(super) metals: f64,
}

impl Composition {
    /// ⁴He mass fraction.
    #[inline]
    pub(super) fn helium4(&self) -> f64 {
        1.0 - self.hydrogen - self.helium3 - self.metals
    }

    /// Nuclei per atomic mass unit: hydrogen, helium, metals.
    #[inline]
    pub(super) fn nuclei(&self) -> [f64; 3] {
        [
            self.hydrogen / HYDROGEN_MASS,
            self.helium4() / HELIUM4_MASS + self.helium3 / HELIUM3_MASS,
            self.metals / METAL_MASS,
        ]
    }
}
