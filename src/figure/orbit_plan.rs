//! The system seen from above its plane: orbits, habitable zone and star to one scale.

use crate::system::{Moment, PlanetMoment, PlanetState};
use crate::units::constants::SOLAR_RADIUS_AU;

/// How distances from the star are laid out.
#[derive(Clone, Copy, Debug, Default, PartialEq, Eq, Hash)]
pub enum PlanScale {
    /// Twice as far is twice as far on the plan.
    #[default]
    Linear,
    /// Ten times as far is one step farther, so that near and far orbits are seen at once.
    Log,
}

impl PlanScale {
    /// Each scale.
    pub const ALL: [Self; 2] = [Self::Linear, Self::Log];

    /// Name for people.
    #[must_use]
    pub fn name(self) -> &'static str {
        match self {
            Self::Linear => "to scale",
            Self::Log => "logarithmic",
        }
    }
}

/// The place of every planet that is still on an orbit, and of those that are not.
#[derive(Clone, Debug, PartialEq)]
pub struct OrbitPlan {
    /// How distances are laid out.
    pub scale: PlanScale,
    /// Distance at the rim of the plan, au.
    pub rim_au: f64,
    /// Distance at the centre of a logarithmic plan, au.
    pub centre_au: f64,
    /// Radius of the star, au.
    pub star_radius_au: Option<f64>,
    /// Inner and outer limit of the habitable zone, au.
    pub zone_au: Option<[f64; 2]>,
    /// Orbits, in the order of the system.
    pub orbits: Vec<Orbit>,
    /// Planets without an orbit, in the order of the system: index and what became of them.
    pub lost: Vec<(usize, PlanetState)>,
}

/// An orbit on the plan: a curve of radii, 0 at the centre to 1 at the rim, over the angle from periastron.
#[derive(Clone, Debug, PartialEq)]
pub struct Orbit {
    /// Index of the planet in the system.
    pub planet: usize,
    /// Angle from periastron, radians, and radius on the plan, all the way round.
    pub path: Vec<(f64, f64)>,
    /// Angle and radius of the planet itself: at periastron at every full number of periods since time zero.
    pub place: (f64, f64),
    /// Closest and farthest distance, au.
    pub reach_au: [f64; 2],
}

/// Points on an orbit.
const POINTS: usize = 181;
/// Decades of distance on a logarithmic plan at most.
const MOST_DECADES: f64 = 5.0;
/// Room beyond the farthest orbit.
const BEYOND: f64 = 1.12;

impl OrbitPlan {
    /// The plan of a moment; `rim_au` sets how far it reaches, or the farthest orbit and the zone do.
    #[must_use]
    pub fn new(moment: &Moment, scale: PlanScale, rim_au: Option<f64>) -> Self {
        let star_radius_au = moment.star.radius_rsun.map(|radius_rsun| radius_rsun * SOLAR_RADIUS_AU);
        let zone_au = moment.star.habitable_zone_au;
        let on_orbit =
            || moment.planets.iter().enumerate().filter_map(|(index, planet)| Some((index, reach_au(planet)?)));
        let farthest_au = on_orbit().map(|(_, reach_au)| reach_au[1]).fold(0.0, f64::max);
        let natural_au = if farthest_au > 0.0 {
            farthest_au
        } else {
            zone_au.map_or(1.0, |zone_au| zone_au[1]).max(star_radius_au.unwrap_or(0.0))
        };
        let rim_au = rim_au.unwrap_or(natural_au * BEYOND).max(1e-6);
        let nearest_au = on_orbit().map(|(_, reach_au)| reach_au[0]).fold(rim_au, f64::min);
        let inner_au =
            star_radius_au.filter(|radius_au| *radius_au > 0.0).map_or(nearest_au, |radius| radius.min(nearest_au));
        let centre_au = (0.5 * inner_au).max(rim_au / 10.0_f64.powf(MOST_DECADES));
        let mut plan = Self { scale, rim_au, centre_au, star_radius_au, zone_au, orbits: Vec::new(), lost: Vec::new() };
        for (index, planet) in moment.planets.iter().enumerate() {
            match reach_au(planet) {
                Some(reach_au) => {
                    let orbit = plan.orbit(index, planet, reach_au, moment.time_yr);
                    plan.orbits.push(orbit);
                }
                None => plan.lost.push((index, planet.state)),
            }
        }
        plan
    }

    /// Place of a distance on the plan: 0 at the centre, 1 at the rim.
    #[must_use]
    pub fn radius(&self, distance_au: f64) -> f64 {
        match self.scale {
            PlanScale::Linear => distance_au / self.rim_au,
            PlanScale::Log => {
                let decades = (self.rim_au / self.centre_au).log10().max(1e-9);
                ((distance_au.max(1e-30) / self.centre_au).log10() / decades).max(0.0)
            }
        }
    }

    /// Round distances for rings, au.
    #[must_use]
    pub fn rings_au(&self) -> Vec<f64> {
        match self.scale {
            PlanScale::Linear => {
                let rough_au = self.rim_au / 4.0;
                let decade = 10.0_f64.powf(rough_au.log10().floor());
                let steps = [1.0, 2.0, 5.0, 10.0].map(|factor| factor * decade);
                let step_au = steps.into_iter().find(|step_au| *step_au >= rough_au).unwrap_or(rough_au);
                (1..=4).map(|count| f64::from(count) * step_au).filter(|ring_au| *ring_au <= self.rim_au).collect()
            }
            PlanScale::Log => {
                let (first, last) = (self.centre_au.log10().ceil() as i32, self.rim_au.log10().floor() as i32);
                (first..=last).map(|power| 10.0_f64.powi(power)).filter(|ring_au| *ring_au > self.centre_au).collect()
            }
        }
    }

