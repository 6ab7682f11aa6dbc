//! A whole sequence of frames: what is chosen once for all of them.

use super::raster::{Raster, Shape};
use super::scene::{self, FrameSubject};
use crate::drawing::{PictureProblem, Subject};
use crate::system::History;

/// Narrowest and widest frame, pixels.
pub const FRAME_SIZE_RANGE_PX: [u32; 2] = [256, 8192];
/// Air about the largest star of a sequence.
const AIR: f64 = 1.25;

/// What is chosen for a sequence.
#[derive(Clone, Debug, PartialEq)]
pub struct SequenceChoices {
    /// What is shown.
    pub subject: FrameSubject,
    /// Flat or dome.
    pub shape: Shape,
    /// Width of a frame, pixels.
    pub width_px: u32,
    /// Width of the field in which a star is shown, solar radii; what holds the largest star of the sequence if nothing
    /// is said.
    pub field_rsun: Option<f64>,
    /// Whether the frames hold linear light, as bright as it is, or what a screen can show.
    pub is_for_light: bool,
}

/// A sequence on a history.
#[derive(Clone, Debug)]
pub struct FrameSequence<'a> {
    history: &'a History,
    title: &'a str,
    choices: SequenceChoices,
    field_rsun: f64,
}

impl<'a> FrameSequence<'a> {
    /// A sequence whose frames show these moments, yr: all of the show, whatever part of it is drawn here.
    #[must_use]
    pub fn new(history: &'a History, title: &'a str, choices: SequenceChoices, moments_yr: &[f64]) -> Self {
        let largest = || {
            let radii = moments_yr.iter().map(|time_yr| history.star_at(*time_yr).radius_rsun);
            AIR * 2.0 * radii.fold(1e-6, f64::max)
        };
        let field_rsun = match (&choices.subject, choices.field_rsun) {
            (_, Some(field_rsun)) => field_rsun,
            (FrameSubject::Star, None) => largest() * if choices.shape == Shape::Flat { 16.0 / 9.0 } else { 1.0 },
            _ => 1.0,
        };
        Self { history, title, choices, field_rsun }
    }

    /// Width of the field in which a star is shown, solar radii.
    #[must_use]
    pub fn field_rsun(&self) -> f64 {
        self.field_rsun
    }

    /// Everything that a frame at a moment depends on, as a short text: frames of equal fingerprints are equal.
    #[must_use]
    pub fn fingerprint(&self, time_yr: f64) -> String {
        let system = self.history.system();
        let choices = &self.choices;
        let bits = (time_yr.to_bits(), self.field_rsun.to_bits());
        let text = format!("{}|{}|{system:?}|{choices:?}|{bits:?}", env!("CARGO_PKG_VERSION"), self.title);
        // Fowler, Noll and Vo's hash FNV-1a of 64 bits: short, and the same on every machine.
        let hash = text
            .bytes()
            .fold(0xcbf2_9ce4_8422_2325_u64, |hash, byte| (hash ^ u64::from(byte)).wrapping_mul(0x0000_0100_0000_01b3));
        format!("Longember {} {hash:016x}", env!("CARGO_PKG_VERSION"))
    }

    /// The frame of a moment, yr, and whether there is anything to see in it.
    ///
    /// # Errors
    /// [`PictureProblem`] when a plot can't be drawn.
    pub fn frame(&self, time_yr: f64) -> Result<(Raster, bool), PictureProblem> {
        let SequenceChoices { subject, shape, width_px, is_for_light, .. } = &self.choices;
        match subject {
            FrameSubject::Star => {
                let moment = self.history.moment(time_yr);
                let raster = scene::star(&moment, *shape, *width_px, self.field_rsun);
                Ok((raster, moment.star.swatch.is_some_and(|swatch| swatch.chromaticity.is_some())))
            }
            FrameSubject::Sky { planet, view } => {
                let moment = self.history.moment(time_yr);
                Ok(scene::sky(self.history, &moment, *planet, *view, (*shape, *width_px), *is_for_light))
            }
            FrameSubject::Figure { plot, planet } => {
                let subject = Subject { planet: *planet, ..Subject::new(self.history, self.title, time_yr) };
                scene::figure(&subject, plot, *shape, *width_px).map(|raster| (raster, true))
            }
        }
    }
}

#[cfg(test)]
mod tests {
    use super::*;
    use crate::drawing::Plot;
    use crate::figure::SkyView;
    use crate::system::{Air, PlanetSpecification, StarSpecification, System};

    fn history() -> History {
        let planets = vec![
            PlanetSpecification { air: Air::EarthLike { surface_pressure_bar: 1.0 }, ..PlanetSpecification::default() },
            PlanetSpecification { name: "Kell".to_owned(), semi_major_axis_au: 0.1, ..PlanetSpecification::default() },
        ];
        History::compute(System { star: StarSpecification::default(), planets }).expect("computed")
    }

