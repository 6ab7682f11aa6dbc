//! What only a structure calculation knows of a star.

use crate::physics::star::convective::Node;

/// The inside of a red dwarf at one moment.
#[derive(Clone, Copy, Debug, PartialEq)]
pub struct Interior {
    /// Mass fraction of hydrogen, mean of the whole star.
    pub mean_hydrogen_fraction: f64,
    /// Mass fraction of ³He at the centre.
    pub core_helium3_fraction: f64,
    /// Temperature of the centre, K.
    pub core_temperature_k: f64,
    /// Density of the centre, g cm⁻³.
    pub core_density_g_cm3: f64,
    /// Fermi energy of the electrons at the centre over the thermal energy kT: far above 1 they are degenerate and hold
    /// the star up even when it is cold, below 1 they are an ordinary gas.
    pub core_degeneracy_ratio: f64,
    /// Share of the mass outside the core in which nothing mixes: 1 where convection reaches the centre.
    pub mixed_mass_fraction: f64,
}

impl Interior {
    /// The inside at a moment of a computed life.
    pub(super) fn of(node: &Node) -> Self {
        Self {
            mean_hydrogen_fraction: node.mean_hydrogen_fraction,
            core_helium3_fraction: traceless(node.core_helium3_fraction),
            core_temperature_k: node.core_temperature_k,
            core_density_g_cm3: node.core_density_g_cm3,
            core_degeneracy_ratio: node.core_degeneracy_ratio(),
            mixed_mass_fraction: 1.0 - node.still_core_mass_fraction,
        }
    }

    /// The inside a share of the way to a later moment; temperature and density in their logarithms.
    pub(super) fn towards(&self, later: &Self, share: f64) -> Self {
        let even = |a: f64, b: f64| a + share * (b - a);
        let log = |a: f64, b: f64| even(a.ln(), b.ln()).exp();
        Self {
            mean_hydrogen_fraction: even(self.mean_hydrogen_fraction, later.mean_hydrogen_fraction),
            core_helium3_fraction: even(self.core_helium3_fraction, later.core_helium3_fraction),
            core_temperature_k: log(self.core_temperature_k, later.core_temperature_k),
            core_density_g_cm3: log(self.core_density_g_cm3, later.core_density_g_cm3),
            core_degeneracy_ratio: log(self.core_degeneracy_ratio, later.core_degeneracy_ratio),
            mixed_mass_fraction: even(self.mixed_mass_fraction, later.mixed_mass_fraction),
        }
    }
}

/// A mass fraction without the traces that a computation never quite burns away.
pub(super) fn traceless(fraction: f64) -> f64 {
    const TRACE: f64 = 1e-6;
    if fraction < TRACE { 0.0 } else { fraction }
}
