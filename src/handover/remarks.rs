//! What a reader must know about single figures of a moment: cautions, typical spread, and why a value is missing.

use super::figures::{planet_cells, planet_figures, star_cells, star_figures};
use crate::system::quantities::STAR;
use crate::system::specification::Body;
use crate::system::starlight::is_dwarf;
use crate::system::{Moment, MomentLight, PlanetLight, PlanetMoment, PlanetState, StarMoment, Starlight};

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
pub fn remarks(moment: &Moment, light: &MomentLight) -> Vec<Remark> {
    let mut remarks: Vec<Remark> = moment
        .notes
        .iter()
        .chain(&light.notes)
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
    let star = star_figures().zip(star_cells(&moment.star, light.star.as_ref())).filter(|(_, cell)| cell.is_missing());
    for (figure, _) in star {
        push_absent(&mut remarks, Body::Star, figure.key, || {
            why_no_star_figure(figure.key, &moment.star, light.star.as_ref())
        });
    }
    for (index, (planet, light)) in moment.planets.iter().zip(&light.planets).enumerate() {
        let light = light.as_ref();
        let missing = planet_figures().zip(planet_cells(planet, light)).filter(|(_, cell)| cell.is_missing());
        for (figure, _) in missing {
            push_absent(&mut remarks, Body::Planet(index), figure.key, || {
                why_no_planet_figure(figure.key, planet, light)
            });
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

fn why_no_star_figure(key: &str, star: &StarMoment, light: Option<&Starlight>) -> String {
    let phase = star.phase.name();
    if star.phase.is_dark() {
        return format!("no value: the phase is \"{phase}\", of which no light is modelled");
    }
    match key {
        "core_mass_msun" => "no value: the star has no core of spent hydrogen yet".to_owned(),
        "core_hydrogen_fraction" => format!("no value: none is computed in the phase \"{phase}\""),
        "mean_hydrogen_fraction"
        | "core_helium3_fraction"
        | "core_temperature_k"
        | "core_density_g_cm3"
        | "core_degeneracy_ratio"
        | "contraction_yr"
        | "mixed_mass_fraction" => "no value: the inside is computed of red dwarfs only".to_owned(),
        _ if key.starts_with("dwarf_") && !is_dwarf(star.phase) => {
            "no value: measured colours are known of main-sequence dwarfs only".to_owned()
        }
        _ if key.starts_with("dwarf_") => "no value: dwarfs were measured from 2850 to 41 500 K".to_owned(),
        _ if is_of_colour(key) && light.is_none_or(|light| light.colour.is_none()) => {
            "no value: there is no visible glow".to_owned()
        }
        "correlated_temperature_k" | "colour_duv" => {
            "no value: the colour is bluer than any blackbody it could be likened to".to_owned()
        }
        _ if key.ends_with("_mag") => "no value: the star is too cool for an estimate in V".to_owned(),
        "habitable_zone_inner_au" | "habitable_zone_outer_au" => "no value: the star gives no light".to_owned(),
        _ => format!("no value: none applies in the phase \"{phase}\""),
    }
}

/// Whether a key is about the colour of what glows.
fn is_of_colour(key: &str) -> bool {
    key.starts_with("colour_") || key.starts_with("linear_") || key == "correlated_temperature_k"
}

/// Figures that only the climate model gives.
const OF_THE_CLIMATE: [&str; 4] = ["ice_fraction", "ice_line_deg", "carbon_dioxide_bar", "water_oceans"];

fn why_no_planet_figure(key: &str, planet: &PlanetMoment, light: Option<&PlanetLight>) -> String {
    let is_of_the_climate = OF_THE_CLIMATE.contains(&key);
    match planet.state {
        PlanetState::Engulfed => "no value: the star has swallowed the planet",
        PlanetState::TornApart => "no value: the star's tide has torn the planet apart",
        PlanetState::Unbound => "no value: the planet no longer orbits the star",
        PlanetState::Dark => "no value: the light of its star is not modelled",
        _ if key == "surface_hotter_than_k" => "no bound: the surface temperature itself is known",
        _ if key == "surface_temperature_k" => "no value: only a bound is known, see surface_hotter_than_k",
        _ if key == "high_energy_w_m2" => "no value: the high-energy light of giants and remnants is not known",
        _ if is_of_the_climate && planet.water_oceans.is_none() => {
            "no value: no climate with surface water is followed at this moment"
        }
        PlanetState::Runaway | PlanetState::Dry if is_of_the_climate => "no value: there is no open water",
        _ if key == "ice_line_deg" => "no value: no single ice line on this planet",
        PlanetState::Frozen
        | PlanetState::Temperate
        | PlanetState::Moist
        | PlanetState::Runaway
        | PlanetState::Dry
        | PlanetState::TooHot => match light {
            Some(_) if key == "star_visual_mag" => "no value: the star is too cool for an estimate in V",
            Some(light) if light.sky.is_none() => "no value: the planet's gravity cannot hold air",
            Some(_) if key.starts_with("sky_") => "no value: the sky is black, for want of air or of light",
            Some(_) if key.starts_with("disc_") => "no value: no light of the star comes through the air",
            _ => "no value: the method does not apply to this planet at this moment",
        },
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
