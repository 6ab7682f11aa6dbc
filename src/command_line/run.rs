//! A command from its words to its exit code.

use super::arguments::{
    Arguments, Command, DemoArguments, EventsArguments, EventsFormat, PageFormat, SourcesArguments, StarArguments,
    StateArguments, TableArguments, TableFormat,
};
use super::check::check;
use super::cues;
use super::figure_run;
use super::frame_run;
use super::outcome::{DONE, Outcome, WRONG_USAGE};
use super::scenario_source::{ScenarioSource, find_demo};
use super::streams::Streams;
use super::trouble::Trouble;
use crate::document::{LifeStore, Scenario, built_in};
use crate::handover::{self, TableRequest};
use crate::system::{Body, EventFilter, EventGroup, History, MomentProblem, MomentRequest, StarSpecification, System};
use crate::units::number_text::machine;
use clap::Parser;
use std::ffi::OsString;
use std::io::{self, IsTerminal};
use std::ops::ControlFlow;
use std::time::{Duration, Instant};

/// Rows of a table where nothing is said.
const TABLE_POINTS: usize = 400;

/// Computations shorter than this show no progress.
const WORTH_SHOWING: Duration = Duration::from_millis(300);

/// Runs a command line, the program's own name first, on the standard streams of the process.
///
/// Without a sub-command nothing is computed and [`Outcome::OpenWindow`] says what to open.
pub fn run(arguments: impl IntoIterator<Item = OsString>) -> Outcome {
    let shows_progress = io::stderr().is_terminal();
    let streams = &mut Streams {
        input: &mut io::stdin(),
        results: &mut io::stdout(),
        messages: &mut io::stderr(),
        shows_progress,
    };
    run_with(arguments, streams)
}

/// Runs a command line on the given streams.
pub fn run_with(arguments: impl IntoIterator<Item = OsString>, streams: &mut Streams<'_>) -> Outcome {
    match Arguments::try_parse_from(arguments) {
        Err(error) => Outcome::Done(tell_about_words(&error, streams)),
        Ok(Arguments { command: None, scenario, graphics }) => match openable(scenario) {
            Ok(scenario) => Outcome::OpenWindow { scenario, graphics },
            Err(trouble) => Outcome::Done(tell(&trouble, streams)),
        },
        Ok(Arguments { command: Some(command), .. }) => Outcome::Done(match carry_out(command, streams) {
            Ok(code) => code,
            Err(trouble) => tell(&trouble, streams),
        }),
    }
}

/// Help and version are results; everything else the parser says is a message.
fn tell_about_words(error: &clap::Error, streams: &mut Streams<'_>) -> u8 {
    let text = error.render().to_string();
    if error.use_stderr() {
        streams.message(&text);
        return WRONG_USAGE;
    }
    match streams.result(&text) {
        Ok(()) => DONE,
        Err(error) => tell(&Trouble::StandardOutput(error), streams),
    }
}

fn tell(trouble: &Trouble, streams: &mut Streams<'_>) -> u8 {
    // A scenario with several problems gets one line for each.
    for line in trouble.to_string().lines() {
        streams.message(&format!("longember: {line}"));
    }
    trouble.exit_code()
}

/// Refuses what the window could not open anyway, while there is still a terminal to say so.
fn openable(scenario: Option<ScenarioSource>) -> Result<Option<ScenarioSource>, Trouble> {
    match &scenario {
        Some(ScenarioSource::StandardInput) => return Err(Trouble::WindowFromStandardInput),
        Some(ScenarioSource::Demo(name)) => {
            find_demo(name)?;
        }
        Some(ScenarioSource::File(path)) if !path.exists() => {
            return Err(Trouble::NothingToOpen { path: path.clone() });
        }
        Some(ScenarioSource::File(_)) | None => {}
    }
    Ok(scenario)
}

