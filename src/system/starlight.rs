//! The star's light at one moment as numbers: shares, brightness to the eye, colour for screens, magnitudes.

use super::moment::StarMoment;
use crate::physics::light::{
    BandShares, Chromaticity, CorrelatedTemperature, DRAPER_POINT_K, DwarfColour, RgbSpace, ScreenColour, Tristimulus,
    VisualPhotometry, WideColour, absolute_bolometric_magnitude, absolute_visual_magnitude, apparent_magnitude,
    band_shares, blackbody_tristimulus, correlated_temperature, largest_channel_one, luminance_cd_m2,
    luminous_efficacy_lm_w, luminous_flux_lm, measured_dwarf_colour, screen_colour, total_exitance_w_m2,
    visual_photometry, wide_colour, wien_peak_thz,
};
use crate::physics::star::Phase;
use crate::units::constants::{SOLAR_GM_M3_S2, SOLAR_RADIUS_M, SOLAR_TEMPERATURE_K};

/// A star's light, as that of a blackbody unless it says otherwise.
#[derive(Clone, Debug, PartialEq)]
pub struct Starlight {
    /// Effective temperature, K.
    pub temperature_k: f64,
    /// Shares of ultraviolet, visible and infrared in the energy.
    pub shares: BandShares,
    /// Peak of the spectrum per unit frequency, THz.
    pub peak_frequency_thz: f64,
    /// Power radiated by each square metre, W m⁻².
    pub exitance_w_m2: f64,
    /// Lumens in each watt of all radiation, lm W⁻¹.
    pub luminous_efficacy_lm_w: f64,
    /// Luminance of the surface, cd m⁻².
    pub luminance_cd_m2: f64,
    /// That luminance over a 5772 K blackbody's.
    pub luminance_over_sun: f64,
    /// Light of the whole star, lm.
    pub luminous_flux_lm: Option<f64>,
    /// Colour of the blackbody, where it glows.
    pub colour: Option<StarColour>,
    /// Colour of measured main-sequence dwarfs of this temperature, where there are any.
    pub dwarf: Option<DwarfColour>,
    /// Magnitudes in V and B − V, where they mean something.
    pub magnitudes: Option<StarMagnitudes>,
}

/// A colour as screens and projectors need it, not adapted: the light as it is emitted.
#[derive(Clone, Debug, PartialEq)]
pub struct StarColour {
    /// Tristimulus values; Y is the luminous exitance, lm m⁻².
    pub light: Tristimulus,
    /// CIE 1931 x, y.
    pub chromaticity: Chromaticity,
    /// CIE 1976 u′, v′.
    pub u_v_prime: [f64; 2],
    /// Correlated colour temperature and distance from the locus, where the locus reaches.
    pub correlated: Option<CorrelatedTemperature>,
    /// Linear RGB in the order of [`RgbSpace::ALL`], largest channel 1, negative where the space lacks the colour.
    pub linear_rgb: [[f64; 3]; 3],
    /// Encoded for an sRGB screen.
    pub screen: ScreenColour,
    /// Encoded for a Display P3 screen.
    pub wide: WideColour,
}

/// Broadband estimates of the star's light.
#[derive(Clone, Debug, PartialEq)]
pub struct StarMagnitudes {
    /// Colour index, bolometric correction, relation, half-width, cautions.
    pub photometry: VisualPhotometry,
    /// Absolute bolometric magnitude, mag.
    pub absolute_bolometric_mag: f64,
    /// Absolute V magnitude, mag.
    pub absolute_visual_mag: f64,
}

impl Starlight {
    /// The light of a star at a moment; `None` where no light is modelled.
    #[must_use]
    pub fn of(star: &StarMoment) -> Option<Self> {
        let temperature_k = star.effective_temperature_k?;
        let luminance = luminance_cd_m2(temperature_k).ok()?;
        Some(Self {
            temperature_k,
            shares: band_shares(temperature_k).ok()?,
            peak_frequency_thz: wien_peak_thz(temperature_k).ok()?,
            exitance_w_m2: total_exitance_w_m2(temperature_k).ok()?,
            luminous_efficacy_lm_w: luminous_efficacy_lm_w(temperature_k).ok()?,
            luminance_cd_m2: luminance,
            luminance_over_sun: luminance / luminance_cd_m2(SOLAR_TEMPERATURE_K).ok()?,
            luminous_flux_lm: star
                .luminosity_lsun
                .and_then(|luminosity_lsun| luminous_flux_lm(luminosity_lsun, temperature_k).ok()),
            colour: StarColour::of_blackbody(temperature_k),
            dwarf: is_dwarf(star.phase).then(|| measured_dwarf_colour(temperature_k).ok()).flatten(),
            magnitudes: StarMagnitudes::of(star),
        })
    }

    /// The V magnitude from a distance in parsecs, mag, without dust on the way.
    #[must_use]
    pub fn visual_mag_at(&self, distance_pc: f64) -> Option<f64> {
        apparent_magnitude(self.magnitudes.as_ref()?.absolute_visual_mag, distance_pc).ok()
    }
}

impl StarColour {
    /// The colour of a blackbody; `None` where nothing glows.
    #[must_use]
    pub fn of_blackbody(temperature_k: f64) -> Option<Self> {
        if temperature_k < DRAPER_POINT_K {
            return None;
        }
        Self::of(blackbody_tristimulus(temperature_k).ok()?)
    }

