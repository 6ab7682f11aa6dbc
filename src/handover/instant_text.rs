//! Everything at one moment as a page for people.

use super::bodies::body_name;
use super::lines::{WIDTH, padded, push_columns, push_wrapped, width};
use super::remarks::{ABSENT, Remark, SPREAD, percent, remarks};
use crate::system::quantities::{PLANET, STAR, planet_quantity, star_quantity};
use crate::system::specification::Body;
use crate::system::{History, Moment, PlanetMoment, StarMoment};
use crate::units::number_text::{fixed, number};
use crate::units::time_words::{SpanStyle, span};

/// What stands where there is no value.
const NONE: &str = "–";
/// Least width of the labels, so that star and planets line up.
const LABEL_WIDTH: usize = 19;

/// A moment as text of at most 80 columns: the star, the planets side by side, then the notes.
#[must_use]
pub fn instant_text(history: &History, title: &str, moment: &Moment) -> String {
    let mut page = String::new();
    push_wrapped(&mut page, "", title);
    let time = span(moment.time_yr, 4, SpanStyle::Words);
    push_wrapped(&mut page, "", &format!("{time} after the star reached the main sequence"));
    page.push('\n');
    push_star(&mut page, &history.system().star.name, &moment.star);
    push_planets(&mut page, &moment.planets);
    push_notes(&mut page, history, moment);
    page
}

fn push_star(page: &mut String, name: &str, star: &StarMoment) {
    push_wrapped(page, "", name);
    // Words stand in lines of their own, so that long ones do not push the column of spreads away.
    push_columns(page, 2, &[vec![padded("Phase", LABEL_WIDTH), star.phase.name().to_owned()]]);
    let figures: Vec<Vec<String>> = STAR
        .iter()
        .map(|quantity| {
            let value = (quantity.value)(star);
            let spread = value.and((quantity.spread)(star));
            vec![
                padded(quantity.name, LABEL_WIDTH),
                with_unit(value, quantity.digits, quantity.symbol),
                spread.map_or_else(String::new, |spread| format!("± {}", percent(spread))),
            ]
        })
        .collect();
    push_columns(page, 2, &figures);
    push_columns(page, 2, &[vec![padded("Colour", LABEL_WIDTH), colour(star)]]);
}

fn colour(star: &StarMoment) -> String {
    match star.swatch.as_ref().and_then(|swatch| Some((swatch, swatch.chromaticity?))) {
        Some((swatch, [x, y])) => format!("{}, {}, x {} y {}", star.colour, swatch.hex(), fixed(x, 4), fixed(y, 4)),
        None => star.colour.to_owned(),
    }
}

/// The planets side by side, as many as fit, then the next ones below.
fn push_planets(page: &mut String, planets: &[PlanetMoment]) {
    let labels: Vec<String> = std::iter::once("Planet".to_owned())
        .chain(["  State".to_owned()])
        .chain(PLANET.iter().map(|quantity| label(quantity.name, quantity.symbol)))
        .chain(["  Zone".to_owned()])
        .map(|label| padded(&label, LABEL_WIDTH + 2))
        .collect();
    let columns: Vec<Vec<String>> = planets.iter().map(planet_column).collect();
    let mut rest = columns.as_slice();
    while !rest.is_empty() {
        let fitting = fitting_count(rest);
        let (block, later) = rest.split_at(fitting);
        let rows: Vec<Vec<String>> = labels
            .iter()
            .enumerate()
            .map(|(row, label)| {
                std::iter::once(label.clone()).chain(block.iter().map(|column| column[row].clone())).collect()
            })
            .collect();
        page.push('\n');
        push_columns(page, 0, &rows);
        rest = later;
    }
}

/// How many of the columns fit beside the labels; at least one.
fn fitting_count(columns: &[Vec<String>]) -> usize {
    let mut used = LABEL_WIDTH + 2;
    let widths = columns.iter().map(|column| column.iter().map(|cell| width(cell)).max().unwrap_or(0));
    let fitting = widths
        .take_while(|column_width| {
            used += column_width + 2;
            used <= WIDTH
        })
        .count();
    fitting.max(1)
}

fn planet_column(planet: &PlanetMoment) -> Vec<String> {
    let figures = PLANET.iter().map(|quantity| {
        (quantity.value)(planet).map_or_else(|| NONE.to_owned(), |value| number(value, quantity.digits))
    });
    std::iter::once(planet.name.clone())
        .chain([planet.state.name().to_owned()])
        .chain(figures)
        .chain([planet.zone.map_or(NONE, |zone| zone.name()).to_owned()])
        .collect()
}

fn label(name: &str, symbol: &str) -> String {
    if symbol.is_empty() { format!("  {name}") } else { format!("  {name}, {symbol}") }
}

fn with_unit(value: Option<f64>, digits: usize, symbol: &str) -> String {
    match value {
        Some(value) => format!("{} {symbol}", number(value, digits)).trim_end().to_owned(),
        None => NONE.to_owned(),
    }
}

/// The notes, with the reasons for missing values gathered so that each reason stands once.
fn push_notes(page: &mut String, history: &History, moment: &Moment) {
    let remarks = remarks(moment);
    let mut lines: Vec<String> = Vec::new();
    for remark in remarks.iter().filter(|remark| remark.kind != SPREAD && remark.kind != ABSENT) {
        let line = match remark.body {
            Body::Star => format!("{}: {}", named(remark), remark.text),
            // A planet's notes begin with its name.
            Body::Planet(_) => remark.text.clone(),
        };
        if !lines.contains(&line) {
            lines.push(line);
        }
    }
    let absent: Vec<&Remark> = remarks.iter().filter(|remark| remark.kind == ABSENT).collect();
    let mut gathered: Vec<(Body, &str, Vec<String>)> = Vec::new();
    for remark in absent {
        match gathered.iter_mut().find(|(body, text, _)| *body == remark.body && *text == remark.text) {
            Some((_, _, names)) => names.push(named(remark)),
            None => gathered.push((remark.body, &remark.text, vec![named(remark)])),
        }
    }
    for (body, text, names) in gathered {
        let of = if body == Body::Star { String::new() } else { format!("{}: ", body_name(history, body)) };
        lines.push(format!("{of}{}: {text}", names.join(", ")));
    }
    if lines.is_empty() {
        return;
    }
    page.push_str("\nNotes\n");
    for line in lines {
        push_wrapped(page, "  - ", &line);
    }
}

/// The figure a remark is about, as the page names it.
fn named(remark: &Remark) -> String {
    let name = match remark.body {
        Body::Star => star_quantity(remark.about).map(|quantity| quantity.name),
        Body::Planet(_) => planet_quantity(remark.about).map(|quantity| quantity.name),
    };
    match name {
        Some(name) => name.to_owned(),
        None if remark.about == "time_yr" => "Time".to_owned(),
        None => remark.about.replace('_', " "),
    }
}
