//! The Hertzsprung-Russell diagram: luminosity over effective temperature, hot on the left.

use super::value_axis::{ValueAxis, ValueTick};
use crate::physics::light::blackbody_swatch;
use crate::physics::star::zero_age_line;
use crate::system::{History, TimeAxis, TimeScale};
use crate::units::constants::SOLAR_TEMPERATURE_K;
use crate::units::number_text::{number, superscript};

/// Places along the track: paced, so that every visible change gets its share.
const PLACES: usize = 900;
/// Decades of light below the brightest that the diagram reaches at most.
const MOST_DECADES: f64 = 11.0;
/// Name of the beginning of life on the track.
const BIRTH: &str = "arrival on the main sequence";

/// A point of the track.
#[derive(Clone, Copy, Debug, PartialEq)]
pub struct TrackPoint {
    /// Age, yr.
    pub age_yr: f64,
    /// Place from the left, 0 to 1, and from the bottom, 0 to 1.
    pub place: [f64; 2],
    /// True colour, sRGB.
    pub colour_srgb: [u8; 3],
}

/// Stars of one radius.
#[derive(Clone, Debug, PartialEq)]
pub struct RadiusLine {
    /// `10 R☉`.
    pub label: String,
    /// Places of both ends, clipped to the diagram; the label stands at the second.
    pub ends: [[f64; 2]; 2],
}

/// Something on the diagram with a name.
#[derive(Clone, Debug, PartialEq)]
pub struct Mark {
    /// Age, yr.
    pub age_yr: f64,
    /// Name for people.
    pub label: String,
    /// Place, as in [`TrackPoint`].
    pub place: [f64; 2],
}

/// The diagram of one history.
#[derive(Clone, Debug, PartialEq)]
pub struct HrDiagram {
    /// Effective temperature; its heights run to the left.
    temperature: ValueAxis,
    /// Luminosity.
    pub luminosity: ValueAxis,
    /// The track's unbroken stretches, oldest first.
    pub track: Vec<Vec<TrackPoint>>,
    /// Where phases begin.
    pub phases: Vec<Mark>,
    /// Lines of equal radius.
    pub radii: Vec<RadiusLine>,
    /// Stars of all masses at birth with the same composition: mass, solar masses, and place.
    pub main_sequence: Vec<(f64, [f64; 2])>,
    /// The Sun of today.
    pub sun: [f64; 2],
}

impl HrDiagram {
    /// The diagram of a whole life.
    #[must_use]
    pub fn new(history: &History) -> Self {
        let states = states(history);
        let lights = || states.iter().flatten().map(|state| state.luminosity_lsun);
        let temperatures = || states.iter().flatten().map(|state| state.temperature_k);
        // The Sun stays in view, so that two diagrams can be told apart.
        let luminosity = ValueAxis::log(lights().chain([0.3, 3.0]), MOST_DECADES);
        let temperature = ValueAxis::log(temperatures().chain([3500.0, 9000.0]), 4.0);
        let place = |temperature_k: f64, luminosity_lsun: f64| {
            Some([1.0 - temperature.height(temperature_k)?, luminosity.height(luminosity_lsun)?])
        };
        let points = states.iter().map(|state| {
            let state = state.as_ref()?;
            let place = place(state.temperature_k, state.luminosity_lsun)?;
            let colour_srgb = blackbody_swatch(state.temperature_k).srgb;
            Some(TrackPoint { age_yr: state.age_yr, place, colour_srgb })
        });
        let line = zero_age_line(history.system().star.metallicity_dex).unwrap_or_default();
        let main_sequence = line
            .iter()
            .filter_map(|star| Some((star.mass_msun, place(star.effective_temperature_k, star.luminosity_lsun)?)))
            .collect();
        let mut phases = Vec::new();
        for (index, span) in history.spans().iter().enumerate() {
            let star = history.star_at(span.from_yr);
            let label = if index == 0 { BIRTH } else { span.phase.name() };
            if !star.phase.is_dark()
                && let Some(place) = place(star.effective_temperature_k, star.luminosity_lsun)
            {
                phases.push(Mark { age_yr: span.from_yr, label: label.to_owned(), place });
            }
        }
        Self {
            track: super::chart::runs(points),
            phases,
            radii: radius_lines(&temperature, &luminosity),
            main_sequence,
            sun: place(SOLAR_TEMPERATURE_K, 1.0).unwrap_or([0.5, 0.5]),
            temperature,
            luminosity,
        }
    }

    /// Place of a star from the left and from the bottom, 0 to 1 inside the diagram.
    #[must_use]
    pub fn place(&self, temperature_k: f64, luminosity_lsun: f64) -> Option<[f64; 2]> {
        Some([1.0 - self.temperature.height(temperature_k)?, self.luminosity.height(luminosity_lsun)?])
    }

    /// The way of another star on this diagram, for comparison.
    #[must_use]
    pub fn path(&self, other: &History) -> Vec<Vec<[f64; 2]>> {
        super::chart::runs(states(other).iter().map(|state| {
            let state = state.as_ref()?;
            self.place(state.temperature_k, state.luminosity_lsun)
        }))
    }

    /// Temperature, K, luminosity and radius, in solar units, at a place.
    #[must_use]
    pub fn reading(&self, [left, bottom]: [f64; 2]) -> [f64; 3] {
        let (temperature_k, luminosity_lsun) = (self.temperature.value(1.0 - left), self.luminosity.value(bottom));
        [temperature_k, luminosity_lsun, luminosity_lsun.sqrt() * (SOLAR_TEMPERATURE_K / temperature_k).powi(2)]
    }

