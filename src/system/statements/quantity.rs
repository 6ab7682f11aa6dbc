//! What can be stated of a body: every figure of a moment, and figures of its whole life.

use crate::physics::star::Phase;
use crate::system::light_quantities::{PLANET_LIGHT, STAR_LIGHT};
use crate::system::quantities::{PLANET, STAR};
use crate::units::entry::EntryKind;

/// A figure of a moment, by the key it has in files.
pub type FigureKey = &'static str;

/// What is stated of a body.
#[derive(Clone, Debug, PartialEq, Eq, Hash)]
pub enum Quantity {
    /// A figure of a moment.
    Figure(FigureKey),
    /// The highest that a figure reaches.
    Highest(FigureKey),
    /// The lowest that a figure reaches.
    Lowest(FigureKey),
    /// When an event of the body takes place, by its name or key.
    Date(String),
    /// How long the star shines before it leaves a remnant.
    Lifetime,
    /// How long the star stays in a phase; the main sequence counts in all its kinds.
    Duration(Phase),
    /// How long the planet has open water, all its mild spells together.
    MildTime,
    /// The longest spell in which the planet has open water.
    LongestMildTime,
    /// How long the planet is inside the conservative habitable zone.
    HabitableZoneTime,
}

/// Colours that a star has beside the rows of its quantities: key, name, digits.
pub(super) const COLOURS: [(FigureKey, &str, usize); 2] =
    [("colour_x", "Colour, CIE 1931 x", 4), ("colour_y", "Colour, CIE 1931 y", 4)];

/// A row of the catalogue.
#[derive(Clone, Copy, Debug, PartialEq, Eq)]
pub(super) struct Figure {
    pub(super) key: FigureKey,
    pub(super) name: &'static str,
    pub(super) symbol: &'static str,
    pub(super) digits: usize,
    pub(super) method: &'static str,
}

/// Every figure of the star.
#[must_use]
pub fn figures_of_star() -> Vec<FigureKey> {
    star_figures().map(|figure| figure.key).collect()
}

/// Every figure of a planet.
#[must_use]
pub fn figures_of_planet() -> Vec<FigureKey> {
    planet_figures().map(|figure| figure.key).collect()
}

pub(super) fn star_figures() -> impl Iterator<Item = Figure> {
    let rows = STAR.iter().map(|row| Figure {
        key: row.key,
        name: row.name,
        symbol: row.symbol,
        digits: row.digits,
        method: row.method,
    });
    let colours =
        COLOURS.into_iter().map(|(key, name, digits)| Figure { key, name, symbol: "", digits, method: "blackbody" });
    let light = STAR_LIGHT.iter().map(|row| Figure {
        key: row.key,
        name: row.name,
        symbol: row.symbol,
        digits: row.digits,
        method: row.method,
    });
    rows.chain(colours).chain(light)
}

pub(super) fn planet_figures() -> impl Iterator<Item = Figure> {
    let rows = PLANET.iter().map(|row| Figure {
        key: row.key,
        name: row.name,
        symbol: row.symbol,
        digits: row.digits,
        method: row.method,
    });
    let light = PLANET_LIGHT.iter().map(|row| Figure {
        key: row.key,
        name: row.name,
        symbol: row.symbol,
        digits: row.digits,
        method: row.method,
    });
    rows.chain(light)
}

/// The row of a key of star or planet; no key belongs to both.
pub(super) fn figure(key: FigureKey) -> Option<Figure> {
    star_figures().chain(planet_figures()).find(|figure| figure.key == key)
}

impl Quantity {
    /// What the value is typed and kept as.
    #[must_use]
    pub fn entry(&self) -> EntryKind {
        match self {
            Self::Figure(key) | Self::Highest(key) | Self::Lowest(key) => entry_of(key),
            Self::Date(_)
            | Self::Lifetime
            | Self::Duration(_)
            | Self::MildTime
            | Self::LongestMildTime
            | Self::HabitableZoneTime => EntryKind::SpanYr,
        }
    }

    /// Whether it is a figure of one moment, so that it needs to be said of when.
    #[must_use]
    pub fn is_of_a_moment(&self) -> bool {
        matches!(self, Self::Figure(_))
    }

    /// The words by which it is typed: `surface temperature`, `highest radius`, `date of event 'largest radius'`.
    #[must_use]
    pub fn words(&self) -> String {
        match self {
            Self::Figure(key) => words_of(key),
            Self::Highest(key) => format!("highest {}", words_of(key)),
            Self::Lowest(key) => format!("lowest {}", words_of(key)),
            Self::Date(name) => format!("date of event {}", super::phrases::quoted(name)),
            Self::Lifetime => "lifetime".to_owned(),
            Self::Duration(phase) => format!("duration of {}", phase_words(*phase)),
            Self::MildTime => "mild time".to_owned(),
            Self::LongestMildTime => "longest mild time".to_owned(),
            Self::HabitableZoneTime => "habitable zone time".to_owned(),
        }
    }
}

