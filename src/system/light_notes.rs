//! What a reader must know about single figures of light.

use super::air::Air;
use super::moment::Moment;
use super::notes::{Note, NoteKind};
use super::planet_light::PlanetLight;
use super::specification::{Body, PlanetSpecification};
use super::starlight::Starlight;
use crate::physics::light::{Caution, FULL_COLOUR_FROM_CD_M2};

/// Radius beyond which most known planets keep hydrogen around them, Earth radii.
///
/// # Source
/// The gap between 1.5 and 2 Earth radii: Fulton et al. (2017), Astronomical Journal 154, 109.
const HYDROGEN_FROM_REARTH: f64 = 2.0;

/// Remarks about the light of star and planets.
pub(super) fn of(
    planets: &[PlanetSpecification],
    moment: &Moment,
    star: Option<&Starlight>,
    lights: &[Option<PlanetLight>],
) -> Vec<Note> {
    let mut notes = star.map_or_else(Vec::new, |star| of_star(star, moment));
    for (index, (planet, light)) in planets.iter().zip(lights).enumerate() {
        if let Some(light) = light {
            of_planet(index, planet, light, &mut notes);
        }
    }
    notes
}

fn of_star(star: &Starlight, moment: &Moment) -> Vec<Note> {
    let mut notes = Vec::new();
    let mut note = |about, caution: Caution| {
        notes.push(Note { body: Body::Star, about, kind: kind_of(caution), text: caution.name().to_owned() });
    };
    // That a blackbody stands in for the spectrum is said once, with the method.
    let swatch_cautions = moment.star.swatch.as_ref().map(crate::physics::light::Swatch::cautions).unwrap_or_default();
    for caution in swatch_cautions.into_iter().filter(|caution| *caution != Caution::BlackbodyStandsIn) {
        note("colour_srgb_hex", caution);
    }
    if let Some(caution) = star.colour.as_ref().and_then(|colour| colour.correlated).and_then(|known| known.caution) {
        note("correlated_temperature_k", caution);
    }
    if let Some(magnitudes) = &star.magnitudes {
        for caution in &magnitudes.photometry.cautions {
            note("absolute_visual_mag", *caution);
        }
    }
    notes
}

fn of_planet(index: usize, planet: &PlanetSpecification, light: &PlanetLight, notes: &mut Vec<Note>) {
    let Some(sky) = &light.sky else { return };
    let mut note = |kind, text: String| {
        notes.push(Note { body: Body::Planet(index), about: "sky_luminance_cd_m2", kind, text });
    };
    let name = &planet.name;
    if planet.air != Air::None {
        note(
            NoteKind::HeldFixed,
            format!("{name}: its air is held fixed, clean and clear, without dust, cloud or ozone"),
        );
        if planet.radius_rearth > HYDROGEN_FROM_REARTH {
            let words = "most planets of this size are wrapped in hydrogen, of which no sky is modelled";
            note(NoteKind::Limited, format!("{name}: {words}"));
        }
    }
    if sky.cautions.contains(&Caution::ThickAir) {
        note(kind_of(Caution::ThickAir), format!("{name}: {}", Caution::ThickAir.name()));
    }
    let brightest_cd_m2 = sky.total_lx() / std::f64::consts::PI;
    if brightest_cd_m2 > 0.0 && brightest_cd_m2 < FULL_COLOUR_FROM_CD_M2 {
        note(NoteKind::Limited, format!("{name}: by so little light an eye sees hardly any colour"));
    }
}

/// What kind of remark a caution of light is.
fn kind_of(caution: Caution) -> NoteKind {
    match caution {
        Caution::OutsideRelation | Caution::LowStar => NoteKind::Extrapolated,
        Caution::OrderOfMagnitude => NoteKind::OrderOfMagnitude,
        Caution::BlackbodyStandsIn
        | Caution::MolecularAbsorption
        | Caution::OutsideSrgb
        | Caution::IllConditioned
        | Caution::CleanAirOnly
        | Caution::ThickAir => NoteKind::Limited,
    }
}