    /// The colour of any light; `None` where there is none.
    #[must_use]
    pub fn of(light: Tristimulus) -> Option<Self> {
        let chromaticity = light.chromaticity()?;
        let [rec709, p3, rec2020] = RgbSpace::ALL.map(|space| largest_channel_one(space.linear(light)));
        Some(Self {
            light,
            chromaticity,
            u_v_prime: chromaticity.u_v_prime(),
            correlated: correlated_temperature(chromaticity).ok(),
            linear_rgb: [rec709?, p3?, rec2020?],
            screen: screen_colour(light)?,
            wide: wide_colour(light)?,
        })
    }
}

impl StarMagnitudes {
    fn of(star: &StarMoment) -> Option<Self> {
        let photometry = visual_photometry(star.effective_temperature_k?, log_g_dex(star)?).ok()?;
        let absolute_bolometric_mag = absolute_bolometric_magnitude(star.luminosity_lsun?).ok()?;
        let absolute_visual_mag =
            absolute_visual_magnitude(absolute_bolometric_mag, photometry.bolometric_correction_mag).ok()?;
        Some(Self { photometry, absolute_bolometric_mag, absolute_visual_mag })
    }
}

/// Whether measured dwarfs are its likes: it burns hydrogen in its core.
#[must_use]
pub fn is_dwarf(phase: Phase) -> bool {
    matches!(phase, Phase::FullyMixedMainSequence | Phase::MainSequence | Phase::RadiativeCore)
}

/// Surface gravity, log₁₀ of cm s⁻²: `G M/R²`.
fn log_g_dex(star: &StarMoment) -> Option<f64> {
    let radius_m = star.radius_rsun? * SOLAR_RADIUS_M;
    let gravity_cm_s2 = star.mass_msun * SOLAR_GM_M3_S2 / (radius_m * radius_m) * 100.0;
    (gravity_cm_s2 > 0.0 && gravity_cm_s2.is_finite()).then(|| gravity_cm_s2.log10())
}

#[cfg(test)]
mod tests {
    use super::*;
    use crate::physics::light::{blackbody_swatch, colour_words};

    pub(crate) fn star(phase: Phase, temperature_k: f64, luminosity_lsun: f64, radius_rsun: f64) -> StarMoment {
        StarMoment {
            phase,
            mass_msun: 1.0,
            luminosity_lsun: Some(luminosity_lsun),
            radius_rsun: Some(radius_rsun),
            effective_temperature_k: Some(temperature_k),
            core_mass_msun: None,
            mass_loss_msun_yr: 0.0,
            core_hydrogen_fraction: None,
            interior: None,
            contraction_yr: None,
            has_old_surface: false,
            peak_wavelength_nm: None,
            swatch: Some(blackbody_swatch(temperature_k)),
            colour: colour_words(temperature_k),
            habitable_zone_au: None,
        }
    }

    #[test]
    fn the_sun_has_the_sun_s_numbers() {
        let light = Starlight::of(&star(Phase::MainSequence, 5772.0, 1.0, 1.0)).expect("light");
        assert!((light.luminous_efficacy_lm_w - 92.03).abs() < 0.01);
        assert!((light.luminance_over_sun - 1.0).abs() < 1e-12);
        let magnitudes = light.magnitudes.clone().expect("magnitudes");
        // Torres 2010, AJ 140, 1158: V = −26.76 ± 0.03 from 1 au, B − V = 0.65.
        assert!((magnitudes.absolute_visual_mag - 4.82).abs() < 0.03, "{magnitudes:?}");
        assert!((magnitudes.photometry.b_minus_v_mag - 0.65).abs() < 0.03, "{magnitudes:?}");
        let from_one_au = light.visual_mag_at(1.0 / 206_264.806).expect("in range");
        assert!((from_one_au + 26.75).abs() < 0.03, "{from_one_au}");
        let colour = light.colour.expect("glows");
        assert!((colour.correlated.expect("on the locus").temperature_k - 5772.0).abs() < 0.1);
        assert!(light.dwarf.expect("a dwarf").difference_de00 > 0.5);
    }

    #[test]
    fn measured_dwarfs_stand_beside_dwarfs_only() {
        let light = |phase, radius_rsun| Starlight::of(&star(phase, 4500.0, 50.0, radius_rsun)).expect("light");
        assert!(light(Phase::MainSequence, 0.7).dwarf.is_some());
        assert!(light(Phase::FirstGiantBranch, 12.0).dwarf.is_none());
        let hot = Starlight::of(&star(Phase::MainSequence, 60_000.0, 1e6, 10.0)).expect("light");
        assert!(hot.dwarf.is_none() && hot.magnitudes.is_some());
    }

    #[test]
    fn a_cold_ember_has_shares_but_no_colour_and_no_magnitude() {
        let light = Starlight::of(&star(Phase::CarbonOxygenWhiteDwarf, 600.0, 1e-9, 0.01)).expect("light");
        assert!(light.colour.is_none() && light.magnitudes.is_none());
        assert!(light.shares.infrared > 0.999);
        let none = StarMoment { effective_temperature_k: None, ..star(Phase::BlackHole, 1.0, 1.0, 1.0) };
        assert_eq!(Starlight::of(&none), None);
    }
}
