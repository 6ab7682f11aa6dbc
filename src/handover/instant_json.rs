//! Everything at one moment as JSON.

use super::bodies::{body_name, planet_index};
use super::cell::Cell;
use super::figures::{Figure, planet_cells, planet_figures, star_cells, star_figures};
use super::remarks::{Remark, remarks};
use crate::system::planet_light::USUAL_ALTITUDE_DEG;
use crate::system::{History, LightReader, Moment};
use serde_json::{Map, Value};

/// A moment as a JSON object with `time_yr`, `star`, `planets` and `notes`.
///
/// Keys carry their unit. A figure without a value is null, and a note says why. Every note names the body and
/// the key it is about; `planet_index` is the planet's place in `planets`, null for the star.
#[must_use]
pub fn instant_json(history: &History, moment: &Moment) -> String {
    let light = LightReader::new(history, USUAL_ALTITUDE_DEG).at(moment);
    let mut star = object(&history.system().star.name, star_figures(), star_cells(&moment.star, light.star.as_ref()));
    // The input that the star's life follows from besides its mass.
    star.insert("metallicity_dex".to_owned(), Cell::Number(history.system().star.metallicity_dex).json());
    let planets: Vec<Value> = moment
        .planets
        .iter()
        .zip(&light.planets)
        .map(|(planet, light)| {
            Value::Object(object(&planet.name, planet_figures(), planet_cells(planet, light.as_ref())))
        })
        .collect();
    let notes: Vec<Value> = remarks(moment, &light).iter().map(|remark| note(history, remark)).collect();
    let mut root = Map::new();
    root.insert("time_yr".to_owned(), Cell::Number(moment.time_yr).json());
    root.insert("star".to_owned(), Value::Object(star));
    root.insert("planets".to_owned(), Value::Array(planets));
    root.insert("notes".to_owned(), Value::Array(notes));
    format!("{:#}\n", Value::Object(root))
}

fn object(name: &str, figures: impl Iterator<Item = Figure>, cells: impl Iterator<Item = Cell>) -> Map<String, Value> {
    let mut object = Map::new();
    object.insert("name".to_owned(), Value::from(name));
    object.extend(figures.zip(cells).map(|(figure, cell)| (figure.key.to_owned(), cell.json())));
    object
}

fn note(history: &History, remark: &Remark) -> Value {
    let mut object = Map::new();
    object.insert("about".to_owned(), Value::from(remark.about));
    object.insert("body".to_owned(), Value::from(body_name(history, remark.body)));
    object.insert("planet_index".to_owned(), planet_index(remark.body));
    object.insert("kind".to_owned(), Value::from(remark.kind));
    object.insert("text".to_owned(), Value::from(remark.text.as_str()));
    Value::Object(object)
}
