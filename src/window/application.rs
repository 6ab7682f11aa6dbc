//! The program behind the window: one frame after another.

use super::background::Keeper;
use super::command::{self, Command};
use super::dialogs::{self, Answer, Dialog};
use super::jobs::HistoryJob;
use super::theme::{self, GRID};
use super::workspace::Workspace;
use super::{fonts, life_strip, menu_bar, moment_panel, pages, system_panel};
use crate::document::recovery::Recovered;
use crate::document::settings::{SIDE_WIDTH_RANGE, TEXT_SCALE_RANGE};
use crate::document::{LifeStore, Scenario, Session, Settings};
use crate::system::{History, HistoryError};
use egui::{CentralPanel, Context, Frame, Margin, Panel, Ui, ViewportCommand};
use std::sync::Arc;
use std::time::Duration;

/// Time between two frames of a life being played.
const PLAY_FRAME: Duration = Duration::from_millis(33);

/// The window's program. [`Longember::root_ui`] is the whole of it and needs no display.
pub struct Longember {
    /// What it works on.
    pub workspace: Workspace,
    pub(super) with_system_dialogs: bool,
    pub(super) may_close: bool,
    /// The user said that unsaved changes are not wanted.
    pub(super) drop_unsaved: bool,
    pub(super) keeper: Keeper,
    title: String,
}

impl Longember {
    /// A program on a scenario. System file dialogs and files of the user are used only in a real window.
    ///
    /// # Errors
    /// [`HistoryError`] when the scenario has no history to show.
    pub fn new(context: &Context, session: Session, settings: Settings, keeper: Keeper) -> Result<Self, HistoryError> {
        let system = session.scenario().system.clone();
        let history = History::quick_look(system.clone()).map_or_else(|| History::compute(system.clone()), Ok)?;
        fonts::install(context);
        let mut workspace = Workspace::new(session, settings, Arc::new(history));
        workspace.job = HistoryJob::new(if keeper.is_real() { LifeStore::of_user() } else { LifeStore::default() });
        if workspace.history.life().is_quick_look() {
            workspace.start_job(system, context);
        }
        theme::apply(context, workspace.theme());
        // Larger and smaller text are commands of ours, within a range that is kept.
        context.options_mut(|options| options.zoom_with_keyboard = false);
        context.set_zoom_factor(workspace.settings.text_scale as f32);
        Ok(Self {
            workspace,
            with_system_dialogs: keeper.is_real(),
            may_close: false,
            drop_unsaved: false,
            keeper,
            title: String::new(),
        })
    }

    /// A program without files of the user or dialogs of the system, for tests.
    ///
    /// # Errors
    /// [`HistoryError`] when the scenario has no history to show.
    pub fn for_tests(context: &Context, scenario: Scenario) -> Result<Self, HistoryError> {
        Self::new(context, Session::of(scenario), Settings::default(), Keeper::none())
    }

    /// Offers unsaved work of an earlier run.
    pub fn offer_recovered(&mut self, recovered: Recovered) {
        self.workspace.dialog = Some(Dialog::Recovered { found: Some(Box::new(recovered)) });
    }

    /// Opens a file at the start, saying everything that is wrong with it.
    pub fn open_at_start(&mut self, context: &Context, path: &std::path::Path) {
        self.open(context, path);
    }

    /// Shows a scenario that has no file at the start.
    pub fn show_at_start(&mut self, context: &Context, scenario: Scenario) {
        self.replace(context, Session::of(scenario));
    }

    /// One frame.
    pub fn root_ui(&mut self, ui: &mut Ui) {
        let context = ui.ctx().clone();
        self.receive(&context);
        self.receive_exports(&context);
        self.play(&context);
        self.workspace.follow_colour();
        let mut commands = if self.workspace.dialog.is_none() { command::from_keys(&context) } else { Vec::new() };
        commands.extend(dropped_files(&context));
        commands.extend(self.draw(ui));
        let answer = dialogs::show(&context, &mut self.workspace);
        for command in commands {
            self.perform(&context, command);
        }
        if let Answer::Close(replies) = answer {
            for reply in replies {
                self.reply(&context, reply);
            }
        }
        if !self.drop_unsaved
            && let Err(sentence) = self.keeper.keep_unsaved(&self.workspace.session)
        {
            self.workspace.say_error(sentence);
        }
        self.watch_file(&context);
        self.watch_closing(&context);
        self.show_title(&context);
        self.note_window(&context);
    }

