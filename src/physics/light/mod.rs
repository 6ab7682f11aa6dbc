//! The star's light: its spectrum, its colour, its brightness to the eye, and the sky it makes.

mod adaptation;
mod air_mass;
mod bands;
mod caution;
mod chromaticity;
mod clear_air;
mod colour_difference;
mod colour_index;
mod colour_words;
mod correlated_temperature;
mod disc;
mod dwarf_colour;
mod gamut;
mod magnitudes;
mod observer;
mod observer_table;
mod occupation;
mod photometry;
mod photometry_tables;
mod photons;
mod planck;
mod range;
mod rayleigh;
mod rgb;
mod screen;
mod sky;
mod spectral_colour;
mod swatch;
mod twilight;
mod visible_spectrum;
mod visual_photometry;

pub use adaptation::{SeenLight, Surround, Viewing, adapted, degree_of_adaptation, seen};
pub use air_mass::air_mass;
pub use bands::{BandShares, VISIBLE_FROM_NM, VISIBLE_TO_NM, band_shares, energy_share, photon_share};
pub use caution::Caution;
pub use chromaticity::{Chromaticity, Tristimulus, WHITE_D65};
pub use clear_air::ClearAir;
pub use colour_difference::{ciede2000, cielab};
pub use colour_index::{
    FlowerClass, ballesteros_colour_mag, ballesteros_temperature_k, flower_colour_mag, flower_temperature_k,
    torres_correction_mag,
};
pub use colour_words::{ColourName, Strength, colour_name, colour_words, steady_colour_name, steady_colour_words};
pub use correlated_temperature::{
    COOLEST_CORRELATED_K, CorrelatedTemperature, HOTTEST_CORRELATED_K, LARGEST_DUV, NoCorrelatedTemperature,
    correlated_temperature,
};
pub use disc::{Disc, disc};
pub use dwarf_colour::{DWARF_SCATTER_X, DwarfColour, DwarfRow, MEASURED_DWARFS, measured_dwarf_colour};
pub use gamut::{JUST_NOTICEABLE, in_gamut, into_p3_gamut, into_srgb_gamut};
pub use magnitudes::{
    BOLOMETRIC_ZERO_W_M2, MAGNITUDE_ZERO_LX, absolute_bolometric_magnitude, absolute_visual_magnitude,
    apparent_bolometric_magnitude, apparent_magnitude, apparent_magnitude_from_planet, illuminance_of_magnitude_lx,
};
pub use observer::{MAXIMUM_EFFICACY_LM_W, blackbody_tristimulus, observer_wavelengths_nm, tristimulus};
pub use observer_table::{OBSERVER, OBSERVER_FROM_NM, OBSERVER_ROWS, OBSERVER_STEP_NM};
pub use photometry::{
    SUN_ILLUMINANCE_LX, illuminance_lx, luminance_cd_m2, luminous_efficacy_lm_w, luminous_exitance_lm_m2,
    luminous_flux_lm,
};
pub use photons::{
    FAR_RED_NM, MEAN_PHOTON_ENERGY_KT, PHOTOSYNTHETIC_NM, PhotosyntheticLight, UltravioletLight, photon_flux_umol_m2_s,
    photosynthetic_light, ultraviolet_light,
};
pub use planck::{
    FIRST_RADIATION_W_M2, SECOND_RADIATION_M_K, photon_energy_j, photon_peak_nm, photon_radiance_per_s_m2_sr_nm,
    sampled_radiance, spectral_exitance_w_m2_nm, spectral_radiance_w_m2_sr_nm, total_exitance_w_m2, wien_peak_nm,
    wien_peak_thz,
};
pub use range::OutOfRange;
pub use rayleigh::{Atmosphere, Gas, rayleigh_cross_section_m2};
pub use rgb::{RgbSpace, decode_srgb, encode_srgb, encode_srgb_16, largest_channel_one};
pub use screen::{ScreenColour, WideColour, hex, screen_colour, wide_colour};
pub use sky::{Sky, SkyScene, light_through_air, sky};
pub use spectral_colour::{SpectralColour, monochromatic, spectral_colour};
pub use swatch::{DRAPER_POINT_K, FULL_COLOUR_FROM_CD_M2, Glow, Swatch, blackbody_swatch};
pub use twilight::{DayPhase, SUNSET_ALTITUDE_DEG, Twilight, twilight};
pub use visible_spectrum::VisibleSpectrum;
pub use visual_photometry::{
    GIANT_BELOW_LOG_G_DEX, PhotometricRelation, VisualPhotometry, WHITE_DWARF_ABOVE_LOG_G_DEX, visual_photometry,
};
