//! `cues`: a show as one line for every frame.

use super::arguments::CuesArguments;
use super::run::computed;
use super::streams::Streams;
use super::trouble::Trouble;
use crate::handover::cue_table_csv;
use crate::system::cues::{Schedule, warnings};

/// Writes the show, and says what to know about it before an audience sees it.
pub(super) fn cues(arguments: &CuesArguments, streams: &mut Streams<'_>) -> Result<(), Trouble> {
    arguments.destination.check()?;
    let rate = arguments.fps;
    let mut scenario = arguments.scenario.load(streams)?;
    let sheet = std::mem::take(&mut scenario.cues);
    let names: Vec<String> = scenario.system.planets.iter().map(|planet| planet.name.clone()).collect();
    let index = |name: &String| {
        names
            .iter()
            .position(|known| known == name)
            .ok_or_else(|| Trouble::NoSuchBody { name: name.clone(), allowed: names.join(", ") })
    };
    let planets: Vec<usize> = if arguments.planet.is_empty() {
        (0..names.len()).collect()
    } else {
        arguments.planet.iter().map(index).collect::<Result<_, _>>()?
    };
    let (_, history) = computed(scenario, streams)?;
    let schedule = Schedule::new(&sheet, &history)?;
    for warning in warnings(&schedule, &history, rate) {
        let lead = if warning.is_harmful() { "warning: " } else { "note: " };
        streams.message(&format!("longember: {lead}{}", warning.text()));
    }
    let text = cue_table_csv(&history, &schedule, rate, &planets);
    arguments.destination.deliver(&text, streams)
}
