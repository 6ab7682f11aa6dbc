//! `figure` and `sheet`: a plot and a page as files.

use super::arguments::{FigureArguments, FigureFormat, SheetArguments, SheetFormat, Sides};
use super::run::computed;
use super::streams::Streams;
use super::trouble::Trouble;
use crate::drawing::{Size, Subject, figure_svg, pdf, png};
use crate::handover;
use crate::system::{History, MomentRequest};

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

/// Most moments of one sheet.
const MOST_MOMENTS: usize = 20;

/// Writes the fact sheet asked for.
pub(super) fn sheet(arguments: &SheetArguments, streams: &mut Streams<'_>) -> Result<(), Trouble> {
    arguments.destination.check()?;
    let format = match (arguments.format, &arguments.destination.out) {
        (Some(format), _) => format,
        (None, None) => SheetFormat::Markdown,
        (None, Some(path)) => match arguments.destination.extension().as_deref() {
            Some("html" | "htm") => SheetFormat::Html,
            Some("md" | "markdown") => SheetFormat::Markdown,
            Some("txt") => SheetFormat::Text,
            _ => return Err(Trouble::NoSuchFormat { path: path.clone(), allowed: ".html, .md and .txt" }),
        },
    };
    if arguments.at.len() > MOST_MOMENTS {
        return Err(Trouble::TooManyMoments { count: arguments.at.len(), most: MOST_MOMENTS });
    }
    let requests = arguments.at.iter().map(|text| MomentRequest::parse(text)).collect::<Result<Vec<_>, _>>()?;
    let scenario = arguments.scenario.load(streams)?;
    let present_age_yr = scenario.system.star.present_age_yr;
    let about = scenario.about.clone();
    let (title, history) = computed(scenario, streams)?;
    let moments = requests.iter().map(|request| request.time_yr(&history, Some(present_age_yr)));
    let moments_yr = moments.collect::<Result<Vec<f64>, _>>()?;
    let sheet = handover::fact_sheet(&history, &title, &about, &moments_yr, format == SheetFormat::Html);
    let page = match format {
        SheetFormat::Html => handover::sheet_html(&sheet),
        SheetFormat::Markdown => handover::sheet_markdown(&sheet),
        SheetFormat::Text => handover::sheet_text(&sheet),
    };
    arguments.destination.deliver(&page, streams)
}

/// Index of the planet named, if one is.
pub(super) fn planet_of(history: &History, name: Option<&str>) -> Result<Option<usize>, Trouble> {
    let planets = &history.system().planets;
    let Some(name) = name else { return Ok(None) };
    planets.iter().position(|planet| planet.name == name).map(Some).ok_or_else(|| Trouble::NoSuchBody {
        name: name.to_owned(),
        allowed: planets.iter().map(|planet| planet.name.as_str()).collect::<Vec<_>>().join(", "),
    })
}
