//! Everything the window knows at one time: the session, the history, the moment, the view.

use super::checked::Checked;
use super::derived::Derived;
use super::dialogs::Dialog;
use super::jobs::{ExportJobs, HistoryJob, Request};
use super::pages::Page;
use super::pinned::Pinned;
use super::playback::Playback;
use super::show_clock::Show;
use super::start::Graphics;
use super::theme::{self, Palette};
use super::view::{View, WHOLE};
use crate::document::{Scenario, Session, Settings, Theme};
use crate::figure::curves::Curve;
use crate::figure::interior::LayerScale;
use crate::figure::orbit_plan::PlanScale;
use crate::figure::{SkyView, SpectrumView};
use crate::physics::light::steady_colour_words;
use crate::system::{Body, EventGroup, History, Moment, System, TimeScale};
use crate::units::number_text::USUAL_DIGITS;
use crate::units::time_words::span;
use std::sync::Arc;

/// What the window works on.
#[derive(Debug)]
pub struct Workspace {
    /// The scenario with its undo history and file.
    pub session: Session,
    /// What the user likes, kept between runs.
    pub settings: Settings,
    /// The last computed history; stays while a new one is being computed.
    pub history: Arc<History>,
    /// What is being computed.
    pub(super) job: HistoryJob,
    /// What is being handed over.
    pub(super) exports: ExportJobs,
    /// Why the scenario as it stands has no history, in one sentence.
    pub trouble: Option<String>,
    /// The instant that everything shows, yr.
    pub moment_yr: f64,
    /// The scale of time.
    pub scale: TimeScale,
    /// The part of the axis in view.
    pub view: View,
    /// Whose figures the panels show below the star's.
    pub selected: Body,
    /// The page of the stage.
    pub page: Page,
    /// Charts on the curves page.
    pub curves: Vec<Curve>,
    /// How the spectrum is looked at.
    pub spectrum_view: SpectrumView,
    /// How the sky is looked at.
    pub sky_view: SkyView,
    /// What the star's layers are laid out against.
    pub layer_scale: LayerScale,
    /// The star's colour in words as it was last shown: it follows with a little delay, so as not to flicker.
    pub(super) colour_words: &'static str,
    /// How distances are laid out on the plan of the orbits.
    pub plan_scale: PlanScale,
    /// How far the plan of the orbits reaches, au; the whole system where nothing is said.
    pub plan_rim_au: Option<f64>,
    /// Groups of events that the chronicle leaves out.
    pub hidden_events: Vec<EventGroup>,
    /// A system kept as a pale reference.
    pub pinned: Option<Pinned>,
    /// Playing.
    pub playback: Playback,
    /// Axis, samples, charts and ribbon for the history and view.
    pub(super) derived: Derived,
    /// The show of the scenario and its clock.
    pub(super) show: Show,
    /// Statements judged so far.
    pub(super) checked: Checked,
    /// Who draws the window.
    pub graphics: Graphics,
    /// A dialog that waits for an answer.
    pub(super) dialog: Option<Dialog>,
    /// The last message to the user.
    pub notice: Option<Notice>,
    /// Method to scroll to on the sources page.
    pub wanted_source: Option<&'static str>,
    /// Foot of the moment's line in the charts, for the connector to the strip.
    pub(super) chart_line_foot: Option<egui::Pos2>,
}

/// A message that needs no answer.
#[derive(Clone, Debug, PartialEq, Eq)]
pub struct Notice {
    /// The sentence.
    pub text: String,
    /// Whether something went wrong.
    pub is_error: bool,
}

impl Workspace {
    /// A workspace on a scenario whose history is known.
    #[must_use]
    pub fn new(session: Session, settings: Settings, history: Arc<History>) -> Self {
        let scale = TimeScale::from_key(&settings.time_scale).unwrap_or_default();
        let view = WHOLE;
        let curves = vec![Curve::Luminosity, Curve::Temperature, Curve::PlanetTemperatures, Curve::Distance];
        let moment_yr = history.system().star.present_age_yr;
        let derived = Derived::new(&history, scale, view, &curves);
        Self {
            session,
            settings,
            history,
            job: HistoryJob::default(),
            exports: ExportJobs::default(),
            trouble: None,
            moment_yr,
            scale,
            view,
            selected: Body::Star,
            page: Page::Curves,
            curves,
            spectrum_view: SpectrumView::default(),
            sky_view: SkyView::default(),
            layer_scale: LayerScale::default(),
            colour_words: "",
            plan_scale: PlanScale::default(),
            plan_rim_au: None,
            hidden_events: Vec::new(),
            pinned: None,
            playback: Playback::default(),
            derived,
            show: Show::default(),
            checked: Checked::default(),
            graphics: Graphics::default(),
            dialog: None,
            notice: None,
            wanted_source: None,
            chart_line_foot: None,
        }
    }

    /// The scenario as it stands.
    #[must_use]
    pub fn scenario(&self) -> &Scenario {
        self.session.scenario()
    }

    /// The chosen look.
    #[must_use]
    pub fn theme(&self) -> Theme {
        self.settings.theme
    }

    /// The colours of the chosen look.
    #[must_use]
    pub fn palette(&self) -> &'static Palette {
        theme::palette(self.theme())
    }

    /// Whether the history shown belongs to an earlier state of the scenario.
    #[must_use]
    pub fn is_stale(&self) -> bool {
        *self.history.system() != self.scenario().system
    }

    /// Whether something is still being handed over.
    #[must_use]
    pub fn is_exporting(&self) -> bool {
        self.exports.is_running()
    }

    /// Everything at the moment.
    #[must_use]
    pub fn moment(&self) -> Moment {
        self.history.moment(self.moment_yr)
    }

    /// Brings the words for the star's colour up to the moment.
    pub(super) fn follow_colour(&mut self) {
        let star = self.history.star_at(self.moment_yr);
        self.colour_words = if star.phase.is_dark() {
            "no light modelled"
        } else {
            steady_colour_words(Some(self.colour_words), star.effective_temperature_k)
        };
    }

    /// Place of the moment in the view; outside 0 to 1 when it is not in view.
    #[must_use]
    pub fn moment_place(&self) -> f64 {
        self.view.place_of(self.derived.axis.fraction_at(self.moment_yr))
    }

    /// A span of time as the user likes it written.
    #[must_use]
    pub fn time_text(&self, time_yr: f64) -> String {
        span(time_yr, USUAL_DIGITS, self.settings.span_style)
    }

    /// Starts computing a history in the background, with what is drawn of it as it is looked at now.
    pub(super) fn start_job(&mut self, system: System, context: &egui::Context) {
        let request = Request {
            system,
            earlier: Arc::clone(&self.history),
            scale: self.scale,
            view: self.view,
            curves: self.curves.clone(),
        };
        self.job.start(request, context);
    }

    /// Builds axis, samples and charts anew after a change of history, scale, view or charts.
    pub(super) fn refresh(&mut self) {
        let pinned = self.pinned.as_ref().map(|pinned| &pinned.history);
        self.derived.update(&self.history, self.scale, self.view, &self.curves, pinned);
    }

    /// Says something that needs no answer.
    pub fn say(&mut self, text: impl Into<String>) {
        self.notice = Some(Notice { text: text.into(), is_error: false });
    }

    /// Says that something went wrong.
    pub fn say_error(&mut self, text: impl Into<String>) {
        self.notice = Some(Notice { text: text.into(), is_error: true });
    }
}
