//! Everything the window can be told, from menu, key, pointer or test, as one value.
//!
//! Drawing returns commands; they are applied after the frame, in one place.

use super::exports::Export;
use super::pages::Page;
use crate::document::{Scenario, Theme};
use crate::figure::curves::Curve;
use crate::figure::interior::LayerScale;
use crate::figure::{SkyView, SpectrumView};
use crate::system::{Body, TimeScale};
use crate::units::time_words::SpanStyle;
use egui::{Key, KeyboardShortcut, Modifiers};
use std::path::PathBuf;

/// One thing to do.
#[derive(Clone, Debug, PartialEq)]
pub enum Command {
    /// Start an empty scenario.
    New,
    /// Ask for a file and open it.
    AskOpen,
    /// Open this file.
    Open(PathBuf),
    /// Open a built-in scenario.
    OpenBuiltIn(&'static str),
    /// Save, asking for a place if there is none yet.
    Save,
    /// Ask for a place and save there.
    AskSaveAs,
    /// Save to this file.
    SaveAs(PathBuf),
    /// Bring back the scenario as it was saved last; can be undone.
    Revert,
    /// Close the window.
    Quit,
    /// Take an edit back.
    Undo,
    /// Do an edit again.
    Redo,
    /// Keep the system as it is as a pale reference on charts and beside figures.
    Pin,
    /// Take the reference away.
    Unpin,
    /// Change the scenario; the label says what changes.
    Edit(Edit),
    /// Change the scenario as part of the step before: a key held down, a drag.
    JoinedEdit(Edit),
    /// Go to a moment.
    Time(TimeCommand),
    /// Choose the scale of time.
    SetScale(TimeScale),
    /// Zoom about a place of the view by a factor.
    Zoom {
        /// Place in the view, 0 to 1.
        about: f64,
        /// More than one shows less time.
        factor: f64,
    },
    /// Move the view by a share of its width.
    Pan(f64),
    /// Show the whole life.
    ShowWhole,
    /// Choose what the panels show.
    Select(Body),
    /// Turn to a page of the stage.
    ShowPage(Page),
    /// Turn to the next page.
    NextPage,
    /// Turn to the page before.
    PreviousPage,
    /// Show or hide a side panel.
    TogglePanel(PanelSide),
    /// Text larger (1), smaller (-1) or as usual (0).
    ScaleText(i32),
    /// Show or hide a chart.
    ToggleCurve(Curve),
    /// Look at the spectrum in another way.
    SetSpectrumView(SpectrumView),
    /// Look at the sky in another way.
    SetSkyView(SkyView),
    /// Lay the star's layers out against mass or radius.
    SetLayerScale(LayerScale),
    /// Choose a look.
    SetTheme(Theme),
    /// Write spans of time with symbols or in words.
    SetSpanStyle(SpanStyle),
    /// Show the source of a method.
    ShowSource(&'static str),
    /// Put a text on the clipboard.
    Copy(String),
    /// Ask for a file and hand something over in it.
    AskExport(Export),
    /// Hand something over in this file.
    Export(Export, PathBuf),
    /// Put the fact sheet of the moment on the clipboard.
    CopySheet,
    /// Show every command with a field to search.
    ShowCommands,
    /// Show every key.
    ShowKeys,
    /// Say what this program is.
    ShowAbout,
    /// Start or stop the show.
    ToggleShow,
    /// Set the clock of the show, s, and go to its moment.
    SetShowTime(f64),
    /// Stop a computation that takes long.
    CancelComputation,
}

/// A panel beside the stage.
#[derive(Clone, Copy, Debug, PartialEq, Eq)]
pub enum PanelSide {
    /// The question panel on the left.
    System,
    /// The answer panel on the right.
    Moment,
}

/// A change of the scenario as a whole value.
#[derive(Clone, Debug, PartialEq)]
pub struct Edit {
    /// What changes: `Change Bond albedo of Ember`.
    pub label: String,
    /// The scenario afterwards.
    pub scenario: Box<Scenario>,
}

/// Where the moment goes.
#[derive(Clone, Copy, Debug, PartialEq)]
pub enum TimeCommand {
    /// To an age, yr.
    To(f64),
    /// By steps along the axis; a fine step is a tenth of a step.
    Step {
        /// How many steps, negative to go back.
        steps: f64,
    },
    /// To the event before the moment.
    PreviousEvent,
    /// To the event after the moment.
    NextEvent,
    /// To birth.
    Birth,
    /// To the end of what is shown.
    End,
    /// To the scenario's present.
    Now,
    /// Start or stop playing.
    TogglePlay,
    /// Let a loop begin at the moment.
    BeginLoop,
    /// Let a loop end at the moment.
    EndLoop,
    /// Play without a loop.
    ClearLoop,
    /// Seconds that a whole life takes when played.
    SetLifeSeconds(f64),
}

/// A key with the command it gives and the words that explain it.
#[derive(Clone, Debug)]
pub struct KeyBinding {
    /// The key.
    pub shortcut: KeyboardShortcut,
    /// What it does.
    pub command: Command,
    /// In words.
    pub words: &'static str,
    /// Whether it also works while a text field has the focus.
    pub even_while_typing: bool,
}

/// One step of the moment as a share of the view.
pub(crate) const STEP: f64 = 0.01;

/// Every key of the window; the help page is made from this list.
#[must_use]
pub fn key_bindings() -> Vec<KeyBinding> {
    let none = Modifiers::NONE;
    let shift = Modifiers::SHIFT;
    let command = Modifiers::COMMAND;
    let command_shift = Modifiers::COMMAND.plus(Modifiers::SHIFT);
    let step = |steps| Command::Time(TimeCommand::Step { steps });
    let time = Command::Time;
    let rows = [
        // The keys with more modifiers come first: a plain key also answers when Shift is held.
        (shift, Key::ArrowRight, step(0.1), "step forward finely", false),
        (shift, Key::ArrowLeft, step(-0.1), "step back finely", false),
        (none, Key::ArrowRight, step(1.0), "step forward", false),
        (none, Key::ArrowLeft, step(-1.0), "step back", false),
        (none, Key::PageDown, time(TimeCommand::NextEvent), "next event", false),
        (none, Key::PageUp, time(TimeCommand::PreviousEvent), "previous event", false),
        (none, Key::Home, time(TimeCommand::Birth), "birth of the star", false),
        (none, Key::End, time(TimeCommand::End), "end of what is shown", false),
        (none, Key::Space, time(TimeCommand::TogglePlay), "play or pause", false),
        (none, Key::N, time(TimeCommand::Now), "the scenario's present", false),
        (none, Key::Plus, Command::Zoom { about: f64::NAN, factor: 1.5 }, "zoom in about the moment", false),
        (none, Key::Minus, Command::Zoom { about: f64::NAN, factor: 1.0 / 1.5 }, "zoom out", false),
        (none, Key::OpenBracket, time(TimeCommand::BeginLoop), "let a loop begin here", false),
        (none, Key::CloseBracket, time(TimeCommand::EndLoop), "let a loop end here", false),
        (none, Key::Backslash, time(TimeCommand::ClearLoop), "no loop", false),
        (none, Key::Num0, Command::ShowWhole, "show the whole life", false),
        (none, Key::Num1, Command::SetScale(TimeScale::Paced), "paced time", false),
        (none, Key::Num2, Command::SetScale(TimeScale::Log), "logarithmic time", false),
        (none, Key::Num3, Command::SetScale(TimeScale::Linear), "linear time", false),
        (command_shift, Key::Z, Command::Redo, "redo", true),
        (command, Key::Z, Command::Undo, "undo", true),
        (command, Key::N, Command::New, "new scenario", true),
        (command, Key::O, Command::AskOpen, "open", true),
        (command_shift, Key::S, Command::AskSaveAs, "save as", true),
        (command, Key::S, Command::Save, "save", true),
        (command, Key::Q, Command::Quit, "quit", true),
        (command_shift, Key::Tab, Command::PreviousPage, "previous page", true),
        (command, Key::Tab, Command::NextPage, "next page", true),
        (command, Key::B, Command::TogglePanel(PanelSide::System), "show or hide the system panel", true),
        (command, Key::M, Command::TogglePanel(PanelSide::Moment), "show or hide this moment", true),
        (command_shift, Key::P, Command::Unpin, "take the pinned reference away", true),
        (command, Key::P, Command::Pin, "pin the system for comparison", true),
        (command, Key::Plus, Command::ScaleText(1), "larger text", true),
        (command, Key::Equals, Command::ScaleText(1), "larger text", true),
        (command, Key::Minus, Command::ScaleText(-1), "smaller text", true),
        (command, Key::Num0, Command::ScaleText(0), "usual text size", true),
        (command, Key::K, Command::ShowCommands, "all commands, with a search", true),
        (none, Key::F1, Command::ShowKeys, "all keys", true),
    ];
    let (with_command, plain): (Vec<_>, Vec<_>) = rows.into_iter().partition(|row| row.0.command);
    with_command
        .into_iter()
        .chain(plain)
        .map(|(modifiers, key, command, words, even_while_typing)| KeyBinding {
            shortcut: KeyboardShortcut::new(modifiers, key),
            command,
            words,
            even_while_typing,
        })
        .collect()
}

/// The key of a command, for menus.
#[must_use]
pub(crate) fn shortcut_of(command: &Command) -> Option<KeyboardShortcut> {
    key_bindings().into_iter().find(|binding| binding.command == *command).map(|binding| binding.shortcut)
}

/// Commands that the keys pressed in this frame ask for.
pub(crate) fn from_keys(context: &egui::Context) -> Vec<Command> {
    let is_typing = context.text_edit_focused();
    context.input_mut(|input| {
        key_bindings()
            .into_iter()
            .filter(|binding| binding.even_while_typing || !is_typing)
            .filter(|binding| input.consume_shortcut(&binding.shortcut))
            .map(|binding| binding.command)
            .collect()
    })
}
