//! When the star's light takes on another colour word.

use super::date_band::{DateBand, crossing};
use super::events::{Event, EventKind};
use super::history::History;
use super::moment::StarMoment;
use super::planet_events::halve;
use super::quantities::star_quantity;
use super::specification::Body;
use super::star_bands;
use crate::physics::light::steady_colour_words;

/// Every change of the colour word, oldest first.
pub(super) fn changes(history: &History) -> Vec<Event> {
    let mut nodes: Vec<(f64, f64)> = Vec::with_capacity(history.life().node_ages_yr().len());
    let mut found: Vec<(f64, &'static str)> = Vec::new();
    let mut before: Option<(f64, &'static str)> = None;
    for &age_yr in history.life().node_ages_yr() {
        let state = history.star_at(age_yr);
        if state.phase.is_dark() {
            break;
        }
        nodes.push((age_yr, state.effective_temperature_k.max(1.0).ln()));
        let word = steady_colour_words(before.map(|(_, word)| word), state.effective_temperature_k);
        if let Some((earlier_yr, known)) = before.filter(|(_, known)| *known != word) {
            let is_known = |age_yr: f64| {
                steady_colour_words(Some(known), history.star_at(age_yr).effective_temperature_k) == known
            };
            found.push((halve(earlier_yr, age_yr, is_known), word));
        }
        before = Some((age_yr, word));
    }
    let event = |(time_yr, word): (f64, &'static str)| {
        let band = band(history, &nodes, time_yr);
        Event { time_yr, body: Body::Star, kind: EventKind::Colour(word), caution: None, band }
    };
    found.into_iter().map(event).collect()
}

/// When the temperature is right within its typical spread, on a clock that is right within its own.
fn band(history: &History, nodes: &[(f64, f64)], time_yr: f64) -> Option<DateBand> {
    let star = StarMoment::new(&history.star_at(time_yr), history.life().interior_at(time_yr));
    let spread = star_quantity("effective_temperature_k").and_then(|quantity| (quantity.spread)(&star));
    let by_temperature = spread.and_then(|spread| crossing(nodes, time_yr, [1.0 - spread, 1.0 + spread], None));
    by_temperature
        .map_or_else(|| star_bands::of_life(history, time_yr), |band| Some(star_bands::widened(history, band)))
}
