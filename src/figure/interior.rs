//! The inside of the star against mass or radius: what one looks at, and where the gas rises and sinks.

use super::value_axis::ValueAxis;
use crate::physics::star::convective::{Layer, Profile};

/// Decades below the largest value that are shown of quantities with many: the thin surface would flatten the rest.
const MOST_DECADES: f64 = 12.0;
/// Smallest radius on a logarithmic axis, as a share of the star's.
const LEAST_RADIUS: f64 = 1e-3;

/// What the layers are laid out against.
#[derive(Clone, Copy, Debug, Default, PartialEq, Eq, Hash)]
pub enum LayerScale {
    /// Mass inside the layer.
    #[default]
    Mass,
    /// Distance from the centre.
    Radius,
    /// Distance from the centre, equal ratios equally wide: shows the small core of a giant.
    RadiusLog,
}

impl LayerScale {
    /// All, in the order they are offered.
    pub const ALL: [Self; 3] = [Self::Mass, Self::Radius, Self::RadiusLog];

    /// Name for people.
    #[must_use]
    pub fn name(self) -> &'static str {
        match self {
            Self::Mass => "mass",
            Self::Radius => "radius",
            Self::RadiusLog => "radius, logarithmic",
        }
    }

    /// What the axis says.
    #[must_use]
    pub fn title(self) -> &'static str {
        match self {
            Self::Mass => "share of the star's mass inside",
            Self::Radius | Self::RadiusLog => "distance from the centre, share of the star's radius",
        }
    }

    /// The axis from centre to surface.
    #[must_use]
    pub fn axis(self) -> ValueAxis {
        match self {
            Self::Mass | Self::Radius => ValueAxis { is_log: false, lowest: 0.0, highest: 1.0 },
            Self::RadiusLog => ValueAxis { is_log: true, lowest: LEAST_RADIUS, highest: 1.0 },
        }
    }

    fn place(self, layer: &Layer) -> f64 {
        let value = match self {
            Self::Mass => layer.mass_fraction(),
            Self::Radius => layer.radius_fraction,
            Self::RadiusLog => layer.radius_fraction.max(LEAST_RADIUS),
        };
        self.axis().height(value).unwrap_or(0.0).clamp(0.0, 1.0)
    }
}

/// Name of a line and how it is read of a layer.
type Reader = (&'static str, fn(&Layer) -> f64);

/// What is shown of the layers.
#[derive(Clone, Copy, Debug, Default, PartialEq, Eq, Hash)]
pub enum LayerFigure {
    /// Temperature.
    #[default]
    Temperature,
    /// Density.
    Density,
    /// Pressure.
    Pressure,
    /// Hydrogen, ³He and ⁴He by mass.
    Composition,
    /// Share of the star's light that flows out through the layer.
    Luminosity,
    /// Fermi energy of the electrons over kT.
    Degeneracy,
}

impl LayerFigure {
    /// All, in reading order.
    pub const ALL: [Self; 6] =
        [Self::Temperature, Self::Density, Self::Pressure, Self::Composition, Self::Luminosity, Self::Degeneracy];

    /// Short name for people.
    #[must_use]
    pub fn name(self) -> &'static str {
        match self {
            Self::Temperature => "Temperature",
            Self::Density => "Density",
            Self::Pressure => "Pressure",
            Self::Composition => "Composition",
            Self::Luminosity => "Light",
            Self::Degeneracy => "Degeneracy",
        }
    }

    /// Title of its panel, with the unit.
    #[must_use]
    pub fn title(self) -> &'static str {
        match self {
            Self::Temperature => "Temperature, K",
            Self::Density => "Density, g/cm³",
            Self::Pressure => "Pressure, bar",
            Self::Composition => "Composition, share by mass",
            Self::Luminosity => "Light that flows out, share of the star's",
            Self::Degeneracy => "Degeneracy, Fermi energy over kT",
        }
    }

    fn lines(self) -> &'static [Reader] {
        match self {
            Self::Temperature => &[("temperature", |layer| layer.temperature_k)],
            Self::Density => &[("density", |layer| layer.density_g_cm3)],
            Self::Pressure => &[("pressure", |layer| layer.pressure_bar)],
            Self::Composition => &[
                ("hydrogen", |layer| layer.hydrogen_fraction),
                ("helium", |layer| layer.helium4_fraction),
                ("helium-3, ten times", |layer| 10.0 * layer.helium3_fraction),
            ],
            Self::Luminosity => &[("light", |layer| layer.luminosity_fraction)],
            Self::Degeneracy => &[("degeneracy", |layer| layer.degeneracy_ratio)],
        }
    }

    fn axis(self, profile: &Profile) -> ValueAxis {
        let values = || self.lines().iter().flat_map(|(_, value)| profile.layers.iter().map(value));
        match self {
            Self::Temperature | Self::Density | Self::Pressure => ValueAxis::log(values(), MOST_DECADES),
            Self::Degeneracy => ValueAxis::log(values().chain([1.0]), 6.0),
            Self::Composition => ValueAxis { is_log: false, lowest: 0.0, highest: 1.02 },
            Self::Luminosity => ValueAxis::linear(values().chain([0.0, 1.0])),
        }
    }
}

