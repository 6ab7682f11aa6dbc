//! The last cooling of a helium white dwarf, as one isothermal crystal.
//!
//! `C dT/dt = −L` with `L = L₀ (T/T₀)^b` for the core's temperature T, at unchanging radius. Heat capacity: three k per
//! ion times the Debye function `D(θ/T)`, plus the degenerate electrons' `(π²/2) Z k kT/E_F` per ion. L₀, b and the
//! rate of cooling are those with which the computed structure ends, so that nothing jumps.
//!
//! # Source
//! Mestel 1952, MNRAS 112, 583 (cooling of an isothermal core); Debye 1912, Ann. Phys. 344, 789 (lattice); θ is
//! 0.45 of the ions' plasma temperature: *common practice*.
//! # Accuracy
//! Ages after the surface is colder than 1000 K: 30 %.

use super::super::cgs::{ATOMIC_MASS, BOLTZMANN, CHARGE_SQUARED, PLANCK};
use super::super::composition::HELIUM4_MASS;
use super::super::gas::fermi_temperature_k;
use std::f64::consts::PI;

/// Debye temperature over the ions' plasma temperature.
const DEBYE: f64 = 0.45;
/// Change of the core's ln temperature in one step.
const STEP: f64 = 0.03;
/// Intervals of the Debye integral.
const INTERVALS: u32 = 200;
/// Range within which b is believed.
const BELIEVED: [f64; 2] = [1.0, 3.5];

/// A helium crystal of one density.
#[derive(Clone, Copy, Debug)]
struct Crystal {
    /// Debye temperature, K.
    debye_k: f64,
    /// Fermi energy over k, K.
    fermi_k: f64,
}

impl Crystal {
    /// Helium at a density, g cm⁻³.
    fn new(density_g_cm3: f64) -> Self {
        let ion = HELIUM4_MASS * ATOMIC_MASS;
        let ions = density_g_cm3 / ion;
        let plasma = (4.0 * PI * 4.0 * CHARGE_SQUARED * ions / ion).sqrt();
        let reduced_planck = PLANCK / (2.0 * PI);
        Self { debye_k: DEBYE * reduced_planck * plasma / BOLTZMANN, fermi_k: fermi_temperature_k(2.0 * ions) }
    }

    /// Heat capacity per ion over k.
    fn heat_capacity(&self, temperature_k: f64) -> f64 {
        3.0 * debye_function(self.debye_k / temperature_k) + PI * PI * temperature_k / self.fermi_k
    }
}

/// Heat capacity of a lattice over its classical value: (3/x³) ∫₀ˣ t⁴ eᵗ/(eᵗ−1)² dt.
fn debye_function(x: f64) -> f64 {
    // Beyond this the integrand is gone.
    let end = x.min(60.0);
    let width = end / f64::from(INTERVALS);
    let integrand = |t: f64| {
        if t < 1e-3 {
            return t * t;
        }
        let half = 2.0 * (0.5 * t).sinh();
        (t * t / half).powi(2)
    };
    // Simpson's rule.
    let mut sum = integrand(0.0) + integrand(end);
    for i in 1..INTERVALS {
        sum += integrand(f64::from(i) * width) * if i % 2 == 1 { 4.0 } else { 2.0 };
    }
    3.0 / (x * x * x) * sum * width / 3.0
}

/// Where the computed structure ended.
#[derive(Clone, Copy, Debug)]
pub(in super::super) struct LateCooling {
    crystal: Crystal,
    temperature_k: f64,
    luminosity: f64,
    power: f64,
    /// Heat capacity of the star over that of one ion in k, in units of luminosity × time per K.
    scale: f64,
}

/// One moment of the cooling.
#[derive(Clone, Copy, Debug)]
pub(in super::super) struct Cooled {
    /// Time since the structure ended, in the unit of the track.
    pub(in super::super) time: f64,
    /// Temperature of the crystal, K.
    pub(in super::super) temperature_k: f64,
    /// Luminosity, in the unit of the track.
    pub(in super::super) luminosity: f64,
}

