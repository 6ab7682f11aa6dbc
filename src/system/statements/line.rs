//! A typed line to a statement.

use super::line_problem::{LineFault, LineProblem};
use super::lookup;
use super::phrases::{is_quoted, starts_with_words, unquoted};
use super::quantity::Quantity;
use super::statement::{During, Relation, Statement, Subject, Tolerance, When};
use crate::system::moment_request::{MomentRequest, on_one_line};
use crate::system::specification::System;
use crate::units::entry::{EntryKind, parse_entry};
use crate::units::number_text::parse_number;

/// Reads a line about a system, such as `Ember surface temperature at event 'largest radius' is at most 300 K`.
///
/// # Errors
/// [`LineProblem`] with the column, what was expected there, and what was probably meant.
///
/// # Example
/// ```
/// use longember::system::statements::parse_statement;
/// use longember::system::{PlanetSpecification, StarSpecification, System};
/// let system = System { star: StarSpecification::default(), planets: vec![PlanetSpecification::default()] };
/// let statement = parse_statement("star luminosity at 5 Gyr is about 1.0 Lsun", &system).unwrap();
/// assert_eq!(statement.line(), "star luminosity at 5 Gyr is about 1 Lsun");
/// ```
pub fn parse_statement(line: &str, system: &System) -> Result<Statement, LineProblem> {
    read(line, system, false)
}

/// Reads a line of a file, in which a planet may be named that was removed since: judging tells so.
///
/// # Errors
/// As [`parse_statement`].
pub fn parse_saved_statement(line: &str, system: &System) -> Result<Statement, LineProblem> {
    read(line, system, true)
}

fn read(line: &str, system: &System, takes_unknown: bool) -> Result<Statement, LineProblem> {
    let line = &on_one_line(line);
    let mut cursor = Cursor { line, at: 0 };
    cursor.skip_space();
    if cursor.rest().is_empty() {
        return Err(cursor.problem(LineFault::Empty));
    }
    let subject = cursor.subject(system, takes_unknown)?;
    cursor.skip_words(&["'s", "’s"]);
    cursor.skip_words(&["the"]);
    let (quantity, is_event) = cursor.quantity(&subject)?;
    if is_event && let Some(relation) = cursor.event_relation() {
        cursor.end()?;
        return Ok(Statement { subject, quantity, when: When::Life(None), relation, note: String::new() });
    }
    let when = cursor.when(&quantity)?;
    let relation = cursor.relation(quantity.entry())?;
    Ok(Statement { subject, quantity, when, relation, note: String::new() })
}

/// Words that say "is", which may be left out.
const IS: [&str; 7] = ["is", "are", "was", "will be", "reaches", "gets", "lasts"];
/// What says near a value.
const ABOUT: [&str; 10] =
    ["about", "around", "roughly", "approximately", "nearly", "equal to", "equals", "~", "≈", "="];
/// What says no less than a value.
const AT_LEAST: [&str; 9] =
    ["at least", "no less than", "not less than", "more than", "above", "exceeds", "≥", ">=", ">"];
/// What says no more than a value.
const AT_MOST: [&str; 8] = ["at most", "no more than", "not more than", "less than", "below", "≤", "<=", "<"];
const BETWEEN: &str = "between";

/// A place in a line.
struct Cursor<'l> {
    line: &'l str,
    at: usize,
}

