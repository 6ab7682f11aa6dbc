//! What was found, in sentences that take no side.

use super::judge::{Finding, NEVER};
use super::phrases::{is_logarithmic, value_text};
use super::quantity::{FigureKey, Quantity, figure, words_of};
use super::spread::Range;
use super::statement::{During, Relation, Statement, Subject, Tolerance, When};
use super::verdict::{Verdict, usual_tolerance};
use crate::system::history::History;
use crate::system::moment_request::MomentRequest;
use crate::system::provenance::method;
use crate::units::entry::EntryKind;
use crate::units::number_text::{USUAL_DIGITS, number};
use crate::units::time_words::short_span;

/// The sentences about a statement: what the model finds, how that stands to what is stated, and the source.
pub(super) fn sentence(
    statement: &Statement,
    history: &History,
    finding: &Finding,
    verdict: Verdict,
    factor: Option<f64>,
    difference: Option<f64>,
) -> String {
    let found = found(statement, history, finding);
    let stated = stated(statement, verdict, factor, difference);
    let source = method(finding.method)
        .map_or_else(String::new, |method| format!(" Method: {} ({}).", method.name, method.source));
    format!("{found} {stated}{source}")
}

fn found(statement: &Statement, history: &History, finding: &Finding) -> String {
    let name = match &statement.subject {
        Subject::Star => history.system().star.name.as_str(),
        Subject::Planet(name) => name,
    };
    let Some(value) = finding.value else {
        let reason = finding.reason.as_deref().unwrap_or(NEVER);
        return match &statement.quantity {
            Quantity::Date(event) if reason == NEVER => {
                format!("In this model the event \"{event}\" never takes place for {name}.")
            }
            quantity => format!("No value for the {} of {name}: {reason}.", quantity_words(quantity)),
        };
    };
    let shown = model_value(&statement.quantity, value, finding.is_bound);
    let spread = spread_text(&statement.quantity, value, finding);
    let at = finding.time_yr.map(short_span).unwrap_or_default();
    match &statement.quantity {
        Quantity::Figure(key) => {
            let words = words_of(key);
            match &statement.when {
                When::At(moment) => {
                    format!("The {words} of {name} {} is {shown} in this model{spread}.", at_moment(moment, &at))
                }
                When::Ever(during) | When::Always(during) | When::Life(during) => {
                    let range = finding.ends.map_or_else(String::new, |(low, high)| range_text(key, low, high));
                    format!(
                        "The {words} of {name}{}{range}; it is {shown} at {at} in this model{spread}.",
                        whole(during.as_ref())
                    )
                }
            }
        }
        Quantity::Highest(_) | Quantity::Lowest(_) => {
            let during = match &statement.when {
                When::Life(during) | When::Ever(during) | When::Always(during) => during.as_ref(),
                When::At(_) => None,
            };
            let words = quantity_words(&statement.quantity);
            format!("The {words} of {name}{} is {shown} in this model, at {at}{spread}.", whole(during))
        }
        Quantity::Date(event) => {
            format!("In this model the event \"{event}\" takes place for {name} at {shown}{spread}.")
        }
        Quantity::Lifetime => {
            format!("In this model {name} shines for {shown} before it leaves a remnant or nothing{spread}.")
        }
        Quantity::Duration(phase) => {
            format!("In this model {name} spends {shown} in the phase \"{}\"{spread}.", super::phase_words(*phase))
        }
        Quantity::MildTime => format!("In this model {name} has open water for {shown} in all{spread}."),
        Quantity::LongestMildTime => {
            format!("In this model the longest spell in which {name} has open water lasts {shown}{spread}.")
        }
        Quantity::HabitableZoneTime => {
            format!("In this model {name} is inside the conservative habitable zone for {shown}{spread}.")
        }
    }
}

fn stated(statement: &Statement, verdict: Verdict, factor: Option<f64>, difference: Option<f64>) -> String {
    let words = match statement.relation {
        Relation::Happens => "that it happens".to_owned(),
        Relation::NeverHappens => "that it never happens".to_owned(),
        relation => relation_words(&statement.quantity, relation),
    };
    let comparison = comparison(statement, factor, difference);
    let when = if matches!(statement.when, When::Always(_)) {
        " at every time"
    } else if matches!(statement.when, When::Ever(_)) {
        " at some time"
    } else {
        ""
    };
    let verdict = match verdict {
        Verdict::Holds => "The statement holds.",
        Verdict::WithinSpread => "The spread of the model neither confirms nor contradicts the statement.",
        Verdict::DoesNotHold => "The statement does not hold.",
        Verdict::NotJudged => "The statement cannot be judged.",
    };
    format!("Stated is {words}{when}{comparison}. {verdict}")
}

/// How the value stands to the stated one.
fn comparison(statement: &Statement, factor: Option<f64>, difference: Option<f64>) -> String {
    let Some(difference) = difference else { return String::new() };
    let kind = statement.quantity.entry();
    let edge = if matches!(statement.relation, Relation::Between(..)) { "the nearer of these" } else { "that" };
    let by_difference = is_logarithmic(&statement.quantity) || kind == EntryKind::TemperatureK || factor.is_none();
    if difference == 0.0 {
        return format!("; the model's value equals {edge}");
    }
    if by_difference {
        let more = if difference > 0.0 { "above" } else { "below" };
        return format!("; the model's value is {} {more} {edge}", with_unit(&statement.quantity, difference.abs(), 2));
    }
    let factor = factor.unwrap_or(1.0);
    let digits = if (0.9..1.1).contains(&factor) { 3 } else { 2 };
    format!("; the model's value is {} times {edge}", number(factor, digits))
}