/// Carries a command out and returns its exit code.
fn carry_out(command: Command, streams: &mut Streams<'_>) -> Result<u8, Trouble> {
    let done = match command {
        Command::Check(arguments) => return check(&arguments, streams),
        Command::State(arguments) => state(&arguments, streams),
        Command::Star(arguments) => star(&arguments, streams),
        Command::Table(arguments) => table(&arguments, streams),
        Command::Events(arguments) => events(&arguments, streams),
        Command::Figure(arguments) => figure_run::figure(&arguments, streams),
        Command::Sheet(arguments) => figure_run::sheet(&arguments, streams),
        Command::Frames(arguments) => frame_run::frames(&arguments, streams),
        Command::Cues(arguments) => cues::cues(&arguments, streams),
        Command::Demo(arguments) => demo(&arguments, streams),
        Command::Sources(arguments) => sources(&arguments, streams),
    };
    done.map(|()| DONE)
}

fn state(arguments: &StateArguments, streams: &mut Streams<'_>) -> Result<(), Trouble> {
    let request = MomentRequest::parse(&arguments.at)?;
    let scenario = arguments.scenario.load(streams)?;
    let present_age_yr = scenario.system.star.present_age_yr;
    let (title, history) = computed(scenario, streams)?;
    let time_yr = request.time_yr(&history, Some(present_age_yr))?;
    show_moment(&history, &title, time_yr, arguments.format, streams)
}

fn star(arguments: &StarArguments, streams: &mut Streams<'_>) -> Result<(), Trouble> {
    let request = MomentRequest::parse(&arguments.at)?;
    let star = StarSpecification {
        mass_msun: arguments.mass,
        metallicity_dex: arguments.metallicity,
        ..StarSpecification::default()
    };
    let history = history_of(System { star, planets: Vec::new() }, streams)?;
    let time_yr = request.time_yr(&history, None)?;
    let mass = machine(arguments.mass).unwrap_or_default();
    let metallicity = machine(arguments.metallicity).unwrap_or_default();
    let title = format!("A star of {mass} M☉ at birth, [Fe/H] {metallicity} dex");
    show_moment(&history, &title, time_yr, arguments.format, streams)
}

fn show_moment(
    history: &History,
    title: &str,
    time_yr: f64,
    format: PageFormat,
    streams: &mut Streams<'_>,
) -> Result<(), Trouble> {
    let moment = history.moment(time_yr);
    let text = match format {
        PageFormat::Text => handover::instant_text(history, title, &moment),
        PageFormat::Json => handover::instant_json(history, &moment),
    };
    streams.result(&text).map_err(Trouble::StandardOutput)
}

fn table(arguments: &TableArguments, streams: &mut Streams<'_>) -> Result<(), Trouble> {
    arguments.destination.check()?;
    if arguments.spacing.0.is_none() && arguments.points.is_some() {
        return Err(Trouble::OptionNeeds { option: "--points", needs: "a spacing other than nodes" });
    }
    let end = |end, problem| Trouble::TableEnd { end, problem };
    let requested = |name, text: &Option<String>| {
        text.as_deref().map(MomentRequest::parse).transpose().map_err(|problem| end(name, problem))
    };
    let (from, to) = (requested("from", &arguments.from)?, requested("to", &arguments.to)?);
    let scenario = arguments.scenario.load(streams)?;
    let present_age_yr = scenario.system.star.present_age_yr;
    let (title, history) = computed(scenario, streams)?;
    let resolved = |name, request: Option<MomentRequest>| {
        let time_yr =
            |request: MomentRequest| -> Result<f64, MomentProblem> { request.time_yr(&history, Some(present_age_yr)) };
        request.map(time_yr).transpose().map_err(|problem| end(name, problem))
    };
    let (from_yr, to_yr) = (resolved("from", from)?, resolved("to", to)?);
    let ages_yr = match arguments.spacing.0 {
        Some(scale) => handover::table_ages(&history, from_yr, to_yr, arguments.points.unwrap_or(TABLE_POINTS), scale)?,
        None => handover::node_ages(&history, from_yr, to_yr)?,
    };
    let chosen = match arguments.columns.as_slice() {
        [] => None,
        names => Some(handover::chosen_columns(history.system(), names)?),
    };
    let by_extension = || match arguments.destination.extension().as_deref() {
        Some("json") => TableFormat::Json,
        Some("ecsv") => TableFormat::Ecsv,
        _ => TableFormat::Csv,
    };
    let request = TableRequest { chosen, ..TableRequest::whole(&history, &title, &ages_yr) };
    let text = match arguments.format.unwrap_or_else(by_extension) {
        TableFormat::Csv => handover::table_csv(&request),
        TableFormat::Ecsv => handover::table_ecsv(&request),
        TableFormat::Json => handover::table_json(&request),
    };
    arguments.destination.deliver(&text, streams)
}

