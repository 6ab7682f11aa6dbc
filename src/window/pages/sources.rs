//! For every figure: relation, paper, range, accuracy.

use crate::system::planet_light::USUAL_ALTITUDE_DEG;
use crate::system::provenance::{METHODS, Method};
use crate::system::quantities::figures_of;
use crate::system::{LightReader, Note};
use crate::window::command::Command;
use crate::window::fonts::BOLD;
use crate::window::theme::{GRID, Palette, TEXT_SIZE, small};
use crate::window::workspace::Workspace;
use egui::{Align, FontFamily, FontId, RichText, ScrollArea, Ui};

/// Draws the page and scrolls to the method that was asked for.
pub(super) fn show(ui: &mut Ui, workspace: &mut Workspace) -> Vec<Command> {
    let palette = workspace.palette();
    let moment = workspace.moment();
    let light = LightReader::new(&workspace.history, USUAL_ALTITUDE_DEG).at(&moment);
    let notes: Vec<Note> = moment.notes.into_iter().chain(light.notes).collect();
    let wanted = workspace.wanted_source.take();
    ScrollArea::vertical().auto_shrink(false).show(ui, |ui| {
        ui.set_max_width(ui.available_width().min(680.0));
        for method in METHODS {
            let title = RichText::new(method.name)
                .font(FontId::new(TEXT_SIZE, FontFamily::Name(BOLD.into())))
                .color(palette.text);
            let response = ui.label(title);
            if wanted == Some(method.key) {
                response.scroll_to_me(Some(Align::TOP));
            }
            row(ui, palette, "", method.relation);
            row(ui, palette, "Source", method.source);
            row(ui, palette, "Valid for", method.valid_for);
            row(ui, palette, "Accuracy", method.accuracy);
            for note in notes_about(method, &notes) {
                row(ui, palette, "Now", &note);
            }
            ui.add_space(3.0 * GRID);
        }
    });
    Vec::new()
}

fn row(ui: &mut Ui, palette: &Palette, name: &str, text: &str) {
    if name.is_empty() {
        ui.label(RichText::new(text).color(palette.text));
        return;
    }
    ui.horizontal_wrapped(|ui| {
        ui.spacing_mut().item_spacing.x = 6.0;
        ui.label(RichText::new(format!("{name}:")).font(small()).color(palette.dim));
        ui.label(RichText::new(text).font(small()).color(palette.text));
    });
}

/// Remarks of this moment about figures that the method makes.
fn notes_about(method: &Method, notes: &[Note]) -> Vec<String> {
    let keys: Vec<&str> = figures_of(method.key)
        .map(|(key, _)| key)
        .chain((method.key == "habitable_zone").then_some("habitable_zone_au"))
        .chain((method.key == "blackbody").then_some("colour_srgb_hex"))
        .collect();
    notes
        .iter()
        .filter(|note| keys.contains(&note.about))
        .map(|note| format!("{}: {}", note.kind.name(), note.text))
        .collect()
}
