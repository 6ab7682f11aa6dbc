//! Monotone cubic interpolation of several quantities over common nodes.

/// Smooth curves of `N` quantities through common nodes that never overshoot: where nodes rise, so does the curve.
///
/// # Source
/// Piecewise cubic Hermite interpolation with the weighted harmonic mean slopes of Fritsch & Butland 1984, SIAM J. Sci.
/// Stat. Comput. 5, 300; end slopes by the limited three-point formula of Moler 2004, Numerical Computing, section 3.4.
#[derive(Clone, Debug)]
pub(super) struct Curve<const N: usize> {
    ages: Vec<f64>,
    values: Vec<[f64; N]>,
    slopes: Vec<[f64; N]>,
}

impl<const N: usize> Curve<N> {
    /// The curve through nodes in order of age. Two nodes of one age mark a bend: the slope may change there.
    pub(super) fn new(nodes: impl IntoIterator<Item = (f64, [f64; N])>) -> Self {
        let (ages, values): (Vec<f64>, Vec<[f64; N]>) = nodes.into_iter().unzip();
        let mut slopes = Vec::with_capacity(ages.len());
        let mut start = 0;
        while start < ages.len() {
            let end = (start + 1..ages.len()).find(|&index| ages[index] <= ages[index - 1]).unwrap_or(ages.len());
            slopes.extend(stretch_slopes(&ages[start..end], &values[start..end]));
            start = end;
        }
        Self { ages, values, slopes }
    }

    /// Ages of the nodes.
    pub(super) fn ages(&self) -> &[f64] {
        &self.ages
    }

    /// Values at an age, held at the ends.
    pub(super) fn at(&self, age: f64) -> [f64; N] {
        let count = self.ages.len();
        let after = self.ages.partition_point(|&node| node <= age);
        if after == 0 || count < 2 {
            return self.values.first().copied().unwrap_or([0.0; N]);
        }
        if after == count {
            return self.values[count - 1];
        }
        let before = after - 1;
        let width = self.ages[after] - self.ages[before];
        let s = (age - self.ages[before]) / width;
        let t = 1.0 - s;
        let blend = s * s * (1.0 + 2.0 * t);
        let (rise_start, rise_end) = (width * s * t * t, -width * s * s * t);
        let ((v0, v1), (d0, d1)) =
            ((&self.values[before], &self.values[after]), (&self.slopes[before], &self.slopes[after]));
        // Rounding alone could step outside the nodes by the last digit.
        std::array::from_fn(|q| {
            let value = v0[q] + blend * (v1[q] - v0[q]) + d0[q] * rise_start + d1[q] * rise_end;
            value.clamp(v0[q].min(v1[q]), v0[q].max(v1[q]))
        })
    }
}

/// Slopes at the nodes of one smooth stretch.
fn stretch_slopes<const N: usize>(ages: &[f64], values: &[[f64; N]]) -> Vec<[f64; N]> {
    let mut slopes = vec![[0.0; N]; ages.len()];
    for quantity in 0..N {
        for (slope, found) in slopes.iter_mut().zip(node_slopes(ages, |index| values[index][quantity])) {
            slope[quantity] = found;
        }
    }
    slopes
}

fn node_slopes(ages: &[f64], value: impl Fn(usize) -> f64) -> Vec<f64> {
    let count = ages.len();
    if count < 2 {
        return vec![0.0; count];
    }
    let width = |i: usize| ages[i + 1] - ages[i];
    let secant = |i: usize| (value(i + 1) - value(i)) / width(i);
    if count == 2 {
        return vec![secant(0); 2];
    }
    let mut slopes = Vec::with_capacity(count);
    slopes.push(end_slope(width(0), width(1), secant(0), secant(1)));
    for i in 1..count - 1 {
        let (left, right) = (secant(i - 1), secant(i));
        slopes.push(if left * right > 0.0 {
            let (w0, w1) = (2.0 * width(i) + width(i - 1), width(i) + 2.0 * width(i - 1));
            (w0 + w1) / (w0 / left + w1 / right)
        } else {
            0.0
        });
    }
    slopes.push(end_slope(width(count - 2), width(count - 3), secant(count - 2), secant(count - 3)));
    slopes
}

fn end_slope(near_width: f64, far_width: f64, near: f64, far: f64) -> f64 {
    let slope = ((2.0 * near_width + far_width) * near - near_width * far) / (near_width + far_width);
    if slope * near <= 0.0 {
        0.0
    } else if near * far <= 0.0 && slope.abs() > 3.0 * near.abs() {
        3.0 * near
    } else {
        slope
    }
}

#[cfg(test)]
mod tests {
    use super::*;

    fn all(value: f64) -> [f64; 5] {
        [value; 5]
    }

    #[test]
    fn it_goes_through_the_nodes_and_holds_the_ends() {
        let curve = Curve::new([(1.0, all(2.0)), (2.0, all(5.0)), (4.0, all(5.0)), (5.0, all(1.0))]);
        for (age, value) in [(0.0, 2.0), (1.0, 2.0), (2.0, 5.0), (3.0, 5.0), (4.0, 5.0), (5.0, 1.0), (9.0, 1.0)] {
            assert_eq!(curve.at(age)[0], value);
        }
    }

    #[test]
    fn it_never_overshoots() {
        let nodes = [(0.0, 0.0), (1.0, 0.01), (1.1, 4.0), (3.0, 4.1), (3.01, 2.0), (9.0, -1.0)];
        let curve = Curve::new(nodes.map(|(age, value)| (age, all(value))));
        for pair in nodes.windows(2) {
            let (low, high) = (pair[0].1.min(pair[1].1), pair[0].1.max(pair[1].1));
            let mut before = pair[0].1;
            for step in 0..=200 {
                let age = pair[0].0 + (pair[1].0 - pair[0].0) * f64::from(step) / 200.0;
                let value = curve.at(age)[3];
                assert!((low - 1e-12..=high + 1e-12).contains(&value));
                assert!((value - before) * (pair[1].1 - pair[0].1) >= -1e-12, "turned back at {age}");
                before = value;
            }
        }
    }

    #[test]
    fn it_bends_where_a_node_stands_twice() {
        let nodes = [(0.0, 0.0), (1.0, 1.0), (2.0, 2.0), (2.0, 2.0), (3.0, 5.0), (4.0, 8.0)];
        let curve = Curve::new(nodes.map(|(age, value)| (age, all(value))));
        for (age, value) in [(1.5, 1.5), (1.9, 1.9), (2.0, 2.0), (2.1, 2.3), (3.7, 7.1)] {
            assert!((curve.at(age)[0] - value).abs() < 1e-12);
        }
    }

    #[test]
    fn a_smooth_curve_is_followed_closely() {
        let curve = Curve::new((0..=20).map(|i| (f64::from(i) * 0.05, all((f64::from(i) * 0.05).exp()))));
        for i in 0..1000 {
            let x = f64::from(i) / 1000.0;
            assert!((curve.at(x)[4] - x.exp()).abs() < 1e-4);
        }
    }
}
