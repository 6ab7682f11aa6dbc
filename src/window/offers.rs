//! Everything the window offers to do, with its words: menus and the list of commands are made from this one list.

use super::command::{Command, PanelSide, TimeCommand};
use super::exports::Export;
use super::pages::Page;
use super::workspace::Workspace;
use crate::document::{Theme, built_in};
use crate::system::TimeScale;
use crate::units::time_words::SpanStyle;

/// Where an offer stands in the menus.
#[derive(Clone, Copy, Debug, PartialEq, Eq)]
pub enum Menu {
    /// Files and scenarios.
    Scenario,
    /// Files opened lately.
    Recent,
    /// Scenarios that come with the program.
    BuiltIn,
    /// The scenario's content.
    Edit,
    /// Looks and layout.
    View,
    /// Pages of the stage.
    Page,
    /// The moment.
    Time,
    /// Help.
    Help,
}

impl Menu {
    /// Name for people.
    #[must_use]
    pub fn name(self) -> &'static str {
        match self {
            Self::Scenario => "Scenario",
            Self::Recent => "Open recent",
            Self::BuiltIn => "Built-in scenarios",
            Self::Edit => "Edit",
            Self::View => "View",
            Self::Page => "Page",
            Self::Time => "Time",
            Self::Help => "Help",
        }
    }
}

/// One thing that can be done now, or not.
#[derive(Clone, Debug)]
pub struct Offer {
    /// Where it stands.
    pub menu: Menu,
    /// Words for people.
    pub words: String,
    /// What is told.
    pub command: Command,
    /// Whether it can be done now.
    pub is_possible: bool,
    /// Of a choice: whether this is what holds now.
    pub is_chosen: Option<bool>,
    /// Whether a new part of the menu begins with it.
    pub begins_part: bool,
}

impl Offer {
    fn new(menu: Menu, words: impl Into<String>, command: Command) -> Self {
        Self { menu, words: words.into(), command, is_possible: true, is_chosen: None, begins_part: false }
    }

    fn possible(self, is_possible: bool) -> Self {
        Self { is_possible, ..self }
    }

    fn choice(self, is_chosen: bool) -> Self {
        Self { is_chosen: Some(is_chosen), ..self }
    }

    fn part(self) -> Self {
        Self { begins_part: true, ..self }
    }
}

/// Everything that is offered now, in the order of the menus.
#[must_use]
pub fn offers(workspace: &Workspace) -> Vec<Offer> {
    let mut all = of_files(workspace);
    all.extend(of_edits(workspace));
    all.extend(of_looks(workspace));
    all.extend(
        Page::ALL
            .map(|page| Offer::new(Menu::Page, page.name(), Command::ShowPage(page)).choice(workspace.page == page)),
    );
    all.push(Offer::new(Menu::Page, "Next page", Command::NextPage).part());
    all.push(Offer::new(Menu::Page, "Previous page", Command::PreviousPage));
    all.extend(of_time(workspace));
    all.push(Offer::new(Menu::Help, "All commands …", Command::ShowCommands));
    all.push(Offer::new(Menu::Help, "All keys", Command::ShowKeys));
    all.push(Offer::new(Menu::Help, "About Longember", Command::ShowAbout));
    all
}

fn of_files(workspace: &Workspace) -> Vec<Offer> {
    let menu = Menu::Scenario;
    let session = &workspace.session;
    let mut all = vec![
        Offer::new(menu, "New", Command::New),
        Offer::new(menu, "Open …", Command::AskOpen),
        Offer::new(menu, "Save", Command::Save).part(),
        Offer::new(menu, "Save as …", Command::AskSaveAs),
        Offer::new(menu, "Revert to saved", Command::Revert).possible(session.is_dirty() && session.saved().is_some()),
        Offer::new(menu, "Export figure …", Command::AskExport(Export::Figure)).part(),
        Offer::new(menu, "Export fact sheet …", Command::AskExport(Export::Sheet)),
        Offer::new(menu, "Export table …", Command::AskExport(Export::Table)),
        Offer::new(menu, "Copy fact sheet", Command::CopySheet),
        Offer::new(menu, "Quit", Command::Quit).part(),
    ];
    all.extend(workspace.settings.recent_files().iter().map(|path| {
        let name = path.file_name().unwrap_or(path.as_os_str()).to_string_lossy();
        Offer::new(Menu::Recent, name, Command::Open(path.clone()))
    }));
    all.extend(built_in::all().iter().map(|scenario| {
        let title = scenario.scenario().map_or_else(|_| scenario.name.to_owned(), |sheet| sheet.title);
        Offer::new(Menu::BuiltIn, title, Command::OpenBuiltIn(scenario.name))
    }));
    all
}

