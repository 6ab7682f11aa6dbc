//! A whole history as a table: comma-separated values, their enhanced form, and JSON.

use super::cell::Cell;
use super::comma_separated::push_record;
use super::enhanced_table::header;
use super::figures::{planet_cells, star_cells};
use super::remarks::{SPREAD, remarks};
use super::table_columns::{Column, planet_prefixes, table_columns};
use crate::physics::star::WholeLife;
use crate::system::planet_light::USUAL_ALTITUDE_DEG;
use crate::system::provenance::{METHODS, Method};
use crate::system::specification::Body;
use crate::system::{History, LightReader, Moment, MomentLight};
use serde_json::{Map, Value};
use std::borrow::Cow;
use std::fmt::Write;

/// What a table is made of.
#[derive(Clone, Debug)]
pub struct TableRequest<'a> {
    /// The history.
    pub history: &'a History,
    /// The scenario's title.
    pub title: &'a str,
    /// The age of each row, yr.
    pub ages_yr: &'a [f64],
    /// Which columns, by their places in [`table_columns`], in the order wanted; all where nothing is said.
    pub chosen: Option<Vec<usize>>,
}

impl<'a> TableRequest<'a> {
    /// A table with every column.
    #[must_use]
    pub fn whole(history: &'a History, title: &'a str, ages_yr: &'a [f64]) -> Self {
        Self { history, title, ages_yr, chosen: None }
    }

    fn columns(&self) -> Vec<Column> {
        self.chosen_of(table_columns(self.history.system()))
    }

    /// The chosen ones of what there is for every column.
    fn chosen_of<T: Clone>(&self, all: Vec<T>) -> Vec<T> {
        match &self.chosen {
            Some(chosen) => chosen.iter().filter_map(|place| all.get(*place).cloned()).collect(),
            None => all,
        }
    }

    /// The rows, each in the order of the columns.
    fn rows(&self) -> impl Iterator<Item = Vec<Cell>> + '_ {
        let prefixes = planet_prefixes(self.history.system());
        let reader = LightReader::new(self.history, USUAL_ALTITUDE_DEG);
        let keys: Option<Vec<String>> =
            self.chosen.is_some().then(|| self.columns().into_iter().map(|column| column.key).collect());
        self.ages_yr
            .iter()
            .map(move |age_yr| self.chosen_of(row(self.history, &reader, &prefixes, keys.as_deref(), *age_yr)))
    }
}

/// The history at the given ages as comma-separated values with one header line.
///
/// The column `notes` names every figure of its row that carries a caution or has no value.
#[must_use]
pub fn table_csv(request: &TableRequest<'_>) -> String {
    let mut text = String::new();
    push_record(&mut text, request.columns().iter().map(|column| column.key.as_str()));
    push_rows(&mut text, request);
    text
}

/// The history at the given ages in the Enhanced Character-Separated Values format, with units and meanings.
///
/// # Source
/// Astropy Proposal for Enhancement 6 (APE6), version 1.0 of the format.
#[must_use]
pub fn table_ecsv(request: &TableRequest<'_>) -> String {
    let columns = request.columns();
    let mut text = header(request.title, &methods(request.history, &columns), &columns);
    push_record(&mut text, columns.iter().map(|column| column.key.as_str()));
    push_rows(&mut text, request);
    text
}

/// The history at the given ages as JSON: `title`, `program`, `methods`, `columns` with unit and meaning, and one
/// object per row.
#[must_use]
pub fn table_json(request: &TableRequest<'_>) -> String {
    let columns = request.columns();
    let described: Vec<Value> = columns.iter().map(described).collect();
    let mut text = format!(
        "{{\n\"title\": {},\n\"program\": {},\n\"methods\": [",
        Value::from(request.title),
        Value::from(PROGRAM)
    );
    push_lines(&mut text, methods(request.history, &columns).into_iter().map(cited));
    text.push_str("\n],\n\"columns\": [");
    push_lines(&mut text, described.into_iter());
    text.push_str("\n],\n\"rows\": [");
    let rows = request.rows().map(|cells| {
        Value::Object(columns.iter().zip(cells).map(|(column, cell)| (column.key.clone(), cell.json())).collect())
    });
    push_lines(&mut text, rows);
    text.push_str("\n]\n}\n");
    text
}

/// Name and version.
pub(super) const PROGRAM: &str = concat!("Longember ", env!("CARGO_PKG_VERSION"));

/// The methods behind some columns of a history, each once; a life has further methods at its ends.
fn methods(history: &History, columns: &[Column]) -> Vec<&'static Method> {
    let is_of_life = columns.iter().any(|column| column.method == Some("star_life"));
    let is_red_dwarf = WholeLife::needs_structure(history.system().star.mass_msun);
    let spans = history.spans();
    let is_used = |method: &&Method| match method.key {
        "star_life" => is_of_life && !is_red_dwarf,
        "red_dwarf" => is_of_life && is_red_dwarf,
        "white_dwarf" => is_of_life && !is_red_dwarf && spans.iter().any(|span| span.phase.is_white_dwarf()),
        "remnant" => is_of_life && spans.iter().any(|span| span.phase.is_dark()),
        key => columns.iter().any(|column| column.method == Some(key)),
    };
    METHODS.iter().filter(is_used).collect()
}

fn cited(method: &Method) -> Value {
    let texts = [("method", method.key), ("name", method.name), ("source", method.source)];
    Value::Object(texts.map(|(key, text)| (key.to_owned(), Value::from(text))).into_iter().collect())
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

fn push_rows(text: &mut String, request: &TableRequest<'_>) {
    for row in request.rows() {
        push_record(text, row.iter().map(Cell::plain));
    }
}

/// One row, in the order of [`table_columns`]. Where only some columns are chosen, the notes are about those.
fn row(
    history: &History,
    reader: &LightReader<'_>,
    prefixes: &[String],
    keys: Option<&[String]>,
    age_yr: f64,
) -> Vec<Cell> {
    let moment = history.moment(age_yr);
    let light = reader.at(&moment);
    let mut cells = vec![Cell::Number(moment.time_yr)];
    cells.extend(star_cells(&moment.star, light.star.as_ref()));
    for (planet, light) in moment.planets.iter().zip(&light.planets) {
        cells.extend(planet_cells(planet, light.as_ref()));
    }
    cells.push(notes(&moment, &light, prefixes, keys));
    cells
}

/// The remarks of a row as `column:kind`. A method's typical spread is no news in any row and left to the list of sources.
fn notes(moment: &Moment, light: &MomentLight, prefixes: &[String], keys: Option<&[String]>) -> Cell {
    let mut words: Vec<String> = Vec::new();
    for remark in remarks(moment, light).iter().filter(|remark| remark.kind != SPREAD) {
        let column = match remark.body {
            Body::Star => remark.about.to_owned(),
            Body::Planet(index) => match prefixes.get(index) {
                Some(prefix) => format!("{prefix}_{}", remark.about),
                None => continue,
            },
        };
        if keys.is_some_and(|keys| !keys.contains(&column)) {
            continue;
        }
        let word = format!("{column}:{}", remark.kind);
        if !words.contains(&word) {
            words.push(word);
        }
    }
    if words.is_empty() { Cell::Missing } else { Cell::Text(Cow::Owned(words.join(" "))) }
}
