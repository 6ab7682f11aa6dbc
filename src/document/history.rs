//! Undo and redo: whole-value snapshots with labels.

use super::edited_field::EditedField;

/// More steps than this are not kept; the oldest go first.
pub const MOST_STEPS: usize = 200;

/// The steps that led to the present value, and those taken back.
#[derive(Clone, Debug)]
pub struct History<T> {
    /// Values before each step, oldest first.
    past: Vec<Step<T>>,
    /// Values after each step taken back, the next to redo last.
    future: Vec<Step<T>>,
    /// The field whose changes go into the last step until the interaction ends.
    interaction: Option<EditedField>,
    /// The last step takes further changes with its label.
    is_joined: bool,
}

#[derive(Clone, Debug)]
struct Step<T> {
    label: String,
    value: T,
}

impl<T: PartialEq> History<T> {
    /// A history without steps.
    #[must_use]
    pub fn new() -> Self {
        Self { past: Vec::new(), future: Vec::new(), interaction: None, is_joined: false }
    }

    /// Notes a step of its own from `before` to the present value.
    pub fn record(&mut self, label: String, before: T) {
        self.interaction = None;
        self.push(label, before);
    }

    /// Notes a change of a field: one of many in a drag or while typing, which make one step together.
    pub fn record_in_interaction(&mut self, field: EditedField, label: String, before: T) {
        if self.interaction == Some(field) {
            return;
        }
        self.push(label, before);
        self.interaction = Some(field);
    }

    /// Notes a change that belongs to the step before it when that has the same label: one key held down.
    pub fn record_joined(&mut self, label: String, before: T) {
        let continues = self.is_joined && self.future.is_empty() && self.undo_label() == Some(label.as_str());
        if !continues {
            self.record(label, before);
        }
        self.is_joined = true;
    }

    /// Ends a drag or a stretch of typing: the next change is a new step.
    ///
    /// A drag that came back to where it began leaves no step.
    pub fn end_interaction(&mut self, present: &T) {
        if self.interaction.take().is_some() && self.past.last().is_some_and(|step| step.value == *present) {
            self.past.pop();
        }
    }

    /// Takes the last step back and returns its label; none if there is no step.
    pub fn undo(&mut self, present: &mut T) -> Option<String> {
        self.end_interaction(present);
        let Step { label, mut value } = self.past.pop()?;
        self.is_joined = false;
        std::mem::swap(present, &mut value);
        self.future.push(Step { label: label.clone(), value });
        Some(label)
    }

    /// Takes the step last undone again and returns its label; none if there is no such step.
    pub fn redo(&mut self, present: &mut T) -> Option<String> {
        self.interaction = None;
        let Step { label, mut value } = self.future.pop()?;
        std::mem::swap(present, &mut value);
        self.past.push(Step { label: label.clone(), value });
        Some(label)
    }

    /// The label of the step that undo would take back.
    #[must_use]
    pub fn undo_label(&self) -> Option<&str> {
        self.past.last().map(|step| step.label.as_str())
    }

    /// The label of the step that redo would take.
    #[must_use]
    pub fn redo_label(&self) -> Option<&str> {
        self.future.last().map(|step| step.label.as_str())
    }

    fn push(&mut self, label: String, before: T) {
        self.is_joined = false;
        self.future.clear();
        if self.past.len() == MOST_STEPS {
            self.past.remove(0);
        }
        self.past.push(Step { label, value: before });
    }
}

impl<T: PartialEq> Default for History<T> {
    fn default() -> Self {
        Self::new()
    }
}

#[cfg(test)]
mod tests {
    use super::*;

    const A: EditedField = EditedField { body: None, key: "title" };
    const B: EditedField = EditedField { body: None, key: "about" };

    #[test]
    fn steps_are_taken_back_and_again() {
        let (mut history, mut present) = (History::new(), 3);
        history.record("two".to_owned(), 1);
        history.record("three".to_owned(), 2);
        assert_eq!(history.undo_label(), Some("three"));
        assert_eq!((history.undo(&mut present).as_deref(), present), (Some("three"), 2));
        assert_eq!((history.undo(&mut present).as_deref(), present), (Some("two"), 1));
        assert_eq!((history.undo(&mut present), present), (None, 1));
        assert_eq!((history.redo(&mut present).as_deref(), present), (Some("two"), 2));
        assert_eq!(history.redo_label(), Some("three"));
        history.record("nine".to_owned(), 2);
        assert_eq!(history.redo_label(), None);
    }

    #[test]
    fn changes_of_one_field_in_one_interaction_are_one_step() {
        let (mut history, mut present) = (History::new(), 0);
        for value in 1..=5 {
            history.record_in_interaction(A, "drag".to_owned(), present);
            present = value;
        }
        history.record_in_interaction(B, "other".to_owned(), present);
        present = 6;
        history.end_interaction(&present);
        history.record_in_interaction(B, "other again".to_owned(), present);
        present = 7;
        let mut seen = Vec::new();
        while let Some(label) = history.undo(&mut present) {
            seen.push((label, present));
        }
        let expected = [("other again", 6), ("other", 5), ("drag", 0)];
        assert_eq!(seen, expected.map(|(label, value)| (label.to_owned(), value)));
    }

    #[test]
    fn a_drag_back_to_its_start_leaves_no_step() {
        let mut history = History::new();
        history.record_in_interaction(A, "drag".to_owned(), 1);
        history.end_interaction(&1);
        assert_eq!(history.undo_label(), None);
    }

    #[test]
    fn the_oldest_steps_are_forgotten() {
        let (mut history, mut present) = (History::new(), MOST_STEPS + 50);
        for before in 0..MOST_STEPS + 50 {
            history.record(before.to_string(), before);
        }
        while history.undo(&mut present).is_some() {}
        assert_eq!(present, 50);
    }
}
