//! What a reader must know about single figures of a moment: cautions, typical spread, and why a value is missing.

use super::figures::{planet_cells, planet_figures, star_cells, star_figures};
use crate::system::quantities::STAR;
use crate::system::specification::Body;
use crate::system::{Moment, PlanetMoment, PlanetState, StarMoment};

/// Kind of a remark that says why there is no value.
pub(super) const ABSENT: &str = "absent";
/// Kind of a remark that says how far the method typically is from what it was made from.
pub(super) const SPREAD: &str = "spread";

/// A remark about one figure, ready to be handed over.
#[derive(Clone, Debug, PartialEq)]
pub struct Remark {
    /// The body it is about.
    pub body: Body,
    /// Key of the figure it is about, as the files write it.
    pub about: &'static str,
    /// Stable machine name of its kind: that of a [`crate::system::NoteKind`], `spread` or `absent`.
    pub kind: &'static str,
    /// The remark, one sentence.
    pub text: String,
}

/// Every remark about a moment: the system's own notes, then spreads, then what is missing without a note.
#[must_use]
pub fn remarks(moment: &Moment) -> Vec<Remark> {
    let mut remarks: Vec<Remark> = moment
        .notes
        .iter()
        .flat_map(|note| {
            keys_of(note.about).map(|about| Remark {
                body: note.body,
                about,
                kind: note.kind.key(),
                text: note.text.clone(),
            })
        })
        .collect();
    for quantity in STAR {
        if let (Some(_), Some(spread)) = ((quantity.value)(&moment.star), (quantity.spread)(&moment.star)) {
            let text = format!("typically within {}", percent(spread));
            remarks.push(Remark { body: Body::Star, about: quantity.key, kind: SPREAD, text });
        }
    }
    let star = star_figures().zip(star_cells(&moment.star)).filter(|(_, cell)| cell.is_missing());
    for (figure, _) in star {
        push_absent(&mut remarks, Body::Star, figure.key, || why_no_star_figure(figure.key, &moment.star));
    }
    for (index, planet) in moment.planets.iter().enumerate() {
        let missing = planet_figures().zip(planet_cells(planet)).filter(|(_, cell)| cell.is_missing());
        for (figure, _) in missing {
            push_absent(&mut remarks, Body::Planet(index), figure.key, || why_no_planet_figure(planet));
        }
    }
    remarks
}

/// A fraction as a percentage with the digits a spread deserves.
pub(super) fn percent(fraction: f64) -> String {
    let value = 100.0 * fraction;
    if value >= 1.95 { format!("{value:.0} %") } else { format!("{value:.1} %") }
}

fn push_absent(remarks: &mut Vec<Remark>, body: Body, about: &'static str, reason: impl Fn() -> String) {
    if !remarks.iter().any(|remark| remark.body == body && remark.about == about && remark.kind != SPREAD) {
        remarks.push(Remark { body, about, kind: ABSENT, text: reason() });
    }
}

/// The keys of the files for what a note is about: the zone has two limits, and the age is the moment's own time.
fn keys_of(about: &'static str) -> impl Iterator<Item = &'static str> {
    let renamed: &'static [&'static str] = match about {
        "habitable_zone_au" => &["habitable_zone_inner_au", "habitable_zone_outer_au"],
        "age_yr" => &["time_yr"],
        _ => &[],
    };
    renamed.iter().copied().chain(renamed.is_empty().then_some(about))
}

fn why_no_star_figure(key: &str, star: &StarMoment) -> String {
    let phase = star.phase.name();
    if star.phase.is_dark() {
        return format!("no value: the phase is \"{phase}\", of which no light is modelled");
    }
    match key {
        "core_mass_msun" => "no value: the star has no core of spent hydrogen yet".to_owned(),
        "core_hydrogen_fraction" => format!("no value: none is computed in the phase \"{phase}\""),
        "colour_x" | "colour_y" => "no value: there is no visible glow".to_owned(),
        "habitable_zone_inner_au" | "habitable_zone_outer_au" => "no value: the star gives no light".to_owned(),
        _ => format!("no value: none applies in the phase \"{phase}\""),
    }
}

fn why_no_planet_figure(planet: &PlanetMoment) -> String {
    match planet.state {
        PlanetState::Engulfed => "no value: the star has swallowed the planet",
        PlanetState::Unbound => "no value: the planet no longer orbits the star",
        PlanetState::Dark => "no value: the light of its star is not modelled",
        PlanetState::Frozen | PlanetState::Temperate | PlanetState::TooHot => {
            "no value: the method does not apply to this planet at this moment"
        }
    }
    .to_owned()
}

#[cfg(test)]
mod tests {
    use super::*;

    #[test]
    fn percentages_keep_one_digit_that_means_something() {
        assert_eq!(percent(0.05), "5 %");
        assert_eq!(percent(0.0279), "3 %");
        assert_eq!(percent(0.004), "0.4 %");
    }

    #[test]
    fn a_note_on_the_zone_is_about_both_limits() {
        let keys: Vec<_> = keys_of("habitable_zone_au").collect();
        assert_eq!(keys, ["habitable_zone_inner_au", "habitable_zone_outer_au"]);
        assert_eq!(keys_of("age_yr").collect::<Vec<_>>(), ["time_yr"]);
        assert_eq!(keys_of("luminosity_lsun").collect::<Vec<_>>(), ["luminosity_lsun"]);
    }
}