impl<'l> Cursor<'l> {
    fn rest(&self) -> &'l str {
        &self.line[self.at..]
    }

    fn skip_space(&mut self) {
        self.at = self.line.len() - self.rest().trim_start().len();
    }

    fn problem(&self, fault: LineFault) -> LineProblem {
        self.problem_at(self.at, fault)
    }

    fn problem_at(&self, at: usize, fault: LineFault) -> LineProblem {
        LineProblem { column: self.line[..at].chars().count() + 1, fault }
    }

    /// Takes the first of these words that stands here.
    fn skip_words(&mut self, choices: &[&str]) -> bool {
        let used = choices.iter().find_map(|words| starts_with_words(self.rest(), words));
        if let Some(used) = used {
            self.at += used;
            self.skip_space();
        }
        used.is_some()
    }

    /// What stands here up to the next space, for messages.
    fn next_word(&self) -> String {
        self.rest().split_whitespace().next().unwrap_or_default().chars().take(40).collect()
    }

    fn quoted_name(&mut self) -> Option<String> {
        let (name, used) = unquoted(self.rest())?;
        self.at += used;
        self.skip_space();
        Some(name)
    }

    fn subject(&mut self, system: &System, takes_unknown: bool) -> Result<Subject, LineProblem> {
        let start = self.at;
        if is_quoted(self.rest())
            && let Some(name) = self.quoted_name()
        {
            return match lookup::planet_named(system, &name) {
                Some(known) => Ok(Subject::Planet(known.to_owned())),
                None if takes_unknown => Ok(Subject::Planet(name)),
                None => Err(self.problem_at(start, lookup::no_body(system, name))),
            };
        }
        if let Some((subject, used)) = lookup::subject_at(system, self.rest()) {
            self.at += used;
            self.skip_space();
            return Ok(subject);
        }
        let word = self.next_word();
        if !takes_unknown {
            return Err(self.problem_at(start, lookup::no_body(system, word)));
        }
        self.at += word.len();
        self.skip_space();
        Ok(Subject::Planet(word))
    }

    /// The quantity, and whether it is an event that may happen or not.
    fn quantity(&mut self, subject: &Subject) -> Result<(Quantity, bool), LineProblem> {
        let of_an_event = self.skip_words(&["date of event", "date of", "event"]);
        if of_an_event {
            self.skip_words(&["event"]);
            let name = self.quoted_name().ok_or_else(|| self.problem(LineFault::EventUnquoted))?;
            return Ok((Quantity::Date(name), true));
        }
        match lookup::quantity_at(subject, self.rest()) {
            Ok((quantity, used)) => {
                self.at += used;
                self.skip_space();
                Ok((quantity, false))
            }
            Err((at, fault)) => Err(self.problem_at(self.at + at, fault)),
        }
    }

    fn event_relation(&mut self) -> Option<Relation> {
        if self.skip_words(&["never happens", "does not happen", "never"]) {
            return Some(Relation::NeverHappens);
        }
        self.skip_words(&["happens"]).then_some(Relation::Happens)
    }

    fn end(&self) -> Result<(), LineProblem> {
        if self.rest().trim_end_matches('.').trim().is_empty() {
            return Ok(());
        }
        Err(self.problem(LineFault::NoRelation { text: self.next_word() }))
    }

    fn when(&mut self, quantity: &Quantity) -> Result<When, LineProblem> {
        let start = self.at;
        let refused = || LineFault::NotOfAMoment { quantity: quantity.words(), may_be_part: may_be_part(quantity) };
        if self.skip_words(&["ever", "at any time", "at some time"]) {
            let during = self.during()?;
            return match quantity.is_of_a_moment() {
                true => Ok(When::Ever(during)),
                false if during.is_none() || may_be_part(quantity) => Ok(When::Life(during)),
                false => Err(self.problem_at(start, refused())),
            };
        }
        if self.skip_words(&["always", "at every time", "at all times"]) {
            let during = self.during()?;
            return if quantity.is_of_a_moment() {
                Ok(When::Always(during))
            } else {
                Err(self.problem_at(start, refused()))
            };
        }
        if let Some(during) = self.during()? {
            return match quantity.is_of_a_moment() {
                true => Ok(When::Always(Some(during))),
                false if may_be_part(quantity) => Ok(When::Life(Some(during))),
                false => Err(self.problem_at(start, refused())),
            };
        }
        let is_relation = relation_at(self.rest());
        let has_time = !is_relation && (self.skip_words(&["at"]) || starts_with_words(self.rest(), "now").is_some());
        match (has_time, quantity.is_of_a_moment()) {
            (true, true) => {
                let end = self.at + find_relation(self.rest());
                self.moment(end).map(When::At)
            }
            (true, false) => Err(self.problem_at(start, refused())),
            (false, true) => Err(self.problem(LineFault::NoTime)),
            (false, false) => Ok(When::Life(None)),
        }
    }

    /// A stretch of time, if one stands here.
    fn during(&mut self) -> Result<Option<During>, LineProblem> {
        if !self.skip_words(&["from"]) {
            return Ok(None);
        }
        let end = self.at + find_relation(self.rest());
        let middle = find_outside_quotes(&self.line[self.at..end], |rest| starts_with_words(rest, "to").is_some());
        let Some(middle) = middle else { return Err(self.problem_at(end, LineFault::NoEnd)) };
        let from = self.moment(self.at + middle)?;
        self.skip_words(&["to"]);
        let to = self.moment(end)?;
        Ok(Some(During { from, to }))
    }

    /// The moment that stands here and ends at a place.
    fn moment(&mut self, end: usize) -> Result<MomentRequest, LineProblem> {
        let text = self.line[self.at..end].trim();
        let moment = match starts_with_words(text, "event") {
            // In quotation marks a name may hold any sign.
            Some(used) => {
                let rest = text[used..].trim_start().trim_start_matches(':').trim_start();
                let name = match unquoted(rest) {
                    Some((name, used)) if rest[used..].trim().is_empty() => name,
                    Some(_) => return Err(self.problem(LineFault::EventUnquoted)),
                    None if rest.is_empty() || is_quoted(rest) => return Err(self.problem(LineFault::EventUnquoted)),
                    None => rest.to_owned(),
                };
                MomentRequest::Event(name)
            }
            None => MomentRequest::parse(text).map_err(|problem| self.problem(LineFault::Moment(problem)))?,
        };
        self.at = end;
        self.skip_space();
        Ok(moment)
    }

    fn relation(&mut self, kind: EntryKind) -> Result<Relation, LineProblem> {
        let says_is = self.skip_words(&IS);
        if self.skip_words(&AT_LEAST) {
            return self.value(self.line.len(), kind).map(Relation::AtLeast);
        }
        if self.skip_words(&AT_MOST) {
            return self.value(self.line.len(), kind).map(Relation::AtMost);
        }
        if self.skip_words(&[BETWEEN]) {
            return self.between(kind);
        }
        if self.skip_words(&ABOUT) || (says_is && !self.rest().is_empty()) {
            return self.about(kind);
        }
        Err(self.problem(LineFault::NoRelation { text: self.next_word() }))
    }

    fn about(&mut self, kind: EntryKind) -> Result<Relation, LineProblem> {
        let within = find_outside_quotes(self.rest(), |rest| starts_with_words(rest, "within").is_some());
        let Some(within) = within else {
            return self.value(self.line.len(), kind).map(|value| Relation::About(value, None));
        };
        let value = self.value(self.at + within, kind)?;
        self.skip_words(&["within"]);
        let text = self.rest().trim().trim_end_matches('.').trim_start_matches('±').trim();
        let tolerance = tolerance(text, kind);
        let tolerance = tolerance.ok_or_else(|| self.problem(LineFault::BadTolerance(text.to_owned())))?;
        Ok(Relation::About(value, Some(tolerance)))
    }

    fn between(&mut self, kind: EntryKind) -> Result<Relation, LineProblem> {
        let middle = find_outside_quotes(self.rest(), |rest| starts_with_words(rest, "and").is_some());
        let Some(middle) = middle else { return Err(self.problem_at(self.line.len(), LineFault::NoSecondValue)) };
        let low_text = self.line[self.at..self.at + middle].trim();
        let low_at = self.at;
        self.at += middle;
        self.skip_words(&["and"]);
        let high = self.value(self.line.len(), kind)?;
        // The unit may stand behind the second value only.
        let high_text = self.line[low_at + middle..].trim().trim_end_matches('.');
        let unit =
            unit_of(high_text.trim_start_matches(|sign: char| !sign.is_ascii_digit() && sign != '.' && sign != '−'));
        let low_text =
            if parse_number(low_text).is_some() { format!("{low_text} {unit}") } else { low_text.to_owned() };
        let low = value(&low_text, kind).map_err(|fault| self.problem_at(low_at, fault))?;
        Ok(Relation::Between(low.min(high), low.max(high)))
    }

    /// The value that stands here and ends at a place.
    fn value(&mut self, end: usize, kind: EntryKind) -> Result<f64, LineProblem> {
        let text = self.line[self.at..end].trim();
        let text = text.strip_suffix('.').unwrap_or(text);
        let read = value(text, kind).map_err(|fault| self.problem(fault))?;
        self.at = end;
        self.skip_space();
        Ok(read)
    }
}

