//! A planet's orbit through the whole life of its star, computed once and read back at any age.

use super::range::{OutOfRange, closed_eccentricity, within};
use super::star_point::{StarPoint, check_track};
use super::tides::Tides;
use super::{orbit, orbit_walk};

/// A planet's orbit at the first node of the star's track, and the body that runs on it.
#[derive(Clone, Copy, Debug, PartialEq)]
pub struct OrbitInput {
    /// Semi-major axis, au.
    pub semi_major_axis_au: f64,
    /// Eccentricity, dimensionless, 0 to 0.999.
    pub eccentricity: f64,
    /// Mass, Earth masses.
    pub mass_mearth: f64,
    /// Radius, Earth radii.
    pub radius_rearth: f64,
}

impl OrbitInput {
    /// Checks every field.
    ///
    /// # Errors
    /// [`OutOfRange`] naming the first field that cannot be used.
    pub fn check(&self) -> Result<(), OutOfRange> {
        within("semi_major_axis_au", self.semi_major_axis_au, 1e-5, 1e6, "1e-5 to 1e6 au")?;
        closed_eccentricity(self.eccentricity)?;
        within("mass_mearth", self.mass_mearth, 1e-6, 3e4, "1e-6 to 30 000 Earth masses")?;
        within("radius_rearth", self.radius_rearth, 0.01, 30.0, "0.01 to 30 Earth radii")?;
        Ok(())
    }
}

/// How an orbit ends.
#[derive(Clone, Copy, Debug, PartialEq, Eq, Hash)]
pub enum OrbitEnd {
    /// The planet enters the star: the periastron lies below the photosphere.
    Engulfed,
    /// The star's tide tears the planet apart outside the star: the periastron lies within the Roche limit.
    TornApart,
    /// Half the star's mass or more went at once, or nothing of the star is left: the planet drifts free.
    Unbound,
}

impl OrbitEnd {
    /// Stable machine name.
    #[must_use]
    pub fn key(self) -> &'static str {
        match self {
            Self::Engulfed => "engulfed",
            Self::TornApart => "torn_apart",
            Self::Unbound => "unbound",
        }
    }

    /// The end in words for people.
    #[must_use]
    pub fn name(self) -> &'static str {
        match self {
            Self::Engulfed => "engulfed by the star",
            Self::TornApart => "torn apart by the star's tide",
            Self::Unbound => "unbound, drifts free",
        }
    }
}

/// The orbit at one age.
#[derive(Clone, Copy, Debug, PartialEq)]
pub struct OrbitNode {
    /// Age of the star, yr.
    pub age_yr: f64,
    /// Semi-major axis, au.
    pub semi_major_axis_au: f64,
    /// Eccentricity, dimensionless.
    pub eccentricity: f64,
}

/// A planet's orbit along the star's track.
///
/// Slow mass loss widens it so that a M stays constant; a sudden loss changes it as
/// [`orbit::after_sudden_loss`] says; the star ends it when it reaches the periastron.
#[derive(Clone, Debug, PartialEq)]
pub struct OrbitHistory {
    pub(super) nodes: Vec<OrbitNode>,
    /// The orbit at each node of the track, up to the end of the orbit.
    pub(super) track_nodes: Vec<OrbitNode>,
    pub(super) end: Option<(f64, OrbitEnd)>,
    pub(super) closest_ratio: f64,
    pub(super) largest_adiabaticity_index: f64,
}

impl OrbitHistory {
    /// Walks the orbit along the star's nodes, without tides.
    ///
    /// # Source
    /// Adiabatic mass loss: Jeans's invariant (textbook form). Sudden loss: Blaauw 1961, at the distance r = a.
    /// Roche limit of a fluid body: factor 2.44 (textbook).
    /// # Valid for
    /// One planet of negligible mass beside its star; no kick to a remnant. Between nodes a varies exponentially
    /// with age.
    /// # Accuracy
    /// Exact while the mass loss is slow, see [`OrbitHistory::is_adiabatic`].
    /// # Errors
    /// [`OutOfRange`] for an orbit or track that cannot be used.
    pub fn walk(input: &OrbitInput, track: &[StarPoint]) -> Result<Self, OutOfRange> {
        Self::walk_with_tides(input, track, &Tides::off())
    }

    /// Walks the orbit along the star's nodes under mass loss and tides.
    ///
    /// The tide on a star that is no giant, the tide on the planet and the drag of a giant's envelope act as
    /// `tides` says; remnants raise a tide on the planet only.
    ///
    /// # Source
    /// As [`OrbitHistory::walk`], [`tides::equilibrium_tide`](super::tides::equilibrium_tide) and
    /// [`tides::giant_drag`](super::tides::giant_drag).
    /// # Accuracy
    /// The integration follows the equations to better than 1 %; the equations are good to an order of magnitude.
    /// # Errors
    /// [`OutOfRange`] for an orbit, track or tide that cannot be used.
    pub fn walk_with_tides(input: &OrbitInput, track: &[StarPoint], tides: &Tides) -> Result<Self, OutOfRange> {
        input.check()?;
        check_track(track)?;
        tides.check()?;
        Ok(orbit_walk::walk(input, track, tides))
    }

    /// The semi-major axis at an age, au; `None` outside the star's track and after the orbit's end.
    #[must_use]
    pub fn semi_major_axis_au_at(&self, age_yr: f64) -> Option<f64> {
        self.at(age_yr).map(|node| node.semi_major_axis_au)
    }

    /// The eccentricity at an age; `None` outside the star's track and after the orbit's end.
    #[must_use]
    pub fn eccentricity_at(&self, age_yr: f64) -> Option<f64> {
        self.at(age_yr).map(|node| node.eccentricity)
    }

