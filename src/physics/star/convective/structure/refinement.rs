//! More mesh points where a thin shell burns, and fewer where it burnt.

use super::super::burning::Helium3;
use super::super::composition::Composition;
use super::super::matter::{Matter, Microphysics};
use super::mesh::Mesh;
use super::model::{Model, Settled, Unknowns};

/// Largest differences between neighbours: hydrogen mass fraction, luminosity over the largest anywhere, ln pressure.
const LARGEST: [f64; 3] = [0.06, 0.06, 0.5];
/// Largest difference of ln temperature between neighbours. It is exceeded only where hydrogen is half ionised under a
/// giant's surface; coarser shells there have two structures each, between which Newton's method cycles.
const LARGEST_LN_TEMPERATURE: f64 = 0.2;
/// The mass share above such neighbours is at least this, …
const TEMPERATURE_SKIN: f64 = 1e-11;
/// … and what lies between them at least this part of it.
const TEMPERATURE_THINNEST: f64 = 0.02;
/// Added points go when all differences across them are smaller than this share of the largest.
const NEEDLESS: f64 = 0.4;
/// At most so many points are added.
const MOST_ADDED: usize = 200;
/// No points are added with a mass share above them smaller than this, …
const SKIN: f64 = 1e-7;
/// … nor in shells thinner than this share of the star.
const THINNEST: f64 = 1e-8;

/// What differences are measured against.
struct Scales {
    brightest: f64,
    closeness: f64,
}

impl Model {
    /// Adds points where neighbours differ too much and takes away added ones that are no longer needed; tells whether any were.
    ///
    /// `closeness` 1 is the usual difference of temperature between neighbours, 2 allows half of it. Nothing where the gas
    /// has no neutral state at a new point.
    pub(in super::super) fn refine(&mut self, laws: &Microphysics, mesh: &mut Mesh, closeness: f64) -> Option<bool> {
        let count = mesh.len();
        let scales = Scales { brightest: self.brightest(), closeness };
        let kept: Vec<bool> =
            (0..count).map(|k| mesh.lasting[k] || self.unlike(mesh, k - 1, k + 1, &scales) > NEEDLESS).collect();
        let room = MOST_ADDED > mesh.lasting.iter().filter(|lasting| !**lasting).count();
        let split: Vec<bool> =
            (0..count - 1).map(|k| room && kept[k] && kept[k + 1] && self.splits(mesh, k, &scales)).collect();
        if kept.iter().all(|keep| *keep) && !split.iter().any(|wanted| *wanted) {
            return Some(false);
        }
        let mut grown = Self {
            unknowns: Vec::with_capacity(count + 8),
            composition: Vec::with_capacity(count + 8),
            helium3: Vec::with_capacity(count + 8),
            settled: Vec::with_capacity(count + 8),
            convective: Vec::with_capacity(count + 8),
            luminosity_unit: self.luminosity_unit,
        };
        let (mut above, mut lasting) = (Vec::with_capacity(count + 8), Vec::with_capacity(count + 8));
        for k in 0..count {
            if kept[k] {
                grown.push(self.unknowns[k], self.composition[k], self.settled[k], self.convective[k]);
                above.push(mesh.above[k]);
                lasting.push(mesh.lasting[k]);
            }
            if k + 1 < count && split[k] {
                let [a, b] = [self.composition[k], self.composition[k + 1]];
                // The mean of both neighbours keeps the amount of every nucleus.
                let composition = Composition {
                    hydrogen: 0.5 * (a.hydrogen + b.hydrogen),
                    helium3: 0.5 * (a.helium3 + b.helium3),
                    metals: a.metals,
                };
                let unknowns = self.halfway(mesh, k);
                let state = [unknowns[0], unknowns[1]];
                let matter = Matter::at(laws, &composition, Helium3::Given, state, self.settled[k].ln_f)?;
                let convective = self.convective[k] && self.convective[k + 1];
                grown.push(unknowns, composition, Settled::near(&matter, [0.0; 2]), convective);
                above.push(0.5 * (mesh.above[k] + mesh.above[k + 1]));
                lasting.push(false);
            }
        }
        *mesh = Mesh::measured(mesh.star_g, above, lasting);
        *self = grown;
        Some(true)
    }

    fn push(&mut self, unknowns: Unknowns, composition: Composition, settled: Settled, convective: bool) {
        self.unknowns.push(unknowns);
        self.composition.push(composition);
        self.helium3.push(Helium3::Given);
        self.settled.push(settled);
        self.convective.push(convective);
    }

    /// Largest luminosity at any point, in the model's unit, but at least that of the surface.
    fn brightest(&self) -> f64 {
        self.unknowns.iter().map(|point| point[3].abs()).fold(1.0, f64::max)
    }

