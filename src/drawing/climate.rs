//! A planet's climate: temperature by latitude, starlight between its thresholds, and both through time.

use super::canvas::{Area, Canvas};
use super::ink::Palette;
use super::legend::{Entry, Sample};
use super::time_chart::{self, TimeView};
use super::{latitudes, light_gauge, page};
use crate::figure::chart::BandMeaning;
use crate::figure::{Chart, LatitudeFigure, LightGauge};

/// Room between the parts.
const BETWEEN: f64 = 16.0;
/// Height for words in place of a plot.
const WORDS: f64 = 56.0;
/// Width over height from which the parts stand beside each other.
const WIDE: f64 = 2.2;

/// Everything that is drawn of a planet's climate.
#[derive(Debug)]
pub(super) struct ClimateFigure {
    /// Index of the planet.
    pub planet: usize,
    /// Temperature by latitude, or why there is none, in a sentence.
    pub latitudes: Result<LatitudeFigure, String>,
    /// Starlight between thresholds, for a planet that has some.
    pub gauge: Option<LightGauge>,
    /// Starlight and states through time.
    pub chart: Chart,
}

impl ClimateFigure {
    /// What lines, shades and marks stand for.
    pub(super) fn entries(&self, palette: &Palette) -> Vec<Entry> {
        let name = self.chart.series.first().map(|series| series.name.clone()).unwrap_or_default();
        let mut entries = vec![Entry { sample: Sample::Planet(self.planet), words: name }];
        let mut band = |meaning, words: &str| {
            entries.push(Entry { sample: Sample::Band(palette.band(meaning)), words: words.to_owned() });
        };
        if self.latitudes.as_ref().is_ok_and(|figure| !figure.ice_deg.is_empty()) {
            band(BandMeaning::LiquidWater, "ice");
        }
        for drawn in self.chart.bands.iter().filter(|drawn| drawn.runs.iter().any(|run| run.len() > 1)) {
            band(drawn.meaning, &drawn.name);
        }
        entries.push(Entry { sample: Sample::Moment, words: "the moment".to_owned() });
        entries
    }

    /// Draws all parts into an area: below each other, in a wide one beside each other.
    pub(super) fn draw(&self, canvas: &mut Canvas, area: Area, time: &TimeView<'_>, palette: &Palette) {
        let gauge_room = if self.gauge.is_some() { light_gauge::HEIGHT + BETWEEN } else { 0.0 };
        let (profile, mut rest) = if area.width() > WIDE * area.height() && self.latitudes.is_ok() {
            let middle = area.centre()[0];
            (Area { right: middle - 0.5 * BETWEEN, ..area }, Area { left: middle + 0.5 * BETWEEN, ..area })
        } else {
            let free = area.height() - gauge_room - BETWEEN;
            let bottom = area.top + if self.latitudes.is_ok() { 0.5 * free } else { WORDS };
            (Area { bottom, ..area }, Area { top: bottom + BETWEEN, ..area })
        };
        match &self.latitudes {
            Ok(figure) => latitudes::draw(canvas, profile, figure, self.planet, palette),
            Err(reason) => page::say_instead(canvas, profile, reason, palette),
        }
        if let Some(gauge) = &self.gauge {
            light_gauge::draw(canvas, rest, gauge, self.planet, palette);
            rest.top += gauge_room;
        }
        time_chart::draw(canvas, rest, std::slice::from_ref(&self.chart), time, palette);
    }
}
