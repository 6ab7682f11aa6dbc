//! One set of gestures for every picture of time: drag sets the moment, wheel zooms about the
//! pointer, sideways wheel pans, double click shows the whole life.

use super::command::{Command, TimeCommand};
use super::workspace::Workspace;
use egui::{Rect, Response};

/// Commands that a gesture over a time axis laid out across `rect` asks for.
pub(super) fn commands(response: &Response, rect: Rect, workspace: &Workspace) -> Vec<Command> {
    let mut commands = Vec::new();
    let place_of = |x: f32| f64::from((x - rect.left()) / rect.width());
    if response.double_clicked() {
        commands.push(Command::ShowWhole);
    } else if (response.dragged() || response.clicked())
        && let Some(position) = response.interact_pointer_pos()
    {
        let place = place_of(position.x).clamp(0.0, 1.0);
        let age_yr = workspace.derived.axis.age_at(workspace.view.fraction_of(place));
        commands.push(Command::Time(TimeCommand::To(age_yr)));
    }
    if let Some(position) = response.hover_pos() {
        let (wheel, zoom) = response.ctx.input(|input| (input.smooth_scroll_delta(), input.zoom_delta()));
        let factor = f64::from(zoom) * (f64::from(wheel.y) / 200.0).exp();
        if (factor - 1.0).abs() > 1e-4 {
            commands.push(Command::Zoom { about: place_of(position.x), factor });
        }
        if wheel.x.abs() > 0.1 {
            commands.push(Command::Pan(-f64::from(wheel.x / rect.width())));
        }
    }
    commands
}