impl LateCooling {
    /// Continues a track of (time, core temperature in K, luminosity), the last of which are given.
    ///
    /// Nothing if the track does not cool at its end.
    pub(in super::super) fn after(track: &[[f64; 3]], density_g_cm3: f64) -> Option<Self> {
        let [.., [time, temperature_k, luminosity]] = *track else { return None };
        // The last factor of ten in luminosity gives b, the last tenth of temperature the rate of cooling.
        let reach = |tenfold: &dyn Fn(&[f64; 3]) -> bool| track.iter().rev().take_while(|node| tenfold(node)).last();
        let bright = reach(&|node| node[2] < 10.0 * luminosity)?;
        let warm = reach(&|node| node[1] < 1.1 * temperature_k)?;
        let power = (bright[2] / luminosity).ln() / (bright[1] / temperature_k).ln();
        let crystal = Crystal::new(density_g_cm3);
        let (fall, span) = (warm[1] - temperature_k, time - warm[0]);
        let middle = 0.5 * (warm[1] + temperature_k);
        let shining = (warm[2] * luminosity).sqrt();
        let scale = shining * span / (fall * crystal.heat_capacity(middle));
        let cools = fall > 0.0 && span > 0.0 && scale.is_finite() && power.is_finite();
        cools.then(|| Self { crystal, temperature_k, luminosity, power: power.clamp(BELIEVED[0], BELIEVED[1]), scale })
    }

    /// The moments down to `end` in luminosity, the end of the structure itself left out.
    pub(in super::super) fn moments(&self, end: f64) -> impl Iterator<Item = Cooled> {
        let cooling = *self;
        let mut now = Cooled { time: 0.0, temperature_k: self.temperature_k, luminosity: self.luminosity };
        std::iter::from_fn(move || {
            if now.luminosity <= end {
                return None;
            }
            let halfway = now.temperature_k * (-0.5 * STEP).exp();
            let capacity = cooling.scale * cooling.crystal.heat_capacity(halfway);
            now.time += capacity * halfway * STEP / cooling.shining(halfway);
            now.temperature_k *= (-STEP).exp();
            now.luminosity = cooling.shining(now.temperature_k);
            Some(now)
        })
    }

    fn shining(&self, temperature_k: f64) -> f64 {
        self.luminosity * (temperature_k / self.temperature_k).powf(self.power)
    }
}

#[cfg(test)]
mod tests {
    use super::*;

    #[test]
    fn the_lattice_has_its_known_limits() {
        assert!((debye_function(1e-2) - 1.0).abs() < 1e-5);
        // Abramowitz & Stegun-style value: C_V(θ = T)/3k = 0.9517.
        assert!((debye_function(1.0) - 0.9517).abs() < 1e-4, "{}", debye_function(1.0));
        let cold = 4.0 * PI.powi(4) / 5.0 / 100_f64.powi(3);
        assert!((debye_function(100.0) / cold - 1.0).abs() < 1e-3);
    }

    #[test]
    fn a_classical_crystal_cools_as_mestel_found() {
        // With constant heat capacity and L ∝ T³ the age grows as T⁻².
        let age = |temperature: f64| 1e9 * (temperature / 1e6).powi(-2);
        let track: Vec<[f64; 3]> = (0..60)
            .map(|i| {
                let temperature = 1e6 * (-0.02 * f64::from(i)).exp();
                [age(temperature), temperature, (temperature / 1e6).powi(3)]
            })
            .collect();
        let cooling = LateCooling::after(&track, 3e3).expect("it cools");
        assert!((cooling.power - 3.0).abs() < 1e-9);
        let last = track[track.len() - 1];
        let later = cooling.moments(0.4 * last[2]).last().expect("moments");
        let expected = age(later.temperature_k) - last[0];
        assert!((later.time / expected - 1.0).abs() < 0.05, "{later:?} {expected}");
    }

    #[test]
    fn a_track_that_warms_is_refused() {
        assert!(LateCooling::after(&[[0.0, 1e6, 1.0], [1.0, 1.2e6, 0.9]], 1e5).is_none());
        assert!(LateCooling::after(&[], 1e5).is_none());
    }
}
