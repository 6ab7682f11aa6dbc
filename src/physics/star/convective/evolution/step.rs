//! One time step.

use super::super::burning::{Helium3, Rates, helium3_after};
use super::super::cgs::SOLAR_RADIUS;
use super::super::gas::gas_pressure;
use super::super::matter::Microphysics;
use super::super::structure::{Mesh, Model, Past, Unknowns};
use super::mixing::burn_and_mix;

/// Newton iterations granted to a step.
const MOST_ITERATIONS: usize = 25;
/// Changes aimed at in one step: ln T, ln ρ of all but the outermost thousandth.
const AIM_LN_TEMPERATURE: f64 = 0.04;
const AIM_LN_DENSITY: f64 = 0.08;
const INTERIOR_ABOVE: f64 = 1e-3;
/// Hydrogen mass fraction at a point within and outside four fifths of the mass.
const AIM_HYDROGEN: [f64; 2] = [0.04, 0.08];
/// ln of the star's mean hydrogen, and how much farther it may fall once little is left.
const AIM_LN_MEAN_HYDROGEN: f64 = 0.010;
const LITTLE_HYDROGEN: f64 = 0.03;
const LITTLE_HYDROGEN_EASE: f64 = 0.3;
/// ln of the surface's luminosity and temperature.
const AIM_LN_LUMINOSITY: f64 = 0.10;
const AIM_LN_SURFACE_TEMPERATURE: f64 = 0.035;

/// A giant larger than this whose core is spent, solar radii, …
const GIANT_RSUN: f64 = 1.5;
const SPENT_CORE: f64 = 0.05;
/// … may change so many times more at each point: its thin shell eats its way outwards through mesh points without
/// changing otherwise.
const GIANT_EASE: f64 = 6.0;

/// A step that was computed.
pub(in super::super) struct Step {
    /// The star after it.
    pub(in super::super) model: Model,
    /// Largest change over the change aimed at.
    pub(in super::super) change: f64,
    /// Newton iterations of the final solution.
    pub(in super::super) iterations: usize,
}

/// Computes steps on one mesh.
pub(in super::super) struct Stepper {
    /// What holds for the star's matter.
    pub(in super::super) laws: Microphysics,
    /// Mass shells.
    pub(in super::super) mesh: Mesh,
    /// Changes aimed at, over those of the standard resolution.
    pub(in super::super) stride: f64,
}

impl Stepper {
    /// The star `step_s` seconds later. Nothing if no structure is found.
    ///
    /// First with the old rates; then again with the mean of old and new rates for p+p and CN, and with the new rates
    /// for ³He, which follows them at once.
    ///
    /// `trend` is how fast each unknown changed in the step before (per second); it makes the first guess.
    pub(in super::super) fn advance(&self, old: &Model, trend: Option<&[Unknowns]>, step_s: f64) -> Option<Step> {
        let old_rates: Vec<Rates<f64>> = old.settled.iter().map(|point| point.rates).collect();
        let ln_temperature: Vec<f64> = old.unknowns.iter().map(|point| point[1]).collect();

        let mut model = old.clone();
        if let Some(trend) = trend {
            model.extrapolate(trend, step_s);
        }
        self.burn_and_relax(old, &mut model, &old_rates, &ln_temperature, step_s)?;
        let rates: Vec<Rates<f64>> = old_rates
            .iter()
            .zip(&model.settled)
            .map(|(before, after)| {
                let after = &after.rates;
                [0.5 * (before[0] + after[0]), after[1], after[2], 0.5 * (before[3] + after[3])]
            })
            .collect();
        model.composition.clone_from(&old.composition);
        let iterations = self.burn_and_relax(old, &mut model, &rates, &ln_temperature, step_s)?;
        keep_helium3(&mut model);
        let change = self.change(old, &model) / self.stride;
        Some(Step { model, change, iterations })
    }

    fn burn_and_relax(
        &self,
        old: &Model,
        model: &mut Model,
        rates: &[Rates<f64>],
        ln_temperature: &[f64],
        step_s: f64,
    ) -> Option<usize> {
        burn_and_mix(model, &self.mesh, rates, step_s);
        let ln_pressure = past_pressure(old, model)?;
        let past = Past { step_s, ln_temperature, ln_pressure: &ln_pressure };
        Some(model.relax(&self.laws, &self.mesh, &past, MOST_ITERATIONS)?.iterations)
    }

    /// Largest change over the change aimed at.
    fn change(&self, old: &Model, new: &Model) -> f64 {
        let mut largest = 0.0_f64;
        let mut note = |change: f64, aim: f64| largest = largest.max(change.abs() / aim);
        let giant = old.radius_cm() > GIANT_RSUN * SOLAR_RADIUS && old.helium_core_share(&self.mesh) > SPENT_CORE;
        // Coarse steps as well: a giant's shell must not leap over its own width.
        let scale = if giant { GIANT_EASE / self.stride.max(1.0) } else { 1.0 };
        for k in 0..self.mesh.len() {
            let above = self.mesh.above[k];
            if above > INTERIOR_ABOVE {
                note(new.unknowns[k][1] - old.unknowns[k][1], scale * AIM_LN_TEMPERATURE);
                note(new.unknowns[k][0] - old.unknowns[k][0], scale * AIM_LN_DENSITY);
            }
            let aim = AIM_HYDROGEN[usize::from(above < 0.2)];
            note(new.composition[k].hydrogen - old.composition[k].hydrogen, scale * aim);
        }
        let [before, after] = [old, new].map(|model| model.mean_hydrogen(&self.mesh));
        let ease = if after < LITTLE_HYDROGEN { LITTLE_HYDROGEN_EASE } else { 1.0 };
        note((after / before).ln() * ease, AIM_LN_MEAN_HYDROGEN);
        note((new.luminosity_erg_s() / old.luminosity_erg_s()).ln(), AIM_LN_LUMINOSITY);
        let last = self.mesh.len() - 1;
        note(new.unknowns[last][1] - old.unknowns[last][1], AIM_LN_SURFACE_TEMPERATURE);
        largest
    }
}

/// ln pressure at the old densities and temperatures with the new composition: mixing is not heating.
fn past_pressure(old: &Model, new: &Model) -> Option<Vec<f64>> {
    /// Smaller changes of hydrogen leave the pressure as it was.
    const UNCHANGED: f64 = 1e-12;
    old.unknowns
        .iter()
        .zip(&old.settled)
        .zip(old.composition.iter().zip(&new.composition))
        .map(|((unknowns, settled), (before, after))| {
            if (after.hydrogen - before.hydrogen).abs() <= UNCHANGED {
                return Some(settled.ln_pressure);
            }
            gas_pressure(after, unknowns[0], unknowns[1], settled.ln_f)
        })
        .collect()
}

/// Makes the ³He found with the structure the composition.
fn keep_helium3(model: &mut Model) {
    for k in 0..model.composition.len() {
        if let Helium3::FromStep { start, step_s } = model.helium3[k] {
            let composition = model.composition[k];
            model.composition[k].helium3 = helium3_after(&composition, &model.settled[k].rates, start, step_s);
            model.helium3[k] = Helium3::Given;
        }
    }
}
