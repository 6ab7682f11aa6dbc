//! How files name the body that something is about.

use crate::system::History;
use crate::system::specification::Body;
use serde_json::Value;

/// `star`, or the planet's name.
pub(super) fn body_name(history: &History, body: Body) -> &str {
    match body {
        Body::Star => "star",
        Body::Planet(index) => history.system().planets.get(index).map_or("planet", |planet| planet.name.as_str()),
    }
}

/// The planet's place in the list of planets, counted from 0; null for the star. It tells a planet named "star" apart.
pub(super) fn planet_index(body: Body) -> Value {
    match body {
        Body::Star => Value::Null,
        Body::Planet(index) => Value::from(index),
    }
}
