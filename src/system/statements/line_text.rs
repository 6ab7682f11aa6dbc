//! A statement to the line that is typed for it.

use super::phrases::{quoted, value_text};
use super::statement::{During, Relation, Statement, Subject, Tolerance, When};
use crate::system::moment_request::MomentRequest;
use crate::units::entry::EntryKind;
use crate::units::number_text::machine;

impl Statement {
    /// The statement as a line that reads back to the same one, without its note.
    #[must_use]
    pub fn line(&self) -> String {
        let subject = match &self.subject {
            Subject::Star => "star".to_owned(),
            Subject::Planet(name) if is_word(name) => name.clone(),
            Subject::Planet(name) => quoted(name),
        };
        let kind = self.quantity.entry();
        if matches!(self.relation, Relation::Happens | Relation::NeverHappens) {
            let event = self.quantity.words();
            let event = event.strip_prefix("date of ").unwrap_or(&event);
            return format!("{subject} {event} {}", relation_text(self.relation, kind));
        }
        let when = match &self.when {
            When::At(moment) => format!(" at {}", moment_text(moment)),
            When::Ever(during) => format!(" ever{}", during_text(during.as_ref())),
            When::Always(during) => format!(" always{}", during_text(during.as_ref())),
            When::Life(during) => during_text(during.as_ref()),
        };
        format!("{subject} {}{when} {}", self.quantity.words(), relation_text(self.relation, kind))
    }
}

/// Whether a name needs no quotation marks.
fn is_word(name: &str) -> bool {
    let is_plain = |sign: char| sign.is_alphanumeric() || matches!(sign, '-' | '_');
    name.starts_with(char::is_alphabetic)
        && name.chars().all(is_plain)
        && !["star", "the"].contains(&name.to_lowercase().as_str())
}

fn during_text(during: Option<&During>) -> String {
    during.map_or_else(String::new, |during| {
        format!(" from {} to {}", moment_text(&during.from), moment_text(&during.to))
    })
}

fn moment_text(moment: &MomentRequest) -> String {
    match moment {
        MomentRequest::Event(name) => format!("event {}", quoted(name)),
        other => other.text(),
    }
}

/// A relation with its values, as it is typed.
pub(super) fn relation_text(relation: Relation, kind: EntryKind) -> String {
    let value = |value| value_text(value, kind);
    match relation {
        Relation::About(near, None) => format!("is about {}", value(near)),
        Relation::About(near, Some(Tolerance::Percent(percent))) => {
            format!("is about {} within {} %", value(near), machine(percent).unwrap_or_default())
        }
        Relation::About(near, Some(Tolerance::Difference(difference))) => {
            let kind = if kind == EntryKind::TemperatureK { EntryKind::TemperatureDifferenceK } else { kind };
            format!("is about {} within {}", value(near), value_text(difference, kind))
        }
        Relation::AtLeast(least) => format!("is at least {}", value(least)),
        Relation::AtMost(most) => format!("is at most {}", value(most)),
        Relation::Between(low, high) => format!("is between {} and {}", value(low), value(high)),
        Relation::Happens => "happens".to_owned(),
        Relation::NeverHappens => "never happens".to_owned(),
    }
}
