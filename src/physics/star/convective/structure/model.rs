//! The star at one moment.

use super::super::burning::{Burning, Helium3, REACTIONS, Rates};
use super::super::cgs::GRAVITATION;
use super::super::composition::Composition;
use super::super::matter::Matter;
use super::isentrope::Isentrope;
use super::mesh::Mesh;

/// ln ρ (g cm⁻³), ln T (K), ln r (cm) and luminosity in units of the model's own.
pub(in super::super) type Unknowns = [f64; 4];

/// What is known of a point once the structure is solved.
#[derive(Clone, Copy, Debug, Default)]
pub(in super::super) struct Settled {
    /// ln pressure, erg cm⁻³.
    pub(in super::super) ln_pressure: f64,
    /// Degeneracy variable of the electrons.
    pub(in super::super) ln_f: f64,
    /// Reaction rates.
    pub(in super::super) rates: Rates<f64>,
    /// Heat of burning, erg g⁻¹ s⁻¹.
    pub(in super::super) heat: f64,
}

impl Settled {
    /// What matter is known to be after small changes of ln ρ and ln T.
    pub(in super::super) fn near(matter: &Matter, by: [f64; 2]) -> Self {
        let Burning { rates, heat } = &matter.burning;
        let mut kept = [0.0; REACTIONS];
        for (value, rate) in kept.iter_mut().zip(rates) {
            *value = rate.moved(by).max(0.0);
        }
        Self {
            ln_pressure: matter.gas.ln_pressure.moved(by),
            ln_f: matter.gas.ln_f.moved(by),
            rates: kept,
            heat: heat.moved(by),
        }
    }
}

/// A star on its mesh, centre first.
#[derive(Clone, Debug)]
pub(in super::super) struct Model {
    /// Unknowns of each point.
    pub(in super::super) unknowns: Vec<Unknowns>,
    /// What each point is made of.
    pub(in super::super) composition: Vec<Composition>,
    /// How ³He is treated while the structure is solved.
    pub(in super::super) helium3: Vec<Helium3>,
    /// Results of the last solution.
    pub(in super::super) settled: Vec<Settled>,
    /// Where gas rises and sinks.
    pub(in super::super) convective: Vec<bool>,
    /// Unit of luminosity, erg s⁻¹: that of the surface when last solved.
    pub(in super::super) luminosity_unit: f64,
}

impl Model {
    /// A model of one composition, interpolated from a star of one entropy that is shrinking: l ∝ ∫T dm.
    pub(in super::super) fn from_isentrope(mesh: &Mesh, star: &Isentrope, composition: Composition) -> Self {
        let count = mesh.len();
        let mut unknowns: Vec<Unknowns> = mesh
            .above
            .iter()
            .map(|above| {
                let [ln_density, ln_temperature, ln_radius] = star.at_share_above(*above);
                [ln_density, ln_temperature, ln_radius, 0.0]
            })
            .collect();
        let mut heat = 0.0;
        for (point, weight) in unknowns.iter_mut().zip(&mesh.weight_g) {
            heat += weight * point[1].exp();
            point[3] = heat;
        }
        for point in &mut unknowns {
            point[3] /= heat;
        }
        Self {
            unknowns,
            composition: vec![composition; count],
            helium3: vec![Helium3::Given; count],
            settled: vec![Settled::default(); count],
            convective: vec![true; count],
            luminosity_unit: star.luminosity_erg_s(),
        }
    }

    /// Carries every unknown on along a trend (per second): a first guess for the next structure.
    pub(in super::super) fn extrapolate(&mut self, trend: &[Unknowns], step_s: f64) {
        /// No unknown is carried farther than this.
        const FARTHEST: f64 = 0.1;
        for ((point, settled), slopes) in self.unknowns.iter_mut().zip(&mut self.settled).zip(trend) {
            let by = slopes.map(|slope| (slope * step_s).clamp(-FARTHEST, FARTHEST));
            point.iter_mut().zip(by).for_each(|(unknown, change)| *unknown += change);
            // In a degenerate or an ionised gas ln f follows density and temperature about like this.
            settled.ln_f += by[0] - 1.5 * by[1];
        }
    }

