//! The events before and after a moment.

use super::content::Dated;
use super::marks::Marks;
use crate::handover::dated_events::doubt;
use crate::system::History;
use crate::units::time_words::{SpanStyle, spans_apart};

/// Events shown on either side of the moment.
const BEFORE: usize = 4;
const AFTER: usize = 5;

/// The events nearest to a moment, oldest first, the last ones before it and the first ones after it.
pub(super) fn around(history: &History, time_yr: f64, marks: &mut Marks) -> Vec<Dated> {
    let events = history.events();
    let first_after = events.partition_point(|event| event.time_yr <= time_yr);
    let shown = &events[first_after.saturating_sub(BEFORE)..(first_after + AFTER).min(events.len())];
    let dates: Vec<f64> = shown.iter().map(|event| event.time_yr).collect();
    let dates = spans_apart(&dates, SpanStyle::Symbols);
    shown
        .iter()
        .zip(dates)
        .map(|(event, date)| Dated {
            date,
            what: event.label(history),
            doubt: doubt(event, SpanStyle::Symbols),
            is_past: event.time_yr <= time_yr,
            mark: marks.of(event.kind.method()),
        })
        .collect()
}
