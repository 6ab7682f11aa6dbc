//! The mass shells into which the star is divided.

/// Mass inside the innermost point, as a share of the star. Much smaller values make the luminosity per mass there
/// pure rounding noise in a burnt-out core.
const INNERMOST: f64 = 2e-3;
/// End of the widening steps at the centre and of the even steps, as mass shares.
const EVEN: [f64; 2] = [0.006, 0.85];
/// Mass above the outermost point but one, as a share; even the photosphere of a hot white dwarf lies below it.
const OUTERMOST: f64 = 1e-16;
/// Outside the even steps the mass above falls by these logarithmic steps down to these shares.
const THINNING: [[f64; 2]; 3] = [[0.07, 0.01], [0.12, 2e-4], [0.32, OUTERMOST]];

/// Mesh points from the centre to the surface.
#[derive(Clone, Debug)]
pub(in super::super) struct Mesh {
    /// Mass of the star, g.
    pub(in super::super) star_g: f64,
    /// Share of the star's mass above each point; exactly zero at the last.
    pub(in super::super) above: Vec<f64>,
    /// Mass inside each point, g.
    pub(in super::super) inside_g: Vec<f64>,
    /// Mass between each point and the next, g.
    pub(in super::super) shell_g: Vec<f64>,
    /// Mass that each point stands for, g.
    pub(in super::super) weight_g: Vec<f64>,
    /// Which points are there for good; the others follow a burning shell.
    pub(super) lasting: Vec<bool>,
}

impl Mesh {
    /// A mesh for a star's mass (g); `spacing` 1 gives some 260 points, 0.5 twice as many.
    pub(in super::super) fn new(star_g: f64, spacing: f64) -> Self {
        let mut above = Vec::new();
        let mut inside = INNERMOST;
        while inside < EVEN[0] {
            above.push(1.0 - inside);
            inside *= 1.0 + 0.6 * spacing;
        }
        // Truncation is meant: a whole number of even steps.
        #[expect(clippy::cast_possible_truncation, clippy::cast_sign_loss, reason = "a small positive count")]
        let even = (90.0 / spacing).round() as usize;
        above.extend((0..=even).map(|i| 1.0 - (EVEN[0] + (EVEN[1] - EVEN[0]) * i as f64 / even as f64)));
        let mut left = 1.0 - EVEN[1];
        for [step, end] in THINNING {
            loop {
                left *= (-step * spacing).exp();
                if left <= end * (1.0 + 1e-9) {
                    break;
                }
                above.push(left);
            }
            left = end;
            if end > OUTERMOST {
                above.push(end);
            }
        }
        above.push(0.0);

        let lasting = vec![true; above.len()];
        Self::measured(star_g, above, lasting)
    }

    /// A mesh from its shares of mass above each point.
    pub(super) fn measured(star_g: f64, above: Vec<f64>, lasting: Vec<bool>) -> Self {
        let inside_g = above.iter().map(|share| star_g * (1.0 - share)).collect::<Vec<_>>();
        // Differences of the mass above keep their digits where the mass inside no longer changes.
        let shell_g = above.windows(2).map(|pair| star_g * (pair[0] - pair[1])).collect::<Vec<_>>();
        let mut weight_g = vec![0.0; above.len()];
        weight_g[0] = inside_g[0];
        for (k, shell) in shell_g.iter().enumerate() {
            weight_g[k] += 0.5 * shell;
            weight_g[k + 1] += 0.5 * shell;
        }
        Self { star_g, above, inside_g, shell_g, weight_g, lasting }
    }

    /// Takes mass (g) off the surface; what lies outside `base`, all of one composition, spreads over what is left.
    ///
    /// Nothing happens if that would take more than half of it.
    pub(in super::super) fn shed(&mut self, base: usize, lost_g: f64) {
        let envelope_g = self.star_g * self.above[base];
        if lost_g > 0.5 * envelope_g {
            return;
        }
        let shrunk = 1.0 - lost_g / envelope_g;
        let star_g = self.star_g - lost_g;
        let above = self
            .above
            .iter()
            .enumerate()
            .map(|(k, share)| {
                let above_g = self.star_g * share;
                (if k < base { above_g - lost_g } else { above_g * shrunk }) / star_g
            })
            .collect();
        *self = Self::measured(star_g, above, std::mem::take(&mut self.lasting));
    }

    /// Number of points.
    pub(in super::super) fn len(&self) -> usize {
        self.above.len()
    }
}

#[cfg(test)]
mod tests {
    use super::*;

    #[test]
    fn a_wind_takes_mass_from_the_envelope_only() {
        let mut mesh = Mesh::new(2e32, 1.0);
        let before = mesh.clone();
        let base = mesh.above.iter().position(|share| *share < 0.3).expect("an envelope");
        mesh.shed(base, 1e30);
        assert!((mesh.star_g / 1.99e32 - 1.0).abs() < 1e-12);
        for k in 0..=base {
            assert!((mesh.inside_g[k] / before.inside_g[k] - 1.0).abs() < 1e-12);
        }
        assert!(mesh.shell_g.iter().all(|shell| *shell > 0.0));
        assert!((mesh.weight_g.iter().sum::<f64>() / mesh.star_g - 1.0).abs() < 1e-12);
        // More than half the envelope at once is refused.
        let kept = mesh.star_g;
        mesh.shed(base, 0.2 * kept);
        assert!(mesh.star_g == kept);
    }

    #[test]
    fn shells_add_up_to_the_star() {
        for spacing in [1.0, 0.5, 1.5] {
            let mesh = Mesh::new(2e32, spacing);
            let total: f64 = mesh.weight_g.iter().sum();
            assert!((total / 2e32 - 1.0).abs() < 1e-12);
            assert!(mesh.above.windows(2).all(|pair| pair[0] > pair[1]));
            assert!(mesh.above[mesh.len() - 2] < 2e-16 && mesh.above[mesh.len() - 1] == 0.0);
            let expected = 255.0 / spacing;
            assert!((mesh.len() as f64 / expected - 1.0).abs() < 0.1, "{} points", mesh.len());
        }
    }
}