/// One line: places from the centre (0) to the surface (1), and values.
#[derive(Clone, Debug, PartialEq)]
pub struct LayerLine {
    /// Name for people.
    pub name: &'static str,
    /// Place and value.
    pub points: Vec<[f64; 2]>,
}

impl LayerLine {
    /// The value at a place, between the layers around it; nothing outside them.
    #[must_use]
    pub fn value_at(&self, place: f64) -> Option<f64> {
        let next = self.points.partition_point(|point| point[0] <= place);
        let before = self.points.get(next.checked_sub(1)?)?;
        let Some(after) = self.points.get(next) else { return (before[0] >= place).then_some(before[1]) };
        let share = (place - before[0]) / (after[0] - before[0]);
        if before[1] > 0.0 && after[1] > 0.0 {
            return Some((before[1].ln() + share * (after[1].ln() - before[1].ln())).exp());
        }
        Some(before[1] + share * (after[1] - before[1]))
    }
}

/// One panel.
#[derive(Clone, Debug, PartialEq)]
pub struct LayerPanel {
    /// What it shows.
    pub figure: LayerFigure,
    /// Its vertical axis.
    pub axis: ValueAxis,
    /// Its lines.
    pub lines: Vec<LayerLine>,
    /// A value that divides two regimes, with words for it.
    pub level: Option<(f64, &'static str)>,
}

/// A convective zone.
#[derive(Clone, Copy, Debug, PartialEq)]
pub struct MixedZone {
    /// Places where it begins and ends, 0 at the centre to 1 at the surface.
    pub places: [f64; 2],
    /// Mass fractions where it begins and ends.
    pub mass_fractions: [f64; 2],
    /// Radius fractions where it begins and ends.
    pub radius_fractions: [f64; 2],
}

/// The inside of the star, ready to be drawn.
#[derive(Clone, Debug, PartialEq)]
pub struct InteriorPicture {
    /// What the layers are laid out against.
    pub scale: LayerScale,
    /// One panel for each figure.
    pub panels: Vec<LayerPanel>,
    /// Zones in which the gas rises and sinks, from the centre outwards.
    pub mixed: Vec<MixedZone>,
}

/// A zone thinner than this in mass and in radius is not spoken of: a film at the surface, or noise at a boundary.
const THIN: f64 = 2e-3;

impl InteriorPicture {
    /// The picture of a profile.
    #[must_use]
    pub fn new(profile: &Profile, scale: LayerScale, figures: &[LayerFigure]) -> Self {
        let panels = figures.iter().map(|figure| panel(profile, scale, *figure)).collect();
        let mixed = profile.convective_zones().into_iter().map(|[first, last]| {
            // A zone reaches half-way to its neighbours: the layers are samples.
            let ends = [(first, first.saturating_sub(1)), (last, (last + 1).min(profile.layers.len() - 1))];
            let middle = |value: &dyn Fn(&Layer) -> f64| {
                ends.map(|(at, beside)| 0.5 * (value(&profile.layers[at]) + value(&profile.layers[beside])))
            };
            let mut zone = MixedZone {
                places: middle(&|layer| scale.place(layer)),
                mass_fractions: middle(&|layer| layer.mass_fraction()),
                radius_fractions: middle(&|layer| layer.radius_fraction),
            };
            if first == 0 {
                (zone.places[0], zone.mass_fractions[0], zone.radius_fractions[0]) = (0.0, 0.0, 0.0);
            }
            zone
        });
        Self { scale, panels, mixed: mixed.filter(MixedZone::is_thick).collect() }
    }