    /// The window is gone: keeps what the next start needs.
    pub(super) fn leave(&mut self) {
        self.keep_settings();
        if self.drop_unsaved || !self.workspace.session.is_dirty() {
            self.keeper.close();
        }
    }

    /// Size of window and text for the next start; written when the window closes.
    fn note_window(&mut self, context: &Context) {
        let settings = &mut self.workspace.settings;
        settings.text_scale = f64::from(context.zoom_factor()).clamp(TEXT_SCALE_RANGE.0, TEXT_SCALE_RANGE.1);
        context.input(|input| {
            let viewport = input.viewport();
            settings.is_maximised = viewport.maximized.unwrap_or(false);
            if let Some(inner) = viewport.inner_rect.filter(|_| !settings.is_maximised) {
                settings.window_size_px = (f64::from(inner.width()), f64::from(inner.height()));
            }
        });
    }

    fn draw(&mut self, ui: &mut Ui) -> Vec<Command> {
        let palette = self.workspace.palette();
        let mut commands = Vec::new();
        let panel = Frame::new().fill(palette.panel).inner_margin(Margin::symmetric(0, GRID as i8));
        let side = Frame::new().fill(palette.panel).inner_margin(Margin::symmetric(4 * GRID as i8, 0));
        Panel::top("menu_bar").frame(panel).exact_size(menu_bar::HEIGHT).resizable(false).show(ui, |ui| {
            commands.extend(menu_bar::show(ui, &self.workspace));
        });
        Panel::bottom("life_strip").frame(panel).exact_size(life_strip::HEIGHT).resizable(false).show(ui, |ui| {
            dim_when_stale(ui, &self.workspace);
            commands.extend(life_strip::show(ui, &self.workspace));
        });
        let settings = &self.workspace.settings;
        let [system_px, moment_px] =
            [settings.panels.system_width_px, settings.panels.moment_width_px].map(|width| width as f32);
        let widths = (SIDE_WIDTH_RANGE.0 as f32)..=(SIDE_WIDTH_RANGE.1 as f32);
        if settings.panels.shows_system {
            let panel = Panel::left("system").frame(side).default_size(system_px).size_range(widths.clone());
            let shown = panel.show(ui, |ui| commands.extend(system_panel::show(ui, &self.workspace)));
            self.workspace.settings.panels.system_width_px = f64::from(shown.response.rect.width());
            name_edge(ui, "system", "Width of the system panel");
        }
        if self.workspace.settings.panels.shows_moment {
            let panel = Panel::right("moment").frame(side).default_size(moment_px).size_range(widths);
            let shown = panel.show(ui, |ui| {
                dim_when_stale(ui, &self.workspace);
                commands.extend(moment_panel::show(ui, &self.workspace));
            });
            self.workspace.settings.panels.moment_width_px = f64::from(shown.response.rect.width());
            name_edge(ui, "moment", "Width of the panel of this moment");
        }
        let stage = Frame::new().fill(palette.ground).inner_margin(Margin::symmetric(3 * GRID as i8, GRID as i8));
        CentralPanel::default().frame(stage).show(ui, |ui| {
            dim_when_stale(ui, &self.workspace);
            commands.extend(pages::show(ui, &mut self.workspace));
        });
        life_strip::connector(ui, &self.workspace);
        commands
    }

    /// Takes over a history that was computed in the background.
    fn receive(&mut self, context: &Context) {
        let workspace = &mut self.workspace;
        match workspace.job.poll() {
            Some(Ok(fresh)) => {
                workspace.history = fresh.history;
                workspace.derived = *fresh.derived;
                workspace.trouble = None;
                workspace.refresh();
                self.keep_moment_in_view();
            }
            Some(Err(HistoryError::Cancelled)) => {}
            Some(Err(error)) => workspace.trouble = Some(error.to_string()),
            None if workspace.job.is_running() => context.request_repaint_after(PLAY_FRAME),
            None => {}
        }
    }

