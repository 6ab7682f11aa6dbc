//! Dated events as text, comma-separated values and JSON.

use super::bodies::{body_name, planet_index};
use super::cell::Cell;
use super::comma_separated::push_record;
use super::lines::{push_columns, push_wrapped};
use crate::system::History;
use crate::units::time_words::{SpanStyle, span};
use serde_json::{Map, Value};

/// Digits of a date for people: late stages of a long life are told apart.
const DATE_DIGITS: usize = 6;

/// The events for people, oldest first.
#[must_use]
pub fn events_text(history: &History, title: &str) -> String {
    let mut page = String::new();
    push_wrapped(&mut page, "", title);
    page.push('\n');
    let heading = ["Time", "Body", "Event"].map(str::to_owned).to_vec();
    let rows = history.events().iter().map(|event| {
        let time = span(event.time_yr, DATE_DIGITS, SpanStyle::Symbols);
        vec![time, body_name(history, event.body).to_owned(), event.kind.name().to_owned()]
    });
    let rows: Vec<Vec<String>> = std::iter::once(heading).chain(rows).collect();
    push_columns(&mut page, 0, &rows);
    page.push('\n');
    push_wrapped(&mut page, "", "Times are counted from the star's arrival on the main sequence.");
    page
}

/// The events as comma-separated values: `time_yr`, `body`, `event` (machine name), `description`.
#[must_use]
pub fn events_csv(history: &History) -> String {
    let mut text = String::new();
    push_record(&mut text, ["time_yr", "body", "planet_index", "event", "description"]);
    for event in history.events() {
        let time = Cell::Number(event.time_yr);
        let index = match planet_index(event.body) {
            Value::Null => String::new(),
            index => index.to_string(),
        };
        push_record(
            &mut text,
            [
                time.plain().as_ref(),
                body_name(history, event.body),
                index.as_str(),
                event.kind.key(),
                event.kind.name(),
            ],
        );
    }
    text
}

/// The events as JSON: an object with `events`, oldest first.
#[must_use]
pub fn events_json(history: &History) -> String {
    let events: Vec<Value> = history
        .events()
        .iter()
        .map(|event| {
            let mut object = Map::new();
            object.insert("time_yr".to_owned(), Cell::Number(event.time_yr).json());
            object.insert("body".to_owned(), Value::from(body_name(history, event.body)));
            object.insert("planet_index".to_owned(), planet_index(event.body));
            object.insert("event".to_owned(), Value::from(event.kind.key()));
            object.insert("description".to_owned(), Value::from(event.kind.name()));
            Value::Object(object)
        })
        .collect();
    let mut root = Map::new();
    root.insert("events".to_owned(), Value::Array(events));
    format!("{:#}\n", Value::Object(root))
}
