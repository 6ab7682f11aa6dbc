//! A whole history as a table: comma-separated values, their enhanced form, and JSON.

use super::cell::Cell;
use super::comma_separated::push_record;
use super::enhanced_table::header;
use super::figures::{planet_cells, star_cells};
use super::remarks::{SPREAD, remarks};
use super::table_columns::{Column, planet_prefixes, table_columns};
use crate::system::planet_light::USUAL_ALTITUDE_DEG;
use crate::system::specification::Body;
use crate::system::{History, LightReader, Moment, MomentLight};
use serde_json::{Map, Value};
use std::borrow::Cow;
use std::fmt::Write;

/// The history at the given ages as comma-separated values with one header line.
///
/// The column `notes` names every figure of its row that carries a caution or has no value.
#[must_use]
pub fn table_csv(history: &History, ages_yr: &[f64]) -> String {
    let mut text = String::new();
    push_record(&mut text, table_columns(history.system()).iter().map(|column| column.key.as_str()));
    push_rows(&mut text, history, ages_yr);
    text
}

/// The history at the given ages in the Enhanced Character-Separated Values format, with units and meanings.
///
/// # Source
/// Astropy Proposal for Enhancement 6 (APE6), version 1.0 of the format.
#[must_use]
pub fn table_ecsv(history: &History, title: &str, ages_yr: &[f64]) -> String {
    let columns = table_columns(history.system());
    let mut text = header(title, &columns);
    push_record(&mut text, columns.iter().map(|column| column.key.as_str()));
    push_rows(&mut text, history, ages_yr);
    text
}

/// The history at the given ages as JSON: `title`, `columns` with unit and meaning, and one object per row.
#[must_use]
pub fn table_json(history: &History, title: &str, ages_yr: &[f64]) -> String {
    let columns = table_columns(history.system());
    let prefixes = planet_prefixes(history.system());
    let reader = LightReader::new(history, USUAL_ALTITUDE_DEG);
    let described: Vec<Value> = columns.iter().map(described).collect();
    let mut text = format!("{{\n\"title\": {},\n\"columns\": [", Value::from(title));
    push_lines(&mut text, described.into_iter());
    text.push_str("\n],\n\"rows\": [");
    let rows = ages_yr.iter().map(|age_yr| {
        let cells = row(history, &reader, &prefixes, *age_yr);
        Value::Object(columns.iter().zip(cells).map(|(column, cell)| (column.key.clone(), cell.json())).collect())
    });
    push_lines(&mut text, rows);
    text.push_str("\n]\n}\n");
    text
}

/// Appends JSON values, each on a line of its own, so that a long table needs no tree of its own in memory.
fn push_lines(text: &mut String, values: impl Iterator<Item = Value>) {
    for (index, value) in values.enumerate() {
        // Writing to a String cannot fail.
        let _ = write!(text, "{}\n{value}", if index > 0 { "," } else { "" });
    }
}

fn described(column: &Column) -> Value {
    let mut object = Map::new();
    object.insert("key".to_owned(), Value::from(column.key.as_str()));
    object.insert("unit".to_owned(), if column.unit.is_empty() { Value::Null } else { Value::from(column.unit) });
    object.insert("meaning".to_owned(), Value::from(column.meaning.as_str()));
    Value::Object(object)
}

fn push_rows(text: &mut String, history: &History, ages_yr: &[f64]) {
    let prefixes = planet_prefixes(history.system());
    let reader = LightReader::new(history, USUAL_ALTITUDE_DEG);
    for age_yr in ages_yr {
        push_record(text, row(history, &reader, &prefixes, *age_yr).iter().map(Cell::plain));
    }
}

/// One row, in the order of [`table_columns`].
fn row(history: &History, reader: &LightReader<'_>, prefixes: &[String], age_yr: f64) -> Vec<Cell> {
    let moment = history.moment(age_yr);
    let light = reader.at(&moment);
    let mut cells = vec![Cell::Number(moment.time_yr)];
    cells.extend(star_cells(&moment.star, light.star.as_ref()));
    for (planet, light) in moment.planets.iter().zip(&light.planets) {
        cells.extend(planet_cells(planet, light.as_ref()));
    }
    cells.push(notes(&moment, &light, prefixes));
    cells
}

/// The remarks of a row as `column:kind`. A method's typical spread is no news in any row and left to the list of sources.
fn notes(moment: &Moment, light: &MomentLight, prefixes: &[String]) -> Cell {
    let mut words: Vec<String> = Vec::new();
    for remark in remarks(moment, light).iter().filter(|remark| remark.kind != SPREAD) {
        let column = match remark.body {
            Body::Star => remark.about.to_owned(),
            Body::Planet(index) => match prefixes.get(index) {
                Some(prefix) => format!("{prefix}_{}", remark.about),
                None => continue,
            },
        };
        let word = format!("{column}:{}", remark.kind);
        if !words.contains(&word) {
            words.push(word);
        }
    }
    if words.is_empty() { Cell::Missing } else { Cell::Text(Cow::Owned(words.join(" "))) }
}
