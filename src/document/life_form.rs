//! A computed life as bytes: to the last bit, with a sum that tells damage.

use crate::physics::star::convective::{Caution, Ending, Layer, Life, Node, Profile, Stage};

const MAGIC: &[u8; 8] = b"LRDLIFE2";
const NUMBERS: usize = 14;
const NODE: usize = 8 * NUMBERS + 1;
const LAYER_NUMBERS: usize = 10;
const LAYER: usize = 4 * LAYER_NUMBERS + 1;

const STAGES: [Stage; 7] = [
    Stage::Contraction,
    Stage::MainSequence,
    Stage::RadiativeCore,
    Stage::BlueDwarf,
    Stage::GiantBranch,
    Stage::HeliumWhiteDwarf,
    Stage::BlackDwarf,
];
const ENDINGS: [Ending; 2] = [Ending::BlackDwarf, Ending::GiantBranch];
const CAUTIONS: [Caution; 7] = [
    Caution::OutsideCalibratedMasses,
    Caution::OutsideCalibratedMetallicity,
    Caution::OutdatedSurface,
    Caution::ShellFlashes,
    Caution::GiantWind,
    Caution::OpacityOfMoreMetals,
    Caution::EarlyCrystal,
];

/// Form, sum over the rest, contraction time, ending, cautions, number of nodes, nodes, then for each profile its age, its
/// number of layers and the layers, whose numbers have no more than seven digits.
pub(super) fn encoded(life: &Life) -> Vec<u8> {
    let mut body = life.contraction_yr.to_le_bytes().to_vec();
    body.push(place(&ENDINGS, &life.ending));
    body.push(u8::try_from(life.cautions.len()).unwrap_or(u8::MAX));
    body.extend(life.cautions.iter().take(usize::from(u8::MAX)).map(|caution| place(&CAUTIONS, caution)));
    body.extend(count(life.nodes.len()));
    for node in &life.nodes {
        for number in numbers(node) {
            body.extend(number.to_le_bytes());
        }
        body.push(place(&STAGES, &node.stage));
    }
    for profile in &life.profiles {
        body.extend(profile.age_yr.to_le_bytes());
        body.extend(count(profile.layers.len()));
        for layer in &profile.layers {
            for number in layer_numbers(layer) {
                body.extend((number as f32).to_le_bytes());
            }
            body.push(u8::from(layer.is_convective));
        }
    }
    let mut bytes = MAGIC.to_vec();
    bytes.extend(sum(&body).to_le_bytes());
    bytes.extend(body);
    bytes
}

/// The life, or nothing if the bytes are not one of this form or are damaged.
pub(super) fn decoded(bytes: &[u8]) -> Option<Life> {
    let mut rest = bytes.strip_prefix(MAGIC)?;
    let expected = u64::from_le_bytes(take(&mut rest)?);
    if sum(rest) != expected {
        return None;
    }
    let contraction_yr = f64::from_le_bytes(take(&mut rest)?);
    let [ending, count] = take::<2>(&mut rest)?;
    let ending = *ENDINGS.get(usize::from(ending))?;
    let mut cautions = Vec::new();
    for _ in 0..count {
        let [caution] = take::<1>(&mut rest)?;
        cautions.push(*CAUTIONS.get(usize::from(caution))?);
    }
    let nodes: Vec<Node> = items(&mut rest, NODE)?.map(node).collect::<Option<_>>()?;
    let mut profiles: Vec<Profile> = Vec::new();
    while !rest.is_empty() {
        let age_yr = f64::from_le_bytes(take(&mut rest)?);
        let layers = items(&mut rest, LAYER)?.map(layer).collect::<Option<_>>()?;
        profiles.push(Profile { age_yr, layers });
    }
    let rises = nodes.windows(2).all(|pair| pair[0].age_yr < pair[1].age_yr)
        && profiles.windows(2).all(|pair| pair[0].age_yr < pair[1].age_yr);
    rises.then_some(Life { nodes, contraction_yr, ending, cautions, profiles })
}

fn count(items: usize) -> [u8; 4] {
    u32::try_from(items).unwrap_or(u32::MAX).to_le_bytes()
}

/// Takes a count and that many items of a size in bytes.
fn items<'a>(rest: &mut &'a [u8], size: usize) -> Option<std::slice::ChunksExact<'a, u8>> {
    let count = u32::from_le_bytes(take(rest)?) as usize;
    let (items, after) = rest.split_at_checked(count.checked_mul(size)?)?;
    *rest = after;
    Some(items.chunks_exact(size))
}

fn layer(mut bytes: &[u8]) -> Option<Layer> {
    let mut numbers = [0.0; LAYER_NUMBERS];
    for number in &mut numbers {
        *number = f64::from(f32::from_le_bytes(take(&mut bytes)?));
    }
    if !numbers.iter().all(|number| number.is_finite()) {
        return None;
    }
    let [convective] = take::<1>(&mut bytes)?;
    let [
        mass_above_fraction,
        radius_fraction,
        temperature_k,
        density_g_cm3,
        pressure_bar,
        luminosity_fraction,
        hydrogen_fraction,
        helium3_fraction,
        helium4_fraction,
        degeneracy_ratio,
    ] = numbers;
    Some(Layer {
        mass_above_fraction,
        radius_fraction,
        temperature_k,
        density_g_cm3,
        pressure_bar,
        luminosity_fraction,
        hydrogen_fraction,
        helium3_fraction,
        helium4_fraction,
        degeneracy_ratio,
        is_convective: convective == 1,
    })
}

