//! A moment as people name it: a span of time, `now`, or an event.

use super::events::{Event, EventKind};
use super::history::History;
use super::specification::Body;
use crate::physics::star::END_YR;
use crate::units::entry::{EntryKind, write_entry};
use crate::units::number_text::machine;
use crate::units::time_words::{NotASpan, SpanStyle, parse_span, span};
use thiserror::Error;

/// What starts an event's name.
const EVENT_PREFIX: &str = "event";

/// Quotation marks around a name, the ones that are written first.
const QUOTES: [(char, char); 3] = [('\'', '\''), ('"', '"'), ('“', '”')];

/// Digits of the times that tell events apart.
const DATE_DIGITS: usize = 6;

/// Names by which an event is known besides its own, with its key.
const ALSO_KNOWN: [(&str, &str); 3] = [
    ("end of core hydrogen burning", "main_sequence_end"),
    ("swallowed by the star", "engulfed"),
    ("set free from the star", "unbound"),
];

/// A moment asked for.
#[derive(Clone, Debug, PartialEq)]
pub enum MomentRequest {
    /// A time since the star's arrival on the main sequence, yr.
    Time(f64),
    /// The scenario's present age.
    Now,
    /// An event, by its name or key, with or without its planet.
    Event(String),
}

/// Why a text names no moment of a history.
#[derive(Clone, Debug, Error, PartialEq)]
pub enum MomentProblem {
    /// The text is no time at all.
    #[error("the time {0}, or say now or event:NAME")]
    NotASpan(#[from] NotASpan),
    /// The time is negative or later than anything computed.
    #[error("the time is {} yr, allowed 0 to {} yr after the star reached the main sequence; choose a time in that range", plain(*time_yr), plain(END_YR))]
    OutOfRange {
        /// The time, yr.
        time_yr: f64,
    },
    /// A star without a scenario has no present.
    #[error(
        "the time is now, allowed with a scenario only, which has a present age; give a time such as 4.57Gyr or an event:NAME"
    )]
    NoPresent,
    /// No event of that name.
    #[error("the event \"{name}\" does not happen here; name one of these: {}", list(available))]
    NoSuchEvent {
        /// The name asked for.
        name: String,
        /// Every event there is.
        available: Vec<String>,
    },
    /// More than one event of that name.
    #[error("the event \"{name}\" happens {} times; give the time of one of these or name its planet: {}", matching.len(), list(matching))]
    Ambiguous {
        /// The name asked for.
        name: String,
        /// The events that match.
        matching: Vec<String>,
    },
}

fn plain(value_yr: f64) -> String {
    machine(value_yr).unwrap_or_else(|| value_yr.to_string())
}

fn list(names: &[String]) -> String {
    names.join(", ")
}

/// A typed text with spaces for line breaks and other control characters, so that no sentence about it is torn.
#[must_use]
pub(super) fn on_one_line(text: &str) -> String {
    text.chars().map(|sign| if sign.is_control() { ' ' } else { sign }).collect()
}

impl MomentRequest {
    /// Reads the text of a moment: `4.57 Gyr`, `now`, `event:"largest radius"`, `event 'largest radius'`.
    ///
    /// # Errors
    /// [`MomentProblem`] when it is neither a time in the computed range nor the name of something.
    pub fn parse(text: &str) -> Result<Self, MomentProblem> {
        let text = on_one_line(text);
        let trimmed = text.trim();
        if trimmed.eq_ignore_ascii_case("now") {
            return Ok(Self::Now);
        }
        if let Some(name) = event_name(trimmed) {
            return Ok(Self::Event(unquoted(name).to_owned()));
        }
        Ok(Self::Time(in_range(parse_span(trimmed)?)?))
    }

    /// The moment as a text that [`MomentRequest::parse`] reads back to the same one.
    #[must_use]
    pub fn text(&self) -> String {
        match self {
            Self::Time(time_yr) => write_entry(*time_yr, EntryKind::SpanYr),
            Self::Now => "now".to_owned(),
            Self::Event(name) => format!("event {}", quoted(name)),
        }
    }

    /// The moment under a planet's new name, where it is an event of that planet.
    #[must_use]
    pub fn renamed(&self, before: &str, after: &str) -> Option<Self> {
        let Self::Event(name) = self else { return None };
        let rest = strip_prefix_ignoring_case(name, before)?.trim_start().strip_prefix(':')?;
        Some(Self::Event(format!("{after}:{rest}")))
    }

    /// The event it means in a history; `None` where it is no event.
    ///
    /// # Errors
    /// [`MomentProblem`] when there is no such event or more than one.
    pub fn event<'h>(&self, history: &'h History) -> Result<Option<&'h Event>, MomentProblem> {
        match self {
            Self::Time(_) | Self::Now => Ok(None),
            Self::Event(name) => event_named(history, name).map(Some),
        }
    }

    /// The time it means in a history, yr. `present_age_yr` is what `now` means, if it means anything.
    ///
    /// # Errors
    /// [`MomentProblem`] when it means no moment of this history.
    pub fn time_yr(&self, history: &History, present_age_yr: Option<f64>) -> Result<f64, MomentProblem> {
        match self {
            Self::Time(time_yr) => Ok(*time_yr),
            Self::Now => in_range(present_age_yr.ok_or(MomentProblem::NoPresent)?),
            Self::Event(name) => in_range(event_named(history, name)?.time_yr),
        }
    }
}

