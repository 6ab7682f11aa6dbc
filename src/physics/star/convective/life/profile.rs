//! The inside of the star at one moment, layer by layer.

/// One layer.
#[derive(Clone, Copy, Debug, PartialEq)]
pub struct Layer {
    /// Share of the star's mass outside it: keeps its digits where the share inside no longer changes.
    pub mass_above_fraction: f64,
    /// Its distance from the centre over the radius of the star.
    pub radius_fraction: f64,
    /// Temperature, K.
    pub temperature_k: f64,
    /// Density, g cm⁻³.
    pub density_g_cm3: f64,
    /// Pressure, bar.
    pub pressure_bar: f64,
    /// Energy that flows out through it each second over the luminosity of the star; negative where heat flows inwards.
    pub luminosity_fraction: f64,
    /// Hydrogen mass fraction.
    pub hydrogen_fraction: f64,
    /// ³He mass fraction.
    pub helium3_fraction: f64,
    /// ⁴He mass fraction.
    pub helium4_fraction: f64,
    /// Fermi energy of the free electrons over kT: above 1 they are degenerate.
    pub degeneracy_ratio: f64,
    /// Whether the gas rises and sinks.
    pub is_convective: bool,
}

/// The inside of the star at one moment.
#[derive(Clone, Debug, PartialEq)]
pub struct Profile {
    /// Age, yr since arrival on the main sequence.
    pub age_yr: f64,
    /// Layers from the centre to the surface.
    pub layers: Vec<Layer>,
}

impl Profile {
    /// Stretches of layers in which the gas rises and sinks: first and last layer of each.
    #[must_use]
    pub fn convective_zones(&self) -> Vec<[usize; 2]> {
        let mut zones: Vec<[usize; 2]> = Vec::new();
        for (place, layer) in self.layers.iter().enumerate() {
            match zones.last_mut() {
                _ if !layer.is_convective => {}
                Some(zone) if zone[1] + 1 == place => zone[1] = place,
                _ => zones.push([place, place]),
            }
        }
        zones
    }

    /// The inside a share of the way to another moment, at the layers of the nearer of both.
    pub(super) fn towards(&self, later: &Self, share: f64) -> Self {
        let (near, far, weight) = if share < 0.5 { (self, later, share) } else { (later, self, 1.0 - share) };
        let layers =
            near.layers.iter().map(|layer| far.at_mass(layer).map_or(*layer, |other| layer.towards(&other, weight)));
        Self { age_yr: self.age_yr + share * (later.age_yr - self.age_yr), layers: layers.collect() }
    }

    /// The layer with as much mass above it as another one has.
    fn at_mass(&self, wanted: &Layer) -> Option<Layer> {
        let above = wanted.mass_above_fraction;
        let next = self.layers.partition_point(|layer| layer.mass_above_fraction > above);
        let outer = self.layers.get(next)?;
        let Some(inner) = next.checked_sub(1).and_then(|before| self.layers.get(before)) else { return Some(*outer) };
        let [high, low] = [inner.mass_above_fraction, outer.mass_above_fraction];
        let share = if low > 0.0 { (high / above).ln() / (high / low).ln() } else { (high - above) / (high - low) };
        Some(inner.towards(outer, share.clamp(0.0, 1.0)))
    }
}

impl Layer {
    /// Share of the star's mass inside it.
    #[must_use]
    pub fn mass_fraction(&self) -> f64 {
        1.0 - self.mass_above_fraction
    }

    /// A layer a share of the way to another one: what is always positive in its logarithm.
    fn towards(&self, other: &Self, share: f64) -> Self {
        let even = |a: f64, b: f64| a + share * (b - a);
        let log = |a: f64, b: f64| if a > 0.0 && b > 0.0 { even(a.ln(), b.ln()).exp() } else { even(a, b) };
        Self {
            mass_above_fraction: self.mass_above_fraction,
            radius_fraction: log(self.radius_fraction, other.radius_fraction),
            temperature_k: log(self.temperature_k, other.temperature_k),
            density_g_cm3: log(self.density_g_cm3, other.density_g_cm3),
            pressure_bar: log(self.pressure_bar, other.pressure_bar),
            luminosity_fraction: even(self.luminosity_fraction, other.luminosity_fraction),
            hydrogen_fraction: even(self.hydrogen_fraction, other.hydrogen_fraction),
            helium3_fraction: even(self.helium3_fraction, other.helium3_fraction),
            helium4_fraction: even(self.helium4_fraction, other.helium4_fraction),
            degeneracy_ratio: log(self.degeneracy_ratio, other.degeneracy_ratio),
            is_convective: self.is_convective,
        }
    }
}
