//! What the window hands over: the figure of the page shown, the fact sheet, the table; made and written off the
//! drawing thread.

use super::pages::Page;
use super::workspace::Workspace;
use crate::document::write_atomically;
use crate::drawing::{Look, Plot, Subject, figure_svg, pdf, png};
use crate::handover::{
    TableRequest, cue_table_csv, fact_sheet, sheet_html, sheet_markdown, sheet_text, table_ages, table_csv, table_ecsv,
    table_json,
};
use crate::system::Body;
use crate::system::cues::{FrameRate, Schedule};
use std::path::{Path, PathBuf};
use std::sync::Arc;

/// Rows of a table from the window.
const TABLE_POINTS: usize = 400;
/// Longest part of a file's name that comes from the scenario's title, characters.
const LONGEST_STEM: usize = 40;

/// Something to hand over as a file.
#[derive(Clone, Copy, Debug, PartialEq, Eq)]
pub enum Export {
    /// The figure of the page shown.
    Figure,
    /// The fact sheet of the moment.
    Sheet,
    /// The whole history as a table.
    Table,
    /// The show as a table, one line for every frame at thirty frames per second.
    Cues,
}

/// What came of work off the drawing thread.
#[derive(Debug)]
pub(super) enum Exported {
    /// A file was written.
    Written(PathBuf),
    /// A text for the clipboard.
    Text(String),
    /// Why there is nothing, in one sentence.
    Refused(String),
}

/// Work for a thread of its own.
pub(super) type Work = Box<dyn FnOnce() -> Exported + Send>;

impl Export {
    /// The ends of file names it can be written as, the usual one first.
    pub(super) fn extensions(self) -> &'static [&'static str] {
        match self {
            Self::Figure => &["svg", "pdf", "png"],
            Self::Sheet => &["html", "md", "txt"],
            Self::Table => &["csv", "ecsv", "json"],
            Self::Cues => &["csv"],
        }
    }

    /// What it is, for headings.
    pub(super) fn name(self) -> &'static str {
        match self {
            Self::Figure => "figure",
            Self::Sheet => "fact sheet",
            Self::Table => "table",
            Self::Cues => "show table",
        }
    }

    /// A name for its file, made of the scenario's title and nothing that a file system could take amiss.
    pub(super) fn file_name(self, workspace: &Workspace) -> String {
        let mut stem = String::new();
        for sign in workspace.scenario().title.chars().flat_map(char::to_lowercase) {
            if sign.is_ascii_alphanumeric() {
                stem.push(sign);
            } else if !stem.is_empty() && !stem.ends_with('_') {
                stem.push('_');
            }
        }
        let short: String = stem.chars().take(LONGEST_STEM).collect();
        let stem = short.trim_end_matches('_');
        let stem = if stem.is_empty() { "scenario" } else { stem };
        format!("{stem}_{}.{}", self.name().replace(' ', "_"), self.extensions()[0])
    }

    /// The work of writing it to a file.
    pub(super) fn work(self, workspace: &Workspace, path: &Path) -> Work {
        let path = if path.extension().is_none() { path.with_extension(self.extensions()[0]) } else { path.to_owned() };
        let extension = path.extension().map(|end| end.to_string_lossy().to_ascii_lowercase()).unwrap_or_default();
        if !self.extensions().contains(&extension.as_str()) {
            let allowed = self.extensions().join(", .");
            let reason = format!(
                "{} names no form of a {}, allowed .{allowed}; choose another name",
                path.display(),
                self.name()
            );
            return Box::new(|| Exported::Refused(reason));
        }
        let make = match self {
            Self::Figure => figure(workspace, extension),
            Self::Sheet => sheet(workspace, extension),
            Self::Table => table(workspace, extension),
            Self::Cues => cue_table(workspace),
        };
        Box::new(move || match make() {
            Ok(bytes) => match write_atomically(&path, &bytes) {
                Ok(()) => Exported::Written(path),
                Err(error) => Exported::Refused(error.to_string()),
            },
            Err(sentence) => Exported::Refused(sentence),
        })
    }
}

