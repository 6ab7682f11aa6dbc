//! A cue sheet on a history: the moment at every show time.

use super::cue::{Cue, LONGEST_SHOW_S, Transition};
use crate::system::history::History;
use crate::system::moment_request::MomentProblem;
use crate::system::pacing::TimeAxis;
use thiserror::Error;

/// Why a sheet makes no show on a history. Cues are counted from 1.
#[derive(Clone, Debug, Error, PartialEq)]
pub enum CueProblem {
    /// There is no cue.
    #[error("there is no cue, allowed one or more; add the moments of the show to the scenario first")]
    NoCues,
    /// A show time that is none.
    #[error(
        "cue {number}: the show time is {show_time_s} s, allowed 0 to {LONGEST_SHOW_S} s; choose a time in that range"
    )]
    OutOfShow {
        /// Which cue.
        number: usize,
        /// Its show time, s.
        show_time_s: f64,
    },
    /// Two cues at one show time.
    #[error("cues {number} and {other} stand at the same show time; move one of them")]
    SameTime {
        /// Which cue.
        number: usize,
        /// The other one.
        other: usize,
    },
    /// A moment that this history does not have.
    #[error("cue {number}: {problem}")]
    Moment {
        /// Which cue.
        number: usize,
        /// What is wrong with its moment.
        problem: MomentProblem,
    },
}

/// A cue with its moment known.
#[derive(Clone, Copy, Debug, PartialEq)]
pub struct Stop {
    /// Place of its cue in the sheet, counted from 0.
    pub index: usize,
    /// Show time, s.
    pub show_time_s: f64,
    /// The moment, yr.
    pub time_yr: f64,
    /// How the show comes here.
    pub transition: Transition,
}

/// The whole show: a moment for every show time.
#[derive(Clone, Debug, PartialEq)]
pub struct Schedule {
    /// In the order of the show.
    stops: Vec<Stop>,
    /// The way to each stop but the first; none for a cut.
    ways: Vec<Option<Way>>,
}

/// An even way between two moments.
#[derive(Clone, Debug, PartialEq)]
struct Way {
    axis: TimeAxis,
    starts_late: bool,
}

impl Schedule {
    /// Places the cues of a sheet, whatever their order, on a history.
    ///
    /// # Errors
    /// [`CueProblem`] with the number of the cue that has no place.
    pub fn new(sheet: &[Cue], history: &History) -> Result<Self, CueProblem> {
        let present_age_yr = history.system().star.present_age_yr;
        let mut stops = Vec::with_capacity(sheet.len());
        for (index, cue) in sheet.iter().enumerate() {
            let number = index + 1;
            if !(0.0..=LONGEST_SHOW_S).contains(&cue.show_time_s) {
                return Err(CueProblem::OutOfShow { number, show_time_s: cue.show_time_s });
            }
            let time_yr = cue.moment.time_yr(history, Some(present_age_yr));
            let time_yr = time_yr.map_err(|problem| CueProblem::Moment { number, problem })?;
            stops.push(Stop { index, show_time_s: cue.show_time_s, time_yr, transition: cue.transition });
        }
        if stops.is_empty() {
            return Err(CueProblem::NoCues);
        }
        stops.sort_by(|first, second| first.show_time_s.total_cmp(&second.show_time_s));
        if let Some(pair) = stops.windows(2).find(|pair| pair[0].show_time_s == pair[1].show_time_s) {
            return Err(CueProblem::SameTime { number: pair[0].index + 1, other: pair[1].index + 1 });
        }
        let ways = stops.windows(2).map(|pair| Way::between(history, &pair[0], &pair[1])).collect();
        Ok(Self { stops, ways })
    }

    /// The cues with their moments, in the order of the show.
    #[must_use]
    pub fn stops(&self) -> &[Stop] {
        &self.stops
    }

    /// When the last cue is reached, s.
    #[must_use]
    pub fn length_s(&self) -> f64 {
        self.stops.last().map_or(0.0, |stop| stop.show_time_s)
    }

    /// The moment at a show time, yr: before the first cue its moment, after the last one that one's.
    #[must_use]
    pub fn time_yr(&self, show_time_s: f64) -> f64 {
        let after = self.stops.partition_point(|stop| stop.show_time_s <= show_time_s);
        let (Some(before), Some(next)) =
            (after.checked_sub(1).and_then(|at| self.stops.get(at)), self.stops.get(after))
        else {
            let end = if after == 0 { self.stops.first() } else { self.stops.last() };
            return end.map_or(0.0, |stop| stop.time_yr);
        };
        match &self.ways[after - 1] {
            None => before.time_yr,
            Some(way) => {
                let share = (show_time_s - before.show_time_s) / (next.show_time_s - before.show_time_s);
                way.time_yr(share, before.time_yr, next.time_yr)
            }
        }
    }

    /// The cue under way at a show time, as its place in the sheet; none before the first.
    #[must_use]
    pub fn cue_at(&self, show_time_s: f64) -> Option<usize> {
        let after = self.stops.partition_point(|stop| stop.show_time_s <= show_time_s);
        after.checked_sub(1).and_then(|at| self.stops.get(at)).map(|stop| stop.index)
    }
}

impl Way {
    fn between(history: &History, before: &Stop, next: &Stop) -> Option<Self> {
        let scale = next.transition.scale()?;
        let (early_yr, late_yr) = (before.time_yr.min(next.time_yr), before.time_yr.max(next.time_yr));
        let axis = TimeAxis::between(history, scale, early_yr, late_yr);
        Some(Self { axis, starts_late: before.time_yr > next.time_yr })
    }

    fn time_yr(&self, share: f64, from_yr: f64, to_yr: f64) -> f64 {
        // The logarithmic axis cannot show birth: at the cue itself its own moment holds.
        if share <= 0.0 {
            return from_yr;
        }
        let age_yr = self.axis.age_at(if self.starts_late { 1.0 - share } else { share });
        age_yr.clamp(from_yr.min(to_yr), from_yr.max(to_yr))
    }
}
