//! Published relations between colour index B−V, effective temperature and bolometric correction.

use super::range::{OutOfRange, within};

/// log₁₀ T as a polynomial in B−V for dwarfs, subgiants and giants.
const FLOWER_DWARFS_AND_GIANTS: [f64; 8] = [
    3.979145106714099,
    -0.654992268598245,
    1.740690042385095,
    -4.608815154057166,
    6.792599779944473,
    -5.396909891322525,
    2.192970376522490,
    -0.359495739295671,
];
/// log₁₀ T as a polynomial in B−V for supergiants.
const FLOWER_SUPERGIANTS: [f64; 6] = [
    4.012559732366214,
    -1.055043117465989,
    2.133394538571825,
    -2.459769794654992,
    1.349423943497744,
    -0.283942579112032,
];
/// `BC_V` as polynomials in log₁₀ T: below 3.70, from 3.70 to 3.90, above.
const TORRES_COOL: [f64; 4] = [-0.190537291496456e5, 0.155144866764412e5, -0.421278819301717e4, 0.381476328422343e3];
const TORRES_MIDDLE: [f64; 5] =
    [-0.370510203809015e5, 0.385672629965804e5, -0.150651486316025e5, 0.261724637119416e4, -0.170623810323864e3];
const TORRES_HOT: [f64; 6] = [
    -0.118115450538963e6,
    0.137145973583929e6,
    -0.636233812100225e5,
    0.147412923562646e5,
    -0.170587278406872e4,
    0.788731721804990e2,
];

/// Range of B−V over which the dwarf and giant relation falls steadily.
const COLOUR_RANGE_MAG: [f64; 2] = [-0.35, 1.8];

/// Which polynomial of Flower's relation.
#[derive(Clone, Copy, Debug, PartialEq, Eq)]
pub enum FlowerClass {
    /// Dwarfs, subgiants and giants.
    DwarfsAndGiants,
    /// Supergiants.
    Supergiants,
}

/// Effective temperature from B−V, K.
///
/// # Source
/// Flower (1996), Astrophysical Journal 469, 355, coefficients as corrected by Torres (2010), AJ 140, 1158, table 2.
///
/// # Valid for
/// B−V from −0.35 to 1.8, that is 2900 to 52 500 K; not good for M dwarfs.
///
/// # Errors
/// [`OutOfRange`] for a colour outside −0.35 to 1.8.
pub fn flower_temperature_k(b_minus_v_mag: f64, class: FlowerClass) -> Result<f64, OutOfRange> {
    let colour = within("b_minus_v_mag", b_minus_v_mag, COLOUR_RANGE_MAG[0], COLOUR_RANGE_MAG[1], "-0.35 to 1.8 mag")?;
    Ok(10.0_f64.powf(match class {
        FlowerClass::DwarfsAndGiants => polynomial(&FLOWER_DWARFS_AND_GIANTS, colour),
        FlowerClass::Supergiants => polynomial(&FLOWER_SUPERGIANTS, colour),
    }))
}

/// B−V of dwarfs and giants from effective temperature, mag: the inverse of [`flower_temperature_k`] by bisection.
///
/// # Source
/// As [`flower_temperature_k`].
///
/// # Errors
/// [`OutOfRange`] for a temperature outside 2900 to 52 500 K.
pub fn flower_colour_mag(effective_temperature_k: f64) -> Result<f64, OutOfRange> {
    let target = flower_range(effective_temperature_k)?.log10();
    let [mut blue, mut red] = COLOUR_RANGE_MAG;
    for _ in 0..52 {
        let middle = f64::midpoint(blue, red);
        if polynomial(&FLOWER_DWARFS_AND_GIANTS, middle) > target {
            blue = middle;
        } else {
            red = middle;
        }
    }
    Ok(f64::midpoint(blue, red))
}

