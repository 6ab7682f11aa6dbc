//! Dated events as text, comma-separated values and JSON.

use super::bodies::{body_name, planet_index};
use super::cell::Cell;
use super::comma_separated::push_record;
use super::lines::{push_columns, push_wrapped};
use crate::physics::planet::Caution;
use crate::system::date_band::RULE;
use crate::system::{DateBand, Event, EventFilter, History};
use crate::units::time_words::{SpanStyle, span, spans_apart};
use serde_json::{Map, Value};

/// Digits of a date for people: late stages of a long life are told apart.
const DATE_DIGITS: usize = 6;
/// Digits of the ends of a band.
const BAND_DIGITS: usize = 4;

/// The chosen events for people, oldest first, each with what is known of its date.
#[must_use]
pub fn events_text(history: &History, title: &str, filter: &EventFilter) -> String {
    let mut page = String::new();
    push_wrapped(&mut page, "", title);
    page.push('\n');
    let mut rows = vec![["Time", "Body", "Event"].map(str::to_owned).to_vec()];
    for event in chosen(history, filter) {
        let time = span(event.time_yr, DATE_DIGITS, SpanStyle::Symbols);
        rows.push(vec![time, body_name(history, event.body).to_owned(), event.kind.name().into_owned()]);
        rows.extend(
            doubt(event, SpanStyle::Symbols).map(|doubt| vec![String::new(), String::new(), format!("  {doubt}")]),
        );
    }
    push_columns(&mut page, 0, &rows);
    page.push('\n');
    push_wrapped(&mut page, "", "Times are counted from the star's arrival on the main sequence.");
    push_wrapped(&mut page, "", RULE);
    if let Some(remark) = history.dates_remark() {
        push_wrapped(&mut page, "", remark);
    }
    page
}

/// What is known of an event's date beyond the date itself: `between 11.92 Gyr and 12.17 Gyr`.
#[must_use]
pub fn doubt(event: &Event, style: SpanStyle) -> Option<String> {
    // As many digits as tell the ends from the date itself.
    let apart = |ends: [f64; 2]| {
        let dates = spans_apart(&[ends[0], event.time_yr, ends[1]], style);
        format!("between {} and {}", dates[0], dates[2])
    };
    let date = |time_yr| span(time_yr, BAND_DIGITS, style);
    match (event.band, event.caution) {
        (Some(DateBand { earliest_yr: Some(earliest_yr), latest_yr: Some(latest_yr) }), _) => {
            Some(apart([earliest_yr, latest_yr]))
        }
        (Some(DateBand { earliest_yr: Some(earliest_yr), latest_yr: None }), _) => {
            Some(format!("after {}, or never", date(earliest_yr)))
        }
        (Some(DateBand { earliest_yr: None, latest_yr: Some(latest_yr) }), _) => {
            Some(format!("before {}, or always so", date(latest_yr)))
        }
        (Some(DateBand { earliest_yr: None, latest_yr: None }), _) => Some("at any time, or never".to_owned()),
        (None, Some(Caution::HeldByUser) | None) => None,
        (None, Some(Caution::Extrapolated)) => Some("outside the stars its rule was made for".to_owned()),
        (None, Some(Caution::OrderOfMagnitude)) => Some("known to an order of magnitude".to_owned()),
        (None, Some(Caution::Undecided)) => Some("undecided, the tides could let it end otherwise".to_owned()),
        (None, Some(Caution::NotApplicable)) => {
            Some("while the star loses mass too fast for a steady orbit".to_owned())
        }
    }
}

fn chosen<'h>(history: &'h History, filter: &EventFilter) -> impl Iterator<Item = &'h Event> {
    history.events().iter().filter(|event| filter.shows(event))
}

/// The columns of the comma-separated form, and the keys of each event in JSON.
const KEYS: [&str; 10] = [
    "time_yr",
    "body",
    "planet_index",
    "event",
    "description",
    "group",
    "earliest_yr",
    "latest_yr",
    "caution",
    "method",
];

/// The values of an event, in the order of [`KEYS`].
fn values(history: &History, event: &Event) -> [Value; KEYS.len()] {
    let date = |time_yr: Option<f64>| Cell::number(time_yr).json();
    [
        Cell::Number(event.time_yr).json(),
        Value::from(body_name(history, event.body)),
        planet_index(event.body),
        Value::from(event.kind.key()),
        Value::from(event.kind.name().as_ref()),
        Value::from(event.kind.group().key()),
        date(event.band.and_then(|band| band.earliest_yr)),
        date(event.band.and_then(|band| band.latest_yr)),
        event.caution.map_or(Value::Null, |caution| Value::from(caution.key())),
        Value::from(event.kind.method()),
    ]
}

/// The chosen events as comma-separated values: when, to whom, what, and how well the date is known.
#[must_use]
pub fn events_csv(history: &History, filter: &EventFilter) -> String {
    let mut text = String::new();
    push_record(&mut text, KEYS);
    for event in chosen(history, filter) {
        let cells = values(history, event).map(|value| match value {
            Value::String(text) => text,
            Value::Null => String::new(),
            Value::Number(number) if number.is_f64() => {
                number.as_f64().map_or_else(String::new, |number| Cell::Number(number).plain().into_owned())
            }
            other => other.to_string(),
        });
        push_record(&mut text, cells.iter().map(String::as_str));
    }
    text
}

/// The chosen events as JSON: an object with `events`, oldest first.
#[must_use]
pub fn events_json(history: &History, filter: &EventFilter) -> String {
    let events: Vec<Value> = chosen(history, filter)
        .map(|event| Value::Object(KEYS.iter().map(|key| (*key).to_owned()).zip(values(history, event)).collect()))
        .collect();
    let mut root = Map::new();
    root.insert("events".to_owned(), Value::Array(events));
    format!("{:#}\n", Value::Object(root))
}
