//! Correlated colour temperature and the distance from the Planckian locus.

use super::caution::Caution;
use super::chromaticity::{Chromaticity, Tristimulus};
use super::observer::blackbody_with_slope;
use std::sync::LazyLock;
use thiserror::Error;

/// Distance from the locus in CIE 1960 (u, v) beyond which no correlated temperature is quoted. CIE 15:2018.
pub const LARGEST_DUV: f64 = 0.05;
/// Coolest temperature that is searched, K.
pub const COOLEST_CORRELATED_K: f64 = 500.0;
/// Hottest temperature that is searched, K.
pub const HOTTEST_CORRELATED_K: f64 = 1e6;
/// Above this the answer is ill-conditioned, K: 0.0001 in (u, v) is worth several per cent.
const ILL_CONDITIONED_K: f64 = 50_000.0;
/// Points of the locus that bracket the answer, even in 1/T.
const NODES: u32 = 257;
/// Most steps of the search; it takes about eight.
const STEPS: u32 = 60;

/// The temperature of the blackbody whose colour is nearest.
#[derive(Clone, Copy, Debug, PartialEq)]
pub struct CorrelatedTemperature {
    /// Correlated colour temperature, K.
    pub temperature_k: f64,
    /// Distance from the locus in CIE 1960 (u, v): positive above it (greenish), negative below (pinkish).
    pub duv: f64,
    /// Set above 50 000 K, where the locus bunches up.
    pub caution: Option<Caution>,
}

/// Why a colour has no correlated temperature.
#[derive(Clone, Copy, Debug, Error, PartialEq)]
pub enum NoCorrelatedTemperature {
    /// Too far from the locus to be likened to a blackbody.
    #[error("duv is {duv:.4}, allowed -0.05 to 0.05")]
    TooFarFromLocus {
        /// Distance from the locus, signed as in [`CorrelatedTemperature::duv`].
        duv: f64,
    },
    /// Bluer than the hot end of the locus.
    #[error("the colour is bluer than any blackbody up to 1e6 K")]
    BeyondHotEnd,
    /// Redder than the cool end that is searched.
    #[error("the colour is redder than a blackbody of 500 K")]
    BeyondCoolEnd,
    /// The point lies outside the chromaticity diagram or is no number.
    #[error("x, y is no point of the chromaticity diagram (allowed 0 to 1 each, y above 0)")]
    NoColour,
}

/// A point of the locus: 1/T in 1/K, (u, v) and its derivative by 1/T.
#[derive(Clone, Copy)]
struct LocusPoint {
    inverse_per_k: f64,
    uv: [f64; 2],
    tangent: [f64; 2],
}

static LOCUS: LazyLock<Vec<LocusPoint>> = LazyLock::new(|| {
    let (hot, cool) = (1.0 / HOTTEST_CORRELATED_K, 1.0 / COOLEST_CORRELATED_K);
    (0..NODES).map(|node| locus_point(hot + (cool - hot) * f64::from(node) / f64::from(NODES - 1))).collect()
});

/// The correlated colour temperature of a chromaticity and its distance from the Planckian locus.
///
/// The nearest point of the locus in CIE 1960 (u, v), found where the connecting line stands upright on it.
///
/// # Source
/// Definition: CIE 15:2018, section 9.5. The locus is computed here from Planck's law, not read off a table.
///
/// # Valid for
/// 500 to 10⁶ K and |Duv| ≤ 0.05; above 50 000 K with a caution.
///
/// # Errors
/// [`NoCorrelatedTemperature`] says why there is none.
///
/// # Example
/// ```
/// use longember::physics::light::{WHITE_D65, correlated_temperature};
/// let white = correlated_temperature(WHITE_D65).expect("near the locus");
/// assert!((white.temperature_k - 6504.0).abs() < 5.0 && (white.duv - 0.0032).abs() < 1e-4);
/// ```
pub fn correlated_temperature(colour: Chromaticity) -> Result<CorrelatedTemperature, NoCorrelatedTemperature> {
    let in_diagram = (0.0..=1.0).contains(&colour.x) && colour.y > 0.0 && colour.x + colour.y <= 1.0;
    if !in_diagram {
        return Err(NoCorrelatedTemperature::NoColour);
    }
    let uv = colour.u_v_1960();
    let nearest = LOCUS
        .iter()
        .enumerate()
        .min_by(|(_, one), (_, other)| distance(uv, one.uv).total_cmp(&distance(uv, other.uv)))
        .map_or(0, |(index, _)| index);
    let last = LOCUS.len() - 1;
    // Going to cooler temperatures, the projection on the tangent falls through zero at the nearest point.
    let (hot, cool) = if ahead(uv, &LOCUS[nearest]) > 0.0 {
        if nearest == last {
            return Err(NoCorrelatedTemperature::BeyondCoolEnd);
        }
        (nearest, nearest + 1)
    } else {
        if nearest == 0 {
            return Err(NoCorrelatedTemperature::BeyondHotEnd);
        }
        (nearest - 1, nearest)
    };
    let foot = foot_between(uv, LOCUS[hot], LOCUS[cool]);
    // A blackbody's own colour lies on the locus; what is left there is rounding.
    let apart = distance(uv, foot.uv);
    let duv = if apart > 1e-12 { apart.copysign(uv[1] - foot.uv[1]) } else { 0.0 };
    if duv.abs() > LARGEST_DUV {
        return Err(NoCorrelatedTemperature::TooFarFromLocus { duv });
    }
    let temperature_k = 1.0 / foot.inverse_per_k;
    let caution = (temperature_k > ILL_CONDITIONED_K).then_some(Caution::IllConditioned);
    Ok(CorrelatedTemperature { temperature_k, duv, caution })
}

