//! Taking values out of parsed text: every wrong, missing or unknown field becomes a problem with its place.

use super::problem::{Fault, Place, Problem, Subject};
use super::ron_text::{self, Field, Lines, Node, Parsed, Record, SyntaxFault, Value};
use crate::units::likeness::likest;
use std::collections::HashMap;

/// More problems than this are not listed.
const MOST_PROBLEMS: usize = 100;

/// A text being read, with the problems found so far.
#[derive(Debug)]
pub(super) struct Reading<'t> {
    lines: Lines<'t>,
    file: &'t str,
    problems: Vec<(usize, Problem)>,
}

/// The fields of one struct.
#[derive(Debug)]
pub(super) struct Fields<'n> {
    by_key: HashMap<&'n str, &'n Field>,
    /// Keys that a mistyped key was meant to be: not reported as missing too.
    meant: Vec<&'static str>,
    damaged: bool,
    start: usize,
    /// The body that problems name.
    pub(super) subject: Subject,
}

impl<'t> Reading<'t> {
    /// Parses a text that was shown under the name `file`; `wanted` names its outermost struct.
    pub(super) fn begin(text: &'t str, file: &'t str, wanted: &'static str) -> (Self, Parsed) {
        let mut parsed = ron_text::parse(text, wanted);
        let mut reading = Self { lines: Lines::new(text), file, problems: Vec::new() };
        for (offset, fault) in std::mem::take(&mut parsed.faults) {
            reading.report(offset, &Subject::Whole, None, fault.into());
        }
        (reading, parsed)
    }

    /// Notes a problem.
    pub(super) fn report(&mut self, offset: usize, subject: &Subject, key: Option<&'static str>, fault: Fault) {
        if self.is_full() {
            return;
        }
        let fault = if self.problems.len() == MOST_PROBLEMS {
            Fault::Syntax(SyntaxFault::TooMany { most: MOST_PROBLEMS })
        } else {
            fault
        };
        let place = Some(self.place(offset));
        self.problems.push((offset, Problem { subject: subject.clone(), key, fault, place }));
    }

    /// No problem is noted any more.
    fn is_full(&self) -> bool {
        self.problems.len() > MOST_PROBLEMS
    }

    /// The place of a byte offset.
    pub(super) fn place(&self, offset: usize) -> Place {
        let (line, column) = self.lines.line_and_column(offset);
        Place { file: self.file.to_owned(), line, column }
    }

    /// The problems in the order of the text.
    pub(super) fn finish(mut self) -> Vec<Problem> {
        self.problems.sort_by_key(|(offset, _)| *offset);
        self.problems.into_iter().map(|(_, problem)| problem).collect()
    }