    /// Where the gas is mixed, in one sentence without its full stop.
    #[must_use]
    pub fn mixing_words(&self) -> String {
        let percent = |share: f64| format!("{:.0}", 100.0 * share);
        let zones: Vec<String> = self
            .mixed
            .iter()
            .map(|zone| {
                let [from, to] = zone.radius_fractions;
                let [below, above] = zone.mass_fractions;
                format!(
                    "from {} to {} % of the radius, which hold {} % of the mass",
                    percent(from),
                    percent(to),
                    percent(above - below)
                )
            })
            .collect();
        match &self.mixed[..] {
            [] => "Nothing mixes: energy is carried by radiation and conduction throughout".to_owned(),
            [zone] if zone.mass_fractions[0] <= 0.0 && zone.mass_fractions[1] > 0.995 => {
                "Gas rises and sinks throughout: the whole star is mixed".to_owned()
            }
            _ => format!("Gas rises and sinks {}", zones.join("; and ")),
        }
    }
}

impl MixedZone {
    fn is_thick(&self) -> bool {
        let thick = |ends: [f64; 2]| ends[1] - ends[0] > THIN;
        thick(self.mass_fractions) || thick(self.radius_fractions)
    }
}

fn panel(profile: &Profile, scale: LayerScale, figure: LayerFigure) -> LayerPanel {
    let line = |(name, value): &Reader| {
        let points = profile.layers.iter().map(|layer| [scale.place(layer), value(layer)]);
        LayerLine { name, points: points.collect() }
    };
    let level = (figure == LayerFigure::Degeneracy).then_some((1.0, "degenerate above"));
    LayerPanel { figure, axis: figure.axis(profile), lines: figure.lines().iter().map(line).collect(), level }
}

#[cfg(test)]
mod tests {
    use super::*;

    fn layer(mass_fraction: f64, is_convective: bool) -> Layer {
        Layer {
            mass_above_fraction: 1.0 - mass_fraction,
            radius_fraction: mass_fraction.cbrt(),
            temperature_k: 4e6 * (1.001 - mass_fraction),
            density_g_cm3: 400.0 * (1.001 - mass_fraction),
            pressure_bar: 1e11 * (1.001 - mass_fraction),
            luminosity_fraction: mass_fraction,
            hydrogen_fraction: 0.7,
            helium3_fraction: 0.01,
            helium4_fraction: 0.27,
            degeneracy_ratio: 3.0,
            is_convective,
        }
    }

    fn profile(is_convective: impl Fn(f64) -> bool) -> Profile {
        let shares = (0..=100).map(|k| f64::from(k) / 100.0);
        Profile { age_yr: 1e9, layers: shares.map(|share| layer(share, is_convective(share))).collect() }
    }

    #[test]
    fn a_star_mixed_throughout_is_called_so() {
        let picture = InteriorPicture::new(&profile(|_| true), LayerScale::Mass, &LayerFigure::ALL);
        assert_eq!(picture.mixed.len(), 1);
        assert_eq!(picture.mixed[0].places, [0.0, 1.0]);
        assert!(picture.mixing_words().contains("the whole star is mixed"));
        assert_eq!(picture.panels.len(), LayerFigure::ALL.len());
    }

    #[test]
    fn an_envelope_is_placed_where_it_lies() {
        let profile = profile(|share| share > 0.6);
        let by_mass = InteriorPicture::new(&profile, LayerScale::Mass, &[]);
        assert!((by_mass.mixed[0].places[0] - 0.605).abs() < 1e-9, "{:?}", by_mass.mixed);
        let by_radius = InteriorPicture::new(&profile, LayerScale::Radius, &[]);
        assert!((by_radius.mixed[0].places[0] - 0.605_f64.cbrt()).abs() < 1e-3);
        assert_eq!(
            by_mass.mixing_words(),
            "Gas rises and sinks from 85 to 100 % of the radius, which hold 40 % of the mass"
        );
        let still = InteriorPicture::new(&self::profile(|_| false), LayerScale::RadiusLog, &[]);
        assert!(still.mixed.is_empty() && still.mixing_words().starts_with("Nothing mixes"));
    }

    #[test]
    fn every_point_stays_on_its_axes() {
        for scale in LayerScale::ALL {
            let picture = InteriorPicture::new(&profile(|share| share > 0.3), scale, &LayerFigure::ALL);
            for panel in &picture.panels {
                for line in &panel.lines {
                    for [place, value] in &line.points {
                        assert!((0.0..=1.0).contains(place));
                        let height = panel.axis.height(*value).expect("a place on the axis");
                        assert!((-0.01..=1.01).contains(&height), "{:?} {}: {value}", panel.figure, line.name);
                    }
                }
            }
        }
    }
}
