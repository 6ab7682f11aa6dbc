//! Rosseland-mean radiative opacity of any mixture of hydrogen, helium and metals.
//!
//! # Source
//! Our own spline fit of OPAL (Iglesias & Rogers 1996, Astrophys. J. 464, 943; GN93 metals) above log T 3.9–4.0 and of
//! Ferguson et al. 2005 (Astrophys. J. 623, 585) below.
//! # Valid for
//! X 0–0.8, Z 0.001–0.03, log T 3–8. Above log R = 1 both published tables end and their last slope is carried on.
//! # Accuracy
//! 0.012 dex rms where red dwarfs pass; 0.04 dex rms below 2000 K (dust).

use super::spline::{Axis, Sloped, Surface};
use std::collections::HashMap;

/// The table of nodes.
const NODES: &str = include_str!("../../../../../assets/tables/opacity_nodes.csv");
/// Metal mass fractions of the hot tables.
const HOT_METALS: [f64; 4] = [0.001, 0.005, 0.0153, 0.03];
/// Hydrogen mass fractions of the hot tables.
const HOT_HYDROGEN: [f64; 4] = [0.0, 0.1, 0.35, 0.7];
/// Added to the hydrogen mass fraction before its logarithm is taken.
const HYDROGEN_OFFSET: f64 = 0.02;
/// Hydrogen mass fraction of cool table A.
const COOL_HYDROGEN: f64 = 0.7;

/// Opacity tables made ready for one metal mass fraction.
#[derive(Clone, Debug)]
pub(in super::super) struct RadiativeOpacity {
    cool_t: Axis,
    cool_r: Axis,
    helium_t: Axis,
    helium_r: Axis,
    hot_t: Axis,
    hot_r: Axis,
    /// log κ of cool gas with X = 0.7.
    cool: Surface,
    /// log κ of cool gas without hydrogen.
    helium: Surface,
    /// log κ of hot gas at each of [`HOT_HYDROGEN`].
    hot: [Surface; 4],
}

/// Weights of a cubic through four nodes.
fn lagrange(nodes: &[f64; 4], position: f64) -> [f64; 4] {
    std::array::from_fn(|i| {
        nodes
            .iter()
            .enumerate()
            .filter(|(j, _)| *j != i)
            .map(|(_, node)| (position - node) / (nodes[i] - node))
            .product()
    })
}

/// Smooth rise from 0 to 1 between two positions, with its slope.
fn rise(position: f64, from: f64, to: f64) -> (f64, f64) {
    let u = ((position - from) / (to - from)).clamp(0.0, 1.0);
    (u * u * (3.0 - 2.0 * u), 6.0 * u * (1.0 - u) / (to - from))
}

impl RadiativeOpacity {
    /// Metal mass fractions of the tables.
    pub(in super::super) const METALS_RANGE: [f64; 2] = [HOT_METALS[0], HOT_METALS[3]];

    /// The tables for a metal mass fraction (kept within 0.001–0.03). Nothing if the table's text is damaged.
    pub(in super::super) fn new(metals: f64) -> Option<Self> {
        let metals = metals.clamp(HOT_METALS[0], HOT_METALS[3]);
        let (grids, tables) = parse(NODES)?;
        let axis = |name: &str, which: &str| Axis::new(grids.get(&format!("{name}{which}"))?.clone());
        let table = |name: &str| tables.get(name);
        let (cool_t, cool_r) = (axis("A", "logT")?, axis("A", "logR")?);
        let (helium_t, helium_r) = (axis("B", "logT")?, axis("B", "logR")?);
        let (hot_t, hot_r) = (axis("H", "logT")?, axis("H", "logR")?);

        let share = (metals / 0.02).ln() / (0.001_f64 / 0.02).ln();
        let change = table("D")?;
        let cool: Vec<f64> = table("A")?.iter().zip(change).map(|(a, d)| a + share * d).collect();
        // Table B begins at a higher temperature than table D on the same rows.
        let helium_values = table("B")?;
        let skipped = change.len().checked_sub(helium_values.len())?;
        let helium: Vec<f64> = helium_values.iter().zip(&change[skipped..]).map(|(b, d)| b + share * d).collect();

        let weights = lagrange(&HOT_METALS.map(f64::ln), metals.ln());
        let hot_surface = |hydrogen: usize| {
            let mut sum: Vec<f64> = Vec::new();
            for (place, weight) in weights.iter().enumerate() {
                let values = table(&format!("H{hydrogen}{place}"))?;
                sum.resize(values.len(), 0.0);
                sum.iter_mut().zip(values).for_each(|(total, value)| *total += weight * value);
            }
            Surface::new(&hot_t, &hot_r, &sum)
        };
        Some(Self {
            cool: Surface::new(&cool_t, &cool_r, &cool)?,
            helium: Surface::new(&helium_t, &helium_r, &helium)?,
            hot: [hot_surface(0)?, hot_surface(1)?, hot_surface(2)?, hot_surface(3)?],
            cool_t,
            cool_r,
            helium_t,
            helium_r,
            hot_t,
            hot_r,
        })
    }

    /// log₁₀ κ (cm² g⁻¹) with slopes, at T = log₁₀ temperature (K), R = log₁₀ density (g cm⁻³) − 3T + 18 and
    /// hydrogen mass fraction X.
    pub(super) fn log_opacity(&self, log_t: f64, log_r: f64, hydrogen: f64) -> Sloped {
        let t = log_t.max(3.0);
        let (share, share_slope) = rise(t, 3.9, 4.0);
        let mut out = if share <= 0.0 {
            self.cool(t, log_r, hydrogen)
        } else if share >= 1.0 {
            self.hot(t, log_r, hydrogen)
        } else {
            self.cool(t, log_r, hydrogen).towards(self.hot(t, log_r, hydrogen), share, share_slope)
        };
        if log_t < 3.0 {
            out.value += log_t - 3.0;
            out.t = 1.0;
        }
        out
    }

