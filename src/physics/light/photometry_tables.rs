//! Tables of colour and bolometric correction, from cool to hot.

/// Effective temperature, K, and B−V, mag, of dwarfs.
///
/// # Source
/// Pecaut & Mamajek (2013), Astrophysical Journal Supplement 208, 9, table version 2019.3.22.
#[expect(clippy::approx_constant, reason = "a measured colour that happens to look like 1/π")]
pub(super) const DWARF_COLOUR: [[f64; 2]; 38] = [
    [2500.0, 2.2],
    [2650.0, 2.06],
    [2850.0, 2.0],
    [3030.0, 1.874],
    [3200.0, 1.661],
    [3410.0, 1.544],
    [3500.0, 1.522],
    [3550.0, 1.5],
    [3700.0, 1.475],
    [3870.0, 1.408],
    [4070.0, 1.33],
    [4410.0, 1.15],
    [4600.0, 1.1],
    [4830.0, 0.986],
    [5040.0, 0.884],
    [5280.0, 0.816],
    [5490.0, 0.73],
    [5660.0, 0.68],
    [5770.0, 0.65],
    [5920.0, 0.596],
    [6170.0, 0.53],
    [6340.0, 0.484],
    [6510.0, 0.44],
    [6810.0, 0.37],
    [7220.0, 0.29],
    [7800.0, 0.21],
    [8080.0, 0.16],
    [8550.0, 0.09],
    [8840.0, 0.07],
    [9700.0, 0.0],
    [10700.0, -0.07],
    [12500.0, -0.109],
    [15700.0, -0.156],
    [17000.0, -0.178],
    [26000.0, -0.278],
    [31500.0, -0.307],
    [32500.0, -0.318],
    [41500.0, -0.32],
];

/// Effective temperature, K, and bolometric correction in V, mag, of dwarfs.
///
/// # Source
/// Pecaut & Mamajek (2013), Astrophysical Journal Supplement 208, 9, table version 2022.04.16;
/// the two rows below 2810 K are from version 2019.3.22, which is 0.3 to 0.4 mag brighter in correction where both exist.
pub(super) const DWARF_CORRECTION: [[f64; 2]; 31] = [
    [2500.0, -5.7],
    [2650.0, -5.06],
    [2810.0, -4.13],
    [3210.0, -2.51],
    [3560.0, -1.62],
    [3850.0, -1.15],
    [4100.0, -0.93],
    [4440.0, -0.63],
    [4830.0, -0.375],
    [5270.0, -0.195],
    [5480.0, -0.14],
    [5660.0, -0.105],
    [5770.0, -0.085],
    [5930.0, -0.065],
    [6180.0, -0.04],
    [6550.0, -0.02],
    [7220.0, 0.01],
    [8100.0, 0.0],
    [8600.0, -0.04],
    [9700.0, -0.21],
    [10700.0, -0.42],
    [12300.0, -0.73],
    [14500.0, -1.13],
    [17000.0, -1.54],
    [20600.0, -2.03],
    [24500.0, -2.44],
    [29000.0, -2.83],
    [33300.0, -3.11],
    [35100.0, -3.24],
    [37100.0, -3.41],
    [41400.0, -3.76],
];

/// Temperature, K, B−V, mag, and bolometric correction in V, mag, of blackbodies.
///
/// # Source
/// Planck's law through the B and V passbands of Bessell (1990), PASP 102, 1181, photon-weighted; zero points
/// from the ASTM G173 Sun set to B−V = 0.653 and BC = −0.085.
#[expect(clippy::approx_constant, reason = "a correction that happens to look like 2π")]
pub(super) const BLACKBODY_PHOTOMETRY: [[f64; 3]; 29] = [
    [2500.0, 2.0819, -2.8816],
    [2650.0, 1.9463, -2.5072],
    [2850.0, 1.7855, -2.0871],
    [3030.0, 1.6571, -1.7721],
    [3200.0, 1.5479, -1.5193],
    [3410.0, 1.4266, -1.2564],
    [3700.0, 1.28, -0.9654],
    [4070.0, 1.1211, -0.6871],
    [4410.0, 0.9972, -0.5],
    [4830.0, 0.867, -0.3356],
    [5280.0, 0.7498, -0.2197],
    [5770.0, 0.6425, -0.1446],
    [6340.0, 0.5385, -0.1048],
    [6810.0, 0.466, -0.0997],
    [7220.0, 0.4106, -0.1101],
    [7800.0, 0.3426, -0.1428],
    [8550.0, 0.269, -0.207],
    [9700.0, 0.1796, -0.3353],
    [10700.0, 0.1187, -0.4632],
    [12500.0, 0.0358, -0.7091],
    [15700.0, -0.0604, -1.1478],
    [17000.0, -0.088, -1.3189],
    [20000.0, -0.137, -1.69],
    [26000.0, -0.1969, -2.3492],
    [32500.0, -0.2349, -2.9488],
    [41500.0, -0.2664, -3.6375],
    [50000.0, -0.285, -4.18],
    [100000.0, -0.328, -6.28],
    [200000.0, -0.348, -8.47],
];

/// Interpolates column `column` linearly in log T; beyond either end the end value holds.
pub(super) fn in_log_temperature<const COLUMNS: usize>(
    table: &[[f64; COLUMNS]],
    column: usize,
    temperature_k: f64,
) -> f64 {
    let upper = table.partition_point(|row| row[0] < temperature_k).clamp(1, table.len() - 1);
    let (cool, hot) = (&table[upper - 1], &table[upper]);
    let share = ((temperature_k / cool[0]).ln() / (hot[0] / cool[0]).ln()).clamp(0.0, 1.0);
    cool[column] + share * (hot[column] - cool[column])
}

#[cfg(test)]
mod tests {
    use super::*;

    #[test]
    fn every_table_goes_from_cool_to_hot() {
        assert!(DWARF_COLOUR.is_sorted_by(|cool, hot| cool[0] < hot[0]));
        assert!(DWARF_CORRECTION.is_sorted_by(|cool, hot| cool[0] < hot[0]));
        assert!(BLACKBODY_PHOTOMETRY.is_sorted_by(|cool, hot| cool[0] < hot[0]));
    }

    #[test]
    fn rows_are_met_and_ends_hold() {
        assert_eq!(in_log_temperature(&DWARF_COLOUR, 1, 5770.0), 0.65);
        assert_eq!(in_log_temperature(&DWARF_COLOUR, 1, 100.0), 2.2);
        assert_eq!(in_log_temperature(&BLACKBODY_PHOTOMETRY, 2, 1e6), -8.47);
    }
}
