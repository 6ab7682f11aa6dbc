//! What a reader must know about single figures of a moment.

use super::moment::{PlanetMoment, PlanetState};
use super::specification::{Body, PlanetSpecification};
use crate::physics::planet::habitable_zone::{ZoneLimit, limit_flux};
use crate::physics::planet::tides::LockLevel;
use crate::physics::planet::{Caution, Greenhouse};
use crate::physics::star::{StarCaution, StarState, WholeLife};

/// A remark about one quantity of one body.
#[derive(Clone, Debug, PartialEq)]
pub struct Note {
    /// The body it is about.
    pub body: Body,
    /// Key of the quantity it is about, such as `surface_temperature_k`.
    pub about: &'static str,
    /// What kind of remark it is.
    pub kind: NoteKind,
    /// The remark, one sentence.
    pub text: String,
}

/// Kinds of remark.
#[derive(Clone, Copy, Debug, PartialEq, Eq, Hash)]
pub enum NoteKind {
    /// The method is asked outside the range it was made for.
    Extrapolated,
    /// Good to a factor of a few.
    OrderOfMagnitude,
    /// The user holds an input fixed that would change in nature.
    HeldFixed,
    /// No method is at hand, so no figure is shown.
    NotModelled,
    /// The figure carries a known spread or simplification.
    Limited,
}

impl NoteKind {
    /// Stable machine name.
    #[must_use]
    pub fn key(self) -> &'static str {
        match self {
            Self::Extrapolated => "extrapolated",
            Self::OrderOfMagnitude => "order_of_magnitude",
            Self::HeldFixed => "held_fixed",
            Self::NotModelled => "not_modelled",
            Self::Limited => "limited",
        }
    }

    /// The kind in words for people.
    #[must_use]
    pub fn name(self) -> &'static str {
        match self {
            Self::Extrapolated => "extrapolated",
            Self::OrderOfMagnitude => "order of magnitude",
            Self::HeldFixed => "held fixed by you",
            Self::NotModelled => "not modelled",
            Self::Limited => "limited",
        }
    }
}

/// Remarks about the star.
pub(super) fn of_star(life: &WholeLife, time_yr: f64, state: &StarState) -> Vec<Note> {
    let mut notes: Vec<Note> = life
        .cautions_at(time_yr)
        .into_iter()
        .map(|caution| Note {
            body: Body::Star,
            about: caution.about(),
            kind: kind_of(caution),
            text: caution.text().trim_end_matches('.').to_owned(),
        })
        .collect();
    if state.phase.is_dark() {
        notes.push(Note {
            body: Body::Star,
            about: "luminosity_lsun",
            kind: NoteKind::NotModelled,
            text: format!("the light of a {} is not modelled, so none is shown", state.phase.name()),
        });
    } else if state.luminosity_lsun > 0.0 && zone_is_extrapolated(state) {
        notes.push(Note {
            body: Body::Star,
            about: "habitable_zone_au",
            kind: NoteKind::Extrapolated,
            text: "the habitable zone was computed for stars of 2600 to 7200 K; the nearest of these limits is used"
                .to_owned(),
        });
    }
    notes
}

/// What kind of remark a caution of the star is.
fn kind_of(caution: StarCaution) -> NoteKind {
    match caution {
        StarCaution::HeavierThanModels
        | StarCaution::LighterThanModels
        | StarCaution::UncheckedLongLife
        | StarCaution::HotterThanModels
        | StarCaution::CoolingMassOutsideTables
        | StarCaution::CoolingOlderThanTables
        | StarCaution::LightRedDwarf
        | StarCaution::UnusualMetals
        | StarCaution::MetalPoorOpacity => NoteKind::Extrapolated,
        StarCaution::MassLossUncertain | StarCaution::SmallGiantWind => NoteKind::OrderOfMagnitude,
        StarCaution::OldSurface => NoteKind::HeldFixed,
        StarCaution::RemnantLightNotModelled => NoteKind::NotModelled,
        StarCaution::NearBlueIgnition
        | StarCaution::CoreHydrogenEstimated
        | StarCaution::PulsesAveraged
        | StarCaution::GiantRadiusUncertain
        | StarCaution::CoolingCoreDiffers
        | StarCaution::RemnantMassUncertain
        | StarCaution::ShellFlashes
        | StarCaution::EarlyCrystal
        | StarCaution::LifetimesDiffer
        | StarCaution::BlendedWithFits
        | StarCaution::GiantNotFollowed
        | StarCaution::QuickLook => NoteKind::Limited,
    }
}

