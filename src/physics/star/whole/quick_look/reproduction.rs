//! Whether the shipped grid is what the structure calculation makes today.

use super::between::GRID;
use super::sample::{COLUMNS, Sampled};
use super::table::GridLife;

/// How far a life computed now lies from its record in the shipped grid: the largest relative difference of the lengths
/// of its stretches, or of a column over the range of that column.
///
/// Nothing if the grid has no such record, or the life was not followed to the black dwarf.
///
/// # Accuracy
/// Sixteen bits a number make 10⁻⁵; the last digits of another machine may add some 10⁻³ where a giant leaves its branch.
#[must_use]
pub fn deviation_from_grid(life: &GridLife) -> Option<f64> {
    let now = Sampled::new(&life.life)?;
    let shipped = GRID.iter().find(|entry| {
        entry.surface == life.surface
            && entry.mass_msun == life.input.mass_msun
            && entry.metallicity_dex == life.input.metallicity_dex
    })?;
    let shipped = &shipped.sampled;
    let relative = |a: f64, b: f64| (a / b - 1.0).abs();
    let mut largest = relative(now.contraction_yr, shipped.contraction_yr);
    for (a, b) in now.lengths_yr.iter().zip(&shipped.lengths_yr) {
        largest = largest.max(relative(*a, *b));
    }
    for column in 0..COLUMNS {
        let values = || shipped.points.iter().map(|point| point[column]);
        let range = values().fold(f64::NEG_INFINITY, f64::max) - values().fold(f64::INFINITY, f64::min);
        if range > 0.0 {
            let pairs = now.points.iter().zip(&shipped.points);
            largest = pairs.map(|(a, b)| (a[column] - b[column]).abs() / range).fold(largest, f64::max);
        }
    }
    Some(largest)
}