    fn cool(&self, t: f64, log_r: f64, hydrogen: f64) -> Sloped {
        let pure = self.cool.at(&self.cool_t.weights(t), &self.cool_r.weights(log_r));
        let mut molecular = pure;
        molecular.value += (0.65 + 0.5 * hydrogen).log10();
        let (share, share_slope) = rise(t, 3.55, 3.65);
        if share <= 0.0 {
            return molecular;
        }
        let helium = self.helium.at(&self.helium_t.weights(t), &self.helium_r.weights(log_r));
        let part = hydrogen / COOL_HYDROGEN;
        let (a, b) = (part * 10_f64.powf(pure.value), (1.0 - part).max(0.0) * 10_f64.powf(helium.value));
        let mixed = Sloped {
            value: (a + b).log10(),
            t: (a * pure.t + b * helium.t) / (a + b),
            r: (a * pure.r + b * helium.r) / (a + b),
        };
        molecular.towards(mixed, share, share_slope)
    }

    fn hot(&self, t: f64, log_r: f64, hydrogen: f64) -> Sloped {
        let (weights_t, weights_r) = (self.hot_t.weights(t.min(8.0)), self.hot_r.weights(log_r));
        let nodes = HOT_HYDROGEN.map(|x| (x + HYDROGEN_OFFSET).ln());
        let shares = lagrange(&nodes, (hydrogen.max(0.0) + HYDROGEN_OFFSET).ln());
        let mut out = Sloped::default();
        for (surface, share) in self.hot.iter().zip(shares) {
            out = out.plus(surface.at(&weights_t, &weights_r), share);
        }
        if t > 8.0 {
            out.t = 0.0;
        }
        out
    }
}

type Named = HashMap<String, Vec<f64>>;

/// Node positions and tables by name.
fn parse(text: &str) -> Option<(Named, Named)> {
    let (mut grids, mut tables) = (Named::new(), Named::new());
    let mut current = String::new();
    for line in text.lines().filter(|line| !line.is_empty() && !line.starts_with('#')) {
        let mut parts = line.split(',');
        match line.split(',').next()? {
            "grid" => {
                parts.next();
                let name = format!("{}{}", parts.next()?, parts.next()?);
                grids.insert(name, parts.map(str::parse).collect::<Result<_, _>>().ok()?);
            }
            "table" => parts.nth(1)?.clone_into(&mut current),
            _ => {
                let values: Vec<f64> = parts.map(str::parse).collect::<Result<_, _>>().ok()?;
                tables.entry(current.clone()).or_default().extend(values);
            }
        }
    }
    Some((grids, tables))
}

#[cfg(test)]
mod tests {
    use super::*;

    #[test]
    fn values_and_slopes_of_the_fit() {
        // Computed with an independent numpy evaluation of the same nodes: T, R, X, Z; log κ, ∂/∂T, ∂/∂R.
        let checks = [
            [3.45, 3.0, 0.711, 0.0153, -0.96348, 16.04717, 0.23943],
            [3.6, 1.0, 0.711, 0.0153, -0.90536, 8.86670, 0.63030],
            [3.8, -0.5, 0.2, 0.0153, -0.88587, 11.49524, 0.53372],
            [3.95, 0.2, 0.35, 0.005, 1.21572, 8.73969, 0.34402],
            [5.0, 0.5, 0.6, 0.0153, 4.56894, -0.99562, 0.57392],
            [6.65, 0.6, 0.3, 0.02, 1.74530, -1.43117, 0.54413],
            [7.2, 0.0, 0.0, 0.001, 0.57128, -0.95886, 0.61621],
            [4.3, -2.5, 0.15, 0.03, 1.22496, 1.97327, 0.79414],
        ];
        for [t, r, x, z, value, slope_t, slope_r] in checks {
            let ours = RadiativeOpacity::new(z).expect("whole table").log_opacity(t, r, x);
            assert!((ours.value - value).abs() < 2e-5, "{t} {r}: {ours:?}");
            assert!((ours.t - slope_t).abs() < 2e-5, "{t} {r}: {ours:?}");
            assert!((ours.r - slope_r).abs() < 2e-5, "{t} {r}: {ours:?}");
        }
    }

    #[test]
    fn published_opal_values_are_met() {
        // Iglesias & Rogers 1996, GN93 table X = 0.70, Y = 0.28, Z = 0.02: log T, log R, log κ.
        let checks = [
            [4.5, 0.0, 4.519],
            [5.0, 0.0, 4.291],
            [6.0, 0.0, 2.441],
            [6.5, 0.0, 1.701],
            [7.0, 0.0, 1.020],
            [7.0, -1.5, 0.270],
            [6.5, 1.0, 2.208],
        ];
        let fit = RadiativeOpacity::new(0.02).expect("whole table");
        for [t, r, published] in checks {
            let ours = fit.log_opacity(t, r, 0.7).value;
            assert!((ours - published).abs() < 0.05, "{t} {r}: {ours} {published}");
        }
    }

    #[test]
    fn damaged_text_is_refused() {
        assert!(parse("grid,A,logT,3,x").is_none());
    }
}
