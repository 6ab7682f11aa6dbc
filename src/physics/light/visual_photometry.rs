//! The colour index and bolometric correction of a star, by the relation that suits it.

use super::caution::Caution;
use super::colour_index::{flower_colour_mag, torres_correction_mag};
use super::photometry_tables::{BLACKBODY_PHOTOMETRY, DWARF_COLOUR, DWARF_CORRECTION, in_log_temperature};
use super::range::{OutOfRange, within};

/// Surface gravity below which a star is treated as a giant, log₁₀ of cm s⁻².
pub const GIANT_BELOW_LOG_G_DEX: f64 = 3.5;
/// Surface gravity above which a star is treated as a white dwarf, log₁₀ of cm s⁻².
pub const WHITE_DWARF_ABOVE_LOG_G_DEX: f64 = 6.0;
/// Range of the dwarf table, K.
const DWARF_RANGE_K: [f64; 2] = [2500.0, 41_500.0];
/// Range of the giants' relation, K. From 3300 K down it is a stretch.
const GIANT_RANGE_K: [f64; 2] = [2900.0, 33_000.0];
const GIANT_TRUSTED_FROM_K: f64 = 3300.0;
/// Hottest row of the blackbody table, K.
const HOTTEST_BLACKBODY_K: f64 = 2e5;

/// Where a colour and a correction come from.
#[derive(Clone, Copy, Debug, PartialEq, Eq)]
pub enum PhotometricRelation {
    /// Table of dwarfs, Pecaut & Mamajek (2013) and updates.
    DwarfTable,
    /// Polynomials of Flower (1996) as corrected by Torres (2010), for giants.
    FlowerTorres,
    /// A blackbody through the passbands of Bessell (1990).
    SyntheticBlackbody,
}

impl PhotometricRelation {
    /// The published source.
    #[must_use]
    pub fn source(self) -> &'static str {
        match self {
            Self::DwarfTable => "Pecaut & Mamajek 2013, ApJS 208, 9 (B−V v2019.3.22, BC v2022.04.16)",
            Self::FlowerTorres => "Flower 1996, ApJ 469, 355; Torres 2010, AJ 140, 1158",
            Self::SyntheticBlackbody => "blackbody through B, V of Bessell 1990, PASP 102, 1181",
        }
    }
}

/// What a star's light is in the V band and between B and V.
#[derive(Clone, Debug, PartialEq)]
pub struct VisualPhotometry {
    /// Colour index B−V, mag.
    pub b_minus_v_mag: f64,
    /// Bolometric correction in V, mag: `M_V = M_bol − BC`, with 4.74 for the Sun.
    pub bolometric_correction_mag: f64,
    /// The relation used.
    pub relation: PhotometricRelation,
    /// Half-width to print beside both, mag.
    pub uncertainty_mag: f64,
    /// What to bear in mind.
    pub cautions: Vec<Caution>,
}

/// Colour index and bolometric correction of a star from its effective temperature and surface gravity.
///
/// log g below 3.5 is a giant (Flower–Torres), above 6 a white dwarf (blackbody), between them a dwarf (table).
/// Stars hotter than the table or relation are treated as blackbodies, with a caution.
///
/// # Source
/// [`PhotometricRelation::source`] names it for each answer.
///
/// # Valid for
/// Near-solar composition. Dwarfs 2500 to 41 500 K, giants 2900 to 33 000 K, white dwarfs from 2500 K. Above
/// 2·10⁵ K the correction goes on as −7.5 log₁₀ T (Rayleigh–Jeans) with a caution.
///
/// # Errors
/// [`OutOfRange`] for an effective temperature below 2500 K (giants: 2900 K), where V means little, or above
/// 10⁷ K, and for a gravity outside −5 to 15.
///
/// # Example
/// ```
/// use longember::physics::light::{absolute_bolometric_magnitude, visual_photometry};
/// let sun = visual_photometry(5772.0, 4.44)?;
/// let absolute_visual_mag = absolute_bolometric_magnitude(1.0)? - sun.bolometric_correction_mag;
/// assert!((absolute_visual_mag - 4.825).abs() < 0.01);
/// # Ok::<(), longember::physics::light::OutOfRange>(())
/// ```
pub fn visual_photometry(effective_temperature_k: f64, log_g_dex: f64) -> Result<VisualPhotometry, OutOfRange> {
    let log_g_dex = within("log_g_dex", log_g_dex, -5.0, 15.0, "-5 to 15")?;
    let temperature_k = within(
        "effective_temperature_k",
        effective_temperature_k,
        DWARF_RANGE_K[0],
        1e7,
        "2500 to 1e7 K (cooler stars have no meaningful V)",
    )?;
    if log_g_dex > WHITE_DWARF_ABOVE_LOG_G_DEX {
        return Ok(blackbody(temperature_k));
    }
    if log_g_dex < GIANT_BELOW_LOG_G_DEX {
        within("effective_temperature_k", temperature_k, GIANT_RANGE_K[0], 1e7, "2900 to 1e7 K for giants")?;
        return if temperature_k > GIANT_RANGE_K[1] { Ok(blackbody(temperature_k)) } else { giant(temperature_k) };
    }
    Ok(if temperature_k > DWARF_RANGE_K[1] { blackbody(temperature_k) } else { dwarf(temperature_k) })
}