    fn orbit(&self, index: usize, planet: &PlanetMoment, reach_au: [f64; 2], time_yr: f64) -> Orbit {
        let eccentricity = planet.eccentricity.unwrap_or(0.0);
        let axis_au = 0.5 * (reach_au[0] + reach_au[1]);
        let distance_au =
            |angle: f64| axis_au * (1.0 - eccentricity * eccentricity) / (1.0 + eccentricity * angle.cos());
        let path = (0..POINTS)
            .map(|point| std::f64::consts::TAU * point as f64 / (POINTS - 1) as f64)
            .map(|angle| (angle, self.radius(distance_au(angle))))
            .collect();
        let turns = planet.period_yr.filter(|period_yr| *period_yr > 0.0).map_or(0.0, |period_yr| time_yr / period_yr);
        // Where each starts is not known; parted by the golden angle no two stand behind each other at first.
        let start = 2.399_963 * index as f64;
        let angle = true_anomaly(std::f64::consts::TAU * turns.fract() + start, eccentricity);
        Orbit { planet: index, path, place: (angle, self.radius(distance_au(angle))), reach_au }
    }
}

/// Closest and farthest distance of a planet on an orbit, au.
fn reach_au(planet: &PlanetMoment) -> Option<[f64; 2]> {
    let (axis_au, eccentricity) = (planet.semi_major_axis_au?, planet.eccentricity?);
    planet.state.orbits().then_some([axis_au * (1.0 - eccentricity), axis_au * (1.0 + eccentricity)])
}

/// The angle from periastron at a mean anomaly, radians, by bisection of Kepler's equation M = E − e sin E.
fn true_anomaly(mean_anomaly: f64, eccentricity: f64) -> f64 {
    let mean = mean_anomaly.rem_euclid(std::f64::consts::TAU);
    let (mut low, mut high) = (0.0, std::f64::consts::TAU);
    for _ in 0..50 {
        let middle = 0.5 * (low + high);
        if middle - eccentricity * middle.sin() < mean { low = middle } else { high = middle }
    }
    let half = 0.5 * (low + high) * 0.5;
    2.0 * ((1.0 + eccentricity).sqrt() * half.sin()).atan2((1.0 - eccentricity).sqrt() * half.cos())
}

#[cfg(test)]
mod tests {
    use super::*;
    use crate::system::{History, PlanetSpecification, StarSpecification, System};

    fn plan(scale: PlanScale, age_yr: f64) -> OrbitPlan {
        let planet = |name: &str, semi_major_axis_au, eccentricity| PlanetSpecification {
            name: name.to_owned(),
            semi_major_axis_au,
            eccentricity,
            ..PlanetSpecification::default()
        };
        let planets = vec![planet("Near", 0.1, 0.0), planet("Far", 10.0, 0.5)];
        let history = History::compute(System { star: StarSpecification::default(), planets }).expect("computed");
        OrbitPlan::new(&history.moment(age_yr), scale, None)
    }

    #[test]
    fn kepler_s_equation_is_solved() {
        assert!((true_anomaly(1.0, 0.0) - 1.0).abs() < 1e-9);
        assert!(true_anomaly(0.0, 0.6).abs() < 1e-9);
        // Half a period after periastron a planet is at apastron, whatever the eccentricity.
        assert!((true_anomaly(std::f64::consts::PI, 0.6).abs() - std::f64::consts::PI).abs() < 1e-6);
        // E = π/2 at e = 0.5: M = π/2 − 0.5, tan(ν/2) = √3.
        let anomaly = true_anomaly(std::f64::consts::FRAC_PI_2 - 0.5, 0.5);
        assert!((anomaly - 2.0 * 3.0_f64.sqrt().atan()).abs() < 1e-9);
    }

    #[test]
    fn a_plan_to_scale_keeps_proportions_and_fits() {
        let plan = plan(PlanScale::Linear, 4.57e9);
        assert!((plan.radius(2.0) / plan.radius(1.0) - 2.0).abs() < 1e-12);
        for orbit in &plan.orbits {
            assert!(orbit.path.iter().all(|(_, radius)| (0.0..=1.0).contains(radius)));
        }
        assert!((plan.orbits[1].reach_au[1] - 15.0).abs() < 1e-9);
        assert!(plan.rings_au().iter().all(|ring_au| *ring_au <= plan.rim_au));
    }

    #[test]
    fn a_logarithmic_plan_parts_near_from_far() {
        let plan = plan(PlanScale::Log, 4.57e9);
        let near = plan.orbits[0].path[0].1;
        assert!(near > 0.2 && near < 0.7, "{near}");
        assert!(plan.rings_au().len() >= 2);
    }

    #[test]
    fn a_swallowed_planet_is_told_apart() {
        let plan = plan(PlanScale::Linear, 1.3e10);
        assert_eq!(plan.lost, [(0, PlanetState::Engulfed)]);
        assert_eq!(plan.orbits.len(), 1);
    }
}