/// Whether a quantity can be said of a part of a life.
fn may_be_part(quantity: &Quantity) -> bool {
    matches!(
        quantity,
        Quantity::Highest(_)
            | Quantity::Lowest(_)
            | Quantity::MildTime
            | Quantity::LongestMildTime
            | Quantity::HabitableZoneTime
    )
}

/// Whether a relation starts here.
fn relation_at(text: &str) -> bool {
    let all = IS.iter().chain(&ABOUT).chain(&AT_LEAST).chain(&AT_MOST).chain([&BETWEEN]);
    all.into_iter().any(|words| starts_with_words(text, words).is_some())
}

/// Where the relation starts; the end of the text where there is none.
fn find_relation(text: &str) -> usize {
    find_outside_quotes(text, relation_at).unwrap_or(text.len())
}

/// The first place outside quotation marks, at the start of a word, that is meant.
fn find_outside_quotes(text: &str, is_meant: impl Fn(&str) -> bool) -> Option<usize> {
    let mut skip_to = 0;
    let mut before = ' ';
    for (at, sign) in text.char_indices() {
        if at < skip_to {
            continue;
        }
        let starts = !(before.is_alphanumeric() && sign.is_alphanumeric());
        before = sign;
        if let Some((_, used)) = unquoted(&text[at..]) {
            skip_to = at + used;
        } else if starts && is_meant(&text[at..]) {
            return Some(at);
        }
    }
    None
}

