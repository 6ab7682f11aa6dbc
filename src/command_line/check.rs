//! `check`: statements against the model.

use super::arguments::{CheckArguments, PageFormat};
use super::outcome::{DOES_NOT_HOLD, DONE};
use super::run::computed;
use super::scenario_source::ScenarioSource;
use super::streams::Streams;
use super::trouble::Trouble;
use crate::document::built_in;
use crate::handover::{JudgedStatement, checked_json, checked_text};
use crate::system::statements::{Statement, parse_statement};

/// Judges and returns the exit code that says whether nothing failed.
pub(super) fn check(arguments: &CheckArguments, streams: &mut Streams<'_>) -> Result<u8, Trouble> {
    let demo = || ScenarioSource::Demo(built_in::demo().name.to_owned());
    let mut scenario = arguments.scenario.clone().unwrap_or_else(demo).load(streams)?;
    if !arguments.statement.is_empty() {
        let read = |line: &String| {
            parse_statement(line, &scenario.system)
                .map_err(|problem| Trouble::Statement { line: line.chars().take(200).collect(), problem })
        };
        let statements: Result<Vec<Statement>, Trouble> = arguments.statement.iter().map(read).collect();
        scenario.statements = statements?;
    }
    if scenario.statements.is_empty() {
        return Err(Trouble::NothingStated);
    }
    let statements = std::mem::take(&mut scenario.statements);
    let (title, history) = computed(scenario, streams)?;
    let rows: Vec<JudgedStatement> =
        statements.into_iter().map(|statement| JudgedStatement::of(statement, &history)).collect();
    let text = match arguments.format {
        PageFormat::Text => checked_text(&title, &rows),
        PageFormat::Json => checked_json(&title, &rows),
    };
    streams.result(&text).map_err(Trouble::StandardOutput)?;
    Ok(if rows.iter().all(|row| row.judgement.verdict.is_upheld()) { DONE } else { DOES_NOT_HOLD })
}
