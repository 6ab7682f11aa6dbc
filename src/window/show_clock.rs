//! The show of the scenario on the history that is shown: its schedule, warnings and clock.

use crate::system::History;
use crate::system::cues::{Cue, FrameRate, Schedule, ShowWarning, warnings};
use std::sync::Arc;

/// Frames that are looked through for flashes as a show is edited: an hour at thirty frames per second.
const MOST_CHECKED_FRAMES: u64 = 108_000;

/// A show and its clock.
#[derive(Debug, Default)]
pub(super) struct Show {
    /// Show time, s.
    pub(super) clock_s: f64,
    /// Whether it plays.
    pub(super) is_running: bool,
    history: Option<Arc<History>>,
    cues: Vec<Cue>,
    schedule: Option<Schedule>,
    problem: Option<String>,
    warnings: Vec<ShowWarning>,
}

impl Show {
    /// Places the cues anew where history or cues have changed.
    pub(super) fn update(&mut self, history: &Arc<History>, cues: &[Cue]) {
        let is_same = self.history.as_ref().is_some_and(|known| Arc::ptr_eq(known, history)) && self.cues == cues;
        if is_same {
            return;
        }
        self.history = Some(Arc::clone(history));
        self.cues = cues.to_vec();
        self.warnings.clear();
        match Schedule::new(cues, history) {
            Ok(schedule) => {
                if schedule.frame_count(FrameRate::THIRTY) <= MOST_CHECKED_FRAMES {
                    self.warnings = warnings(&schedule, history, FrameRate::THIRTY);
                }
                self.problem = None;
                self.schedule = Some(schedule);
            }
            Err(problem) => {
                self.problem = Some(problem.to_string());
                self.schedule = None;
                self.is_running = false;
            }
        }
    }

    /// The schedule, where the cues make a show.
    pub(super) fn schedule(&self) -> Option<&Schedule> {
        self.schedule.as_ref()
    }

    /// Why the cues make no show.
    pub(super) fn problem(&self) -> Option<&str> {
        self.problem.as_deref()
    }

    /// What to know about the show at thirty frames per second.
    pub(super) fn warnings(&self) -> &[ShowWarning] {
        &self.warnings
    }

    /// Whether it is too long to be looked through while it is edited.
    pub(super) fn is_too_long_to_check(&self) -> bool {
        self.schedule().is_some_and(|schedule| schedule.frame_count(FrameRate::THIRTY) > MOST_CHECKED_FRAMES)
    }

    /// The cue under way, as its place in the sheet, while the show plays or its clock stands within it.
    pub(super) fn cue(&self) -> Option<usize> {
        let schedule = self.schedule()?;
        (self.is_running || self.clock_s > 0.0).then(|| schedule.cue_at(self.clock_s)).flatten()
    }

    /// Lets the clock go on and returns the moment it shows, yr; it stops at the last cue.
    pub(super) fn advance(&mut self, elapsed_s: f64) -> Option<f64> {
        let length_s = self.schedule.as_ref()?.length_s();
        self.clock_s = (self.clock_s + elapsed_s).min(length_s);
        if self.clock_s >= length_s {
            self.is_running = false;
        }
        self.schedule.as_ref().map(|schedule| schedule.time_yr(self.clock_s))
    }

    /// Starts or stops; from the end it begins anew.
    pub(super) fn toggle(&mut self) {
        let Some(length_s) = self.schedule.as_ref().map(Schedule::length_s) else { return };
        self.is_running = !self.is_running;
        if self.is_running && self.clock_s >= length_s {
            self.clock_s = 0.0;
        }
    }
}
