//! Text to the rows of a scenario that are no bodies: statements, and the cues of a show.

use super::keys::{CUE_KEYS, STATEMENT_KEYS, TRANSITIONS};
use super::places::{Owner, Places};
use crate::document::problem::{Fault, Subject};
use crate::document::record_reading::{Fields, Reading};
use crate::document::ron_text::{Node, Value};
use crate::system::MomentRequest;
use crate::system::cues::{Cue, LONGEST_SHOW_S, MOST_CUES, Transition};
use crate::system::specification::System;
use crate::system::statements::{MOST_STATEMENTS, Statement, parse_saved_statement};

/// The statements of a list about a system, whose planets they may call by name.
pub(super) fn read_statements(
    reading: &mut Reading<'_>,
    node: &Node,
    system: &System,
    places: &mut Places,
) -> Vec<Statement> {
    let Some(items) = rows(reading, node, "statements", MOST_STATEMENTS) else { return Vec::new() };
    let items = items.iter().take(MOST_STATEMENTS).enumerate();
    items.filter_map(|(index, item)| read_statement(reading, item, index, system, places)).collect()
}

fn read_statement(
    reading: &mut Reading<'_>,
    node: &Node,
    index: usize,
    system: &System,
    places: &mut Places,
) -> Option<Statement> {
    let fields = reading.fields(node, "Statement", "statement", STATEMENT_KEYS, Subject::Statement { index })?;
    let node = reading.required(&fields, "claim", "a line such as \"star luminosity at 5 Gyr is about 1.0 Lsun\"")?;
    let line = reading.text(node, &fields.subject, "claim")?;
    let note = read_note(reading, &fields, Owner::Statement(index), places);
    match parse_saved_statement(line, system) {
        Ok(statement) => Some(Statement { note, ..statement }),
        Err(problem) => {
            reading.report(node.span.start, &fields.subject, Some("claim"), problem.into());
            None
        }
    }
}

/// The cues of a list.
pub(super) fn read_cues(reading: &mut Reading<'_>, node: &Node, places: &mut Places) -> Vec<Cue> {
    let Some(items) = rows(reading, node, "cues", MOST_CUES) else { return Vec::new() };
    let items = items.iter().take(MOST_CUES).enumerate();
    items.filter_map(|(index, item)| read_cue(reading, item, index, places)).collect()
}

/// The items of a list, of which too many are reported.
fn rows<'n>(reading: &mut Reading<'_>, node: &'n Node, key: &'static str, most: usize) -> Option<&'n [Node]> {
    let items = reading.list(node, &Subject::Whole, key)?;
    let count = items.iter().filter(|item| item.value != Value::Broken).count();
    if count > most {
        reading.report(node.span.start, &Subject::Whole, Some(key), Fault::TooMany { key, count, most });
    }
    Some(items)
}

fn read_cue(reading: &mut Reading<'_>, node: &Node, index: usize, places: &mut Places) -> Option<Cue> {
    let fields = reading.fields(node, "Cue", "cue", CUE_KEYS, Subject::Cue { index })?;
    let owner = Owner::Cue(index);
    let allowed = format!("0 to {LONGEST_SHOW_S} s");
    let show_time_s = reading.required(&fields, "show_time_s", &allowed).and_then(|node| {
        places.insert((owner, "show_time_s"), node.span.start);
        reading.number(node, &fields.subject, "show_time_s", &allowed)
    });
    let moment = reading
        .required(&fields, "moment", "a moment such as \"4.6 Gyr\", \"now\" or \"event 'largest radius'\"")
        .and_then(|node| {
            let text = reading.text(node, &fields.subject, "moment")?;
            MomentRequest::parse(text)
                .map_err(|problem| reading.report(node.span.start, &fields.subject, Some("moment"), problem.into()))
                .ok()
        });
    let transition = fields.given("transition").and_then(|node| {
        let index = reading.choice(node, &fields.subject, "transition", TRANSITIONS)?;
        Transition::ALL.get(index).copied()
    });
    let note = read_note(reading, &fields, owner, places);
    // A part that is missing was reported: the row stays, so that the ones after it keep their numbers.
    Some(Cue {
        show_time_s: show_time_s.unwrap_or(0.0),
        moment: moment.unwrap_or(MomentRequest::Now),
        transition: transition.unwrap_or_default(),
        note,
    })
}

fn read_note(reading: &mut Reading<'_>, fields: &Fields<'_>, owner: Owner, places: &mut Places) -> String {
    let note = fields.given("note").and_then(|node| {
        places.insert((owner, "note"), node.span.start);
        reading.text(node, &fields.subject, "note")
    });
    note.unwrap_or_default().to_owned()
}
