//! The system from above: orbits, habitable zone, the star's disc to scale, and planets that are lost.

use super::canvas::{Anchor, Area, Canvas, Point, Stroke, lettering, stroke};
use super::fonts::width;
use super::ink::{Palette, dashes, hex};
use super::legend::{Entry, Sample};
use super::page::SMALL_SIZE;
use super::state_mark;
use crate::figure::OrbitPlan;
use crate::figure::chart::BandMeaning;
use crate::figure::orbit_plan::Orbit;
use crate::system::Moment;
use crate::units::number_text::number;

/// Smallest disc of the star that can be seen.
const SMALLEST_STAR: f64 = 1.5;
/// Half the size of a planet's mark.
const MARK: f64 = 8.0;

/// What marks and band stand for: every planet with its state, lost ones too.
pub(super) fn entries(plan: &OrbitPlan, moment: &Moment, palette: &Palette) -> Vec<Entry> {
    let planets = moment.planets.iter().enumerate().map(|(index, planet)| Entry {
        sample: Sample::State(index, planet.state),
        words: format!("{}: {}", planet.name, planet.state.name()),
    });
    let zone = plan.zone_au.map(|_| Entry {
        sample: Sample::Band(palette.band(BandMeaning::HabitableZone)),
        words: "habitable zone".to_owned(),
    });
    planets.chain(zone).collect()
}

/// Draws a plan into an area; returns whether the star had to be drawn larger than it is.
pub(super) fn draw(canvas: &mut Canvas, area: Area, plan: &OrbitPlan, moment: &Moment, palette: &Palette) -> bool {
    let place = Places { centre: area.centre(), reach: 0.5 * area.width().min(area.height()) - 6.0 };
    let mut is_enlarged = false;
    canvas.clipped(area, |canvas| {
        if let Some([inner_au, outer_au]) = plan.zone_au {
            let [inner, outer] = [inner_au, outer_au].map(|distance_au| place.length(plan.radius(distance_au)));
            canvas.ring(place.centre, inner, outer, palette.band(BandMeaning::HabitableZone));
        }
        rings(canvas, &place, plan, palette);
        for orbit in &plan.orbits {
            let path: Vec<Point> = orbit.path.iter().map(|(angle, radius)| place.at(*angle, *radius)).collect();
            let ink = palette.planet(orbit.planet);
            canvas.polyline(&path, Stroke { ink, width: 1.5, dashes: dashes(orbit.planet) });
        }
        is_enlarged = star(canvas, &place, plan, moment, palette);
        let mut taken = ring_labels(canvas, &place, plan, palette);
        taken.push(square(place.centre, MARK));
        taken.extend(plan.orbits.iter().map(|orbit| square(place.at(orbit.place.0, orbit.place.1), MARK)));
        for orbit in &plan.orbits {
            planet(canvas, &place, orbit, moment, palette);
        }
        for orbit in &plan.orbits {
            name(canvas, area, place.at(orbit.place.0, orbit.place.1), moment, orbit.planet, &mut taken, palette);
        }
    });
    is_enlarged
}

struct Places {
    centre: Point,
    reach: f64,
}

impl Places {
    fn length(&self, radius: f64) -> f64 {
        radius.min(1e3) * self.reach
    }

    fn at(&self, angle: f64, radius: f64) -> Point {
        let length = self.length(radius);
        [self.centre[0] + angle.cos() * length, self.centre[1] - angle.sin() * length]
    }
}

fn square([x, y]: Point, half: f64) -> Area {
    Area { left: x - half, top: y - half, right: x + half, bottom: y + half }
}

/// Rings at round distances.
fn rings(canvas: &mut Canvas, place: &Places, plan: &OrbitPlan, palette: &Palette) {
    for ring_au in plan.rings_au() {
        canvas.circle(place.centre, place.length(plan.radius(ring_au)), stroke(palette.hairline, 1.0));
    }
}

/// Distances of the rings, on plates over the orbits; returns where they stand.
fn ring_labels(canvas: &mut Canvas, place: &Places, plan: &OrbitPlan, palette: &Palette) -> Vec<Area> {
    let mut taken: Vec<Area> = Vec::new();
    for ring_au in plan.rings_au() {
        let [x, y] = place.at(-0.25 * std::f64::consts::PI, plan.radius(ring_au));
        let words = format!("{} au", number(ring_au, 1));
        let half = 0.5 * width(&words, 10.0, false) + 2.0;
        let label = Area { left: x - half, top: y - 7.0, right: x + half, bottom: y + 6.0 };
        if !taken.iter().any(|other| other.meets(label)) {
            canvas.veil(label, palette.ground, 0.85);
            canvas.text([x, y + 3.5], &words, lettering(palette.dim, 10.0, Anchor::Middle));
            taken.push(label);
        }
    }
    taken
}

fn star(canvas: &mut Canvas, place: &Places, plan: &OrbitPlan, moment: &Moment, palette: &Palette) -> bool {
    let radius = plan.star_radius_au.map_or(0.0, |radius_au| place.length(plan.radius(radius_au)));
    let glow = moment.star.swatch.as_ref().filter(|swatch| swatch.chromaticity.is_some());
    let fill = glow.map_or_else(|| "#080808".to_owned(), |swatch| hex(swatch.srgb));
    let is_enlarged = radius < SMALLEST_STAR;
    if is_enlarged {
        canvas.circle(place.centre, 6.5, stroke(palette.dim, 1.0));
    }
    canvas.disc(place.centre, radius.max(SMALLEST_STAR), &fill, Some(stroke(palette.casing, 1.0)));
    is_enlarged
}

fn planet(canvas: &mut Canvas, place: &Places, orbit: &Orbit, moment: &Moment, palette: &Palette) {
    let Some(planet) = moment.planets.get(orbit.planet) else { return };
    let at = place.at(orbit.place.0, orbit.place.1);
    canvas.disc(at, 8.5, palette.ground, None);
    state_mark::draw(canvas, at, planet.state, palette.planet(orbit.planet));
}

/// The planet's name beside its mark, on the first side where it covers nothing; the legend names it in any case.
fn name(
    canvas: &mut Canvas,
    area: Area,
    [x, y]: Point,
    moment: &Moment,
    index: usize,
    taken: &mut Vec<Area>,
    palette: &Palette,
) {
    let Some(planet) = moment.planets.get(index) else { return };
    let wide = width(&planet.name, SMALL_SIZE, false);
    let label = |left: f64, baseline: f64| Area {
        left: left - 2.0,
        top: baseline - 10.5,
        right: left + wide + 2.0,
        bottom: baseline + 3.0,
    };
    let sides =
        [(x + 11.0, y + 4.0), (x - 11.0 - wide, y + 4.0), (x - 0.5 * wide, y - 12.0), (x - 0.5 * wide, y + 20.0)];
    let is_free = |side: &Area| area.holds(*side) && !taken.iter().any(|other| other.meets(*side));
    let found = sides.into_iter().map(|(left, baseline)| (label(left, baseline), left, baseline));
    if let Some((side, left, baseline)) = found.into_iter().find(|(side, _, _)| is_free(side)) {
        canvas.veil(side, palette.ground, 0.8);
        canvas.text([left, baseline], &planet.name, lettering(palette.text, SMALL_SIZE, Anchor::Start));
        taken.push(side);
    }
}
