//! The star's spectrum over wavelength, beside that of a reference star.

use super::value_axis::ValueAxis;
use crate::physics::light::{
    VISIBLE_FROM_NM, VISIBLE_TO_NM, band_shares, photon_peak_nm, photon_radiance_per_s_m2_sr_nm, photon_share,
    spectral_colour, spectral_radiance_w_m2_sr_nm, wien_peak_nm,
};
use crate::units::constants::SOLAR_TEMPERATURE_K;

/// Left and right end of the wavelength axis, nm: fixed, so that a spectrum is seen to move.
pub const WAVELENGTHS_NM: [f64; 2] = [30.0, 10_000.0];
/// Temperature of the reference star, K: the Sun's.
pub const REFERENCE_K: f64 = SOLAR_TEMPERATURE_K;
/// Distances from which the star's magnitude can be asked for, pc.
pub const DISTANCES_PC: [f64; 5] = [1.0, 10.0, 100.0, 1000.0, 10_000.0];

/// Points of a curve.
const POINTS: usize = 300;
/// Step of the visible band, nm.
const VISIBLE_STEP_NM: f64 = 2.5;
/// Sensitivity of the eye below which a spectral colour fades, against its best.
const FADES_BELOW: f64 = 0.02;

/// What is counted at each wavelength.
#[derive(Clone, Copy, Debug, Default, PartialEq, Eq, Hash)]
pub enum Counted {
    /// Energy: spectral radiance.
    #[default]
    Energy,
    /// Photons.
    Photons,
}

impl Counted {
    /// Both, in the order they are offered.
    pub const ALL: [Self; 2] = [Self::Energy, Self::Photons];

    /// Name for people.
    #[must_use]
    pub fn name(self) -> &'static str {
        match self {
            Self::Energy => "energy",
            Self::Photons => "photons",
        }
    }
}

/// What heights are measured against.
#[derive(Clone, Copy, Debug, Default, PartialEq, Eq, Hash)]
pub enum Scaling {
    /// Each spectrum against its own peak: shapes can be compared.
    #[default]
    OwnPeak,
    /// In units, on a fixed logarithmic axis: brightness per area can be compared.
    Absolute,
}

impl Scaling {
    /// Both, in the order they are offered.
    pub const ALL: [Self; 2] = [Self::OwnPeak, Self::Absolute];

    /// Name for people.
    #[must_use]
    pub fn name(self) -> &'static str {
        match self {
            Self::OwnPeak => "each to its own peak",
            Self::Absolute => "absolute",
        }
    }
}

/// How a spectrum is looked at.
#[derive(Clone, Copy, Debug, PartialEq)]
pub struct SpectrumView {
    /// What is counted.
    pub counted: Counted,
    /// What heights are measured against.
    pub scaling: Scaling,
    /// Distance of who looks at the star, pc.
    pub distance_pc: f64,
}

impl Default for SpectrumView {
    fn default() -> Self {
        Self { counted: Counted::default(), scaling: Scaling::default(), distance_pc: 10.0 }
    }
}

/// One spectrum.
#[derive(Clone, Debug, PartialEq)]
pub struct SpectrumCurve {
    /// Temperature, K.
    pub temperature_k: f64,
    /// Places on the wavelength axis, 0 to 1, and heights in the unit of the value axis.
    pub points: Vec<[f64; 2]>,
    /// Its highest point.
    pub peak: Peak,
}

/// The highest point of a spectrum.
#[derive(Clone, Copy, Debug, PartialEq)]
pub struct Peak {
    /// Wavelength, nm.
    pub wavelength_nm: f64,
    /// Place on the wavelength axis; held at an end when the peak lies beyond it.
    pub place: f64,
    /// Height in the unit of the value axis.
    pub height: f64,
    /// Whether it lies within the axis.
    pub is_in_view: bool,
}

