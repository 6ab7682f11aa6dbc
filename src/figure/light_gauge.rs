//! Where a planet's starlight stands between the thresholds of its climate, for a world of ice and one of open water.

use super::chart::Level;
use super::value_axis::ValueAxis;
use crate::physics::planet::history::LightThresholds;
use crate::system::{PlanetClimate, PlanetState};
use crate::units::number_text::number;

/// Room left below the lowest threshold and above the highest, as a factor.
const ROOM: f64 = 1.35;
/// How far beyond the thresholds the axis goes to reach the light, as a factor.
const FARTHEST: f64 = 30.0;

/// Two rows over one axis of starlight: what the planet is when it comes from ice, and when it comes from open water.
#[derive(Clone, Debug, PartialEq)]
pub struct LightGauge {
    /// The axis of starlight, units of the Earth's.
    pub axis: ValueAxis,
    /// What becomes of a frozen planet, and of one with open water.
    pub rows: [GaugeRow; 2],
    /// The light at the moment, units of the Earth's; of a giant it may lie beyond the axis.
    pub light_earth: f64,
    /// The row that the planet's past has put it in.
    pub row_in_force: usize,
    /// Everything in words.
    pub description: String,
}

/// One row of the gauge.
#[derive(Clone, Debug, PartialEq)]
pub struct GaugeRow {
    /// Name for people.
    pub name: &'static str,
    /// Stretches of light, units of the Earth's, and the state they lead to.
    pub spans: Vec<(f64, f64, PlanetState)>,
    /// Thresholds that count in this row.
    pub marks: Vec<Level>,
}

impl LightGauge {
    /// The gauge of a planet with a climate; `None` for one without, or without light.
    #[must_use]
    pub fn new(name: &str, climate: &PlanetClimate) -> Option<Self> {
        let (thresholds, light_earth) = (climate.thresholds?, climate.insolation_earth?);
        let LightThresholds {
            freeze_insolation_earth: freeze,
            thaw_insolation_earth: thaw,
            moist_insolation_earth: moist,
            runaway_insolation_earth: runaway,
        } = thresholds;
        let moist = moist.min(runaway);
        // The light of a giant would press all thresholds into a corner, so the axis goes only so far for it.
        let lowest = (freeze / ROOM).min(light_earth.max(freeze / FARTHEST) / 1.1);
        let highest = (thaw.max(runaway) * ROOM).max(light_earth.min(FARTHEST * runaway) * 1.1);
        let axis = ValueAxis { is_log: true, lowest, highest };
        let row = |name, melts: f64, marks: Vec<(&str, f64)>| {
            let edges = [lowest, melts, moist.max(melts), runaway.max(melts), highest];
            let states = [PlanetState::Frozen, PlanetState::Temperate, PlanetState::Moist, PlanetState::Runaway];
            let spans = edges.windows(2).zip(states).map(|(pair, state)| (pair[0], pair[1], state));
            GaugeRow {
                name,
                spans: spans.filter(|(from, to, _)| to > from).collect(),
                marks: marks.into_iter().map(|(name, value)| Level { name: name.to_owned(), value }).collect(),
            }
        };
        let rows = [
            row("from ice", thaw, vec![("thaws", thaw)]),
            row("from open water", freeze, vec![("freezes", freeze), ("steams", runaway)]),
        ];
        let figure = |value| number(value, 3);
        let is_frozen = climate.state == PlanetState::Frozen;
        let description = format!(
            "Starlight on {name}: {} of the Earth's. It freezes below {}, thaws above {}, turns to steam above {}; now it \
             is {}",
            figure(light_earth),
            figure(freeze),
            figure(thaw),
            figure(runaway),
            climate.state.name()
        );
        Some(Self { axis, rows, light_earth, row_in_force: usize::from(!is_frozen), description })
    }
}

#[cfg(test)]
mod tests {
    use super::*;
    use crate::physics::planet::history::NoLatitudes;

    fn climate(state: PlanetState, light_earth: f64, thaw: f64) -> PlanetClimate {
        PlanetClimate {
            state,
            mean_k: None,
            ice_line_deg: None,
            ice_fraction: None,
            planetary_albedo: None,
            insolation_earth: Some(light_earth),
            latitudes: Err(NoLatitudes::Steam),
            thresholds: Some(LightThresholds {
                freeze_insolation_earth: 0.92,
                thaw_insolation_earth: thaw,
                moist_insolation_earth: 1.01,
                runaway_insolation_earth: 1.107,
            }),
        }
    }

    #[test]
    fn between_freeze_and_thaw_the_past_decides() {
        let gauge = LightGauge::new("Ember", &climate(PlanetState::Frozen, 0.95, 1.05)).expect("a climate");
        let state = |row: usize| {
            gauge.rows[row].spans.iter().find(|(from, to, _)| (*from..*to).contains(&0.95)).map(|span| span.2)
        };
        assert_eq!((state(0), state(1)), (Some(PlanetState::Frozen), Some(PlanetState::Temperate)));
        assert_eq!(gauge.row_in_force, 0);
        for row in &gauge.rows {
            assert_eq!(row.spans.first().map(|span| span.0), Some(gauge.axis.lowest));
            assert_eq!(row.spans.last().map(|span| span.1), Some(gauge.axis.highest));
            assert!(row.spans.windows(2).all(|pair| pair[0].1 == pair[1].0), "{row:?}");
        }
    }

    #[test]
    fn ice_that_melts_above_the_runaway_limit_goes_straight_to_steam() {
        let gauge = LightGauge::new("Ember", &climate(PlanetState::Runaway, 5000.0, 1.16)).expect("a climate");
        let states: Vec<PlanetState> = gauge.rows[0].spans.iter().map(|span| span.2).collect();
        assert_eq!(states, [PlanetState::Frozen, PlanetState::Runaway]);
        assert!(gauge.axis.highest < 50.0, "a giant's light does not press the thresholds together");
        assert_eq!(gauge.row_in_force, 1);
        assert_eq!(
            LightGauge::new("Ember", &PlanetClimate { thresholds: None, ..climate(PlanetState::Dry, 1.0, 1.1) }),
            None
        );
    }
}
