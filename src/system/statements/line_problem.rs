//! Why a typed line is no statement: where, what was found, what was expected, what was probably meant.

use crate::system::moment_request::MomentProblem;
use crate::units::entry::EntryProblem;
use thiserror::Error;

/// A line that could not be read, with the place where that became clear.
#[derive(Clone, Debug, Error, PartialEq)]
#[error("column {column}: {fault}")]
pub struct LineProblem {
    /// The character that the problem starts at, counted from 1.
    pub column: usize,
    /// What is wrong.
    pub fault: LineFault,
}

/// What can be wrong with a line.
#[derive(Clone, Debug, Error, PartialEq)]
pub enum LineFault {
    /// There is nothing.
    #[error("nothing is stated; write a line such as {EXAMPLE}")]
    Empty,
    /// A body that the system does not have.
    #[error("\"{found}\" is no body here, allowed {allowed}{}", meant(likely.as_ref()))]
    NoSuchBody {
        /// What stands there.
        found: String,
        /// Every body.
        allowed: String,
        /// What was probably meant.
        likely: Option<String>,
    },
    /// A quantity that the body does not have.
    #[error("\"{found}\" is no quantity of {body}, allowed {allowed}{}", meant(likely.as_ref()))]
    NoSuchQuantity {
        /// What stands there.
        found: String,
        /// The star or a planet.
        body: &'static str,
        /// The most used ones.
        allowed: String,
        /// What was probably meant.
        likely: Option<String>,
    },
    /// A phase that stars do not have.
    #[error("\"{found}\" is no phase of a star, allowed {allowed}{}", meant(likely.as_ref()))]
    NoSuchPhase {
        /// What stands there.
        found: String,
        /// Every phase.
        allowed: String,
        /// What was probably meant.
        likely: Option<String>,
    },
    /// A quotation mark that is never closed, or missing.
    #[error("the name of the event has to stand in quotation marks, such as event 'largest radius'")]
    EventUnquoted,
    /// It is not said when.
    #[error(
        "it is not said when; write at 5 Gyr, at now, at event 'largest radius', ever, always, or from 1 Gyr to 5 Gyr"
    )]
    NoTime,
    /// A moment where only a stretch of time has a meaning.
    #[error("{quantity} is not of one moment; leave the time out{}", if *may_be_part { ", or write from 1 Gyr to 5 Gyr" } else { "" })]
    NotOfAMoment {
        /// The quantity in its words.
        quantity: String,
        /// Whether it can be said of a stretch of time.
        may_be_part: bool,
    },
    /// The text of a time is none.
    #[error("{0}")]
    Moment(MomentProblem),
    /// The end of a stretch of time is missing.
    #[error("the end of the time is missing; write from 1 Gyr to 5 Gyr")]
    NoEnd,
    /// It is not said how the quantity stands to the value.
    #[error("{} here, allowed is about, at least, at most, between … and …", found(text))]
    NoRelation {
        /// What stands there.
        text: String,
    },
    /// The value is none.
    #[error("{0}")]
    Value(EntryProblem),
    /// A number without its unit.
    #[error("{number} has no unit; write it as {number} {unit}")]
    NoUnit {
        /// The number as typed.
        number: String,
        /// The unit that the quantity is kept in.
        unit: &'static str,
    },
    /// The upper value is missing.
    #[error("the second value is missing; write between 1 and 2 with a unit")]
    NoSecondValue,
    /// How near is near enough is no positive number.
    #[error("\"{0}\" does not say how near; write within 10 %, or a difference with its unit")]
    BadTolerance(String),
}

/// A line as it may be typed.
const EXAMPLE: &str = "star luminosity at 5 Gyr is about 1.0 Lsun";

fn meant(likely: Option<&String>) -> String {
    likely.map_or_else(String::new, |likely| format!("; did you mean {likely}?"))
}

fn found(text: &str) -> String {
    if text.is_empty() { "the line ends".to_owned() } else { format!("\"{text}\" stands") }
}