/// A point of the visible band: place, height under the star's curve, colour of the wavelength.
#[derive(Clone, Copy, Debug, PartialEq)]
pub struct VisiblePoint {
    /// Place on the wavelength axis.
    pub place: f64,
    /// Height of the star's curve; zero without a star.
    pub height: f64,
    /// Nearest screen colour of the wavelength.
    pub colour_srgb: [u8; 3],
    /// How much of it the eye sees, 0 to 1: less than one at either end of the band.
    pub visibility: f64,
}

/// One of the three bands with its share.
#[derive(Clone, Copy, Debug, PartialEq)]
pub struct SpectralBand {
    /// Name for people.
    pub name: &'static str,
    /// Place where it begins and ends on the axis.
    pub places: [f64; 2],
    /// Share of what is counted, without a star none.
    pub share: Option<f64>,
}

/// A mark on the wavelength axis.
#[derive(Clone, Copy, Debug, PartialEq, Eq)]
pub struct WavelengthTick {
    /// Wavelength, nm.
    pub wavelength_nm: u32,
    /// Its label.
    pub label: &'static str,
}

/// Round wavelengths.
pub const TICKS: [WavelengthTick; 8] = [
    WavelengthTick { wavelength_nm: 50, label: "50 nm" },
    WavelengthTick { wavelength_nm: 100, label: "100 nm" },
    WavelengthTick { wavelength_nm: 200, label: "200 nm" },
    WavelengthTick { wavelength_nm: 500, label: "500 nm" },
    WavelengthTick { wavelength_nm: 1000, label: "1 µm" },
    WavelengthTick { wavelength_nm: 2000, label: "2 µm" },
    WavelengthTick { wavelength_nm: 5000, label: "5 µm" },
    WavelengthTick { wavelength_nm: 10_000, label: "10 µm" },
];

/// Everything to draw.
#[derive(Clone, Debug, PartialEq)]
pub struct Spectrum {
    /// What it shows, with its unit.
    pub title: &'static str,
    /// The axis of heights.
    pub axis: ValueAxis,
    /// The star; `None` where no light is modelled.
    pub star: Option<SpectrumCurve>,
    /// The reference star.
    pub reference: Option<SpectrumCurve>,
    /// The visible band in its colours.
    pub visible: Vec<VisiblePoint>,
    /// Ultraviolet, visible, infrared.
    pub bands: [SpectralBand; 3],
}

impl Spectrum {
    /// The spectrum of a blackbody at the star's temperature, K, if it has one.
    #[must_use]
    pub fn new(temperature_k: Option<f64>, view: SpectrumView) -> Self {
        let axis = match view.scaling {
            Scaling::OwnPeak => ValueAxis { is_log: false, lowest: 0.0, highest: 1.12 },
            Scaling::Absolute => {
                // From the dimmest ember that glows to the hottest white dwarf.
                let [lowest, highest] = match view.counted {
                    Counted::Energy => [1e-2, 1e12],
                    Counted::Photons => [1e16, 1e29],
                };
                ValueAxis { is_log: true, lowest, highest }
            }
        };
        let star = temperature_k.and_then(|temperature_k| SpectrumCurve::new(temperature_k, view));
        Self {
            title: title(view),
            axis,
            visible: visible(temperature_k, view),
            bands: bands(temperature_k, view.counted),
            reference: SpectrumCurve::new(REFERENCE_K, view),
            star,
        }
    }
}

impl SpectrumCurve {
    fn new(temperature_k: f64, view: SpectrumView) -> Option<Self> {
        let peak_nm = match view.counted {
            Counted::Energy => wien_peak_nm(temperature_k).ok()?,
            Counted::Photons => photon_peak_nm(temperature_k).ok()?,
        };
        let unit = unit_height(temperature_k, view)?;
        let [from_nm, to_nm] = WAVELENGTHS_NM;
        let points = (0..=POINTS)
            .filter_map(|point| {
                let place = point as f64 / POINTS as f64;
                let wavelength_nm = from_nm * (to_nm / from_nm).powf(place);
                Some([place, strength(wavelength_nm, temperature_k, view.counted)? / unit])
            })
            .collect();
        let place = place_of(peak_nm);
        let peak = Peak {
            wavelength_nm: peak_nm,
            place: place.clamp(0.0, 1.0),
            height: strength(peak_nm, temperature_k, view.counted)? / unit,
            is_in_view: (0.0..=1.0).contains(&place),
        };
        Some(Self { temperature_k, points, peak })
    }
}

