//! When the star's light takes on another colour word.

use super::events::{Event, EventKind};
use super::history::History;
use super::planet_events::halve;
use super::specification::Body;
use crate::physics::light::steady_colour_words;

/// Every change of the colour word, oldest first.
pub(super) fn changes(history: &History) -> Vec<Event> {
    let mut events = Vec::new();
    let mut before: Option<(f64, &'static str)> = None;
    for &age_yr in history.life().node_ages_yr() {
        let state = history.star_at(age_yr);
        if state.phase.is_dark() {
            break;
        }
        let word = steady_colour_words(before.map(|(_, word)| word), state.effective_temperature_k);
        if let Some((earlier_yr, known)) = before.filter(|(_, known)| *known != word) {
            let is_known = |age_yr: f64| {
                steady_colour_words(Some(known), history.star_at(age_yr).effective_temperature_k) == known
            };
            let time_yr = halve(earlier_yr, age_yr, is_known);
            let kind = EventKind::Colour(word);
            events.push(Event { time_yr, body: Body::Star, kind, caution: None, band: None });
        }
        before = Some((age_yr, word));
    }
    events
}