fn layer_numbers(layer: &Layer) -> [f64; LAYER_NUMBERS] {
    [
        layer.mass_above_fraction,
        layer.radius_fraction,
        layer.temperature_k,
        layer.density_g_cm3,
        layer.pressure_bar,
        layer.luminosity_fraction,
        layer.hydrogen_fraction,
        layer.helium3_fraction,
        layer.helium4_fraction,
        layer.degeneracy_ratio,
    ]
}

fn node(mut bytes: &[u8]) -> Option<Node> {
    let mut numbers = [0.0; NUMBERS];
    for number in &mut numbers {
        *number = f64::from_le_bytes(take(&mut bytes)?);
    }
    if !numbers.iter().all(|number| number.is_finite()) {
        return None;
    }
    let [stage] = take::<1>(&mut bytes)?;
    let [
        age_yr,
        mass_msun,
        luminosity_lsun,
        radius_rsun,
        effective_temperature_k,
        nuclear_luminosity_lsun,
        core_temperature_k,
        core_density_g_cm3,
        core_hydrogen_fraction,
        core_helium3_fraction,
        mean_hydrogen_fraction,
        surface_hydrogen_fraction,
        still_core_mass_fraction,
        helium_core_mass_msun,
    ] = numbers;
    Some(Node {
        age_yr,
        mass_msun,
        luminosity_lsun,
        radius_rsun,
        effective_temperature_k,
        nuclear_luminosity_lsun,
        core_temperature_k,
        core_density_g_cm3,
        core_hydrogen_fraction,
        core_helium3_fraction,
        mean_hydrogen_fraction,
        surface_hydrogen_fraction,
        still_core_mass_fraction,
        helium_core_mass_msun,
        stage: *STAGES.get(usize::from(stage))?,
    })
}

fn numbers(node: &Node) -> [f64; NUMBERS] {
    [
        node.age_yr,
        node.mass_msun,
        node.luminosity_lsun,
        node.radius_rsun,
        node.effective_temperature_k,
        node.nuclear_luminosity_lsun,
        node.core_temperature_k,
        node.core_density_g_cm3,
        node.core_hydrogen_fraction,
        node.core_helium3_fraction,
        node.mean_hydrogen_fraction,
        node.surface_hydrogen_fraction,
        node.still_core_mass_fraction,
        node.helium_core_mass_msun,
    ]
}

/// The place of a value in its list; one past the end for what is not listed, which does not decode.
fn place<T: PartialEq>(list: &[T], value: &T) -> u8 {
    let place = list.iter().position(|listed| listed == value).unwrap_or(list.len());
    u8::try_from(place).unwrap_or(u8::MAX)
}

/// Fowler–Noll–Vo sum, 64 bits, variant 1a. Source: Fowler, Noll & Vo, RFC 9923.
fn sum(bytes: &[u8]) -> u64 {
    bytes.iter().fold(0xcbf2_9ce4_8422_2325, |sum, byte| (sum ^ u64::from(*byte)).wrapping_mul(0x0100_0000_01b3))
}

fn take<const N: usize>(bytes: &mut &[u8]) -> Option<[u8; N]> {
    let (first, rest) = bytes.split_first_chunk::<N>()?;
    *bytes = rest;
    Some(*first)
}

#[cfg(test)]
mod tests {
    use super::*;

    fn life() -> Life {
        let moment = |age_yr: f64, stage| Node {
            age_yr,
            mass_msun: 0.1,
            luminosity_lsun: 1e-3 / 3.0,
            radius_rsun: 0.12,
            effective_temperature_k: 2850.0,
            nuclear_luminosity_lsun: 0.0,
            core_temperature_k: 4.5e6,
            core_density_g_cm3: 400.0,
            core_hydrogen_fraction: 0.7,
            core_helium3_fraction: 3e-5,
            mean_hydrogen_fraction: 0.7,
            surface_hydrogen_fraction: 0.7,
            still_core_mass_fraction: 0.0,
            helium_core_mass_msun: 0.0,
            stage,
        };
        let layer = |mass_above_fraction: f64| Layer {
            mass_above_fraction,
            radius_fraction: f64::from((1.0 - mass_above_fraction).cbrt() as f32),
            temperature_k: 4.5e6,
            density_g_cm3: 400.0,
            pressure_bar: f64::from(2.9e11_f32),
            luminosity_fraction: 1.0 - mass_above_fraction,
            hydrogen_fraction: 0.5,
            helium3_fraction: 0.0625,
            helium4_fraction: 0.25,
            degeneracy_ratio: f64::from(3.3_f32),
            is_convective: mass_above_fraction < 0.75,
        };
        let profile = |age_yr| Profile { age_yr, layers: [1.0, 0.5, 0.0].map(layer).to_vec() };
        Life {
            profiles: vec![profile(-2.0), profile(1e12 / 3.0)],
            nodes: vec![
                moment(-1e9, Stage::Contraction),
                moment(0.0, Stage::MainSequence),
                moment(1e13, Stage::BlackDwarf),
            ],
            contraction_yr: 1e9,
            ending: Ending::GiantBranch,
            cautions: vec![Caution::GiantWind, Caution::EarlyCrystal],
        }
    }

    #[test]
    fn a_life_comes_back_to_the_last_bit() {
        assert_eq!(decoded(&encoded(&life())), Some(life()));
    }

    #[test]
    fn damage_is_noticed() {
        let bytes = encoded(&life());
        assert_eq!(decoded(b""), None);
        assert_eq!(decoded(&bytes[..bytes.len() - 1]), None);
        for place in [0, 9, 20, 60, bytes.len() - 1] {
            let mut damaged = bytes.clone();
            damaged[place] ^= 4;
            assert_eq!(decoded(&damaged), None, "byte {place}");
        }
    }
}