    fn choices(subject: FrameSubject, shape: Shape) -> SequenceChoices {
        SequenceChoices { subject, shape, width_px: 320, field_rsun: None, is_for_light: false }
    }

    #[test]
    fn the_star_is_drawn_to_one_scale_in_its_colour() {
        let history = history();
        let moments = [4.57e9, history.events().iter().map(|event| event.time_yr).fold(0.0, f64::max)];
        for shape in Shape::ALL {
            let choices = SequenceChoices { field_rsun: Some(4.0), ..choices(FrameSubject::Star, shape) };
            let sequence = FrameSequence::new(&history, "A test", choices, &moments);
            let (raster, is_seen) = sequence.frame(4.57e9).expect("drawn");
            // A radius of 1 R☉ is a quarter of a field of 4 R☉: 80 of 320 pixels, an area of 20 100.
            let area: f64 = raster.pixels.iter().map(|pixel| f64::from(pixel[0])).sum();
            let radius_rsun = history.star_at(4.57e9).radius_rsun;
            let expected = std::f64::consts::PI * (80.0 * radius_rsun).powi(2);
            assert!(is_seen && (area / expected - 1.0).abs() < 0.01, "{area} and {expected}");
            let [width, height] = raster.sides_px;
            let middle = raster.pixels[(height / 2 * width + width / 2) as usize];
            assert!(middle[0] == 1.0 && middle[2] < 1.0 && middle[2] > 0.7, "{middle:?}");
        }
    }

    #[test]
    fn a_sky_is_blue_above_its_ground_and_its_sun_is_far_brighter_in_linear_light() {
        let history = history();
        let subject = FrameSubject::Sky { planet: 0, view: SkyView::default() };
        let of = |shape, is_for_light| {
            let choices = SequenceChoices { is_for_light, ..choices(subject.clone(), shape) };
            FrameSequence::new(&history, "A test", choices, &[4.57e9]).frame(4.57e9).expect("drawn")
        };
        let (flat, is_seen) = of(Shape::Flat, false);
        let brightest = |raster: &Raster| raster.pixels.iter().flatten().copied().fold(0.0, f32::max);
        let corner = flat.pixels[0];
        assert!(is_seen && corner[2] > corner[0] && brightest(&flat) <= 1.0, "{corner:?}");
        assert!(brightest(&of(Shape::Flat, true).0) > 100.0);
        let (dome, _) = of(Shape::Dome, false);
        assert_eq!((dome.pixels[0], dome.sides_px), ([0.0; 3], [320, 320]));
        let zenith = dome.pixels[160 * 320 + 160];
        assert!(zenith[2] > zenith[0] && zenith[2] > 0.01, "{zenith:?}");
        // The inner planet ends in the giant: nothing stands in its sky then.
        let swallowed = choices(FrameSubject::Sky { planet: 1, view: SkyView::default() }, Shape::Dome);
        let sequence = FrameSequence::new(&history, "A test", swallowed, &[]);
        let (gone, is_seen) = sequence.frame(1.3e10).expect("drawn");
        assert!(!is_seen && brightest(&gone) == 0.0);
    }

    #[test]
    fn a_figure_stands_in_front_in_a_dome() {
        let history = history();
        let sequence = |shape| {
            FrameSequence::new(
                &history,
                "A test",
                choices(FrameSubject::Figure { plot: Plot::LifeStrip, planet: None }, shape),
                &[],
            )
        };
        let (dome, _) = sequence(Shape::Dome).frame(4.57e9).expect("drawn");
        let lit = |rows: std::ops::Range<usize>| {
            dome.pixels[320 * rows.start..320 * rows.end].iter().filter(|pixel| pixel[0] > 0.05).count()
        };
        assert!(lit(160..320) > 1000 && lit(0..120) == 0, "{} {}", lit(160..320), lit(0..120));
        let (flat, _) = sequence(Shape::Flat).frame(4.57e9).expect("drawn");
        assert_eq!(flat.sides_px, [320, 180]);
    }

    #[test]
    fn fingerprints_tell_everything_apart_that_makes_another_picture() {
        let history = history();
        let print = |choices, title, time_yr| FrameSequence::new(&history, title, choices, &[]).fingerprint(time_yr);
        let usual = || choices(FrameSubject::Star, Shape::Flat);
        let first = print(usual(), "A", 1e9);
        assert_eq!(first, print(usual(), "A", 1e9));
        for other in [
            print(usual(), "B", 1e9),
            print(usual(), "A", 1e9 + 1.0),
            print(choices(FrameSubject::Star, Shape::Dome), "A", 1e9),
            print(SequenceChoices { is_for_light: true, ..usual() }, "A", 1e9),
        ] {
            assert_ne!(first, other);
        }
    }
}
