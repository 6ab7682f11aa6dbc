//! What the star is doing at each moment.

use super::node::{Ending, Node};

/// Stage of a red dwarf's life.
#[derive(Clone, Copy, Debug, PartialEq, Eq, Hash, PartialOrd, Ord)]
#[non_exhaustive]
pub enum Stage {
    /// Shrinking, not yet shining by burning.
    Contraction,
    /// Burning hydrogen, mixed through the centre.
    MainSequence,
    /// Burning hydrogen round a centre in which nothing mixes any more.
    RadiativeCore,
    /// Bright and ever hotter while the last hydrogen burns.
    BlueDwarf,
    /// On the way up the giant branch, burning hydrogen in a shell.
    GiantBranch,
    /// A helium white dwarf of the star's whole mass, at first with hydrogen still glowing.
    HeliumWhiteDwarf,
    /// A helium white dwarf colder than 1000 K.
    BlackDwarf,
}

/// Surface temperature below which a white dwarf is called black, K.
pub(super) const BLACK_BELOW_K: f64 = 1000.0;
/// The blue dwarf begins at this many times the light with which the centre stopped mixing …
const BRIGHTENED: f64 = 3.0;
/// … and ends at this share of its peak.
const FADED: f64 = 0.1;

/// Writes the stage of every node; the ages must already count from arrival on the main sequence.
pub(super) fn assign(nodes: &mut [Node], ending: Ending) {
    let onset =
        nodes.iter().position(|node| node.age_yr >= 0.0 && node.still_core_mass_fraction > 0.0).unwrap_or(nodes.len());
    let light_at_onset = nodes.get(onset).map_or(f64::INFINITY, |node| node.luminosity_lsun);
    let mut peak = (onset, 0.0);
    for (place, node) in nodes.iter().enumerate().skip(onset) {
        if node.luminosity_lsun > peak.1 {
            peak = (place, node.luminosity_lsun);
        }
    }
    // The faintest stars brighten less than threefold: for them half-way (in the logarithm) to the peak counts.
    let bright = light_at_onset * BRIGHTENED.min((peak.1 / light_at_onset).sqrt());
    let brightened = nodes.iter().enumerate().skip(onset).find(|(_, node)| node.luminosity_lsun > bright);
    let brightened = brightened.map_or(nodes.len(), |(place, _)| place);
    let faded = nodes.iter().enumerate().skip(peak.0).find(|(_, node)| node.luminosity_lsun < FADED * peak.1);
    let faded = faded.map_or(nodes.len(), |(place, _)| place);

    for (place, node) in nodes.iter_mut().enumerate() {
        node.stage = if node.age_yr < 0.0 {
            Stage::Contraction
        } else if place < onset {
            Stage::MainSequence
        } else if place < brightened {
            Stage::RadiativeCore
        } else if ending == Ending::GiantBranch {
            Stage::GiantBranch
        } else if place < faded {
            Stage::BlueDwarf
        } else if node.effective_temperature_k < BLACK_BELOW_K {
            Stage::BlackDwarf
        } else {
            Stage::HeliumWhiteDwarf
        };
    }
}
