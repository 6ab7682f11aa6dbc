//! What a figure says about itself: title, moment, caption, and the credits line.

use super::page::Words;
use super::plot::{Plot, Subject};
use super::spectrum::wavelength_text;
use crate::figure::curves::Curve;
use crate::figure::orbit_plan::PlanScale;
use crate::figure::{Chart, InteriorPicture, Owner, SkyPicture, Spectrum};
use crate::physics::light::Viewing;
use crate::physics::star::WholeLife;
use crate::system::provenance::method;
use crate::system::{Air, Moment, PlanetClimate, TimeScale};
use crate::units::number_text::number;
use crate::units::time_words::short_span;

/// The usual caution beside a picture of a sky.
const LOOKING: &str =
    "Looking at a star is dangerous, even at a dim or low one: the picture says nothing about safety.";

impl Subject<'_> {
    pub(super) fn star_name(&self) -> &str {
        &self.history.system().star.name
    }

    /// Scenario and moment.
    fn subtitle(&self) -> String {
        format!("{} · {}", self.title, short_span(self.moment_yr))
    }

    fn words(&self, plot: &Plot, title: String, caption: String) -> Words {
        Words { title, subtitle: self.subtitle(), caption, credits: self.credits(plot) }
    }

    /// Charts over time.
    pub(super) fn words_of_charts(&self, plot: &Plot, curves: &[Curve], charts: &[Chart]) -> Words {
        let star = self.star_name();
        let title = match curves {
            [Curve::Luminosity] => format!("Luminosity of {star}"),
            [Curve::Radius] => format!("Radius of {star}"),
            [Curve::Temperature] => format!("Effective temperature of {star}"),
            [Curve::Mass] => format!("Mass of {star}"),
            [Curve::PlanetTemperatures] => format!("Surface temperatures of the planets of {star}"),
            [Curve::Distance] => format!("Distances from {star}"),
            _ => format!("The life of {star} and its planets"),
        };
        let fraction = self.axis().fraction_at(self.moment_yr);
        let readings: Vec<String> = charts
            .iter()
            .flat_map(|chart| chart.series.iter().map(move |series| (chart, series)))
            .filter_map(|(chart, series)| {
                let figure = number(chart.value_at(series, fraction)?, 3);
                Some(match series.owner {
                    Owner::Star => format!("{figure} {}", chart.symbol),
                    Owner::Planet(_) => format!("{} {figure} {}", series.name, chart.symbol),
                })
            })
            .collect();
        let at_moment = if readings.is_empty() {
            String::new()
        } else {
            format!("At {}: {}. ", short_span(self.moment_yr), readings.join(", "))
        };
        let colour = if curves.contains(&Curve::Temperature) {
            "The line of temperature has the star's own colour, on a neutral casing. "
        } else {
            ""
        };
        self.words(plot, title, format!("{at_moment}{colour}{}", scale_words(self.scale)))
    }

    /// The ribbon.
    pub(super) fn words_of_life(&self, plot: &Plot) -> Words {
        let star = self.history.star_at(self.moment_yr);
        let caption = format!(
            "The ribbon has the star's true colour, that of a blackbody on a screen with daylight white; its height follows the logarithm of the luminosity. At {}: {}. Triangles mark events. {}",
            short_span(self.moment_yr),
            star.phase.name(),
            scale_words(self.scale)
        );
        self.words(plot, format!("The life of {}", self.star_name()), caption)
    }

    /// The Hertzsprung-Russell diagram.
    pub(super) fn words_of_diagram(&self, plot: &Plot, moment: &Moment) -> Words {
        let star = &moment.star;
        let at_moment = match (star.effective_temperature_k, star.luminosity_lsun) {
            (Some(temperature_k), Some(luminosity_lsun)) => {
                format!("{} K, {} L☉", number(temperature_k, 4), number(luminosity_lsun, 3))
            }
            _ => "no light is modelled".to_owned(),
        };
        let caption = format!(
            "The star's whole life as luminosity over effective temperature, hot on the left, in the true colours of a blackbody; rings mark where phases begin. At {}: {}, {at_moment}.",
            short_span(self.moment_yr),
            star.phase.name()
        );
        self.words(plot, format!("{} on the Hertzsprung-Russell diagram", self.star_name()), caption)
    }

    /// The spectrum.
    pub(super) fn words_of_spectrum(&self, plot: &Plot, spectrum: &Spectrum) -> Words {
        let caption = if let Some(star) = &spectrum.star {
            format!(
                "The star as a blackbody of {} K, with its peak at {} and the visible band in its colours; dashed, a blackbody of the Sun's temperature. Above, the share of each band.",
                number(star.temperature_k, 4),
                wavelength_text(star.peak.wavelength_nm)
            )
        } else {
            let phase = self.history.star_at(self.moment_yr).phase.name();
            format!("The star is a {phase}, whose light is not modelled; dashed, a blackbody of the Sun's temperature.")
        };
        self.words(plot, format!("Spectrum of {}", self.star_name()), caption)
    }

    /// The plan of the orbits.
    pub(super) fn words_of_orbits(&self, plot: &Plot, scale: PlanScale, star_is_enlarged: bool) -> Words {
        let laid_out = match scale {
            PlanScale::Linear => "to scale",
            PlanScale::Log => "with ten times the distance as one step farther",
        };
        let star = if star_is_enlarged { " The star is drawn larger than it is, in a ring." } else { "" };
        let caption = format!(
            "Seen from above the plane of the orbits, {laid_out}.{star} Where on its orbit a planet stands is not known; it turns at its true pace."
        );
        self.words(plot, format!("Orbits about {}", self.star_name()), caption)
    }

    /// A sky.
    pub(super) fn words_of_sky(&self, plot: &Plot, planet: usize, picture: Option<&SkyPicture>) -> Words {
        let planets = &self.history.system().planets;
        let name = planets.get(planet).map_or("the planet", |planet| planet.name.as_str());
        let title = format!("The sky of {name}");
        let Some(picture) = picture else { return self.words(plot, title, LOOKING.to_owned()) };
        let air = planets.get(planet).map(|planet| planet.air).filter(|_| self.sky_view.with_air);
        let air = match air.and_then(|air: Air| Some((air.name(), air.surface_pressure_bar()?))) {
            Some((name, pressure_bar)) => format!("{name}, {} bar, clean and clear", number(pressure_bar, 3)),
            None => "no air".to_owned(),
        };
        let viewing = match self.sky_view.viewing {
            Viewing::Camera => "colours as emitted, on a screen with D65 white",
            Viewing::AdaptedEye => "colours as an eye sees them that is used to this star",
        };
        let seen = picture.vision.words().map_or_else(String::new, |words| format!(" {words}"));
        let caption = format!(
            "{LOOKING} The star stands {}° high and is {}° wide; {air}; {viewing}; exposed for the sunlit ground, the disc is far brighter than a screen can show.{seen}",
            number(picture.altitude_deg, 3),
            number(picture.star_diameter_deg, 3)
        );
        self.words(plot, title, caption)
    }

    /// A climate of the planet with a name.
    pub(super) fn words_of_climate(&self, plot: &Plot, climate: Option<(&str, &PlanetClimate)>) -> Words {
        let Some((name, climate)) = climate else {
            return self.words(plot, format!("Climates about {}", self.star_name()), String::new());
        };
        let caption =
            format!("At {}, {}. {}", short_span(self.moment_yr), climate.in_words(name), scale_words(self.scale));
        self.words(plot, format!("The climate of {name}"), caption)
    }

    /// The inside of the star, where it is known layer by layer.
    pub(super) fn words_of_interior(&self, plot: &Plot, picture: Option<&InteriorPicture>) -> Words {
        let star = self.history.star_at(self.moment_yr);
        let mut caption = format!("At {}: {}.", short_span(self.moment_yr), star.phase.name());
        if let Some(picture) = picture {
            caption = format!("{caption} {}.", picture.mixing_words());
        }
        self.words(plot, format!("The inside of {}", self.star_name()), caption)
    }

    /// Keys of the methods behind a plot of this subject.
    fn methods(&self, plot: &Plot) -> Vec<&'static str> {
        let has_water = || {
            let planet = self.history.system().planets.get(self.planet_of(plot));
            planet.is_some_and(|planet| planet.water.is_some())
        };
        match plot {
            Plot::Climate if !has_water() => vec!["star_life", "orbit", "insolation", "surface_temperature"],
            Plot::Interior(_) if self.history.life().profile_at(self.moment_yr).is_err() => vec!["star_life"],
            _ => plot.methods(),
        }
    }

    /// Program, version, scenario and the names of the methods behind a plot.
    fn credits(&self, plot: &Plot) -> String {
        let mut keys: Vec<&str> = Vec::new();
        let mut add = |key: &'static str| {
            if !keys.contains(&key) {
                keys.push(key);
            }
        };
        let star = &self.history.system().star;
        let life = if WholeLife::needs_structure(star.mass_msun) { "red_dwarf" } else { "star_life" };
        let ends_as_white_dwarf = self.history.spans().iter().any(|span| span.phase.is_white_dwarf());
        for part in self.methods(plot) {
            if part == "star_life" {
                add(life);
                if ends_as_white_dwarf && life == "star_life" {
                    add("white_dwarf");
                }
            } else {
                add(part);
            }
        }
        let names: Vec<&str> = keys.iter().filter_map(|key| method(key)).map(|method| method.name).collect();
        format!(
            "Longember {} · scenario \u{201c}{}\u{201d} · Methods: {}. Papers: longember sources",
            env!("CARGO_PKG_VERSION"),
            self.title,
            names.join("; ")
        )
    }
}

fn scale_words(scale: TimeScale) -> &'static str {
    match scale {
        TimeScale::Paced => "Time is paced: every visible change gets a similar width.",
        TimeScale::Log => "Time is logarithmic: equal ratios of age get equal widths.",
        TimeScale::Linear => "Time is linear.",
    }
}
