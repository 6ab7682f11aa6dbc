//! Every plot by name, and its figure as SVG.

use super::canvas::Canvas;
use super::ink::Look;
use super::page::{self, Words};
use super::time_chart::{self, TimeView};
use super::{climate::ClimateFigure, hr_diagram, interior, legend, life_strip, orbits, picture::Size, sky, spectrum};
use crate::figure::curves::Curve;
use crate::figure::interior::{LayerFigure, LayerScale};
use crate::figure::light_and_thresholds;
use crate::figure::orbit_plan::PlanScale;
use crate::figure::ribbon::LightRange;
use crate::figure::{
    Chart, HrDiagram, InteriorPicture, LatitudeFigure, LightGauge, OrbitPlan, Ribbon, Samples, SkyPicture, SkyView,
    Spectrum, SpectrumView,
};
use crate::physics::light::VisibleSpectrum;
use crate::system::planet_light::clear_air;
use crate::system::{
    Air, History, Moment, PlanetLight, PlanetSpecification, PlanetState, Starlight, TimeAxis, TimeScale,
};

/// Places at which a part of a history is read for a chart.
const SAMPLES: usize = 900;
/// Places at which the whole life is read for the range of light.
const COARSE_SAMPLES: usize = 240;
/// The size in which text has its usual size; larger figures have larger text.
const USUAL_SIZE: [f64; 2] = [960.0, 600.0];
/// Least room that the words of a figure need, in units of its text; smaller figures have smaller text.
const LEAST_ROOM: [f64; 2] = [560.0, 430.0];

/// A plot.
#[derive(Clone, Debug, PartialEq, Eq)]
pub enum Plot {
    /// Charts over one time axis, one below the other.
    Curves(Vec<Curve>),
    /// The ribbon of the whole life.
    LifeStrip,
    /// The Hertzsprung-Russell diagram.
    HrDiagram,
    /// The star's spectrum.
    Spectrum,
    /// The system from above.
    Orbits(PlanScale),
    /// The sky of a planet.
    Sky,
    /// The climate of a planet: by latitude, and its starlight against its thresholds.
    Climate,
    /// The inside of the star, layer by layer.
    Interior(LayerScale),
}

impl Plot {
    /// Every plot with its stable machine name.
    #[must_use]
    pub fn all() -> Vec<(&'static str, Self)> {
        let overview = [Curve::Luminosity, Curve::Temperature, Curve::PlanetTemperatures, Curve::Distance];
        let mut plots = vec![("curves", Self::Curves(overview.to_vec()))];
        plots.extend(Curve::ALL.into_iter().map(|curve| (curve.key(), Self::Curves(vec![curve]))));
        plots.extend([
            ("life_strip", Self::LifeStrip),
            ("hr_diagram", Self::HrDiagram),
            ("spectrum", Self::Spectrum),
            ("orbits", Self::Orbits(PlanScale::Linear)),
            ("orbits_log", Self::Orbits(PlanScale::Log)),
            ("sky", Self::Sky),
            ("climate", Self::Climate),
            ("interior", Self::Interior(LayerScale::Mass)),
            ("interior_radius", Self::Interior(LayerScale::Radius)),
            ("interior_radius_log", Self::Interior(LayerScale::RadiusLog)),
        ]);
        plots
    }

    /// Finds a plot by its machine name.
    #[must_use]
    pub fn from_key(key: &str) -> Option<Self> {
        Self::all().into_iter().find(|(name, _)| *name == key).map(|(_, plot)| plot)
    }

    /// The size that shows it well where none is asked for.
    #[must_use]
    pub fn usual_size(&self) -> Size {
        match self {
            Self::Curves(curves) if curves.len() > 2 => Size::usual([960, 840]),
            Self::Orbits(_) => Size::usual([800, 840]),
            Self::Climate | Self::Interior(_) => Size::usual([960, 840]),
            Self::HrDiagram => Size::usual([960, 800]),
            _ => Size::default(),
        }
    }

    /// Index of the planet it shows where none is chosen: for a climate the first with water, else the first with air;
    /// failing that, the first.
    #[must_use]
    pub fn usual_planet(&self, planets: &[PlanetSpecification]) -> usize {
        let fits = |planet: &PlanetSpecification| match self {
            Self::Climate => planet.water.is_some(),
            _ => planet.air != Air::None,
        };
        planets.iter().position(fits).unwrap_or(0)
    }

