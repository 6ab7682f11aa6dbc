//! A star of one entropy throughout: what convection makes of a young, contracting star.
//!
//! Integrated outwards from the centre along dlnT/dlnP = ∇_ad with hydrostatic balance, to the photosphere
//! P = (2/3) g/κ. It is where a life begins.

use super::super::burning::Helium3;
use super::super::cgs::{GRAVITATION, STEFAN_BOLTZMANN};
use super::super::composition::Composition;
use super::super::matter::{Matter, Microphysics};
use std::f64::consts::PI;

/// Largest change of ln P and of ln r in one step.
const STEP: [f64; 2] = [0.05, 0.03];
/// Steps after which an integration is given up.
const MOST_STEPS: usize = 3000;
/// Below this ln temperature (800 K) no photosphere is looked for any more.
const COLDEST_LN_K: f64 = 6.684_611_727_667_927;
/// How well the mass is met.
const MASS_TOLERANCE: f64 = 1e-8;

/// One layer.
#[derive(Clone, Copy, Debug)]
pub(in super::super) struct Layer {
    /// ln density, g cm⁻³.
    pub(in super::super) ln_density: f64,
    /// ln temperature, K.
    pub(in super::super) ln_temperature: f64,
    /// Radius, cm.
    pub(in super::super) radius_cm: f64,
    /// Mass inside, g.
    pub(in super::super) inside_g: f64,
}

/// A star of one entropy, centre first.
#[derive(Clone, Debug)]
pub(in super::super) struct Isentrope {
    /// Layers from near the centre to the photosphere.
    pub(in super::super) layers: Vec<Layer>,
}

/// Changes per unit ln P.
struct Slopes {
    ln_density: f64,
    ln_temperature: f64,
    radius_cm: f64,
    inside_g: f64,
}

fn slopes(matter: &Matter, layer: &Layer) -> Slopes {
    let gas = &matter.gas;
    let adiabatic = gas.adiabatic_gradient.value;
    let pressure = gas.ln_pressure.value.exp();
    let square = layer.radius_cm * layer.radius_cm;
    let per_mass = pressure / (GRAVITATION * layer.inside_g);
    Slopes {
        ln_density: gas.chi_density.value.recip() - gas.expansion.value * adiabatic,
        ln_temperature: adiabatic,
        radius_cm: -square * per_mass / layer.ln_density.exp(),
        inside_g: -4.0 * PI * square * square * per_mass,
    }
}

fn moved(layer: &Layer, slopes: &Slopes, step: f64) -> Layer {
    Layer {
        ln_density: layer.ln_density + step * slopes.ln_density,
        ln_temperature: layer.ln_temperature + step * slopes.ln_temperature,
        radius_cm: layer.radius_cm + step * slopes.radius_cm,
        inside_g: layer.inside_g + step * slopes.inside_g,
    }
}

/// ln P above that of a photosphere at this layer.
fn above_photosphere(matter: &Matter, layer: &Layer) -> f64 {
    let gravity = GRAVITATION * layer.inside_g / (layer.radius_cm * layer.radius_cm);
    matter.gas.ln_pressure.value + matter.ln_opacity.value - (2.0 / 3.0 * gravity).ln()
}

impl Isentrope {
    /// The star with this central density (g cm⁻³) and temperature (K). Nothing if it has no photosphere.
    fn outward(laws: &Microphysics, composition: &Composition, density: f64, temperature: f64) -> Option<Self> {
        let matter_at = |layer: &Layer, guess: f64| {
            let state = [layer.ln_density, layer.ln_temperature];
            Matter::at(laws, composition, Helium3::Given, state, guess)
        };
        let mut layer =
            Layer { ln_density: density.ln(), ln_temperature: temperature.ln(), radius_cm: 1.0, inside_g: 1.0 };
        let centre = matter_at(&layer, 0.0)?;
        // A small uniform sphere, its pressure lower at the edge by (2π/3) G ρ² r².
        let falling = 2.0 / 3.0 * PI * GRAVITATION * density * density;
        let pressure = centre.gas.ln_pressure.value.exp();
        let radius = 0.05 * (pressure / falling).sqrt();
        let fall = (1.0 - falling * radius * radius / pressure).ln();
        let start = slopes(&centre, &layer);
        layer.ln_density += start.ln_density * fall;
        layer.ln_temperature += start.ln_temperature * fall;
        layer.radius_cm = radius;
        layer.inside_g = 4.0 / 3.0 * PI * radius.powi(3) * density;

        let mut matter = matter_at(&layer, centre.gas.ln_f.value)?;
        let mut height = above_photosphere(&matter, &layer);
        let mut layers = vec![layer];
        for _ in 0..MOST_STEPS {
            let here = slopes(&matter, &layer);
            let step = -STEP[0].min(STEP[1] * layer.radius_cm / -here.radius_cm);
            let half = moved(&layer, &here, 0.5 * step);
            let halfway = matter_at(&half, matter.gas.ln_f.value)?;
            let next = moved(&layer, &slopes(&halfway, &half), step);
            let next_matter = matter_at(&next, halfway.gas.ln_f.value)?;
            let next_height = above_photosphere(&next_matter, &next);
            if next_height <= 0.0 {
                let part = height / (height - next_height);
                let between = |a: f64, b: f64| a + (b - a) * part;
                layers.push(Layer {
                    ln_density: between(layer.ln_density, next.ln_density),
                    ln_temperature: between(layer.ln_temperature, next.ln_temperature),
                    radius_cm: between(layer.radius_cm, next.radius_cm),
                    inside_g: between(layer.inside_g, next.inside_g),
                });
                return Some(Self { layers });
            }
            if next.ln_temperature < COLDEST_LN_K {
                return None;
            }
            layers.push(next);
            (layer, matter, height) = (next, next_matter, next_height);
        }
        None
    }

