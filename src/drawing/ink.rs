//! Colours of figures: light for print, dark for slides. The star's own colours are data and come with the data.

use crate::figure::chart::BandMeaning;

/// The ground a figure stands on.
#[derive(Clone, Copy, Debug, Default, PartialEq, Eq, Hash)]
pub enum Look {
    /// Dark ink on white.
    #[default]
    Light,
    /// Light ink on near-black.
    Dark,
}

impl Look {
    /// Each look.
    pub const ALL: [Self; 2] = [Self::Light, Self::Dark];

    /// Stable machine name.
    #[must_use]
    pub fn key(self) -> &'static str {
        match self {
            Self::Light => "light",
            Self::Dark => "dark",
        }
    }

    /// The colours of the look.
    pub(super) fn palette(self) -> &'static Palette {
        match self {
            Self::Light => &LIGHT,
            Self::Dark => &DARK,
        }
    }
}

/// Every colour of a figure that is not data.
#[derive(Debug)]
pub(super) struct Palette {
    /// Paper.
    pub ground: &'static str,
    /// Thin lines of the grid.
    pub hairline: &'static str,
    /// Axes, text, the star's curves.
    pub text: &'static str,
    /// Secondary text.
    pub dim: &'static str,
    /// The moment.
    pub accent: &'static str,
    /// Neutral mid grey on which true colours stand.
    pub bed: &'static str,
    /// Text on the bed.
    pub on_bed: &'static str,
    /// Casing of true-colour lines.
    pub casing: &'static str,
    /// Curves of planets, told apart by colour-blind readers (after Okabe & Ito 2008), each with its own dashes.
    pub planets: [&'static str; 7],
    water: &'static str,
    zone: &'static str,
    star_body: &'static str,
    spread: &'static str,
    undecided: &'static str,
}

impl Palette {
    /// The colour of a band.
    pub(super) fn band(&self, meaning: BandMeaning) -> &'static str {
        match meaning {
            BandMeaning::LiquidWater => self.water,
            BandMeaning::HabitableZone => self.zone,
            BandMeaning::StarBody => self.star_body,
            BandMeaning::Spread => self.spread,
            BandMeaning::Undecided => self.undecided,
        }
    }

    /// The colour of a planet.
    pub(super) fn planet(&self, index: usize) -> &'static str {
        self.planets[index % self.planets.len()]
    }
}

static LIGHT: Palette = Palette {
    ground: "#ffffff",
    hairline: "#e3e1dc",
    text: "#1c1d1f",
    dim: "#5a5d61",
    accent: "#00735f",
    bed: "#8a8c90",
    on_bed: "#101113",
    casing: "#6f7175",
    planets: ["#a86a00", "#0072b2", "#a8477f", "#7a7000", "#00704f", "#b84800", "#5a50b0"],
    water: "#dcebf3",
    zone: "#cfe8da",
    star_body: "#d8d6d1",
    spread: "#e4e2dd",
    undecided: "#bcbab5",
};

static DARK: Palette = Palette {
    ground: "#101113",
    hairline: "#2a2d32",
    text: "#e4e3df",
    dim: "#a0a4aa",
    accent: "#4fd1b8",
    bed: "#62656a",
    on_bed: "#ffffff",
    casing: "#4a4d52",
    planets: ["#e69f00", "#56b4e9", "#e68fbf", "#f0e442", "#3dbe93", "#f07f4a", "#a9b4ff"],
    water: "#17303a",
    zone: "#1b3a30",
    star_body: "#3a3c41",
    spread: "#30333a",
    undecided: "#4c4f55",
};

/// Dash patterns that tell planets apart without colour.
pub(super) fn dashes(index: usize) -> &'static str {
    const PATTERNS: [&str; 6] = ["", "7 3", "2 2.5", "12 4", "8 3 2 3", "4 2"];
    PATTERNS[index % PATTERNS.len()]
}

/// A colour of the data as text.
pub(super) fn hex([red, green, blue]: [u8; 3]) -> String {
    format!("#{red:02x}{green:02x}{blue:02x}")
}
