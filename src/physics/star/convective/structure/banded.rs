//! Linear equations whose matrix is a narrow band.

/// Bands below and above the diagonal.
const REACH: usize = 5;
/// A row holds the band and what row exchanges add above it.
const WIDTH: usize = 3 * REACH + 1;

/// A square banded matrix with its right-hand side.
pub(super) struct Banded {
    rows: Vec<[f64; WIDTH]>,
    right: Vec<f64>,
}

impl Banded {
    /// An empty system of `size` equations.
    pub(super) fn new(size: usize) -> Self {
        Self { rows: vec![[0.0; WIDTH]; size], right: vec![0.0; size] }
    }

    /// Empties the matrix; the right-hand side is overwritten as rows are written.
    pub(super) fn clear(&mut self) {
        self.rows.fill([0.0; WIDTH]);
    }

    /// Adds to one coefficient, no farther than five from the diagonal.
    #[inline]
    pub(super) fn add(&mut self, row: usize, column: usize, value: f64) {
        self.rows[row][column + REACH - row] += value;
    }

    /// Sets the right-hand side of a row.
    #[inline]
    pub(super) fn set_right(&mut self, row: usize, value: f64) {
        self.right[row] = value;
    }

    /// Solves by elimination with row exchanges. Nothing if the matrix is singular.
    pub(super) fn solve(&mut self) -> Option<&[f64]> {
        let size = self.rows.len();
        for i in 0..size {
            let below = (i + REACH + 1).min(size);
            let pivot = (i..below).max_by(|&a, &b| {
                let of = |row: usize| self.rows[row][REACH + i - row].abs();
                of(a).total_cmp(&of(b))
            })?;
            let end = (i + 2 * REACH + 1).min(size);
            if pivot != i {
                for column in i..end {
                    let kept = self.rows[i][column + REACH - i];
                    self.rows[i][column + REACH - i] = self.rows[pivot][column + REACH - pivot];
                    self.rows[pivot][column + REACH - pivot] = kept;
                }
                self.right.swap(i, pivot);
            }
            let upper = self.rows[i];
            let diagonal = upper[REACH];
            if !(diagonal.abs() > f64::MIN_POSITIVE && diagonal.is_finite()) {
                return None;
            }
            for row in i + 1..below {
                let lead = REACH + i - row;
                let factor = self.rows[row][lead] / diagonal;
                if factor != 0.0 {
                    for (k, value) in upper[REACH..].iter().enumerate().take(end - i) {
                        self.rows[row][lead + k] -= factor * value;
                    }
                    self.right[row] -= factor * self.right[i];
                }
            }
        }
        for i in (0..size).rev() {
            let end = (i + 2 * REACH + 1).min(size);
            let known: f64 = (i + 1..end).map(|j| self.rows[i][j + REACH - i] * self.right[j]).sum();
            self.right[i] = (self.right[i] - known) / self.rows[i][REACH];
        }
        self.right.iter().all(|value| value.is_finite()).then_some(self.right.as_slice())
    }
}

#[cfg(test)]
mod tests {
    use super::*;

    #[test]
    fn a_band_with_a_zero_diagonal_is_solved() {
        let size = 40_usize;
        let entry = |i: usize, j: usize| {
            if i == j && i.is_multiple_of(3) {
                0.0
            } else {
                f64::from(u32::try_from((7 * i + 3 * j + i * j) % 11).unwrap()) - 4.5
            }
        };
        let wanted: Vec<f64> = (0..size).map(|i| (i as f64).sin() + 0.1).collect();
        let mut system = Banded::new(size);
        for i in 0..size {
            let columns = i.saturating_sub(REACH)..(i + REACH + 1).min(size);
            system.set_right(i, columns.clone().map(|j| entry(i, j) * wanted[j]).sum());
            columns.for_each(|j| system.add(i, j, entry(i, j)));
        }
        let found = system.solve().expect("a regular matrix");
        for (a, b) in found.iter().zip(&wanted) {
            assert!((a - b).abs() < 1e-9, "{a} {b}");
        }
    }

    #[test]
    fn a_singular_matrix_is_refused() {
        let mut system = Banded::new(3);
        system.add(0, 0, 1.0);
        system.add(1, 1, 1.0);
        assert!(system.solve().is_none());
    }
}