/// The work of writing the fact sheet as text for the clipboard.
pub(super) fn sheet_for_clipboard(workspace: &Workspace) -> Work {
    let make = sheet(workspace, "txt".to_owned());
    Box::new(move || match make() {
        Ok(bytes) => Exported::Text(String::from_utf8_lossy(&bytes).into_owned()),
        Err(sentence) => Exported::Refused(sentence),
    })
}

type Make = Box<dyn FnOnce() -> Result<Vec<u8>, String> + Send>;

/// The plot that a page shows; pages of words stand beside the ribbon of the whole life.
fn plot_of(workspace: &Workspace) -> Plot {
    match workspace.page {
        Page::Curves if !workspace.curves.is_empty() => Plot::Curves(workspace.curves.clone()),
        Page::HrDiagram => Plot::HrDiagram,
        Page::Spectrum => Plot::Spectrum,
        Page::Sky => Plot::Sky,
        Page::Orbits => Plot::Orbits(workspace.plan_scale),
        Page::Climate => Plot::Climate,
        Page::Interior => Plot::Interior(workspace.layer_scale),
        _ => Plot::LifeStrip,
    }
}

fn figure(workspace: &Workspace, extension: String) -> Make {
    let history = Arc::clone(&workspace.history);
    let (title, plot) = (workspace.scenario().title.clone(), plot_of(workspace));
    let (moment_yr, scale, view) = (workspace.moment_yr, workspace.scale, workspace.view);
    let (spectrum_view, sky_view) = (workspace.spectrum_view, workspace.sky_view);
    let planet = match workspace.selected {
        Body::Planet(index) => Some(index),
        // The sky's page shows the first where none is chosen.
        Body::Star => (plot == Plot::Sky).then_some(0),
    };
    Box::new(move || {
        let subject = Subject {
            planet,
            scale,
            shown_fractions: [view.from, view.to],
            spectrum_view,
            sky_view,
            ..Subject::new(&history, &title, moment_yr)
        };
        let size = plot.usual_size();
        let svg = figure_svg(&subject, &plot, size, Look::Light, "figure");
        match extension.as_str() {
            "pdf" => pdf(&svg).map_err(|error| error.to_string()),
            "png" => png(&svg, size).map_err(|error| error.to_string()),
            _ => Ok(svg.into_bytes()),
        }
    })
}

fn sheet(workspace: &Workspace, extension: String) -> Make {
    let history = Arc::clone(&workspace.history);
    let (title, about) = (workspace.scenario().title.clone(), workspace.scenario().about.clone());
    let moment_yr = workspace.moment_yr;
    Box::new(move || {
        let sheet = fact_sheet(&history, &title, &about, &[moment_yr], extension == "html");
        let page = match extension.as_str() {
            "md" => sheet_markdown(&sheet),
            "txt" => sheet_text(&sheet),
            _ => sheet_html(&sheet),
        };
        Ok(page.into_bytes())
    })
}

fn cue_table(workspace: &Workspace) -> Make {
    let history = Arc::clone(&workspace.history);
    let cues = workspace.scenario().cues.clone();
    Box::new(move || {
        let schedule = Schedule::new(&cues, &history).map_err(|problem| problem.to_string())?;
        let planets: Vec<usize> = (0..history.planets().len()).collect();
        Ok(cue_table_csv(&history, &schedule, FrameRate::THIRTY, &planets).into_bytes())
    })
}

fn table(workspace: &Workspace, extension: String) -> Make {
    let history = Arc::clone(&workspace.history);
    let (title, scale) = (workspace.scenario().title.clone(), workspace.scale);
    Box::new(move || {
        let ages_yr = table_ages(&history, None, None, TABLE_POINTS, scale).map_err(|error| error.to_string())?;
        let request = TableRequest::whole(&history, &title, &ages_yr);
        let text = match extension.as_str() {
            "ecsv" => table_ecsv(&request),
            "json" => table_json(&request),
            _ => table_csv(&request),
        };
        Ok(text.into_bytes())
    })
}
