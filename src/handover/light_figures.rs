//! The figures of light as keyed values, in the one order that every file uses.

use super::cell::Cell;
use super::figures::{Figure, number, word};
use crate::physics::light::{SeenLight, Tristimulus, Viewing, hex, seen};
use crate::system::light_quantities::{PLANET_LIGHT, STAR_LIGHT};
use crate::system::{PlanetLight, Starlight};
use std::borrow::Cow;

/// What the star's light has besides its quantities.
const STAR_WORDS: [Figure; 3] = [
    word("colour_display_p3_hex", "Colour on a Display P3 screen"),
    word("dwarf_srgb_hex", "Colour of measured dwarfs on an sRGB display"),
    word("dwarf_spectral_type", "Nearest measured dwarf"),
];
/// What a planet's light has besides its quantities; all of it for the star 30° above the horizon.
const PLANET_WORDS: [Figure; 6] = [
    word("sky_srgb_hex", "Sky as emitted, on an sRGB display with D65 white, star at 30°"),
    word("sky_colour", "Sky as emitted, in words, star at 30°"),
    word("sky_adapted_srgb_hex", "Sky to an eye adapted to the star, on an sRGB display, star at 30°"),
    word("sky_adapted_colour", "Sky to an eye adapted to the star, in words, star at 30°"),
    word("disc_srgb_hex", "Disc through the air as emitted, on an sRGB display, star at 30°"),
    word("disc_colour", "Disc through the air as emitted, in words, star at 30°"),
];

/// Figures of the star's light.
pub(super) fn star_light_figures() -> impl Iterator<Item = Figure> {
    STAR_LIGHT.iter().map(|quantity| number(quantity.key, quantity.name)).chain(STAR_WORDS)
}

/// Values of the star's light, in the order of [`star_light_figures`].
pub(super) fn star_light_cells(light: Option<&Starlight>) -> impl Iterator<Item = Cell> {
    let dwarf = light.and_then(|light| light.dwarf);
    let words = [
        text(light.and_then(|light| light.colour.as_ref()).map(|colour| hex(colour.wide.display_p3))),
        text(dwarf.map(|dwarf| dwarf.screen.hex())),
        Cell::word(dwarf.map(|dwarf| dwarf.nearest_type)),
    ];
    STAR_LIGHT.iter().map(move |quantity| Cell::number(light.and_then(quantity.value))).chain(words)
}

/// Figures of the light on a planet.
pub(super) fn planet_light_figures() -> impl Iterator<Item = Figure> {
    PLANET_LIGHT.iter().map(|quantity| number(quantity.key, quantity.name)).chain(PLANET_WORDS)
}

/// Values of the light on a planet, in the order of [`planet_light_figures`].
pub(super) fn planet_light_cells(light: Option<&PlanetLight>) -> impl Iterator<Item = Cell> {
    let shown = |seen: Option<SeenLight>| {
        [text(seen.map(|seen| seen.screen.hex())), text(seen.map(|seen| seen.name.to_string()))]
    };
    let [emitted, adapted] = Viewing::ALL.map(|viewing| shown(light.and_then(|light| sky_seen(light, viewing))));
    let disc = light.and_then(|light| light.sky.as_ref()).and_then(|sky| seen_as_emitted(sky.disc));
    let words = [emitted, adapted, shown(disc)].into_iter().flatten();
    PLANET_LIGHT.iter().map(move |quantity| Cell::number(light.and_then(quantity.value))).chain(words)
}

/// How a planet's sky looks; `None` where it is black.
pub(super) fn sky_seen(light: &PlanetLight, viewing: Viewing) -> Option<SeenLight> {
    let sky = light.sky.as_ref()?;
    seen(sky.dome, sky.star_above_air, viewing)
}

fn seen_as_emitted(light: Tristimulus) -> Option<SeenLight> {
    seen(light, light, Viewing::Camera)
}

fn text(text: Option<String>) -> Cell {
    text.map_or(Cell::Missing, |text| Cell::Text(Cow::Owned(text)))
}
