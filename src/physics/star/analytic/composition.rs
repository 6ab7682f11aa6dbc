//! Coefficients of one composition: the polynomials evaluated and the papers' special rules applied.

use super::coefficients::{A, B, ZERO_AGE_LUMINOSITY, ZERO_AGE_RADIUS};
use super::critical_mass::CriticalMasses;

/// Every coefficient of one composition. Indices are the numbers in the papers.
#[derive(Clone, Debug)]
pub(super) struct Coefficients {
    /// Zero-age luminosity.
    pub(super) zero_age_l: [f64; 8],
    /// Zero-age radius.
    pub(super) zero_age_r: [f64; 10],
    /// a1 … a81.
    pub(super) a: [f64; 82],
    /// b1 … b57.
    pub(super) b: [f64; 58],
}

/// α + βζ + γζ² + … by Horner's rule.
fn polynomial(row: &[f64; 6], zeta: f64) -> f64 {
    row.iter().rev().fold(0.0, |sum, term| sum * zeta + term)
}

fn evaluate<const N: usize>(rows: &[[f64; 6]; N], zeta: f64) -> [f64; N] {
    std::array::from_fn(|index| polynomial(&rows[index], zeta))
}

impl Coefficients {
    /// Coefficients at heavy-element mass fraction `z`.
    ///
    /// # Source
    /// Hurley, Pols & Tout 2000, Appendix A, the rules printed between and below the tables.
    pub(super) fn new(z: f64, critical: &CriticalMasses) -> Self {
        let zeta = (z / 0.02).log10();
        let mut a = evaluate(&A, zeta);
        let mut b = evaluate(&B, zeta);
        apply_rules_a(&mut a, z, zeta);
        apply_rules_b(&mut b, z, zeta, critical);
        Self { zero_age_l: evaluate(&ZERO_AGE_LUMINOSITY, zeta), zero_age_r: evaluate(&ZERO_AGE_RADIUS, zeta), a, b }
    }
}

fn apply_rules_a(a: &mut [f64; 82], z: f64, zeta: f64) {
    let sigma = z.log10();
    a[11] *= a[14];
    a[12] *= a[14];
    a[17] = 10.0_f64
        .powf((0.097 - 0.1072 * (sigma + 3.0)).max(0.097_f64.max((0.1461 + 0.1237 * (sigma + 2.0)).min(0.1461))));
    a[18] *= a[20];
    a[19] *= a[20];
    a[29] = a[29].powf(a[32]);
    a[33] = (0.6355 - 0.4192 * zeta).max(1.25_f64.max((1.5135 + 0.3769 * zeta).min(1.4)));
    a[42] = a[42].clamp(1.1, 1.25);
    a[44] = a[44].clamp(0.45, 1.3);
    a[49] = a[49].max(0.145);
    a[50] = a[50].min(0.306 + 0.053 * zeta);
    a[51] = a[51].min(0.3625 + 0.062 * zeta);
    a[52] = a[52].max(0.9);
    a[53] = a[53].max(1.0);
    if z > 0.01 {
        a[52] = a[52].min(1.0);
        a[53] = a[53].min(1.1);
        a[72] = a[72].max(0.95);
    }
    a[57] = a[33];
    a[62] = a[62].max(0.065);
    if z < 0.004 {
        a[63] = a[63].min(0.055);
    }
    a[66] = a[66].max((-0.308 - 1.046 * zeta).min(1.6));
    a[66] = a[66].min(0.8 - 2.0 * zeta).max(0.8);
    a[68] = a[68].clamp(0.9, 1.0);
    a[64] = a[64].clamp(0.091, 0.121);
    if a[68] > a[66] {
        a[64] = a[58] * a[66].powf(a[60]) / (a[59] + a[66].powf(a[61]));
    }
    a[68] = a[68].min(a[66]);
    a[74] = a[74].clamp(1.4, 1.6);
    a[75] = a[75].clamp(1.0, 1.27).max(0.6355 - 0.4192 * zeta);
    a[76] = a[76].max(-0.1015564 - 0.2161264 * zeta - 0.05182516 * zeta * zeta);
    a[77] = (-0.3868776 - 0.5457078 * zeta - 0.1463472 * zeta * zeta).max(a[77].min(0.0));
    a[78] = a[78].min(7.454 + 9.046 * zeta).max(0.0);
    a[79] = a[79].min((-13.3 - 18.6 * zeta).max(2.0));
    a[80] = a[80].max(0.0585542);
    a[81] = a[81].clamp(0.4, 1.5);
}

fn apply_rules_b(b: &mut [f64; 58], z: f64, zeta: f64, critical: &CriticalMasses) {
    let sigma = z.log10();
    let rho = zeta + 1.0;
    b[1] = b[1].min(0.54);
    b[2] = 10.0_f64.powf(-4.6739 - 0.9394 * sigma);
    b[2] = b[2].max(-0.04167 + 55.67 * z).min(0.4771 - 9329.21 * z.powf(2.94));
    b[3] = 10.0_f64.powf((-2.2794 - 1.5175 * sigma - 0.254 * sigma * sigma).max(-0.1451));
    if z > 0.004 {
        b[3] = b[3].max(0.7307 + 14265.1 * z.powf(3.395));
    }
    b[11] *= b[11];
    b[13] *= b[13];
    b[14] = b[14].powf(b[15]);
    b[16] = b[16].powf(b[15]);
    b[17] = if zeta <= -1.0 { 1.0 } else { 1.0 - 0.3880523 * rho.powf(2.862149) };
    b[24] = b[24].powf(b[28]);
    b[26] = 5.0 - 0.09138012 * z.powf(-0.3671407);
    b[27] = b[27].powf(2.0 * b[28]);
    b[31] = b[31].powf(b[33]);
    b[34] = b[34].powf(b[33]);
    b[36] = b[36].powi(4);
    b[37] *= 4.0;
    b[38] = b[38].powi(4);
    b[40] = b[40].max(1.0);
    b[41] = b[41].powf(b[42]);
    b[44] = b[44].powi(5);
    b[45] = if rho <= 0.0 { 1.0 } else { 1.0 - rho * (2.47162 + rho * (-5.401682 + rho * 3.247361)) };
    b[46] *= -(critical.flash_msun / critical.blue_ignition_msun).log10();
    b[47] = rho * (1.127733 + rho * (0.2344416 - rho * 0.3793726));
    b[55] = b[55].min(0.99164 - 743.123 * z.powf(2.83));
    b[50] = b[55] * b[3];
}
