//! Everything at one moment as a page for people.

use super::bodies::body_name;
use super::light_figures::sky_seen;
use super::lines::{WIDTH, padded, push_columns, push_wrapped, width};
use super::remarks::{ABSENT, Remark, SPREAD, percent, remarks};
use crate::physics::light::{RgbSpace, Viewing, hex};
use crate::physics::planet::habitable_zone::ZonePlace;
use crate::system::light_quantities::{LightQuantity, PLANET_LIGHT, STAR_LIGHT};
use crate::system::planet_light::USUAL_ALTITUDE_DEG;
use crate::system::quantities::{PLANET, STAR, planet_figure_name, star_figure_name};
use crate::system::specification::Body;
use crate::system::{History, LightReader, Moment, MomentLight, PlanetLight, PlanetMoment, StarMoment, Starlight};
use crate::units::number_text::{fixed, number};
use crate::units::time_words::{SpanStyle, span};

/// What stands where there is no value.
const NONE: &str = "–";
/// Least width of the labels, so that star and planets line up.
const LABEL_WIDTH: usize = 19;
/// Longest phrase that stands in one line of a planet's column.
const PHRASE_WIDTH: usize = 16;

/// A moment as text of at most 80 columns: the star, the planets side by side, then the notes.
#[must_use]
pub fn instant_text(history: &History, title: &str, moment: &Moment) -> String {
    let mut page = String::new();
    push_wrapped(&mut page, "", title);
    let time = span(moment.time_yr, 4, SpanStyle::Words);
    push_wrapped(&mut page, "", &format!("{time} after the star reached the main sequence"));
    page.push('\n');
    let light = LightReader::new(history, USUAL_ALTITUDE_DEG).at(moment);
    push_star(&mut page, &history.system().star.name, &moment.star);
    if let Some(light) = &light.star {
        push_starlight(&mut page, light);
    }
    push_planets(&mut page, &moment.planets, &light.planets);
    push_notes(&mut page, history, moment, &light);
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

/// The star's light: what has no value takes no line.
fn push_starlight(page: &mut String, light: &Starlight) {
    // Triples and colours of dwarfs stand in lines of their own below.
    let is_single = |key: &str| !key.starts_with("linear_") && !key.starts_with("dwarf_");
    let mut rows: Vec<Vec<String>> = STAR_LIGHT
        .iter()
        .filter(|quantity| is_single(quantity.key))
        .filter_map(|quantity| {
            let value = (quantity.value)(light)?;
            Some(vec![padded(quantity.name, LABEL_WIDTH), with_unit(Some(value), quantity.digits, quantity.symbol)])
        })
        .collect();
    if let Some(colour) = &light.colour {
        for (space, linear) in RgbSpace::ALL.into_iter().zip(colour.linear_rgb) {
            let channels = linear.map(|channel| fixed(channel, 4)).join("  ");
            rows.push(vec![padded(&format!("Linear {}", space.name()), LABEL_WIDTH), channels]);
        }
        rows.push(vec![padded("Display P3", LABEL_WIDTH), hex(colour.wide.display_p3)]);
    }
    if let Some(dwarf) = &light.dwarf {
        let [x, y] = dwarf.chromaticity.xy().map(|value| fixed(value, 4));
        let difference = fixed(dwarf.difference_de00, 1);
        let words = format!("{}, x {x} y {y}, like {}, {difference} apart", dwarf.screen.hex(), dwarf.nearest_type);
        rows.push(vec![padded("Measured dwarfs", LABEL_WIDTH), words]);
    }
    push_columns(page, 2, &rows);
}

/// The planets side by side, as many as fit, then the next ones below.
fn push_planets(page: &mut String, planets: &[PlanetMoment], lights: &[Option<PlanetLight>]) {
    let labels: Vec<String> = std::iter::once("Planet".to_owned())
        .chain(["  State".to_owned()])
        .chain(PLANET.iter().map(|quantity| label(quantity.name, quantity.symbol)))
        .chain(["  Zone".to_owned(), String::new()])
        .chain(planet_light().map(|quantity| label(quantity.name, quantity.symbol)))
        .chain(SKY_LABELS.iter().flat_map(|label| [(*label).to_owned(), String::new()]))
        .map(|label| padded(&label, LABEL_WIDTH + 2))
        .collect();
    let columns: Vec<Vec<String>> =
        planets.iter().zip(lights).map(|(planet, light)| planet_column(planet, light.as_ref())).collect();
    let label_width = labels.iter().map(|label| width(label)).max().unwrap_or(0);
    let mut rest = columns.as_slice();
    while !rest.is_empty() {
        let fitting = fitting_count(rest, label_width);
        let (block, later) = rest.split_at(fitting);
        let rows: Vec<Vec<String>> = labels
            .iter()
            .enumerate()
            .map(|(row, label)| {
                std::iter::once(label.clone()).chain(block.iter().map(|column| column[row].clone())).collect()
            })
            // What no planet of the block has takes no line; the notes say why.
            .filter(|row: &Vec<String>| row.iter().skip(1).any(|cell| !cell.trim().is_empty() && cell != NONE))
            .collect();
        page.push('\n');
        push_columns(page, 0, &rows);
        rest = later;
    }
}

/// How many of the columns fit beside the labels; at least one.
fn fitting_count(columns: &[Vec<String>], label_width: usize) -> usize {
    let mut used = label_width;
    let widths = columns.iter().map(|column| column.iter().map(|cell| width(cell)).max().unwrap_or(0));
    let fitting = widths
        .take_while(|column_width| {
            used += column_width + 2;
            used <= WIDTH
        })
        .count();
    fitting.max(1)
}

/// Labels of the sky's colours, as emitted on a screen with D65 white and to an eye adapted to the star.
const SKY_LABELS: [&str; 2] = ["  Sky as emitted", "  Sky, eye adapted"];

/// Figures of light that a page for people shows: colours stand there in words.
fn planet_light() -> impl Iterator<Item = &'static LightQuantity<PlanetLight>> {
    PLANET_LIGHT.iter().filter(|quantity| !quantity.key.ends_with("_x") && !quantity.key.ends_with("_y"))
}

