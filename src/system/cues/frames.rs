//! A show as frames.

use super::cue::{Cue, LONGEST_SHOW_S};
use super::frame_rate::FrameRate;
use super::schedule::{CueProblem, Schedule};
use crate::system::history::History;

/// Most frames of a show: the longest one at the fastest rate.
pub const MOST_FRAMES: u64 = 1000 * (LONGEST_SHOW_S as u64) + 1;

/// One frame of a show.
#[derive(Clone, Copy, Debug, PartialEq)]
pub struct ShowFrame {
    /// Its number, counted from 0.
    pub number: u64,
    /// When it begins, s since the start of the show.
    pub show_time_s: f64,
    /// The moment of the star's life that it shows, yr.
    pub time_yr: f64,
}

/// Every frame of a show, from its start to the last cue, that one's frame included.
///
/// # Errors
/// [`CueProblem`] when the sheet makes no show on this history.
pub fn frames(sheet: &[Cue], history: &History, rate: FrameRate) -> Result<Vec<ShowFrame>, CueProblem> {
    Ok(Schedule::new(sheet, history)?.frames(rate).collect())
}

impl Schedule {
    /// Every frame of the show, from its start to the last cue, that one's frame included.
    pub fn frames(&self, rate: FrameRate) -> impl Iterator<Item = ShowFrame> + '_ {
        (0..self.frame_count(rate)).map(move |number| {
            let show_time_s = rate.show_time_s(number);
            ShowFrame { number, show_time_s, time_yr: self.time_yr(show_time_s) }
        })
    }

    /// How many frames the show has.
    #[must_use]
    pub fn frame_count(&self, rate: FrameRate) -> u64 {
        (rate.frame_at(self.length_s()) + 1).min(MOST_FRAMES)
    }
}

#[cfg(test)]
mod tests {
    use super::*;
    use crate::system::cues::Transition;
    use crate::system::{MomentRequest, StarSpecification, System};

    fn history() -> History {
        History::compute(System { star: StarSpecification::default(), planets: Vec::new() }).expect("a star")
    }

    fn cue(show_time_s: f64, time_yr: f64, transition: Transition) -> Cue {
        Cue { show_time_s, moment: MomentRequest::Time(time_yr), transition, note: String::new() }
    }

    #[test]
    fn every_transition_passes_its_cues_and_never_turns_back() {
        let history = history();
        for transition in Transition::ALL {
            for (from_yr, to_yr) in [(0.0, 1e10), (1.2e10, 4e9), (5e9, 5e9)] {
                let sheet = [cue(0.0, from_yr, Transition::Cut), cue(10.0, to_yr, transition)];
                let frames = frames(&sheet, &history, FrameRate::THIRTY).expect("a show");
                assert_eq!(frames.len(), 301);
                assert_eq!((frames[0].time_yr, frames[300].time_yr), (from_yr, to_yr), "{transition:?}");
                let rises = |pair: &[ShowFrame]| (pair[1].time_yr - pair[0].time_yr) * (to_yr - from_yr) >= 0.0;
                assert!(frames.windows(2).all(rises), "{transition:?}");
            }
        }
        let steady =
            frames(&[cue(0.0, 0.0, Transition::Cut), cue(2.0, 1e10, Transition::Steady)], &history, FrameRate::THIRTY);
        assert_eq!(steady.expect("a show")[30].time_yr, 5e9);
    }

    #[test]
    fn a_cut_holds_and_jumps_and_the_order_of_rows_does_not_count() {
        let history = history();
        let sheet = [cue(1.0, 9e9, Transition::Cut), cue(0.0, 1e9, Transition::Cut)];
        let frames = frames(&sheet, &history, FrameRate::THIRTY).expect("a show");
        assert_eq!((frames[29].time_yr, frames[30].time_yr), (1e9, 9e9));
        let schedule = Schedule::new(&sheet, &history).expect("a show");
        assert_eq!((schedule.cue_at(0.5), schedule.cue_at(1.0), schedule.time_yr(99.0)), (Some(1), Some(0), 9e9));
    }

    #[test]
    fn a_sheet_that_makes_no_show_says_why() {
        let history = history();
        let refused = |sheet: &[Cue]| frames(sheet, &history, FrameRate::THIRTY).expect_err("no show").to_string();
        assert!(refused(&[]).contains("no cue"));
        assert!(refused(&[cue(-1.0, 0.0, Transition::Cut)]).contains("cue 1: the show time is -1 s"));
        assert!(refused(&[cue(1.0, 0.0, Transition::Cut), cue(1.0, 2.0, Transition::Cut)]).contains("cues 1 and 2"));
        let lost = Cue { moment: MomentRequest::Event("picnic".to_owned()), ..cue(0.0, 0.0, Transition::Cut) };
        assert!(refused(&[lost]).contains("cue 1: the event \"picnic\" does not happen here"));
    }
}
