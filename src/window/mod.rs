//! The window: one instant, everywhere. It draws what the engine says and holds no formula.

mod application;
mod background;
mod checked;
mod command;
mod derived;
mod dialogs;
mod exports;
mod file_dialogs;
mod fonts;
mod jobs;
mod life_strip;
mod menu_bar;
mod moment_panel;
mod pages;
mod perform;
mod playback;
mod start;
mod system_panel;
mod theme;
mod time_gesture;
mod view;
mod widgets;
mod workspace;

pub use application::Longember;
pub use command::{Command, Edit, TimeCommand, key_bindings};
pub use exports::Export;
pub use fonts::{SPECIAL_CHARACTERS, definitions as font_definitions};
pub use pages::Page;
pub use start::{NoWindow, Opening, run};
pub use theme::contrast;
pub use view::View;
pub use workspace::Workspace;