fn dwarf(temperature_k: f64) -> VisualPhotometry {
    VisualPhotometry {
        b_minus_v_mag: in_log_temperature(&DWARF_COLOUR, 1, temperature_k),
        bolometric_correction_mag: in_log_temperature(&DWARF_CORRECTION, 1, temperature_k),
        relation: PhotometricRelation::DwarfTable,
        uncertainty_mag: match temperature_k {
            _ if temperature_k < 2810.0 => 0.5,
            _ if temperature_k < 4000.0 => 0.3,
            _ if temperature_k <= 10_000.0 => 0.05,
            _ => 0.15,
        },
        cautions: Vec::new(),
    }
}

fn giant(temperature_k: f64) -> Result<VisualPhotometry, OutOfRange> {
    let trusted = temperature_k >= GIANT_TRUSTED_FROM_K;
    Ok(VisualPhotometry {
        b_minus_v_mag: flower_colour_mag(temperature_k)?,
        bolometric_correction_mag: torres_correction_mag(temperature_k)?,
        relation: PhotometricRelation::FlowerTorres,
        uncertainty_mag: match temperature_k {
            _ if !trusted => 1.0,
            _ if (4000.0..=10_000.0).contains(&temperature_k) => 0.1,
            _ => 0.3,
        },
        cautions: if trusted { Vec::new() } else { vec![Caution::OutsideRelation] },
    })
}

fn blackbody(temperature_k: f64) -> VisualPhotometry {
    let beyond_table = (temperature_k / HOTTEST_BLACKBODY_K).max(1.0);
    let mut cautions = vec![Caution::BlackbodyStandsIn];
    if beyond_table > 1.0 {
        cautions.push(Caution::OutsideRelation);
    }
    VisualPhotometry {
        b_minus_v_mag: in_log_temperature(&BLACKBODY_PHOTOMETRY, 1, temperature_k),
        bolometric_correction_mag: in_log_temperature(&BLACKBODY_PHOTOMETRY, 2, temperature_k)
            - 7.5 * beyond_table.log10(),
        relation: PhotometricRelation::SyntheticBlackbody,
        uncertainty_mag: if temperature_k < 5000.0 { 0.5 } else { 0.2 },
        cautions,
    }
}

#[cfg(test)]
mod tests {
    use super::*;

    #[test]
    fn gravity_chooses_the_relation() {
        let relation = |temperature_k, log_g| visual_photometry(temperature_k, log_g).expect("in range").relation;
        assert_eq!(relation(5772.0, 4.4), PhotometricRelation::DwarfTable);
        assert_eq!(relation(4500.0, 2.0), PhotometricRelation::FlowerTorres);
        assert_eq!(relation(10_000.0, 8.0), PhotometricRelation::SyntheticBlackbody);
        assert_eq!(relation(60_000.0, 5.0), PhotometricRelation::SyntheticBlackbody);
    }

    #[test]
    fn cool_objects_have_no_visual_magnitude() {
        assert!(visual_photometry(2400.0, 5.3).is_err());
        assert!(visual_photometry(2800.0, 0.0).is_err());
        assert!(visual_photometry(f64::NAN, 4.0).is_err());
        assert!(visual_photometry(5000.0, f64::NAN).is_err());
    }

    #[test]
    fn doubt_is_said_where_the_relation_is_stretched() {
        let giant = visual_photometry(3000.0, 0.5).expect("in range");
        assert!(giant.cautions.contains(&Caution::OutsideRelation) && giant.uncertainty_mag >= 1.0);
        let remnant = visual_photometry(4e5, 7.5).expect("in range");
        assert!((remnant.bolometric_correction_mag - (-8.47 - 2.257_7)).abs() < 1e-3);
    }
}
