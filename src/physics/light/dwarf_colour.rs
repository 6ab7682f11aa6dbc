//! Measured colours of real dwarf stars beside those of blackbodies of the same temperature.

use super::chromaticity::{Chromaticity, Tristimulus};
use super::colour_difference::ciede2000;
use super::observer::blackbody_unchecked;
use super::range::{OutOfRange, within};
use super::screen::{ScreenColour, screen_colour};

/// One measured spectrum.
#[derive(Clone, Copy, Debug, PartialEq)]
pub struct DwarfRow {
    /// Spectral type and luminosity class.
    pub spectral_type: &'static str,
    /// Effective temperature of the type, K.
    pub temperature_k: f64,
    /// CIE 1931 x of the spectrum.
    pub x: f64,
    /// CIE 1931 y of the spectrum.
    pub y: f64,
}

/// Measured dwarfs from cool to hot.
///
/// # Source
/// Spectra: Pickles (1998), PASP 110, 863, weighted with the CIE 1931 2° observer. Temperatures of the types:
/// Pecaut & Mamajek (2013), Astrophysical Journal Supplement 208, 9, in the table version 2019.3.22.
pub const MEASURED_DWARFS: [DwarfRow; 20] = [
    DwarfRow { spectral_type: "M6V", temperature_k: 2850.0, x: 0.4243, y: 0.4193 },
    DwarfRow { spectral_type: "M5V", temperature_k: 3030.0, x: 0.4143, y: 0.4087 },
    DwarfRow { spectral_type: "M4V", temperature_k: 3200.0, x: 0.4033, y: 0.4072 },
    DwarfRow { spectral_type: "M3V", temperature_k: 3410.0, x: 0.4053, y: 0.3996 },
    DwarfRow { spectral_type: "M2V", temperature_k: 3550.0, x: 0.4060, y: 0.3891 },
    DwarfRow { spectral_type: "M0V", temperature_k: 3870.0, x: 0.3959, y: 0.3778 },
    DwarfRow { spectral_type: "K7V", temperature_k: 4070.0, x: 0.4000, y: 0.3822 },
    DwarfRow { spectral_type: "K5V", temperature_k: 4410.0, x: 0.3865, y: 0.3686 },
    DwarfRow { spectral_type: "K2V", temperature_k: 5040.0, x: 0.3496, y: 0.3521 },
    DwarfRow { spectral_type: "K0V", temperature_k: 5280.0, x: 0.3357, y: 0.3418 },
    DwarfRow { spectral_type: "G5V", temperature_k: 5660.0, x: 0.3243, y: 0.3356 },
    DwarfRow { spectral_type: "G2V", temperature_k: 5770.0, x: 0.3212, y: 0.3311 },
    DwarfRow { spectral_type: "G0V", temperature_k: 5920.0, x: 0.3146, y: 0.3249 },
    DwarfRow { spectral_type: "F5V", temperature_k: 6510.0, x: 0.3046, y: 0.3157 },
    DwarfRow { spectral_type: "F0V", temperature_k: 7220.0, x: 0.2912, y: 0.2996 },
    DwarfRow { spectral_type: "A5V", temperature_k: 8080.0, x: 0.2761, y: 0.2856 },
    DwarfRow { spectral_type: "A0V", temperature_k: 9700.0, x: 0.2644, y: 0.2689 },
    DwarfRow { spectral_type: "B8V", temperature_k: 12500.0, x: 0.2596, y: 0.2607 },
    DwarfRow { spectral_type: "B0V", temperature_k: 31500.0, x: 0.2429, y: 0.2387 },
    DwarfRow { spectral_type: "O5V", temperature_k: 41500.0, x: 0.2407, y: 0.2347 },
];

/// How far single measured spectra of one type scatter, in x.
pub const DWARF_SCATTER_X: f64 = 0.01;