fn planet_column(planet: &PlanetMoment, light: Option<&PlanetLight>) -> Vec<String> {
    let figures = PLANET.iter().map(|quantity| {
        (quantity.value)(planet).map_or_else(|| NONE.to_owned(), |value| number(value, quantity.digits))
    });
    std::iter::once(planet.name.clone())
        .chain([planet.state.name().to_owned()])
        .chain(figures)
        .chain(in_two_lines(planet.zone.map_or(NONE, ZonePlace::name)))
        .chain(planet_light().map(|quantity| {
            light.and_then(quantity.value).map_or_else(|| NONE.to_owned(), |value| number(value, quantity.digits))
        }))
        .chain(Viewing::ALL.into_iter().flat_map(|viewing| {
            let colour = light.and_then(|light| sky_seen(light, viewing)).map(|sky| sky.name.to_string());
            in_two_lines(colour.as_deref().unwrap_or(NONE))
        }))
        .collect()
}

/// Words broken once, so that one long phrase does not widen a whole column of figures.
fn in_two_lines(words: &str) -> [String; 2] {
    let middle = width(words) / 2;
    let cut = words.match_indices(' ').map(|(at, _)| at).min_by_key(|at| at.abs_diff(middle));
    match cut {
        Some(cut) if width(words) > PHRASE_WIDTH => [words[..cut].to_owned(), words[cut + 1..].to_owned()],
        _ => [words.to_owned(), String::new()],
    }
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

fn push_notes(page: &mut String, history: &History, moment: &Moment, light: &MomentLight) {
    let notes = gathered_notes(history, moment, light, true);
    if notes.is_empty() {
        return;
    }
    page.push_str("\nNotes\n");
    for note in notes {
        push_wrapped(page, "  - ", &note);
    }
}

/// The notes on a moment: each sentence stands once, after everything it is about. What is missing may be left out.
pub(super) fn gathered_notes(
    history: &History,
    moment: &Moment,
    light: &MomentLight,
    with_absences: bool,
) -> Vec<String> {
    let mut gathered: Vec<(String, Vec<String>)> = Vec::new();
    let is_told = |remark: &&Remark| remark.kind != SPREAD && (with_absences || remark.kind != ABSENT);
    for remark in remarks(moment, light).iter().filter(is_told) {
        let (about, sentence) = about_and_sentence(history, remark);
        match gathered.iter_mut().find(|(known, _)| *known == sentence) {
            Some((_, abouts)) if abouts.contains(&about) => {}
            Some((_, abouts)) => abouts.push(about),
            None => gathered.push((sentence, vec![about])),
        }
    }
    gathered.into_iter().map(|(sentence, abouts)| format!("{}: {sentence}", abouts.join(", "))).collect()
}

fn about_and_sentence(history: &History, remark: &Remark) -> (String, String) {
    let sentence = remark.text.trim_end_matches('.');
    if remark.body == Body::Star {
        return (named(remark), sentence.to_owned());
    }
    let name = body_name(history, remark.body);
    // Why a planet has no values is one reason for all of them, so the planet alone is named.
    if remark.kind == ABSENT {
        return (name.to_owned(), sentence.to_owned());
    }
    // A note on a planet that begins with its name says which figure it is about in its own words.
    match sentence.strip_prefix(name).and_then(|rest| rest.strip_prefix(": ")) {
        Some(rest) => (name.to_owned(), rest.to_owned()),
        None => (format!("{name}, {}", named(remark).to_lowercase()), sentence.to_owned()),
    }
}

/// The figure a remark is about, as the page names it.
fn named(remark: &Remark) -> String {
    let name = match remark.body {
        Body::Star => star_figure_name(remark.about),
        Body::Planet(_) => planet_figure_name(remark.about),
    };
    match name {
        Some(name) => name.to_owned(),
        None if remark.about == "time_yr" => "Time".to_owned(),
        None if remark.about.starts_with("colour") => "Colour".to_owned(),
        None => remark.about.replace('_', " "),
    }
}

#[cfg(test)]
mod tests {
    use super::*;

    #[test]
    fn long_phrases_break_near_their_middle() {
        assert_eq!(in_two_lines("conservative habitable zone"), ["conservative", "habitable zone"]);
        assert_eq!(in_two_lines("too much light"), ["too much light", ""]);
        assert_eq!(in_two_lines("unbreakable-phrase-of-one-word"), ["unbreakable-phrase-of-one-word", ""]);
    }

    #[test]
    fn as_many_columns_as_fit_and_always_one() {
        let column = |cell_width: usize| vec!["x".repeat(cell_width)];
        assert_eq!(fitting_count(&[column(16), column(16), column(16), column(16)], 21), 3);
        assert_eq!(fitting_count(&[column(60), column(5)], 21), 1);
        assert_eq!(fitting_count(&[column(5), column(60)], 21), 1);
    }

    #[test]
    fn what_has_no_value_has_no_unit() {
        assert_eq!(with_unit(None, 4, "K"), "–");
        assert_eq!(with_unit(Some(5772.0), 4, "K"), "5772 K");
        assert_eq!(with_unit(Some(0.5), 2, ""), "0.50");
    }
}
