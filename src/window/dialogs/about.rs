//! What this program is, with the usual caution.

use super::{Answer, buttons};
use crate::window::workspace::Workspace;
use egui::{RichText, Ui};

/// Draws the page.
pub(super) fn show(ui: &mut Ui, workspace: &Workspace) -> Answer {
    let palette = workspace.palette();
    ui.label(RichText::new(format!("Longember {}", env!("CARGO_PKG_VERSION"))).heading());
    ui.label("A star's whole life and the fate of its planets, at any moment, with sources.");
    ui.label(RichText::new("Every figure has its method, paper, range and accuracy on the Sources page. Fonts: Noto Sans, SIL Open Font License 1.1.").color(palette.dim));
    ui.label(
        RichText::new("Never look at the Sun without a filter made for it; the colours here say nothing about safety.")
            .color(palette.dim),
    );
    ui.label(RichText::new(format!("Drawn by {}.", workspace.graphics.name())).color(palette.dim));
    match buttons(ui, &["Close"]) {
        Some(_) => Answer::Close(Vec::new()),
        None => Answer::Wait,
    }
}