/// A real dwarf's colour beside its blackbody's.
#[derive(Clone, Copy, Debug, PartialEq)]
pub struct DwarfColour {
    /// Nearest measured spectral type.
    pub nearest_type: &'static str,
    /// CIE 1931 chromaticity of the dwarf.
    pub chromaticity: Chromaticity,
    /// The dwarf's colour on a screen with D65 white.
    pub screen: ScreenColour,
    /// CIE 1931 chromaticity of the blackbody.
    pub blackbody_chromaticity: Chromaticity,
    /// Colour difference CIEDE2000 at equal luminance; about 1 is just noticeable.
    pub difference_de00: f64,
}

/// The measured colour of a main-sequence dwarf of this effective temperature.
///
/// Chromaticity is interpolated linearly in log T between measured types. A and F dwarfs are bluer than
/// blackbodies, late K dwarfs a little redder, middle and late M dwarfs yellower, since titanium and
/// vanadium oxide take out red.
///
/// # Source
/// [`MEASURED_DWARFS`]; difference by CIEDE2000 (CIE 142-2001).
///
/// # Valid for
/// Dwarfs of solar composition from 2850 to 41 500 K; single spectra scatter by about 0.01 in x. Giants, white
/// dwarfs and brown dwarfs look different.
///
/// # Errors
/// [`OutOfRange`] outside 2850 to 41 500 K: nothing is extrapolated.
///
/// # Example
/// ```
/// use longember::physics::light::measured_dwarf_colour;
/// let red_dwarf = measured_dwarf_colour(2850.0)?;
/// assert!(red_dwarf.difference_de00 > 5.0, "a red dwarf is visibly yellower than its blackbody");
/// # Ok::<(), longember::physics::light::OutOfRange>(())
/// ```
pub fn measured_dwarf_colour(effective_temperature_k: f64) -> Result<DwarfColour, OutOfRange> {
    const ALLOWED: &str = "2850 to 41 500 K, measured dwarfs";
    let temperature_k = within("effective_temperature_k", effective_temperature_k, 2850.0, 41_500.0, ALLOWED)?;
    let refused = OutOfRange { what: "effective_temperature_k", value: temperature_k, allowed: ALLOWED };
    let upper =
        MEASURED_DWARFS.partition_point(|row| row.temperature_k < temperature_k).clamp(1, MEASURED_DWARFS.len() - 1);
    let (cool, hot) = (MEASURED_DWARFS[upper - 1], MEASURED_DWARFS[upper]);
    let share = (temperature_k / cool.temperature_k).ln() / (hot.temperature_k / cool.temperature_k).ln();
    let chromaticity = Chromaticity { x: cool.x + share * (hot.x - cool.x), y: cool.y + share * (hot.y - cool.y) };
    let light = chromaticity.tristimulus().ok_or(refused)?;
    let blackbody_chromaticity = blackbody_unchecked(temperature_k).chromaticity().ok_or(refused)?;
    let blackbody: Tristimulus = blackbody_chromaticity.tristimulus().ok_or(refused)?;
    Ok(DwarfColour {
        nearest_type: if share < 0.5 { cool.spectral_type } else { hot.spectral_type },
        chromaticity,
        screen: screen_colour(light).ok_or(refused)?,
        blackbody_chromaticity,
        difference_de00: ciede2000(light, blackbody),
    })
}

#[cfg(test)]
mod tests {
    use super::*;

    #[test]
    fn the_rows_go_from_cool_to_hot() {
        assert!(MEASURED_DWARFS.is_sorted_by(|cool, hot| cool.temperature_k < hot.temperature_k));
    }

    #[test]
    fn a_row_is_met_exactly_and_nothing_is_extrapolated() {
        for row in MEASURED_DWARFS {
            let found = measured_dwarf_colour(row.temperature_k).expect("in range");
            assert!((found.chromaticity.x - row.x).abs() < 1e-12 && (found.chromaticity.y - row.y).abs() < 1e-12);
            assert_eq!(found.nearest_type, row.spectral_type);
        }
        for outside_k in [2849.0, 41_501.0, f64::NAN] {
            assert!(measured_dwarf_colour(outside_k).is_err());
        }
    }
}
