//! Between which dates an event falls when the starlight that fires it is known only within a factor.

use super::history::History;
use super::planet_past::PlanetPast;
use crate::physics::planet::PlanetEventKind;
use crate::physics::planet::habitable_zone::{ZoneLimit, limit_flux};

/// How the dates and their bands are meant, for people.
pub const RULE: &str = "Bands of the star's own dates: how well the length of its life is known. Bands of planets: how well \
                        the starlight that turns them is known, under the star's life as it is computed; of a planet's end \
                        and its nearest giant, the star's own.";

/// The dates between which an event falls.
#[derive(Clone, Copy, Debug, PartialEq)]
pub struct DateBand {
    /// Earliest date, yr; `None` where it may have been so from the start.
    pub earliest_yr: Option<f64>,
    /// Latest date, yr; `None` where it may never happen.
    pub latest_yr: Option<f64>,
}

/// How well the starlight of a threshold is known: factors below and above.
#[derive(Clone, Copy)]
struct Known {
    down_to: f64,
    up_to: f64,
    /// The event is fired by rising light; `None` where either way can fire it.
    is_rising: Option<bool>,
}

/// How well the threshold behind an event is known.
///
/// # Source
/// Thaw: bare ice of albedo 0.5 to 0.7 moves it by some 20 % either way; freeze: the same range moves it from 0.96 to
/// 1.08 times its value (both computed with the climate model here). Limits of the habitable zone and of the moist
/// greenhouse: about 10 % between one- and three-dimensional models (Leconte et al. 2013, Nature 504, 268;
/// Kopparapu et al. 2014).
fn known(kind: PlanetEventKind) -> Option<Known> {
    use PlanetEventKind as Kind;
    let within = |down_to, up_to, is_rising| Some(Known { down_to, up_to, is_rising });
    match kind {
        Kind::Thaws | Kind::ThawsToSteam => within(1.0 / 1.2, 1.2, Some(true)),
        Kind::Freezes => within(0.96, 1.08, Some(false)),
        Kind::MoistGreenhouse | Kind::RunawayGreenhouse | Kind::TooMuchLight => within(0.9, 1.1, Some(true)),
        Kind::MoistEnds | Kind::Condenses | Kind::TooLittleLight => within(0.9, 1.1, Some(false)),
        Kind::EntersHabitableZone => within(0.9, 1.1, None),
        Kind::WaterGone
        | Kind::AtmosphereLost
        | Kind::ProbablyLocked
        | Kind::Locked
        | Kind::Engulfed
        | Kind::TornApart
        | Kind::Unbound => None,
    }
}

/// The starlight of one planet over its runaway limit at every node of its orbit, as a natural logarithm.
pub(super) struct LightHistory {
    nodes: Vec<(f64, f64)>,
}

impl LightHistory {
    pub(super) fn of(history: &History, past: &PlanetPast) -> Self {
        let orbit = past.history().orbit();
        let mass_mearth = past.specification().mass_mearth;
        let ages = history.life().node_ages_yr().iter().copied();
        let end_yr = past.end().map(|(end_yr, _)| end_yr.next_down());
        let ages = ages.take_while(|age_yr| end_yr.is_none_or(|end_yr| *age_yr < end_yr)).chain(end_yr);
        let nodes = ages
            .filter_map(|age_yr| {
                let place = orbit.at(age_yr)?;
                let star = history.star_at(age_yr);
                let limit = limit_flux(ZoneLimit::RunawayGreenhouse, star.effective_temperature_k, mass_mearth).ok()?;
                let (a, e) = (place.semi_major_axis_au, place.eccentricity);
                let light = star.luminosity_lsun / (a * a * (1.0 - e * e).sqrt());
                Some((age_yr, (light.max(1e-30) / limit.insolation_earth).ln()))
            })
            .collect();
        Self { nodes }
    }

    /// The band of an event's date; `None` for kinds whose rule is no threshold of the starlight.
    pub(super) fn band(&self, time_yr: f64, kind: PlanetEventKind) -> Option<DateBand> {
        let Known { down_to, up_to, is_rising } = known(kind)?;
        crossing(&self.nodes, time_yr, [down_to, up_to], is_rising)
    }
}

/// The dates between which a threshold is passed that is known within factors; `nodes` hold the age and the logarithm of
/// what passes it, which rises there, falls, or does as the nodes do.
pub(super) fn crossing(
    nodes: &[(f64, f64)],
    time_yr: f64,
    [down_to, up_to]: [f64; 2],
    is_rising: Option<bool>,
) -> Option<DateBand> {
    let after = nodes.partition_point(|(age_yr, _)| *age_yr < time_yr).clamp(1, nodes.len().max(2) - 1);
    let (before, next) = (nodes.get(after - 1)?, nodes.get(after)?);
    let is_rising = is_rising.unwrap_or(next.1 > before.1);
    let here = (time_yr, between(*before, *next, time_yr));
    let (low, high) = (here.1 + down_to.ln(), here.1 + up_to.ln());
    let earlier = leaves(here, nodes[..after].iter().rev().copied(), low, high);
    let later = leaves(here, nodes[after..].iter().copied(), low, high);
    // Forward, what turns back before it has reached the far threshold may never fire the event.
    let latest_yr = later.filter(|(_, is_above)| *is_above == is_rising).map(|(age_yr, _)| age_yr);
    Some(DateBand { earliest_yr: earlier.map(|(age_yr, _)| age_yr), latest_yr })
}

fn between(before: (f64, f64), next: (f64, f64), time_yr: f64) -> f64 {
    let span_yr = next.0 - before.0;
    if span_yr <= 0.0 {
        return next.1;
    }
    before.1 + ((time_yr - before.0) / span_yr).clamp(0.0, 1.0) * (next.1 - before.1)
}

/// Where a path through nodes first leaves a range, and whether it leaves it upwards.
fn leaves(from: (f64, f64), nodes: impl Iterator<Item = (f64, f64)>, low: f64, high: f64) -> Option<(f64, bool)> {
    let mut last = from;
    for node in nodes {
        let edge = if node.1 > high {
            high
        } else if node.1 < low {
            low
        } else {
            last = node;
            continue;
        };
        let share = ((edge - last.1) / (node.1 - last.1)).clamp(0.0, 1.0);
        return Some((last.0 + share * (node.0 - last.0), node.1 > high));
    }
    None
}

#[cfg(test)]
mod tests {
    use super::*;

    fn light(values: &[f64]) -> LightHistory {
        LightHistory { nodes: values.iter().enumerate().map(|(at, value)| (at as f64, value.ln())).collect() }
    }

    #[test]
    fn a_rise_gives_both_dates() {
        let history = light(&[0.5, 0.8, 1.0, 1.25, 2.0]);
        let band = history.band(2.0, PlanetEventKind::Thaws).expect("a threshold");
        let (early, late) = (band.earliest_yr.expect("dimmer before"), band.latest_yr.expect("brighter after"));
        assert!(early > 1.0 && early < 2.0 && late > 2.0 && late < 3.0, "{band:?}");
    }

    #[test]
    fn light_that_turns_back_may_never_fire_it() {
        let history = light(&[0.5, 1.0, 1.1, 0.5]);
        let band = history.band(1.0, PlanetEventKind::Thaws).expect("a threshold");
        assert!(band.earliest_yr.is_some() && band.latest_yr.is_none(), "{band:?}");
    }

    #[test]
    fn dates_without_a_threshold_of_light_have_no_band() {
        assert_eq!(light(&[1.0, 1.1]).band(0.5, PlanetEventKind::Engulfed), None);
    }
}
