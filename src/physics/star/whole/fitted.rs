//! A life by the analytic fits, with the fading of its white dwarf to black.

use super::told::BLACK_BELOW_K;
use crate::physics::star::event::{StarEvent, StarEventKind};
use crate::physics::star::input::END_YR;
use crate::physics::star::phase::{Phase, PhaseSpan};
use crate::physics::star::state::StarState;
use crate::physics::star::track::Track;

/// The fits' life, told in the phases of [`WholeLife`](super::WholeLife).
#[derive(Clone, Debug)]
pub(super) struct Fitted {
    pub(super) track: Track,
    pub(super) spans: Vec<PhaseSpan>,
    pub(super) events: Vec<StarEvent>,
    black_yr: f64,
}

impl Fitted {
    pub(super) fn new(track: Track) -> Self {
        let (mut spans, mut events) = (track.spans().to_vec(), track.events().to_vec());
        let black_yr = black_from_yr(&track);
        if let (Some(black_yr), Some(last)) = (black_yr, spans.last_mut()) {
            last.to_yr = black_yr;
            spans.push(PhaseSpan { phase: Phase::BlackDwarf, from_yr: black_yr, to_yr: END_YR });
            events.push(StarEvent { age_yr: black_yr, kind: StarEventKind::BlackDwarfBirth });
        }
        Self { track, spans, events, black_yr: black_yr.unwrap_or(f64::INFINITY) }
    }

    pub(super) fn state_at(&self, age_yr: f64) -> StarState {
        let mut state = self.track.state_at(age_yr);
        if state.age_yr >= self.black_yr {
            state.phase = Phase::BlackDwarf;
        }
        state
    }
}

/// Age from which the white dwarf of a life is too cold to glow, yr: it only cools, so halving the logarithm finds it.
fn black_from_yr(track: &Track) -> Option<f64> {
    let birth = track.spans().last().filter(|span| span.phase.is_white_dwarf())?;
    let is_black = |age_yr: f64| track.state_at(age_yr).effective_temperature_k < BLACK_BELOW_K;
    if !is_black(END_YR) {
        return None;
    }
    let (mut early, mut late) = (birth.from_yr.max(1.0).ln(), END_YR.ln());
    for _ in 0..60 {
        let middle = 0.5 * (early + late);
        if is_black(middle.exp()) { late = middle } else { early = middle }
    }
    Some(late.exp().clamp(birth.from_yr, END_YR))
}