fn events(arguments: &EventsArguments, streams: &mut Streams<'_>) -> Result<(), Trouble> {
    arguments.destination.check()?;
    let scenario = arguments.scenario.load(streams)?;
    let (title, history) = computed(scenario, streams)?;
    let filter = event_filter(arguments, &history)?;
    let by_extension = || match arguments.destination.extension().as_deref() {
        Some("json") => EventsFormat::Json,
        Some("csv") => EventsFormat::Csv,
        _ => EventsFormat::Text,
    };
    let text = match arguments.format.unwrap_or_else(by_extension) {
        EventsFormat::Text => handover::events_text(&history, &title, &filter),
        EventsFormat::Csv => handover::events_csv(&history, &filter),
        EventsFormat::Json => handover::events_json(&history, &filter),
    };
    arguments.destination.deliver(&text, streams)
}

/// The events that the arguments ask for.
fn event_filter(arguments: &EventsArguments, history: &History) -> Result<EventFilter, Trouble> {
    let planets = &history.system().planets;
    let body = |name: &String| {
        let planet = planets.iter().position(|planet| planet.name == *name).map(Body::Planet);
        planet.or_else(|| (name == "star").then_some(Body::Star)).ok_or_else(|| Trouble::NoSuchBody {
            name: name.clone(),
            allowed: std::iter::once("star")
                .chain(planets.iter().map(|planet| planet.name.as_str()))
                .collect::<Vec<_>>()
                .join(", "),
        })
    };
    let body = arguments.body.as_ref().map(body).transpose()?;
    let is_hidden =
        |group: &EventGroup| !arguments.kind.is_empty() && !arguments.kind.iter().any(|wanted| wanted.0 == *group);
    Ok(EventFilter { body, hidden: EventGroup::ALL.into_iter().filter(is_hidden).collect() })
}

fn demo(arguments: &DemoArguments, streams: &mut Streams<'_>) -> Result<(), Trouble> {
    if let Some(name) = &arguments.name {
        arguments.destination.check()?;
        return arguments.destination.deliver(find_demo(name)?.text, streams);
    }
    if arguments.destination.out.is_some() {
        return Err(Trouble::OptionNeeds { option: "--out", needs: "NAME" });
    }
    arguments.destination.check()?;
    let titles = built_in::all().iter().map(|built_in| {
        let scenario = built_in.scenario().map_err(|problems| Trouble::BuiltIn { problems })?;
        Ok((built_in.name, scenario.title))
    });
    let titles: Vec<(&str, String)> = titles.collect::<Result<_, Trouble>>()?;
    streams.result(&handover::named_list(&titles)).map_err(Trouble::StandardOutput)
}

fn sources(arguments: &SourcesArguments, streams: &mut Streams<'_>) -> Result<(), Trouble> {
    let text = match arguments.format {
        PageFormat::Text => handover::sources_text(),
        PageFormat::Json => handover::sources_json(),
    };
    streams.result(&text).map_err(Trouble::StandardOutput)
}

pub(super) fn computed(scenario: Scenario, streams: &mut Streams<'_>) -> Result<(String, History), Trouble> {
    Ok((scenario.title, history_of(scenario.system, streams)?))
}

/// Computes a history and shows how far it is once that takes longer than a moment.
fn history_of(system: System, streams: &mut Streams<'_>) -> Result<History, Trouble> {
    let begun = Instant::now();
    let mut shown = None;
    let computed = LifeStore::of_user().history(None, system, &mut |share| {
        let percent = (0..=100).take_while(|percent| f64::from(*percent) <= 100.0 * share).last();
        if percent != shown && begun.elapsed() > WORTH_SHOWING {
            shown = percent;
            streams.progress(percent.unwrap_or(0));
        }
        ControlFlow::Continue(())
    });
    if shown.is_some() {
        streams.end_progress();
    }
    Ok(computed?)
}
