//! Carries commands out: the one place where the workspace changes.

use super::application::Longember;
use super::command::{Command, PanelSide, STEP, TimeCommand};
use super::dialogs::command_list::Search;
use super::dialogs::{Dialog, Reply};
use super::exports::{self, Exported};
use super::file_dialogs::{Asked, Purpose};
use super::pages::Page;
use super::pinned::Pinned;
use super::theme;
use super::view::WHOLE;
use crate::document::settings::TEXT_SCALE_RANGE;
use crate::document::{SaveError, Session, built_in};
use crate::system::history::held;
use crate::system::{Body, System};
use egui::{Context, ViewportCommand};
use std::path::Path;
use std::sync::Arc;

/// One step of the size of all text.
const TEXT_STEP: f32 = 1.1;

impl Longember {
    /// Carries one command out.
    pub fn perform(&mut self, context: &Context, command: Command) {
        let workspace = &mut self.workspace;
        match command {
            Command::New | Command::AskOpen | Command::Open(_) | Command::OpenBuiltIn(_) | Command::Quit
                if workspace.session.is_dirty() =>
            {
                workspace.dialog = Some(Dialog::Unsaved { then: command });
            }
            Command::New => self.replace(context, Session::new_untitled()),
            Command::AskOpen => self.ask(context, Purpose::Open, None),
            Command::Open(path) => self.open(context, &path),
            Command::OpenBuiltIn(name) => self.open_built_in(context, name),
            Command::Quit => {
                self.may_close = true;
                context.send_viewport_cmd(ViewportCommand::Close);
            }
            Command::Save => self.save(context),
            Command::AskSaveAs => self.ask(context, Purpose::Save, None),
            Command::SaveAs(path) => self.save_as(&path),
            Command::Revert => {
                if let Some(saved) = workspace.session.saved().cloned() {
                    workspace.session.edit("Revert to saved", |scenario| *scenario = saved);
                    self.recompute(context);
                }
            }
            Command::ScaleText(step) => {
                let (least, most) = TEXT_SCALE_RANGE;
                let scale = if step == 0 { 1.0 } else { context.zoom_factor() * TEXT_STEP.powi(step) };
                context.set_zoom_factor(scale.clamp(least as f32, most as f32));
            }
            Command::TogglePanel(side) => {
                let shown = match side {
                    PanelSide::System => &mut workspace.settings.panels.shows_system,
                    PanelSide::Moment => &mut workspace.settings.panels.shows_moment,
                };
                *shown = !*shown;
                self.keep_settings();
            }
            Command::Undo => {
                let before = workspace.scenario().system.clone();
                if let Some(label) = workspace.session.undo() {
                    workspace.say(format!("Undone: {label}"));
                    self.recompute_unless(context, &before);
                }
            }
            Command::Redo => {
                let before = workspace.scenario().system.clone();
                if let Some(label) = workspace.session.redo() {
                    workspace.say(format!("Redone: {label}"));
                    self.recompute_unless(context, &before);
                }
            }
            Command::Edit(edit) => {
                let before = workspace.scenario().system.clone();
                workspace.session.edit(edit.label, |scenario| *scenario = *edit.scenario);
                self.recompute_unless(context, &before);
            }
            Command::JoinedEdit(edit) => {
                workspace.session.edit_joined(edit.label, |scenario| *scenario = *edit.scenario);
                self.recompute(context);
            }
            Command::CancelComputation => {
                workspace.job.cancel();
                workspace.say("Stopped. The curves still show the system as it was computed last.");
            }
            Command::Copy(text) => {
                workspace.say(format!("Copied: {}", text.lines().next().unwrap_or_default()));
                context.copy_text(text);
            }
            Command::AskExport(export) => self.ask(context, Purpose::Export(export), None),
            Command::Export(export, path) => {
                workspace.exports.start(export.work(workspace, &path), context);
            }
            Command::CopySheet => workspace.exports.start(exports::sheet_for_clipboard(workspace), context),
            Command::SetTheme(theme) => {
                workspace.settings.theme = theme;
                theme::apply(context, theme);
                self.keep_settings();
            }
            Command::SetSpanStyle(style) => {
                workspace.settings.span_style = style;
                self.keep_settings();
            }
            Command::SetScale(scale) => {
                // Its places belong to the old scale.
                workspace.playback.loop_fractions = None;
                workspace.scale = scale;
                workspace.view = WHOLE;
                scale.key().clone_into(&mut workspace.settings.time_scale);
                workspace.refresh();
                self.keep_settings();
            }
            other => self.look(&other),
        }
    }

