//! The states of a climate with memory, and what takes it from one to the next.

/// What a planet's water is doing.
#[derive(Clone, Copy, Debug, PartialEq, Eq, Hash)]
pub enum ClimateState {
    /// Ice from pole to pole.
    Frozen,
    /// Open water, with or without polar ice.
    Temperate,
    /// Open water, but the upper air is wet and hydrogen leaks away.
    Moist,
    /// The oceans are steam.
    Runaway,
    /// No water left. For good.
    Dry,
}

impl ClimateState {
    /// Every state.
    pub const ALL: [Self; 5] = [Self::Frozen, Self::Temperate, Self::Moist, Self::Runaway, Self::Dry];

    /// Stable machine name.
    #[must_use]
    pub fn key(self) -> &'static str {
        match self {
            Self::Frozen => "frozen",
            Self::Temperate => "temperate",
            Self::Moist => "moist",
            Self::Runaway => "runaway",
            Self::Dry => "dry",
        }
    }

    /// The state in words for people.
    #[must_use]
    pub fn name(self) -> &'static str {
        match self {
            Self::Frozen => "frozen over",
            Self::Temperate => "open water",
            Self::Moist => "moist greenhouse",
            Self::Runaway => "runaway greenhouse",
            Self::Dry => "dry",
        }
    }
}

/// The starlight at one moment, as the natural logarithm of its ratio to every threshold: positive above it.
#[derive(Clone, Copy, Debug)]
pub(crate) struct Standing {
    pub(crate) over_freeze: f64,
    pub(crate) over_thaw: f64,
    pub(crate) over_moist: f64,
    pub(crate) over_runaway: f64,
    /// The thresholds were not computed for a star of this temperature.
    pub(crate) extrapolated: bool,
}

/// Beyond this a threshold counts as passed; at it, rounding decides nothing.
const PASSED: f64 = 1e-9;

impl Standing {
    /// Where the starlight leads from a state, if anywhere.
    pub(crate) fn leads_from(&self, state: ClimateState) -> Option<ClimateState> {
        Way::from(state).iter().find(|way| way.depth(self) > PASSED).map(|way| way.to)
    }
}

/// One way out of a state.
#[derive(Clone, Copy)]
struct Way {
    threshold: fn(&Standing) -> f64,
    /// 1 for rising above the threshold, −1 for falling below it.
    sign: f64,
    to: ClimateState,
}

impl Way {
    /// The ways out of a state; where several are open at once the first is taken.
    fn from(state: ClimateState) -> &'static [Self] {
        const RUN_AWAY: Way = Way { threshold: |at| at.over_runaway, sign: 1.0, to: ClimateState::Runaway };
        const FREEZE: Way = Way { threshold: |at| at.over_freeze, sign: -1.0, to: ClimateState::Frozen };
        const MOISTEN: Way = Way { threshold: |at| at.over_moist, sign: 1.0, to: ClimateState::Moist };
        const CLEAR: Way = Way { threshold: |at| at.over_moist, sign: -1.0, to: ClimateState::Temperate };
        const THAW: Way = Way { threshold: |at| at.over_thaw, sign: 1.0, to: ClimateState::Temperate };
        const CONDENSE: Way = Way { threshold: |at| at.over_runaway, sign: -1.0, to: ClimateState::Moist };
        match state {
            ClimateState::Frozen => &[THAW],
            ClimateState::Temperate => &[RUN_AWAY, FREEZE, MOISTEN],
            ClimateState::Moist => &[RUN_AWAY, CLEAR],
            ClimateState::Runaway => &[CONDENSE],
            ClimateState::Dry => &[],
        }
    }

    /// How far this way's threshold is passed.
    fn depth(&self, at: &Standing) -> f64 {
        self.sign * (self.threshold)(at)
    }
}

/// The first change of state between two moments, at or after `from_share` of the way: when, as a share of the
/// way, and to what. The logarithms run straight between the moments.
pub(crate) fn next_change(
    state: ClimateState,
    from_share: f64,
    before: &Standing,
    after: &Standing,
) -> Option<(f64, ClimateState)> {
    let mut first: Option<(f64, ClimateState)> = None;
    for way in Way::from(state) {
        let (start, end) = (way.depth(before), way.depth(after));
        let here = start + from_share * (end - start);
        let share = if here > PASSED {
            from_share
        } else if end > PASSED && end > start {
            (-start / (end - start)).clamp(from_share, 1.0)
        } else {
            continue;
        };
        if first.is_none_or(|(earliest, _)| share < earliest) {
            first = Some((share, way.to));
        }
    }
    first
}

#[cfg(test)]
mod tests {
    use super::*;

    fn standing(s: f64) -> Standing {
        let over = |threshold: f64| (s / threshold).ln();
        Standing {
            over_freeze: over(0.9),
            over_thaw: over(1.2),
            over_moist: over(1.05),
            over_runaway: over(1.1),
            extrapolated: false,
        }
    }

    #[test]
    fn ice_remembers() {
        assert_eq!(standing(1.0).leads_from(ClimateState::Frozen), None);
        assert_eq!(standing(1.0).leads_from(ClimateState::Temperate), None);
        assert_eq!(standing(1.3).leads_from(ClimateState::Frozen), Some(ClimateState::Temperate));
        assert_eq!(standing(1.3).leads_from(ClimateState::Temperate), Some(ClimateState::Runaway));
        assert_eq!(standing(9.0).leads_from(ClimateState::Dry), None);
    }

    #[test]
    fn a_rise_passes_every_threshold_in_order_and_never_turns_back() {
        let (before, after) = (standing(0.95), standing(1.3));
        let (mut state, mut share, mut seen) = (ClimateState::Temperate, 0.0, Vec::new());
        while let Some((at, next)) = next_change(state, share, &before, &after) {
            assert!(at >= share);
            (state, share) = (next, at);
            seen.push(next);
            assert!(seen.len() < 10, "{seen:?}");
        }
        assert_eq!(seen, [ClimateState::Moist, ClimateState::Runaway]);
    }

    #[test]
    fn a_fall_from_steam_ends_in_ice() {
        let (before, after) = (standing(1.3), standing(0.5));
        let (mut state, mut share, mut seen) = (ClimateState::Runaway, 0.0, Vec::new());
        while let Some((at, next)) = next_change(state, share, &before, &after) {
            (state, share) = (next, at);
            seen.push(next);
            assert!(seen.len() < 10, "{seen:?}");
        }
        assert_eq!(seen, [ClimateState::Moist, ClimateState::Temperate, ClimateState::Frozen]);
    }
}
