//! Which moments and which layers of a life are kept.

use super::super::cgs::ATOMIC_MASS;
use super::super::gas::{electrons_per_cm3, fermi_temperature_k};
use super::super::structure::{Mesh, Model};
use super::node::{Life, Node};
use super::profile::{Layer, Profile};

/// Layers that are kept of a moment, at most.
const MOST_LAYERS: usize = 72;
/// Moments that are kept, at most.
const MOST_PROFILES: usize = 240;
/// Changes between two layers of like weight: mass fraction, radius fraction, ln T, ln ρ, hydrogen, ³He, luminosity
/// fraction, and whether the gas is mixed.
const BETWEEN_LAYERS: [f64; 8] = [0.03, 0.03, 0.3, 0.6, 0.04, 0.01, 0.04, 0.5];
/// Changes after which a moment is kept: ln central temperature and density, ln luminosity and radius, hydrogen at the
/// centre and on average, still core.
const BETWEEN_MOMENTS: [f64; 7] = [0.03, 0.08, 0.10, 0.05, 0.03, 0.03, 0.05];
/// Pressure unit, erg cm⁻³.
const BAR: f64 = 1e6;

/// Collects moments, fewer and fewer of them the longer a life becomes.
#[derive(Debug, Default)]
pub(super) struct Collector {
    kept: Vec<Profile>,
    last: Option<[f64; 7]>,
    /// How many times the usual change makes a moment worth keeping, less one.
    easing: f64,
}

impl Collector {
    /// Looks at a moment and keeps its inside if it differs enough from the last kept; before arrival on the main sequence
    /// only the last is kept.
    pub(super) fn note(&mut self, node: &Node, model: &Model, mesh: &Mesh, arrived: bool) {
        if !arrived {
            self.kept = vec![profile(model, mesh, node.age_yr)];
            return;
        }
        let now = changing(node);
        let far =
            self.last.is_none_or(|last| now.iter().zip(last).any(|(new, old)| (new - old).abs() > 1.0 + self.easing));
        if !far {
            return;
        }
        self.last = Some(now);
        self.kept.push(profile(model, mesh, node.age_yr));
        if self.kept.len() > MOST_PROFILES {
            let mut place = 0;
            self.kept.retain(|_| {
                place += 1;
                place % 2 == 1
            });
            self.easing = 2.0 * self.easing + 1.0;
        }
    }

    /// The kept moments from arrival on the main sequence on, and the last before it; `end` is the last of all.
    pub(super) fn finish(mut self, end: Profile, arrival_yr: f64) -> Vec<Profile> {
        if self.kept.last().is_none_or(|last| last.age_yr < end.age_yr) {
            self.kept.push(end);
        }
        self.kept.iter_mut().for_each(|profile| profile.age_yr -= arrival_yr);
        let first = self.kept.partition_point(|profile| profile.age_yr <= 0.0).saturating_sub(1);
        self.kept.split_off(first)
    }
}

/// What is watched, in units of the change that counts.
fn changing(node: &Node) -> [f64; 7] {
    let values = [
        node.core_temperature_k.ln(),
        node.core_density_g_cm3.ln(),
        node.luminosity_lsun.ln(),
        node.radius_rsun.ln(),
        node.core_hydrogen_fraction,
        node.mean_hydrogen_fraction,
        node.still_core_mass_fraction,
    ];
    std::array::from_fn(|i| values[i] / BETWEEN_MOMENTS[i])
}

