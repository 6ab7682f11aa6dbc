//! Opens the window on this machine, or says why it cannot.

use super::Longember;
use super::background::Keeper;
use super::software;
use crate::document::recovery::{RecoveryCopy, left_behind};
use crate::document::settings::settings_path;
use crate::document::{Scenario, Session, Settings, built_in, state_folder};
use crate::drawing::{self, Size};
use egui::{IconData, ViewportBuilder, vec2};
use std::path::PathBuf;
use thiserror::Error;

/// Smallest window that still shows everything, points.
const SMALLEST: egui::Vec2 = vec2(960.0, 600.0);

/// What stands behind most failures to begin at all.
const NO_DISPLAY: &str = "there is no display, or it does not answer (see DISPLAY and WAYLAND_DISPLAY)";
/// The program's icon.
const ICON: &str = include_str!("../../assets/desktop/longember.svg");
/// Its side, pixels.
const ICON_SIDE: u32 = 128;

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

/// Who draws the window.
#[derive(Clone, Copy, Debug, Default, PartialEq, Eq)]
pub enum Graphics {
    /// OpenGL, by a graphics card or in software.
    #[default]
    OpenGl,
    /// The processor, without OpenGL.
    Processor,
}

impl Graphics {
    /// In words for people.
    #[must_use]
    pub fn name(self) -> &'static str {
        match self {
            Self::OpenGl => "OpenGL",
            Self::Processor => "the processor, without OpenGL",
        }
    }
}

/// Why no window opened.
#[derive(Debug, Error)]
pub enum NoWindow {
    /// OpenGL is missing or broken; the processor can draw instead.
    #[error("OpenGL cannot be used here: {reason}; try `longember --graphics processor`")]
    NoOpenGl {
        /// What the system says.
        reason: String,
    },
    /// No display, no graphics, or a missing system library.
    #[error(
        "the window cannot open here: {reason}; the same engine works without one, try `longember demo` and `longember state demo:sunlike_five_worlds --at 4.57Gyr`"
    )]
    NoDisplay {
        /// What the system says.
        reason: String,
    },
}

impl NoWindow {
    /// The system has no display for us.
    pub(super) fn no_display() -> Self {
        Self::NoDisplay { reason: NO_DISPLAY.to_owned() }
    }
}

/// Opens the window and returns when it closes.
///
/// # Errors
/// [`NoWindow`] with what to do about it.
pub fn run(opening: Opening, graphics: Graphics) -> Result<(), NoWindow> {
    let path = settings_path();
    let (settings, warning) = path.as_deref().map_or_else(Default::default, Settings::read);
    let (width, height) = settings.window_size_px;
    let viewport = ViewportBuilder::default()
        .with_title("Longember")
        .with_app_id("longember")
        .with_icon(icon())
        .with_inner_size(vec2(width as f32, height as f32))
        .with_maximized(settings.is_maximised)
        .with_min_inner_size(SMALLEST)
        .with_drag_and_drop(true);
    let make = move |context: &egui::Context| -> Result<Longember, String> {
        let keeper = Keeper::new(path, state_folder().and_then(|folder| RecoveryCopy::begin(&folder).ok()));
        // The demo is there at once; a red dwarf would keep the window waiting for seconds.
        let mut program =
            Longember::new(context, demo_session()?, settings, keeper).map_err(|error| error.to_string())?;
        program.workspace.graphics = graphics;
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
        Ok(program)
    };
    match graphics {
        Graphics::Processor => software::run(viewport, Box::new(make)),
        Graphics::OpenGl => {
            let options = eframe::NativeOptions { viewport, ..eframe::NativeOptions::default() };
            let created = eframe::run_native(
                "longember",
                options,
                Box::new(move |creation| Ok(Box::new(make(&creation.egui_ctx)?))),
            );
            created.map_err(|error| match error {
                eframe::Error::Glutin(_) | eframe::Error::NoGlutinConfigs(..) | eframe::Error::OpenGL(_) => {
                    NoWindow::NoOpenGl { reason: error.to_string() }
                }
                eframe::Error::WinitEventLoop(_) => NoWindow::no_display(),
                other => NoWindow::NoDisplay { reason: other.to_string() },
            })
        }
    }
}

/// The program's icon; none if its drawing were unreadable, which a test rules out.
fn icon() -> IconData {
    let drawn = Size::new(ICON_SIDE, ICON_SIDE).and_then(|size| drawing::pixels(ICON, size));
    drawn.map_or_else(
        |_| IconData::default(),
        |pixels| {
            let rgba = pixels.chunks_exact(3).flat_map(|pixel| [pixel[0], pixel[1], pixel[2], u8::MAX]).collect();
            IconData { rgba, width: ICON_SIDE, height: ICON_SIDE }
        },
    )
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

#[cfg(test)]
mod tests {
    use super::*;

    #[test]
    fn the_icon_can_be_drawn() {
        let icon = icon();
        assert_eq!(icon.rgba.len(), 4 * 128 * 128);
        assert!(icon.rgba.chunks_exact(4).any(|pixel| pixel[0] > 240), "the star shines");
    }
}