/// A value with its unit.
fn value(text: &str, kind: EntryKind) -> Result<f64, LineFault> {
    let unit = kind.typed_unit();
    if parse_number(text).is_some() && !unit.is_empty() {
        return Err(LineFault::NoUnit { number: text.to_owned(), unit });
    }
    parse_entry(text, kind).map_err(LineFault::Value)
}

/// What follows the number at the start of a text.
fn unit_of(text: &str) -> &str {
    let mut ends = text.char_indices().rev().map(|(at, sign)| at + sign.len_utf8());
    let number = ends.find(|end| parse_number(&text[..*end]).is_some()).unwrap_or(0);
    text[number..].trim()
}

/// How near is near enough: a share, or a difference in the unit that the quantity is kept in.
fn tolerance(text: &str, kind: EntryKind) -> Option<Tolerance> {
    let tolerance = match text.strip_suffix('%') {
        Some(percent) if kind != EntryKind::Plain => Tolerance::Percent(parse_number(percent)?),
        _ => {
            let kind = if kind == EntryKind::TemperatureK { EntryKind::TemperatureDifferenceK } else { kind };
            Tolerance::Difference(value(text, kind).ok()?)
        }
    };
    let (Tolerance::Percent(size) | Tolerance::Difference(size)) = tolerance;
    (size >= 0.0 && size.is_finite()).then_some(tolerance)
}
