//! Every figure of light as one row, beside those of [`super::quantities`].
//!
//! They take longer to work out than the others, so that they are read from [`super::MomentLight`] and not in bulk.

use super::planet_light::PlanetLight;
use super::starlight::Starlight;

/// One figure of light.
#[derive(Debug)]
pub struct LightQuantity<T: 'static> {
    /// Key with unit suffix, for files.
    pub key: &'static str,
    /// Name for people.
    pub name: &'static str,
    /// Unit symbol; empty when dimensionless.
    pub symbol: &'static str,
    /// Significant digits for people.
    pub digits: usize,
    /// Key of the method in [`super::provenance::METHODS`].
    pub method: &'static str,
    /// Reads the value.
    pub value: fn(&T) -> Option<f64>,
}

const fn star(
    key: &'static str,
    name: &'static str,
    symbol: &'static str,
    digits: usize,
    method: &'static str,
    value: fn(&Starlight) -> Option<f64>,
) -> LightQuantity<Starlight> {
    LightQuantity { key, name, symbol, digits, method, value }
}

const fn planet(
    key: &'static str,
    name: &'static str,
    symbol: &'static str,
    digits: usize,
    method: &'static str,
    value: fn(&PlanetLight) -> Option<f64>,
) -> LightQuantity<PlanetLight> {
    LightQuantity { key, name, symbol, digits, method, value }
}

/// The star's figures of light, in reading order.
pub const STAR_LIGHT: &[LightQuantity<Starlight>] = &[
    star("peak_frequency_thz", "Peak by frequency", "THz", 3, "spectrum", |star| Some(star.peak_frequency_thz)),
    star("ultraviolet_fraction", "Ultraviolet share", "", 3, "spectrum", |star| Some(star.shares.ultraviolet)),
    star("visible_fraction", "Visible share", "", 3, "spectrum", |star| Some(star.shares.visible)),
    star("infrared_fraction", "Infrared share", "", 3, "spectrum", |star| Some(star.shares.infrared)),
    star("exitance_w_m2", "Exitance", "W/m²", 4, "spectrum", |star| Some(star.exitance_w_m2)),
    star("luminous_efficacy_lm_w", "Efficacy", "lm/W", 4, "photometry", |star| Some(star.luminous_efficacy_lm_w)),
    star("luminance_cd_m2", "Luminance", "cd/m²", 4, "photometry", |star| Some(star.luminance_cd_m2)),
    star("luminous_flux_lm", "Luminous flux", "lm", 4, "photometry", |star| star.luminous_flux_lm),
    star("colour_u_prime", "u' (CIE 1976)", "", 4, "colour_numbers", |star| Some(star.colour.as_ref()?.u_v_prime[0])),
    star("colour_v_prime", "v' (CIE 1976)", "", 4, "colour_numbers", |star| Some(star.colour.as_ref()?.u_v_prime[1])),
    star("correlated_temperature_k", "Correlated temp.", "K", 4, "colour_numbers", |star| {
        Some(star.colour.as_ref()?.correlated?.temperature_k)
    }),
    star("colour_duv", "Duv", "", 2, "colour_numbers", |star| Some(star.colour.as_ref()?.correlated?.duv)),
    star("linear_rec709_red", "Rec. 709 red", "", 4, "colour_numbers", |star| linear(star, 0, 0)),
    star("linear_rec709_green", "Rec. 709 green", "", 4, "colour_numbers", |star| linear(star, 0, 1)),
    star("linear_rec709_blue", "Rec. 709 blue", "", 4, "colour_numbers", |star| linear(star, 0, 2)),
    star("linear_p3_red", "P3-D65 red", "", 4, "colour_numbers", |star| linear(star, 1, 0)),
    star("linear_p3_green", "P3-D65 green", "", 4, "colour_numbers", |star| linear(star, 1, 1)),
    star("linear_p3_blue", "P3-D65 blue", "", 4, "colour_numbers", |star| linear(star, 1, 2)),
    star("linear_rec2020_red", "Rec. 2020 red", "", 4, "colour_numbers", |star| linear(star, 2, 0)),
    star("linear_rec2020_green", "Rec. 2020 green", "", 4, "colour_numbers", |star| linear(star, 2, 1)),
    star("linear_rec2020_blue", "Rec. 2020 blue", "", 4, "colour_numbers", |star| linear(star, 2, 2)),
    star("dwarf_x", "Dwarf x", "", 4, "measured_dwarfs", |star| Some(star.dwarf?.chromaticity.x)),
    star("dwarf_y", "Dwarf y", "", 4, "measured_dwarfs", |star| Some(star.dwarf?.chromaticity.y)),
    star("dwarf_difference_de00", "Dwarf difference", "", 2, "measured_dwarfs", |star| {
        Some(star.dwarf?.difference_de00)
    }),
    star("b_minus_v_mag", "B − V", "mag", 3, "magnitudes", |star| {
        Some(star.magnitudes.as_ref()?.photometry.b_minus_v_mag)
    }),
    star("bolometric_correction_mag", "Correction BC", "mag", 3, "magnitudes", |star| {
        Some(star.magnitudes.as_ref()?.photometry.bolometric_correction_mag)
    }),
    star("absolute_visual_mag", "V from 10 pc", "mag", 4, "magnitudes", |star| {
        Some(star.magnitudes.as_ref()?.absolute_visual_mag)
    }),
    star("magnitude_uncertainty_mag", "± of B − V and BC", "mag", 2, "magnitudes", |star| {
        Some(star.magnitudes.as_ref()?.photometry.uncertainty_mag)
    }),
];

