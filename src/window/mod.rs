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
mod offers;
mod pages;
mod perform;
mod pinned;
mod playback;
mod start;
mod system_panel;
mod theme;
mod time_gesture;
mod view;
mod widgets;
mod workspace;

pub use application::Longember;
pub use exports::Export;
pub use command::{Command, Edit, PanelSide, TimeCommand, key_bindings};
pub use fonts::{SPECIAL_CHARACTERS, definitions as font_definitions};
pub use offers::{Menu, Offer, offers};
pub use pages::Page;
pub use pinned::Pinned;
pub use start::{NoWindow, Opening, run};
pub use theme::contrast;
pub use view::View;
pub use workspace::Workspace;