    /// Commands that change only what is looked at.
    fn look(&mut self, command: &Command) {
        let workspace = &mut self.workspace;
        match *command {
            Command::Time(time) => self.go(time),
            Command::Zoom { about, factor } => {
                let about = if about.is_nan() { workspace.moment_place().clamp(0.0, 1.0) } else { about };
                workspace.view = workspace.view.zoomed(about, factor);
                workspace.refresh();
            }
            Command::Pan(share) => {
                workspace.view = workspace.view.panned(share);
                workspace.refresh();
            }
            Command::ShowWhole => {
                workspace.view = WHOLE;
                workspace.refresh();
            }
            Command::Select(body) => workspace.selected = body,
            Command::ShowPage(page) => workspace.page = page,
            Command::NextPage => workspace.page = workspace.page.turned(1),
            Command::PreviousPage => workspace.page = workspace.page.turned(Page::ALL.len() - 1),
            Command::Pin => {
                let label = workspace.scenario().title.clone();
                workspace.say(format!("Pinned: {label}"));
                workspace.pinned = Some(Pinned { label, history: Arc::clone(&workspace.history) });
                workspace.refresh();
            }
            Command::Unpin => {
                workspace.pinned = None;
                workspace.refresh();
            }
            Command::SetSpectrumView(view) => workspace.spectrum_view = view,
            Command::SetSkyView(view) => workspace.sky_view = view,
            Command::SetLayerScale(scale) => workspace.layer_scale = scale,
            Command::ToggleCurve(curve) => {
                if workspace.curves.contains(&curve) {
                    workspace.curves.retain(|shown| *shown != curve);
                } else {
                    workspace.curves.push(curve);
                    workspace
                        .curves
                        .sort_by_key(|shown| crate::figure::curves::Curve::ALL.iter().position(|curve| curve == shown));
                }
                workspace.refresh();
            }
            Command::ShowSource(method) => {
                workspace.page = Page::Sources;
                workspace.wanted_source = Some(method);
            }
            Command::ShowCommands => workspace.dialog = Some(Dialog::Commands(Search::default())),
            Command::ToggleShow => {
                workspace.show.toggle();
                workspace.playback.is_running = false;
            }
            Command::SetShowTime(show_time_s) => {
                workspace.show.clock_s = show_time_s;
                if let Some(time_yr) = workspace.show.advance(0.0) {
                    self.go(TimeCommand::To(time_yr));
                }
            }
            Command::ShowKeys => workspace.dialog = Some(Dialog::Keys),
            Command::ShowAbout => workspace.dialog = Some(Dialog::About),
            _ => {}
        }
    }

    fn go(&mut self, command: TimeCommand) {
        let workspace = &mut self.workspace;
        let events = workspace.history.events();
        let now_yr = workspace.moment_yr;
        let target_yr = match command {
            TimeCommand::To(age_yr) => Some(age_yr),
            TimeCommand::Step { steps } => {
                let axis = &workspace.derived.axis;
                Some(axis.age_at(axis.fraction_at(now_yr) + steps * STEP * workspace.view.width()))
            }
            TimeCommand::PreviousEvent => {
                events.iter().rev().map(|event| event.time_yr).find(|time_yr| *time_yr < now_yr)
            }
            TimeCommand::NextEvent => events.iter().map(|event| event.time_yr).find(|time_yr| *time_yr > now_yr),
            TimeCommand::Birth => Some(0.0),
            TimeCommand::End => Some(workspace.history.shown_until_yr()),
            TimeCommand::Now => Some(workspace.history.system().star.present_age_yr),
            TimeCommand::TogglePlay => {
                let starts = !workspace.playback.is_running;
                workspace.playback.is_running = starts;
                workspace.show.is_running = false;
                // Playing from the end would stop at once; begin anew instead.
                (starts && now_yr >= workspace.derived.axis.to_yr()).then_some(0.0)
            }
            TimeCommand::BeginLoop | TimeCommand::EndLoop => {
                let fraction = workspace.derived.axis.fraction_at(now_yr);
                match command {
                    TimeCommand::BeginLoop => workspace.playback.begin_loop(fraction),
                    _ => workspace.playback.end_loop(fraction),
                }
                None
            }
            TimeCommand::ClearLoop => {
                workspace.playback.loop_fractions = None;
                None
            }
            TimeCommand::SetLifeSeconds(seconds) => {
                workspace.playback.life_seconds = seconds;
                None
            }
        };
        if let Some(target_yr) = target_yr {
            workspace.moment_yr = held(target_yr);
            self.keep_moment_in_view();
        }
    }

    /// Moves a zoomed view so that it shows the moment.
    pub(super) fn keep_moment_in_view(&mut self) {
        let workspace = &mut self.workspace;
        let view = workspace.view.showing(workspace.derived.axis.fraction_at(workspace.moment_yr));
        if view != workspace.view {
            workspace.view = view;
            workspace.refresh();
        }
    }

    /// Carries out what a dialog was told.
    pub(super) fn reply(&mut self, context: &Context, reply: Reply) {
        match reply {
            Reply::Do(command) => self.perform(context, command),
            Reply::DoAnyway(command) => self.perform_anyway(context, command),
            Reply::SaveThen(then) if self.workspace.session.path().is_none() => {
                self.ask(context, Purpose::Save, Some(then));
            }
            Reply::SaveThen(then) => {
                self.save(context);
                if !self.workspace.session.is_dirty() {
                    self.perform(context, then);
                }
            }
            Reply::Recover(recovered) => {
                let session = recovered.session();
                self.replace(context, session);
                self.settle_recovered(*recovered);
            }
            Reply::Forget(recovered) => self.settle_recovered(*recovered),
        }
    }

