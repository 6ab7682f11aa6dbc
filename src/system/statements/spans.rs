//! Spans of a body's life: phases, mild spells, time in the habitable zone.

use super::spread::Range;
use crate::physics::planet::habitable_zone::ZonePlace;
use crate::physics::star::Phase;
use crate::system::date_band::DateBand;
use crate::system::history::History;
use crate::system::mild_spans::{MildSpan, mild_spans};
use crate::system::specification::Body;

/// A span with its start, and how well its length is known.
#[derive(Clone, Copy, Debug, PartialEq)]
pub(super) struct Length {
    pub(super) span_yr: f64,
    pub(super) from_yr: Option<f64>,
    pub(super) known: Option<Range>,
}

/// Phases that are the main sequence, in all its kinds.
const MAIN_SEQUENCE: [Phase; 3] = [Phase::FullyMixedMainSequence, Phase::MainSequence, Phase::RadiativeCore];

/// How long the star stays in a phase; none if it never is in it or stays for good.
pub(super) fn duration(history: &History, phase: Phase) -> Option<(f64, f64)> {
    let is_meant = |other: Phase| other == phase || (phase == Phase::MainSequence && MAIN_SEQUENCE.contains(&other));
    let spans: Vec<_> = history.spans().iter().filter(|span| is_meant(span.phase)).collect();
    let is_last = history.spans().last().is_some_and(|last| is_meant(last.phase));
    let from_yr = spans.first()?.from_yr;
    (!is_last).then(|| (from_yr, spans.iter().map(|span| span.to_yr - span.from_yr).sum()))
}

/// How long the star shines before it leaves a remnant, or nothing.
pub(super) fn lifetime_yr(history: &History) -> Option<f64> {
    history.spans().iter().find(|span| span.phase.is_remnant()).map(|span| span.from_yr)
}

/// The mild spells of a planet within a stretch of time, all together or the longest one.
pub(super) fn mild(history: &History, index: usize, from_yr: f64, to_yr: f64, all: bool) -> Length {
    let cut = |span: &MildSpan| MildSpan { from_yr: span.from_yr.max(from_yr), until_yr: span.until_yr.min(to_yr) };
    let spans =
        mild_spans(history, index).into_iter().map(|span| cut(&span)).filter(|span| span.until_yr > span.from_yr);
    let lengths: Vec<Length> = spans.map(|span| length(history, index, &span)).collect();
    let longest = lengths.iter().copied().reduce(|best, next| if next.span_yr > best.span_yr { next } else { best });
    let Some(longest) = longest else { return Length { span_yr: 0.0, from_yr: None, known: None } };
    if !all {
        return longest;
    }
    let add = |sum: Option<f64>, next: Option<f64>| sum.zip(next).map(|(sum, next)| sum + next);
    let known = lengths.iter().map(|length| length.known).reduce(|sum, next| {
        let (sum, next) = (sum?, next?);
        Some(Range { lowest: add(sum.lowest, next.lowest), highest: add(sum.highest, next.highest) })
    });
    Length { span_yr: lengths.iter().map(|length| length.span_yr).sum(), known: known.flatten(), ..longest }
}

/// The length of a mild spell; its ends carry the bands of the events that stand there.
fn length(history: &History, index: usize, span: &MildSpan) -> Length {
    let band = |time_yr: f64| {
        let mut events = history.events().iter().filter(|event| event.body == Body::Planet(index));
        events.find(|event| event.time_yr == time_yr).and_then(|event| event.band)
    };
    let ends = |time_yr: f64| match band(time_yr) {
        Some(DateBand { earliest_yr, latest_yr }) => (earliest_yr, latest_yr),
        None => (Some(time_yr), Some(time_yr)),
    };
    let (start, end) = (ends(span.from_yr), ends(span.until_yr));
    let has_bands = band(span.from_yr).is_some() || band(span.until_yr).is_some();
    let lowest = end.0.zip(start.1).map_or(0.0, |(end_yr, start_yr)| (end_yr - start_yr).max(0.0));
    let highest = end.1.map(|end_yr| end_yr - start.0.unwrap_or(0.0));
    let known = has_bands.then_some(Range { lowest: Some(lowest), highest });
    Length { span_yr: span.until_yr - span.from_yr, from_yr: Some(span.from_yr), known }
}

/// How long a planet is inside the conservative habitable zone of a shining star within a stretch of time.
pub(super) fn zone_time(history: &History, index: usize, from_yr: f64, to_yr: f64) -> Length {
    let is_inside = |age_yr: f64| {
        history.planet_at(index, age_yr).is_some_and(|planet| planet.zone == Some(ZonePlace::Conservative))
    };
    let mut ages = vec![from_yr, to_yr];
    ages.extend(history.life().node_ages_yr());
    ages.extend(history.events().iter().filter(|event| event.body == Body::Planet(index)).map(|event| event.time_yr));
    ages.retain(|age_yr| (from_yr..=to_yr).contains(age_yr));
    ages.sort_by(f64::total_cmp);
    ages.dedup();
    let mut first = None;
    let mut span_yr = 0.0;
    for pair in ages.windows(2) {
        if is_inside(0.5 * (pair[0] + pair[1])) {
            first = first.or(Some(pair[0]));
            span_yr += pair[1] - pair[0];
        }
    }
    Length { span_yr, from_yr: first, known: None }
}