    /// Largest difference between two points over that allowed.
    fn unlike(&self, mesh: &Mesh, a: usize, b: usize, scales: &Scales) -> f64 {
        let warmer = (self.unknowns[b][1] - self.unknowns[a][1]).abs() * scales.closeness / LARGEST_LN_TEMPERATURE;
        if mesh.above[b] < SKIN {
            return if mesh.above[b] < TEMPERATURE_SKIN { 0.0 } else { warmer };
        }
        let differences = [
            self.composition[b].hydrogen - self.composition[a].hydrogen,
            (self.unknowns[b][3] - self.unknowns[a][3]) / scales.brightest,
            self.settled[b].ln_pressure - self.settled[a].ln_pressure,
        ];
        differences.iter().zip(LARGEST).map(|(difference, largest)| difference.abs() / largest).fold(warmer, f64::max)
    }

    fn splits(&self, mesh: &Mesh, k: usize, scales: &Scales) -> bool {
        let thinnest = (THINNEST * mesh.star_g).min(TEMPERATURE_THINNEST * mesh.above[k + 1] * mesh.star_g);
        mesh.shell_g[k] > thinnest && self.unlike(mesh, k, k + 1, scales) > 1.0
    }

    /// Unknowns half-way in mass between a point and the next, on a cubic that neither overshoots nor undershoots.
    fn halfway(&self, mesh: &Mesh, k: usize) -> Unknowns {
        let slope = |j: usize, i: usize| (self.unknowns[j + 1][i] - self.unknowns[j][i]) / mesh.shell_g[j];
        // Slope at point j: harmonic mean of those on both sides, none at an extremum (Fritsch & Butland 1984).
        let bend = |j: usize, i: usize| {
            if j == 0 || j + 1 >= mesh.len() {
                return slope(j.min(mesh.len() - 2), i);
            }
            let [before, after] = [slope(j - 1, i), slope(j, i)];
            if before * after <= 0.0 {
                return 0.0;
            }
            let [left, right] = [mesh.shell_g[j - 1], mesh.shell_g[j]];
            let share = (left + 2.0 * right) / (3.0 * (left + right));
            before * after / (share * after + (1.0 - share) * before)
        };
        std::array::from_fn(|i| {
            let [a, b] = [self.unknowns[k][i], self.unknowns[k + 1][i]];
            0.5 * (a + b) + 0.125 * mesh.shell_g[k] * (bend(k, i) - bend(k + 1, i))
        })
    }
}

#[cfg(test)]
mod tests {
    use super::super::super::calibration::MODERN_SURFACE;
    use super::super::super::opacity::{Opacity, RadiativeOpacity};
    use super::*;

    #[test]
    fn points_come_and_go_without_changing_what_the_star_is_made_of() {
        let opacity = Opacity::new(RadiativeOpacity::new(0.0153).expect("whole table"), MODERN_SURFACE);
        let laws = Microphysics { opacity, cn_ceiling_k: None };
        let mut mesh = Mesh::new(4e32, 1.0);
        // A star with a step in hydrogen at half its mass.
        let composition =
            |above: f64| Composition { hydrogen: if above > 0.5 { 0.0 } else { 0.7 }, helium3: 1e-4, metals: 0.0153 };
        let count = mesh.len();
        let mut model = Model {
            unknowns: mesh
                .above
                .iter()
                .map(|above| [3.0 + 4.0 * above, 14.0 + 2.0 * above, 22.0, 1.0 - above])
                .collect(),
            composition: mesh.above.iter().map(|above| composition(*above)).collect(),
            helium3: vec![Helium3::Given; count],
            settled: vec![Settled::default(); count],
            convective: vec![false; count],
            luminosity_unit: 1.0,
        };
        model.settle(&laws).expect("ordinary states");
        let hydrogen = model.mean_hydrogen(&mesh);
        for _ in 0..10 {
            model.refine(&laws, &mut mesh, 1.0).expect("ordinary states");
        }
        assert!(mesh.len() > count + 3, "{count} points became {}", mesh.len());
        assert!((model.mean_hydrogen(&mesh) / hydrogen - 1.0).abs() < 1e-12);
        assert!(model.unknowns.windows(2).all(|pair| pair[0][0] >= pair[1][0] && pair[0][1] >= pair[1][1]));
        // Once all is alike the added points go again.
        model.composition.fill(composition(1.0));
        model.unknowns.iter_mut().for_each(|point| *point = [5.0, 16.0, 22.0, 1.0]);
        model.settle(&laws).expect("ordinary states");
        for _ in 0..10 {
            model.refine(&laws, &mut mesh, 1.0).expect("ordinary states");
        }
        assert_eq!(mesh.len(), count);
    }
}
