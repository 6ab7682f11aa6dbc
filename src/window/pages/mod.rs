//! The stage: pages that all show the one moment.

mod chart_view;
mod chronicle;
mod climate;
mod cue_rows;
mod cues;
mod curves;
mod hr_diagram;
mod interior;
mod interior_plot;
mod introduction;
mod latitude_plot;
mod light_columns;
mod light_gauge_view;
mod orbits;
mod sky;
mod sky_altitude;
mod sky_scene;
mod sources;
mod spectrum;
mod spectrum_plot;
mod statement_form;
mod statement_rows;
mod statements;

use super::command::Command;
use super::theme::GRID;
use super::widgets::choice::word;
use super::workspace::Workspace;
use egui::Ui;

/// A page of the stage.
#[derive(Clone, Copy, Debug, Default, PartialEq, Eq, Hash)]
pub enum Page {
    /// Strip charts over one shared time axis.
    #[default]
    Curves,
    /// Luminosity over temperature.
    HrDiagram,
    /// The star's spectrum, brightness and colour in numbers.
    Spectrum,
    /// The star's layers.
    Interior,
    /// What stands in a planet's sky.
    Sky,
    /// The system from above.
    Orbits,
    /// One planet's climate by latitude and against its thresholds.
    Climate,
    /// Every dated event.
    Chronicle,
    /// Claims and what the model says to them.
    Statements,
    /// Show time against cosmic time.
    Cues,
    /// What the scenario is about.
    Introduction,
    /// Methods, papers, ranges.
    Sources,
}

impl Page {
    /// Every page, in order.
    pub const ALL: [Self; 12] = [
        Self::Curves,
        Self::HrDiagram,
        Self::Spectrum,
        Self::Interior,
        Self::Orbits,
        Self::Climate,
        Self::Sky,
        Self::Chronicle,
        Self::Statements,
        Self::Cues,
        Self::Introduction,
        Self::Sources,
    ];

    /// The page so many places on; after the last comes the first.
    #[must_use]
    pub fn turned(self, by: usize) -> Self {
        let here = Self::ALL.iter().position(|page| *page == self).unwrap_or(0);
        Self::ALL[(here + by) % Self::ALL.len()]
    }

    /// Name on its tab.
    #[must_use]
    pub fn name(self) -> &'static str {
        match self {
            Self::Curves => "Curves",
            Self::HrDiagram => "HR diagram",
            Self::Spectrum => "Spectrum",
            Self::Interior => "Interior",
            Self::Sky => "Sky",
            Self::Orbits => "Orbits",
            Self::Climate => "Climate",
            Self::Chronicle => "Chronicle",
            Self::Statements => "Statements",
            Self::Cues => "Cues",
            Self::Introduction => "Introduction",
            Self::Sources => "Sources",
        }
    }
}

/// Draws tabs and page and returns what they were told.
pub(super) fn show(ui: &mut Ui, workspace: &mut Workspace) -> Vec<Command> {
    let palette = workspace.palette();
    let mut commands = Vec::new();
    ui.horizontal_wrapped(|ui| {
        ui.spacing_mut().item_spacing.x = 2.0 * GRID;
        for page in Page::ALL {
            if word(ui, palette, page.name(), workspace.page == page).clicked() {
                commands.push(Command::ShowPage(page));
            }
        }
    });
    ui.add_space(GRID);
    workspace.chart_line_foot = None;
    commands.extend(match workspace.page {
        Page::Curves => curves::show(ui, workspace),
        Page::HrDiagram => hr_diagram::show(ui, workspace),
        Page::Spectrum => spectrum::show(ui, workspace),
        Page::Interior => interior::show(ui, workspace),
        Page::Sky => sky::show(ui, workspace),
        Page::Orbits => orbits::show(ui, workspace),
        Page::Climate => climate::show(ui, workspace),
        Page::Chronicle => chronicle::show(ui, workspace),
        Page::Statements => statements::show(ui, workspace),
        Page::Cues => cues::show(ui, workspace),
        Page::Introduction => introduction::show(ui, workspace),
        Page::Sources => sources::show(ui, workspace),
    });
    commands
}
