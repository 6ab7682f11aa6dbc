//! Which body and which quantity the words of a line mean.

use super::line_problem::LineFault;
use super::phrases::starts_with_words;
use super::quantity::{
    FigureKey, Quantity, figures_of_planet, figures_of_star, other_words, phase_words, planet_figures, star_figures,
    words_of,
};
use super::statement::Subject;
use crate::physics::star::Phase;
use crate::system::specification::System;
use crate::units::likeness::likest;

/// The planet of a name, whatever its case where that is clear.
pub(super) fn planet_named<'s>(system: &'s System, name: &str) -> Option<&'s str> {
    let names = || system.planets.iter().map(|planet| planet.name.as_str());
    let same = |known: &&str| known.to_lowercase() == name.to_lowercase();
    names().find(|known| *known == name).or_else(|| names().find(same))
}

/// The body at the start of a text, and how many bytes its name takes: the longest name that fits.
pub(super) fn subject_at(system: &System, text: &str) -> Option<(Subject, usize)> {
    let planets = system.planets.iter().filter_map(|planet| {
        let used = if text.starts_with(&planet.name) {
            Some(planet.name.len())
        } else {
            starts_with_words(text, planet.name.trim())
        };
        let is_whole = |used: &usize| !text[*used..].starts_with(char::is_alphanumeric);
        Some((Subject::Planet(planet.name.clone()), used.filter(is_whole)?))
    });
    let star = ["star", "the star", system.star.name.trim()];
    let star = star
        .into_iter()
        .filter(|name| !name.is_empty())
        .filter_map(|name| Some((Subject::Star, starts_with_words(text, name)?)));
    // The word "star" means the star, whatever a planet is called.
    star.chain(planets).reduce(|best, next| if next.1 > best.1 { next } else { best })
}

/// The fault of a body that is not there.
pub(super) fn no_body(system: &System, found: String) -> LineFault {
    let mut names = vec!["star"];
    names.extend(system.planets.iter().map(|planet| planet.name.as_str()));
    let likely = likest(&found, &names).map(str::to_owned);
    LineFault::NoSuchBody { allowed: names.join(", "), likely, found }
}

/// The quantity at the start of a text, and how many bytes its words take.
///
/// # Errors
/// Where the fault is, in bytes, and what it is.
pub(super) fn quantity_at(subject: &Subject, text: &str) -> Result<(Quantity, usize), (usize, LineFault)> {
    for (words, quantity) in whole_life(subject) {
        if let Some(used) = starts_with_words(text, words) {
            return Ok((quantity, used));
        }
    }
    let is_star = *subject == Subject::Star;
    if let Some(used) = ["duration of the", "duration of", "time in the phase"]
        .into_iter()
        .find_map(|words| starts_with_words(text, words))
        .filter(|_| is_star)
    {
        return phase_at(text, used);
    }
    for (choices, quantity) in [(HIGHEST, Quantity::Highest as fn(FigureKey) -> Quantity), (LOWEST, Quantity::Lowest)] {
        let used = choices.iter().find_map(|words| starts_with_words(text, words));
        if let Some((used, (key, more))) = used.and_then(|used| Some((used, figure_at(subject, &text[used..])?))) {
            return Ok((quantity(key), used + more));
        }
    }
    if let Some((key, used)) = figure_at(subject, text) {
        return Ok((Quantity::Figure(key), used));
    }
    Err((0, no_quantity(subject, text)))
}

const HIGHEST: &[&str] = &["highest", "maximum", "greatest", "largest", "peak"];
const LOWEST: &[&str] = &["lowest", "minimum", "smallest"];

fn whole_life(subject: &Subject) -> Vec<(&'static str, Quantity)> {
    match subject {
        Subject::Star => vec![("lifetime", Quantity::Lifetime)],
        Subject::Planet(_) => vec![
            ("longest mild time", Quantity::LongestMildTime),
            ("total mild time", Quantity::MildTime),
            ("mild time", Quantity::MildTime),
            ("habitable zone time", Quantity::HabitableZoneTime),
            ("time in the habitable zone", Quantity::HabitableZoneTime),
        ],
    }
}

/// The figure whose words are the longest that fit here.
fn figure_at(subject: &Subject, text: &str) -> Option<(FigureKey, usize)> {
    let trimmed = text.trim_start();
    let gap = text.len() - trimmed.len();
    let figures: Vec<_> = match subject {
        Subject::Star => star_figures().collect(),
        Subject::Planet(_) => planet_figures().collect(),
    };
    // A figure's own words win over other words for it that are as long.
    let own = figures.iter().map(|figure| (figure.key, words_of(figure.key)));
    let keys = figures.iter().map(|figure| (figure.key, figure.key.to_owned()));
    let names = figures.iter().map(|figure| (figure.key, figure.name.to_lowercase()));
    let others =
        figures.iter().flat_map(|figure| other_words(figure.key).iter().map(|words| (figure.key, (*words).to_owned())));
    own.chain(keys)
        .chain(others)
        .chain(names)
        .filter_map(|(key, words)| Some((key, gap + starts_with_words(trimmed, &words)?)))
        .reduce(|best, next| if next.1 > best.1 { next } else { best })
}

fn phase_at(text: &str, used: usize) -> Result<(Quantity, usize), (usize, LineFault)> {
    let rest = text[used..].trim_start();
    let start = text.len() - rest.len();
    let fits = Phase::ALL.into_iter().filter_map(|phase| Some((phase, starts_with_words(rest, &phase_words(phase))?)));
    if let Some((phase, more)) = fits.reduce(|best, next| if next.1 > best.1 { next } else { best }) {
        return Ok((Quantity::Duration(phase), start + more));
    }
    let known: Vec<String> = Phase::ALL.into_iter().map(phase_words).collect();
    let known: Vec<&str> = known.iter().map(String::as_str).collect();
    let found = words_before_time(rest);
    let likely = likest(&found, &known).map(str::to_owned);
    Err((start, LineFault::NoSuchPhase { allowed: known.join(", "), likely, found }))
}

fn no_quantity(subject: &Subject, text: &str) -> LineFault {
    let found = words_before_time(text);
    let (body, keys) = match subject {
        Subject::Star => ("the star", figures_of_star()),
        Subject::Planet(_) => ("a planet", figures_of_planet()),
    };
    let mut known: Vec<String> = keys.iter().map(|key| words_of(key)).collect();
    known.extend(keys.iter().flat_map(|key| other_words(key).iter().map(|words| (*words).to_owned())));
    known.extend(whole_life(subject).into_iter().map(|(words, _)| words.to_owned()));
    let known: Vec<&str> = known.iter().map(String::as_str).collect();
    let likely = likest(&found, &known).map(str::to_owned);
    let most_used: &[&str] = match subject {
        Subject::Star => &["luminosity", "radius", "temperature", "mass", "lifetime", "duration of main sequence"],
        Subject::Planet(_) => &["surface temperature", "insolation", "semi major axis", "ice fraction", "mild time"],
    };
    let allowed = format!("{}, highest and lowest of them, date of event 'NAME' and others", most_used.join(", "));
    LineFault::NoSuchQuantity { found, body, allowed, likely }
}

/// The words up to those that say when or how.
fn words_before_time(text: &str) -> String {
    const ENDS: [&str; 13] =
        ["at", "ever", "always", "from", "is", "are", "now", "between", "about", "above", "below", "happens", "never"];
    let words = text.split_whitespace().take_while(|word| !ENDS.contains(&word.to_lowercase().as_str()));
    words.collect::<Vec<_>>().join(" ").chars().take(60).collect()
}