    /// The orbit at an age; `None` outside the star's track and after the orbit's end.
    ///
    /// Where two nodes share an age (a sudden change) the later one holds.
    #[must_use]
    pub fn at(&self, age_yr: f64) -> Option<OrbitNode> {
        let after = self.nodes.partition_point(|node| node.age_yr <= age_yr);
        let before = self.nodes.get(after.checked_sub(1)?)?;
        if self.end.is_some_and(|(end_yr, _)| age_yr >= end_yr) {
            return None;
        }
        let Some(next) = self.nodes.get(after) else {
            return (age_yr <= before.age_yr).then_some(*before);
        };
        let share = (age_yr - before.age_yr) / (next.age_yr - before.age_yr);
        Some(OrbitNode {
            age_yr,
            semi_major_axis_au: before.semi_major_axis_au
                * (next.semi_major_axis_au / before.semi_major_axis_au).powf(share),
            eccentricity: before.eccentricity + share * (next.eccentricity - before.eccentricity),
        })
    }

    /// When and how the orbit ends, if it does within the track.
    #[must_use]
    pub fn end(&self) -> Option<(f64, OrbitEnd)> {
        self.end
    }

    /// The nodes of the orbit, in order of age.
    #[must_use]
    pub fn nodes(&self) -> &[OrbitNode] {
        &self.nodes
    }

    /// The orbit at each node of the star's track, as far as it lasts: one entry for each of the first nodes.
    pub(crate) fn track_nodes(&self) -> &[OrbitNode] {
        &self.track_nodes
    }

    /// The smallest ratio of periastron to the star's reach along the track, dimensionless. The star reaches to its
    /// photosphere or to the planet's Roche limit, whichever is farther out.
    ///
    /// Within about 15 % of 1 nobody can say whether the planet survives: giant radii are not known better.
    #[must_use]
    pub fn closest_ratio(&self) -> f64 {
        self.closest_ratio
    }

    /// Whether all slow mass loss was slow against the period, so that a M = const holds.
    #[must_use]
    pub fn is_adiabatic(&self) -> bool {
        self.largest_adiabaticity_index < orbit::ADIABATIC_INDEX_LIMIT
    }
}

#[cfg(test)]
mod tests {
    use super::*;

    const EARTH: OrbitInput =
        OrbitInput { semi_major_axis_au: 1.0, eccentricity: 0.0, mass_mearth: 1.0, radius_rearth: 1.0 };

    fn star(age_yr: f64, mass_msun: f64, radius_rsun: f64) -> StarPoint {
        StarPoint {
            age_yr,
            mass_msun,
            luminosity_lsun: 1.0,
            radius_rsun,
            effective_temperature_k: 5772.0,
            envelope_mass_msun: 0.0,
            is_giant: false,
            is_remnant: false,
            lost_mass_suddenly: false,
        }
    }

    #[test]
    fn slow_loss_widens_and_the_last_node_can_be_read() {
        let history = OrbitHistory::walk(&EARTH, &[star(0.0, 1.0, 1.0), star(1e9, 0.5, 0.01)]).expect("in range");
        assert!((history.semi_major_axis_au_at(1e9).expect("bound") - 2.0).abs() < 1e-12);
        assert!((history.semi_major_axis_au_at(5e8).expect("bound") - 2.0_f64.sqrt()).abs() < 1e-12);
        assert_eq!(history.semi_major_axis_au_at(1.1e9), None);
        assert_eq!(history.semi_major_axis_au_at(-1.0), None);
        assert!(history.is_adiabatic());
    }

    #[test]
    fn a_supernova_unbinds_and_a_small_one_does_not() {
        let mut after = star(1e7, 1.5, 1e-5);
        after.lost_mass_suddenly = true;
        let gone = OrbitHistory::walk(&EARTH, &[star(0.0, 10.0, 5.0), star(1e7, 8.0, 100.0), after]).expect("in range");
        assert_eq!(gone.end(), Some((1e7, OrbitEnd::Unbound)));
        after.mass_msun = 6.0;
        let kept = OrbitHistory::walk(&EARTH, &[star(0.0, 8.0, 5.0), star(1e7, 8.0, 100.0), after]).expect("in range");
        assert_eq!(kept.end(), None);
        assert!((kept.eccentricity_at(1e7).expect("bound") - 1.0 / 3.0).abs() < 1e-12);
    }

    #[test]
    fn a_swelling_star_takes_the_planet_when_it_arrives() {
        let history = OrbitHistory::walk(&EARTH, &[star(0.0, 1.0, 2.0), star(100.0, 1.0, 23_118.0)]).expect("in range");
        // One au is 107.5 times the first radius and 1/107.5 times the last: half-way in the logarithm.
        let (age_yr, end) = history.end().expect("engulfed");
        assert_eq!(end, OrbitEnd::Engulfed);
        assert!((age_yr - 50.0).abs() < 0.1, "{age_yr}");
        assert!(history.at(age_yr).is_none() && history.at(age_yr - 1.0).is_some());
    }

    #[test]
    fn an_orbit_within_the_roche_limit_never_starts() {
        let close = OrbitInput { semi_major_axis_au: 0.006, ..EARTH };
        let history = OrbitHistory::walk(&close, &[star(0.0, 1.0, 1.0), star(1e9, 1.0, 1.0)]).expect("in range");
        assert_eq!(history.end(), Some((0.0, OrbitEnd::TornApart)));
    }

    #[test]
    fn a_star_that_vanishes_lets_go() {
        let history = OrbitHistory::walk(&EARTH, &[star(0.0, 150.0, 10.0), star(3e6, 0.0, 0.0)]).expect("in range");
        assert_eq!(history.end(), Some((3e6, OrbitEnd::Unbound)));
    }
}
