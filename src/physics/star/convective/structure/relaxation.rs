//! Newton's method for the structure one time step later.

use super::super::matter::{Matter, Microphysics};
use super::banded::Banded;
use super::equations::{Point, write};
use super::mesh::Mesh;
use super::model::{Model, Settled};

/// Largest change of a logarithm in one iteration.
const LARGEST_CHANGE: f64 = 0.3;
/// A correction this large means that the structure is lost.
const HOPELESS: f64 = 300.0;
/// Largest change of luminosity in one iteration, of that at the surface.
const LARGEST_LUMINOSITY_CHANGE: f64 = 0.5;
/// Iterations after which corrections are halved two times out of three, which ends two-cycles at corners.
const CAUTIOUS_AFTER: usize = 5;
/// Accepted corrections (logarithms, luminosity) from this iteration on.
const ACCEPTED: [(usize, f64, f64); 3] = [(0, 1e-4, 5e-4), (10, 3e-4, 2e-3), (16, 2e-3, 2e-2)];

/// The thermal state from which a step begins.
pub(in super::super) struct Past<'a> {
    /// Length of the step, s.
    pub(in super::super) step_s: f64,
    /// ln temperature (K) of each point.
    pub(in super::super) ln_temperature: &'a [f64],
    /// ln pressure (erg cm⁻³) of each point at the old density and temperature, but of the new composition: mixing is
    /// not heating.
    pub(in super::super) ln_pressure: &'a [f64],
}

/// A structure was found.
#[derive(Clone, Copy, Debug)]
pub(in super::super) struct Relaxed {
    /// In so many iterations.
    pub(in super::super) iterations: usize,
}

impl Model {
    /// Finds the structure at the end of a step. Nothing if Newton's method does not settle; the model is then spoilt.
    pub(in super::super) fn relax(
        &mut self,
        laws: &Microphysics,
        mesh: &Mesh,
        past: &Past,
        most_iterations: usize,
    ) -> Option<Relaxed> {
        let count = mesh.len();
        let mut system = Banded::new(4 * count);
        let mut points: Vec<Point> = Vec::with_capacity(count);
        for iteration in 0..most_iterations {
            let unit = self.luminosity_unit;
            points.clear();
            for k in 0..count {
                let unknowns = self.unknowns[k];
                let state = [unknowns[0], unknowns[1]];
                let guess = self.settled[k].ln_f;
                let matter = Matter::at(laws, &self.composition[k], self.helium3[k], state, guess)?;
                points.push(Point::new(mesh, k, unknowns, unit, &matter, past));
            }
            system.clear();
            write(&mut system, mesh, &points, unit);
            let corrections = system.solve()?;

            let mut largest = [0.0_f64; 2];
            for point in corrections.chunks_exact(4) {
                largest[0] = point[..3].iter().fold(largest[0], |sum, value| sum.max(value.abs()));
                largest[1] = largest[1].max(point[3].abs());
            }
            if largest[0] > HOPELESS {
                return None;
            }
            let surface = self.unknowns[count - 1][3].abs();
            let share = damping(iteration, largest, surface);
            for (k, correction) in corrections.chunks_exact(4).enumerate() {
                let point = &points[k];
                let by = [share * correction[0], share * correction[1]];
                for (unknown, change) in self.unknowns[k].iter_mut().zip(correction) {
                    *unknown += share * change;
                }
                self.settled[k] = Settled::near(&point.matter, by);
                let moved = std::array::from_fn::<f64, 4, _>(|i| share * correction[i]);
                self.convective[k] = point.excess_after(moved) > 0.0;
            }
            let settled = ACCEPTED.iter().any(|(from, logarithms, luminosity)| {
                iteration >= *from && largest[0] < *logarithms && largest[1] < luminosity * surface.max(1e-3)
            });
            if settled {
                self.rescale(count)?;
                return Some(Relaxed { iterations: iteration + 1 });
            }
        }
        None
    }

    /// Works out pressure and rates of a model that was never solved. Nothing where the gas has no neutral state.
    pub(in super::super) fn settle(&mut self, laws: &Microphysics) -> Option<()> {
        for k in 0..self.unknowns.len() {
            let state = [self.unknowns[k][0], self.unknowns[k][1]];
            let matter = Matter::at(laws, &self.composition[k], self.helium3[k], state, self.settled[k].ln_f)?;
            self.settled[k] = Settled::near(&matter, [0.0; 2]);
        }
        Some(())
    }

    /// Makes the surface luminosity the unit. Nothing if it is not positive.
    fn rescale(&mut self, count: usize) -> Option<()> {
        let surface = self.unknowns[count - 1][3];
        if !(surface > 0.0 && surface.is_finite()) {
            return None;
        }
        self.luminosity_unit *= surface;
        self.unknowns.iter_mut().for_each(|point| point[3] /= surface);
        Some(())
    }
}

impl Point {
    /// ∇_r − ∇_ad after changes of the unknowns, to first order.
    fn excess_after(&self, by: [f64; 4]) -> f64 {
        let radiative = &self.gradient.radiative;
        let moved: f64 = radiative.slope.iter().zip(by).map(|(slope, change)| slope * change).sum();
        radiative.value + moved - self.matter.gas.adiabatic_gradient.moved([by[0], by[1]])
    }
}

/// Share of the corrections that is applied.
fn damping(iteration: usize, largest: [f64; 2], surface: f64) -> f64 {
    let mut share = (LARGEST_CHANGE / largest[0]).min(1.0);
    let allowed = LARGEST_LUMINOSITY_CHANGE * surface.max(1.0);
    if largest[1] > allowed {
        share = share.min(allowed / largest[1]);
    }
    if iteration >= CAUTIOUS_AFTER && iteration % 3 != 2 { 0.5 * share } else { share }
}