    fn play(&mut self, context: &Context) {
        let workspace = &mut self.workspace;
        let elapsed_s = f64::from(context.input(|input| input.stable_dt.min(0.1)));
        if workspace.show.is_running {
            let history = Arc::clone(&workspace.history);
            workspace.show.update(&history, &workspace.session.scenario().cues);
        }
        // A show keeps to the clock on the wall, however long a frame took.
        let passed_s = f64::from(context.input(|input| input.unstable_dt.min(1.0)));
        if workspace.show.is_running
            && let Some(time_yr) = workspace.show.advance(passed_s)
        {
            workspace.moment_yr = time_yr;
            self.keep_moment_in_view();
            context.request_repaint_after(PLAY_FRAME);
            return;
        }
        if !workspace.playback.is_running {
            return;
        }
        workspace.moment_yr = workspace.playback.advance(&workspace.derived.axis, workspace.moment_yr, elapsed_s);
        self.keep_moment_in_view();
        context.request_repaint_after(PLAY_FRAME);
    }

    /// Coming back to the window is the moment to see that another program wrote the file.
    fn watch_file(&mut self, context: &Context) {
        let comes_back =
            context.input(|input| input.events.iter().any(|event| matches!(event, egui::Event::WindowFocused(true))));
        if comes_back && self.workspace.dialog.is_none() && self.workspace.session.is_changed_elsewhere() {
            self.workspace.dialog = Some(Dialog::ChangedElsewhere);
        }
    }

    /// Closing waits while there is unsaved work.
    fn watch_closing(&mut self, context: &Context) {
        let wants_to_close = context.input(|input| input.viewport().close_requested());
        if !wants_to_close || self.may_close {
            return;
        }
        if self.workspace.session.is_dirty() {
            context.send_viewport_cmd(ViewportCommand::CancelClose);
            self.workspace.dialog = Some(Dialog::Unsaved { then: Command::Quit });
        }
    }

    fn show_title(&mut self, context: &Context) {
        let mark = if self.workspace.session.is_dirty() { " *" } else { "" };
        let title = format!("{}{mark} – Longember", self.workspace.scenario().title);
        if title != self.title {
            context.send_viewport_cmd(ViewportCommand::Title(title.clone()));
            self.title = title;
        }
    }

    /// Writes the settings; trouble with them is said and stops nothing.
    pub(super) fn keep_settings(&mut self) {
        if let Err(sentence) = self.keeper.keep_settings(&mut self.workspace.settings) {
            self.workspace.say_error(sentence);
        }
    }

    /// Removes the copy of recovered work that was taken up or is not wanted.
    pub(super) fn settle_recovered(&mut self, recovered: Recovered) {
        if let Err(error) = self
            .keeper
            .keep_unsaved(&self.workspace.session)
            .and_then(|()| recovered.discard().map_err(|error| error.to_string()))
        {
            self.workspace.say_error(error);
        }
    }
}

/// Names the edge by which a panel is drawn wider: the toolkit calls all of them the same.
fn name_edge(ui: &Ui, panel: &str, name: &str) {
    let edge = ui.scope_id().with_salt(egui::IdSalt::new(panel)).with("__resize");
    ui.ctx().accesskit_node_builder(edge, |node| node.set_label(name));
}

/// The old figures stay while new ones are made, and look like it.
fn dim_when_stale(ui: &mut Ui, workspace: &Workspace) {
    if workspace.is_stale() {
        ui.multiply_opacity(0.5);
    }
}

fn dropped_files(context: &Context) -> Option<Command> {
    context
        .input(|input| {
            input
                .raw
                .dropped_files
                .iter()
                .find_map(|file| (!file.path().as_os_str().is_empty()).then(|| file.path().to_path_buf()))
        })
        .map(Command::Open)
}

impl eframe::App for Longember {
    fn ui(&mut self, ui: &mut Ui, _frame: &mut eframe::Frame) {
        self.root_ui(ui);
    }

    fn on_exit(&mut self, _gl: Option<&eframe::glow::Context>) {
        self.leave();
    }
}
