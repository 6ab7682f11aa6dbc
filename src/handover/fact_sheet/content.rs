//! What stands on a fact sheet, whatever it is written as.

use super::chronicle;
use super::marks::{GIVEN, Marks};
use crate::drawing::{Look, Plot, Size, Subject, figure_svg};
use crate::handover::instant_text::gathered_notes;
use crate::handover::remarks::percent;
use crate::system::planet_light::USUAL_ALTITUDE_DEG;
use crate::system::provenance::Method;
use crate::system::quantities::{PLANET, STAR};
use crate::system::{History, LightReader, Moment, PlanetSpecification, StarMoment};
use crate::units::number_text::number;
use crate::units::time_words::{SpanStyle, span};

/// Digits of inputs: as they were typed, as far as people type.
const INPUT_DIGITS: usize = 5;
/// Width and height of the figures of a sheet.
const FIGURE_SIZE: (u32, u32) = (960, 480);

/// Planets side by side in one table at most.
pub(super) const PLANETS_ACROSS: usize = 5;

/// A fact sheet.
#[derive(Clone, Debug)]
pub struct FactSheet {
    pub(super) title: String,
    /// The scenario's own words, paragraph by paragraph.
    pub(super) about: Vec<String>,
    pub(super) star: String,
    pub(super) inputs: Vec<Group>,
    pub(super) moments: Vec<MomentSheet>,
    pub(super) cautions: Vec<String>,
    /// Source lines; a figure's mark is the place of its line, counted from 1.
    pub(super) sources: Vec<&'static Method>,
    pub(super) program: String,
}

/// Figures of one body.
#[derive(Clone, Debug)]
pub(super) struct Group {
    pub(super) name: String,
    /// Phase, colour or state in words.
    pub(super) words: String,
    pub(super) figures: Vec<SheetFigure>,
}

/// One figure with its source mark.
#[derive(Clone, Debug)]
pub(super) struct SheetFigure {
    pub(super) name: &'static str,
    /// Value with its unit.
    pub(super) value: String,
    /// How far the method typically is from what it was made from.
    pub(super) spread: Option<String>,
    pub(super) mark: usize,
}

/// An event near a moment.
#[derive(Clone, Debug)]
pub(super) struct Dated {
    pub(super) date: String,
    pub(super) what: String,
    pub(super) doubt: Option<String>,
    pub(super) is_past: bool,
    pub(super) mark: usize,
}

/// Everything about one moment.
#[derive(Clone, Debug)]
pub(super) struct MomentSheet {
    pub(super) time: String,
    pub(super) star: Group,
    pub(super) planets: Vec<Group>,
    pub(super) chronicle: Vec<Dated>,
    pub(super) notes: Vec<String>,
    /// Each figure in both looks.
    pub(super) drawings: Vec<[String; 2]>,
}

/// Gathers the sheet of a scenario at moments, yr. Figures are drawn where the sheet is to show them.
#[must_use]
pub fn fact_sheet(history: &History, title: &str, about: &str, moments_yr: &[f64], with_drawings: bool) -> FactSheet {
    let mut marks = Marks::default();
    let inputs = inputs(history, &mut marks);
    let reader = LightReader::new(history, USUAL_ALTITUDE_DEG);
    let moments: Vec<MomentSheet> = moments_yr
        .iter()
        .enumerate()
        .map(|(index, time_yr)| {
            let moment = history.moment(*time_yr);
            let light = reader.at(&moment);
            MomentSheet {
                time: span(moment.time_yr, 4, SpanStyle::Words),
                star: star(&history.system().star.name, &moment.star, &mut marks),
                planets: planets(&moment, &mut marks),
                chronicle: chronicle::around(history, moment.time_yr, &mut marks),
                notes: gathered_notes(history, &moment, &light, false),
                drawings: if with_drawings { drawings(history, title, moment.time_yr, index) } else { Vec::new() },
            }
        })
        .collect();
    FactSheet {
        title: title.to_owned(),
        about: about.split('\n').map(str::trim).filter(|line| !line.is_empty()).map(str::to_owned).collect(),
        star: history.system().star.name.clone(),
        inputs,
        moments,
        cautions: cautions(history),
        sources: marks.lines(),
        program: format!("Longember {}", env!("CARGO_PKG_VERSION")),
    }
}

/// Every name of a figure of some bodies, once.
pub(super) fn figure_names(groups: &[Group]) -> Vec<&'static str> {
    let mut names = Vec::new();
    for figure in groups.iter().flat_map(|group| &group.figures) {
        if !names.contains(&figure.name) {
            names.push(figure.name);
        }
    }
    names
}

fn with_unit(value: f64, digits: usize, symbol: &str) -> String {
    let figure = number(value, digits);
    match symbol {
        "" => figure,
        "°" => format!("{figure}°"),
        _ => format!("{figure} {symbol}"),
    }
}

