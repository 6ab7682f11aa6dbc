//! Statements judged on the history that is shown, a few in every frame, kept until one of them changes.

use crate::handover::JudgedStatement;
use crate::system::History;
use crate::system::statements::Statement;
use std::sync::Arc;
use std::time::{Duration, Instant};

/// Most of a frame that goes into judging.
const SHARE_OF_A_FRAME: Duration = Duration::from_millis(8);

/// What is judged so far.
#[derive(Debug, Default)]
pub(super) struct Checked {
    history: Option<Arc<History>>,
    rows: Vec<JudgedStatement>,
}

impl Checked {
    /// Judges more of the statements and says whether all are judged.
    pub(super) fn update(&mut self, history: &Arc<History>, statements: &[Statement]) -> bool {
        if self.history.as_ref().is_none_or(|known| !Arc::ptr_eq(known, history)) {
            self.rows.clear();
            self.history = Some(Arc::clone(history));
        }
        let begun = Instant::now();
        let mut old = std::mem::take(&mut self.rows);
        for statement in statements {
            // What was judged before is taken over, wherever it stood: rows are moved and removed.
            match old.iter().position(|row| row.statement == *statement) {
                Some(at) => self.rows.push(old.swap_remove(at)),
                None if begun.elapsed() < SHARE_OF_A_FRAME => {
                    self.rows.push(JudgedStatement::of(statement.clone(), history));
                }
                None => break,
            }
        }
        self.rows.len() == statements.len()
    }

    /// The statements judged so far, in their order.
    pub(super) fn rows(&self) -> &[JudgedStatement] {
        &self.rows
    }
}
