//! Statements with their verdicts as text and JSON.

use super::cell::Cell;
use super::lines::{padded, push_wrapped};
use crate::system::History;
use crate::system::statements::{Judgement, Statement, Verdict, judge};
use crate::units::number_text::number;
use serde_json::{Map, Value};

/// A statement with what the model says to it.
#[derive(Clone, Debug, PartialEq)]
pub struct JudgedStatement {
    /// What is stated.
    pub statement: Statement,
    /// What was found.
    pub judgement: Judgement,
}

impl JudgedStatement {
    /// Judges a statement.
    #[must_use]
    pub fn of(statement: Statement, history: &History) -> Self {
        Self { judgement: judge(&statement, history), statement }
    }
}

/// The model's value with its spread and the factor to the stated one: `0.9984 L☉ ± 5 %, factor 0.998`.
#[must_use]
pub fn model_text(row: &JudgedStatement) -> String {
    let Some(value) = row.judgement.value_text(&row.statement) else { return "no value".to_owned() };
    let spread = row.judgement.spread_text(&row.statement).map_or_else(String::new, |spread| format!(" ({spread})"));
    let factor = row.judgement.factor.map_or_else(String::new, |factor| format!(", factor {}", number(factor, 3)));
    format!("{value}{spread}{factor}")
}

/// Width of the longest verdict.
const VERDICT_WIDTH: usize = 17;

/// The statements for people, in lines of at most 80 columns.
#[must_use]
pub fn checked_text(title: &str, rows: &[JudgedStatement]) -> String {
    let mut page = String::new();
    push_wrapped(&mut page, "", title);
    for (index, row) in rows.iter().enumerate() {
        page.push('\n');
        let lead = format!("{:>3}  {}  ", index + 1, padded(row.judgement.verdict.name(), VERDICT_WIDTH));
        push_wrapped(&mut page, &lead, &row.statement.line());
        push_wrapped(&mut page, "     Model: ", &model_text(row));
        push_wrapped(&mut page, "     ", &row.judgement.sentence);
        for note in &row.judgement.notes {
            push_wrapped(&mut page, "     Note: ", note);
        }
        if !row.statement.note.is_empty() {
            push_wrapped(&mut page, "     Remark: ", &row.statement.note);
        }
    }
    page.push('\n');
    push_wrapped(&mut page, "", &summary(rows));
    page
}

/// How many there are of each verdict: `12 statements: 7 hold, …`.
fn summary(rows: &[JudgedStatement]) -> String {
    let parts = Verdict::ALL.into_iter().filter_map(|verdict| {
        let count = count(rows, verdict);
        let words = match (verdict, count) {
            (_, 0) => return None,
            (Verdict::Holds, 1) => "holds",
            (Verdict::Holds, _) => "hold",
            (Verdict::WithinSpread, 1) => "is within the spread",
            (Verdict::WithinSpread, _) => "are within the spread",
            (Verdict::DoesNotHold, 1) => "does not hold",
            (Verdict::DoesNotHold, _) => "do not hold",
            (Verdict::NotJudged, _) => "cannot be judged",
        };
        Some(format!("{count} {words}"))
    });
    let parts: Vec<String> = parts.collect();
    let noun = if rows.len() == 1 { "statement" } else { "statements" };
    format!("{} {noun}: {}.", rows.len(), parts.join(", "))
}

fn count(rows: &[JudgedStatement], verdict: Verdict) -> usize {
    rows.iter().filter(|row| row.judgement.verdict == verdict).count()
}

/// The statements as JSON: an object with `title`, `statements` and the number of each verdict.
#[must_use]
pub fn checked_json(title: &str, rows: &[JudgedStatement]) -> String {
    let mut root = Map::new();
    root.insert("title".to_owned(), Value::from(title));
    root.insert("statements".to_owned(), Value::Array(rows.iter().map(object).collect()));
    for verdict in Verdict::ALL {
        root.insert(verdict.key().to_owned(), Value::from(count(rows, verdict)));
    }
    format!("{:#}\n", Value::Object(root))
}

fn object(row: &JudgedStatement) -> Value {
    let JudgedStatement { statement, judgement } = row;
    let number = |value: Option<f64>| Cell::number(value).json();
    let unit = statement.quantity.entry().typed_unit();
    let fields = [
        ("claim", Value::from(statement.line())),
        ("note", Value::from(statement.note.as_str())),
        ("verdict", Value::from(judgement.verdict.key())),
        ("value", number(judgement.value)),
        ("unit", if unit.is_empty() { Value::Null } else { Value::from(unit) }),
        ("value_is_lower_bound", Value::from(judgement.is_bound)),
        ("lowest", number(judgement.lowest)),
        ("highest", number(judgement.highest)),
        ("time_yr", number(judgement.time_yr)),
        ("factor", number(judgement.factor)),
        ("difference", number(judgement.difference)),
        ("sentence", Value::from(judgement.sentence.as_str())),
        ("method", Value::from(judgement.method)),
        ("source", judgement.method().map_or(Value::Null, |method| Value::from(method.source))),
        ("notes", judgement.notes.iter().map(|note| Value::from(note.as_str())).collect()),
    ];
    Value::Object(fields.into_iter().map(|(key, value)| (key.to_owned(), value)).collect())
}
