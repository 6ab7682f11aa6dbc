//! Windows in which a planet has open water, with their length.

use super::history::History;
use super::moment::PlanetState;
use super::specification::Body;

/// A stretch of time in which a planet has open water under air that keeps it.
#[derive(Clone, Copy, Debug, PartialEq)]
pub struct MildSpan {
    /// Its start, yr.
    pub from_yr: f64,
    /// Its end, yr; the end of what is shown where it is still mild then.
    pub until_yr: f64,
}

/// The mild spans of a planet, oldest first, up to the age that a whole life is shown to.
///
/// Mild is [`PlanetState::Temperate`]: with a climate, open water that neither freezes nor steams nor leaks away;
/// under a held greenhouse, a mean surface temperature between freezing and boiling.
#[must_use]
pub fn mild_spans(history: &History, index: usize) -> Vec<MildSpan> {
    let Some(past) = history.planets().get(index) else { return Vec::new() };
    let is_mild = |age_yr: f64| history.planet_at(index, age_yr).is_some_and(|now| now.state == PlanetState::Temperate);
    // Between two events of the planet, and between two changes of its climate, the state stays.
    let dated = history.events().iter().filter(|event| event.body == Body::Planet(index)).map(|event| event.time_yr);
    let changes = past.history().climate_states().iter().map(|(age_yr, _)| *age_yr);
    let end_yr = history.shown_until_yr();
    let mut ages: Vec<f64> = dated.chain(changes).filter(|age_yr| *age_yr > 0.0 && *age_yr < end_yr).collect();
    ages.extend([0.0, end_yr]);
    ages.sort_by(f64::total_cmp);
    ages.dedup();
    let mut spans: Vec<MildSpan> = Vec::new();
    for pair in ages.windows(2) {
        if !is_mild(0.5 * (pair[0] + pair[1])) {
            continue;
        }
        match spans.last_mut() {
            Some(last) if last.until_yr == pair[0] => last.until_yr = pair[1],
            _ => spans.push(MildSpan { from_yr: pair[0], until_yr: pair[1] }),
        }
    }
    spans
}

#[cfg(test)]
mod tests {
    use super::*;
    use crate::physics::planet::Greenhouse;
    use crate::system::{PlanetSpecification, StarSpecification, System};

    #[test]
    fn an_earth_under_a_held_greenhouse_is_mild_for_long() {
        let greenhouse = Greenhouse::FixedIncrement { increment_k: 33.0 };
        let planet = PlanetSpecification { greenhouse, ..PlanetSpecification::default() };
        let history =
            History::compute(System { star: StarSpecification::default(), planets: vec![planet] }).expect("computed");
        let spans = mild_spans(&history, 0);
        let longest_yr = spans.iter().map(|span| span.until_yr - span.from_yr).fold(0.0, f64::max);
        assert!(longest_yr > 5e9, "{spans:?}");
        assert!(spans.windows(2).all(|pair| pair[0].until_yr < pair[1].from_yr));
        assert_eq!(mild_spans(&history, 1), []);
    }
}
