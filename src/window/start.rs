//! Opens the window on this machine, or says why it cannot.

use super::Longember;
use super::background::Keeper;
use crate::document::recovery::{RecoveryCopy, left_behind};
use crate::document::settings::settings_path;
use crate::document::{Scenario, Session, Settings, built_in, state_folder};
use egui::{ViewportBuilder, vec2};
use std::path::PathBuf;
use thiserror::Error;

/// Smallest window that still shows everything, points.
const SMALLEST: egui::Vec2 = vec2(960.0, 600.0);

/// What the window opens with.
#[derive(Clone, Debug, Default, PartialEq)]
pub enum Opening {
    /// The demo.
    #[default]
    Demo,
    /// A file.
    File(PathBuf),
    /// A scenario that has no file: a built-in one, or one from standard input.
    Scenario(Box<Scenario>),
}

/// Why no window opened.
#[derive(Debug, Error)]
pub enum NoWindow {
    /// No display, no graphics, or a missing system library.
    #[error(
        "the window cannot open here: {reason}; the same engine works without one, try `longember demo` and `longember state demo:sunlike_five_worlds --at 4.57Gyr`"
    )]
    NoDisplay {
        /// What the system says.
        reason: String,
    },
}

/// Opens the window and returns when it closes.
///
/// # Errors
/// [`NoWindow`] with the commands that need no display.
pub fn run(opening: Opening) -> Result<(), NoWindow> {
    let path = settings_path();
    let (settings, warning) = path.as_deref().map_or_else(Default::default, Settings::read);
    let (width, height) = settings.window_size_px;
    let viewport = ViewportBuilder::default()
        .with_title("Longember")
        .with_app_id("longember")
        .with_inner_size(vec2(width as f32, height as f32))
        .with_maximized(settings.is_maximised)
        .with_min_inner_size(SMALLEST)
        .with_drag_and_drop(true);
    let options = eframe::NativeOptions { viewport, ..eframe::NativeOptions::default() };
    let keeper = Keeper::new(path, state_folder().and_then(|folder| RecoveryCopy::begin(&folder).ok()));
    let created = eframe::run_native(
        "longember",
        options,
        Box::new(move |creation| {
            let context = &creation.egui_ctx;
            // The demo is there at once; a red dwarf would keep the window waiting for seconds.
            let mut program = Longember::new(context, demo_session()?, settings, keeper)?;
            if let Some(warning) = warning {
                program.workspace.say_error(warning.to_string());
            }
            match opening {
                Opening::Demo => {}
                Opening::File(path) => program.open_at_start(context, &path),
                Opening::Scenario(scenario) => program.show_at_start(context, *scenario),
            }
            if let Some(recovered) = first_left_behind() {
                program.offer_recovered(recovered);
            }
            Ok(Box::new(program))
        }),
    );
    created.map_err(|error| NoWindow::NoDisplay { reason: error.to_string() })
}

fn demo_session() -> Result<Session, String> {
    Session::from_built_in(built_in::demo())
        .map_err(|problems| problems.iter().map(ToString::to_string).collect::<Vec<_>>().join("; "))
}

/// Unsaved work of an earlier run; more than one piece is offered one start after another.
fn first_left_behind() -> Option<crate::document::recovery::Recovered> {
    let folder = state_folder()?;
    left_behind(&folder).ok()?.copies.into_iter().next()
}