/// A phase as it is typed: `core helium burning`.
#[must_use]
pub fn phase_words(phase: Phase) -> String {
    phase.key().replace('_', " ")
}

/// Ends of keys that are units, longer ones first.
const UNIT_ENDS: [&str; 24] = [
    "_umol_m2_s",
    "_msun_yr",
    "_cd_m2",
    "_g_cm3",
    "_lm_w",
    "_w_m2",
    "_lsun",
    "_rsun",
    "_msun",
    "_earth",
    "_oceans",
    "_de00",
    "_thz",
    "_deg",
    "_mag",
    "_bar",
    "_nm",
    "_au",
    "_yr",
    "_lm",
    "_lx",
    "_over_sun",
    "_s",
    "_k",
];

/// The words of a figure: its key without the unit.
#[must_use]
pub(super) fn words_of(key: &str) -> String {
    let stem = UNIT_ENDS.iter().find_map(|end| key.strip_suffix(end)).unwrap_or(key);
    let says_magnitude = if key.ends_with("_visual_mag") { " magnitude" } else { "" };
    format!("{}{says_magnitude}", stem.replace('_', " "))
}

/// Other words for a figure, beside its words and its name.
pub(super) fn other_words(key: &str) -> &'static [&'static str] {
    match key {
        "luminosity_lsun" => &["light", "brightness"],
        "effective_temperature_k" => &["temperature", "surface temperature"],
        "surface_temperature_k" => &["temperature", "mean surface temperature"],
        "core_temperature_k" => &["central temperature"],
        "mass_loss_msun_yr" => &["wind"],
        "insolation_earth" => &["starlight", "sunlight"],
        "semi_major_axis_au" => &["distance", "orbit"],
        "period_yr" => &["orbital period", "year"],
        "star_angular_diameter_deg" => &["angular diameter", "angular size"],
        "water_oceans" => &["oceans"],
        "ice_fraction" => &["ice cover", "ice"],
        "illuminance_lx" => &["illumination"],
        "absolute_visual_mag" => &["absolute magnitude"],
        "star_visual_mag" => &["magnitude of its star"],
        _ => &[],
    }
}

/// What a figure is typed and kept as, by the unit at the end of its key.
fn entry_of(key: &str) -> EntryKind {
    const KINDS: [(&str, EntryKind); 21] = [
        ("_umol_m2_s", EntryKind::PhotonFluxUmolM2S),
        ("_msun_yr", EntryKind::MassLossMsunYr),
        ("_cd_m2", EntryKind::LuminanceCdM2),
        ("_g_cm3", EntryKind::DensityGCm3),
        ("_lm_w", EntryKind::EfficacyLmW),
        ("_km_s", EntryKind::SpeedKmS),
        ("_m_s2", EntryKind::AccelerationMS2),
        ("_w_m2", EntryKind::IrradianceWM2),
        ("_lsun", EntryKind::LuminosityLsun),
        ("_rsun", EntryKind::RadiusRsun),
        ("_msun", EntryKind::MassMsun),
        ("_earth", EntryKind::InsolationEarth),
        ("_thz", EntryKind::FrequencyThz),
        ("_deg", EntryKind::AngleDeg),
        ("_mag", EntryKind::Magnitude),
        ("_bar", EntryKind::PressureBar),
        ("_nm", EntryKind::WavelengthNm),
        ("_au", EntryKind::DistanceAu),
        ("_yr", EntryKind::SpanYr),
        ("_lm", EntryKind::LuminousFluxLm),
        ("_lx", EntryKind::IlluminanceLx),
    ];
    if key.ends_with("_k") {
        return EntryKind::TemperatureK;
    }
    if key.ends_with("_oceans") {
        return EntryKind::WaterOceans;
    }
    KINDS.iter().find(|(end, _)| key.ends_with(end)).map_or(EntryKind::Plain, |(_, kind)| *kind)
}

#[cfg(test)]
mod tests {
    use super::*;

    #[test]
    fn every_figure_of_a_body_has_words_of_its_own() {
        for keys in [figures_of_star(), figures_of_planet()] {
            let mut words: Vec<String> = keys.iter().map(|key| words_of(key)).collect();
            let count = words.len();
            words.sort();
            words.dedup();
            assert_eq!(words.len(), count);
        }
        assert_eq!(words_of("surface_temperature_k"), "surface temperature");
        assert_eq!(words_of("par_photon_flux_umol_m2_s"), "par photon flux");
    }

    #[test]
    fn a_figure_with_a_unit_is_typed_with_one() {
        for figure in star_figures().chain(planet_figures()) {
            let is_plain = entry_of(figure.key) == EntryKind::Plain;
            let has_unit = !figure.symbol.is_empty() || figure.key.ends_with("_oceans");
            assert_ne!(is_plain, has_unit, "{}", figure.key);
        }
    }
}
