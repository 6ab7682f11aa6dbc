//! Photon occupation numbers 1/(eˣ − 1) for a whole table of wavelengths at once.
//!
//! A colour is 95 exponentials. The library exponential is called one by one; the one here is written without
//! branches, so that the compiler works on several wavelengths together.

use super::planck::LARGEST_EXPONENT;
use std::f64::consts::{LN_2, LOG2_E};

/// Smallest exponent (c₂/λT) down to which the fast form keeps its digits: below it 1 − e⁻ˣ cancels.
const SMALLEST_FAST_EXPONENT: f64 = 0.1;

/// 1.5 · 2⁵²: adding it rounds to a whole number, which then stands in the low bits.
const ROUNDER: f64 = 6_755_399_441_055_744.0;
/// ln 2 with its last 21 bits cut off, so that whole multiples up to 2²⁰ are exact; and what was cut off.
const LN_2_HIGH: f64 = f64::from_bits(LN_2.to_bits() & !((1 << 21) - 1));
const LN_2_LOW: f64 = 1.9082149292705877e-10;

/// Occupation numbers for exponents `exponents_k` / T; zero beyond an exponent of 700.
pub(super) fn occupations<const ROWS: usize>(exponents_k: &[f64; ROWS], temperature_k: f64) -> [f64; ROWS] {
    let per_kelvin = 1.0 / temperature_k;
    let (mut smallest, mut largest) = (f64::INFINITY, 0.0_f64);
    for ends in [exponents_k.first(), exponents_k.last()].into_iter().flatten() {
        smallest = smallest.min(ends * per_kelvin);
        largest = largest.max(ends * per_kelvin);
    }
    let mut occupations = [0.0; ROWS];
    // The table runs evenly from one end to the other, so that its ends bound all rows.
    if smallest >= SMALLEST_FAST_EXPONENT && largest <= LARGEST_EXPONENT {
        for (occupation, exponent_k) in occupations.iter_mut().zip(exponents_k) {
            let falling = exp_of_minus(exponent_k * per_kelvin);
            *occupation = falling / (1.0 - falling);
        }
    } else {
        for (occupation, exponent_k) in occupations.iter_mut().zip(exponents_k) {
            let exponent = exponent_k * per_kelvin;
            *occupation = if exponent > LARGEST_EXPONENT { 0.0 } else { 1.0 / exponent.exp_m1() };
        }
    }
    occupations
}

/// e⁻ˣ for 0 ≤ x ≤ 700, to a few units of the last digit.
///
/// x = k ln 2 + r with |r| ≤ ½ ln 2; e⁻ʳ by its Taylor series to r¹², whose remainder is below 2·10⁻¹⁶.
fn exp_of_minus(x: f64) -> f64 {
    let shifted = x * LOG2_E + ROUNDER;
    let whole = shifted - ROUNDER;
    let r = (x - whole * LN_2_HIGH) - whole * LN_2_LOW;
    let mut sum = 1.0 / 479_001_600.0;
    for coefficient in [
        -1.0 / 39_916_800.0,
        1.0 / 3_628_800.0,
        -1.0 / 362_880.0,
        1.0 / 40_320.0,
        -1.0 / 5040.0,
        1.0 / 720.0,
        -1.0 / 120.0,
        1.0 / 24.0,
        -1.0 / 6.0,
        0.5,
        -1.0,
        1.0,
    ] {
        sum = sum * r + coefficient;
    }
    // The low bits of `shifted` hold k; moved into the exponent field they make 2⁻ᵏ.
    sum * f64::from_bits(1023_u64.wrapping_sub(shifted.to_bits()) << 52)
}

#[cfg(test)]
mod tests {
    use super::*;

    #[test]
    fn the_fast_exponential_is_the_library_one() {
        let mut worst = 0.0_f64;
        for step in 0..=700_000 {
            let x = f64::from(step) * 1e-3;
            worst = worst.max((exp_of_minus(x) / (-x).exp() - 1.0).abs());
        }
        assert!(worst < 5e-16, "{worst}");
    }

    #[test]
    fn the_logarithm_of_two_is_split_without_loss() {
        // ln 2 = 0.693147180559945309417232121458 (to 30 digits): the high part is exact in binary, so that
        // the low part must bring the sum to the next digits that f64 cannot hold.
        assert_eq!(LN_2_HIGH + LN_2_LOW, LN_2);
        assert!((LN_2_HIGH * 1024.0).to_bits().trailing_zeros() >= 21);
    }

    #[test]
    fn both_ways_meet_where_they_change_over() {
        let exponents_k = [1000.0, 1500.0, 2000.0];
        for temperature_k in [9_999.0, 10_001.0, 2.9, 2.8] {
            let found = occupations(&exponents_k, temperature_k);
            for (occupation, exponent_k) in found.iter().zip(exponents_k) {
                let exponent: f64 = exponent_k / temperature_k;
                let expected = if exponent > 700.0 { 0.0 } else { 1.0 / exponent.exp_m1() };
                assert!((occupation - expected).abs() <= 1e-14 * expected, "{temperature_k}: {occupation} {expected}");
            }
        }
    }
}