    /// How fast every unknown changed since an older model on the same mesh, per second.
    pub(in super::super) fn trend_since(&self, older: &Self, step_s: f64) -> Vec<Unknowns> {
        let unit = older.luminosity_unit / self.luminosity_unit;
        self.unknowns
            .iter()
            .zip(&older.unknowns)
            .map(|(new, old)| {
                let old = [old[0], old[1], old[2], old[3] * unit];
                std::array::from_fn(|i| (new[i] - old[i]) / step_s)
            })
            .collect()
    }

    fn surface(&self) -> &Unknowns {
        &self.unknowns[self.unknowns.len() - 1]
    }

    /// Luminosity of the surface, erg s⁻¹.
    pub(in super::super) fn luminosity_erg_s(&self) -> f64 {
        self.surface()[3] * self.luminosity_unit
    }

    /// Radius of the photosphere, cm.
    pub(in super::super) fn radius_cm(&self) -> f64 {
        self.surface()[2].exp()
    }

    /// Temperature of the photosphere, K.
    pub(in super::super) fn effective_temperature_k(&self) -> f64 {
        self.surface()[1].exp()
    }

    /// Heat set free by burning, erg s⁻¹.
    pub(in super::super) fn nuclear_erg_s(&self, mesh: &Mesh) -> f64 {
        self.settled.iter().zip(&mesh.weight_g).map(|(point, weight)| point.heat * weight).sum()
    }

    /// Temperature where most heat is set free per octave of the mass above, K.
    pub(in super::super) fn shell_temperature_k(&self, mesh: &Mesh) -> f64 {
        let strongest = self
            .settled
            .iter()
            .zip(&mesh.above)
            .map(|(point, above)| point.heat * above)
            .enumerate()
            .max_by(|a, b| a.1.total_cmp(&b.1));
        strongest.map_or(0.0, |(place, _)| self.unknowns[place][1].exp())
    }

    /// Innermost point of the envelope that has the surface's composition.
    pub(in super::super) fn envelope_base(&self) -> usize {
        const ALIKE: f64 = 1e-3;
        let last = self.composition.len() - 1;
        let surface = self.composition[last].hydrogen;
        let alike = self.composition.iter().rev().take_while(|c| (c.hydrogen - surface).abs() < ALIKE).count();
        last + 1 - alike
    }

    /// Mean hydrogen mass fraction of the star.
    pub(in super::super) fn mean_hydrogen(&self, mesh: &Mesh) -> f64 {
        let total: f64 = self.composition.iter().zip(&mesh.weight_g).map(|(c, weight)| c.hydrogen * weight).sum();
        total / mesh.star_g
    }

    /// Mass share up to which nothing mixes, counted from the centre; zero while the centre is convective.
    pub(in super::super) fn still_core_share(&self, mesh: &Mesh) -> f64 {
        // The innermost points' flags are the least certain: their luminosity is nearly zero.
        const CERTAIN: usize = 3;
        if self.convective[CERTAIN] {
            return 0.0;
        }
        let first =
            self.convective.iter().skip(CERTAIN).position(|mixing| *mixing).map_or(mesh.len() - 1, |k| k + CERTAIN);
        1.0 - mesh.above[first]
    }

    /// Mass share with less than a hundredth of hydrogen, counted from the centre.
    pub(in super::super) fn helium_core_share(&self, mesh: &Mesh) -> f64 {
        let spent = self.composition.iter().take_while(|c| c.hydrogen < 0.01).count();
        if spent == 0 { 0.0 } else { 1.0 - mesh.above[spent - 1] }
    }

    /// Time in which the star would radiate its gravitational energy, GM²/(RL), s.
    pub(in super::super) fn thermal_time_s(&self, mesh: &Mesh) -> f64 {
        GRAVITATION * mesh.star_g * mesh.star_g / (self.radius_cm() * self.luminosity_erg_s())
    }
}