    /// Keys of the methods behind it; `star_life` stands for however the life of this star was computed.
    pub(super) fn methods(&self) -> Vec<&'static str> {
        match self {
            Self::Curves(curves) => curves.iter().flat_map(|curve| methods_of(*curve)).copied().collect(),
            Self::LifeStrip => vec!["star_life", "blackbody"],
            Self::HrDiagram => vec!["star_life", "effective_temperature", "blackbody"],
            Self::Spectrum => vec!["star_life", "effective_temperature", "spectrum"],
            Self::Orbits(_) => vec!["star_life", "orbit", "habitable_zone"],
            Self::Sky => vec!["star_life", "orbit", "clear_sky"],
            Self::Climate => {
                vec!["star_life", "orbit", "insolation", "climate", "carbon_dioxide", "moist_greenhouse", "steam"]
            }
            Self::Interior(_) => vec!["star_life", "degeneracy"],
        }
    }
}

fn methods_of(curve: Curve) -> &'static [&'static str] {
    match curve {
        Curve::Luminosity | Curve::Radius => &["star_life"],
        Curve::Temperature => &["star_life", "effective_temperature", "blackbody"],
        Curve::Mass => &["star_life", "star_winds"],
        Curve::PlanetTemperatures => &["star_life", "orbit", "surface_temperature"],
        Curve::Distance => &["star_life", "orbit", "habitable_zone"],
    }
}

/// What a figure is drawn of.
#[derive(Clone, Debug)]
pub struct Subject<'a> {
    /// The history.
    pub history: &'a History,
    /// The scenario's title.
    pub title: &'a str,
    /// The moment, yr.
    pub moment_yr: f64,
    /// Index of the planet whose sky or climate is drawn; the usual one of the plot if none is chosen.
    pub planet: Option<usize>,
    /// The scale of time.
    pub scale: TimeScale,
    /// The part of the time axis that is shown, as fractions of it.
    pub shown_fractions: [f64; 2],
    /// How the spectrum is looked at.
    pub spectrum_view: SpectrumView,
    /// How the sky is looked at.
    pub sky_view: SkyView,
}

impl<'a> Subject<'a> {
    /// A history at a moment, yr, looked at in the usual way.
    #[must_use]
    pub fn new(history: &'a History, title: &'a str, moment_yr: f64) -> Self {
        Self {
            history,
            title,
            moment_yr,
            planet: None,
            scale: TimeScale::Paced,
            shown_fractions: [0.0, 1.0],
            spectrum_view: SpectrumView::default(),
            sky_view: SkyView::default(),
        }
    }

    /// Index of the planet that a plot shows.
    pub(super) fn planet_of(&self, plot: &Plot) -> usize {
        self.planet.unwrap_or_else(|| plot.usual_planet(&self.history.system().planets))
    }

    pub(super) fn axis(&self) -> TimeAxis {
        TimeAxis::new(self.history, self.scale)
    }
}

/// Where and how a figure is drawn.
struct Sheet {
    canvas: Canvas,
    /// Width and height in units of the text.
    units: [f64; 2],
    look: Look,
}

/// A plot as an SVG document in publication style. `name` begins every name within it: give figures that stand in one
/// page different ones.
#[must_use]
pub fn figure_svg(subject: &Subject<'_>, plot: &Plot, size: Size, look: Look, name: &str) -> String {
    let size_px = size.sides_px();
    let [width, height] = size_px.map(f64::from);
    let usual = (width / USUAL_SIZE[0]).min(height / USUAL_SIZE[1]);
    let scale = usual.max(1.0).min(width / LEAST_ROOM[0]).min(height / LEAST_ROOM[1]);
    let mut sheet = Sheet { canvas: Canvas::new(name), units: [width / scale, height / scale], look };
    let words = match plot {
        Plot::Curves(curves) => sheet.charts(subject, plot, curves),
        Plot::LifeStrip => sheet.life(subject, plot),
        Plot::HrDiagram => sheet.hr_diagram(subject, plot),
        Plot::Spectrum => sheet.spectrum(subject, plot),
        Plot::Orbits(scale) => sheet.orbits(subject, plot, *scale),
        Plot::Sky => sheet.sky(subject, plot),
        Plot::Climate => sheet.climate(subject, plot),
        Plot::Interior(scale) => sheet.interior(subject, plot, *scale),
    };
    let description = format!("{}. {}", words.subtitle, words.caption);
    sheet.canvas.document(sheet.units, size_px, &words.title, &description)
}