/// A planet's figures of light, in reading order. Figures of the sky hold for the star at the altitude of the reader.
pub const PLANET_LIGHT: &[LightQuantity<PlanetLight>] = &[
    planet("illuminance_lx", "Above its air", "lx", 4, "photometry", |planet| Some(planet.illuminance_lx)),
    planet("star_visual_mag", "V of its star", "mag", 4, "magnitudes", |planet| planet.star_visual_mag),
    planet("star_over_half_degree", "Star/half degree", "", 3, "angular_diameter", PlanetLight::star_over_half_degree),
    planet("par_photon_flux_umol_m2_s", "Plant photons", "µmol/m²/s", 3, "photons", |planet| {
        Some(planet.photosynthetic.photon_flux_umol_m2_s)
    }),
    planet("ultraviolet_a_w_m2", "Ultraviolet A", "W/m²", 3, "photons", |planet| Some(planet.ultraviolet.uva_w_m2)),
    planet("ultraviolet_b_w_m2", "Ultraviolet B", "W/m²", 3, "photons", |planet| Some(planet.ultraviolet.uvb_w_m2)),
    planet("ultraviolet_c_w_m2", "Ultraviolet C", "W/m²", 3, "photons", |planet| Some(planet.ultraviolet.uvc_w_m2)),
    planet("ground_illuminance_lx", "Ground, star at 30°", "lx", 3, "clear_sky", |planet| {
        planet.sky.as_ref().map(crate::physics::light::Sky::total_lx)
    }),
    planet("sky_illuminance_lx", "Sky, star at 30°", "lx", 3, "clear_sky", |planet| {
        planet.sky.as_ref().map(crate::physics::light::Sky::diffuse_lx)
    }),
    planet("sky_luminance_cd_m2", "Sky, star at 30°", "cd/m²", 3, "clear_sky", |planet| {
        planet.sky.as_ref().map(crate::physics::light::Sky::dome_luminance_cd_m2)
    }),
    planet("sky_x", "Sky x, star at 30°", "", 4, "clear_sky", |planet| {
        Some(planet.sky.as_ref()?.dome.chromaticity()?.x)
    }),
    planet("sky_y", "Sky y, star at 30°", "", 4, "clear_sky", |planet| {
        Some(planet.sky.as_ref()?.dome.chromaticity()?.y)
    }),
    planet("disc_x", "Disc x, star at 30°", "", 4, "clear_sky", |planet| {
        Some(planet.sky.as_ref()?.disc.chromaticity()?.x)
    }),
    planet("disc_y", "Disc y, star at 30°", "", 4, "clear_sky", |planet| {
        Some(planet.sky.as_ref()?.disc.chromaticity()?.y)
    }),
];

fn linear(star: &Starlight, space: usize, channel: usize) -> Option<f64> {
    star.colour.as_ref().map(|colour| colour.linear_rgb[space][channel])
}

#[cfg(test)]
mod tests {
    use super::*;
    use crate::system::provenance::method;
    use crate::system::quantities::{PLANET, STAR};
    use std::collections::HashSet;

    #[test]
    fn every_figure_of_light_has_a_method_and_a_key_of_its_own() {
        for key in STAR_LIGHT.iter().map(|row| row.method).chain(PLANET_LIGHT.iter().map(|row| row.method)) {
            assert!(method(key).is_some_and(|method| !method.source.is_empty()), "{key}");
        }
        let star: Vec<_> = STAR.iter().map(|row| row.key).chain(STAR_LIGHT.iter().map(|row| row.key)).collect();
        let planet: Vec<_> = PLANET.iter().map(|row| row.key).chain(PLANET_LIGHT.iter().map(|row| row.key)).collect();
        for keys in [star, planet] {
            assert_eq!(keys.iter().collect::<HashSet<_>>().len(), keys.len());
        }
    }
}
