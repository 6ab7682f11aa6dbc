//! `figure`: a plot as a file.

use super::arguments::{FigureArguments, FigureFormat, Sides};
use super::run::computed;
use super::streams::Streams;
use super::trouble::Trouble;
use crate::drawing::{Size, Subject, figure_svg, pdf, png};
use crate::system::{Air, History, MomentRequest};

/// Draws the figure asked for.
pub(super) fn figure(arguments: &FigureArguments, streams: &mut Streams<'_>) -> Result<(), Trouble> {
    arguments.destination.check()?;
    let format = format_of(arguments)?;
    let plot = &arguments.plot.plot;
    let size = match arguments.size {
        Some(Sides([width, height])) => Size::new(width, height)?,
        None => plot.usual_size(),
    };
    let request = MomentRequest::parse(&arguments.at)?;
    let scenario = arguments.scenario.load(streams)?;
    let present_age_yr = scenario.system.star.present_age_yr;
    let (title, history) = computed(scenario, streams)?;
    let subject = Subject {
        planet: planet_of(&history, arguments.planet.as_deref())?,
        scale: arguments.scale.0,
        ..Subject::new(&history, &title, request.time_yr(&history, Some(present_age_yr))?)
    };
    let svg = figure_svg(&subject, plot, size, arguments.theme.0, "figure");
    match format {
        FigureFormat::Svg => arguments.destination.deliver(&svg, streams),
        FigureFormat::Pdf => arguments.destination.deliver_bytes(&pdf(&svg)?, streams),
        FigureFormat::Png => arguments.destination.deliver_bytes(&png(&svg, size)?, streams),
    }
}

/// The form asked for, by name or by the end of the file's name.
fn format_of(arguments: &FigureArguments) -> Result<FigureFormat, Trouble> {
    match (arguments.format, &arguments.destination.out) {
        (Some(format), _) => Ok(format),
        (None, None) => Ok(FigureFormat::Svg),
        (None, Some(path)) => match arguments.destination.extension().as_deref() {
            Some("svg") => Ok(FigureFormat::Svg),
            Some("pdf") => Ok(FigureFormat::Pdf),
            Some("png") => Ok(FigureFormat::Png),
            _ => Err(Trouble::NoSuchFormat { path: path.clone(), allowed: ".svg, .pdf and .png" }),
        },
    }
}

/// Index of the planet named, or of the first with air, or of the first.
pub(super) fn planet_of(history: &History, name: Option<&str>) -> Result<usize, Trouble> {
    let planets = &history.system().planets;
    let Some(name) = name else {
        return Ok(planets.iter().position(|planet| planet.air != Air::None).unwrap_or(0));
    };
    planets.iter().position(|planet| planet.name == name).ok_or_else(|| Trouble::NoSuchBody {
        name: name.to_owned(),
        allowed: planets.iter().map(|planet| planet.name.as_str()).collect::<Vec<_>>().join(", "),
    })
}