/// The relation with its values, for a sentence.
fn relation_words(quantity: &Quantity, relation: Relation) -> String {
    let value = |value| stated_value(quantity, value);
    match relation {
        Relation::About(near, tolerance) => {
            let reach = match tolerance.unwrap_or_else(|| usual_tolerance(quantity)) {
                Tolerance::Percent(percent) => format!("{} %", number(percent, 2)),
                Tolerance::Difference(difference) => with_unit(quantity, difference, 2),
            };
            format!("about {} (within {reach})", value(near))
        }
        Relation::AtLeast(least) => format!("at least {}", value(least)),
        Relation::AtMost(most) => format!("at most {}", value(most)),
        Relation::Between(low, high) => format!("between {} and {}", value(low), value(high)),
        Relation::Happens | Relation::NeverHappens => String::new(),
    }
}

/// A stated value with no more digits than were stated.
fn stated_value(quantity: &Quantity, value: f64) -> String {
    let typed = value_text(value, quantity.entry());
    let digits = typed.chars().filter(char::is_ascii_digit).count().clamp(1, USUAL_DIGITS);
    // The fewest digits that tell the value: 5 Gyr, not 5.000 Gyr.
    let digits = (1..=digits).find(|digits| {
        let rounded = format!("{:.*e}", digits - 1, value).parse::<f64>().unwrap_or(value);
        rounded == value
    });
    with_unit(quantity, value, digits.unwrap_or(USUAL_DIGITS))
}

/// The model's value with its unit.
pub(super) fn model_value(quantity: &Quantity, value: f64, is_bound: bool) -> String {
    let digits = match quantity {
        Quantity::Figure(key) | Quantity::Highest(key) | Quantity::Lowest(key) => {
            figure(key).map_or(USUAL_DIGITS, |figure| figure.digits)
        }
        _ => USUAL_DIGITS,
    };
    let above = if is_bound { "above " } else { "" };
    format!("{above}{}", with_unit(quantity, value, digits))
}

fn with_unit(quantity: &Quantity, value: f64, digits: usize) -> String {
    if quantity.entry() == EntryKind::SpanYr {
        return crate::units::time_words::span(value, digits, crate::units::time_words::SpanStyle::Symbols);
    }
    let symbol = symbol(quantity);
    let gap = if symbol.is_empty() || symbol == "°" { "" } else { " " };
    format!("{}{gap}{symbol}", number(value, digits))
}

fn symbol(quantity: &Quantity) -> &'static str {
    match quantity {
        Quantity::Figure(key) | Quantity::Highest(key) | Quantity::Lowest(key) => {
            let symbol = figure(key).map_or("", |figure| figure.symbol);
            if symbol.is_empty() { quantity.entry().symbol() } else { symbol }
        }
        _ => "",
    }
}

/// The spread in brackets; empty where none is published.
pub(super) fn spread_text(quantity: &Quantity, value: f64, finding: &Finding) -> String {
    range_words(quantity, value, finding.is_bound, finding.known)
        .map_or_else(String::new, |words| format!(" ({words})"))
}

/// The spread in words: `± 5 %`, `between 11.9 Gyr and 12.4 Gyr`.
pub(super) fn range_words(quantity: &Quantity, value: f64, is_bound: bool, known: Option<Range>) -> Option<String> {
    let shown = |value| with_unit(quantity, value, USUAL_DIGITS);
    match known? {
        _ if is_bound => None,
        Range { lowest: Some(lowest), highest: Some(highest) } => {
            let (down, up) = (value - lowest, highest - value);
            if value != 0.0 && (up - down).abs() <= 1e-6 * up.abs() && quantity.entry() != EntryKind::Plain {
                return Some(format!("± {} %", number(100.0 * (up / value).abs(), 1)));
            }
            Some(format!("between {} and {}", shown(lowest), shown(highest)))
        }
        Range { lowest: Some(lowest), highest: None } if matches!(quantity, Quantity::Date(_)) => {
            Some(format!("after {}, or never", shown(lowest)))
        }
        Range { lowest: Some(lowest), highest: None } => Some(format!("at least {}", shown(lowest))),
        Range { lowest: None, highest: Some(highest) } => Some(format!("at most {}", shown(highest))),
        Range { lowest: None, highest: None } => None,
    }
}

fn range_text(key: FigureKey, low: f64, high: f64) -> String {
    let quantity = Quantity::Figure(key);
    format!(" runs from {} to {}", model_value(&quantity, low, false), model_value(&quantity, high, false))
}

fn quantity_words(quantity: &Quantity) -> String {
    match quantity {
        Quantity::Date(event) => format!("date of the event \"{event}\""),
        other => other.words(),
    }
}

fn at_moment(moment: &MomentRequest, at: &str) -> String {
    match moment {
        MomentRequest::Time(_) => format!("at {at}"),
        MomentRequest::Now => format!("now, at {at},"),
        MomentRequest::Event(name) => format!("at {at}, at the event \"{name}\","),
    }
}

fn whole(during: Option<&During>) -> String {
    let moment = |moment: &MomentRequest| match moment {
        MomentRequest::Time(time_yr) => short_span(*time_yr),
        MomentRequest::Now => "now".to_owned(),
        MomentRequest::Event(name) => format!("\"{name}\""),
    };
    match during {
        None => " over the whole life".to_owned(),
        Some(During { from, to }) => format!(" from {} to {}", moment(from), moment(to)),
    }
}