    /// The star of this mass (g) and central density (g cm⁻³), found from a first guess of its central temperature
    /// (K) by the secant method. Nothing if none is found.
    pub(in super::super) fn of_mass(
        laws: &Microphysics,
        composition: &Composition,
        mass_g: f64,
        density: f64,
        temperature_guess: f64,
    ) -> Option<Self> {
        let at = |ln_temperature: f64| {
            let star = Self::outward(laws, composition, density, ln_temperature.exp())?;
            let miss = (star.surface().inside_g / mass_g).ln();
            Some((star, miss))
        };
        // M ∝ T_c^(3/2) at given central density.
        let mut old = temperature_guess.ln();
        let (mut star, mut old_miss) = at(old)?;
        let mut new = old - (old_miss / 1.5).clamp(-0.7, 0.7);
        for _ in 0..40 {
            if old_miss.abs() < MASS_TOLERANCE {
                return Some(star);
            }
            let (next, miss) = at(new)?;
            let rise = (miss - old_miss) / (new - old);
            (star, old_miss, old) = (next, miss, new);
            let step = if rise.is_finite() && rise > 0.1 { -miss / rise } else { -miss / 1.5 };
            new += step.clamp(-0.7, 0.7);
        }
        None
    }

    /// The photosphere.
    pub(in super::super) fn surface(&self) -> &Layer {
        &self.layers[self.layers.len() - 1]
    }

    /// Luminosity 4πR²σT⁴, erg s⁻¹.
    pub(in super::super) fn luminosity_erg_s(&self) -> f64 {
        let surface = self.surface();
        4.0 * PI * surface.radius_cm.powi(2) * STEFAN_BOLTZMANN * (4.0 * surface.ln_temperature).exp()
    }

    /// ln ρ, ln T and ln r at the point with this share of the star's mass above it.
    pub(in super::super) fn at_share_above(&self, above: f64) -> [f64; 3] {
        /// Between shares as small as this the logarithm of the mass above is followed.
        const SKIN: f64 = 0.02;
        let mass = self.surface().inside_g;
        let share = |layer: &Layer| 1.0 - layer.inside_g / mass;
        let first = &self.layers[0];
        if above >= share(first) {
            let inside = mass * (1.0 - above);
            let radius = first.radius_cm * (inside / first.inside_g).cbrt();
            return [first.ln_density, first.ln_temperature, radius.ln()];
        }
        let next = self.layers.partition_point(|layer| share(layer) > above).clamp(1, self.layers.len() - 1);
        let (inner, outer) = (&self.layers[next - 1], &self.layers[next]);
        let part = if above > SKIN {
            (share(inner) - above) / (share(inner) - share(outer))
        } else {
            let ln = |value: f64| value.max(1e-15).ln();
            let (from, to) = (ln(share(inner)), ln(share(outer)));
            if from - to > 1e-9 { (from - ln(above)) / (from - to) } else { 1.0 }
        };
        let between = |a: f64, b: f64| a + (b - a) * part.clamp(0.0, 1.0);
        [
            between(inner.ln_density, outer.ln_density),
            between(inner.ln_temperature, outer.ln_temperature),
            between(inner.radius_cm, outer.radius_cm).ln(),
        ]
    }
}
