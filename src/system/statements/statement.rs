//! What is stated.

use super::quantity::Quantity;
use crate::system::moment_request::MomentRequest;

/// Most statements of a scenario.
pub const MOST_STATEMENTS: usize = 200;

/// One statement: of what, which quantity, when, and how it stands to which value.
#[derive(Clone, Debug, PartialEq)]
pub struct Statement {
    /// The body it is about.
    pub subject: Subject,
    /// What of it.
    pub quantity: Quantity,
    /// When.
    pub when: When,
    /// How it stands to the stated value, in the unit that the quantity is kept in.
    pub relation: Relation,
    /// Where the statement comes from, or what is to be done about it; may be empty.
    pub note: String,
}

/// The body that a statement is about.
#[derive(Clone, Debug, PartialEq, Eq, Hash)]
pub enum Subject {
    /// The star.
    Star,
    /// The planet of this name.
    Planet(String),
}

/// When a statement is meant to hold.
#[derive(Clone, Debug, PartialEq)]
pub enum When {
    /// At one moment.
    At(MomentRequest),
    /// At some time or other.
    Ever(Option<During>),
    /// At every time.
    Always(Option<During>),
    /// For quantities of a whole life, or of a stretch of it.
    Life(Option<During>),
}

/// A stretch of time.
#[derive(Clone, Debug, PartialEq)]
pub struct During {
    /// Its start.
    pub from: MomentRequest,
    /// Its end.
    pub to: MomentRequest,
}

/// How a quantity stands to the stated value. Values are in the unit that the quantity is kept in.
#[derive(Clone, Copy, Debug, PartialEq)]
pub enum Relation {
    /// Near a value.
    About(f64, Option<Tolerance>),
    /// No less than a value.
    AtLeast(f64),
    /// No more than a value.
    AtMost(f64),
    /// Within two values, the lower one first.
    Between(f64, f64),
    /// Of an event: it takes place at all.
    Happens,
    /// Of an event: it never takes place.
    NeverHappens,
}

/// How near is near.
#[derive(Clone, Copy, Debug, PartialEq)]
pub enum Tolerance {
    /// Per cent of the stated value.
    Percent(f64),
    /// A difference in the unit that the quantity is kept in.
    Difference(f64),
}

impl Statement {
    /// Gives a planet its new name wherever the statement calls it by the old one.
    pub fn rename(&mut self, before: &str, after: &str) {
        if self.subject == Subject::Planet(before.to_owned()) {
            self.subject = Subject::Planet(after.to_owned());
        }
        let rename = |moment: &mut MomentRequest| {
            if let Some(renamed) = moment.renamed(before, after) {
                *moment = renamed;
            }
        };
        match &mut self.when {
            When::At(moment) => rename(moment),
            When::Ever(Some(during)) | When::Always(Some(during)) | When::Life(Some(during)) => {
                rename(&mut during.from);
                rename(&mut during.to);
            }
            When::Ever(None) | When::Always(None) | When::Life(None) => {}
        }
    }
}
