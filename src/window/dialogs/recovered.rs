//! Offers work that an earlier run could not save.

use super::{Answer, Reply, buttons};
use crate::document::recovery::Recovered;
use egui::{RichText, Ui};

/// Draws the offer.
pub(super) fn show(ui: &mut Ui, found: &mut Option<Box<Recovered>>) -> Answer {
    let Some(work) = found.take() else { return Answer::Close(Vec::new()) };
    ui.label(RichText::new("Unsaved work was found").heading());
    ui.label(format!("Longember ended without saving \"{}\". Its last state was kept.", work.scenario.title));
    match buttons(ui, &["Bring it back", "Forget it"]) {
        Some(0) => Answer::Close(vec![Reply::Recover(work)]),
        Some(_) => Answer::Close(vec![Reply::Forget(work)]),
        None => {
            *found = Some(work);
            Answer::Wait
        }
    }
}