    /// The fields of a struct; reports another kind of value, another name, unknown and repeated keys.
    pub(super) fn fields<'n>(
        &mut self,
        node: &'n Node,
        name: &'static str,
        key: &'static str,
        keys: &'static [&'static str],
        subject: Subject,
    ) -> Option<Fields<'n>> {
        let Value::Record(record) = &node.value else {
            self.wrong_kind(node, &subject, key, format!("{name}({}: …)", keys[0]));
            return None;
        };
        if let Some(found) = record.name.as_ref().filter(|found| *found != name) {
            self.report(node.span.start, &subject, None, Fault::WrongName { found: found.clone(), allowed: name });
        }
        let mut by_key: HashMap<&str, &Field> = HashMap::new();
        let mut meant = Vec::new();
        for field in &record.fields {
            if self.is_full() {
                break;
            }
            let at = field.key_span.start;
            let Some(known) = keys.iter().copied().find(|known| *known == field.key) else {
                let likely = likest(&field.key, keys);
                meant.extend(likely);
                let fault = Fault::UnknownKey { key: field.key.clone(), allowed: keys, meant: likely };
                self.report(at, &subject, None, fault);
                continue;
            };
            if let Some(first) = by_key.get(known) {
                let (first_line, _) = self.lines.line_and_column(first.key_span.start);
                self.report(at, &subject, Some(known), Fault::KeyTwice { key: field.key.clone(), first_line });
            } else {
                by_key.insert(known, field);
            }
        }
        Some(Fields { by_key, meant, damaged: record.damaged, start: node.span.start, subject })
    }

    /// The value of a key that has to be there.
    pub(super) fn required<'n>(&mut self, fields: &Fields<'n>, key: &'static str, allowed: &str) -> Option<&'n Node> {
        let found = fields.get(key);
        if found.is_none() && !fields.damaged && !fields.meant.contains(&key) {
            let fault = Fault::MissingKey { key, allowed: allowed.to_owned() };
            self.report(fields.start, &fields.subject, Some(key), fault);
        }
        found
    }

    /// The number of a node.
    pub(super) fn number(&mut self, node: &Node, subject: &Subject, key: &'static str, allowed: &str) -> Option<f64> {
        match &node.value {
            Value::Number(number) => return Some(*number),
            Value::Text(text) if text.trim().parse::<f64>().is_ok() => {
                self.wrong_kind(node, subject, key, format!("{allowed}, written without quotes"));
            }
            _ => self.wrong_kind(node, subject, key, format!("a number, {allowed}")),
        }
        None
    }

    /// The text of a node.
    pub(super) fn text<'n>(&mut self, node: &'n Node, subject: &Subject, key: &'static str) -> Option<&'n str> {
        if let Value::Text(text) = &node.value {
            return Some(text);
        }
        self.wrong_kind(node, subject, key, "text in double quotes".to_owned());
        None
    }

    /// The items of a list.
    pub(super) fn list<'n>(&mut self, node: &'n Node, subject: &Subject, key: &'static str) -> Option<&'n [Node]> {
        if let Value::List(items) = &node.value {
            return Some(items);
        }
        self.wrong_kind(node, subject, key, "a list […]".to_owned());
        None
    }

    /// Which of the names a node holds, as an index into `choices`.
    pub(super) fn choice(
        &mut self,
        node: &Node,
        subject: &Subject,
        key: &'static str,
        choices: &'static [&'static str],
    ) -> Option<usize> {
        let found = match &node.value {
            Value::Name(name)
            | Value::Record(Record { name: Some(name), .. })
            | Value::Tuple { name: Some(name), .. } => name.as_str(),
            _ => {
                self.wrong_kind(node, subject, key, choices.join(", "));
                return None;
            }
        };
        let index = choices.iter().position(|choice| *choice == found);
        if index.is_none() {
            let fault =
                Fault::UnknownChoice { key, found: node.described(), allowed: choices, meant: likest(found, choices) };
            self.report(node.span.start, subject, Some(key), fault);
        }
        index
    }

    /// Reports a value of another kind; one that was not readable was reported before.
    pub(super) fn wrong_kind(&mut self, node: &Node, subject: &Subject, key: &'static str, allowed: String) {
        if node.value != Value::Broken {
            let fault = Fault::WrongKind { key, found: node.described(), allowed };
            self.report(node.span.start, subject, Some(key), fault);
        }
    }
}

impl<'n> Fields<'n> {
    /// The value of a key, taken out of `Some(…)`.
    pub(super) fn get(&self, key: &str) -> Option<&'n Node> {
        self.by_key.get(key).map(|field| unwrapped(&field.value))
    }

    /// The value of a key that may be left out or be `None`.
    pub(super) fn given(&self, key: &str) -> Option<&'n Node> {
        self.get(key).filter(|node| !matches!(&node.value, Value::Name(name) if name == "None"))
    }
}

/// What stands in `Some(…)`, or the node itself.
fn unwrapped(node: &Node) -> &Node {
    match &node.value {
        Value::Tuple { name: Some(name), items } if name == "Some" && items.len() == 1 => &items[0],
        _ => node,
    }
}