/// Bolometric correction in V from effective temperature, mag.
///
/// # Source
/// Flower (1996), coefficients as corrected by Torres (2010), table 1. Steps by 0.022 mag at log T = 3.70 and
/// 0.003 mag at 3.90.
///
/// # Valid for
/// 2900 to 52 500 K; not good for M dwarfs.
///
/// # Errors
/// [`OutOfRange`] for a temperature outside 2900 to 52 500 K.
///
/// # Example
/// ```
/// use longember::physics::light::torres_correction_mag;
/// assert!((torres_correction_mag(5772.0)? + 0.081).abs() < 1e-3);
/// # Ok::<(), longember::physics::light::OutOfRange>(())
/// ```
pub fn torres_correction_mag(effective_temperature_k: f64) -> Result<f64, OutOfRange> {
    let log_t = flower_range(effective_temperature_k)?.log10();
    Ok(match log_t {
        _ if log_t < 3.70 => polynomial(&TORRES_COOL, log_t),
        _ if log_t <= 3.90 => polynomial(&TORRES_MIDDLE, log_t),
        _ => polynomial(&TORRES_HOT, log_t),
    })
}

/// Effective temperature from B−V by two effective wavelengths of a blackbody, K.
///
/// T = 4600 (1/(0.92(B−V) + 1.7) + 1/(0.92(B−V) + 0.62)).
///
/// # Source
/// Ballesteros (2012), EPL 97, 34008, equation 14.
///
/// # Valid for
/// 4000 to 10 000 K (B−V from −0.06 to 1.38 in round figures); beyond it misses real stars by 0.2 mag and more.
///
/// # Errors
/// [`OutOfRange`] for a colour outside −0.06 to 1.38.
pub fn ballesteros_temperature_k(b_minus_v_mag: f64) -> Result<f64, OutOfRange> {
    let scaled = 0.92 * within("b_minus_v_mag", b_minus_v_mag, -0.06, 1.38, "-0.06 to 1.38 mag")?;
    Ok(4600.0 * (1.0 / (scaled + 1.7) + 1.0 / (scaled + 0.62)))
}

/// B−V from effective temperature, mag: the exact inverse of [`ballesteros_temperature_k`].
///
/// # Source
/// Ballesteros (2012), EPL 97, 34008, equation 14 solved for B−V.
///
/// # Errors
/// [`OutOfRange`] for a temperature outside 4000 to 10 000 K.
pub fn ballesteros_colour_mag(effective_temperature_k: f64) -> Result<f64, OutOfRange> {
    let t = within("effective_temperature_k", effective_temperature_k, 4000.0, 10_000.0, "4000 to 10 000 K")?;
    let half = 2.32 * t - 9200.0;
    let discriminant = half * half - 4.0 * t * (1.054 * t - 10_672.0);
    Ok((-half + discriminant.sqrt()) / (2.0 * t) / 0.92)
}

fn flower_range(effective_temperature_k: f64) -> Result<f64, OutOfRange> {
    within("effective_temperature_k", effective_temperature_k, 2900.0, 52_500.0, "2900 to 52 500 K")
}

fn polynomial(coefficients: &[f64], variable: f64) -> f64 {
    coefficients.iter().rev().fold(0.0, |sum, coefficient| sum * variable + coefficient)
}

#[cfg(test)]
mod tests {
    use super::*;

    #[test]
    fn the_inverse_undoes_the_relation() {
        for temperature_k in [3000.0, 3900.0, 5772.0, 9000.0, 30_000.0, 50_000.0] {
            let colour = flower_colour_mag(temperature_k).expect("in range");
            let back_k = flower_temperature_k(colour, FlowerClass::DwarfsAndGiants).expect("in range");
            assert!((back_k / temperature_k - 1.0).abs() < 1e-9, "{temperature_k}: {colour} {back_k}");
        }
        for temperature_k in [4100.0, 5772.0, 9900.0] {
            let colour = ballesteros_colour_mag(temperature_k).expect("in range");
            let back_k = ballesteros_temperature_k(colour).expect("in range");
            assert!((back_k / temperature_k - 1.0).abs() < 1e-12);
        }
    }

    #[test]
    fn the_relation_falls_steadily_over_its_range() {
        let temperatures: Vec<f64> = (0..=2150)
            .map(|step| flower_temperature_k(-0.35 + 0.001 * f64::from(step), FlowerClass::DwarfsAndGiants))
            .collect::<Result<_, _>>()
            .expect("in range");
        assert!(temperatures.windows(2).all(|pair| pair[1] < pair[0]));
    }

    #[test]
    fn nothing_is_answered_out_of_range() {
        assert!(torres_correction_mag(100_000.0).is_err());
        assert!(flower_temperature_k(2.0, FlowerClass::Supergiants).is_err());
        assert!(ballesteros_colour_mag(f64::NAN).is_err());
    }
}