    /// Marks of the temperature axis: places from the left with labels.
    #[must_use]
    pub fn temperature_ticks(&self, count: usize) -> Vec<ValueTick> {
        let mirrored = |tick: ValueTick| ValueTick { height: 1.0 - tick.height, ..tick };
        self.temperature.ticks(count).into_iter().map(mirrored).collect()
    }

    /// The point of the track nearest to a place on a picture so wide and high; its distance in the unit of both.
    #[must_use]
    pub fn nearest(&self, [left, bottom]: [f64; 2], width: f64, height: f64) -> Option<(TrackPoint, f64)> {
        let distance = |point: &TrackPoint| ((point.place[0] - left) * width).hypot((point.place[1] - bottom) * height);
        let found = self.track.iter().flatten().map(|point| (*point, distance(point)));
        found.min_by(|first, second| first.1.total_cmp(&second.1))
    }
}

/// What the track needs of the star.
struct State {
    age_yr: f64,
    temperature_k: f64,
    luminosity_lsun: f64,
}

/// The star along its life; nothing where it does not shine.
fn states(history: &History) -> Vec<Option<State>> {
    let axis = TimeAxis::new(history, TimeScale::Paced);
    let mut ages: Vec<f64> = (0..=PLACES).map(|step| axis.age_at(step as f64 / PLACES as f64)).collect();
    ages.extend(history.spans().iter().skip(1).flat_map(|span| [span.from_yr.next_down(), span.from_yr]));
    ages.retain(|age_yr| (axis.from_yr()..=axis.to_yr()).contains(age_yr));
    ages.sort_by(f64::total_cmp);
    ages.into_iter()
        .map(|age_yr| {
            let star = history.star_at(age_yr);
            let shines = !star.phase.is_dark() && star.luminosity_lsun > 0.0 && star.effective_temperature_k > 0.0;
            shines.then_some(State {
                age_yr,
                temperature_k: star.effective_temperature_k,
                luminosity_lsun: star.luminosity_lsun,
            })
        })
        .collect()
}

/// `0.01`, `1000`, farther away `10⁻⁴`.
fn radius_text(exponent: i32) -> String {
    if (-3..=3).contains(&exponent) { number(10_f64.powi(exponent), 1) } else { format!("10{}", superscript(exponent)) }
}

/// Lines of equal radius, a factor of ten apart: L = R² (T/T☉)⁴ in solar units (Stefan-Boltzmann law).
fn radius_lines(temperature: &ValueAxis, luminosity: &ValueAxis) -> Vec<RadiusLine> {
    let line = |exponent: i32| {
        let radius_rsun = 10_f64.powi(exponent);
        let light_lsun = |temperature_k: f64| radius_rsun.powi(2) * (temperature_k / SOLAR_TEMPERATURE_K).powi(4);
        let temperature_k = |light_lsun: f64| SOLAR_TEMPERATURE_K * (light_lsun / radius_rsun.powi(2)).powf(0.25);
        // The part inside the frame: from its hot end to its cool end.
        let hot_k = temperature.highest.min(temperature_k(luminosity.highest));
        let cool_k = temperature.lowest.max(temperature_k(luminosity.lowest));
        let end = |at_k: f64| Some([1.0 - temperature.height(at_k)?, luminosity.height(light_lsun(at_k))?]);
        let is_long = hot_k > 1.08 * cool_k;
        is_long.then(|| {
            Some(RadiusLine { label: format!("{} R☉", radius_text(exponent)), ends: [end(hot_k)?, end(cool_k)?] })
        })?
    };
    (-6..=4).filter_map(line).collect()
}

#[cfg(test)]
mod tests {
    use super::*;
    use crate::system::{StarSpecification, System};

    fn diagram() -> HrDiagram {
        let system = System { star: StarSpecification::default(), planets: Vec::new() };
        HrDiagram::new(&History::compute(system).expect("computed"))
    }

    #[test]
    fn hot_is_left_and_bright_is_up() {
        let diagram = diagram();
        let [hot, cool] = [10_000.0, 4000.0].map(|at_k| diagram.place(at_k, 1.0).expect("placed")[0]);
        let [bright, faint] = [10.0, 0.1].map(|light| diagram.place(5000.0, light).expect("placed")[1]);
        assert!(hot < cool && bright > faint);
        let [temperature_k, light_lsun, radius_rsun] = diagram.reading(diagram.sun);
        assert!((temperature_k / SOLAR_TEMPERATURE_K - 1.0).abs() < 1e-9);
        assert!((light_lsun - 1.0).abs() < 1e-9 && (radius_rsun - 1.0).abs() < 1e-9);
        let ticks = diagram.temperature_ticks(6);
        assert!(ticks.len() >= 3 && ticks.windows(2).all(|pair| pair[0].height > pair[1].height), "{ticks:?}");
    }

    #[test]
    fn the_track_is_inside_and_can_be_found() {
        let diagram = diagram();
        let points: Vec<TrackPoint> = diagram.track.iter().flatten().copied().collect();
        assert!(points.len() > 500);
        assert!(points.iter().all(|point| (0.0..=1.0).contains(&point.place[0])));
        assert!(points.windows(2).all(|pair| pair[0].age_yr <= pair[1].age_yr));
        let (found, distance) = diagram.nearest(points[300].place, 800.0, 600.0).expect("found");
        assert!(distance < 1e-9 && (found.place == points[300].place));
    }

    #[test]
    fn equal_radii_run_inside_the_frame() {
        let diagram = diagram();
        assert!(diagram.radii.len() >= 3, "{:?}", diagram.radii);
        for line in &diagram.radii {
            for [left, bottom] in line.ends {
                assert!((-1e-9..=1.0 + 1e-9).contains(&left) && (-1e-9..=1.0 + 1e-9).contains(&bottom), "{line:?}");
            }
        }
    }
}
