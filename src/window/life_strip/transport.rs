//! Play, steps, pace, scale and the typed moment.

use super::icon::{Icon, icon_button};
use crate::system::TimeScale;
use crate::system::limits::PRESENT_AGE;
use crate::units::time_words::parse_span;
use crate::window::command::{Command, TimeCommand};
use crate::window::playback::LIFE_SECONDS;
use crate::window::theme::{GRID, small, usual};
use crate::window::widgets::choice::word;
use crate::window::widgets::draft::keep_draft;
use crate::window::workspace::Workspace;
use egui::{Align, Color32, ComboBox, Id, Layout, RichText, Stroke, StrokeKind, TextEdit, Ui};

/// The row under the ribbon.
pub(super) fn show(ui: &mut Ui, workspace: &Workspace) -> Vec<Command> {
    let palette = workspace.palette();
    let mut commands = Vec::new();
    ui.horizontal(|ui| {
        ui.add_space(2.0 * GRID);
        let time = Command::Time;
        if icon_button(ui, palette, Icon::Previous, "Previous event (Page Up)", true).clicked() {
            commands.push(time(TimeCommand::PreviousEvent));
        }
        let (icon, name) =
            if workspace.playback.is_running { (Icon::Pause, "Pause (Space)") } else { (Icon::Play, "Play (Space)") };
        if icon_button(ui, palette, icon, name, true).clicked() {
            commands.push(time(TimeCommand::TogglePlay));
        }
        if icon_button(ui, palette, Icon::Next, "Next event (Page Down)", true).clicked() {
            commands.push(time(TimeCommand::NextEvent));
        }
        ui.add_space(GRID);
        commands.extend(pace(ui, workspace));
        ui.add_space(2.0 * GRID);
        commands.extend(typed_moment(ui, workspace));
        let text = RichText::new(workspace.history.star_at(workspace.moment_yr).phase.name()).color(palette.dim);
        if ui.available_width() > 380.0 {
            ui.label(text);
        }
        ui.with_layout(Layout::right_to_left(Align::Center), |ui| {
            ui.add_space(2.0 * GRID);
            for scale in TimeScale::ALL.into_iter().rev() {
                let hint = match scale {
                    TimeScale::Paced => "Every visible change gets a similar width (1)",
                    TimeScale::Log => "Equal ratios of age get equal widths (2)",
                    TimeScale::Linear => "Equal spans of time get equal widths (3)",
                };
                if word(ui, palette, scale.key(), workspace.scale == scale).on_hover_text(hint).clicked() {
                    commands.push(Command::SetScale(scale));
                }
            }
            ui.label(RichText::new("Time").color(palette.dim).font(small()));
            if workspace.view.width() < 1.0
                && ui.button("Whole life").on_hover_text("Show the whole life (0)").clicked()
            {
                commands.push(Command::ShowWhole);
            }
        });
    });
    commands
}

fn pace(ui: &mut Ui, workspace: &Workspace) -> Vec<Command> {
    let mut commands = Vec::new();
    let words = |seconds: f64| {
        if seconds < 60.0 { format!("life in {seconds} s") } else { format!("life in {} min", seconds / 60.0) }
    };
    let response = ComboBox::from_id_salt("pace")
        .width(104.0)
        .selected_text(words(workspace.playback.life_seconds))
        .show_ui(ui, |ui| {
            for seconds in LIFE_SECONDS {
                if ui.selectable_label(workspace.playback.life_seconds == seconds, words(seconds)).clicked() {
                    commands.push(Command::Time(TimeCommand::SetLifeSeconds(seconds)));
                }
            }
        });
    response.response.accessible_name("Speed of play").on_hover_text("How long a whole life takes when played");
    commands
}

/// The moment as a text that can be typed over: `7.6 Gyr`, `2 trillion years`.
fn typed_moment(ui: &mut Ui, workspace: &Workspace) -> Vec<Command> {
    let palette = workspace.palette();
    let id = Id::unique("typed_moment");
    let draft = ui.data(|data| data.get_temp::<String>(id));
    let is_refused = draft.as_ref().is_some_and(|text| judged(text).is_err());
    let mut text = draft.unwrap_or_else(|| workspace.time_text(workspace.moment_yr));
    let ink: Color32 = if is_refused { palette.error } else { palette.text };
    let field = TextEdit::singleline(&mut text).id(id.with("field")).desired_width(112.0).text_color(ink).font(usual());
    let response = ui.add(field).accessible_name("Moment");
    let given_up = ui.input(|input| input.key_pressed(egui::Key::Escape));
    let mut commands = Vec::new();
    let keeps_draft = if response.lost_focus() && !given_up {
        match judged(&text) {
            Ok(age_yr) => {
                if text != workspace.time_text(workspace.moment_yr) {
                    commands.push(Command::Time(TimeCommand::To(age_yr)));
                }
                false
            }
            Err(_) => true,
        }
    } else {
        (response.has_focus() || is_refused) && !given_up
    };
    keep_draft(ui, id, keeps_draft.then(|| text.clone()));
    match judged(&text) {
        Err(reason) if keeps_draft && !response.has_focus() => {
            let outline = Stroke::new(1.5, palette.error);
            ui.painter().rect_stroke(response.rect.expand(1.0), 4.0, outline, StrokeKind::Outside);
            ui.label(RichText::new(reason).font(small()).color(palette.error));
        }
        _ => {
            response.on_hover_text(
                "Time since the star reached the main sequence; type 7.6 Gyr, 2 trillion years or 3e12 yr",
            );
        }
    }
    commands
}

/// The typed moment as an age, or why not.
fn judged(text: &str) -> Result<f64, String> {
    let age_yr = parse_span(text).map_err(|error| error.to_string())?;
    PRESENT_AGE.check(age_yr).map_err(|_| format!("allowed: {}", PRESENT_AGE.allowed()))
}
