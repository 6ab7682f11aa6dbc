//! A show as comma-separated values: one line for every frame.

use super::cell::Cell;
use super::comma_separated::push_record;
use super::figures::{planet_cells, planet_figures, star_cells, star_figures};
use super::table_columns::planet_prefixes;
use crate::system::cues::{FrameRate, Schedule, time_code};
use crate::system::planet_light::USUAL_ALTITUDE_DEG;
use crate::system::{History, LightReader, StarMoment};
use std::borrow::Cow;

/// Columns before the figures.
const FRAME: [&str; 5] = ["frame", "time_code", "show_time_s", "cue", "time_yr"];
/// The colour as a screen takes it, 0 to 1 in each channel.
const ENCODED: [&str; 3] = ["encoded_srgb_red", "encoded_srgb_green", "encoded_srgb_blue"];

/// Every frame of a show: time code, cosmic time, all figures of the star, those of the chosen planets.
///
/// `planets` are indices into the system. The frame's cue is counted from 1, in the order of the sheet.
#[must_use]
pub fn cue_table_csv(history: &History, schedule: &Schedule, rate: FrameRate, planets: &[usize]) -> String {
    let prefixes = planet_prefixes(history.system());
    let chosen: Vec<(usize, &String)> =
        planets.iter().filter_map(|index| Some((*index, prefixes.get(*index)?))).collect();
    let mut text = String::new();
    let mut header: Vec<String> = FRAME.iter().map(|key| (*key).to_owned()).collect();
    header.extend(star_figures().map(|figure| figure.key.to_owned()));
    header.extend(ENCODED.map(str::to_owned));
    for (_, prefix) in &chosen {
        header.extend(planet_figures().map(|figure| format!("{prefix}_{}", figure.key)));
    }
    push_record(&mut text, &header);
    let reader = LightReader::new(history, USUAL_ALTITUDE_DEG);
    let mut last: Option<(f64, Vec<Cell>)> = None;
    for frame in schedule.frames(rate) {
        // A held moment is read once.
        let figures = match last.take() {
            Some((time_yr, figures)) if time_yr == frame.time_yr => figures,
            _ => figures(history, &reader, frame.time_yr, &chosen),
        };
        let cue = schedule.cue_at(frame.show_time_s).map_or(Cell::Missing, |index| Cell::Number((index + 1) as f64));
        let start = [
            Cell::Number(frame.number as f64),
            Cell::Text(Cow::Owned(time_code(frame.number, rate))),
            Cell::Number(frame.show_time_s),
            cue,
            Cell::Number(frame.time_yr),
        ];
        push_record(&mut text, start.iter().chain(&figures).map(Cell::plain));
        last = Some((frame.time_yr, figures));
    }
    text
}

/// The figures of a moment in the order of the columns.
fn figures(history: &History, reader: &LightReader<'_>, time_yr: f64, chosen: &[(usize, &String)]) -> Vec<Cell> {
    let moment = history.moment(time_yr);
    let light = reader.at(&moment);
    let mut cells: Vec<Cell> = star_cells(&moment.star, light.star.as_ref()).collect();
    cells.extend(encoded(&moment.star));
    for (index, _) in chosen {
        if let (Some(planet), Some(light)) = (moment.planets.get(*index), light.planets.get(*index)) {
            cells.extend(planet_cells(planet, light.as_ref()));
        }
    }
    cells
}

fn encoded(star: &StarMoment) -> [Cell; 3] {
    let srgb = star.swatch.as_ref().map(|swatch| swatch.srgb);
    [0, 1, 2].map(|channel| Cell::number(srgb.map(|srgb| f64::from(srgb[channel]) / 255.0)))
}