/// Place of a wavelength on the axis: equal ratios get equal widths.
#[must_use]
pub fn place_of(wavelength_nm: f64) -> f64 {
    let [from_nm, to_nm] = WAVELENGTHS_NM;
    (wavelength_nm / from_nm).ln() / (to_nm / from_nm).ln()
}

fn title(view: SpectrumView) -> &'static str {
    match (view.counted, view.scaling) {
        (Counted::Energy, Scaling::OwnPeak) => "Spectral radiance, share of its peak",
        (Counted::Photons, Scaling::OwnPeak) => "Photons by wavelength, share of their peak",
        (Counted::Energy, Scaling::Absolute) => "Spectral radiance, W m⁻² sr⁻¹ nm⁻¹",
        (Counted::Photons, Scaling::Absolute) => "Photons, s⁻¹ m⁻² sr⁻¹ nm⁻¹",
    }
}

/// Radiance at a wavelength in energy or photons.
fn strength(wavelength_nm: f64, temperature_k: f64, counted: Counted) -> Option<f64> {
    match counted {
        Counted::Energy => spectral_radiance_w_m2_sr_nm(wavelength_nm, temperature_k).ok(),
        Counted::Photons => photon_radiance_per_s_m2_sr_nm(wavelength_nm, temperature_k).ok(),
    }
}

/// What stands for one on the axis of heights; `None` for a body so cold that nothing is above zero.
fn unit_height(temperature_k: f64, view: SpectrumView) -> Option<f64> {
    let unit = match (view.scaling, view.counted) {
        (Scaling::Absolute, _) => 1.0,
        (Scaling::OwnPeak, Counted::Energy) => {
            strength(wien_peak_nm(temperature_k).ok()?, temperature_k, Counted::Energy)?
        }
        (Scaling::OwnPeak, Counted::Photons) => {
            strength(photon_peak_nm(temperature_k).ok()?, temperature_k, Counted::Photons)?
        }
    };
    (unit > 0.0).then_some(unit)
}

fn visible(temperature_k: Option<f64>, view: SpectrumView) -> Vec<VisiblePoint> {
    let unit = temperature_k.and_then(|temperature_k| Some((temperature_k, unit_height(temperature_k, view)?)));
    let steps = ((VISIBLE_TO_NM - VISIBLE_FROM_NM) / VISIBLE_STEP_NM).round() as u32;
    (0..=steps)
        .filter_map(|step| {
            let wavelength_nm = VISIBLE_FROM_NM + VISIBLE_STEP_NM * f64::from(step);
            let colour = spectral_colour(wavelength_nm).ok()?;
            let height = unit.and_then(|(temperature_k, unit)| {
                strength(wavelength_nm, temperature_k, view.counted).map(|strength| strength / unit)
            });
            Some(VisiblePoint {
                place: place_of(wavelength_nm),
                height: height.unwrap_or(0.0),
                colour_srgb: colour.screen.srgb,
                visibility: (colour.relative_brightness / FADES_BELOW).clamp(0.0, 1.0),
            })
        })
        .collect()
}

