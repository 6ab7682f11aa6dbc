//! The star's light: its spectrum, its colour, its brightness to the eye, and the sky it makes.

mod bands;
mod chromaticity;
mod colour_words;
mod gamut;
mod observer;
mod observer_table;
mod planck;
mod range;
mod rgb;
mod screen;
mod swatch;

pub use bands::{BandShares, VISIBLE_FROM_NM, VISIBLE_TO_NM, band_shares, energy_share, photon_share};
pub use chromaticity::{Chromaticity, Tristimulus, WHITE_D65};
pub use colour_words::{ColourName, Strength, colour_name, colour_words, steady_colour_words};
pub use gamut::{JUST_NOTICEABLE, in_gamut, into_srgb_gamut};
pub use observer::{MAXIMUM_EFFICACY_LM_W, blackbody_tristimulus, observer_wavelengths_nm, tristimulus};
pub use observer_table::{OBSERVER, OBSERVER_FROM_NM, OBSERVER_ROWS, OBSERVER_STEP_NM};
pub use planck::{
    FIRST_RADIATION_W_M2, SECOND_RADIATION_M_K, photon_energy_j, photon_radiance_per_s_m2_sr_nm, sampled_radiance,
    spectral_exitance_w_m2_nm, spectral_radiance_w_m2_sr_nm, total_exitance_w_m2, wien_peak_nm,
};
pub use range::OutOfRange;
pub use rgb::{RgbSpace, encode_srgb, largest_channel_one};
pub use screen::{ScreenColour, hex, screen_colour};
pub use swatch::{DRAPER_POINT_K, FULL_COLOUR_FROM_CD_M2, Glow, Swatch, blackbody_swatch};