fn of_edits(workspace: &Workspace) -> Vec<Offer> {
    let menu = Menu::Edit;
    let (undo, redo) = (workspace.session.undo_label(), workspace.session.redo_label());
    let words =
        |verb: &str, label: Option<&str>| label.map_or_else(|| verb.to_owned(), |label| format!("{verb}: {label}"));
    let pinned = workspace.pinned.as_ref();
    let unpin = pinned.map_or_else(|| "Unpin".to_owned(), |pinned| format!("Unpin {}", pinned.label));
    vec![
        Offer::new(menu, words("Undo", undo), Command::Undo).possible(undo.is_some()),
        Offer::new(menu, words("Redo", redo), Command::Redo).possible(redo.is_some()),
        Offer::new(menu, "Pin for comparison", Command::Pin).part(),
        Offer::new(menu, unpin, Command::Unpin).possible(pinned.is_some()),
    ]
}

fn of_looks(workspace: &Workspace) -> Vec<Offer> {
    let menu = Menu::View;
    let settings = &workspace.settings;
    let mut all: Vec<Offer> = Vec::new();
    let themes = Theme::ALL.map(|theme| {
        let words = match theme {
            Theme::Dark => "Dark",
            Theme::Light => "Light",
            Theme::Dome => "Dome (dim amber)",
        };
        Offer::new(menu, words, Command::SetTheme(theme)).choice(workspace.theme() == theme)
    });
    all.extend(themes);
    let styles = [(SpanStyle::Symbols, "Times as 7.600 Gyr"), (SpanStyle::Words, "Times as 7.600 billion years")];
    for (index, (style, words)) in styles.into_iter().enumerate() {
        let offer = Offer::new(menu, words, Command::SetSpanStyle(style)).choice(settings.span_style == style);
        all.push(if index == 0 { offer.part() } else { offer });
    }
    all.push(
        Offer::new(menu, "System panel", Command::TogglePanel(PanelSide::System))
            .choice(settings.panels.shows_system)
            .part(),
    );
    all.push(
        Offer::new(menu, "Panel of this moment", Command::TogglePanel(PanelSide::Moment))
            .choice(settings.panels.shows_moment),
    );
    all.push(Offer::new(menu, "Larger text", Command::ScaleText(1)).part());
    all.push(Offer::new(menu, "Smaller text", Command::ScaleText(-1)));
    all.push(Offer::new(menu, "Usual text size", Command::ScaleText(0)));
    all
}

fn of_time(workspace: &Workspace) -> Vec<Offer> {
    let menu = Menu::Time;
    let time = Command::Time;
    let play = if workspace.playback.is_running { "Pause" } else { "Play" };
    let is_looped = workspace.playback.loop_fractions.is_some();
    let mut all = vec![
        Offer::new(menu, play, time(TimeCommand::TogglePlay)),
        Offer::new(menu, "Next event", time(TimeCommand::NextEvent)),
        Offer::new(menu, "Previous event", time(TimeCommand::PreviousEvent)),
        Offer::new(menu, "Birth of the star", time(TimeCommand::Birth)),
        Offer::new(menu, "The scenario's present", time(TimeCommand::Now)),
        Offer::new(menu, "End of what is shown", time(TimeCommand::End)),
        Offer::new(menu, "Loop: begin here", time(TimeCommand::BeginLoop)).part(),
        Offer::new(menu, "Loop: end here", time(TimeCommand::EndLoop)),
        Offer::new(menu, "No loop", time(TimeCommand::ClearLoop)).possible(is_looped),
    ];
    for (index, scale) in TimeScale::ALL.into_iter().enumerate() {
        let words = format!("{} time", scale.key());
        let offer = Offer::new(menu, words, Command::SetScale(scale)).choice(workspace.scale == scale);
        all.push(if index == 0 { offer.part() } else { offer });
    }
    all.push(Offer::new(menu, "Whole life", Command::ShowWhole).possible(workspace.view.width() < 1.0).part());
    all
}