/// A number as it was given: no more digits than it has.
fn as_given(value: f64, symbol: &str) -> String {
    let decimals = (0..INPUT_DIGITS + 4)
        .find(|decimals| (value - format!("{value:.decimals$}").parse().unwrap_or(value)).abs() <= 1e-9 * value.abs());
    let figure = match decimals {
        Some(decimals) if value.abs() < 1e7 => crate::units::number_text::fixed(value, decimals),
        _ => number(value, INPUT_DIGITS),
    };
    match symbol {
        "" => figure,
        "°" => format!("{figure}°"),
        _ => format!("{figure} {symbol}"),
    }
}

fn inputs(history: &History, marks: &mut Marks) -> Vec<Group> {
    let system = history.system();
    let mark = marks.of(GIVEN);
    let given = |name, value: String| SheetFigure { name, value, spread: None, mark };
    let star = Group {
        name: system.star.name.clone(),
        words: "star".to_owned(),
        figures: vec![
            given("Mass at birth", as_given(system.star.mass_msun, "M☉")),
            given("Metallicity [Fe/H]", as_given(system.star.metallicity_dex, "dex")),
            given("Present age", span(system.star.present_age_yr, 4, SpanStyle::Symbols)),
        ],
    };
    let planet = |planet: &PlanetSpecification| Group {
        name: planet.name.clone(),
        words: "planet".to_owned(),
        figures: vec![
            given("Semi-major axis at birth", as_given(planet.semi_major_axis_au, "au")),
            given("Eccentricity", as_given(planet.eccentricity, "")),
            given("Mass", as_given(planet.mass_mearth, "M⊕")),
            given("Radius", as_given(planet.radius_rearth, "R⊕")),
            given("Bond albedo", as_given(planet.bond_albedo, "")),
        ],
    };
    std::iter::once(star).chain(system.planets.iter().map(planet)).collect()
}

/// The method that a figure of the star has at a moment: the life of a red dwarf is computed, that of a remnant is
/// another one again.
fn method_at(star: &StarMoment, method: &'static str) -> &'static str {
    match method {
        "star_life" if star.interior.is_some() => "red_dwarf",
        "star_life" if star.phase.is_white_dwarf() => "white_dwarf",
        "star_life" if star.phase.is_remnant() => "remnant",
        other => other,
    }
}

fn star(name: &str, star: &StarMoment, marks: &mut Marks) -> Group {
    let mut figures: Vec<SheetFigure> = STAR
        .iter()
        .filter_map(|quantity| {
            Some(SheetFigure {
                name: quantity.name,
                value: with_unit((quantity.value)(star)?, quantity.digits, quantity.symbol),
                spread: (quantity.spread)(star).map(percent),
                mark: marks.of(method_at(star, quantity.method)),
            })
        })
        .collect();
    if let Some(swatch) = star.swatch.as_ref().filter(|swatch| swatch.chromaticity.is_some()) {
        let value = format!("{}, {}", star.colour, swatch.hex());
        figures.push(SheetFigure { name: "Colour", value, spread: None, mark: marks.of("blackbody") });
    }
    Group { name: name.to_owned(), words: star.phase.name().to_owned(), figures }
}

fn planets(moment: &Moment, marks: &mut Marks) -> Vec<Group> {
    let mut of = |planet: &crate::system::PlanetMoment| Group {
        name: planet.name.clone(),
        words: planet.state.name().to_owned(),
        figures: PLANET
            .iter()
            .filter_map(|quantity| {
                Some(SheetFigure {
                    name: quantity.name,
                    value: with_unit((quantity.value)(planet)?, quantity.digits, quantity.symbol),
                    spread: None,
                    mark: marks.of(quantity.method),
                })
            })
            .collect(),
    };
    moment.planets.iter().map(&mut of).collect()
}

/// The ribbon at every moment; what runs over the whole life once.
fn drawings(history: &History, title: &str, moment_yr: f64, index: usize) -> Vec<[String; 2]> {
    let has_planets = !history.system().planets.is_empty();
    let names: &[&str] = match (index, has_planets) {
        (0, true) => &["life_strip", "planet_temperatures", "distance"],
        (0, false) => &["life_strip", "luminosity"],
        _ => &["life_strip"],
    };
    let subject = Subject::new(history, title, moment_yr);
    let size = Size::new(FIGURE_SIZE.0, FIGURE_SIZE.1).unwrap_or_default();
    let drawn = |name: &&str| {
        let plot = Plot::from_key(name)?;
        let look = |look: Look| figure_svg(&subject, &plot, size, look, &format!("f{index}-{name}-{}", look.key()));
        Some(Look::ALL.map(look))
    };
    names.iter().filter_map(drawn).collect()
}

fn cautions(history: &History) -> Vec<String> {
    let mut found = vec![
        "Figures carry the spread and the range of their methods, which the source lines state; dates are counted from the star's arrival on the main sequence.".to_owned(),
        "Never look at the Sun, and never let an audience try, without a filter made for it; no star in another sky is safer for looking dim or low.".to_owned(),
    ];
    found.extend(history.dates_remark().map(str::to_owned));
    found
}