impl Sheet {
    fn frame(&mut self, words: &Words, entries: &[legend::Entry]) -> super::canvas::Area {
        page::frame(&mut self.canvas, self.units, words, entries, self.look.palette())
    }

    fn charts(&mut self, subject: &Subject<'_>, plot: &Plot, curves: &[Curve]) -> Words {
        let axis = subject.axis();
        let [from_fraction, to_fraction] = subject.shown_fractions;
        let samples = Samples::new(subject.history, &axis, from_fraction, to_fraction, SAMPLES);
        let charts: Vec<Chart> = curves.iter().map(|curve| curve.chart(&samples)).collect();
        let time = TimeView { axis: &axis, from_fraction, to_fraction, moment_yr: subject.moment_yr };
        let words = subject.words_of_charts(plot, curves, &charts);
        let palette = self.look.palette();
        let area = self.frame(&words, &time_chart::entries(&charts, palette));
        time_chart::draw(&mut self.canvas, area, &charts, &time, palette);
        words
    }

    fn life(&mut self, subject: &Subject<'_>, plot: &Plot) -> Words {
        let axis = subject.axis();
        let [from_fraction, to_fraction] = subject.shown_fractions;
        let light = LightRange::of(&Samples::new(subject.history, &axis, 0.0, 1.0, COARSE_SAMPLES));
        let samples = Samples::new(subject.history, &axis, from_fraction, to_fraction, SAMPLES);
        let ribbon = Ribbon::new(&samples, light);
        let time = TimeView { axis: &axis, from_fraction, to_fraction, moment_yr: subject.moment_yr };
        let words = subject.words_of_life(plot);
        let entries = life_strip::entries(self.units[0], &ribbon, &time);
        let area = self.frame(&words, &entries);
        let ink = (self.look, self.look.palette());
        life_strip::draw(&mut self.canvas, area, (&ribbon, &entries), subject.history, &time, ink);
        words
    }

    fn hr_diagram(&mut self, subject: &Subject<'_>, plot: &Plot) -> Words {
        let moment = subject.history.moment(subject.moment_yr);
        let diagram = HrDiagram::new(subject.history);
        let words = subject.words_of_diagram(plot, &moment);
        let area = self.frame(&words, &hr_diagram::entries(&diagram));
        hr_diagram::draw(&mut self.canvas, area, &diagram, &moment, self.look.palette());
        words
    }

    fn spectrum(&mut self, subject: &Subject<'_>, plot: &Plot) -> Words {
        let moment = subject.history.moment(subject.moment_yr);
        let drawn = Spectrum::new(moment.star.effective_temperature_k, subject.spectrum_view);
        let words = subject.words_of_spectrum(plot, &drawn);
        let area = self.frame(&words, &spectrum::entries(&drawn));
        spectrum::draw(&mut self.canvas, area, &drawn, self.look.palette());
        words
    }

    fn orbits(&mut self, subject: &Subject<'_>, plot: &Plot, scale: PlanScale) -> Words {
        let moment = subject.history.moment(subject.moment_yr);
        let plan = OrbitPlan::new(&moment, scale, None);
        let palette = self.look.palette();
        let entries = orbits::entries(&plan, &moment, palette);
        // The star's size on paper is known only once there is a frame; the caption's length hardly depends on it.
        let room = self.frame_room(&subject.words_of_orbits(plot, scale, true), &entries);
        let is_enlarged = orbits::draw(&mut Canvas::new("trial"), room, &plan, &moment, palette);
        let words = subject.words_of_orbits(plot, scale, is_enlarged);
        let area = self.frame(&words, &entries);
        orbits::draw(&mut self.canvas, area, &plan, &moment, palette);
        words
    }

    /// The room that a frame leaves, without drawing it.
    fn frame_room(&self, words: &Words, entries: &[legend::Entry]) -> super::canvas::Area {
        page::frame(&mut Canvas::new("trial"), self.units, words, entries, self.look.palette())
    }

