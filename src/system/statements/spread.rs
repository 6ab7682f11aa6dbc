//! How well the model knows a figure, where that is published.

use super::quantity::FigureKey;
use super::reading::{Reader, Reading};
use crate::physics::star::WholeLife;
use crate::system::date_band::DateBand;
use crate::system::events::Event;
use crate::system::history::History;
use crate::system::moment::StarMoment;
use crate::system::quantities::star_quantity;
use crate::system::specification::Body;

/// Ends of the range in which a figure may lie; an end that is not known is open.
#[derive(Clone, Copy, Debug, PartialEq)]
pub(super) struct Range {
    /// Lower end; none where it may be as low as it likes.
    pub(super) lowest: Option<f64>,
    /// Upper end; none where it may be as high as it likes.
    pub(super) highest: Option<f64>,
}

/// Factor either way of what is known to an order of magnitude: half a decade.
const HALF_DECADE: f64 = 3.162_277_660_168_379_5;
/// Factor either way of winds, see the method `star_winds`.
const WIND_FACTOR: f64 = 2.0;
/// Share either way of a white dwarf's mass, see the method `star_winds`.
const REMNANT_MASS_SHARE: f64 = 0.1;
/// Flux of the habitable zone's limits, see the method `habitable_zone`.
const ZONE_FLUX_SHARE: f64 = 0.1;
/// Difference in the core's share of hydrogen, see the method `core_hydrogen`.
const CORE_HYDROGEN: f64 = 0.05;

impl Range {
    fn share(value: f64, share: f64) -> Self {
        let reach = (share * value).abs();
        Self { lowest: Some(value - reach), highest: Some(value + reach) }
    }

    fn factor(value: f64, factor: f64) -> Self {
        Self { lowest: Some(value / factor), highest: Some(value * factor) }
    }
}

/// The range of a figure that was read at an age; none where nothing is published.
pub(super) fn range_of(reader: &Reader<'_>, key: FigureKey, age_yr: f64, reading: Reading) -> Option<Range> {
    let value = reading.value;
    if reading.is_bound {
        return Some(Range { lowest: Some(value), highest: None });
    }
    let star = reader.star(age_yr);
    let of = |key| star_quantity(key).and_then(|quantity| (quantity.spread)(&star));
    let luminosity = || of("luminosity_lsun");
    let share = match key {
        "luminosity_lsun" | "radius_rsun" | "effective_temperature_k" => of(key),
        "peak_wavelength_nm" | "peak_frequency_thz" => of("effective_temperature_k"),
        "mass_msun" => star.phase.is_white_dwarf().then_some(REMNANT_MASS_SHARE),
        "mass_loss_msun_yr" => return (value > 0.0).then(|| Range::factor(value, WIND_FACTOR)),
        "core_hydrogen_fraction" => return core_hydrogen(&star, value),
        // Distances go as the square root of light and flux.
        "habitable_zone_inner_au" | "habitable_zone_outer_au" => {
            luminosity().map(|light| 0.5 * light.hypot(ZONE_FLUX_SHARE))
        }
        "insolation_earth" | "illuminance_lx" => luminosity(),
        // Temperatures go as the fourth root of light.
        "equilibrium_temperature_k" => luminosity().map(|light| 0.25 * light),
        "surface_temperature_k" => {
            let is_held = reader.planet(age_yr).is_some_and(|planet| planet.water_oceans.is_none());
            luminosity().filter(|_| is_held).map(|light| 0.25 * light)
        }
        "star_angular_diameter_deg" | "star_over_half_degree" => of("radius_rsun"),
        "semi_major_axis_au" => return orbit_range(reader, age_yr),
        "high_energy_w_m2" | "shoreline_ratio" | "water_oceans" => {
            return (value > 0.0).then(|| Range::factor(value, HALF_DECADE));
        }
        _ => None,
    };
    share.map(|share| Range::share(value, share))
}

fn core_hydrogen(star: &StarMoment, value: f64) -> Option<Range> {
    let is_estimated = star.interior.is_none();
    is_estimated.then(|| Range {
        lowest: Some((value - CORE_HYDROGEN).max(0.0)),
        highest: Some((value + CORE_HYDROGEN).min(1.0)),
    })
}

/// The orbit under every assumption on tides.
fn orbit_range(reader: &Reader<'_>, age_yr: f64) -> Option<Range> {
    let Body::Planet(index) = reader.body else { return None };
    let [low, high] = reader.history.planets().get(index)?.orbit_range_au(age_yr)?;
    (high > low).then_some(Range { lowest: Some(low), highest: Some(high) })
}

/// Share by which lifetimes are known: 5 % of fitted models, 10 % of red dwarfs; see the methods `star_life` and `red_dwarf`.
pub(super) fn lifetime_share(history: &History) -> f64 {
    if WholeLife::needs_structure(history.system().star.mass_msun) { 0.1 } else { 0.05 }
}

/// The range of a span of the star's life, yr.
pub(super) fn range_of_span(history: &History, span_yr: f64) -> Range {
    Range::share(span_yr, lifetime_share(history))
}

/// The range of an event's date, yr: its band, or what is known of lifetimes.
pub(super) fn range_of_date(history: &History, event: &Event) -> Range {
    match event.band {
        Some(DateBand { earliest_yr, latest_yr }) => {
            Range { lowest: Some(earliest_yr.unwrap_or(0.0)), highest: latest_yr }
        }
        None => range_of_span(history, event.time_yr),
    }
}