    /// Carries a command out although there may be unsaved work: the user said so.
    fn perform_anyway(&mut self, context: &Context, command: Command) {
        match command {
            Command::New => self.replace(context, Session::new_untitled()),
            Command::AskOpen => self.ask(context, Purpose::Open, None),
            Command::Open(path) => self.open(context, &path),
            Command::OpenBuiltIn(name) => self.open_built_in(context, name),
            Command::Quit => {
                self.drop_unsaved = true;
                self.may_close = true;
                context.send_viewport_cmd(ViewportCommand::Close);
            }
            other => self.perform(context, other),
        }
    }

    fn ask(&mut self, context: &Context, purpose: Purpose, then: Option<Command>) {
        let typed = match (purpose, self.workspace.session.path()) {
            (Purpose::Save, Some(path)) => path.to_string_lossy().into_owned(),
            (Purpose::Export(export), _) => {
                let name = export.file_name(&self.workspace);
                let folder = self.workspace.settings.folder.as_ref();
                folder.map_or_else(|| name.clone(), |folder| folder.join(&name).to_string_lossy().into_owned())
            }
            // A folder with a separator at its end: the name is yet to be typed.
            _ => self
                .workspace
                .settings
                .folder
                .as_ref()
                .map_or_else(String::new, |folder| folder.join("").to_string_lossy().into_owned()),
        };
        let system = self.with_system_dialogs.then_some(context);
        self.workspace.dialog = Some(Dialog::Path(Asked::new(purpose, typed, then, system)));
    }

    /// Opens a file; when it cannot be opened, the scenario that is open stays.
    pub(super) fn open(&mut self, context: &Context, path: &Path) {
        match Session::open(path) {
            Ok(session) => {
                self.workspace.settings.remember_file(path);
                self.keep_settings();
                self.replace(context, session);
            }
            Err(error) => {
                let file = path.file_name().unwrap_or(path.as_os_str()).to_string_lossy().into_owned();
                self.workspace.dialog = Some(Dialog::LoadProblems {
                    file,
                    problems: error.to_string().lines().map(str::to_owned).collect(),
                });
            }
        }
    }

    fn open_built_in(&mut self, context: &Context, name: &str) {
        match built_in::find(name).map(Session::from_built_in) {
            Some(Ok(session)) => self.replace(context, session),
            _ => self.workspace.say_error(format!("There is no built-in scenario named {name}.")),
        }
    }

    /// Saves to the session's own file; asks for a place when there is none or someone else changed it.
    fn save(&mut self, context: &Context) {
        match self.workspace.session.save() {
            Ok(()) => self.after_saving(),
            Err(SaveError::NoFile) => self.ask(context, Purpose::Save, None),
            Err(error @ SaveError::ChangedElsewhere { .. }) => {
                self.workspace.say_error(error.to_string());
                self.ask(context, Purpose::Save, None);
            }
            Err(error @ SaveError::Write(_)) => self.workspace.say_error(error.to_string()),
        }
    }

    fn save_as(&mut self, path: &Path) {
        match self.workspace.session.save_as(path) {
            Ok(()) => self.after_saving(),
            Err(error) => self.workspace.say_error(error.to_string()),
        }
    }

    fn after_saving(&mut self) {
        if let Some(path) = self.workspace.session.path().map(Path::to_path_buf) {
            self.workspace.say(format!("Saved {}", path.display()));
            self.workspace.settings.remember_file(&path);
            self.keep_settings();
        }
    }

    /// Takes over what was handed over in the background.
    pub(super) fn receive_exports(&mut self, context: &Context) {
        for exported in self.workspace.exports.poll() {
            match exported {
                Exported::Written(path) => self.workspace.say(format!("Exported {}", path.display())),
                Exported::Text(text) => {
                    self.workspace.say("Copied the fact sheet");
                    context.copy_text(text);
                }
                Exported::Refused(sentence) => self.workspace.say_error(sentence),
            }
        }
    }

    /// Puts another session in place of the one that is open.
    pub(super) fn replace(&mut self, context: &Context, session: Session) {
        let present_yr = session.scenario().system.star.present_age_yr;
        let workspace = &mut self.workspace;
        workspace.session = session;
        workspace.selected = Body::Star;
        workspace.view = WHOLE;
        workspace.notice = None;
        workspace.playback.is_running = false;
        workspace.playback.loop_fractions = None;
        workspace.moment_yr = present_yr;
        self.recompute(context);
    }

    /// Computes anew unless the system is still this one: words, statements and cues have no part in its history.
    fn recompute_unless(&mut self, context: &Context, before: &System) {
        if self.workspace.scenario().system != *before {
            self.recompute(context);
        }
    }

    /// Starts computing the history of the scenario as it stands.
    fn recompute(&mut self, context: &Context) {
        let workspace = &mut self.workspace;
        let system = workspace.scenario().system.clone();
        if let Body::Planet(index) = workspace.selected
            && index >= system.planets.len()
        {
            workspace.selected = Body::Star;
        }
        workspace.start_job(system, context);
    }
}