/// The inside of a model: as many layers as are kept, closest where most changes.
pub(super) fn profile(model: &Model, mesh: &Mesh, age_yr: f64) -> Profile {
    let all: Vec<Layer> = (0..mesh.len()).map(|k| layer(model, mesh, k)).collect();
    let mut lengths = vec![0.0];
    for pair in all.windows(2) {
        lengths.push(lengths[lengths.len() - 1] + apart(&pair[0], &pair[1]));
    }
    let whole = lengths[lengths.len() - 1];
    let mut places: Vec<usize> = (0..MOST_LAYERS)
        .map(|step| {
            let wanted = whole * step as f64 / (MOST_LAYERS - 1) as f64;
            let next = lengths.partition_point(|length| *length < wanted).min(all.len() - 1);
            let nearer_before = next > 0 && wanted - lengths[next - 1] < lengths[next] - wanted;
            if nearer_before { next - 1 } else { next }
        })
        .collect();
    places.dedup();
    // The innermost shell is as the centre, through which nothing flows.
    let centre = Layer { mass_above_fraction: 1.0, radius_fraction: 0.0, luminosity_fraction: 0.0, ..all[0] };
    let layers = std::iter::once(centre).chain(places.into_iter().map(|place| all[place])).collect();
    Profile { age_yr, layers }
}

fn layer(model: &Model, mesh: &Mesh, k: usize) -> Layer {
    let [ln_density, ln_temperature, ln_radius, luminosity] = model.unknowns[k];
    let surface = model.unknowns[mesh.len() - 1];
    let composition = &model.composition[k];
    let temperature_k = ln_temperature.exp();
    let free = electrons_per_cm3(model.settled[k].ln_f, temperature_k);
    // More electrons than the nuclei own are an artefact of the fit at the edge of its range.
    let most = ln_density.exp() / ATOMIC_MASS;
    Layer {
        mass_above_fraction: seven_digits(mesh.above[k]),
        radius_fraction: seven_digits((ln_radius - surface[2]).exp()),
        temperature_k: seven_digits(temperature_k),
        density_g_cm3: seven_digits(ln_density.exp()),
        pressure_bar: seven_digits(model.settled[k].ln_pressure.exp() / BAR),
        luminosity_fraction: seven_digits(luminosity / surface[3]),
        hydrogen_fraction: seven_digits(composition.hydrogen),
        helium3_fraction: seven_digits(composition.helium3),
        helium4_fraction: seven_digits(composition.helium4()),
        degeneracy_ratio: seven_digits(fermi_temperature_k(free.min(most)) / temperature_k),
        is_convective: model.convective[k],
    }
}

/// What a stored profile keeps of a number, so that it comes back from the store to the last bit.
fn seven_digits(value: f64) -> f64 {
    f64::from(value as f32)
}

/// How unlike two layers are.
fn apart(a: &Layer, b: &Layer) -> f64 {
    let differences = [
        b.mass_fraction() - a.mass_fraction(),
        b.radius_fraction - a.radius_fraction,
        (b.temperature_k / a.temperature_k).ln(),
        (b.density_g_cm3 / a.density_g_cm3).ln(),
        b.hydrogen_fraction - a.hydrogen_fraction,
        b.helium3_fraction - a.helium3_fraction,
        b.luminosity_fraction - a.luminosity_fraction,
        f64::from(u8::from(a.is_convective != b.is_convective)),
    ];
    differences.iter().zip(BETWEEN_LAYERS).map(|(difference, scale)| (difference / scale).powi(2)).sum::<f64>().sqrt()
}

impl Life {
    /// The inside of the star at an age (yr since arrival on the main sequence), between the two kept moments around it.
    ///
    /// Nothing before arrival, and after the last moment of which the structure was computed.
    #[must_use]
    pub fn profile_at(&self, age_yr: f64) -> Option<Profile> {
        profile_at(&self.profiles, age_yr)
    }
}

/// The inside at an age, from moments in order of age. Nothing outside them.
#[must_use]
pub fn profile_at(profiles: &[Profile], age_yr: f64) -> Option<Profile> {
    let next = profiles.partition_point(|profile| profile.age_yr <= age_yr);
    let before = profiles.get(next.checked_sub(1)?)?;
    match profiles.get(next) {
        Some(after) => Some(before.towards(after, (age_yr - before.age_yr) / (after.age_yr - before.age_yr))),
        None => (before.age_yr >= age_yr).then(|| before.clone()),
    }
}
