//! Dates at which running quantities pass their marks between two nodes.

use super::super::caution::Caution;
use super::super::escape;
use super::super::range::OutOfRange;
use super::event::{PlanetEvent, PlanetEventKind};
use super::input::PlanetInput;
use super::surroundings::Surroundings;
use crate::units::constants::SOLAR_CONSTANT_W_M2;

/// High-energy light the Earth has received in 4.57 Gyr, units of 1361.17 W m⁻² times years: the integral of
/// 10⁻³ (t/45 Myr)^−1.23 from the end of saturation, and 45 Myr before it, for the Sun's present luminosity.
const EARTH_FLUENCE_YR: f64 = 1.731e5;

/// What a planet has accumulated up to a node.
#[derive(Clone, Copy, Debug, Default, PartialEq)]
pub(super) struct Accumulated {
    pub(super) age_yr: f64,
    /// Braking of the rotation times Q, s⁻¹.
    pub(super) braking_per_s: f64,
    /// The planet's place against the shoreline of air, from the light received so far.
    pub(super) shoreline_ratio: f64,
}

/// Dates and running sums along the walk.
pub(super) struct Passage<'a> {
    input: &'a PlanetInput,
    shoreline_per_fluence: f64,
    pub(super) now: Accumulated,
    pub(super) probable_yr: Option<f64>,
    pub(super) locked_yr: Option<f64>,
}

impl<'a> Passage<'a> {
    pub(super) fn start(input: &'a PlanetInput, first: &Surroundings) -> Result<Self, OutOfRange> {
        let speed_4 = escape::escape_speed_ratio_4(input.orbit.mass_mearth, input.orbit.radius_rearth)?;
        let mut passage = Self {
            input,
            shoreline_per_fluence: 1.0 / (EARTH_FLUENCE_YR * speed_4),
            now: Accumulated { age_yr: first.age_yr, ..Accumulated::default() },
            probable_yr: None,
            locked_yr: None,
        };
        // A planet given a day as long as its year is locked from the start.
        if first.spin_excess_per_s <= 0.0 {
            passage.probable_yr = Some(first.age_yr);
            passage.locked_yr = Some(first.age_yr);
        }
        Ok(passage)
    }

    /// Runs from one node to the next and writes down what is passed on the way.
    pub(super) fn advance(&mut self, before: &Surroundings, after: &Surroundings, events: &mut Vec<PlanetEvent>) {
        Self::pass_zone(before, after, events);
        let span_yr = after.age_yr - before.age_yr;
        let old = self.now;
        let braking = 0.5 * (before.unit_braking_per_s_yr + after.unit_braking_per_s_yr) * span_yr;
        let fluence = 0.5 * (before.high_energy_earth + after.high_energy_earth) * span_yr;
        self.now = Accumulated {
            age_yr: after.age_yr,
            braking_per_s: old.braking_per_s + braking,
            shoreline_ratio: old.shoreline_ratio + fluence * self.shoreline_per_fluence,
        };
        let uncertain = Some(Caution::OrderOfMagnitude);
        let at = |share: f64| before.age_yr + share * span_yr;
        let spin = &self.input.spin;
        for (quality, date, kind) in [
            (spin.quality_low, &mut self.probable_yr, PlanetEventKind::ProbablyLocked),
            (spin.quality_high, &mut self.locked_yr, PlanetEventKind::Locked),
        ] {
            let missing = |braking: f64, excess: f64| excess - braking / quality;
            let (start, end) = (
                missing(old.braking_per_s, before.spin_excess_per_s),
                missing(self.now.braking_per_s, after.spin_excess_per_s),
            );
            if date.is_none() && end <= 0.0 {
                let age_yr = at(if start > 0.0 { start / (start - end) } else { 0.0 });
                *date = Some(age_yr);
                events.push(PlanetEvent { age_yr, kind, caution: uncertain });
            }
        }
        let (start, end) = (old.shoreline_ratio, self.now.shoreline_ratio);
        if start < escape::SHORELINE && end >= escape::SHORELINE {
            let age_yr = at((escape::SHORELINE - start) / (end - start));
            events.push(PlanetEvent { age_yr, kind: PlanetEventKind::AtmosphereLost, caution: uncertain });
        }
    }

    fn pass_zone(before: &Surroundings, after: &Surroundings, events: &mut Vec<PlanetEvent>) {
        let span_yr = after.age_yr - before.age_yr;
        let caution = (before.zone_extrapolated || after.zone_extrapolated).then_some(Caution::Extrapolated);
        // Inside means below the inner limit and above the outer one; a sudden change may pass both.
        for (start, end, falling, rising) in [
            (before.over_inner, after.over_inner, PlanetEventKind::EntersHabitableZone, PlanetEventKind::TooMuchLight),
            (
                before.over_outer,
                after.over_outer,
                PlanetEventKind::TooLittleLight,
                PlanetEventKind::EntersHabitableZone,
            ),
        ] {
            if (start > 0.0) != (end > 0.0) {
                let age_yr = before.age_yr + (start / (start - end)).clamp(0.0, 1.0) * span_yr;
                events.push(PlanetEvent { age_yr, kind: if end > start { rising } else { falling }, caution });
            }
        }
    }
}

/// High-energy light in W m⁻² from units of the Earth's sunlight.
pub(super) fn w_m2(earth_units: f64) -> f64 {
    earth_units * SOLAR_CONSTANT_W_M2
}

#[cfg(test)]
mod tests {
    use super::super::super::high_energy::high_energy_luminosity_lsun;
    use super::*;

    #[test]
    fn the_earths_fluence_is_the_integral_of_the_decline() {
        // Trapezoids in the logarithm of age from one year to 4.57 Gyr.
        let steps = 20_000;
        let age = |i: i32| 4.57e9_f64.powf(f64::from(i) / f64::from(steps));
        let light = |i: i32| high_energy_luminosity_lsun(1.0, 1.0, age(i)).expect("in range");
        let sum: f64 = (0..steps).map(|i| 0.5 * (light(i) + light(i + 1)) * (age(i + 1) - age(i))).sum();
        assert!((sum / EARTH_FLUENCE_YR - 1.0).abs() < 2e-3, "{sum}");
    }
}