    fn sky(&mut self, subject: &Subject<'_>, plot: &Plot) -> Words {
        let planet = subject.planet_of(plot);
        let moment = subject.history.moment(subject.moment_yr);
        let light = light_on(subject.history, &moment, planet, subject.sky_view);
        let picture = light.as_ref().and_then(|light| SkyPicture::new(light, subject.sky_view));
        let words = subject.words_of_sky(plot, planet, picture.as_ref());
        let area = self.frame(&words, &[]);
        if let Some(picture) = &picture {
            sky::draw(&mut self.canvas, area, picture, self.look.palette());
        } else {
            let reason = why_no_sky(&moment, planet);
            page::say_instead(&mut self.canvas, area, &reason, self.look.palette());
        }
        words
    }

    fn interior(&mut self, subject: &Subject<'_>, plot: &Plot, scale: LayerScale) -> Words {
        let palette = self.look.palette();
        match subject.history.life().profile_at(subject.moment_yr) {
            Ok(profile) => {
                let picture = InteriorPicture::new(&profile, scale, &LayerFigure::ALL);
                let words = subject.words_of_interior(plot, Some(&picture));
                let area = self.frame(&words, &interior::entries(&picture));
                interior::draw(&mut self.canvas, area, &picture, palette);
                words
            }
            Err(why) => {
                let words = subject.words_of_interior(plot, None);
                let area = self.frame(&words, &[]);
                page::say_instead(&mut self.canvas, area, &format!("No layers to show: {why}."), palette);
                words
            }
        }
    }

    fn climate(&mut self, subject: &Subject<'_>, plot: &Plot) -> Words {
        let palette = self.look.palette();
        let planet = subject.planet_of(plot);
        let planets = &subject.history.system().planets;
        let known = planets.get(planet).zip(subject.history.climate_at(planet, subject.moment_yr));
        let Some((named, climate)) = known else {
            let words = subject.words_of_climate(plot, None);
            let area = self.frame(&words, &[]);
            page::say_instead(&mut self.canvas, area, "There is no planet with a climate.", palette);
            return words;
        };
        let axis = subject.axis();
        let [from_fraction, to_fraction] = subject.shown_fractions;
        let samples = Samples::new(subject.history, &axis, from_fraction, to_fraction, SAMPLES);
        let figure = ClimateFigure {
            planet,
            latitudes: match &climate.latitudes {
                Ok(belts) => Ok(LatitudeFigure::new(&named.name, &climate, belts)),
                Err(reason) => Err(format!("No climate by latitude. {}", reason.text())),
            },
            gauge: LightGauge::new(&named.name, &climate),
            chart: light_and_thresholds::chart(subject.history, &samples, planet),
        };
        let words = subject.words_of_climate(plot, Some((&named.name, &climate)));
        let area = self.frame(&words, &figure.entries(palette));
        let time = TimeView { axis: &axis, from_fraction, to_fraction, moment_yr: subject.moment_yr };
        figure.draw(&mut self.canvas, area, &time, palette);
        words
    }
}

/// The light on a planet at a moment, looked at as chosen; `None` without a star whose light is modelled.
pub(super) fn light_on(history: &History, moment: &Moment, planet: usize, view: SkyView) -> Option<PlanetLight> {
    let star = Starlight::of(&moment.star)?;
    let spectrum = VisibleSpectrum::of_blackbody(star.temperature_k).ok()?;
    let air = clear_air(history.system().planets.get(planet)?, view.altitude_deg, view.with_air);
    PlanetLight::of(&moment.star, &star, &spectrum, moment.planets.get(planet)?, air.as_ref())
}

/// Why a planet's sky shows no star, in one sentence.
fn why_no_sky(moment: &Moment, planet: usize) -> String {
    let Some(planet) = moment.planets.get(planet) else {
        return "There is no planet to stand on.".to_owned();
    };
    let name = &planet.name;
    match planet.state {
        PlanetState::Engulfed => format!("The star has swallowed {name}."),
        PlanetState::TornApart => format!("The star's tide has torn {name} apart."),
        PlanetState::Unbound => format!("{name} no longer orbits the star: no star stands in its sky."),
        PlanetState::Dark => format!("No light is modelled of what {name} orbits now."),
        _ => format!("No sky can be worked out for {name}: its gravity holds no air."),
    }
}
