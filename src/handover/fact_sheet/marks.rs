//! Source lines, numbered in the order in which a sheet first leans on them.

use crate::system::provenance::{METHODS, Method};

/// Key of what the scenario itself says.
pub(super) const GIVEN: &str = "given";

/// The line of what the scenario itself says.
static GIVEN_LINE: Method = Method {
    key: GIVEN,
    name: "Given by the scenario",
    relation: "An input, chosen by whoever wrote the scenario, not computed.",
    source: "The scenario",
    valid_for: "this scenario",
    accuracy: "as good as the choice",
};

/// The source lines of one sheet.
#[derive(Clone, Debug, Default)]
pub(super) struct Marks {
    lines: Vec<&'static Method>,
}

impl Marks {
    /// The number of a method's line, counted from 1.
    pub(super) fn of(&mut self, key: &str) -> usize {
        if let Some(at) = self.lines.iter().position(|line| line.key == key) {
            return at + 1;
        }
        // A key without a method would be a fault of ours; a test holds every figure to its method.
        let line = METHODS.iter().find(|method| method.key == key).unwrap_or(&GIVEN_LINE);
        if let Some(at) = self.lines.iter().position(|known| known.key == line.key) {
            return at + 1;
        }
        self.lines.push(line);
        self.lines.len()
    }

    /// The lines, in the order of their numbers.
    pub(super) fn lines(self) -> Vec<&'static Method> {
        self.lines
    }
}