fn bands(temperature_k: Option<f64>, counted: Counted) -> [SpectralBand; 3] {
    let shares = temperature_k.and_then(|temperature_k| match counted {
        Counted::Energy => {
            let shares = band_shares(temperature_k).ok()?;
            Some([shares.ultraviolet, shares.visible, shares.infrared])
        }
        Counted::Photons => {
            // From waves so short that a star has none to the cut.
            let below = |cut_nm| photon_share(1e-3, cut_nm, temperature_k).ok();
            let (ultraviolet, up_to_red) = (below(VISIBLE_FROM_NM)?, below(VISIBLE_TO_NM)?);
            Some([ultraviolet, up_to_red - ultraviolet, 1.0 - up_to_red])
        }
    });
    let (blue, red) = (place_of(VISIBLE_FROM_NM), place_of(VISIBLE_TO_NM));
    let band = |name, places, index: usize| SpectralBand { name, places, share: shares.map(|shares| shares[index]) };
    [band("ultraviolet", [0.0, blue], 0), band("visible", [blue, red], 1), band("infrared", [red, 1.0], 2)]
}

#[cfg(test)]
mod tests {
    use super::*;

    fn view(counted: Counted, scaling: Scaling) -> SpectrumView {
        SpectrumView { counted, scaling, ..SpectrumView::default() }
    }

    #[test]
    fn every_temperature_gives_a_finite_spectrum() {
        for counted in Counted::ALL {
            for scaling in Scaling::ALL {
                for temperature_k in [3.0, 300.0, 798.0, 2600.0, 5772.0, 50_000.0, 5e5] {
                    let spectrum = Spectrum::new(Some(temperature_k), view(counted, scaling));
                    let star = spectrum.star.expect("a curve");
                    assert!(star.points.iter().flatten().all(|value| value.is_finite() && *value >= 0.0));
                    assert!(star.peak.height.is_finite() && (0.0..=1.0).contains(&star.peak.place));
                    let shares: f64 = spectrum.bands.iter().filter_map(|band| band.share).sum();
                    assert!((shares - 1.0).abs() < 1e-12, "{shares}");
                    assert!(spectrum.visible.iter().all(|point| point.height.is_finite()));
                }
            }
        }
    }

    #[test]
    fn against_its_own_peak_no_point_is_higher_than_one() {
        for counted in Counted::ALL {
            let spectrum = Spectrum::new(Some(3000.0), view(counted, Scaling::OwnPeak));
            let star = spectrum.star.expect("a curve");
            let highest = star.points.iter().map(|point| point[1]).fold(0.0, f64::max);
            assert!(highest <= 1.0 + 1e-9 && highest > 0.999, "{highest}");
            assert_eq!(star.peak.height, 1.0);
        }
    }

    #[test]
    fn red_dwarfs_peak_in_the_infrared_and_hot_stars_beyond_the_left_end() {
        let peak = |temperature_k| {
            let spectrum = Spectrum::new(Some(temperature_k), SpectrumView::default());
            spectrum.star.expect("a curve").peak
        };
        assert!(peak(3000.0).wavelength_nm > VISIBLE_TO_NM && peak(3000.0).is_in_view);
        assert!(!peak(150_000.0).is_in_view && peak(150_000.0).place == 0.0);
    }

    #[test]
    fn without_light_the_reference_still_stands() {
        let spectrum = Spectrum::new(None, SpectrumView::default());
        assert!(spectrum.star.is_none() && spectrum.reference.is_some());
        assert!(spectrum.bands.iter().all(|band| band.share.is_none()));
    }

    #[test]
    fn the_visible_band_runs_from_blue_to_red() {
        let visible = Spectrum::new(None, SpectrumView::default()).visible;
        assert!(visible.windows(2).all(|pair| pair[0].place < pair[1].place));
        assert!(visible.iter().all(|point| (0.0..=1.0).contains(&point.visibility)));
        assert!(visible[0].visibility < 0.01 && visible[visible.len() / 2].visibility == 1.0);
        let at = |share: f64| visible[(share * (visible.len() - 1) as f64) as usize].colour_srgb;
        let ([_, _, blue], [red, ..]) = (at(0.18), at(0.65));
        assert!(blue > 200 && red > 200, "{:?} {:?}", at(0.18), at(0.65));
    }
}
