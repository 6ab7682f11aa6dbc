//! Natural cubic splines over a rectangle of nodes, with slopes.

/// A value and its slopes along both axes.
#[derive(Clone, Copy, Debug, Default, PartialEq)]
pub(super) struct Sloped {
    /// The value.
    pub(super) value: f64,
    /// Slope along the first axis, log T.
    pub(super) t: f64,
    /// Slope along the second axis, log R.
    pub(super) r: f64,
}

impl Sloped {
    /// This plus `factor` times another.
    #[inline]
    pub(super) fn plus(self, other: Self, factor: f64) -> Self {
        Self { value: self.value + factor * other.value, t: self.t + factor * other.t, r: self.r + factor * other.r }
    }

    /// This moved towards another by a share which itself changes along the first axis.
    #[inline]
    pub(super) fn towards(self, other: Self, share: f64, share_slope: f64) -> Self {
        let step = other.plus(self, -1.0);
        let mut mixed = self.plus(step, share);
        mixed.t += share_slope * step.value;
        mixed
    }
}

/// Weights of the values and second derivatives at the two ends of one interval.
#[derive(Clone, Copy, Debug)]
pub(super) struct Weights {
    start: usize,
    value: [f64; 4],
    slope: [f64; 4],
}

/// Node positions along one axis.
#[derive(Clone, Debug)]
pub(super) struct Axis(Vec<f64>);

impl Axis {
    /// An axis of at least two rising positions.
    pub(super) fn new(nodes: Vec<f64>) -> Option<Self> {
        (nodes.len() >= 2 && nodes.windows(2).all(|w| w[0] < w[1])).then_some(Self(nodes))
    }

    fn len(&self) -> usize {
        self.0.len()
    }

    /// Weights at a position; outside the nodes the spline goes on straight.
    #[inline]
    pub(super) fn weights(&self, position: f64) -> Weights {
        let nodes = &self.0;
        let last = nodes.len() - 1;
        let start = nodes.partition_point(|node| *node < position).clamp(1, last) - 1;
        let width = nodes[start + 1] - nodes[start];
        let inside = position.clamp(nodes[0], nodes[last]);
        let b = (inside - nodes[start]) / width;
        let a = 1.0 - b;
        let sixth = width * width / 6.0;
        let mut value = [a, b, (a * a * a - a) * sixth, (b * b * b - b) * sixth];
        let slope = [-1.0 / width, 1.0 / width, -(3.0 * a * a - 1.0) * width / 6.0, (3.0 * b * b - 1.0) * width / 6.0];
        let beyond = position - inside;
        if beyond != 0.0 {
            for (v, s) in value.iter_mut().zip(slope) {
                *v += beyond * s;
            }
        }
        Weights { start, value, slope }
    }

    /// Second derivatives at the nodes of the natural cubic spline through `values`.
    fn second_derivatives(&self, values: &[f64]) -> Vec<f64> {
        let nodes = &self.0;
        let count = nodes.len();
        let mut moments = vec![0.0; count];
        let mut ratio = vec![0.0; count];
        for i in 1..count - 1 {
            let (left, right) = (nodes[i] - nodes[i - 1], nodes[i + 1] - nodes[i]);
            let bend = (values[i + 1] - values[i]) / right - (values[i] - values[i - 1]) / left;
            let pivot = (left + right) / 3.0 - left / 6.0 * ratio[i - 1];
            ratio[i] = right / 6.0 / pivot;
            moments[i] = (bend - left / 6.0 * moments[i - 1]) / pivot;
        }
        for i in (1..count - 1).rev() {
            moments[i] -= ratio[i] * moments[i + 1];
        }
        moments
    }
}

/// One table: value and second derivatives (none, R, T, TR) at every node.
#[derive(Clone, Debug)]
pub(super) struct Surface {
    columns: usize,
    nodes: Vec<[f64; 4]>,
}

impl Surface {
    /// The spline through `values`, given row by row (one row per log T).
    pub(super) fn new(t: &Axis, r: &Axis, values: &[f64]) -> Option<Self> {
        let (rows, columns) = (t.len(), r.len());
        if values.len() != rows * columns {
            return None;
        }
        let mut nodes = vec![[0.0; 4]; values.len()];
        for row in 0..rows {
            let line = &values[row * columns..(row + 1) * columns];
            for (column, second) in r.second_derivatives(line).into_iter().enumerate() {
                nodes[row * columns + column][0] = line[column];
                nodes[row * columns + column][1] = second;
            }
        }
        for column in 0..columns {
            for part in 0..2 {
                let line: Vec<f64> = (0..rows).map(|row| nodes[row * columns + column][part]).collect();
                for (row, second) in t.second_derivatives(&line).into_iter().enumerate() {
                    nodes[row * columns + column][part + 2] = second;
                }
            }
        }
        Some(Self { columns, nodes })
    }

    /// Value and slopes at the place that the weights stand for.
    #[inline]
    pub(super) fn at(&self, t: &Weights, r: &Weights) -> Sloped {
        let mut out = Sloped::default();
        for p in 0..2 {
            let row = (t.start + p) * self.columns + r.start;
            for q in 0..2 {
                let [f, f_r, f_t, f_tr] = self.nodes[row + q];
                let plain = f * r.value[q] + f_r * r.value[q + 2];
                let plain_slope = f * r.slope[q] + f_r * r.slope[q + 2];
                let bent = f_t * r.value[q] + f_tr * r.value[q + 2];
                let bent_slope = f_t * r.slope[q] + f_tr * r.slope[q + 2];
                out.value += t.value[p] * plain + t.value[p + 2] * bent;
                out.t += t.slope[p] * plain + t.slope[p + 2] * bent;
                out.r += t.value[p] * plain_slope + t.value[p + 2] * bent_slope;
            }
        }
        out
    }
}