fn in_range(time_yr: f64) -> Result<f64, MomentProblem> {
    if (0.0..=END_YR).contains(&time_yr) {
        // Minus zero is birth as well.
        return Ok(time_yr.abs());
    }
    Err(MomentProblem::OutOfRange { time_yr })
}

fn event_named<'h>(history: &'h History, name: &str) -> Result<&'h Event, MomentProblem> {
    let described = |event: &Event| {
        format!("\"{}\" at {}", event.label(history), span(event.time_yr, DATE_DIGITS, SpanStyle::Symbols))
    };
    let matching: Vec<&Event> = history.events().iter().filter(|event| is_named(history, event, name)).collect();
    match matching.as_slice() {
        [event] => Ok(*event),
        [] => Err(MomentProblem::NoSuchEvent {
            name: name.chars().take(80).collect(),
            available: history.events().iter().map(described).collect(),
        }),
        several => Err(MomentProblem::Ambiguous {
            name: name.to_owned(),
            matching: several.iter().map(|event| described(event)).collect(),
        }),
    }
}

/// Whether a name means a kind of event: by its words or its key, whatever the case.
pub(super) fn is_kind_named(kind: EventKind, name: &str) -> bool {
    words_of(kind).contains(&folded(name))
}

/// Names by which a kind of event is known, in lower case.
fn words_of(kind: EventKind) -> Vec<String> {
    let key = kind.key();
    let mut words = vec![folded(&kind.name()), folded(key), folded(&key.replace('_', " "))];
    words.extend(ALSO_KNOWN.iter().filter(|(_, of)| *of == key).map(|(known, _)| (*known).to_owned()));
    words
}

/// Whether a name means an event: by its words or its key, alone or after `PLANET: `, whatever the case.
fn is_named(history: &History, event: &Event, name: &str) -> bool {
    let wanted = folded(name);
    let words = words_of(event.kind);
    if words.contains(&wanted) {
        return true;
    }
    let Body::Planet(index) = event.body else { return false };
    let Some(planet) = history.system().planets.get(index) else { return false };
    // The planet's own name may hold a colon, so the name is compared whole.
    let planet = folded(&planet.name);
    words.iter().any(|word| wanted == format!("{planet}: {word}"))
}

/// Lower case, with single spaces.
fn folded(text: &str) -> String {
    text.split_whitespace().collect::<Vec<_>>().join(" ").to_lowercase()
}

/// What follows the word that starts an event: a colon, a space or a quotation mark has to come next.
fn event_name(text: &str) -> Option<&str> {
    let rest = strip_prefix_ignoring_case(text, EVENT_PREFIX)?;
    let is_apart = rest.starts_with(|sign: char| sign == ':' || sign.is_whitespace() || QUOTES.contains(&(sign, sign)));
    is_apart.then(|| rest.trim_start().trim_start_matches(':'))
}

/// A name in quotation marks that do not stand in it.
fn quoted(name: &str) -> String {
    let (open, close) = QUOTES.into_iter().find(|(_, close)| !name.contains(*close)).unwrap_or(QUOTES[0]);
    format!("{open}{name}{close}")
}

fn strip_prefix_ignoring_case<'a>(text: &'a str, prefix: &str) -> Option<&'a str> {
    let start = text.get(..prefix.len())?;
    start.eq_ignore_ascii_case(prefix).then(|| &text[prefix.len()..])
}

/// The text without one pair of quotation marks, which a shell may or may not have taken away.
fn unquoted(text: &str) -> &str {
    let text = text.trim();
    QUOTES.into_iter().find_map(|(open, close)| text.strip_prefix(open)?.strip_suffix(close)).unwrap_or(text).trim()
}

#[cfg(test)]
mod tests {
    use super::*;

    #[test]
    fn every_form_is_understood() {
        let parse = |text: &str| MomentRequest::parse(text).expect(text);
        assert_eq!(parse("4.57Gyr"), MomentRequest::Time(4.57e9));
        assert_eq!(parse("2.1e12yr"), MomentRequest::Time(2.1e12));
        assert_eq!(parse("3 trillion years"), MomentRequest::Time(3e12));
        assert_eq!(parse(" 1e14 yr "), MomentRequest::Time(1e14));
        assert_eq!(parse("0"), MomentRequest::Time(0.0));
        assert_eq!(parse("Now"), MomentRequest::Now);
        for text in [
            "event:\"largest radius\"",
            "event:largest radius",
            "EVENT: 'largest radius' ",
            "event:“largest radius”",
            "event 'largest radius'",
            "event largest radius",
        ] {
            assert_eq!(parse(text), MomentRequest::Event("largest radius".to_owned()));
        }
    }

    #[test]
    fn times_outside_the_computed_range_are_refused_with_the_range() {
        for text in ["-1 yr", "-5Gyr", "1.0000001e14 yr", "1e290 Gyr", "101 trillion years"] {
            let error = MomentRequest::parse(text).expect_err(text).to_string();
            assert!(error.contains("0 to 100000000000000 yr"), "{text}: {error}");
        }
        assert!(MomentRequest::parse("-0 yr").is_ok_and(|moment| moment == MomentRequest::Time(0.0)));
    }

    #[test]
    fn what_is_no_time_is_refused_with_examples() {
        for text in ["", "soon", "nan", "inf", "4,57 Gyr", "7 parsecs", "evén:x", "eventually"] {
            let error = MomentRequest::parse(text).expect_err(text).to_string();
            assert!(error.contains("7.6 Gyr") && error.contains("event:NAME"), "{text}: {error}");
        }
    }
}