/// The point of the locus between two that bracket it where the line to `uv` stands upright on the tangent.
fn foot_between(uv: [f64; 2], hot: LocusPoint, cool: LocusPoint) -> LocusPoint {
    let (mut low, mut high) = (hot.inverse_per_k, cool.inverse_per_k);
    let (mut at_low, mut at_high) = (ahead(uv, &hot), ahead(uv, &cool));
    let mut foot = hot;
    // Regula falsi with the halving of a stale end (Illinois); it ends long before the last step.
    let mut last_side = 0;
    for _ in 0..STEPS {
        let gap = at_low - at_high;
        let share = if gap > 0.0 { at_low / gap } else { 0.5 };
        foot = locus_point(low + share.clamp(0.0, 1.0) * (high - low));
        let here = ahead(uv, &foot);
        if here == 0.0 || high - low < 1e-14 * high {
            break;
        }
        let moved = if here > 0.0 { foot.inverse_per_k - low } else { high - foot.inverse_per_k };
        if here > 0.0 {
            (low, at_low) = (foot.inverse_per_k, here);
            at_high *= if last_side == 1 { 0.5 } else { 1.0 };
            last_side = 1;
        } else {
            (high, at_high) = (foot.inverse_per_k, here);
            at_low *= if last_side == -1 { 0.5 } else { 1.0 };
            last_side = -1;
        }
        if moved < 1e-14 * high {
            break;
        }
    }
    foot
}

fn distance(one: [f64; 2], other: [f64; 2]) -> f64 {
    (one[0] - other[0]).hypot(one[1] - other[1])
}

/// How far the point lies ahead (towards cooler temperatures) along the tangent.
fn ahead(uv: [f64; 2], point: &LocusPoint) -> f64 {
    (uv[0] - point.uv[0]) * point.tangent[0] + (uv[1] - point.uv[1]) * point.tangent[1]
}

fn locus_point(inverse_per_k: f64) -> LocusPoint {
    let temperature_k = 1.0 / inverse_per_k;
    let (light, by_kelvin) = blackbody_with_slope(temperature_k);
    // u = 4X/(X+15Y+3Z), v = 6Y/(X+15Y+3Z).
    let weighted = |value: Tristimulus| value.x + 15.0 * value.y + 3.0 * value.z;
    let (denominator, denominator_slope) = (weighted(light), weighted(by_kelvin));
    let uv = [4.0 * light.x / denominator, 6.0 * light.y / denominator];
    let slope_of = |numerator_slope: f64, ratio: f64| (numerator_slope - ratio * denominator_slope) / denominator;
    let per_inverse = -temperature_k * temperature_k;
    let tangent = [slope_of(4.0 * by_kelvin.x, uv[0]) * per_inverse, slope_of(6.0 * by_kelvin.y, uv[1]) * per_inverse];
    LocusPoint { inverse_per_k, uv, tangent }
}

#[cfg(test)]
mod tests {
    use super::super::observer::blackbody_unchecked;
    use super::*;

    #[test]
    fn a_blackbody_has_its_own_temperature() {
        for temperature_k in [520.0, 1000.0, 2856.0, 5772.0, 20_000.0, 200_000.0] {
            let colour = blackbody_unchecked(temperature_k).chromaticity().expect("light");
            let found = correlated_temperature(colour).expect("on the locus");
            assert!((found.temperature_k / temperature_k - 1.0).abs() < 1e-8, "{found:?}");
            assert!(found.duv.abs() < 1e-10);
            assert_eq!(found.caution.is_some(), temperature_k > 50_000.0);
        }
    }

    #[test]
    fn every_refusal_says_why() {
        let ask = |x, y| correlated_temperature(Chromaticity { x, y });
        assert!(matches!(ask(0.30, 0.60), Err(NoCorrelatedTemperature::TooFarFromLocus { duv }) if duv > 0.05));
        assert_eq!(ask(0.2, 0.17), Err(NoCorrelatedTemperature::BeyondHotEnd));
        assert_eq!(ask(0.734, 0.2655), Err(NoCorrelatedTemperature::BeyondCoolEnd));
        assert_eq!(ask(f64::NAN, 0.3), Err(NoCorrelatedTemperature::NoColour));
        assert_eq!(ask(0.3, 0.0), Err(NoCorrelatedTemperature::NoColour));
    }
}
