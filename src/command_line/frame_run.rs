//! `frames`: a show as a numbered sequence of pictures.

use super::arguments::FramesArguments;
use super::figure_run::planet_of;
use super::frame_crew::FrameJob;
use super::run::computed;
use super::streams::Streams;
use super::trouble::Trouble;
use crate::drawing::Plot;
use crate::drawing::frames::{FRAME_SIZE_RANGE_PX, FrameFormat, FrameSequence, FrameSubject, SequenceChoices};
use crate::figure::SkyView;
use crate::system::cues::{Cue, Schedule, ShowFrame, Transition};
use crate::system::{History, MomentRequest};
use std::fs;
use std::time::Instant;

/// Length of a show where nothing is said, s.
const USUAL_LENGTH_S: f64 = 30.0;

/// Draws the frames asked for.
pub(super) fn frames(arguments: &FramesArguments, streams: &mut Streams<'_>) -> Result<(), Trouble> {
    let [least, most] = FRAME_SIZE_RANGE_PX;
    if !(least..=most).contains(&arguments.size) {
        return Err(Trouble::FrameSize { size: arguments.size, least, most });
    }
    if !(0.0..=90.0).contains(&arguments.altitude) {
        return Err(Trouble::OutOfRange {
            option: "--altitude",
            value: arguments.altitude,
            allowed: "0 to 90 degrees",
        });
    }
    if let Some(field_rsun) = arguments.field.filter(|field_rsun| !(1e-6..=1e6).contains(field_rsun)) {
        return Err(Trouble::OutOfRange { option: "--field", value: field_rsun, allowed: "1e-6 to 1e6 solar radii" });
    }
    let scenario = arguments.scenario.load(streams)?;
    let (present_age_yr, cues) = (scenario.system.star.present_age_yr, scenario.cues.clone());
    let (title, history) = computed(scenario, streams)?;
    let sheet = match one_sweep(arguments, &history, present_age_yr, cues.is_empty())? {
        Some(sweep) => sweep.to_vec(),
        None => cues,
    };
    let all: Vec<ShowFrame> = Schedule::new(&sheet, &history)?.frames(arguments.fps).collect();
    let choices = SequenceChoices {
        subject: subject(arguments, &history)?,
        shape: arguments.shape.0,
        width_px: arguments.size,
        field_rsun: arguments.field,
        is_for_light: arguments.format.0 == FrameFormat::Exr,
    };
    let moments_yr: Vec<f64> = all.iter().map(|frame| frame.time_yr).collect();
    let sequence = FrameSequence::new(&history, &title, choices, &moments_yr);
    let part = arguments.part.of(&all);
    let folder = &arguments.out;
    fs::create_dir_all(folder).map_err(|source| Trouble::Folder { path: folder.clone(), source })?;
    let job = FrameJob {
        sequence: &sequence,
        frames: part,
        folder,
        format: arguments.format.0,
        shape: arguments.shape.0,
        width_px: arguments.size,
        force: arguments.force,
    };
    let begun = Instant::now();
    let count = part.len().max(1);
    let mut shown = None;
    let tally = job.carry_out(|done| {
        let percent = (100 * done / count) as u32;
        if shown != Some(percent) {
            shown = Some(percent);
            streams.progress(percent);
        }
    });
    streams.end_progress();
    let tally = tally?;
    let rate = tally.drawn as f64 / begun.elapsed().as_secs_f64().max(1e-3);
    streams.message(&format!(
        "{} frames of {} in {}: {} drawn at {rate:.1} a second, {} kept",
        part.len(),
        all.len(),
        folder.display(),
        tally.drawn,
        tally.kept
    ));
    if tally.empty > 0 {
        streams.message(&format!(
            "{} of them are black: nothing glows or stands in the sky there. Fade to them and from them.",
            tally.empty
        ));
    }
    Ok(())
}

/// The show that the arguments describe by themselves: from one moment to another. Nothing where the scenario's cues do.
fn one_sweep(
    arguments: &FramesArguments,
    history: &History,
    present_age_yr: f64,
    has_no_cues: bool,
) -> Result<Option<[Cue; 2]>, Trouble> {
    let is_described = arguments.from.is_some() || arguments.to.is_some() || arguments.seconds.is_some();
    if !is_described && !has_no_cues {
        return Ok(None);
    }
    let moment_yr = |end, text: &Option<String>, otherwise_yr: f64| {
        let request = text.as_deref().map(MomentRequest::parse).transpose();
        let time_yr = request.and_then(|request| {
            request.map_or(Ok(otherwise_yr), |request| request.time_yr(history, Some(present_age_yr)))
        });
        time_yr.map_err(|problem| Trouble::TableEnd { end, problem })
    };
    let from_yr = moment_yr("from", &arguments.from, 0.0)?;
    let to_yr = moment_yr("to", &arguments.to, history.shown_until_yr())?;
    let cue = |show_time_s, time_yr, transition| Cue {
        show_time_s,
        moment: MomentRequest::Time(time_yr),
        transition,
        note: String::new(),
    };
    let end = cue(arguments.seconds.unwrap_or(USUAL_LENGTH_S), to_yr, arguments.pace.0);
    Ok(Some([cue(0.0, from_yr, Transition::Cut), end]))
}

fn subject(arguments: &FramesArguments, history: &History) -> Result<FrameSubject, Trouble> {
    let named = planet_of(history, arguments.planet.as_deref())?;
    Ok(match &arguments.subject.subject {
        FrameSubject::Sky { .. } => {
            if history.system().planets.is_empty() {
                return Err(Trouble::NoPlanet);
            }
            let view = SkyView { altitude_deg: arguments.altitude, ..SkyView::default() };
            let planet = named.unwrap_or_else(|| Plot::Sky.usual_planet(&history.system().planets));
            FrameSubject::Sky { planet, view }
        }
        FrameSubject::Figure { plot, .. } => FrameSubject::Figure { plot: plot.clone(), planet: named },
        FrameSubject::Star => FrameSubject::Star,
    })
}