/// Remarks about a planet.
pub(super) fn of_planet(
    index: usize,
    specification: &PlanetSpecification,
    moment: &PlanetMoment,
    star: &StarState,
) -> Vec<Note> {
    let body = Body::Planet(index);
    let mut notes = Vec::new();
    let mut note = |about, kind, text: String| notes.push(Note { body, about, kind, text });
    let name = &specification.name;
    if moment.state.orbits() && star.phase.is_dark() {
        note(
            "insolation_earth",
            NoteKind::NotModelled,
            format!("{name}: the light of its star is not modelled, so no temperature is shown"),
        );
    }
    if moment.state == PlanetState::Unbound {
        note(
            "surface_temperature_k",
            NoteKind::OrderOfMagnitude,
            format!("{name}: away from its star only inner heat like the Earth's and the cosmic background warm it"),
        );
    } else if moment.surface_caution == Some(Caution::HeldByUser) && specification.greenhouse != Greenhouse::None {
        note(
            "surface_temperature_k",
            NoteKind::HeldFixed,
            format!("{name}: the greenhouse effect is held fixed; it knows nothing of ice, lost air or boiling seas"),
        );
    }
    match moment.surface_caution {
        Some(Caution::Extrapolated) => note(
            "surface_temperature_k",
            NoteKind::Extrapolated,
            format!("{name}: its climate was computed for stars of 2600 to 7200 K; the nearest of these is used"),
        ),
        Some(Caution::OrderOfMagnitude) => note(
            "surface_temperature_k",
            NoteKind::OrderOfMagnitude,
            format!("{name}: it keeps one face to its star, so bands of latitude stand in for day and night"),
        ),
        _ => {}
    }
    if moment.surface_hotter_than_k.is_some() {
        note(
            "surface_temperature_k",
            NoteKind::NotModelled,
            format!("{name}: under steam only a bound of the surface temperature is known"),
        );
    }
    if moment.state == PlanetState::Frozen && moment.water_oceans.is_some() {
        note(
            "ice_fraction",
            NoteKind::Limited,
            format!("{name}: the starlight that thaws it is known to 20 %, since the albedo of its ice decides"),
        );
    }
    if moment.shoreline_ratio.is_some() {
        note(
            "shoreline_ratio",
            NoteKind::OrderOfMagnitude,
            format!("{name}: what high-energy light has done to its air and water is known to an order of magnitude"),
        );
    }
    if moment.lock.is_some_and(|lock| lock != LockLevel::Free) {
        note(
            "tidal_lock",
            NoteKind::OrderOfMagnitude,
            format!("{name}: how fast tides brake its turning is known to an order of magnitude"),
        );
    }
    match moment.orbit_caution {
        Some(Caution::Undecided) => note(
            "semi_major_axis_au",
            NoteKind::Limited,
            format!(
                "{name}: its fate is undecided, for forms of the tide disagree or the giant misses it by under 15 %"
            ),
        ),
        Some(Caution::NotApplicable) => note(
            "semi_major_axis_au",
            NoteKind::OrderOfMagnitude,
            format!("{name}: at times its star loses mass faster than it goes round, which the orbit does not follow"),
        ),
        _ => {}
    }
    notes
}

fn zone_is_extrapolated(state: &StarState) -> bool {
    limit_flux(ZoneLimit::RunawayGreenhouse, state.effective_temperature_k, 1.0).is_ok_and(|flux| flux.extrapolated)
}
